// Building + weather → Problem: nodes, links and drivers, each with its provenance.
//
// One room after another: its air and masses, its surfaces as chains, its windows, then what its faces
// exchange inside, the sun, gains, air and plant. Partitions are built with the first of their rooms
// and found again by the second.
import {
  dryAirDensityKgPerM3,
  standardPressurePa,
  type WeatherYear,
  weatherSteps,
  withDiffuseSplit,
} from '../../weather/index.ts';
import { type Building, constructionOf, type Room, type Surface } from '../building/index.ts';
import type { Problem } from '../network/index.ts';
import { addOutdoorAir, airCapacityJPerK } from './air.ts';
import { addRoomAir } from './air-between.ts';
import { type AirFlow, type AirProperties, type AirSite, airSite } from './air-site.ts';
import { addBridges } from './bridges.ts';
import { comfortHours } from './comfort-hours.ts';
import { faceViews } from './enclosure.ts';
import {
  addChain,
  addOuterExchange,
  addOuterSun,
  type Chain,
  type Fineness,
  faceHeightM,
  netAreaM2,
  type OuterFace,
  roughnessOf,
} from './fabric.ts';
import { addGains } from './gains.ts';
import { addGround } from './ground.ts';
import { type GroundClimate, groundClimate } from './ground-climate.ts';
import { addInsideFilm, addInsideLongWave } from './inside-exchange.ts';
import { addInternalMass } from './internal-mass.ts';
import { emptyMemory, type Memory, turnMemory } from './memory.ts';
import { NetworkBuilder, type Provenance } from './network-builder.ts';
import { type Outdoors, outdoors } from './outdoors.ts';
import { addPlants } from './plant.ts';
import type { Face, RoomMeters, RoomParts } from './room-parts.ts';
import { scheduledValues } from './schedule-values.ts';
import { shadedSurface } from './shading.ts';
import { type StepClock, stepClock } from './step-clock.ts';
import { addRoomSun } from './sun-inside.ts';
import { addWindow, type WindowParts } from './window.ts';
import { windowHours } from './window-hours.ts';

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
  const climate = groundClimate(steps, clock);
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

interface RoomTask {
  readonly building: Building;
  readonly room: Room;
  readonly air: AirProperties;
  readonly fineness: Fineness;
  /** Partitions already built, by "room/surface" of the face that is still to come. */
  readonly chains: Map<string, Chain>;
  readonly outside: Outdoors;
  readonly clock: StepClock;
  readonly climate: GroundClimate;
  readonly site: AirSite;
  readonly airFlows: AirFlow[];
  readonly builder: NetworkBuilder;
  readonly assumptions: string[];
  readonly heatingRamps: AssemblyOptions['heatingRamps'];
  readonly drawnByRoom: AssemblyOptions['drawnByRoom'];
}

function addRoom(task: RoomTask): RoomParts {
  const { building, room, air, outside, clock, builder } = task;
  const meters = roomMeters(room, builder);
  const airNode = builder.node(
    {
      name: `${room.id} air`,
      room: room.id,
      what: 'room air',
      method: 'volume times density and specific heat of dry air at the site',
      inputs: { volumeM3: room.volumeM3, ...air },
    },
    airCapacityJPerK(room, air),
  );
  builder.count(meters.storage, 1, { kind: 'storage', node: airNode });
  const faces: Face[] = [];
  const windows: WindowParts[] = [];
  for (const surface of room.surfaces) {
    if (netAreaM2(surface) > 1e-9) faces.push(addSurface(task, surface));
    for (const opening of surface.openings) {
      const window = addWindow(
        {
          ...task,
          airNode,
          toRoom: (flow) => builder.count(meters.glazing, 1, flow),
        },
        surface,
        opening,
      );
      windows.push(window);
      faces.push(window.face);
      if (window.frameFace) faces.push(window.frameFace);
    }
  }
  const faceMeter = (face: Face) => meters[face.balance];
  const views = faceViews(room, faces);
  const enclosure = addInsideLongWave(building, room, faces, views, builder);
  faces.forEach((face, position) => {
    builder.count(faceMeter(face), 1, addInsideFilm(building, room, face, airNode, builder));
    builder.count(faceMeter(face), -1, { kind: 'enclosure', enclosure, position });
  });
  const massNodes = room.internalMasses.map((mass) =>
    addInternalMass(building, room, mass, { airNode, meters }, builder),
  );
  const light = addRoomSun({
    building,
    room,
    faces,
    windows,
    views,
    outside,
    builder,
    meters,
    faceMeter,
  });
  const nodes = { airNode, faces };
  const gains = addGains(building, room, nodes, clock, builder, meters, faceMeter);
  const heatingRamp = task.heatingRamps?.get(room.id);
  const plants = addPlants({
    building,
    room,
    nodes,
    clock,
    builder,
    meters,
    faceMeter,
    heatingRamp,
  });
  addBridges(building, room, { airNode, meters }, outside, clock, builder);
  addOutdoorAir({
    building,
    room,
    parts: { airNode, meters },
    site: task.site,
    outside,
    builder,
    flows: task.airFlows,
  });
  return {
    room,
    airNode,
    massNodes,
    faces,
    meters,
    comfort: comfortHours(building, room, clock),
    plants,
    windows: light.map((one) => windowHours(one, one.window.face.surface, clock)),
    ...gains,
  };
}

