// npm run bench: a year of the benchmark family at the default step, by size, kind and plant.
//
// Prints one JSON document on standard output. With the family's own weather table beside the checkout
// the results are those of its page; without it an invented year takes its place, and the document says
// so: times compare, results do not. Arguments: the numbers of rooms, of 1 4 16 64 256
// (all but the last without any).

import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { march } from '../../engine/network/index.ts';
import { buildFamily, type Kind } from './family.ts';
import { type Drivers, readDrivers } from './family-drivers.ts';

const table = join(process.cwd(), '../shared/weather/tmy3-725650.csv');
const method = { toleranceK: 1e-6, maxIterations: 40 };

/** A year of sinusoids with the level and swing of a continental place. */
function inventedDrivers(): Drivers {
  const hourly = (of: (yearTurn: number, dayTurn: number, sun: number) => number) =>
    Float64Array.from({ length: 8760 }, (_, k) => {
      const hour = (k % 24) + 0.5;
      const yearTurn = -Math.cos((2 * Math.PI * (k - 480)) / 8760);
      const sun = Math.max(0, Math.sin((Math.PI * (hour - 6)) / 12)) * (0.7 + 0.3 * yearTurn);
      return of(yearTurn, -Math.cos((2 * Math.PI * (hour - 3)) / 24), sun);
    });
  const outdoorC = hourly((year, day) => 10 + 12 * year + 5 * day);
  return {
    outdoorC,
    skyC: outdoorC.map((tempC) => 0.0552 * (tempC + 273.15) ** 1.5 - 273.15),
    groundC: hourly((year) => 10 + 4 * year),
    windMPerS: hourly((_, day) => 4 + day),
    south: hourly((_year, _day, sun) => 450 * sun),
    north: hourly((_year, _day, sun) => 150 * sun),
    west: hourly((_year, day, sun) => (300 + 100 * day) * sun),
    east: hourly((_year, day, sun) => (300 - 100 * day) * sun),
    roof: hourly((_year, _day, sun) => 650 * sun),
  };
}

function measure(rooms: number, kind: Kind, hasPlant: boolean, drivers: Drivers) {
  const { problem, sums } = buildFamily(rooms, kind, hasPlant, drivers);
  const times: number[] = [];
  let run = null;
  let spentMs = 0;
  // The best of up to three, as the first also warms the compiler up; a long one is not repeated.
  for (let i = 0; i < 3 && spentMs < 4000; i++) {
    const started = performance.now();
    run = march(problem, method);
    times.push(performance.now() - started);
    spentMs += performance.now() - started;
  }
  if (run === null) throw new Error('nothing was run');
  const { quality, outcome, meterW, records } = run;
  const meters = problem.meters.length;
  const kWh = (at: number) => {
    let sum = 0;
    for (let r = 0; r < records; r++) sum += meterW[r * meters + at] / 1000;
    return sum;
  };
  const msPerYear = Math.min(...times);
  console.error(
    `${String(rooms).padStart(4)} rooms ${kind} ${hasPlant ? 'plant' : 'free '}: ${msPerYear.toFixed(0).padStart(6)} ms a year`,
  );
  return {
    rooms,
    kind,
    plant: hasPlant,
    nodes: sums.nodes,
    msPerYear,
    usPerNodeStep: (1000 * msPerYear) / (quality.steps * sums.nodes),
    iterationsPerStep: quality.iterations / quality.steps,
    outcome: outcome.kind,
    unconvergedSteps: quality.unconvergedSteps,
    relativeBalanceResidual: quality.relativeBalanceResidual,
    ...(hasPlant ? { heatingKWh: kWh(0), coolingKWh: kWh(1) } : {}),
  };
}

const hasTable = existsSync(table);
const drivers = hasTable ? readDrivers(readFileSync(table, 'utf8')) : inventedDrivers();
const asked = process.argv.slice(2).map(Number);
const sizes = asked.length > 0 ? asked : [1, 4, 16, 64];
const cases = sizes.flatMap((rooms) =>
  (['L', 'V'] as const).flatMap((kind) =>
    [false, true].map((hasPlant) => measure(rooms, kind, hasPlant, drivers)),
  ),
);
console.log(
  JSON.stringify({
    drivers: hasTable ? "the family's own table" : 'invented',
    stepMinutes: 15,
    cases,
  }),
);
