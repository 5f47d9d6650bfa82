// The design spell: a week of steady cold without sun or gains, repeated until it follows itself, with
// plants of several sizes. It shows what a size means on the design day: how long the warm-up after a
// set-back takes, and how far the rooms stay below.
import type { WeatherColumn, WeatherYear } from '../../weather/index.ts';
import { assemble } from '../assembly/index.ts';
import type { Building } from '../building/index.ts';
import type { Progress } from '../simulate.ts';
import { type RunOf, type Weathers, weatherOf } from './job.ts';
import { marchPart } from './march-part.ts';
import { type RoomPlant, readRecords, roomPlants, sensorReading } from './room-plants.ts';
import { segmentOf, withPlants } from './segment.ts';
import { metWithinK } from './shortfall.ts';

export interface SpellJob extends RunOf {
  readonly kind: 'spell';
  readonly designOutdoorC: number;
  /** Heaters of each room with one [W]: one list a size. */
  readonly sizesW: readonly (readonly number[])[];
}

export interface SpellRoom {
  readonly room: string;
  readonly sizeW: number;
  /** Longest stretch in the week with the set-point missed by more than 0.2 K; null: it is never met [h]. */
  readonly warmUpH: number | null;
  readonly worstMissK: number;
  /** Lowest reading of the sensor [°C]. */
  readonly lowestC: number;
}

export interface SpellResult {
  readonly kind: 'spell';
  /** Day of the year on which the spell ends, 0 for 1 January. */
  readonly lastDay: number;
  readonly sizes: readonly { readonly rooms: readonly SpellRoom[] }[];
}

const days = 7;
const sigma = 5.670374419e-8;

/** The day with the lowest (highest) mean temperature. */
export function extremeDay(weather: WeatherYear, sign: 1 | -1): number {
  const { values } = weather.dryBulbC;
  let best = -Infinity;
  let day = 0;
  for (let d = 0; d < weather.hours / 24; d++) {
    let sum = 0;
    for (let h = 24 * d; h < 24 * d + 24; h++) sum += sign * values[h];
    if (sum > best) [best, day] = [sum, d];
  }
  return day;
}

/** The year with one temperature all along, no sun, and an overcast sky as warm as the air. */
export function steadyCold(weather: WeatherYear, outdoorC: number): WeatherYear {
  const level = (value: number): WeatherColumn => ({
    values: new Float64Array(weather.hours).fill(value),
    stands: { kind: 'mean' },
    origin: 'assumed',
  });
  const { values: dry } = weather.dryBulbC;
  const { values: dew } = weather.dewPointC;
  const dewPoints = dew.map((c, h) => outdoorC + Math.min(0, c - dry[h]));
  return {
    ...weather,
    dryBulbC: level(outdoorC),
    dewPointC: { ...level(0), values: dewPoints },
    ghiWPerM2: level(0),
    dniWPerM2: level(0),
    dhiWPerM2: level(0),
    skyCover: level(1),
    opaqueSkyCover: level(1),
    horizontalInfraredWPerM2: level(sigma * (outdoorC + 273.15) ** 4),
  };
}

/** Nobody and nothing in the rooms gives heat: design loads count on none (EN 12831-1). */
export function withoutGains(building: Building): Building {
  return {
    ...building,
    rooms: building.rooms.map(({ usage: _, ...room }) => ({ ...room, gains: [] })),
  };
}

/** First step of the week that ends with a day, moved into the year where it would reach beyond. */
export function weekEnding(day: number, stepS: number): { from: number; count: number } {
  const perDay = 86_400 / stepS;
  return { from: Math.max(0, day - (days - 1)) * perDay, count: days * perDay };
}

export function* spellJob(job: SpellJob, weathers: Weathers): Generator<Progress, SpellResult> {
  const weather = weatherOf(job, weathers);
  yield { done: 0, what: 'assembling the design spell' };
  const lastDay = Math.max(days - 1, extremeDay(weather, -1));
  const building = withoutGains(job.building);
  const assembly = assemble(building, steadyCold(weather, job.designOutdoorC), job);
  const plants = roomPlants(assembly, 'heating');
  const { from, count } = weekEnding(lastDay, assembly.problem.stepS);
  const week = {
    ...segmentOf(assembly.problem, from, count, {
      kind: 'periodic',
      spanSteps: count,
      toleranceK: 0.01,
      maxPasses: 40,
    }),
    stepsPerRecord: 1,
  };
  const sizes: { rooms: SpellRoom[] }[] = [];
  for (const [i, sizeW] of job.sizesW.entries()) {
    const changes = new Map(plants.map(({ index }, r) => [index, { maxW: sizeW[r] }]));
    for (const { backup } of plants) if (backup >= 0) changes.set(backup, { maxW: 0 });
    const share = (k: number) => 0.1 + (0.9 * k) / job.sizesW.length;
    const run = yield* marchPart(
      withPlants(week, changes),
      'running the design spell',
      share(i),
      share(i + 1),
    );
    sizes.push({
      rooms: plants.map((plant, r) => {
        const sensorC = readRecords(run, sensorReading(week, plant), 'meanC');
        const { values } = week.series[week.network.plants[plant.index].setPointSeries];
        return spellRoom(plant, sizeW[r], sensorC, values, week.stepS);
      }),
    });
  }
  return { kind: 'spell', lastDay, sizes };
}

function spellRoom(
  { room }: RoomPlant,
  sizeW: number,
  sensorC: Float64Array,
  setPointRampC: Float64Array,
  stepS: number,
): SpellRoom {
  let longest = 0;
  let stretch = 0;
  let met = 0;
  let worstMissK = 0;
  const steps = sensorC.length;
  // Twice round: the week follows itself, and a stretch may begin on its last day.
  for (let i = 0; i < 2 * steps; i++) {
    const k = i % steps;
    const setPointC = (setPointRampC[2 * k] + setPointRampC[2 * k + 1]) / 2;
    const missK = setPointC - sensorC[k];
    if (missK > metWithinK) {
      stretch++;
      worstMissK = Math.max(worstMissK, missK);
    } else {
      stretch = 0;
      met++;
    }
    longest = Math.max(longest, stretch);
  }
  return {
    room: room.room.id,
    sizeW,
    warmUpH: met === 0 || longest >= steps ? null : (longest * stepS) / 3600,
    worstMissK,
    lowestC: sensorC.reduce((a, b) => Math.min(a, b), Infinity),
  };
}
