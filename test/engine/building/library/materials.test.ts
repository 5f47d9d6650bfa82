// The generic materials: complete, in physical ranges, and in line with the standard's values.
import { describe, expect, test } from 'vitest';
import { libraryMaterial, libraryMaterials } from '../../../../engine/building/library/index.ts';
import { materialSchema } from '../../../../engine/building/schema-fabric.ts';

describe('materials', () => {
  test('there are at least 80, and no two share an id or a name', () => {
    expect(libraryMaterials.length).toBeGreaterThanOrEqual(80);
    expect(new Set(libraryMaterials.map((m) => m.id)).size).toBe(libraryMaterials.length);
    expect(new Set(libraryMaterials.map((m) => m.name)).size).toBe(libraryMaterials.length);
  });
  test('a project takes every one of them as it is', () => {
    for (const material of libraryMaterials) {
      expect(materialSchema.parse(material)).toEqual(material);
    }
  });
  // Bounds of building materials: vacuum panels to copper; insulation mats to lead; lead to polyethylene.
  for (const m of libraryMaterials) {
    test(`${m.id} lies in the range of building materials and names its source`, () => {
      expect(m.conductivityWPerMK).toBeGreaterThanOrEqual(0.004);
      expect(m.conductivityWPerMK).toBeLessThanOrEqual(400);
      expect(m.densityKgPerM3).toBeGreaterThanOrEqual(10);
      expect(m.densityKgPerM3).toBeLessThanOrEqual(11400);
      expect(m.specificHeatJPerKgK).toBeGreaterThanOrEqual(120);
      expect(m.specificHeatJPerKgK).toBeLessThanOrEqual(2600);
      expect(m.vapourResistanceFactor).toBeGreaterThanOrEqual(1);
      // ρ·c of all dense solids and water-free ones stays below water's 4.2 MJ/(m³·K).
      expect(m.densityKgPerM3 * m.specificHeatJPerKgK).toBeLessThan(4.2e6);
      expect(m.source).toMatch(/ISO 10456|DIN 4108-4|common practice, no source|from memory/);
    });
  }
  // Source: ISO 10456:2007, Table 3 (from memory): conductivity, density, specific heat, dry μ.
  const rows: readonly (readonly [string, number, number, number, number])[] = [
    ['concrete-2400', 2.0, 2400, 1000, 130],
    ['concrete-reinforced-1', 2.3, 2300, 1000, 130],
    ['timber-500', 0.13, 500, 1600, 50],
    ['timber-700', 0.18, 700, 1600, 200],
    ['osb', 0.13, 650, 1700, 50],
    ['plasterboard-900', 0.25, 900, 1000, 10],
    ['plaster-cement-sand', 1.0, 1800, 1000, 10],
    ['steel', 50, 7800, 450, 1e6],
    ['glass', 1.0, 2500, 750, 1e6],
    ['bitumen-felt', 0.23, 1100, 1000, 50000],
    ['stone-granite', 2.8, 2600, 1000, 10000],
    ['linoleum', 0.17, 1200, 1400, 1000],
  ];
  for (const [id, conductivity, density, heat, mu] of rows) {
    test(`${id} has its values of ISO 10456 Table 3 (from memory)`, () => {
      expect(libraryMaterial(id)).toMatchObject({
        conductivityWPerMK: conductivity,
        densityKgPerM3: density,
        specificHeatJPerKgK: heat,
        vapourResistanceFactor: mu,
      });
    });
  }
  test('an id that is not there gives nothing', () => {
    expect(libraryMaterial('unobtainable')).toBeUndefined();
  });
});
