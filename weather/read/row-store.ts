// Takes a table's rows as they come and keeps only what the weather year needs: stamps and the known
// columns, as numbers. A file of any size costs no more memory than this.
import type { FaultList } from './fault-list.ts';
import { type ColumnForm, type Head, headingKey, type Opened, plainNumber } from './form.ts';
import { limits, type Quantity, slack } from './quantities.ts';

/** Rows kept; beyond them the file holds more than a year or a shorter interval, which is a fault. */
export const mostRows = 20000;

const notMeasured = new Set(['', 'nan', 'na', 'n/a', 'null', 'none', '-', '--', '#n/a', 'missing']);

interface KeptColumn {
  readonly form: ColumnForm;
  readonly at: number;
  readonly heading: string;
  readonly values: Float64Array;
}

/** A mended kind of cell: how many and the first rows, for the notes. */
export interface Mended {
  readonly heading: string;
  count: number;
  readonly rows: number[];
}

export class RowStore {
  count = 0;
  isDone = false;
  readonly row = new Int32Array(mostRows);
  readonly year = new Int16Array(mostRows);
  /** Minute of the year on a leap year's calendar, or of the counted hour; start of the row's time. */
  readonly minute = new Int32Array(mostRows);
  /** Whether the rows count the hours of the year in place of a date. */
  isCounted = false;
  readonly columns: readonly KeptColumn[];
  readonly drawnBack = new Map<string, Mended>();

  /** Columns with cells that are faults. */
  readonly broken = new Set<Quantity>();

  private readonly opened: Opened;
  private readonly head: Head;
  private readonly faults: FaultList;
  private readonly hasDecimalComma: boolean;
  private sawStampless = 0;

  constructor(opened: Opened, head: Head, faults: FaultList) {
    this.opened = opened;
    this.head = head;
    this.faults = faults;
    this.hasDecimalComma = head.delimiter !== ',';
    const keys = head.headings.map(headingKey);
    this.columns = opened.columns.flatMap((form) => {
      const at = keys.indexOf(form.heading);
      if (at < 0) return [];
      if (keys.indexOf(form.heading, at + 1) >= 0)
        faults.cell(
          head.row,
          head.headings[at],
          head.headings[at],
          'each heading once',
          'Delete one of the two columns, or give it another name.',
        );
      return [{ form, at, heading: head.headings[at], values: new Float64Array(mostRows) }];
    });
  }

  /** Takes one row of cells. `row` is its number in the file. */
  take(cells: readonly string[], row: number): void {
    if (this.isDone || (cells.length <= 1 && (cells[0] ?? '').trim() === '')) return;
    if ((cells[0] ?? '').startsWith('#')) return;
    const stamp = this.opened.stamp(cells);
    if (typeof stamp === 'string') {
      if (this.opened.hasFooter && this.count > 0) {
        this.sawStampless++;
        return;
      }
      this.badStamp(cells, row, stamp);
      return;
    }
    if (this.sawStampless > 0) {
      this.sawStampless = 0;
      this.badStamp(
        ['a row without a stamp before this one'],
        row,
        'one table without lines between',
      );
    }
    const minute = stamp.month === 0 ? stamp.minute : minuteOfLeapYear(stamp);
    if (stamp.month === 0) this.isCounted = true;
    if (Number.isNaN(minute)) {
      const found = `${stamp.year}-${stamp.month}-${stamp.day} minute ${stamp.minute}`;
      this.badStamp([found], row, 'a day and hour of the calendar');
      return;
    }
    if (!this.hasRightLength(cells, row)) return;
    if (this.count === mostRows) {
      this.isDone = true;
      return;
    }
    const i = this.count++;
    this.row[i] = row;
    this.year[i] = stamp.year;
    this.minute[i] = minute;
    for (const column of this.columns) column.values[i] = this.read(column, cells[column.at], row);
  }

  private badStamp(cells: readonly string[], row: number, expected: string): void {
    this.faults.cell(
      row,
      this.opened.stampHeading,
      cells.slice(0, 5).join(this.head.delimiter),
      expected,
      'Correct the stamp, or delete the line if it is not part of the table.',
    );
  }

