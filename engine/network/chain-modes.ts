// Chains over a whole step in their own modes: what the nodes inside a wall remember.
//
// With T = Φ·z (modes orthonormal in C) a chain between ends A and B falls apart into scalars,
//   dz/dt = −λ·z + α·T_A + β·T_B,   heat to A: Σ α·z − g_A·T_A,   to B: Σ β·z − g_B·T_B.
// The two stages of SDIRK2 (length τ = γh, weight c of the first in the second) become
//   z1 = d·z0 + τ·d·(α·T_A1 + β·T_B1),  z2 = e·z0 + c·τ·d²·(α·T_A1 + β·T_B1) + τ·d·(α·T_A2 + β·T_B2),
//   d = 1/(1 + τ·λ),  e = d·(1 − c + c·d),
// so that one pass a step moves every mode on and sums what the ends will hear of it in either stage of
// the next. Same numbers as elimination node by node, to rounding: no term is left out, nothing is
// done twice, and no mode waits for another (a node waits for its neighbour).

import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { Chains } from './chains.ts';

/** Numbers a mode: e, then the weights of T_A1, T_B1, T_A2, T_B2 in z2, then those of z in the history
 * of the ends (A and B in stage 1, A and B in stage 2) and in the heat stored. */
const width = 10;

export interface ChainModes {
  /** Modes of chain c: `start[c]` to `start[c + 1] − 1`. */
  readonly start: Int32Array;
  readonly coefficients: Float64Array;
  readonly z: Float64Array;
  /** Four a chain: heat towards A and B by history in stage 1, then in stage 2 with the ends at 0 °C [W]. */
  readonly history: Float64Array;
  /** History of the stage at hand, two a chain: heat towards A and B with both ends at 0 °C [W]. */
  readonly now: Float64Array;
  /** What T_A1 and T_B1 add to the history of stage 2: at A by A, across, at B by B [W/K]. */
  readonly secondAA: Float64Array;
  readonly secondAB: Float64Array;
  readonly secondBB: Float64Array;
  /** Heat stored in each chain, from 0 °C [J]. */
  readonly heatJ: Float64Array;
  /** By mode: z after stage 1 is decay1·z0 + drive1A·T_A1 + drive1B·T_B1. */
  readonly decay1: Float64Array;
  readonly drive1A: Float64Array;
  readonly drive1B: Float64Array;
  /** Node i of a chain of m modes: T = Σ shape[shapeStart[i] + k]·z_k + byA[i]·T_A + byB[i]·T_B. */
  readonly shapeStart: Int32Array;
  readonly shape: Float64Array;
  readonly byA: Float64Array;
  readonly byB: Float64Array;
  readonly capacityJPerK: Float64Array;
}

interface OneChain {
  readonly lambda: readonly number[];
  readonly alpha: Float64Array;
  readonly beta: Float64Array;
  readonly heat: Float64Array;
  readonly shape: Float64Array;
  readonly byA: Float64Array;
  readonly byB: Float64Array;
}

