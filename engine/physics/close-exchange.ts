// Makes a symmetric table of exchange areas add up to the surfaces' areas, row by row.

const tolerance = 1e-13;
const mostRounds = 2000;

/**
 * Scales a symmetric, non-negative table in place so that row i adds up to area i.
 *
 *   x_ij ← d_i·x_ij·d_j,  d_i ← d_i·√(A_i/Σj d_i·x_ij·d_j),  repeated
 *
 * Keeps symmetry and zeros. Where no such scaling exists (a surface larger than all that it sees),
 * what is missing is put on the diagonal: the surface is taken to see itself.
 *
 * @returns largest share of a surface that was put on the diagonal, 0 to 1
 *
 * Source: R. Sinkhorn, P. Knopp, "Concerning nonnegative matrices and doubly stochastic matrices",
 * Pacific Journal of Mathematics 21 (1967), in its symmetric form.
 */
export function closeExchange(areaM2: Float64Array, exchangeM2: Float64Array): number {
  const n = areaM2.length;
  const rows = new Float64Array(n);
  const sumRows = () => {
    let worst = 0;
    for (let i = 0; i < n; i++) {
      let sum = 0;
      for (let j = 0; j < n; j++) sum += exchangeM2[i * n + j];
      rows[i] = sum;
      if (areaM2[i] > 0) worst = Math.max(worst, Math.abs(sum / areaM2[i] - 1));
    }
    return worst;
  };
  for (let round = 0; round < mostRounds && sumRows() > tolerance; round++) {
    for (let i = 0; i < n; i++) rows[i] = rows[i] > 0 ? Math.sqrt(areaM2[i] / rows[i]) : 0;
    for (let i = 0; i < n; i++)
      for (let j = 0; j < n; j++) exchangeM2[i * n + j] *= rows[i] * rows[j];
  }
  sumRows();
  let shrink = 1;
  for (let i = 0; i < n; i++)
    if (rows[i] > areaM2[i]) shrink = Math.min(shrink, areaM2[i] / rows[i]);
  let largest = 0;
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) exchangeM2[i * n + j] *= shrink;
    const missing = areaM2[i] - rows[i] * shrink;
    exchangeM2[i * n + i] += missing;
    if (areaM2[i] > 0) largest = Math.max(largest, missing / areaM2[i]);
  }
  return largest;
}
