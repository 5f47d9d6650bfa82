// One step after another: the same method as engine/network/stepper.ts, chain-modes.ts, balance.ts and recorder.ts.

import { at, before, byA, byB, chainCount, chainEnd, chainEndCount, chainEndExchange, chainEndOther, chainEndOwn, chainEndSlot, chainJ, chainSlotA, chainSlotB, coefficients, converged, crossCount, crossDriven, crossDrivenCount, crossDrivenSign, crossG, crossInside, crossLaw, crossLawCount, crossLawSign, crossMember, crossMemberCount, crossOutside, decay1, directedFrom, dirty, drive1A, drive1B, driven, drivenAll, drivenAtFrom, drivenAtTo, drivenCount, drivenFrom, drivenG, drivenOwnFrom, drivenOwnTo, drivenRate, drivenSeries, drivenTo, emissionRest, emissionSlope, enclosureStart, exchangeM2, firstChain, firstFixed, fixedCount, fixedSeries, heatJ, heldCount, heldFactor, heldOf, heldRow, heldW, history, historyNow, inflowCount, inflowLink, inflowRow, inflowSlot, iterations, linkFrom, linkTo, matrix, memberEnclosure, memberRow, memberSlot, meterCount, meterEntry, meterFactor, meterStart, modeStart, modes1, modes2, movingCount, movingFactor, movingOf, movingRow, readHeldCount, readHeldIndex, readMovingCount, readMovingIndex, readMovingLinear, recordedAt, recordedChain, recordedCount, recordedSlot, rest, restSum, rows, secondAA, secondAB, secondBB, series, shape, shapeStart, singular, slopeFrom, slopeTo, sourceAbs, sourceCount, sourceSeries, sourceSum, startC, storage, storedJPerK, storing, storingCount, sum, sumCount, unitBandK, unitChillerSeries, unitChillerW, unitCoolC, unitCoolSeries, unitCount, unitHeatC, unitHeatSeries, unitHeaterSeries, unitHeaterW, unitHigh, unitLow, unitMode, unitRow, unitShare, unitW, unitZero, watchChain, watchDriven, watchDrivenCount, watchInside, watchInsideCount, watchLaw, watchLawCount, watchMember, watchMemberCount, watchSeries, watchSeriesCount, watchSlots, watchSlotsCount, watchStored, watchStoredChain, watchStoredCount, z } from "./fields";
import { add, clearNumbers, copyBytes, f, i32at, mark, set } from "./memory";
import { solveStage } from "./solve";

const gamma: f64 = 1 - Math.SQRT1_2;
const carry: f64 = (1 - gamma) / gamma;
const stillK: f64 = 3e-5;

/** States: at a step's start, its first stage, its end. */
let x0: usize = 0;
let x1: usize = 0;
let x2: usize = 0;
let stepS: f64 = 0;
let totalJPerK: f64 = 0;
let totalWPerK: f64 = 0;
let inW: f64 = 0;
let throughW: f64 = 0;
let stepsPerRecord: i32 = 1;
let stepsInRecord: i32 = 0;

/** What came out of `run`. */
export let totalIterations: f64 = 0;
export let unconverged: i32 = 0;
export let worstBalance: f64 = 0;
export let failedSlot: i32 = -1;
export let recordCount: i32 = 0;

export function begin(a: usize, c: usize, d: usize, stepSeconds: f64, jPerK: f64, wPerK: f64, perRecord: i32): void {
  x0 = a;
  x1 = c;
  x2 = d;
  stepS = stepSeconds;
  totalJPerK = jPerK;
  totalWPerK = wPerK;
  stepsPerRecord = perRecord;
}

/** Forgets what was counted. */
export function clear(): void {
  totalIterations = 0;
  unconverged = 0;
  worstBalance = 0;
  stepsInRecord = 0;
  inW = 0;
  throughW = 0;
}

/** Address of the state at the end of the last step. */
export function stateNow(): usize { return x2; }

