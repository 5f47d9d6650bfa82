import { describe, expect, test } from 'vitest';
import {
  type Batch,
  finishStudy,
  type Json,
  parseSweep,
  runCount,
  runSweep,
  type Sweep,
  type SweepResult,
  type SweepRow,
  sweepPoints,
} from '../../../engine/study/index.ts';
import { faultText, readWeather } from '../../../weather/index.ts';
import { sampleProject, sampleWeather } from '../../app/sample.ts';
import { building } from '../assembly/plain-room.ts';

const project = {
  ...sampleProject,
  options: [
    {
      id: 'airtight',
      name: 'Airtight',
      changes: [{ path: 'rooms[room].infiltration.airChangesPerH', value: 0.1 }],
    },
  ],
};
const document = project as unknown as Json;
const base = building(document);
const read = readWeather(sampleWeather(), { file: 'year.csv' });
if (!read.ok) throw new Error('the sample weather is wrong');
const weathers = new Map([['w', read.value]]);
const insulation = 'constructions[brick-wall].layers[0].resistanceM2KPerW';

const file = (parameters: Json, more: object = {}): string =>
  JSON.stringify({
    format: 'inglenook-sweep',
    version: 1,
    name: 'Test',
    parameters,
    sample: { kind: 'grid' },
    stepMinutes: 60,
    ...more,
  });

function sweepOf(parameters: Json, more: object = {}): Sweep {
  const parsed = parseSweep(file(parameters, more), 's.json', base, document);
  if (!parsed.ok) throw new Error(parsed.faults.map(faultText).join('\n'));
  return parsed.value;
}

function faultsOf(parameters: Json, more: object = {}): string {
  const parsed = parseSweep(file(parameters, more), 's.json', base, document);
  return parsed.ok ? '' : parsed.faults.map(faultText).join('\n');
}

const options = { file: 'p.json', weatherOf: () => 'w', batch: 3 };
const walls = { id: 'walls', paths: [insulation], from: 1, to: 5, steps: 3 };
const packages = { id: 'package', options: ['base', 'airtight'] };

describe('a grid', () => {
  const sweep = sweepOf([walls, packages], { front: ['heatingKWh', 'hoursAboveBand'] });
  const seen: SweepRow[] = [];
  const result = finishStudy(
    runSweep(base, document, sweep, { ...options, onRows: (rows) => seen.push(...rows) }),
    weathers,
  );
  test('holds every combination in order, ranges and options alike', () => {
    expect(runCount(sweep)).toBe(6);
    expect(result.rows.map((row) => Object.values(row.values))).toEqual([
      [1, 'base'],
      [1, 'airtight'],
      [3, 'base'],
      [3, 'airtight'],
      [5, 'base'],
      [5, 'airtight'],
    ]);
    expect(seen).toEqual(result.rows);
  });
  test('shows what insulation and tightness do', () => {
    const heat = result.rows.map((row) => row.figures.heatingKWh ?? Number.NaN);
    expect(heat[2]).toBeLessThan(heat[0]);
    expect(heat[4]).toBeLessThan(heat[2]);
    expect(heat[1]).toBeLessThan(heat[0]);
    expect(result.front).toContain(5); // least heating of all
  });
  test('goes on where it was stopped and ends with the same bytes', () => {
    const known = new Map(result.rows.slice(0, 4).map((row) => [row.index, row]));
    const fresh: SweepRow[] = [];
    const again = finishStudy(
      runSweep(base, document, sweep, { ...options, known, onRows: (rows) => fresh.push(...rows) }),
      weathers,
    );
    expect(fresh.map((row) => row.index)).toEqual([4, 5]);
    expect(JSON.stringify(again)).toBe(JSON.stringify(result));
  });
  test('can be stopped between batches', () => {
    const study = runSweep(base, document, sweep, options);
    const first = study.next([]);
    expect((first.value as Batch).jobs).toHaveLength(3);
    const end = study.return(undefined as unknown as SweepResult);
    expect(end.done).toBe(true);
  });
});

