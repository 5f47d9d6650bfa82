import { expect, test } from 'vitest';
import { carpetBand, stepByCuts, warmStep } from '../../../../app/ui/chart/warm-step.ts';

// The rule of the look: three steps below the band, two inside, three above; 2 K and 4 K beyond it.
test('a temperature takes its step from the band of its room', () => {
  const steps = [15.9, 17, 19.9, 20, 22.9, 23, 26, 26.1, 28.1, 30.1];
  expect(steps.map((t) => warmStep(t, 20, 26))).toEqual([0, 1, 2, 3, 3, 4, 4, 5, 6, 7]);
});

test('the same temperature is warm in a cool room and cool in a warm one', () => {
  expect(warmStep(22, 16, 20)).toBeGreaterThan(4);
  expect(warmStep(22, 24, 28)).toBeLessThan(3);
});

test('an hour without people takes the band of the last hour with people', () => {
  const band = carpetBand(
    Float64Array.of(NaN, 18, NaN, 20, NaN),
    Float64Array.of(NaN, 24, NaN, 26, NaN),
  );
  expect(Array.from(band?.lowC ?? [])).toEqual([20, 18, 18, 20, 20]);
  expect(band?.constant).toBeNull();
});

test('one band all year is known as such, and no band is no band', () => {
  const low = Float64Array.of(NaN, 20, 20);
  const high = Float64Array.of(NaN, 26, 26);
  expect(carpetBand(low, high)?.constant).toEqual({ lowC: 20, highC: 26 });
  expect(carpetBand(Float64Array.of(NaN), Float64Array.of(NaN))).toBeNull();
});

test('a plain scale counts the cuts reached', () => {
  expect([-1, 0, 9, 10, 25].map((v) => stepByCuts(v, [0, 10, 20]))).toEqual([0, 1, 1, 2, 3]);
});