function insideC(c: i32, i: i32, a: f64, other: f64, first: bool): f64 {
  let total = f(byA, i) * a + f(byB, i) * other;
  const begin = i32at(modeStart, c);
  const end = i32at(modeStart, c + 1);
  const s = i32at(shapeStart, i) - begin;
  for (let k = begin; k < end; k++) {
    const v = first ? f(decay1, k) * f(z, k) + f(drive1A, k) * a + f(drive1B, k) * other : f(z, k);
    total += f(shape, s + k) * v;
  }
  return total;
}

function advanceModes(): void {
  let w = coefficients;
  let p = z;
  for (let c = 0; c < chainCount; c++) {
    const sa = i32at(chainSlotA, c);
    const sb = i32at(chainSlotB, c);
    const a1 = f64x2.splat(f(x1, sa));
    const b1 = f64x2.splat(f(x1, sb));
    const a2 = f64x2.splat(f(x2, sa));
    const b2 = f64x2.splat(f(x2, sb));
    let n = i32at(modeStart, c + 1) - i32at(modeStart, c);
    let toA1B1 = f64x2.splat(0);
    let toA2B2 = f64x2.splat(0);
    let heat: f64 = 0;
    for (; n > 0; n--) {
      // e·z + (first·(α, β) · (T_A1, T_B1)) + (second·(α, β) · (T_A2, T_B2)), pairs at a time.
      const ends = f64x2.add(f64x2.mul(v128.load(w, 8), pair(a1, b1)), f64x2.mul(v128.load(w, 24), pair(a2, b2)));
      const v = load<f64>(w) * load<f64>(p) + f64x2.extract_lane(ends, 0) + f64x2.extract_lane(ends, 1);
      store<f64>(p, v);
      const vv = f64x2.splat(v);
      toA1B1 = f64x2.add(toA1B1, f64x2.mul(v128.load(w, 40), vv));
      toA2B2 = f64x2.add(toA2B2, f64x2.mul(v128.load(w, 56), vv));
      heat += load<f64>(w, 72) * v;
      w += 80;
      p += 8;
    }
    const h = history + ((<usize>c) << 5);
    v128.store(h, toA1B1);
    v128.store(h, toA2B2, 16);
    set(heatJ, c, heat);
  }
}

@inline
function pair(a: v128, c: v128): v128 { return v128.shuffle<f64>(a, c, 0, 2); }

function addHistory(second: bool): void {
  for (let c = 0; c < chainCount; c++) {
    const sa = i32at(chainSlotA, c);
    const sb = i32at(chainSlotB, c);
    let toA: f64;
    let toB: f64;
    if (second) {
      const a1 = f(x1, sa);
      const b1 = f(x1, sb);
      toA = f(history, 4 * c + 2) + f(secondAA, c) * a1 + f(secondAB, c) * b1;
      toB = f(history, 4 * c + 3) + f(secondAB, c) * a1 + f(secondBB, c) * b1;
    } else {
      toA = f(history, 4 * c);
      toB = f(history, 4 * c + 1);
    }
    set(historyNow, 2 * c, toA);
    set(historyNow, 2 * c + 1, toB);
    add(before, sa, toA);
    add(before, sb, toB);
  }
}

function setUnitBounds(earlier: usize, weight: f64): void {
  for (let u = 0; u < unitCount; u++) {
    const hs = i32at(unitHeatSeries, u);
    const cs = i32at(unitCoolSeries, u);
    const hm = i32at(unitHeaterSeries, u);
    const cm = i32at(unitChillerSeries, u);
    set(unitHeatC, u, hs < 0 ? -Infinity : f(series, hs));
    set(unitCoolC, u, cs < 0 ? Infinity : f(series, cs));
    set(unitHeaterW, u, hm < 0 ? 0 : f(series, hm));
    set(unitChillerW, u, cm < 0 ? 0 : f(series, cm));
    const w: f64 = f(unitBandK, u) > 0 ? 1 : weight;
    const shift: f64 = w == 1 ? 0 : (-(1 - w) * f(earlier, i32at(unitRow, u))) / w;
    set(unitZero, u, shift);
    set(unitHigh, u, f(unitHeaterW, u) / w + shift);
    set(unitLow, u, -f(unitChillerW, u) / w + shift);
  }
}

