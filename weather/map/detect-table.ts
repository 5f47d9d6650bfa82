// Delimiter, decimal mark, heading row and first row of values, from how evenly the lines fall apart.
import { cellsOf, hasOpenQuote, headingsOf } from './cells.ts';
import { type Delimiter, delimiters, type TableMapping, type ThousandsMark } from './mapping.ts';
import { numberOf } from './numbers.ts';
import type { Sample } from './sample.ts';
import { isUnitText } from './units.ts';

export interface Guess<T> {
  readonly value: T;
  /** 0 to 1. */
  readonly confidence: number;
  readonly reason: string;
}

export interface TableGuess {
  readonly table: Guess<TableMapping>;
  readonly decimal: Guess<'.' | ','>;
  readonly headings: readonly string[];
  /** Texts of the row of units below the headings, where there is one. */
  readonly units: readonly string[];
  /** Cells of sampled rows, the last rows last. */
  readonly rows: readonly (readonly string[])[];
  readonly columnCount: number;
}

const words: Readonly<Record<Delimiter, string>> = {
  ',': 'a comma',
  ';': 'a semicolon',
  '\t': 'a tab',
  '|': 'a bar',
  ' ': 'blanks',
};

const anyNumber = /^[-+−]?(?:\d[\d.,'’ \u00a0]*\d|\d|[.,]\d+)(?:[eE][-+]?\d+)?$/;

/** The layout, or null where no mark parts most lines into the same number of cells. */
export function detectLayout(sample: Sample): TableGuess | null {
  const middle = [
    ...sample.head.slice(-60),
    ...sample.runs.flatMap((run) => run.slice(0, 10)),
  ].filter((line) => line.trim() !== '' && !line.startsWith('#'));
  let best: { delimiter: Delimiter; columnCount: number; even: number; score: number } | null =
    null;
  for (const delimiter of delimiters) {
    const counts = new Map<number, number>();
    let numbers = 0;
    let cells = 0;
    for (const line of middle) {
      const parts = cellsOf(line, delimiter);
      let columnCount = parts.length;
      while (columnCount > 0 && parts[columnCount - 1] === '') columnCount--;
      counts.set(columnCount, (counts.get(columnCount) ?? 0) + 1);
      numbers += parts.filter((cell) => anyNumber.test(cell)).length;
      cells += parts.length;
    }
    const [columnCount, times] = [...counts].sort((a, b) => b[1] - a[1])[0] ?? [0, 0];
    const even = times / Math.max(1, middle.length);
    if (columnCount < 2 || even < 0.6) continue;
    // Evenness first, then cells that are numbers; a decimal comma splits evenly but leaves a stamp whole.
    const score = even * 2 + numbers / Math.max(1, cells) - (delimiter === ' ' ? 0.8 : 0);
    const commaInSemicolon = delimiter === ',' && middle.every((line) => line.includes(';'));
    const commaInTab = delimiter === ',' && middle.every((line) => line.includes('\t'));
    const value = score - (commaInSemicolon || commaInTab ? 1.5 : 0);
    if (best === null || value > best.score) best = { delimiter, columnCount, even, score: value };
  }
  if (best === null) return null;
  const { delimiter, even } = best;
  const lines = sample.head;
  const first = firstValueRow(lines, delimiter);
  if (first === 0) return null;
  const headingRow = headingRowAbove(lines, first, delimiter, best.columnCount);
  const headings = headingsOf(lines, headingRow, delimiter);
  const between = lines.slice(headingRow, first - 1).map((line) => cellsOf(line, delimiter));
  const units = between.find((cells) => cells.filter(isUnitText).length >= 2) ?? [];
  const rows = [
    ...lines.slice(first - 1).map((line) => cellsOf(line, delimiter)),
    ...sample.runs.flatMap((run) => run.map((line) => cellsOf(line, delimiter))),
  ].filter((cells) => cells.length > 1 && cells.some((cell) => cell !== ''));
  const decimal = detectDecimal(rows, delimiter);
  const thousands = detectThousands(rows, decimal.value);
  return {
    table: {
      value: { delimiter, decimal: decimal.value, thousands, headingRow, firstRow: first },
      confidence: Math.min(1, even * (delimiter === ' ' ? 0.9 : 1)),
      reason: `${words[delimiter]} parts ${Math.round(even * 100)} % of the lines into ${best.columnCount} cells; ${headingRow === 0 ? 'no row of headings' : `headings in row ${headingRow}`}, values from row ${first}`,
    },
    decimal,
    headings,
    units,
    rows,
    columnCount: Math.max(best.columnCount, headings.length),
  };
}

/** A row of values: at least half its cells hold a number or a date, and so do those below it. */
function firstValueRow(lines: readonly string[], delimiter: Delimiter): number {
  const isValues = (line: string) => {
    if (line.trim() === '' || line.startsWith('#') || hasOpenQuote(line)) return false;
    const cells = cellsOf(line, delimiter).filter((cell) => cell !== '');
    if (cells.length < 2) return false;
    const filled = cells.filter((cell) => /^[-+−.,]?\d/.test(cell)).length;
    return filled * 2 >= cells.length && cells.slice(0, 8).some((cell) => /^\d/.test(cell));
  };
  const widthOf = (line: string) => cellsOf(line, delimiter).length;
  for (let i = 0; i < Math.min(lines.length, 400); i++) {
    const next = lines.slice(i, i + 6).filter((line) => line.trim() !== '');
    if (next.length < 2 || !next.every(isValues)) continue;
    const wide = widthOf(next[next.length - 1]);
    if (next.every((line) => Math.abs(widthOf(line) - wide) <= 1)) return i + 1;
  }
  return 0;
}

function headingRowAbove(
  lines: readonly string[],
  first: number,
  delimiter: Delimiter,
  columnCount: number,
): number {
  let best = 0;
  let most = 0;
  for (let row = first - 1; row >= Math.max(1, first - 8); row--) {
    const cells = headingsOf(lines, row, delimiter);
    const named = cells.filter((cell) => /\p{L}/u.test(cell) && !isUnitText(cell)).length;
    const fits = cells.length >= columnCount * 0.7 && cells.length <= columnCount + 2;
    if (!fits || named < Math.max(2, columnCount * 0.4)) continue;
    // Of several rows of words that with most names is the row of headings; the upper one on a tie.
    if (named >= most) {
      most = named;
      best = row;
    }
  }
  return best;
}

function detectDecimal(
  rows: readonly (readonly string[])[],
  delimiter: Delimiter,
): Guess<'.' | ','> {
  let points = 0;
  let commas = 0;
  for (const cells of rows.slice(0, 3000))
    for (const cell of cells) {
      if (/^[-+−]?\d*\.\d+(?:[eE][-+]?\d+)?$/.test(cell) && !/^\d+\.\d{3}$/.test(cell)) points++;
      else if (/^[-+−]?\d*,\d+(?:[eE][-+]?\d+)?$/.test(cell) && !/^\d+,\d{3}$/.test(cell)) commas++;
      else if (/^[-+−]?\d{1,3}(?:\.\d{3})+,\d+$/.test(cell)) commas++;
      else if (/^[-+−]?\d{1,3}(?:,\d{3})+\.\d+$/.test(cell)) points++;
    }
  if (points === 0 && commas === 0)
    return delimiter === ';'
      ? {
          value: ',',
          confidence: 0.6,
          reason: 'no decimals seen; semicolons go with a decimal comma',
        }
      : { value: '.', confidence: 0.9, reason: 'no decimals seen' };
  const value = commas > points ? ',' : '.';
  const share = Math.max(points, commas) / (points + commas);
  const name = value === ',' ? 'comma' : 'point';
  return {
    value,
    confidence: share,
    reason: `${Math.max(points, commas)} cells with a decimal ${name}${share < 1 ? `, ${Math.min(points, commas)} with the other mark` : ''}`,
  };
}

function detectThousands(rows: readonly (readonly string[])[], decimal: '.' | ','): ThousandsMark {
  const marks: readonly ThousandsMark[] = [decimal === '.' ? ',' : '.', "'", ' '];
  for (const thousands of marks) {
    let seen = 0;
    let spoilt = 0;
    for (const cells of rows.slice(0, 3000))
      for (const cell of cells) {
        if (!cell.includes(thousands) && !(thousands === ' ' && /[\u00a0\u202f]/.test(cell)))
          continue;
        if (!/^[-+−]?\d/.test(cell) || /[:/]/.test(cell)) continue;
        if (Number.isNaN(numberOf(cell, { decimal, thousands }))) spoilt++;
        else seen++;
      }
    // Dates hold these marks too, but never as thousands.
    if (seen > 0 && (thousands !== '.' || seen > spoilt * 0.01)) return thousands;
  }
  return '';
}
