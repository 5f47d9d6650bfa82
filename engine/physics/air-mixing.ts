// Streams of moist air that join, and the heat an air exchange carries.

/** Enthalpy of moist air per kg of dry air, 1.006·t + w·(2501 + 1.86·t). [kJ/kg → J/kg] */
export function mixEnthalpyJPerKg(tempC: number, waterKgPerKg: number): number {
  return 1006 * tempC + waterKgPerKg * (2.501e6 + 1860 * tempC);
}

/** Moist air by its temperature and its humidity ratio. */
export interface MoistStream {
  readonly tempC: number;
  /** Water per kg of dry air. */
  readonly waterKgPerKg: number;
  /** Dry air [kg/s]. */
  readonly massKgPerS: number;
}

/**
 * State of two streams joined without loss: dry air, water and enthalpy are kept.
 *
 * Fog is not taken out: where the result lies above saturation the caller must say so.
 *
 * Source: ASHRAE Handbook of Fundamentals, psychrometrics, adiabatic mixing.
 */
export function mixedStream(one: MoistStream, other: MoistStream): MoistStream {
  const massKgPerS = one.massKgPerS + other.massKgPerS;
  const a = one.massKgPerS / massKgPerS;
  const b = other.massKgPerS / massKgPerS;
  const water = a * one.waterKgPerKg + b * other.waterKgPerKg;
  const enthalpy =
    a * mixEnthalpyJPerKg(one.tempC, one.waterKgPerKg) +
    b * mixEnthalpyJPerKg(other.tempC, other.waterKgPerKg);
  const tempC = (enthalpy - water * 2.501e6) / (1006 + water * 1860);
  return { tempC, waterKgPerKg: water, massKgPerS };
}

/**
 * Conductance of an air exchange, n·V·ρc / 3600.
 *
 * @param heatJPerM3K heat capacity of a cubic metre of air; 1.2 kg/m³ · 1006 J/(kg·K) at sea level
 */
export function airExchangeWPerK(
  changesPerH: number,
  volumeM3: number,
  heatJPerM3K: number,
): number {
  return (changesPerH * volumeM3 * heatJPerM3K) / 3600;
}

/** Latent heat that an air exchange carries out, ṁ·2501 kJ/kg·(w_i − w_e); negative comes in [W]. */
export function latentExchangeW(
  massKgPerS: number,
  insideKgPerKg: number,
  outsideKgPerKg: number,
): number {
  return massKgPerS * 2.501e6 * (insideKgPerKg - outsideKgPerKg);
}