function loadStage(prev: usize, wBase: f64, wPrev: f64, x: usize): void {
  for (let i = 0; i < fixedCount; i++) {
    const t = f(series, i32at(fixedSeries, i));
    set(x, firstFixed + i, t);
    set(at, firstFixed + i, t);
    set(restSum, firstFixed + i, 0);
  }
  for (let k = 0; k < drivenCount; k++) {
    const l = i32at(driven, k);
    const g = f(drivenRate, l) * f(series, i32at(drivenSeries, l));
    const change = g - f(drivenG, l);
    if (change == 0) continue;
    set(drivenG, l, g);
    add(matrix, i32at(drivenOwnFrom, l), change);
    add(matrix, i32at(drivenAtFrom, l), -change);
    add(matrix, i32at(drivenOwnTo, l), change);
    add(matrix, i32at(drivenAtTo, l), -change);
    mark(dirty, i32at(drivenFrom, l), 1);
    mark(dirty, i32at(drivenTo, l), 1);
  }
  for (let i = 0; i < rows; i++) {
    set(before, i, f(heldW, i) + f(storage, i) * (wBase * f(x0, i) + wPrev * f(prev, i)));
  }
  for (let k = 0; k < movingCount; k++) add(before, i32at(movingRow, k), f(movingFactor, k) * f(series, i32at(movingOf, k)));
  for (let t = 0; t < inflowCount; t++) {
    add(before, i32at(inflowRow, t), f(drivenG, i32at(inflowLink, t)) * f(x, i32at(inflowSlot, t)));
  }
}

function addStageFlows(x: usize, weight: f64): void {
  let total: f64 = 0;
  let through: f64 = 0;
  for (let k = 0; k < crossCount; k++) {
    const q = f(crossG, k) * (f(x, i32at(crossOutside, k)) - f(x, i32at(crossInside, k)));
    total += q;
    through += Math.abs(q);
  }
  for (let k = 0; k < chainEndCount; k++) {
    const q =
      f(chainEndOwn, k) * f(x, i32at(chainEndSlot, k)) -
      f(chainEndExchange, k) * f(x, i32at(chainEndOther, k)) -
      f(historyNow, i32at(chainEnd, k));
    total += q;
    through += Math.abs(q);
  }
  for (let k = 0; k < crossLawCount; k++) {
    const l = i32at(crossLaw, k);
    const q = f(slopeFrom, l) * f(x, i32at(linkFrom, l)) - f(slopeTo, l) * f(x, i32at(linkTo, l)) + f(rest, l);
    total += f(crossLawSign, k) * q;
    through += Math.abs(q);
  }
  for (let k = 0; k < crossDrivenCount; k++) {
    const l = i32at(crossDriven, k);
    const q = f(drivenG, l) * (f(x, i32at(drivenFrom, l)) - f(x, i32at(drivenTo, l)));
    total += f(crossDrivenSign, k) * q;
    through += Math.abs(q);
  }
  for (let l = directedFrom; l < drivenAll; l++) {
    const from = i32at(drivenFrom, l);
    const to = i32at(drivenTo, l);
    if (to >= rows && to < firstChain) continue;
    const q = f(drivenG, l) * (f(x, from) - f(x, to));
    total += q;
    if (from >= rows && from < firstChain) through += Math.abs(q);
  }
  for (let k = 0; k < crossMemberCount; k++) {
    const m = i32at(crossMember, k);
    const e = i32at(memberEnclosure, m);
    const first = i32at(enclosureStart, e);
    const end = i32at(enclosureStart, e + 1);
    const r = i32at(memberRow, m) - first;
    const own = f(emissionSlope, m) * f(x, i32at(memberSlot, m)) + f(emissionRest, m);
    let q: f64 = 0;
    for (let j = first; j < end; j++) {
      q += f(exchangeM2, r + j) * (f(emissionSlope, j) * f(x, i32at(memberSlot, j)) + f(emissionRest, j) - own);
    }
    total -= q;
    through += Math.abs(q);
  }
  for (let k = 0; k < sourceCount; k++) {
    const v = f(series, i32at(sourceSeries, k));
    total += f(sourceSum, k) * v;
    through += f(sourceAbs, k) * Math.abs(v);
  }
  for (let u = 0; u < unitCount; u++) {
    const q = f(unitShare, u) * f(x, i32at(unitRow, u));
    total += q;
    through += Math.abs(q);
  }
  inW += weight * total;
  throughW += weight * through;
}

