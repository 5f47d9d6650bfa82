// Samples and indices on functions whose answers are published or can be worked out by hand.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  gridPoints,
  morrisEffects,
  morrisPoints,
  mostSobolDimensions,
  paretoFront,
  sobolPoints,
  variancePoints,
  varianceShares,
} from '../../../engine/study/index.ts';

const { PI, sin } = Math;

/**
 * Ishigami function, a = 7, b = 0.1, inputs even from −π to π.
 * Source: T. Ishigami, T. Homma, ISUMA 1990, 398–403; indices from its closed form
 *   D1 = b·π⁴/5 + b²π⁸/50 + 1/2, D2 = a²/8, D13 = 8b²π⁸/225
 */
const ishigami = ([x, y, z]: readonly number[]): number => {
  const [a, b, c] = [x, y, z].map((u) => PI * (2 * u - 1));
  return sin(a) + 7 * sin(b) ** 2 + 0.1 * c ** 4 * sin(a);
};
const d1 = (0.1 * PI ** 4) / 5 + (0.01 * PI ** 8) / 50 + 0.5;
const d2 = 49 / 8;
const d13 = (8 * 0.01 * PI ** 8) / 225;
const whole = d1 + d2 + d13;

/**
 * g-function of Sobol', S_i = (1/3)/(1 + a_i)² over the variance Π(1 + V_i) − 1.
 * Source: I. M. Sobol', Mathematics and Computers in Simulation 55 (2001), 271–280.
 */
const weights = [0, 1, 4.5, 9];
const g = (point: readonly number[]): number =>
  point.reduce(
    (product, x, i) => product * ((Math.abs(4 * x - 2) + weights[i]) / (1 + weights[i])),
    1,
  );

describe('shares of the variance', () => {
  test('of the Ishigami function are the published ones', () => {
    const count = 4096;
    const values = variancePoints(count, 3).map(ishigami);
    const shares = varianceShares(values, count, 3);
    // 0.3139, 0.4424, 0 and 0.5576, 0.4424, 0.2437
    const first = [d1 / whole, d2 / whole, 0];
    const total = [(d1 + d13) / whole, d2 / whole, d13 / whole];
    shares.forEach((share, i) => {
      expect(Math.abs(share.first - first[i]), `first ${i}`).toBeLessThan(0.01);
      expect(Math.abs(share.total - total[i]), `total ${i}`).toBeLessThan(0.01);
    });
  });
  test("of Sobol's g-function are those of its closed form", () => {
    const count = 4096;
    const parts = weights.map((a) => 1 / 3 / (1 + a) ** 2);
    const variance = parts.reduce((product, v) => product * (1 + v), 1) - 1;
    const shares = varianceShares(variancePoints(count, 4).map(g), count, 4);
    shares.forEach(({ first, total }, i) => {
      expect(Math.abs(first - parts[i] / variance), `first ${i}`).toBeLessThan(0.01);
      const others = (variance + 1) / (1 + parts[i]);
      expect(Math.abs(total - (parts[i] * others) / variance), `total ${i}`).toBeLessThan(0.01);
    });
  });
  test('of a constant are none', () => {
    const values = variancePoints(8, 2).map(() => 5);
    expect(varianceShares(values, 8, 2)).toEqual([
      { first: 0, total: 0 },
      { first: 0, total: 0 },
    ]);
  });
});

