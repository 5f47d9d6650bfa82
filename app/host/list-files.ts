import { readdir, stat } from 'node:fs/promises';
import { basename, join } from 'node:path';
import type { CallIn, CallOut } from '../bridge/index.ts';

const ending = { project: /\.inglenook\.json$/i, weather: /\.csv$/i };
const passedOver = /^(\.|node_modules$|dist$|coverage$)/;
const deepest = 4;
const most = 500;

/** Files of a kind below the folders, newest first; folders that cannot be read are passed over. */
export async function listFiles(
  folders: readonly string[],
  kind: CallIn<'listFiles'>['kind'],
): Promise<CallOut<'listFiles'>> {
  const found = new Map<string, CallOut<'listFiles'>[number]>();

  async function walk(at: string, folder: string, depth: number): Promise<void> {
    const entries = await readdir(at, { withFileTypes: true }).catch(() => []);
    for (const entry of entries) {
      if (found.size >= most) return;
      const path = join(at, entry.name);
      if (passedOver.test(entry.name)) continue;
      if (entry.isDirectory() && depth < deepest) await walk(path, folder, depth + 1);
      if (!entry.isFile() || !ending[kind].test(entry.name) || found.has(path)) continue;
      const { size, mtimeMs } = await stat(path);
      found.set(path, { path, name: basename(path), folder, bytes: size, changedAt: mtimeMs });
    }
  }
  for (const folder of folders) await walk(folder, folder, 0);
  return [...found.values()].sort((a, b) => b.changedAt - a.changedAt);
}