  private hasRightLength(cells: readonly string[], row: number): boolean {
    const wanted = this.head.headings.length;
    let filled = cells.length;
    while (filled > wanted && cells[filled - 1].trim() === '') filled--;
    const last = this.columns.reduce((most, column) => Math.max(most, column.at), 0);
    if (filled <= wanted && cells.length > last) return true;
    this.faults.row(
      row,
      'all',
      `${filled} cells`,
      `${wanted} cells as in the headings`,
      'Check that the decimals are points, or that another character than the comma parts the cells.',
    );
    return false;
  }

  private read(column: KeptColumn, cell: string, row: number): number {
    const { form } = column;
    let text = cell;
    if (this.hasDecimalComma && text.includes(',')) text = text.replace(',', '.');
    let found = Number(text);
    if (!(found > 0 || found < 0)) {
      text = text.trim();
      if (notMeasured.has(text.toLowerCase())) return Number.NaN;
      found = plainNumber(text);
    }
    if (form.quantity === 'ceilingM' && text.trim() === 'unlimited')
      return Number.POSITIVE_INFINITY;
    if (!Number.isFinite(found) || /[xbo]/i.test(text)) {
      this.badCell(column, cell, row);
      return Number.NaN;
    }
    if (form.missing.includes(found)) return Number.NaN;
    const special = form.special?.[found];
    if (special !== undefined) return special;
    // Dividing by a whole number rounds as the decimal was meant: 0.85 from 85, not 85 * 0.01.
    const value = form.scale < 1 ? found / Math.round(1 / form.scale) : found * form.scale;
    const [low, high] = limits[form.quantity];
    if (value >= low && value <= high) return value === 0 ? 0 : value; // no negative zero
    const drawn = value < low ? low : high;
    if (Math.abs(value - drawn) <= (slack[form.quantity] ?? 0)) {
      const mended = this.drawnBack.get(form.quantity) ?? {
        heading: column.heading,
        count: 0,
        rows: [],
      };
      this.drawnBack.set(form.quantity, mended);
      mended.count++;
      if (mended.rows.length < 5) mended.rows.push(row);
      return drawn;
    }
    this.badCell(column, cell, row);
    return Number.NaN;
  }

  private badCell(column: KeptColumn, cell: string, row: number): void {
    const [low, high] = limits[column.form.quantity];
    const { scale } = column.form;
    this.broken.add(column.form.quantity);
    const round = (v: number) => Number((v / scale).toPrecision(6));
    this.faults.cell(
      row,
      column.heading,
      cell.trim(),
      `a number from ${round(low)} to ${round(high)}`,
      'Correct the value, or leave the cell empty if it was not measured.',
    );
  }
}

const dayOfLeapYear = [0, 31, 60, 91, 121, 152, 182, 213, 244, 274, 305, 335, 366];

/** NaN for a day that the calendar does not have. The hour before 1 January is the year's last. */
function minuteOfLeapYear(stamp: {
  readonly year: number;
  readonly month: number;
  readonly day: number;
  readonly minute: number;
}): number {
  const { year, month, day, minute } = stamp;
  if (!(month >= 1 && month <= 12) || !(day >= 1) || minute < -60 || minute >= 1440)
    return Number.NaN;
  if (year < 1900 || year > 2200) return Number.NaN;
  if (day > dayOfLeapYear[month] - dayOfLeapYear[month - 1]) return Number.NaN;
  const at = (dayOfLeapYear[month - 1] + day - 1) * 1440 + minute;
  if (at < 0) return at + 366 * 1440;
  // Hour-ending midnight of 1 March is the end of 28 February where the year has no 29th.
  const isCommon = (year % 4 !== 0 || year % 100 === 0) && year % 400 !== 0;
  if (month === 2 && day === 29 && isCommon) return Number.NaN;
  if (minute < 0 && month === 3 && day === 1 && isCommon) return at - 1440;
  return at;
}