describe('elementary effects', () => {
  test('of a plane are its slopes, without deviation', () => {
    const points = morrisPoints(5, 3);
    const effects = morrisEffects(
      points,
      points.map(([x, y, z]) => 4 * x - 2 * y + 0 * z + 1),
      3,
    );
    expect(effects.map((one) => one.mean)).toEqual([4, -2, 0].map((v) => expect.closeTo(v, 9)));
    expect(effects.map((one) => one.meanAmount)).toEqual(
      [4, 2, 0].map((v) => expect.closeTo(v, 9)),
    );
    for (const one of effects) expect(one.deviation).toBeLessThan(1e-9);
  });
  test('of a product deviate, and an amount does not cancel where the mean does', () => {
    const points = morrisPoints(200, 2);
    const effects = morrisEffects(
      points,
      points.map(([x, y]) => (x - 0.5) * (y - 0.5)),
      2,
    );
    expect(Math.abs(effects[0].mean)).toBeLessThan(0.05);
    expect(effects[0].meanAmount).toBeGreaterThan(0.2);
    expect(effects[0].deviation).toBeGreaterThan(0.2);
  });
  test('screen the Ishigami function as its total shares do: all three matter', () => {
    const points = morrisPoints(200, 3, 8);
    const effects = morrisEffects(points, points.map(ishigami), 3);
    for (const one of effects) expect(one.meanAmount).toBeGreaterThan(1);
  });
  test('move one input at a time, on the levels, inside the cube', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 8 }),
        fc.constantFrom(4, 6, 8),
        fc.integer({ min: 1, max: 1e6 }),
        (inputs, levels, seed) => {
          const points = morrisPoints(3, inputs, levels, seed);
          expect(points).toHaveLength(3 * (inputs + 1));
          for (const x of points.flat()) {
            const level = x * (levels - 1);
            expect(Math.abs(level - Math.round(level))).toBeLessThan(1e-9);
            expect(x).toBeGreaterThan(-1e-9);
            expect(x).toBeLessThan(1 + 1e-9);
          }
          points.forEach((point, k) => {
            if (k % (inputs + 1) === 0) return;
            const moved = point.filter((x, i) => x !== points[k - 1][i]);
            expect(moved).toHaveLength(1);
          });
        },
      ),
      { numRuns: 50 },
    );
  });
});

describe('samples', () => {
  test('every dimension of a low-discrepancy sample puts one point in each of its cells', () => {
    // What makes a (t, s)-sequence in base 2: each projection onto one axis is a (0, 1)-net (Sobol' 1967).
    for (const bits of [1, 4, 7, 10]) {
      const count = 2 ** bits;
      const points = sobolPoints(count, mostSobolDimensions);
      for (let d = 0; d < mostSobolDimensions; d++) {
        const cells = new Set(points.map((point) => Math.floor(point[d] * count)));
        expect(cells.size, `dimension ${d}, ${count} points`).toBe(count);
      }
    }
  });
  test('its first points are the published ones', () => {
    // 0, 1/2, 3/4 and 1/4, 3/8, 7/8 … in the first dimension (Antonov & Saleev order).
    const points = sobolPoints(8, 2);
    const near = (x: number) => Math.round(x * 8) / 8;
    expect(points.map(([x]) => near(x))).toEqual([0, 0.5, 0.75, 0.25, 0.375, 0.875, 0.625, 0.125]);
    expect(points.map(([, y]) => near(y))).toEqual([
      0, 0.5, 0.25, 0.75, 0.375, 0.875, 0.125, 0.625,
    ]);
  });
  test('pairs of dimensions fill their squares: the mean of a product comes out', () => {
    const points = sobolPoints(1024, mostSobolDimensions);
    for (let a = 0; a < mostSobolDimensions; a++)
      for (let b = 0; b < a; b++) {
        const mean = points.reduce((sum, point) => sum + point[a] * point[b], 0) / points.length;
        expect(Math.abs(mean - 0.25), `dimensions ${a} and ${b}`).toBeLessThan(0.01);
      }
  });
  test('a grid holds every combination once, the last moving fastest', () => {
    expect(gridPoints([2, 3])).toEqual([
      [0, 0],
      [0, 1],
      [0, 2],
      [1, 0],
      [1, 1],
      [1, 2],
    ]);
  });
});

describe('the front', () => {
  test('of points on a quarter circle is all of them, and none behind it', () => {
    const on = Array.from({ length: 9 }, (_, i) => [
      1 - Math.cos((i * PI) / 16),
      1 - sin((i * PI) / 16),
    ]);
    const behind = on.map(([x, y]) => [x + 0.1, y + 0.1]);
    expect(paretoFront([...on, ...behind])).toEqual([
      ...on.map(() => true),
      ...behind.map(() => false),
    ]);
  });
  test('nothing on it is beaten, everything off it is', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.integer({ min: 0, max: 9 }), fc.integer({ min: 0, max: 9 })), {
          minLength: 1,
          maxLength: 40,
        }),
        (rows) => {
          const front = paretoFront(rows);
          expect(front).toContain(true);
          const beats = (a: readonly number[], b: readonly number[]) =>
            a.every((v, k) => v <= b[k]) && a.some((v, k) => v < b[k]);
          rows.forEach((row, i) => {
            expect(rows.some((other) => beats(other, row))).toBe(!front[i]);
          });
        },
      ),
    );
  });
  test('a run without a figure is not on it', () => {
    expect(
      paretoFront([
        [Number.NaN, 0],
        [1, 1],
      ]),
    ).toEqual([false, true]);
  });
});
