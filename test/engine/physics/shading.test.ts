import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { diffuseShading } from '../../../engine/physics/diffuse-shading.ts';
import {
  horizonAltitudeDeg,
  isAboveHorizon,
  orderedHorizon,
} from '../../../engine/physics/horizon.ts';
import {
  type Fin,
  type Overhang,
  profileAngleDeg,
  type ShadedWindow,
  sunFromWindow,
  sunlitFraction,
} from '../../../engine/physics/window-shading.ts';
import { caseName, expectCase, inputNumber, referenceCases } from '../../reference/cases.ts';

const long = (depthM: number, gapM = 0): Overhang => ({
  depthM,
  gapM,
  leftM: Infinity,
  rightM: Infinity,
});
const tall = (depthM: number, gapM = 0): Fin => ({
  depthM,
  gapM,
  aboveM: Infinity,
  belowM: Infinity,
});

describe('long overhang and tall fin', () => {
  for (const one of referenceCases('05a-solar-position.json', /^shade-/)) {
    test(caseName(one), () => {
      const number = (key: string) => inputNumber(one, key);
      const side = number('solar_azimuth_minus_wall');
      const sun = sunFromWindow(90, 180, 180 + side, number('solar_altitude'));
      const fin = tall(number('fin_depth'), number('fin_gap'));
      const window: ShadedWindow = {
        widthM: number('window_width'),
        heightM: number('window_height'),
        revealM: 0,
        overhang: long(number('overhang_depth'), number('overhang_gap')),
        ...(side >= 0 ? { rightFin: fin } : { leftFin: fin }), // the fin stands on the side of the sun
      };
      expectCase(one, {
        profile_angle: profileAngleDeg(sun),
        incidence: (Math.acos(sun.out) * 180) / Math.PI,
        sunlit_fraction: sunlitFraction(window, sun),
      });
    });
  }
});

