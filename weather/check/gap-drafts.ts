// Values that were not measured: short gaps from both sides, longer ones from the days beside them, and
// none that is longer.
import { quantityWords } from '../map/mapping.ts';
import { type Quantity, radiationQuantities } from '../read/quantities.ts';
import { type SeriesColumn, stepText, type WeatherSeries } from '../series/series.ts';
import type { HourlySun } from '../steps/hourly-sun.ts';
import { lengthText, placesOf, type Run, runsWhere, totalOf } from './runs.ts';
import type { Draft } from './value-checks.ts';

/** The longest gap that is bridged from its two sides [h]. */
export const longestShortGapH = 3;
/** The longest gap that is filled from the days beside it [h]. */
export const longestFilledGapH = 72;

export function gapDrafts(
  series: WeatherSeries,
  column: SeriesColumn,
  sun: HourlySun | null,
): Draft[] {
  const { quantity, values, heading } = column;
  const stepH = series.intervalS / 3600;
  const gaps = runsWhere(values.length, (k) => Number.isNaN(values[k]));
  const short = gaps.filter(({ count }) => count * stepH <= longestShortGapH);
  const long = gaps.filter(
    ({ count }) => count * stepH > longestShortGapH && count * stepH <= longestFilledGapH,
  );
  const tooLong = gaps.filter(({ count }) => count * stepH > longestFilledGapH);
  const isSun =
    radiationQuantities.has(quantity as Quantity) || quantity === 'beamHorizontalWPerM2';
  const course = isSun && sun ? courseOf(quantity, sun) : null;
  const drafts: Draft[] = [];
  const add = (
    kind: 'gap-short' | 'gap-long' | 'gap-too-long',
    runs: readonly Run[],
    repair: string | null,
    mend: Draft['mend'],
  ) => {
    if (runs.length === 0) return;
    const longest = runs.reduce((most, run) => (run.count > most.count ? run : most));
    drafts.push({
      id: `${kind}-${quantity}`,
      kind,
      quantity,
      level: 'blocks',
      title: `${quantityWords[quantity]}: ${runs.length === 1 ? `gap of ${lengthText(series, longest.count)}` : `${runs.length} gaps`}`,
      text: `${heading}: ${totalOf(runs)} values are missing in ${runs.length} ${runs.length === 1 ? 'gap' : 'gaps'}, the longest ${lengthText(series, longest.count)} from ${stepText(series, longest.from)}.`,
      count: totalOf(runs),
      places: placesOf(series, runs),
      repair,
      mend,
    });
  };
  add(
    'gap-short',
    short,
    course
      ? 'Fill along the course of the clear sky between both sides.'
      : 'Fill between the values on both sides.',
    (out) => {
      for (const gap of short) {
        if (course) bridgeCourse(out, course, gap);
        else bridge(out, gap, quantity === 'windFromDeg');
      }
    },
  );
  add('gap-long', long, 'Fill from the same hours of the days beside it.', (out) => {
    for (const gap of long)
      fillFromDays(out, gap, Math.round(24 / stepH), course, quantity === 'windFromDeg');
  });
  add('gap-too-long', tooLong, null, () => {});
  return drafts;
}

/** Fills steps that were taken out, as gaps of their length; longer ones than are filled stay open. */
export function fillRuns(
  series: WeatherSeries,
  quantity: SeriesColumn['quantity'],
  values: Float64Array,
  runs: readonly Run[],
  sun: HourlySun | null,
): void {
  const stepH = series.intervalS / 3600;
  const course = sun ? courseOf(quantity, sun) : null;
  const isDirection = quantity === 'windFromDeg';
  for (const run of runs) {
    if (run.count * stepH > longestFilledGapH) continue;
    if (run.count * stepH > longestShortGapH)
      fillFromDays(values, run, Math.round(24 / stepH), course, isDirection);
    else if (course) bridgeCourse(values, course, run);
    else bridge(values, run, isDirection);
  }
}

