// Which columns say when: every reading that fits the cells is tried on the sampled rows, and the one
// whose times follow evenly wins. Day and month tell themselves apart by that, too.
import { createCells, splitLine } from './cells.ts';
import { textColumns } from './date-columns.ts';
import type { Guess } from './detect-table.ts';
import type { DateOrder, StampMapping, StampPart, StampReads, TableMapping } from './mapping.ts';
import { numberOf } from './numbers.ts';
import { createStampReader } from './stamp.ts';

export interface StampGuess {
  readonly stamp: StampMapping;
  readonly parts: Guess<readonly StampPart[]>;
  readonly marks: Guess<StampMapping['marks']>;
  /** The columns it uses, from 0. */
  readonly used: ReadonlySet<number>;
  readonly intervalS: number;
  readonly statesOffset: boolean;
}

type Row = readonly string[];
type Placed = StampPart & { readonly at: number };

const partWords: readonly (readonly [StampReads, RegExp])[] = [
  ['dayOfYear', /^(doy|day ?of ?(the )?year|julian( day)?|jday|tag ?des ?jahres|jour ?julien)$/],
  ['hourOfYear', /^(hour ?of ?(the )?year|hoy|stunde ?des ?jahres|heure ?de ?l.ann[ée]e)$/],
  ['hourMinute', /^(hhmm|hour ?min(ute)?|time ?\(?hhmm\)?)$/],
  ['year', /^(years?|yr|yyyy|jahr|ann[ée]e|an|anno|a[ñn]o|ano|jaar|y)$/],
  ['month', /^(months?|mon|mo|mm|monat|mois|mese|mes|m[êe]s|maand|m)$/],
  ['day', /^(days?|dd|tag|jour|giorno|d[ií]a|dia|dag|d|day ?of ?(the )?month)$/],
  ['hour', /^(hours?|hr|hh|std|stunde|heure|ora|hora|uur|h|hour ?of ?(the )?day)$/],
  ['minute', /^(minutes?|min|minuto|mi|nn)$/],
];

/** Reads the head of a table for its stamp, or null where nothing in it tells the time. */
export function detectStamp(
  rows: readonly Row[],
  headings: readonly string[],
  table: TableMapping,
): StampGuess | null {
  const sample = rows.length > 1200 ? [...rows.slice(0, 800), ...rows.slice(-400)] : rows;
  const columnCount = Math.min(Math.max(...sample.slice(0, 50).map((row) => row.length)), 60);
  const refOf = (at: number): string | number => {
    const name = headings[at] ?? '';
    return name !== '' && headings.filter((one) => one === name).length === 1 ? name : at + 1;
  };
  const place = (at: number, reads: StampReads, order?: DateOrder): Placed =>
    order ? { at, column: refOf(at), reads, order } : { at, column: refOf(at), reads };

  const tried: Placed[][] = [];
  const text = textColumns(sample, columnCount);
  for (const { at, order } of text.dateTime) tried.push([place(at, 'dateTime', order)]);
  for (const { at, order } of text.date) {
    for (const time of text.time) tried.push([place(at, 'date', order), place(time, 'time')]);
    const hour = namedColumn(headings, 'hour') ?? namedColumn(headings, 'hourMinute');
    if (hour !== null) {
      const reads = hour === namedColumn(headings, 'hourMinute') ? 'hourMinute' : 'hour';
      const minute = namedColumn(headings, 'minute');
      tried.push([
        place(at, 'date', order),
        place(hour, reads),
        ...(minute !== null && reads === 'hour' ? [place(minute, 'minute')] : []),
      ]);
    }
  }
  tried.push(
    ...namedParts(headings, place),
    ...numberParts(sample, headings, columnCount, table, place),
  );
  let best: {
    parts: Placed[];
    score: number;
    times: Float64Array;
    year: boolean;
    states: boolean;
  } | null = null;
  let second = 0;
  for (const parts of tried) {
    const found = tryParts(parts, sample, table);
    if (found === null) continue;
    if (best === null || found.score > best.score + 1e-9) {
      if (best !== null && !sameTimes(best.times, found.times)) second = best.score;
      best = { parts, ...found };
    } else if (!sameTimes(best.times, found.times)) second = Math.max(second, found.score);
  }
  if (best === null || best.score < 0.5) return null;
  const { parts, times, score, states } = best;
  const intervalS = usualStep(times);
  const marks = marksOf(sample, parts, headings, times, intervalS);
  const isTied = second > score - 0.02;
  const names = parts.map(
    ({ column, reads, order }) =>
      `${typeof column === 'number' ? `column ${column}` : `"${column}"`} as ${reads}${order ? ` (${order})` : ''}`,
  );
  const plain = parts.map(({ at: _, ...part }) => part);
  return {
    stamp: { parts: plain, marks: marks.value, clock: { kind: 'site' } },
    parts: {
      value: plain,
      confidence: isTied ? 0.5 : Math.min(1, score),
      reason: isTied
        ? `${names.join(', ')}; another order of day and month fits as well`
        : `${names.join(', ')}: rows follow every ${intervalS / 60} minutes`,
    },
    marks,
    used: new Set(parts.map(({ at }) => at)),
    intervalS,
    statesOffset: states,
  };
}

