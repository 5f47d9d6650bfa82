// The project's own source files, read once for the tests of the house style.

import { readdirSync, readFileSync } from 'node:fs';
import { join, sep } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../../', import.meta.url));

export interface Source {
  /** From the root, with forward slashes. */
  readonly path: string;
  readonly text: string;
}

export function sourcesOf(...folders: readonly string[]): readonly Source[] {
  return folders.flatMap((folder) =>
    readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
      .filter((name) => /\.(ts|tsx)$/.test(name))
      .map((name) => ({
        path: join(folder, name).split(sep).join('/'),
        text: readFileSync(join(root, folder, name), 'utf8'),
      })),
  );
}
