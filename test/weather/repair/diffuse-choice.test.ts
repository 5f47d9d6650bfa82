// Splits of a lone global radiation: closure, the formula at single hours, and tables that need none.
import { describe, expect, test } from 'vitest';
import {
  bolandRidleyLauretDiffuseShare,
  type DiffuseSplit,
  hourlySun,
  reindlDiffuseShare,
  type WeatherYear,
  withDiffuseSplit,
} from '../../../weather/index.ts';
import { inventedYear } from '../invented-year.ts';

const read = inventedYear();
const derived = { origin: 'derived' } as const;
const lone: WeatherYear = {
  ...read,
  dniWPerM2: { ...read.dniWPerM2, ...derived },
  dhiWPerM2: { ...read.dhiWPerM2, ...derived },
};
const sun = hourlySun(lone, lone.ghiWPerM2.stands);
const others: DiffuseSplit[] = ['orgill-hollands', 'reindl', 'boland', 'boland-ridley-lauret'];

describe.each(others)('after %s', (split) => {
  const year = withDiffuseSplit(lone, split);

  test('global is beam on the flat and diffuse in every hour', () => {
    for (let h = 0; h < 8760; h++) {
      const flat = year.dniWPerM2.values[h] * sun.meanUp[h] + year.dhiWPerM2.values[h];
      expect(flat).toBeCloseTo(year.ghiWPerM2.values[h], 6);
      expect(year.dniWPerM2.values[h]).toBeGreaterThanOrEqual(0);
    }
  });

  test('its sum of diffuse light is its own, and said in a note', () => {
    const sum = (one: WeatherYear) => one.dhiWPerM2.values.reduce((a, b) => a + b, 0);
    expect(sum(year)).not.toBe(sum(lone));
    expect(year.notes.at(-1)?.text).toContain('as the project asks');
  });
});

test('an hour of clearness 0.5 holds the diffuse share of the formula', () => {
  // Reindl et al. 1990, one variable: 1.45 − 1.67·kt for 0.3 < kt < 0.78.
  const year = withDiffuseSplit(lone, 'reindl');
  let seen = 0;
  for (let h = 0; h < 8760; h++) {
    const kt = lone.ghiWPerM2.values[h] / sun.extraterrestrialWPerM2[h];
    if (!(sun.sunlitShare[h] === 1 && kt > 0.35 && kt < 0.75 && sun.meanUp[h] > 0.1)) continue;
    const share = year.dhiWPerM2.values[h] / year.ghiWPerM2.values[h];
    expect(share).toBeCloseTo(reindlDiffuseShare(kt), 6);
    seen++;
  }
  expect(seen).toBeGreaterThan(500);
});

test('five predictors: near noon of an even day the share is the formula’s at solar time 12', () => {
  const year = withDiffuseSplit(lone, 'boland-ridley-lauret');
  // 12 UTC+1 at 9° E is 11:36 mean solar time, half an hour later in the middle of the hour.
  const h = 171 * 24 + 12;
  const kt = (k: number) => lone.ghiWPerM2.values[k] / sun.extraterrestrialWPerM2[k];
  let [global, outside] = [0, 0];
  for (let k = 171 * 24; k < 172 * 24; k++) {
    global += lone.ghiWPerM2.values[k];
    outside += sun.extraterrestrialWPerM2[k];
  }
  const altitudeDeg = (Math.asin(sun.meanUp[h]) * 180) / Math.PI;
  const beside = (kt(h - 1) + kt(h + 1)) / 2;
  const share = year.dhiWPerM2.values[h] / year.ghiWPerM2.values[h];
  // Equation of time −2 min on 21 June: apparent solar time 12.05 h.
  const want = bolandRidleyLauretDiffuseShare(kt(h), 12.05, altitudeDeg, global / outside, beside);
  expect(Math.abs(share - want)).toBeLessThan(0.002);
});

test('a table with beam and diffuse of its own stays as it is, with a note', () => {
  const year = withDiffuseSplit(read, 'boland');
  expect(year.dniWPerM2).toBe(read.dniWPerM2);
  expect(year.notes.at(-1)?.text).toContain('is not needed');
  expect(withDiffuseSplit(lone, 'erbs')).toBe(lone);
});
