// Edits of profiles, schedules and gains.

import type { Building, Change, Json } from '../../engine/index.ts';
import {
  freeId,
  type ProfileForm,
  type ProjectForm,
  type RoomForm,
  type ScheduleForm,
} from './form.ts';
import { nameOf } from './room-edits.ts';
import type { Edit } from './story.ts';

const json = (value: unknown): Json => value as Json;

/** What the building takes from the library is copied into the document before it is edited. */
function ownProfile(form: ProjectForm, building: Building, id: string): Change[] {
  if (form.profiles?.some((one) => one.id === id)) return [];
  const profile = building.profiles.find((one) => one.id === id);
  return profile ? [{ path: 'profiles[+]', value: json(profile) }] : [];
}

function ownSchedule(form: ProjectForm, building: Building, id: string): Change[] {
  if (form.schedules?.some((one) => one.id === id)) return [];
  const schedule = building.schedules.find((one) => one.id === id);
  return schedule ? [{ path: 'schedules[+]', value: json(schedule) }] : [];
}

/** A profile by hours, painted or typed; one by points becomes one by hours. */
export function profileEdit(
  form: ProjectForm,
  building: Building,
  profile: ProfileForm,
  values: readonly number[],
  gesture?: string,
): Edit {
  const next: ProfileForm = {
    kind: 'hours',
    id: profile.id,
    ...(profile.name === undefined ? {} : { name: profile.name }),
    values: [...values],
  };
  return {
    name: `Hours of ${nameOf(profile)}`,
    changes: [
      ...ownProfile(form, building, profile.id),
      { path: `profiles[${profile.id}]`, value: json(next) },
    ],
    ...(gesture === undefined ? {} : { gesture }),
  };
}

export type DayKind = 'profile' | 'saturday' | 'sunday' | 'holiday';

/** Which profile holds on a kind of day; undefined: the same as on weekdays. */
export function dayEdit(
  form: ProjectForm,
  building: Building,
  schedule: ScheduleForm,
  day: DayKind,
  profile: string | undefined,
): Edit {
  return {
    name: `${nameOf(schedule)}, ${day === 'profile' ? 'weekdays' : day}`,
    changes: [
      ...ownSchedule(form, building, schedule.id),
      { path: `schedules[${schedule.id}].${day}`, value: profile },
    ],
  };
}

export function scheduleFieldEdit(
  form: ProjectForm,
  building: Building,
  schedule: ScheduleForm,
  field: 'name' | 'periods',
  value: unknown,
  name: string,
): Edit {
  return {
    name,
    changes: [
      ...ownSchedule(form, building, schedule.id),
      { path: `schedules[${schedule.id}].${field}`, value: json(value) },
    ],
  };
}

/** A schedule of its own with a profile of its own, both like those given. */
export function newSchedule(building: Building, like: ScheduleForm | undefined) {
  const id = freeId(
    like?.id ?? 'schedule',
    building.schedules.map((one) => one.id),
  );
  const profileId = freeId(
    id,
    building.profiles.map((one) => one.id),
  );
  const old = building.profiles.find((one) => one.id === like?.profile);
  const values = old?.kind === 'hours' ? old.values : new Array(24).fill(1);
  const name = like ? `${nameOf(like)}, copy` : 'New schedule';
  const edit: Edit = {
    name: `${name} added`,
    changes: [
      { path: 'profiles[+]', value: { kind: 'hours', id: profileId, name, values: json(values) } },
      { path: 'schedules[+]', value: { id, name, profile: profileId } },
    ],
  };
  return { id, edit };
}

/** A profile of its own for one kind of day, like the one that holds there now. */
export function ownDayProfile(
  form: ProjectForm,
  building: Building,
  schedule: ScheduleForm,
  day: DayKind,
): Edit | null {
  const old = building.profiles.find((one) => one.id === (schedule[day] ?? schedule.profile));
  if (!old) return null;
  const id = freeId(
    `${schedule.id}-${day === 'profile' ? 'weekday' : day}`,
    building.profiles.map((one) => one.id),
  );
  return {
    name: `${nameOf(schedule)}: own hours`,
    changes: [
      ...ownSchedule(form, building, schedule.id),
      { path: 'profiles[+]', value: json({ ...old, id }) },
      { path: `schedules[${schedule.id}].${day}`, value: id },
    ],
  };
}

export function addGain(room: RoomForm): Edit {
  const id = freeId(
    'gain',
    (room.gains ?? []).map((one) => one.id),
  );
  const value = { id, name: 'Equipment', kind: 'equipment', powerW: 100 };
  return {
    name: `Gain added to ${nameOf(room)}`,
    changes: [{ path: `rooms[${room.id}].gains[+]`, value }],
  };
}

const amounts = ['powerW', 'powerWPerM2', 'persons', 'floorPerPersonM2'] as const;
export type GainAmount = (typeof amounts)[number];
export const usualAmount: Readonly<Record<GainAmount, number>> = {
  powerW: 100,
  powerWPerM2: 5,
  persons: 1,
  floorPerPersonM2: 20,
};

export function amountOf(
  gain: Readonly<Partial<Record<GainAmount, number | undefined>>>,
): GainAmount {
  return amounts.find((one) => gain[one] !== undefined) ?? 'powerW';
}

/** The amount stands in exactly one field. */
export function gainAmountEdit(
  path: string,
  name: string,
  amount: GainAmount,
  value: number,
): Edit {
  const changes: Change[] = amounts.map((one) => ({
    path: `${path}.${one}`,
    value: one === amount ? value : undefined,
  }));
  if (amount === 'persons' || amount === 'floorPerPersonM2') {
    changes.push({ path: `${path}.kind`, value: 'people' });
  }
  return { name, changes };
}
