// Which inputs matter: elementary effects and variance shares, as designs of points and the reckoning
// of what came out. All inputs run over the unit cube.
import { mostSobolDimensions, seededNumbers, sobolPoints } from './sampling.ts';

/** Effect of one input over its whole range, from Morris's method. */
export interface ElementaryEffects {
  /** Mean of the effects: direction. */
  readonly mean: number;
  /** Mean of their amounts: how much it matters. */
  readonly meanAmount: number;
  /** Standard deviation: how much that depends on the others, or bends. */
  readonly deviation: number;
}

/**
 * Trajectories through a grid of levels, one input moved at a time by Δ = p/(2(p − 1)).
 *
 * @param levels p, even, 4 or more
 * @returns `count` · (inputs + 1) points, trajectory by trajectory
 *
 * Source: M. D. Morris, Technometrics 33 (1991), 161–174.
 */
export function morrisPoints(count: number, inputs: number, levels = 4, seed = 1): number[][] {
  const random = seededNumbers(seed);
  const step = levels / (2 * (levels - 1));
  const points: number[][] = [];
  for (let t = 0; t < count; t++) {
    const at = Array.from(
      { length: inputs },
      () => Math.floor(random() * (levels / 2)) / (levels - 1),
    );
    const up = at.map(() => random() < 0.5);
    // Moving down starts at the top of the move.
    const point = at.map((value, i) => (up[i] ? value : value + step));
    points.push([...point]);
    for (const i of shuffled(inputs, random)) {
      point[i] += up[i] ? step : -step;
      points.push([...point]);
    }
  }
  return points;
}

function shuffled(count: number, random: () => number): number[] {
  const order = Array.from({ length: count }, (_, i) => i);
  for (let i = count - 1; i > 0; i--) {
    const j = Math.floor(random() * (i + 1));
    [order[i], order[j]] = [order[j], order[i]];
  }
  return order;
}

/**
 * Effects from the values at `morrisPoints`.
 *
 * Source: Morris as above; mean amount μ* by F. Campolongo, J. Cariboni, A. Saltelli, Environmental
 * Modelling & Software 22 (2007), 1509–1518.
 */
export function morrisEffects(
  points: readonly (readonly number[])[],
  values: readonly number[],
  inputs: number,
): ElementaryEffects[] {
  const effects: number[][] = Array.from({ length: inputs }, () => []);
  for (let first = 0; first < points.length; first += inputs + 1) {
    for (let k = first; k < first + inputs; k++) {
      const moved = points[k + 1].findIndex((value, i) => value !== points[k][i]);
      const by = points[k + 1][moved] - points[k][moved];
      effects[moved].push((values[k + 1] - values[k]) / by);
    }
  }
  return effects.map((list) => {
    const mean = list.reduce((a, b) => a + b, 0) / list.length;
    const square = list.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    return {
      mean,
      meanAmount: list.reduce((sum, value) => sum + Math.abs(value), 0) / list.length,
      deviation: list.length > 1 ? Math.sqrt(square / (list.length - 1)) : 0,
    };
  });
}

/** Shares of the variance, of one input alone and with all that it takes part in. */
export interface VarianceShares {
  readonly first: number;
  readonly total: number;
}

export const mostVarianceInputs = Math.floor(mostSobolDimensions / 2);

/**
 * Two independent samples A and B, and for each input A with that column of B.
 *
 * @param count a power of two serves best
 * @returns count · (inputs + 2) points: A, B, then one block an input
 *
 * Source: A. Saltelli et al., Computer Physics Communications 181 (2010), 259–270.
 */
export function variancePoints(count: number, inputs: number): number[][] {
  const both = sobolPoints(count, 2 * inputs);
  const a = both.map((point) => point.slice(0, inputs));
  const b = both.map((point) => point.slice(inputs));
  const mixed = Array.from({ length: inputs }, (_, i) =>
    a.map((point, k) => point.map((value, j) => (j === i ? b[k][j] : value))),
  );
  return [...a, ...b, ...mixed.flat()];
}

/**
 * Shares from the values at `variancePoints`.
 *
 *   S_i = (1/N)·Σ f(B)·(f(A_B^i) − f(A)) / V,  T_i = (1/2N)·Σ (f(A) − f(A_B^i))² / V
 *
 * Source: Saltelli et al. 2010, table 2, (b) and (f) (Jansen 1999); values are centred first, which
 * changes nothing but the error of the sum.
 */
export function varianceShares(
  values: readonly number[],
  count: number,
  inputs: number,
): VarianceShares[] {
  const pair = values.slice(0, 2 * count);
  const mean = pair.reduce((sum, value) => sum + value, 0) / pair.length;
  const variance = pair.reduce((sum, value) => sum + (value - mean) ** 2, 0) / pair.length;
  const centred = values.map((value) => value - mean);
  return Array.from({ length: inputs }, (_, i) => {
    if (!(variance > 0)) return { first: 0, total: 0 };
    let first = 0;
    let total = 0;
    for (let k = 0; k < count; k++) {
      const [a, b, mixed] = [centred[k], centred[count + k], centred[(2 + i) * count + k]];
      first += b * (mixed - a);
      total += (a - mixed) ** 2;
    }
    return { first: first / count / variance, total: total / (2 * count) / variance };
  });
}

/** Which rows no other row beats: better or equal in every figure and better in one (smaller is better). */
export function paretoFront(rows: readonly (readonly number[])[]): boolean[] {
  return rows.map(
    (row, i) =>
      row.every(Number.isFinite) &&
      !rows.some(
        (other, j) =>
          j !== i &&
          other.every((value, k) => value <= row[k]) &&
          other.some((value, k) => value < row[k]),
      ),
  );
}
