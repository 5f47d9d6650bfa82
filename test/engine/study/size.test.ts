import { describe, expect, test } from 'vitest';
import { emptyMemory } from '../../../engine/assembly/index.ts';
import { parseProjectDocument, simulate } from '../../../engine/index.ts';
import * as physics from '../../../engine/physics/index.ts';
import {
  curveShares,
  finishStudy,
  leastPower,
  size,
  sizeDefaults,
  withCooling,
} from '../../../engine/study/index.ts';
import { sizesJob } from '../../../engine/study/sizes-job.ts';
import { spellJob } from '../../../engine/study/spell-job.ts';
import { readWeather } from '../../../weather/index.ts';
import { sampleProject, sampleWeather } from '../../app/sample.ts';
import { building } from '../assembly/plain-room.ts';
import { finished, lumpedProject, runsOf, steadyWeather } from './plain-study.ts';

const read = readWeather(sampleWeather(), { file: 'year.csv' });
if (!read.ok) throw new Error('the sample weather is wrong');
const weather = read.value;
const weathers = new Map([['w', weather]]);

/** A set-back at night, so that the size shows in the morning. */
const [plainRoom] = sampleProject.rooms;
const project = {
  ...sampleProject,
  profiles: [
    {
      kind: 'hours',
      id: 'day',
      values: Array.from({ length: 24 }, (_, h) => (h < 6 || h >= 22 ? 16 : 20)),
    },
  ],
  schedules: [{ id: 'set-point', profile: 'day' }],
  rooms: [{ ...plainRoom, heating: { setPointC: { schedule: 'set-point' }, maxW: 1500 } }],
};
const house = building(project);
const run = { building: house, weather: 'w', stepMinutes: 60, refine: 1 };

describe('the year against size', () => {
  const sizesW = curveShares.map((share) => [share * 2000]);
  const result = finished(
    sizesJob({ kind: 'sizes', ...run, side: 'heating', sizesW }, weathers, emptyMemory()),
  );
  test('is what whole years with those sizes give', () => {
    for (const i of [1, 4, 7]) {
      const [maxW] = sizesW[i];
      const sized = parseProjectDocument(
        {
          ...project,
          rooms: [{ ...project.rooms[0], heating: { ...project.rooms[0].heating, maxW } }],
        },
        'p.json',
      );
      if (!sized.ok) throw new Error('the sample is wrong');
      const whole = finished(simulate(sized.value, weather, { stepMinutes: 60 }));
      const { building: all, rooms } = whole.findings;
      const outcome = result.sizes[i];
      expect(outcome.energyKWh).toBeCloseTo(all.heatingKWh, 1);
      expect(outcome.coincidentPeakW).toBeCloseTo(all.peakHeatingW, 1);
      expect(outcome.rooms[0].extremeOperativeC).toBeCloseTo(rooms[0].operativeTemperatureC.min, 2);
      const missed = whole.rooms[0].airC.filter(
        (c, h) => (h % 24 < 6 || h % 24 >= 22 ? 16 : 20) - c > 0.2,
      );
      expect(outcome.unmetHours).toBe(missed.length);
      // The findings count hours at full power only.
      expect(rooms[0].hoursHeatingShort).toBeLessThanOrEqual(outcome.unmetHours);
    }
  });
  test('is monotone: a larger heater never leaves more unmet, colder rooms or less heat', () => {
    for (let i = 0; i + 1 < result.sizes.length; i++) {
      const [small, large] = [result.sizes[i], result.sizes[i + 1]];
      expect(large.unmetHours).toBeLessThanOrEqual(small.unmetHours);
      expect(large.rooms[0].unmetDegreeHours).toBeLessThanOrEqual(
        small.rooms[0].unmetDegreeHours + 1e-6,
      );
      expect(large.rooms[0].extremeOperativeC).toBeGreaterThanOrEqual(
        small.rooms[0].extremeOperativeC - 1e-3,
      );
      expect(large.energyKWh).toBeGreaterThanOrEqual(small.energyKWh - 0.1);
    }
    expect(result.sizes[0].unmetHours).toBeGreaterThan(0);
    expect(result.sizes.at(-1)?.stepsRun).toBe(0);
  });
  test('runs only what a size can change', () => {
    const whole = result.stepsInYear * result.sizes.length;
    const done = result.sizes.reduce((sum, one) => sum + one.stepsRun, 0);
    expect(done).toBeLessThan(0.8 * whole);
  });
});

