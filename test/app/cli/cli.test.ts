import { createHash } from 'node:crypto';
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { runCli } from '../../../app/cli/run-cli.ts';
import { version } from '../../../app/version.ts';
import { sampleText, sampleWeather } from '../sample.ts';

let folder: string;
const at = (name: string) => join(folder, name);

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'inglenook-cli-'));
  mkdirSync(at('weather'));
  writeFileSync(at('weather/year.csv'), sampleWeather());
  writeFileSync(at('house.inglenook.json'), sampleText());
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

interface Said {
  readonly status: number;
  readonly out: string;
  readonly err: string;
}

async function run(
  args: readonly string[],
  options: { isTTY?: boolean; env?: object } = {},
): Promise<Said> {
  let out = '';
  let err = '';
  const status = await runCli(args, {
    out: {
      write: (text) => {
        out += text;
      },
    },
    err: {
      isTTY: options.isTTY ?? false,
      write: (text) => {
        err += text.replaceAll(folder, '…');
      },
    },
    env: { ...options.env },
  });
  return { status, out, err };
}

describe('usage', () => {
  test('without a command: the list, on standard error, and status 2', async () => {
    const said = await run([]);
    expect(said.status).toBe(2);
    expect(said.out).toBe('');
    expect(said.err).toContain('simulate PROJECT');
  });

  test('help lists the commands there are, and each has its own with examples', async () => {
    const { out, status } = await run(['--help']);
    expect(status).toBe(0);
    const commands = [...out.matchAll(/^ {2}(\w+) [A-Z]+(?: [A-Z]+)? {2}/gm)].map(
      (match) => match[1] ?? '',
    );
    expect(commands).toEqual([
      'simulate',
      'compare',
      'size',
      'cooldown',
      'overheating',
      'sweep',
      'check',
      'weather',
      'network',
    ]);
    for (const command of commands) {
      const help = await run([command, '--help']);
      expect(help.status).toBe(0);
      expect(help.out).toContain(`inglenook ${command} `);
      expect(help.out).toContain('Examples:');
      expect(await run(['help', command])).toEqual(help);
    }
  });

  test("the version is the package's", async () => {
    expect((await run(['--version'])).out).toBe(`${version}\n`);
    expect(version).toMatch(/^\d+\.\d+\.\d+$/);
  });

  test.each([
    [['simulat', 'x'], 'Did you mean simulate?'],
    [['xyzzy'], 'There is no command "xyzzy".'],
    [['simulate'], 'PROJECT is missing'],
    [['simulate', ''], 'PROJECT is missing'],
    [['check', 'a', 'b'], 'one PROJECT at a time, found also "b"'],
    [['simulate', 'x', '--wether', 'y'], 'no option --wether. Did you mean --weather?'],
    [['simulate', 'x', '-j'], 'no option -j'],
    [['simulate', 'x', '--out'], '--out needs a value: --out DIR'],
    [['simulate', 'x', '--out', '--json'], '--out needs a value'],
    [['simulate', 'x', '--out='], '--out needs a value'],
    [['simulate', 'x', '--json=yes'], '--json takes no value, found "yes"'],
    [['simulate', 'x', '--step', '5', '--step', '6'], '--step is given twice'],
  ])('%j is wrong usage, said in one line', async (args, message) => {
    const said = await run(args);
    expect(said.status).toBe(2);
    expect(said.err).toContain(message);
    expect(said.err.trim().split('\n')).toHaveLength(1);
    expect(said.out).toBe('');
  });

  test('an operand after -- may begin with a dash', async () => {
    expect((await run(['check', '--', '-odd.json'])).err).toContain('-odd.json, the whole file');
  });

  test('a step that does not divide the hour is wrong usage', async () => {
    const said = await run(['simulate', at('house.inglenook.json'), '--step', '7']);
    expect(said.status).toBe(2);
    expect(said.err).toContain('found "7", expected minutes that divide the hour');
  });
});

