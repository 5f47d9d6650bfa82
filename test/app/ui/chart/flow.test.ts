import fc from 'fast-check';
import { expect, test } from 'vitest';
import { layFlow } from '../../../../app/ui/chart/flow.ts';
import { shareOut } from '../../../../app/ui/chart/share-out.ts';

// Largest remainder (Hamilton's method of apportionment): floors first, then the largest fractions.
// Worked by hand: 33.4 + 33.3 + 33.3 = 100; floors make 99, the one left goes to .4.
test('three thirds of a hundred are shown as 34, 33 and 33', () => {
  expect(shareOut([33.4, 33.3, 33.3])).toEqual([34, 33, 33]);
});

test('rounded parts add up to the rounded whole and are never off by a unit or more', () => {
  fc.assert(
    fc.property(
      fc.array(fc.double({ min: 0, max: 5000, noNaN: true }), { minLength: 1 }),
      (parts) => {
        const whole = parts.reduce((sum, part) => sum + part, 0);
        const shown = shareOut(parts);
        expect(shown.reduce((sum, part) => sum + part, 0)).toBe(Math.round(whole));
        shown.forEach((value, i) => {
          expect(Math.abs(value - (parts[i] ?? 0))).toBeLessThan(1.000001);
        });
      },
    ),
  );
});

const parts = [
  { key: 'solar', value: 485.4 },
  { key: 'opaque', value: 124.3 },
  { key: 'gains', value: 8.3 },
  { key: 'infiltration', value: -224.2 },
  { key: 'storage', value: -190.8 },
  { key: 'rooms', value: -147 },
  { key: 'glazing', value: -56 },
];

test('both sides of a flow picture add up to the sum on the bar', () => {
  const picture = layFlow(parts, 137);
  expect(picture.sum).toBe(618);
  expect(picture.into.reduce((sum, s) => sum + s.shown, 0)).toBe(618);
  expect(picture.out.reduce((sum, s) => sum + s.shown, 0)).toBe(618);
});

test('streams are as wide as their heat, and fill the bar on both sides', () => {
  const { into, out } = layFlow(parts, 137);
  expect(into.reduce((sum, s) => sum + s.width, 0)).toBeCloseTo(137, 6);
  expect(out.reduce((sum, s) => sum + s.width, 0)).toBeCloseTo(137, 6);
  expect((into[0]?.width ?? 0) / (into[1]?.width ?? 1)).toBeCloseTo(485.4 / 124.3, 6);
});

test('the largest stream is on top and no two names are closer than a line', () => {
  const { into, out } = layFlow(parts, 137);
  expect(into.map((s) => s.key)).toEqual(['solar', 'opaque', 'gains']);
  expect(out.map((s) => s.key)).toEqual(['infiltration', 'storage', 'rooms', 'glazing']);
  for (const side of [into, out]) {
    for (let i = 1; i < side.length; i++) {
      expect((side[i]?.labelY ?? 0) - (side[i - 1]?.labelY ?? 0)).toBeGreaterThanOrEqual(16);
    }
  }
});

test('no heat draws no streams and no infinite widths', () => {
  const picture = layFlow([{ key: 'solar', value: 0 }], 100);
  expect(picture.into).toEqual([]);
  expect(Number.isFinite(picture.height)).toBe(true);
});
