// Published criteria for overheating, each with its document and edition.
import { hourName, monthOfHour } from './hour-name.ts';

/** One criterion: what was found, what is allowed. */
export interface Criterion {
  readonly name: string;
  readonly found: number;
  readonly limit: number;
  readonly unit: string;
  readonly met: boolean;
}

export interface OverheatingFindings {
  /** Document and edition. */
  readonly method: string;
  readonly criteria: readonly Criterion[];
  readonly passed: boolean;
  /** Start of the hour furthest above the limit, empty where it is never passed. */
  readonly worstAt: string;
}

/** A room's year as the methods see it. */
export interface OverheatingHours {
  readonly operativeC: Float64Array;
  readonly occupied: Uint8Array;
  readonly runningMeanC: Float64Array;
  readonly category: 'I' | 'II' | 'III';
  readonly bedroom: boolean;
  readonly latitudeDeg: number;
  readonly year: number;
}

/** Reach of the upper limit above comfort [K]. Source: EN 15251:2007, Annex A.2. */
const reachK = { I: 2, II: 3, III: 4 } as const;

/**
 * Upper limit that the criteria start from.
 *
 *   T_max = 0.33·T_rm + 18.8 + 2, 3 or 4 K
 *
 * The equation is stated for running means of 10 to 30 °C; beyond, the nearer end is taken (own rule).
 *
 * Source: CIBSE TM52:2013, section 6.1.2, after EN 15251:2007.
 */
export function upperLimitC(runningMeanC: number, category: keyof typeof reachK): number {
  return 0.33 * Math.min(30, Math.max(10, runningMeanC)) + 18.8 + reachK[category];
}

/** May to September, or November to March south of the equator (own rule: the standard knows the north). */
function isSummer(hour: number, hoursInYear: number, latitudeDeg: number): boolean {
  const month = monthOfHour(hour, hoursInYear);
  return latitudeDeg >= 0 ? month >= 4 && month <= 8 : month >= 10 || month <= 2;
}

/** Excess over the limit, rounded to whole kelvins as the method asks; −Infinity outside occupied summer. */
function wholeExcessK(hours: OverheatingHours): Float64Array {
  const { operativeC, occupied, runningMeanC, category, latitudeDeg } = hours;
  return operativeC.map((c, h) =>
    occupied[h] === 0 || !isSummer(h, operativeC.length, latitudeDeg)
      ? Number.NEGATIVE_INFINITY
      : Math.round(c - upperLimitC(runningMeanC[h], category)),
  );
}

const criterion = (name: string, found: number, limit: number, unit: string): Criterion => ({
  name,
  found,
  limit,
  unit,
  met: found <= limit,
});

/** Hours of exceedance over occupied summer hours, in percent. */
function exceedancePercent(excessK: Float64Array): number {
  let occupied = 0;
  let over = 0;
  for (const k of excessK) {
    if (k === Number.NEGATIVE_INFINITY) continue;
    occupied++;
    if (k >= 1) over++;
  }
  return occupied === 0 ? 0 : (100 * over) / occupied;
}

/**
 * Three criteria; a room that fails two of them overheats.
 *
 *   1  hours with ΔT of 1 K or more: at most 3 % of occupied hours from May to September
 *   2  Σ hours · ΔT of any day: at most 6
 *   3  ΔT: at most 4 K
 *
 * Source: CIBSE TM52:2013, The limits of thermal comfort, section 6.1.2 (from memory).
 */
export function tm52(hours: OverheatingHours): OverheatingFindings {
  const excessK = wholeExcessK(hours);
  let worstDay = 0;
  let worstK = 0;
  for (let day = 0; day < excessK.length / 24; day++) {
    let weighted = 0;
    for (let h = 24 * day; h < 24 * day + 24; h++) {
      weighted += Math.max(0, excessK[h]);
      worstK = Math.max(worstK, excessK[h]);
    }
    worstDay = Math.max(worstDay, weighted);
  }
  const criteria = [
    criterion('hours of exceedance', exceedancePercent(excessK), 3, '% of occupied summer hours'),
    criterion('daily weighted exceedance', worstDay, 6, 'K·h in a day'),
    criterion('upper limit', worstK, 4, 'K above the limit'),
  ];
  return {
    method: 'CIBSE TM52:2013',
    criteria,
    passed: criteria.filter((one) => !one.met).length < 2,
    worstAt: worstHour(excessK, hours.year),
  };
}

/**
 * Homes that people can open up.
 *
 *   a  hours with ΔT of 1 K or more: at most 3 % of occupied hours from May to September
 *   b  bedrooms: above 26 °C in at most 1 % of the hours from 22:00 to 07:00 of the year
 *
 * Source: CIBSE TM59:2017, section 4.2 (from memory).
 */
export function tm59Natural(hours: OverheatingHours): OverheatingFindings {
  const excessK = wholeExcessK(hours);
  const criteria = [
    criterion('hours of exceedance', exceedancePercent(excessK), 3, '% of occupied summer hours'),
  ];
  if (hours.bedroom) {
    const nightly = hours.operativeC.map((c, h) => (isNight(h) ? c : Number.NaN));
    const nights = nightly.filter((c) => !Number.isNaN(c));
    const hot = nights.filter((c) => c > 26).length;
    const found = (100 * hot) / nights.length;
    criteria.push(
      criterion('bedroom above 26 °C at night', found, 1, '% of hours, 22:00 to 07:00'),
    );
  }
  return {
    method: 'CIBSE TM59:2017, predominantly naturally ventilated homes',
    criteria,
    passed: criteria.every((one) => one.met),
    worstAt: worstHour(excessK, hours.year),
  };
}

/**
 * Homes whose windows do not open enough: above 26 °C in at most 3 % of the occupied hours of the year.
 *
 * Source: CIBSE TM59:2017, section 4.3 (from memory).
 */
export function tm59Mechanical(hours: OverheatingHours): OverheatingFindings {
  const { operativeC, occupied, year } = hours;
  const excessK = operativeC.map((c, h) => (occupied[h] === 0 ? Number.NEGATIVE_INFINITY : c - 26));
  const count = occupied.reduce((sum, one) => sum + one, 0);
  const over = excessK.filter((k) => k > 0).length;
  const found = count === 0 ? 0 : (100 * over) / count;
  const criteria = [criterion('above 26 °C', found, 3, '% of occupied hours')];
  return {
    method: 'CIBSE TM59:2017, predominantly mechanically ventilated homes',
    criteria,
    passed: criteria[0].met,
    worstAt: worstHour(excessK, year),
  };
}

const isNight = (hour: number): boolean => hour % 24 >= 22 || hour % 24 < 7;

function worstHour(excessK: Float64Array, year: number): string {
  let best = 0;
  let at = -1;
  for (let h = 0; h < excessK.length; h++) if (excessK[h] > best) [best, at] = [excessK[h], h];
  return at < 0 ? '' : hourName(at, excessK.length, year);
}

/** All methods on one room. Clock times are local standard time. */
export function overheatingFindings(hours: OverheatingHours): OverheatingFindings[] {
  return [tm52(hours), tm59Natural(hours), tm59Mechanical(hours)];
}