describe('input at fault', () => {
  test('every fault of a project is told, one a line, with no trace and nothing on standard output', async () => {
    writeFileSync(at('bad.json'), sampleText({ name: 7, rooms: [{ id: 'A room' }], more: 1 }));
    for (const command of ['simulate', 'check', 'network']) {
      const said = await run([command, at('bad.json')]);
      expect(said.status).toBe(1);
      expect(said.out).toBe('');
      const lines = said.err.trim().split('\n');
      expect(lines.length).toBeGreaterThan(4);
      for (const line of lines)
        expect(line).toMatch(/^…\/bad\.json, .+: found .+, expected .+\. .+\.$/);
      expect(said.err).not.toMatch(/\bat .+:\d+:\d+/);
    }
  });

  test.each([
    ['none.json', 'found nothing at this path, expected a project file'],
    ['weather', 'found a folder'],
    ['empty.json', 'found an empty file'],
    ['binary.json', 'found binary data'],
    ['cut.json', 'found text that is not JSON'],
  ])('%s: %s', async (name, message) => {
    writeFileSync(at('empty.json'), '');
    writeFileSync(at('binary.json'), Buffer.from([123, 0, 125]));
    writeFileSync(at('cut.json'), sampleText().slice(0, 400));
    const said = await run(['simulate', at(name)]);
    expect(said.status).toBe(1);
    expect(said.err).toContain(message);
    expect(said.err.trim().split('\n')).toHaveLength(1);
  });

  test('a weather table that is not the one of the project is refused, with both digests', async () => {
    const weather = { file: 'weather/year.csv', sha256: '0'.repeat(64) };
    writeFileSync(at('other.json'), sampleText({ weather }));
    const said = await run(['simulate', at('other.json')]);
    const real = createHash('sha256')
      .update(readFileSync(at('weather/year.csv')))
      .digest('hex');
    expect(said.status).toBe(1);
    expect(said.err).toContain(`weather.sha256: found ${'0'.repeat(64)}, expected ${real}`);
    writeFileSync(at('same.json'), sampleText({ weather: { ...weather, sha256: real } }));
    const good = await run(['check', at('same.json')]);
    expect(good).toMatchObject({ status: 0, err: '' });
    expect(good.out).not.toContain('SHA-256');
  });

  test('a missing weather table names the path that was tried', async () => {
    writeFileSync(at('lost.json'), sampleText({ weather: { file: 'weather/none.csv' } }));
    const said = await run(['simulate', at('lost.json')]);
    expect(said.status).toBe(1);
    expect(said.err).toContain('…/weather/none.csv, the whole file: found nothing at this path');
  });

  test('check explains constructions, glazings and windows, as text and as data', async () => {
    const text = await run(['check', at('house.inglenook.json')]);
    expect(text).toMatchObject({ status: 0, err: '' });
    expect(text.out).toContain('Constructions: U and films by ISO 6946');
    expect(text.out).toContain('Windows: U_w by ISO 10077-1');
    const data = await run(['check', at('house.inglenook.json'), '--json']);
    const { ok, explained } = JSON.parse(data.out);
    expect(ok).toBe(true);
    for (const part of ['constructions', 'glazings', 'windows'])
      expect(explained[part].length).toBeGreaterThan(0);
    expect(explained.constructions[0].uses[0].uValueWPerM2K).toBeGreaterThan(0);
  });

  test('check --json tells the faults as data, with status 1', async () => {
    const said = await run(['check', at('bad.json'), '--json']);
    expect(said.status).toBe(1);
    expect(said.err).toBe('');
    const document = JSON.parse(said.out);
    expect(document.ok).toBe(false);
    expect(document.faults[0]).toMatchObject({ place: { path: 'name' }, found: '7' });
  });
});

