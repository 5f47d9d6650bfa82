// The generic glazings: optics that add up, and the U and g their name promises.
import { describe, expect, test } from 'vitest';
import { libraryGases, libraryGlazings } from '../../../../engine/building/library/index.ts';
import { glazingSchema, type PaneGlazing } from '../../../../engine/building/schema-fabric.ts';
import {
  beamShares,
  gasProperties,
  glassPane,
  glazingTransmittance,
  type PaneOptics,
  solarFactor,
} from '../../../../engine/physics/index.ts';

/** U by EN 673 and g by EN 410, films 25 and 7.7 and 23 and 8. */
function standardValues(glazing: PaneGlazing): { u: number; g: number } {
  const unit = glazingTransmittance({
    panesM2KPerW: glazing.panes.map((p) => p.thicknessM / p.conductivityWPerMK),
    gaps: glazing.gaps.map((gap, i) => ({
      thicknessM: gap.thicknessM,
      emissivity1: glazing.panes[i]?.backEmissivity ?? Number.NaN,
      emissivity2: glazing.panes[i + 1]?.frontEmissivity ?? Number.NaN,
      filling: [{ gas: gap.gas, share: 1 }],
    })),
    tiltDeg: 90,
    outsideWPerM2K: 25,
    // EN 673: h_i = 3.6 + 4.1·ε/0.837 for the inner face
    insideWPerM2K: 3.6 + (4.1 * (glazing.panes.at(-1)?.backEmissivity ?? Number.NaN)) / 0.837,
  });
  const optics = glazing.panes.map(
    (p): PaneOptics =>
      p.frontSolarReflectance === undefined || p.backSolarReflectance === undefined
        ? glassPane(p.solarTransmittance, p.refractiveIndex)
        : {
            kind: 'coated',
            transmittance: p.solarTransmittance,
            frontReflectance: p.frontSolarReflectance,
            backReflectance: p.backSolarReflectance,
          },
  );
  const shares = beamShares(optics, 1);
  const gaps = unit.convectiveWPerM2K.map((h, i) => h + (unit.radiativeWPerM2K[i] ?? Number.NaN));
  return {
    u: unit.uValueWPerM2K,
    g: solarFactor(shares.transmittance, shares.absorptance, gaps),
  };
}

describe('glazings', () => {
  test('there are at least 15 with panes and some by U and g, and no two share an id or a name', () => {
    const kinds = libraryGlazings.map((entry) => entry.glazing.kind);
    expect(kinds.filter((kind) => kind === 'panes').length).toBeGreaterThanOrEqual(15);
    expect(kinds.filter((kind) => kind === 'simple').length).toBeGreaterThanOrEqual(3);
    expect(new Set(libraryGlazings.map((e) => e.glazing.id)).size).toBe(libraryGlazings.length);
    expect(new Set(libraryGlazings.map((e) => e.glazing.name)).size).toBe(libraryGlazings.length);
  });
  for (const { glazing, typicalUWPerM2K, typicalG } of libraryGlazings) {
    test(`${glazing.id} is taken by a project as it is`, () => {
      expect(glazingSchema.parse(glazing)).toEqual(glazing);
    });
    if (glazing.kind !== 'panes') continue;
    test(`${glazing.id} has one gap fewer than panes, and panes that make no light`, () => {
      expect(glazing.gaps.length).toBe(glazing.panes.length - 1);
      for (const p of glazing.panes) {
        const most = Math.max(p.frontSolarReflectance ?? 0.08, p.backSolarReflectance ?? 0.08);
        expect(p.solarTransmittance + most).toBeLessThan(1);
      }
    });
    test(`${glazing.id} has the U and g of such units (EN 673, EN 410; common practice, no source)`, () => {
      const { u, g } = standardValues(glazing);
      expect(u).toBeGreaterThanOrEqual(typicalUWPerM2K[0]);
      expect(u).toBeLessThanOrEqual(typicalUWPerM2K[1]);
      expect(g).toBeGreaterThanOrEqual(typicalG[0]);
      expect(g).toBeLessThanOrEqual(typicalG[1]);
    });
  }
  test('every gas of the library has properties in the physics', () => {
    for (const gas of libraryGases) {
      expect(gasProperties(gas.id, 10).conductivityWPerMK).toBeGreaterThan(0.004);
      expect(gasProperties(gas.id, 10).conductivityWPerMK).toBeLessThan(0.03);
    }
  });
});
