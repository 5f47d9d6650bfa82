// Sunlight inside a room: what each surface takes in once all diffuse reflections are followed.
import { solveDense } from './dense.ts';

/**
 * Total light on each surface from the light that meets the surfaces first: P = M·H.
 *
 *   P_i = H_i + Σj P_j·ρ_j·F_ji      so that      M = (I − B)⁻¹,  B_ij = ρ_j·(A_j·F_ji)/A_j
 *
 * What surface i absorbs is P_i·α_i; a window absorbs P_i·α in each pane and loses P_i·τ outdoors,
 * with its optics for diffuse light from inside. Since α + ρ + τ = 1, all of H is accounted for.
 *
 * @param areaM2 of each surface; an area of 0 takes nothing
 * @param exchangeM2 A_i·F_ij, symmetric, each row adds up to A_i
 * @param reflectance for diffuse light, 0 to 1; windows by their inside
 * @returns M_ij at [i * n + j]: light on i, in W, for 1 W that meets j first
 *
 * Source: net radiation method for diffuse reflectors, R. Siegel, J. R. Howell, Thermal Radiation
 * Heat Transfer.
 */
export function lightMatrix(
  areaM2: Float64Array,
  exchangeM2: Float64Array,
  reflectance: ArrayLike<number>,
): Float64Array {
  const n = areaM2.length;
  const system = new Float64Array(n * n);
  const matrix = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    matrix[i * n + i] = 1;
    for (let j = 0; j < n; j++) {
      const b = areaM2[j] > 0 ? (reflectance[j] * exchangeM2[j * n + i]) / areaM2[j] : 0;
      system[i * n + j] = (i === j ? 1 : 0) - b;
    }
  }
  solveDense(system, matrix, n, n);
  return matrix;
}

/**
 * Light on every surface for a given first incidence, in place.
 *
 * @param matrix of `lightMatrix`
 * @param firstW light that meets each surface first [W]
 * @param totalW light on each surface, reflections included [W]; overwritten
 */
export function spreadLight(
  matrix: Float64Array,
  firstW: Float64Array,
  totalW: Float64Array,
): void {
  const n = firstW.length;
  for (let i = 0; i < n; i++) {
    let sum = 0;
    for (let j = 0; j < n; j++) sum += matrix[i * n + j] * firstW[j];
    totalW[i] = sum;
  }
}
