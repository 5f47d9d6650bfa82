// Radiation on a tilted plane at every step, in the parts that shading treats differently.
import { perezLeastCosZenith } from '../sky/perez.ts';
import { hayDaviesLeastCosZenith } from '../sky/simple-skies.ts';
import { radPerDeg } from '../sun/ephemeris.ts';
import type { WeatherSteps } from './steps.ts';

export type SkyModel = 'perez' | 'hay-davies' | 'isotropic';

export interface Plane {
  /** 0 flat, 90 upright, 180 facing down. */
  readonly tiltDeg: number;
  /** That it faces, clockwise from north. */
  readonly azimuthDeg: number;
  /** 0 to 1; an array gives it for each step. */
  readonly groundReflectance: number | Float64Array;
  /** Perez 1990 where absent. */
  readonly skyModel?: SkyModel;
  /** Adds the circumsolar light to the beam, as it comes from nearly the same place. */
  readonly circumsolarAsBeam?: boolean;
}

/** Means over the steps, each `count` long; nothing around the plane casts shade. */
export interface PlaneIrradiance {
  /** Straight from the sun; with the circumsolar light where that was asked for. */
  readonly beamWPerM2: Float64Array;
  /** From around the sun; all 0 where it was added to the beam. */
  readonly circumsolarWPerM2: Float64Array;
  /** From the even dome. */
  readonly isotropicWPerM2: Float64Array;
  /** From the band along the horizon; may be negative, never below minus the other sky parts. */
  readonly horizonWPerM2: Float64Array;
  readonly groundWPerM2: Float64Array;
  /** Between sun and normal in the middle of the sunlit part; negative behind the plane. */
  readonly cosIncidence: Float64Array;
  readonly circumsolarIsBeam: boolean;
}

/**
 * Low-sun guard: beam reaches the plane only in steps with the sun up, at the sine of the altitude
 * that it really has; the circumsolar part divides by no less than the cosine of 85 degrees (Perez)
 * or 89 (Hay and Davies). The ground reflects the table's global radiation.
 */
export function planeIrradiance(steps: WeatherSteps, plane: Plane): PlaneIrradiance {
  const { count, sun, ghiWPerM2, dniWPerM2, dhiWPerM2, circumsolarShare, horizonShare } = steps;
  const { east, north, up, sunlitShare, extraterrestrialWPerM2 } = sun;
  const model = plane.skyModel ?? 'perez';
  const asBeam = plane.circumsolarAsBeam === true;
  const tilt = plane.tiltDeg * radPerDeg;
  const azimuth = plane.azimuthDeg * radPerDeg;
  const normalEast = Math.sin(tilt) * Math.sin(azimuth);
  const normalNorth = Math.sin(tilt) * Math.cos(azimuth);
  const normalUp = Math.cos(tilt);
  const dome = (1 + normalUp) / 2;
  const below = (1 - normalUp) / 2;
  const sinTilt = Math.sin(tilt);
  const reflects = plane.groundReflectance;
  const beam = new Float64Array(count);
  const circumsolar = new Float64Array(count);
  const isotropic = new Float64Array(count);
  const horizon = new Float64Array(count);
  const ground = new Float64Array(count);
  const cosIncidence = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    const cosine = east[k] * normalEast + north[k] * normalNorth + up[k] * normalUp;
    cosIncidence[k] = cosine;
    const diffuse = dhiWPerM2[k];
    const global = ghiWPerM2[k];
    if (diffuse === 0 && global === 0 && dniWPerM2[k] === 0) continue;
    const rho = typeof reflects === 'number' ? reflects : reflects[k];
    ground[k] = rho * global * below;
    if (sunlitShare[k] === 0) {
      isotropic[k] = diffuse * dome;
      continue;
    }
    const facing = Math.max(0, cosine);
    beam[k] = dniWPerM2[k] * facing;
    let around = 0;
    let least = perezLeastCosZenith;
    if (model === 'perez') {
      around = circumsolarShare[k];
      horizon[k] = diffuse * horizonShare[k] * sinTilt;
    } else if (model === 'hay-davies') {
      around = Math.min(1, dniWPerM2[k] / (extraterrestrialWPerM2[k] * sunlitShare[k]));
      least = hayDaviesLeastCosZenith;
    }
    isotropic[k] = diffuse * (1 - around) * dome;
    const bright = (diffuse * around * facing) / Math.max(up[k], least);
    if (horizon[k] < -isotropic[k] - bright) horizon[k] = -isotropic[k] - bright;
    if (asBeam) beam[k] += bright;
    else circumsolar[k] = bright;
  }
  return {
    beamWPerM2: beam,
    circumsolarWPerM2: circumsolar,
    isotropicWPerM2: isotropic,
    horizonWPerM2: horizon,
    groundWPerM2: ground,
    cosIncidence,
    circumsolarIsBeam: asBeam,
  };
}