function closeStep(): f64 {
  let stored: f64 = 0;
  let moved: f64 = 0;
  for (let i = 0; i < storingCount; i++) {
    const s = i32at(storing, i);
    const q = f(storedJPerK, i) * (f(x2, s) - f(x0, s));
    stored += q;
    moved += Math.abs(q);
  }
  for (let c = 0; c < chainCount; c++) {
    const q = f(heatJ, c) - f(chainJ, c);
    set(chainJ, c, f(heatJ, c));
    stored += q;
    moved += Math.abs(q);
  }
  const imbalance = Math.abs(inW - stored / stepS);
  const still = stillK * (totalJPerK / stepS + totalWPerK);
  const through = Math.max(Math.max(throughW, moved / stepS), still);
  inW = 0;
  throughW = 0;
  return through == 0 ? 0 : imbalance / through;
}

function addStage(x: usize, weight: f64, isFirst: bool): void {
  let p = sum;
  for (let i = 0; i < watchSlotsCount; i++, p += 8) store<f64>(p, load<f64>(p) + weight * f(x, i32at(watchSlots, i)));
  for (let i = 0; i < watchInsideCount; i++, p += 8) {
    const c = i32at(watchChain, i);
    const t = insideC(c, i32at(watchInside, i), f(x, i32at(chainSlotA, c)), f(x, i32at(chainSlotB, c)), isFirst);
    store<f64>(p, load<f64>(p) + weight * t);
  }
  for (let i = 0; i < watchLawCount; i++, p += 8) {
    const l = i32at(watchLaw, i);
    const q = f(slopeFrom, l) * f(x, i32at(linkFrom, l)) - f(slopeTo, l) * f(x, i32at(linkTo, l)) + f(rest, l);
    store<f64>(p, load<f64>(p) + weight * q);
  }
  for (let i = 0; i < watchDrivenCount; i++, p += 8) {
    const l = i32at(watchDriven, i);
    store<f64>(p, load<f64>(p) + weight * f(drivenG, l) * (f(x, i32at(drivenFrom, l)) - f(x, i32at(drivenTo, l))));
  }
  for (let i = 0; i < watchMemberCount; i++, p += 8) {
    const m = i32at(watchMember, i);
    store<f64>(p, load<f64>(p) + weight * (f(emissionSlope, m) * f(x, i32at(memberSlot, m)) + f(emissionRest, m)));
  }
  for (let i = 0; i < watchSeriesCount; i++, p += 8) store<f64>(p, load<f64>(p) + weight * f(series, i32at(watchSeries, i)));
  for (let u = 0; u < unitCount; u++) add(unitW, u, weight * f(x, i32at(unitRow, u)));
}

function nodeC(slot: i32, c: i32): f64 {
  if (slot < firstChain) return f(x2, slot);
  return insideC(c, slot - firstChain, f(x2, i32at(chainSlotA, c)), f(x2, i32at(chainSlotB, c)), false);
}

export function openRecords(): void {
  for (let i = 0; i < watchStoredCount; i++) set(startC, i, nodeC(i32at(watchStored, i), i32at(watchStoredChain, i)));
}

