// npm run bench: one part of the benchmark, as a process of its own; app/build/bench.mjs puts them together.
//
//   cold KERNEL          first year of one room in a fresh process
//   family KERNEL N…     the family of the page of definitions, with plant, L and V
//   baseline STEPS       dense implicit Euler with ml-matrix, one room V, so many steps
//   building KERNEL N    the demo house (5), or a block of 12 or 60 rooms, with all default physics
//
// Prints one JSON document on standard output and its progress on standard error. Times are the best of
// up to five runs, wall clock and processor. Errors are taken on the air of all rooms at the hours' ends
// against the same network at steps of 1 min, over the year up to 4 rooms and over 720 h beyond. With
// --quick last: errors over less, and JavaScript only where it is short.

import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ostermereYear } from '../../demo/ostermere-weather.ts';
import { assemble } from '../../engine/assembly/index.ts';
import { parseProject, simulate } from '../../engine/index.ts';
import { type Method, march, type Problem, type Run } from '../../engine/network/index.ts';
import { faultText } from '../../weather/index.ts';
import { blockProject } from './building.ts';
import { denseEuler } from './dense-euler.ts';
import { buildFamily, type Kind } from './family.ts';
import { readDrivers } from './family-drivers.ts';
import { sumsOf } from './family-sums.ts';
import { inventedDrivers } from './invented-drivers.ts';

const table = join(process.cwd(), '../shared/weather/tmy3-725650.csv');
const hasTable = existsSync(table);
const script: Method = { toleranceK: 1e-6, maxIterations: 50 };
const note = (text: string) => console.error(text);

interface Timed {
  readonly seconds: number;
  readonly cpuSeconds: number;
  readonly run: Run;
}

/** Best of up to `most` runs; a run of more than a few seconds is not repeated. */
function timed(problem: Problem, method: Method, most = 5): Timed {
  let seconds = Infinity;
  let cpuSeconds = Infinity;
  let spent = 0;
  let run: Run | null = null;
  for (let i = 0; i < most && spent < 4; i++) {
    const cpu = process.cpuUsage();
    const begin = performance.now();
    run = march(problem, method);
    const wall = (performance.now() - begin) / 1000;
    const used = process.cpuUsage(cpu);
    seconds = Math.min(seconds, wall);
    cpuSeconds = Math.min(cpuSeconds, (used.user + used.system) / 1e6);
    spent += wall;
  }
  if (run === null) throw new Error('nothing was run');
  if (run.outcome.kind !== 'finished') throw new Error(`the march ended as ${run.outcome.kind}`);
  return { seconds, cpuSeconds, run };
}

const kernelMethod = (file: string): Method => ({
  ...script,
  kernel: new Uint8Array(readFileSync(file)),
});

const familyDrivers = () =>
  hasTable ? readDrivers(readFileSync(table, 'utf8')) : inventedDrivers();

/** Errors of hourly air temperatures against steps of 1 min, and of the annual energies where they run a year. */
function errors(rooms: number, kind: Kind, method: Method, isQuick: boolean) {
  const drivers = familyDrivers();
  const whole = rooms <= 4 ? 8760 : 720;
  const hours = isQuick ? Math.min(whole, Math.round(8760 / rooms ** 2 / 24) * 24 || 24) : whole;
  const coarse = march(buildFamily(rooms, kind, true, drivers, 900, hours).problem, method);
  const fine = march(buildFamily(rooms, kind, true, drivers, 60, hours).problem, method);
  let square = 0;
  let maxK = 0;
  for (let i = 0; i < fine.endC.length; i++) {
    const d = Math.abs(coarse.endC[i] - fine.endC[i]);
    square += d * d;
    maxK = Math.max(maxK, d);
  }
  const energy = (run: Run, at: number) => {
    let sum = 0;
    for (let r = 0; r < run.records; r++) sum += run.meterW[2 * r + at] / 1000;
    return sum;
  };
  const off = (at: number) => Math.abs(energy(coarse, at) / energy(fine, at) - 1);
  return {
    rmsK: Math.sqrt(square / fine.endC.length),
    maxK,
    heatingError: off(0),
    coolingError: energy(fine, 1) > 0 ? off(1) : 0,
    errorHours: hours,
  };
}

