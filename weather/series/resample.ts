// A series of any interval → one that divides the hour: radiation keeps its energy and follows the sun
// within the interval, states lie on straight lines between their moments.
import type { Quantity } from '../read/quantities.ts';
import { radiationQuantities } from '../read/quantities.ts';
import type { Stands } from '../weather-year.ts';
import type { SeriesColumn, WeatherSeries } from './series.ts';
import { seriesSun } from './series-sun.ts';

const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));

/** The series itself where its interval divides the hour; else in parts that do. */
export function dividingHour(series: WeatherSeries): WeatherSeries {
  const { intervalS } = series;
  if (3600 % intervalS === 0) return series;
  // Half an interval is where the window of a reading begins.
  const partS = gcd(gcd(intervalS, 3600), intervalS / 2);
  const parts = intervalS / partS;
  const count = series.count * parts;
  const sourceYear = Int16Array.from(
    { length: count },
    (_, k) => series.sourceYear[Math.floor(k / parts)],
  );
  const rowOf = Int32Array.from({ length: count }, (_, k) => series.rowOf[Math.floor(k / parts)]);
  const finer: WeatherSeries = {
    ...series,
    intervalS: partS,
    count,
    sourceYear,
    rowOf,
    columns: [],
  };
  const sun = seriesSun(finer);
  const columns = series.columns.map((column): SeriesColumn => {
    const values = radiationQuantities.has(column.quantity as Quantity)
      ? spreadParts(
          column,
          parts,
          column.quantity === 'dniWPerM2' ? sun.sunlitShare : sun.extraterrestrialWPerM2,
        )
      : lineParts(column, parts, column.quantity === 'windFromDeg');
    const stands: Stands = radiationQuantities.has(column.quantity as Quantity)
      ? { kind: 'mean' }
      : { kind: 'reading', at: 0.5 };
    return { ...column, values, stands };
  });
  return { ...finer, columns };
}

/**
 * Each value's energy laid over its window in proportion to a course of the clear day: none before
 * sunrise, none lost. Where the course is 0 throughout it is laid evenly.
 */
function spreadParts(
  { values, stands }: SeriesColumn,
  parts: number,
  course: Float64Array,
): Float64Array {
  const out = new Float64Array(values.length * parts);
  const shift = stands.kind === 'mean' ? 0 : Math.round((stands.at - 0.5) * parts);
  const last = out.length - 1;
  for (let k = 0; k < values.length; k++) {
    const from = k * parts + shift;
    let sum = 0;
    for (let p = 0; p < parts; p++) sum += course[Math.min(last, Math.max(0, from + p))];
    for (let p = 0; p < parts; p++) {
      const i = Math.min(last, Math.max(0, from + p));
      out[i] += values[k] * (sum > 0 ? (course[i] * parts) / sum : 1);
    }
  }
  return out;
}

/** Values in the middle of each part, on straight lines; directions the shorter way round. */
function lineParts(
  { values, stands }: SeriesColumn,
  parts: number,
  isDirection: boolean,
): Float64Array {
  const at = stands.kind === 'mean' ? 0.5 : stands.at;
  const n = values.length;
  return Float64Array.from({ length: n * parts }, (_, i) => {
    const x = (i + 0.5) / parts - at;
    const k = Math.min(n - 1, Math.max(0, Math.floor(x)));
    const next = Math.min(n - 1, k + 1);
    const share = Math.min(1, Math.max(0, x - k));
    if (!isDirection) return values[k] + (values[next] - values[k]) * share;
    const turn = ((values[next] - values[k] + 540) % 360) - 180;
    return (values[k] + turn * share + 360) % 360;
  });
}

/**
 * Means over hours that begin at `hourS`, from steps that divide the hour.
 * @param hourS start of each hour, seconds on the series' clock; steps outside the series are NaN
 */
export function hourlyMeans(
  series: WeatherSeries,
  column: SeriesColumn,
  hourS: Float64Array,
): Float64Array {
  const { startS, intervalS } = series;
  const { values } = column;
  const n = 3600 / intervalS;
  const isDirection = column.quantity === 'windFromDeg';
  return hourS.map((start) => {
    const from = (start - startS) / intervalS;
    const first = Math.floor(from + 1e-9);
    const share = Math.max(0, from - first);
    if (n === 1) return values[first] ?? Number.NaN; // a part of an hour moves the moment, not the value
    let sum = 0;
    let east = 0;
    let north = 0;
    const steps = share > 1e-9 ? n + 1 : n;
    for (let s = 0; s < steps; s++) {
      const weight = s === 0 ? 1 - share : s === n ? share : 1;
      const value = values[first + s] ?? Number.NaN;
      if (isDirection) {
        east += weight * Math.sin((value * Math.PI) / 180);
        north += weight * Math.cos((value * Math.PI) / 180);
      } else sum += weight * value;
    }
    if (!isDirection) return sum / n;
    return ((Math.atan2(east, north) * 180) / Math.PI + 360) % 360;
  });
}

/** What an hourly mean stands for, when its steps stood for `stands`. */
export function hourlyStands(series: WeatherSeries, stands: Stands, shareOfHour: number): Stands {
  const { intervalS } = series;
  if (intervalS === 3600) {
    if (stands.kind === 'mean')
      return shareOfHour === 0 ? stands : { kind: 'reading', at: 0.5 + shareOfHour };
    return { kind: 'reading', at: stands.at + shareOfHour };
  }
  if (stands.kind === 'mean' || stands.at === 0.5) return { kind: 'mean' };
  return { kind: 'reading', at: 0.5 + ((stands.at - 0.5) * intervalS) / 3600 };
}
