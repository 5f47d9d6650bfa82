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
import type { Memory } from './memory.ts';
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
  /** Names all that the sun outside depends on, but for the face. */
  readonly sunKey: string;
  readonly memory: Memory;
  readonly airNode: number;
  readonly skyNode: number;
  /** Dry bulb, mean of each step. */
  readonly airC: Float64Array;
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
  memory: Memory,
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
  const stationMPerS = Float64Array.from(
    { length: steps.count },
    (_, k) => (steps.windMPerS[k] + steps.windMPerS[k + 1]) / 2,
  );
  let forced: { windward: Float64Array; leeward: Float64Array } | undefined;
  const films = new Map<string, number>();
  const sunlight = new Map<string, number>();
  const sunKey = `${steps.stepS} ${building.physics.diffuseSky} ${building.site.groundReflectance}`;
  const horizon = orderedHorizon(building.site.horizon);
  const terrain = terrains[building.site.terrain];

  function film(heightM: number, tiltDeg: number, azimuthDeg: number): Float64Array {
    const atHeight = windAtHeightMPerS(1, heightM, terrain); // the profile is linear in the wind
    if (method === 'iso-6946')
      return stationMPerS.map((v) => standardOutsideFilmWPerM2K(v * atHeight));
    if (method === 'constant') return stationMPerS.map(() => standardOutsideFilmWPerM2K(4));
    if (method === 'mcadams') return stationMPerS.map((v) => roughPlateFilmWPerM2K(v * atHeight));
    // Power laws: their value at the height is that at the station times that of the profile.
    const { windward, leeward } = stationFilms();
    const toWindward = forcedFilmWPerM2K(atHeight, true) / forcedFilmWPerM2K(1, true);
    const toLeeward = forcedFilmWPerM2K(atHeight, false) / forcedFilmWPerM2K(1, false);
    return windward.map((h, k) =>
      isWindward(steps.windFromDeg[k], azimuthDeg, tiltDeg)
        ? h * toWindward
        : leeward[k] * toLeeward,
    );
  }

  /** Wind-driven film of either kind at the station's wind, computed once. */
  function stationFilms(): { windward: Float64Array; leeward: Float64Array } {
    forced ??= {
      windward: stationMPerS.map((v) => forcedFilmWPerM2K(v, true)),
      leeward: stationMPerS.map((v) => forcedFilmWPerM2K(v, false)),
    };
    return forced;
  }

  function planeOf({ tiltDeg, azimuthDeg }: Facing): PlaneIrradiance {
    return memory.planes.of(`${sunKey} ${tiltDeg} ${azimuthDeg}`, () =>
      planeIrradiance(steps, {
        tiltDeg,
        azimuthDeg,
        groundReflectance: building.site.groundReflectance,
        skyModel: building.physics.diffuseSky,
        circumsolarAsBeam: true,
      }),
    );
  }

  function sunOn(face: Facing, shaded: ShadedWindow | null): FaceSun {
    const { tiltDeg, azimuthDeg } = face;
    const key = `${sunKey} ${tiltDeg} ${azimuthDeg} ${JSON.stringify([shaded, horizon])}`;
    return memory.faceSuns.of(key, () => faceSun(planeOf(face), face, shaded, horizon, steps.sun));
  }

  return {
    count: steps.count,
    sunKey,
    memory,
    airNode,
    skyNode,
    airC: Float64Array.from(
      { length: steps.count },
      (_, k) => (steps.dryBulbC[k] + steps.dryBulbC[k + 1]) / 2,
    ),
    sun: steps.sun,
    hasNaturalTerm: method === 'yazdanian-klems',
    filmSeries({ heightM, tiltDeg, azimuthDeg }) {
      const key = `${heightM} ${tiltDeg} ${azimuthDeg}`;
      const known = films.get(key);
      if (known !== undefined) return known;
      const series = builder.series(
        `film at ${heightM} m, tilt ${tiltDeg}°, azimuth ${azimuthDeg}°`,
        'step',
        memory.films.of(`${steps.stepS} ${method} ${building.site.terrain} ${key}`, () =>
          film(heightM, tiltDeg, azimuthDeg),
        ),
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
