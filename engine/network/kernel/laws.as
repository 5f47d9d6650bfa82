// Laws of the state-dependent links: the same formulas as engine/network/links.ts.

import { at, emissionRest, emissionSlope, emissionSlopeNow, emissionW, enclosureStart, exchangeM2, flowW, freeFrom, freeTo, linkFrom, linkKind, linkNumbers, linkRoot, linkSeries, linkTo, memberFree, memberRow, memberSlot, nowFrom, nowTo, restSum, rowSumM2, series, tables } from "./fields";
import { f, i32at, set, u8at } from "./memory";

/** Conductance of function link `law`: asked of the host. */
@external("env", "call")
declare function call(law: i32, a: f64, b: f64, step: i32): f64;

const probeK: f64 = 1e-4;
const zeroC: f64 = 273.15;
const stefanBoltzmann: f64 = 5.670374419e-8;

/**
 * z^(−1/6), z > 0: a guess from a sixth of the exponent's bits (3 % off), then
 * r·(1 + δ/6 + 7δ²/72 + 91δ³/1296) with δ = 1 − z·r⁶ (Householder's rule: the error's fourth power) twice.
 */
@inline
function inverseSixthRoot(z: f64): f64 {
  let r = reinterpret<f64>(0x4a971851eb851eb8 - reinterpret<u64>(z) / 6);
  for (let k = 0; k < 2; k++) {
    const square = r * r;
    const d = 1 - z * (square * square * square);
    r += r * d * (1.0 / 6 + d * (7.0 / 72 + d * (91.0 / 1296)));
  }
  return r;
}

/** z^(exponent/2), see `rootOf` of links.ts. */
function raise(z: f64, root: u32, exponent: f64): f64 {
  if (root == 0) {
    if (z < 1e-290) return 0;
    const r = inverseSixthRoot(z);
    const square = r * r;
    return z * (square * square * r);
  }
  if (root == 1) return Math.sqrt(z);
  if (root == 2) return Math.sqrt(Math.sqrt(Math.sqrt(z)));
  if (root == 3) return Math.sqrt(Math.sqrt(z));
  if (root == 4) return Math.pow(z, 1.0 / 3);
  return Math.pow(z, exponent / 2);
}

export function evaluateLinks(first: i32, last: i32, step: i32): void {
  for (let l = first; l < last; l++) {
    const a = f(at, i32at(linkFrom, l));
    const b = f(at, i32at(linkTo, l));
    const d = a - b;
    const p = linkNumbers + (<usize>l) * 40;
    const kind = u8at(linkKind, l);
    if (kind == 0) {
      const square = d * d;
      const z = square + load<f64>(p, 32);
      const exponent = load<f64>(p, 24);
      const natural = (d > 0 ? load<f64>(p) : load<f64>(p, 8)) * raise(z, u8at(linkRoot, l), exponent);
      const s = i32at(linkSeries, l);
      const base = load<f64>(p, 16);
      const g = natural + (s < 0 ? base : base * f(series, s));
      const slope = z > 0 ? g + (exponent * natural * square) / z : g;
      set(nowFrom, l, slope * f(freeFrom, l));
      set(nowTo, l, slope * f(freeTo, l));
      set(flowW, l, g * d);
    } else if (kind == 1) {
      const exponent = load<f64>(p, 24);
      const natural = (d > 0 ? load<f64>(p) : load<f64>(p, 8)) * raise(d * d, u8at(linkRoot, l), exponent);
      const forced = f(series, i32at(linkSeries, l));
      const rough = load<f64>(p, 16);
      const area = load<f64>(p, 32);
      const joined = Math.sqrt(natural * natural + forced * forced);
      const h = natural + rough * (joined - natural);
      const bend: f64 = joined > 0 ? 1 - rough + (rough * natural) / joined : 0;
      const slope = area * (h + exponent * natural * bend);
      set(nowFrom, l, slope * f(freeFrom, l));
      set(nowTo, l, slope * f(freeTo, l));
      set(flowW, l, area * h * d);
    } else if (kind == 2) {
      const hot = a + zeroC;
      const cold = b + zeroC;
      const s = load<f64>(p);
      const hot2 = hot * hot;
      const cold2 = cold * cold;
      set(nowFrom, l, 4 * s * hot2 * hot * f(freeFrom, l));
      set(nowTo, l, 4 * s * cold2 * cold * f(freeTo, l));
      set(flowW, l, s * d * (hot + cold) * (hot2 + cold2));
    } else if (kind == 4) evaluateTable(l, a, b, p);
    else {
      const law = <i32>load<f64>(p, 8);
      const flow = call(law, a, b, step) * d;
      const up = call(law, a + probeK, b, step) * (d + probeK) - flow;
      const down = call(law, a, b + probeK, step) * (d - probeK) - flow;
      set(nowFrom, l, Math.max(0, up / probeK) * f(freeFrom, l));
      set(nowTo, l, Math.max(0, -down / probeK) * f(freeTo, l));
      set(flowW, l, flow);
    }
  }
}

