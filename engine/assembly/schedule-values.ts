// A schedule of the project, or a constant, as one value a step.
import {
  type Building,
  type Profile,
  profileOf,
  type Schedule,
  type Scheduled,
  scheduleOf,
} from '../building/index.ts';
import type { StepClock } from './step-clock.ts';

/** Where in the step the profile is read. At a jump `end` takes the value before it, `start` the one after. */
type At = 'start' | 'middle' | 'end';

/** Value of the schedule with this id in every step; asked for twice it is the same array. */
export function scheduleValues(
  building: Building,
  id: string,
  clock: StepClock,
  at: At = 'middle',
): Float64Array {
  const key = `${id} ${at}`;
  const known = clock.laidOut.get(key);
  if (known) return known;
  const schedule = scheduleOf(building, id);
  const holidays = new Set(building.calendar.holidays);
  const ofDay = clock.monthDay.map((monthDay, d) =>
    profileOf(building, profileOfDay(schedule, monthDay, clock.weekday[d], holidays)),
  );
  const values = new Float64Array(clock.count);
  const intoStepH = (intoStep[at] * clock.stepS) / 3600;
  for (let k = 0; k < clock.count; k++)
    values[k] = profileValue(ofDay[clock.day[k]], clock.hourOfDay[k] + intoStepH, at);
  clock.laidOut.set(key, values);
  return values;
}

const intoStep = { start: 0, middle: 0.5, end: 1 };

/** The same for a field that may hold a number instead. */
export function scheduledValues(
  building: Building,
  value: Scheduled,
  clock: StepClock,
  at: At = 'middle',
): Float64Array {
  return typeof value === 'number'
    ? new Float64Array(clock.count).fill(value)
    : scheduleValues(building, value.schedule, clock, at);
}

/** A scheduled value at both ends of every step, for a series that holds ramps: start, end, start, … */
export function scheduledRamp(
  building: Building,
  value: Scheduled,
  clock: StepClock,
): Float64Array {
  const starts = scheduledValues(building, value, clock, 'start');
  const ends = scheduledValues(building, value, clock, 'end');
  const both = new Float64Array(2 * clock.count);
  for (let k = 0; k < clock.count; k++) {
    both[2 * k] = starts[k];
    both[2 * k + 1] = ends[k];
  }
  return both;
}

function profileOfDay(
  schedule: Schedule,
  monthDay: string,
  weekday: number,
  holidays: ReadonlySet<string>,
): string {
  const period = schedule.periods.find(({ from, to }) =>
    from <= to ? from <= monthDay && monthDay <= to : monthDay >= from || monthDay <= to,
  );
  const week = period ?? schedule;
  if (holidays.has(monthDay) && week.holiday !== undefined) return week.holiday;
  if (weekday === 6 && week.saturday !== undefined) return week.saturday;
  if (weekday === 7 && week.sunday !== undefined) return week.sunday;
  return week.profile;
}

/** Value of a day's profile. */
function profileValue(profile: Profile, hour: number, at: At): number {
  if (profile.kind === 'hours') {
    const h = at === 'end' ? Math.ceil(hour - 1e-9) - 1 : Math.floor(hour + 1e-9);
    return profile.values[Math.min(23, Math.max(0, h))];
  }
  const { points } = profile;
  let before = -1;
  for (let i = 0; i < points.length; i++) {
    const passed = at === 'end' ? points[i].atH < hour - 1e-9 : points[i].atH <= hour + 1e-9;
    if (passed) before = i;
  }
  if (before < 0) return points[0].value;
  if (before === points.length - 1) return points[before].value;
  const a = points[before];
  const b = points[before + 1];
  return a.value + ((b.value - a.value) * (hour - a.atH)) / (b.atH - a.atH);
}
