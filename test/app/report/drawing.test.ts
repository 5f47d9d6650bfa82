import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { dayLabel, hourSpan, monthsOf } from '../../../app/report/calendar.ts';
import { byDuration, hoursAtLeast } from '../../../app/report/drawing/load-picture.ts';
import { monthPicture } from '../../../app/report/drawing/month-picture.ts';
import { roundTicks } from '../../../app/report/drawing/scale.ts';
import { apart } from '../../../app/report/drawing/svg.ts';
import { warmStep, warmSteps } from '../../../app/report/drawing/warm-step.ts';
import { figure } from '../../../app/report/figures.ts';

describe('figures and dates', () => {
  test.each([
    [1234567.4, 0, '1,234,567'],
    [-1234.56, 1, '\u22121,234.6'],
    [-0.4, 0, '0'],
    [999.5, 0, '1,000'],
    [NaN, 0, '\u2013'],
  ])('%d with %d decimals reads %s', (value, decimals, text) => {
    expect(figure(value, decimals)).toBe(text);
  });

  // The calendar: 6 August 2025 was a Wednesday, 29 February 2024 a Thursday.
  test('an hour is told by its day of the week', () => {
    expect(hourSpan(217 * 24 + 14, { hours: 8760, year: 2025 })).toBe('Wed 6 Aug, 14:00 to 15:00');
    expect(dayLabel(59 * 24, { hours: 8784, year: 2024 })).toBe('Thu 29 Feb');
    expect(dayLabel(60 * 24, { hours: 8784, year: 2024 })).toBe('Fri 1 Mar');
  });

  test.each([8760, 8784])('twelve months share out %d hours', (hours) => {
    const months = monthsOf(hours);
    expect(months[0]?.firstHour).toBe(0);
    expect(months.at(-1)?.endHour).toBe(hours);
    for (let i = 1; i < 12; i++) expect(months[i]?.firstHour).toBe(months[i - 1]?.endHour);
    const february = months[1];
    expect(((february?.endHour ?? 0) - (february?.firstHour ?? 0)) / 24).toBe(
      hours === 8784 ? 29 : 28,
    );
  });
});

describe('scales', () => {
  test('round ticks cover the range in few even steps', () => {
    const range = fc
      .tuple(
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        fc.double({ min: 0.01, max: 1e5, noNaN: true }),
      )
      .map(([low, span]) => [low, low + span] as const);
    fc.assert(
      fc.property(range, ([low, high]) => {
        const ticks = roundTicks(low, high, 4);
        expect(ticks[0]).toBeLessThanOrEqual(low + 1e-6 * (high - low));
        expect(ticks.at(-1)).toBeGreaterThanOrEqual(high - 1e-6 * (high - low));
        expect(ticks.length).toBeGreaterThanOrEqual(2);
        expect(ticks.length).toBeLessThanOrEqual(7);
      }),
    );
  });

  test('labels keep their distance, and their order', () => {
    const heights = fc.array(fc.double({ min: 0, max: 200, noNaN: true }), {
      minLength: 2,
      maxLength: 4,
    });
    fc.assert(
      fc.property(heights, (wanted) => {
        const moved = apart(wanted, 16);
        const sorted = [...moved].sort((a, b) => a - b);
        for (let i = 1; i < sorted.length; i++)
          expect((sorted[i] ?? 0) - (sorted[i - 1] ?? 0)).toBeGreaterThan(14);
      }),
    );
  });
});

describe('how warm an hour is', () => {
  test.each([
    [14.9, 0],
    [15, 1],
    [17, 2],
    [18.9, 2],
    [19, 3],
    [22.4, 3],
    [22.5, 4],
    [26, 4],
    [26.1, 5],
    [28, 5],
    [28.1, 6],
    [30, 6],
    [30.1, 7],
  ])('%d °C against a band of 19 to 26 °C is step %d', (temperatureC, step) => {
    expect(warmStep(temperatureC, 19, 26)).toBe(step);
  });

  test('an hour without people takes the last band; a room without people has none', () => {
    const of = (...values: number[]) => Float64Array.from(values);
    expect([...(warmSteps(of(27, 27, 27), of(NaN, 19, NaN), of(NaN, 26, NaN)) ?? [])]).toEqual([
      5, 5, 5,
    ]);
    expect(warmSteps(of(27), of(NaN), of(NaN))).toBe(null);
  });
});

test('load duration counts as many hours as there are', () => {
  const powers = fc.array(fc.integer({ min: 0, max: 50 }), { minLength: 1, maxLength: 60 });
  fc.assert(
    fc.property(powers, fc.integer({ min: 0, max: 60 }), (values, limit) => {
      const sorted = byDuration(Float64Array.from(values));
      expect(hoursAtLeast(sorted, limit)).toBe(values.filter((value) => value >= limit).length);
    }),
  );
});

describe('the picture of the months', () => {
  const twelve = (value: number) => new Array<number>(12).fill(value);
  const heights = (svg: string, kind: string) =>
    [...svg.matchAll(new RegExp(`height="([\\d.]+)" class="${kind}"`, 'g'))].map(([, h]) =>
      Number(h),
    );

  test('draws bars in proportion, and names each', () => {
    const heatingKWh = [800, 400, ...new Array<number>(10).fill(0)];
    const { markup } = monthPicture({
      hours: 8760,
      heatingKWh,
      coolingKWh: twelve(0),
      hoursAbove: twelve(0),
    });
    const [first = 0, second = 0, ...rest] = heights(markup, 'bar-heat');
    expect(first / second).toBeCloseTo(2, 2);
    expect(rest).toEqual([]);
    expect(markup).toContain('>800</text>');
    expect(markup).toContain('No occupied hour lies above the band.');
  });

  test('turns to megawatt hours where the figures would not fit', () => {
    const { markup } = monthPicture({
      hours: 8760,
      heatingKWh: twelve(123_456),
      coolingKWh: twelve(0),
      hoursAbove: twelve(1),
    });
    expect(markup).toContain('>123.5</text>');
    expect(markup).toContain('MWh');
  });
});
