// Elimination of chains onto their ends, for one stage length.
//
// Interior node i of a chain:  (c + gA + gB)·T_i − gA·T_(i−1) − gB·T_(i+1) = c·Told_i,  c = C/Δt.
// Gaussian elimination from end A to end B, the coupling to A carried along:
//   pivot_i·T_i = y_i + a_i·T_A + gB_i·T_(i+1),   y_i = r_i + gA_i/pivot_(i−1)·y_(i−1).
// All factors are sums and products of positive numbers (no cancellation), so that the eliminated
// system conserves heat to rounding. What the histories r add, chain-modes.ts knows.

import type { Chains } from './chains.ts';

export interface ChainFactors {
  /** C/Δt of each interior node [W/K]. */
  readonly storage: Float64Array;
  readonly lower: Float64Array;
  /** 1/pivot. */
  readonly inverse: Float64Array;
  /** a/pivot: the share of T_A. */
  readonly shareA: Float64Array;
  /** gB/pivot: the share of the next node. */
  readonly shareNext: Float64Array;
  /** What each chain adds to the matrix: own entries at A and B, and the exchange between them [W/K]. */
  readonly ownA: Float64Array;
  readonly ownB: Float64Array;
  readonly exchange: Float64Array;
}

/** Factors of all chains; `stageS` Infinity gives the steady state. */
export function factorChains(
  chains: Chains,
  capacityJPerK: Float64Array,
  stageS: number,
): ChainFactors {
  const n = chains.node.length;
  const f: ChainFactors = {
    storage: Float64Array.from(chains.node, (v) => capacityJPerK[v] / stageS),
    lower: new Float64Array(n),
    inverse: new Float64Array(n),
    shareA: new Float64Array(n),
    shareNext: new Float64Array(n),
    ownA: new Float64Array(chains.count),
    ownB: new Float64Array(chains.count),
    exchange: new Float64Array(chains.count),
  };
  const { towardsA, towardsB, start } = chains;
  for (let c = 0; c < chains.count; c++) {
    let rest = 0; // pivot − gB of the node before
    let a = 0;
    for (let i = start[c]; i < start[c + 1]; i++) {
      const first = i === start[c];
      rest = first
        ? f.storage[i] + towardsA[i]
        : f.storage[i] + towardsA[i] * rest * f.inverse[i - 1];
      f.inverse[i] = 1 / (rest + towardsB[i]);
      f.lower[i] = first ? 0 : towardsA[i] * f.inverse[i - 1];
      a = first ? towardsA[i] : a * f.lower[i];
      f.shareA[i] = a * f.inverse[i];
      f.shareNext[i] = towardsB[i] * f.inverse[i];
    }
    const last = start[c + 1] - 1;
    f.ownB[c] = f.shareNext[last] * rest;
    f.exchange[c] = f.shareNext[last] * a;
    // Own entry at A: what passes to B plus what the nodes store, with T_A = 1 and T_B = 0.
    let own = f.exchange[c];
    let response = 0;
    for (let i = last; i >= start[c]; i--) {
      response = f.shareA[i] + f.shareNext[i] * response;
      own += f.storage[i] * response;
    }
    f.ownA[c] = own;
  }
  return f;
}

/** Temperatures inside the chains from those of the ends where nothing is stored, written into `x`. */
export function steadyInside(
  chains: Chains,
  f: ChainFactors,
  slotA: Int32Array,
  slotB: Int32Array,
  at: number,
  x: Float64Array,
): void {
  const { start, count } = chains;
  const { shareA, shareNext } = f;
  for (let c = 0; c < count; c++) {
    const atA = x[slotA[c]];
    let value = x[slotB[c]];
    for (let i = start[c + 1] - 1; i >= start[c]; i--) {
      value = shareA[i] * atA + shareNext[i] * value;
      x[at + i] = value;
    }
  }
}
