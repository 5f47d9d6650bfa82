// Air between rooms: fixed paths and swaps, doorways, ventilation units that serve several rooms.
import type { AirUnit, Building, Doorway } from '../building/index.ts';
import { doorwayExchangeWPerK15 } from '../physics/index.ts';
import { effectivenessInUse } from './air-recovery.ts';
import type { AirFlow, AirSite } from './air-site.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Outdoors } from './outdoors.ts';
import type { RoomParts } from './room-parts.ts';
import { scheduleValues } from './schedule-values.ts';

interface BetweenTask {
  readonly building: Building;
  readonly rooms: readonly RoomParts[];
  readonly site: AirSite;
  readonly outside: Outdoors;
  readonly builder: NetworkBuilder;
  /** Streams for the vapour balance, added to. */
  readonly flows: AirFlow[];
}

/** Temperature at which a doorway's air density is taken; its choice moves the flow by 0.2 % a kelvin. */
const doorwayC = 20;
/** Keeps the slope finite where rooms are equally warm [K²]. */
const softeningK2 = 1e-4;

/** Ties the air of a unit that never runs to a temperature; nothing beside its flow. */
const stillWPerK = 1e-6;

/** Adds all air that moves between rooms. */
export function addRoomAir(task: BetweenTask): void {
  const { building, rooms, site, outside, builder, flows } = task;
  const air = site.properties;
  const perM3JPerK = air.densityKgPerM3 * air.specificHeatJPerKgK;
  const indexOf = new Map(rooms.map((parts, r) => [parts.room.id, r]));
  const index = (id: string) => indexOf.get(id) ?? -1;
  const nodeOf = (id: string) => rooms[index(id)]?.airNode ?? outside.airNode;
  const shareOf = (schedule: string | undefined) =>
    schedule === undefined ? null : scheduleValues(building, schedule, site.clock);
  const seriesOf = new Map<string, number>();
  const seriesFor = (schedule: string | undefined) => {
    if (schedule === undefined) return -1;
    let series = seriesOf.get(schedule);
    if (series === undefined) {
      series = builder.series(
        `air, ${schedule}`,
        'step',
        scheduleValues(building, schedule, site.clock),
      );
      seriesOf.set(schedule, series);
    }
    return series;
  };
  const stream = (
    name: string,
    from: string,
    to: string,
    mutual: boolean,
    massKgPerS: AirFlow['massKgPerS'],
  ) => {
    if (index(to) >= 0)
      flows.push({ name, from: index(from), to: index(to), mutual, keptShare: 0, massKgPerS });
  };
  for (const { from, to, flowM3PerS, schedule } of building.airPaths) {
    const name = `air ${from} to ${to}`;
    const ref = builder.directedLink(
      nodeOf(from),
      nodeOf(to),
      flowM3PerS * perM3JPerK,
      seriesFor(schedule),
      {
        name,
        what: `air from ${from} to ${to}`,
        method: 'directed air flow times volumetric heat capacity of dry air at the site',
        inputs: { flowM3PerS, ...air },
      },
    );
    const parts = rooms[index(to)];
    if (parts)
      builder.count(from === 'outdoors' ? parts.meters.ventilation : parts.meters.rooms, 1, ref);
    const share = shareOf(schedule);
    const massKgPerS = flowM3PerS * air.densityKgPerM3;
    stream(name, from, to, false, (step) => massKgPerS * (share === null ? 1 : share[step]));
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
    const series = seriesFor(schedule);
    const ref =
      series < 0
        ? builder.constantLink(nodeOf(a), nodeOf(b), conductance, about)
        : builder.scaledLink(nodeOf(a), nodeOf(b), conductance, series, about);
    countBoth(task, index(a), index(b), ref);
    const share = shareOf(schedule);
    const massKgPerS = flowM3PerS * air.densityKgPerM3;
    stream(about.name, a, b, true, (step) => massKgPerS * (share === null ? 1 : share[step]));
  }
  for (const doorway of building.doorways) addDoorway(task, doorway, index, shareOf, stream);
  for (const unit of building.airUnits) addUnit(task, unit, index, shareOf);
}

function countBoth(
  task: BetweenTask,
  a: number,
  b: number,
  ref: ReturnType<NetworkBuilder['functionLink']>,
): void {
  const { rooms, builder } = task;
  builder.count(rooms[a].meters.rooms, -1, ref);
  builder.count(rooms[b].meters.rooms, 1, ref);
}