/** Modes of one chain; nodes without mass lie on the straight line between their neighbours with mass. */
function modesOf(capacity: Float64Array, towardsA: Float64Array, lastG: number): OneChain {
  const n = capacity.length;
  const massive: number[] = [];
  for (let i = 0; i < n; i++) if (capacity[i] > 0) massive.push(i);
  const m = massive.length;
  /** Resistance from A to node i; B is "node" n. */
  const along = new Float64Array(n + 1);
  for (let i = 0; i <= n; i++)
    along[i] = (i > 0 ? along[i - 1] : 0) + 1 / (i < n ? towardsA[i] : lastG);
  const reach = [-1, ...massive, n];
  const place = (i: number) => (i < 0 ? 0 : along[i]);
  const g = reach.slice(1).map((i, k) => 1 / (place(i) - place(reach[k])));
  if (m === 0) {
    const byB = Float64Array.from(capacity, (_, i) => along[i] / along[n]);
    const empty = new Float64Array(0);
    return {
      lambda: [],
      alpha: empty,
      beta: empty,
      heat: empty,
      shape: empty,
      byA: byB.map((b) => 1 - b),
      byB,
    };
  }
  const root = massive.map((i) => Math.sqrt(capacity[i]));
  const k = Matrix.zeros(m, m);
  for (let i = 0; i < m; i++) {
    k.set(i, i, (g[i] + g[i + 1]) / (root[i] * root[i]));
    if (i > 0) {
      k.set(i, i - 1, -g[i] / (root[i] * root[i - 1]));
      k.set(i - 1, i, -g[i] / (root[i] * root[i - 1]));
    }
  }
  const found = new EigenvalueDecomposition(k, { assumeSymmetric: true });
  const q = found.eigenvectorMatrix;
  const shape = new Float64Array(n * m);
  const byA = new Float64Array(n);
  const byB = new Float64Array(n);
  let after = 0; // place in `reach` of the next massive node or B
  for (let i = 0; i < n; i++) {
    while (reach[after] < i) after++;
    const [left, right] = reach[after] === i ? [after, after] : [after - 1, after];
    const share =
      left === right
        ? 1
        : (place(i) - place(reach[left])) / (place(reach[right]) - place(reach[left]));
    for (const [at, weight] of [
      [left, left === right ? 0 : 1 - share],
      [right, share],
    ]) {
      if (weight === 0) continue;
      if (at === 0) byA[i] += weight;
      else if (at === m + 1) byB[i] += weight;
      else
        for (let j = 0; j < m; j++) shape[i * m + j] += (weight * q.get(at - 1, j)) / root[at - 1];
    }
  }
  const over = (of: (j: number) => number) => Float64Array.from({ length: m }, (_, j) => of(j));
  return {
    lambda: found.realEigenvalues,
    alpha: over((j) => (q.get(0, j) * g[0]) / root[0]),
    beta: over((j) => (q.get(m - 1, j) * g[m]) / root[m - 1]),
    heat: over((j) => root.reduce((sum, r, i) => sum + r * q.get(i, j), 0)),
    shape,
    byA,
    byB,
  };
}

/**
 * @param tauS length of a stage
 * @param carry weight of the first stage in the start of the second
 */
export function compileModes(
  chains: Chains,
  capacityJPerK: Float64Array,
  tauS: number,
  carry: number,
): ChainModes {
  const { count, node } = chains;
  const own = Float64Array.from(node, (v) => capacityJPerK[v]);
  const start = new Int32Array(count + 1);
  const shapeStart = new Int32Array(node.length);
  const all: OneChain[] = [];
  let shapes = 0;
  for (let c = 0; c < count; c++) {
    const from = chains.start[c];
    const to = chains.start[c + 1];
    const one = modesOf(
      own.slice(from, to),
      chains.towardsA.slice(from, to),
      chains.towardsB[to - 1],
    );
    const m = one.lambda.length;
    start[c + 1] = start[c] + m;
    for (let i = from; i < to; i++) shapeStart[i] = shapes + (i - from) * m;
    shapes += one.shape.length;
    all.push(one);
  }
  const modes = start[count];
  const byMode = () => new Float64Array(modes);
  const byChain = () => new Float64Array(count);
  const result: ChainModes = {
    start,
    coefficients: new Float64Array(modes * width),
    z: byMode(),
    history: new Float64Array(4 * count),
    now: new Float64Array(2 * count),
    secondAA: byChain(),
    secondAB: byChain(),
    secondBB: byChain(),
    heatJ: byChain(),
    decay1: byMode(),
    drive1A: byMode(),
    drive1B: byMode(),
    shapeStart,
    shape: new Float64Array(shapes),
    byA: new Float64Array(node.length),
    byB: new Float64Array(node.length),
    capacityJPerK: own,
  };
  let at = 0;
  all.forEach((one, c) => {
    result.byA.set(one.byA, chains.start[c]);
    result.byB.set(one.byB, chains.start[c]);
    result.shape.set(one.shape, at);
    at += one.shape.length;
    one.lambda.forEach((lambda, j) => {
      const [alpha, beta] = [one.alpha[j], one.beta[j]];
      const d = 1 / (1 + tauS * lambda);
      const e = d * (1 - carry + carry * d);
      const first = carry * tauS * d * d;
      const second = tauS * d;
      const k = start[c] + j;
      result.coefficients.set(
        [
          e,
          first * alpha,
          first * beta,
          second * alpha,
          second * beta,
          d * alpha,
          d * beta,
          e * alpha,
          e * beta,
          one.heat[j],
        ],
        k * width,
      );
      result.secondAA[c] += first * alpha * alpha;
      result.secondAB[c] += first * alpha * beta;
      result.secondBB[c] += first * beta * beta;
      result.decay1[k] = d;
      result.drive1A[k] = second * alpha;
      result.drive1B[k] = second * beta;
    });
  });
  return result;
}

