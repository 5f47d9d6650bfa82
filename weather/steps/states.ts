// Hourly readings onto step ends: linear between them, around the end of the year.
import type { WeatherColumn } from '../weather-year.ts';

/** Where in its hour a value stands: its reading's moment, or the middle for a mean. */
export function momentInHour(column: Pick<WeatherColumn, 'stands'>): number {
  return column.stands.kind === 'reading' ? column.stands.at : 0.5;
}

/** Values at the end of each step, the year's start first: `hours * perHour + 1` of them. */
export function atStepEnds(values: Float64Array, at: number, perHour: number): Float64Array {
  const hours = values.length;
  const ends = new Float64Array(hours * perHour + 1);
  for (let k = 0; k < ends.length; k++) {
    const x = k / perHour - at;
    const i = Math.floor(x + 1e-9);
    const share = Math.max(0, x - i);
    const before = values[(i + hours) % hours];
    const after = values[(i + 1 + hours) % hours];
    ends[k] = before + (after - before) * share;
  }
  return ends;
}

/** Wind direction in the middle of each step: the way round between two readings that is shorter. */
export function directionInSteps(
  valuesDeg: Float64Array,
  at: number,
  perHour: number,
): Float64Array {
  const hours = valuesDeg.length;
  const middles = new Float64Array(hours * perHour);
  for (let k = 0; k < middles.length; k++) {
    const x = (k + 0.5) / perHour - at;
    const i = Math.floor(x);
    const before = valuesDeg[(i + hours) % hours];
    const turn = ((valuesDeg[(i + 1 + hours) % hours] - before + 540) % 360) - 180;
    middles[k] = (before + turn * (x - i) + 360) % 360;
  }
  return middles;
}
