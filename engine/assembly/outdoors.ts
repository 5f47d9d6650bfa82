// The world outside as boundary nodes and series: air, sky, wind at each face, sun on each plane.
import {
  type PlaneIrradiance,
  planeIrradiance,
  type SunTrack,
  type WeatherSteps,
} from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import {
  forcedFilmWPerM2K,
  isWindward,
  orderedHorizon,
  roughPlateFilmWPerM2K,
  type ShadedWindow,
  standardOutsideFilmWPerM2K,
  terrains,
  windAtHeightMPerS,
} from '../physics/index.ts';
import type { NetworkBuilder } from './network-builder.ts';
import { type FaceSun, faceSun } from './shading.ts';

/** Where a face looks. */
interface Facing {
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
}

/** What faces need to know of the outside; each series is computed once and shared. */
export interface Outdoors {
  /** Steps in the year. */
  readonly count: number;
  readonly airNode: number;
  readonly skyNode: number;
  readonly sun: SunTrack;
  /** Wind-driven film of a face, as a series of W/m²K; the whole film where `hasNaturalTerm` is false. */
  filmSeries(face: { heightM: number; tiltDeg: number; azimuthDeg: number }): number;
  readonly hasNaturalTerm: boolean;
  /** Sun on a face, with what shades it; skyline included. */
  sunOn(face: Facing, shaded: ShadedWindow | null): FaceSun;
  /** All sunlight on a face, as a series of W/m²; faces alike share one. */
  totalSunSeries(face: Facing, shaded: ShadedWindow | null, name: string): number;
}

export function outdoors(
  building: Building,
  steps: WeatherSteps,
  builder: NetworkBuilder,
): Outdoors {
  const method = building.physics.outsideConvection;
  const about = (name: string, what: string) => ({
    name,
    what,
    method: 'weather table',
    inputs: {},
  });
  const airNode = builder.node(
    about('outdoor air', 'air outside, dry bulb'),
    0,
    builder.series('dry bulb', 'linear', steps.dryBulbC),
  );
  const skyNode = builder.node(
    about('sky', 'sky, as a black body of its effective temperature'),
    0,
    builder.series('sky temperature', 'linear', steps.skyTemperatureC),
  );
  const films = new Map<string, number>();
  const planes = new Map<string, PlaneIrradiance>();
  const sunlight = new Map<string, number>();
  const horizon = orderedHorizon(building.site.horizon);
  const terrain = terrains[building.site.terrain];

  function film(heightM: number, tiltDeg: number, azimuthDeg: number): Float64Array {
    const values = new Float64Array(steps.count);
    for (let k = 0; k < steps.count; k++) {
      const stationMPerS = (steps.windMPerS[k] + steps.windMPerS[k + 1]) / 2;
      const windMPerS = windAtHeightMPerS(stationMPerS, heightM, terrain);
      if (method === 'iso-6946') values[k] = standardOutsideFilmWPerM2K(windMPerS);
      else if (method === 'mcadams') values[k] = roughPlateFilmWPerM2K(windMPerS);
      else
        values[k] = forcedFilmWPerM2K(
          windMPerS,
          isWindward(steps.windFromDeg[k], azimuthDeg, tiltDeg),
        );
    }
    return values;
  }

  function planeOf({ tiltDeg, azimuthDeg }: Facing): PlaneIrradiance {
    const key = `${tiltDeg} ${azimuthDeg}`;
    let plane = planes.get(key);
    if (!plane) {
      plane = planeIrradiance(steps, {
        tiltDeg,
        azimuthDeg,
        groundReflectance: building.site.groundReflectance,
        skyModel: building.physics.diffuseSky,
        circumsolarAsBeam: true,
      });
      planes.set(key, plane);
    }
    return plane;
  }

  function sunOn(face: Facing, shaded: ShadedWindow | null): FaceSun {
    return faceSun(planeOf(face), face, shaded, horizon, steps.sun);
  }

  return {
    count: steps.count,
    airNode,
    skyNode,
    sun: steps.sun,
    hasNaturalTerm: method === 'yazdanian-klems',
    filmSeries({ heightM, tiltDeg, azimuthDeg }) {
      const key = `${heightM} ${tiltDeg} ${azimuthDeg}`;
      const known = films.get(key);
      if (known !== undefined) return known;
      const series = builder.series(
        `film at ${heightM} m, tilt ${tiltDeg}°, azimuth ${azimuthDeg}°`,
        'step',
        film(heightM, tiltDeg, azimuthDeg),
      );
      films.set(key, series);
      return series;
    },
    sunOn,
    totalSunSeries(face, shaded, name) {
      const key = `${face.tiltDeg} ${face.azimuthDeg} ${JSON.stringify(shaded)}`;
      const known = sunlight.get(key);
      if (known !== undefined) return known;
      const { beamWPerM2, diffuseWPerM2 } = sunOn(face, shaded);
      const total = beamWPerM2.map((beam, k) => beam + diffuseWPerM2[k]);
      const series = builder.series(name, 'step', total);
      sunlight.set(key, series);
      return series;
    },
  };
}
