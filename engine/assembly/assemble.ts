// Building + weather → Problem: nodes, links and drivers, each with its provenance.
//
// Room after room, then the air between them. Partitions are built with the first of their rooms and
// found again by the second.
import {
  dryAirDensityKgPerM3,
  standardPressurePa,
  type WeatherYear,
  weatherSteps,
  withDiffuseSplit,
} from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import type { Problem } from '../network/index.ts';
import { addRoomAir } from './air-between.ts';
import { type AirFlow, type AirProperties, type AirSite, airSite } from './air-site.ts';
import type { Chain, Fineness } from './fabric.ts';
import { groundClimateOnce } from './ground-climate.ts';
import { emptyMemory, type Memory, turnMemory } from './memory.ts';
import { NetworkBuilder } from './network-builder.ts';
import { outdoors } from './outdoors.ts';
import { addRoom } from './room.ts';
import type { RoomParts } from './room-parts.ts';
import { stepClock } from './step-clock.ts';

/** How to cut the year and the walls. */
export interface AssemblyOptions {
  /** A divisor of 60, or 60. */
  readonly stepMinutes: number;
  /** Multiplies the cells of every layer. */
  readonly refine: number;
  /** Kept from one assembly to the next by whoever runs many; without it nothing is kept. */
  readonly memory?: Memory | undefined;
  /** Set-points of heating by room at both ends of every step, in place of the schedule's. */
  readonly heatingRamps?: ReadonlyMap<string, Float64Array>;
  /** Shares over which coverings are drawn by the room's temperature, hour by hour, by window. */
  readonly drawnByRoom?: ReadonlyMap<string, Float64Array>;
}

export interface Assembly {
  readonly building: Building;
  readonly problem: Problem;
  readonly rooms: readonly RoomParts[];
  readonly outdoorNode: number;
  /** Outdoor air step by step, and the streams of air between rooms and from outdoors. */
  readonly airSite: AirSite;
  readonly airFlows: readonly AirFlow[];
  readonly provenance: ReturnType<NetworkBuilder['provenance']>;
  /** What was assumed on the way, as sentences. */
  readonly assumptions: readonly string[];
  /** Dangers that show before the run, as sentences. */
  readonly cautions: readonly string[];
}

const warmUp = { days: 7, toleranceK: 0.01, maxPasses: 40 };

/** Common volumetric basis of all air flows: dry air at 20 °C under the site's standard pressure. */
function siteAir(elevationM: number): AirProperties {
  const pressurePa = standardPressurePa(elevationM);
  return {
    pressurePa,
    densityKgPerM3: dryAirDensityKgPerM3(20, pressurePa),
    specificHeatJPerKgK: 1006,
  };
}

/** Builds the network of a whole building and everything that drives it over the weather's year. */
export function assemble(
  building: Building,
  table: WeatherYear,
  options: AssemblyOptions,
): Assembly {
  const weather = withDiffuseSplit(table, building.physics.diffuseSplit);
  const stepS = options.stepMinutes * 60;
  const memory = options.memory ?? emptyMemory();
  turnMemory(memory, weather);
  const skyMethod = building.physics.skyTemperature;
  const steps = memory.steps.of(`${stepS} ${skyMethod}`, () =>
    weatherSteps(weather, stepS, { skyMethod }),
  );
  const clock = stepClock(
    building.calendar,
    { year: weather.year, hours: weather.hours, utcOffsetH: weather.site.utcOffsetH },
    stepS,
  );
  const builder = new NetworkBuilder(steps.count);
  const outside = outdoors(building, steps, builder, memory);
  const air = siteAir(weather.site.elevationM);
  const fineness: Fineness = { stepS, refine: options.refine };
  const chains = new Map<string, Chain>();
  const assumptions: string[] = [
    ...(building.fromLibrary ?? []),
    ...weather.notes.slice(table.notes.length).map((note) => note.text),
  ];
  const cautions: string[] = [];
  const climate = groundClimateOnce(steps, clock);
  const site = airSite(steps, clock, air);
  const airFlows: AirFlow[] = [];
  const rooms = building.rooms.map((room) =>
    addRoom({
      building,
      room,
      air,
      fineness,
      chains,
      outside,
      clock,
      climate,
      cautions,
      site,
      airFlows,
      builder,
      assumptions,
      heatingRamps: options.heatingRamps,
      drawnByRoom: options.drawnByRoom,
    }),
  );
  addRoomAir({ building, rooms, site, outside, builder, flows: airFlows });
  const recordNodes = new Set<number>([outside.airNode]);
  for (const parts of rooms) for (const node of recordedOf(parts)) recordNodes.add(node);
  return {
    building,
    rooms,
    outdoorNode: outside.airNode,
    airSite: site,
    airFlows,
    provenance: builder.provenance(),
    assumptions,
    cautions,
    problem: {
      network: builder.network(),
      stepS,
      stepCount: steps.count,
      series: builder.allSeries(),
      start: {
        kind: 'periodic',
        spanSteps: (warmUp.days * 86_400) / stepS,
        toleranceK: warmUp.toleranceK,
        maxPasses: warmUp.maxPasses,
      },
      stepsPerRecord: 3600 / stepS,
      recordNodes: Int32Array.from(recordNodes),
      meters: builder.meters(),
    },
  };
}

function recordedOf(parts: RoomParts): number[] {
  const bodies = parts.plants.map((one) => one.bodyNode).filter((node) => node >= 0);
  return [parts.airNode, ...parts.massNodes, ...bodies, ...parts.faces.map((face) => face.node)];
}
