// Carbon dioxide and vapour of a room against 08-airflow-moisture.json; people's gains.
import { describe, expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '08-airflow-moisture.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

describe('well mixed air', () => {
  each(/^co2-step-/, (one, n) => {
    const end = physics.steadyGasPpm(n('c_out'), n('source'), n('n'), n('volume'));
    const tau = 1 / n('n');
    expectCase(one, {
      c_end: end,
      time_constant_h: tau,
      c: inputNumbers(one, 'times_h').map((t) => physics.decayed(n('c0'), end, t, tau)),
      time_to: physics.timeToReach(n('c0'), end, n('target'), tau),
    });
  });
  each(/^moisture-step-/, (one, n) => {
    const end = physics.steadyVapourKgPerM3(n('v_out'), n('source_g'), n('n'), n('volume')); // in g
    expectCase(one, {
      v_end: end,
      v: inputNumbers(one, 'times_h').map((t) => physics.decayed(n('v0'), end, t, 1 / n('n'))),
    });
  });
  each(/^moisture-buffer-/, (one, n) => {
    const stores: physics.TwoStores = {
      firstCapacity: n('volume'),
      secondCapacity: n('buffer'),
      between: n('exchange'),
      firstToOutside: n('n') * n('volume'),
      secondToOutside: 0,
    };
    const end = physics.steadyStores(stores, n('v_out'), n('source_g'), 0);
    const start = [n('v0'), n('v0')] as const;
    expectCase(one, {
      v: inputNumbers(one, 'times_h').map((t) => physics.storesAfter(stores, start, end, t)[0]),
      v_end: end[0],
    });
  });
  test('a value that cannot be reached takes for ever, one already there takes no time', () => {
    expect(physics.timeToReach(20, 5, 4, 10)).toBe(Number.POSITIVE_INFINITY);
    expect(physics.timeToReach(20, 5, 5, 10)).toBe(Number.POSITIVE_INFINITY);
    expect(physics.timeToReach(20, 5, 25, 10)).toBe(Number.POSITIVE_INFINITY);
    expect(physics.timeToReach(20, 5, 20, 10)).toBe(0);
    expect(physics.timeToReach(20, 20, 20, 10)).toBe(0);
  });
  test('two stores keep their sum where nothing leaves (conservation)', () => {
    const closed: physics.TwoStores = {
      firstCapacity: 3,
      secondCapacity: 7,
      between: 2,
      firstToOutside: 0,
      secondToOutside: 0,
    };
    const mean = (3 * 10 + 7 * 20) / 10; // both end at the mixed value
    const [a, b] = physics.storesAfter(closed, [10, 20], [mean, mean], 1.3);
    expect(3 * a + 7 * b).toBeCloseTo(170, 10);
  });
  test('saturated air at 20 °C holds 17.3 g/m³ (handbook value, from memory)', () => {
    expect(physics.saturatedVapourKgPerM3(20) * 1000).toBeCloseTo(17.3, 1);
  });
  test('a buffer volume takes up A·MBV for a swing of one per cent relative humidity', () => {
    const volume = physics.bufferVolumeM3(30, 0.001, 20);
    expect(volume * 0.01 * physics.saturatedVapourKgPerM3(20)).toBeCloseTo(0.03, 12);
  });
});

describe('people', () => {
  test('all that a person gives is the metabolic rate, at any air', () => {
    for (const met of Object.values(physics.activityMet)) {
      for (const airC of [16, 22, 27, 33, 40]) {
        const gain = physics.personGain(met, airC, 1300);
        expect(gain.sensibleW + gain.latentW).toBeCloseTo(1.8 * 58.15 * met, 9);
        expect(Math.min(gain.sensibleW, gain.latentW)).toBeGreaterThanOrEqual(0);
      }
    }
  });
  test('seated at light work at 24 °C gives about 75 W dry and 55 W vapour (ASHRAE table, from memory)', () => {
    // The handbook's person gives 130 W, ours 125.6 W; its dry share is for a mean of men and women.
    const gain = physics.personGain(physics.activityMet['seated-work'], 24, 1400);
    expect(Math.abs(gain.sensibleW - 75)).toBeLessThan(12);
    expect(Math.abs(gain.latentW - 55)).toBeLessThan(16);
  });
  test('a warmer room shifts heat from dry to vapour', () => {
    const dry = [20, 24, 28, 32, 36].map((t) => physics.personGain(1.2, t, 1400).sensibleW);
    expect(dry[0]).toBe(dry[1]);
    for (let i = 1; i < 4; i++) expect(dry[i + 1]).toBeLessThan(dry[i] ?? 0);
    expect(dry[4]).toBe(0);
  });
  test('an adult at seated work breathes out 18 to 20 l/h of carbon dioxide (EN 16798-2, from memory)', () => {
    const litresPerH = physics.personCo2M3PerS(physics.activityMet['seated-work']) * 3.6e6;
    expect(litresPerH).toBeGreaterThan(18);
    expect(litresPerH).toBeLessThan(20);
  });
});
