import { describe, expect, test } from 'vitest';
import {
  cavityConvectiveWPerM2K,
  cavityGas,
  cavityNusselt,
  cavityRayleigh,
} from '../../../engine/physics/cavity-convection.ts';
import { type FillGas, gasProperties } from '../../../engine/physics/fill-gas.ts';
import { gapConvectiveWPerM2K } from '../../../engine/physics/glazing-gap.ts';
import {
  angularShare,
  directTransmittance,
  simpleGlazing,
} from '../../../engine/physics/simple-window.ts';
import { secondaryHeatFactor } from '../../../engine/physics/solar-factor.ts';

describe('gases by ISO 15099 against the table of EN 673', () => {
  // Two standards, two sets of data: they agree within 2.5 % at 10 °C; xenon's viscosity within 5 %.
  test.each<FillGas>(['air', 'argon', 'krypton', 'xenon'])('%s', (gas) => {
    const table = gasProperties(gas, 10);
    const line = cavityGas([{ gas, share: 1 }]);
    const kelvin = 283.15;
    const density = (101_325 * line.molarKgPerMol) / (8.314462618 * kelvin);
    const within = (found: number, expected: number, share: number) =>
      expect(Math.abs(found / expected - 1)).toBeLessThan(share);
    within(line.conductivity0 + line.conductivity1 * kelvin, table.conductivityWPerMK, 0.025);
    within(line.viscosity0 + line.viscosity1 * kelvin, table.viscosityPaS, 0.05);
    within(line.specificHeat0 + line.specificHeat1 * kelvin, table.specificHeatJPerKgK, 0.025);
    within(density, table.densityKgPerM3, 0.025);
  });

  test('a gas without data is refused by name', () => {
    expect(() => cavityGas([{ gas: 'sulphur-hexafluoride', share: 1 }])).toThrow(
      'sulphur-hexafluoride',
    );
  });
});

describe('Nusselt number of a gap', () => {
  test('the branches of the upright gap meet where they change over, within 1 %, as published', () => {
    for (const ra of [1e4, 5e4]) {
      const below = cavityNusselt(ra * 0.99999, 2, 0.012, 90);
      const above = cavityNusselt(ra * 1.00001, 2, 0.012, 90);
      expect(Math.abs(above / below - 1)).toBeLessThan(0.01);
    }
  });

  // Hollands et al. 1976: a flat gap heated from below stays still under Ra 1708.
  test('a flat gap starts to convect at Rayleigh 1708', () => {
    expect(cavityNusselt(1700, 1, 0.01, 0)).toBe(1);
    expect(cavityNusselt(1800, 1, 0.01, 0)).toBeGreaterThan(1.05);
    expect(cavityNusselt(1e6, 1, 0.01, 180)).toBeCloseTo(1, 12); // heated from above it never does
  });

  // Hollands et al. 1976 by hand, Ra 1e5 flat: 1 + 1.44·(1 − 0.01708) + (17.1527^(1/3) − 1).
  test('a flat gap at Rayleigh 1e5 has the value of the formula worked by hand', () => {
    expect(cavityNusselt(1e5, 1, 0.01, 0)).toBeCloseTo(3.99432, 4);
  });

  test('tilt has no step at 60°, at 90° and beyond', () => {
    for (const tilt of [90]) {
      const apart =
        cavityNusselt(2e4, 1, 0.016, tilt - 0.001) - cavityNusselt(2e4, 1, 0.016, tilt + 0.001);
      expect(Math.abs(apart)).toBeLessThan(1e-3);
    }
    const at60 = [59.999, 60.001].map((t) => cavityNusselt(2e4, 1, 0.016, t));
    expect(Math.abs(at60[0] / at60[1] - 1)).toBeLessThan(0.1); // two correlations, as published
  });
});

// Two independent standards for the same gap: 16 mm, upright, 15 K about 10 °C.
test.each<FillGas>(['air', 'argon'])('upright gap of %s: within 20 % of EN 673', (gas) => {
  const iso = cavityConvectiveWPerM2K(cavityGas([{ gas, share: 1 }]), 0.016, 1.2, 90, 2.5, 17.5);
  const en = gapConvectiveWPerM2K(gasProperties(gas, 10), 0.016, 15, 283, 90);
  expect(Math.abs(iso / en - 1)).toBeLessThan(0.2);
});

