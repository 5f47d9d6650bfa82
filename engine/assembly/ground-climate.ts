// What the ground knows of the weather: monthly means, the yearly wave in them, and the mean wind.
import type { WeatherSteps } from '../../weather/index.ts';
import type { YearlyCycle } from '../physics/index.ts';
import type { StepClock } from './step-clock.ts';

export interface GroundClimate {
  /** Outdoor air, January first. */
  readonly monthC: readonly number[];
  readonly outside: YearlyCycle;
  /** When the wave is coldest, counted in months: 1 is the middle of January. Not a whole number. */
  readonly coldestMonth: number;
  /** Mean of the year at the weather station's 10 m. */
  readonly windMPerS: number;
}

/** Month of every step, 0 to 11. */
export function monthOfStep(clock: StepClock): Int8Array {
  const ofDay = clock.monthDay.map((name) => Number(name.slice(0, 2)) - 1);
  return Int8Array.from({ length: clock.count }, (_, k) => ofDay[clock.day[k]]);
}

/** Means of a step series by month. */
export function monthlyMeans(values: ArrayLike<number>, clock: StepClock): number[] {
  const month = monthOfStep(clock);
  const sums = new Float64Array(12);
  const counts = new Float64Array(12);
  for (let k = 0; k < clock.count; k++) {
    sums[month[k]] += values[k];
    counts[month[k]]++;
  }
  return Array.from(sums, (sum, m) => sum / counts[m]);
}

/**
 * Mean and half swing of twelve monthly means.
 *
 * Source: ISO 13370:2017, Annex C: the amplitude is half of the difference of warmest and coldest month.
 */
export function yearlyCycle(monthC: readonly number[]): YearlyCycle {
  return {
    meanC: monthC.reduce((sum, value) => sum + value, 0) / 12,
    amplitudeK: (Math.max(...monthC) - Math.min(...monthC)) / 2,
  };
}

/**
 * Month in which a yearly wave through the means is coldest, from 0.5 up to 12.5; 1 is mid-January.
 *
 * The first harmonic gives it: the coldest month itself jumps between neighbours that differ little.
 */
export function coldestMonthOf(monthC: readonly number[]): number {
  const turn = Math.PI / 6;
  let cosine = 0;
  let sine = 0;
  monthC.forEach((value, m) => {
    cosine += value * Math.cos(turn * (m + 1));
    sine += value * Math.sin(turn * (m + 1));
  });
  const month = Math.atan2(-sine, -cosine) / turn; // where −cos is in phase with the means
  return month < 0.5 ? month + 12 : month;
}

/** The same, computed when first asked for: most projects never ask. */
export function groundClimateOnce(steps: WeatherSteps, clock: StepClock): () => GroundClimate {
  let known: GroundClimate | null = null;
  return () => {
    known ??= groundClimate(steps, clock);
    return known;
  };
}

function groundClimate(steps: WeatherSteps, clock: StepClock): GroundClimate {
  const middles = Float64Array.from(
    { length: clock.count },
    (_, k) => (steps.dryBulbC[k] + steps.dryBulbC[k + 1]) / 2,
  );
  const monthC = monthlyMeans(middles, clock);
  return {
    monthC,
    outside: yearlyCycle(monthC),
    coldestMonth: coldestMonthOf(monthC),
    windMPerS: steps.windMPerS.reduce((sum, wind) => sum + wind, 0) / steps.windMPerS.length,
  };
}