function endStep(meanC: usize, endC: usize, meterW: usize): void {
  const storedAt = sumCount - watchStoredCount;
  const chillerAt = storedAt - unitCount;
  const heaterAt = chillerAt - unitCount;
  for (let u = 0; u < unitCount; u++) {
    const q = f(unitW, u);
    if (q > 0) add(sum, heaterAt + u, q);
    else add(sum, chillerAt + u, -q);
    set(unitW, u, 0);
  }
  stepsInRecord++;
  if (stepsInRecord < stepsPerRecord) return;
  const n = <f64>stepsInRecord;
  for (let i = 0; i < watchStoredCount; i++) {
    const end = nodeC(i32at(watchStored, i), i32at(watchStoredChain, i));
    set(sum, storedAt + i, end - f(startC, i));
    set(startC, i, end);
  }
  const out = recordCount * recordedCount;
  for (let i = 0; i < recordedCount; i++) {
    set(meanC, out + i, f(sum, i32at(recordedAt, i)) / n);
    set(endC, out + i, nodeC(i32at(recordedSlot, i), i32at(recordedChain, i)));
  }
  for (let m = 0; m < meterCount; m++) {
    let total: f64 = 0;
    const last = i32at(meterStart, m + 1);
    for (let k = i32at(meterStart, m); k < last; k++) total += f(meterFactor, k) * f(sum, i32at(meterEntry, k));
    set(meterW, recordCount * meterCount + m, total / n);
  }
  recordCount++;
  stepsInRecord = 0;
  clearNumbers(sum, sumCount);
}

/**
 * Takes `count` steps, the first being `first` of the problem. Drivers lie series by series, `stride`
 * numbers apart: `held` one a step; `moving` at the steps' ends, or two a step.
 * Records, if wanted, are written from the start of `meanC`, `endC` and `meterW`.
 * @returns steps taken; fewer than `count` where one failed at `failedSlot`
 */
export function run(first: i32, count: i32, held: usize, heldStride: i32, moving: usize, movingStride: i32, records: bool, meanC: usize, endC: usize, meterW: usize): i32 {
  recordCount = 0;
  failedSlot = -1;
  for (let n = 0; n < count; n++) {
    const step = first + n;
    const spent = x0;
    x0 = x2;
    x2 = spent;

    let changed = false;
    for (let k = 0; k < readHeldCount; k++) {
      const v = f(held, k * heldStride + n);
      const i = i32at(readHeldIndex, k);
      if (v == f(series, i)) continue;
      set(series, i, v);
      changed = true;
    }
    if (changed) {
      clearNumbers(heldW, rows);
      for (let k = 0; k < heldCount; k++) add(heldW, i32at(heldRow, k), f(heldFactor, k) * f(series, i32at(heldOf, k)));
    }
    readMoving(moving, movingStride, n, gamma);
    setUnitBounds(x0, 1);
    copyBytes(unitMode, modes1, unitCount);
    const back = gamma / (1 - gamma);
    for (let i = 0; i < rows; i++) set(x1, i, f(x0, i) + back * (f(x0, i) - f(x1, i)));
    loadStage(x0, 1, 0, x1);
    addHistory(false);
    solveStage(x1, step);
    if (singular >= 0) return fail(singular, n);
    copyBytes(modes1, unitMode, unitCount);
    totalIterations += <f64>iterations;
    let good = converged;
    addStageFlows(x1, 1 - gamma);
    if (records) addStage(x1, 1 - gamma, true);

    readMoving(moving, movingStride, n, 1);
    setUnitBounds(x1, gamma);
    copyBytes(unitMode, modes2, unitCount);
    for (let i = 0; i < rows; i++) set(x2, i, f(x1, i) + carry * (f(x1, i) - f(x0, i)));
    loadStage(x1, 1 - carry, carry, x2);
    addHistory(true);
    solveStage(x2, step);
    if (singular >= 0) return fail(singular, n);
    copyBytes(modes2, unitMode, unitCount);
    totalIterations += <f64>iterations;
    good = good && converged;
    addStageFlows(x2, gamma);
    if (!good) unconverged++;
    advanceModes();
    const residual = closeStep();
    if (!(residual <= worstBalance)) {
      if (residual != residual) return fail(-2, n);
      worstBalance = residual;
    }
    if (records) {
      addStage(x2, gamma, false);
      endStep(meanC, endC, meterW);
    }
  }
  return count;
}

function fail(slot: i32, n: i32): i32 {
  failedSlot = slot;
  return n;
}

function readMoving(moving: usize, stride: i32, n: i32, share: f64): void {
  for (let k = 0; k < readMovingCount; k++) {
    const p = k * stride + (i32at(readMovingLinear, k) == 1 ? n : 2 * n);
    const v = f(moving, p);
    const w = f(moving, p + 1);
    set(series, i32at(readMovingIndex, k), w == v ? v : v + share * (w - v));
  }
}
