export { type ReadOptions, readText, type TextFile } from './read-text.ts';
export { systemFault } from './system-fault.ts';
export { writeFileWhole, writeFolderWhole } from './write-whole.ts';
