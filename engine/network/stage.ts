// One implicit stage:  C/Δt·(T − T_start) = q(t, T) − K(t, T)·T, plants included.
//
// The matrix lives in three layers over one pattern: constant; with the links that drivers set; with
// slopes of state-dependent laws and plant rows. Each change refactors from the first row it touches.
// Slopes in the matrix may lag behind the state (a chord step): every flow is then taken as
//   flow = law(state) + slope in matrix · (change), which balances exactly and differs from the law
// by (slope error · last change), with the last change below the tolerance.

import { type ChainFactors, factorChains } from './chain-sweeps.ts';
import { compileDriven, type DrivenLinks } from './driven-links.ts';
import { compileEnclosures, type Enclosures } from './enclosures.ts';
import { compileLaws, type StateLinks } from './laws.ts';
import type { Layout } from './layout.ts';
import { createLu, entryOf, type SparseLu } from './sparse-lu.ts';
import { compileUnits, type UnitsState } from './units-state.ts';

export interface Stage {
  readonly layout: Layout;
  readonly lu: SparseLu;
  readonly chain: ChainFactors;
  readonly driven: DrivenLinks;
  readonly laws: StateLinks;
  readonly enclosures: Enclosures;
  readonly units: UnitsState;
  /** C/Δt of each row [W/K]. */
  readonly storage: Float64Array;
  /** Matrix layers; the last entry of each is a spare that absorbs what has no place. */
  readonly constant: Float64Array;
  readonly withDrivers: Float64Array;
  readonly matrix: Float64Array;
  /** Constant conductances between a row and a boundary (chains' own exchange included). */
  readonly tieRow: Int32Array;
  readonly tieSlot: Int32Array;
  readonly tieWPerK: Float64Array;
  readonly sourceSlot: Int32Array;
  /** Slopes in the matrix, and what each linearisation leaves: flow = slopeFrom·Tf − slopeTo·Tt + rest. */
  readonly slopeFrom: Float64Array;
  readonly slopeTo: Float64Array;
  readonly rest: Float64Array;
  readonly lawEntry: {
    readonly ownFrom: Int32Array;
    readonly ownTo: Int32Array;
    readonly atFrom: Int32Array;
    readonly atTo: Int32Array;
  };
  /** 1/diagonal of the constant layer, 0 at boundaries: how much a slope weighs at its node. */
  readonly lightness: Float64Array;
  /** Slopes in the matrix are renewed when they lag by more than this share of their node's own entry. */
  readonly lagLimit: number;
  /** Right-hand side before the iteration, and in it; by slot. */
  readonly before: Float64Array;
  readonly b: Float64Array;
  /** State at which the laws are evaluated. */
  readonly at: Float64Array;
  /** First row to factor again; `rows` when the factors are up to date. */
  stale: number;
  /** Whether slopes were put into the matrix yet. */
  loaded: boolean;
}

/** Lag of the slopes at which a small core is factored again: two iterations a stage, one factorisation. */
const leastLag = 0.003;
/** Ratio of factor to solve work up to which that pays, and the lag never passed. */
const cheapRatio = 3;
const mostLag = 0.03;

/** The dearer a factorisation against a solve (many rooms, much fill), the longer slopes are kept. */
function lagLimitFor(lu: SparseLu, firstState: number): number {
  let factorWork = 0;
  for (let i = firstState; i < lu.size; i++) {
    for (let p = lu.rowStart[i]; p < lu.diagonal[i]; p++) {
      const k = lu.column[p];
      factorWork += lu.rowStart[k + 1] - lu.diagonal[k];
    }
  }
  const solveWork = lu.rowStart[lu.size] - lu.rowStart[firstState];
  const ratio = solveWork > 0 ? factorWork / solveWork : 1;
  return Math.min(mostLag, leastLag * Math.max(1, ratio / cheapRatio));
}

/** Everything that one stage length needs. `stageS` Infinity gives the steady state. */
export function createStage(layout: Layout, stageS: number): Stage {
  const { network, rows, slotOfNode, slotCount, firstFixed, chains, units } = layout;
  const lu = createLu(layout.order);
  const spare = lu.column.length;
  const constant = new Float64Array(spare + 1);
  const storage = new Float64Array(rows);
  for (let row = 0; row < rows; row++) {
    const node = layout.nodeOfSlot[row];
    if (node < 0) continue;
    storage[row] = network.capacityJPerK[node] / stageS;
    constant[lu.diagonal[row]] += storage[row];
  }
  const ties: [number, number, number][] = [];
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
    tie(a, b, chain.ownA[c], chain.ownB[c], chain.exchange[c]);
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
  return {
    layout,
    lu,
    chain,
    driven: compileDriven(layout, lu, spare, constant),
    laws,
    enclosures: compileEnclosures(layout, lu, spare),
    units: compileUnits(layout, lu, spare),
    storage,
    constant,
    withDrivers: Float64Array.from(constant),
    matrix: Float64Array.from(constant),
    tieRow: Int32Array.from(ties, (t) => t[0]),
    tieSlot: Int32Array.from(ties, (t) => t[1]),
    tieWPerK: Float64Array.from(ties, (t) => t[2]),
    sourceSlot: network.sources.node.map((v) => slotOfNode[v]),
    slopeFrom: new Float64Array(laws.count),
    slopeTo: new Float64Array(laws.count),
    rest: new Float64Array(laws.count),
    lawEntry: {
      ownFrom: from.map((a) => entry(a, a)),
      ownTo: to.map((b) => entry(b, b)),
      atFrom: from.map((a, l) => entry(a, to[l])),
      atTo: to.map((b, l) => entry(b, from[l])),
    },
    lightness,
    lagLimit: lagLimitFor(lu, layout.firstState),
    before: new Float64Array(slotCount),
    b: new Float64Array(slotCount),
    at: new Float64Array(slotCount),
    stale: 0,
    loaded: false,
  };
}
