// Columns that a series lacks, computed from those it has by published methods and marked as derived.
import { standardPressurePa } from '../air/atmosphere.ts';
import {
  dewPointC,
  dewPointFromHumidityC,
  humidityRatioFromWetBulb,
  relativeHumidityFromDewPoint,
  vapourPressurePa,
} from '../air/moist-air.ts';
import { type MappedQuantity, quantityWords } from '../map/mapping.ts';
import type { Quantity } from '../read/quantities.ts';
import { completeRadiation, type RadiationColumns } from '../repair/radiation.ts';
import { haurwitzWPerM2 } from '../sky/clear-sky.ts';
import { hourlySky } from '../sky/hourly-sky.ts';
import { skyInfraredWPerM2 } from '../sky/sky-temperature.ts';
import type { Stands, WeatherColumn, WeatherNote, WeatherYear } from '../weather-year.ts';
import { columnOf, type SeriesColumn, type WeatherSeries, withColumns } from './series.ts';
import { seriesSun } from './series-sun.ts';

export interface Derived {
  readonly series: WeatherSeries;
  readonly notes: readonly WeatherNote[];
  /** Quantities without which no year can be made. */
  readonly lacking: readonly string[];
}

/** Completes a series without gaps. */
export function deriveColumns(from: WeatherSeries): Derived {
  let series = from;
  const notes: WeatherNote[] = [];
  const lacking: string[] = [];
  const { count } = series;
  const has = (quantity: MappedQuantity) => columnOf(series, quantity);
  const put = (
    quantity: Quantity,
    values: Float64Array,
    stands: Stands,
    origin: 'derived' | 'assumed',
    text: string,
  ) => {
    series = withColumns(series, [
      { quantity, heading: quantityWords[quantity], stands, origin, values },
    ]);
    notes.push({ kind: 'assumption', text, count });
  };

  const air = has('dryBulbC');
  if (!has('pressurePa')) {
    const sea = has('seaLevelPressurePa');
    const height = series.site.elevationM;
    if (sea)
      put(
        'pressurePa',
        sea.values.map((p, k) => stationPressurePa(p, height, air?.values[k] ?? 15)),
        sea.stands,
        'derived',
        `Air pressure was computed from that reduced to sea level, for ${height} m (international barometric formula).`,
      );
    else {
      const standard = standardPressurePa(height);
      put(
        'pressurePa',
        new Float64Array(count).fill(standard),
        { kind: 'mean' },
        'assumed',
        `The table has no air pressure: ${Math.round(standard)} Pa of the standard atmosphere at ${height} m are taken.`,
      );
    }
  }
  const pressure = has('pressurePa');
  if (!air) lacking.push('air temperature');
  else if (pressure) deriveHumidity(air, pressure);
  deriveSun();
  if (!has('windMPerS')) lacking.push('wind speed');
  if (!has('windFromDeg'))
    put(
      'windFromDeg',
      new Float64Array(count),
      { kind: 'mean' },
      'assumed',
      'The table has no wind direction: wind is taken to come from the north.',
    );
  if (!has('skyCover') && !has('opaqueSkyCover') && !has('horizontalInfraredWPerM2')) deriveCloud();
  return { series, notes, lacking };

  function deriveHumidity(t: SeriesColumn, p: SeriesColumn): void {
    const humid = has('relativeHumidity');
    if (!has('dewPointC')) {
      const dew = (text: string, source: SeriesColumn, value: (k: number) => number) =>
        put(
          'dewPointC',
          Float64Array.from({ length: count }, (_, k) => Math.min(t.values[k], value(k))),
          source.stands,
          'derived',
          `Dew point was computed from ${text}.`,
        );
      const [wet, ratio, vapour] = [has('wetBulbC'), has('humidityRatio'), has('vapourPressurePa')];
      if (humid)
        dew('temperature and relative humidity', humid, (k) =>
          dewPointFromHumidityC(t.values[k], Math.max(0.001, humid.values[k])),
        );
      else if (vapour) dew('the vapour pressure', vapour, (k) => dewPointC(vapour.values[k]));
      else if (ratio)
        dew('humidity ratio and pressure', ratio, (k) =>
          dewPointC(vapourPressurePa(ratio.values[k], p.values[k])),
        );
      else if (wet)
        dew('dry and wet bulb', wet, (k) => {
          const x = humidityRatioFromWetBulb(
            t.values[k],
            Math.min(wet.values[k], t.values[k]),
            p.values[k],
          );
          return dewPointC(vapourPressurePa(Math.max(1e-6, x), p.values[k]));
        });
      else
        lacking.push('relative humidity, dew point, wet bulb, humidity ratio or vapour pressure');
    }
    const dew = has('dewPointC');
    if (dew && !humid)
      put(
        'relativeHumidity',
        t.values.map((c, k) => Math.min(1, relativeHumidityFromDewPoint(c, dew.values[k]))),
        dew.stands,
        'derived',
        'Relative humidity was computed from temperature and dew point.',
      );
  }

  function deriveSun(): void {
    const [ghi, dhi, flat] = [has('ghiWPerM2'), has('dhiWPerM2'), has('beamHorizontalWPerM2')];
    const one = ghi ?? dhi ?? flat ?? has('dniWPerM2');
    if (!one) {
      lacking.push('global radiation, or two of global, direct and diffuse');
      return;
    }
    const all: RadiationColumns = {
      ghi: ghi?.values,
      dni: has('dniWPerM2')?.values,
      dhi: dhi?.values,
    };
    if (all.ghi && all.dni && all.dhi) return;
    // Direct on the horizontal makes up for the one that is not there.
    if (flat && !all.ghi && all.dhi) all.ghi = all.dhi.map((d, k) => d + flat.values[k]);
    else if (flat && all.ghi && !all.dhi)
      all.dhi = all.ghi.map((g, k) => Math.max(0, g - flat.values[k]));
    const said = completeRadiation(all, seriesSun(series, one.stands));
    if (said === null) {
      lacking.push('global radiation, or two of global, direct and diffuse');
      return;
    }
    for (const [quantity, values] of [
      ['ghiWPerM2', all.ghi],
      ['dniWPerM2', all.dni],
      ['dhiWPerM2', all.dhi],
    ] as const)
      if (values && !has(quantity))
        series = withColumns(series, [
          {
            quantity,
            heading: quantityWords[quantity],
            stands: one.stands,
            origin: 'derived',
            values,
          },
        ]);
    notes.push({
      kind: 'assumption',
      text: said || 'Radiation was completed from the direct radiation on the horizontal.',
      count,
    });
  }

  /** G = G0 · (1 − 0.75·N^3.4) turned round; the night takes the cover of the day's ends. */
  function deriveCloud(): void {
    const ghi = has('ghiWPerM2');
    if (!ghi) return;
    const sun = seriesSun(series, ghi.stands);
    const cover = new Float64Array(count).fill(Number.NaN);
    for (let k = 0; k < count; k++) {
      if (sun.meanUp[k] < 0.17 || sun.sunlitShare[k] < 1) continue; // sun under 10 degrees
      const clear = haurwitzWPerM2((Math.acos(Math.min(1, sun.meanUp[k])) * 180) / Math.PI);
      const share = Math.min(1, Math.max(0.25, ghi.values[k] / clear));
      cover[k] = ((1 - share) / 0.75) ** (1 / 3.4);
    }
    fillBetween(cover);
    put(
      'skyCover',
      cover,
      ghi.stands,
      'derived',
      'Cloud cover was computed from global radiation over that of the clear sky (Kasten and Czeplak, Solar Energy 24, 1980, pp. 177-189) and carried through the night; the sky temperature follows from it.',
    );
  }
}