/** Tables: pointer to values, rows, columns, first mean, row step, first difference, column step; 7 numbers each. */
function evaluateTable(l: i32, a: f64, b: f64, p: usize): void {
  const t = tables + (<usize>load<f64>(p, 8)) * 56;
  const values = <usize>load<f64>(t);
  const rows = load<f64>(t, 8);
  const columns = load<f64>(t, 16);
  const rowStepK = load<f64>(t, 32);
  const columnStepK = load<f64>(t, 48);
  const d = a - b;
  const u = ((a + b) / 2 - load<f64>(t, 24)) / rowStepK;
  const v = (-d - load<f64>(t, 40)) / columnStepK;
  const r = Math.max(0, Math.min(rows - 2, Math.floor(u)));
  const c = Math.max(0, Math.min(columns - 2, Math.floor(v)));
  const up = Math.max(0, Math.min(1, u - r));
  const along = Math.max(0, Math.min(1, v - c));
  const cell = values + ((<usize>(r * columns + c)) << 3);
  const next = cell + ((<usize>columns) << 3);
  const across = load<f64>(cell, 8) - load<f64>(cell);
  const acrossHigh = load<f64>(next, 8) - load<f64>(next);
  const low = load<f64>(cell) + along * across;
  const high = load<f64>(next) + along * acrossHigh;
  const factor = load<f64>(p);
  const g = factor * (low + up * (high - low));
  const byMean: f64 = up == u - r ? (factor * (high - low)) / rowStepK : 0;
  const byDifference: f64 = along == v - c ? (factor * (across + up * (acrossHigh - across))) / columnStepK : 0;
  set(nowFrom, l, Math.max(0, g + d * (byMean / 2 - byDifference)) * f(freeFrom, l));
  set(nowTo, l, Math.max(0, g - d * (byMean / 2 + byDifference)) * f(freeTo, l));
  set(flowW, l, g * d);
}

export function evaluateEmission(e: i32): void {
  const last = i32at(enclosureStart, e + 1);
  for (let m = i32at(enclosureStart, e); m < last; m++) {
    const t = f(at, i32at(memberSlot, m)) + zeroC;
    const cube = stefanBoltzmann * t * t * t;
    set(emissionW, m, cube * t);
    set(emissionSlopeNow, m, 4 * cube * f(memberFree, m));
  }
}

export function addEnclosureRest(e: i32): void {
  const first = i32at(enclosureStart, e);
  const n = i32at(enclosureStart, e + 1) - first;
  for (let m = first; m < first + n; m++) {
    set(emissionRest, m, f(emissionW, m) - f(emissionSlope, m) * f(at, i32at(memberSlot, m)));
  }
  const rests = emissionRest + ((<usize>first) << 3);
  for (let i = 0; i < n; i++) {
    const x = exchangeM2 + ((<usize>i32at(memberRow, first + i)) << 3);
    let sum = -f(rowSumM2, first + i) * f(rests, i);
    for (let j = 0; j < n; j++) sum += f(x, j) * f(rests, j);
    const slot = i32at(memberSlot, first + i);
    set(restSum, slot, f(restSum, slot) + sum);
  }
}