describe('plates of limited length', () => {
  const bare: ShadedWindow = { widthM: 2, heightM: 1, revealM: 0 };

  // By hand: sun at 45° altitude and 45° to the right of the normal. tan h/cos γ = √2, tan γ = 1.
  // A plate 1 m deep and as wide as the window throws its outer edge 1 m to the left and √2 m down:
  // what is lit is the triangle at the right with legs 1/√2 (side at the sill) and 1.
  test('a short overhang lets the sun in past its end', () => {
    const sun = sunFromWindow(90, 180, 225, 45);
    const overhang = { depthM: 1, gapM: 0, leftM: 0, rightM: 0 };
    const lit = (0.5 * 1 * Math.SQRT1_2) / 2;
    expect(sunlitFraction({ ...bare, overhang }, sun)).toBeCloseTo(lit, 12);
    const longer = { ...overhang, rightM: 5 };
    expect(sunlitFraction({ ...bare, overhang: longer }, sun)).toBeCloseTo(0, 12);
  });

  test('a reveal leaves the window less its shift, by either side and for light from below', () => {
    for (const [azimuth, altitude] of [
      [225, 20],
      [140, 20],
      [200, -15],
    ] as const) {
      const sun = sunFromWindow(90, 180, azimuth, altitude);
      const [x, y] = [0.2 * Math.abs(sun.right / sun.out), 0.2 * Math.abs(sun.up / sun.out)];
      expect(sunlitFraction({ ...bare, revealM: 0.2 }, sun)).toBeCloseTo(
        ((2 - x) * (1 - y)) / 2,
        12,
      );
    }
  });

  test('an overhang before a reveal shades as one plate of both depths', () => {
    const sun = sunFromWindow(90, 180, 190, 35);
    const joined = sunlitFraction({ ...bare, overhang: long(0.3) }, sun);
    const side = 0.2 * Math.abs(sun.right / sun.out); // the reveal's side still throws its own shadow
    const both = sunlitFraction({ ...bare, revealM: 0.2, overhang: long(0.1) }, sun);
    expect(both).toBeCloseTo((joined * (2 - side)) / 2, 9);
  });

  test('mirroring sun and plates changes nothing; more shading never adds sun', () => {
    const metres = fc.double({ min: 0, max: 2, noNaN: true });
    const degrees = fc.double({ min: -85, max: 85, noNaN: true });
    fc.assert(
      fc.property(
        metres,
        metres,
        metres,
        metres,
        degrees,
        degrees,
        (a, b, c, d, azimuth, altitude) => {
          const sun = sunFromWindow(90, 180, 180 + azimuth, altitude);
          const mirror = { ...sun, right: -sun.right };
          const fin: Fin = { depthM: a, gapM: b, aboveM: c, belowM: 0 };
          const overhang: Overhang = { depthM: d, gapM: 0.1, leftM: a, rightM: b };
          const turned: Overhang = { ...overhang, leftM: b, rightM: a };
          const one = sunlitFraction({ ...bare, overhang, leftFin: fin }, sun);
          expect(sunlitFraction({ ...bare, overhang: turned, rightFin: fin }, mirror)).toBeCloseTo(
            one,
            9,
          );
          expect(one).toBeLessThanOrEqual(sunlitFraction({ ...bare, overhang }, sun) + 1e-9);
          expect(one).toBeGreaterThanOrEqual(0);
        },
      ),
    );
  });

  test('plates seen edge-on throw no shadow', () => {
    const all = { ...bare, revealM: 0.1, overhang: long(1), leftFin: tall(1), rightFin: tall(1) };
    expect(sunlitFraction(all, { right: 0, up: 0, out: 1 })).toBe(1);
    const level = sunFromWindow(90, 180, 180, 45); // square to the wall: the fins are edge-on
    expect(sunlitFraction({ ...bare, leftFin: tall(1), rightFin: tall(1) }, level)).toBe(1);
  });

  // Independent of all polygons: follow the ray from each of many points and ask which plate it meets.
  test('rays from points over the window find the same share within 2 %', () => {
    const metres = fc.double({ min: 0.05, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(
        metres,
        metres,
        fc.double({ min: -80, max: 80, noNaN: true }),
        fc.double({ min: 1, max: 80, noNaN: true }),
        (a, b, azimuth, altitude) => {
          const sun = sunFromWindow(90, 180, 180 + azimuth, altitude);
          const overhang: Overhang = { depthM: a, gapM: 0.1, leftM: 0.2, rightM: b };
          const fin: Fin = { depthM: b, gapM: 0.15, aboveM: 0.1, belowM: 0.3 };
          const window = { ...bare, revealM: 0.1, overhang, leftFin: fin, rightFin: fin };
          let lit = 0;
          const n = 60;
          const slope = [sun.right / sun.out, sun.up / sun.out];
          const meets = (
            p: number,
            line: number,
            rate: number,
            q: number,
            other: number,
            from: number,
            to: number,
            near: number,
            far: number,
          ) => {
            const depth = (line - p) / rate; // where the ray comes to the plate's plane
            const at = q + depth * other;
            return depth >= near && depth <= far && at >= from && at <= to;
          };
          for (let i = 0; i < n; i++)
            for (let j = 0; j < n; j++) {
              const [x, y] = [((i + 0.5) * 2) / n, (j + 0.5) / n];
              const [sx, sy] = slope;
              const hit =
                meets(y, 1.1, sy, x, sx, -0.2, 2 + b, 0.1, 0.1 + a) ||
                meets(x, -0.15, sx, y, sy, -0.3, 1.1, 0.1, 0.1 + b) ||
                meets(x, 2.15, sx, y, sy, -0.3, 1.1, 0.1, 0.1 + b) ||
                meets(y, 1, sy, x, sx, 0, 2, 0, 0.1) ||
                meets(x, 0, sx, y, sy, 0, 1, 0, 0.1) ||
                meets(x, 2, sx, y, sy, 0, 1, 0, 0.1);
              if (!hit) lit++;
            }
          expect(Math.abs(lit / (n * n) - sunlitFraction(window, sun))).toBeLessThan(0.02);
        },
      ),
    );
  });

  test('sun behind the window lights nothing', () => {
    expect(sunlitFraction(bare, sunFromWindow(90, 180, 0, 30))).toBe(0);
    expect(sunlitFraction(bare, sunFromWindow(90, 180, 180, 30))).toBe(1);
  });
});

// Incidence on a tilted plane by the handbook formula cos θ = sin h·cos β + cos h·sin β·cos γ.
test('the frame of a tilted window gives the incidence of the handbook', () => {
  const rad = Math.PI / 180;
  for (const [tilt, azimuth, at, high] of [
    [35, 170, 220, 40],
    [0, 0, 100, 25],
    [90, 250, 300, 10],
  ]) {
    const sun = sunFromWindow(tilt, azimuth, at, high);
    const expected =
      Math.sin(high * rad) * Math.cos(tilt * rad) +
      Math.cos(high * rad) * Math.sin(tilt * rad) * Math.cos((at - azimuth) * rad);
    expect(sun.out).toBeCloseTo(expected, 12);
    expect(Math.hypot(sun.right, sun.up, sun.out)).toBeCloseTo(1, 12);
  }
});

describe('diffuse light', () => {
  // Crossed strings (Hottel): a long strip of height H under a long plate of depth D, gap g, sees the
  // plate by (√(D² + g²) + H − √(D² + (g + H)²))/(2H), out of one half for the whole sky.
  test.each([
    [1.5, 0.6, 0.2],
    [2, 1, 0.5],
    [1, 2, 0],
  ])('a long overhang, window %f m high, plate %f m deep, gap %f m', (h, d, g) => {
    const plate = (Math.hypot(d, g) + h - Math.hypot(d, g + h)) / (2 * h);
    const found = diffuseShading(
      { widthM: 1, heightM: h, revealM: 0, overhang: long(d, g) },
      90,
      180,
    );
    expect(Math.abs(found.sky - (1 - 2 * plate))).toBeLessThan(0.005);
    expect(found.ground).toBeCloseTo(1, 9);
    expect(found.horizon).toBeCloseTo(1, 9);
  });

  // A wall gets (1/π)·∫∫ cos²h·cos γ dh dγ of an even sky; from a to 90° over from 0 to 90° that is
  // 1 − (2/π)·(a + sin(2a)/2).
  test('an even skyline leaves a wall the share of the sky above it', () => {
    const a = (20 * Math.PI) / 180;
    const left = 1 - (2 / Math.PI) * (a + Math.sin(2 * a) / 2);
    const found = diffuseShading({ widthM: 1, heightM: 1, revealM: 0 }, 90, 100, [
      { azimuthDeg: 0, altitudeDeg: 20 },
    ]);
    expect(Math.abs(found.sky - left)).toBeLessThan(0.01);
    expect(found.horizon).toBe(0);
    expect(found.ground).toBe(1);
  });

  test('bare windows of any tilt lose nothing', () => {
    for (const tilt of [0, 30, 90, 150]) {
      const { sky, ground, horizon } = diffuseShading(
        { widthM: 1, heightM: 1, revealM: 0 },
        tilt,
        45,
      );
      for (const share of [sky, ground, horizon]) expect(share).toBeCloseTo(1, 9);
    }
  });
});

describe('skyline', () => {
  const horizon = orderedHorizon([
    { azimuthDeg: 270, altitudeDeg: 20 },
    { azimuthDeg: 90, altitudeDeg: 10 },
    { azimuthDeg: -10, altitudeDeg: 0 },
  ]);
  test('runs straight between its points and over north', () => {
    expect(horizonAltitudeDeg(horizon, 180)).toBeCloseTo(15, 12);
    expect(horizonAltitudeDeg(horizon, 310)).toBeCloseTo(10, 12);
    expect(horizonAltitudeDeg(horizon, 0)).toBeCloseTo(1, 12);
    expect(horizonAltitudeDeg(horizon, 450)).toBeCloseTo(10, 12);
    expect(horizonAltitudeDeg([], 123)).toBe(0);
  });
  test('hides the sun that stands lower, and the night', () => {
    expect(isAboveHorizon(horizon, 180, 14.9)).toBe(false);
    expect(isAboveHorizon(horizon, 180, 15.1)).toBe(true);
    expect(isAboveHorizon([], 180, -0.1)).toBe(false);
  });
});
