// npm run bench: builds each program in test/bench/ and runs it. Arguments go to the programs; the first
// may name one of them (npm run bench -- family). A program prints its progress on standard error and
// one JSON document on standard output; all of them land in bench-out/bench.json.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readdirSync, renameSync, writeFileSync } from 'node:fs';
import { arch, cpus, platform } from 'node:os';
import { basename, join } from 'node:path';
import { root } from './paths.mjs';
import { setUp } from './set-up.mjs';

if (!(await setUp())) process.exit(1);

const folder = join(root, 'test', 'bench');
let names = [];
try {
  names = readdirSync(folder)
    .filter((name) => name.endsWith('.bench.ts'))
    .map((name) => basename(name, '.bench.ts'));
} catch {
  // no folder, no benchmarks: said below
}
const args = process.argv.slice(2);
const chosen = names.includes(args[0]) ? [args.shift()] : names;
if (chosen.length === 0) {
  console.error('There is no benchmark: test/bench/ holds no NAME.bench.ts.');
  process.exit(1);
}

const out = join(root, 'bench-out');
const { bundleForNode } = await import('./build.mjs');
mkdirSync(out, { recursive: true });
await bundleForNode(
  Object.fromEntries(chosen.map((name) => [name, join(folder, `${name}.bench.ts`)])),
  join(out, 'programs'),
);

const results = {};
for (const name of chosen) {
  console.error(`bench ${name}`);
  const { status, stdout } = spawnSync(
    process.execPath,
    [join(out, 'programs', `${name}.js`), ...args],
    {
      cwd: root,
      stdio: ['ignore', 'pipe', 'inherit'],
      encoding: 'utf8',
      maxBuffer: 64 * 1024 * 1024,
    },
  );
  try {
    results[name] = JSON.parse(stdout);
  } catch {
    results[name] = { failed: `printed no JSON document (status ${status})` };
  }
  if (status !== 0) process.exitCode = 1;
  if (status !== 0 || results[name].failed) console.error(`bench ${name} failed, status ${status}`);
}

const file = join(out, 'bench.json');
const machine = { cpu: cpus()[0]?.model, cores: cpus().length, platform: platform(), arch: arch() };
const document = { machine: { ...machine, node: process.version }, results };
writeFileSync(`${file}.tmp`, `${JSON.stringify(document, null, 2)}\n`);
renameSync(`${file}.tmp`, file);
console.log(file);