describe('samples', () => {
  test('fill ranges and lists', () => {
    const sweep = sweepOf([walls, packages], { sample: { kind: 'low-discrepancy', runs: 16 } });
    const points = sweepPoints(sweep);
    const values = points.map((point) => Number(point.values.walls));
    expect(Math.min(...values)).toBeGreaterThanOrEqual(1);
    expect(Math.max(...values)).toBeLessThanOrEqual(5);
    // Even in each half, by the sample's own property.
    expect(values.filter((value) => value < 3)).toHaveLength(8);
    expect(points.filter((point) => point.values.package === 'base')).toHaveLength(8);
  });
  test('tell which input matters: a set-point more than the absorptance of a wall', () => {
    const sweep = sweepOf(
      [
        {
          id: 'paint',
          paths: ['constructions[brick-wall].outsideSolarAbsorptance'],
          from: 0.55,
          to: 0.65,
        },
        { id: 'set-point', paths: ['rooms[room].heating.setPointC'], from: 18, to: 22 },
      ],
      { sample: { kind: 'elementary-effects', trajectories: 2 }, figures: ['heatingKWh'] },
    );
    // The construction has no absorptance of its own in the file: the field is added.
    const result = finishStudy(runSweep(base, document, sweep, { ...options, batch: 6 }), weathers);
    const amount = (id: string) =>
      result.influences.find((one) => one.parameter === id)?.effects?.meanAmount ?? Number.NaN;
    expect(amount('set-point')).toBeGreaterThan(10 * amount('paint'));
  });
});

describe('what a sweep may not be', () => {
  test('outside the physical range', () => {
    const text = faultsOf([{ ...walls, from: -1 }]);
    expect(text).toContain('parameters[0].from');
    expect(text).toContain('-1, with which the project is at fault');
    expect(text).toContain('Keep the sweep inside what the project allows.');
  });
  test('about a part that is not there, an option that is not there, an id twice', () => {
    const text = faultsOf([
      { ...walls, paths: ['rooms[attic].volumeM3'] },
      { id: 'package', options: ['lost'] },
      { id: 'package', options: ['base'] },
    ]);
    expect(text).toContain('parameters[0].paths[0]');
    expect(text).toContain('no option "lost"');
    expect(text).toContain('parameters[2].id');
  });
  test('without end, or in more inputs than its sample has', () => {
    const many = Array.from({ length: 12 }, (_, i) => ({ ...walls, id: `p-${i}` }));
    expect(faultsOf(many)).toContain('531441 runs');
    expect(faultsOf(many, { sample: { kind: 'variance-shares', runs: 8 } })).toContain(
      'at most 10',
    );
  });
  test('no sweep at all', () => {
    const parsed = parseSweep(
      '{ "format": "inglenook-sweep", "extra": 1',
      's.json',
      base,
      document,
    );
    expect(parsed.ok).toBe(false);
    expect(faultsOf([{ id: 'x', paths: [insulation] }])).not.toBe('');
  });
  test('a run that cannot be made is a row with its reason, and the others stand', () => {
    const sweep = sweepOf([
      { id: 'band', paths: ['rooms[room].comfort.bandLowC'], values: [19] },
      { id: 'room', paths: ['rooms[room].comfort'], values: [{ bandLowC: 18, bandHighC: 25 }] },
    ]);
    const clash: Sweep = { ...sweep, parameters: [...sweep.parameters].reverse() };
    const result = finishStudy(runSweep(base, document, clash, options), weathers);
    expect(result.rows[0].fault).toBeUndefined();
    const broken: Sweep = {
      ...clash,
      parameters: [{ id: 'gone', paths: ['rooms[attic].volumeM3'], values: [1] }],
    };
    const failed = finishStudy(runSweep(base, document, broken, options), weathers);
    expect(failed.rows[0].fault).toContain('rooms[attic]');
    expect(failed.notes.join(' ')).toContain('1 of 1 runs could not be made');
  });
});
