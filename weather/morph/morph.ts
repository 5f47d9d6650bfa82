// A weather year moved to another climate by monthly changes, hour by hour: shift x + Δ, stretch α·x,
// and both, x + Δ + α·(x − mean of the month).
//
// Source: S. Belcher, J. Hacker, D. Powell, "Constructing design weather data for future climates",
// Building Services Engineering Research and Technology 26 (2005), pp. 49-61. The changes are the user's
// own. Differences to the paper: humidity is changed as vapour pressure and held below saturation;
// direct and diffuse are stretched with the global, so that the three stay closed.
import { dewPointC, relativeHumidityFromDewPoint, saturationPressurePa } from '../air/moist-air.ts';
import { monthStarts } from '../calendar.ts';
import { skyInfraredWPerM2, skyTemperatureFromInfraredC } from '../sky/sky-temperature.ts';
import type { WeatherColumn, WeatherNote, WeatherYear } from '../weather-year.ts';

/** Twelve values, January first; what is left out stays as it is. */
export interface MonthlyChanges {
  readonly name: string;
  /** Of the monthly mean temperature. */
  readonly meanDryBulbK?: readonly number[];
  /** Of the monthly means of the daily highest and lowest; they stretch the daily course. */
  readonly maxDryBulbK?: readonly number[];
  readonly minDryBulbK?: readonly number[];
  /** New over old vapour pressure. */
  readonly vapourFactor?: readonly number[];
  /** Change of relative humidity, −1 to 1; in place of the vapour's factor. */
  readonly relativeHumidityShift?: readonly number[];
  /** New over old global radiation. */
  readonly radiationFactor?: readonly number[];
  readonly windFactor?: readonly number[];
  readonly pressureShiftPa?: readonly number[];
  /** Change of cloud cover, −1 to 1. */
  readonly skyCoverShift?: readonly number[];
}

/** Faults of the changes themselves, as sentences; empty where they can be used. */
export function checkChanges(changes: MonthlyChanges): readonly string[] {
  const limits: Readonly<Record<string, readonly [number, number]>> = {
    meanDryBulbK: [-20, 20],
    maxDryBulbK: [-20, 20],
    minDryBulbK: [-20, 20],
    vapourFactor: [0.2, 3],
    relativeHumidityShift: [-0.5, 0.5],
    radiationFactor: [0.2, 2],
    windFactor: [0, 3],
    pressureShiftPa: [-5000, 5000],
    skyCoverShift: [-1, 1],
  };
  const said = Object.entries(changes).flatMap(([field, values]: readonly [string, unknown]) => {
    if (field === 'name') return [];
    const limit = limits[field];
    if (!limit)
      return [`${field}: no such change; expected one of ${Object.keys(limits).join(', ')}.`];
    if (!Array.isArray(values) || values.length !== 12)
      return [
        `${field}: found ${Array.isArray(values) ? values.length : 'no list of'} values, expected 12, January first.`,
      ];
    return values.flatMap((value: unknown, m) =>
      typeof value === 'number' && value >= limit[0] && value <= limit[1]
        ? []
        : [
            `${field}[${m}]: found ${String(value)}, expected a number from ${limit[0]} to ${limit[1]}.`,
          ],
    );
  });
  if ((changes.maxDryBulbK === undefined) !== (changes.minDryBulbK === undefined))
    said.push('maxDryBulbK and minDryBulbK go together: together they stretch the day.');
  if (changes.vapourFactor && changes.relativeHumidityShift)
    said.push('vapourFactor and relativeHumidityShift both change the humidity: give one of them.');
  return said;
}

