// The benchmark family against the check numbers of its page of definitions: what was built, and the
// converged results (matrix exponential, fine implicit Runge-Kutta and 5 s steps, made elsewhere).

import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { march, type Run } from '../../engine/network/index.ts';
import { buildFamily, type Kind } from './family.ts';
import { readDrivers } from './family-drivers.ts';
import { familySums } from './family-sums.ts';

const table = new URL('../../../shared/weather/tmy3-725650.csv', import.meta.url);
const there = existsSync(table);
const method = { toleranceK: 1e-6, maxIterations: 40 };

describe.skipIf(!there)('benchmark family (needs ../shared/weather/tmy3-725650.csv)', () => {
  const drivers = there ? readDrivers(readFileSync(table, 'utf8')) : readDrivers('');

  test.each(familySums)(
    '%i rooms add up to the page’s sums',
    (n, nodes, chains, shared, c, g, h, leak, window) => {
      const { sums } = buildFamily(n, 'L', false, drivers, 3600, 24);
      expect(sums.nodes).toBe(nodes);
      expect(sums.chains).toBe(chains);
      expect(sums.sharedChains).toBe(shared);
      expect(sums.capacityJPerK / 1e6).toBeCloseTo(c, 5);
      expect(sums.fabricWPerK).toBeCloseTo(g, 3);
      expect(sums.insideConvectionWPerK).toBeCloseTo(h, 6);
      expect(sums.infiltrationWPerK).toBeCloseTo(leak, 5);
      expect(sums.windowM2).toBeCloseTo(window, 5);
    },
  );

  const draws = () => buildFamily(1, 'L', false, drivers, 3600, 24).firstDraws;

  test('the first random draws are the page’s, the third aside', () => {
    const want = [0.5201291833, 0.1206409594, NaN, 0.9864851639, 0.1607970344];
    draws().forEach((u, i) => {
      if (i !== 2) expect(u).toBeCloseTo(want[i], 9);
    });
  });

  // The page prints 0.1652344379; the generator that gives its four other draws, and all its sums,
  // gives 0.1652343799: two digits of the page look exchanged.
  test.fails('the third draw is the page’s', () => {
    expect(draws()[2]).toBeCloseTo(0.1652344379, 9);
  });

  test('the driver means are the page’s', () => {
    const mean = (v: Float64Array) => v.reduce((a, b) => a + b, 0) / v.length;
    expect(mean(drivers.outdoorC)).toBeCloseTo(10.875342, 5);
    expect(mean(drivers.skyC)).toBeCloseTo(-8.77811, 5);
    expect(mean(drivers.windMPerS)).toBeCloseTo(3.91653, 5);
    expect(mean(drivers.south)).toBeCloseTo(146.946507, 4);
    expect(mean(drivers.north)).toBeCloseTo(54.539694, 4);
    expect(mean(drivers.west)).toBeCloseTo(104.506857, 4);
    expect(mean(drivers.east)).toBeCloseTo(114.843074, 4);
    expect(mean(drivers.roof)).toBeCloseTo(190.664384, 4);
  });

  const timed = (n: number, kind: Kind, plant: boolean): Run => {
    const { problem } = buildFamily(n, kind, plant, drivers);
    march(problem, method);
    const begin = performance.now();
    const r = march(problem, method);
    const ms = performance.now() - begin;
    const q = r.quality;
    console.log(
      `${n} ${kind} ${plant ? 'plant' : 'free'}: ${ms.toFixed(0)} ms, residual ${q.relativeBalanceResidual.toExponential(1)}, iterations/stage ${(q.iterations / q.steps / 2).toFixed(2)}, unconverged ${q.unconvergedSteps}`,
    );
    return r;
  };

  // Free-floating values at the ends of hours 1, 24, 1000, 4380, 8760, and the mean of the hour ends.
  const hours = [1, 24, 1000, 4380, 8760];
  test.each<[number, Kind, number[], number]>([
    [1, 'L', [13.7383, 13.3883, 11.7305, 32.0164, 9.3848], 20.9874],
    [1, 'V', [13.3767, 12.7217, 12.0013, 32.7553, 9.0319], 21.1351],
    [4, 'L', [13.3722, 13.2808, 10.013, 31.3543, 7.9271], 19.9553],
    [4, 'V', [12.9806, 12.4758, 10.4109, 32.1252, 7.7386], 20.1389],
  ])('%i rooms %s float to the converged temperatures', (n, kind, want, mean) => {
    const r = timed(n, kind, false);
    expect(r.outcome.kind).toBe('finished');
    const got = hours.map((h) => r.endC[(h - 1) * n]);
    let sum = 0;
    for (let h = 0; h < 8760; h++) sum += r.endC[h * n];
    console.log(
      n,
      kind,
      got.map((g, i) => (g - want[i]).toFixed(5)).join(' '),
      (sum / 8760 - mean).toFixed(5),
    );
    got.forEach((g, i) => {
      expect(Math.abs(g - want[i])).toBeLessThan(0.005);
    });
    expect(Math.abs(sum / 8760 - mean)).toBeLessThan(0.001);
    expect(r.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    expect(r.quality.unconvergedSteps).toBe(0);
  });

  test.each<[number, Kind, number, number]>([
    [1, 'L', 827.6545, 457.6287],
    [1, 'V', 838.016, 466.432],
    [4, 'L', 4165.826, 1254.829],
    [4, 'V', 4252.22, 1302.492],
  ])('%i rooms %s need the converged heating and cooling', (n, kind, heating, cooling) => {
    const r = timed(n, kind, true);
    let heat = 0;
    let cool = 0;
    for (let h = 0; h < r.records; h++) {
      heat += r.meterW[2 * h] / 1000;
      cool += r.meterW[2 * h + 1] / 1000;
    }
    console.log(n, kind, heat, heat - heating, cool, cool - cooling);
    expect(Math.abs(heat - heating)).toBeLessThan(0.001 * heating);
    expect(Math.abs(cool - cooling)).toBeLessThan(0.001 * cooling);
    expect(r.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    expect(r.quality.unconvergedSteps).toBe(0);
  });
});
