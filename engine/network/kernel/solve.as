// One stage, block by block: the same method as engine/network/stage-solve.ts and stage-matrix.ts.

import { again, at, atFrom, atTo, b, before, blockBends, blockCount, blockEnclosureStart, blockEnclosures, blockLinkStart, blockOf, blockRowStart, blockUnitStart, blockUnits, column, constant, converged, diagonal, dirty, driven, drivenAtFrom, drivenAtTo, drivenCount, drivenG, drivenOwnFrom, drivenOwnTo, emissionSlope, emissionSlopeNow, enclosureCount, enclosureStart, entries, exchangeEntry, exchangeM2, faintA, faintB, faintCount, faintFlowW, faintSum, faintWPerK, faintWeight, firstFixed, flowW, inverse, isNode, iterations, linkCount, linkFrom, linkTo, linkWeight, loaded, matrix, maxIterations, memberRow, memberSlot, memberWeight, nowFrom, nowTo, ownFrom, ownTo, parent, rest, restSum, rowStart, rowSumM2, runs, sensorEntry, sensorSlot, sensorStart, sensorWeight, setConverged, setIterations, setLoaded, setSingular, setSolves, singular, slopeFrom, slopeTo, slots, solves, toleranceK, unitBandK, unitChillerW, unitCoolC, unitCount, unitHeatC, unitHeatSeries, unitHeaterW, unitHigh, unitInMatrix, unitLine, unitLow, unitMode, unitOwn, unitRow, unitZero, values, work } from "./fields";
import { addEnclosureRest, evaluateEmission, evaluateLinks } from "./laws";
import { add, clearBytes, dot, f, i32at, mark, place, set, takeOff, u8at } from "./memory";

const lagLimit: f64 = 0.003;
const leastContraction: f64 = 0.003;
const guard: f64 = 4;
const cautious: i32 = 12;
const single: i32 = 20;
const stagesPerBuild: i32 = 5000;
const slackK: f64 = 1e-9;
const slackW: f64 = 1e-7;

const off: u32 = 0;
const heatSet: u32 = 1;
const heatFull: u32 = 2;
const coolSet: u32 = 3;
const coolFull: u32 = 4;
const line: u32 = 5;

function buildMatrix(): void {
  memory.copy(matrix, constant, (<usize>entries) << 3);
  for (let k = 0; k < drivenCount; k++) {
    const l = i32at(driven, k);
    const g = f(drivenG, l);
    add(matrix, i32at(drivenOwnFrom, l), g);
    add(matrix, i32at(drivenAtFrom, l), -g);
    add(matrix, i32at(drivenOwnTo, l), g);
    add(matrix, i32at(drivenAtTo, l), -g);
  }
  for (let l = 0; l < linkCount; l++) {
    add(matrix, i32at(ownFrom, l), f(slopeFrom, l));
    add(matrix, i32at(atFrom, l), -f(slopeTo, l));
    add(matrix, i32at(ownTo, l), f(slopeTo, l));
    add(matrix, i32at(atTo, l), -f(slopeFrom, l));
  }
  for (let e = 0; e < enclosureCount; e++) {
    const first = i32at(enclosureStart, e);
    const n = i32at(enclosureStart, e + 1) - first;
    for (let i = 0; i < n; i++) {
      const r = i32at(memberRow, first + i);
      for (let j = 0; j < n; j++) {
        add(matrix, i32at(exchangeEntry, r + j), -f(exchangeM2, r + j) * f(emissionSlope, first + j));
      }
      add(matrix, i32at(exchangeEntry, r + i), f(rowSumM2, first + i) * f(emissionSlope, first + i));
    }
  }
  for (let u = 0; u < unitCount; u++) mark(unitInMatrix, u, 255);
  memory.fill(dirty, 1, slots);
}

@inline
function lagOf(l: i32): f64 {
  const byFrom = Math.abs(f(nowFrom, l) - f(slopeFrom, l));
  const byTo = Math.abs(f(nowTo, l) - f(slopeTo, l));
  return Math.max(byFrom, byTo) * f(linkWeight, l);
}

