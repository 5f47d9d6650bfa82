// Solves one stage: history and drivers into the right-hand side, then iteration over the rows that
// depend on the state, then substitution into all other nodes.

import { sweepBackward, sweepForward } from './chain-sweeps.ts';
import { driveLinks } from './driven-links.ts';
import { evaluateEmission } from './enclosures.ts';
import { evaluateLaws } from './laws.ts';
import { solveBackward, solveForward } from './sparse-lu.ts';
import type { Stage } from './stage.ts';
import { addRests, loadDrivers, loadSlopes, refresh } from './stage-matrix.ts';
import { loadUnits, nextMode, settleModes } from './units-state.ts';

/** The estimated rest of the iteration may be this share of the tolerance. */
const tailShare = 0.1;
/** From this iteration on, slopes are always renewed and the state moves half-way only. */
const cautious = 12;
/** From this iteration on, one plant changes its branch at a time. */
const single = 20;

/** What a solve came to. `iterations` counts linear solves. */
export interface Solved {
  iterations: number;
  converged: boolean;
  /** Row without a pivot, or −1. */
  singularRow: number;
}

/**
 * Solves the stage that starts from wBase·base + wPrev·prev.
 *
 * Called twice a step, so it allocates nothing.
 * @param x in: a guess for the rows; out: the state, all slots
 * @param series drivers at the stage's time
 * @param step passed on to function links
 */
export function solveStage(
  stage: Stage,
  base: Float64Array,
  prev: Float64Array,
  wBase: number,
  wPrev: number,
  x: Float64Array,
  series: Float64Array,
  step: number,
  toleranceK: number,
  maxIterations: number,
  solved: Solved,
): void {
  const { layout, lu, before, b, at, units, laws, enclosures } = stage;
  const { rows, firstFixed, firstChain, firstState, fixedSeries } = layout;
  solved.iterations = 0;
  solved.converged = false;
  solved.singularRow = -1;
  for (let i = 0; i < fixedSeries.length; i++) {
    x[firstFixed + i] = series[fixedSeries[i]];
    at[firstFixed + i] = x[firstFixed + i];
  }
  if (driveLinks(stage.driven, series)) loadDrivers(stage);
  loadHistory(stage, base, prev, wBase, wPrev, x, series);
  settleModes(units);
  const linear = laws.count === 0 && enclosures.slot.length === 0;
  for (let i = firstState; i < rows; i++) at[i] = x[i];

  let lastChange = Infinity;
  let slow = false;
  for (let k = 1; k <= maxIterations; k++) {
    for (let i = firstState; i < rows; i++) b[i] = before[i];
    if (!linear) {
      evaluateLaws(laws, at, series, step);
      evaluateEmission(enclosures, at);
      const lag = addRests(stage);
      const renew = slow || k >= cautious || !(lag <= stage.lagLimit);
      if (renew || !stage.loaded) loadSlopes(stage, renew);
      if (renew) {
        for (let i = firstState; i < rows; i++) b[i] = before[i];
        addRests(stage);
      }
    } else if (!stage.loaded) loadSlopes(stage, true);
    solved.singularRow = refresh(stage);
    if (solved.singularRow >= 0) return;
    if (k === 1) {
      solveForward(lu, before, 0, firstState);
      for (let i = 0; i < firstState; i++) b[i] = before[i];
    }
    loadUnits(units, x, b, firstFixed);
    solveForward(lu, b, firstState, rows);
    solveBackward(lu, b, x, firstState, rows);
    solved.iterations = k;

    let change = 0;
    for (let i = firstState; i < rows; i++) {
      const d = Math.abs(x[i] - at[i]);
      if ((d > change || Number.isNaN(d)) && layout.nodeOfSlot[i] >= 0) change = d; // NaN stays
    }
    const switched = exchangeModes(stage, x, k >= single);
    // What is left shrinks by the same share as the last change did (a geometric tail).
    const share = change / lastChange;
    const known = lastChange < Infinity && share < 0.5;
    const left = known ? (change * share) / (1 - share) : change;
    if (!switched && (linear || left <= tailShare * toleranceK || change <= toleranceK)) {
      solved.converged = true;
      break;
    }
    if (!(change < Infinity)) break;
    slow = change > 0.1 * lastChange;
    lastChange = switched ? Infinity : change;
    const way = k >= cautious ? 0.5 : 1;
    for (let i = firstState; i < rows; i++) at[i] += way * (x[i] - at[i]);
  }
  solveBackward(lu, b, x, 0, firstState);
  sweepBackward(layout.chains, stage.chain, layout.chainSlotA, layout.chainSlotB, firstChain, x);
}

/** Right-hand side of all rows as far as it does not depend on the state. */
function loadHistory(
  stage: Stage,
  base: Float64Array,
  prev: Float64Array,
  wBase: number,
  wPrev: number,
  x: Float64Array,
  series: Float64Array,
): void {
  const { layout, before, storage, driven, tieRow, tieSlot, tieWPerK, sourceSlot } = stage;
  const { rows, chains } = layout;
  for (let i = 0; i < rows; i++) before[i] = storage[i] * (wBase * base[i] + wPrev * prev[i]);
  const { chainSlotA, chainSlotB, firstChain } = layout;
  sweepForward(
    chains,
    stage.chain,
    chainSlotA,
    chainSlotB,
    firstChain,
    base,
    prev,
    wBase,
    wPrev,
    before,
  );
  for (let t = 0; t < tieRow.length; t++) before[tieRow[t]] += tieWPerK[t] * x[tieSlot[t]];
  const { inflowLink, inflowRow, inflowSlot, conductanceWPerK } = driven;
  for (let t = 0; t < inflowLink.length; t++) {
    before[inflowRow[t]] += conductanceWPerK[inflowLink[t]] * x[inflowSlot[t]];
  }
  const { factor, series: of } = layout.network.sources;
  for (let k = 0; k < sourceSlot.length; k++) before[sourceSlot[k]] += factor[k] * series[of[k]];
}

/** Moves units to the branch they belong on; true where any moved. */
function exchangeModes(stage: Stage, x: Float64Array, onlyOne: boolean): boolean {
  const { units } = stage;
  let moved = false;
  for (let u = 0; u < units.count; u++) {
    const next = nextMode(units, u, x);
    if (next === units.mode[u]) continue;
    units.mode[u] = next;
    moved = true;
    if (onlyOne) return true;
  }
  return moved;
}
