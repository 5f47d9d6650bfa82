// Rooms that are one capacity and one conductance, or two of each, as projects: so that closed forms can
// be held against whole studies. Films are constant (ISO 6946), surfaces do not radiate, and what lies
// beyond them has a given temperature.
import type { Building } from '../../../engine/index.ts';
import { building, type Json, plainProject, plainYear } from '../assembly/plain-room.ts';

/** Of the room's air at sea level: dry air of 20 °C, 1006 J/kgK. */
const airJPerM3K = 1006 * (101_325 / (287.055 * 293.15));
const insideFilm = 1 / 2.5; // ISO 6946:2017 Annex C, horizontal flow, convection only
const beyondFilm = 0.13;

export const constantPhysics = { insideConvection: 'iso-6946' };

interface Wall {
  readonly id: string;
  readonly areaM2: number;
  readonly conductanceWPerK: number;
  readonly beyondC: number;
}

const construction = (id: string, layers: Json) => ({
  id,
  name: id,
  layers,
  insideEmissivity: 1e-9,
  outsideEmissivity: 1e-9,
});

const upright = (id: string, areaM2: number, boundary: Json) => ({
  id,
  construction: id,
  areaM2,
  tiltDeg: 90,
  azimuthDeg: 0,
  boundary,
});

/** A wall without mass that gives its conductance from the room's air to what lies beyond. */
function massless({ id, areaM2, conductanceWPerK, beyondC }: Wall) {
  const resistanceM2KPerW = areaM2 / conductanceWPerK - insideFilm - beyondFilm;
  return {
    surface: upright(id, areaM2, { kind: 'fixed', temperatureC: beyondC }),
    construction: construction(id, [{ resistanceM2KPerW }]),
  };
}

export interface LumpedSpec {
  readonly capacityJPerK: number;
  readonly conductanceWPerK: number;
  readonly outsideC: number;
  readonly gainW: number;
  /** Heating set-point, constant or a schedule of the project. */
  readonly setPointC: Json;
  readonly maxW?: number;
}

/** A room that is its air and one conductance. */
export function lumpedProject(spec: LumpedSpec, more: Json = {}): Json {
  const wall = massless({
    id: 'shell',
    areaM2: 2 * spec.conductanceWPerK,
    conductanceWPerK: spec.conductanceWPerK,
    beyondC: spec.outsideC,
  });
  const room = {
    id: 'room',
    name: 'Room',
    floorAreaM2: 50,
    volumeM3: spec.capacityJPerK / airJPerM3K,
    surfaces: [wall.surface],
    gains: [{ id: 'gain', kind: 'equipment', powerW: spec.gainW, radiantShare: 0 }],
    heating: {
      setPointC: spec.setPointC,
      ...(spec.maxW === undefined ? {} : { maxW: spec.maxW }),
    },
  };
  return plainProject([room], {
    physics: constantPhysics,
    constructions: [wall.construction],
    ...more,
  });
}

export interface TwoCapacitySpec {
  readonly airJPerK: number;
  readonly massJPerK: number;
  readonly betweenWPerK: number;
  readonly airToOutsideWPerK: number;
  readonly massToOutsideWPerK: number;
  readonly outsideC: number;
  readonly setPointC: number;
}

/** Air, a mass behind a film, and a conductance of each to what lies beyond. */
export function twoCapacityProject(spec: TwoCapacitySpec): Json {
  const areaM2 = 400;
  const thicknessM = 0.01;
  const out = spec.massToOutsideWPerK;
  const mass = {
    id: 'mass',
    name: 'Mass',
    conductivityWPerMK: 500,
    densityKgPerM3: spec.massJPerK / areaM2 / thicknessM / 1000,
    specificHeatJPerKgK: 1000,
  };
  const layers: Json[] = [
    { material: 'mass', thicknessM },
    { resistanceM2KPerW: areaM2 / spec.betweenWPerK - insideFilm },
  ];
  if (out > 0) layers.unshift({ resistanceM2KPerW: areaM2 / out - beyondFilm });
  const shell = massless({
    id: 'shell',
    areaM2: 200,
    conductanceWPerK: spec.airToOutsideWPerK,
    beyondC: spec.outsideC,
  });
  const beyond = out > 0 ? { kind: 'fixed', temperatureC: spec.outsideC } : { kind: 'adiabatic' };
  const room = {
    id: 'room',
    name: 'Room',
    floorAreaM2: 50,
    volumeM3: spec.airJPerK / airJPerM3K,
    surfaces: [shell.surface, upright('heavy', areaM2, beyond)],
    heating: { setPointC: spec.setPointC },
  };
  return plainProject([room], {
    physics: constantPhysics,
    materials: [mass],
    constructions: [shell.construction, construction('heavy', layers)],
  });
}

export const steadyWeather = (outdoorC: number) =>
  new Map([['w', plainYear({ dryBulbC: outdoorC })]]);

export function runsOf(project: Json, stepMinutes = 15) {
  const one: Building = building(project);
  return { building: one, weather: 'w', stepMinutes, refine: 1 };
}

export function finished<T>(steps: Generator<unknown, T>): T {
  let turn = steps.next();
  while (!turn.done) turn = steps.next();
  return turn.value;
}
