// Unsaved work, written a moment after each edit: what a crash, a power cut or a closed tab would
// otherwise take. A draft goes when its document is saved or let go.

import { mkdir, readdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import { writeFileWhole } from '../disk/index.ts';

const form = z.object({
  window: z.string(),
  path: z.string().nullable(),
  name: z.string(),
  weatherPath: z.string().nullable(),
  replaces: z.string().nullable(),
  text: z.string(),
  changedAt: z.number(),
});
export type Draft = z.infer<typeof form>;

export interface Drafts {
  keep(id: string, draft: Omit<Draft, 'changedAt'>): Promise<void>;
  drop(id: string): Promise<void>;
  /** Latest first. */
  all(): Promise<readonly (Draft & { readonly id: string })[]>;
}

export function draftFiles(dataFolder: string | null, now: () => number): Drafts {
  if (dataFolder === null) {
    return { keep: async () => {}, drop: async () => {}, all: async () => [] };
  }
  const folder = join(dataFolder, 'drafts');
  const fileOf = (id: string) => join(folder, `${id}.json`);
  return {
    async keep(id, draft) {
      await mkdir(folder, { recursive: true });
      const written = await writeFileWhole(
        fileOf(id),
        JSON.stringify({ ...draft, changedAt: now() }),
      );
      if (!written.ok) throw new Error(`The draft could not be written to ${folder}.`);
    },
    drop: (id) => rm(fileOf(id), { force: true }),
    async all() {
      const found: (Draft & { readonly id: string })[] = [];
      for (const name of await readdir(folder).catch(() => [])) {
        if (!name.endsWith('.json') || name.startsWith('.')) continue;
        try {
          const id = name.slice(0, -5);
          found.push({ id, ...form.parse(JSON.parse(await readFile(fileOf(id), 'utf8'))) });
        } catch {
          // no draft of ours: left where it is
        }
      }
      return found.sort((a, b) => b.changedAt - a.changedAt);
    },
  };
}