function familyCase(rooms: number, kind: Kind, method: Method, isQuick: boolean) {
  const { problem, sums } = buildFamily(rooms, kind, true, familyDrivers());
  if (hasTable) {
    for (const [name, found, expected] of sumsOf(rooms, sums)) {
      // The page prints four to six decimals.
      if (Math.abs(found - expected) > 1e-6 + 1e-9 * expected) {
        throw new Error(`${rooms} rooms: ${name} is ${found}, the page says ${expected}`);
      }
    }
  }
  const { seconds, cpuSeconds, run } = timed(problem, method);
  const plain = isQuick && rooms > 4 ? null : timed(problem, script, rooms <= 4 ? 3 : 1);
  const kWh = (at: number) => {
    let sum = 0;
    for (let r = 0; r < run.records; r++) sum += run.meterW[2 * r + at] / 1000;
    return sum;
  };
  const { quality } = run;
  note(
    `${String(rooms).padStart(4)} rooms ${kind}: ${seconds.toFixed(3)} s (JavaScript ${plain ? plain.seconds.toFixed(3) : '–'} s)`,
  );
  return {
    rooms,
    variant: kind,
    seconds,
    nsPerNodeStep: (1e9 * seconds) / (quality.steps * sums.nodes),
    ...errors(rooms, kind, method, isQuick),
    heatingKWh: kWh(0),
    coolingKWh: kWh(1),
    cpuSeconds,
    scriptSeconds: plain?.seconds ?? null,
    scriptCpuSeconds: plain?.cpuSeconds ?? null,
    roundsPerStage: quality.iterations / quality.steps / 2,
    relativeBalanceResidual: quality.relativeBalanceResidual,
    unconvergedSteps: quality.unconvergedSteps,
  };
}

function buildingCase(rooms: number, method: Method, isQuick: boolean) {
  const houseText = readFileSync(join(process.cwd(), 'demo/quillon-house.inglenook.json'), 'utf8');
  const text =
    rooms === 5
      ? houseText
      : blockProject(houseText, rooms / (rooms > 12 ? 10 : 4), rooms > 12 ? 5 : 2);
  const parsed = parseProject(text, 'bench.inglenook.json');
  if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
  if (parsed.value.rooms.length !== rooms) throw new Error('another number of rooms was built');
  const weather = ostermereYear();
  const begin = performance.now();
  const { problem } = assemble(parsed.value, weather, { stepMinutes: 15, refine: 1 });
  const assembleSeconds = (performance.now() - begin) / 1000;
  const { seconds, cpuSeconds, run } = timed(problem, method, rooms > 12 ? 1 : 5);
  const plain = isQuick || rooms > 12 ? null : timed(problem, script, 1);
  const wholeBegin = performance.now();
  const whole = isQuick ? null : simulate(parsed.value, weather);
  while (whole && !whole.next().done);
  const wholeSeconds = (performance.now() - wholeBegin) / 1000;
  const { quality } = run;
  note(`${rooms} rooms, all default physics: ${seconds.toFixed(3)} s the year's march`);
  return {
    rooms,
    nodes: problem.network.nodeNames.length,
    seconds,
    cpuSeconds,
    scriptSeconds: plain?.seconds ?? null,
    assembleSeconds,
    /** Parsed project to findings, as the application runs it. */
    wholeSeconds: whole ? wholeSeconds : null,
    nsPerNodeStep:
      (1e9 * seconds) / ((quality.steps + quality.warmUpSteps) * problem.network.nodeNames.length),
    roundsPerStage: quality.iterations / quality.steps / 2,
    relativeBalanceResidual: quality.relativeBalanceResidual,
    unconvergedSteps: quality.unconvergedSteps,
  };
}

function part(args: readonly string[]) {
  const isQuick = args.at(-1) === '--quick';
  const [name, first, ...rest] = args.filter((arg) => arg !== '--quick');
  switch (name) {
    case 'cold': {
      const { problem } = buildFamily(1, 'V', true, familyDrivers());
      const begin = performance.now();
      march(problem, kernelMethod(first));
      return { coldSeconds: (performance.now() - begin) / 1000 };
    }
    case 'family': {
      const method = kernelMethod(first);
      return rest
        .map(Number)
        .flatMap((n) => (['L', 'V'] as const).map((k) => familyCase(n, k, method, isQuick)));
    }
    case 'baseline': {
      const steps = Number(first);
      const { problem } = buildFamily(1, 'V', true, familyDrivers());
      const begin = performance.now();
      const run = denseEuler(problem, steps);
      const seconds = (performance.now() - begin) / 1000;
      note(`dense implicit Euler, ${steps} steps: ${seconds.toFixed(1)} s`);
      return { ...run, seconds };
    }
    case 'building':
      return buildingCase(Number(rest[0]), kernelMethod(first), isQuick);
    default:
      throw new Error(`there is no part "${name}"`);
  }
}

const result = part(process.argv.slice(2));
console.log(
  JSON.stringify({
    result,
    memoryPeakMB: process.resourceUsage().maxRSS / 1024,
    drivers: hasTable ? "the family's own table" : 'invented: times compare, results do not',
  }),
);
