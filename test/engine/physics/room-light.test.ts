import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { lightMatrix, spreadLight } from '../../../engine/physics/short-wave-enclosure.ts';
import {
  type Direction,
  inwardCosine,
  patchScratch,
  patchShare,
  sunTravel,
} from '../../../engine/physics/sun-patch.ts';
import {
  type BoxFace,
  type BoxRectangle,
  boxExchangeM2,
  boxFaces,
  boxViewFactors,
  faceRectangle,
  rectangleAreaM2,
} from '../../../engine/physics/view-factors.ts';
import { windowLight } from '../../../engine/physics/window-light.ts';
import { sunFromWindow, sunlitPieces } from '../../../engine/physics/window-shading.ts';

const box = { lengthM: 8, widthM: 6, heightM: 2.7 };
const window: BoxRectangle = { face: 'front', u0M: 0.5, u1M: 3.5, v0M: 0.2, v1M: 2.2 };
const scratch = patchScratch();
const share = (travel: Direction, target: BoxRectangle, through = window) =>
  patchShare(box, through, travel, target, scratch);
const angle = fc.double({ min: -89, max: 89, noNaN: true });

describe('patch of the sun', () => {
  test('sun straight ahead of a south front travels north and down', () => {
    const d = sunTravel(180, 180, 30);
    expect(d.x).toBeCloseTo(0, 12);
    expect(d.y).toBeCloseTo(Math.cos(Math.PI / 6), 12);
    expect(d.z).toBeCloseTo(-0.5, 12);
    const morning = sunTravel(180, 90, 0); // sun in the east of a south front: towards its left, west
    expect(morning.x).toBeCloseTo(-1, 12);
    expect(inwardCosine('front', d)).toBeCloseTo(Math.cos(Math.PI / 6), 12);
  });

  // By hand: sun square to the front at 45°; the strip of the window at height v lands at y = v.
  test('square sun at 45° lands on the floor, as far in as the window is high', () => {
    const d = sunTravel(180, 180, 45);
    expect(share(d, faceRectangle(box, 'floor'))).toBeCloseTo(1, 12);
    const strip: BoxRectangle = { face: 'floor', u0M: 0, u1M: 8, v0M: 0.2, v1M: 1.2 };
    expect(share(d, strip)).toBeCloseTo(0.5, 12);
    const beside: BoxRectangle = { face: 'floor', u0M: 3.5, u1M: 8, v0M: 0, v1M: 6 };
    expect(share(d, beside)).toBe(0);
  });

  // By hand: tan h = 0.25; what enters above v = 6·0.25 = 1.5 reaches the back, 0.7 m of 2 m.
  test('low sun splits between floor and back wall', () => {
    const d = sunTravel(180, 180, Math.atan(0.25) / (Math.PI / 180));
    expect(share(d, faceRectangle(box, 'back'))).toBeCloseTo(0.35, 12);
    expect(share(d, faceRectangle(box, 'floor'))).toBeCloseTo(0.65, 12);
  });

  test('the shares of all faces add up to 1, whatever face the window is on', () => {
    fc.assert(
      fc.property(fc.constantFrom(...boxFaces), angle, angle, (face: BoxFace, a, b) => {
        const whole = faceRectangle(box, face);
        const through = {
          ...whole,
          u0M: 0.1 * whole.u1M,
          u1M: 0.4 * whole.u1M,
          v0M: 0.3 * whole.v1M,
        };
        const [p, q] = [Math.tan((a * Math.PI) / 180), Math.tan((b * Math.PI) / 180)];
        const n = inwardCosine(face, { x: 1, y: 1, z: 1 });
        const d =
          face === 'left' || face === 'right'
            ? { x: n, y: p, z: q }
            : face === 'front' || face === 'back'
              ? { x: p, y: n, z: q }
              : { x: p, y: q, z: n };
        const sum = boxFaces.reduce((s, f) => s + share(d, faceRectangle(box, f), through), 0);
        expect(sum).toBeCloseTo(1, 9);
      }),
    );
  });

  // Independent of the clipping of pieces: the lit part of this window is a rectangle at its right end
  // (as seen from inside, which is its low-x end in front), that can be given as a window itself.
  test('a window in half shade throws the patch of its lit half', () => {
    const d = sunTravel(180, 150, 30); // morning sun, from the left looking out: the left is in shade
    const sun = sunFromWindow(90, 180, 150, 30);
    const shade = {
      widthM: 3,
      heightM: 2,
      revealM: 0,
      leftFin: { depthM: 2, gapM: 0, aboveM: Infinity, belowM: Infinity },
    };
    const lit = sunlitPieces(shade, sun);
    const shadowM = (2 * -sun.right) / sun.out;
    const rest = { ...window, u1M: window.u1M - shadowM };
    const strip: BoxRectangle = { face: 'floor', u0M: 0, u1M: 1.5, v0M: 0.5, v1M: 2.5 };
    for (const target of [...boxFaces.map((f) => faceRectangle(box, f)), strip]) {
      const found = patchShare(box, window, d, target, scratch, lit);
      expect(found, target.face).toBeCloseTo(share(d, target, rest), 9);
    }
    expect(patchShare(box, window, d, faceRectangle(box, 'floor'), scratch, [])).toBe(0);
  });

  test('a ray cast from points over the window finds the same shares within 1 %', () => {
    const d = sunTravel(180, 230, 20);
    const hits: Record<string, number> = {};
    const points = 400;
    for (let i = 0; i < points; i++)
      for (let j = 0; j < points; j++) {
        const x = window.u0M + ((i + 0.5) / points) * 3;
        const z = window.v0M + ((j + 0.5) / points) * 2;
        const reach = [
          { face: 'right', t: d.x > 0 ? (8 - x) / d.x : Infinity },
          { face: 'left', t: d.x < 0 ? -x / d.x : Infinity },
          { face: 'back', t: 6 / d.y },
          { face: 'floor', t: -z / d.z },
        ].sort((a, b) => a.t - b.t)[0].face;
        hits[reach] = (hits[reach] ?? 0) + 1 / points ** 2;
      }
    expect(Object.keys(hits).length).toBeGreaterThan(1);
    for (const face of boxFaces)
      expect(Math.abs(share(d, faceRectangle(box, face)) - (hits[face] ?? 0))).toBeLessThan(0.01);
  });
});

