import { describe, expect, test } from 'vitest';
import type { Building, RoomFindings, RoomHours } from '../../../engine/index.ts';
import { projectSchema } from '../../../engine/index.ts';
import { finishStudy, overheating, overheatingDefaults } from '../../../engine/study/index.ts';
import { adaptiveLimitC, hotNightHours, judgeRoom } from '../../../engine/study/judge.ts';
import { trials } from '../../../engine/study/trials.ts';
import { driversOf } from '../../../engine/study/worst-days.ts';
import { readWeather } from '../../../weather/index.ts';
import { sampleProject, sampleWeather } from '../../app/sample.ts';
import { building } from '../assembly/plain-room.ts';

const [room] = sampleProject.rooms;
const [south, ...others] = room.surfaces;
/** Much glass to the south under a strong sun, little air: at risk. */
const project = {
  ...sampleProject,
  rooms: [
    {
      ...room,
      infiltration: { airChangesPerH: 0.1 },
      gains: [{ id: 'people', kind: 'people', powerW: 150 }],
      surfaces: [
        {
          ...south,
          openings: [
            {
              id: 'window',
              glazing: 'pane',
              areaM2: 10,
              rectangle: { leftM: 0, bottomM: 0.2, widthM: 5, heightM: 2 },
            },
          ],
        },
        ...others,
      ],
    },
  ],
};
const house = building(project);
const yearOf = (warmerK: number) => {
  // The sample's sun doubled: the last column.
  const text = sampleWeather(warmerK).replace(/,([\d.]+)$/gm, (_, w) => `,${2 * Number(w)}`);
  const read = readWeather(text, { file: 'year.csv' });
  if (!read.ok) throw new Error('the sample weather is wrong');
  return read.value;
};

describe('a room at risk', () => {
  const weathers = new Map([
    ['warm', yearOf(6)],
    ['cold', yearOf(-15)],
  ]);
  const main = weathers.get('warm');
  if (!main) throw new Error('no weather');
  const result = finishStudy(
    overheating(house, main, {
      ...overheatingDefaults,
      weathers: ['warm', 'cold'],
      stepMinutes: 30,
    }),
    weathers,
  );
  const [found] = result.rooms;
  test('fails, with how far, and the limit of each criterion', () => {
    expect(found.passed).toBe(false);
    expect(found.verdicts[0].criteria.map((one) => one.limit)).toEqual([3, 6, 4]); // CIBSE TM52:2013
    for (const one of found.verdicts[0].criteria) {
      expect(one.by).toBeCloseTo(one.found - one.limit, 12);
      expect(one.uncertainty).not.toBeNull();
    }
  });
  test('is driven by the sun', () => {
    expect(found.drivers?.main).toBe('sun');
    expect(found.worst?.operativeC).toHaveLength(168);
    const above = found.worst?.operativeC.reduce(
      (sum, c, h) =>
        sum + Math.max(0, c - (found.worst?.limitC[h] ?? c)) * (found.worst?.occupied[h] ?? 0),
      0,
    );
    expect(above).toBeCloseTo(found.worst?.degreeHours ?? Number.NaN, 6);
  });
  test('trials come from the best, each better than nothing done, and what cures is named', () => {
    const singles = result.trials.filter((one) => one.parts.length === 1);
    expect(singles.length).toBeGreaterThanOrEqual(6);
    for (let i = 0; i + 1 < singles.length; i++)
      expect(singles[i].roomsFailing.length).toBeLessThanOrEqual(
        singles[i + 1].roomsFailing.length,
      );
    const blinds = singles.find((one) => one.id === 'outside-blinds');
    expect(blinds?.severity).toBeLessThan(result.base.severity);
    if (result.cure)
      expect(result.trials.find((one) => one.id === result.cure)?.roomsFailing).toEqual([]);
    else expect(result.cautions.join(' ')).toContain('None of the changes tried');
  });
  test('passes in a cold year, in the same study', () => {
    expect(result.otherWeathers).toEqual([
      { weather: 'cold', place: 'Nowhere Moor', roomsFailing: [] },
    ]);
  });
  test('is said to fail by the methods that were not asked for', () => {
    expect(found.wouldFail).toContain('din-4108-2');
    expect(result.notes.join(' ')).toContain('DIN 4108-2:2013');
  });
});

