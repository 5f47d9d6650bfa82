// An unfamiliar table, from the command line: proposed, read, checked, repaired on demand, stored.
import { mkdtemp, readFile, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { runCli } from '../../../app/cli/run-cli.ts';
import { type Dialect, dialects } from '../../weather/map/tables.ts';
import { sampleText } from '../sample.ts';

async function inglenook(...args: string[]) {
  let out = '';
  let err = '';
  const code = await runCli(args, {
    out: { write: (text: string) => (out += text) },
    err: { write: (text: string) => (err += text) },
    env: {},
  });
  return { code, out, err };
}

let folder = '';
const path = (name: string) => join(folder, name);
const german = dialects.find(({ name }) => name.startsWith('German')) as Dialect;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'weather-'));
  process.env.INGLENOOK_STORE = path('store');
  const lines = german.write().split('\n');
  lines.splice(4000, 6); // a gap of six hours
  await writeFile(path('roof.txt'), lines.join('\r\n'), 'latin1');
});
afterAll(() => {
  delete process.env.INGLENOOK_STORE;
});

test('a table of no known form is not guessed at: the way to a mapping is told', async () => {
  const { code, err } = await inglenook('weather', path('roof.txt'));
  expect(code).toBe(1);
  expect(err).toContain('--make-mapping');
});

test('a mapping is proposed with reasons, rows and open questions', async () => {
  const { code, out, err } = await inglenook(
    'weather',
    path('roof.txt'),
    '--make-mapping',
    path('roof.json'),
    '--site',
    '47.5,9,480,1',
  );
  expect(err).toContain('Written to');
  expect(code).toBe(0);
  expect(out).toContain('decimal comma');
  expect(out).toContain('air temperature');
  expect(out).toContain('the first stamp is one interval into the day, the last is midnight');
  expect(out).toContain('01.01.2023 01:00');
  const mapping = JSON.parse(await readFile(path('roof.json'), 'utf8'));
  expect(mapping.format).toBe('inglenook-weather-mapping');
});

test('the gap stops the reading with the repair that mends it, and accepting it reads the year', async () => {
  const refused = await inglenook('weather', path('roof.txt'), '--mapping', path('roof.json'));
  expect(refused.code).toBe(1);
  expect(refused.err).toContain('the longest 6 h from 2023-06-16');
  expect(refused.err).toContain('Accept it as "gap-long-dryBulbC"');
  const read = await inglenook(
    'weather',
    path('roof.txt'),
    '--mapping',
    path('roof.json'),
    '--accept',
    'all',
    '--json',
  );
  expect(read.err).toBe('');
  const { findings, notes, hours } = JSON.parse(read.out);
  expect(hours).toBe(8760);
  expect(findings.find(({ id }: { id: string }) => id === 'gap-long-dryBulbC').isAccepted).toBe(
    true,
  );
  expect(notes.map(({ text }: { text: string }) => text).join()).toContain(
    'Fill from the same hours of the days beside it',
  );
});

test('an accepted repair that the table does not call for is said', async () => {
  const gaps = [
    'dryBulbC',
    'relativeHumidity',
    'windMPerS',
    'ghiWPerM2',
    'dhiWPerM2',
    'pressurePa',
  ];
  const ids = [...gaps.map((name) => `gap-long-${name}`), 'gap-lnog-x'].join(',');
  const read = await inglenook(
    'weather',
    path('roof.txt'),
    '--mapping',
    path('roof.json'),
    '--accept',
    ids,
  );
  expect(read.err).toBe('');
  expect(read.out.replace(/\s+/g, ' ')).toContain('not found in this table: gap-lnog-x.');
});

test('mistakes on the command line and in the mapping are named with their place', async () => {
  const both = await inglenook(
    'weather',
    path('roof.txt'),
    '--mapping',
    path('roof.json'),
    '--year',
    '2023',
    '--part',
  );
  expect(both.code).toBe(2);
  expect(both.err).toContain('one of --year, --from and --part');
  await writeFile(
    path('bad.json'),
    '{"format":"inglenook-weather-mapping","version":2,"colums":[]}',
  );
  const bad = await inglenook('weather', path('roof.txt'), '--mapping', path('bad.json'));
  expect(bad.code).toBe(1);
  expect(bad.err).toContain('version: found 2, expected one of 1');
  expect(bad.err).toContain('colums: found the field "colums"');
});

test('a project reads its weather by the mapping and the repairs that it names', async () => {
  const project = JSON.parse(sampleText());
  project.weather = { file: 'roof.txt', mapping: 'roof.json', accept: ['all'] };
  await writeFile(path('house.inglenook.json'), JSON.stringify(project));
  const { code, out, err } = await inglenook('check', path('house.inglenook.json'));
  expect(err).toBe('');
  expect(code).toBe(0);
  expect(out).toContain('8760 hours');
  expect(out).toContain('Weather read by the mapping');
  expect(out).toContain('Fill from the same hours of the days beside it');
  project.weather = { file: 'roof.txt', mapping: 'nowhere.json' };
  await writeFile(path('house.inglenook.json'), JSON.stringify(project));
  const lost = await inglenook('check', path('house.inglenook.json'));
  expect(lost.code).toBe(1);
  expect(lost.err).toContain('nowhere.json');
});

test('a year is changed by the month and written as a plain table that reads back', async () => {
  const twelve = Array.from({ length: 12 }, () => 2);
  await writeFile(path('warm.json'), JSON.stringify({ name: 'two degrees', meanDryBulbK: twelve }));
  const args = ['weather', path('roof.txt'), '--mapping', path('roof.json'), '--accept', 'all'];
  const plain = await inglenook(...args, '--json');
  const warm = await inglenook(
    ...args,
    '--changes',
    path('warm.json'),
    '--plain',
    path('warm.csv'),
    '--json',
  );
  const mean = (out: string) => JSON.parse(out).climate.meanDryBulbC;
  expect(mean(warm.out) - mean(plain.out)).toBeCloseTo(2, 9);
  const back = await inglenook('weather', path('warm.csv'), '--json');
  expect(mean(back.out)).toBeCloseTo(mean(warm.out), 9);
  await writeFile(path('warm.json'), JSON.stringify({ name: 'x', meanDryBulbK: [1] }));
  const wrong = await inglenook(...args, '--changes', path('warm.json'));
  expect(wrong.code).toBe(1);
  expect(wrong.err).toContain('meanDryBulbK: found 1 values, expected 12');
});
