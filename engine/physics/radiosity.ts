// Long-wave exchange of grey, diffuse surfaces that enclose a room.
import { solveDense } from './dense.ts';

/** Stefan-Boltzmann constant [W/(m²·K⁴)]. Source: CODATA 2018. */
export const stefanBoltzmannWPerM2K4 = 5.670374419e-8;

/**
 * Absorption factors: the share of surface i's emission that surface j absorbs in the end, all
 * reflections followed.
 *
 *   G = (I − F·ρ)⁻¹·F·ε,  ρ = 1 − ε
 *
 * @param areaM2 of each surface; an area of 0 is left out
 * @param exchangeM2 A_i·F_ij, symmetric, row i adds up to A_i
 * @param emissivity 0 to 1; at least one above 0
 * @returns G_ij at [i * n + j]; each row adds up to 1
 *
 * Source: B. Gebhart, "Surface temperature calculations in radiant surroundings of arbitrary
 * complexity", International Journal of Heat and Mass Transfer 3 (1961), pp. 341–346.
 */
export function absorptionFactors(
  areaM2: Float64Array,
  exchangeM2: Float64Array,
  emissivity: ArrayLike<number>,
): Float64Array {
  const n = areaM2.length;
  const system = new Float64Array(n * n);
  const factors = new Float64Array(n * n);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      const f = areaM2[i] > 0 ? exchangeM2[i * n + j] / areaM2[i] : 0;
      system[i * n + j] = (i === j ? 1 : 0) - f * (1 - emissivity[j]);
      factors[i * n + j] = f * emissivity[j];
    }
  }
  solveDense(system, factors, n, n);
  return factors;
}

/**
 * Total exchange areas of a grey enclosure: surface i gains σ·Σj X_ij·(Tj⁴ − Ti⁴).
 *
 *   X_ij = ε_i·A_i·G_ij
 *
 * Symmetric; row i adds up to ε_i·A_i, its diagonal included.
 *
 * @returns X_ij at [i * n + j] [m²]
 *
 * Source: as for the absorption factors; H. C. Hottel, A. F. Sarofim, Radiative Transfer, 1967.
 */
export function greyExchangeAreasM2(
  areaM2: Float64Array,
  exchangeM2: Float64Array,
  emissivity: ArrayLike<number>,
): Float64Array {
  const n = areaM2.length;
  const x = absorptionFactors(areaM2, exchangeM2, emissivity);
  for (let i = 0; i < n; i++) for (let j = 0; j < n; j++) x[i * n + j] *= emissivity[i] * areaM2[i];
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) {
      const mean = (x[i * n + j] + x[j * n + i]) / 2; // equal but for rounding
      x[i * n + j] = mean;
      x[j * n + i] = mean;
    }
  return x;
}

/**
 * Exchange area of each surface with one mean radiant node.
 *
 *   X_i = A_i/(1/Φ_i + (1 − ε_i)/ε_i),  Φ_i = 1/(1 − A_i·Φ_i/Σj A_j·Φ_j)
 *
 * Φ makes up for a surface's not seeing itself. Exact for two equal parallel surfaces; within a few
 * per cent of the full enclosure in ordinary rooms. Needs at least three surfaces, or two equal ones,
 * and none as large as all others together.
 *
 * @returns X_i [m²], surface to node
 *
 * Source: J. A. Carroll, "An 'MRT method' of computing radiant energy exchange in rooms", Systems
 * Simulation and Economic Analysis, San Diego, 1980.
 */
export function starExchangeAreasM2(
  areaM2: Float64Array,
  emissivity: ArrayLike<number>,
): Float64Array {
  const n = areaM2.length;
  const phi = new Float64Array(n).fill(1);
  for (let round = 0; round < 500; round++) {
    let total = 0;
    let change = 0;
    for (let i = 0; i < n; i++) total += areaM2[i] * phi[i];
    for (let i = 0; i < n; i++) {
      const next = 1 / (1 - Math.min(0.95, (areaM2[i] * phi[i]) / total));
      change = Math.max(change, Math.abs(next - phi[i]));
      phi[i] = (phi[i] + next) / 2;
    }
    if (change < 1e-13) break;
  }
  return Float64Array.from(areaM2, (a, i) =>
    emissivity[i] > 0 ? a / (1 / phi[i] + (1 - emissivity[i]) / emissivity[i]) : 0,
  );
}

/**
 * Exchange area of two grey surfaces that see only each other: parallel faces, or a convex body in
 * its surroundings.
 *
 *   X = A1/(1/ε1 + (A1/A2)·(1/ε2 − 1))
 *
 * Sheets between them (shields) are resistances in series: 1/X adds up.
 *
 * @param innerM2 area of the flat or convex surface, @param outerM2 area around it [m²]
 * @returns X [m²], so that q = σ·X·(T1⁴ − T2⁴)
 *
 * Source: F. P. Incropera et al., Fundamentals of Heat and Mass Transfer, table 13.3.
 */
export function greyPairExchangeM2(
  innerM2: number,
  outerM2: number,
  innerEmissivity: number,
  outerEmissivity: number,
): number {
  return innerM2 / (1 / innerEmissivity + (innerM2 / outerM2) * (1 / outerEmissivity - 1));
}

/**
 * Linearised radiation coefficient of a black pair about a mean temperature, 4·σ·T³ [W/(m²·K)].
 *
 * Source: ISO 6946:2017, Annex C.
 */
export function blackCoefficientWPerM2K(meanC: number): number {
  return 4 * stefanBoltzmannWPerM2K4 * (meanC + 273.15) ** 3;
}