describe('the design spell', () => {
  // One capacity under steady cold: how long the reheat takes is a closed form.
  const capacityJPerK = 6e6;
  const lumped = { capacityJPerK, conductanceWPerK: 100, outsideC: -10, gainW: 0 };
  const wanted = {
    profiles: [
      {
        kind: 'hours',
        id: 'day',
        values: Array.from({ length: 24 }, (_, h) => (h < 6 || h >= 22 ? 15 : 20)),
      },
    ],
    schedules: [{ id: 'wanted', profile: 'day' }],
  };
  const one = lumpedProject({ ...lumped, setPointC: { schedule: 'wanted' } }, wanted);
  test('warms up as the exponential says', () => {
    const sizesW = [[4500], [6000], [9000]];
    const result = finished(
      spellJob(
        { kind: 'spell', ...runsOf(one, 15), designOutdoorC: -10, sizesW },
        steadyWeather(-10),
      ),
    );
    // Night of 8 h from 20 °C; the set-back of 15 °C is reached and held where the fall goes that far.
    const cold = Math.max(15, physics.roomAfterC(lumped, 20, 0, 8));
    for (const [i, [powerW]] of sizesW.entries()) {
      // Counted until less than 0.2 K is missing.
      const hours = physics.roomHoursToH(lumped, cold, 19.8, powerW);
      expect(result.sizes[i].rooms[0].warmUpH).toBeGreaterThan(hours - 0.26);
      expect(result.sizes[i].rooms[0].warmUpH).toBeLessThan(hours + 0.26);
    }
  });
  test('says never where the power does not carry the set-point', () => {
    const result = finished(
      spellJob(
        { kind: 'spell', ...runsOf(one, 60), designOutdoorC: -10, sizesW: [[2900]] },
        steadyWeather(-10),
      ),
    );
    expect(result.sizes[0].rooms[0]).toMatchObject({ warmUpH: 16 }); // every hour of the day's set-point
  });
  test('the least power lies between those tried', () => {
    const points = [
      { powerW: 1000, hours: null },
      { powerW: 2000, hours: 4 },
      { powerW: 3000, hours: 2 },
    ];
    expect(leastPower(points, 3)).toBe(2500);
    expect(leastPower(points, 4)).toBe(2000);
    expect(leastPower(points, 1)).toBeNull();
  });
});

describe('the study', () => {
  const options = {
    ...sizeDefaults,
    weather: 'w',
    stepMinutes: 60,
    designOutdoorC: -8,
    coolToC: 25,
  };
  const sizing = finishStudy(size(house, weather, options), weathers);
  test('chooses steps of what is asked for, above steady load and warm-up, and says why', () => {
    const heating = sizing.heating;
    if (!heating) throw new Error('no heating');
    const [room] = heating.rooms;
    expect(room.chosenW % options.roomStepW).toBe(0);
    expect(room.chosenW).toBeGreaterThanOrEqual(1.1 * Math.max(room.designW, room.dynamicW ?? 0));
    expect(room.chosenW).toBeLessThan(
      1.1 * Math.max(room.designW, room.dynamicW ?? 0) + options.roomStepW,
    );
    expect(room.presentW).toBe(1500);
    expect(room.why).toContain('Steady load');
    expect(heating.plantW % options.plantStepW).toBe(0);
    expect(heating.plantW).toBeGreaterThanOrEqual(heating.coincidentPeakW);
    expect(heating.curve).toHaveLength(12);
    expect(heating.curve.find((point) => point.share === 1)?.totalW).toBe(room.chosenW);
    expect(heating.present?.totalW).toBe(1500);
    expect(heating.coincidenceShare).toBeLessThanOrEqual(1 + 1e-9);
  });
  test('the peak hour adds up: what comes in by all causes, and the heater, is what masses take up', () => {
    const { peak } = sizing.heating ?? {};
    if (!peak) throw new Error('no peak');
    const { storage, ...causes } = peak.causesW;
    const sum = Object.values(causes).reduce((a, b) => a + b, 0);
    expect(sum + peak.totalW - storage).toBeCloseTo(0, 3);
    expect(peak.totalW).toBeGreaterThan(0);
  });
  test('sizes a chiller for rooms that have none when told to what temperature', () => {
    const cooling = sizing.cooling;
    if (!cooling) throw new Error('no cooling');
    expect(cooling.rooms[0].chosenW).toBeGreaterThan(0);
    const unmet = cooling.curve.map((point) => point.outcome.unmetHours);
    for (let i = 0; i + 1 < unmet.length; i++) expect(unmet[i + 1]).toBeLessThanOrEqual(unmet[i]);
    const hottest = cooling.curve.map((point) => point.outcome.rooms[0].extremeOperativeC);
    for (let i = 0; i + 1 < hottest.length; i++)
      expect(hottest[i + 1]).toBeLessThanOrEqual(hottest[i] + 1e-3);
    expect(withCooling(house, 25).rooms[0].cooling?.setPointC).toBe(25);
  });
  test('is the same in any number of pieces', () => {
    const cut = finishStudy(
      size(house, weather, { ...options, coolToC: null, pieces: 3 }),
      weathers,
    );
    const { heating } = cut;
    heating?.curve.forEach((point, i) => {
      const other = sizing.heating?.curve[i];
      expect(point.outcome.unmetHours).toBe(other?.outcome.unmetHours);
      expect(point.outcome.energyKWh).toBeCloseTo(other?.outcome.energyKWh ?? 0, 1);
    });
  });
  test('without a heater there is nothing to size, and it says so', () => {
    const { heating: _, ...bare } = project.rooms[0];
    const none = building({ ...project, rooms: [bare] });
    const empty = finishStudy(size(none, weather, { ...options, coolToC: null }), weathers);
    expect(empty.heating).toBeNull();
    expect(empty.cooling).toBeNull();
    expect(empty.notes.join(' ')).toContain('No room has a heater');
  });
});
