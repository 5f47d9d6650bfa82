import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { runCli, status as statuses } from '../../../app/cli/run-cli.ts';
import { sampleProject, sampleText, sampleWeather } from '../sample.ts';

let folder: string;
let project: string;

const options = [
  {
    id: 'thick',
    name: 'More insulation',
    measureCost: 1000,
    changes: [{ path: 'constructions[brick-wall].layers[0].resistanceM2KPerW', value: 4 }],
  },
  { id: 'warm', name: 'Warmer', changes: [{ path: 'rooms[room].heating.setPointC', value: 21 }] },
];

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'inglenook-studies-'));
  mkdirSync(join(folder, 'weather'));
  writeFileSync(join(folder, 'weather/year.csv'), sampleWeather());
  project = join(folder, 'house.inglenook.json');
  writeFileSync(project, sampleText({ options }));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function run(args: readonly string[]) {
  let out = '';
  let err = '';
  const status = await runCli(args, {
    out: { write: (text: string) => (out += text) },
    err: { write: (text: string) => (err += text) },
    env: {},
  });
  return { out, err, status };
}

async function json(args: readonly string[]) {
  const { out, err, status } = await run([...args, '--json']);
  expect(err).toBe('');
  expect(status).toBe(statuses.done);
  return JSON.parse(out);
}

describe('compare', () => {
  test('prints base, options and combinations, as a table and as data', async () => {
    const result = await json([
      'compare',
      project,
      '--step',
      '60',
      '--accuracy',
      'none',
      '--combine',
      'thick+warm',
    ]);
    expect(result.cases.map((one: { id: string }) => one.id)).toEqual([
      'base',
      'thick',
      'warm',
      'thick+warm',
    ]);
    expect(result.cases[1].building.heatingKWh.difference).toBeLessThan(0);
    const { out } = await run([
      'compare',
      project,
      '--step',
      '60',
      '--accuracy',
      'none',
      '--rooms',
    ]);
    expect(out).toContain('More insulation');
    expect(out).toContain('resistance: 2 m²K/W → 4 m²K/W');
    expect(out).toContain('No energy carriers are given');
  });
  test('refuses options that no longer fit, all of them, and runs nothing', async () => {
    const file = join(folder, 'broken.inglenook.json');
    const broken = [
      { id: 'a', name: 'A', changes: [{ path: 'rooms[attic].volumeM3', value: 1 }] },
      { id: 'b', name: 'B', changes: [{ path: 'rooms[room].volumeM3', value: -1 }] },
    ];
    writeFileSync(file, sampleText({ options: broken }));
    const { out, err, status } = await run(['compare', file]);
    expect(status).toBe(statuses.inputAtFault);
    expect(out).toBe('');
    expect(err).toContain('options[a].changes[0].path');
    expect(err).toContain('"B"');
  });
  test.each([
    [['--sort', 'beauty'], '--sort: found "beauty"'],
    [['--accuracy', 'high'], '--accuracy: found "high"'],
    [['--step', '7'], '--step: found "7"'],
    [['--threads', '0'], '--threads: found "0"'],
  ])('says what is wrong with %j', async (more, text) => {
    const { err, status } = await run(['compare', project, ...more]);
    expect(status).toBe(statuses.wrongUsage);
    expect(err).toContain(text);
  });
  test('names an option that is not there', async () => {
    const { err, status } = await run(['compare', project, '--combine', 'thick+lost']);
    expect(status).toBe(statuses.inputAtFault);
    expect(err).toContain('no option "lost"');
  });
});

describe('size', () => {
  test('takes a design temperature below zero, and prints sizes, curve and peak', async () => {
    const args = ['size', project, '--step', '60', '--outdoor', '-8', '--room-step', '100'];
    const result = await json(args);
    expect(result.steady.designOutdoorC).toBe(-8);
    expect(result.heating.rooms[0].chosenW % 100).toBe(0);
    expect(result.heating.curve).toHaveLength(12);
    expect(result.cooling).toBeNull();
    expect(result.notes.join(' ')).toContain('No room is cooled');
    const { out } = await run(args);
    expect(out).toContain('The year against size, from real runs');
    expect(out).toContain('Peak hour');
    expect(out).toMatch(/licensed\s+practitioner/);
  });
  test('refuses what is no temperature', async () => {
    const { err, status } = await run(['size', project, '--outdoor', 'cold']);
    expect(status).toBe(statuses.wrongUsage);
    expect(err).toContain('expected a number from -60 to 30 °C');
  });
});

describe('cooldown', () => {
  test('prints the fall, the limits and the power to be back', async () => {
    const args = ['cooldown', project, '--step', '60', '--day', '01-20', '--limits', 'frost=5,10'];
    const result = await json(args);
    expect(result.offAt).toBe('2019-01-20T22:00');
    expect(result.rooms[0].airC.length).toBe(73);
    expect(result.rooms[0].limits.map((one: { name: string }) => one.name)).toEqual([
      'frost',
      '10 °C',
    ]);
    expect(result.warmUps.length).toBeGreaterThan(3);
    const { out } = await run(args);
    expect(out).toContain('Power to be warm by 2019-01-21 06:30');
    expect(out).toContain('Time constants of the network');
  });
  test.each([
    [['--day', '02-30'], '--day: found "02-30"'],
    [['--mode', 'sleep'], '--mode: found "sleep"'],
    [['--limits', 'icy'], '--limits: found "icy"'],
  ])('says what is wrong with %j', async (more, text) => {
    const { err, status } = await run(['cooldown', project, ...more]);
    expect(status).toBe(statuses.wrongUsage);
    expect(err).toContain(text);
  });
});

