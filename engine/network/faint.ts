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
  /** 1/own entry at the lighter end: how far 1 W moves it [K/W]. */
  readonly weight: Float64Array;
  /** Exchange in use, from A to B [W]. */
  readonly flowW: Float64Array;
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

export function compileFaint(
  layout: Layout,
  factors: ChainFactors,
  lightness: Float64Array,
): FaintLinks {
  const list: number[] = [];
  layout.faint.forEach((is, c) => {
    if (is === 1) list.push(c);
  });
  return {
    count: list.length,
    a: Int32Array.from(list, (c) => layout.chainSlotA[c]),
    b: Int32Array.from(list, (c) => layout.chainSlotB[c]),
    wPerK: Float64Array.from(list, (c) => factors.exchange[c]),
    weight: Float64Array.from(list, (c) =>
      Math.max(lightness[layout.chainSlotA[c]], lightness[layout.chainSlotB[c]]),
    ),
    flowW: new Float64Array(list.length),
  };
}

/** Sets all exchanges to those at state `x` and sums them at the rows. */
export function setFaint(faint: FaintLinks, x: Float64Array, sumW: Float64Array): void {
  const { count, a, b, wPerK, flowW } = faint;
  for (let k = 0; k < count; k++) {
    sumW[a[k]] = 0;
    sumW[b[k]] = 0;
  }
  for (let k = 0; k < count; k++) {
    const q = wPerK[k] * (x[a[k]] - x[b[k]]);
    flowW[k] = q;
    sumW[a[k]] -= q;
    sumW[b[k]] += q;
  }
}

/**
 * Renews the exchanges that state `x` has moved by more than `limitK` at either end, and marks the blocks
 * that have to be solved again.
 * @returns whether there are any
 */
export function renewFaint(
  faint: FaintLinks,
  x: Float64Array,
  sumW: Float64Array,
  limitK: number,
  blockOf: Int32Array,
  again: Uint8Array,
): boolean {
  const { count, a, b, wPerK, flowW, weight } = faint;
  let found = false;
  for (let k = 0; k < count; k++) {
    const q = wPerK[k] * (x[a[k]] - x[b[k]]);
    const change = q - flowW[k];
    if (Math.abs(change) * weight[k] <= limitK) continue;
    flowW[k] = q;
    sumW[a[k]] -= change;
    sumW[b[k]] += change;
    again[blockOf[a[k]]] = 1;
    again[blockOf[b[k]]] = 1;
    found = true;
  }
  return found;
}
