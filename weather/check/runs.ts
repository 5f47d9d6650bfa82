// Runs of steps that share something, as places.
import { stepText, type WeatherSeries } from '../series/series.ts';
import { mostPlaces, type Place } from './finding.ts';

export interface Run {
  readonly from: number;
  readonly count: number;
}

/** Maximal runs of steps for which `is` holds. */
export function runsWhere(count: number, is: (k: number) => boolean): Run[] {
  const runs: Run[] = [];
  let from = -1;
  for (let k = 0; k <= count; k++) {
    const holds = k < count && is(k);
    if (holds && from < 0) from = k;
    if (!holds && from >= 0) {
      runs.push({ from, count: k - from });
      from = -1;
    }
  }
  return runs;
}

export function placesOf(series: WeatherSeries, runs: readonly Run[]): Place[] {
  return runs.slice(0, mostPlaces).map(({ from, count }) => ({
    from,
    count,
    row: rowNear(series, from),
    when: stepText(series, from),
  }));
}

/** Row of a step, or of the last one before it that the file holds. */
function rowNear(series: WeatherSeries, k: number): number {
  for (let i = k; i >= Math.max(0, k - 100_000); i--)
    if (series.rowOf[i] > 0) return series.rowOf[i];
  return 0;
}

export function totalOf(runs: readonly Run[]): number {
  return runs.reduce((sum, run) => sum + run.count, 0);
}

/** "6 h", "12 min", "3 days" of a number of steps. */
export function lengthText(series: WeatherSeries, steps: number): string {
  const minutes = (steps * series.intervalS) / 60;
  if (minutes < 60) return `${minutes} min`;
  if (minutes < 72 * 60) return `${Number((minutes / 60).toFixed(1))} h`;
  return `${Number((minutes / 1440).toFixed(1))} days`;
}
