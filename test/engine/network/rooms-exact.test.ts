// Rooms with layered walls against solutions of the continuous walls (Laplace inversion and complex
// transmission matrices, no discretisation): test/reference/11-room-exact.json. Each layer gets ten
// slices; all walls are chains on one room node.

import { describe, expect, test } from 'vitest';
import {
  march,
  type Problem,
  type Run,
  type Series,
  steadyState,
} from '../../../engine/network/index.ts';
import {
  constant,
  constantLinks,
  held,
  network,
  problem,
  sourceRows,
  straight,
  usual,
} from './problems.ts';
import { besides, cases, meetsCase } from './reference.ts';
import { addWall, type Draft, type Layer } from './walls.ts';

interface Inputs {
  readonly C_air: number;
  readonly H_direct: number;
  readonly elements: {
    readonly kind: 'outside' | 'adiabatic';
    readonly area: number;
    readonly layers: Layer[];
    readonly Rsi: number;
    readonly Rse?: number;
  }[];
  readonly times_h: number[];
  readonly T0: number;
  readonly T_out: number;
  readonly outside_amplitude: number;
  readonly gain_amplitude: number;
  readonly period_h: number;
  readonly setpoint: number;
  readonly target: number;
  readonly T_outside_mean: number;
  readonly gain_W: number;
  readonly on: number;
  readonly off: number;
}

const file = '11-room-exact.json';
const slices = 10;

/** Node 0 is outside (series 0), node 1 the room, gains are series 1 into the room. */
function room(i: Inputs) {
  const draft: Draft = { capacities: [0, i.C_air], links: [[0, 1, i.H_direct]] };
  for (const e of i.elements) {
    const nodes = addWall(draft, e.layers, e.area, slices);
    draft.links.push([1, nodes[0], e.area / e.Rsi]);
    if (e.kind === 'outside')
      draft.links.push([nodes[nodes.length - 1], 0, e.area / (e.Rse ?? 0.04)]);
  }
  return network(
    draft.capacities,
    { 0: 0 },
    {
      links: [constantLinks(draft.links)],
      sources: sourceRows([[1, 1, 1]]),
    },
  );
}

function marchRoom(i: Inputs, series: Series[], stepS: number, more: Partial<Problem>): Run {
  const steps = series[0].values.length - (series[0].hold === 'linear' ? 1 : 0);
  const net = room(i);
  const start = net.nodeNames.map(() => 0);
  const run = march(
    problem(net, series, stepS, steps, start, { recordNodes: Int32Array.of(1), ...more }),
    usual,
  );
  expect(run.outcome.kind).toBe('finished');
  expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  return run;
}

const of = <E>(start: string) => cases<Inputs, E>(file, (id) => id.startsWith(start));
const within = (got: number, want: number, share: number) =>
  expect(Math.abs(got / want - 1)).toBeLessThan(share);

describe.each(of<{ T_per_kW: number[]; T_per_K_out: number[]; H_total: number }>('room-step'))(
  '$id',
  ({ id, inputs: i, expected }) => {
    const stepS = 60;
    const steps = (Math.max(...i.times_h) * 3600) / stepS;
    const at = (run: Run) => i.times_h.map((h) => run.endC[(h * 3600) / stepS - 1]);

    test('1 kW raises the room as in the continuous solution, within 2 %', () => {
      const run = marchRoom(
        i,
        [constant('out', 0, steps), constant('gain', 1000, steps)],
        stepS,
        {},
      );
      at(run).forEach((t, k) => {
        within(t, expected.T_per_kW[k], 0.02);
      });
      meetsCase(file, id, { T_per_kW: at(run) }, { T_per_K_out: besides, H_total: besides });
    });

    test('a step of the outside temperature reaches the room as in the continuous solution', () => {
      const run = marchRoom(i, [constant('out', 1, steps), constant('gain', 0, steps)], stepS, {});
      meetsCase(file, id, { T_per_K_out: at(run) }, { T_per_kW: besides, H_total: besides });
    });

    test('the steady state has the case’s loss', () => {
      const p = problem(room(i), [constant('out', 0, 1), constant('gain', 1000, 1)], 900, 1, []);
      const { tempC } = steadyState(p, { kind: 'step', step: 0 }, usual);
      const others = { T_per_kW: besides, T_per_K_out: besides };
      meetsCase(file, id, { H_total: 1000 / tempC[1] }, others);
    });
  },
);

test.each(of<{ heater_W: number; T: number[] }>('room-cool-down'))(
  '$id: heater off after a steady state, at 5 min',
  ({ id, inputs: i, expected }) => {
    const stepS = 300;
    const steps = (Math.max(...i.times_h) * 3600) / stepS;
    const out = constant('out', i.T_out, steps);
    const before = problem(
      room(i),
      [out, constant('gain', expected.heater_W, steps)],
      stepS,
      steps,
      [],
    );
    const warm = steadyState(before, { kind: 'step', step: 0 }, usual);
    expect(Math.abs(warm.tempC[1] - i.T0)).toBeLessThan(1e-3);
    const run = marchRoom(i, [out, constant('gain', 0, steps)], stepS, {
      start: { kind: 'temperatures', tempC: warm.tempC },
    });
    const T = i.times_h.map((h) => run.endC[(h * 3600) / stepS - 1]);
    T.forEach((t, k) => {
      expect(Math.abs(t - expected.T[k])).toBeLessThan(0.05);
    });
    const cold = run.endC.findIndex((t) => t <= i.target); // straight within its step
    const [warmer, cooler] = [cold > 0 ? run.endC[cold - 1] : i.T0, run.endC[cold]];
    const share = (warmer - i.target) / (warmer - cooler);
    meetsCase(file, id, {
      heater_W: (expected.heater_W * (i.T0 - i.T_out)) / (warm.tempC[1] - i.T_out), // linear
      T,
      time_to_target_h: ((cold + share) * stepS) / 3600,
    });
  },
);

