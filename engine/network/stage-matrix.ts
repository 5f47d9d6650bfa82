// Keeps the matrix of a stage up to date: drivers, slopes, plant rows, factors.

import { assembleDriven } from './driven-links.ts';
import { addEnclosureRest, assembleEnclosures } from './enclosures.ts';
import { factorFrom } from './sparse-lu.ts';
import type { Stage } from './stage.ts';
import { assembleUnits, coolSet, heatSet, off, type UnitsState } from './units-state.ts';

/** Rebuilds the layer of the driven links from row `firstDriven` on. */
export function loadDrivers(stage: Stage): void {
  const { layout, lu, constant, withDrivers, driven } = stage;
  const first = lu.rowStart[layout.firstDriven];
  const { matrix } = stage;
  for (let p = first; p < constant.length; p++) withDrivers[p] = constant[p];
  assembleDriven(driven, withDrivers);
  for (let p = first; p < constant.length; p++) matrix[p] = withDrivers[p];
  stage.stale = Math.min(stage.stale, layout.firstDriven);
  stage.loaded = false; // the upper layer was overwritten
}

/**
 * Adds to the right-hand side what the linearisations at state `at` leave, with the slopes in the
 * matrix, and tells how far these lag behind, as a share of their nodes' own entries (largest).
 */
export function addRests(stage: Stage): number {
  const { laws, slopeFrom, slopeTo, rest, at, b, lightness, enclosures } = stage;
  const { from, to, flowW, count, freeFrom, freeTo } = laws;
  const nowFrom = laws.slopeFrom;
  const nowTo = laws.slopeTo;
  let worst = 0;
  for (let l = 0; l < count; l++) {
    const f = from[l];
    const t = to[l];
    const sf = slopeFrom[l];
    const st = slopeTo[l];
    const q = flowW[l] - sf * at[f] + st * at[t];
    rest[l] = q;
    b[f] -= q;
    b[t] += q;
    const lagFrom = Math.abs(nowFrom[l] * freeFrom[l] - sf) * lightness[f];
    const lagTo = Math.abs(nowTo[l] * freeTo[l] - st) * lightness[t];
    if (lagFrom > worst) worst = lagFrom;
    if (lagTo > worst) worst = lagTo;
  }
  const { slot, slope, slopeNow, rowSumM2 } = enclosures;
  if (slot.length === 0) return worst;
  for (let m = 0; m < slot.length; m++) {
    const lag = Math.abs(slopeNow[m] - slope[m]) * rowSumM2[m] * lightness[slot[m]];
    if (lag > worst) worst = lag;
  }
  addEnclosureRest(enclosures, at, b);
  return worst;
}

/** Puts the slopes last evaluated into the matrix (`fresh`), or those already in use. */
export function loadSlopes(stage: Stage, fresh: boolean): void {
  const { layout, lu, withDrivers, matrix, laws, slopeFrom, slopeTo, enclosures } = stage;
  const first = lu.rowStart[layout.firstState];
  for (let p = first; p < matrix.length; p++) matrix[p] = withDrivers[p];
  if (fresh) {
    for (let l = 0; l < laws.count; l++) {
      slopeFrom[l] = laws.slopeFrom[l] * laws.freeFrom[l];
      slopeTo[l] = laws.slopeTo[l] * laws.freeTo[l];
    }
    enclosures.slope.set(enclosures.slopeNow);
  }
  const { ownFrom, ownTo, atFrom, atTo } = stage.lawEntry;
  for (let l = 0; l < laws.count; l++) {
    matrix[ownFrom[l]] += slopeFrom[l];
    matrix[atFrom[l]] -= slopeTo[l];
    matrix[ownTo[l]] += slopeTo[l];
    matrix[atTo[l]] -= slopeFrom[l];
  }
  assembleEnclosures(enclosures, matrix);
  stage.units.inMatrix.fill(255);
  stage.stale = Math.min(stage.stale, layout.firstState);
  stage.loaded = true;
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
  const { layout, lu, matrix, units } = stage;
  for (let tries = 0; ; tries++) {
    stage.stale = Math.min(stage.stale, assembleUnits(units, matrix, layout.rows));
    if (stage.stale >= layout.rows) return -1;
    const failed = factorFrom(lu, matrix, stage.stale);
    if (failed < 0) {
      stage.stale = layout.rows;
      return -1;
    }
    stage.stale = Math.min(stage.stale, failed);
    const u = units.row.indexOf(failed);
    const holds = u >= 0 && (units.mode[u] === heatSet || units.mode[u] === coolSet);
    if (!holds || tries > units.count) return failed;
    giveWay(units, u);
  }
}
