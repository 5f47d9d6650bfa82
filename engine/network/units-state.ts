// The plants' side of a stage: bounds, modes and rows. A unit's power u (positive into its nodes) and
// its sensor s obey, with 0 between the two bounds low ≤ 0 ≤ high,
//   s < heat set-point: u = high · s = heat set-point: 0 ≤ u ≤ high · between: u = 0 · mirrored for cooling.
// A mode names the branch that is held; branches are exchanged until all hold (an active-set method for
// the complementarity problem; with M-matrices a few rounds, and finite).
//
// Source of the method: M. Hintermüller, K. Ito, K. Kunisch, "The primal-dual active set strategy as a
// semismooth Newton method", SIAM J. Optim. 13 (2002) 865-888; single exchanges after many rounds:
// K. G. Murty, "Note on a Bard-type scheme for solving the complementarity problem", Opsearch 11 (1974).

import type { Layout } from './layout.ts';
import type { Plant } from './problem.ts';
import { entryOf, type SparseLu } from './sparse-lu.ts';

export const off = 0;
export const heatSet = 1;
export const heatFull = 2;
export const coolSet = 3;
export const coolFull = 4;
/** On the straight part of a proportional band. */
export const line = 5;

/** How far the sensor may pass a set-point, or the power a bound, before the branch is left. */
const slackK = 1e-9;
const slackW = 1e-7;

export interface UnitsState {
  readonly count: number;
  readonly row: Int32Array;
  readonly mode: Uint8Array;
  /** Mode whose row is in the matrix, and the line's slope there; 255 for none. */
  readonly inMatrix: Uint8Array;
  readonly lineInMatrix: Float64Array;
  /** Bounds of this stage [W]. */
  readonly low: Float64Array;
  readonly zero: Float64Array;
  readonly high: Float64Array;
  readonly heatC: Float64Array;
  readonly coolC: Float64Array;
  readonly bandK: Float64Array;
  /** Greatest power of heater and chiller now [W]. */
  readonly heaterMaxW: Float64Array;
  readonly chillerMaxW: Float64Array;
  readonly heatSeries: Int32Array;
  readonly coolSeries: Int32Array;
  readonly heaterMaxSeries: Int32Array;
  readonly chillerMaxSeries: Int32Array;
  /** Sensors flat: unit u has `sensorStart[u]`…; slots, weights and matrix entries (spare at boundaries). */
  readonly sensorStart: Int32Array;
  readonly sensorSlot: Int32Array;
  readonly sensorWeight: Float64Array;
  readonly sensorEntry: Int32Array;
  readonly own: Int32Array;
}

export function compileUnits(layout: Layout, lu: SparseLu, spare: number): UnitsState {
  const { units, network, rowOfUnit, slotOfNode, rows } = layout;
  const n = units.length;
  const sensorStart = new Int32Array(n + 1);
  const slots: number[] = [];
  const weights: number[] = [];
  const entries: number[] = [];
  units.forEach((unit, u) => {
    unit.sensorNodes.forEach((v, i) => {
      const slot = slotOfNode[v];
      slots.push(slot);
      weights.push(unit.sensorWeights[i]);
      entries.push(slot < rows ? entryOf(lu, rowOfUnit[u], slot) : spare);
    });
    sensorStart[u + 1] = slots.length;
  });
  const numbers = () => new Float64Array(n);
  const seriesOf = (plant: number, pick: (p: Plant) => number) =>
    plant < 0 ? -1 : pick(network.plants[plant]);
  return {
    count: n,
    row: rowOfUnit,
    mode: new Uint8Array(n),
    inMatrix: new Uint8Array(n).fill(255),
    lineInMatrix: numbers(),
    low: numbers(),
    zero: numbers(),
    high: numbers(),
    heatC: numbers(),
    coolC: numbers(),
    bandK: Float64Array.from(units, (u) => u.bandK),
    heaterMaxW: numbers(),
    chillerMaxW: numbers(),
    heatSeries: Int32Array.from(units, (u) => seriesOf(u.heater, (p) => p.setPointSeries)),
    coolSeries: Int32Array.from(units, (u) => seriesOf(u.chiller, (p) => p.setPointSeries)),
    heaterMaxSeries: Int32Array.from(units, (u) => seriesOf(u.heater, (p) => p.maxSeries)),
    chillerMaxSeries: Int32Array.from(units, (u) => seriesOf(u.chiller, (p) => p.maxSeries)),
    sensorStart,
    sensorSlot: Int32Array.from(slots),
    sensorWeight: Float64Array.from(weights),
    sensorEntry: Int32Array.from(entries),
    own: Int32Array.from(rowOfUnit, (r) => entryOf(lu, r, r)),
  };
}

