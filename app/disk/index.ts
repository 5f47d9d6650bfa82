export { readKernel } from './read-kernel.ts';
export { readBytes, readText, type TextFile } from './read-text.ts';
export { readStored, writeStored } from './store.ts';
export { writeFileWhole, writeFolderWhole } from './write-whole.ts';
