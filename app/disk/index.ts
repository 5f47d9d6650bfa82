export { readBytes, readText, type TextFile } from './read-text.ts';
export { writeFileWhole, writeFolderWhole } from './write-whole.ts';
