// The external check values beside this file, and the comparison that they ask for.
//
//   for (const one of referenceCases('06-air-and-sky.json', /^moist-air-/)) {
//     test(caseName(one), () => {
//       const dryBulbC = inputNumber(one, 't');
//       expectCase(one, { w: humidityRatio(…), twb: wetBulbC(…), … });
//     });
//   }
//
// A case's own tolerance is used, never another. Every key of `expected` has to be found; one that a
// test cannot compute is named in `leaveOut` with its reason, so that nothing is skipped in silence.
import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { record } from './record.ts';

/** How far from the expected value counts as equal: in its own unit, or as a share of it. */
export type Tolerance =
  | { readonly abs: number; readonly reason: string }
  | { readonly rel: number; readonly reason: string };

/** A plain value, a list, or a list of lists; `null` means that there is no value. */
export type Value = number | string | boolean | null | ArrayLike<Value>;

export interface ReferenceCase {
  /** File it comes from; cite a case as `file#id`. */
  readonly file: string;
  readonly id: string;
  readonly title: string;
  readonly source: string;
  readonly from_memory: boolean;
  readonly constants_from_memory: boolean;
  readonly inputs: Readonly<Record<string, Value>>;
  readonly expected: Readonly<Record<string, Value>>;
  readonly units: Readonly<Record<string, string>>;
  readonly tolerance: Readonly<Record<string, Tolerance>>;
  readonly note: string;
}

/** The cases of a file, all of them or those whose id matches. A pattern that fits none is an error. */
export function referenceCases(file: string, ids?: RegExp): readonly ReferenceCase[] {
  const text = readFileSync(new URL(file, import.meta.url), 'utf8');
  const all = (JSON.parse(text) as { cases: Omit<ReferenceCase, 'file'>[] }).cases;
  const chosen = all.filter((one) => ids === undefined || ids.test(one.id));
  if (chosen.length === 0) throw new Error(`${file} has no case that matches ${ids}`);
  return chosen.map((one) => ({ ...one, file }));
}

/** One case by its id. */
export function referenceCase(file: string, id: string): ReferenceCase {
  const found = referenceCases(file).find((one) => one.id === id);
  if (found === undefined) throw new Error(`${file} has no case ${id}`);
  return found;
}

/** Name for a test: what is claimed, after which source. */
export function caseName(one: ReferenceCase): string {
  const memory = one.from_memory ? ', value from memory' : '';
  return `${one.file}#${one.id}: ${one.title} (${one.source}${memory})`;
}

export function inputNumber(one: ReferenceCase, key: string): number {
  const value = one.inputs[key];
  if (typeof value !== 'number') throw new Error(`${one.id}: input ${key} is not a number`);
  return value;
}

export function inputNumbers(one: ReferenceCase, key: string): number[] {
  const value = one.inputs[key];
  if (!Array.isArray(value) || !value.every((v) => typeof v === 'number'))
    throw new Error(`${one.id}: input ${key} is not a list of numbers`);
  return value;
}

export function inputText(one: ReferenceCase, key: string): string {
  const value = one.inputs[key];
  if (typeof value !== 'string') throw new Error(`${one.id}: input ${key} is not a text`);
  return value;
}

/**
 * Fails unless every expected value is met within the case's own tolerance.
 * @param found the computed values under the keys of `expected`; typed arrays will do for lists
 * @param leaveOut keys that the test does not compute, each with the reason
 */
export function expectCase(
  one: ReferenceCase,
  found: Readonly<Record<string, Value | undefined>>,
  leaveOut: Readonly<Record<string, string>> = {},
): void {
  const misses: string[] = [];
  const worst: Worst = { share: null, key: '' };
  const compared: string[] = [];
  for (const [key, expected] of Object.entries(one.expected)) {
    if (key in leaveOut) continue;
    const value = found[key];
    const tolerance = one.tolerance[key] ?? one.tolerance['*'];
    if (value === undefined) misses.push(`${key}: not computed`);
    else if (tolerance === undefined) misses.push(`${key}: the case states no tolerance`);
    else compare(key, value, expected, tolerance, misses, worst);
    compared.push(key);
  }
  for (const key of Object.keys(found))
    if (!(key in one.expected)) misses.push(`${key}: not among the case's expected values`);
  record({
    file: one.file,
    id: one.id,
    worstShare: worst.share,
    key: worst.key,
    compared,
    leftOut: leaveOut,
  });
  expect(compared.length, `${one.id}: values compared`).toBeGreaterThan(0);
  expect(misses, `${one.file}#${one.id} (${one.source})`).toEqual([]);
}

/** Largest distance found so far as a share of its tolerance. */
interface Worst {
  share: number | null;
  key: string;
}

function compare(
  key: string,
  found: Value,
  expected: Value,
  tol: Tolerance,
  misses: string[],
  worst: Worst,
) {
  if (isList(expected)) {
    if (!isList(found) || found.length !== expected.length)
      misses.push(`${key}: found ${describe(found)}, expected a list of ${expected.length}`);
    else
      for (let i = 0; i < expected.length; i++)
        compare(`${key}[${i}]`, found[i] as Value, expected[i] as Value, tol, misses, worst);
    return;
  }
  const seconds = instantS(expected);
  if (seconds !== null || typeof expected === 'number') {
    const want = seconds ?? (expected as number);
    const have = seconds === null ? found : (instantS(found) ?? found);
    const width = 'abs' in tol ? tol.abs : tol.rel * Math.abs(want);
    const share = typeof have === 'number' ? Math.abs(have - want) / (width + 1e-15) : Infinity;
    if (!(share <= (worst.share ?? -1))) {
      worst.share = share;
      worst.key = key;
    }
    if (share <= 1) return;
    const gap = typeof have === 'number' ? `, off by ${have - want}` : '';
    misses.push(
      `${key}: found ${describe(found)}, expected ${expected} within ${width}${gap} (${tol.reason})`,
    );
  } else if (found !== expected) {
    misses.push(`${key}: found ${describe(found)}, expected exactly ${expected}`);
  }
}

function isList(value: Value): value is ArrayLike<Value> {
  return typeof value === 'object' && value !== null;
}

/** ISO time as seconds, `null` for anything else. */
function instantS(value: Value): number | null {
  if (typeof value !== 'string' || !/^\d{4}-\d\d-\d\dT/.test(value)) return null;
  return Date.parse(value) / 1000;
}

function describe(value: Value): string {
  return isList(value) ? `a list of ${value.length}` : String(value);
}
