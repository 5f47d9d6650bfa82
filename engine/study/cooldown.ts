// Cool-down: how fast and how cold once the heating is off, and what it takes to be warm again.
import type { WeatherYear } from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import { hourName } from '../findings/index.ts';
import type { CooldownJob } from './cooldown-job.ts';
import { extremeDay } from './spell-job.ts';
import { ask, type Study } from './study.ts';
import type { WarmUp } from './warm-up.ts';

export type CooldownMode = 'overnight' | 'weekend' | 'holiday';

/** Off and back in hours: 22:00 to 06:30, Friday 18:00 to Monday 07:00, ten days. */
const modes = {
  overnight: { offAtH: 22, hours: 72, backAfterH: 8.5, vacant: false },
  weekend: { offAtH: 18, hours: 96, backAfterH: 61, vacant: true },
  holiday: { offAtH: 12, hours: 264, backAfterH: 246, vacant: true },
} as const;

export interface CooldownOptions {
  readonly weather: string;
  readonly stepMinutes: number;
  readonly mode: CooldownMode;
  /** Day of the year on which heating goes off, 0 for 1 January; null: the coldest spell of the table. */
  readonly day: number | null;
  /** Hour of that day; null: the mode's. */
  readonly offAtH: number | null;
  readonly hours: number | null;
  /** Hours from off to the hour by which the rooms must be warm; null: the mode's. */
  readonly backAfterH: number | null;
  readonly designOutdoorC: number | null;
  readonly limits: readonly CooldownLimit[];
}

/** A temperature that should not be passed. */
export interface CooldownLimit {
  readonly name: string;
  readonly limitC: number;
}

export const usualLimits: readonly CooldownLimit[] = [
  { name: 'set-back', limitC: 16 },
  { name: 'cold for people', limitC: 12 },
  { name: 'frost protection', limitC: 5 },
];

/** When a limit is passed; null: not within the time looked at. */
export interface LimitTimes {
  readonly name: string;
  readonly limitC: number;
  readonly airAfterH: number | null;
  readonly operativeAfterH: number | null;
  readonly surfaceAfterH: number | null;
  /** Whether it would be passed at all if the spell's mean weather stayed for good. */
  readonly everReached: boolean;
}

export interface RoomCooldown {
  readonly room: string;
  readonly name: string;
  readonly startC: number;
  readonly lowestAirC: number;
  /** At the hour by which it must be warm, still without heating. */
  readonly airAtBackC: number | null;
  readonly endC: number;
  readonly decayTimeConstantH: number | null;
  readonly coldestSurface: string;
  readonly limits: readonly LimitTimes[];
  /** One value a step from the moment of switching off. */
  readonly airC: Float64Array;
  readonly operativeC: Float64Array;
  readonly coldestSurfaceC: Float64Array;
}

export interface Cooldown {
  readonly study: 'cooldown';
  readonly project: string;
  readonly options: CooldownOptions;
  readonly offAt: string;
  readonly backAt: string;
  readonly stepMinutes: number;
  readonly outdoor: { readonly minC: number; readonly meanC: number; readonly maxC: number };
  readonly outdoorC: Float64Array;
  readonly rooms: readonly RoomCooldown[];
  readonly coldestRoom: string;
  readonly timeConstantsH: readonly number[] | null;
  readonly targetC: readonly number[];
  /** Power against the time of switching on, from the earliest. */
  readonly warmUps: readonly (WarmUp & {
    readonly onAt: string;
    readonly shortRooms: readonly string[];
  })[];
  /** What the heaters there may give; Infinity where one has no limit. */
  readonly presentW: number;
  readonly notes: readonly string[];
  readonly cautions: readonly string[];
  readonly relativeBalanceResidual: number;
}

const warmUpHours = [8, 6, 5, 4, 3, 2, 1];

