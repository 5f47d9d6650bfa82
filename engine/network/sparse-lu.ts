// Sparse LU of a matrix with a symmetric, fixed pattern, row by row (up-looking), without pivoting:
// the nodes' part is an M-matrix, and plant rows come after the nodes that give them a pivot.
// A row depends on the rows below it in the elimination tree only: a change in one row asks for that
// row and its ancestors to be factored again, which leaves the other rooms of a building alone.

import type { Order } from './ordering.ts';

export interface SparseLu {
  readonly size: number;
  /** Entries of row i: `rowStart[i]` to `rowStart[i + 1] − 1`, columns ascending. */
  readonly rowStart: Int32Array;
  readonly column: Int32Array;
  readonly diagonal: Int32Array;
  /** L (unit diagonal, below) and U (from the diagonal) in the pattern of the matrix. */
  readonly values: Float64Array;
  readonly inverse: Float64Array;
  readonly work: Float64Array;
  /** First later row that each row is coupled to, or −1: its parent in the elimination tree. */
  readonly parent: Int32Array;
  /** Whether a row's columns follow one another: 1 below the diagonal, 2 above it, 3 both. */
  readonly runs: Uint8Array;
  /** By slot; 1 for a row whose entries changed since it was factored. */
  readonly dirty: Uint8Array;
}

/** The pattern that the elimination order fills. `slots` is the length of the state, boundaries too. */
export function createLu(order: Order, slots: number): SparseLu {
  const n = order.upper.length;
  const lower: number[][] = Array.from({ length: n }, () => []);
  order.upper.forEach((columns, i) => {
    for (const j of columns) lower[j].push(i);
  });
  const rowStart = new Int32Array(n + 1);
  for (let i = 0; i < n; i++) {
    rowStart[i + 1] = rowStart[i] + lower[i].length + 1 + order.upper[i].length;
  }
  const column = new Int32Array(rowStart[n]);
  const diagonal = new Int32Array(n);
  for (let i = 0; i < n; i++) {
    column.set(lower[i], rowStart[i]);
    diagonal[i] = rowStart[i] + lower[i].length;
    column[diagonal[i]] = i;
    column.set(order.upper[i], diagonal[i] + 1);
  }
  const isRun = (from: number, to: number) =>
    to <= from || column[to - 1] - column[from] === to - 1 - from;
  const runs = Uint8Array.from(diagonal, (diag, i) => {
    const below = isRun(rowStart[i], diag) ? 1 : 0;
    return below + (isRun(diag + 1, rowStart[i + 1]) ? 2 : 0);
  });
  return {
    size: n,
    rowStart,
    column,
    diagonal,
    values: new Float64Array(rowStart[n]),
    inverse: new Float64Array(n),
    work: new Float64Array(n),
    parent: Int32Array.from(order.upper, (columns) => (columns.length > 0 ? columns[0] : -1)),
    runs,
    dirty: new Uint8Array(slots).fill(1),
  };
}

/** Index of entry (row, col) in the pattern; both must be coupled. */
export function entryOf(lu: SparseLu, row: number, col: number): number {
  let low = lu.rowStart[row];
  let high = lu.rowStart[row + 1] - 1;
  while (low <= high) {
    const mid = (low + high) >> 1;
    if (lu.column[mid] === col) return mid;
    if (lu.column[mid] < col) low = mid + 1;
    else high = mid - 1;
  }
  throw new Error(`entry ${row}, ${col} is outside the pattern`);
}

/**
 * Factors the dirty rows of `a` (same pattern) from `from` to `to` − 1 and what depends on them. Gives the first row whose pivot
 * vanished against the row's own size, which stays dirty, or −1.
 */
export function factorDirty(lu: SparseLu, a: Float64Array, from: number, to: number): number {
  const { rowStart, column, diagonal, values, inverse, work, parent, dirty } = lu;
  for (let i = from; i < to; i++) {
    if (dirty[i] === 0) continue;
    const begin = rowStart[i];
    const end = rowStart[i + 1];
    const diag = diagonal[i];
    for (let p = begin; p < end; p++) work[column[p]] = a[p];
    // A plant's row starts without a diagonal: its pivot is judged by what the elimination puts there.
    const own = Math.abs(work[i]);
    let scale = own;
    for (let p = begin; p < diag; p++) {
      const k = column[p];
      const w = work[k];
      if (w === 0) {
        values[p] = 0;
        continue;
      }
      const l = w * inverse[k];
      values[p] = l;
      const before = work[i];
      const kEnd = rowStart[k + 1];
      for (let q = diagonal[k] + 1; q < kEnd; q++) work[column[q]] -= l * values[q];
      if (own === 0) scale += Math.abs(work[i] - before);
    }
    for (let p = diag; p < end; p++) values[p] = work[column[p]];
    const pivot = values[diag];
    if (!(Math.abs(pivot) > 1e-14 * scale)) return i;
    inverse[i] = 1 / pivot;
    dirty[i] = 0;
    if (parent[i] >= 0) dirty[parent[i]] = 1;
  }
  return -1;
}

/** Forward substitution of rows `from` to `to` − 1, in place. */
export function solveForward(lu: SparseLu, b: Float64Array, from: number, to: number): void {
  const { rowStart, column, diagonal, values } = lu;
  for (let i = from; i < to; i++) {
    let sum = b[i];
    const diag = diagonal[i];
    for (let p = rowStart[i]; p < diag; p++) sum -= values[p] * b[column[p]];
    b[i] = sum;
  }
}

/** Backward substitution of rows `to` − 1 down to `from`; rows from `to` on must be in `x` already. */
export function solveBackward(
  lu: SparseLu,
  b: Float64Array,
  x: Float64Array,
  from: number,
  to: number,
): void {
  const { rowStart, column, diagonal, values, inverse } = lu;
  for (let i = to - 1; i >= from; i--) {
    let sum = b[i];
    const end = rowStart[i + 1];
    for (let p = diagonal[i] + 1; p < end; p++) sum -= values[p] * x[column[p]];
    x[i] = sum * inverse[i];
  }
}
