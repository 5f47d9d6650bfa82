import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { approximateViewFactors } from '../../../engine/physics/approximate-view-factors.ts';
import {
  type Box,
  type BoxFace,
  type BoxRectangle,
  boxExchangeM2,
  boxViewFactors,
  faceRectangle,
  parallelExchangeM2,
  perpendicularExchangeM2,
  rectangleAreaM2,
} from '../../../engine/physics/view-factors.ts';
import { caseName, expectCase, inputNumber, referenceCases } from '../../reference/cases.ts';

const file = '07-radiation-exchange.json';

describe('rectangles', () => {
  for (const one of referenceCases(file, /^vf-parallel-/)) {
    test(caseName(one), () => {
      const [a, b, z] = ['a', 'b', 'distance'].map((key) => inputNumber(one, key));
      const sides = [
        [0, a],
        [0, b],
      ] as const;
      expectCase(one, { F: parallelExchangeM2(sides, sides, z) / (a * b) });
    });
  }
  for (const one of referenceCases(file, /^vf-perpendicular-/)) {
    test(caseName(one), () => {
      const [along, own, other] = ['common', 'own', 'other'].map((key) => inputNumber(one, key));
      const x = perpendicularExchangeM2([0, own], [0, along], [0, other], [0, along]);
      expectCase(one, { F: x / (along * own) });
    });
  }
  for (const one of referenceCases(file, /^vf-cube-table/)) {
    test(caseName(one), () => {
      const box = {
        lengthM: inputNumber(one, 'a'),
        widthM: inputNumber(one, 'b'),
        heightM: inputNumber(one, 'distance'),
      };
      const { exchangeM2 } = boxViewFactors(box);
      expectCase(one, { F: [exchangeM2[1], exchangeM2[2]] });
    });
  }
});

describe('whole boxes', () => {
  for (const one of referenceCases(file, /^vf-box-/)) {
    test(caseName(one), () => {
      // The case's order is floor, ceiling, south, north, west, east: ours with south in front.
      const { areaM2, exchangeM2 } = boxViewFactors({
        lengthM: inputNumber(one, 'length'),
        widthM: inputNumber(one, 'width'),
        heightM: inputNumber(one, 'height'),
      });
      const rows = [...areaM2].map((a, i) =>
        [...exchangeM2.slice(i * 6, i * 6 + 6)].map((x) => x / a),
      );
      expectCase(one, {
        areas: areaM2,
        F_matrix: rows,
        row_sums: rows.map((row) => row.reduce((s, f) => s + f, 0)),
      });
    });
  }
});

const rooms = fc.record({
  lengthM: fc.double({ min: 1, max: 20, noNaN: true }),
  widthM: fc.double({ min: 1, max: 20, noNaN: true }),
  heightM: fc.double({ min: 2, max: 6, noNaN: true }),
});
const faces = fc.constantFrom<BoxFace>('floor', 'ceiling', 'front', 'back', 'left', 'right');
const share = fc.double({ min: 0, max: 0.6, noNaN: true });

/** A rectangle on a face from shares of the face's sides: at least 1/20 of each. */
function within(
  box: Box,
  face: BoxFace,
  u: number,
  v: number,
  du: number,
  dv: number,
): BoxRectangle {
  const whole = faceRectangle(box, face);
  const [w, h] = [whole.u1M, whole.v1M];
  const part = (a: number, b: number, size: number) => [a * size, Math.min(1, a + 0.05 + b) * size];
  const [u0M, u1M] = part(u, du, w);
  const [v0M, v1M] = part(v, dv, h);
  return { face, u0M, u1M, v0M, v1M };
}

