// The WebAssembly kernel against the JavaScript march: two programs for one method, so every number that
// comes out must agree to rounding (roots and sums in another order), and both must obey the same laws.
// The other tests of this folder hold the JavaScript to values from outside.

import { existsSync, readFileSync } from 'node:fs';
import { beforeAll, describe, expect, test } from 'vitest';
import { compileKernel } from '../../../app/build/kernel.mjs';
import {
  type ConductanceTable,
  type LinkGroup,
  type Meter,
  march,
  marchSteps,
  type Problem,
} from '../../../engine/network/index.ts';
import { arraysOf } from '../../../engine/network/kernel/fields.ts';
import { createRecorder } from '../../../engine/network/recorder.ts';
import { createStepper } from '../../../engine/network/stepper.ts';
import { buildFamily } from '../../bench/family.ts';
import { readDrivers } from '../../bench/family-drivers.ts';
import {
  constantLinks,
  directedLinks,
  held,
  network,
  problem,
  sourceRows,
  straight,
  usual,
} from './problems.ts';

let kernel: Uint8Array = new Uint8Array(0);
beforeAll(async () => {
  kernel = await compileKernel();
}, 60_000);

/** Largest difference of two arrays of the same length. */
function apart(a: Float64Array, b: Float64Array): number {
  expect(a.length).toBe(b.length);
  return a.reduce((worst, v, i) => Math.max(worst, Math.abs(v - b[i])), 0);
}

