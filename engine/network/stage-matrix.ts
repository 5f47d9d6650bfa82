// Keeps the matrix of a stage up to date: linearisations, plant rows, factors.

import { assembleDriven } from './driven-links.ts';
import {
  addEnclosureRest,
  assembleEnclosures,
  evaluateEmission,
  renewEnclosure,
} from './enclosures.ts';
import { evaluateLinks } from './links.ts';
import { factorDirty } from './sparse-lu.ts';
import type { Stage } from './stage.ts';
import { assembleUnits, coolSet, heatSet, off, type UnitsState } from './units-state.ts';

/** Puts the matrix together from its parts, with the slopes in use: at first, and against the rounding of many changes. */
export function buildMatrix(stage: Stage): void {
  const { constant, matrix, laws, slopeFrom, slopeTo, enclosures, lu } = stage;
  for (let p = 0; p < matrix.length; p++) matrix[p] = constant[p];
  assembleDriven(stage.driven, matrix);
  const { ownFrom, ownTo, atFrom, atTo } = stage.lawEntry;
  for (let l = 0; l < laws.count; l++) {
    matrix[ownFrom[l]] += slopeFrom[l];
    matrix[atFrom[l]] -= slopeTo[l];
    matrix[ownTo[l]] += slopeTo[l];
    matrix[atTo[l]] -= slopeFrom[l];
  }
  assembleEnclosures(enclosures, matrix);
  stage.units.inMatrix.fill(255);
  lu.dirty.fill(1);
}

/** Renews the slope of link l in matrix and rest. */
function renewLink(stage: Stage, l: number): void {
  const { laws, slopeFrom, slopeTo, rest, restSum, at, matrix, lu } = stage;
  const { ownFrom, ownTo, atFrom, atTo } = stage.lawEntry;
  const f = laws.from[l];
  const t = laws.to[l];
  const sf = laws.slopeFrom[l];
  const st = laws.slopeTo[l];
  const byFrom = sf - slopeFrom[l];
  const byTo = st - slopeTo[l];
  matrix[ownFrom[l]] += byFrom;
  matrix[atFrom[l]] -= byTo;
  matrix[ownTo[l]] += byTo;
  matrix[atTo[l]] -= byFrom;
  slopeFrom[l] = sf;
  slopeTo[l] = st;
  const q = laws.flowW[l] - sf * at[f] + st * at[t];
  const change = q - rest[l];
  rest[l] = q;
  restSum[f] -= change;
  restSum[t] += change;
  lu.dirty[f] = 1;
  lu.dirty[t] = 1;
}

/** How much of its nodes' own entries the slope of link l in the matrix is wrong by. */
function lagOf(stage: Stage, l: number): number {
  const { laws, slopeFrom, slopeTo, linkWeight } = stage;
  const byFrom = Math.abs(laws.slopeFrom[l] - slopeFrom[l]);
  const byTo = Math.abs(laws.slopeTo[l] - slopeTo[l]);
  return Math.max(byFrom, byTo) * linkWeight[l];
}

/** The same of the emission slopes of enclosure e, largest of its members. */
function enclosureLag(stage: Stage, e: number): number {
  const { start, slopeNow, slope } = stage.enclosures;
  let worst = 0;
  for (let m = start[e]; m < start[e + 1]; m++) {
    const lag = Math.abs(slopeNow[m] - slope[m]) * stage.memberWeight[m];
    if (lag > worst) worst = lag;
  }
  return worst;
}

/**
 * Evaluates the laws of a block at `at` and sums what their linearisations leave, with the slopes in the
 * matrix. Where one of these lags by more than `limit` (as a share of its nodes' own entries), all that
 * lag by more than a quarter of it are renewed.
 * @returns the largest lag that stays
 */
export function linearise(
  stage: Stage,
  block: number,
  series: Float64Array,
  step: number,
  limit: number,
): number {
  const { laws, slopeFrom, slopeTo, rest, restSum, at, enclosures, blocks } = stage;
  const first = blocks.linkStart[block];
  const last = blocks.linkStart[block + 1];
  evaluateLinks(laws, first, last, at, series, step);
  for (let i = blocks.rowStart[block]; i < blocks.rowStart[block + 1]; i++) restSum[i] = 0;
  const { from, to, flowW } = laws;
  let worst = 0;
  for (let l = first; l < last; l++) {
    const f = from[l];
    const t = to[l];
    const q = flowW[l] - slopeFrom[l] * at[f] + slopeTo[l] * at[t];
    rest[l] = q;
    restSum[f] -= q;
    restSum[t] += q;
    const lag = lagOf(stage, l);
    if (lag > worst) worst = lag;
  }
  const firstEnclosure = blocks.enclosureStart[block];
  const lastEnclosure = blocks.enclosureStart[block + 1];
  for (let k = firstEnclosure; k < lastEnclosure; k++) {
    const e = blocks.enclosures[k];
    evaluateEmission(enclosures, e, at);
    const lag = enclosureLag(stage, e);
    if (lag > worst) worst = lag;
  }
  if (worst > limit) {
    const quarter = limit / 4;
    worst = Math.max(quarter, 0);
    for (let l = first; l < last; l++) if (lagOf(stage, l) > quarter) renewLink(stage, l);
    for (let k = firstEnclosure; k < lastEnclosure; k++) {
      const e = blocks.enclosures[k];
      if (enclosureLag(stage, e) <= quarter) continue;
      renewEnclosure(enclosures, e, stage.matrix, stage.lu.dirty);
    }
  }
  for (let k = firstEnclosure; k < lastEnclosure; k++) {
    addEnclosureRest(enclosures, blocks.enclosures[k], at, restSum);
  }
  return worst;
}

/** A unit that has no pivot of its own gives way, or the one that holds the same sensor lower does. */
function giveWay(units: UnitsState, u: number): void {
  const { mode, heatC, coolC, sensorStart, sensorSlot } = units;
  for (let v = 0; v < units.count; v++) {
    if (v === u || mode[v] !== mode[u]) continue;
    if (sensorSlot[sensorStart[v]] !== sensorSlot[sensorStart[u]]) continue;
    const weaker = mode[u] === heatSet ? heatC[v] < heatC[u] : coolC[v] > coolC[u];
    if (weaker) {
      mode[v] = off;
      return;
    }
  }
  mode[u] = off;
}

/**
 * Brings plant rows and factors of a block up to date.
 * @returns row without a pivot, or −1 when all is well
 */
export function refresh(stage: Stage, block: number): number {
  const { lu, matrix, units, blocks } = stage;
  const { unitStart, rowStart } = blocks;
  const first = unitStart[block];
  const last = unitStart[block + 1];
  for (let tries = 0; ; tries++) {
    if (last > first) assembleUnits(units, blocks.units, first, last, matrix, lu.dirty);
    const failed = factorDirty(lu, matrix, rowStart[block], rowStart[block + 1]);
    if (failed < 0) return -1;
    const u = units.row.indexOf(failed);
    const holds = u >= 0 && (units.mode[u] === heatSet || units.mode[u] === coolSet);
    if (!holds || tries > units.count) return failed;
    giveWay(units, u);
  }
}
