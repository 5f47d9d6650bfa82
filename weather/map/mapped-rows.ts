// Takes the rows of a mapped table as they come: stamps and the mapped columns, as numbers.
import type { FaultList } from '../read/fault-list.ts';
import { type Cells, cellText, createCells, splitLine } from './cells.ts';
import type { ColumnMapping, ColumnRef, Mapping } from './mapping.ts';
import { type NumberForm, numberIn } from './numbers.ts';
import { createStampReader, type PlacedPart, type StampReader } from './stamp.ts';
import { type Unit, unitNamed } from './units.ts';

/** Texts that say "not measured" in any table. */
const notMeasured = new Set([
  '',
  'nan',
  'na',
  'n/a',
  'null',
  'none',
  '-',
  '--',
  '---',
  '#n/a',
  'missing',
]);

export interface RowColumn {
  readonly mapping: ColumnMapping;
  readonly unit: Unit;
  readonly at: number;
  readonly heading: string;
  /** As in the file; NaN: not measured. */
  values: Float64Array;
  readonly missing: readonly number[];
}

/** Rows kept: 20 years of minutes would be more than a machine should hold. */
export const mostMappedRows = 6_000_000;

export class MappedRows {
  count = 0;
  row = new Int32Array(16384);
  /** UTC, as stamped [s]. */
  utcS = new Float64Array(16384);
  /** Year that the stamp stated on its own clock, 0 for none. */
  year = new Int16Array(16384);
  readonly columns: readonly RowColumn[];
  readonly footerRows: number[] = [];
  isFull = false;

  private readonly faults: FaultList;
  private readonly form: NumberForm;
  private readonly mapping: Mapping;
  private readonly stamp: StampReader;
  private readonly parts: readonly PlacedPart[];
  private readonly cells: Cells = createCells();
  private readonly texts: ReadonlySet<string>;
  private width = 0;
  private readonly least: number;
  private readonly waiting: { row: number; text: string }[] = [];
  private waitingMore = 0;

  constructor(
    mapping: Mapping,
    headings: readonly string[],
    siteUtcOffsetH: number,
    faults: FaultList,
  ) {
    this.mapping = mapping;
    this.faults = faults;
    this.form = mapping.table;
    this.width = headings.length;
    while (this.width > 0 && headings[this.width - 1] === '') this.width--;
    const place = (ref: ColumnRef) => placeOf(ref, headings, mapping.table.headingRow, faults);
    this.parts = mapping.stamp.parts.map((part) => ({ ...part, at: place(part.column) }));
    this.stamp = createStampReader(mapping.stamp, this.parts, this.form, siteUtcOffsetH);
    const codes = (own: ColumnMapping) => [...mapping.missing, ...(own.missing ?? [])];
    this.texts = new Set([
      ...notMeasured,
      ...mapping.columns
        .flatMap(codes)
        .concat(mapping.missing)
        .flatMap((code) => (typeof code === 'string' ? [code.trim().toLowerCase()] : [])),
    ]);
    this.columns = mapping.columns.flatMap((one) => {
      const unit = unitNamed(one.quantity, one.unit);
      if (unit === undefined) return []; // checked with the mapping
      const at = place(one.column);
      return [
        {
          mapping: one,
          unit,
          at,
          heading: headings[at] || `column ${at + 1}`,
          values: new Float64Array(16384),
          missing: codes(one).flatMap((code) => (typeof code === 'number' ? [code] : [])),
        },
      ];
    });
    this.least = Math.max(0, ...[...this.columns, ...this.parts].map(({ at }) => at + 1));
  }

  /** Whether stamps state their own offset from UTC. */
  get statesOffset(): boolean {
    return this.stamp.statesOffset;
  }

  /** Takes a line of `text`, from `from` to `to`; `row` is its number in the file. */
  take(text: string, from: number, to: number, row: number): void {
    const { cells } = this;
    if (isEmptyLine(text, from, to)) return;
    splitLine(cells, text, from, to, this.mapping.table.delimiter);
    if (cells.count === 0 || isAllEmpty(cells)) return;
    const utcS = this.stamp.read(cells);
    if (Number.isNaN(utcS) || cells.isBroken) {
      if (this.waiting.length < 5)
        this.waiting.push({ row, text: text.slice(from, Math.min(to, from + 60)) });
      else this.waitingMore++;
      return;
    }
    this.blameWaiting();
    if (this.width === 0) this.width = cells.count;
    if (!this.hasRightLength(cells, row)) return;
    if (this.count === mostMappedRows) {
      this.isFull = true;
      return;
    }
    if (this.count === this.row.length) this.grow();
    const i = this.count++;
    this.row[i] = row;
    this.utcS[i] = utcS;
    this.year[i] = this.stamp.year;
    for (const column of this.columns) column.values[i] = this.value(column, row);
  }

