// Air that carries heat: leakage, ventilation, flows between rooms.
import type { Building, Room } from '../building/index.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { RoomParts } from './room-parts.ts';
import { scheduleValues } from './schedule-values.ts';
import type { StepClock } from './step-clock.ts';

/** Air at the site: what a cubic metre of it carries per kelvin. */
export interface AirProperties {
  readonly pressurePa: number;
  readonly densityKgPerM3: number;
  readonly specificHeatJPerKgK: number;
}

/** Air capacity of a room [J/K]. */
export function airCapacityJPerK(room: Room, air: AirProperties): number {
  return room.volumeM3 * air.densityKgPerM3 * air.specificHeatJPerKgK;
}

/** Leakage and ventilation of one room with the outdoor air. */
export function addOutdoorAir(
  building: Building,
  room: Room,
  parts: Pick<RoomParts, 'airNode' | 'meters'>,
  air: AirProperties,
  outside: Outdoors,
  clock: StepClock,
  builder: NetworkBuilder,
): void {
  const perM3JPerK = air.densityKgPerM3 * air.specificHeatJPerKgK;
  const link = (
    what: string,
    flowM3PerS: number,
    schedule: string | undefined,
    recovery: number,
  ) => {
    const conductance = flowM3PerS * perM3JPerK * (1 - recovery);
    const about: Provenance = {
      name: `${room.id} ${what}`,
      room: room.id,
      what,
      method: 'air flow times volumetric heat capacity of dry air at the site',
      inputs: { flowM3PerS, heatRecovery: recovery, ...air },
    };
    return schedule === undefined
      ? builder.constantLink(outside.airNode, parts.airNode, conductance, about)
      : builder.scaledLink(
          outside.airNode,
          parts.airNode,
          conductance,
          builder.series(`${room.id} ${what}`, 'step', scheduleValues(building, schedule, clock)),
          about,
        );
  };
  const { infiltration } = room;
  if (infiltration.airChangesPerH > 0) {
    const flowM3PerS = (infiltration.airChangesPerH * room.volumeM3) / 3600;
    builder.count(
      parts.meters.infiltration,
      1,
      link('infiltration', flowM3PerS, infiltration.schedule, 0),
    );
  }
  for (const one of room.ventilation) {
    if (one.flowM3PerS === 0 || one.heatRecovery === 1) continue;
    const ref = link(
      `ventilation ${one.name ?? one.id}`,
      one.flowM3PerS,
      one.schedule,
      one.heatRecovery,
    );
    builder.count(parts.meters.ventilation, 1, ref);
  }
}

/** Air that moves one way, and air that rooms swap. */
export function addRoomAir(
  building: Building,
  rooms: readonly RoomParts[],
  air: AirProperties,
  outside: Outdoors,
  clock: StepClock,
  builder: NetworkBuilder,
): void {
  const perM3JPerK = air.densityKgPerM3 * air.specificHeatJPerKgK;
  const partsOf = new Map(rooms.map((parts) => [parts.room.id, parts]));
  const nodeOf = (id: string) => partsOf.get(id)?.airNode ?? outside.airNode;
  const seriesOf = new Map<string, number>();
  const seriesFor = (schedule: string) => {
    let series = seriesOf.get(schedule);
    if (series === undefined) {
      series = builder.series(
        `air, ${schedule}`,
        'step',
        scheduleValues(building, schedule, clock),
      );
      seriesOf.set(schedule, series);
    }
    return series;
  };
  for (const { from, to, flowM3PerS, schedule } of building.airPaths) {
    const ref = builder.directedLink(
      nodeOf(from),
      nodeOf(to),
      flowM3PerS * perM3JPerK,
      schedule === undefined ? -1 : seriesFor(schedule),
      {
        name: `air ${from} to ${to}`,
        what: `air from ${from} to ${to}`,
        method: 'directed air flow times volumetric heat capacity of dry air at the site',
        inputs: { flowM3PerS, ...air },
      },
    );
    const parts = partsOf.get(to);
    if (parts)
      builder.count(from === 'outdoors' ? parts.meters.ventilation : parts.meters.rooms, 1, ref);
  }
  for (const { rooms: pair, flowM3PerS, schedule } of building.airExchanges) {
    const [a, b] = pair;
    const about: Provenance = {
      name: `air ${a} and ${b}`,
      what: 'air swapped through an opening',
      method: 'equal flows both ways times volumetric heat capacity of dry air at the site',
      inputs: { flowM3PerS, ...air },
    };
    const conductance = flowM3PerS * perM3JPerK;
    const ref =
      schedule === undefined
        ? builder.constantLink(nodeOf(a), nodeOf(b), conductance, about)
        : builder.scaledLink(nodeOf(a), nodeOf(b), conductance, seriesFor(schedule), about);
    const [first, second] = [partsOf.get(a), partsOf.get(b)];
    if (first) builder.count(first.meters.rooms, -1, ref);
    if (second) builder.count(second.meters.rooms, 1, ref);
  }
}