describe('simulate', () => {
  const hourly = ['simulate', '--step', '60'];

  test('--json writes one document and nothing else, with what the design promises', async () => {
    const said = await run([...hourly, at('house.inglenook.json'), '--json']);
    expect(said).toMatchObject({ status: 0, err: '' });
    const document = JSON.parse(said.out);
    expect(document.project).toBe('Garden room');
    expect(document.stepMinutes).toBe(60);
    expect(document.weather).toMatchObject({ place: 'Nowhere Moor', hours: 8760 });
    const [room] = document.rooms;
    expect(Object.keys(room)).toEqual(
      expect.arrayContaining([
        ...['id', 'name', 'floorAreaM2', 'heatingKWh', 'coolingKWh', 'peakHeatingW'],
        ...['peakHeatingAt', 'peakCoolingW', 'peakCoolingAt', 'airTemperatureC'],
        ...['operativeTemperatureC', 'occupiedHours', 'hoursBelowBand', 'hoursAboveBand'],
        ...['degreeHoursBelow', 'degreeHoursAbove', 'balanceKWh'],
      ]),
    );
    // The law that every run must keep: what goes in is stored or goes out.
    const { storage, residual, ...into } = room.balanceKWh;
    const flows = Object.values(into as Record<string, number>);
    const sum = flows.reduce((a, b) => a + b, 0);
    const throughput = flows.reduce((a, b) => a + Math.abs(b), 0);
    expect(Math.abs(sum - storage)).toBeLessThan(1e-6 * throughput);
    expect(Math.abs(residual)).toBeLessThan(1e-6 * throughput);
    expect(document.assumptions.join()).toContain('The project holds no SHA-256');
  });

  test('the same command gives the same figures', async () => {
    const figures = async () => {
      const { out } = await run([...hourly, at('house.inglenook.json'), '--json']);
      return { ...JSON.parse(out), timings: null };
    };
    expect(await figures()).toEqual(await figures());
  });

  test('for a person: tables with units, cautions and assumptions', async () => {
    const { out } = await run([...hourly, at('house.inglenook.json')]);
    expect(out).toMatch(/^Room +Floor +Heating/m);
    expect(out).toMatch(/^ +m² +kWh/m);
    expect(out).toContain('Results are estimates for design decisions');
    expect(out).toContain('Assumptions');
    expect(out).not.toContain('NaN');
    expect(out).not.toContain('undefined');
  });

  test('progress goes to standard error: one line over and over on a terminal, tenths on request', async () => {
    const shown = await run([...hourly, at('house.inglenook.json'), '--json'], { isTTY: true });
    expect(shown.err).toMatch(/\r.*\d+ %/);
    expect(shown.err.endsWith('\r\u001b[2K')).toBe(true);
    const asked = await run([...hourly, at('house.inglenook.json'), '--json', '--progress']);
    const lines = asked.err.trimEnd().split('\n');
    expect(lines.length).toBeLessThan(15);
    for (const line of lines) expect(line).toMatch(/^ *\d+ % {2}\w/);
    JSON.parse(asked.out);
  });

  test('--out writes the hours and the findings; the year adds up to the figures', async () => {
    const said = await run([
      ...hourly,
      at('house.inglenook.json'),
      '--json',
      '--out',
      at('results'),
    ]);
    expect(said.status).toBe(0);
    expect(readdirSync(at('results')).sort()).toEqual(['findings.json', 'room-room.csv']);
    expect(readFileSync(at('results/findings.json'), 'utf8')).toBe(said.out);
    const [head = '', ...rows] = readFileSync(at('results/room-room.csv'), 'utf8')
      .trim()
      .split('\n');
    expect(rows).toHaveLength(8760);
    expect(rows[0]).toMatch(/^2019-01-01T00:00,/);
    expect(rows.at(-1)).toMatch(/^2019-12-31T23:00,/);
    const column = head.split(',').indexOf('heatingW');
    const sumKWh = rows.reduce((sum, row) => sum + Number(row.split(',')[column]) / 1000, 0);
    const { heatingKWh } = JSON.parse(said.out).rooms[0];
    // Nine digits are written, so that the sum of 8760 of them is good to one in ten million.
    expect(Math.abs(sumKWh / heatingKWh - 1)).toBeLessThan(1e-7);
  });

  test('a folder that cannot be written is the fault of the input, and nothing is left', async () => {
    writeFileSync(at('taken'), 'a file');
    const said = await run([...hourly, at('house.inglenook.json'), '--out', at('taken')]);
    expect(said.status).toBe(1);
    expect(said.err).toContain('expected a folder to write into');
    expect(readdirSync(folder).filter((name) => name.includes('.tmp'))).toEqual([]);
  });

  test('--check-accuracy shows what half the step and twice the nodes change, and it is small', async () => {
    const said = await run(['simulate', at('house.inglenook.json'), '--json', '--check-accuracy']);
    const { accuracy, quality, rooms } = JSON.parse(said.out);
    expect(accuracy.stepMinutes).toBe(7.5);
    expect(accuracy.nodes).toBeGreaterThan(1.8 * quality.nodes);
    const { heatingKWh } = accuracy.rooms[0];
    expect(heatingKWh.run).toBe(rooms[0].heatingKWh);
    expect(heatingKWh.difference).toBeCloseTo(heatingKWh.finer - heatingKWh.run, 9);
    // Our own promise for the default step: the year's heat is good to half a percent.
    expect(Math.abs(heatingKWh.difference / heatingKWh.run)).toBeLessThan(0.005);
  }, 60_000);

  test('--weather takes another table and says so; a year 5 K warmer needs less heat', async () => {
    writeFileSync(at('warm.csv'), sampleWeather(5));
    const command = [...hourly, at('house.inglenook.json'), '--json'];
    const cold = JSON.parse((await run(command)).out);
    const warm = JSON.parse((await run([...command, '--weather', at('warm.csv')])).out);
    expect(warm.assumptions.join()).toContain('as given on the command line');
    expect(warm.rooms[0].heatingKWh).toBeLessThan(cold.rooms[0].heatingKWh);
  });
});

