// Efficiency of heaters and chillers by load and outdoor temperature. Curves for estimates: a maker's
// test points, where given, go in as `ratedPoints`.

/**
 * Boiler losses by load, straight between standing by, a part load and full load.
 *
 * @param loadShare output over full output, 0 to 1
 * @param partShare load of the part-load test, 0.3 by EN 15502
 * @returns losses in the unit of those given
 *
 * Source: EN 15316-4-1:2017, case-specific boiler method (from memory).
 */
export function boilerLoss(
  loadShare: number,
  standbyLoss: number,
  partLoss: number,
  fullLoss: number,
  partShare = 0.3,
): number {
  if (loadShare <= partShare) {
    return standbyLoss + (loadShare / partShare) * (partLoss - standbyLoss);
  }
  return partLoss + ((loadShare - partShare) / (1 - partShare)) * (fullLoss - partLoss);
}

/**
 * Efficiency of a boiler at a load, output over fuel.
 *
 * @param fullEfficiency and `partEfficiency` from its tests; may exceed 1 on net calorific value
 * @param standbyShare standing loss over full output, about 0.005 to 0.02
 * @returns 0 at no load
 */
export function boilerEfficiency(
  loadShare: number,
  fullEfficiency: number,
  partEfficiency: number,
  standbyShare: number,
  partShare = 0.3,
): number {
  const full = 1 / fullEfficiency - 1; // losses over full output
  const part = partShare * (1 / partEfficiency - 1);
  const loss = boilerLoss(loadShare, standbyShare, part, full, partShare);
  return loadShare / (loadShare + loss);
}

/**
 * Greatest coefficient of performance between two temperatures, T_hot / (T_hot − T_cold).
 * For heating; a chiller's limit is one less.
 *
 * Source: Carnot; any real machine stays below it.
 */
export function carnotHeatingCop(coldC: number, hotC: number): number {
  return (hotC + 273.15) / (hotC - coldC);
}

/**
 * Heating COP by a fixed share of Carnot, with the lifts of both heat exchangers.
 *
 * @param qualityShare 0.35 to 0.55 for whole machines (common practice, no source)
 * @param exchangerK temperature lost in each of evaporator and condenser, about 5 [K]
 */
export function heatPumpCop(
  sourceC: number,
  sinkC: number,
  qualityShare: number,
  exchangerK: number,
): number {
  const hot = sinkC + exchangerK;
  const cold = Math.min(sourceC, sinkC) - exchangerK;
  return qualityShare * carnotHeatingCop(cold, hot);
}

/** Cooling EER by a fixed share of Carnot, heat given to air at `outdoorC`, cold made at `chilledC`. */
export function chillerEer(
  outdoorC: number,
  chilledC: number,
  qualityShare: number,
  exchangerK: number,
): number {
  const cold = chilledC - exchangerK;
  const hot = Math.max(outdoorC, chilledC) + exchangerK;
  return qualityShare * (carnotHeatingCop(cold, hot) - 1);
}

/** A test point: what the machine does at one outdoor temperature. */
export interface RatedPoint {
  readonly outdoorC: number;
  readonly value: number;
}

/**
 * Value between test points, straight by outdoor temperature, kept level beyond the outer ones.
 * For COP, EER and capacity alike.
 *
 * @param points at least one, in rising order of temperature
 */
export function ratedAt(points: readonly RatedPoint[], outdoorC: number): number {
  const last = points.length - 1;
  if (last < 0) throw new RangeError('no rated points');
  if (outdoorC <= points[0].outdoorC) return points[0].value;
  if (outdoorC >= points[last].outdoorC) return points[last].value;
  let k = 0;
  while (outdoorC > points[k + 1].outdoorC) k++;
  const a = points[k];
  const b = points[k + 1];
  return a.value + ((outdoorC - a.outdoorC) / (b.outdoorC - a.outdoorC)) * (b.value - a.value);
}

/**
 * Loss of COP or EER by switching on and off below the least continuous output, for water systems.
 *
 *   f = CR / (0.9·CR + 0.1),  CR = demand over output, 0 to 1
 *
 * Source: EN 14825:2018, clause 6.4 (degradation coefficient 0.9 from memory).
 */
export function cyclingFactorWater(capacityRatio: number): number {
  return capacityRatio / (0.9 * capacityRatio + 0.1);
}

/**
 * The same for air systems, f = 1 − 0.25 · (1 − CR).
 *
 * Source: EN 14825:2018, clause 6.3 (coefficient 0.25 from memory).
 */
export function cyclingFactorAir(capacityRatio: number): number {
  return 1 - 0.25 * (1 - capacityRatio);
}
