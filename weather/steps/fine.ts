// Weather finer than the hour onto the steps of a march. Radiation keeps its energy, interval by
// interval, and where a step is the shorter one it falls only while the sun is up; states are means
// around the ends of steps, over a step or an interval, whichever is longer: what a step cannot resolve
// does not reach it as noise, and air and dew point stay in order.
import type { WeatherColumn } from '../weather-year.ts';
import type { SunTrack } from './sun-track.ts';

/** Running sum: entry k is the sum of the values before k. */
function sums(values: Float64Array): Float64Array {
  const all = new Float64Array(values.length + 1);
  for (let k = 0; k < values.length; k++) all[k + 1] = all[k] + values[k];
  return all;
}

/** Sum from the start to a place between values, around the end of the year. */
function sumTo(all: Float64Array, at: number): number {
  const n = all.length - 1;
  const turns = Math.floor(at / n);
  const x = at - turns * n;
  const k = Math.min(n - 1, Math.floor(x));
  return turns * all[n] + all[k] + (all[k + 1] - all[k]) * (x - k);
}

/** How far the values' windows lie from their own interval, in intervals. */
const shiftOf = ({ stands }: WeatherColumn) => (stands.kind === 'mean' ? 0 : stands.at - 0.5);

/** Means over the steps. @param intervalS of the column */
export function fineRadiation(
  column: WeatherColumn,
  intervalS: number,
  track: SunTrack,
): Float64Array {
  const { stepS, count, sunlitShare } = track;
  const shift = shiftOf(column);
  const per = stepS / intervalS;
  const pieces = intervalS / stepS;
  if (per >= 1 || !Number.isInteger(pieces) || shift !== 0) {
    const all = sums(column.values);
    return Float64Array.from({ length: count }, (_, k) =>
      Math.max(0, (sumTo(all, (k + 1) * per - shift) - sumTo(all, k * per - shift)) / per),
    );
  }
  const means = new Float64Array(count);
  for (let i = 0; i < column.values.length; i++) {
    const value = column.values[i];
    if (value === 0) continue;
    let lit = 0;
    for (let s = 0; s < pieces; s++) lit += sunlitShare[i * pieces + s];
    for (let s = 0; s < pieces; s++) {
      const k = i * pieces + s;
      means[k] = lit > 0.05 ? (value * pieces * sunlitShare[k]) / lit : value;
    }
  }
  return means;
}

/** States at the ends of steps, the year's start first: `count + 1` of them. */
export function fineStates(
  column: WeatherColumn,
  intervalS: number,
  stepS: number,
  count: number,
): Float64Array {
  const all = sums(column.values);
  const per = stepS / intervalS;
  const width = Math.max(1, per);
  const shift = shiftOf(column);
  return Float64Array.from({ length: count + 1 }, (_, k) => {
    const middle = k * per - shift;
    return (sumTo(all, middle + width / 2) - sumTo(all, middle - width / 2)) / width;
  });
}

/** Direction over each step, as the mean of unit vectors. */
export function fineDirection(
  column: WeatherColumn,
  intervalS: number,
  stepS: number,
  count: number,
): Float64Array {
  const east = sums(column.values.map((deg) => Math.sin((deg * Math.PI) / 180)));
  const north = sums(column.values.map((deg) => Math.cos((deg * Math.PI) / 180)));
  const per = stepS / intervalS;
  return Float64Array.from({ length: count }, (_, k) => {
    const x = sumTo(east, (k + 1) * per) - sumTo(east, k * per);
    const y = sumTo(north, (k + 1) * per) - sumTo(north, k * per);
    return ((Math.atan2(x, y) * 180) / Math.PI + 360) % 360;
  });
}
