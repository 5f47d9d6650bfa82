// Shares of people dissatisfied by local causes: draught, a warm head, a cold floor, uneven radiation.
// All are 0 to 1. Source of all: ISO 7730:2005, clause 6 (constants from memory).

const asShare = (percent: number): number => Math.min(1, Math.max(0, percent / 100));

/**
 * Draught rate.
 *
 *   DR = (34 − t)·(v − 0.05)^0.62·(0.37·v·Tu + 3.14), in percent
 *
 * For seated people at 20 to 26 °C, under 0.5 m/s, turbulence 10 to 60 %; 0 up to 0.05 m/s.
 *
 * @param turbulence intensity, 0 to 1; 0.4 where unknown
 *
 * Source: ISO 7730:2005, 6.2, equation (6).
 */
export function draughtRate(airC: number, airMPerS: number, turbulence = 0.4): number {
  if (airMPerS <= 0.05 || airC >= 34) return 0;
  const swirl = 0.37 * airMPerS * 100 * turbulence + 3.14;
  return asShare((34 - airC) * (airMPerS - 0.05) ** 0.62 * swirl);
}

/**
 * By air warmer at the head than at the ankles.
 *
 *   PD = 100/(1 + exp(5.76 − 0.856·Δt)), in percent
 *
 * @param headMinusAnklesK 0 to 8 [K]
 *
 * Source: ISO 7730:2005, 6.3, equation (7).
 */
export function dissatisfiedByStratification(headMinusAnklesK: number): number {
  return asShare(100 / (1 + Math.exp(5.76 - 0.856 * headMinusAnklesK)));
}

/**
 * By a warm or cold floor, in shoes.
 *
 *   PD = 100 − 94·exp(−1.387 + 0.118·t − 0.0025·t²), in percent
 *
 * Source: ISO 7730:2005, 6.4, equation (8).
 */
export function dissatisfiedByFloor(floorC: number): number {
  return asShare(100 - 94 * Math.exp(-1.387 + 0.118 * floorC - 0.0025 * floorC * floorC));
}

export type AsymmetryKind = 'warm ceiling' | 'cool wall' | 'cool ceiling' | 'warm wall';

/** Constants a, b, c of PD = 100/(1 + exp(a − b·Δt)) − c. Source: ISO 7730:2005, (9) to (12). */
const asymmetries: Readonly<Record<AsymmetryKind, readonly [number, number, number]>> = {
  'warm ceiling': [2.84, 0.174, 5.5],
  'cool wall': [6.61, 0.345, 0],
  'cool ceiling': [9.93, 0.5, 0],
  'warm wall': [3.72, 0.052, 3.5],
};

/**
 * By radiation from one side: half spaces seen by a small plane element differ by Δt.
 *
 * @param asymmetryK radiant temperature asymmetry; up to 23 for a warm ceiling, 15 for cool faces, 35
 *   for a warm wall [K]
 *
 * Source: ISO 7730:2005, 6.5, equations (9) to (12).
 */
export function dissatisfiedByAsymmetry(kind: AsymmetryKind, asymmetryK: number): number {
  const [a, b, c] = asymmetries[kind];
  return asShare(100 / (1 + Math.exp(a - b * asymmetryK)) - c);
}
