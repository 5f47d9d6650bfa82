// Earlier versions of a file: its bytes before each save, the latest twenty. They lie in the program's
// data folder, not beside the file, where they would be in the way.

import { createHash } from 'node:crypto';
import { mkdir, readdir, readFile, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { writeFileWhole } from '../disk/index.ts';

export const versionsKept = 20;

export interface Version {
  readonly id: string;
  readonly savedAt: number;
  readonly bytes: number;
}

export interface Versions {
  /** Keeps what stands in the file now. */
  keep(path: string): Promise<void>;
  /** Latest first. */
  list(path: string): Promise<readonly Version[]>;
  read(path: string, id: string): Promise<string | null>;
}

export function fileVersions(dataFolder: string | null, now: () => number): Versions {
  if (dataFolder === null) {
    return { keep: async () => {}, list: async () => [], read: async () => null };
  }
  const folderOf = (path: string) =>
    join(dataFolder, 'versions', createHash('sha256').update(path).digest('hex').slice(0, 24));
  const isId = (id: string) => /^\d{13}$/.test(id);

  async function ids(path: string): Promise<string[]> {
    const names = await readdir(folderOf(path)).catch(() => []);
    return names
      .filter((name) => name.endsWith('.json'))
      .map((name) => name.slice(0, -5))
      .filter(isId)
      .sort()
      .reverse();
  }
  const fileOf = (path: string, id: string) => join(folderOf(path), `${id}.json`);

  return {
    async keep(path) {
      const text = await readFile(path, 'utf8').catch(() => null);
      if (text === null) return;
      const [latest] = await ids(path);
      if (latest && (await readFile(fileOf(path, latest), 'utf8').catch(() => '')) === text) return;
      await mkdir(folderOf(path), { recursive: true });
      // Two saves within a millisecond must not share a name.
      const at = Math.max(now(), latest === undefined ? 0 : Number(latest) + 1);
      await writeFileWhole(fileOf(path, String(at).padStart(13, '0')), text);
      for (const old of (await ids(path)).slice(versionsKept)) {
        await rm(fileOf(path, old), { force: true });
      }
    },
    async list(path) {
      const found: Version[] = [];
      for (const id of await ids(path)) {
        const size = await stat(fileOf(path, id)).catch(() => null);
        if (size) found.push({ id, savedAt: Number(id), bytes: size.size });
      }
      return found;
    },
    read: async (path, id) =>
      isId(id) ? readFile(fileOf(path, id), 'utf8').catch(() => null) : null,
  };
}
