// Text of a weather table → WeatherYear, or every fault in it. Fed in pieces of any size, so that a
// file larger than memory can be read, followed and stopped.
import Papa from 'papaparse';
import type { Parsed } from '../fault.ts';
import type { Site, WeatherNote, WeatherYear } from '../weather-year.ts';
import { createDecoder } from './decode.ts';
import { FaultList } from './fault-list.ts';
import { finishYear } from './finish.ts';
import type { Opened } from './form.ts';
import { linesSearched, notText, type Recognised, recognise } from './recognise.ts';
import { RowStore } from './row-store.ts';
import { completeSite } from './site.ts';
import { timeline } from './timeline.ts';

export interface ReadWeatherOptions {
  /** Name of the file, for messages. */
  readonly file?: string;
  /** Goes before what the file states; needed where it states no site. */
  readonly site?: Partial<Site>;
  /** Calendar that weekdays follow; else the file's own. */
  readonly year?: number;
  /** Faults listed before the rest are only counted; 20. */
  readonly mostFaults?: number;
}

/** Takes a table in pieces. */
export interface WeatherReader {
  /** Takes text or bytes. False: no more is needed, the faults are clear already. */
  push(chunk: string | Uint8Array): boolean;
  readonly rows: number;
  end(): Parsed<WeatherYear>;
}

/** Held back without a line break before the text is taken for no table. */
const longestLine = 4_000_000;
const pieceLength = 262_144;

export function createWeatherReader(options: ReadWeatherOptions = {}): WeatherReader {
  const file = options.file ?? 'weather table';
  const faults = new FaultList(file, options.mostFaults);
  const decoder = createDecoder();
  let held = '';
  let known: (Recognised & { opened: Opened; store: RowStore }) | null = null;
  let isOver = false;
  let nextRow = 1;

  /** Reads whole lines from what is held; at the end also the last one. */
  function work(isLast: boolean): void {
    while (!isOver && held !== '') {
      if (known === null) {
        if (!open(isLast)) return;
        continue;
      }
      const piece = wholeLines(held, isLast);
      if (piece === '') {
        if (held.length > longestLine) giveUp();
        return;
      }
      held = held.slice(piece.length);
      const { data, errors } = Papa.parse<string[]>(piece, {
        delimiter: known.head.delimiter,
        newline: '\n',
      });
      if (piece.endsWith('\n')) data.pop(); // what follows the last line break
      for (const error of errors)
        if (error.type === 'Quotes')
          faults.row(
            nextRow + (error.row ?? 0),
            'all',
            'a quotation mark without its partner',
            'quotation marks in pairs',
            'Delete the single quotation mark.',
          );
      for (const cells of data) known.store.take(cells, nextRow++);
      isOver = known.store.isDone;
    }
  }

  /** Looks for the headings once enough lines are there. */
  function open(isLast: boolean): boolean {
    if (held.startsWith('\uFEFF')) held = held.slice(1);
    const lines = held.split('\n', linesSearched + 1);
    if (!isLast && lines.length <= linesSearched && held.length < pieceLength) return false;
    if (!isLast && lines.length < 2 && held.length < longestLine) return false;
    const found = recognise(file, lines, faults);
    if (found === null) {
      isOver = true;
      return false;
    }
    const opened = found.form.open(found.head, faults);
    known = { ...found, opened, store: new RowStore(opened, found.head, faults) };
    const taken = found.head.row;
    let at = 0;
    for (let i = 0; i < taken && at >= 0; i++) at = held.indexOf('\n', at) + 1 || held.length;
    held = held.slice(at);
    nextRow = taken + 1;
    return true;
  }

  function giveUp(): void {
    const complaint = notText(held);
    faults.whole(
      complaint?.found ?? `${held.length} characters without a line break`,
      'a weather table as text, one row an hour',
      complaint?.mend ?? 'Save the table as CSV with line breaks.',
    );
    isOver = true;
  }

  let endsInReturn = false;
  function take(text: string, isLast: boolean): void {
    // CR LF and lone CR become LF; a CR at the end of a piece waits for what follows.
    let part = endsInReturn ? `\r${text}` : text;
    endsInReturn = !isLast && part.endsWith('\r');
    if (endsInReturn) part = part.slice(0, -1);
    held += part.includes('\r') ? part.replace(/\r\n?/g, '\n') : part;
    work(isLast);
  }

  return {
    push(chunk) {
      if (!isOver) take(typeof chunk === 'string' ? chunk : decoder.decode(chunk), false);
      return !isOver;
    },
    get rows() {
      return known?.store.count ?? 0;
    },
    end() {
      if (!isOver) take(decoder.end(), true);
      if (known === null) {
        if (faults.isEmpty) recognise(file, [held], faults);
        return { ok: false, faults: faults.list() };
      }
      return finish(known, options, faults, decoder.encoding);
    },
  };
}

