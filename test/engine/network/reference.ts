// Reads the external check values; each case carries its source.

import { readFileSync } from 'node:fs';
import { expectCase, referenceCase, type Value } from '../../reference/cases.ts';

export interface Case<I, E> {
  readonly id: string;
  readonly inputs: I;
  readonly expected: E;
}

/** Cases of a reference file whose id passes `wanted`; none found is an error. */
export function cases<I, E>(file: string, wanted: (id: string) => boolean): Case<I, E>[] {
  const url = new URL(`../../reference/${file}`, import.meta.url);
  const all: { cases: Case<I, E>[] } = JSON.parse(readFileSync(url, 'utf8'));
  const found = all.cases.filter((c) => wanted(c.id));
  if (found.length === 0) throw new Error(`${file} holds none of the cases asked for`);
  return found;
}

/** Largest absolute difference of two lists of equal length. */
export function largestGap(a: ArrayLike<number>, b: ArrayLike<number>): number {
  if (a.length !== b.length) throw new Error(`${a.length} against ${b.length} values`);
  let worst = 0;
  for (let i = 0; i < a.length; i++) {
    const gap = Math.abs(a[i] - b[i]);
    if (!(gap <= worst)) worst = Number.isNaN(gap) ? Infinity : gap;
  }
  return worst;
}

/** Holds what was computed to the case's own tolerance, and keeps it for the table of checks. */
export function meetsCase(
  file: string,
  id: string,
  found: Readonly<Record<string, Value>>,
  leaveOut: Readonly<Record<string, string>> = {},
): void {
  expectCase(referenceCase(file, id), found, leaveOut);
}

/** Reason to leave out a key that the test beside compares. */
export const besides = 'compared by the test beside';
