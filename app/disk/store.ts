// Bytes kept between runs of the program, by a key: a convenience that may be thrown away at any time.
// Nothing depends on it: what cannot be read or written is worked out again.

import { randomBytes } from 'node:crypto';
import { mkdir, readdir, readFile, rename, rm, stat, utimes, writeFile } from 'node:fs/promises';
import { homedir } from 'node:os';
import { join } from 'node:path';

/** All that is kept together; the files longest unused go first. */
const mostBytes = 200_000_000;

/**
 * The folder: INGLENOOK_STORE where it is set ("off": none), else the system's place for such files.
 * Under a test runner nothing is kept unless it is set.
 */
function storeFolder(env: NodeJS.ProcessEnv): string | null {
  const set = env.INGLENOOK_STORE;
  if (set !== undefined && set !== '') return set === 'off' ? null : set;
  if (env.VITEST !== undefined) return null;
  if (process.platform === 'win32')
    return env.LOCALAPPDATA ? join(env.LOCALAPPDATA, 'inglenook', 'weather') : null;
  if (process.platform === 'darwin')
    return join(homedir(), 'Library', 'Caches', 'inglenook', 'weather');
  return join(env.XDG_CACHE_HOME || join(homedir(), '.cache'), 'inglenook', 'weather');
}

/** @param key hexadecimal digits */
export async function readStored(key: string): Promise<Uint8Array | null> {
  const folder = storeFolder(process.env);
  if (folder === null) return null;
  const path = join(folder, `${key}.bin`);
  const bytes = await readFile(path).catch(() => null);
  const now = new Date();
  if (bytes) await utimes(path, now, now).catch(() => {});
  return bytes;
}

export async function writeStored(key: string, bytes: Uint8Array): Promise<void> {
  const folder = storeFolder(process.env);
  if (folder === null || bytes.length > mostBytes / 2) return;
  const path = join(folder, `${key}.bin`);
  const fresh = `${path}.${randomBytes(4).toString('hex')}.tmp`;
  try {
    await mkdir(folder, { recursive: true });
    await writeFile(fresh, bytes, { flag: 'wx', mode: 0o600 });
    await rename(fresh, path);
    await makeRoom(folder);
  } catch {
    await rm(fresh, { force: true }).catch(() => {});
  }
}

async function makeRoom(folder: string): Promise<void> {
  const names = (await readdir(folder)).filter((name) => /^[0-9a-f]+\.bin$/.test(name));
  const files = await Promise.all(
    names.map(async (name) => {
      const path = join(folder, name);
      const { size, mtimeMs } = await stat(path);
      return { path, size, mtimeMs };
    }),
  );
  files.sort((a, b) => b.mtimeMs - a.mtimeMs);
  let sum = 0;
  for (const { path, size } of files) {
    sum += size;
    if (sum > mostBytes) await rm(path, { force: true });
  }
}
