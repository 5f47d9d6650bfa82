// Leakage by the power law q = C·Δp^n, as a pressure test measures it.

/**
 * Coefficient of the power law from the air changes at 50 Pa.
 *
 *   C = n_50 · V / 50^n
 *
 * @param exponent 0.5 (large holes) to 1 (fine cracks); 0.65 where it is not measured
 * @returns flow at 1 Pa [m³/(s·Pa^n)]
 *
 * Source: ISO 9972:2015.
 */
export function leakageCoefficient(n50PerH: number, volumeM3: number, exponent: number): number {
  return (n50PerH * volumeM3) / 3600 / 50 ** exponent;
}

/**
 * Flow through a leak, with the sign of the pressure difference.
 *
 * Source: power law, ISO 9972:2015.
 */
export function leakageM3PerS(coefficient: number, exponent: number, pressurePa: number): number {
  return Math.sign(pressurePa) * coefficient * Math.abs(pressurePa) ** exponent;
}
