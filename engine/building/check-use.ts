// Gains, usage profiles and comfort that name nothing, say too much or too little, or cannot be.
import type { Fault } from '../../weather/index.ts';
import { nearest } from './check-references.ts';
import { usageOf } from './from-library.ts';
import { libraryUsages } from './library/index.ts';
import type { Gain } from './schema-gains.ts';
import type { Scheduled } from './schema-plant.ts';
import type { Building } from './schema-project.ts';
import type { Room } from './schema-room.ts';

type Add = (path: string, found: string, expected: string, mend: string) => void;

/** Every fault in how rooms are used and judged. Schedules must be sound already. */
export function useFaults(building: Building, file: string): Fault[] {
  const faults: Fault[] = [];
  const add: Add = (path, found, expected, mend) =>
    faults.push({ file, place: { path }, found, expected, mend });
  building.rooms.forEach((room, i) => {
    const path = `rooms[${i}]`;
    usageFaults(room, `${path}.usage`, add);
    room.gains.forEach((gain, j) => {
      gainFaults(gain, `${path}.gains[${j}]`, add);
    });
    comfortFaults(building, room, `${path}.comfort`, add);
  });
  return faults;
}

function usageFaults(room: Room, path: string, add: Add) {
  if (room.usage === undefined) return;
  const [id, at] =
    typeof room.usage === 'string' ? [room.usage, path] : [room.usage.profile, `${path}.profile`];
  if (usageOf(id)) return;
  const ids = libraryUsages.map((one) => one.id);
  const near = nearest(id, new Set(ids));
  add(
    at,
    `"${id}"`,
    `a usage profile of the library: ${ids.join(', ')}`,
    near ? `Did you mean "${near}"?` : 'Choose one of them, or give the gains themselves.',
  );
}

const amounts = ['powerW', 'powerWPerM2', 'persons', 'floorPerPersonM2'] as const;

function gainFaults(gain: Gain, path: string, add: Add) {
  const given = amounts.filter((name) => gain[name] !== undefined);
  if (given.length !== 1)
    add(
      path,
      given.length === 0 ? 'no amount' : `${given.join(' and ')} together`,
      `exactly one of ${amounts.join(', ')}`,
      'Keep the one that you know.',
    );
  if (gain.kind === 'people') return;
  for (const name of ['persons', 'floorPerPersonM2', 'activity'] as const)
    if (gain[name] !== undefined)
      add(
        `${path}.${name}`,
        `${name} with kind "${gain.kind}"`,
        'kind "people"',
        'Only people are counted by heads and by what they do.',
      );
}

function comfortFaults(building: Building, room: Room, path: string, add: Add) {
  const votes = room.comfort?.votes;
  if (!votes) return;
  if (votes.clothingClo !== 'by-weather')
    rangeFault(building, votes.clothingClo, [0, 2], `${path}.votes.clothingClo`, 'clo', add);
  rangeFault(building, votes.metRate, [0.8, 4], `${path}.votes.metRate`, 'met', add);
}

/** The schema holds numbers in their range; a schedule's values are held here. */
function rangeFault(
  building: Building,
  value: Scheduled,
  [low, high]: readonly [number, number],
  path: string,
  unit: string,
  add: Add,
) {
  if (typeof value === 'number') return;
  const schedule = building.schedules.find((one) => one.id === value.schedule);
  if (!schedule) {
    add(
      `${path}.schedule`,
      `"${value.schedule}"`,
      'the id of a schedule in this file',
      'Define it under schedules, or correct the name.',
    );
    return;
  }
  const weeks = [schedule, ...schedule.periods];
  const used = new Set(weeks.flatMap((w) => [w.profile, w.saturday, w.sunday, w.holiday]));
  for (const profile of building.profiles) {
    if (!used.has(profile.id)) continue;
    const values =
      profile.kind === 'hours' ? profile.values : profile.points.map((point) => point.value);
    const wrong = values.find((v) => v < low || v > high);
    if (wrong !== undefined)
      add(
        path,
        `${wrong} in profile "${profile.id}"`,
        `${low} to ${high} ${unit}`,
        'Correct the profile; the method holds in these limits only.',
      );
  }
}
