// Runs after all other tests: every check value was compared, and the table of checks says so. The
// table with the deviations of this run goes to test/out/check-table.md; with INGLENOOK_WRITE_CHECKS=1
// it is written into README.md and test/reference/check-table.md.
import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { casesOf, checkTable, recordedChecks, reported, rowsOf, topics } from './check-table.ts';

const checks = recordedChecks();
const table = checkTable(checks);
const committed = 'test/reference/check-table.md';
const [open, close] = ['<!-- checks -->', '<!-- /checks -->'];

test('there are records of comparisons: the other tests ran before', () => {
  expect(checks.length, 'run all tests, not this file alone').toBeGreaterThan(0);
});

test('every file of check values stands in the table', () => {
  const files = readdirSync('test/reference').filter((name) => /^\d\d.*\.json$/.test(name));
  const known = topics.map(({ file }) => file);
  expect(files.filter((file) => !known.includes(file))).toEqual([]);
  expect(files.length).toBeGreaterThan(10);
});

describe.each(topics.filter(({ file }) => file.endsWith('.json')))('$file', ({ file }) => {
  const ofFile = checks.filter((check) => check.file === file);

  test('every case was compared, in every value it expects or with a reason', () => {
    const open = casesOf(file).flatMap(({ id, expected }) => {
      const own = ofFile.filter((check) => check.id === id);
      if (own.length === 0) return [`${id}: no test`];
      return Object.keys(expected)
        .filter((key) => !own.some((check) => check.compared.includes(key) || check.leftOut[key]))
        .map((key) => `${id}: ${key} neither compared nor left out with a reason`);
    });
    expect(open).toEqual([]);
  });

  test('what lies beyond its tolerance is reported by name, and nothing else is', () => {
    const beyond = new Set(
      ofFile.flatMap(({ id, worstShare }) =>
        worstShare !== null && !(worstShare <= 1) ? [`${file}#${id}`] : [],
      ),
    );
    const named = Object.keys(reported).filter((key) => key.startsWith(`${file}#`));
    expect([...beyond].sort()).toEqual(named.sort());
  });
});

test('the tables in README.md and beside the check values are up to date in topics and cases', () => {
  mkdirSync('test/out', { recursive: true });
  writeFileSync('test/out/check-table.md', `${table}\n`);
  const readme = readFileSync('README.md', 'utf8');
  const [from, to] = [readme.indexOf(open), readme.indexOf(close)];
  expect(from, `${open} in README.md`).toBeGreaterThan(0);
  expect(to).toBeGreaterThan(from);
  if (process.env.INGLENOOK_WRITE_CHECKS === '1') {
    writeFileSync(committed, `${table}\n`);
    const filled = `${readme.slice(0, from)}${open}\n${table}\n${readme.slice(to)}`;
    writeFileSync('README.md', filled);
    return;
  }
  const mend = 'run all tests with INGLENOOK_WRITE_CHECKS=1';
  expect(rowsOf(readFileSync(committed, 'utf8')), mend).toEqual(rowsOf(table));
  expect(rowsOf(readme.slice(from, to)), mend).toEqual(rowsOf(table));
});
