// Lumped networks against their exact trajectories: test/reference/02c-rc-networks.json (matrix
// exponential, scipy 1.10.1, cross-checked with mpmath at 40 digits). The march is a fixed-step
// second-order method, so it states its error: at 15 min, and how it falls when the step is halved.

import { describe, expect, test } from 'vitest';
import {
  march,
  type Problem,
  type Series,
  steadyState,
  timeConstantsS,
} from '../../../engine/network/index.ts';
import { constantLinks, network, problem, sourceRows, tight } from './problems.ts';
import { besides, cases, largestGap, meetsCase } from './reference.ts';

interface Inputs {
  readonly C: number[];
  readonly conductances: number[][];
  readonly boundary_conductances: number[][];
  readonly sources: number[][];
  readonly x0: number[];
  readonly u0: number[];
  readonly u1: number[];
  readonly times_h: number[];
  readonly hourly_inputs: number[][];
  readonly hold: string;
  readonly input_mean: number[];
  readonly input_amplitude: number[];
  readonly input_peak_hour: number[];
}

interface Expected {
  readonly T: number[][];
  readonly time_constants_h: number[];
  readonly steady?: number[];
  readonly mean: number[];
  readonly amplitude: number[];
  readonly peak_hour: number[];
}

const file = '02c-rc-networks.json';
const all = cases<Inputs, Expected>(file, () => true);
const fixedInput = all.filter((c) => c.inputs.u0);
const hourly = all.filter((c) => c.inputs.hourly_inputs);
const periodic = all.filter((c) => c.inputs.input_mean);

/** The case's network; inputs are its boundaries first, then its sources. */
function build(
  i: Inputs,
  series: Series[],
  stepS: number,
  steps: number,
  startC: number[],
): Problem {
  const n = i.C.length;
  const boundaries = 1 + Math.max(...i.boundary_conductances.map((b) => b[1]));
  const fixed = Object.fromEntries(Array.from({ length: boundaries }, (_, b) => [n + b, b]));
  const net = network([...i.C, ...new Array(boundaries).fill(0)], fixed, {
    links: [
      constantLinks([
        ...i.conductances,
        ...i.boundary_conductances.map(([node, b, g]) => [n + b, node, g]),
      ]),
    ],
    sources: sourceRows(i.sources.map(([node, s, share]) => [node, share, boundaries + s])),
  });
  const start = [...startC, ...new Array(boundaries).fill(0)];
  return problem(net, series, stepS, steps, start, {
    recordNodes: Int32Array.from(i.C, (_, k) => k),
  });
}

/** Ramps u0 + u1·t over the case's whole time. */
function ramped(i: Inputs, stepS: number): Problem {
  const steps = Math.round((Math.max(...i.times_h) * 3600) / stepS);
  const series = i.u0.map(
    (u0, k): Series => ({
      name: `u${k}`,
      hold: 'linear',
      values: Float64Array.from({ length: steps + 1 }, (_, s) => u0 + i.u1[k] * s * stepS),
    }),
  );
  return build(i, series, stepS, steps, i.x0);
}

/** All nodes at the case's times. */
function trajectory(p: Problem, i: Inputs): Float64Array[] {
  const run = march(p, tight);
  const n = i.C.length;
  return i.times_h.map((h) => {
    const step = Math.round((h * 3600) / p.stepS);
    return run.endC.slice((step - 1) * n, step * n);
  });
}

/** Largest error at the case's times from `fromH` on. */
function errorK(p: Problem, i: Inputs, e: Expected, fromH: number): number {
  const rows = trajectory(p, i);
  return Math.max(...i.times_h.map((h, row) => (h < fromH ? 0 : largestGap(rows[row], e.T[row]))));
}

describe.each(fixedInput)('$id', ({ id, inputs, expected }) => {
  test('the trajectory is met within 0.002 K at 9 s steps', () => {
    // All the case's times, the first fast transients included.
    const T = trajectory(ramped(inputs, 9), inputs);
    const others = Object.fromEntries(
      Object.keys(expected).flatMap((key) => (key === 'T' ? [] : [[key, besides]])),
    );
    meetsCase(file, id, { T }, others);
  });

  test('steps of 15 min stay within 0.005 K once the start’s jump has passed', () => {
    // The start is out of balance by kelvins and the fastest parts have time constants of minutes:
    // what 15 min steps cannot resolve is gone within 2 h.
    expect(errorK(ramped(inputs, 900), inputs, expected, 2)).toBeLessThan(0.005);
  });

  test('halving the step cuts the error by 3.5 or more', () => {
    const coarse = errorK(ramped(inputs, 36), inputs, expected, 0.5);
    const fine = errorK(ramped(inputs, 18), inputs, expected, 0.5);
    // References have ten digits: errors below 1e-7 K are their rounding.
    if (coarse > 1e-6) expect(coarse / fine).toBeGreaterThan(3.5);
    else expect(fine).toBeLessThan(1e-6);
  });

  test('time constants are the reference’s', () => {
    const got = timeConstantsS(ramped(inputs, 900), new Float64Array(expected.T[0].length + 9), 0);
    expected.time_constants_h.forEach((h, k) => {
      expect(Math.abs(got[k] / 3600 / h - 1)).toBeLessThan(1e-5);
    });
    expect(got.length).toBe(expected.time_constants_h.length);
    const others = { T: besides, ...(expected.steady ? { steady: besides } : {}) };
    meetsCase(file, id, { time_constants_h: got.map((tauS) => tauS / 3600) }, others);
  });
});

