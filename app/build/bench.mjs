// npm run bench: the solver's benchmark, part after part in processes of their own (test/bench/march.bench.ts).
//
//   --quick            1, 4, 16 rooms and the demo house; a tenth of the baseline's year
//   --against FILE     compares with an earlier bench.json
//
// Writes bench-out/bench.json and prints its path last. Run it on a machine that does nothing else.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { arch, cpus, loadavg, platform } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { compileKernel } from './kernel.mjs';
import { root } from './paths.mjs';
import { setUp } from './set-up.mjs';

const { values: options } = parseArgs({
  options: { quick: { type: 'boolean', default: false }, against: { type: 'string' } },
});
const earlier = options.against ? JSON.parse(readFileSync(options.against, 'utf8')) : null;
if (!(await setUp())) process.exit(1);

const out = join(root, 'bench-out');
const programs = join(out, 'programs');
mkdirSync(programs, { recursive: true });
const { bundleForNode } = await import('./build.mjs');
await bundleForNode({ march: join(root, 'test', 'bench', 'march.bench.ts') }, programs);
const kernel = join(programs, 'kernel.wasm');
writeFileSync(kernel, await compileKernel());

function part(...args) {
  const { status, stdout } = spawnSync(
    process.execPath,
    [join(programs, 'march.js'), ...args.map(String), ...(options.quick ? ['--quick'] : [])],
    { cwd: root, stdio: ['ignore', 'pipe', 'inherit'], encoding: 'utf8', maxBuffer: 64e6 },
  );
  if (status !== 0) {
    console.error(`The part "${args[0]}" failed (status ${status}).`);
    process.exit(1);
  }
  return JSON.parse(stdout);
}

const yearSteps = 35_040;
const baselineSteps = options.quick ? yearSteps / 10 : yearSteps;
const cold = part('cold', kernel);
const family = part('family', kernel, ...(options.quick ? [1, 4, 16] : [1, 4, 16, 64, 256]));
const demo = part('building', kernel, 5);
const blocks = options.quick ? [] : [12, 60].map((rooms) => part('building', kernel, rooms));
const baseline = part('baseline', baselineSteps).result;

/** Slope of log(seconds) over log(rooms), V, from 4 rooms on. */
function exponentOf(cases) {
  const points = cases
    .filter(({ variant, rooms }) => variant === 'V' && rooms >= 4)
    .map(({ rooms, seconds }) => [Math.log(rooms), Math.log(seconds)]);
  const mean = (at) => points.reduce((sum, p) => sum + p[at], 0) / points.length;
  const [x, y] = [mean(0), mean(1)];
  const above = points.reduce((sum, p) => sum + (p[0] - x) * (p[1] - y), 0);
  return above / points.reduce((sum, p) => sum + (p[0] - x) ** 2, 0);
}

const document = {
  family: family.result,
  baseline: {
    denseImplicitEulerSeconds: baseline.seconds * (yearSteps / baselineSteps),
    stepsRun: baselineSteps,
    secondsRun: baseline.seconds,
  },
  exponent: exponentOf(family.result),
  coldSeconds: cold.result.coldSeconds,
  demoSeconds: demo.result.seconds,
  buildings: [demo, ...blocks].map(({ result, memoryPeakMB }) => ({ ...result, memoryPeakMB })),
  memoryPeakMB: family.memoryPeakMB,
  drivers: family.drivers,
  machine: {
    cpu: cpus()[0]?.model,
    cores: cpus().length,
    loadAverage: loadavg()[0],
    platform: platform(),
    arch: arch(),
    node: process.version,
  },
};

const file = join(out, 'bench.json');
writeFileSync(`${file}.tmp`, `${JSON.stringify(document, null, 2)}\n`);
renameSync(`${file}.tmp`, file);

const print = (...cells) => console.log(cells.map((cell) => String(cell).padStart(12)).join(''));
print('rooms', 'year, s', 'cpu, s', 'script, s', 'ns/node-step', 'RMS, K', 'max, K', 'earlier, s');
const before = (rooms, variant) =>
  earlier?.family.find((one) => one.rooms === rooms && one.variant === variant)?.seconds;
for (const one of document.family) {
  const { rooms, variant, seconds, cpuSeconds, scriptSeconds, nsPerNodeStep, rmsK, maxK } = one;
  const was = before(rooms, variant);
  print(
    `${rooms} ${variant}`,
    seconds.toFixed(3),
    cpuSeconds.toFixed(3),
    scriptSeconds?.toFixed(3) ?? '–',
    nsPerNodeStep.toFixed(1),
    rmsK.toFixed(5),
    maxK.toFixed(4),
    was ? `${was.toFixed(3)} ×${(was / seconds).toFixed(2)}` : '',
  );
}
for (const { rooms, seconds, cpuSeconds, wholeSeconds, memoryPeakMB } of document.buildings) {
  const was = earlier?.buildings?.find((one) => one.rooms === rooms)?.seconds;
  console.log(
    `building of ${rooms}: march ${seconds.toFixed(3)} s (processor ${cpuSeconds.toFixed(3)} s), project to findings ${wholeSeconds?.toFixed(3) ?? '–'} s, ${memoryPeakMB.toFixed(0)} MB${was ? `, earlier ${was.toFixed(3)} s ×${(was / seconds).toFixed(2)}` : ''}`,
  );
}
const one = document.family.find(({ rooms, variant }) => rooms === 1 && variant === 'V');
const { denseImplicitEulerSeconds } = document.baseline;
console.log(
  `dense implicit Euler ${denseImplicitEulerSeconds.toFixed(1)} s a year (${baselineSteps} of ${yearSteps} steps run): ${(denseImplicitEulerSeconds / one.seconds).toFixed(0)} times as long; exponent ${document.exponent.toFixed(3)}; cold ${document.coldSeconds.toFixed(3)} s`,
);
console.log(file);