  /** Lines without a stamp after the last row are a footer, told in a note; between rows, faults. */
  end(): void {
    if (this.count === 0) {
      this.blameWaiting();
      return;
    }
    for (const { row } of this.waiting) this.footerRows.push(row);
    if (this.waiting.length + this.waitingMore > 100) this.blameWaiting();
  }

  private blameWaiting(): void {
    if (this.waiting.length === 0) return;
    const heading = this.mapping.stamp.parts[0]?.column ?? 'stamp';
    for (const { row, text } of this.waiting)
      this.faults.cell(
        row,
        String(heading),
        text,
        'a stamp as the mapping reads it',
        'Correct the stamp or its line, or how the mapping reads it.',
      );
    if (this.waitingMore > 0)
      this.faults.whole(
        `${this.waitingMore} more rows without a stamp`,
        'a stamp as the mapping reads it',
        'Correct how the mapping reads the stamps.',
        'stamp',
      );
    this.waiting.length = 0;
    this.waitingMore = 0;
    this.footerRows.length = 0;
  }

  private hasRightLength(cells: Cells, row: number): boolean {
    let filled = cells.count;
    while (filled > this.width && cellText(cells, filled - 1) === '') filled--;
    // A cell too few may lack anywhere: what follows would slide into the wrong column.
    if (filled <= this.width && cells.count >= Math.max(this.width, this.least)) return true;
    this.faults.row(
      row,
      'all',
      `${Math.max(filled, Math.min(cells.count, this.width))} cells`,
      `${this.width} cells as in ${this.mapping.table.headingRow > 0 ? 'the headings' : 'the first row'}`,
      'Check the mark between cells, and the decimal mark.',
    );
    return false;
  }

  private value(column: RowColumn, row: number): number {
    const { cells, form } = this;
    const { at, missing } = column;
    const value = numberIn(cells.text, cells.from[at], cells.to[at], form);
    if (Number.isNaN(value)) {
      const text = cellText(cells, at);
      if (this.texts.has(text.toLowerCase())) return value;
      this.faults.cell(
        row,
        column.heading,
        text,
        `a number (${form.decimal === ',' ? 'decimal comma' : 'decimal point'}), or a missing code of the mapping`,
        'Correct the cell, or add its text to the missing codes of the mapping.',
      );
      return value;
    }
    for (let k = 0; k < missing.length; k++) if (missing[k] === value) return Number.NaN;
    return value;
  }

  private grow(): void {
    const size = this.row.length * 2;
    const wider = <T extends Int32Array | Int16Array | Float64Array>(old: T, next: T): T => {
      next.set(old);
      return next;
    };
    this.row = wider(this.row, new Int32Array(size));
    this.utcS = wider(this.utcS, new Float64Array(size));
    this.year = wider(this.year, new Int16Array(size));
    for (const column of this.columns) column.values = wider(column.values, new Float64Array(size));
  }
}

function isEmptyLine(text: string, from: number, to: number): boolean {
  for (let i = from; i < to; i++) {
    const c = text.charCodeAt(i);
    if (c === 35 || c > 32) return c === 35; // a remark
  }
  return true;
}

function isAllEmpty(cells: Cells): boolean {
  for (let k = 0; k < cells.count; k++) if (cellText(cells, k) !== '') return false;
  return true;
}

/** Place of a column from 0; a fault where the table has no such column. */
function placeOf(
  ref: ColumnRef,
  headings: readonly string[],
  headingRow: number,
  faults: FaultList,
): number {
  if (typeof ref === 'number') {
    if (headings.length > 0 && ref > headings.length)
      faults.row(
        Math.max(1, headingRow),
        String(ref),
        `${headings.length} columns`,
        `at least ${ref} columns`,
        'Use a mapping made for tables of this shape.',
      );
    return ref - 1;
  }
  const key = (text: string) => text.replace(/\s+/g, ' ').trim().toLowerCase();
  const at = headings.findIndex((heading) => key(heading) === key(ref));
  if (at < 0)
    faults.cell(
      Math.max(1, headingRow),
      ref,
      headings.slice(0, 12).join(' | '),
      `a column headed "${ref}"`,
      'Use a mapping made for tables of this shape, or name the column by its number.',
    );
  else if (headings.findIndex((heading, k) => k > at && key(heading) === key(ref)) >= 0)
    faults.cell(
      Math.max(1, headingRow),
      ref,
      ref,
      'each heading once',
      'Name the column by its number in the mapping.',
    );
  return Math.max(0, at);
}
