// All checks of a mapped table, one after the other, with the repairs that were accepted made on the
// way: what a later check sees has been mended by the earlier ones. The table itself stays as it is.

import type { Parsed } from '../fault.ts';
import { dateOfDay } from '../map/date-text.ts';
import { quantityWords } from '../map/mapping.ts';
import type { MappedTable } from '../map/read-mapped.ts';
import { type Quantity, radiationQuantities } from '../read/quantities.ts';
import { dayShifts, middleOf } from '../repair/sun-phase.ts';
import { clearestDays, type SunTimeCheck, sunTimeOf } from '../repair/sun-time.ts';
import {
  columnOf,
  momentText,
  type SeriesColumn,
  type WeatherSeries,
  withColumns,
} from '../series/series.ts';
import { seriesSun } from '../series/series-sun.ts';
import { haurwitzWPerM2 } from '../sky/clear-sky.ts';
import type { HourlySun } from '../steps/hourly-sun.ts';
import type { Stands, WeatherNote } from '../weather-year.ts';
import { arrange } from './arrange.ts';
import { type Accepted, type Finding, isAccepted } from './finding.ts';
import { fillRuns, gapDrafts } from './gap-drafts.ts';
import { type SunSeason, seasonOf } from './season.ts';
import {
  closureDrafts,
  type Draft,
  jumpDrafts,
  rangeDrafts,
  stuckDrafts,
  sunDrafts,
} from './value-checks.ts';

export interface Inspection {
  /** With the accepted repairs made; values may still be missing. */
  readonly series: WeatherSeries;
  readonly findings: readonly Finding[];
  readonly sunTime: SunTimeCheck | null;
  readonly season: SunSeason | null;
}

const isSunColumn = ({ quantity }: SeriesColumn) =>
  radiationQuantities.has(quantity as Quantity) || quantity === 'beamHorizontalWPerM2';

export function inspectTable(
  table: MappedTable,
  accepted: Accepted = new Set(),
): Parsed<Inspection> {
  const arranged = arrange(table, accepted);
  if (!arranged.ok) return arranged;
  const inspection = inspectSeries(arranged.value.series, accepted);
  return {
    ok: true,
    value: { ...inspection, findings: [...arranged.value.findings, ...inspection.findings] },
  };
}

/** The sun-time check alone, of a table as it is mapped. */
export function sunTimeOfTable(table: MappedTable): SunTimeCheck | null {
  const arranged = arrange(table, new Set());
  return arranged.ok ? settleClock(arranged.value.series, new Set()).sunTime : null;
}

/** The checks of values and sun on a series. */
export function inspectSeries(from: WeatherSeries, accepted: Accepted = new Set()): Inspection {
  let series = from;
  const findings: Finding[] = [];
  const repairs: WeatherNote[] = [];
  const suns = new Map<string, HourlySun>();
  const sunOf = (stands: Stands): HourlySun => {
    const key = JSON.stringify(stands);
    const known = suns.get(key) ?? seriesSun(series, stands);
    suns.set(key, known);
    return known;
  };
  const settle = (draft: Draft): void => {
    const { mend, takesOut, ...finding } = draft;
    const ok = isAccepted(accepted, finding.id, finding.repair);
    findings.push({ ...finding, isAccepted: ok });
    const column = finding.quantity && columnOf(series, finding.quantity);
    if (!ok || !column) return;
    const values = column.values.slice();
    mend(values);
    if (takesOut)
      fillRuns(
        series,
        column.quantity,
        values,
        takesOut,
        isSunColumn(column) ? sunOf(column.stands) : null,
      );
    series = withColumns(series, [{ ...column, values }]);
    repairs.push({
      kind: 'repair',
      text: `${finding.text} ${finding.repair}`,
      count: finding.count,
    });
  };

  const clock = settleClock(series, accepted);
  series = clock.series;
  findings.push(...clock.findings);
  repairs.push(...clock.repairs);

  for (const { quantity } of series.columns) {
    const now = () => columnOf(series, quantity);
    for (const check of [rangeDrafts, stuckDrafts, jumpDrafts]) {
      const column = now();
      if (column) for (const draft of check(series, column)) settle(draft);
    }
  }
  for (const column of series.columns.filter(isSunColumn))
    for (const draft of sunDrafts(series, column, sunOf(column.stands))) settle(draft);
  const ghi = columnOf(series, 'ghiWPerM2');
  if (ghi) for (const draft of closureDrafts(series, sunOf(ghi.stands))) settle(draft);
  for (const { quantity } of series.columns) {
    const column = columnOf(series, quantity);
    if (!column) continue;
    const sun =
      isSunColumn(column) && column.values.some(Number.isNaN) ? sunOf(column.stands) : null;
    for (const draft of gapDrafts(series, column, sun)) settle(draft);
  }
  const leap = leapDraft(series);
  if (leap) findings.push(leap);
  return {
    series: { ...series, notes: [...series.notes, ...repairs] },
    findings,
    sunTime: clock.sunTime,
    season: clock.season,
  };
}

