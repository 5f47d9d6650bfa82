// Checks of the values of a series: limits of nature, stuck sensors, spikes and jumps, and what the sun
// allows. Each returns what it found; `mend` says which values it would take out or change.
import { limitsOf } from '../map/detect-columns.ts';
import { quantityWords } from '../map/mapping.ts';
import { type Quantity, radiationQuantities, slack } from '../read/quantities.ts';
import { columnOf, type SeriesColumn, stepText, type WeatherSeries } from '../series/series.ts';
import type { HourlySun } from '../steps/hourly-sun.ts';
import type { Finding } from './finding.ts';
import { lengthText, placesOf, type Run, runsWhere, totalOf } from './runs.ts';

/** A finding on its way: with the change that its repair makes, in place. */
export interface Draft extends Omit<Finding, 'isAccepted'> {
  readonly mend: (values: Float64Array) => void;
  /** Steps whose values are taken out, to be filled as gaps at once. */
  readonly takesOut?: readonly Run[];
}

const takeOut = (runs: readonly Run[]) => ({
  takesOut: runs,
  mend: (values: Float64Array) => {
    for (const { from, count } of runs) values.fill(Number.NaN, from, from + count);
  },
});

const takenOut = 'Take the values out and fill them from those beside, as gaps of their length.';

export function rangeDrafts(series: WeatherSeries, column: SeriesColumn): Draft[] {
  const { quantity, values, heading } = column;
  const [low, high] = limitsOf(quantity);
  const near = slack[quantity as Quantity] ?? 0;
  const drafts: Draft[] = [];
  // An unlimited cloud base is infinite and no fault.
  const off = (k: number) => {
    const value = values[k];
    if (value === Number.POSITIVE_INFINITY) return 0;
    return value < low ? low - value : value - high;
  };
  const just = runsWhere(values.length, (k) => off(k) > 0 && off(k) <= near);
  const far = runsWhere(values.length, (k) => off(k) > near);
  const name = quantityWords[quantity];
  if (just.length > 0)
    drafts.push({
      id: `offset-${quantity}`,
      kind: 'offset',
      quantity,
      level: 'blocks',
      title: `${name}: just outside its limits`,
      text: `${heading}: ${totalOf(just)} values lie just outside ${low} to ${high} (SI), as zero offsets and humid sensors do.`,
      count: totalOf(just),
      places: placesOf(series, just),
      repair: 'Draw them back to the limit.',
      mend: (all) => {
        for (const { from, count } of just)
          for (let k = from; k < from + count; k++) all[k] = Math.min(high, Math.max(low, all[k]));
      },
    });
  if (far.length > 0)
    drafts.push({
      id: `range-${quantity}`,
      kind: 'range',
      quantity,
      level: 'blocks',
      title: `${name}: outside what nature does`,
      text: `${heading}: ${totalOf(far)} values lie outside ${low} to ${high} (SI), the first ${Number(values[far[0].from].toPrecision(6))} at ${stepText(series, far[0].from)}.`,
      count: totalOf(far),
      places: placesOf(series, far),
      repair: takenOut,
      ...takeOut(far),
    });
  return drafts;
}

/**
 * How long a value may stay the same to its last digit before the sensor is doubted [h]: longer than
 * any such run in the open tables that the tests read. Common practice, no source.
 */
const stuckAfterH: Partial<Record<Quantity, number>> = {
  dryBulbC: 24,
  dewPointC: 36,
  relativeHumidity: 36,
  windMPerS: 24,
  windFromDeg: 48,
  pressurePa: 60,
  ghiWPerM2: 5,
};

/** Few different values: written in steps so coarse that standing still proves nothing. */
function isCoarse(values: Float64Array): boolean {
  const seen = new Set<number>();
  for (const value of values) {
    seen.add(value);
    if (seen.size > 30) return false;
  }
  return values.length > 1000;
}

