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

/** Pressure difference over leak k, outside less inside, with the zone at `zonePa` [Pa]. */
function leakPa(paths: LeakPaths, k: number, air: ZoneAir, zonePa: number): number {
  const barometer = air.barometerPa ?? seaLevelPa;
  const outside = dryAirKgPerM3(air.outsideC, barometer);
  const inside = dryAirKgPerM3(air.insideC, barometer);
  const wind = 0.5 * outside * air.windMPerS * air.windMPerS * paths.windCoefficient[k];
  return wind - zonePa - (outside - inside) * gravityMPerS2 * paths.heightM[k];
}

/**
 * Mass flow through leak k, inward positive, with the density of the air that passes.
 *
 * @param zonePa zone pressure at height 0 against outside at height 0 [Pa]
 * @returns [kg/s]
 */
export function leakKgPerS(paths: LeakPaths, k: number, air: ZoneAir, zonePa: number): number {
  const drop = leakPa(paths, k, air, zonePa);
  const flow = paths.coefficient[k] * Math.abs(drop) ** paths.exponent[k];
  const barometer = air.barometerPa ?? seaLevelPa;
  return drop > 0
    ? flow * dryAirKgPerM3(air.outsideC, barometer)
    : -flow * dryAirKgPerM3(air.insideC, barometer);
}

/** Net inflow of the zone, fans counted; falls as the zone's pressure rises [kg/s]. */
function netKgPerS(paths: LeakPaths, air: ZoneAir, zonePa: number): number {
  let sum = air.fanKgPerS;
  for (let k = 0; k < paths.coefficient.length; k++) sum += leakKgPerS(paths, k, air, zonePa);
  return sum;
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
  if (!paths.coefficient.some((c) => c > 0)) {
    throw new RangeError('a zone without a leak has no pressure of its own');
  }
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (let k = 0; k < paths.coefficient.length; k++) {
    const own = leakPa(paths, k, air, 0);
    low = Math.min(low, own);
    high = Math.max(high, own);
  }
  let width = Math.max(1, high - low);
  while (netKgPerS(paths, air, low) < 0) {
    low -= width;
    width *= 2;
  }
  while (netKgPerS(paths, air, high) > 0) {
    high += width;
    width *= 2;
  }
  let atLow = netKgPerS(paths, air, low);
  let atHigh = netKgPerS(paths, air, high);
  let side = 0;
  for (let round = 0; round < 200 && high - low > 1e-9; round++) {
    const secant = atLow > atHigh ? low + ((high - low) * atLow) / (atLow - atHigh) : low;
    const mid = round % 3 === 2 ? (low + high) / 2 : secant;
    const at = netKgPerS(paths, air, mid);
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
