// Air that cannot flow: more taken out of a room than comes in with no way to make it up, recovery beyond
// what the flows allow, leaks without an outer surface.
import type { Fault } from '../../weather/index.ts';
import { greatestEffectiveness } from '../physics/index.ts';
import type { Building } from './schema-project.ts';
import type { Room } from './schema-room.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

/** Every fault in leaks, openings, ventilation and the mass balance of rooms. References must be sound. */
export function airFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  building.rooms.forEach((room, i) => {
    const path = `rooms[${i}]`;
    leakFaults(room, path, add);
    room.ventilation.forEach((_, j) => {
      ventilationFaults(room, j, `${path}.ventilation[${j}]`, add);
    });
    balanceFaults(building, room, path, add);
  });
  building.airUnits.forEach((unit, i) => {
    const sum = (list: readonly { readonly flowM3PerS: number }[]) =>
      list.reduce((total, end) => total + end.flowM3PerS, 0);
    const path = `airUnits[${i}]`;
    recoveryFaults(unit.heatRecovery, sum(unit.supply), sum(unit.extract), path, add);
    if (unit.supply.length + unit.extract.length === 0)
      add(path, 'no supply and no extract', 'at least one of them', 'Name rooms with their flows.');
  });
  [...building.doorways, ...building.airExchanges].forEach((between) => {
    const list = 'widthM' in between ? building.doorways : building.airExchanges;
    const name = 'widthM' in between ? 'doorways' : 'airExchanges';
    if (between.rooms[0] === between.rooms[1])
      add(
        `${name}[${(list as readonly unknown[]).indexOf(between)}].rooms`,
        `"${between.rooms[0]}" twice`,
        'two rooms',
        'Air is swapped between different rooms.',
      );
  });
  return faults;
}

function leakFaults(room: Room, path: string, add: Add) {
  if (!room.leakage) return;
  if (room.infiltration.airChangesPerH > 0)
    add(
      `${path}.leakage`,
      'leakage beside infiltration by air changes',
      'one of them',
      'Both stand for the same cracks: take one out.',
    );
  if (!room.surfaces.some(({ boundary }) => boundary.kind === 'outdoors'))
    add(
      `${path}.leakage`,
      'leaks in a room without an outdoor surface',
      'a surface with boundary "outdoors"',
      'Give the room its outer surfaces, or take the leakage out.',
    );
}

function ventilationFaults(room: Room, j: number, path: string, add: Add) {
  const one = room.ventilation[j];
  const extract = one.extractM3PerS ?? one.flowM3PerS;
  recoveryFaults(one.heatRecovery, one.flowM3PerS, extract, path, add);
  const onRoom =
    one.control?.roomAboveC !== undefined || one.control?.warmerThanOutdoorsK !== undefined;
  if (onRoom && extract !== one.flowM3PerS && !room.leakage)
    add(
      `${path}.control`,
      'a control by room temperature with unequal supply and extract',
      'equal flows, or a room with leakage',
      'The air of other rooms cannot follow this room’s temperature; balance the fan.',
    );
}

function recoveryFaults(
  heatRecovery: number,
  supplyM3PerS: number,
  extractM3PerS: number,
  path: string,
  add: Add,
) {
  if (heatRecovery === 0 || supplyM3PerS === 0) return;
  const most = extractM3PerS === 0 ? 0 : greatestEffectiveness(supplyM3PerS / extractM3PerS);
  if (heatRecovery > most * (1 + 1e-9))
    add(
      `${path}.heatRecovery`,
      `${heatRecovery} with ${round(extractM3PerS * 1000)} L/s of extract for ${round(supplyM3PerS * 1000)} L/s of supply`,
      `at most ${round(most)}, extract over supply`,
      'The supply cannot gain more than the extract air gives; lower it or correct the flows.',
    );
}

/** What ventilation, units and paths bring in and take out under each schedule. */
function balanceFaults(building: Building, room: Room, path: string, add: Add) {
  if (room.leakage) return; // the leaks make up whatever is left
  interface Net {
    in: number;
    out: number;
    fans: boolean;
  }
  const nets = new Map<string, Net>();
  const book = (schedule: string | undefined, into: number, out: number, fans: boolean) => {
    const net = nets.get(schedule ?? '') ?? { in: 0, out: 0, fans: false };
    net.in += into;
    net.out += out;
    net.fans ||= fans;
    nets.set(schedule ?? '', net);
  };
  for (const { from, to, flowM3PerS, schedule } of building.airPaths) {
    if (to === room.id) book(schedule, flowM3PerS, 0, false);
    if (from === room.id) book(schedule, 0, flowM3PerS, false);
  }
  for (const { supply, extract, schedule } of building.airUnits) {
    for (const end of supply) if (end.room === room.id) book(schedule, end.flowM3PerS, 0, true);
    for (const end of extract) if (end.room === room.id) book(schedule, 0, end.flowM3PerS, true);
  }
  for (const one of room.ventilation) {
    const extract = one.extractM3PerS ?? one.flowM3PerS;
    if (extract !== one.flowM3PerS) book(one.schedule, one.flowM3PerS, extract, true);
  }
  for (const [name, net] of nets) {
    const surplus = net.in - net.out;
    if (Math.abs(surplus) <= 1e-9 * (net.in + net.out)) continue;
    const under = name === '' ? '' : ` under schedule "${name}"`;
    if (!net.fans)
      add(
        'airPaths',
        `a surplus of ${round(surplus * 1000)} L/s in room "${room.id}"${under}`,
        'as much air out of each room as into it',
        'Add the path that is missing, from or to "outdoors".',
      );
    else if (surplus < 0)
      add(
        path,
        `more exhaust than supply in room "${room.id}"${under}: ${round(net.out * 1000)} L/s out, ${round(net.in * 1000)} L/s in, and no path that makes up ${round(-surplus * 1000)} L/s`,
        'as much air into the room as out of it',
        'Add an airPath to the room under the same schedule, supply more, or give the room leakage.',
      );
    else
      add(
        path,
        `more supply than exhaust in room "${room.id}"${under}: ${round(net.in * 1000)} L/s in, ${round(net.out * 1000)} L/s out, and no path that takes ${round(surplus * 1000)} L/s away`,
        'as much air into the room as out of it',
        'Add an airPath from the room under the same schedule, extract more, or give the room leakage.',
      );
  }
}

const round = (value: number): number => Number(value.toPrecision(5));
