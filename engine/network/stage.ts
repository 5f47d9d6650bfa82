// One implicit stage:  C/Δt·(T − T_start) = q(t, T) − K(t, T)·T, plants included.
//
// The matrix holds constants, the links that drivers set, slopes of state-dependent laws and plant rows;
// each is brought up to date entry by entry, and only rows that depend on a change are factored again.
// Slopes in the matrix may lag behind the state (a chord step): every flow is then taken as
//   flow = law(state) + slope in matrix · (change), which balances exactly and differs from the law
// by (slope error · last change), with the last change below the tolerance.

import { type Blocks, blockOfRow, compileBlocks } from './blocks.ts';
import { type ChainFactors, factorChains } from './chain-sweeps.ts';
import { compileDriven, type DrivenLinks } from './driven-links.ts';
import { compileLoads, type DriverLoads, type Tie } from './driver-loads.ts';
import { compileEnclosures, type Enclosures } from './enclosures.ts';
import { compileFaint, type FaintLinks } from './faint.ts';
import type { Layout } from './layout.ts';
import { compileLinks, type StateLinks } from './links.ts';
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
  /** Exchanges of the faint links summed at each row [W]. */
  readonly faintSum: Float64Array;
  readonly blockOf: Int32Array;
  /** 1 for a row that is a node, 0 for a plant's power. */
  readonly isNode: Float64Array;
  /** Scratch by block: to be solved again. */
  readonly again: Uint8Array;
  /** Right-hand side before the iteration, and in it; by slot. */
  readonly before: Float64Array;
  readonly b: Float64Array;
  /** State at which the laws are evaluated. */
  readonly at: Float64Array;
  /** Whether the laws were evaluated yet. */
  loaded: boolean;
  /** Stages solved. */
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
  const blockOf = blockOfRow(layout);
  const laws = compileLinks(network, slotOfNode, firstFixed, (slot) =>
    slot < rows ? blockOf[slot] : layout.order.blockStart.length - 1,
  );
  const { from, to } = laws;
  const entry = (a: number, b: number) => (a < rows && b < rows ? entryOf(lu, a, b) : spare);
  const lightness = new Float64Array(slotCount);
  for (let row = 0; row < rows; row++) {
    const own = constant[lu.diagonal[row]];
    lightness[row] = own > 0 ? 1 / own : 1e3;
  }
  const enclosures = compileEnclosures(layout, lu, spare);
  return {
    layout,
    lu,
    chain,
    faint: compileFaint(layout, chain, lightness),
    driven: compileDriven(layout, lu, spare, constant),
    loads: compileLoads(layout, series, ties),
    laws,
    enclosures,
    blocks: compileBlocks(layout, laws, enclosures),
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
    faintSum: new Float64Array(rows),
    blockOf,
    isNode: Float64Array.from({ length: rows }, (_, row) => (layout.nodeOfSlot[row] >= 0 ? 1 : 0)),
    again: new Uint8Array(layout.order.blockStart.length),
    before: new Float64Array(slotCount),
    b: new Float64Array(slotCount),
    at: new Float64Array(slotCount),
    loaded: false,
    solves: 0,
  };
}