/** Takes the modes from the temperatures of the nodes inside, `x[at + i]`, and makes the histories. */
export function placeModes(chains: Chains, modes: ChainModes, x: Float64Array, at: number): void {
  const { start, z, shape, shapeStart, capacityJPerK } = modes;
  for (let c = 0; c < chains.count; c++) {
    for (let k = start[c]; k < start[c + 1]; k++) {
      let sum = 0; // z = Φᵀ·C·T; nodes without mass weigh nothing
      for (let i = chains.start[c]; i < chains.start[c + 1]; i++) {
        sum += shape[shapeStart[i] + k - start[c]] * capacityJPerK[i] * x[at + i];
      }
      z[k] = sum;
    }
    advanceChain(modes, c, 0, 0, 0, 0, false);
  }
}

/** Moves all chains on by a step whose ends were at `x1` and `x2`; slots of the ends are given. */
export function advanceModes(
  modes: ChainModes,
  slotA: Int32Array,
  slotB: Int32Array,
  x1: Float64Array,
  x2: Float64Array,
): void {
  for (let c = 0; c < slotA.length; c++) {
    const a = slotA[c];
    const b = slotB[c];
    advanceChain(modes, c, x1[a], x1[b], x2[a], x2[b], true);
  }
}

function advanceChain(
  modes: ChainModes,
  c: number,
  a1: number,
  b1: number,
  a2: number,
  b2: number,
  moves: boolean,
): void {
  const { start, coefficients: w, z, history, heatJ } = modes;
  const end = start[c + 1];
  let p = start[c] * width;
  let toA1 = 0;
  let toB1 = 0;
  let toA2 = 0;
  let toB2 = 0;
  let heat = 0;
  for (let k = start[c]; k < end; k++, p += width) {
    let v = z[k];
    if (moves) {
      v = w[p] * v + (w[p + 1] * a1 + w[p + 2] * b1) + (w[p + 3] * a2 + w[p + 4] * b2);
      z[k] = v;
    }
    toA1 += w[p + 5] * v;
    toB1 += w[p + 6] * v;
    toA2 += w[p + 7] * v;
    toB2 += w[p + 8] * v;
    heat += w[p + 9] * v;
  }
  const h = 4 * c;
  history[h] = toA1;
  history[h + 1] = toB1;
  history[h + 2] = toA2;
  history[h + 3] = toB2;
  heatJ[c] = heat;
}

/** Histories of stage 1 onto the right-hand side of the ends. */
export function addFirstHistory(
  modes: ChainModes,
  slotA: Int32Array,
  slotB: Int32Array,
  b: Float64Array,
): void {
  const { history, now } = modes;
  for (let c = 0; c < slotA.length; c++) {
    const toA = history[4 * c];
    const toB = history[4 * c + 1];
    now[2 * c] = toA;
    now[2 * c + 1] = toB;
    b[slotA[c]] += toA;
    b[slotB[c]] += toB;
  }
}

/** Histories of stage 2, the ends having been at `x1` in stage 1. */
export function addSecondHistory(
  modes: ChainModes,
  slotA: Int32Array,
  slotB: Int32Array,
  x1: Float64Array,
  b: Float64Array,
): void {
  const { history, now, secondAA, secondAB, secondBB } = modes;
  for (let c = 0; c < slotA.length; c++) {
    const a1 = x1[slotA[c]];
    const b1 = x1[slotB[c]];
    const toA = history[4 * c + 2] + secondAA[c] * a1 + secondAB[c] * b1;
    const toB = history[4 * c + 3] + secondAB[c] * a1 + secondBB[c] * b1;
    now[2 * c] = toA;
    now[2 * c + 1] = toB;
    b[slotA[c]] += toA;
    b[slotB[c]] += toB;
  }
}

/** Temperature of node i inside chain c, after the step's end (`first` false) or at its first stage,
 * which must be asked for before the step is taken. */
export function insideC(
  modes: ChainModes,
  c: number,
  i: number,
  a: number,
  b: number,
  first: boolean,
): number {
  const { start, z, shape, shapeStart, byA, byB, decay1, drive1A, drive1B } = modes;
  let sum = byA[i] * a + byB[i] * b;
  for (let k = start[c]; k < start[c + 1]; k++) {
    const v = first ? decay1[k] * z[k] + drive1A[k] * a + drive1B[k] * b : z[k];
    sum += shape[shapeStart[i] + k - start[c]] * v;
  }
  return sum;
}
