// The generic constructions: made of known materials, with the U-value their name promises.
import { describe, expect, test } from 'vitest';
import {
  libraryConstructions,
  libraryMaterial,
  libraryUValueWPerM2K,
  projectConstruction,
} from '../../../../engine/building/library/index.ts';
import { constructionSchema, materialSchema } from '../../../../engine/building/schema-fabric.ts';

describe('constructions', () => {
  test('there are at least 30 of every kind together, and no two share an id or a name', () => {
    expect(libraryConstructions.length).toBeGreaterThanOrEqual(30);
    expect(new Set(libraryConstructions.map((c) => c.id)).size).toBe(libraryConstructions.length);
    expect(new Set(libraryConstructions.map((c) => c.name)).size).toBe(libraryConstructions.length);
    expect(new Set(libraryConstructions.map((c) => c.kind)).size).toBe(7);
  });
  for (const entry of libraryConstructions) {
    test(`${entry.id} has the U-value of its build-up in the trade (ISO 6946; common practice, no source)`, () => {
      const [low, high] = entry.typicalUWPerM2K;
      expect(low).toBeLessThan(high);
      const uValue = libraryUValueWPerM2K(entry);
      expect(uValue).toBeGreaterThanOrEqual(low);
      expect(uValue).toBeLessThanOrEqual(high);
    });
    test(`${entry.id} goes into a project with all its materials`, () => {
      for (const layer of entry.layers) {
        if ('materialId' in layer) expect(libraryMaterial(layer.materialId)).toBeDefined();
        if ('thicknessM' in layer) expect(layer.thicknessM).toBeLessThanOrEqual(0.6);
      }
      const { construction, materials } = projectConstruction(entry);
      expect(constructionSchema.parse(construction)).toEqual(construction);
      for (const material of materials) expect(materialSchema.parse(material)).toEqual(material);
      const known = new Set(materials.map((m) => m.id));
      for (const layer of construction.layers) {
        if ('material' in layer) expect(known.has(layer.material)).toBe(true);
      }
    });
  }
  test('a plastered brick wall by hand: 0.13 + 0.015/0.8 + 0.24/0.81 + 0.02/1.0 + 0.04', () => {
    const wall = libraryConstructions.find((c) => c.id === 'wall-brick-solid-240');
    const total = 0.13 + 0.015 / 0.8 + 0.24 / 0.81 + 0.02 / 1.0 + 0.04;
    expect(wall && libraryUValueWPerM2K(wall)).toBeCloseTo(1 / total, 12);
  });
  test('an empty cavity enters a project as 0.18 m²·K/W (ISO 6946, Table 8)', () => {
    const wall = libraryConstructions.find((c) => c.id === 'wall-cavity-empty');
    const layer = wall && projectConstruction(wall).construction.layers[1];
    expect(layer).toMatchObject({ name: 'air layer 50 mm' });
    expect(layer && 'resistanceM2KPerW' in layer && layer.resistanceM2KPerW).toBeCloseTo(0.18, 2);
  });
});