function renewLink(l: i32): void {
  const from = i32at(linkFrom, l);
  const to = i32at(linkTo, l);
  const sf = f(nowFrom, l);
  const st = f(nowTo, l);
  const byFrom = sf - f(slopeFrom, l);
  const byTo = st - f(slopeTo, l);
  add(matrix, i32at(ownFrom, l), byFrom);
  add(matrix, i32at(atFrom, l), -byTo);
  add(matrix, i32at(ownTo, l), byTo);
  add(matrix, i32at(atTo, l), -byFrom);
  set(slopeFrom, l, sf);
  set(slopeTo, l, st);
  const q = f(flowW, l) - sf * f(at, from) + st * f(at, to);
  const change = q - f(rest, l);
  set(rest, l, q);
  add(restSum, from, -change);
  add(restSum, to, change);
  mark(dirty, from, 1);
  mark(dirty, to, 1);
}

function renewEnclosure(e: i32): void {
  const first = i32at(enclosureStart, e);
  const n = i32at(enclosureStart, e + 1) - first;
  for (let j = 0; j < n; j++) {
    const m = first + j;
    const change = f(emissionSlopeNow, m) - f(emissionSlope, m);
    set(emissionSlope, m, f(emissionSlopeNow, m));
    mark(dirty, i32at(memberSlot, m), 1);
    if (change == 0) continue;
    for (let i = 0; i < n; i++) {
      const p = i32at(memberRow, first + i) + j;
      add(matrix, i32at(exchangeEntry, p), -f(exchangeM2, p) * change);
    }
    add(matrix, i32at(exchangeEntry, i32at(memberRow, m) + j), f(rowSumM2, m) * change);
  }
}

function enclosureLag(e: i32): f64 {
  let worst: f64 = 0;
  const end = i32at(enclosureStart, e + 1);
  for (let m = i32at(enclosureStart, e); m < end; m++) {
    const lag = Math.abs(f(emissionSlopeNow, m) - f(emissionSlope, m)) * f(memberWeight, m);
    if (lag > worst) worst = lag;
  }
  return worst;
}

function linearise(block: i32, step: i32, limit: f64): f64 {
  const first = i32at(blockLinkStart, block);
  const last = i32at(blockLinkStart, block + 1);
  evaluateLinks(first, last, step);
  const rowEnd = i32at(blockRowStart, block + 1);
  for (let i = i32at(blockRowStart, block); i < rowEnd; i++) set(restSum, i, 0);
  let worst: f64 = 0;
  for (let l = first; l < last; l++) {
    const from = i32at(linkFrom, l);
    const to = i32at(linkTo, l);
    const q = f(flowW, l) - f(slopeFrom, l) * f(at, from) + f(slopeTo, l) * f(at, to);
    set(rest, l, q);
    add(restSum, from, -q);
    add(restSum, to, q);
    const lag = lagOf(l);
    if (lag > worst) worst = lag;
  }
  const firstEnclosure = i32at(blockEnclosureStart, block);
  const lastEnclosure = i32at(blockEnclosureStart, block + 1);
  for (let k = firstEnclosure; k < lastEnclosure; k++) {
    const e = i32at(blockEnclosures, k);
    evaluateEmission(e);
    const lag = enclosureLag(e);
    if (lag > worst) worst = lag;
  }
  if (worst > limit) {
    const quarter = limit / 4;
    worst = Math.max(quarter, 0);
    for (let l = first; l < last; l++) if (lagOf(l) > quarter) renewLink(l);
    for (let k = firstEnclosure; k < lastEnclosure; k++) {
      const e = i32at(blockEnclosures, k);
      if (!(enclosureLag(e) <= quarter)) renewEnclosure(e);
    }
  }
  for (let k = firstEnclosure; k < lastEnclosure; k++) addEnclosureRest(i32at(blockEnclosures, k));
  return worst;
}

/** Row without a pivot, or −1. */
function factorDirty(from: i32, to: i32): i32 {
  for (let i = from; i < to; i++) {
    if (u8at(dirty, i) == 0) continue;
    const begin = i32at(rowStart, i);
    const end = i32at(rowStart, i + 1);
    const diag = i32at(diagonal, i);
    for (let p = begin; p < end; p++) set(work, i32at(column, p), f(matrix, p));
    const own = Math.abs(f(work, i));
    let scale = own;
    for (let p = begin; p < diag; p++) {
      const k = i32at(column, p);
      const w = f(work, k);
      if (w == 0) {
        set(values, p, 0);
        continue;
      }
      const l = w * f(inverse, k);
      set(values, p, l);
      const earlier = f(work, i);
      const kEnd = i32at(rowStart, k + 1);
      const kFirst = i32at(diagonal, k) + 1;
      if (u8at(runs, k) & 2) {
        if (kFirst < kEnd) takeOff(place(work, i32at(column, kFirst)), place(values, kFirst), l, kEnd - kFirst);
      } else for (let q = kFirst; q < kEnd; q++) add(work, i32at(column, q), -(l * f(values, q)));
      if (own == 0) scale += Math.abs(f(work, i) - earlier);
    }
    for (let p = diag; p < end; p++) set(values, p, f(work, i32at(column, p)));
    const pivot = f(values, diag);
    if (!(Math.abs(pivot) > 1e-14 * scale)) return i;
    set(inverse, i, 1 / pivot);
    mark(dirty, i, 0);
    const up = i32at(parent, i);
    if (up >= 0) mark(dirty, up, 1);
  }
  return -1;
}