function namedColumn(headings: readonly string[], reads: StampReads): number | null {
  const rule = partWords.find(([part]) => part === reads)?.[1];
  const at = headings.findIndex((heading) =>
    rule?.test(
      heading
        .toLowerCase()
        .replace(/[[(].*$/, '')
        .replace(/_/g, ' ')
        .trim(),
    ),
  );
  return at < 0 ? null : at;
}

type Place = (at: number, reads: StampReads, order?: DateOrder) => Placed;

function namedParts(headings: readonly string[], place: Place): Placed[][] {
  const at = new Map(partWords.map(([reads]) => [reads, namedColumn(headings, reads)]));
  const part = (reads: StampReads): Placed[] => {
    const found = at.get(reads);
    return found === null || found === undefined ? [] : [place(found, reads)];
  };
  const sets: Placed[][] = [];
  const clock = part('hour').length > 0 ? [...part('hour'), ...part('minute')] : part('hourMinute');
  if (part('month').length > 0 && part('day').length > 0 && clock.length > 0)
    sets.push([...part('year'), ...part('month'), ...part('day'), ...clock]);
  if (part('dayOfYear').length > 0 && clock.length > 0)
    sets.push([...part('year'), ...part('dayOfYear'), ...clock]);
  if (part('hourOfYear').length > 0) sets.push([...part('year'), ...part('hourOfYear')]);
  if (sets.length === 0 && part('hour').length > 0)
    sets.push([place(part('hour')[0].at, 'hourOfYear')]);
  return sets;
}

/** Readings of bare numbers: years and months side by side, seconds since 1970, days of a spreadsheet. */
function numberParts(
  rows: readonly Row[],
  headings: readonly string[],
  columnCount: number,
  table: TableMapping,
  place: Place,
): Placed[][] {
  const sets: Placed[][] = [];
  const column = (at: number) => rows.slice(0, 300).map((row) => numberOf(row[at] ?? '', table));
  const within = (at: number, low: number, high: number, isWhole = true) =>
    at < columnCount &&
    column(at).every((v) => v >= low && v <= high && (!isWhole || Number.isInteger(v)));
  for (let at = 0; at < Math.min(columnCount, 6); at++) {
    if (within(at, 1900, 2200) && within(at + 1, 1, 12) && within(at + 2, 1, 31)) {
      const date = [place(at, 'year'), place(at + 1, 'month'), place(at + 2, 'day')];
      if (within(at + 3, 0, 24)) {
        sets.push([...date, place(at + 3, 'hour')]);
        if (within(at + 4, 0, 59))
          sets.push([...date, place(at + 3, 'hour'), place(at + 4, 'minute')]);
      } else if (within(at + 3, 0, 2400)) sets.push([...date, place(at + 3, 'hourMinute')]);
    }
    if (within(at, 1900, 2200) && within(at + 1, 1, 366)) {
      const date = [place(at, 'year'), place(at + 1, 'dayOfYear')];
      if (within(at + 2, 0, 24)) sets.push([...date, place(at + 2, 'hour')]);
      if (within(at + 2, 0, 2400)) sets.push([...date, place(at + 2, 'hourMinute')]);
    }
    if (within(at, 1, 12) && within(at + 1, 1, 31) && within(at + 2, 0, 24))
      sets.push([place(at, 'month'), place(at + 1, 'day'), place(at + 2, 'hour')]);
    if (within(at, 1e8, 7e9)) sets.push([place(at, 'epochSeconds')]);
    if (within(at, 1e11, 7e12)) sets.push([place(at, 'epochMilliseconds')]);
    if (within(at, 20000, 100000, false)) sets.push([place(at, 'spreadsheetDay')]);
    const isCount = column(at).every(
      (v, i, all) => Number.isInteger(v) && (i === 0 || v - all[i - 1] === 1),
    );
    if (
      isCount &&
      within(at, 0, 8784) &&
      (headings.length === 0 || /hour|stunde|heure|ora|^h$/i.test(headings[at] ?? ''))
    )
      sets.push([place(at, 'hourOfYear')]);
  }
  return sets;
}

function tryParts(parts: readonly Placed[], rows: readonly Row[], table: TableMapping) {
  const stamp: StampMapping = { parts, marks: 'start', clock: { kind: 'site' } };
  const reader = createStampReader(stamp, parts, table, 0);
  const cells = createCells();
  const times = new Float64Array(rows.length).fill(Number.NaN);
  rows.forEach((row, i) => {
    const line = row.map((cell) => (/["\t]/.test(cell) ? '' : cell)).join('\t');
    splitLine(cells, line, 0, line.length, '\t');
    times[i] = reader.read(cells);
  });
  const read = times.filter((time) => !Number.isNaN(time)).length / rows.length;
  if (read < 0.8) return null;
  const step = usualStep(times);
  if (!(step >= 60 && step <= 10800)) return null;
  let even = 0;
  for (let i = 1; i < times.length; i++) if (times[i] - times[i - 1] === step) even++;
  return {
    score: read * (even / (times.length - 1)) ** 0.5,
    times,
    year: reader.year > 0,
    states: reader.statesOffset,
  };
}

function usualStep(times: Float64Array): number {
  const seen = new Map<number, number>();
  for (let i = 1; i < times.length; i++) {
    const apart = times[i] - times[i - 1];
    if (apart > 0) seen.set(apart, (seen.get(apart) ?? 0) + 1);
  }
  return [...seen].sort((a, b) => b[1] - a[1])[0]?.[0] ?? 0;
}

function sameTimes(one: Float64Array, two: Float64Array): boolean {
  return one.every((time, i) => time === two[i] || (Number.isNaN(time) && Number.isNaN(two[i])));
}

function marksOf(
  rows: readonly Row[],
  parts: readonly Placed[],
  headings: readonly string[],
  times: Float64Array,
  intervalS: number,
): Guess<StampMapping['marks']> {
  const words = parts
    .map(({ at }) => headings[at] ?? '')
    .join(' ')
    .toLowerCase();
  if (/\bend|ende\b|bis\b|fin\b|ending/.test(words))
    return { value: 'end', confidence: 0.9, reason: 'the heading speaks of the end' };
  if (/begin|start|\bfrom\b|\bvon\b|anfang|d[ée]but|inizio/.test(words))
    return { value: 'start', confidence: 0.9, reason: 'the heading speaks of the start' };
  const has24 = rows.some((row) =>
    parts.some(({ at, reads }) => {
      const cell = row[at] ?? '';
      if (reads === 'hour') return Number(cell) === 24;
      if (reads === 'hourMinute') return Number(cell) === 2400;
      return (reads === 'time' || reads === 'dateTime') && /(^|\D)24[:.]00/.test(cell);
    }),
  );
  if (has24) return { value: 'end', confidence: 0.95, reason: 'hours run from 1 to 24' };
  const hourOfYear = parts.find(({ reads }) => reads === 'hourOfYear');
  const first = times.find((time) => !Number.isNaN(time)) ?? 0;
  const last = times.findLast((time) => !Number.isNaN(time)) ?? 0;
  const into = (time: number) => ((time % 86400) + 86400) % 86400;
  if (hourOfYear && into(first) === 3600)
    return { value: 'end', confidence: 0.9, reason: 'hours of the year are counted from 1' };
  if (intervalS > 0 && into(first) === intervalS && into(last) === 0)
    return {
      value: 'end',
      confidence: 0.9,
      reason: 'the first stamp is one interval into the day, the last is midnight',
    };
  if (intervalS > 0 && into(first) % intervalS === intervalS / 2 && intervalS >= 600)
    return { value: 'middle', confidence: 0.8, reason: 'stamps lie in the middle of the interval' };
  if (into(first) === 0 && into(last) === 86400 - intervalS)
    return {
      value: 'start',
      confidence: 0.75,
      reason: 'the first stamp is midnight, the last one interval before it',
    };
  return {
    value: 'start',
    confidence: 0.5,
    reason: 'nothing in the table says which end of the interval a stamp marks',
  };
}
