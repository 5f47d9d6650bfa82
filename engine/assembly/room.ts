// One room in the network: its air and masses, its surfaces as chains, its windows, then what its faces
// exchange inside, the sun, gains, plant, thermal bridges and air.
import type { Building, Room } from '../building/index.ts';
import { addOutdoorAir, airCapacityJPerK } from './air.ts';
import type { AirFlow, AirProperties, AirSite } from './air-site.ts';
import { addBridges } from './bridges.ts';
import { comfortHours } from './comfort-hours.ts';
import { faceViews } from './enclosure.ts';
import { type Chain, type Fineness, netAreaM2 } from './fabric.ts';
import { addGains } from './gains.ts';
import type { GroundClimate } from './ground-climate.ts';
import { addInsideFilm, addInsideLongWave } from './inside-exchange.ts';
import { addInternalMass } from './internal-mass.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import { addPlants } from './plant.ts';
import type { Face, RoomMeters, RoomParts } from './room-parts.ts';
import type { StepClock } from './step-clock.ts';
import { addRoomSun } from './sun-inside.ts';
import { addSurface } from './surface.ts';
import { addWindow, type WindowParts } from './window.ts';
import { windowHours } from './window-hours.ts';

/** What a room is built from and into. */
export interface RoomTask {
  readonly building: Building;
  readonly room: Room;
  readonly air: AirProperties;
  readonly fineness: Fineness;
  /** Partitions already built, by "room/surface" of the face that is still to come. */
  readonly chains: Map<string, Chain>;
  readonly outside: Outdoors;
  readonly clock: StepClock;
  readonly climate: () => GroundClimate;
  readonly cautions: string[];
  readonly site: AirSite;
  readonly airFlows: AirFlow[];
  readonly builder: NetworkBuilder;
  readonly assumptions: string[];
  /** As in `AssemblyOptions`. */
  readonly heatingRamps: ReadonlyMap<string, Float64Array> | undefined;
  readonly drawnByRoom: ReadonlyMap<string, Float64Array> | undefined;
}

/** Adds one room to the network. */
export function addRoom(task: RoomTask): RoomParts {
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
    assumptions: task.assumptions,
    cautions: task.cautions,
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
