// A line of a table → its cells, without a string for each: where they start and end.
import type { Delimiter } from './mapping.ts';

/** More cells than this are not looked at: no weather table has so many columns. */
export const mostCells = 1024;

/** One line taken apart; reused for the next. */
export interface Cells {
  /** The line, or what stands in its place where cells were quoted. */
  text: string;
  count: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** A quotation mark without its partner. */
  isBroken: boolean;
}

export function createCells(): Cells {
  const from = new Int32Array(mostCells);
  return { text: '', count: 0, from, to: new Int32Array(mostCells), isBroken: false };
}

/** Takes `text` from `start` to `end` apart into `cells`. */
export function splitLine(
  cells: Cells,
  text: string,
  start: number,
  end: number,
  delimiter: Delimiter,
): void {
  cells.text = text;
  cells.isBroken = false;
  const mark = delimiter.charCodeAt(0);
  const isBlank = delimiter === ' ';
  const { from, to } = cells;
  let count = 0;
  let at = start;
  if (isBlank) while (at < end && isSpace(text.charCodeAt(at))) at++;
  let open = at;
  for (let i = at; i < end; i++) {
    const c = text.charCodeAt(i);
    if (c === 34) {
      splitQuoted(cells, text.slice(start, end), delimiter);
      return;
    }
    if (c !== mark && !(isBlank && c === 9)) continue;
    if (count < mostCells) {
      from[count] = open;
      to[count] = i;
      count++;
    }
    if (isBlank) while (i + 1 < end && isSpace(text.charCodeAt(i + 1))) i++;
    open = i + 1;
  }
  if (!(isBlank && open >= end) && count < mostCells) {
    from[count] = open;
    to[count] = end;
    count++;
  }
  cells.count = count;
}

const isSpace = (code: number) => code === 32 || code === 9;

/** The same for a line with quotation marks; doubled ones within a cell stand for one. */
function splitQuoted(cells: Cells, line: string, delimiter: Delimiter): void {
  const isBlank = delimiter === ' ';
  const parts: string[] = [];
  let part = '';
  let isQuoted = false;
  let wasQuoted = false;
  const flush = () => {
    parts.push(part);
    part = '';
    wasQuoted = false;
  };
  for (let i = 0; i < line.length; i++) {
    const c = line[i];
    if (isQuoted) {
      if (c !== '"') part += c;
      else if (line[i + 1] === '"') {
        part += '"';
        i++;
      } else isQuoted = false;
    } else if (c === '"' && part.trim() === '' && !wasQuoted) {
      part = '';
      isQuoted = true;
      wasQuoted = true;
    } else if (c === delimiter || (isBlank && c === '\t')) {
      if (!isBlank || part !== '' || wasQuoted) flush();
    } else part += c;
  }
  if (!isBlank || part !== '' || wasQuoted) flush();
  cells.isBroken = isQuoted;
  cells.text = parts.join('\n');
  cells.count = Math.min(parts.length, mostCells);
  let at = 0;
  for (let k = 0; k < cells.count; k++) {
    cells.from[k] = at;
    cells.to[k] = at + parts[k].length;
    at += parts[k].length + 1;
  }
}

/** Text of a cell without blanks around it; empty where the line has no such cell. */
export function cellText(cells: Cells, at: number): string {
  return at < cells.count ? cells.text.slice(cells.from[at], cells.to[at]).trim() : '';
}

/** All cells of a line, as texts. */
export function cellsOf(line: string, delimiter: Delimiter): readonly string[] {
  const cells = createCells();
  splitLine(cells, line, 0, line.length, delimiter);
  return Array.from({ length: cells.count }, (_, k) => cellText(cells, k));
}

/**
 * The headings of a table; a cell that holds a line break inside quotation marks runs over several lines.
 * @param row of the headings, counted from 1; 0: none
 */
export function headingsOf(
  lines: readonly string[],
  row: number,
  delimiter: Delimiter,
): readonly string[] {
  if (row === 0) return [];
  let text = (lines[row - 1] ?? '').replace(/^\uFEFF/, '');
  for (let k = row; k < row + 6 && hasOpenQuote(text) && k < lines.length; k++)
    text += ` ${lines[k]}`;
  return cellsOf(text, delimiter).map((cell) => cell.replace(/\s+/g, ' '));
}

export function hasOpenQuote(text: string): boolean {
  return text.split('"').length % 2 === 0;
}
