// Keeps the matrix of a stage up to date: drivers, slopes, plant rows, factors.

import { assembleDriven } from './driven-links.ts';
import { assembleEnclosures } from './enclosures.ts';
import { factorFrom } from './sparse-lu.ts';
import type { Stage } from './stage.ts';
import { assembleUnits, coolSet, heatSet, off, type UnitsState } from './units-state.ts';

/** Rebuilds the layer of the driven links from row `firstDriven` on. */
export function loadDrivers(stage: Stage): void {
  const { layout, lu, constant, withDrivers, driven } = stage;
  const first = lu.rowStart[layout.firstDriven];
  withDrivers.set(constant.subarray(first), first);
  assembleDriven(driven, withDrivers);
  stage.matrix.set(withDrivers.subarray(first), first);
  stage.stale = Math.min(stage.stale, layout.firstDriven);
  stage.loaded = false; // the upper layer was overwritten
}

/** How far the slopes in the matrix lag behind, as a share of the nodes' own entries (largest). */
export function slopeLag(stage: Stage): number {
  const { laws, slopeFrom, slopeTo, lightness, enclosures } = stage;
  const { from, to, count } = laws;
  let worst = 0;
  for (let l = 0; l < count; l++) {
    const a = Math.abs(laws.slopeFrom[l] - slopeFrom[l]) * lightness[from[l]];
    const b = Math.abs(laws.slopeTo[l] - slopeTo[l]) * lightness[to[l]];
    if (a > worst) worst = a;
    if (b > worst) worst = b;
  }
  const { slot, slope, slopeNow, rowSumM2 } = enclosures;
  for (let m = 0; m < slot.length; m++) {
    const a = Math.abs(slopeNow[m] - slope[m]) * rowSumM2[m] * lightness[slot[m]];
    if (a > worst) worst = a;
  }
  return worst;
}

/** Puts the slopes last evaluated into the matrix (`fresh`), or those already in use. */
export function loadSlopes(stage: Stage, fresh: boolean): void {
  const { layout, lu, withDrivers, matrix, laws, slopeFrom, slopeTo, enclosures } = stage;
  const first = lu.rowStart[layout.firstState];
  matrix.set(withDrivers.subarray(first), first);
  if (fresh) {
    slopeFrom.set(laws.slopeFrom);
    slopeTo.set(laws.slopeTo);
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
