// One implicit stage:  C/Δt·(T − T_start) = q(t, T) − K(t, T)·T, plants included.
//
// The matrix holds constants, the links that drivers set, slopes of state-dependent laws and plant rows;
// each is brought up to date entry by entry, and only rows that depend on a change are factored again.
// Slopes in the matrix may lag behind the state (a chord step): every flow is then taken as
//   flow = law(state) + slope in matrix · (change), which balances exactly and differs from the law
// by (slope error · last change), with the last change below the tolerance.

import { type Blocks, compileBlocks } from './blocks.ts';
import { type ChainFactors, factorChains } from './chain-sweeps.ts';
import { compileDriven, type DrivenLinks } from './driven-links.ts';
import { compileLoads, type DriverLoads, type Tie } from './driver-loads.ts';
import { compileEnclosures, type Enclosures } from './enclosures.ts';
import { compileFaint, type FaintLinks } from './faint.ts';
import { compileLaws, type StateLinks } from './laws.ts';
import type { Layout } from './layout.ts';
import type { Series } from './problem.ts';
import { createLu, entryOf, type SparseLu } from './sparse-lu.ts';
import { compileUnits, type UnitsState } from './units-state.ts';

export interface Stage {
  readonly layout: Layout;
  readonly lu: SparseLu;
  readonly chain: ChainFactors;
  readonly faint: FaintLinks;
  readonly driven: DrivenLinks;
  readonly loads: DriverLoads;
  readonly laws: StateLinks;
  readonly enclosures: Enclosures;
  readonly blocks: Blocks;
  readonly units: UnitsState;
  /** C/Δt of each row [W/K]. */
  readonly storage: Float64Array;
  /** Constant entries, and the matrix; the last entry is a spare that absorbs what has no place. */
  readonly constant: Float64Array;
  readonly matrix: Float64Array;
  /** Slopes in the matrix, and what each linearisation leaves: flow = slopeFrom·Tf − slopeTo·Tt + rest. */
  readonly slopeFrom: Float64Array;
  readonly slopeTo: Float64Array;
  readonly rest: Float64Array;
  /** All rests summed at each slot [W]. */
  readonly restSum: Float64Array;
  readonly lawEntry: {
    readonly ownFrom: Int32Array;
    readonly ownTo: Int32Array;
    readonly atFrom: Int32Array;
    readonly atTo: Int32Array;
  };
  /** How much a wrong slope of each link, or emission slope of each member, weighs at its nodes. */
  readonly linkWeight: Float64Array;
  readonly memberWeight: Float64Array;
  /** Whether nothing depends on the state but the plants. */
  readonly isLinear: boolean;
  /** Rows from `firstState` on that are nodes. */
  readonly stateRows: Int32Array;
  /** Right-hand side before the iteration, and in it; by slot. */
  readonly before: Float64Array;
  readonly b: Float64Array;
  /** State at which the laws are evaluated. */
  readonly at: Float64Array;
  /** Whether any row is dirty. */
  stale: boolean;
  /** Whether the laws were evaluated yet. */
  loaded: boolean;
  /** Stages solved, and rebuilds of factors, for the record. */
  solves: number;
}