function expectSame(of: Problem, limitK: number, limitW: number) {
  const script = march(of, usual);
  const wasm = march(of, { ...usual, kernel });
  expect(wasm.outcome).toEqual(script.outcome);
  expect(wasm.records).toBe(script.records);
  expect(apart(wasm.meanC, script.meanC)).toBeLessThan(limitK);
  expect(apart(wasm.endC, script.endC)).toBeLessThan(limitK);
  expect(apart(wasm.finalC, script.finalC)).toBeLessThan(limitK);
  expect(apart(wasm.meterW, script.meterW)).toBeLessThan(limitW);
  expect(wasm.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  expect(wasm.quality.unconvergedSteps).toBe(script.quality.unconvergedSteps);
  expect(wasm.quality.warmUpPasses).toBe(script.quality.warmUpPasses);
  return script;
}

/** G = 3·(6 + 0.02·mean + 0.005·difference), on a grid that holds the plane exactly. */
const plane: ConductanceTable = {
  factor: 3,
  rows: 9,
  columns: 41,
  firstMeanC: -40,
  rowStepK: 20,
  firstDifferenceK: -100,
  columnStepK: 5,
  values: Float64Array.from({ length: 9 * 41 }, (_, i) => {
    const meanC = -40 + 20 * Math.floor(i / 41);
    return 6 + 0.02 * meanC + 0.005 * (-100 + 5 * (i % 41));
  }),
};
const planeW = (_: number, a: number, b: number) =>
  3 * (6 + (0.02 * (a + b)) / 2 + 0.005 * (b - a));

/** Every law, two enclosures, a wall with a massless layer, plants of all kinds, all kinds of drivers. */
function everything(start: Problem['start']): Problem {
  const steps = 96 * 4;
  const daily = (mean: number, swing: number, shift: number) => (k: number) =>
    mean + swing * Math.sin((2 * Math.PI * (k - shift)) / 96);
  const list = (of: (k: number) => number) =>
    held(
      '',
      Array.from({ length: steps }, (_, k) => of(k)),
    );
  const outside = straight('outside', 900, steps, (s) => daily(4, 8, 32)(s / 900));
  const ramp = {
    name: 'ramp',
    hold: 'ramp' as const,
    values: Float64Array.from({ length: 2 * steps }, (_, i) =>
      Math.floor(i / 2) % 96 < 24 ? 16 : 20 + (i % 2),
    ),
  };
  const series = [
    outside,
    list(daily(-6, 4, 30)),
    list((k) => Math.max(0, daily(-100, 500, 24)(k))),
    list((k) => 2 + (k % 7)),
    ramp,
    list(() => 900),
    list((k) => (k % 96 > 40 ? 23 : 26)),
    list(() => 400),
  ];
  // 0 air, 1 face, 2-4 inside a wall (3 without mass), 5 outer face, 6 pane, 7 second air, 8 its face,
  // 9 furniture, 10 outdoor air, 11 sky
  const groups: LinkGroup[] = [
    constantLinks([
      [1, 2, 30],
      [2, 3, 15],
      [3, 4, 18],
      [4, 5, 40],
      [1, 8, 0.02],
      [6, 10, 12],
      [9, 0, 25],
    ]),
    {
      law: 'scaled',
      from: Int32Array.of(10),
      to: Int32Array.of(0),
      conductanceWPerK: Float64Array.of(3),
      series: Int32Array.of(3),
    },
    {
      law: 'buoyant',
      from: Int32Array.of(1, 6, 8),
      to: Int32Array.of(0, 0, 7),
      warmerFrom: Float64Array.of(20, 8, 15),
      coolerFrom: Float64Array.of(12, 8, 25),
      exponent: 1 / 3,
      softeningK2: 1e-6,
      baseSeries: Int32Array.of(-1, 3, -1),
      baseWPerK: Float64Array.of(1, 0.5, 0),
    },
    {
      law: 'buoyant',
      from: Int32Array.of(7),
      to: Int32Array.of(10),
      warmerFrom: Float64Array.of(1),
      coolerFrom: Float64Array.of(2),
      exponent: 0.31,
      softeningK2: 0,
      baseSeries: Int32Array.of(-1),
      baseWPerK: Float64Array.of(4),
    },
    {
      law: 'mixed-film',
      from: Int32Array.of(5),
      to: Int32Array.of(10),
      areaM2: Float64Array.of(12),
      warmerFrom: Float64Array.of(1.5),
      coolerFrom: Float64Array.of(1.2),
      exponent: 1 / 3,
      forcedSeries: Int32Array.of(3),
      roughness: Float64Array.of(1.6),
    },
    {
      law: 'radiant',
      from: Int32Array.of(5, 6),
      to: Int32Array.of(11, 11),
      exchangeAreaM2: Float64Array.of(6, 2),
    },
    {
      law: 'function',
      from: Int32Array.of(6, 0),
      to: Int32Array.of(1, 7),
      conductanceWPerK: planeW,
      tables: [plane, null],
    },
  ];
  const unit = {
    sensorNodes: Int32Array.of(0),
    sensorWeights: Float64Array.of(1),
    deliveryNodes: Int32Array.of(0, 1),
    deliveryShares: Float64Array.of(0.6, 0.4),
    bandK: 0,
  };
  const net = network(
    [2e5, 3e5, 2e6, 0, 2e6, 3e5, 2e4, 3e5, 1e6, 1e5, 0, 0],
    { 10: 0, 11: 1 },
    {
      links: groups,
      enclosures: [
        {
          name: 'room',
          nodes: Int32Array.of(1, 6, 8),
          exchangeAreaM2: Float64Array.of(0, 3, 5, 3, 0, 2, 5, 2, 0),
        },
        { name: 'yard', nodes: Int32Array.of(5, 10), exchangeAreaM2: Float64Array.of(0, 4, 4, 0) },
      ],
      directed: directedLinks([
        [0, 7, 10],
        [7, 0, 10],
        [10, 0, 4, 3],
        [0, 10, 4, 3],
      ]),
      sources: sourceRows([
        [1, 0.5, 2],
        [5, 2, 2],
        [0, 60, 3],
      ]),
      plants: [
        { ...unit, name: 'radiator', kind: 'heater', setPointSeries: 4, maxSeries: 5 },
        {
          ...unit,
          deliveryNodes: Int32Array.of(7),
          sensorNodes: Int32Array.of(7, 8),
          sensorWeights: Float64Array.of(0.5, 0.5),
          deliveryShares: Float64Array.of(1),
          name: 'band',
          kind: 'heater',
          setPointSeries: 4,
          maxSeries: 7,
          bandK: 2,
        },
        {
          ...unit,
          deliveryNodes: Int32Array.of(0),
          deliveryShares: Float64Array.of(1),
          name: 'chiller',
          kind: 'chiller',
          setPointSeries: 6,
          maxSeries: 7,
        },
      ],
    },
  );
  const link = (group: number, index: number) => ({
    sign: 1,
    of: { kind: 'link' as const, group, index },
  });
  const meters: Meter[] = [
    {
      name: 'plants',
      terms: [0, 1, 2].map((index) => ({
        sign: index === 2 ? -1 : 1,
        of: { kind: 'plant' as const, index },
      })),
    },
    {
      name: 'laws',
      terms: [link(2, 0), link(2, 2), link(3, 0), link(4, 0), link(5, 1), link(6, 0), link(6, 1)],
    },
    { name: 'wall', terms: [link(0, 1), link(0, 4), link(1, 0)] },
    {
      name: 'faces',
      terms: [
        { sign: -1, of: { kind: 'enclosure', enclosure: 0, position: 2 } },
        { sign: 1, of: { kind: 'directed', index: 2 } },
      ],
    },
    {
      name: 'stores',
      terms: [0, 2, 8].map((node) => ({ sign: 1, of: { kind: 'storage' as const, node } })),
    },
    {
      name: 'sun',
      terms: [0, 2].map((index) => ({ sign: 1, of: { kind: 'source' as const, index } })),
    },
  ];
  return problem(net, series, 900, steps, new Float64Array(12).fill(15), {
    start,
    meters,
    stepsPerRecord: 4,
  });
}

describe('the kernel', () => {
  test('gives what the JavaScript march gives, law by law, plant by plant, meter by meter', () => {
    const fixed = { kind: 'temperatures', tempC: new Float64Array(12).fill(15) } as const;
    const run = expectSame(everything(fixed), 1e-9, 1e-6);
    expect(run.outcome.kind).toBe('finished');
    for (let m = 0; m < 6; m++) {
      const values = run.meterW.filter((_, i) => i % 6 === m);
      expect(Math.max(...values.map(Math.abs))).toBeGreaterThan(0.1); // no meter stands still
    }
  });

  test('starts up as the JavaScript march does', () => {
    const periodic = { kind: 'periodic', spanSteps: 96, toleranceK: 0.01, maxPasses: 30 } as const;
    const run = expectSame(everything(periodic), 1e-9, 1e-6);
    expect(run.quality.warmUpPasses).toBeGreaterThan(1);
  });

  const table = new URL('../../../../shared/weather/tmy3-725650.csv', import.meta.url);
  test.skipIf(!existsSync(table))(
    'gives the same first two weeks of four rooms with plant (needs ../shared/weather/tmy3-725650.csv)',
    () => {
      const drivers = readDrivers(readFileSync(table, 'utf8'));
      expectSame(buildFamily(4, 'V', true, drivers, 900, 336).problem, 1e-9, 1e-6);
    },
  );

  test('names step and node where a driver is no number', () => {
    const whole = everything({ kind: 'temperatures', tempC: new Float64Array(12).fill(15) });
    const broken: Problem = {
      ...whole,
      network: {
        ...whole.network,
        links: whole.network.links.map((group) =>
          group.law === 'function'
            ? {
                ...group,
                tables: [],
                conductanceWPerK: (_k, _a, _b, step) => (step < 250 ? 1 : NaN),
              }
            : group,
        ),
      },
    };
    const [script, wasm] = [march(broken, usual), march(broken, { ...usual, kernel })];
    expect(wasm.outcome).toEqual(script.outcome);
    expect(wasm.outcome).toMatchObject({ kind: 'diverged', atStep: 250 });
  });

  test('stops where it is told to and keeps what it has', () => {
    const whole = everything({ kind: 'temperatures', tempC: new Float64Array(12).fill(15) });
    const steps = marchSteps(whole, { ...usual, kernel });
    let turn = steps.next();
    while (!turn.done) turn = steps.next(turn.value.step < 200);
    expect(turn.value.outcome).toEqual({ kind: 'stopped', atStep: 200 });
    expect(turn.value.records).toBe(50);
  });

  test('reads the arrays in the order in which they are handed over', () => {
    const source = readFileSync(
      new URL('../../../engine/network/kernel/fields.as', import.meta.url),
      'utf8',
    );
    const read = [...source.matchAll(/^ {2}(\w+) = <usize>i32at\(places, (\d+)\);$/gm)];
    const whole = everything({ kind: 'temperatures', tempC: new Float64Array(12).fill(15) });
    const stepper = createStepper(whole, usual);
    const given = Object.keys(arraysOf(stepper, createRecorder(whole, stepper.stage)));
    expect(read.map(([, name]) => name)).toEqual(given);
    expect(read.map(([, , place]) => Number(place))).toEqual(given.map((_, i) => i));
  });

  test('a table gives what the law it was made from gives', () => {
    const whole = everything({ kind: 'temperatures', tempC: new Float64Array(12).fill(15) });
    const called: Problem = {
      ...whole,
      network: {
        ...whole.network,
        links: whole.network.links.map((group) =>
          group.law === 'function' ? { ...group, tables: [] } : group,
        ),
      },
    };
    // The table holds a plane, which straight lines in between hold exactly.
    expect(apart(march(whole, usual).endC, march(called, usual).endC)).toBeLessThan(1e-6);
  });
});
