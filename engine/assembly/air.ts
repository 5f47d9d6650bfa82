// Air that carries heat between a room and outdoors: leaks, open windows, ventilation.
//
// Flows given as volumes are taken at the density of dry air of 20 °C at the site's height. Flows that
// pressure drives (leaks, openings) take the density of the air that passes, at its own temperature.
import type { Building, Leakage, Room } from '../building/index.ts';
import { leakageCoefficient } from '../physics/index.ts';
import { feelsRoom, openShare } from './air-control.ts';
import { roomLeaks } from './air-leaks.ts';
import { openingFlow, openingMethods } from './air-openings.ts';
import { ownSurplusKgPerS, pathSurplusKgPerS } from './air-paths.ts';
import { effectivenessInUse, extractOf, flowShare, ventilationFeelsRoom } from './air-recovery.ts';
import type { AirFlow, AirProperties, AirSite } from './air-site.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { RoomParts } from './room-parts.ts';
import { scheduleValues } from './schedule-values.ts';

export type { AirProperties } from './air-site.ts';

/** Air capacity of a room [J/K]. */
export function airCapacityJPerK(room: Room, air: AirProperties): number {
  return room.volumeM3 * air.densityKgPerM3 * air.specificHeatJPerKgK;
}

export interface OutdoorAirTask {
  readonly building: Building;
  readonly room: Room;
  readonly parts: Pick<RoomParts, 'airNode' | 'meters'>;
  readonly site: AirSite;
  readonly outside: Outdoors;
  readonly builder: NetworkBuilder;
  /** Streams for the vapour balance, added to. */
  readonly flows: AirFlow[];
  /** Sentences for the report, added to. */
  readonly assumptions: string[];
  readonly cautions: string[];
}

const volumeMethod = 'air flow times volumetric heat capacity of dry air at the site';

/** Everything that joins one room's air with the outdoor air. */
export function addOutdoorAir(task: OutdoorAirTask): void {
  const { room } = task;
  const { infiltration } = room;
  if (infiltration.airChangesPerH > 0) {
    const flowM3PerS = (infiltration.airChangesPerH * room.volumeM3) / 3600;
    addVolumeFlow(task, 'infiltration', 'infiltration', flowM3PerS, infiltration.schedule);
  }
  for (const one of room.ventilation) addVentilation(task, one);
  for (const opening of room.airOpenings) {
    const flow = openingFlow(task.building, room, opening, task.site);
    const name = `opening ${opening.name ?? opening.id}`;
    addLaw(task, 'ventilation', name, openingMethods[opening.kind], flow, { kind: opening.kind });
  }
  addLeaks(task);
  const controls = [...room.airOpenings, ...room.ventilation].map((one) => one.control);
  if (controls.some((control) => control?.outdoorHumidityBelow !== undefined))
    task.assumptions.push(
      `Air of ${room.name}: the limit by outdoor humidity stands in for rain, which the weather table does not hold.`,
    );
}

type Meter = 'infiltration' | 'ventilation';

function about(
  task: OutdoorAirTask,
  what: string,
  method: string,
  inputs: Provenance['inputs'],
): Provenance {
  const { room } = task;
  return { name: `${room.id} ${what}`, room: room.id, what, method, inputs };
}

function stream(
  task: OutdoorAirTask,
  name: string,
  massKgPerS: AirFlow['massKgPerS'],
  keptShare = 0,
): void {
  const to = task.building.rooms.indexOf(task.room);
  task.flows.push({ name, from: -1, to, mutual: false, keptShare, massKgPerS });
}

