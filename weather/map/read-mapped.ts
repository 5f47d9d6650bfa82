// A table and its mapping → the measured rows in SI on one clock, as they stand in the file: nothing
// sorted, filled or left out yet. Fed in pieces of any size, so that it can be followed and stopped.
import type { Parsed } from '../fault.ts';
import { createDecoder } from '../read/decode.ts';
import { FaultList } from '../read/fault-list.ts';
import type { ReadProgress } from '../read/read-weather.ts';
import { completeSite } from '../read/site.ts';
import type { Site, WeatherNote } from '../weather-year.ts';
import { headingsOf } from './cells.ts';
import { MappedRows } from './mapped-rows.ts';
import type { MappedQuantity, MappedStands, Mapping } from './mapping.ts';
import { toSi } from './units.ts';

export interface MappedColumn {
  readonly quantity: MappedQuantity;
  readonly heading: string;
  readonly stands: MappedStands;
  /** SI, one a row; NaN: not measured. */
  readonly values: Float64Array;
}

/** The rows of a table as they stand in the file. */
export interface MappedTable {
  readonly file: string;
  readonly site: Site;
  /** Name of the mapping, for `WeatherYear.form`. */
  readonly form: string;
  readonly count: number;
  /** Row in the file, counted from 1. */
  readonly row: Int32Array;
  /** Start of the row's interval: local standard time, in seconds since 1970-01-01 00:00. */
  readonly startS: Float64Array;
  /** Year that the stamp stated, 0 where it stated none. */
  readonly year: Int16Array;
  readonly intervalS: number;
  /** Where in its interval a reading was taken: 0 start, 0.5 middle, 1 end. */
  readonly readAt: number;
  readonly columns: readonly MappedColumn[];
  readonly notes: readonly WeatherNote[];
}

export interface ReadMappedOptions {
  readonly file?: string;
  /** Goes before the site of the mapping. */
  readonly site?: Partial<Site>;
  readonly mostFaults?: number;
}

export interface MappedReader {
  /** Takes text or bytes. False: no more is needed. */
  push(chunk: string | Uint8Array): boolean;
  readonly rows: number;
  end(): Parsed<MappedTable>;
}

/** Bytes are decoded this many at a time, so that the text of a large table is never whole in memory. */
const pieceBytes = 1 << 20;
/** A line longer than this is none. */
const longestLine = 1 << 20;

export function createMappedReader(
  mapping: Mapping,
  options: ReadMappedOptions = {},
): MappedReader {
  const file = options.file ?? 'weather table';
  const faults = new FaultList(file, options.mostFaults);
  const notes: WeatherNote[] = [];
  const isOwnClock = mapping.stamp.clock.kind !== 'site';
  const site = completeSite(mapping.site ?? {}, options.site ?? {}, isOwnClock, faults, notes);
  const decoder = createDecoder();
  const head: string[] = [];
  let rows: MappedRows | null = null;
  let held = '';
  let nextRow = 1;
  let isOver = site === null || !faults.isEmpty;
  let endsInReturn = false;

  function line(text: string, from: number, to: number): void {
    const row = nextRow++;
    if (row < mapping.table.firstRow) {
      head.push(text.slice(from, to));
      return;
    }
    if (rows === null) {
      if (head.length > 0) head[0] = head[0].replace(/^\uFEFF/, '');
      const headings = headingsOf(head, mapping.table.headingRow, mapping.table.delimiter);
      rows = new MappedRows(mapping, headings, site?.utcOffsetH ?? 0, faults);
      if (!faults.isEmpty) {
        isOver = true;
        return;
      }
    }
    rows.take(text, from, to, row);
    if (rows.isFull || faults.count > 2000) isOver = true;
  }

  function take(part: string, isLast: boolean): void {
    let text = endsInReturn ? `\r${part}` : part;
    endsInReturn = !isLast && text.endsWith('\r');
    if (endsInReturn) text = text.slice(0, -1);
    text = held + text;
    // A lone return ends a line too (old tables); only texts that have one pay for it.
    if (text.includes('\r')) text = text.replace(/\r\n?/g, '\n');
    let from = 0;
    if (nextRow === 1 && text.charCodeAt(0) === 0xfeff) from = 1;
    while (!isOver) {
      const to = text.indexOf('\n', from);
      if (to < 0) break;
      line(text, from, to);
      from = to + 1;
    }
    held = isOver ? '' : text.slice(from);
    if (isLast && held !== '' && !isOver) line(held, 0, held.length);
    if (held.length > longestLine) {
      faults.whole(
        `${held.length} characters without a line break`,
        'a table as text, one row a line',
        'Save the table as CSV.',
      );
      isOver = true;
    }
  }

  return {
    push(chunk) {
      if (typeof chunk === 'string')
        for (let k = 0; k < chunk.length && !isOver; k += pieceBytes)
          take(chunk.slice(k, k + pieceBytes), false);
      else
        for (let k = 0; k < chunk.length && !isOver; k += pieceBytes)
          take(decoder.decode(chunk.subarray(k, k + pieceBytes)), false);
      return !isOver;
    },
    get rows() {
      return rows?.count ?? 0;
    },
    end() {
      if (!isOver) take(decoder.end(), true);
      rows?.end();
      if (site === null || !faults.isEmpty) return { ok: false, faults: faults.list() };
      if (decoder.encoding !== 'UTF-8')
        notes.push({
          kind: 'assumption',
          text: `The text was read as ${decoder.encoding}.`,
          count: 0,
        });
      const table = rows === null ? null : finish(rows, mapping, site, file, notes, faults);
      if (rows === null || (table === null && faults.isEmpty))
        faults.whole(
          `${nextRow - 1} lines`,
          `rows of values from row ${mapping.table.firstRow}`,
          'Choose the file with the whole table, or correct table.firstRow of the mapping.',
        );
      return table === null || !faults.isEmpty
        ? { ok: false, faults: faults.list() }
        : { ok: true, value: table };
    },
  };
}

