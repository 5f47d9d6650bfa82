// Cool-down and warm-up of whole projects against closed forms, with the cases of
// 09-heat-load-and-energy.json that say what a lumped room does.
import { describe, expect, test } from 'vitest';
import { emptyMemory } from '../../../engine/assembly/index.ts';
import * as physics from '../../../engine/physics/index.ts';
import { passedAfterH } from '../../../engine/study/cooldown.ts';
import { cooldownJob, decayH } from '../../../engine/study/cooldown-job.ts';
import { cooldown, finishStudy, usualLimits } from '../../../engine/study/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';
import {
  finished,
  lumpedProject,
  runsOf,
  steadyWeather,
  twoCapacityProject,
} from './plain-study.ts';

const file = '09-heat-load-and-energy.json';
const job = {
  kind: 'cooldown',
  offHour: 240,
  designOutdoorC: null,
  vacant: false,
  backAfterH: null,
  onAfterH: [],
} as const;

describe('a room of one capacity', () => {
  for (const one of referenceCases(file, /^cool-down-/)) {
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const project = lumpedProject({
        capacityJPerK: n('C'),
        conductanceWPerK: n('H'),
        outsideC: n('T_out'),
        gainW: n('gain'),
        setPointC: n('T0'),
      });
      const run = finished(
        cooldownJob(
          { ...job, ...runsOf(project), hours: 48 },
          steadyWeather(n('T_out')),
          emptyMemory(),
        ),
      );
      const [room] = run.rooms;
      expectCase(one, {
        tau_h: room.decayTimeConstantH ?? Number.NaN,
        T_end: room.endC,
        T: inputNumbers(one, 'times_h').map((h) => room.airC[4 * h]),
        time_h: passedAfterH(room.airC, n('target'), 0.25) ?? Number.NaN,
      });
      // Eigenvalue and simulated decay of one capacity are the same number.
      expect(run.timeConstantsH?.[0]).toBeCloseTo(room.decayTimeConstantH ?? Number.NaN, 1);
    });
  }
});

describe('warm again by an hour', () => {
  for (const one of referenceCases(file, /^reheat-/)) {
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      // Kept at T0 until the tenth day, then wanted at the target.
      const day = (id: string, value: number) => ({
        kind: 'hours',
        id,
        values: Array(24).fill(value),
      });
      const project = lumpedProject(
        {
          capacityJPerK: n('C'),
          conductanceWPerK: n('H'),
          outsideC: n('T_out'),
          gainW: n('gain'),
          setPointC: { schedule: 'wanted' },
        },
        {
          profiles: [day('low', n('T0')), day('high', n('target'))],
          schedules: [
            {
              id: 'wanted',
              profile: 'low',
              periods: [{ from: '01-11', to: '12-20', profile: 'high' }],
            },
          ],
        },
      );
      const hours = n('time_available_h');
      const run = finished(
        cooldownJob(
          { ...job, ...runsOf(project), hours: 24, backAfterH: hours, onAfterH: [0] },
          steadyWeather(n('T_out')),
          emptyMemory(),
        ),
      );
      expect(run.warmUps[0].met).toBe(true);
      expectCase(
        one,
        { power_needed: run.warmUps[0].totalW },
        {
          reheat_h: 'time at a given power, not a result of the study; held in the physics tests',
          power_steady: 'as above',
        },
      );
    });
  }
});