describe('diffuse light through a window', () => {
  const others = boxFaces
    .filter((face) => face !== 'front')
    .map((face) => faceRectangle(box, face));

  // Closed-form view factors of the window: light from above and below in equal parts.
  test('sky and ground light together follow the view factors of the window within 0.002', () => {
    const { sky, ground } = windowLight(box, window, others);
    others.forEach((face, i) => {
      const exact = boxExchangeM2(box, window, face) / rectangleAreaM2(window);
      expect(Math.abs((sky[i] + ground[i]) / 2 - exact), face.face).toBeLessThan(0.002);
    });
  });

  test('sky light never meets the ceiling first, nor ground light the floor; all of it lands', () => {
    const { sky, ground } = windowLight(box, window, others, (c) => c ** 0.3);
    const at = (face: BoxFace) => others.findIndex((o) => o.face === face);
    expect(sky[at('ceiling')]).toBe(0);
    expect(ground[at('floor')]).toBe(0);
    expect(sky.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 9);
    expect(ground.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 9);
  });

  test('a roof light sees sky only', () => {
    const light: BoxRectangle = { face: 'ceiling', u0M: 3, u1M: 4, v0M: 2, v1M: 3 };
    const floor = faceRectangle(box, 'floor');
    const found = windowLight(box, light, [floor]);
    expect(found.ground[0]).toBe(0);
    expect(Math.abs(found.sky[0] - boxExchangeM2(box, light, floor))).toBeLessThan(0.002); // 1 m²
  });
});

describe('reflections inside', () => {
  const views = boxViewFactors(box, [window]);
  const reflectance = [0.4, 0.4, 0.4, 0.4, 0.4, 0.4, 0.15];

  test('what is absorbed and lost is what came in', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0, max: 500, noNaN: true }), { minLength: 7, maxLength: 7 }),
        (w) => {
          const first = Float64Array.from(w);
          const total = new Float64Array(7);
          spreadLight(lightMatrix(views.areaM2, views.exchangeM2, reflectance), first, total);
          const taken = total.reduce((s, p, i) => s + p * (1 - reflectance[i]), 0);
          const entered = first.reduce((s, p) => s + p, 0);
          expect(Math.abs(taken - entered)).toBeLessThan(1e-9 * (1 + entered));
          total.forEach((p, i) => {
            expect(p).toBeGreaterThanOrEqual(first[i] - 1e-9);
          });
        },
      ),
    );
  });

  // Integrating sphere: even walls of reflectance ρ multiply the mean light by 1/(1 − ρ).
  test('in a cube of even walls, light spreads as in an integrating sphere', () => {
    const cube = boxViewFactors({ lengthM: 2, widthM: 2, heightM: 2 });
    const total = new Float64Array(6);
    const first = new Float64Array(6).fill(10);
    spreadLight(lightMatrix(cube.areaM2, cube.exchangeM2, new Array(6).fill(0.6)), first, total);
    for (const p of total) expect(p).toBeCloseTo(10 / 0.4, 9);
  });

  test('black walls keep what they first get', () => {
    const matrix = lightMatrix(views.areaM2, views.exchangeM2, new Array(7).fill(0));
    for (let i = 0; i < 7; i++)
      for (let j = 0; j < 7; j++) expect(matrix[i * 7 + j]).toBe(i === j ? 1 : 0);
  });
});
