import { expect, test } from 'vitest';
import {
  difference,
  duration,
  figure,
  hourSpan,
  hourText,
  makeCalendar,
  plain,
  powerOfTen,
  quantity,
  stampText,
} from '../../../../app/ui/format/index.ts';

test('thousands have a comma and the minus is a minus sign', () => {
  expect(figure(9854.4)).toBe('9,854');
  expect(figure(-3.25, 1)).toBe('\u22123.3');
});

test('a value that rounds to nought has no sign', () => {
  expect(figure(-0.04, 1)).toBe('0.0');
  expect(difference(-0.04, 1)).toBe('0.0');
});

test('a difference shows its sign', () => {
  expect(difference(298)).toBe('+298');
  expect(difference(-7172)).toBe('\u22127,172');
});

test('what is not known is an en dash', () => {
  expect(figure(NaN, 1)).toBe('\u2013');
});

test('each quantity has the decimals of its kind', () => {
  expect(plain(quantity.energyKWh(1343.4))).toBe('1,343 kWh');
  expect(plain(quantity.housePowerW(8512))).toBe('8.5 kW');
  expect(plain(quantity.roomPowerW(1352))).toBe('1.35 kW');
  expect(plain(quantity.temperatureC(35.94))).toBe('35.9 °C');
  expect(plain(quantity.differenceK(2.4))).toBe('+2.4 K');
});

test('a small share is written as a power of ten', () => {
  expect(powerOfTen(3.1e-12)).toEqual({ mantissa: '3', exponent: '\u221212' });
  expect(powerOfTen(9.7e-10)).toEqual({ mantissa: '1', exponent: '\u22129' });
  expect(powerOfTen(0)).toBeNull();
});

// 18 July 2025 was a Friday (calendar); it is day 199 of a common year, index 198.
test('an hour is named by weekday, date and clock', () => {
  const hour = 198 * 24 + 16;
  expect(hourSpan(makeCalendar(8760, 2025), hour)).toBe('Fri 18 July, 16:00 to 17:00');
  expect(hourText(makeCalendar(8760), hour)).toBe('18 July, 16:00');
});

test('the last hour of a day ends at 24:00', () => {
  expect(hourSpan(makeCalendar(8760), 23)).toBe('1 January, 23:00 to 24:00');
});

test('a run time is in milliseconds or seconds', () => {
  expect(duration(42)).toBe('42 ms');
  expect(duration(214)).toBe('0.21 s');
});

test("the engine's stamp reads as a date, and no stamp stays empty", () => {
  expect(stampText('2025-01-17T07:00')).toBe('17 January, 07:00');
  expect(stampText('')).toBe('');
});