/**
 * Sets set-points and bounds of a stage. The bounds apply to the mean power
 * (1 − weight)·before + weight·u, `before` being the power of the first stage; weight 1 for the first
 * stage itself. A proportional band acts on the power of the moment.
 */
export function setUnitBounds(
  units: UnitsState,
  series: Float64Array,
  before: Float64Array,
  weight: number,
): void {
  const { row, low, zero, high, heatC, coolC, heaterMaxW, chillerMaxW, bandK } = units;
  const { heatSeries, coolSeries, heaterMaxSeries, chillerMaxSeries } = units;
  for (let u = 0; u < units.count; u++) {
    heatC[u] = heatSeries[u] < 0 ? -Infinity : series[heatSeries[u]];
    coolC[u] = coolSeries[u] < 0 ? Infinity : series[coolSeries[u]];
    heaterMaxW[u] = heaterMaxSeries[u] < 0 ? 0 : series[heaterMaxSeries[u]];
    chillerMaxW[u] = chillerMaxSeries[u] < 0 ? 0 : series[chillerMaxSeries[u]];
    const w = bandK[u] > 0 ? 1 : weight;
    const shift = w === 1 ? 0 : (-(1 - w) * before[row[u]]) / w;
    zero[u] = shift;
    high[u] = heaterMaxW[u] / w + shift;
    low[u] = -chillerMaxW[u] / w + shift;
  }
}

/** Reading of unit u's sensor in state `x`. */
export function sensorC(units: UnitsState, u: number, x: Float64Array): number {
  const { sensorStart, sensorSlot, sensorWeight } = units;
  let sum = 0;
  for (let i = sensorStart[u]; i < sensorStart[u + 1]; i++)
    sum += sensorWeight[i] * x[sensorSlot[i]];
  return sum;
}

/** Slope of the proportional line of unit u [W/K], and the temperature at which it gives nothing. */
export function lineSlopeW(units: UnitsState, u: number): number {
  return Math.max(units.heaterMaxW[u], units.chillerMaxW[u]) / units.bandK[u];
}

export function lineZeroC(units: UnitsState, u: number): number {
  const half = units.bandK[u] / 2;
  return units.heatSeries[u] >= 0 ? units.heatC[u] + half : units.coolC[u] - half;
}

/** The branch that unit u belongs on, given the one it was on and the state this led to. */
export function nextMode(units: UnitsState, u: number, x: Float64Array): number {
  const { mode, low, zero, high, heatC, coolC, row, bandK } = units;
  const s = sensorC(units, u, x);
  if (bandK[u] > 0) {
    // Over the line on the way from none to full: each exchange goes to the neighbouring branch.
    const heating = units.heatSeries[u] >= 0;
    const below = heating ? heatC[u] - s : s - coolC[u]; // how far the room is from satisfied
    const half = bandK[u] / 2;
    const full = heating ? heatFull : coolFull;
    if (mode[u] === off) return below > -half + slackK ? line : off;
    if (mode[u] === full) return below < half - slackK ? line : full;
    if (below > half + slackK) return full;
    return below < -half - slackK ? off : line;
  }
  const power = x[row[u]];
  const heats = heatC[u] > -Infinity && units.heaterMaxW[u] > 0;
  const cools = coolC[u] < Infinity && units.chillerMaxW[u] > 0;
  switch (mode[u]) {
    case heatSet:
      if (!heats || power < zero[u] - slackW) return off;
      return power > high[u] + slackW ? heatFull : heatSet;
    case heatFull:
      if (!heats) return off;
      return s > heatC[u] + slackK ? heatSet : heatFull;
    case coolSet:
      if (!cools || power > zero[u] + slackW) return off;
      return power < low[u] - slackW ? coolFull : coolSet;
    case coolFull:
      if (!cools) return off;
      return s < coolC[u] - slackK ? coolSet : coolFull;
    default:
      if (heats && s < heatC[u] - slackK) return heatSet;
      return cools && s > coolC[u] + slackK ? coolSet : off;
  }
}

