// Pressure of one zone with any number of leaks, under wind, stack and fans: the mass balance of a
// single-zone air-flow network.
import { dryAirKgPerM3, gravityMPerS2, seaLevelPa } from './dry-air.ts';

/** Leaks of a zone; index k is one leak in all four. */
export interface LeakPaths {
  /** Flow at 1 Pa [m³/(s·Pa^n)]. */
  readonly coefficient: Float64Array;
  /** 0.5 to 1. */
  readonly exponent: Float64Array;
  readonly heightM: Float64Array;
  /** Wind pressure coefficient, positive windward. */
  readonly windCoefficient: Float64Array;
}

/** What acts on a zone's air. */
export interface ZoneAir {
  readonly insideC: number;
  readonly outsideC: number;
  /** Wind to which the pressure coefficients refer. */
  readonly windMPerS: number;
  /** Air that fans bring in, less what they take out [kg/s]. */
  readonly fanKgPerS: number;
  /** Barometric pressure; sea level where left out. */
  readonly barometerPa?: number;
}

/** Outside pressure by wind for a pressure coefficient of 1, ½·ρ_e·v² [Pa]. */
function dynamicPa(air: ZoneAir, outsideKgPerM3: number): number {
  return 0.5 * outsideKgPerM3 * air.windMPerS * air.windMPerS;
}

/** Mass flow of one leak under a pressure difference, with the density of the air that passes. */
function flowKgPerS(
  coefficient: number,
  exponent: number,
  dropPa: number,
  outsideKgPerM3: number,
  insideKgPerM3: number,
): number {
  if (dropPa > 0) return outsideKgPerM3 * coefficient * dropPa ** exponent;
  return -insideKgPerM3 * coefficient * (-dropPa) ** exponent;
}

/**
 * Mass flow through leak k, inward positive.
 *
 *   Δp = C_p·½·ρ_e·v² − p − (ρ_e − ρ_i)·g·z,  ṁ = ± ρ·C·|Δp|^n
 *
 * @param zonePa zone pressure p at height 0 against outside at height 0 [Pa]
 * @returns [kg/s]
 */
export function leakKgPerS(paths: LeakPaths, k: number, air: ZoneAir, zonePa: number): number {
  const barometer = air.barometerPa ?? seaLevelPa;
  const outside = dryAirKgPerM3(air.outsideC, barometer);
  const inside = dryAirKgPerM3(air.insideC, barometer);
  const wind = dynamicPa(air, outside) * paths.windCoefficient[k];
  const drop = wind - zonePa - (outside - inside) * gravityMPerS2 * paths.heightM[k];
  return flowKgPerS(paths.coefficient[k], paths.exponent[k], drop, outside, inside);
}

/**
 * Pressure of a zone at which as much air enters as leaves.
 *
 * The balance falls steadily with the pressure, so there is one root; it is bracketed by the leaks' own
 * pressures (widened for the fans) and closed in by the Illinois form of the false position, with
 * halving where that stalls.
 *
 * @param paths at least one leak of a coefficient above 0
 * @returns pressure at height 0 against outside at height 0, to 1e-9 Pa [Pa]
 *
 * Source: one-zone pressure network, e.g. ASHRAE Handbook of Fundamentals, chapter on infiltration.
 */
export function zonePressurePa(paths: LeakPaths, air: ZoneAir): number {
  const { coefficient, exponent, heightM, windCoefficient } = paths;
  if (!coefficient.some((c) => c > 0)) {
    throw new RangeError('a zone without a leak has no pressure of its own');
  }
  const barometer = air.barometerPa ?? seaLevelPa;
  const outside = dryAirKgPerM3(air.outsideC, barometer);
  const inside = dryAirKgPerM3(air.insideC, barometer);
  const dynamic = dynamicPa(air, outside);
  const weight = (outside - inside) * gravityMPerS2; // Pa per metre of height

  function netKgPerS(zonePa: number): number {
    let sum = air.fanKgPerS;
    for (let k = 0; k < coefficient.length; k++) {
      const drop = dynamic * windCoefficient[k] - zonePa - weight * heightM[k];
      sum += flowKgPerS(coefficient[k], exponent[k], drop, outside, inside);
    }
    return sum;
  }

  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (let k = 0; k < coefficient.length; k++) {
    const own = dynamic * windCoefficient[k] - weight * heightM[k];
    low = Math.min(low, own);
    high = Math.max(high, own);
  }
  let width = Math.max(1, high - low);
  let atLow = netKgPerS(low);
  while (atLow < 0) {
    low -= width;
    width *= 2;
    atLow = netKgPerS(low);
  }
  let atHigh = netKgPerS(high);
  while (atHigh > 0) {
    high += width;
    width *= 2;
    atHigh = netKgPerS(high);
  }
  let side = 0;
  for (let round = 0; round < 200 && high - low > 1e-9; round++) {
    const secant = atLow > atHigh ? low + ((high - low) * atLow) / (atLow - atHigh) : low;
    const mid = round % 3 === 2 ? (low + high) / 2 : secant;
    const at = netKgPerS(mid);
    if (at === 0) return mid;
    if (at > 0) {
      low = mid;
      atLow = at;
      if (side === 1) atHigh /= 2;
      side = 1;
    } else {
      high = mid;
      atHigh = at;
      if (side === -1) atLow /= 2;
      side = -1;
    }
  }
  return (low + high) / 2;
}

/** Sum of the inward leaks [kg/s]. */
export function infiltrationKgPerS(paths: LeakPaths, air: ZoneAir, zonePa: number): number {
  let sum = 0;
  for (let k = 0; k < paths.coefficient.length; k++) {
    sum += Math.max(0, leakKgPerS(paths, k, air, zonePa));
  }
  return sum;
}
