// An invented simulation for drawing and for tests of the window: plausible in shape, computed by no
// engine. Four rooms, a mild sea climate, one hot spell in July.

import { makeCalendar } from '../../../app/ui/format/index.ts';
import type {
  RoomSeries,
  RoomTotals,
  Simulation,
  Stream,
  Totals,
} from '../../../app/ui/simulation.ts';
import { streams } from '../../../app/ui/simulation.ts';
import { hourName } from '../../../engine/index.ts';

interface Sketch {
  readonly id: string;
  readonly name: string;
  readonly floorAreaM2: number;
  readonly sunny: number;
  readonly limitW: number;
  readonly isOccupied: (hourOfDay: number) => boolean;
}

const home = (h: number) => h >= 7 && h < 22;
const night = (h: number) => h >= 21 || h < 8;
const sketches: readonly Sketch[] = [
  {
    id: 'living',
    name: 'Living room',
    floorAreaM2: 24,
    sunny: 1.1,
    limitW: 2200,
    isOccupied: home,
  },
  { id: 'bed', name: 'Bedroom', floorAreaM2: 16.5, sunny: 0.8, limitW: 1100, isOccupied: night },
  {
    id: 'study',
    name: 'Study under the roof',
    floorAreaM2: 11.2,
    sunny: 1.9,
    limitW: 800,
    isOccupied: (h) => h >= 8 && h < 18,
  },
  { id: 'hall', name: 'Hall', floorAreaM2: 9, sunny: 0.2, limitW: 600, isOccupied: () => false },
];

/** A repeatable wobble between -1 and 1. */
function wobble(n: number): number {
  const s = Math.sin(n * 12.9898) * 43758.5453;
  return 2 * (s - Math.floor(s)) - 1;
}

function outdoor(hours: number): Float64Array {
  let weather = 0;
  return Float64Array.from({ length: hours }, (_, h) => {
    const day = h / 24;
    if (h % 6 === 0) weather = 0.93 * weather + 1.3 * wobble(h);
    const season = 9.8 - 7.2 * Math.cos(((day - 20) / 365) * 2 * Math.PI);
    const swing =
      (3 + 2 * Math.sin(((day - 80) / 365) * 2 * Math.PI)) * -Math.cos(((h - 3) / 12) * Math.PI);
    const spell = 8 * Math.exp(-(((day - 197) / 5) ** 2));
    const cold = -7 * Math.exp(-(((day - 16) / 4) ** 2));
    return season + swing + weather + spell + cold;
  });
}

type TemperatureRange = Totals['airTemperatureC'];

const fixtureYear = 2023;
const stamp = (hour: number, hours: number) => hourName(hour, hours, fixtureYear);

function range(series: Float64Array): TemperatureRange {
  let minAt = 0;
  let maxAt = 0;
  let sum = 0;
  series.forEach((t, h) => {
    sum += t;
    if (t < series[minAt]) minAt = h;
    if (t > series[maxAt]) maxAt = h;
  });
  return {
    min: series[minAt],
    max: series[maxAt],
    mean: sum / series.length,
    minAt: stamp(minAt, series.length),
    maxAt: stamp(maxAt, series.length),
  };
}

const indexOfMost = (series: Float64Array) =>
  series.reduce((best, value, h) => (value > series[best] ? h : best), 0);
const sumOf = (series: Float64Array) => series.reduce((sum, value) => sum + value, 0);

const sketchLimit = (id: string) => sketches.find((one) => one.id === id)?.limitW ?? Infinity;

const byMonth = (watts: Float64Array) =>
  makeCalendar(watts.length, fixtureYear).months.map(
    (month) => sumOf(watts.subarray(month.firstHour, month.endHour)) / 1000,
  );

