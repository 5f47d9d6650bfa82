import { describe, expect, test } from 'vitest';
import {
  blendedFilmWPerM2K,
  fixedFilm,
  layeredFaceWPerM2K,
  stirredFaceWPerM2K,
  thirdPowerFilm,
  verticalFaceWPerM2K,
} from '../../../engine/physics/inside-film.ts';
import {
  forcedFilmWPerM2K,
  isWindward,
  joinedFilmWPerM2K,
  roughnessFactor,
  roughPlateFilmWPerM2K,
  standardOutsideFilmWPerM2K,
} from '../../../engine/physics/outside-film.ts';
import { terrains, windAtHeightMPerS } from '../../../engine/physics/wind-at-height.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';

describe('Alamdari & Hammond correlations', () => {
  for (const one of referenceCases('10-glazing-optics-and-films.json', /^convection-/)) {
    test(caseName(one), () => {
      const film = (d: number) => {
        if (one.id === 'convection-vertical')
          return verticalFaceWPerM2K(d, inputNumber(one, 'height'));
        const width = inputNumber(one, 'D_h');
        return one.id === 'convection-stable'
          ? layeredFaceWPerM2K(d, width)
          : stirredFaceWPerM2K(d, width);
      };
      expectCase(one, { h_c: inputNumbers(one, 'dT').map(film) });
    });
  }

  test('a face picks the branch by tilt and by the sign of the difference', () => {
    expect(blendedFilmWPerM2K(0, 5, 3, 4)).toBe(stirredFaceWPerM2K(5, 4)); // warm floor
    expect(blendedFilmWPerM2K(180, -5, 3, 4)).toBe(stirredFaceWPerM2K(5, 4)); // cold ceiling
    expect(blendedFilmWPerM2K(0, -5, 3, 4)).toBe(layeredFaceWPerM2K(5, 4)); // cold floor
    expect(blendedFilmWPerM2K(180, 5, 3, 4)).toBe(layeredFaceWPerM2K(5, 4)); // warm ceiling
    expect(blendedFilmWPerM2K(90, -5, 3, 4)).toBe(verticalFaceWPerM2K(5, 3));
  });
});

describe('one-third power films', () => {
  // ASHRAE Handbook of Fundamentals: 1.31 upright, 1.51 and 0.76 flat (fabric-cases.md, section 6).
  test('upright and flat faces have the constants of the Handbook', () => {
    expect(thirdPowerFilm(90)).toEqual({ warmerFace: 1.31, coolerFace: 1.31, exponent: 1 / 3 });
    expect(thirdPowerFilm(0)).toEqual({ warmerFace: 1.51, coolerFace: 0.76, exponent: 1 / 3 });
    expect(thirdPowerFilm(180)).toEqual({ warmerFace: 0.76, coolerFace: 1.51, exponent: 1 / 3 });
  });

  // Walton 1983: 9.482/(7.238 − |cos β|) and 1.810/(1.382 + |cos β|); at 60° the cosine is one half.
  test('a tilted face lies between, by its cosine', () => {
    const film = thirdPowerFilm(60);
    expect(film.warmerFace).toBeCloseTo(9.482 / 6.738, 12);
    expect(film.coolerFace).toBeCloseTo(1.81 / 1.882, 12);
    const under = thirdPowerFilm(120);
    expect(under.warmerFace).toBeCloseTo(1.81 / 1.882, 12);
    expect(under.coolerFace).toBeCloseTo(9.482 / 6.738, 12);
  });

  test('the tilted forms meet upright and flat within 0.7 %', () => {
    for (const [tilted, limit] of [
      [89.9, 90],
      [1.1, 0],
      [178.9, 180],
    ] as const) {
      const a = thirdPowerFilm(tilted);
      const b = thirdPowerFilm(limit);
      expect(Math.abs(a.warmerFace / b.warmerFace - 1)).toBeLessThan(0.007);
      expect(Math.abs(a.coolerFace / b.coolerFace - 1)).toBeLessThan(0.007);
    }
  });
});

