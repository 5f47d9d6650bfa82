// An unfamiliar table, from the command line: proposed, read, checked, repaired on demand, stored.
import { mkdtemp, readFile, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { runCli } from '../../../app/cli/run-cli.ts';
import { type Dialect, dialects } from '../../weather/map/tables.ts';

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
