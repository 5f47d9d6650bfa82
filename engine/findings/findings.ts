// Run → figures. Everything here is arithmetic on the run's hourly records.

import type { WeatherYear } from '../../weather/index.ts';
import {
  type Assembly,
  type PeopleHours,
  type PlantParts,
  referenceVapourPa,
} from '../assembly/index.ts';
import type { Run } from '../network/index.ts';
import { personGain } from '../physics/index.ts';
import { cautions } from './cautions.ts';
import { runningMeanHoursC } from './comfort-adaptive.ts';
import { bandFindings } from './comfort-band.ts';
import { explainedOnce } from './explain-glazing.ts';
import { finalEnergy } from './final-energy.ts';
import { hourName, monthOfHour } from './hour-name.ts';
import { moistureAssumption, moistureOf } from './moisture.ts';
import { roomComfort } from './room-comfort.ts';
import { roomHours } from './room-hours.ts';
import type {
  BalanceKWh,
  Extremes,
  Findings,
  RoomFindings,
  RoomHours,
  Simulation,
  SpaceFindings,
} from './simulation.ts';
import { windowFindings } from './window-findings.ts';

const balanceLines = [
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
] as const;

/** Figures and hours of a finished run. */
export function simulationOf(
  assembly: Assembly,
  weather: WeatherYear,
  run: Run,
  timings: Findings['timings'],
): Simulation {
  const year = assembly.building.calendar.year ?? weather.year;
  const outdoorC = outdoorHours(assembly, run);
  const runningMeanC = runningMeanHoursC(outdoorC);
  const climate = { outdoorC, runningMeanC, latitudeDeg: weather.site.latitudeDeg, year };
  const rooms: RoomHours[] = [];
  const figures: RoomFindings[] = [];
  const energy = finalEnergy(assembly.building, assembly.rooms, outdoorC, (m) =>
    meterHours(run, m),
  );
  const plain = assembly.rooms.map((parts) => roomHours(run, parts));
  const moisture = moistureOf(
    assembly,
    run,
    plain.map((hours) => hours.airC),
    outdoorC,
  );
  assembly.rooms.forEach((parts, r) => {
    const damp = moisture?.[r];
    const hours = damp ? { ...plain[r], relativeHumidity: damp.relativeHumidity } : plain[r];
    const comfort = roomComfort(run, parts, hours, climate);
    rooms.push(comfort.vote ? { ...hours, vote: comfort.vote } : hours);
    figures.push({
      ...roomFindings(hours, year, parts.plants),
      ...latentGains(parts.people, hours.airC),
      ...comfort.findings,
      ...(damp ? { moisture: damp.findings } : {}),
      ...energy?.rooms[r],
    });
  });
  const building = { ...wholeFindings(rooms, figures, year), ...energy?.building };
  const worstRoom = Math.max(
    0,
    ...figures.map(({ balanceKWh }) => Math.abs(balanceKWh.residual) / throughput(balanceKWh)),
  );
  const { quality } = run;
  const explain = explainedOnce();
  const findings: Findings = {
    project: assembly.building.name,
    weather: {
      place: weather.site.name,
      form: weather.form,
      hours: weather.hours,
      repairs: weather.notes,
    },
    stepMinutes: run.problem.stepS / 60,
    rooms: figures,
    building,
    windows: assembly.rooms.flatMap((parts, r) =>
      windowFindings(assembly, parts, rooms[r], outdoorC, (m) => meterHours(run, m), explain),
    ),
    ...(energy ? { supplies: energy.supplies, currency: assembly.building.energy.currency } : {}),
    assumptions: [
      ...assembly.assumptions,
      ...(energy?.assumptions ?? []),
      ...(moisture ? [moistureAssumption] : []),
    ],
    cautions: [...assembly.cautions, ...cautions(figures, energy?.supplies)],
    quality: {
      relativeBalanceResidual: Math.max(quality.relativeBalanceResidual, worstRoom),
      unconvergedSteps: quality.unconvergedSteps,
      warmUpDays: (quality.warmUpSteps * run.problem.stepS) / 86_400,
      warmUpDriftK: quality.warmUpDriftK,
      nodes: run.problem.network.nodeNames.length,
    },
    timings,
  };
  return { findings, hours: run.records, year, outdoorC, rooms };
}

