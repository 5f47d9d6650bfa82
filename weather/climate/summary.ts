// What a weather year is like: months, extremes, spells and degree days.
import { monthStarts } from '../calendar.ts';
import type { WeatherYear } from '../weather-year.ts';
import { type DesignConditions, designConditions } from './design-conditions.ts';

export interface MonthClimate {
  /** 1 to 12. */
  readonly month: number;
  readonly meanDryBulbC: number;
  readonly minDryBulbC: number;
  readonly maxDryBulbC: number;
  readonly meanDewPointC: number;
  readonly meanWindMPerS: number;
  /** Energy of the month on the horizontal, facing the sun, and diffuse. */
  readonly ghiJPerM2: number;
  readonly dniJPerM2: number;
  readonly dhiJPerM2: number;
}

/** Consecutive days with the lowest or highest mean temperature. */
export interface Spell {
  /** Day of the year, from 0. */
  readonly firstDay: number;
  readonly days: number;
  readonly meanDryBulbC: number;
}

export interface ClimateSummary {
  readonly months: readonly MonthClimate[];
  readonly meanDryBulbC: number;
  readonly minDryBulbC: number;
  readonly maxDryBulbC: number;
  /** Hours of the year, from 0. */
  readonly coldestHour: number;
  readonly hottestHour: number;
  readonly coldestSpell: Spell;
  readonly hottestSpell: Spell;
  /** Daily means below 18 °C, summed [K·d]. */
  readonly heatingDegreeDays18Kd: number;
  /** Daily means above 18 °C, summed [K·d]. */
  readonly coolingDegreeDays18Kd: number;
  readonly ghiJPerM2: number;
  readonly dniJPerM2: number;
  readonly dhiJPerM2: number;
  readonly meanWindMPerS: number;
  readonly design: DesignConditions;
}

const spellDays = 3;

export function climateSummary(year: WeatherYear): ClimateSummary {
  const air = year.dryBulbC.values;
  const starts = monthStarts(year.hours);
  const months = Array.from({ length: 12 }, (_, m): MonthClimate => {
    const part = (values: Float64Array) => values.subarray(starts[m], starts[m + 1]);
    const t = part(air);
    return {
      month: m + 1,
      meanDryBulbC: mean(t),
      minDryBulbC: Math.min(...t),
      maxDryBulbC: Math.max(...t),
      meanDewPointC: mean(part(year.dewPointC.values)),
      meanWindMPerS: mean(part(year.windMPerS.values)),
      ghiJPerM2: 3600 * sum(part(year.ghiWPerM2.values)),
      dniJPerM2: 3600 * sum(part(year.dniWPerM2.values)),
      dhiJPerM2: 3600 * sum(part(year.dhiWPerM2.values)),
    };
  });
  const daily = Float64Array.from({ length: year.hours / 24 }, (_, d) =>
    mean(air.subarray(d * 24, d * 24 + 24)),
  );
  const coldestHour = air.reduce((best, t, h) => (t < air[best] ? h : best), 0);
  const hottestHour = air.reduce((best, t, h) => (t > air[best] ? h : best), 0);
  return {
    months,
    meanDryBulbC: mean(air),
    minDryBulbC: air[coldestHour],
    maxDryBulbC: air[hottestHour],
    coldestHour,
    hottestHour,
    coldestSpell: spell(daily, (a, b) => a < b),
    hottestSpell: spell(daily, (a, b) => a > b),
    heatingDegreeDays18Kd: degreeDaysKd(daily, 18, 'below'),
    coolingDegreeDays18Kd: degreeDaysKd(daily, 18, 'above'),
    ghiJPerM2: 3600 * sum(year.ghiWPerM2.values),
    dniJPerM2: 3600 * sum(year.dniWPerM2.values),
    dhiJPerM2: 3600 * sum(year.dhiWPerM2.values),
    meanWindMPerS: mean(year.windMPerS.values),
    design: designConditions(year),
  };
}

/**
 * Sum over the days of how far the daily mean lies below or above a base [K·d].
 * Source: ASHRAE Handbook of Fundamentals, chapter "Climatic design information"; mean of the 24 hours
 * in place of the mean of lowest and highest.
 */
export function degreeDaysKd(
  dailyMeanC: Float64Array,
  baseC: number,
  side: 'below' | 'above',
): number {
  const sign = side === 'below' ? 1 : -1;
  return dailyMeanC.reduce((total, t) => total + Math.max(0, sign * (baseC - t)), 0);
}

function spell(daily: Float64Array, isMore: (a: number, b: number) => boolean): Spell {
  let best: Spell | null = null;
  for (let d = 0; d + spellDays <= daily.length; d++) {
    const meanDryBulbC = mean(daily.subarray(d, d + spellDays));
    if (best === null || isMore(meanDryBulbC, best.meanDryBulbC))
      best = { firstDay: d, days: spellDays, meanDryBulbC };
  }
  if (best === null) throw new Error('a year shorter than a spell');
  return best;
}

function sum(values: Float64Array): number {
  return values.reduce((total, value) => total + value, 0);
}

function mean(values: Float64Array): number {
  return sum(values) / values.length;
}
