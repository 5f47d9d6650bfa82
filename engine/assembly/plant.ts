// Heaters and chillers of a room as controlled sources: sensor, set-point, limit, and where the heat goes.
import type { Building, Heating, Room } from '../building/index.ts';
import { type Delivery, delivery } from './emitter.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { Face, RoomMeters } from './room-parts.ts';
import { scheduledRamp, scheduleValues } from './schedule-values.ts';
import { areaShares, type RoomNodes } from './shares.ts';
import type { StepClock } from './step-clock.ts';

/** One heater or chiller of a room: findings map its power back through it. */
export interface PlantParts {
  readonly field: 'heating' | 'backupHeating' | 'cooling';
  readonly plant: Heating;
  /** Greatest power, Infinity without limit [W]. */
  readonly maxW: number;
  /** Power of this plant alone, 0 or more. */
  readonly meter: number;
  /** The body between plant and room, or −1. */
  readonly bodyNode: number;
  /** Set-point at both ends of every step, and in each hour [°C]. */
  readonly ramp: Float64Array;
  readonly setPointC: Float64Array;
}

interface PlantTask {
  readonly building: Building;
  readonly room: Room;
  readonly nodes: RoomNodes;
  readonly clock: StepClock;
  readonly builder: NetworkBuilder;
  readonly meters: RoomMeters;
  readonly faceMeter: (face: Face) => number;
  /** Set-points of the heating at both ends of every step, where they are not the schedule's. */
  readonly heatingRamp: Float64Array | undefined;
}

/** Reach of the backup's own band where none is given [K]. */
const backupBandK = 0.5;

/** Adds all heaters and chillers of a room. */
export function addPlants(task: PlantTask): PlantParts[] {
  const { room } = task;
  const list: PlantParts[] = [];
  if (room.heating) list.push(addPlant(task, 'heating', room.heating));
  if (room.backupHeating) list.push(addPlant(task, 'backupHeating', room.backupHeating));
  if (room.cooling) list.push(addPlant(task, 'cooling', room.cooling));
  return list;
}

function addPlant(task: PlantTask, field: PlantParts['field'], plant: Heating): PlantParts {
  const { room, nodes, clock, builder, meters, faceMeter } = task;
  const kind = field === 'cooling' ? 'chiller' : 'heater';
  const sign = kind === 'heater' ? 1 : -1;
  const name = `${field === 'backupHeating' ? 'backup heater' : kind} of ${room.name}`;
  const way: Delivery = delivery(room, plant, name, nodes, builder);
  const maxW =
    plant.maxW ??
    (plant.emitter?.kind === 'radiator' ? plant.emitter.nominalW : Number.POSITIVE_INFINITY);
  const ramp = setPointRamp(task, field, plant);
  const sensor = sensorOf(plant, nodes);
  const index = builder.plant({
    name,
    kind,
    ...sensor,
    deliveryNodes: way.nodes,
    deliveryShares: way.shares,
    setPointSeries: builder.series(`${name}, set-point`, 'ramp', ramp),
    maxSeries: maxSeries(task, plant, maxW, name),
    bandK: bandOf(field, plant),
  });
  const power = { kind: 'plant', index } as const;
  builder.count(field === 'cooling' ? meters.cooling : meters.heating, sign, power);
  // Heat that reaches faces by another way than their films comes back as their heat: off their lines.
  way.onFaces.forEach(({ face, share }) => {
    builder.count(faceMeter(face), -sign * share, power);
  });
  way.toFaces.forEach(({ face, ref }) => {
    builder.count(faceMeter(face), -1, ref);
  });
  if (way.bodyNode >= 0) builder.count(meters.storage, 1, { kind: 'storage', node: way.bodyNode });
  const meter = builder.meter(`${room.id} ${field} alone`);
  builder.count(meter, 1, power);
  return {
    field,
    plant,
    maxW,
    meter,
    bodyNode: way.bodyNode,
    ramp,
    setPointC: hourlyMean(ramp, clock),
  };
}

function bandOf(field: PlantParts['field'], plant: Heating): number {
  return field === 'backupHeating' && plant.bandK === 0 ? backupBandK : plant.bandK;
}

/**
 * The set-point at both ends of each step. A backup's band ends where the main heater's set-point is,
 * so that it gives nothing while that one keeps it.
 */
function setPointRamp(task: PlantTask, field: PlantParts['field'], plant: Heating): Float64Array {
  const { building, room, clock, heatingRamp } = task;
  const own = scheduledRamp(building, plant.setPointC, clock);
  if (field === 'heating') return heatingRamp ?? own;
  if (field === 'cooling' || !room.heating) return own;
  const main = heatingRamp ?? scheduledRamp(building, room.heating.setPointC, clock);
  const half = bandOf(field, plant) / 2;
  return own.map((c, i) => Math.min(c, main[i]) - half);
}

function sensorOf(plant: Heating, nodes: RoomNodes) {
  if (plant.sensor === 'air')
    return { sensorNodes: Int32Array.of(nodes.airNode), sensorWeights: Float64Array.of(1) };
  return {
    sensorNodes: Int32Array.of(nodes.airNode, ...nodes.faces.map((face) => face.node)),
    sensorWeights: Float64Array.of(0.5, ...areaShares(nodes.faces).map((s) => s / 2)),
  };
}

function maxSeries(task: PlantTask, plant: Heating, maxW: number, name: string): number {
  const { building, clock, builder } = task;
  if (plant.available === undefined) return builder.constantSeries(maxW);
  const values = scheduleValues(building, plant.available, clock);
  return builder.series(
    `${name}, greatest power`,
    'step',
    values.map((v) => (v > 0 ? maxW : 0)),
  );
}

/** Mean of each hour of a ramp. */
function hourlyMean(ramp: Float64Array, clock: StepClock): Float64Array {
  const perHour = (2 * 3600) / clock.stepS;
  const hours = new Float64Array(ramp.length / perHour);
  for (let i = 0; i < ramp.length; i++) hours[Math.floor(i / perHour)] += ramp[i] / perHour;
  return hours;
}