function meterHours(run: Run, meter: number): Float64Array {
  const width = run.problem.meters.length;
  return Float64Array.from({ length: run.records }, (_, h) => run.meterW[h * width + meter]);
}

/** Heat of people that is no dry heat, by the air of each hour. */
function latentGains(people: readonly PeopleHours[], airC: Float64Array) {
  if (people.length === 0) return {};
  let sumW = 0;
  for (const { metRate, sweats, heads } of people)
    for (let h = 0; h < airC.length; h++)
      if (heads[h] > 0)
        sumW += heads[h] * personGain(metRate, sweats ? airC[h] : 24, referenceVapourPa).latentW;
  return { latentGainsKWh: sumW / 1000 };
}

function outdoorHours(assembly: Assembly, run: Run): Float64Array {
  const { recordNodes } = run.problem;
  const at = recordNodes.indexOf(assembly.outdoorNode);
  return Float64Array.from(
    { length: run.records },
    (_, h) => run.meanC[h * recordNodes.length + at],
  );
}

function roomFindings(hours: RoomHours, year: number, plants: readonly PlantParts[]): RoomFindings {
  return {
    id: hours.id,
    name: hours.name,
    ...spaceEnergy([hours], year),
    floorAreaM2: hours.floorAreaM2,
    airTemperatureC: extremes(hours.airC, year),
    operativeTemperatureC: extremes(hours.operativeC, year),
    ...bandFindings(hours, year),
    hoursHeatingShort: hoursShort(
      hours.heatingW,
      plants.filter((one) => one.field !== 'cooling'),
      hours,
    ),
    hoursCoolingShort: hoursShort(
      hours.coolingW,
      plants.filter((one) => one.field === 'cooling'),
      hours,
    ),
  };
}

/** Hours in which these plants gave all they had and the first one's set-point was missed by over 0.2 K. */
function hoursShort(powerW: Float64Array, plants: readonly PlantParts[], room: RoomHours): number {
  if (plants.length === 0) return 0;
  const [{ field, plant, setPointC }] = plants;
  const sensorC = plant.sensor === 'air' ? room.airC : room.operativeC;
  const sign = field === 'cooling' ? -1 : 1;
  const maxW = plants.reduce((sum, one) => sum + one.maxW, 0);
  let count = 0;
  for (let h = 0; h < powerW.length; h++)
    if (powerW[h] >= maxW * (1 - 1e-6) && sign * (setPointC[h] - sensorC[h]) > 0.2) count++;
  return count;
}

type Energy = Pick<
  SpaceFindings,
  | 'heatingKWh'
  | 'coolingKWh'
  | 'peakHeatingW'
  | 'peakHeatingAt'
  | 'peakCoolingW'
  | 'peakCoolingAt'
  | 'heatingByMonthKWh'
  | 'coolingByMonthKWh'
  | 'balanceKWh'
>;

/** Energies and coincident peaks of one room or several together. */
function spaceEnergy(rooms: readonly RoomHours[], year: number): Energy {
  const heatingW = together(rooms, (room) => room.heatingW);
  const coolingW = together(rooms, (room) => room.coolingW);
  const heating = peak(heatingW, year);
  const cooling = peak(coolingW, year);
  const line = (name: keyof RoomHours['flowsW']) =>
    rooms.reduce((sum, room) => sum + kWh(room.flowsW[name]), 0);
  const lines = Object.fromEntries(balanceLines.map((name) => [name, line(name)])) as Record<
    (typeof balanceLines)[number],
    number
  >;
  const storage = line('storage');
  const into = balanceLines.reduce((sum, name) => sum + lines[name], 0);
  return {
    heatingKWh: kWh(heatingW),
    coolingKWh: kWh(coolingW),
    peakHeatingW: heating.value,
    peakHeatingAt: heating.at,
    peakCoolingW: cooling.value,
    peakCoolingAt: cooling.at,
    heatingByMonthKWh: byMonthKWh(heatingW),
    coolingByMonthKWh: byMonthKWh(coolingW),
    balanceKWh: { ...lines, storage, residual: into - storage },
  };
}

