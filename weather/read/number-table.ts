// A plain table of numbers with a heading row: boundary columns for nodal models.
import Papa from 'papaparse';
import type { Fault, Parsed } from '../fault.ts';

export interface NumberTable {
  readonly rows: number;
  /** By heading; `column.get('outdoorC')` holds one value a row. */
  readonly columns: ReadonlyMap<string, Float64Array>;
}

const mostFaults = 20;

/** Reads a CSV whose every cell below the heading is a number; lines that start with # are remarks. */
export function readNumberTable(text: string, file: string): Parsed<NumberTable> {
  const faults: Fault[] = [];
  const fault = (row: number, column: string, found: string, expected: string, mend: string) => {
    if (faults.length < mostFaults)
      faults.push({ file, place: { row, column }, found, expected, mend });
  };
  const parsed = Papa.parse<string[]>(text.replace(/^\uFEFF/, ''), {
    comments: '#',
    skipEmptyLines: 'greedy',
  });
  const [heading = [], ...body] = parsed.data;
  const names = heading.map((name) => name.trim());
  if (names.length === 0 || body.length === 0) {
    fault(1, '1', 'no table', 'a heading row and rows of numbers', 'Choose another file.');
    return { ok: false, faults };
  }
  names.forEach((name, c) => {
    if (name === '')
      fault(1, String(c + 1), 'an empty heading', 'a name', 'Give the column a name.');
    else if (names.indexOf(name) !== c)
      fault(1, name, `"${name}" twice`, 'each name once', 'Rename one of them.');
  });
  const columns = new Map<string, Float64Array>();
  names.forEach((name, c) => {
    columns.set(
      name,
      Float64Array.from(body, (row, r) => {
        const found = row[c]?.trim() ?? '';
        const value = found === '' ? Number.NaN : Number(found); // Number('') is 0
        if (!Number.isFinite(value))
          fault(r + 2, name, `"${found}"`, 'a number', 'Correct the cell.');
        return value;
      }),
    );
  });
  return faults.length > 0
    ? { ok: false, faults }
    : { ok: true, value: { rows: body.length, columns } };
}
