// Heater and chiller sizes: steady design load, design spell with warm-up, design day, and the curve of
// the year against size from real runs. Sizes are proposals for design; local codes and a licensed
// practitioner decide.
import type { WeatherYear } from '../../weather/index.ts';
import type { Building, Room } from '../building/index.ts';
import { dayOfYear } from './peak-hour.ts';
import { curveAndPeak, pieces, presentW, runOf, upTo } from './size-curve.ts';
import type { SideSizing, SizedRoom, SizeOptions, Sizing, WarmUpPoint } from './size-types.ts';
import type { SpellResult } from './spell-job.ts';
import { type SteadyLoad, steadyLoad } from './steady-load.ts';
import { ask, type Study } from './study.ts';

const spellShares = [0.8, 1, 1.2, 1.4, 1.6, 1.8, 2, 2.4, 2.8, 3.4];

export function* size(
  building: Building,
  weather: WeatherYear,
  options: SizeOptions,
): Study<Sizing> {
  const steady = steadyLoad(building, weather, options);
  const cooled = options.coolToC === null ? building : withCooling(building, options.coolToC);
  const heatingRooms = building.rooms.filter((room) => room.heating);
  const coolingRooms = cooled.rooms.filter((room) => room.cooling);
  const notes = [...steady.assumptions];
  if (heatingRooms.length === 0) notes.push('No room has a heater, so there is none to size.');
  if (heatingRooms.some((room) => room.heating?.optimumStart))
    notes.push(
      'Sizes are found without early starts: the heaters follow their schedules as written.',
    );
  if (heatingRooms.some((room) => room.backupHeating))
    notes.push('Sizes are those of the main heaters alone; backup heaters are off.');
  if (coolingRooms.length === 0)
    notes.push('No room is cooled. To size a chiller, give a temperature to cool to.');
  const to = (share: number) => share / (coolingRooms.length > 0 ? 2 : 1);
  const heating =
    heatingRooms.length > 0
      ? yield* sizeHeating(building, weather, options, steady, heatingRooms, to)
      : null;
  const cooling =
    coolingRooms.length > 0
      ? yield* sizeCooling(cooled, weather, options, coolingRooms, heating ? 0.5 : 0)
      : null;
  return {
    study: 'size',
    project: building.name,
    options,
    steady,
    heating,
    cooling,
    notes,
    cautions: cautionsOf(heating, options),
  };
}

/** Ideal cooling for rooms that have none. */
export function withCooling(building: Building, toC: number): Building {
  return {
    ...building,
    rooms: building.rooms.map((room) =>
      room.cooling
        ? room
        : {
            ...room,
            cooling: { setPointC: toC, convectiveShare: 1, sensor: 'operative' as const, bandK: 0 },
          },
    ),
  };
}

const basisW = (steady: SteadyLoad, room: Room): number => {
  const own = steady.rooms.find((one) => one.room === room.id);
  // A room that loses next to nothing still needs a scale for its curve.
  return Math.max(own ? own.transmissionW + own.ventilationW : 0, 5 * room.floorAreaM2);
};

function* sizeHeating(
  building: Building,
  weather: WeatherYear,
  options: SizeOptions,
  steady: SteadyLoad,
  rooms: readonly Room[],
  to: (share: number) => number,
): Study<SideSizing> {
  const basis = rooms.map((room) => basisW(steady, room));
  const spellPieces = pieces(spellShares, options.pieces);
  const spells = yield* ask(
    'spell',
    spellPieces.map((shares) => ({
      kind: 'spell' as const,
      ...runOf(building, options),
      designOutdoorC: options.designOutdoorC,
      sizesW: shares.map((share) => basis.map((w) => share * w)),
    })),
    'running the design spell',
    0,
    to(0.2),
  );
  const spell = new Map(
    spells.flatMap((result, p) => result.sizes.map((one, i) => [spellPieces[p][i], one] as const)),
  );
  const sized = rooms.map((room, r): SizedRoom => {
    const own = steady.rooms.find((one) => one.room === room.id);
    const designW = own?.totalW ?? 0;
    const points = spellShares.map((share) => ({
      powerW: share * basis[r],
      hours: spell.get(share)?.rooms[r].warmUpH ?? null,
    }));
    const dynamicW = leastPower(points, options.warmUpH);
    const needW = Math.max(designW, dynamicW ?? points[points.length - 1].powerW);
    const chosenW = upTo(needW * (1 + options.marginShare), options.roomStepW);
    return {
      room: room.id,
      name: room.name,
      designW,
      dynamicW,
      chosenW,
      presentW: presentW(room, 'heating'),
      why: heatingWhy(designW, dynamicW, chosenW, options),
    };
  });
  const whole = yield* curveAndPeak(building, options, rooms, sized, 'heating', to(0.2), to(1));
  return {
    ...whole,
    warmUp: spellShares.map((share) => warmUpPoint(share, basis, spell.get(share)?.rooms ?? [])),
    designDay: dayOfYear(spells[0].lastDay, weather.hours, yearOf(building, weather)),
  };
}

