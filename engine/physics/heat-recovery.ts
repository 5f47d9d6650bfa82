// Balanced ventilation with heat recovery: supply and exhaust temperature, the frost limit, the bypass.

/**
 * Supply temperature behind a heat exchanger, θ_e + η · (θ_x − θ_e).
 *
 * @param effectiveness temperature effectiveness on the supply side, 0 to `greatestEffectiveness`
 *
 * Source: definition, EN 308 / EN 13141-7.
 */
export function recoveredSupplyC(
  extractC: number,
  outdoorC: number,
  effectiveness: number,
): number {
  return outdoorC + effectiveness * (extractC - outdoorC);
}

/**
 * Exhaust temperature behind the exchanger.
 *
 *   θ_ex = θ_x − η · (ṁ_supply/ṁ_extract) · (θ_x − θ_e)
 *
 * @param supplyPerExtract mass flow of the supply over that of the extract air
 */
export function recoveredExhaustC(
  extractC: number,
  outdoorC: number,
  effectiveness: number,
  supplyPerExtract = 1,
): number {
  return extractC - effectiveness * supplyPerExtract * (extractC - outdoorC);
}

/** Greatest effectiveness that the flows allow: 1, or ṁ_extract/ṁ_supply where less is extracted. */
export function greatestEffectiveness(supplyPerExtract: number): number {
  return Math.min(1, 1 / supplyPerExtract);
}

/**
 * Effectiveness that keeps the exhaust air from freezing in the exchanger.
 *
 *   η ≤ (θ_x − θ_limit) / ((ṁ_supply/ṁ_extract) · (θ_x − θ_e))
 *
 * @param leastExhaustC limit of the exhaust temperature; makers state 1 to 5 °C, common practice [°C]
 * @returns the effectiveness, cut where needed, never below 0
 *
 * Source: the balance of `recoveredExhaustC`, solved for η.
 */
export function frostLimitedEffectiveness(
  effectiveness: number,
  extractC: number,
  outdoorC: number,
  leastExhaustC: number,
  supplyPerExtract = 1,
): number {
  const drop = supplyPerExtract * (extractC - outdoorC);
  if (drop <= 0) return effectiveness;
  return Math.min(effectiveness, Math.max(0, (extractC - leastExhaustC) / drop));
}

/**
 * Effectiveness with a modulating bypass that aims at a supply temperature.
 *
 * Where full recovery would make the supply warmer than wanted in cool weather, just enough air goes
 * round the exchanger; where outdoor air is warmer than the extract, recovery keeps the heat out and
 * the bypass stays shut.
 *
 * @param wantedSupplyC supply temperature that must not be passed [°C]
 */
export function bypassedEffectiveness(
  effectiveness: number,
  extractC: number,
  outdoorC: number,
  wantedSupplyC: number,
): number {
  const lift = extractC - outdoorC;
  if (lift <= 0) return effectiveness;
  return Math.min(effectiveness, Math.max(0, (wantedSupplyC - outdoorC) / lift));
}

/** Heat that the room still loses by ventilation, ṁ·c·(θ_x − θ_supply); negative is a gain [W]. */
export function ventilationLossW(
  massKgPerS: number,
  heatJPerKgK: number,
  roomC: number,
  supplyC: number,
): number {
  return massKgPerS * heatJPerKgK * (roomC - supplyC);
}