// ISO 6946:2017 Annex C: 5.0 upwards, 2.5 sideways, 0.7 downwards.
test('fixed films follow the heat flow as ISO 6946 has it', () => {
  expect(fixedFilm(0)).toEqual({ warmerFace: 5, coolerFace: 0.7, exponent: 0 });
  expect(fixedFilm(60)).toEqual({ warmerFace: 2.5, coolerFace: 2.5, exponent: 0 });
  expect(fixedFilm(135)).toEqual({ warmerFace: 0.7, coolerFace: 5, exponent: 0 });
});

describe('outside films', () => {
  test('the wind blows at a face within 100° of its normal, and at every flat roof', () => {
    expect(isWindward(350, 90, 90)).toBe(true); // 100° apart over north
    expect(isWindward(349, 90, 90)).toBe(false);
    expect(isWindward(10, 270, 90)).toBe(true);
    expect(isWindward(-170, 180, 90)).toBe(true);
    expect(isWindward(0, 180, 90)).toBe(false);
    expect(isWindward(0, 180, 0)).toBe(true);
    expect(isWindward(0, 180, 9.9)).toBe(true);
    expect(isWindward(0, 180, 45)).toBe(false);
    expect(isWindward(76, 180, 45)).toBe(true); // 104° in plan is 99.85° from the slope's normal
    expect(isWindward(75, 180, 45)).toBe(false); // 105° in plan is 100.55°
  });

  // Yazdanian & Klems 1994: 3.26·V^0.89 and 3.55·V^0.617; at 1 m/s the constants themselves.
  test('the wind term has the published constants and powers', () => {
    expect(forcedFilmWPerM2K(1, true)).toBe(3.26);
    expect(forcedFilmWPerM2K(1, false)).toBe(3.55);
    expect(forcedFilmWPerM2K(4, true) / forcedFilmWPerM2K(2, true)).toBeCloseTo(2 ** 0.89, 12);
    expect(forcedFilmWPerM2K(4, false) / forcedFilmWPerM2K(2, false)).toBeCloseTo(2 ** 0.617, 12);
    expect(forcedFilmWPerM2K(0, true)).toBe(0);
  });

  test('natural and wind terms join by root of squares, roughness on the surplus', () => {
    expect(joinedFilmWPerM2K(3, 4, 1)).toBe(5);
    expect(joinedFilmWPerM2K(3, 4, roughnessFactor['medium rough'])).toBeCloseTo(3 + 1.52 * 2, 12);
    expect(joinedFilmWPerM2K(3, 0, 2.17)).toBe(3); // no wind: roughness has nothing to act on
  });

  test('fixed laws: 4 + 4·V, and a plate in the wind by McAdams', () => {
    expect(standardOutsideFilmWPerM2K(4)).toBe(20); // ISO 6946: Rse = 1/(20 + 5.1) ≈ 0.04
    expect(roughPlateFilmWPerM2K(0)).toBeCloseTo(6.19, 2);
    // 5 mph is 2.2352 m/s: 1.09 + 0.23·7.333 = 2.7767 Btu/(h·ft²·°F)
    expect(roughPlateFilmWPerM2K(2.2352)).toBeCloseTo(15.766, 2);
    const jump = roughPlateFilmWPerM2K(4.88) / roughPlateFilmWPerM2K(4.8799);
    expect(Math.abs(jump - 1)).toBeLessThan(0.04);
  });
});

describe('wind at the height of a face', () => {
  for (const one of referenceCases('06-air-and-sky.json', /^wind-profile-/)) {
    test(caseName(one), () => {
      const number = (key: string) => inputNumber(one, key);
      const local = { exponent: number('a'), layerM: number('delta') };
      const station = { exponent: number('a_met'), layerM: number('delta_met') };
      const v = windAtHeightMPerS(
        number('v_met'),
        number('height'),
        local,
        station,
        number('h_met'),
      );
      expectCase(one, { v });
      const known = Object.values(terrains);
      expect(known).toContainEqual(local); // the case's terrain is one of our table
      expect(known).toContainEqual(station);
    });
  }
});
