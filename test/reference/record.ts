// What the comparisons of one test file found, written when the file is done: test/out/checks/NAME.json.
// The table of checks is composed from these by check-table.last.test.ts, after all other tests.
import { mkdirSync, writeFileSync } from 'node:fs';
import { relative } from 'node:path';
import { afterAll, expect } from 'vitest';

/** One comparison of a case. */
export interface Check {
  readonly file: string;
  readonly id: string;
  /** Largest distance from an expected value as a share of its tolerance, 1 at its edge; null where values had to be equal. */
  readonly worstShare: number | null;
  readonly key: string;
  readonly compared: readonly string[];
  /** Keys that the test leaves out, each with the reason. */
  readonly leftOut: Readonly<Record<string, string>>;
}

export interface CheckRecord {
  /** From the root of the checkout. */
  readonly test: string;
  readonly checks: readonly Check[];
}

export const recordFolder = 'test/out/checks';

const checks: Check[] = [];

/** Keeps a comparison for the table. */
export function record(check: Check): void {
  checks.push(check);
}

afterAll(() => {
  const { testPath } = expect.getState();
  if (testPath === undefined || checks.length === 0) return;
  const test = relative(process.cwd(), testPath).replaceAll('\\', '/');
  const text: CheckRecord = { test, checks };
  mkdirSync(recordFolder, { recursive: true });
  writeFileSync(`${recordFolder}/${test.replaceAll('/', '.')}.json`, JSON.stringify(text, null, 1));
});