describe('a room of two capacities', () => {
  for (const one of referenceCases(file, /^two-node-cool-down-2$/)) {
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const project = twoCapacityProject({
        airJPerK: n('C_air'),
        massJPerK: n('C_mass'),
        betweenWPerK: n('G_am'),
        airToOutsideWPerK: n('G_ao'),
        massToOutsideWPerK: n('G_mo'),
        outsideC: n('T_out'),
        setPointC: n('T0'),
      });
      const weathers = steadyWeather(n('T_out'));
      const run = finished(
        cooldownJob({ ...job, ...runsOf(project, 1), hours: 30 }, weathers, emptyMemory()),
      );
      const at = inputNumbers(one, 'times_h').map((h) => Math.round(60 * h));
      const [slow, fast] = run.timeConstantsH ?? [];
      expectCase(
        one,
        {
          T_air: at.map((k) => run.rooms[0].airC[k]),
          tau1_h: slow,
          tau2_h: fast,
        },
        { T_mass: 'the mass is inside a wall here; the air shows both exponentials' },
      );
    });
  }

  test('two exponentials, from the steady state under the heater on (closed form of two stores)', () => {
    const spec = {
      airJPerK: 300_000,
      massJPerK: 2e7,
      betweenWPerK: 400,
      airToOutsideWPerK: 60,
      massToOutsideWPerK: 40,
      outsideC: 0,
      setPointC: 20,
    };
    const run = finished(
      cooldownJob(
        { ...job, ...runsOf(twoCapacityProject(spec)), hours: 72 },
        steadyWeather(0),
        emptyMemory(),
      ),
    );
    const stores: physics.TwoStores = {
      firstCapacity: spec.airJPerK,
      secondCapacity: spec.massJPerK,
      between: spec.betweenWPerK,
      firstToOutside: spec.airToOutsideWPerK,
      secondToOutside: spec.massToOutsideWPerK,
    };
    const end = physics.steadyStores(stores, 0, 0, 0);
    const start = [20, (20 * 400) / 440] as const; // the mass between the air and outdoors
    for (const h of [1, 2, 6, 12, 24, 48, 72]) {
      const [air] = physics.storesAfter(stores, start, end, h * 3600);
      expect(Math.abs(run.rooms[0].airC[4 * h] - air), `after ${h} h`).toBeLessThan(0.01);
    }
    const [slow] = physics.storeTimeConstants(stores);
    expect(run.rooms[0].decayTimeConstantH).toBeCloseTo(slow / 3600, 1);
  });
});

describe('the study', () => {
  const project = lumpedProject({
    capacityJPerK: 6e6,
    conductanceWPerK: 200,
    outsideC: 2,
    gainW: 0,
    setPointC: 20,
    maxW: 5000,
  });
  const { building } = runsOf(project);
  const weathers = steadyWeather(2);
  const weather = weathers.get('w');
  if (!weather) throw new Error('no weather');
  const study = (more: object = {}) =>
    finishStudy(
      cooldown(building, weather, {
        weather: 'w',
        stepMinutes: 15,
        mode: 'overnight',
        day: 20,
        offAtH: 22,
        hours: 48,
        backAfterH: 8,
        designOutdoorC: null,
        limits: usualLimits,
        ...more,
      }),
      weathers,
    );

  test('limits come in order, and power falls with the time there is', () => {
    const { rooms, warmUps, offAt, backAt } = study();
    expect([offAt, backAt]).toEqual(['2019-01-21T22:00', '2019-01-22T06:00']);
    const after = rooms[0].limits.map((one) => one.airAfterH ?? Number.NaN);
    const room = { capacityJPerK: 6e6, conductanceWPerK: 200, outsideC: 2, gainW: 0 };
    [16, 12, 5].forEach((limitC, l) => {
      expect(after[l]).toBeCloseTo(physics.roomHoursToH(room, 20, limitC, 0), 1);
    });
    const powers = warmUps.map((one) => one.totalW);
    for (let i = 0; i + 1 < powers.length; i++) expect(powers[i + 1]).toBeGreaterThan(powers[i]);
    // Closed form: off so long, then reheated in what is left.
    for (const one of warmUps) {
      const cold = physics.roomAfterC(room, 20, 0, 8 - one.hours);
      expect(one.totalW).toBeCloseTo(physics.reheatW(room, cold, 20, one.hours), -1);
      expect(one.shortRooms).toEqual(one.totalW > 5000 ? ['room'] : []);
    }
  });
  test('a limit that is never reached is said to be', () => {
    const { rooms, notes } = study({ limits: [{ name: 'ice', limitC: 0 }] });
    expect(rooms[0].limits[0]).toMatchObject({ airAfterH: null, everReached: false });
    expect(notes.join(' ')).toContain(
      'Never down to 0 °C in this weather, however long: Room (ends at 2.0 °C).',
    );
  });
  test('heating off on 1 January starts from the turn of the year', () => {
    const { rooms } = study({ day: 0, offAtH: 6 });
    expect(rooms[0].startC).toBeCloseTo(20, 6);
  });
  test('off near the end of the year looks no further than the year', () => {
    const { rooms } = study({ day: 364, offAtH: 12, hours: 48, backAfterH: 8 });
    expect(rooms[0].airC).toHaveLength(12 * 4 + 1);
  });
});

test('a decay that never gets there has no time constant', () => {
  expect(decayH(Float64Array.of(20, 19.9, 19.8), 20, 0, 3600)).toBeNull();
});