@inline
function lineSlopeW(u: i32): f64 {
  return Math.max(f(unitHeaterW, u), f(unitChillerW, u)) / f(unitBandK, u);
}

function assembleUnits(first: i32, last: i32): void {
  for (let k = first; k < last; k++) {
    const u = i32at(blockUnits, k);
    const m = u8at(unitMode, u);
    const was = u8at(unitInMatrix, u);
    const slope: f64 = m == line ? lineSlopeW(u) : 0;
    const holds = m == heatSet || m == coolSet;
    const held = was == heatSet || was == coolSet;
    if (was != 255 && holds == held && slope == f(unitLine, u)) continue;
    const from = i32at(sensorStart, u);
    const to = i32at(sensorStart, u + 1);
    for (let i = from; i < to; i++) set(matrix, i32at(sensorEntry, i), 0);
    for (let i = from; i < to; i++) add(matrix, i32at(sensorEntry, i), holds ? f(sensorWeight, i) : slope * f(sensorWeight, i));
    set(matrix, i32at(unitOwn, u), holds ? 0 : 1);
    mark(unitInMatrix, u, m);
    set(unitLine, u, slope);
    mark(dirty, i32at(unitRow, u), 1);
  }
}

function giveWay(u: i32): void {
  const m = u8at(unitMode, u);
  for (let v = 0; v < unitCount; v++) {
    if (v == u || u8at(unitMode, v) != m) continue;
    if (i32at(sensorSlot, i32at(sensorStart, v)) != i32at(sensorSlot, i32at(sensorStart, u))) continue;
    const weaker = m == heatSet ? f(unitHeatC, v) < f(unitHeatC, u) : f(unitCoolC, v) > f(unitCoolC, u);
    if (weaker) {
      mark(unitMode, v, off);
      return;
    }
  }
  mark(unitMode, u, off);
}

function refresh(block: i32): i32 {
  const first = i32at(blockUnitStart, block);
  const last = i32at(blockUnitStart, block + 1);
  for (let tries = 0; ; tries++) {
    if (last > first) assembleUnits(first, last);
    const failed = factorDirty(i32at(blockRowStart, block), i32at(blockRowStart, block + 1));
    if (failed < 0) return -1;
    let u = -1;
    for (let v = 0; v < unitCount; v++) if (i32at(unitRow, v) == failed) u = v;
    if (u < 0 || tries > unitCount) return failed;
    const m = u8at(unitMode, u);
    if (m != heatSet && m != coolSet) return failed;
    giveWay(u);
  }
  return -1;
}

function loadUnits(first: i32, last: i32, x: usize): void {
  for (let k = first; k < last; k++) {
    const u = i32at(blockUnits, k);
    const m = u8at(unitMode, u);
    let value = f(unitZero, u);
    if (m == heatFull) value = f(unitHigh, u);
    else if (m == coolFull) value = f(unitLow, u);
    else if (m != off) {
      let known: f64 = 0;
      const to = i32at(sensorStart, u + 1);
      for (let i = i32at(sensorStart, u); i < to; i++) {
        const slot = i32at(sensorSlot, i);
        if (slot >= firstFixed) known += f(sensorWeight, i) * f(x, slot);
      }
      if (m == heatSet) value = f(unitHeatC, u) - known;
      else if (m == coolSet) value = f(unitCoolC, u) - known;
      else {
        const half = f(unitBandK, u) / 2;
        const zeroAt = i32at(unitHeatSeries, u) >= 0 ? f(unitHeatC, u) + half : f(unitCoolC, u) - half;
        value = lineSlopeW(u) * (zeroAt - known);
      }
    }
    set(b, i32at(unitRow, u), value);
  }
}