function finish(
  rows: MappedRows,
  mapping: Mapping,
  site: Site,
  file: string,
  notes: WeatherNote[],
  faults: FaultList,
): MappedTable | null {
  const { count } = rows;
  if (count < 2) return null;
  if (rows.isFull)
    faults.whole(
      `more than ${count} rows`,
      'fewer rows',
      'Cut the table to the years that are wanted.',
    );
  const utcS = rows.utcS.subarray(0, count);
  const intervalS = intervalOf(utcS);
  if (!(intervalS >= 60 && intervalS <= 10800) || 86400 % intervalS !== 0) {
    faults.whole(
      intervalS > 0 ? `a row every ${intervalS / 60} minutes` : 'rows that do not follow in time',
      'an interval from 1 minute to 3 hours that divides the day',
      intervalS > 0
        ? 'Use a table with another interval.'
        : 'Check which columns hold the stamp, and the order of day and month.',
      'stamp',
    );
    return null;
  }
  const { marks, clock } = mapping.stamp;
  const readAt = marks === 'start' ? 0 : marks === 'end' ? 1 : 0.5;
  const shiftS = site.utcOffsetH * 3600 - readAt * intervalS;
  const startS = utcS.map((s) => s + shiftS);
  if (rows.footerRows.length > 0)
    notes.push({
      kind: 'assumption',
      text: `Lines without a stamp after the last row were left out (from row ${rows.footerRows[0]}).`,
      count: rows.footerRows.length,
    });
  if (clock.kind === 'site' && !rows.statesOffset)
    notes.push({
      kind: 'assumption',
      text: 'Stamps are taken as local standard time of the site, as the mapping says.',
      count: 0,
    });
  const columns = rows.columns.map(({ mapping: own, unit, heading, values }): MappedColumn => {
    const part = values.subarray(0, count);
    const isSi = unit.scale === 1 && unit.before === 0 && !unit.isEnergy;
    if (!isSi) for (let i = 0; i < count; i++) part[i] = toSi(unit, part[i], intervalS);
    return { quantity: own.quantity, heading, stands: own.stands, values: part };
  });
  return {
    file,
    site,
    form: mapping.name || 'mapped table',
    count,
    row: rows.row.subarray(0, count),
    startS,
    year: rows.year.subarray(0, count),
    intervalS,
    readAt,
    columns,
    notes,
  };
}

/** The step between most rows [s]; 0 where rows do not follow in time. */
export function intervalOf(timeS: Float64Array): number {
  const seen = new Map<number, number>();
  const n = Math.min(timeS.length, 5000);
  for (let i = 1; i < n; i++) {
    const apart = Math.round(timeS[i] - timeS[i - 1]);
    seen.set(apart, (seen.get(apart) ?? 0) + 1);
  }
  let usual = 0;
  let most = 0;
  for (const [apart, times] of seen)
    if (apart > 0 && (times > most || (times === most && apart < usual))) {
      usual = apart;
      most = times;
    }
  return most * 2 >= n - 1 ? usual : 0;
}

/** Reads a mapped table at once. */
export function readMapped(
  source: string | Uint8Array,
  mapping: Mapping,
  options: ReadMappedOptions = {},
): Parsed<MappedTable> {
  const reader = createMappedReader(mapping, options);
  reader.push(source);
  return reader.end();
}

export interface ReadMappedStreamOptions extends ReadMappedOptions {
  readonly onProgress?: (progress: ReadProgress) => void;
  /** Asked before each piece; true stops the reading. */
  readonly isCancelled?: () => boolean;
}

/** Reads a mapped table from a stream of pieces; `null` when it was cancelled. */
export async function readMappedStream(
  pieces: AsyncIterable<string | Uint8Array> | Iterable<string | Uint8Array>,
  mapping: Mapping,
  options: ReadMappedStreamOptions = {},
): Promise<Parsed<MappedTable> | null> {
  const reader = createMappedReader(mapping, options);
  let taken = 0;
  for await (const piece of pieces) {
    if (options.isCancelled?.()) return null;
    const wantsMore = reader.push(piece);
    taken += piece.length;
    options.onProgress?.({ rows: reader.rows, taken });
    if (!wantsMore) break;
  }
  return options.isCancelled?.() ? null : reader.end();
}
