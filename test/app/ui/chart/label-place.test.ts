import { expect, test } from 'vitest';
import { clearestEnd } from '../../../../app/ui/chart/label-place.ts';

test('the label goes where no line crosses the foot of the band', () => {
  const band = new Float64Array(168).fill(20);
  const line = Float64Array.from({ length: 168 }, (_, h) => (h < 100 ? 20 : 30));
  const end = clearestEnd(band, [line], 30);
  expect(end).toBeGreaterThanOrEqual(129);
});

test('the label ends inside the band, never where nobody is in', () => {
  const band = Float64Array.from({ length: 168 }, (_, h) => (h % 24 < 12 ? 20 : NaN));
  const end = clearestEnd(band, [new Float64Array(168).fill(25)], 30);
  expect(Number.isNaN(band[end])).toBe(false);
  expect(end).toBeGreaterThanOrEqual(29);
});

test('no band, no place', () => {
  expect(clearestEnd(new Float64Array(168).fill(NaN), [], 30)).toBe(-1);
});