/** G = K·|ΔT|^½ both ways: warm air passes above, as much cold air below (Brown & Solvason 1962). */
function addDoorway(
  task: BetweenTask,
  doorway: Doorway,
  index: (id: string) => number,
  shareOf: (schedule: string | undefined) => Float64Array | null,
  stream: (
    name: string,
    from: string,
    to: string,
    mutual: boolean,
    massKgPerS: AirFlow['massKgPerS'],
  ) => void,
): void {
  const { rooms, site, builder } = task;
  const [a, b] = doorway.rooms;
  const { widthM, heightM, dischargeCoefficient } = doorway;
  const air = site.properties;
  const coefficient = doorwayExchangeWPerK15(
    widthM * heightM,
    heightM,
    doorwayC,
    dischargeCoefficient,
    air.densityKgPerM3 * air.specificHeatJPerKgK,
  );
  const share = shareOf(doorway.schedule);
  const law = (fromC: number, toC: number, step: number) => {
    const differenceK = fromC - toC;
    const open = share === null ? 1 : Math.max(0, share[step]);
    return open * coefficient * Math.sqrt(Math.sqrt(differenceK * differenceK + softeningK2));
  };
  const name = `doorway ${a} and ${b}`;
  const ref = builder.functionLink(rooms[index(a)].airNode, rooms[index(b)].airNode, law, {
    name,
    what: 'air through an open doorway',
    method: 'Bernoulli along the height of the opening (Brown & Solvason 1962)',
    inputs: { widthM, heightM, dischargeCoefficient, ...air },
  });
  countBoth(task, index(a), index(b), ref);
  stream(name, a, b, true, (step, fromC, toC) => law(fromC, toC, step) / air.specificHeatJPerKgK);
}

/**
 * A unit that supplies some rooms and extracts from others. The extract air mixes in a node of its own;
 * supply at θ_e + η·(θ_x − θ_e) is η of it from there and 1 − η from outdoors, so that mass and heat
 * balance. Bypass and frost limit follow the outdoor air and the unit's design extract temperature.
 */
function addUnit(
  task: BetweenTask,
  unit: AirUnit,
  index: (id: string) => number,
  shareOf: (schedule: string | undefined) => Float64Array | null,
): void {
  const { rooms, site, outside, builder, flows } = task;
  const air = site.properties;
  const total = (list: AirUnit['supply']) => list.reduce((sum, end) => sum + end.flowM3PerS, 0);
  const supplyM3PerS = total(unit.supply);
  const extractM3PerS = total(unit.extract);
  const label = unit.name ?? unit.id;
  const share = shareOf(unit.schedule) ?? new Float64Array(site.clock.count).fill(1);
  const kept = Float64Array.from(site.outdoorC, (outdoorC) =>
    extractM3PerS > 0
      ? effectivenessInUse(unit, unit.designExtractC, outdoorC, supplyM3PerS / extractM3PerS)
      : 0,
  );
  const series = (what: string, value: (k: number) => number) =>
    builder.series(
      `${label} ${what}`,
      'step',
      share.map((open, k) => Math.max(0, open * value(k))),
    );
  const about = (what: string): Provenance => ({
    name: `${label} ${what}`,
    what: `${what} of ventilation unit ${label}`,
    method: 'directed air flow; recovery as the share of the extract air in the supply (EN 308)',
    inputs: { supplyM3PerS, extractM3PerS, heatRecovery: unit.heatRecovery, ...air },
  });
  const perM3 = air.densityKgPerM3 * air.specificHeatJPerKgK;
  const flowing = series('flow', () => 1);
  const fresh = series('from outdoors', (k) => 1 - kept[k]);
  const returned = series('from extract', (k) => kept[k]);
  // A cubic metre of duct air: it holds a temperature while the unit stands still.
  const mixed = builder.node(about('extract'), perM3);
  builder.constantLink(mixed, outside.airNode, stillWPerK, about('still air'));
  for (const { room, flowM3PerS } of unit.extract)
    builder.directedLink(
      rooms[index(room)].airNode,
      mixed,
      flowM3PerS * perM3,
      flowing,
      about('extract'),
    );
  builder.directedLink(
    mixed,
    outside.airNode,
    perM3,
    series('exhaust', (k) => extractM3PerS - kept[k] * supplyM3PerS),
    about('exhaust'),
  );
  for (const { room, flowM3PerS } of unit.supply) {
    const to = index(room);
    const parts = rooms[to];
    const rate = flowM3PerS * perM3;
    const count = (from: number, values: number) =>
      builder.count(
        parts.meters.ventilation,
        1,
        builder.directedLink(from, parts.airNode, rate, values, about('supply')),
      );
    count(outside.airNode, fresh);
    if (unit.heatRecovery > 0) count(mixed, returned);
    const massKgPerS = flowM3PerS * air.densityKgPerM3;
    flows.push({
      name: `${label} supply`,
      from: -1,
      to,
      mutual: false,
      keptShare: unit.moistureRecovery,
      massKgPerS: (step) => massKgPerS * share[step],
    });
  }
}