const settling = fixedInput.filter((c) => c.expected.steady);

test.each(settling)('the steady state of $id is the reference’s', ({ id, inputs, expected }) => {
  const { tempC, converged } = steadyState(ramped(inputs, 900), { kind: 'step', step: 0 }, tight);
  expect(converged).toBe(true);
  const want = expected.steady ?? [];
  expect(want.length).toBe(inputs.C.length);
  const steady = tempC.subarray(0, want.length);
  meetsCase(file, id, { steady }, { T: besides, time_constants_h: besides });
});

describe.each(hourly)('$id', ({ id, inputs, expected }) => {
  const hours = Math.max(...inputs.times_h);
  const driven = (stepS: number): Problem => {
    const perHour = 3600 / stepS;
    const rows = inputs.hourly_inputs;
    const zero = inputs.hold === 'zero';
    const series = rows[0].map((_, k): Series => {
      const at = (s: number) => {
        const h = Math.floor(s / perHour);
        if (zero) return rows[h][k];
        const next = rows[Math.min(h + 1, rows.length - 1)][k];
        return rows[h][k] + (s / perHour - h) * (next - rows[h][k]);
      };
      const length = zero ? hours * perHour : hours * perHour + 1;
      return {
        name: `u${k}`,
        hold: zero ? 'step' : 'linear',
        values: Float64Array.from({ length }, (_, s) => at(s)),
      };
    });
    return build(inputs, series, stepS, hours * perHour, inputs.x0);
  };

  test('three driven days are met within 0.002 K at 1 min steps', () => {
    meetsCase(file, id, { T: trajectory(driven(60), inputs) });
  });

  test('halving the step cuts the error by 3.5 or more', () => {
    const ratio = errorK(driven(60), inputs, expected, 0) / errorK(driven(30), inputs, expected, 0);
    expect(ratio).toBeGreaterThan(3.5);
  });
});

describe.each(periodic)('$id', ({ id, inputs }) => {
  test('marched until periodic, mean, amplitude and peak hour are the closed form’s', () => {
    const stepS = 300;
    const perDay = 86400 / stepS;
    const series = inputs.input_mean.map((mean, k): Series => {
      const wave = (s: number) =>
        mean +
        inputs.input_amplitude[k] *
          Math.cos((2 * Math.PI * ((s * stepS) / 3600 - inputs.input_peak_hour[k])) / 24);
      return {
        name: `u${k}`,
        hold: 'linear',
        values: Float64Array.from({ length: perDay + 1 }, (_, s) => wave(s)),
      };
    });
    const p = build(
      inputs,
      series,
      stepS,
      perDay,
      inputs.C.map(() => 0),
    );
    const run = march(
      { ...p, start: { kind: 'periodic', spanSteps: perDay, toleranceK: 1e-7, maxPasses: 400 } },
      tight,
    );
    expect(run.quality.warmUpDriftK).toBeLessThanOrEqual(1e-7);
    const n = inputs.C.length;
    const found = { mean: [] as number[], amplitude: [] as number[], peak_hour: [] as number[] };
    for (let node = 0; node < n; node++) {
      let mean = 0;
      let cos = 0;
      let sin = 0;
      for (let s = 0; s < perDay; s++) {
        const t = run.endC[s * n + node];
        const angle = (2 * Math.PI * (s + 1)) / perDay;
        mean += t / perDay;
        cos += (2 * t * Math.cos(angle)) / perDay;
        sin += (2 * t * Math.sin(angle)) / perDay;
      }
      found.mean.push(mean);
      found.amplitude.push(Math.hypot(cos, sin));
      found.peak_hour.push(((Math.atan2(sin, cos) / (2 * Math.PI)) * 24 + 24) % 24);
    }
    meetsCase(file, id, found);
  });
});