test('thin air at altitude convects less, and a gap with no difference only conducts', () => {
  const air = cavityGas([{ gas: 'air', share: 1 }]);
  expect(
    cavityRayleigh(air, 0.016, 15, 283, 83_000) / cavityRayleigh(air, 0.016, 15, 283, 101_325),
  ).toBeCloseTo((83_000 / 101_325) ** 2, 12);
  expect(cavityConvectiveWPerM2K(air, 0.012, 1, 90, 10, 10)).toBeCloseTo(
    (2.873e-3 + 7.76e-5 * 283.15) / 0.012,
    12,
  );
});

test('a skylight convects more when the room is the warmer side', () => {
  const air = cavityGas([{ gas: 'air', share: 1 }]);
  const winter = cavityConvectiveWPerM2K(air, 0.016, 1, 10, 0, 20);
  const summer = cavityConvectiveWPerM2K(air, 0.016, 1, 10, 40, 20);
  expect(winter).toBeGreaterThan(1.5 * summer);
});

describe('a window known by U and g', () => {
  test.each([
    [5.8, 0.85],
    [2.8, 0.76],
    [1.1, 0.6],
    [0.6, 0.5],
    [1.2, 0.3],
  ])('U %f and g %f come back under standard films', (u, g) => {
    const layer = simpleGlazing(u, g);
    const total = 1 / 25 + layer.resistanceM2KPerW + 1 / 7.7;
    expect(Math.abs(1 / total - u)).toBeLessThan(0.06); // single glass keeps a least resistance
    const half = layer.resistanceM2KPerW / 2; // as EN 410 with the pane half-way through the layer
    const inward = secondaryHeatFactor(
      [layer.absorptance],
      [],
      1 / (1 / 25 + half),
      1 / (1 / 7.7 + half),
    );
    expect(layer.transmittance + inward).toBeCloseTo(g, 9);
    expect(layer.transmittance + layer.absorptance).toBeLessThan(1);
  });

  // Clear double glazing of fabric-cases.md: U about 2.8, solar heat gain 0.769, transmittance 0.703.
  test('direct transmittance of clear double glazing is found within 0.02', () => {
    expect(Math.abs(directTransmittance(2.8, 0.769) - 0.703)).toBeLessThan(0.02);
  });

  test('the angular curve falls from 1 to 0 without rising', () => {
    for (const panes of [1, 2, 3]) {
      expect(angularShare(0, panes)).toBe(1);
      expect(angularShare(90, panes)).toBeCloseTo(0, 12);
      for (let k = 0; k < 90; k++)
        expect(angularShare(k + 1, panes)).toBeLessThanOrEqual(angularShare(k, panes) + 1e-9);
    }
  });

  // fabric-cases.md section 4, with the heat of the panes by EN 410 (6.3 W/(m²·K) pane to pane).
  test('the curve of two panes is within 0.06 of the clear double glazing of the fabric cases', () => {
    const g = (t: number, outer: number, inner: number) =>
      t + secondaryHeatFactor([outer, inner], [6.3]);
    const normal = g(0.7, 0.096, 0.075);
    const rows = [
      [40, 0.678, 0.105, 0.081],
      [50, 0.653, 0.11, 0.083],
      [60, 0.597, 0.117, 0.083],
      [70, 0.464, 0.126, 0.076],
      [80, 0.215, 0.133, 0.056],
    ] as const;
    for (const [deg, t, outer, inner] of rows)
      expect(Math.abs(angularShare(deg, 2) - g(t, outer, inner) / normal)).toBeLessThan(0.06);
  });

  test('light from the hemisphere is shared out wholly', () => {
    const { diffuse } = simpleGlazing(1.1, 0.6).angles;
    expect(diffuse.transmittance + diffuse.reflectance + diffuse.absorptance[0]).toBeCloseTo(1, 12);
    const ratio = diffuse.transmittance / simpleGlazing(1.1, 0.6).transmittance;
    expect(Math.abs(ratio - 0.611 / 0.7)).toBeLessThan(0.05); // as the fabric cases' double glazing
  });
});
