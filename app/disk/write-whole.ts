// Writes so that a reader, or a power cut, finds the old content or the new and never a part of it:
// the new bytes go to a file beside the old one, reach the disk, and take its name in one step.

import { randomBytes } from 'node:crypto';
import { mkdir, open, readdir, realpath, rename, rm, rmdir, stat } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import type { Fault, Parsed } from '../../weather/index.ts';
import { systemCode, systemFault } from './system-fault.ts';

const written = { ok: true, value: null } as const;

const beside = (path: string) =>
  join(dirname(path), `.${basename(path)}.${randomBytes(4).toString('hex')}.tmp`);

async function writeToDisk(path: string, text: string, mode: number): Promise<void> {
  const handle = await open(path, 'wx', mode);
  try {
    await handle.writeFile(text, 'utf8');
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Where a path really leads, so that a link is written through; the path itself if nothing is there. */
async function target(path: string): Promise<{ readonly path: string; readonly mode: number }> {
  try {
    const real = await realpath(path);
    return { path: real, mode: (await stat(real)).mode & 0o777 };
  } catch (error) {
    if (systemCode(error) !== 'ENOENT') throw error;
    return { path, mode: 0o666 };
  }
}

/** Writes one file whole, or leaves what was there and says why. */
export async function writeFileWhole(file: string, text: string): Promise<Parsed<null>> {
  let fresh: string | null = null;
  try {
    const { path, mode } = await target(file);
    if ((await stat(path).catch(() => null))?.isDirectory()) {
      throw Object.assign(new Error('is a folder'), { code: 'EISDIR' });
    }
    fresh = beside(path);
    await writeToDisk(fresh, text, mode);
    await rename(fresh, path);
    return written;
  } catch (error) {
    if (fresh) await rm(fresh, { force: true });
    return { ok: false, faults: [systemFault(file, error, 'a place to write a file')] };
  }
}

/**
 * Writes several files into a folder: all of them are complete on disk before the first appears. A
 * new folder appears with everything in it; in one that holds other files, each file appears whole.
 */
export async function writeFolderWhole(
  folder: string,
  files: ReadonlyMap<string, string>,
): Promise<Parsed<null>> {
  const fresh = beside(folder);
  try {
    await mkdir(dirname(folder), { recursive: true });
    await mkdir(fresh);
    for (const [name, text] of files) await writeToDisk(join(fresh, name), text, 0o666);
    const held = await readdir(folder).catch((error: unknown) => {
      if (systemCode(error) === 'ENOENT') return null;
      throw error;
    });
    if (held && held.length > 0) {
      for (const name of files.keys()) await rename(join(fresh, name), join(folder, name));
      await rmdir(fresh);
    } else {
      if (held) await rmdir(folder);
      await rename(fresh, folder);
    }
    return written;
  } catch (error) {
    await rm(fresh, { recursive: true, force: true });
    const fault: Fault = systemFault(folder, error, 'a folder to write into');
    return { ok: false, faults: [fault] };
  }
}
