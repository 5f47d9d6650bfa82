// The generic usage profiles: whole days, sound shares, and loads as rooms have them.
import { describe, expect, test } from 'vitest';
import { libraryUsages } from '../../../../engine/building/library/index.ts';
import { activityMet } from '../../../../engine/physics/index.ts';

describe('usage profiles', () => {
  test('there are at least 12, and no two share an id or a name', () => {
    expect(libraryUsages.length).toBeGreaterThanOrEqual(12);
    expect(new Set(libraryUsages.map((u) => u.id)).size).toBe(libraryUsages.length);
    expect(new Set(libraryUsages.map((u) => u.name)).size).toBe(libraryUsages.length);
  });
  for (const use of libraryUsages) {
    test(`${use.id} has 24 shares from 0 to 1 for every kind of day`, () => {
      for (const day of [use.weekday, use.weekend]) {
        for (const shares of [day.occupancy, day.lighting, day.equipment]) {
          expect(shares.length).toBe(24);
          expect(Math.min(...shares)).toBeGreaterThanOrEqual(0);
          expect(Math.max(...shares)).toBeLessThanOrEqual(1);
        }
      }
      expect(Math.max(...use.weekday.occupancy)).toBeGreaterThan(0);
    });
    test(`${use.id} has loads and set-points of such rooms (common practice, no source)`, () => {
      expect(use.floorPerPersonM2).toBeGreaterThanOrEqual(1);
      expect(use.lightingWPerM2).toBeLessThanOrEqual(15);
      expect(use.equipmentWPerM2).toBeLessThanOrEqual(150);
      expect(activityMet[use.activity]).toBeGreaterThan(0);
      expect(use.heatingSetBackC).toBeLessThanOrEqual(use.heatingSetPointC);
      expect(use.heatingSetPointC).toBeLessThan(use.coolingSetPointC);
      expect(use.coolingSetPointC).toBeLessThanOrEqual(use.coolingSetBackC);
      // Outdoor air at full use: 0.2 to 8 l/s for each square metre.
      const air = use.airPerPersonM3PerS / use.floorPerPersonM2 + use.airPerAreaM3PerSM2;
      expect(air).toBeGreaterThanOrEqual(0.0002);
      expect(air).toBeLessThanOrEqual(0.008);
      expect(use.source).toContain('EN 16798-1');
    });
  }
  test('an office of 10 m² a person gets 1.4 l/(s·m²) in category II (EN 16798-1, Table B, from memory)', () => {
    const office = libraryUsages.find((u) => u.id === 'office-single');
    const air = office && office.airPerPersonM3PerS / 10 + office.airPerAreaM3PerSM2;
    expect(air).toBeCloseTo(0.0014, 12);
  });
});