function finish(
  known: Recognised & { opened: Opened; store: RowStore },
  options: ReadWeatherOptions,
  faults: FaultList,
  encoding: string,
): Parsed<WeatherYear> {
  const { opened, store, head, form } = known;
  const notes: WeatherNote[] = [...opened.notes];
  const site = completeSite(
    opened.site,
    options.site ?? {},
    opened.stampOffsetH !== undefined,
    faults,
    notes,
  );
  if (head.delimiter !== ',')
    notes.push({
      kind: 'assumption',
      text: `Cells are parted by ${head.delimiter === '\t' ? 'tabs' : `"${head.delimiter}"`}; a comma within a cell is read as the decimal mark.`,
      count: store.count,
    });
  if (encoding !== 'UTF-8')
    notes.push({ kind: 'assumption', text: `The text was read as ${encoding}.`, count: 0 });
  const time = timeline(store, opened.stampHeading, faults);
  if (time === null || site === null) return { ok: false, faults: faults.list() };
  const year = finishYear(
    {
      formName: form.name,
      opened: { ...opened, notes },
      head,
      store,
      time,
      site,
      stampOffsetH: opened.stampOffsetH ?? site.utcOffsetH,
      year: options.year,
      broken: store.broken,
    },
    faults,
  );
  if (year === null) return { ok: false, faults: faults.list() };
  return { ok: true, value: year };
}

/** As many whole lines as make a piece, cut where no quotation mark is open. */
function wholeLines(text: string, isLast: boolean): string {
  if (isLast && text.length <= pieceLength) return text;
  let end = text.lastIndexOf('\n', Math.min(text.length, pieceLength)) + 1;
  if (end === 0) end = text.indexOf('\n') + 1;
  if (end === 0) return isLast ? text : '';
  const piece = text.slice(0, end);
  if (!piece.includes('"') || piece.split('"').length % 2 === 1) return piece;
  const close = text.indexOf('"', end);
  const line = close < 0 || close > end + 4096 ? -1 : text.indexOf('\n', close);
  // An unclosed mark must not swallow the rest of the file: the piece is cut and the fault reported.
  return line < 0 ? piece : text.slice(0, line + 1);
}

/** Reads a whole table at once. Bytes may be UTF-8, UTF-16 or Windows-1252. */
export function readWeather(
  source: string | Uint8Array,
  options: ReadWeatherOptions = {},
): Parsed<WeatherYear> {
  const reader = createWeatherReader(options);
  reader.push(source);
  return reader.end();
}

export interface ReadProgress {
  readonly rows: number;
  /** Characters or bytes taken so far. */
  readonly taken: number;
}

export interface ReadStreamOptions extends ReadWeatherOptions {
  readonly onProgress?: (progress: ReadProgress) => void;
  /** Asked before each piece; true stops the reading. */
  readonly isCancelled?: () => boolean;
}

/** Reads a table from a stream of pieces; `null` when it was cancelled. */
export async function readWeatherStream(
  pieces: AsyncIterable<string | Uint8Array> | Iterable<string | Uint8Array>,
  options: ReadStreamOptions = {},
): Promise<Parsed<WeatherYear> | null> {
  const reader = createWeatherReader(options);
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
