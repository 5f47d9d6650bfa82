// An invented run of two rooms, written out by rule instead of by the engine, for the tests of the report.
import { type Building, parseProjectDocument } from '../../../engine/building/index.ts';
import type {
  BalanceKWh,
  Findings,
  HourlyFlows,
  RoomFindings,
  RoomHours,
  Simulation,
} from '../../../engine/index.ts';
import { sampleProject } from '../sample.ts';

export const hours = 8760;

const hourly = (of: (hour: number) => number) =>
  Float64Array.from({ length: hours }, (_, h) => of(h));
const season = (h: number) => Math.cos((2 * Math.PI * (h / 24 - 203)) / 365);
const day = (h: number) => Math.cos((2 * Math.PI * ((h % 24) - 15)) / 24);

const flowNames = [
  'solar',
  'gains',
  'heating',
  'cooling',
  'opaque',
  'glazing',
  'ground',
  'infiltration',
  'ventilation',
  'rooms',
  'storage',
] as const;

function roomHours(id: string, name: string, shiftK: number): RoomHours {
  const operativeC = hourly((h) => 22 + shiftK + 4 * season(h) + 2 * day(h));
  const nought = () => new Float64Array(hours);
  return {
    id,
    name,
    floorAreaM2: 20,
    airC: operativeC,
    meanRadiantC: operativeC,
    operativeC,
    heatingW: hourly((h) => Math.max(0, -900 * season(h) - 100 * day(h))),
    coolingW: nought(),
    bandLowC: nought().fill(19),
    bandHighC: nought().fill(26),
    occupied: Uint8Array.from({ length: hours }, (_, h) => (h % 24 >= 8 && h % 24 < 18 ? 1 : 0)),
    flowsW: Object.fromEntries(flowNames.map((key) => [key, nought()])) as HourlyFlows,
  };
}

export const balanceKWh: BalanceKWh = {
  solar: 1234.5,
  gains: 700.4,
  heating: 2000.6,
  cooling: 0,
  opaque: -1500.2,
  glazing: -600.7,
  ground: -433.3,
  infiltration: -1201.1,
  ventilation: -200.2,
  rooms: 0,
  storage: 0,
  residual: 0,
};

function roomFindings(room: RoomHours): RoomFindings {
  const values = Array.from(room.operativeC);
  const extremes = {
    min: Math.min(...values),
    max: Math.max(...values),
    mean: 22,
    minAt: '2025-01-22T03:00',
    maxAt: '2025-07-23T15:00',
  };
  const above = values.map((t, h) => (room.occupied[h] ? Math.max(0, t - 26) : 0));
  const count = above.filter((k) => k > 0).length;
  const sum = above.reduce((a, b) => a + b, 0);
  return {
    id: room.id,
    name: room.name,
    floorAreaM2: room.floorAreaM2,
    heatingKWh: room.heatingW.reduce((a, b) => a + b, 0) / 1000,
    coolingKWh: 0,
    peakHeatingW: Math.max(...room.heatingW),
    peakHeatingAt: '2025-01-22T03:00',
    peakCoolingW: 0,
    peakCoolingAt: '',
    airTemperatureC: extremes,
    operativeTemperatureC: extremes,
    occupiedHours: 3650,
    hoursBelowBand: 0,
    hoursAboveBand: count,
    degreeHoursBelow: 0,
    degreeHoursAbove: sum,
    heatingByMonthKWh: [500, 400, 300, 200, 100, 10, 0, 0, 100, 200, 300, 400],
    coolingByMonthKWh: new Array(12).fill(0),
    balanceKWh,
    worstWeekBelow: null,
    worstWeekAbove: sum > 0 ? { from: '2025-07-20', firstHour: 4800, degreeHours: sum / 8 } : null,
    hoursHeatingShort: 0,
    hoursCoolingShort: 0,
  };
}

/** Names and words may be set, to see what the page makes of them. */
export function sampleRun(
  words: { project?: string; room?: string; caution?: string; repair?: string } = {},
): Simulation {
  const rooms = [roomHours('hot', words.room ?? 'Sun room', 3), roomHours('cool', 'Larder', -1)];
  const found = rooms.map(roomFindings);
  const [hot, cool] = found;
  if (!hot || !cool) throw new Error('two rooms');
  const findings: Findings = {
    project: words.project ?? 'Sample house',
    weather: {
      place: 'Nowhere',
      form: 'plain table',
      hours,
      repairs: [{ kind: 'repair', text: words.repair ?? 'Filled 2 hours of wind.', count: 2 }],
    },
    stepMinutes: 15,
    rooms: found,
    building: {
      ...hot,
      floorAreaM2: 40,
      occupiedHours: 7300,
      hoursAboveBand: hot.hoursAboveBand + cool.hoursAboveBand,
    },
    assumptions: ['The ground is dry.'],
    cautions: [words.caution ?? 'Heat: the sun room is hot.'],
    quality: {
      relativeBalanceResidual: 3.4e-13,
      unconvergedSteps: 0,
      warmUpDays: 14,
      warmUpDriftK: 1e-3,
      nodes: 12,
    },
    timings: { readMs: 1, assembleMs: 2, runMs: 3 },
  };
  const outdoorC = hourly((h) => 10 + 8 * season(h) + 4 * day(h));
  return { findings, hours, year: 2025, outdoorC, rooms };
}

export function sampleBuilding(): Building {
  const parsed = parseProjectDocument(sampleProject, 'sample.inglenook.json');
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.faults));
  return parsed.value;
}
