// Design conditions computed from the table itself: percentiles with what comes together with them,
// cold and hot spells, winter design in the manner of ISO 15927-5, degree days.
//
// One year gives milder extremes than the decades that climate tables are made from.
import { enthalpyJPerKg, humidityRatio, saturationPressurePa, wetBulbC } from '../air/moist-air.ts';
import type { WeatherYear } from '../weather-year.ts';
import { exceeded } from './design-conditions.ts';
import { dailyMeansC, spellOf } from './spells.ts';
import { degreeDaysKd, type Spell } from './summary.ts';

/** A value that is exceeded in a share of the hours, and the means of what comes with it. */
export interface DesignPoint {
  /** Share of the hours of the year in which the value is exceeded, 0 to 1. */
  readonly share: number;
  readonly valueC: number;
  readonly coincident: {
    readonly dryBulbC: number;
    readonly wetBulbC: number;
    readonly humidityRatio: number;
    readonly windMPerS: number;
    /** Mean vector of the wind; NaN where it comes from everywhere alike. */
    readonly windFromDeg: number;
    readonly enthalpyJPerKg: number;
  };
  /** Hours within the bin that the means are taken over. */
  readonly hours: number;
}

/** Coldest run of n days of the table, and the wind during it. */
export interface WinterDesign {
  readonly days: number;
  readonly spell: Spell;
  readonly windMPerS: number;
}

export interface DesignTable {
  /** Dry bulb exceeded in 99.6 and 99 % of the hours. */
  readonly heating: readonly DesignPoint[];
  /** Dry bulb exceeded in 0.4, 1 and 2 % of the hours. */
  readonly cooling: readonly DesignPoint[];
  /** Wet bulb exceeded in 0.4, 1 and 2 %. */
  readonly evaporation: readonly DesignPoint[];
  /** Dew point exceeded in 0.4, 1 and 2 %. */
  readonly dehumidification: readonly DesignPoint[];
  readonly coldest: readonly Spell[];
  readonly hottest: readonly Spell[];
  readonly winter: readonly WinterDesign[];
  readonly degreeDays: readonly {
    readonly baseC: number;
    readonly heatingKd: number;
    readonly coolingKd: number;
  }[];
}

const spellLengths = [1, 3, 5];
/** Bases in use between Europe and America, whole and half degrees alike. */
export const degreeDayBasesC: readonly number[] = [10, 12, 15, 15.5, 18, 18.3, 20, 22, 24];

export function designTable(year: WeatherYear, basesC = degreeDayBasesC): DesignTable {
  const { hours } = year;
  const air = year.dryBulbC.values;
  const dew = year.dewPointC.values;
  const ratio = new Float64Array(hours);
  const wet = new Float64Array(hours);
  for (let h = 0; h < hours; h++) {
    ratio[h] = humidityRatio(saturationPressurePa(dew[h]), year.pressurePa.values[h]);
    wet[h] = Math.min(air[h], wetBulbC(air[h], ratio[h], year.pressurePa.values[h]));
  }
  const point = (values: Float64Array, sorted: Float64Array, share: number): DesignPoint => {
    const valueC = exceeded(sorted, share);
    return { share, valueC, ...coincident(year, values, valueC, ratio, wet) };
  };
  const points = (values: Float64Array, shares: readonly number[]) => {
    const sorted = Float64Array.from(values).sort();
    return shares.map((share) => point(values, sorted, share));
  };
  const daily = dailyMeansC(air);
  const spells = (which: 'coldest' | 'hottest') =>
    spellLengths.flatMap((days) => spellOf(daily, days, which) ?? []);
  const warm = [0.004, 0.01, 0.02];
  return {
    heating: points(air, [0.996, 0.99]),
    cooling: points(air, warm),
    evaporation: points(wet, warm),
    dehumidification: points(dew, warm),
    coldest: spells('coldest'),
    hottest: spells('hottest'),
    winter: winterDesign(year, daily),
    degreeDays: basesC.map((baseC) => ({
      baseC,
      heatingKd: degreeDaysKd(daily, baseC, 'below'),
      coolingKd: degreeDaysKd(daily, baseC, 'above'),
    })),
  };
}

/** Means over the hours within half a kelvin of a value, or of the nearest one where none are. */
function coincident(
  year: WeatherYear,
  values: Float64Array,
  valueC: number,
  ratio: Float64Array,
  wet: Float64Array,
) {
  const nearest = values.reduce(
    (least, v) => Math.min(least, Math.abs(v - valueC)),
    Number.POSITIVE_INFINITY,
  );
  const width = Math.max(0.5, nearest + 1e-9);
  const sum = { air: 0, wet: 0, ratio: 0, wind: 0, east: 0, north: 0 };
  let n = 0;
  for (let h = 0; h < year.hours; h++) {
    if (Math.abs(values[h] - valueC) > width) continue;
    n++;
    sum.air += year.dryBulbC.values[h];
    sum.wet += wet[h];
    sum.ratio += ratio[h];
    const wind = year.windMPerS.values[h];
    const from = (year.windFromDeg.values[h] * Math.PI) / 180;
    sum.wind += wind;
    sum.east += wind * Math.sin(from);
    sum.north += wind * Math.cos(from);
  }
  const isEven = Math.hypot(sum.east, sum.north) < 0.02 * Math.max(sum.wind, 1e-9);
  const dryBulbC = sum.air / n;
  return {
    hours: n,
    coincident: {
      dryBulbC,
      wetBulbC: sum.wet / n,
      humidityRatio: sum.ratio / n,
      windMPerS: sum.wind / n,
      windFromDeg: isEven
        ? Number.NaN
        : ((Math.atan2(sum.east, sum.north) * 180) / Math.PI + 360) % 360,
      enthalpyJPerKg: enthalpyJPerKg(dryBulbC, sum.ratio / n),
    },
  };
}

/**
 * Winter design temperatures as ISO 15927-5 takes them from many years: means over 1 to 4 days, here the
 * lowest of the table (the standard takes the value that comes once a year on average from 20 years and
 * more), with the mean wind of those days.
 */
function winterDesign(year: WeatherYear, daily: Float64Array): WinterDesign[] {
  return [1, 2, 3, 4].flatMap((days) => {
    const spell = spellOf(daily, days, 'coldest');
    if (!spell) return [];
    let wind = 0;
    const from = spell.firstDay * 24;
    for (let h = from; h < from + days * 24; h++) wind += year.windMPerS.values[h];
    return [{ days, spell, windMPerS: wind / (days * 24) }];
  });
}
