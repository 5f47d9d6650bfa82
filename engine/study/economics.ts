// What a measure costs and saves over the years.
import type { Economics } from '../building/index.ts';

/** Something bought at the start, and again each time it has worn out. */
export interface Measure {
  readonly cost: number;
  /** Infinity: it outlasts the time looked at. */
  readonly lifetimeYears: number;
}

/** Value today of 1 a year for so many years, paid at each year's end, rising each year; a broken last year counts in part. */
export function annuityFactor(years: number, discountShare: number, riseShare = 0): number {
  const ratio = (1 + riseShare) / (1 + discountShare);
  const whole = Math.floor(years + 1e-9);
  let sum = 0;
  let term = 1 / (1 + discountShare);
  for (let k = 0; k < whole; k++) {
    sum += term;
    term *= ratio;
  }
  return sum + term * Math.max(0, years - whole);
}

/**
 * Value today of buying a measure, buying it again when worn out, less what the last one is still worth
 * at the end (falling straight with its age).
 *
 * Source: EN 15459-1:2017, replacement costs and final value (form of the method, from memory).
 */
export function measureCostToday(measure: Measure, { years, discountShare }: Economics): number {
  const { cost, lifetimeYears } = measure;
  let sum = cost;
  if (!Number.isFinite(lifetimeYears)) return sum; // nothing is left to count on
  let bought = 0;
  while (bought + lifetimeYears < years - 1e-9) {
    bought += lifetimeYears;
    sum += cost / (1 + discountShare) ** bought;
  }
  const leftShare = Math.max(0, (bought + lifetimeYears - years) / lifetimeYears);
  return sum - (cost * leftShare) / (1 + discountShare) ** years;
}

/** Cost over saving of a year; null where nothing is saved. */
export function simplePaybackYears(cost: number, savingPerYear: number): number | null {
  return savingPerYear > 0 ? cost / savingPerYear : null;
}

/** Value today of all savings less all that is bought. */
export function netPresentValue(
  measures: readonly Measure[],
  savingPerYear: number,
  economics: Economics,
): number {
  const { years, discountShare, priceRiseShare } = economics;
  const saved = savingPerYear * annuityFactor(years, discountShare, priceRiseShare);
  return saved - measures.reduce((sum, one) => sum + measureCostToday(one, economics), 0);
}
