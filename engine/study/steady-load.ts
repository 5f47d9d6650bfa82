// Steady design heat load of every room in the form of EN 12831-1, from the building's own fabric.
//
//   Φ = (H_T + H_V)·(θ_i − θ_e) + A·f_RH,   no sun, no gains
//
// A sizing aid: design temperatures, least air flows and supplements come from the national annex, and
// a licensed practitioner answers for the result.
import type { WeatherYear } from '../../weather/index.ts';
import { scheduledValues, stepClock } from '../assembly/index.ts';
import type { Building, Room, Scheduled, Surface } from '../building/index.ts';
import { designGroundWPerK, designHeatLoad } from '../physics/index.ts';
import { extremeDay } from './spell-job.ts';
import { heightFactor, shieldFactor, ventilationWPerK } from './steady-air.ts';
import { groundUWPerM2K, openingUWPerM2K, surfaceUWPerM2K } from './u-values.ts';

export interface SteadyLoadOptions {
  readonly designOutdoorC: number;
  /** Least outdoor air of every room, as air changes; 0.5 is EN 12831's usual value for dwellings (from memory). */
  readonly leastAirChangesPerH: number;
  /** Supplement for warming up after a set-back, f_RH; 0 without one. */
  readonly reheatWPerM2: number;
}

/** One element's part in the loss. */
export interface SteadyElement {
  readonly name: string;
  readonly towards: 'outdoors' | 'ground' | 'other room' | 'given temperature';
  readonly areaM2: number;
  readonly uValueWPerM2K: number;
  /** (θ_i − θ_beyond)/(θ_i − θ_e); 1 to outdoors. */
  readonly temperatureFactor: number;
  readonly lossW: number;
}

export interface SteadyRoom {
  readonly room: string;
  readonly name: string;
  readonly insideC: number;
  readonly heated: boolean;
  readonly transmissionW: number;
  readonly ventilationW: number;
  readonly reheatW: number;
  /** 0 or more. */
  readonly totalW: number;
  readonly airChangesPerH: number;
  readonly elements: readonly SteadyElement[];
}

export interface SteadyLoad {
  readonly method: string;
  readonly designOutdoorC: number;
  readonly yearMeanC: number;
  readonly rooms: readonly SteadyRoom[];
  /** Of heated rooms; heat between them cancels. */
  readonly totalW: number;
  readonly assumptions: readonly string[];
}

interface Scene {
  readonly building: Building;
  readonly options: SteadyLoadOptions;
  readonly yearMeanC: number;
  readonly coldestGroundMonth: number;
  readonly meanWindMPerS: number;
  readonly insideC: ReadonlyMap<string, number>;
  /** Mean over the coldest day of a scheduled value. */
  readonly onColdestDay: (value: Scheduled) => number;
}

export function steadyLoad(
  building: Building,
  weather: WeatherYear,
  options: SteadyLoadOptions,
): SteadyLoad {
  const mean = (values: Float64Array) => values.reduce((a, b) => a + b, 0) / values.length;
  const day = extremeDay(weather, -1);
  const clock = stepClock(
    building.calendar,
    { year: weather.year, hours: weather.hours, utcOffsetH: weather.site.utcOffsetH },
    3600,
  );
  const dayOf = (value: Scheduled, days: number) => {
    const from = Math.max(0, day - days + 1) * 24;
    return scheduledValues(building, value, clock).subarray(from, (day + 1) * 24);
  };
  const insideC = new Map(
    building.rooms.map((room) => [
      room.id,
      // The day's set-point, not that of the set-back.
      room.heating ? Math.max(...dayOf(room.heating.setPointC, 7)) : options.designOutdoorC,
    ]),
  );
  const base: Scene = {
    building,
    options,
    yearMeanC: mean(weather.dryBulbC.values),
    coldestGroundMonth: Number(clock.monthDay[day].slice(0, 2)) - 1,
    meanWindMPerS: mean(weather.windMPerS.values),
    insideC,
    onColdestDay: (value) => mean(dayOf(value, 1)),
  };
  settleUnheated(base, insideC);
  const rooms = building.rooms.map((room) => steadyRoom(base, room));
  return {
    method:
      'EN 12831-1:2017, steady design load in its standard form; U-values by ISO 6946, EN 673, ISO 10077-1, ISO 13370',
    designOutdoorC: options.designOutdoorC,
    yearMeanC: base.yearMeanC,
    rooms,
    totalW: rooms.reduce((sum, room) => sum + (room.heated ? room.totalW : 0), 0),
    assumptions: assumptionsOf(base),
  };
}

/** Rooms without heater take the temperature at which what they lose and gain is equal. */
function settleUnheated(scene: Scene, insideC: Map<string, number>): void {
  const unheated = scene.building.rooms.filter((room) => !room.heating);
  const { designOutdoorC } = scene.options;
  for (let round = 0; round < 200; round++) {
    let moved = 0;
    for (const room of unheated) {
      // Losses fall straight with the temperature: two readings give its zero.
      const at = (c: number) => {
        insideC.set(room.id, c);
        const { transmissionW, ventilationW } = steadyRoom(scene, room);
        return transmissionW + ventilationW;
      };
      const before = insideC.get(room.id) ?? designOutdoorC;
      const [low, high] = [at(before + 1), at(before + 2)];
      const next = high === low ? before : before + 1 - low / (high - low);
      insideC.set(room.id, next);
      moved = Math.max(moved, Math.abs(next - before));
    }
    if (moved < 1e-9) return;
  }
}

