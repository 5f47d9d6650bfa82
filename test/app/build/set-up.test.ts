import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { packagesAreInstalled, packagesMatch } from '../../../app/build/packages.mjs';

const root = fileURLToPath(new URL('../../../', import.meta.url));
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'inglenook-set-up-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('installed packages', () => {
  const a = { version: '1.0.0', integrity: 'sha512-a' };

  test('match the lock file by version and integrity, whatever the dates say', () => {
    expect(packagesMatch({ '': {}, 'node_modules/a': a }, { 'node_modules/a': a })).toBe(true);
    expect(packagesMatch({ 'node_modules/a': a }, {})).toBe(false);
    const newer = { ...a, version: '1.0.1' };
    expect(packagesMatch({ 'node_modules/a': newer }, { 'node_modules/a': a })).toBe(false);
    const other = { ...a, integrity: 'sha512-b' };
    expect(packagesMatch({ 'node_modules/a': other }, { 'node_modules/a': a })).toBe(false);
  });

  test('may lack what is for another platform', () => {
    const elsewhere = { ...a, optional: true, os: ['plan9'] };
    expect(packagesMatch({ 'node_modules/b': elsewhere }, {})).toBe(true);
  });

  test('are missing where there is no record of them', () => {
    expect(packagesMatch({ 'node_modules/a': a }, null)).toBe(false);
    expect(packagesAreInstalled(folder)).toBe(false);
  });

  test('are in order in this checkout', () => {
    expect(packagesAreInstalled()).toBe(true);
  });
});

describe('the summary that CI reads', () => {
  type Status = 'passed' | 'failed' | 'skipped' | 'todo';
  const file = (status: string, ...tests: readonly Status[]) => ({
    status,
    assertionResults: tests.map((one) => ({ status: one })),
  });

  function summary(report: object | null, rc: number) {
    const path = join(folder, 'report.json');
    rmSync(path, { force: true });
    if (report) writeFileSync(path, JSON.stringify(report));
    const script = join(root, 'app/build/ci-summary.mjs');
    const { status, stdout } = spawnSync(process.execPath, [script, path, String(rc)], {
      encoding: 'utf8',
    });
    return { status, line: stdout.trim().split('\n').at(-1) };
  }

  test.each([
    ['all pass', [file('passed', 'passed', 'passed')], true, 0, 0, '2 passed, 0 failed'],
    [
      'some skipped',
      [file('passed', 'passed', 'skipped', 'todo')],
      true,
      0,
      0,
      '1 passed, 0 failed, 2 skipped',
    ],
    ['one fails', [file('failed', 'passed', 'failed')], false, 1, 1, '1 passed, 1 failed'],
    [
      'a file cannot load',
      [file('passed', 'passed'), file('failed')],
      false,
      1,
      1,
      '1 passed, 1 failed',
    ],
    ['unhandled error', [file('passed', 'passed')], true, 1, 1, '1 passed, 1 failed'],
    ['lint fails, tests pass', [file('passed', 'passed')], true, 2, 2, '1 passed, 1 failed'],
    ['no test at all', [], true, 0, 1, '0 passed, 0 failed'],
  ])('%s', (_, testResults, success, rc, status, line) => {
    expect(summary({ testResults, success }, rc)).toEqual({ status, line });
  });

  test('a run without a report is never a pass', () => {
    expect(summary(null, 0)).toEqual({ status: 1, line: '0 passed, 1 failed' });
    expect(summary(null, 7)).toEqual({ status: 7, line: '0 passed, 1 failed' });
  });
});

// Timed on a machine that runs other tests at the same time: the best of three counts.
test('with nothing to do, the set-up costs well under a second', { retry: 2 }, () => {
  const at = performance.now();
  const { status, stdout } = spawnSync(process.execPath, [join(root, 'app/build/set-up.mjs')], {
    encoding: 'utf8',
  });
  expect(status).toBe(0);
  expect(stdout).toBe(''); // standard output belongs to the command that follows
  expect(performance.now() - at).toBeLessThan(1000);
});