function roomMeters(room: Room, builder: NetworkBuilder): RoomMeters {
  const meter = (name: string) => builder.meter(`${room.id} ${name}`);
  return {
    solar: meter('solar'),
    gains: meter('gains'),
    heating: meter('heating'),
    cooling: meter('cooling'),
    opaque: meter('opaque'),
    glazing: meter('glazing'),
    ground: meter('ground'),
    infiltration: meter('infiltration'),
    ventilation: meter('ventilation'),
    rooms: meter('rooms'),
    storage: meter('storage'),
  };
}

/** One opaque surface: its chain, and what happens at its outer face. */
function addSurface(task: RoomTask, surface: Surface): Face {
  const { building, room, fineness, chains, builder } = task;
  const construction = constructionOf(building, surface.construction);
  const { boundary } = surface;
  const key = `${room.id}/${surface.id}`;
  const built = chains.get(key);
  const chain = built ?? addChain(building, room, surface, fineness, builder);
  if (!built) {
    if (boundary.kind === 'room')
      chains.set(`${boundary.room}/${boundary.surface}`, {
        outerNode: chain.innerNode,
        innerNode: chain.outerNode,
        layers: chain.layers,
      });
    else addOuterSide(task, surface, chain.outerNode);
  }
  const otherWay = surface.reversed;
  return {
    node: chain.innerNode,
    layers: chain.layers,
    surface: surface.id,
    name: key,
    areaM2: netAreaM2(surface),
    tiltDeg: surface.tiltDeg,
    azimuthDeg: surface.azimuthDeg,
    emissivity: otherWay ? construction.outsideEmissivity : construction.insideEmissivity,
    balance: balanceOf(boundary.kind),
    boundary: boundary.kind,
    light: {
      absorbed: otherWay
        ? construction.outsideSolarAbsorptance
        : construction.insideSolarAbsorptance,
      transmitted: 0,
    },
  };
}

function balanceOf(boundary: Surface['boundary']['kind']): Face['balance'] {
  if (boundary === 'room') return 'rooms';
  return boundary === 'ground' || boundary === 'ground-contact' ? 'ground' : 'opaque';
}

const unheatedFilmM2KPerW = 0.13; // ISO 6946, horizontal heat flow

function addOuterSide(task: RoomTask, surface: Surface, outerNode: number): void {
  const { building, room, outside, clock, builder } = task;
  const { boundary } = surface;
  const construction = constructionOf(building, surface.construction);
  const name = `${room.id}/${surface.id}`;
  const about = (what: string, method: string, inputs: Provenance['inputs']): Provenance => ({
    name: `${name} ${what}`,
    room: room.id,
    surface: surface.id,
    what,
    method,
    inputs,
  });
  const areaM2 = netAreaM2(surface);
  if (boundary.kind === 'outdoors') {
    const face: OuterFace = {
      node: outerNode,
      areaM2,
      tiltDeg: surface.tiltDeg,
      azimuthDeg: surface.azimuthDeg,
      heightM: faceHeightM(room, surface),
      emissivity: construction.outsideEmissivity,
      roughness: roughnessOf(construction),
      about: { name, room: room.id, surface: surface.id },
    };
    addOuterExchange(building, face, outside, builder);
    addOuterSun(construction, face, shadedSurface(room, surface), outside, builder);
  }
  if (boundary.kind === 'ground-contact') addGround(task, surface, boundary.contact, outerNode);
  if (boundary.kind === 'ground') {
    const series = builder.series(
      `${name} ground`,
      'step',
      groundValues(boundary.temperatureC, clock),
    );
    const node = builder.node(
      about('ground', 'temperature under the construction, as given', {}),
      0,
      series,
    );
    // The boundary touches the construction: a conductance so large that it only joins the two.
    builder.constantLink(
      outerNode,
      node,
      areaM2 * 1e4,
      about('contact with the ground', 'no film', { areaM2 }),
    );
  }
  if (boundary.kind === 'fixed') {
    const values = scheduledValues(building, boundary.temperatureC, clock);
    const node = builder.node(
      about('space beyond', 'temperature as given', {}),
      0,
      builder.series(`${name} beyond`, 'step', values),
    );
    builder.constantLink(
      outerNode,
      node,
      areaM2 / unheatedFilmM2KPerW,
      about('film to the space beyond', 'ISO 6946 film, 0.13 m²K/W', { areaM2 }),
    );
  }
}

/** Monthly means become a step series; the year has the months of its length. */
function groundValues(temperatureC: number | readonly number[], clock: StepClock): Float64Array {
  const values = new Float64Array(clock.count);
  for (let k = 0; k < clock.count; k++)
    values[k] =
      typeof temperatureC === 'number'
        ? temperatureC
        : temperatureC[Number(clock.monthDay[clock.day[k]].slice(0, 2)) - 1];
  return values;
}
