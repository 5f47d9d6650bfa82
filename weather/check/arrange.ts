// Rows as they stand in the file → an even time axis: order, doubles, the clock of summer, steps off the
// axis, leap days.
import type { Fault, Parsed } from '../fault.ts';
import { dateOfDay, dayNumber } from '../map/date-text.ts';
import { mostMappedRows } from '../map/mapped-rows.ts';
import type { MappedTable } from '../map/read-mapped.ts';
import { momentText, type SeriesColumn, type WeatherSeries } from '../series/series.ts';
import type { WeatherNote } from '../weather-year.ts';
import { type Accepted, type Finding, isAccepted, mostPlaces, type Place } from './finding.ts';

export interface Arranged {
  readonly series: WeatherSeries;
  readonly findings: readonly Finding[];
}

/** A longer stretch between first and last row than this many times the rows is a wrong stamp. */
const mostEmpty = 20;

export function arrange(table: MappedTable, accepted: Accepted): Parsed<Arranged> {
  const { count, intervalS } = table;
  const findings: Finding[] = [];
  const notes: WeatherNote[] = [...table.notes];
  const add = (
    found: Omit<Finding, 'isAccepted' | 'quantity'> & { readonly id: string },
  ): boolean => {
    const ok = isAccepted(accepted, found.id, found.repair);
    findings.push({ ...found, quantity: null, isAccepted: ok });
    return ok;
  };
  const placeAt = (i: number, timeS: number): Place => ({
    from: 0,
    count: 1,
    row: table.row[i],
    when: momentText(timeS),
  });

  const stitched = stitch(table);
  let timeS = stitched?.timeS ?? table.startS;
  if (stitched)
    notes.push({
      kind: 'assumption',
      text: `The months come from different years; they are laid on the calendar of ${stitched.year}, and the sun follows each month's own year.`,
      count,
    });

  const change = summerClock(timeS, intervalS);
  if (change) {
    const rows = change.shifted.reduce((sum, one) => sum + one, 0);
    const repair = 'Shift these rows back by 60 minutes.';
    const ok = add({
      id: 'summer-time',
      kind: 'summer-time',
      level: 'blocks',
      title: 'Clock put forward in summer',
      text: `An hour is missing at ${momentText(timeS[change.gapAt])} and one comes twice at ${momentText(timeS[change.twiceAt])}: ${rows} rows between are in summer time.`,
      count: rows,
      places: [
        placeAt(change.gapAt, timeS[change.gapAt]),
        placeAt(change.twiceAt, timeS[change.twiceAt]),
      ],
      repair,
    });
    if (ok) timeS = timeS.map((t, i) => t - (change.shifted[i] === 1 ? 3600 : 0));
  }

  let from = Number.POSITIVE_INFINITY;
  let to = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < count; i++) {
    if (timeS[i] < from) from = timeS[i];
    if (timeS[i] > to) to = timeS[i];
  }
  const startS = timeS[0] - Math.round((timeS[0] - from) / intervalS) * intervalS;
  const steps = Math.round((to - startS) / intervalS) + 1;
  if (steps > mostMappedRows || steps > count * mostEmpty + 1000) {
    const fault: Fault = {
      file: table.file,
      place: { path: 'stamp' },
      found: `${count} rows from ${momentText(from)} to ${momentText(to)}`,
      expected: `rows that follow every ${intervalS / 60} minutes`,
      mend: 'Correct the stamps that lie far from the rest, or how the mapping reads them.',
    };
    return { ok: false, faults: [fault] };
  }

  const rowAt = new Int32Array(steps).fill(-1);
  let unordered = 0;
  let offGrid = 0;
  let twice = 0;
  let differing = 0;
  const places = { order: [] as Place[], twice: [] as Place[], offGrid: [] as Place[] };
  for (let i = 0; i < count; i++) {
    const exact = (timeS[i] - startS) / intervalS;
    const k = Math.min(steps - 1, Math.max(0, Math.round(exact)));
    if (i > 0 && timeS[i] < timeS[i - 1]) {
      unordered++;
      if (places.order.length < mostPlaces) places.order.push(placeAt(i, timeS[i]));
    }
    if (Math.abs(exact - k) * intervalS > 1.5) {
      offGrid++;
      if (places.offGrid.length < mostPlaces) places.offGrid.push(placeAt(i, timeS[i]));
    }
    if (rowAt[k] < 0) rowAt[k] = i;
    else {
      twice++;
      if (!sameValues(table, rowAt[k], i)) differing++;
      if (places.twice.length < mostPlaces) places.twice.push(placeAt(i, timeS[i]));
    }
  }
  if (unordered > 0)
    add({
      id: 'order',
      kind: 'order',
      level: 'blocks',
      title: 'Rows out of order',
      text: `${unordered} rows lie before the row above them in time.`,
      count: unordered,
      places: places.order,
      repair: 'Sort the rows by time.',
    });
  if (offGrid > 0)
    add({
      id: 'off-grid',
      kind: 'off-grid',
      level: 'blocks',
      title: 'Stamps off the beat',
      text: `${offGrid} stamps do not lie on the beat of ${intervalS / 60} minutes from ${momentText(startS)}.`,
      count: offGrid,
      places: places.offGrid,
      repair: 'Take each to the nearest step.',
    });
  if (twice > 0 && !(change && !findings.some((one) => one.id === 'summer-time' && one.isAccepted)))
    add({
      id: 'duplicates',
      kind: 'duplicates',
      level: 'blocks',
      title: 'Rows that come twice',
      text: `${twice} rows have the time of an earlier one; ${differing === 0 ? 'their values are the same' : `${differing} of them with other values`}.`,
      count: twice,
      places: places.twice,
      repair: 'Keep the first of each.',
    });
  const isPlain = steps === count && unordered === 0 && twice === 0;
  const columns = table.columns.map((column): SeriesColumn => {
    const stands =
      column.stands === 'mean'
        ? { kind: 'mean' as const }
        : { kind: 'reading' as const, at: table.readAt };
    const base = {
      quantity: column.quantity,
      heading: column.heading,
      stands,
      origin: 'read' as const,
    };
    if (isPlain) return { ...base, values: column.values };
    const values = new Float64Array(steps);
    for (let k = 0; k < steps; k++) values[k] = rowAt[k] < 0 ? Number.NaN : column.values[rowAt[k]];
    return { ...base, values };
  });
  const rowOf = new Int32Array(steps);
  const sourceYear = new Int16Array(steps);
  let known = 0;
  let knownDay = Number.NaN;
  for (let k = 0; k < steps; k++) {
    const day = Math.floor((startS + k * intervalS) / 86400);
    if (day !== knownDay) {
      knownDay = day;
      known = dateOfDay(day).year;
    }
    const i = rowAt[k];
    if (i >= 0) rowOf[k] = table.row[i];
    const own = stitched && i >= 0 ? stitched.yearOf[i] : known;
    sourceYear[k] = own > 0 ? own : known;
  }
  const series: WeatherSeries = {
    file: table.file,
    site: table.site,
    form: table.form,
    startS,
    intervalS,
    count: steps,
    isStitched: stitched !== null,
    sourceYear,
    rowOf,
    columns,
    notes,
  };
  return { ok: true, value: { series, findings } };
}

