// Every static check, all of them run even when one fails: types, lint and format, unused code.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { isProgram, root } from './paths.mjs';

const types = ['engine', '.', 'app/ui'].filter((at) => existsSync(join(root, at, 'tsconfig.json')));
const checks = [
  ...types.map((at) => [`types of ${at === '.' ? 'the rest' : at}`, 'tsc', ['-p', at]]),
  ['lint and format', 'biome', ['ci', '--error-on-warnings', '.']],
  ['unused code and packages', 'knip', []],
];

/** Names of the checks that failed. */
export function check() {
  const failed = [];
  for (const [name, command, args] of checks) {
    const at = Date.now();
    const { status } = spawnSync(join(root, 'node_modules', '.bin', command), args, {
      cwd: root,
      stdio: 'inherit',
      shell: process.platform === 'win32',
    });
    const seconds = ((Date.now() - at) / 1000).toFixed(1);
    console.log(`${status === 0 ? 'ok    ' : 'FAILED'} ${name} (${seconds} s)`);
    if (status !== 0) failed.push(name);
  }
  return failed;
}

if (isProgram(import.meta.url)) process.exitCode = check().length > 0 ? 1 : 0;
