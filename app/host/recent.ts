// The list of projects used lately. It is a convenience: when it cannot be read or written, the
// program goes on without it.

import { mkdir, readFile } from 'node:fs/promises';
import { homedir } from 'node:os';
import { join } from 'node:path';
import { z } from 'zod';
import { writeFileWhole } from '../disk/index.ts';

const most = 20;
const list = z.array(z.object({ path: z.string(), usedAt: z.number() }));
export type RecentFile = z.infer<typeof list>[number];

/** Where programs keep their data on this system. */
export function dataFolder(
  env: Readonly<Record<string, string | undefined>>,
  platform: NodeJS.Platform,
): string {
  if (env.INGLENOOK_DATA) return env.INGLENOOK_DATA;
  if (platform === 'win32') {
    return join(env.APPDATA ?? join(homedir(), 'AppData', 'Roaming'), 'Inglenook');
  }
  if (platform === 'darwin') return join(homedir(), 'Library', 'Application Support', 'Inglenook');
  return join(env.XDG_DATA_HOME || join(homedir(), '.local', 'share'), 'inglenook');
}

export interface Recent {
  files(): Promise<readonly RecentFile[]>;
  used(path: string): Promise<void>;
}

export function recentList(folder: string | null, now: () => number): Recent {
  if (folder === null) return { files: async () => [], used: async () => {} };
  const file = join(folder, 'recent.json');
  const files = async () => {
    try {
      return list.parse(JSON.parse(await readFile(file, 'utf8')));
    } catch {
      return [];
    }
  };
  return {
    files,
    async used(path) {
      const others = (await files()).filter((entry) => entry.path !== path);
      const next = [{ path, usedAt: now() }, ...others].slice(0, most);
      await mkdir(folder, { recursive: true }).catch(() => {});
      await writeFileWhole(file, `${JSON.stringify(next, null, 2)}\n`);
    },
  };
}