/** @throws Error for changes that `checkChanges` complains of */
export function morph(year: WeatherYear, changes: MonthlyChanges): WeatherYear {
  const wrong = checkChanges(changes);
  if (wrong.length > 0) throw new Error(wrong.join(' '));
  const { hours } = year;
  const starts = monthStarts(hours);
  const monthOf = new Uint8Array(hours);
  for (let m = 0; m < 12; m++) monthOf.fill(m, starts[m], starts[m + 1]);
  const changed = (
    column: WeatherColumn,
    value: (x: number, m: number, h: number) => number,
  ): WeatherColumn => ({
    ...column,
    origin: 'derived',
    values: column.values.map((x, h) => value(x, monthOf[h], h)),
  });
  const times = (
    column: WeatherColumn,
    factor: readonly number[] | undefined,
    most = Number.POSITIVE_INFINITY,
  ) => (factor ? changed(column, (x, m) => Math.min(most, x * factor[m])) : column);

  const dryBulb = morphAir(year, changes, starts, changed);
  const dewPoint = morphDew(year, changes, dryBulb, changed);
  const isMoister = dewPoint !== year.dewPointC || dryBulb !== year.dryBulbC;
  const relativeHumidity = isMoister
    ? changed(year.relativeHumidity, (_, _m, h) =>
        Math.min(1, relativeHumidityFromDewPoint(dryBulb.values[h], dewPoint.values[h])),
      )
    : year.relativeHumidity;
  const { radiationFactor, pressureShiftPa, skyCoverShift } = changes;
  const cover = (column: WeatherColumn | undefined) =>
    column && skyCoverShift
      ? changed(column, (x, m) => Math.min(1, Math.max(0, x + skyCoverShift[m])))
      : column;
  const infrared = year.horizontalInfraredWPerM2;
  // The sky warms with the air: its temperature keeps its distance to it.
  const warmer =
    infrared && dryBulb !== year.dryBulbC
      ? changed(infrared, (x, _m, h) =>
          skyInfraredWPerM2(
            1,
            skyTemperatureFromInfraredC(x) + dryBulb.values[h] - year.dryBulbC.values[h],
          ),
        )
      : infrared;
  const note: WeatherNote = {
    kind: 'assumption',
    text: `The year was changed by "${changes.name}" (${Object.keys(changes)
      .filter((key) => key !== 'name')
      .join(
        ', ',
      )}) by shift and stretch after Belcher, Hacker and Powell (2005). It is a possible year, not a forecast.`,
    count: hours,
  };
  const { fine: _, skyCover, opaqueSkyCover, horizontalInfraredWPerM2: __, ...rest } = year;
  const [total, opaque] = [cover(skyCover), cover(opaqueSkyCover)];
  return {
    ...rest,
    form: `${year.form}, changed by ${changes.name}`,
    dryBulbC: dryBulb,
    dewPointC: dewPoint,
    relativeHumidity,
    windMPerS: times(year.windMPerS, changes.windFactor, 115),
    pressurePa: pressureShiftPa
      ? changed(year.pressurePa, (x, m) => x + pressureShiftPa[m])
      : year.pressurePa,
    ghiWPerM2: times(year.ghiWPerM2, radiationFactor),
    dniWPerM2: times(year.dniWPerM2, radiationFactor),
    dhiWPerM2: times(year.dhiWPerM2, radiationFactor),
    ...(total ? { skyCover: total } : {}),
    ...(opaque ? { opaqueSkyCover: opaque } : {}),
    ...(warmer ? { horizontalInfraredWPerM2: warmer } : {}),
    notes: [...year.notes, note],
  };
}

type Changed = (
  column: WeatherColumn,
  value: (x: number, m: number, h: number) => number,
) => WeatherColumn;

/** x + Δmean + α·(x − mean), α = (Δmax − Δmin) / (mean daily highest − mean daily lowest). */
function morphAir(
  year: WeatherYear,
  changes: MonthlyChanges,
  starts: readonly number[],
  changed: Changed,
): WeatherColumn {
  const { meanDryBulbK, maxDryBulbK, minDryBulbK } = changes;
  if (!meanDryBulbK && !maxDryBulbK) return year.dryBulbC;
  const air = year.dryBulbC.values;
  const months = Array.from({ length: 12 }, (_, m) => {
    let [sum, high, low] = [0, 0, 0];
    const days = (starts[m + 1] - starts[m]) / 24;
    for (let d = 0; d < days; d++) {
      const day = air.subarray(starts[m] + d * 24, starts[m] + d * 24 + 24);
      high += Math.max(...day) / days;
      low += Math.min(...day) / days;
      sum += day.reduce((total, t) => total + t, 0) / 24 / days;
    }
    const stretch =
      maxDryBulbK && minDryBulbK
        ? (maxDryBulbK[m] - minDryBulbK[m]) / Math.max(0.5, high - low)
        : 0;
    // Without a change of the mean of its own, that of highest and lowest moves the month.
    const shift = meanDryBulbK?.[m] ?? ((maxDryBulbK?.[m] ?? 0) + (minDryBulbK?.[m] ?? 0)) / 2;
    return { mean: sum, stretch, shift };
  });
  return changed(
    year.dryBulbC,
    (x, m) => x + months[m].shift + months[m].stretch * (x - months[m].mean),
  );
}

function morphDew(
  year: WeatherYear,
  changes: MonthlyChanges,
  air: WeatherColumn,
  changed: Changed,
): WeatherColumn {
  const { vapourFactor, relativeHumidityShift } = changes;
  if (relativeHumidityShift)
    return changed(year.dewPointC, (_, m, h) => {
      const share = Math.min(
        1,
        Math.max(0.01, year.relativeHumidity.values[h] + relativeHumidityShift[m]),
      );
      return Math.min(air.values[h], dewPointC(share * saturationPressurePa(air.values[h])));
    });
  if (!vapourFactor && air === year.dryBulbC) return year.dewPointC;
  return changed(year.dewPointC, (x, m, h) =>
    Math.min(
      air.values[h],
      vapourFactor ? dewPointC(saturationPressurePa(x) * vapourFactor[m]) : x,
    ),
  );
}