function wholeFindings(
  rooms: readonly RoomHours[],
  figures: readonly RoomFindings[],
  year: number,
): SpaceFindings {
  const sum = (of: (one: RoomFindings) => number) =>
    figures.reduce((total, one) => total + of(one), 0);
  const floorAreaM2 = sum((one) => one.floorAreaM2);
  return {
    ...spaceEnergy(rooms, year),
    floorAreaM2,
    airTemperatureC: wholeExtremes(figures, (one) => one.airTemperatureC, floorAreaM2),
    operativeTemperatureC: wholeExtremes(figures, (one) => one.operativeTemperatureC, floorAreaM2),
    occupiedHours: sum((one) => one.occupiedHours),
    hoursBelowBand: sum((one) => one.hoursBelowBand),
    hoursAboveBand: sum((one) => one.hoursAboveBand),
    degreeHoursBelow: sum((one) => one.degreeHoursBelow),
    degreeHoursAbove: sum((one) => one.degreeHoursAbove),
  };
}

/** Coldest and hottest of all rooms, and the mean weighted by floor area. */
function wholeExtremes(
  figures: readonly RoomFindings[],
  of: (one: RoomFindings) => Extremes,
  floorAreaM2: number,
): Extremes {
  const coldest = figures.reduce((a, b) => (of(b).min < of(a).min ? b : a));
  const hottest = figures.reduce((a, b) => (of(b).max > of(a).max ? b : a));
  return {
    min: of(coldest).min,
    minAt: of(coldest).minAt,
    max: of(hottest).max,
    maxAt: of(hottest).maxAt,
    mean: figures.reduce((sum, one) => sum + (of(one).mean * one.floorAreaM2) / floorAreaM2, 0),
  };
}

function together(
  rooms: readonly RoomHours[],
  of: (room: RoomHours) => Float64Array,
): Float64Array {
  const total = new Float64Array(of(rooms[0]).length);
  for (const room of rooms) {
    const values = of(room);
    for (let h = 0; h < total.length; h++) total[h] += values[h];
  }
  return total;
}

function peak(values: Float64Array, year: number): { value: number; at: string } {
  let best = 0;
  let hour = -1;
  for (let h = 0; h < values.length; h++) if (values[h] > best) [best, hour] = [values[h], h];
  return { value: best, at: hour < 0 ? '' : hourName(hour, values.length, year) };
}

function extremes(values: Float64Array, year: number): Extremes {
  let low = 0;
  let high = 0;
  let sum = 0;
  for (let h = 0; h < values.length; h++) {
    if (values[h] < values[low]) low = h;
    if (values[h] > values[high]) high = h;
    sum += values[h];
  }
  return {
    min: values[low],
    minAt: hourName(low, values.length, year),
    max: values[high],
    maxAt: hourName(high, values.length, year),
    mean: sum / values.length,
  };
}

/** Sum of hourly means in W, as kWh. */
function kWh(values: Float64Array): number {
  let sum = 0;
  for (let h = 0; h < values.length; h++) sum += values[h];
  return sum / 1000;
}

function byMonthKWh(values: Float64Array): number[] {
  const months = new Array<number>(12).fill(0);
  for (let h = 0; h < values.length; h++) months[monthOfHour(h, values.length)] += values[h] / 1000;
  return months;
}

function throughput(balance: BalanceKWh): number {
  const total = balanceLines.reduce((sum, name) => sum + Math.abs(balance[name]), 0);
  return Math.max(total, 1e-9);
}
