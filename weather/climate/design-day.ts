// A periodic design day: air between a highest and a lowest value after the handbook's daily shape,
// humidity held, and the sun of a clear sky.

import { standardPressurePa } from '../air/atmosphere.ts';
import {
  dewPointC,
  humidityRatioFromWetBulb,
  relativeHumidityFromDewPoint,
  vapourPressurePa,
} from '../air/moist-air.ts';
import { dateOfDay, dayNumber } from '../map/date-text.ts';
import { kastenYoungAirMass } from '../sky/air-mass.ts';
import { turbiditySky } from '../sky/clear-sky.ts';
import { sunTrack } from '../steps/sun-track.ts';
import type { Site } from '../weather-year.ts';

export interface DesignDay {
  /** 1 to 12, and the day of the month. */
  readonly month: number;
  readonly day: number;
  readonly maxDryBulbC: number;
  /** Highest less lowest of the day; 0 for a winter day held at its design value. */
  readonly rangeK: number;
  /** At the hour of the highest dry bulb; limited by saturation at the others. */
  readonly wetBulbC: number;
  readonly windMPerS: number;
  readonly windFromDeg: number;
  /** Linke turbidity: 2 very clear, 3 clear, 5 hazy; null: a day without sun. */
  readonly linkeTurbidity: number | null;
  /** Share of the clear sky's light that comes, 0 to 1; 1 where absent. */
  readonly clearShare?: number;
}

/** Means of the 24 hours. */
export interface DesignDayHours {
  readonly dryBulbC: Float64Array;
  readonly dewPointC: Float64Array;
  readonly relativeHumidity: Float64Array;
  readonly windMPerS: Float64Array;
  readonly windFromDeg: Float64Array;
  readonly ghiWPerM2: Float64Array;
  readonly dniWPerM2: Float64Array;
  readonly dhiWPerM2: Float64Array;
  readonly pressurePa: number;
}

/**
 * Share of the daily range below the highest value, for hours that end at 1 to 24 o'clock.
 * Source: ASHRAE Handbook of Fundamentals, chapter "Climatic design information", table "Fraction of
 * daily temperature range" (from memory).
 */
const shareBelow = [
  0.88, 0.92, 0.95, 0.98, 1, 0.98, 0.91, 0.74, 0.55, 0.38, 0.23, 0.13, 0.05, 0, 0, 0.06, 0.14, 0.24,
  0.39, 0.5, 0.59, 0.68, 0.75, 0.82,
];

/** @param year whose sun is taken */
export function designDayHours(site: Site, day: DesignDay, year = 2018): DesignDayHours {
  const pressurePa = standardPressurePa(site.elevationM);
  const dryBulbC = Float64Array.from(shareBelow, (share) => day.maxDryBulbC - share * day.rangeK);
  const ratio = humidityRatioFromWetBulb(
    day.maxDryBulbC,
    Math.min(day.wetBulbC, day.maxDryBulbC),
    pressurePa,
  );
  const dew = dewPointC(vapourPressurePa(Math.max(1e-6, ratio), pressurePa));
  const dews = dryBulbC.map((t) => Math.min(t, dew));
  const light = clearDay(site, day, pressurePa, year);
  return {
    dryBulbC,
    dewPointC: dews,
    relativeHumidity: dryBulbC.map((t, h) => Math.min(1, relativeHumidityFromDewPoint(t, dews[h]))),
    windMPerS: new Float64Array(24).fill(day.windMPerS),
    windFromDeg: new Float64Array(24).fill(day.windFromDeg),
    ...light,
    pressurePa,
  };
}

/** Hourly means of the clear sky after Ineichen and Perez, from steps of 5 minutes. */
function clearDay(site: Site, day: DesignDay, pressurePa: number, year: number) {
  const ghiWPerM2 = new Float64Array(24);
  const dniWPerM2 = new Float64Array(24);
  const dhiWPerM2 = new Float64Array(24);
  const { linkeTurbidity, clearShare = 1 } = day;
  if (linkeTurbidity === null) return { ghiWPerM2, dniWPerM2, dhiWPerM2 };
  const sourceYear = new Int16Array(8760).fill(year);
  const track = sunTrack({ site, hours: 8760, sourceYear }, 300);
  const at = (dayNumber(2018, day.month, day.day) - dayNumber(2018, 1, 1)) * 288;
  for (let s = 0; s < 288; s++) {
    const k = at + s;
    const lit = track.sunlitShare[k];
    if (lit === 0) continue;
    const zenithDeg = 90 - track.altitudeDeg[k];
    const mass = (kastenYoungAirMass(zenithDeg) * pressurePa) / 101325;
    const sky = turbiditySky(
      zenithDeg,
      track.extraterrestrialWPerM2[k],
      mass,
      linkeTurbidity,
      site.elevationM,
    );
    const weight = (lit * clearShare) / 12;
    const h = Math.floor(s / 12);
    ghiWPerM2[h] += sky.ghiWPerM2 * weight;
    dniWPerM2[h] += sky.dniWPerM2 * weight;
    dhiWPerM2[h] += sky.dhiWPerM2 * weight;
  }
  return { ghiWPerM2, dniWPerM2, dhiWPerM2 };
}

/** Day of the year, from 0, on a calendar of 365 days. */
export function dayIndexOf(month: number, day: number): number {
  return dayNumber(2018, month, day) - dayNumber(2018, 1, 1);
}

/** Month and day of a day of the year, on a calendar of 365 days. */
export function monthDayOf(dayIndex: number): { readonly month: number; readonly day: number } {
  const { month, day } = dateOfDay(dayNumber(2018, 1, 1) + dayIndex);
  return { month, day };
}
