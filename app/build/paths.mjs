// The places that the set-up scripts share.
import { realpathSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
export const dist = join(root, 'dist');
export const stampFile = join(dist, '.stamp');
/** Made by the build, beside dist/: the demo's project names it. */
export const demoWeather = join(root, 'demo', 'out', 'ostermere-weather.csv');

/** Whether this module is the program that was started, and not imported by another. */
export function isProgram(moduleUrl) {
  const started = process.argv[1];
  return started !== undefined && realpathSync(started) === realpathSync(fileURLToPath(moduleUrl));
}
