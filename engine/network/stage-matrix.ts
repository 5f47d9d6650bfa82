// Keeps the matrix of a stage up to date: linearisations, plant rows, factors.

import { assembleDriven } from './driven-links.ts';
import {
  addEnclosureRest,
  assembleEnclosures,
  evaluateEmission,
  renewEnclosure,
} from './enclosures.ts';
import { addFaint } from './faint.ts';
import { evaluateLaws } from './laws.ts';
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
  stage.stale = true;
}

/** Renews the slopes of a block's links in matrix and rests. */
function renewLinks(stage: Stage, block: number): void {
  const { blocks, laws, slopeFrom, slopeTo, rest, restSum, at, matrix, lu } = stage;
  const { ownFrom, ownTo, atFrom, atTo } = stage.lawEntry;
  const { from, to, flowW, freeFrom, freeTo } = laws;
  const { dirty } = lu;
  for (let k = blocks.linkStart[block]; k < blocks.linkStart[block + 1]; k++) {
    const l = blocks.links[k];
    const f = from[l];
    const t = to[l];
    const sf = laws.slopeFrom[l] * freeFrom[l];
    const st = laws.slopeTo[l] * freeTo[l];
    const byFrom = sf - slopeFrom[l];
    const byTo = st - slopeTo[l];
    matrix[ownFrom[l]] += byFrom;
    matrix[atFrom[l]] -= byTo;
    matrix[ownTo[l]] += byTo;
    matrix[atTo[l]] -= byFrom;
    slopeFrom[l] = sf;
    slopeTo[l] = st;
    const q = flowW[l] - sf * at[f] + st * at[t];
    const change = q - rest[l];
    rest[l] = q;
    restSum[f] -= change;
    restSum[t] += change;
    dirty[f] = 1;
    dirty[t] = 1;
  }
}

/**
 * Evaluates all laws at `at` and sums what their linearisations leave, with the slopes in the matrix;
 * slopes of a block that lag by more than `limit` (as a share of their nodes' own entries) are renewed.
 * @returns the largest lag that stays
 */
export function linearise(stage: Stage, series: Float64Array, step: number, limit: number): number {
  const { laws, slopeFrom, slopeTo, rest, restSum, at, enclosures, blocks } = stage;
  const { linkWeight, memberWeight } = stage;
  evaluateLaws(laws, at, series, step);
  restSum.fill(0);
  addFaint(stage.faint, at, restSum);
  const { from, to, flowW, count, freeFrom, freeTo } = laws;
  const nowFrom = laws.slopeFrom;
  const nowTo = laws.slopeTo;
  const { lag, ofLink, ofMember } = blocks;
  lag.fill(0);
  for (let l = 0; l < count; l++) {
    const f = from[l];
    const t = to[l];
    const sf = slopeFrom[l];
    const st = slopeTo[l];
    const q = flowW[l] - sf * at[f] + st * at[t];
    rest[l] = q;
    restSum[f] -= q;
    restSum[t] += q;
    const byFrom = Math.abs(nowFrom[l] * freeFrom[l] - sf);
    const byTo = Math.abs(nowTo[l] * freeTo[l] - st);
    const share = Math.max(byFrom, byTo) * linkWeight[l];
    if (!(share <= lag[ofLink[l]])) lag[ofLink[l]] = share;
  }
  if (enclosures.slot.length > 0) {
    const { slopeNow, slope } = enclosures;
    evaluateEmission(enclosures, at);
    for (let m = 0; m < slope.length; m++) {
      const share = Math.abs(slopeNow[m] - slope[m]) * memberWeight[m];
      if (share > lag[ofMember[m]]) lag[ofMember[m]] = share;
    }
  }
  let worst = 0;
  for (let b = 0; b < blocks.count; b++) {
    if (lag[b] <= limit) {
      if (lag[b] > worst) worst = lag[b];
      continue;
    }
    renewLinks(stage, b);
    for (let k = blocks.enclosureStart[b]; k < blocks.enclosureStart[b + 1]; k++) {
      renewEnclosure(enclosures, blocks.enclosures[k], stage.matrix, stage.lu.dirty);
    }
    stage.stale = true;
  }
  if (enclosures.slot.length > 0) addEnclosureRest(enclosures, at, restSum);
  stage.loaded = true;
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
 * Brings plant rows and factors up to date.
 * @returns row without a pivot, or −1 when all is well
 */
export function refresh(stage: Stage): number {
  const { lu, matrix, units } = stage;
  for (let tries = 0; ; tries++) {
    if (assembleUnits(units, matrix, lu.dirty)) stage.stale = true;
    if (!stage.stale) return -1;
    const failed = factorDirty(lu, matrix);
    if (failed < 0) {
      stage.stale = false;
      return -1;
    }
    const u = units.row.indexOf(failed);
    const holds = u >= 0 && (units.mode[u] === heatSet || units.mode[u] === coolSet);
    if (!holds || tries > units.count) return failed;
    giveWay(units, u);
  }
}