/** A volume flow that a schedule scales, in full exchange with outdoors. */
function addVolumeFlow(
  task: OutdoorAirTask,
  meter: Meter,
  what: string,
  flowM3PerS: number,
  schedule: string | undefined,
): void {
  const { building, parts, site, outside, builder } = task;
  const air = site.properties;
  const massKgPerS = flowM3PerS * air.densityKgPerM3;
  const conductance = massKgPerS * air.specificHeatJPerKgK;
  const why = about(task, what, volumeMethod, { flowM3PerS, ...air });
  const values = schedule === undefined ? null : scheduleValues(building, schedule, site.clock);
  const ref =
    values === null
      ? builder.constantLink(outside.airNode, parts.airNode, conductance, why)
      : builder.scaledLink(
          outside.airNode,
          parts.airNode,
          conductance,
          builder.series(why.name, 'step', values),
          why,
        );
  builder.count(parts.meters[meter], 1, ref);
  stream(task, why.name, (step) => massKgPerS * (values === null ? 1 : values[step]));
}

/** A mass flow by law, in full exchange with outdoors. */
function addLaw(
  task: OutdoorAirTask,
  meter: Meter,
  what: string,
  method: string,
  massKgPerS: AirFlow['massKgPerS'],
  inputs: Provenance['inputs'],
): void {
  const { parts, site, outside, builder } = task;
  const heat = site.properties.specificHeatJPerKgK;
  const why = about(task, what, method, { ...inputs, ...site.properties });
  const ref = builder.functionLink(
    outside.airNode,
    parts.airNode,
    (outdoorC, roomC, step) => heat * massKgPerS(step, outdoorC, roomC),
    why,
  );
  builder.count(parts.meters[meter], 1, ref);
  stream(task, why.name, massKgPerS);
}

/**
 * Supply S and extract E of a room, recovery η on the supply. Seen from the room the supply brings
 * S·(1 − η) of the difference to outdoors. In a room without leaks, S − E goes on to (or comes from)
 * other rooms by directed links, which must balance: then E − η·S of the exchange is left for this link.
 */
function addVentilation(task: OutdoorAirTask, one: Room['ventilation'][number]): void {
  const { building, room, parts, site, outside, builder } = task;
  const air = site.properties;
  const supplyM3PerS = one.flowM3PerS;
  const extractM3PerS = extractOf(one);
  const heatPerM3 = air.densityKgPerM3 * air.specificHeatJPerKgK;
  const what = `ventilation ${one.name ?? one.id}`;
  const why = about(task, what, volumeMethod, {
    flowM3PerS: supplyM3PerS,
    extractM3PerS,
    heatRecovery: one.heatRecovery,
    ...air,
  });
  const count = (ref: FlowRef) => builder.count(parts.meters.ventilation, 1, ref);
  const surplusM3PerS = supplyM3PerS - extractM3PerS;
  const directed = surplusM3PerS !== 0 && room.leakage === undefined;
  const aside = directed ? Math.max(0, surplusM3PerS) : 0; // of the supply, by the directed link
  const perExtract = extractM3PerS > 0 ? supplyM3PerS / extractM3PerS : 1;
  const plain = one.schedule === undefined && one.control === undefined;
  const share = plain ? null : flowShare(building, one, site);
  const series = share === null ? -1 : builder.series(why.name, 'step', share);
  if (directed) {
    const rate = Math.abs(surplusM3PerS) * heatPerM3;
    const [from, to] =
      surplusM3PerS > 0 ? [outside.airNode, parts.airNode] : [parts.airNode, outside.airNode];
    const ref = builder.directedLink(from, to, rate, series, why);
    if (surplusM3PerS > 0) count(ref);
  }
  const open =
    one.control && feelsRoom(one.control) ? openShare(building, one.control, site) : null;
  const inUse = (step: number, outdoorC: number, roomC: number) =>
    (share === null ? 1 : share[step]) * (open === null ? 1 : open(step, roomC, outdoorC));
  const massKgPerS = supplyM3PerS * air.densityKgPerM3;
  if (massKgPerS === 0) return;
  stream(
    task,
    why.name,
    (step, outdoorC, roomC) => massKgPerS * inUse(step, outdoorC, roomC),
    one.moistureRecovery,
  );
  if (!ventilationFeelsRoom(one)) {
    const rest = heatPerM3 * (supplyM3PerS * (1 - one.heatRecovery) - aside);
    if (!(rest > 1e-12)) return;
    count(
      series < 0
        ? builder.constantLink(outside.airNode, parts.airNode, rest, why)
        : builder.scaledLink(outside.airNode, parts.airNode, rest, series, why),
    );
    return;
  }
  const law = (outdoorC: number, roomC: number, step: number) => {
    const kept = effectivenessInUse(one, roomC, outdoorC, perExtract);
    const flow = Math.max(0, supplyM3PerS * (1 - kept) - aside);
    return heatPerM3 * flow * inUse(step, outdoorC, roomC);
  };
  count(
    builder.functionLink(outside.airNode, parts.airNode, law, {
      ...why,
      method: 'supply by heat recovery with bypass and frost limit (EN 308), by room temperature',
    }),
  );
}

