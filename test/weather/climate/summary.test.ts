import { expect, test } from 'vitest';
import {
  climateSummary,
  degreeDaysKd,
  exceeded,
  type WeatherYear,
} from '../../../weather/index.ts';
import { inventedYear } from '../invented-year.ts';
import { testTable, yearOf } from '../shared-tables.ts';

const total = (values: ArrayLike<number>) => Array.from(values).reduce((a, b) => a + b, 0);

function yearWithAir(air: (h: number) => number): WeatherYear {
  const year = inventedYear();
  const column = {
    ...year.dryBulbC,
    values: Float64Array.from({ length: 8760 }, (_, h) => air(h)),
  };
  return {
    ...year,
    dryBulbC: column,
    dewPointC: { ...column, values: column.values.map((t) => t - 5) },
  };
}

test('months and the year hold the same energy, and the extremes of the table', () => {
  const year = inventedYear();
  const climate = climateSummary(year);
  for (const [key, values] of [
    ['ghiJPerM2', year.ghiWPerM2.values],
    ['dniJPerM2', year.dniWPerM2.values],
    ['dhiJPerM2', year.dhiWPerM2.values],
  ] as const) {
    expect(climate[key]).toBeCloseTo(total(values) * 3600, -3);
    expect(total(climate.months.map((month) => month[key]))).toBeCloseTo(climate[key], -3);
  }
  expect(Math.min(...climate.months.map((month) => month.minDryBulbC))).toBe(climate.minDryBulbC);
  expect(year.dryBulbC.values[climate.hottestHour]).toBe(climate.maxDryBulbC);
  const weighted = climate.months.map(
    (m, i) => m.meanDryBulbC * [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31][i],
  );
  expect(total(weighted) / 365).toBeCloseTo(climate.meanDryBulbC, 10);
});

test('percentiles of a year that warms evenly lie on its line', () => {
  // Closed form: air rises from 0 to 8759 hundredths; the value exceeded in a share p is (1 - p) of it.
  const climate = climateSummary(yearWithAir((h) => h / 250)).design;
  const top = 8759 / 250;
  expect(climate.heating996C).toBeCloseTo(0.004 * top, 10);
  expect(climate.heating99C).toBeCloseTo(0.01 * top, 10);
  expect(climate.cooling04C).toBeCloseTo(0.996 * top, 10);
  expect(climate.cooling2C).toBeCloseTo(0.98 * top, 10);
  expect(climate.wetBulbAtCooling04C).toBeLessThan(climate.cooling04C);
  expect(climate.wetBulbAtCooling04C).toBeGreaterThan(climate.cooling04C - 5);
  expect(exceeded(Float64Array.of(3), 0.4)).toBe(3);
});

test('degree days of days of 10 and of 25 degrees', () => {
  const daily = Float64Array.of(10, 10, 25);
  expect(degreeDaysKd(daily, 18, 'below')).toBe(16);
  expect(degreeDaysKd(daily, 18, 'above')).toBe(7);
  const climate = climateSummary(yearWithAir((h) => (h < 100 * 24 ? 8 : 20)));
  expect(climate.heatingDegreeDays18Kd).toBe(1000);
  expect(climate.coolingDegreeDays18Kd).toBe(265 * 2);
});

test('spells are the three days that are coldest and hottest together', () => {
  const climate = climateSummary(
    yearWithAir((h) => {
      const day = Math.floor(h / 24);
      if (day === 20) return -30; // one colder day alone
      if (day >= 40 && day < 43) return -15;
      return day >= 200 && day < 203 ? 30 : 10;
    }),
  );
  expect(climate.coldestSpell).toEqual({ firstDay: 40, days: 3, meanDryBulbC: -15 });
  expect(climate.hottestSpell).toEqual({ firstDay: 200, days: 3, meanDryBulbC: 30 });
});

testTable('Denver is as cold and sunny as its table', 'tmy3-725650.csv', (bytes) => {
  // test/reference/fabric-cases.md, section 1: extremes and sums of the table.
  const climate = climateSummary(yearOf(bytes, {}));
  expect(climate.minDryBulbC).toBe(-19.4);
  expect(climate.maxDryBulbC).toBe(40);
  expect(Math.round(climate.dniJPerM2 / 3.6e6)).toBe(1978);
  expect(climate.design.heating996C).toBeGreaterThan(climate.minDryBulbC);
  expect(climate.design.cooling04C).toBeLessThan(climate.maxDryBulbC);
});
