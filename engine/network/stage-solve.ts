// Solves one stage: history and drivers into the right-hand side, then iteration over the rows that
// depend on the state, then substitution into the others.
//
// The first round takes the linearisations as the last stage left them: it hears every driver and costs
// no law. From then on laws are evaluated where the round before ended, with slopes kept while they are
// good. A round's error shrinks by the lag of the slopes (a chord's contraction), which is measured with
// every evaluation: that bounds what is left without another round to show it.

import { driveLinks } from './driven-links.ts';
import { addMovingLoads } from './driver-loads.ts';
import { solveBackward, solveForward } from './sparse-lu.ts';
import type { Stage } from './stage.ts';
import { buildMatrix, linearise, refresh } from './stage-matrix.ts';
import { loadUnits, nextMode, settleModes } from './units-state.ts';

/** Lag from which the slopes of a block are renewed. */
const lagLimit = 0.003;
/** Contraction counted with at least: the lag at one point says nothing of the bend on the way. */
const leastContraction = 0.003;
/** Lags of several links and of neighbours add up: the contraction is taken as this many times the largest. */
const guard = 4;
/** From this iteration on, slopes are always renewed and the state moves half-way only. */
const cautious = 12;
/** From this iteration on, one plant changes its branch at a time. */
const single = 20;
/** Stages after which the matrix is put together anew. */
const stagesPerBuild = 5000;

/** What a solve came to. `iterations` counts linear solves. */
export interface Solved {
  iterations: number;
  converged: boolean;
  /** Row without a pivot, or −1. */
  singularRow: number;
}

/**
 * Right-hand side of all rows as far as it does not depend on the state, but for the chains' histories;
 * the stage starts from wBase·base + wPrev·prev. Boundaries are set in `x`.
 */
export function loadStage(
  stage: Stage,
  base: Float64Array,
  prev: Float64Array,
  wBase: number,
  wPrev: number,
  x: Float64Array,
  series: Float64Array,
): void {
  const { layout, before, storage, driven, loads, at, matrix, lu } = stage;
  const { rows, firstFixed, fixedSeries } = layout;
  for (let i = 0; i < fixedSeries.length; i++) {
    const t = series[fixedSeries[i]];
    x[firstFixed + i] = t;
    at[firstFixed + i] = t;
  }
  if (driveLinks(driven, series, matrix, lu.dirty)) stage.stale = true;
  const { heldW } = loads;
  for (let i = 0; i < rows; i++) {
    before[i] = heldW[i] + storage[i] * (wBase * base[i] + wPrev * prev[i]);
  }
  addMovingLoads(loads, series, before);
  const { inflowLink, inflowRow, inflowSlot, conductanceWPerK } = driven;
  for (let t = 0; t < inflowLink.length; t++) {
    before[inflowRow[t]] += conductanceWPerK[inflowLink[t]] * x[inflowSlot[t]];
  }
}

/**
 * Solves the stage that was loaded. Called twice a step, so it allocates nothing.
 * @param x in: a guess for the rows; out: rows and boundaries
 * @param series drivers at the stage's time
 * @param step passed on to function links
 */
export function solveStage(
  stage: Stage,
  x: Float64Array,
  series: Float64Array,
  step: number,
  toleranceK: number,
  maxIterations: number,
  solved: Solved,
): void {
  const { layout, lu, before, b, at, units, restSum, isLinear, stateRows, faint } = stage;
  const { rows, firstFixed, firstState } = layout;
  solved.iterations = 0;
  solved.converged = false;
  solved.singularRow = -1;
  if (stage.solves++ % stagesPerBuild === 0) buildMatrix(stage);
  settleModes(units);

  let contraction = 0;
  let lastChange = Infinity;
  let slow = false;
  /** Whether the laws were evaluated at `at` for this round. */
  let isFresh = false;
  let stay = false;
  for (let k = 1; k <= maxIterations; k++) {
    if (!isLinear && !stay && (k > 1 || !stage.loaded)) {
      const way = k > cautious ? 0.5 : 1;
      for (let i = firstState; i < rows; i++) at[i] = k > 1 ? at[i] + way * (x[i] - at[i]) : x[i];
      const limit = slow || k >= cautious ? -1 : lagLimit;
      const lag = linearise(stage, series, step, limit);
      contraction = guard * Math.max(lag, leastContraction, faint.share);
      isFresh = true;
    }
    solved.singularRow = refresh(stage);
    if (solved.singularRow >= 0) return;
    if (k === 1) {
      solveForward(lu, before, 0, firstState);
      for (let i = 0; i < firstState; i++) b[i] = before[i];
    }
    for (let i = firstState; i < rows; i++) b[i] = before[i] + restSum[i];
    loadUnits(units, x, b, firstFixed);
    solveForward(lu, b, firstState, rows);
    solveBackward(lu, b, x, firstState, rows);
    solved.iterations = k;

    const switched = units.count > 0 && exchangeModes(stage, x, k >= single);
    if (isLinear) {
      if (switched) continue;
      solved.converged = true;
      break;
    }
    // A switched plant is solved for again around the same state before any law is asked.
    stay = switched && !stay;
    if (stay) continue;
    if (!isFresh) {
      for (let i = 0; i < stateRows.length; i++) at[stateRows[i]] = x[stateRows[i]];
      continue;
    }
    let change = 0;
    let missing = 0;
    for (let i = 0; i < stateRows.length; i++) {
      const r = stateRows[i];
      const d = Math.abs(x[r] - at[r]);
      missing += d - d; // 0, or NaN for ever
      if (d > change) change = d;
    }
    if (missing !== 0 || change === Infinity) break;
    const share = change / lastChange;
    const seen = lastChange < Infinity && share < 0.5 ? share / (1 - share) : 1;
    const left = change * Math.min(seen, contraction);
    if (!switched && (left <= toleranceK || change <= toleranceK)) {
      solved.converged = true;
      break;
    }
    slow = share > 0.1;
    lastChange = switched ? Infinity : change;
  }
  solveBackward(lu, b, x, 0, firstState);
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
