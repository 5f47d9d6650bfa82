// Faint couplings: walls so thick that one face hardly feels the other within a stage. Their exchange
// g·(T_A − T_B) is left out of the matrix (which falls apart into rooms) and taken along by the
// iteration, as one flow that leaves one end and enters the other: conservative at every round.

import type { ChainFactors } from './chain-sweeps.ts';
import type { Chains } from './chains.ts';
import type { Layout } from './layout.ts';
import type { Network } from './problem.ts';

/** Largest share of its end's own entry that an exchange may have, the iteration's contraction. */
const faintShare = 2e-3;

export interface FaintLinks {
  readonly count: number;
  readonly a: Int32Array;
  readonly b: Int32Array;
  readonly wPerK: Float64Array;
  /** Largest share of an exchange in its ends' own entries. */
  share: number;
}

/** Chains between two unknowns that count as faint in a stage of `stageS`. */
export function faintChains(
  network: Network,
  chains: Chains,
  factors: ChainFactors,
  stageS: number,
): Uint8Array {
  const faint = new Uint8Array(chains.count);
  const { boundarySeries, capacityJPerK } = network;
  for (let c = 0; c < chains.count; c++) {
    const [a, b] = [chains.endA[c], chains.endB[c]];
    if (a === b || boundarySeries[a] >= 0 || boundarySeries[b] >= 0) continue;
    const ownA = factors.ownA[c] + capacityJPerK[a] / stageS;
    const ownB = factors.ownB[c] + capacityJPerK[b] / stageS;
    if (factors.exchange[c] < faintShare * Math.min(ownA, ownB)) faint[c] = 1;
  }
  return faint;
}

export function compileFaint(layout: Layout, factors: ChainFactors): FaintLinks {
  const list: number[] = [];
  layout.faint.forEach((is, c) => {
    if (is === 1) list.push(c);
  });
  return {
    count: list.length,
    a: Int32Array.from(list, (c) => layout.chainSlotA[c]),
    b: Int32Array.from(list, (c) => layout.chainSlotB[c]),
    wPerK: Float64Array.from(list, (c) => factors.exchange[c]),
    share: 0,
  };
}

/** Adds the exchange at state `x` to the right-hand side. */
export function addFaint(faint: FaintLinks, x: Float64Array, b: Float64Array): void {
  const { count, a, b: other, wPerK } = faint;
  for (let k = 0; k < count; k++) {
    const q = wPerK[k] * (x[a[k]] - x[other[k]]);
    b[a[k]] -= q;
    b[other[k]] += q;
  }
}
