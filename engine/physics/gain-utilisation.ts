// How much of the gains a building uses over a month: the utilisation factor of the monthly method.
// A quick check beside the hourly run.

/** Parameter of the monthly method, a = a_0 + τ/τ_0 with a_0 = 1, τ_0 = 15 h (from memory). */
export function utilisationExponent(timeConstantH: number, a0 = 1, tau0H = 15): number {
  return a0 + timeConstantH / tau0H;
}

/**
 * Utilisation factor of the gains in heating.
 *
 *   η = (1 − γ^a) / (1 − γ^(a+1)),  a/(a + 1) at γ = 1,  1/γ for γ < 0
 *
 * @param gainRatio γ, gains over losses of the month
 *
 * Source: ISO 13790:2008, 12.2.1.1; ISO 52016-1:2017, 6.6.10.
 */
export function gainUtilisation(gainRatio: number, exponent: number): number {
  if (gainRatio < 0) return 1 / gainRatio;
  if (Math.abs(gainRatio - 1) < 1e-9) return exponent / (exponent + 1);
  return (1 - gainRatio ** exponent) / (1 - gainRatio ** (exponent + 1));
}

/** Monthly heating need, losses less used gains, 0 or more. Any unit of energy, both the same. */
export function monthlyHeatingNeed(losses: number, gains: number, exponent: number): number {
  return Math.max(0, losses - gainUtilisation(gains / losses, exponent) * gains);
}