function nextMode(u: i32, x: usize): u32 {
  let s: f64 = 0;
  const to = i32at(sensorStart, u + 1);
  for (let i = i32at(sensorStart, u); i < to; i++) s += f(sensorWeight, i) * f(x, i32at(sensorSlot, i));
  const mode = u8at(unitMode, u);
  const heatC = f(unitHeatC, u);
  const coolC = f(unitCoolC, u);
  if (f(unitBandK, u) > 0) {
    const heating = i32at(unitHeatSeries, u) >= 0;
    const below = heating ? heatC - s : s - coolC;
    const half = f(unitBandK, u) / 2;
    const full = heating ? heatFull : coolFull;
    if (mode == off) return below > -half + slackK ? line : off;
    if (mode == full) return below < half - slackK ? line : full;
    if (below > half + slackK) return full;
    return below < -half - slackK ? off : line;
  }
  const power = f(x, i32at(unitRow, u));
  const heats = heatC > -Infinity && f(unitHeaterW, u) > 0;
  const cools = coolC < Infinity && f(unitChillerW, u) > 0;
  if (mode == heatSet) {
    if (!heats || power < f(unitZero, u) - slackW) return off;
    return power > f(unitHigh, u) + slackW ? heatFull : heatSet;
  }
  if (mode == heatFull) {
    if (!heats) return off;
    return s > heatC + slackK ? heatSet : heatFull;
  }
  if (mode == coolSet) {
    if (!cools || power > f(unitZero, u) + slackW) return off;
    return power < f(unitLow, u) - slackW ? coolFull : coolSet;
  }
  if (mode == coolFull) {
    if (!cools) return off;
    return s < coolC - slackK ? coolSet : coolFull;
  }
  if (heats && s < heatC - slackK) return heatSet;
  return cools && s > coolC + slackK ? coolSet : off;
}

function exchangeModes(block: i32, x: usize, onlyOne: bool): bool {
  let moved = false;
  const last = i32at(blockUnitStart, block + 1);
  for (let k = i32at(blockUnitStart, block); k < last; k++) {
    const u = i32at(blockUnits, k);
    const next = nextMode(u, x);
    if (next == u8at(unitMode, u)) continue;
    mark(unitMode, u, next);
    moved = true;
    if (onlyOne) return true;
  }
  return moved;
}

function settleModes(): void {
  for (let u = 0; u < unitCount; u++) {
    const m = u8at(unitMode, u);
    const isHeater = i32at(unitHeatSeries, u) >= 0;
    const heating = m == heatSet || m == heatFull || (m == line && isHeater);
    const cooling = m == coolSet || m == coolFull || (m == line && !isHeater);
    if (heating && !(f(unitHeatC, u) > -Infinity && f(unitHeaterW, u) > 0)) mark(unitMode, u, off);
    if (cooling && !(f(unitCoolC, u) < Infinity && f(unitChillerW, u) > 0)) mark(unitMode, u, off);
  }
}

function solveBlock(block: i32, x: usize): void {
  setSingular(refresh(block));
  if (singular >= 0) return;
  const from = i32at(blockRowStart, block);
  const to = i32at(blockRowStart, block + 1);
  if (to == from + 1 && i32at(blockUnitStart, block) == i32at(blockUnitStart, block + 1)) {
    set(x, from, (f(before, from) + f(restSum, from) + f(faintSum, from)) * f(inverse, from));
    return;
  }
  for (let i = from; i < to; i++) set(b, i, f(before, i) + f(restSum, i) + f(faintSum, i));
  loadUnits(i32at(blockUnitStart, block), i32at(blockUnitStart, block + 1), x);
  const rhs = b;
  for (let i = from; i < to; i++) {
    let sum = f(rhs, i);
    const diag = i32at(diagonal, i);
    const begin = i32at(rowStart, i);
    if (u8at(runs, i) & 1) {
      if (begin < diag) sum -= dot(place(values, begin), place(rhs, i32at(column, begin)), diag - begin);
    } else for (let p = begin; p < diag; p++) sum -= f(values, p) * f(rhs, i32at(column, p));
    set(rhs, i, sum);
  }
  for (let i = to - 1; i >= from; i--) {
    let sum = f(rhs, i);
    const end = i32at(rowStart, i + 1);
    const begin = i32at(diagonal, i) + 1;
    if (u8at(runs, i) & 2) {
      if (begin < end) sum -= dot(place(values, begin), place(x, i32at(column, begin)), end - begin);
    } else for (let p = begin; p < end; p++) sum -= f(values, p) * f(x, i32at(column, p));
    set(x, i, sum * f(inverse, i));
  }
}

