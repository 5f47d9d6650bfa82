// The design day of cooling: the hottest day of the table, by its mean, repeated until it follows
// itself, with chillers without limit.
import { assemble, type Memory } from '../assembly/index.ts';
import type { Progress } from '../simulate.ts';
import { type RunOf, type Weathers, weatherOf } from './job.ts';
import { marchPart } from './march-part.ts';
import { meterRecords, roomPlants } from './room-plants.ts';
import { segmentOf, withPlants } from './segment.ts';
import { extremeDay } from './spell-job.ts';

export interface DesignDayJob extends RunOf {
  readonly kind: 'design-day';
}

export interface DesignDayResult {
  readonly kind: 'design-day';
  /** Day of the year, 0 for 1 January. */
  readonly day: number;
  /** Greatest hourly mean of each room with a chiller, and its hour of the day. */
  readonly rooms: readonly {
    readonly room: string;
    readonly peakW: number;
    readonly hour: number;
  }[];
  readonly coincidentPeakW: number;
  readonly coincidentHour: number;
}

export function* designDayJob(
  job: DesignDayJob,
  weathers: Weathers,
  memory: Memory,
): Generator<Progress, DesignDayResult> {
  const weather = weatherOf(job, weathers);
  yield { done: 0, what: 'assembling the design day' };
  const assembly = assemble(job.building, weather, { ...job, memory });
  const plants = roomPlants(assembly, 'cooling');
  const day = extremeDay(weather, 1);
  const perDay = 86_400 / assembly.problem.stepS;
  const segment = segmentOf(assembly.problem, day * perDay, perDay, {
    kind: 'periodic',
    spanSteps: perDay,
    toleranceK: 0.01,
    maxPasses: 200,
  });
  const free = new Map(plants.map(({ index }) => [index, { maxW: Infinity }]));
  const run = yield* marchPart(withPlants(segment, free), 'running the design day', 0.2);
  const powers = plants.map(({ parts }) => meterRecords(run, parts.meter));
  const total = Float64Array.from({ length: run.records }, (_, h) =>
    powers.reduce((sum, power) => sum + power[h], 0),
  );
  const peak = (values: Float64Array) => {
    const hour = values.indexOf(Math.max(...values));
    return { hour, peakW: values[hour] };
  };
  const whole = peak(total);
  return {
    kind: 'design-day',
    day,
    rooms: plants.map(({ room }, r) => ({ room: room.room.id, ...peak(powers[r]) })),
    coincidentPeakW: whole.peakW,
    coincidentHour: whole.hour,
  };
}
