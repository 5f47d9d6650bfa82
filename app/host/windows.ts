// Which windows are open, and on which file: so that two windows on one file are told of each other, and
// a draft is offered again only when the window that wrote it is gone. Windows may belong to different
// runs of the program, so they are known by small files that each of them renews.

import { mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';

const entry = z.object({ path: z.string().nullable(), at: z.number() });
type Entry = z.infer<typeof entry>;

/** A window that has not been heard of for so long is gone [ms]. */
export const goneAfterMs = 15_000;

export interface Windows {
  /** The window is there, with this file open. */
  seen(window: string, path: string | null): Promise<void>;
  /** Windows that are there, each with its file. */
  open(): Promise<ReadonlyMap<string, string | null>>;
}

export function openWindows(dataFolder: string | null, now: () => number): Windows {
  const own = new Map<string, Entry>();
  const folder = dataFolder === null ? null : join(dataFolder, 'windows');

  async function fromFiles(): Promise<Map<string, Entry>> {
    const found = new Map<string, Entry>();
    if (folder === null) return found;
    for (const name of await readdir(folder).catch(() => [])) {
      const file = join(folder, name);
      try {
        const read = entry.parse(JSON.parse(await readFile(file, 'utf8')));
        if (now() - read.at < goneAfterMs) found.set(name.replace(/\.json$/, ''), read);
        else await rm(file, { force: true });
      } catch {
        // being written just now, or spoilt: its window will renew it
      }
    }
    return found;
  }

  return {
    async seen(window, path) {
      own.set(window, { path, at: now() });
      if (folder === null) return;
      await mkdir(folder, { recursive: true }).catch(() => {});
      // Losing this file costs a warning, nothing more: it need not be written whole.
      await writeFile(join(folder, `${window}.json`), JSON.stringify({ path, at: now() })).catch(
        () => {},
      );
    },
    async open() {
      const all = new Map([...(await fromFiles()), ...own]);
      for (const [window, { at }] of all) {
        if (now() - at < goneAfterMs) continue;
        all.delete(window);
        own.delete(window);
      }
      return new Map([...all].map(([window, { path }]) => [window, path]));
    },
  };
}