/** The sun-time check, and the shift of the rows where it was accepted. */
function settleClock(series: WeatherSeries, accepted: Accepted) {
  const none = {
    series,
    findings: [] as Finding[],
    repairs: [] as WeatherNote[],
    sunTime: null,
    season: null,
  };
  const light = columnOf(series, 'ghiWPerM2') ?? columnOf(series, 'beamHorizontalWPerM2');
  const perDay = 86400 / series.intervalS;
  if (!light || series.count < perDay * 12) return none;
  const sun = seriesSun(series, light.stands);
  const clear = sun.meanUp.map((up, k) =>
    up > 0 ? sun.sunlitShare[k] * haurwitzWPerM2((Math.acos(Math.min(1, up)) * 180) / Math.PI) : 0,
  );
  const firstHour = (((series.startS % 86400) + 86400) % 86400) / 3600;
  const firstDay = Math.ceil(series.startS / 86400 - 1e-9);
  const days = dayShifts(light.values, clear, perDay, firstHour);
  const groupOf = (day: number) => {
    const { year, month } = dateOfDay(firstDay + day);
    return year * 12 + month;
  };
  const sunTime = sunTimeOf(days, groupOf, series.site);
  const season = seasonOf(clearestDays(days, groupOf));
  const findings: Finding[] = [];
  const repairs: WeatherNote[] = [];
  if (season) {
    const from = firstDay + season.fromDay;
    const to = firstDay + season.toDay;
    const span = `${momentText(from * 86400).slice(0, 10)} to ${momentText(to * 86400).slice(0, 10)}`;
    const outside = middleOf(season.outside).minutes;
    findings.push({
      id: 'sun-season',
      kind: 'sun-season',
      quantity: null,
      level: 'doubt',
      title: 'The sun does not agree with the clock in a part of the year',
      text: `From about ${span} the light comes ${Math.round(season.shiftMinutes - outside)} minutes later than in the rest: the clock seems to be put forward in summer.`,
      count: Math.round((to - from) * perDay),
      places: [],
      repair: null,
      isAccepted: false,
    });
    return { ...none, findings, sunTime, season };
  }
  if (!sunTime.isSuspect || sunTime.shiftMinutes === null) return { ...none, sunTime };
  const minutes = Math.round(sunTime.shiftMinutes / 15) * 15;
  const shift =
    Math.abs(minutes - sunTime.shiftMinutes) <= 5 ? minutes : Math.round(sunTime.shiftMinutes);
  const isPlace = sunTime.causes[0]?.includes('longitude') ?? false;
  const repair = isPlace
    ? null
    : `Shift all rows ${shift > 0 ? 'back' : 'forward'} by ${Math.abs(shift)} minutes.`;
  const ok = isAccepted(accepted, 'sun-time', repair);
  findings.push({
    id: 'sun-time',
    kind: 'sun-time',
    quantity: null,
    level: 'doubt',
    title: `The table runs ${Math.abs(shift)} min ${shift > 0 ? 'late' : 'early'} against the sun`,
    text: sunTime.text,
    count: series.count,
    places: [],
    repair,
    isAccepted: ok,
  });
  if (!ok) return { ...none, findings, sunTime };
  repairs.push({
    kind: 'repair',
    text: `All rows were shifted ${shift > 0 ? 'back' : 'forward'} by ${Math.abs(shift)} minutes to agree with the sun.`,
    count: series.count,
  });
  return {
    series: { ...series, startS: series.startS - shift * 60 },
    findings,
    repairs,
    sunTime,
    season,
  };
}

/** A leap year without its 29 February: usual in typical years, a gap in measured ones. */
function leapDraft(series: WeatherSeries): Finding | null {
  const first = Math.floor(series.startS / 86400);
  const last = Math.floor((series.startS + (series.count - 1) * series.intervalS) / 86400);
  const perDay = 86400 / series.intervalS;
  for (let day = first; day <= last; day++) {
    const { month, day: ofMonth } = dateOfDay(day);
    if (month !== 2 || ofMonth !== 29) continue;
    const from = Math.round((day * 86400 - series.startS) / series.intervalS);
    let held = 0;
    for (let k = Math.max(0, from); k < Math.min(series.count, from + perDay); k++)
      if (series.rowOf[k] > 0) held++;
    if (held > 0) continue;
    return {
      id: 'leap-day',
      kind: 'leap-day',
      quantity: null,
      level: 'note',
      title: '29 February is not in the table',
      text: `${momentText(day * 86400).slice(0, 4)} is a leap year, and the table leaves its 29 February out: a year of 365 days is taken from it.`,
      count: perDay,
      places: [],
      repair: null,
      isAccepted: false,
    };
  }
  return null;
}

/** Findings that keep a year from being taken, as sentences with what to accept. */
export function openText(findings: readonly Finding[]): readonly string[] {
  return findings
    .filter((one) => one.level === 'blocks' && !one.isAccepted)
    .map((one) => `${one.quantity ? quantityWords[one.quantity] : one.title}: ${one.text}`);
}