function courseOf(quantity: SeriesColumn['quantity'], sun: HourlySun): Float64Array {
  return quantity === 'dniWPerM2' ? sun.sunlitShare : sun.extraterrestrialWPerM2;
}

/** A straight line between both sides; at an end of the series the one side goes on. */
export function bridge(values: Float64Array, { from, count }: Run, isDirection: boolean): void {
  const before = from > 0 ? values[from - 1] : values[from + count];
  const after = from + count < values.length ? values[from + count] : before;
  const way = isDirection ? ((after - before + 540) % 360) - 180 : after - before;
  for (let k = 0; k < count; k++) {
    const value = before + (way * (k + 1)) / (count + 1);
    values[from + k] = isDirection ? (value + 360) % 360 : value;
  }
}

/** The same for the ratio to a course that is 0 at night, so that a bridged sunrise stays one. */
export function bridgeCourse(
  values: Float64Array,
  course: Float64Array,
  { from, count }: Run,
): void {
  const ratio = (k: number) =>
    k >= 0 && k < values.length && course[k] > 0 ? values[k] / course[k] : Number.NaN;
  const one = ratio(from - 1);
  const two = ratio(from + count);
  const first = Number.isNaN(one) ? (Number.isNaN(two) ? 0 : two) : one;
  const second = Number.isNaN(two) ? first : two;
  for (let k = 0; k < count; k++)
    values[from + k] = course[from + k] * (first + ((second - first) * (k + 1)) / (count + 1));
}

/** Days on each side that are looked at. */
const daysBeside = 3;

/**
 * Mean of the same hours of the nearest days that were measured, one on each side. Radiation enters as
 * ratio to the clear course of its own day; states are moved by a line so that both ends join.
 */
export function fillFromDays(
  values: Float64Array,
  { from, count }: Run,
  perDay: number,
  course: Float64Array | null,
  isDirection: boolean,
): void {
  const n = values.length;
  const seen = values.slice(
    Math.max(0, from - (daysBeside + 4) * perDay),
    Math.min(n, from + count + (daysBeside + 4) * perDay),
  );
  const shift = Math.max(0, from - (daysBeside + 4) * perDay);
  const measured = (k: number) =>
    k >= shift && k - shift < seen.length ? seen[k - shift] : Number.NaN;
  const daysOver = Math.ceil(count / perDay);
  const beside = (k: number, way: 1 | -1) => {
    for (let day = 1; day <= daysBeside + daysOver; day++) {
      const value = measured(k + way * day * perDay);
      if (Number.isNaN(value)) continue;
      if (!course) return value;
      const own = course[k + way * day * perDay];
      return own > 0 ? Math.min(value / own, 1.2) * course[k] : Number.NaN;
    }
    return Number.NaN;
  };
  for (let i = 0; i < count; i++) {
    const k = from + i;
    const [one, two] = [beside(k, -1), beside(k, 1)];
    if (course && course[k] === 0) values[k] = 0;
    else if (Number.isNaN(one) && Number.isNaN(two)) values[k] = course ? 0 : Number.NaN;
    else if (Number.isNaN(one)) values[k] = two;
    else if (Number.isNaN(two) || isDirection) values[k] = one;
    else values[k] = (one + two) / 2;
  }
  if (course || isDirection) return;
  // Both ends join: what is lacking there is laid over the gap as a line, fading with an hour or two inside.
  const before = from > 0 ? values[from - 1] : Number.NaN;
  const after = from + count < n ? values[from + count] : Number.NaN;
  const lackBefore = Number.isNaN(before) ? 0 : before - values[from];
  const lackAfter = Number.isNaN(after) ? 0 : after - values[from + count - 1];
  for (let i = 0; i < count; i++)
    values[from + i] +=
      lackBefore * (1 - (i + 1) / (count + 1)) + (lackAfter * (i + 1)) / (count + 1);
}
