// Time constants: how fast the network forgets. Eigenvalues of C⁻¹·K at a state, massless nodes
// condensed first (K_cc − K_cm·K_mm⁻¹·K_mc); plants stand still.

import { EigenvalueDecomposition, Matrix, solve } from 'ml-matrix';
import { denseNetwork } from './dense.ts';
import type { Problem } from './problem.ts';
import { readSeries } from './series.ts';

/**
 * Time constants [s], slowest first; Infinity for a part that is tied to no boundary.
 *
 * @param tempC state at which laws are linearised, all nodes
 * @param step drivers are those in the middle of this step
 */
export function timeConstantsS(problem: Problem, tempC: Float64Array, step: number): Float64Array {
  const series = new Float64Array(problem.series.length);
  if (problem.stepCount > 0) readSeries(problem.series, step, 0.5, series);
  const dense = denseNetwork(problem.network, tempC, series, step);
  const massive: number[] = [];
  const massless: number[] = [];
  dense.capacityJPerK.forEach((c, i) => {
    (c > 0 ? massive : massless).push(i);
  });
  const k = dense.conductanceWPerK;
  let condensed = k.selection(massive, massive);
  if (massless.length > 0 && massive.length > 0) {
    const across = solve(k.selection(massless, massless), k.selection(massless, massive));
    condensed = Matrix.sub(condensed, k.selection(massive, massless).mmul(across));
  }
  const roots = massive.map((i) => Math.sqrt(dense.capacityJPerK[i]));
  const scaled = Matrix.zeros(massive.length, massive.length);
  for (let i = 0; i < massive.length; i++) {
    for (let j = 0; j < massive.length; j++) {
      // Rounding of the condensation is taken out of a symmetric K.
      const value = dense.isSymmetric
        ? (condensed.get(i, j) + condensed.get(j, i)) / 2
        : condensed.get(i, j);
      scaled.set(i, j, value / (roots[i] * roots[j]));
    }
  }
  if (massive.length === 0) return new Float64Array(0);
  const rates = new EigenvalueDecomposition(scaled, { assumeSymmetric: dense.isSymmetric })
    .realEigenvalues;
  const fastest = Math.max(...rates);
  return Float64Array.from(rates, (r) => (r > 1e-13 * fastest ? 1 / r : Infinity))
    .sort()
    .reverse();
}