/** Whether the mode makes sense under the stage's set-points at all; a switched-off plant does not heat. */
export function settleModes(units: UnitsState): void {
  const { mode, heatC, coolC, heaterMaxW, chillerMaxW } = units;
  for (let u = 0; u < units.count; u++) {
    const m = mode[u];
    const heating = m === heatSet || m === heatFull || (m === line && units.heatSeries[u] >= 0);
    const cooling = m === coolSet || m === coolFull || (m === line && units.heatSeries[u] < 0);
    if (heating && !(heatC[u] > -Infinity && heaterMaxW[u] > 0)) mode[u] = off;
    if (cooling && !(coolC[u] < Infinity && chillerMaxW[u] > 0)) mode[u] = off;
  }
}

/** Writes the rows of units `list[first]` to `list[last − 1]` whose branch changed into the matrix and marks them. */
export function assembleUnits(
  units: UnitsState,
  list: Int32Array,
  first: number,
  last: number,
  a: Float64Array,
  dirty: Uint8Array,
): void {
  const { mode, inMatrix, lineInMatrix, sensorStart, sensorEntry, sensorWeight, own, row } = units;
  for (let k = first; k < last; k++) {
    const u = list[k];
    const m = mode[u];
    const slope = m === line ? lineSlopeW(units, u) : 0;
    const holds = m === heatSet || m === coolSet;
    const held = inMatrix[u] === heatSet || inMatrix[u] === coolSet;
    if (inMatrix[u] !== 255 && holds === held && slope === lineInMatrix[u]) continue;
    for (let i = sensorStart[u]; i < sensorStart[u + 1]; i++) a[sensorEntry[i]] = 0;
    for (let i = sensorStart[u]; i < sensorStart[u + 1]; i++) {
      a[sensorEntry[i]] += holds ? sensorWeight[i] : slope * sensorWeight[i];
    }
    a[own[u]] = holds ? 0 : 1;
    inMatrix[u] = m;
    lineInMatrix[u] = slope;
    dirty[row[u]] = 1;
  }
}

/** Right-hand side of the rows of units `list[first]` to `list[last − 1]`; `x` holds the boundaries' temperatures, `firstFixed` onward. */
export function loadUnits(
  units: UnitsState,
  list: Int32Array,
  first: number,
  last: number,
  x: Float64Array,
  b: Float64Array,
  firstFixed: number,
): void {
  const { mode, low, zero, high, heatC, coolC, row } = units;
  for (let k = first; k < last; k++) {
    const u = list[k];
    const m = mode[u];
    let value = zero[u];
    if (m === heatFull) value = high[u];
    else if (m === coolFull) value = low[u];
    else if (m !== off) {
      let known = 0;
      for (let i = units.sensorStart[u]; i < units.sensorStart[u + 1]; i++) {
        const slot = units.sensorSlot[i];
        if (slot >= firstFixed) known += units.sensorWeight[i] * x[slot];
      }
      if (m === heatSet) value = heatC[u] - known;
      else if (m === coolSet) value = coolC[u] - known;
      else value = lineSlopeW(units, u) * (lineZeroC(units, u) - known);
    }
    b[row[u]] = value;
  }
}