describe('criteria', () => {
  const hours = 8760;
  const level = (c: number) => new Float64Array(hours).fill(c);
  const roomHours = (operativeC: Float64Array, occupied = new Uint8Array(hours).fill(1)) =>
    ({ operativeC, occupied }) as unknown as RoomHours;
  const findings = { occupiedHours: hours, hoursAboveBand: 0 } as unknown as RoomFindings;
  const judged = (operativeC: Float64Array, region: 'A' | 'B' | 'C', dwelling = true) =>
    judgeRoom(findings, roomHours(operativeC), 'II', level(15), {
      methods: ['din-4108-2'],
      region,
      dwelling,
      bandShare: 0.03,
    })[0].criteria[0];
  test('of DIN 4108-2 sum what is above 25, 26 or 27 °C against 1200 or 500 K·h', () => {
    // 100 hours at 30 °C, the rest at 20 °C: 100 · (30 − base).
    const values = level(20).fill(30, 1000, 1100);
    expect(judged(values, 'A')).toMatchObject({ found: 500, limit: 1200, met: true });
    expect(judged(values, 'B')).toMatchObject({ found: 400, by: -800 });
    expect(judged(values, 'C', false)).toMatchObject({ found: 300, limit: 500 });
    expect(judged(level(26.2), 'B')).toMatchObject({ met: false });
  });
  test('of EN 16798-1 follow the running mean: 0.33 · 15 + 18.8 + 3 in category II', () => {
    const limit = adaptiveLimitC(level(15), 'II');
    expect(limit[0]).toBeCloseTo(26.75, 9);
    const over = level(20).fill(27, 0, 300); // 300 of 8760 h: 3.42 %
    const [verdict] = judgeRoom(findings, roomHours(over), 'II', level(15), {
      methods: ['en-16798-1'],
      region: 'B',
      dwelling: true,
      bandShare: 0.03,
    });
    expect(verdict.passed).toBe(false);
    expect(verdict.criteria[0].found).toBeCloseTo(100 * (300 / 8760), 9);
  });
  test('of a night count from 22:00 to 07:00', () => {
    expect(hotNightHours(level(26.5))).toBe(365 * 9);
    expect(hotNightHours(level(26))).toBe(0);
  });
});

describe('drivers', () => {
  test('sum the days on which the limit is passed, and no others', () => {
    const hours = 48;
    const flow = (w: number) => new Float64Array(hours).fill(w);
    const zero = flow(0);
    const flowsW = {
      solar: flow(100),
      gains: flow(300),
      opaque: flow(-50),
      glazing: flow(-50),
      ground: zero,
      infiltration: flow(-100),
      ventilation: flow(-200),
      rooms: zero,
      heating: zero,
      cooling: zero,
      storage: zero,
    };
    const operativeC = new Float64Array(hours).fill(20);
    operativeC[30] = 30;
    const room = {
      operativeC,
      occupied: new Uint8Array(hours).fill(1),
      flowsW,
    } as unknown as RoomHours;
    const limit = new Float64Array(hours).fill(26);
    const drivers = driversOf(room, limit);
    expect(drivers).toMatchObject({ days: 1, main: 'gains' });
    expect(drivers?.kWh.sun).toBeCloseTo(2.4, 9);
    expect(drivers?.kWh.air).toBeCloseTo(-7.2, 9);
    expect(driversOf({ ...room, operativeC: new Float64Array(hours) }, limit)).toBeNull();
  });
});

describe('trials', () => {
  test('leave rooms that pass alone', () => {
    for (const trial of trials) expect(trial.apply(house, new Set())).toBeNull();
  });
  test('give buildings that the project file would take', () => {
    for (const trial of trials) {
      const changed = trial.apply(house, new Set(['room']));
      if (changed === null) continue;
      const { fromLibrary: _, ...rest } = changed satisfies Building;
      expect(projectSchema.safeParse(rest).error?.issues ?? [], trial.id).toEqual([]);
    }
  });
});