describe('overheating', () => {
  test('judges rooms by the criteria asked for, over several tables', async () => {
    const warm = join(folder, 'warm.csv');
    writeFileSync(warm, sampleWeather(12));
    const args = [
      'overheating',
      project,
      '--step',
      '60',
      '--criteria',
      'tm52,din-4108-2',
      '--accuracy',
      'none',
    ];
    const result = await json([...args, '--more-weather', warm, '--no-trials']);
    expect(result.rooms[0].verdicts.map((one: { method: string }) => one.method)).toEqual([
      'tm52',
      'din-4108-2',
    ]);
    expect(result.otherWeathers[0].roomsFailing).toEqual(['room']);
    const { out } = await run([...args, '--no-trials']);
    expect(out).toContain('DIN 4108-2:2013');
  });
  test('refuses a criterion that it does not know', async () => {
    const { err, status } = await run(['overheating', project, '--criteria', 'feeling']);
    expect(status).toBe(statuses.wrongUsage);
    expect(err).toContain('tm52, tm59');
  });
});

describe('sweep', () => {
  const sweep = {
    format: 'inglenook-sweep',
    version: 1,
    name: 'Walls',
    parameters: [
      {
        id: 'walls',
        paths: ['constructions[brick-wall].layers[0].resistanceM2KPerW'],
        from: 1,
        to: 3,
        steps: 3,
      },
    ],
    sample: { kind: 'grid' },
    stepMinutes: 60,
  };
  test('keeps its rows as they come, and goes on from what is left of them', async () => {
    const study = join(folder, 'walls.sweep.json');
    const rows = join(folder, 'walls.jsonl');
    writeFileSync(study, JSON.stringify(sweep));
    const whole = await json(['sweep', project, study, '--rows', rows]);
    expect(whole.rows).toHaveLength(3);
    const lines = readFileSync(rows, 'utf8').trimEnd().split('\n');
    expect(lines).toHaveLength(4);
    expect(JSON.parse(lines[0])).toMatchObject({ format: 'inglenook-sweep-rows', runs: 3 });
    expect(lines.slice(1).map((line) => JSON.parse(line))).toEqual(whole.rows);
    // Cut off in the middle of the last line, as a stop would leave it.
    writeFileSync(rows, `${lines.slice(0, 3).join('\n')}\n${lines[3].slice(0, 20)}`);
    const { out, err, status } = await run(['sweep', project, study, '--rows', rows, '--json']);
    expect(status).toBe(statuses.done);
    expect(err).toContain('2 of 3 runs are there already.');
    expect(JSON.parse(out)).toEqual(whole);
  });
  test('does not go on with the rows of another sweep', async () => {
    const study = join(folder, 'other.sweep.json');
    const rows = join(folder, 'other.jsonl');
    writeFileSync(study, JSON.stringify({ ...sweep, name: 'Other' }));
    writeFileSync(rows, '{"format":"inglenook-sweep-rows","sha256":"0"}\n');
    const { err, status } = await run(['sweep', project, study, '--rows', rows]);
    expect(status).toBe(statuses.inputAtFault);
    expect(err).toContain('rows of another sweep, project or weather');
    expect(readFileSync(rows, 'utf8')).toBe('{"format":"inglenook-sweep-rows","sha256":"0"}\n');
  });
  test('says how many runs it would be, and what is wrong before any is made', async () => {
    const study = join(folder, 'check.sweep.json');
    writeFileSync(study, JSON.stringify(sweep));
    expect((await run(['sweep', project, study, '--check'])).out).toBe(
      'Walls: 3 runs. No faults.\n',
    );
    writeFileSync(
      study,
      JSON.stringify({ ...sweep, parameters: [{ ...sweep.parameters[0], from: -1 }] }),
    );
    const { err, status } = await run(['sweep', project, study]);
    expect(status).toBe(statuses.inputAtFault);
    expect(err).toContain('parameters[0].from');
  });
  test('needs both of its files', async () => {
    const { err, status } = await run(['sweep', project]);
    expect(status).toBe(statuses.wrongUsage);
    expect(err).toContain('STUDY is missing');
  });
});

test('a study of a nodal model is refused', async () => {
  const file = join(folder, 'plain.json');
  const model = { format: 'inglenook-network', version: 1 };
  writeFileSync(file, JSON.stringify(model));
  const { status } = await run(['compare', file]);
  expect(status).not.toBe(statuses.done);
});

test('a plant that cannot hold its set-point at all is said to be', async () => {
  const file = join(folder, 'weak.inglenook.json');
  const [room] = sampleProject.rooms;
  const weak = { ...room, heating: { setPointC: 35, maxW: 100 } };
  writeFileSync(file, sampleText({ rooms: [weak] }));
  const { out } = await run(['cooldown', file, '--step', '60', '--day', '01-20']);
  expect(out).toContain('Not warm in time');
});
