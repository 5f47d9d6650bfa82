// Dense linear systems of a few dozen unknowns, row by row in one typed array.

/**
 * Solves A·X = B in place by Gaussian elimination with partial pivoting; B becomes X, A is used up.
 *
 * @param a matrix, a_ij = a[i * n + j]
 * @param b right-hand sides side by side, b_ik = b[i * columns + k]
 *
 * Source: G. H. Golub, C. F. Van Loan, Matrix Computations, algorithm 3.4.1.
 */
export function solveDense(a: Float64Array, b: Float64Array, n: number, columns = 1): void {
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let i = k + 1; i < n; i++)
      if (Math.abs(a[i * n + k]) > Math.abs(a[pivot * n + k])) pivot = i;
    if (a[pivot * n + k] === 0) throw new Error(`a dense system is singular in column ${k}`);
    if (pivot !== k) {
      swapRows(a, k, pivot, n);
      swapRows(b, k, pivot, columns);
    }
    const inverse = 1 / a[k * n + k];
    for (let i = k + 1; i < n; i++) {
      const factor = a[i * n + k] * inverse;
      if (factor === 0) continue;
      for (let j = k + 1; j < n; j++) a[i * n + j] -= factor * a[k * n + j];
      for (let j = 0; j < columns; j++) b[i * columns + j] -= factor * b[k * columns + j];
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let j = 0; j < columns; j++) {
      let x = b[i * columns + j];
      for (let k = i + 1; k < n; k++) x -= a[i * n + k] * b[k * columns + j];
      b[i * columns + j] = x / a[i * n + i];
    }
  }
}

function swapRows(m: Float64Array, i: number, j: number, width: number): void {
  for (let k = 0; k < width; k++) {
    const held = m[i * width + k];
    m[i * width + k] = m[j * width + k];
    m[j * width + k] = held;
  }
}
