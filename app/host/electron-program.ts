import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';

/**
 * The path of Electron's program where it is installed, else null. Only looks: asking the package
 * itself would start a download of a hundred megabytes.
 */
export function electronProgram(from: string): string | null {
  try {
    const folder = dirname(createRequire(from).resolve('electron/package.json'));
    const program = join(folder, 'dist', readFileSync(join(folder, 'path.txt'), 'utf8').trim());
    return existsSync(program) ? program : null;
  } catch {
    return null;
  }
}
