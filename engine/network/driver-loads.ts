// What drivers put on the right-hand side without asking the state: sources, and boundaries through
// constant links. Terms of drivers that hold over a step are summed once for all steps between two
// changes; those of drivers that move within it, at every stage.

import type { Layout } from './layout.ts';
import type { Series } from './problem.ts';

interface Terms {
  readonly row: Int32Array;
  readonly factor: Float64Array;
  readonly series: Int32Array;
}

export interface DriverLoads {
  readonly held: Terms;
  readonly moving: Terms;
  /** Sum of the held terms at each row [W]. */
  readonly heldW: Float64Array;
}

/** A constant link from a row to a boundary slot. */
export type Tie = readonly [row: number, slot: number, wPerK: number];

export function compileLoads(
  layout: Layout,
  series: readonly Series[],
  ties: readonly Tie[],
): DriverLoads {
  const { network, rows, slotOfNode, fixedSeries, firstFixed } = layout;
  const { node, factor, series: of } = network.sources;
  const sums = new Map<number, number>();
  const add = (row: number, at: number, value: number) => {
    const key = row * series.length + at;
    sums.set(key, (sums.get(key) ?? 0) + value);
  };
  for (let k = 0; k < node.length; k++) {
    const row = slotOfNode[node[k]];
    if (row < rows) add(row, of[k], factor[k]);
  }
  for (const [row, slot, g] of ties) add(row, fixedSeries[slot - firstFixed], g);
  const all = [...sums].sort((a, b) => a[0] - b[0]);
  const pick = (isHeld: boolean): Terms => {
    const terms = all.filter(([key]) => (series[key % series.length].hold === 'step') === isHeld);
    return {
      row: Int32Array.from(terms, ([key]) => Math.floor(key / series.length)),
      factor: Float64Array.from(terms, ([, value]) => value),
      series: Int32Array.from(terms, ([key]) => key % series.length),
    };
  };
  return { held: pick(true), moving: pick(false), heldW: new Float64Array(rows) };
}

function addTerms(terms: Terms, series: Float64Array, to: Float64Array): void {
  const { row, factor, series: of } = terms;
  for (let k = 0; k < row.length; k++) to[row[k]] += factor[k] * series[of[k]];
}

/** Sums the terms of the held drivers anew. */
export function holdLoads(loads: DriverLoads, series: Float64Array): void {
  loads.heldW.fill(0);
  addTerms(loads.held, series, loads.heldW);
}

/** Adds the terms of the moving drivers. */
export function addMovingLoads(loads: DriverLoads, series: Float64Array, b: Float64Array): void {
  addTerms(loads.moving, series, b);
}