/** Amplitude and lag [h] of hourly-or-finer values over one period, against a cosine that peaks at 0. */
function wave(values: Float64Array, periodH: number) {
  let mean = 0;
  let cos = 0;
  let sin = 0;
  values.forEach((v, s) => {
    const angle = (2 * Math.PI * (s + 1)) / values.length;
    mean += v / values.length;
    cos += (2 * v * Math.cos(angle)) / values.length;
    sin += (2 * v * Math.sin(angle)) / values.length;
  });
  const lagH = (Math.atan2(sin, cos) / (2 * Math.PI)) * periodH;
  return { mean, amplitude: Math.hypot(cos, sin), lagH: (lagH + periodH) % periodH };
}

const stepS = 300;
const perDay = 288;
const swing = (name: string, mean: number, amplitude: number) =>
  straight(name, stepS, perDay, (t) => mean + amplitude * Math.cos((2 * Math.PI * t) / 86400));
const daily = {
  start: { kind: 'periodic', spanSteps: perDay, toleranceK: 1e-5, maxPasses: 2000 },
} as const;

test.each(of<{ amplitude: number; lag_h: number }>('room-periodic-outside'))(
  '$id: the daily swing reaches the room with the exact amplitude and lag',
  ({ id, inputs: i, expected }) => {
    const series = [swing('out', 0, i.outside_amplitude), constant('gain', 0, perDay)];
    const got = wave(marchRoom(i, series, stepS, daily).endC, 24);
    within(got.amplitude, expected.amplitude, 0.02);
    meetsCase(file, id, { amplitude: got.amplitude, lag_h: got.lagH });
  },
);

test.each(of<{ amplitude: number; lag_h: number }>('room-periodic-gain'))(
  '$id: a swinging gain moves the room with the exact amplitude and lag',
  ({ id, inputs: i, expected }) => {
    const series = [constant('out', 0, perDay), swing('gain', 0, i.gain_amplitude)];
    const got = wave(marchRoom(i, series, stepS, daily).endC, 24);
    within(got.amplitude, expected.amplitude, 0.02);
    meetsCase(file, id, { amplitude: got.amplitude, lag_h: got.lagH });
  },
);

test.each(of<{ load_mean: number; load_amplitude: number; lag_h: number }>('room-ideal-load'))(
  '$id: an ideal heater needs the exact mean and swing of power',
  ({ id, inputs: i, expected }) => {
    const net = room(i);
    const series = [
      swing('out', i.T_outside_mean, i.outside_amplitude),
      constant('gain', 0, perDay),
      constant('set', i.setpoint, perDay),
      constant('max', Infinity, perDay),
    ];
    const one = Float64Array.of(1);
    const at = Int32Array.of(1);
    const run = march(
      problem(
        {
          ...net,
          plants: [
            {
              name: 'heater',
              kind: 'heater',
              sensorNodes: at,
              sensorWeights: one,
              deliveryNodes: at,
              deliveryShares: one,
              setPointSeries: 2,
              maxSeries: 3,
              bandK: 0,
            },
          ],
        },
        series,
        stepS,
        perDay,
        [],
        {
          ...daily,
          recordNodes: at,
          meters: [{ name: 'load', terms: [{ sign: 1, of: { kind: 'plant', index: 0 } }] }],
        },
      ),
      usual,
    );
    // A step's mean power stands for its middle: half a step later than the end of the one before.
    const got = wave(run.meterW, 24);
    const lag = (got.lagH - stepS / 7200 + 12) % 24; // of the minimum
    const turns = Math.round((lag - expected.lag_h) / 24); // the same moment a day on or back
    meetsCase(file, id, {
      load_mean: got.mean,
      load_amplitude: got.amplitude,
      lag_h: lag - 24 * turns,
    });
    for (const t of run.endC) expect(Math.abs(t - i.setpoint)).toBeLessThan(1e-9);
  },
);

test.each(of('room-periodic-day'))(
  '$id: a repeated day with a block of gain comes out hour by hour',
  ({ id, inputs: i }) => {
    const wave15 = (t: number) =>
      i.T_outside_mean + i.outside_amplitude * Math.cos(2 * Math.PI * (t / 86400 - 15 / 24));
    const block = Array.from({ length: perDay }, (_, s) => {
      const hour = (s * stepS) / 3600;
      return hour >= i.on && hour < i.off ? i.gain_W : 0;
    });
    const series = [straight('out', stepS, perDay, wave15), held('gain', block)];
    const run = marchRoom(i, series, stepS, daily);
    const T_peak = Math.max(...run.endC);
    meetsCase(file, id, {
      T_hourly: Array.from({ length: 24 }, (_, h) => run.endC[(h + 1) * 12 - 1]),
      T_mean: run.meanC.reduce((a, b) => a + b, 0) / perDay,
      T_peak,
      peak_hour: ((run.endC.indexOf(T_peak) + 1) * stepS) / 3600,
    });
  },
);
