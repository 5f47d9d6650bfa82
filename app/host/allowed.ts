// Which paths the window may touch: those below a folder that the user named, and those that the user
// picked. Links are followed first, so that a link inside a folder does not lead out of it.

import { realpath } from 'node:fs/promises';
import { basename, dirname, join, resolve, sep } from 'node:path';

/** The real path of a file that need not exist yet: its folder is resolved, its name kept. */
export async function realPath(path: string): Promise<string> {
  const whole = resolve(path);
  try {
    return await realpath(whole);
  } catch {
    const parent = dirname(whole);
    return parent === whole ? whole : join(await realPath(parent), basename(whole));
  }
}

export async function isBelow(path: string, folder: string): Promise<boolean> {
  const [file, root] = await Promise.all([realPath(path), realPath(folder)]);
  return file === root || file.startsWith(root.endsWith(sep) ? root : root + sep);
}

export interface Allowed {
  mayRead(path: string): Promise<boolean>;
  mayWrite(path: string): Promise<boolean>;
  /** The user picked this file in the system's own dialog, or named it when starting. */
  picked(path: string): Promise<void>;
}

export function allowed(folders: readonly string[], readOnlyFolders: readonly string[]): Allowed {
  const pickedFiles = new Set<string>();
  /** Weather tables lie beside the project or below it. */
  const besidePicked = new Set<string>();
  const below = async (path: string, roots: Iterable<string>) => {
    for (const root of roots) if (await isBelow(path, root)) return true;
    return false;
  };
  const mayWrite = async (path: string) =>
    pickedFiles.has(await realPath(path)) || (await below(path, folders));
  return {
    mayWrite,
    mayRead: async (path) =>
      (await mayWrite(path)) ||
      (await below(path, readOnlyFolders)) ||
      (await below(path, besidePicked)),
    async picked(path) {
      const real = await realPath(path);
      pickedFiles.add(real);
      besidePicked.add(dirname(real));
    },
  };
}