/** Double area integral of cos·cos/(π·r²) by Gauss-Legendre, 6 points a side: the definition itself. */
function quadrature(box: Box, one: BoxRectangle, two: BoxRectangle): number {
  const nodes = [0.6612093864662645, 0.2386191860831969, 0.932469514203152];
  const weights = [0.3607615730481386, 0.467913934572691, 0.1713244923791704];
  const line = (a: number, b: number) =>
    nodes.flatMap((x, k) =>
      [-1, 1].map((s) => ({
        at: (a + b) / 2 + (s * x * (b - a)) / 2,
        w: (weights[k] * (b - a)) / 2,
      })),
    );
  const size = { x: box.lengthM, y: box.widthM, z: box.heightM };
  const points = (r: BoxRectangle) => {
    const list: { p: number[]; n: number[]; w: number }[] = [];
    for (const u of line(r.u0M, r.u1M))
      for (const v of line(r.v0M, r.v1M)) {
        const w = u.w * v.w;
        if (r.face === 'floor') list.push({ p: [u.at, v.at, 0], n: [0, 0, 1], w });
        if (r.face === 'ceiling') list.push({ p: [u.at, v.at, size.z], n: [0, 0, -1], w });
        if (r.face === 'front') list.push({ p: [u.at, 0, v.at], n: [0, 1, 0], w });
        if (r.face === 'back') list.push({ p: [u.at, size.y, v.at], n: [0, -1, 0], w });
        if (r.face === 'left') list.push({ p: [0, u.at, v.at], n: [1, 0, 0], w });
        if (r.face === 'right') list.push({ p: [size.x, u.at, v.at], n: [-1, 0, 0], w });
      }
    return list;
  };
  let sum = 0;
  for (const a of points(one))
    for (const b of points(two)) {
      const d = a.p.map((x, i) => b.p[i] - x);
      const r2 = d[0] ** 2 + d[1] ** 2 + d[2] ** 2;
      const ca = d[0] * a.n[0] + d[1] * a.n[1] + d[2] * a.n[2];
      const cb = -(d[0] * b.n[0] + d[1] * b.n[1] + d[2] * b.n[2]);
      sum += (a.w * b.w * ca * cb) / (Math.PI * r2 * r2);
    }
  return sum;
}

describe('rectangles anywhere on a box', () => {
  const box = { lengthM: 8, widthM: 6, heightM: 2.7 };
  const window: BoxRectangle = { face: 'front', u0M: 0.5, u1M: 3.5, v0M: 0.4, v1M: 2.2 };
  const others: BoxRectangle[] = [
    { face: 'floor', u0M: 2, u1M: 5, v0M: 1.5, v1M: 4 },
    { face: 'ceiling', u0M: 1, u1M: 2, v0M: 1, v1M: 5 },
    { face: 'back', u0M: 4, u1M: 7, v0M: 0, v1M: 2 },
    { face: 'left', u0M: 2, u1M: 5, v0M: 0.5, v1M: 2.5 },
    { face: 'right', u0M: 1, u1M: 6, v0M: 0, v1M: 2.7 },
  ];
  // Definition of the view factor, by quadrature; smooth here, as none of them touch.
  test.each(others)('the closed form meets the double integral, window to $face', (other) => {
    const exact = boxExchangeM2(box, window, other);
    expect(Math.abs(exact / quadrature(box, window, other) - 1)).toBeLessThan(1e-5);
    expect(boxExchangeM2(box, other, window)).toBeCloseTo(exact, 12);
  });

  test('pairs of side faces too: left to right, and left to back', () => {
    const left: BoxRectangle = { face: 'left', u0M: 0.5, u1M: 2, v0M: 1, v1M: 2 };
    for (const other of [others[2], others[4]]) {
      const exact = boxExchangeM2(box, left, other);
      expect(Math.abs(exact / quadrature(box, left, other) - 1)).toBeLessThan(1e-5);
    }
  });

  test('cutting a rectangle in two leaves the sum of the exchange areas', () => {
    fc.assert(
      fc.property(
        rooms,
        faces,
        faces,
        share,
        share,
        share,
        share,
        share,
        (b, f1, f2, u, v, du, dv, cut) => {
          const one = within(b, f1, u, v, du, dv);
          const two = within(b, f2, v, u, dv, du);
          const at = one.u0M + (one.u1M - one.u0M) * (0.1 + cut);
          const parts =
            boxExchangeM2(b, { ...one, u1M: at }, two) + boxExchangeM2(b, { ...one, u0M: at }, two);
          expect(Math.abs(parts - boxExchangeM2(b, one, two))).toBeLessThan(1e-11);
        },
      ),
    );
  });

  test('rows add up to the areas to 1e-12 and the table is symmetric, windows cut out', () => {
    fc.assert(
      fc.property(rooms, faces, share, share, share, share, (b, face, u, v, du, dv) => {
        const cut = within(b, face, u, v, du, dv);
        const door: BoxRectangle = {
          face: face === 'left' ? 'back' : 'left',
          u0M: 0,
          u1M: 0.9,
          v0M: 0,
          v1M: 1.9,
        };
        const { areaM2, exchangeM2 } = boxViewFactors(b, [cut, door]);
        const n = areaM2.length;
        for (let i = 0; i < n; i++) {
          let row = 0;
          for (let j = 0; j < n; j++) {
            row += exchangeM2[i * n + j];
            expect(exchangeM2[i * n + j]).toBeGreaterThanOrEqual(0);
            expect(exchangeM2[i * n + j]).toBe(exchangeM2[j * n + i]);
          }
          expect(Math.abs(row - areaM2[i])).toBeLessThan(1e-12 * areaM2[i] + 1e-13);
        }
      }),
    );
  });

  test('before closing, the closed forms themselves add up to 1e-11', () => {
    const around = (['floor', 'ceiling', 'back', 'left', 'right'] as const).map((f) =>
      faceRectangle(box, f),
    );
    const sum = around.reduce((s, face) => s + boxExchangeM2(box, window, face), 0);
    expect(Math.abs(sum / rectangleAreaM2(window) - 1)).toBeLessThan(1e-11);
  });

  test('a face that is all window leaves a wall of no area that sees nothing', () => {
    const all = faceRectangle(box, 'front');
    const { areaM2, exchangeM2 } = boxViewFactors(box, [all]);
    const bare = boxViewFactors(box);
    expect(areaM2[2]).toBe(0);
    expect([...exchangeM2.slice(14, 21)]).toEqual([0, 0, 0, 0, 0, 0, 0]);
    for (let j = 0; j < 6; j++)
      expect(exchangeM2[42 + j]).toBeCloseTo(j === 2 ? 0 : bare.exchangeM2[12 + j], 11);
  });
});

