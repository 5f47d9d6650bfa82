// References of ground contacts, thermal bridges, air and moisture that lead nowhere.
import type { Fault } from '../../weather/index.ts';
import { nearest } from './check-references.ts';
import type { AirControl } from './schema-air.ts';
import type { Building } from './schema-project.ts';
import type { Room } from './schema-room.ts';

/** Every id in these parts of the project that names nothing, or stands twice. */
export function airReferenceFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, found: string, expected: string, mend: string) =>
    faults.push({ file, place: { path }, found, expected, mend });
  const idsOf = (list: readonly { readonly id: string }[]) => new Set(list.map((one) => one.id));
  const schedules = idsOf(building.schedules);
  const roomIds = idsOf(building.rooms);
  const contacts = idsOf(building.groundContacts);

  const refer = (id: string, known: ReadonlySet<string>, kind: string, path: string) => {
    if (known.has(id)) return;
    const near = nearest(id, known);
    const hint = near ? `Did you mean "${near}"?` : 'Define it, or correct the name.';
    add(path, `"${id}"`, `the id of a ${kind} in this file`, hint);
  };
  const schedule = (id: string | undefined, path: string) => {
    if (id !== undefined) refer(id, schedules, 'schedule', path);
  };
  const scheduled = (value: unknown, path: string) => {
    if (typeof value === 'object' && value !== null && 'schedule' in value)
      schedule(String(value.schedule), `${path}.schedule`);
  };
  const once = (list: readonly { readonly id: string }[], path: string) => {
    list.forEach((item, i) => {
      const first = list.findIndex((other) => other.id === item.id);
      if (first < i)
        add(
          `${path}[${i}].id`,
          `"${item.id}"`,
          'an id used once',
          `It is also the id of ${path}[${first}]; rename one of them.`,
        );
    });
  };
  const control = (of: AirControl | undefined, path: string) => {
    if (!of) return;
    schedule(of.schedule, `${path}.schedule`);
    schedule(of.occupied, `${path}.occupied`);
    scheduled(of.roomAboveC, `${path}.roomAboveC`);
  };

  once(building.groundContacts, 'groundContacts');
  once(building.airUnits, 'airUnits');
  building.rooms.forEach((room, i) => {
    roomFaults(room, `rooms[${i}]`);
  });
  building.airUnits.forEach((unit, i) => {
    schedule(unit.schedule, `airUnits[${i}].schedule`);
    for (const side of ['supply', 'extract'] as const)
      unit[side].forEach((end, j) => {
        refer(end.room, roomIds, 'room', `airUnits[${i}].${side}[${j}].room`);
      });
  });
  building.doorways.forEach((doorway, i) => {
    schedule(doorway.schedule, `doorways[${i}].schedule`);
    doorway.rooms.forEach((room, j) => {
      refer(room, roomIds, 'room', `doorways[${i}].rooms[${j}]`);
    });
  });
  return faults;

  function roomFaults(room: Room, path: string) {
    const surfaces = idsOf(room.surfaces);
    room.surfaces.forEach(({ boundary }, j) => {
      if (boundary.kind === 'ground-contact')
        refer(
          boundary.contact,
          contacts,
          'ground contact',
          `${path}.surfaces[${j}].boundary.contact`,
        );
    });
    once(room.airOpenings, `${path}.airOpenings`);
    room.airOpenings.forEach((opening, j) => {
      const at = `${path}.airOpenings[${j}]`;
      control(opening.control, `${at}.control`);
      if (opening.kind === 'cross')
        opening.openings.forEach((end, k) => {
          refer(
            end.surface,
            surfaces,
            `surface of room "${room.id}"`,
            `${at}.openings[${k}].surface`,
          );
        });
    });
    room.ventilation.forEach((one, j) => {
      control(one.control, `${path}.ventilation[${j}].control`);
    });
    once(room.thermalBridges, `${path}.thermalBridges`);
    room.thermalBridges.forEach((bridge, j) => {
      const at = `${path}.thermalBridges[${j}]`;
      if (bridge.surface !== undefined)
        refer(bridge.surface, surfaces, `surface of room "${room.id}"`, `${at}.surface`);
      if (bridge.beyond.kind === 'fixed')
        scheduled(bridge.beyond.temperatureC, `${at}.beyond.temperatureC`);
    });
    const { moisture } = room;
    if (!moisture) return;
    once(moisture.sources, `${path}.moisture.sources`);
    moisture.sources.forEach((source, j) => {
      schedule(source.schedule, `${path}.moisture.sources[${j}].schedule`);
    });
    scheduled(moisture.humidifier?.humidityAbove, `${path}.moisture.humidifier.humidityAbove`);
    scheduled(moisture.dehumidifier?.humidityBelow, `${path}.moisture.dehumidifier.humidityBelow`);
  }
}