function sameValues(table: MappedTable, a: number, b: number): boolean {
  return table.columns.every(({ values }) => Object.is(values[a], values[b]));
}

/** Months of different years: laid on one calendar, where that puts the rows in order. */
function stitch(table: MappedTable) {
  const { startS, count, intervalS } = table;
  let jumps = 0;
  const monthAt = (i: number) => dateOfDay(Math.floor(startS[i] / 86400)).month;
  for (let i = 1; i < count; i++) {
    if (Math.abs(startS[i] - startS[i - 1]) < 150 * 86400) continue;
    // Years change where months do; a jump within a month is a wrong stamp.
    if (monthAt(i) === monthAt(i - 1)) return null;
    jumps++;
  }
  if (jumps === 0 || jumps > 24 || count * intervalS > 367 * 86400) return null;
  const yearOf = new Int16Array(count);
  let hasLeapDay = false;
  const dates = new Map<number, { year: number; month: number; day: number }>();
  for (let i = 0; i < count; i++) {
    const day = Math.floor(startS[i] / 86400);
    const date = dates.get(day) ?? dateOfDay(day);
    dates.set(day, date);
    yearOf[i] = date.year;
    if (date.month === 2 && date.day === 29) hasLeapDay = true;
  }
  const year = hasLeapDay ? 2024 : 2018;
  const timeS = new Float64Array(count);
  let falls = 0;
  for (let i = 0; i < count; i++) {
    const day = Math.floor(startS[i] / 86400);
    const { month, day: ofMonth } = dates.get(day) ?? dateOfDay(day);
    timeS[i] = dayNumber(year, month, ofMonth) * 86400 + (startS[i] - day * 86400);
    if (i > 0 && timeS[i] < timeS[i - 1]) falls++;
  }
  // The last hour of a hour-ending table may carry the year of its stamp: one fall is its wrap.
  return falls <= 1 ? { timeS, yearOf, year } : null;
}

/** The signature of summer time: an hour gone in spring, one twice in autumn, months apart. */
function summerClock(timeS: Float64Array, intervalS: number) {
  if (intervalS > 3600) return null;
  let gapAt = -1;
  let twiceAt = -1;
  for (let i = 1; i < timeS.length; i++) {
    const apart = timeS[i] - timeS[i - 1];
    if (apart === intervalS) continue;
    if (apart === intervalS + 3600 && gapAt < 0) gapAt = i;
    else if (apart === intervalS - 3600 && twiceAt < 0) twiceAt = i;
    else if (apart < 0 || apart === intervalS + 3600) return null;
  }
  if (gapAt < 0 || twiceAt < 0) return null;
  if (Math.abs(gapAt - twiceAt) * intervalS < 100 * 86400) return null;
  const shifted = new Uint8Array(timeS.length);
  if (gapAt < twiceAt) shifted.fill(1, gapAt, twiceAt);
  else {
    shifted.fill(1, 0, twiceAt);
    shifted.fill(1, gapAt);
  }
  return { gapAt, twiceAt, shifted };
}