/** Everything that one stage length needs. `stageS` Infinity gives the steady state. */
export function createStage(layout: Layout, series: readonly Series[], stageS: number): Stage {
  const { network, rows, slotOfNode, slotCount, firstFixed, chains, units } = layout;
  const lu = createLu(layout.order, slotCount);
  const spare = lu.column.length;
  const constant = new Float64Array(spare + 1);
  const storage = new Float64Array(rows);
  for (let row = 0; row < rows; row++) {
    const node = layout.nodeOfSlot[row];
    if (node < 0) continue;
    storage[row] = network.capacityJPerK[node] / stageS;
    constant[lu.diagonal[row]] += storage[row];
  }
  const ties: Tie[] = [];
  const tie = (a: number, b: number, ownA: number, ownB: number, exchange: number) => {
    if (a < rows) constant[lu.diagonal[a]] += ownA;
    if (b < rows) constant[lu.diagonal[b]] += ownB;
    if (a < rows && b < rows) {
      constant[entryOf(lu, a, b)] -= exchange;
      constant[entryOf(lu, b, a)] -= exchange;
    } else if (a < rows) ties.push([a, b, exchange]);
    else if (b < rows) ties.push([b, a, exchange]);
  };
  for (const group of network.links) {
    if (group.law !== 'constant') continue;
    for (let k = 0; k < group.from.length; k++) {
      const a = slotOfNode[group.from[k]];
      const b = slotOfNode[group.to[k]];
      const g = group.conductanceWPerK[k];
      if (a < layout.firstChain && b < layout.firstChain && g !== 0) tie(a, b, g, g, g);
    }
  }
  const chain = factorChains(chains, network.capacityJPerK, stageS);
  for (let c = 0; c < chains.count; c++) {
    const a = layout.chainSlotA[c];
    const b = layout.chainSlotB[c];
    const exchange = chain.exchange[c];
    if (layout.faint[c] === 0) tie(a, b, chain.ownA[c], chain.ownB[c], exchange);
    else {
      constant[lu.diagonal[a]] += chain.ownA[c] - exchange;
      constant[lu.diagonal[b]] += chain.ownB[c] - exchange;
    }
  }
  units.forEach((unit, u) => {
    unit.deliveryNodes.forEach((v, i) => {
      const row = slotOfNode[v];
      if (row < rows) constant[entryOf(lu, row, layout.rowOfUnit[u])] -= unit.deliveryShares[i];
    });
  });
  const laws = compileLaws(network, slotOfNode, firstFixed);
  const { from, to } = laws;
  const entry = (a: number, b: number) => (a < rows && b < rows ? entryOf(lu, a, b) : spare);
  const lightness = new Float64Array(slotCount);
  for (let row = 0; row < rows; row++) {
    const own = constant[lu.diagonal[row]];
    lightness[row] = own > 0 ? 1 / own : 1e3;
  }
  const faint = compileFaint(layout, chain);
  for (let k = 0; k < faint.count; k++) {
    const weight = Math.max(lightness[faint.a[k]], lightness[faint.b[k]]);
    faint.share = Math.max(faint.share, 2 * faint.wPerK[k] * weight);
  }
  const enclosures = compileEnclosures(layout, lu, spare);
  const stateRows: number[] = [];
  for (let row = layout.firstState; row < rows; row++) {
    if (layout.nodeOfSlot[row] >= 0) stateRows.push(row);
  }
  return {
    layout,
    lu,
    chain,
    faint,
    driven: compileDriven(layout, lu, spare, constant),
    loads: compileLoads(layout, series, ties),
    laws,
    enclosures,
    blocks: compileBlocks(laws, enclosures, rows),
    units: compileUnits(layout, lu, spare),
    storage,
    constant,
    matrix: Float64Array.from(constant),
    slopeFrom: new Float64Array(laws.count),
    slopeTo: new Float64Array(laws.count),
    rest: new Float64Array(laws.count),
    restSum: new Float64Array(slotCount),
    lawEntry: {
      ownFrom: from.map((a) => entry(a, a)),
      ownTo: to.map((b) => entry(b, b)),
      atFrom: from.map((a, l) => entry(a, to[l])),
      atTo: to.map((b, l) => entry(b, from[l])),
    },
    linkWeight: Float64Array.from(from, (a, l) => Math.max(lightness[a], lightness[to[l]])),
    memberWeight: Float64Array.from(
      enclosures.slot,
      (slot, m) => lightness[slot] * enclosures.rowSumM2[m],
    ),
    isLinear: laws.count === 0 && enclosures.slot.length === 0 && faint.count === 0,
    stateRows: Int32Array.from(stateRows),
    before: new Float64Array(slotCount),
    b: new Float64Array(slotCount),
    at: new Float64Array(slotCount),
    stale: true,
    loaded: false,
    solves: 0,
  };
}