describe('view factors by area', () => {
  // Cube: by symmetry opposite and adjacent faces alike get 1/5 where exact ones are 0.1998 and 0.2000.
  test('a cube gets one fifth everywhere', () => {
    const { exchangeM2 } = approximateViewFactors(new Float64Array(6).fill(1), [0, 1, 2, 3, 4, 5]);
    for (let j = 1; j < 6; j++) expect(exchangeM2[j]).toBeCloseTo(0.2, 12);
  });

  test('closed to 1e-12, symmetric, and blind in its own plane', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.5, max: 60, noNaN: true }), { minLength: 4, maxLength: 12 }),
        (areas) => {
          const planes = areas.map((_, i) => (i === areas.length - 1 ? -1 : i % 3));
          const found = approximateViewFactors(Float64Array.from(areas), planes);
          const n = areas.length;
          for (let i = 0; i < n; i++) {
            let row = 0;
            for (let j = 0; j < n; j++) {
              const x = found.exchangeM2[i * n + j];
              row += x;
              expect(Math.abs(x - found.exchangeM2[j * n + i])).toBeLessThan(1e-12 * areas[i]);
              if (i !== j && planes[i] === planes[j] && planes[i] >= 0) expect(x).toBe(0);
            }
            expect(Math.abs(row / areas[i] - 1)).toBeLessThan(1e-12);
          }
        },
      ),
    );
  });

  test('a surface larger than all others sees the rest of itself', () => {
    const { exchangeM2, largestSelfShare } = approximateViewFactors(
      Float64Array.of(30, 5, 5),
      [0, 1, 2],
    );
    // x to each small one and z to itself: scaling keeps x²/(z·y) = 1, with y = 5 − x, z = 30 − 2x.
    const x = 20 - Math.sqrt(250);
    expect(exchangeM2[1]).toBeCloseTo(x, 9);
    expect(largestSelfShare).toBeCloseTo((30 - 2 * x) / 30, 9);
  });

  test('in a room of 8 × 6 × 2.7 m it is within 0.04 of every exact factor', () => {
    const exact = boxViewFactors({ lengthM: 8, widthM: 6, heightM: 2.7 });
    const rough = approximateViewFactors(exact.areaM2, [0, 1, 2, 3, 4, 5]);
    let worst = 0;
    for (let k = 0; k < 36; k++)
      worst = Math.max(
        worst,
        Math.abs(exact.exchangeM2[k] - rough.exchangeM2[k]) / exact.areaM2[Math.floor(k / 6)],
      );
    expect(worst).toBeLessThan(0.04);
  });
});
