// Grey enclosures: node i gains σ·Σj X_ij·(Tj⁴ − Ti⁴). Each node's emission is linearised on its own,
//   σ·T⁴ ≈ slope·T + rest,
// so that the exchange stays conservative whatever slopes are in the matrix (X is symmetric).

import { stefanBoltzmann, zeroC } from './law-radiant.ts';
import type { Layout } from './layout.ts';
import { entryOf, type SparseLu } from './sparse-lu.ts';

/** All enclosures flat: member m of enclosure e is `start[e] + m`; its exchange row begins at `row[start[e] + m]`. */
export interface Enclosures {
  readonly count: number;
  readonly start: Int32Array;
  readonly slot: Int32Array;
  /** 1 for an unknown, 0 for a boundary. */
  readonly free: Float64Array;
  readonly row: Int32Array;
  readonly exchangeM2: Float64Array;
  readonly rowSumM2: Float64Array;
  /** Matrix entry of each exchange (row i, column j), the spare one where there is none. */
  readonly entry: Int32Array;
  /** Emission slope now and in the matrix [W/(m²K)], and emission at the state evaluated [W/m²]. */
  readonly slopeNow: Float64Array;
  readonly slope: Float64Array;
  readonly emissionWPerM2: Float64Array;
  readonly rest: Float64Array;
}

export function compileEnclosures(layout: Layout, lu: SparseLu, spare: number): Enclosures {
  const { network, slotOfNode, rows } = layout;
  const list = network.enclosures;
  const start = new Int32Array(list.length + 1);
  const size = list.reduce((n, e) => n + e.nodes.length ** 2, 0);
  list.forEach((e, i) => {
    start[i + 1] = start[i] + e.nodes.length;
  });
  const members = start[list.length];
  const slot = new Int32Array(members);
  const row = new Int32Array(members);
  const rowSumM2 = new Float64Array(members);
  const exchangeM2 = new Float64Array(size);
  const entry = new Int32Array(size).fill(spare);
  let at = 0;
  list.forEach((enclosure, e) => {
    const n = enclosure.nodes.length;
    for (let i = 0; i < n; i++) {
      const m = start[e] + i;
      slot[m] = slotOfNode[enclosure.nodes[i]];
      row[m] = at + i * n;
    }
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        if (i === j) continue;
        const x = enclosure.exchangeAreaM2[i * n + j];
        exchangeM2[at + i * n + j] = x;
        rowSumM2[start[e] + i] += x;
        const a = slot[start[e] + i];
        const b = slot[start[e] + j];
        if (a < rows && b < rows) entry[at + i * n + j] = entryOf(lu, a, b);
      }
      const own = slot[start[e] + i];
      if (own < rows) entry[at + i * n + i] = entryOf(lu, own, own);
    }
    at += n * n;
  });
  const numbers = () => new Float64Array(members);
  return {
    count: list.length,
    start,
    slot,
    free: Float64Array.from(slot, (s) => (s < rows ? 1 : 0)),
    row,
    exchangeM2,
    rowSumM2,
    entry,
    slopeNow: numbers(),
    slope: numbers(),
    emissionWPerM2: numbers(),
    rest: numbers(),
  };
}

/** Emission and its slope at state `x`, of enclosure `e`. */
export function evaluateEmission(enclosures: Enclosures, e: number, x: Float64Array): void {
  const { start, slot, free, slopeNow, emissionWPerM2 } = enclosures;
  for (let m = start[e]; m < start[e + 1]; m++) {
    const t = x[slot[m]] + zeroC;
    const cube = stefanBoltzmann * t * t * t;
    emissionWPerM2[m] = cube * t;
    slopeNow[m] = 4 * cube * free[m];
  }
}

/** Adds the exchange with the slopes in use to the matrix. */
export function assembleEnclosures(enclosures: Enclosures, a: Float64Array): void {
  const { count, start, row, exchangeM2, rowSumM2, entry, slope } = enclosures;
  for (let e = 0; e < count; e++) {
    const first = start[e];
    const n = start[e + 1] - first;
    for (let i = 0; i < n; i++) {
      const r = row[first + i];
      for (let j = 0; j < n; j++) a[entry[r + j]] -= exchangeM2[r + j] * slope[first + j];
      a[entry[r + i]] += rowSumM2[first + i] * slope[first + i];
    }
  }
}

/** Brings the slopes of an enclosure in the matrix up to those last evaluated and marks its rows. */
export function renewEnclosure(
  enclosures: Enclosures,
  e: number,
  a: Float64Array,
  dirty: Uint8Array,
): void {
  const { start, slot, row, exchangeM2, rowSumM2, entry, slope, slopeNow } = enclosures;
  const first = start[e];
  const n = start[e + 1] - first;
  for (let j = 0; j < n; j++) {
    const change = slopeNow[first + j] - slope[first + j];
    slope[first + j] = slopeNow[first + j];
    dirty[slot[first + j]] = 1;
    if (change === 0) continue;
    for (let i = 0; i < n; i++) {
      const p = row[first + i] + j;
      a[entry[p]] -= exchangeM2[p] * change;
    }
    a[entry[row[first + j] + j]] += rowSumM2[first + j] * change;
  }
}

/** Adds what the linearisation of enclosure `e` at state `x` leaves on the right-hand side. */
export function addEnclosureRest(
  enclosures: Enclosures,
  e: number,
  x: Float64Array,
  b: Float64Array,
): void {
  const { start, slot, row, exchangeM2, rowSumM2, slope, emissionWPerM2, rest } = enclosures;
  const first = start[e];
  const n = start[e + 1] - first;
  for (let m = first; m < first + n; m++) rest[m] = emissionWPerM2[m] - slope[m] * x[slot[m]];
  for (let i = 0; i < n; i++) {
    const r = row[first + i];
    let sum = -rowSumM2[first + i] * rest[first + i];
    for (let j = 0; j < n; j++) sum += exchangeM2[r + j] * rest[first + j];
    b[slot[first + i]] += sum;
  }
}