function makeRoom(sketch: Sketch, outdoorC: Float64Array): RoomSeries {
  const hours = outdoorC.length;
  const zeros = () => new Float64Array(hours);
  const flowsW = Object.fromEntries([...streams, 'storage'].map((key) => [key, zeros()])) as Record<
    Stream | 'storage',
    Float64Array
  >;
  const room = {
    id: sketch.id,
    name: sketch.name,
    floorAreaM2: sketch.floorAreaM2,
    airC: zeros(),
    operativeC: zeros(),
    meanRadiantC: zeros(),
    heatingW: zeros(),
    coolingW: zeros(),
    bandLowC: new Float64Array(hours).fill(NaN),
    bandHighC: new Float64Array(hours).fill(NaN),
    occupied: new Uint8Array(hours),
    flowsW,
  };
  let t = 18;
  for (let h = 0; h < hours; h++) {
    const hourOfDay = h % 24;
    const day = h / 24;
    const up = Math.max(0, Math.sin(((hourOfDay - 6) / 12) * Math.PI));
    const season = 0.55 - 0.45 * Math.cos(((day + 10) / 365) * 2 * Math.PI);
    const clear = 0.5 + 0.5 * wobble(Math.floor(day) + 0.5);
    const isIn = sketch.isOccupied(hourOfDay);
    const out = outdoorC[h];
    flowsW.solar[h] = 520 * sketch.sunny * up * season * clear;
    flowsW.gains[h] = isIn ? 140 : 30;
    const lossWPerK = sketch.floorAreaM2 * 2.1;
    const free = flowsW.solar[h] + flowsW.gains[h] - lossWPerK * (t - out);
    const target = isIn ? 20.4 : 16.5;
    const capacityWhPerK = sketch.floorAreaM2 * 70;
    const need = capacityWhPerK * (target - t) * 0.5 - free;
    flowsW.heating[h] = t < target && need > 0 ? Math.min(need, sketch.limitW) : 0;
    room.heatingW[h] = flowsW.heating[h];
    const loss = lossWPerK * (t - out);
    flowsW.opaque[h] = -0.36 * loss;
    flowsW.glazing[h] = -0.22 * loss;
    flowsW.ground[h] = -0.07 * loss;
    flowsW.infiltration[h] = -0.2 * loss;
    flowsW.ventilation[h] = -0.15 * loss;
    flowsW.rooms[h] = sketch.id === 'hall' ? 30 : sketch.id === 'living' ? -30 : 0;
    let net = 0;
    for (const key of streams) net += flowsW[key][h];
    flowsW.storage[h] = net;
    t += net / capacityWhPerK;
    room.airC[h] = t;
    room.meanRadiantC[h] = t - 0.02 * (t - out);
    room.operativeC[h] = (room.airC[h] + room.meanRadiantC[h]) / 2;
    if (isIn) {
      room.occupied[h] = 1;
      room.bandLowC[h] = 20;
      room.bandHighC[h] = 26;
    }
  }
  return room;
}

function totalsOf(room: RoomSeries): RoomTotals {
  let below = 0;
  let above = 0;
  let degreeBelow = 0;
  let degreeAbove = 0;
  room.occupied.forEach((isIn, h) => {
    if (!isIn) return;
    const under = room.bandLowC[h] - room.operativeC[h];
    const over = room.operativeC[h] - room.bandHighC[h];
    if (under > 0) below++;
    if (over > 0) above++;
    degreeBelow += Math.max(0, under);
    degreeAbove += Math.max(0, over);
  });
  const peakHeatingAt = indexOfMost(room.heatingW);
  const kWh = (key: Stream | 'storage') => sumOf(room.flowsW[key]) / 1000;
  const into = streams.map((key) => [key, kWh(key)] as const);
  return {
    id: room.id,
    name: room.name,
    floorAreaM2: room.floorAreaM2,
    heatingKWh: kWh('heating'),
    coolingKWh: 0,
    peakHeatingW: room.heatingW[peakHeatingAt],
    peakHeatingAt: stamp(peakHeatingAt, room.heatingW.length),
    peakCoolingW: 0,
    peakCoolingAt: '',
    airTemperatureC: range(room.airC),
    operativeTemperatureC: range(room.operativeC),
    occupiedHours: room.occupied.reduce((sum, isIn) => sum + isIn, 0),
    hoursBelowBand: below,
    hoursAboveBand: above,
    degreeHoursBelow: degreeBelow,
    degreeHoursAbove: degreeAbove,
    heatingByMonthKWh: byMonth(room.heatingW),
    coolingByMonthKWh: byMonth(room.coolingW),
    worstWeekBelow: null,
    worstWeekAbove: null,
    hoursHeatingShort: room.heatingW.reduce(
      (count, w, h) => count + (w >= sketchLimit(room.id) && room.operativeC[h] < 18 ? 1 : 0),
      0,
    ),
    hoursCoolingShort: 0,
    balanceKWh: {
      ...(Object.fromEntries(into) as Record<Stream, number>),
      storage: kWh('storage'),
      residual: 0,
    },
  };
}

