// npm test: set up, check, build, run every test. Arguments go to vitest (npm test -- test/weather).
//
// A failing check does not hide the tests' results, and the other way round. Without a browser the
// tests of the built window cannot run: all else does, and the end says so and is not a pass.
import { spawnSync } from 'node:child_process';
import { readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { browserForTests } from './browser.mjs';
import { root } from './paths.mjs';
import { setUp } from './set-up.mjs';

const failed = [];
if (!(await setUp())) process.exit(1);
const browser = browserForTests();

const { check } = await import('./check.mjs');
failed.push(...check());
if (!(await setUp('build'))) failed.push('build');

const report = '.vitest.json';
rmSync(join(root, report), { force: true });
const vitest = spawnSync(
  process.execPath,
  [
    join(root, 'node_modules', 'vitest', 'vitest.mjs'),
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
    ...(browser ? [] : ['--project=unit', '--project=ui', '--project=checks']),
    ...process.argv.slice(2),
  ],
  {
    cwd: root,
    stdio: 'inherit',
    // A build in this process leaves NODE_ENV at production, with which React's test tools do not work.
    env: { ...process.env, NODE_ENV: 'test', INGLENOOK_BROWSER: browser ?? '' },
  },
);
if (vitest.status !== 0) failed.push('tests');

if (!browser) {
  failed.push('browser tests (not run: no browser)');
  const files = readdirSync(join(root, 'test'), { recursive: true });
  for (const file of files.filter((name) => name.endsWith('.e2e.test.ts'))) {
    console.log(`not run, no browser: ${join('test', file)}`);
  }
}
if (failed.length > 0) console.log(`\nFailed: ${failed.join(', ')}.`);
process.exitCode = failed.length > 0 ? 1 : 0;