describe('a plain nodal model', () => {
  // Closed form: one mass C joined by one conductance H to a boundary at 0 °C follows
  // θ(t) = θ0·exp(−t·H/C). Here C/H = 10 h, so after 10 h the share e⁻¹ of 20 K is left.
  const model = {
    format: 'inglenook-network',
    version: 1,
    name: 'One mass',
    time: { stepS: 60, stepCount: 600, stepsPerRecord: 60 },
    nodes: [
      { id: 'mass', capacityJPerK: 3.6e6, startC: 20 },
      { id: 'outside', boundaryC: 0 },
    ],
    links: [{ from: 'mass', to: 'outside', conductanceWPerK: 100 }],
  };

  test('cools along its exponential', async () => {
    writeFileSync(at('mass.json'), JSON.stringify(model));
    const said = await run(['simulate', at('mass.json'), '--json', '--out', at('mass')]);
    expect(said.status).toBe(0);
    const { nodes, flows } = JSON.parse(said.out);
    // Second order: the error is of the order (step/τ)² of the excess, 20·(1/600)²/12 K.
    expect(Math.abs(nodes[0].endC - 20 * Math.exp(-1))).toBeLessThan(1e-5);
    // Everything that the mass lost went through the link.
    expect(flows[0].totalKWh).toBeCloseTo((3.6e6 * 20 * (1 - Math.exp(-1))) / 3.6e6, 4);
    expect(readFileSync(at('mass/records.csv'), 'utf8').trim().split('\n')).toHaveLength(11);
  });

  test('is checked and shown as a network; options of projects are refused', async () => {
    writeFileSync(at('mass.json'), JSON.stringify(model));
    expect((await run(['check', at('mass.json')])).out).toContain('2 nodes, 1 link');
    const { nodes, links } = JSON.parse((await run(['network', at('mass.json'), '--json'])).out);
    expect(nodes[0].ownTimeConstantH).toBeCloseTo(10, 12);
    expect(links[0]).toMatchObject({ from: 'mass', to: 'outside', sizeWPerK: 100 });
    expect((await run(['simulate', at('mass.json'), '--step', '5'])).status).toBe(2);
  });

  test('a link to nowhere is a fault with its place', async () => {
    const links = [{ from: 'mass', to: 'nowhere', conductanceWPerK: 100 }];
    writeFileSync(at('lost.json'), JSON.stringify({ ...model, links }));
    const said = await run(['simulate', at('lost.json')]);
    expect(said.status).toBe(1);
    expect(said.err).toContain('links[0].to: found "nowhere"');
  });
});

describe('weather and network', () => {
  test('a weather table is shown with its months, and as data', async () => {
    const { out } = await run(['weather', at('weather/year.csv')]);
    expect(out).toContain('Nowhere Moor, 50.00° N, 15.00° E, 200 m, UTC+1');
    const document = JSON.parse((await run(['weather', at('weather/year.csv'), '--json'])).out);
    // The mean of the table's own column, from the text.
    const rows = sampleWeather()
      .split('\n')
      .filter((line) => /^\d/.test(line));
    const meanC = rows.reduce((sum, row) => sum + Number(row.split(',')[1]), 0) / rows.length;
    const column = document.columns.find((one: { column: string }) => one.column === 'dryBulbC');
    expect(column.mean).toBeCloseTo(meanC, 9);
    expect(document.climate.months).toHaveLength(12);
    expect(document.climate.meanDryBulbC).toBeCloseTo(meanC, 9);
  });

  test('a table that is no weather is a fault of the file', async () => {
    writeFileSync(at('list.csv'), 'name,price\nnail,3\n');
    const said = await run(['weather', at('list.csv')]);
    expect(said.status).toBe(1);
    expect(said.err).toContain('…/list.csv');
  });

  test('the network of a project names every node and link with its method', async () => {
    const said = await run(['network', at('house.inglenook.json'), '--json']);
    const { nodes, links } = JSON.parse(said.out);
    expect(new Set(nodes.map((node: { name: string }) => node.name)).size).toBe(nodes.length);
    for (const part of [...nodes, ...links]) expect(part.method).not.toBe('');
    // The air of 50 m³ holds between 1.0 and 1.3 kg/m³ times 1006 J/(kg·K).
    const air = nodes.find((node: { what: string }) => node.what === 'room air');
    expect(air.capacityJPerK).toBeGreaterThan(50 * 1006);
    expect(air.capacityJPerK).toBeLessThan(50 * 1006 * 1.3);
  });
});

test('a fault of the program says so in one line and keeps the trace for who asks', async () => {
  const broken = {
    write: () => {
      throw new RangeError('the screen is gone');
    },
  };
  let err = '';
  const streams = (env: object) => ({
    out: broken,
    err: {
      write: (text: string) => {
        err += text;
      },
    },
    env: { ...env },
  });
  expect(await runCli(['--version'], streams({}))).toBe(3);
  expect(err).toContain('Stopped: the screen is gone. This is a fault of the program');
  expect(err).toContain('INGLENOOK_TRACE=1');
  expect(err).not.toContain('cli.test.ts');
  err = '';
  await runCli(['--version'], streams({ INGLENOOK_TRACE: '1' }));
  expect(err).toContain('cli.test.ts');
});
