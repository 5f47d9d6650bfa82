// T⁴ exchange: grey enclosures and shields against radiosity solutions (test/reference/07-radiation-
// exchange.json, closed form). Exchange areas X of an enclosure come from its view factors here, by the
// inverse of the radiosity matrix: q_i = A_i·ε_i/(1 − ε_i)·(σT_i⁴ − J_i) with J = ε·σT⁴ + (1 − ε)·F·J gives
//   X = D·(I − (1 − ε)·F)⁻¹·ε with D = A·ε/(1 − ε), off the diagonal.

import { inverse, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import {
  march,
  type Series,
  steadyState,
  stefanBoltzmann,
  zeroC,
} from '../../../engine/network/index.ts';
import { constant, constantLinks, network, problem, sourceRows, tight } from './problems.ts';
import { cases, largestGap } from './reference.ts';

const file = '07-radiation-exchange.json';

function exchangeAreas(areas: number[], f: number[][], emissivity: number[]): Float64Array {
  const n = areas.length;
  const system = Matrix.eye(n, n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) system.set(i, j, system.get(i, j) - (1 - emissivity[i]) * f[i][j]);
  }
  // Share of emission from j that ends at i by F·J, which avoids 1 − ε = 0 for black surfaces.
  const radiosity = inverse(system);
  const x = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      let arriving = 0;
      for (let k = 0; k < n; k++) arriving += f[i][k] * radiosity.get(k, j) * emissivity[j];
      x[i * n + j] = areas[i] * emissivity[i] * arriving;
    }
  }
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < i; j++) {
      // Reciprocity holds to the digits of the printed view factors; the network wants it exact.
      const mean = (x[i * n + j] + x[j * n + i]) / 2;
      x[i * n + j] = mean;
      x[j * n + i] = mean;
    }
  }
  return x;
}

interface Enclosed {
  readonly areas: number[];
  readonly F_matrix: number[][];
  readonly emissivity: number[];
  readonly temperatures: (number | null)[];
  readonly net_flow_given: number[][];
}

const enclosures = cases<Enclosed, { net_flow: number[]; temperature_out: number[] }>(file, (id) =>
  /^enclosure-[36]/.test(id),
);

test.each(enclosures)(
  '$id: net flows and free temperatures in steady state',
  ({ inputs: i, expected }) => {
    const n = i.areas.length;
    const series: Series[] = [constant('one', 1, 1)];
    const boundaries: Record<number, number> = {};
    i.temperatures.forEach((t, k) => {
      if (t === null) return;
      series.push(constant(`t${k}`, t, 1));
      boundaries[k] = series.length - 1;
    });
    const net = network(new Array(n).fill(0), boundaries, {
      enclosures: [
        {
          name: 'room',
          nodes: Int32Array.from(i.areas, (_, k) => k),
          exchangeAreaM2: exchangeAreas(i.areas, i.F_matrix, i.emissivity),
        },
      ],
      sources: sourceRows(i.net_flow_given.map(([k, q]) => [k, q * i.areas[k], 0])),
    });
    const p = problem(net, series, 900, 1, new Array(n).fill(15), {
      meters: i.areas.map((_, position) => ({
        name: `gain ${position}`,
        terms: [{ sign: -1, of: { kind: 'enclosure', enclosure: 0, position } }],
      })),
    });
    const { tempC, converged } = steadyState(p, { kind: 'step', step: 0 }, tight);
    expect(converged).toBe(true);
    expect(largestGap(tempC, expected.temperature_out)).toBeLessThan(0.001);
    // Without capacity one step of the march is the steady state too, and meters tell the flows.
    const run = march(p, tight);
    expect(largestGap(run.endC, expected.temperature_out)).toBeLessThan(0.001);
    expect(largestGap(run.meterW, expected.net_flow)).toBeLessThan(0.1);
    expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  },
);

