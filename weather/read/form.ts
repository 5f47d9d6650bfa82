// What a reader needs to know of a data set's form; one file per form fills this in.
import type { Fault } from '../fault.ts';
import type { Site, Stands, WeatherNote } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';
import type { Quantity } from './quantities.ts';

/** One column of the file that is wanted. The value in SI is the cell times `scale`. */
export interface ColumnForm {
  readonly quantity: Quantity;
  /** The heading in the file, as `headingKey` writes it. */
  readonly heading: string;
  readonly scale: number;
  /** Numbers in the cell that mean "not measured". */
  readonly missing: readonly number[];
  /** Numbers in the cell that stand for something else, as value in SI. */
  readonly special?: Readonly<Record<number, number>>;
  readonly stands: Stands;
}

/** Start of the time that a row belongs to, on the file's clock. */
export interface Stamp {
  readonly year: number;
  /** 1 to 12. */
  readonly month: number;
  readonly day: number;
  /** Of the day; -60 for the last hour of the day before. */
  readonly minute: number;
}

/** What lies before the table's rows. */
export interface Head {
  readonly file: string;
  /** Lines before the heading, as text. */
  readonly preamble: readonly string[];
  /** Row of the heading, counted from 1. */
  readonly row: number;
  readonly headings: readonly string[];
  readonly delimiter: string;
}

/** What a form learns from the head of a file. */
export interface Opened {
  readonly columns: readonly ColumnForm[];
  /** Site fields that the file states. */
  readonly site: Partial<Site>;
  /** The stamps' clock minus UTC; absent: the site's own. */
  readonly stampOffsetH?: number;
  /** Calendar that the file states. */
  readonly year?: number;
  /** Place of the stamp in its row, for faults. */
  readonly stampHeading: string;
  /** Reads a row's stamp, or says what was expected instead. */
  stamp(cells: readonly string[]): Stamp | string;
  /** Whether a row without a stamp ends the table, as a footer does. */
  readonly hasFooter: boolean;
  readonly notes: readonly WeatherNote[];
  /** How the stamp lies in its hour: `end` (already moved to the start by `stamp`) or `moment`. */
  readonly minuteMeaning: 'start' | 'moment';
}

export interface Form {
  /** As shown to people and stored in `WeatherYear.form`. */
  readonly name: string;
  /** Whether these headings are of this form. */
  recognises(headings: readonly string[]): boolean;
  /** Reads the head; faults go to the list, and what could be read comes back. */
  open(head: Head, faults: FaultList): Opened;
}

/** A heading as forms compare it: no quotes, no case, single spaces. */
export function headingKey(cell: string): string {
  return cell
    .replace(/^\uFEFF/, '')
    .replace(/"/g, '')
    .replace(/\s+/g, ' ')
    .trim()
    .toLowerCase();
}

/** A number written plainly, or NaN. Empty is no number; neither is hexadecimal. */
export function plainNumber(text: string): number {
  const value = Number(text);
  if (value === 0 && text.trim() === '') return Number.NaN;
  return Number.isFinite(value) && !/[xXbBoO]/.test(text) ? value : Number.NaN;
}

export type { Fault };