export function* cooldown(
  building: Building,
  weather: WeatherYear,
  options: CooldownOptions,
): Study<Cooldown> {
  const mode = modes[options.mode];
  const backAfterH = options.backAfterH ?? mode.backAfterH;
  const hours = Math.max(options.hours ?? mode.hours, Math.ceil(backAfterH));
  const day = options.day ?? Math.max(0, coldestSpellDay(weather, Math.ceil(hours / 24)));
  const offHour = 24 * day + (options.offAtH ?? mode.offAtH);
  const onAfterH = warmUpHours.map((h) => backAfterH - h).filter((h) => h > 0);
  const job: CooldownJob = {
    kind: 'cooldown',
    building,
    weather: options.weather,
    stepMinutes: options.stepMinutes,
    refine: 1,
    offHour,
    hours,
    designOutdoorC: options.designOutdoorC,
    vacant: mode.vacant,
    backAfterH,
    onAfterH,
  };
  const [result] = yield* ask('cooldown', [job], 'cooling down', 0, 1);
  const year = building.calendar.year ?? weather.year;
  const named = (hour: number) => {
    const text = hourName(Math.floor(hour) % weather.hours, weather.hours, year);
    const minutes = String(Math.round((hour % 1) * 60)).padStart(2, '0');
    return `${text.slice(0, -2)}${minutes}`;
  };
  const stepH = result.stepMinutes / 60;
  const rooms = result.rooms.map((room): RoomCooldown => {
    const at = Math.round(backAfterH / stepH);
    return {
      room: room.room,
      name: room.name,
      startC: room.airC[0],
      lowestAirC: room.airC.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY),
      airAtBackC: at < room.airC.length ? room.airC[at] : null,
      endC: room.endC,
      decayTimeConstantH: room.decayTimeConstantH,
      coldestSurface: room.coldestSurface,
      limits: options.limits.map(({ name, limitC }) => ({
        name,
        limitC,
        airAfterH: passedAfterH(room.airC, limitC, stepH),
        operativeAfterH: passedAfterH(room.operativeC, limitC, stepH),
        surfaceAfterH: passedAfterH(room.coldestSurfaceC, limitC, stepH),
        everReached: room.endC < limitC,
      })),
      airC: room.airC,
      operativeC: room.operativeC,
      coldestSurfaceC: room.coldestSurfaceC,
    };
  });
  const outdoorC = result.outdoorC.subarray(1);
  const { heaterMaxW } = result;
  const maxOf = (id: string) => heaterMaxW[result.rooms.findIndex((room) => room.room === id)];
  const heated = heaterMaxW.filter((w) => !Number.isNaN(w));
  const coldest = rooms.reduce((a, b) => (b.lowestAirC < a.lowestAirC ? b : a));
  const presentW = heated.reduce((a, b) => a + b, 0);
  const warmUps = result.warmUps.map((one) => ({
    ...one,
    onAt: named(offHour + backAfterH - one.hours),
    shortRooms: one.rooms.filter((room) => room.powerW > maxOf(room.room)).map((room) => room.room),
  }));
  return {
    study: 'cooldown',
    project: building.name,
    options,
    offAt: named(offHour),
    backAt: named(offHour + backAfterH),
    stepMinutes: result.stepMinutes,
    outdoor: {
      minC: Math.min(...outdoorC),
      meanC: outdoorC.reduce((a, b) => a + b, 0) / outdoorC.length,
      maxC: Math.max(...outdoorC),
    },
    outdoorC: result.outdoorC,
    rooms,
    coldestRoom: coldest.room,
    timeConstantsH: result.timeConstantsH,
    targetC: result.targetC,
    warmUps,
    presentW,
    notes: notesOf(rooms, result.timeConstantsH, mode.vacant, heated.length),
    cautions: cautionsOf(rooms, warmUps),
    relativeBalanceResidual: result.relativeBalanceResidual,
  };
}

/** First day of the coldest stretch of so many days. */
export function coldestSpellDay(weather: WeatherYear, days: number): number {
  if (days <= 1) return extremeDay(weather, -1);
  const { values } = weather.dryBulbC;
  const span = 24 * days;
  let sum = 0;
  let best = Number.POSITIVE_INFINITY;
  let day = 0;
  for (let h = 0; h < weather.hours; h++) {
    sum += values[h] - (h >= span ? values[h - span] : 0);
    const first = (h + 1 - span) / 24;
    if (first >= 0 && Number.isInteger(first) && sum < best) [best, day] = [sum, first];
  }
  return day;
}

/** Hours until a falling value first passes a limit; 0 where it starts below, null where it does not. */
export function passedAfterH(values: Float64Array, limitC: number, stepH: number): number | null {
  if (values[0] <= limitC) return 0;
  for (let k = 1; k < values.length; k++)
    if (values[k] <= limitC)
      return (k - 1 + (values[k - 1] - limitC) / (values[k - 1] - values[k])) * stepH;
  return null;
}

function notesOf(
  rooms: readonly RoomCooldown[],
  timeConstantsH: readonly number[] | null,
  vacant: boolean,
  heaters: number,
): string[] {
  const notes = [
    vacant
      ? 'Nobody is there while the heating is off: no people, lights or equipment.'
      : 'People, lights and equipment go on as scheduled.',
    'All heaters, backup heaters and chillers are off from the hour named.',
    'Time constants are those of the network with one node a layer, under the mean weather of the spell; the decay beside them is simulated with all nodes.',
  ];
  if (timeConstantsH === null)
    notes.push(
      'The building has too many nodes for its eigenvalues; the simulated decay stands alone.',
    );
  if (heaters === 0) notes.push('No room has a heater, so there is no warm-up power.');
  for (const [l, limit] of (rooms[0]?.limits ?? []).entries()) {
    const never = rooms.filter(
      ({ limits }) => limits[l].airAfterH === null && !limits[l].everReached,
    );
    if (never.length > 0)
      notes.push(
        `Never down to ${limit.limitC} °C in this weather, however long: ${never.map(({ name, endC }) => `${name} (ends at ${endC.toFixed(1)} °C)`).join(', ')}.`,
      );
    const late = rooms.filter(
      ({ limits }) => limits[l].airAfterH === null && limits[l].everReached,
    );
    if (late.length > 0)
      notes.push(
        `Not down to ${limit.limitC} °C in the time looked at, but in the end: ${late.map(({ name }) => name).join(', ')}. Look longer to see when.`,
      );
  }
  return notes;
}

function cautionsOf(rooms: readonly RoomCooldown[], warmUps: Cooldown['warmUps']): string[] {
  const list: string[] = [];
  const frost = rooms.flatMap(({ name, limits }) => {
    const hours = limits.find((one) => one.limitC === 5)?.airAfterH;
    return typeof hours === 'number' ? [`${name} after ${hours.toFixed(0)} h`] : [];
  });
  if (frost.length > 0)
    list.push(
      `Frost: the air reaches 5 °C in ${frost.join(', ')}; pipes in outside walls get there sooner. Leave a frost guard on, or drain; have it designed by a licensed practitioner.`,
    );
  const latest = warmUps.at(-1);
  const short = new Map(warmUps.map((one) => [one.hours, one.shortRooms]));
  if (latest && [...short.values()].every((names) => names.length > 0))
    list.push(
      `Not warm in time: even switched on ${Math.max(...short.keys())} h before, these need more than their heaters give: ${(short.get(Math.max(...short.keys())) ?? []).join(', ')}. Start earlier, set back less, or give them larger heaters.`,
    );
  return list;
}
