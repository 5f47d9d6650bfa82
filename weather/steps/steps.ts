// The weather brought to the steps of a march: states at the ends of steps, radiation as means.
import { humidityRatio, saturationPressurePa } from '../air/moist-air.ts';
import { kastenYoungAirMass } from '../sky/air-mass.ts';
import { hourlySky, type SkyMethod } from '../sky/hourly-sky.ts';
import { perezBin, perezCircumsolar, perezClearness, perezHorizon } from '../sky/perez.ts';
import type { Site, WeatherNote, WeatherYear } from '../weather-year.ts';
import { fineDirection, fineRadiation, fineStates } from './fine.ts';
import { spreadRadiation } from './spread.ts';
import { atStepEnds, directionInSteps, momentInHour } from './states.ts';
import { type SunTrack, sunTrack } from './sun-track.ts';

/**
 * States are values at the ends of steps, `count + 1` long: index 0 is the start of the year, k the
 * end of step k - 1. Radiation, wind direction and the sun belong to steps, `count` long.
 */
export interface WeatherSteps {
  readonly site: Site;
  readonly hours: number;
  readonly stepS: number;
  readonly count: number;
  readonly dryBulbC: Float64Array;
  readonly dewPointC: Float64Array;
  readonly humidityRatio: Float64Array;
  readonly pressurePa: Float64Array;
  readonly windMPerS: Float64Array;
  readonly skyTemperatureC: Float64Array;
  /** What the sky's temperature was computed from, for the report. */
  readonly skyMethod: string;
  readonly windFromDeg: Float64Array;
  readonly ghiWPerM2: Float64Array;
  readonly dniWPerM2: Float64Array;
  readonly dhiWPerM2: Float64Array;
  /** The table's ground reflectance, where it has one. */
  readonly albedo?: Float64Array;
  readonly sun: SunTrack;
  /** Perez 1990: circumsolar share of the diffuse light and strength of the horizon band; 0 at night. */
  readonly circumsolarShare: Float64Array;
  readonly horizonShare: Float64Array;
  readonly notes: readonly WeatherNote[];
}

export interface WeatherStepsOptions {
  readonly skyMethod?: SkyMethod;
  /** The sun at this step from an earlier call, for the same site and years. */
  readonly sun?: SunTrack;
}

/** @param stepS seconds, a divisor of 3600 */
export function weatherSteps(
  year: WeatherYear,
  stepS: number,
  options: WeatherStepsOptions = {},
): WeatherSteps {
  const perHour = 3600 / stepS;
  if (!Number.isInteger(perHour)) throw new Error(`a step of ${stepS} s does not divide an hour`);
  const sun = options.sun ?? sunTrack(year, stepS);
  if (sun.stepS !== stepS || sun.count !== year.hours * perHour)
    throw new Error('the sun given was computed for other steps');
  const fine = stepS < 3600 ? year.fine : undefined;
  const ends = (quantity: 'dryBulbC' | 'dewPointC' | 'pressurePa' | 'windMPerS') => {
    const own = fine?.columns[quantity];
    if (fine && own) return fineStates(own, fine.intervalS, stepS, sun.count);
    return atStepEnds(year[quantity].values, momentInHour(year[quantity]), perHour);
  };
  const spread = (quantity: 'ghiWPerM2' | 'dniWPerM2' | 'dhiWPerM2') => {
    const own = fine?.columns[quantity];
    if (fine && own) return { means: fineRadiation(own, fine.intervalS, sun), guardedHours: 0 };
    return spreadRadiation(year[quantity], sun);
  };

  const sky = hourlySky(year, options.skyMethod);
  const dewPointC = ends('dewPointC');
  const pressurePa = ends('pressurePa');
  const ratio = dewPointC.map((dew, k) => humidityRatio(saturationPressurePa(dew), pressurePa[k]));
  const ghi = spread('ghiWPerM2');
  const dni = spread('dniWPerM2');
  const dhi = spread('dhiWPerM2');
  const notes: WeatherNote[] = [];
  const guarded = Math.max(ghi.guardedHours, dni.guardedHours, dhi.guardedHours);
  if (guarded > 0)
    notes.push({
      kind: 'assumption',
      text: `${guarded} hours hold radiation with less than 3 minutes of sun above the horizon; it is laid evenly over the hour.`,
      count: guarded,
    });
  const steps: WeatherSteps = {
    site: year.site,
    hours: year.hours,
    stepS,
    count: sun.count,
    dryBulbC: ends('dryBulbC'),
    dewPointC,
    humidityRatio: ratio,
    pressurePa,
    windMPerS: ends('windMPerS'),
    skyTemperatureC: atStepEnds(sky.temperatureC, momentInHour(sky.like), perHour),
    skyMethod: sky.method,
    windFromDeg: fine?.columns.windFromDeg
      ? fineDirection(fine.columns.windFromDeg, fine.intervalS, stepS, sun.count)
      : directionInSteps(year.windFromDeg.values, momentInHour(year.windFromDeg), perHour),
    ghiWPerM2: ghi.means,
    dniWPerM2: dni.means,
    dhiWPerM2: dhi.means,
    sun,
    ...perezShares(sun, dni.means, dhi.means),
    notes,
  };
  return year.albedo ? { ...steps, albedo: repeated(year.albedo.values, perHour) } : steps;
}

function repeated(values: Float64Array, perHour: number): Float64Array {
  const all = new Float64Array(values.length * perHour);
  for (let k = 0; k < all.length; k++) all[k] = values[Math.floor(k / perHour)];
  return all;
}

/** F1 and F2 of each step. They depend on sun and sky only, so all planes share them. */
function perezShares(sun: SunTrack, dni: Float64Array, dhi: Float64Array) {
  const circumsolarShare = new Float64Array(sun.count);
  const horizonShare = new Float64Array(sun.count);
  for (let k = 0; k < sun.count; k++) {
    const lit = sun.sunlitShare[k];
    if (lit === 0 || !(dhi[k] > 0)) continue;
    const zenithDeg = 90 - sun.altitudeDeg[k];
    const zenithRad = (zenithDeg * Math.PI) / 180;
    const strength = dhi[k] / lit; // while the sun is up
    const brightness = (strength * kastenYoungAirMass(zenithDeg)) / sun.extraterrestrialWPerM2[k];
    const bin = perezBin(perezClearness(dhi[k], dni[k], zenithRad));
    circumsolarShare[k] = perezCircumsolar(bin, brightness, zenithRad);
    horizonShare[k] = perezHorizon(bin, brightness, zenithRad);
  }
  return { circumsolarShare, horizonShare };
}