/** Straight lines across the gaps; the ends hold. All missing: half covered. */
function fillBetween(values: Float64Array): void {
  let last = -1;
  for (let k = 0; k < values.length; k++) {
    if (Number.isNaN(values[k])) continue;
    for (let i = last + 1; i < k; i++)
      values[i] =
        last < 0
          ? values[k]
          : values[last] + ((values[k] - values[last]) * (i - last)) / (k - last);
    last = k;
  }
  values.fill(last < 0 ? 0.5 : values[last], last + 1);
}

/**
 * Pressure at a height from that reduced to sea level: p = p0 · (1 − 0.0065·h / (T + 0.0065·h))^5.257.
 * Source: barometric formula of the ICAO standard atmosphere with the measured temperature.
 */
export function stationPressurePa(
  seaLevelPa: number,
  elevationM: number,
  dryBulbC: number,
): number {
  const fall = 0.0065 * elevationM;
  return seaLevelPa * (1 - fall / (dryBulbC + 273.15 + fall)) ** 5.257;
}

/** Infrared from the sky as the sky temperature of the year has it, for tables that hold none. */
export function derivedInfrared(year: WeatherYear): WeatherColumn {
  const sky = hourlySky(year);
  return {
    values: sky.temperatureC.map((t) => skyInfraredWPerM2(1, t)),
    stands: sky.like.stands,
    origin: 'derived',
  };
}