export function stuckDrafts(series: WeatherSeries, column: SeriesColumn): Draft[] {
  const { quantity, values, heading } = column;
  const limitH = stuckAfterH[quantity as Quantity];
  if (limitH === undefined) return [];
  if (isCoarse(values)) return [];
  const least = Math.max(6, Math.round((limitH * 3600) / series.intervalS));
  const runs: Run[] = [];
  for (let k = 0; k < values.length; ) {
    let end = k + 1;
    while (end < values.length && values[end] === values[k]) end++;
    const isUsual =
      (quantity === 'relativeHumidity' && values[k] > 0.97) ||
      (radiationQuantities.has(quantity as Quantity) && values[k] < 3) ||
      // Calm air stays calm for days where instruments start at a breeze.
      ((quantity === 'windMPerS' || quantity === 'windFromDeg') &&
        values[k] === 0 &&
        end - k < least * 3);
    if (end - k >= least && !isUsual) runs.push({ from: k, count: end - k });
    k = end;
  }
  if (runs.length === 0) return [];
  const longest = runs.reduce((most, run) => (run.count > most.count ? run : most));
  return [
    {
      id: `stuck-${quantity}`,
      kind: 'stuck',
      quantity,
      level: 'doubt',
      title: `${quantityWords[quantity]} stuck at ${Number(values[longest.from].toPrecision(4))}`,
      text: `${heading}: the same value to the last digit for ${lengthText(series, longest.count)} from ${stepText(series, longest.from)}${runs.length > 1 ? `, and ${runs.length - 1} times more` : ''}.`,
      count: totalOf(runs),
      places: placesOf(series, runs),
      repair: takenOut,
      ...takeOut(runs),
    },
  ];
}

/** Change within an hour that is doubted: the record for air is 27 K in 2 minutes, 10 K an hour is rare. */
const jumpPerHour: Partial<Record<Quantity, number>> = {
  dryBulbC: 15,
  dewPointC: 25,
  pressurePa: 2000,
};

export function jumpDrafts(series: WeatherSeries, column: SeriesColumn): Draft[] {
  const { quantity, values, heading } = column;
  const limit = jumpPerHour[quantity as Quantity];
  if (limit === undefined) return [];
  const apart = Math.max(1, series.intervalS / 3600) * limit;
  const isJoin = (k: number) =>
    series.isStitched && series.sourceYear[k] !== series.sourceYear[k - 1];
  const [low, high] = limitsOf(quantity);
  const isNatural = (value: number) => value >= low && value <= high;
  const spikes: Run[] = [];
  const jumps: Run[] = [];
  for (let k = 1; k < values.length; k++) {
    const rise = values[k] - values[k - 1];
    if (!(Math.abs(rise) > apart) || isJoin(k)) continue;
    // What lies outside nature is another finding already.
    if (!isNatural(values[k]) || !isNatural(values[k - 1])) continue;
    const back = k + 1 < values.length ? values[k + 1] - values[k] : 0;
    if (Math.abs(back) > apart && back * rise < 0) {
      spikes.push({ from: k, count: 1 });
      k++;
    } else jumps.push({ from: k, count: 1 });
  }
  const drafts: Draft[] = [];
  if (spikes.length > 0)
    drafts.push({
      id: `spike-${quantity}`,
      kind: 'spike',
      quantity,
      level: 'doubt',
      title: `${quantityWords[quantity]}: single values far from both neighbours`,
      text: `${heading}: ${spikes.length} values jump away and back at once, the first at ${stepText(series, spikes[0].from)}.`,
      count: spikes.length,
      places: placesOf(series, spikes),
      repair: takenOut,
      ...takeOut(spikes),
    });
  if (jumps.length > 0)
    drafts.push({
      id: `jump-${quantity}`,
      kind: 'jump',
      quantity,
      level: 'doubt',
      title: `${quantityWords[quantity]} jumps`,
      text: `${heading}: ${jumps.length} changes of more than ${apart} within one step, the first at ${stepText(series, jumps[0].from)}: a sensor may have been moved or changed.`,
      count: jumps.length,
      places: placesOf(series, jumps),
      repair: null,
      mend: () => {},
    });
  return drafts;
}

/**
 * Radiation against the sun: light in the night, and more light than the sky lets through.
 * Source of the limits: C. Long, Y. Shi, "An automated quality assessment and control algorithm for
 * surface radiation measurements", Open Atmospheric Science Journal 2 (2008), pp. 23-37: physically
 * possible, global 1.5·S·µ^1.2 + 100, diffuse 0.95·S·µ^1.2 + 50, direct S.
 */