const yearOf = (building: Building, weather: WeatherYear) => building.calendar.year ?? weather.year;

function warmUpPoint(
  share: number,
  basis: readonly number[],
  rooms: SpellResult['sizes'][number]['rooms'],
): WarmUpPoint {
  const hours = rooms.map((room) => room.warmUpH);
  return {
    share,
    totalW: basis.reduce((sum, w) => sum + share * w, 0),
    warmUpH: hours.some((h) => h === null) ? null : Math.max(...hours.map((h) => h ?? 0)),
    rooms: rooms.map(({ room, warmUpH }) => ({ room, warmUpH })),
  };
}

/** Least power whose warm-up keeps to the limit, straight between the powers tried; null where none does. */
export function leastPower(
  points: readonly { readonly powerW: number; readonly hours: number | null }[],
  limitH: number,
): number | null {
  for (const [i, point] of points.entries()) {
    if (point.hours === null || point.hours > limitH) continue;
    const before = i > 0 ? points[i - 1] : null;
    if (!before || before.hours === null) return point.powerW;
    const share = (before.hours - limitH) / (before.hours - point.hours);
    return before.powerW + share * (point.powerW - before.powerW);
  }
  return null;
}

function heatingWhy(
  designW: number,
  dynamicW: number | null,
  chosenW: number,
  options: SizeOptions,
): string {
  const margin = `${Math.round(options.marginShare * 100)} % on top, in steps of ${options.roomStepW} W`;
  const warm =
    dynamicW === null
      ? `no size tried warms it up within ${options.warmUpH} h on the design spell`
      : `warm-up within ${options.warmUpH} h on the design spell ${Math.round(dynamicW)} W`;
  return `Steady load ${Math.round(designW)} W at ${options.designOutdoorC} °C; ${warm}; ${margin}: ${chosenW} W.`;
}

function* sizeCooling(
  building: Building,
  weather: WeatherYear,
  options: SizeOptions,
  rooms: readonly Room[],
  from: number,
): Study<SideSizing> {
  const at = (share: number) => from + (1 - from) * share;
  const run = runOf(building, options);
  const [day] = yield* ask(
    'design-day',
    [{ kind: 'design-day', ...run }],
    'running the design day',
    at(0),
    at(0.1),
  );
  const free = rooms.map(() => Number.POSITIVE_INFINITY);
  const [year] = yield* ask(
    'sizes',
    [{ kind: 'sizes', ...run, side: 'cooling', sizesW: [free] }],
    'running the year',
    at(0.1),
    at(0.3),
  );
  const sized = rooms.map((room, r): SizedRoom => {
    const designW = day.rooms[r].peakW;
    const yearW = year.sizes[0].rooms[r].peakW;
    // A room that is never warm on the design day still needs a scale for its curve.
    const chosenW = Math.max(
      options.roomStepW,
      upTo(designW * (1 + options.marginShare), options.roomStepW),
    );
    return {
      room: room.id,
      name: room.name,
      designW,
      dynamicW: yearW,
      chosenW,
      presentW: presentW(room, 'cooling'),
      why: `Peak of the design day ${Math.round(designW)} W; of the year ${Math.round(yearW)} W; ${Math.round(options.marginShare * 100)} % on the design day, in steps of ${options.roomStepW} W: ${chosenW} W.`,
    };
  });
  const whole = yield* curveAndPeak(building, options, rooms, sized, 'cooling', at(0.3), at(1));
  return {
    ...whole,
    warmUp: [],
    designDay: dayOfYear(day.day, weather.hours, yearOf(building, weather)),
  };
}

function cautionsOf(heating: SideSizing | null, options: SizeOptions): string[] {
  const list = [
    'Sized on one year and one design temperature: a colder night will come. Check the size at the design temperature of the local code; where old or ill people live, let a licensed practitioner confirm it.',
  ];
  if (!heating) return list;
  const never = heating.rooms.filter((room) => room.dynamicW === null).map((room) => room.name);
  if (never.length > 0)
    list.push(
      `No size tried is warm within ${options.warmUpH} h on the design spell: ${never.join(', ')}. Allow a longer warm-up, raise the set-back, or leave it out on cold days.`,
    );
  const chosen = heating.curve.find((point) => point.share === 1);
  const cold = chosen?.outcome.rooms.filter((room) => room.unmetHours > 500) ?? [];
  if (cold.length > 0)
    list.push(
      `Cannot hold the set-point for much of the year even at the chosen size: ${cold.map((room) => `${room.room} (${room.unmetHours} h)`).join(', ')}. Look at the set-point's schedule, open windows and the heater's hours.`,
    );
  return list;
}
