// Solves one stage: history and drivers into the right-hand side, then block by block.
//
// The first round takes the linearisations as the last stage left them: it hears every driver and costs
// no law. From then on a block's laws are evaluated where its round before ended, with slopes kept while
// they are good. A round's error shrinks by the lag of the slopes (a chord's contraction), which is
// measured with every evaluation: that bounds what is left without another round to show it.
// Blocks hear of one another through faint links; those that moved too far call for another sweep.

import { driveLinks } from './driven-links.ts';
import { addMovingLoads } from './driver-loads.ts';
import { renewFaint, setFaint } from './faint.ts';
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

/** What a solve came to. `iterations` counts rounds of the block that needed most. */
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
  const { layout, before, storage, driven, loads, at, matrix, lu, restSum } = stage;
  const { rows, firstFixed, fixedSeries } = layout;
  for (let i = 0; i < fixedSeries.length; i++) {
    const t = series[fixedSeries[i]];
    x[firstFixed + i] = t;
    at[firstFixed + i] = t;
    restSum[firstFixed + i] = 0;
  }
  driveLinks(driven, series, matrix, lu.dirty);
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
  const { blocks, faint, faintSum, again, blockOf, units } = stage;
  const { count, bends } = blocks;
  solved.iterations = 0;
  solved.converged = true;
  solved.singularRow = -1;
  if (stage.solves++ % stagesPerBuild === 0) buildMatrix(stage);
  if (units.count > 0) settleModes(units);
  setFaint(faint, x, faintSum);
  const isFirst = !stage.loaded;
  stage.loaded = true;
  for (let block = 0; block < count; block++) {
    if (bends[block] === 1 && isFirst) continue;
    solveLinear(stage, block, x, bends[block] === 1 ? 2 : maxIterations, solved);
    if (solved.singularRow >= 0) return;
  }
  for (let sweep = 0; ; sweep++) {
    again.fill(0);
    const found = renewFaint(faint, x, faintSum, 0.1 * toleranceK, blockOf, again);
    if (!found && sweep > 0) break;
    if (sweep >= maxIterations) {
      solved.converged = false;
      break;
    }
    for (let block = 0; block < count; block++) {
      if (bends[block] === 1 && (sweep === 0 || again[block] === 1)) {
        iterate(stage, block, x, series, step, toleranceK, maxIterations, solved);
      } else if (again[block] === 1) solveLinear(stage, block, x, maxIterations, solved);
      if (solved.singularRow >= 0) return;
    }
    if (!solved.converged) break;
  }
}

/** One linear solve of a block with the linearisations at hand. */
function solveBlock(stage: Stage, block: number, x: Float64Array, solved: Solved): void {
  const { lu, b, before, restSum, faintSum, blocks, units } = stage;
  solved.singularRow = refresh(stage, block);
  if (solved.singularRow >= 0) return;
  const from = blocks.rowStart[block];
  const to = blocks.rowStart[block + 1];
  for (let i = from; i < to; i++) b[i] = before[i] + restSum[i] + faintSum[i];
  const first = blocks.unitStart[block];
  const last = blocks.unitStart[block + 1];
  if (last > first) loadUnits(units, blocks.units, first, last, x, b, stage.layout.firstFixed);
  solveForward(lu, b, from, to);
  solveBackward(lu, b, x, from, to);
}

/** Solves a block around the state at which it was linearised until its plants stay on their branches. */
function solveLinear(
  stage: Stage,
  block: number,
  x: Float64Array,
  mostRounds: number,
  solved: Solved,
): void {
  for (let k = 1; k <= mostRounds; k++) {
    solveBlock(stage, block, x, solved);
    if (solved.singularRow >= 0) return;
    solved.iterations = Math.max(solved.iterations, k);
    if (!exchangeModes(stage, block, x, k >= single)) return;
  }
  if (stage.blocks.bends[block] === 0) solved.converged = false;
}

/** Iterates a block from the state in `x` until it obeys its laws. */
function iterate(
  stage: Stage,
  block: number,
  x: Float64Array,
  series: Float64Array,
  step: number,
  toleranceK: number,
  maxIterations: number,
  solved: Solved,
): void {
  const { at, blocks, isNode } = stage;
  const from = blocks.rowStart[block];
  const to = blocks.rowStart[block + 1];
  let lastChange = Infinity;
  let slow = false;
  for (let i = from; i < to; i++) at[i] = x[i];
  for (let k = 2; k <= maxIterations; k++) {
    const lag = linearise(stage, block, series, step, slow || k >= cautious ? -1 : lagLimit);
    const contraction = guard * Math.max(lag, leastContraction);
    solveBlock(stage, block, x, solved);
    if (solved.singularRow >= 0) return;
    let switched = exchangeModes(stage, block, x, k >= single);
    if (switched) {
      // Solved for again around the same state before any law is asked.
      solveBlock(stage, block, x, solved);
      if (solved.singularRow >= 0) return;
      switched = exchangeModes(stage, block, x, k >= single);
    }
    if (k > solved.iterations) solved.iterations = k;
    let change = 0;
    let missing = 0;
    for (let i = from; i < to; i++) {
      const d = Math.abs(x[i] - at[i]) * isNode[i];
      missing += d - d; // 0, or NaN for ever
      if (d > change) change = d;
    }
    if (missing !== 0) break;
    const share = change / lastChange;
    const seen = lastChange < Infinity && share < 0.5 ? share / (1 - share) : 1;
    const left = change * Math.min(seen, contraction);
    if (!switched && (left <= toleranceK || change <= toleranceK)) return;
    slow = share > 0.1;
    lastChange = switched ? Infinity : change;
    const way = k >= cautious ? 0.5 : 1;
    for (let i = from; i < to; i++) at[i] += way * (x[i] - at[i]);
  }
  solved.converged = false;
}

/** Moves the units of a block to the branch they belong on; true where any moved. */
function exchangeModes(stage: Stage, block: number, x: Float64Array, onlyOne: boolean): boolean {
  const { units, blocks } = stage;
  let moved = false;
  for (let k = blocks.unitStart[block]; k < blocks.unitStart[block + 1]; k++) {
    const u = blocks.units[k];
    const next = nextMode(units, u, x);
    if (next === units.mode[u]) continue;
    units.mode[u] = next;
    moved = true;
    if (onlyOne) return true;
  }
  return moved;
}