export function sunDrafts(series: WeatherSeries, column: SeriesColumn, sun: HourlySun): Draft[] {
  const { quantity, values, heading } = column;
  const { sunlitShare, meanUp, normalWPerM2 } = sun;
  const drafts: Draft[] = [];
  const n = values.length;
  const dark = (k: number) =>
    sunlitShare[k] === 0 &&
    (k === 0 || sunlitShare[k - 1] === 0) &&
    (k + 1 >= n || sunlitShare[k + 1] === 0);
  const night = runsWhere(n, (k) => values[k] > 5 && dark(k));
  if (night.length > 0) {
    let inNight = 0;
    let all = 0;
    for (let k = 0; k < n; k++) if (values[k] > 0) all += values[k];
    for (const { from, count } of night)
      for (let k = from; k < from + count; k++) inNight += values[k];
    const isLittle = inNight < 0.01 * all;
    drafts.push({
      id: `night-sun-${quantity}`,
      kind: 'night-sun',
      quantity,
      level: 'doubt',
      title: `${quantityWords[quantity]} in the night`,
      text: `${heading}: ${totalOf(night)} values above 5 W/m² while the sun of this site is down, ${Number(((100 * inNight) / all).toFixed(1))} % of all its light.`,
      count: totalOf(night),
      places: placesOf(series, night),
      // Much light in the night is a clock or a place that is wrong: nothing to be cut off.
      repair: isLittle ? 'Set them to 0.' : null,
      mend: (out) => {
        for (const { from, count } of night) out.fill(0, from, from + count);
      },
    });
  }
  const limit = (k: number) => {
    const s = normalWPerM2[k];
    if (quantity === 'dniWPerM2') return s;
    const rise = (sunlitShare[k] * meanUp[k]) ** 1.2;
    return quantity === 'dhiWPerM2' ? 0.95 * s * rise + 50 : 1.5 * s * rise + 100;
  };
  const above = runsWhere(n, (k) => values[k] > limit(k) && sunlitShare[k] > 0);
  if (above.length > 0)
    drafts.push({
      id: `above-clear-${quantity}`,
      kind: 'above-clear',
      quantity,
      level: 'doubt',
      title: `${quantityWords[quantity]} above what the sky lets through`,
      text: `${heading}: ${totalOf(above)} values above the physically possible limit of the clear sky, the first at ${stepText(series, above[0].from)}.`,
      count: totalOf(above),
      places: placesOf(series, above),
      repair: takenOut,
      ...takeOut(above),
    });
  return drafts;
}

/** Whether global = direct · sin h + diffuse, where a table has all three. */
export function closureDrafts(series: WeatherSeries, sun: HourlySun): Draft[] {
  const [ghi, dni, dhi] = (['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'] as const).map((q) =>
    columnOf(series, q),
  );
  if (!ghi || !dni || !dhi) return [];
  const { meanUp } = sun;
  const apart = (k: number) => ghi.values[k] - dni.values[k] * meanUp[k] - dhi.values[k];
  const isLit = (k: number) => meanUp[k] > 0.17 && ghi.values[k] > 20; // sun above 10 degrees
  const open = runsWhere(
    series.count,
    (k) => isLit(k) && Math.abs(apart(k)) > Math.max(50, 0.15 * ghi.values[k]),
  );
  const lit = totalOf(runsWhere(series.count, isLit));
  const count = totalOf(open);
  if (count <= lit * 0.01) return [];
  return [
    {
      id: 'closure',
      kind: 'closure',
      quantity: 'dniWPerM2',
      level: 'doubt',
      title: 'Global, direct and diffuse do not agree',
      text: `In ${count} of ${lit} steps with the sun above 10° global differs from direct · sin h + diffuse by more than 15 % and 50 W/m².`,
      count,
      places: placesOf(series, open),
      repair: 'Compute the direct normal from global and diffuse in these steps.',
      mend: (values) => {
        for (const { from, count: length } of open)
          for (let k = from; k < from + length; k++)
            values[k] = Math.min(
              sun.normalWPerM2[k],
              Math.max(0, (ghi.values[k] - dhi.values[k]) / meanUp[k]),
            );
      },
    },
  ];
}