function houseOf(rooms: readonly RoomSeries[], totals: readonly RoomTotals[]): Totals {
  const sum = (of: (room: RoomTotals) => number) => totals.reduce((all, room) => all + of(room), 0);
  const together = new Float64Array(rooms[0]?.heatingW.length ?? 0);
  for (const room of rooms)
    for (let h = 0; h < together.length; h++) together[h] += room.heatingW[h];
  const peakHeatingAt = indexOfMost(together);
  const pick = (key: 'airTemperatureC' | 'operativeTemperatureC'): TemperatureRange => {
    const lowest = totals.reduce((a, b) => (b[key].min < a[key].min ? b : a))[key];
    const highest = totals.reduce((a, b) => (b[key].max > a[key].max ? b : a))[key];
    const mean = sum((room) => room[key].mean * room.floorAreaM2) / sum((r) => r.floorAreaM2);
    return { ...highest, min: lowest.min, minAt: lowest.minAt, mean };
  };
  const keys = [...streams, 'storage', 'residual'] as const;
  return {
    floorAreaM2: sum((room) => room.floorAreaM2),
    heatingKWh: sum((room) => room.heatingKWh),
    coolingKWh: 0,
    peakHeatingW: together[peakHeatingAt],
    peakHeatingAt: stamp(peakHeatingAt, together.length),
    peakCoolingW: 0,
    peakCoolingAt: '',
    airTemperatureC: pick('airTemperatureC'),
    operativeTemperatureC: pick('operativeTemperatureC'),
    occupiedHours: sum((room) => room.occupiedHours),
    hoursBelowBand: sum((room) => room.hoursBelowBand),
    hoursAboveBand: sum((room) => room.hoursAboveBand),
    degreeHoursBelow: sum((room) => room.degreeHoursBelow),
    degreeHoursAbove: sum((room) => room.degreeHoursAbove),
    heatingByMonthKWh: byMonth(together),
    coolingByMonthKWh: byMonth(new Float64Array(together.length)),
    balanceKWh: Object.fromEntries(
      keys.map((key) => [key, sum((room) => room.balanceKWh[key])]),
    ) as unknown as Totals['balanceKWh'], // one entry a key of the list above
  };
}

export function makeSimulation(hours = 8760): Simulation {
  const outdoorC = outdoor(hours);
  const rooms = sketches.map((sketch) => makeRoom(sketch, outdoorC));
  const totals = rooms.map(totalsOf);
  return {
    findings: {
      project: 'Saltmarsh Row 3',
      weather: {
        place: 'Brackwater',
        form: 'plain table, one row an hour',
        hours,
        repairs: [
          {
            kind: 'repair',
            text: 'Gap of 6 h on 14 August, 02:00 to 08:00, filled from the hours beside it',
            count: 6,
          },
          {
            kind: 'assumption',
            text: 'No infrared from the sky in the table: derived from dew point and cloud',
            count: 8760,
          },
        ],
      },
      stepMinutes: 15,
      rooms: totals,
      building: houseOf(rooms, totals),
      assumptions: [
        'Ground reflectance 0.2 all year: the weather table has none',
        'Outside walls: absorptance 0.6, as the project gives none',
      ],
      cautions: [],
      quality: {
        relativeBalanceResidual: 3.1e-12,
        unconvergedSteps: 0,
        warmUpDays: 14,
        warmUpDriftK: 0.004,
        nodes: 96,
      },
      timings: { readMs: 92, assembleMs: 11, runMs: 214 },
    },
    hours,
    year: fixtureYear,
    outdoorC,
    rooms,
  };
}