function steadyRoom(scene: Scene, room: Room): SteadyRoom {
  const { options } = scene;
  const insideC = insideOf(scene, room.id);
  const elements = room.surfaces.flatMap((surface) => surfaceElements(scene, room, surface));
  elements.push(...bridgeElements(scene, room));
  const transmissionW = elements.reduce((sum, element) => sum + element.lossW, 0);
  const airWPerK = ventilationWPerK(
    {
      building: scene.building,
      leastAirChangesPerH: options.leastAirChangesPerH,
      onColdestDay: scene.onColdestDay,
    },
    room,
  );
  const load = designHeatLoad(
    0,
    airWPerK,
    insideC,
    options.designOutdoorC,
    room.floorAreaM2,
    room.heating ? options.reheatWPerM2 : 0,
  );
  return {
    room: room.id,
    name: room.name,
    insideC,
    heated: room.heating !== undefined,
    transmissionW,
    ventilationW: load.ventilationW,
    reheatW: load.reheatW,
    totalW: Math.max(0, transmissionW + load.ventilationW + load.reheatW),
    airChangesPerH: airWPerK / 0.34 / room.volumeM3,
    elements,
  };
}

const insideOf = (scene: Scene, room: string): number =>
  scene.insideC.get(room) ?? scene.options.designOutdoorC;

function surfaceElements(scene: Scene, room: Room, surface: Surface): SteadyElement[] {
  const { building, options } = scene;
  const { boundary } = surface;
  if (boundary.kind === 'adiabatic') return [];
  const insideC = insideOf(scene, room.id);
  const glassM2 = surface.openings.reduce((sum, opening) => sum + opening.areaM2, 0);
  const towardsC = (beyondC: number) => (insideC - beyondC) / (insideC - options.designOutdoorC);
  const line = (
    name: string,
    towards: SteadyElement['towards'],
    areaM2: number,
    uValueWPerM2K: number,
    temperatureFactor: number,
  ): SteadyElement => ({
    name,
    towards,
    areaM2,
    uValueWPerM2K,
    temperatureFactor,
    lossW: areaM2 * uValueWPerM2K * temperatureFactor * (insideC - options.designOutdoorC),
  });
  const openings = surface.openings.map((opening) =>
    line(
      `${surface.id} ${opening.id}`,
      'outdoors',
      opening.areaM2,
      openingUWPerM2K(building, opening, surface.tiltDeg),
      1,
    ),
  );
  const areaM2 = surface.areaM2 - glassM2;
  const u = surfaceUWPerM2K(building, surface);
  switch (boundary.kind) {
    case 'outdoors':
      return [line(surface.id, 'outdoors', areaM2, u, 1), ...openings];
    case 'room':
      return [line(surface.id, 'other room', areaM2, u, towardsC(insideOf(scene, boundary.room)))];
    case 'fixed': {
      const beyondC = scene.onColdestDay(boundary.temperatureC);
      return [line(surface.id, 'given temperature', areaM2, u, towardsC(beyondC))];
    }
    case 'ground': {
      const { temperatureC } = boundary;
      const groundC =
        typeof temperatureC === 'number' ? temperatureC : temperatureC[scene.coldestGroundMonth];
      return [line(surface.id, 'ground', areaM2, u, towardsC(groundC))];
    }
    case 'ground-contact': {
      const own = groundUWPerM2K(building, surface, boundary.contact, scene.meanWindMPerS);
      if (own === null) return [line(surface.id, 'ground', areaM2, u, towardsC(scene.yearMeanC))];
      const wPerK = designGroundWPerK(
        areaM2,
        own,
        insideC,
        options.designOutdoorC,
        scene.yearMeanC,
        1,
      );
      return [line(surface.id, 'ground', areaM2, own, areaM2 > 0 ? wPerK / (areaM2 * own) : 0)];
    }
    default:
      return boundary satisfies never;
  }
}

function bridgeElements(scene: Scene, room: Room): SteadyElement[] {
  const insideC = insideOf(scene, room.id);
  const { designOutdoorC } = scene.options;
  return room.thermalBridges.map((bridge) => {
    const wPerK =
      bridge.kind === 'linear' ? bridge.lengthM * bridge.psiWPerMK : bridge.count * bridge.chiWPerK;
    const { beyond } = bridge;
    const whole = insideC - designOutdoorC;
    const factor =
      beyond.kind === 'outdoors'
        ? beyond.reductionShare
        : beyond.kind === 'fixed'
          ? (insideC - scene.onColdestDay(beyond.temperatureC)) / whole
          : (insideC -
              (typeof beyond.temperatureC === 'number'
                ? beyond.temperatureC
                : beyond.temperatureC[scene.coldestGroundMonth])) /
            whole;
    return {
      name: `thermal bridge ${bridge.id}`,
      towards:
        beyond.kind === 'outdoors'
          ? 'outdoors'
          : beyond.kind === 'fixed'
            ? 'given temperature'
            : 'ground',
      areaM2: 1,
      uValueWPerM2K: wPerK,
      temperatureFactor: factor,
      lossW: wPerK * factor * whole,
    };
  });
}

function assumptionsOf({ building, options }: Scene): string[] {
  const list = [
    `Every room gets at least ${options.leastAirChangesPerH} air changes an hour of outdoor air, by leaks, windows or fans.`,
    'Rooms are at the highest set-point of the week before the coldest day; fans and schedules stand as on that day.',
    'Sun, people, lights and equipment give no heat on the design day.',
  ];
  const unheated = building.rooms.filter((room) => !room.heating);
  if (unheated.length > 0)
    list.push(
      `Without heater, so at the temperature that comes by itself: ${unheated.map((room) => room.name).join(', ')}.`,
    );
  if (building.rooms.some((room) => room.leakage))
    list.push(
      `Leaks on the design day by 2·V·n50·e·ε with e ${shieldFactor} and ε ${heightFactor}.`,
    );
  if (building.rooms.some((room) => room.airOpenings.length > 0))
    list.push('Windows that people open are shut on the design day.');
  return list;
}