function solveLinear(block: i32, x: usize, mostRounds: i32): void {
  for (let k = 1; k <= mostRounds; k++) {
    solveBlock(block, x);
    if (singular >= 0) return;
    if (k > iterations) setIterations(k);
    if (!exchangeModes(block, x, k >= single)) return;
  }
  if (u8at(blockBends, block) == 0) setConverged(false);
}

function iterate(block: i32, x: usize, step: i32): void {
  const from = i32at(blockRowStart, block);
  const to = i32at(blockRowStart, block + 1);
  let lastChange: f64 = Infinity;
  let slow = false;
  for (let i = from; i < to; i++) set(at, i, f(x, i));
  for (let k = 2; k <= maxIterations; k++) {
    const lag = linearise(block, step, slow || k >= cautious ? -1 : lagLimit);
    const contraction = guard * Math.max(lag, leastContraction);
    solveBlock(block, x);
    if (singular >= 0) return;
    let switched = exchangeModes(block, x, k >= single);
    if (switched) {
      solveBlock(block, x);
      if (singular >= 0) return;
      switched = exchangeModes(block, x, k >= single);
    }
    if (k > iterations) setIterations(k);
    let change: f64 = 0;
    for (let i = from; i < to; i++) change = Math.max(change, Math.abs(f(x, i) - f(at, i)) * f(isNode, i));
    if (!(change < Infinity)) break; // f64.max passes NaN on
    const share = change / lastChange;
    const seen: f64 = lastChange < Infinity && share < 0.5 ? share / (1 - share) : 1;
    const left = change * Math.min(seen, contraction);
    if (!switched && (left <= toleranceK || change <= toleranceK)) return;
    slow = share > 0.1;
    lastChange = switched ? Infinity : change;
    const way: f64 = k >= cautious ? 0.5 : 1;
    for (let i = from; i < to; i++) add(at, i, way * (f(x, i) - f(at, i)));
  }
  setConverged(false);
}

function setFaint(x: usize): void {
  for (let k = 0; k < faintCount; k++) {
    set(faintSum, i32at(faintA, k), 0);
    set(faintSum, i32at(faintB, k), 0);
  }
  for (let k = 0; k < faintCount; k++) {
    const p = i32at(faintA, k);
    const r = i32at(faintB, k);
    const q = f(faintWPerK, k) * (f(x, p) - f(x, r));
    set(faintFlowW, k, q);
    add(faintSum, p, -q);
    add(faintSum, r, q);
  }
}

function renewFaint(x: usize, limitK: f64): bool {
  let found = false;
  for (let k = 0; k < faintCount; k++) {
    const p = i32at(faintA, k);
    const r = i32at(faintB, k);
    const q = f(faintWPerK, k) * (f(x, p) - f(x, r));
    const change = q - f(faintFlowW, k);
    if (Math.abs(change) * f(faintWeight, k) <= limitK) continue;
    set(faintFlowW, k, q);
    add(faintSum, p, -change);
    add(faintSum, r, change);
    mark(again, i32at(blockOf, p), 1);
    mark(again, i32at(blockOf, r), 1);
    found = true;
  }
  return found;
}

export function solveStage(x: usize, step: i32): void {
  setIterations(0);
  setConverged(true);
  setSingular(-1);
  if (solves % stagesPerBuild == 0) buildMatrix();
  setSolves(solves + 1);
  settleModes();
  setFaint(x);
  const isFirst = !loaded;
  setLoaded(true);
  for (let block = 0; block < blockCount; block++) {
    const bends = u8at(blockBends, block) == 1;
    if (bends && isFirst) continue;
    solveLinear(block, x, bends ? 2 : maxIterations);
    if (singular >= 0) return;
  }
  for (let sweep = 0; ; sweep++) {
    clearBytes(again, blockCount);
    const found = renewFaint(x, 0.1 * toleranceK);
    if (!found && sweep > 0) break;
    if (sweep >= maxIterations) {
      setConverged(false);
      break;
    }
    for (let block = 0; block < blockCount; block++) {
      const isAgain = u8at(again, block) == 1;
      if (u8at(blockBends, block) == 1 && (sweep == 0 || isAgain)) iterate(block, x, step);
      else if (isAgain) solveLinear(block, x, maxIterations);
      if (singular >= 0) return;
    }
    if (!converged) break;
  }
}
