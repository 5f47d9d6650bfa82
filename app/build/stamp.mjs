// The stamp of a build: a hash of every file it was made from. A build is stale when the stamp that
// it carries is not the one of the files as they are now.
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { demoWeather, root, stampFile } from './paths.mjs';

const folders = ['app', 'demo', 'engine', 'weather'];
const source = /\.(as|ts|tsx|mts|mjs|cjs|js|css|html|svg|json|woff2|png)$/;
/** Written by a run of the demo, or data that it reads: not part of a build. */
const notSource = /^demo[\\/](out[\\/]|.*\.json$)/;

export function sourcesStamp() {
  const hash = createHash('sha256');
  const files = folders.flatMap((folder) => {
    try {
      return readdirSync(join(root, folder), { recursive: true }).map((name) => join(folder, name));
    } catch {
      return []; // the folder is not there
    }
  });
  const read = files.filter((file) => source.test(file) && !notSource.test(file)).sort();
  for (const file of [...read, 'package.json', 'package-lock.json']) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

export function buildIsFresh() {
  try {
    return existsSync(demoWeather) && readFileSync(stampFile, 'utf8') === sourcesStamp();
  } catch {
    return false;
  }
}
