// Ids that are used twice or name nothing, and partitions that only one room knows of.
import type { Fault } from '../../weather/index.ts';
import type { Scheduled } from './schema-plant.ts';
import type { Building } from './schema-project.ts';
import type { Room } from './schema-room.ts';

/** Every reference that leads nowhere and every id that stands twice. */
export function referenceFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add = (path: string, found: string, expected: string, mend: string) =>
    faults.push({ file, place: { path }, found, expected, mend });

  const unique = (list: readonly { readonly id: string }[], path: string) => {
    const seen = new Map<string, number>();
    list.forEach((item, i) => {
      const first = seen.get(item.id);
      if (first === undefined) seen.set(item.id, i);
      else
        add(
          `${path}[${i}].id`,
          `"${item.id}"`,
          'an id used once',
          `It is also the id of ${path}[${first}]; rename one of them.`,
        );
    });
    return new Set(seen.keys());
  };
  const known = {
    material: unique(building.materials, 'materials'),
    construction: unique(building.constructions, 'constructions'),
    glazing: unique(building.glazings, 'glazings'),
    profile: unique(building.profiles, 'profiles'),
    schedule: unique(building.schedules, 'schedules'),
    room: unique(building.rooms, 'rooms'),
  };
  unique(building.options, 'options');
  const refer = (kind: keyof typeof known, id: string, path: string) => {
    if (known[kind].has(id)) return;
    const near = nearest(id, known[kind]);
    const hint = near
      ? `Did you mean "${near}"?`
      : `Define it under ${plural[kind]}, or correct the name.`;
    add(
      path,
      `"${id}"`,
      `the id of a ${kind} in this file${inLibrary.has(kind) ? ' or the generic library' : ''}`,
      hint,
    );
  };
  const scheduled = (value: Scheduled, path: string) => {
    if (typeof value === 'object') refer('schedule', value.schedule, `${path}.schedule`);
  };

  building.constructions.forEach((construction, i) => {
    construction.layers.forEach((layer, j) => {
      if ('material' in layer)
        refer('material', layer.material, `constructions[${i}].layers[${j}].material`);
    });
  });
  building.schedules.forEach((schedule, i) => {
    const days = (
      from: {
        profile: string;
        saturday?: string | undefined;
        sunday?: string | undefined;
        holiday?: string | undefined;
      },
      path: string,
    ) => {
      refer('profile', from.profile, `${path}.profile`);
      for (const day of ['saturday', 'sunday', 'holiday'] as const) {
        const profile = from[day];
        if (profile !== undefined) refer('profile', profile, `${path}.${day}`);
      }
    };
    days(schedule, `schedules[${i}]`);
    schedule.periods.forEach((period, j) => {
      days(period, `schedules[${i}].periods[${j}]`);
    });
  });
  building.rooms.forEach((room, i) => {
    roomReferences(room, `rooms[${i}]`);
  });
  building.airPaths.forEach((path, i) => {
    for (const end of ['from', 'to'] as const)
      if (path[end] !== 'outdoors') refer('room', path[end], `airPaths[${i}].${end}`);
    if (path.schedule !== undefined) refer('schedule', path.schedule, `airPaths[${i}].schedule`);
  });
  building.airExchanges.forEach((exchange, i) => {
    exchange.rooms.forEach((room, j) => {
      refer('room', room, `airExchanges[${i}].rooms[${j}]`);
    });
    if (exchange.schedule !== undefined)
      refer('schedule', exchange.schedule, `airExchanges[${i}].schedule`);
  });
  return faults;

  function roomReferences(room: Room, path: string) {
    unique(room.surfaces, `${path}.surfaces`);
    room.surfaces.forEach((surface, j) => {
      const at = `${path}.surfaces[${j}]`;
      refer('construction', surface.construction, `${at}.construction`);
      unique(surface.openings, `${at}.openings`);
      surface.openings.forEach((opening, k) => {
        refer('glazing', opening.glazing, `${at}.openings[${k}].glazing`);
      });
      const { boundary } = surface;
      if (boundary.kind === 'fixed')
        scheduled(boundary.temperatureC, `${at}.boundary.temperatureC`);
      if (boundary.kind !== 'room') return;
      refer('room', boundary.room, `${at}.boundary.room`);
      const other = building.rooms.find((one) => one.id === boundary.room);
      if (!other) return;
      const behind = other.surfaces.find((one) => one.id === boundary.surface);
      if (!behind)
        add(
          `${at}.boundary.surface`,
          `"${boundary.surface}"`,
          `a surface of room "${other.id}"`,
          'A partition has a face in both rooms: list it there too, or correct the name.',
        );
      else if (
        behind.boundary.kind !== 'room' ||
        behind.boundary.room !== room.id ||
        behind.boundary.surface !== surface.id
      )
        add(
          `${at}.boundary`,
          `a partition to ${other.id}/${behind.id}, which does not lead back here`,
          `${other.id}/${behind.id} with the boundary room "${room.id}", surface "${surface.id}"`,
          'A partition is listed in both rooms and each names the other.',
        );
    });
    room.gains.forEach((gain, j) => {
      if (gain.schedule !== undefined)
        refer('schedule', gain.schedule, `${path}.gains[${j}].schedule`);
    });
    if (room.infiltration.schedule !== undefined)
      refer('schedule', room.infiltration.schedule, `${path}.infiltration.schedule`);
    room.ventilation.forEach((ventilation, j) => {
      if (ventilation.schedule !== undefined)
        refer('schedule', ventilation.schedule, `${path}.ventilation[${j}].schedule`);
    });
    if (room.heating) scheduled(room.heating.setPointC, `${path}.heating.setPointC`);
    if (room.cooling) scheduled(room.cooling.setPointC, `${path}.cooling.setPointC`);
    if (room.comfort) {
      scheduled(room.comfort.bandLowC, `${path}.comfort.bandLowC`);
      scheduled(room.comfort.bandHighC, `${path}.comfort.bandHighC`);
      if (room.comfort.occupied !== undefined)
        refer('schedule', room.comfort.occupied, `${path}.comfort.occupied`);
    }
  }
}

/** Kinds that the parser looks up in the library too. */
const inLibrary = new Set(['material', 'construction', 'glazing']);

const plural = {
  material: 'materials',
  construction: 'constructions',
  glazing: 'glazings',
  profile: 'profiles',
  schedule: 'schedules',
  room: 'rooms',
};

/** A known id within two keystrokes of the wrong one, for the hint. */
export function nearest(id: string, known: ReadonlySet<string>): string | undefined {
  let best: string | undefined;
  let least = 3;
  for (const other of known) {
    const distance = editDistance(id, other);
    if (distance < least) [best, least] = [other, distance];
  }
  return best;
}

function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++)
      next[j] = Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1));
    row = next;
  }
  return row[b.length];
}
