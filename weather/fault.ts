// What a reader hands back when the user's file is wrong. One type for every door of the program:
// weather tables, project files, nodal models.

/** Something wrong in a file that the user can put right. */
export interface Fault {
  readonly file: string;
  /** A cell, counted as a spreadsheet does (the first line is row 1), or a path into JSON. */
  readonly place: { readonly row: number; readonly column: string } | { readonly path: string };
  readonly found: string;
  readonly expected: string;
  /** What the user can do about it, as an instruction. */
  readonly mend: string;
}

export type Parsed<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** The fault as one line that a person reads: file, place, found, expected, mend. */
export function faultText(fault: Fault): string {
  const { place } = fault;
  const where =
    'path' in place ? place.path || 'the whole file' : `row ${place.row}, column ${place.column}`;
  return `${fault.file}, ${where}: found ${fault.found}, expected ${fault.expected}. ${fault.mend}`;
}