test('a three-sided oven with an insulated side comes to the printed temperature and heat', () => {
  const [{ inputs, expected }] = cases<
    {
      areas: number[];
      F_matrix: number[][];
      emissivity: number[];
      temperature_K: (number | null)[];
    },
    { q_kW_per_m: number; T_insulated: number }
  >(file, (id) => id === 'enclosure-oven');
  const series = [
    constant('hot', (inputs.temperature_K[0] ?? 0) - zeroC, 1),
    constant('panel', (inputs.temperature_K[2] ?? 0) - zeroC, 1),
  ];
  const net = network(
    [0, 0, 0],
    { 0: 0, 2: 1 },
    {
      enclosures: [
        {
          name: 'oven',
          nodes: Int32Array.of(0, 1, 2),
          exchangeAreaM2: exchangeAreas(inputs.areas, inputs.F_matrix, inputs.emissivity),
        },
      ],
    },
  );
  const run = march(
    problem(net, series, 60, 1, [0, 20, 0], {
      meters: [
        {
          name: 'heat',
          terms: [{ sign: -1, of: { kind: 'enclosure', enclosure: 0, position: 0 } }],
        },
      ],
    }),
    tight,
  );
  expect(Math.abs(run.endC[1] + zeroC - expected.T_insulated)).toBeLessThan(1.5);
  expect(Math.abs(run.meterW[0] / 1000 - expected.q_kW_per_m)).toBeLessThan(0.5);
});

interface Plates {
  readonly T1: number;
  readonly T2: number;
  readonly eps1: number;
  readonly eps2: number;
  readonly eps_shield: number;
  readonly n_shields: number;
}

describe('shields as radiant links', () => {
  test.each(cases<Plates, { q: number }>(file, (id) => id.startsWith('one-shield')))(
    '$id: a free shield between two plates',
    ({ inputs: i, expected }) => {
      const series = [constant('a', i.T1 - zeroC, 1), constant('b', i.T2 - zeroC, 1)];
      const between = (a: number, b: number) => 1 / (1 / a + 1 / b - 1);
      const net = network(
        [0, 0, 0],
        { 0: 0, 2: 1 },
        {
          links: [
            {
              law: 'radiant',
              from: Int32Array.of(0, 1),
              to: Int32Array.of(1, 2),
              exchangeAreaM2: Float64Array.of(
                between(i.eps1, i.eps_shield),
                between(i.eps_shield, i.eps2),
              ),
            },
          ],
        },
      );
      const p = problem(net, series, 900, 1, [0, 100, 0], {
        meters: [{ name: 'q', terms: [{ sign: 1, of: { kind: 'link', group: 0, index: 0 } }] }],
      });
      const run = march(p, tight);
      expect(run.quality.unconvergedSteps).toBe(0);
      expect(Math.abs(run.meterW[0] / expected.q - 1)).toBeLessThan(1e-6);
    },
  );
});

test('a body that cools by radiation alone follows T⁻³ = T0⁻³ + 3σA·t/C in second order', () => {
  // Closed form of C·dT/dt = −σA·T⁴ (surroundings at 0 K).
  const area = 2;
  const capacity = 20000;
  const start = 500;
  const timeS = 3600;
  const exact = (start ** -3 + (3 * stefanBoltzmann * area * timeS) / capacity) ** (-1 / 3);
  const error = (stepS: number) => {
    const steps = timeS / stepS;
    const net = network(
      [capacity, 0],
      { 1: 0 },
      {
        links: [
          {
            law: 'radiant',
            from: Int32Array.of(0),
            to: Int32Array.of(1),
            exchangeAreaM2: Float64Array.of(area),
          },
        ],
      },
    );
    const run = march(
      problem(net, [constant('cold', -zeroC, steps)], stepS, steps, [start - zeroC, 0]),
      tight,
    );
    return Math.abs(run.finalC[0] + zeroC - exact);
  };
  expect(error(30)).toBeLessThan(0.01);
  expect(error(60) / error(30)).toBeGreaterThan(3.5);
});

test('constant links beside radiation settle where both flows balance', () => {
  const net = network(
    [0, 0],
    { 1: 0 },
    {
      links: [
        constantLinks([[0, 1, 5]]),
        {
          law: 'radiant',
          from: Int32Array.of(0),
          to: Int32Array.of(1),
          exchangeAreaM2: Float64Array.of(0.8),
        },
      ],
      sources: sourceRows([[0, 300, 1]]),
    },
  );
  const p = problem(net, [constant('out', 10, 1), constant('one', 1, 1)], 900, 1, [0, 0]);
  const { tempC } = steadyState(p, { kind: 'step', step: 0 }, tight);
  const t = tempC[0];
  const flow = 5 * (t - 10) + 0.8 * stefanBoltzmann * ((t + zeroC) ** 4 - (10 + zeroC) ** 4);
  expect(Math.abs(flow - 300)).toBeLessThan(1e-9 * 300);
});
