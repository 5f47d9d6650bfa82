import { cp, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { runDemo } from '../../demo/demo.ts';
import { type Places, placesIn, projectName, weatherName } from '../../demo/places.ts';
import type { Findings } from '../../engine/index.ts';

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'inglenook-demo-'));
});
afterAll(() => rm(folder, { recursive: true }));

/** The demo's data in a folder of its own. */
async function freshDemo(name: string): Promise<Places> {
  const places = placesIn(join(folder, name));
  await cp('demo', places.demo, {
    recursive: true,
    filter: (path) => !/demo[\\/]out$/.test(path) && !path.endsWith('.ts'),
  });
  return places;
}

async function run(places: Places) {
  const spoken = { out: '', err: '' };
  const stream = (name: 'out' | 'err') => ({
    write: (text: string) => {
      spoken[name] += text;
    },
  });
  const streams = { out: stream('out'), err: stream('err'), env: {} };
  const status = await runDemo(places, '2026-01-02', streams);
  return { status, ...spoken };
}

describe('the demo', { timeout: 180_000 }, () => {
  let places: Places;
  let said: Awaited<ReturnType<typeof run>>;
  let findings: Findings;
  beforeAll(async () => {
    places = await freshDemo('whole');
    said = await run(places);
    findings = JSON.parse(await readFile(join(places.out, 'findings.json'), 'utf8'));
  }, 180_000);

  const room = (id: string) => {
    const found = findings.rooms.find((one) => one.id === id);
    if (!found) throw new Error(id);
    return found;
  };

  test('ends well and says nothing on standard error', () => {
    expect(said.err).toBe('');
    expect(said.status).toBe(0);
  });

  test('prints every room and where the results are', () => {
    for (const { name } of findings.rooms) expect(said.out).toContain(name);
    expect(said.out).toContain('summary.html');
    expect(said.out).toContain('Loft tank on frosty nights: the tank falls to');
    expect(said.out).toContain('Solar wall and store: the wall gives its water');
  });

  test('writes findings, hours of every room, weather and a summary, and leaves nothing half-made', async () => {
    const expected = findings.rooms.map(({ id }) => `room-${id}.csv`);
    expect((await readdir(places.out)).sort()).toEqual(
      [...expected, 'findings.json', 'summary.html', weatherName].sort(),
    );
    const rows = (await readFile(join(places.out, 'room-study.csv'), 'utf8')).trimEnd().split('\n');
    expect(rows).toHaveLength(8761);
    const html = await readFile(join(places.out, 'summary.html'), 'utf8');
    for (const { name } of findings.rooms) expect(html).toContain(`<th scope="row">${name}</th>`);
  });

  test('closes its energy balance to 1e-9 of the throughput', () => {
    expect(findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    expect(findings.quality.unconvergedSteps).toBe(0);
  });

  // The scenario, as its project says it: what a reader of the demo is told to find.
  test('the study is the room at risk in summer, and the heater of bedroom 2 is the small one', () => {
    const hours = findings.rooms.map((one) => one.hoursAboveBand);
    expect(room('study').hoursAboveBand).toBe(Math.max(...hours));
    const share = room('study').hoursAboveBand / room('study').occupiedHours;
    expect(share).toBeGreaterThan(0.1);
    // Sun through shut glass can bring a room to 35 to 40 °C on a day of 30 °C; more were absurd. Common
    // practice, no source.
    expect(room('study').operativeTemperatureC.max).toBeLessThan(38);
    const short = findings.rooms.filter((one) => one.hoursHeatingShort > 0).map(({ id }) => id);
    expect(short).toEqual(['bedroom-2']);
  });

  test('its heating is that of a house with thin insulation in a mild place', () => {
    // Between a new house (about 30) and an old one without insulation (150 and more); common practice,
    // no source.
    const perM2 = findings.building.heatingKWh / findings.building.floorAreaM2;
    expect(perM2).toBeGreaterThan(30);
    expect(perM2).toBeLessThan(100);
  });

  test('the summary’s worst week and answers are those of the findings', async () => {
    const html = await readFile(join(places.out, 'summary.html'), 'utf8');
    const grouped = Math.round(findings.building.heatingKWh).toLocaleString('en-GB');
    expect(html).toContain(`<b>${grouped}</b> kWh`);
    expect(html).toContain(`most in Study, ${room('study').hoursAboveBand} h`);
  });
});

test('a damaged project ends with status 1, every fault, and no results', async () => {
  const places = await freshDemo('damaged');
  const file = join(places.demo, projectName);
  const project = JSON.parse(await readFile(file, 'utf8'));
  project.rooms[0].floorAreaM2 = -1;
  project.rooms[1].colour = 'blue';
  await writeFile(file, JSON.stringify(project));
  const { status, out, err } = await run(places);
  expect(status).toBe(1);
  expect(out).toBe('');
  expect(err).toContain('rooms[0].floorAreaM2');
  expect(err).toContain('rooms[1].colour');
  expect(err).not.toContain('    at ');
  expect(await readdir(places.out)).toEqual([weatherName]);
});

test('a place that cannot be written ends with status 1 and says so', async () => {
  const places = await freshDemo('blocked');
  await writeFile(places.out, 'a file where the folder should be');
  const { status, err } = await run(places);
  expect(status).toBe(1);
  expect(err).toMatch(/out/);
});