/** Under-pressure at which open flues may spill; limits of 4 Pa are common practice, no source. */
const spillagePa = 4;

/** Pressure that fans and paths alone hold in the room, without wind and stack, at its lowest [Pa]. */
function fanPressurePa(
  room: Room,
  leakage: Leakage,
  site: AirSite,
  paths: Float64Array,
  own: Float64Array,
): number {
  let least = 0; // kg/s
  for (let k = 0; k < paths.length; k++) least = Math.min(least, paths[k] + own[k]);
  const coefficient = leakageCoefficient(leakage.n50PerH, room.volumeM3, leakage.exponent);
  const flowM3PerS = -least / site.properties.densityKgPerM3;
  return flowM3PerS === 0 ? 0 : -((flowM3PerS / coefficient) ** (1 / leakage.exponent));
}

/**
 * Leaks take up whatever fans and paths leave over. What paths bring in too much leaves by a directed
 * link; what they take out is made up by one, and that air is taken off the leaks' own.
 */
function addLeaks(task: OutdoorAirTask): void {
  const { building, room, parts, site, outside, builder } = task;
  const { leakage } = room;
  if (leakage === undefined) return;
  const paths = pathSurplusKgPerS(building, room, site);
  const own = ownSurplusKgPerS(building, room, site);
  const leaks = roomLeaks(
    building,
    room,
    leakage,
    site,
    paths.map((path, k) => path + own[k]),
  );
  task.assumptions.push(
    `Leaks of ${room.name}: ${leakage.n50PerH} air changes at 50 Pa, shared out over its outdoor surfaces by area; wind pressure as on a low building standing free.`,
  );
  const fans = fanPressurePa(room, leakage, site, paths, own);
  if (fans < -spillagePa)
    task.cautions.push(
      `Combustion air: fans draw ${(-fans).toFixed(0)} Pa below outdoors in ${room.name}. An open-flued or open fire there can spill its fumes into the room; have the air supply designed by a licensed practitioner.`,
    );
  const heat = site.properties.specificHeatJPerKgK;
  const link = (values: Float64Array, inward: boolean) => {
    if (values.every((value) => value === 0)) return;
    const why = about(
      task,
      inward ? 'make-up air through leaks' : 'air pressed out through leaks',
      'mass balance of the room',
      {},
    );
    const series = builder.series(why.name, 'step', values);
    const [from, to] = inward ? [outside.airNode, parts.airNode] : [parts.airNode, outside.airNode];
    const ref = builder.directedLink(from, to, heat, series, why);
    if (inward) builder.count(parts.meters.infiltration, 1, ref);
  };
  const madeUp = paths.map((path) => Math.max(0, -path));
  link(madeUp, true);
  link(
    paths.map((path) => Math.max(0, path)),
    false,
  );
  const why = about(
    task,
    'leaks',
    'power law of the pressure test (ISO 9972) under wind, stack and fans; one-zone mass balance',
    { n50PerH: leakage.n50PerH, exponent: leakage.exponent, ...site.properties },
  );
  const ref = builder.functionLink(
    outside.airNode,
    parts.airNode,
    (_, roomC, step) => heat * Math.max(0, leaks.inflowKgPerS(step, roomC) - madeUp[step]),
    why,
  );
  builder.count(parts.meters.infiltration, 1, ref);
  stream(task, why.name, (step, _, roomC) =>
    Math.max(madeUp[step], leaks.inflowKgPerS(step, roomC)),
  );
}
