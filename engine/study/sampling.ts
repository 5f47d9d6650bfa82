// Points in the unit cube: full grids and low-discrepancy samples. The same every time.

/** Every combination of so many choices, the last one moving fastest. */
export function gridPoints(counts: readonly number[]): number[][] {
  return counts.reduce<number[][]>(
    (points, count) =>
      points.flatMap((point) => Array.from({ length: count }, (_, i) => [...point, i])),
    [[]],
  );
}

/**
 * Degree s and coefficients a of the primitive polynomials, and the first direction numbers m, of
 * dimensions 2 to 20.
 *
 * Source: S. Joe, F. Y. Kuo, "Constructing Sobol sequences with better two-dimensional projections",
 * SIAM J. Sci. Comput. 30 (2008), 2635–2654, table new-joe-kuo-6 (from memory; a test holds the
 * stratification that any such table must give).
 */
const directions: readonly (readonly [number, number, readonly number[]])[] = [
  [1, 0, [1]],
  [2, 1, [1, 3]],
  [3, 1, [1, 3, 1]],
  [3, 2, [1, 1, 1]],
  [4, 1, [1, 1, 3, 3]],
  [4, 4, [1, 3, 5, 13]],
  [5, 2, [1, 1, 5, 5, 17]],
  [5, 4, [1, 1, 5, 5, 5]],
  [5, 7, [1, 1, 7, 11, 19]],
  [5, 11, [1, 1, 5, 1, 1]],
  [5, 13, [1, 1, 1, 3, 11]],
  [5, 14, [1, 3, 5, 5, 31]],
  [6, 1, [1, 3, 3, 9, 7, 49]],
  [6, 13, [1, 1, 1, 15, 21, 21]],
  [6, 16, [1, 3, 1, 13, 27, 49]],
  [6, 19, [1, 1, 1, 15, 7, 5]],
  [6, 22, [1, 3, 1, 15, 13, 25]],
  [6, 25, [1, 1, 5, 5, 19, 61]],
  [7, 1, [1, 3, 7, 11, 23, 15, 103]],
];

export const mostSobolDimensions = directions.length + 1;
const bits = 30;

/** Direction numbers of one dimension, as integers of `bits` bits. */
function directionNumbers(dimension: number): number[] {
  if (dimension === 0) return Array.from({ length: bits }, (_, i) => 2 ** (bits - 1 - i));
  const [degree, a, first] = directions[dimension - 1];
  const m = [...first];
  for (let k = degree; k < bits; k++) {
    let next = m[k - degree] ^ (m[k - degree] * 2 ** degree);
    for (let j = 1; j < degree; j++) if ((a >> (degree - 1 - j)) & 1) next ^= m[k - j] * 2 ** j;
    m.push(next);
  }
  return m.map((value, i) => value * 2 ** (bits - 1 - i));
}

/**
 * The first `count` points of the Sobol sequence, in the middle of their finest cells so that none lies
 * on an edge.
 *
 * Source: I. M. Sobol' (1967); Gray-code order of I. A. Antonov, V. M. Saleev (1979).
 */
export function sobolPoints(count: number, dimensions: number): number[][] {
  if (dimensions < 1 || dimensions > mostSobolDimensions)
    throw new RangeError(`from 1 to ${mostSobolDimensions} dimensions, not ${dimensions}`);
  const numbers = Array.from({ length: dimensions }, (_, d) => directionNumbers(d));
  const at = new Array<number>(dimensions).fill(0);
  const points: number[][] = [];
  for (let i = 0; i < count; i++) {
    points.push(at.map((value) => (value + 0.5) / 2 ** bits));
    let zero = 0;
    while ((i >> zero) & 1) zero++;
    for (let d = 0; d < dimensions; d++) at[d] ^= numbers[d][zero];
  }
  return points;
}

/** Even numbers from 0 to 1 out of a seed (32-bit mixing; quality enough to shuffle with). */
export function seededNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), state | 1);
    t = (t + Math.imul(t ^ (t >>> 7), t | 61)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}
