import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  dayUnits,
  edgeBars,
  evenUnits,
  monthUnits,
} from '../../../../app/ui/chart/measured-edge.ts';
import { roundTicks, tickDecimals } from '../../../../app/ui/chart/ticks.ts';
import { makeCalendar } from '../../../../app/ui/format/index.ts';

test('months meet without a gap and cover the year, leap or not', () => {
  for (const [hours, year] of [
    [8760, 2023],
    [8784, 2024],
  ] as const) {
    const units = monthUnits(makeCalendar(hours, year).months);
    expect(units).toHaveLength(12);
    expect(units[0]?.from).toBe(0);
    expect(units[11]?.to).toBe(hours);
    for (let i = 1; i < 12; i++) expect(units[i]?.from).toBe(units[i - 1]?.to);
  }
});

test('February has 28 days, and 29 in a leap year', () => {
  const feb = (hours: number) => {
    const month = makeCalendar(hours).months[1];
    return ((month?.endHour ?? 0) - (month?.firstHour ?? 0)) / 24;
  };
  expect(feb(8760)).toBe(28);
  expect(feb(8784)).toBe(29);
});

test('units are filled and open in turn and end on the last pixel', () => {
  const bars = edgeBars(evenUnits(0, 10, 2), (v) => 64 + v * 10);
  expect(bars.map((bar) => bar.isFilled)).toEqual([true, false, true, false, true]);
  const last = bars[4];
  expect((last?.x ?? 0) + (last?.width ?? 0)).toBe(164);
});

// 14 July 2025 was a Monday (calendar).
test('a week is labelled by weekday and date', () => {
  const calendar = makeCalendar(8760, 2025);
  const firstHour = 194 * 24;
  expect(dayUnits(calendar, firstHour, firstHour + 168).map((unit) => unit.label)).toEqual([
    'Mon 14',
    'Tue 15',
    'Wed 16',
    'Thu 17',
    'Fri 18',
    'Sat 19',
    'Sun 20',
  ]);
});

test('ticks cover the range with few, even, round steps', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -500, max: 500, noNaN: true }),
      fc.double({ min: 0.5, max: 9000, noNaN: true }),
      (low, span) => {
        const ticks = roundTicks(low, low + span);
        const step = (ticks[1] ?? 0) - (ticks[0] ?? 0);
        expect(ticks[0]).toBeLessThanOrEqual(low + step * 1e-6);
        expect(ticks.at(-1)).toBeGreaterThanOrEqual(low + span - step * 1e-6);
        expect(ticks.length).toBeLessThanOrEqual(7);
      },
    ),
  );
  expect(roundTicks(15.2, 34)).toEqual([15, 20, 25, 30, 35]);
  expect(tickDecimals([0, 0.5, 1])).toBe(1);
  expect(tickDecimals([0, 10, 20])).toBe(0);
});
