import { describe, expect, test } from 'vitest';
import {
  bridgeAlong,
  bridgeHold,
  bridgeLinear,
  completeRadiation,
  gapsIn,
  hourlySun,
  type RadiationColumns,
} from '../../../weather/index.ts';
import { inventedYear } from '../invented-year.ts';

const none = Number.NaN;

describe('gaps', () => {
  test('are found once each, also around the end of the year', () => {
    expect(gapsIn(Float64Array.of(none, 1, none, none, 2, none))).toEqual([
      { from: 2, count: 2 },
      { from: 5, count: 2 },
    ]);
    expect(gapsIn(Float64Array.of(1, 2))).toEqual([]);
    expect(gapsIn(Float64Array.of(none, none))).toEqual([{ from: 0, count: 2 }]);
  });
  test('are bridged by a straight line, or by the value before', () => {
    const line = Float64Array.of(none, 10, none, none, 40, none);
    for (const gap of gapsIn(line)) bridgeLinear(line, gap);
    expect(Array.from(line)).toEqual([20, 10, 20, 30, 40, 30]);
    const held = Float64Array.of(none, 10, none, 40);
    for (const gap of gapsIn(held)) bridgeHold(held, gap);
    expect(Array.from(held)).toEqual([40, 10, 10, 40]);
  });
  test('in radiation follow the course of the sun and leave the night dark', () => {
    const course = Float64Array.of(0, 100, 300, 500, 300, 0, 0, 0);
    const values = Float64Array.of(0, none, none, 400, 240, none, none, 0);
    for (const gap of gapsIn(values)) bridgeAlong(values, course, gap);
    // Ratio 0.8 from the one side that has sun: 80, 240; the evening is night.
    expect(Array.from(values)).toEqual([0, 80, 240, 400, 240, 0, 0, 0]);
  });
});

describe('radiation computed from what is there', () => {
  const year = inventedYear();
  const sun = hourlySun(year, { kind: 'mean' });
  const close = (columns: RadiationColumns) => {
    const { ghi, dni, dhi } = columns;
    if (!ghi || !dni || !dhi) throw new Error('not completed');
    return Array.from(ghi, (value, h) => value - dni[h] * sun.meanUp[h] - dhi[h]);
  };
  test('closes: global is beam on the flat plus diffuse, hour by hour', () => {
    const fromBeam: RadiationColumns = { dni: year.dniWPerM2.values, dhi: year.dhiWPerM2.values };
    completeRadiation(fromBeam, sun);
    expect(Math.max(...close(fromBeam).map(Math.abs))).toBeLessThan(1e-9);
    const split: RadiationColumns = { ghi: year.ghiWPerM2.values };
    completeRadiation(split, sun);
    expect(Math.max(...close(split).map(Math.abs))).toBeLessThan(1e-9);
  });
  test('has no beam under 3 degrees of sun and none above the extraterrestrial', () => {
    const split: RadiationColumns = { ghi: year.ghiWPerM2.values.map((v) => v * 3) };
    completeRadiation(split, sun);
    split.dni?.forEach((beam, h) => {
      if (sun.meanUp[h] < Math.sin((3 * Math.PI) / 180)) expect(beam).toBe(0);
      expect(beam).toBeLessThanOrEqual(sun.normalWPerM2[h]);
    });
  });
  test('is not made up from a lone diffuse column', () => {
    expect(completeRadiation({ dhi: year.dhiWPerM2.values }, sun)).toBeNull();
  });
});
