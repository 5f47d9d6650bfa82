// The year with many sizes of heater or chiller, from one assembly.
//
// A smaller plant changes nothing until a larger one would have given more than it has. So the year is
// run once with the largest sizes, in blocks of a week with the state kept at each start, and every
// other size runs only the stretches of blocks that it can change, each from the kept state, on past
// the last block that it changes until every node is back to within `sameK` of the kept state. What
// comes out is what a whole year would give, to that tolerance; a test holds the two side by side.
import type { WeatherYear } from '../../weather/index.ts';
import { assemble, type Memory } from '../assembly/index.ts';
import type { Problem, Run } from '../network/index.ts';
import type { Progress } from '../simulate.ts';
import { type RunOf, type Weathers, weatherOf } from './job.ts';
import { marchPart } from './march-part.ts';
import {
  meterRecords,
  operativeReading,
  type RoomPlant,
  readRecords,
  roomPlants,
  type Side,
  sensorReading,
} from './room-plants.ts';
import { type PlantChange, segmentOf, withPlants } from './segment.ts';
import { type RoomShortfall, shortfallOf } from './shortfall.ts';

export interface SizesJob extends RunOf {
  readonly kind: 'sizes';
  readonly side: Side;
  /** Greatest power of each room's plant [W]: one list a size, in the order of the rooms that have one. */
  readonly sizesW: readonly (readonly number[])[];
}

/** What the year was with one size. */
export interface SizeOutcome {
  readonly rooms: readonly Omit<RoomShortfall, 'missedK'>[];
  /** Hours in which any room misses its set-point. */
  readonly unmetHours: number;
  /** Greatest hourly mean of all rooms together, and the hour. */
  readonly coincidentPeakW: number;
  readonly coincidentPeakHour: number;
  readonly energyKWh: number;
  /** Steps that this size was run for, of the year's. */
  readonly stepsRun: number;
}

export interface SizesResult {
  readonly kind: 'sizes';
  readonly sizes: readonly SizeOutcome[];
  readonly stepsInYear: number;
}

const blockDays = 7;
const sameK = 0.005;

/** Steps of one run: sensor, operative temperature and power of each room with a plant. */
interface Traces {
  readonly sensorC: Float64Array[];
  readonly operativeC: Float64Array[];
  readonly powerW: Float64Array[];
}

interface Block {
  readonly from: number;
  readonly count: number;
  /** All nodes at its start. */
  readonly startC: Float64Array;
}

export function* sizesJob(
  job: SizesJob,
  weathers: Weathers,
  memory: Memory,
): Generator<Progress, SizesResult> {
  const { building, side, sizesW } = job;
  const weather: WeatherYear = weatherOf(job, weathers);
  yield { done: 0, what: 'assembling the network' };
  const assembly = assemble(building, weather, { ...job, memory });
  const plants = roomPlants(assembly, side);
  const problem = readsOnly(assembly.problem, plants);
  const largest = plants.map((_, r) => Math.max(...sizesW.map((size) => size[r])));
  const year = yield* referenceYear(problem, plants, largest);
  const sizes: SizeOutcome[] = [];
  for (const [i, size] of sizesW.entries()) {
    const from = 0.3 + (0.7 * i) / sizesW.length;
    const run = yield* sizedYear(problem, plants, size, year, from);
    sizes.push(outcomeOf(run.traces, plants, size, run.stepsRun, side, problem.stepS));
  }
  return { kind: 'sizes', sizes, stepsInYear: problem.stepCount };
}

/** Records only what sizes are judged by. */
function readsOnly(problem: Problem, plants: readonly RoomPlant[]): Problem {
  const nodes = new Set<number>();
  for (const { room, index } of plants) {
    nodes.add(room.airNode);
    for (const face of room.faces) nodes.add(face.node);
    for (const node of problem.network.plants[index].sensorNodes) nodes.add(node);
  }
  return {
    ...problem,
    recordNodes: Int32Array.from(nodes),
    meters: plants.map(({ parts }) => problem.meters[parts.meter]),
    stepsPerRecord: 1,
  };
}

function sized(problem: Problem, plants: readonly RoomPlant[], sizeW: readonly number[]): Problem {
  const changes = new Map<number, PlantChange>();
  plants.forEach(({ index, backup }, r) => {
    changes.set(index, { maxW: sizeW[r] });
    if (backup >= 0) changes.set(backup, { maxW: 0 }); // the size is that of the main heater alone
  });
  return withPlants(problem, changes);
}

interface ReferenceYear {
  readonly largestW: readonly number[];
  readonly blocks: readonly Block[];
  readonly traces: Traces;
}

function emptyTraces(plants: readonly RoomPlant[], steps: number): Traces {
  const lists = () => plants.map(() => new Float64Array(steps));
  return { sensorC: lists(), operativeC: lists(), powerW: lists() };
}

function keep(run: Run, plants: readonly RoomPlant[], into: Traces, fromStep: number): void {
  const { problem } = run;
  plants.forEach((plant, r) => {
    into.sensorC[r].set(readRecords(run, sensorReading(problem, plant), 'meanC'), fromStep);
    into.operativeC[r].set(
      readRecords(run, operativeReading(problem, plant.room), 'meanC'),
      fromStep,
    );
    into.powerW[r].set(meterRecords(run, r), fromStep);
  });
}

/** The state at new year: the last week over and over until it repeats itself, as a year run starts. */
function* lastWeek(whole: Problem, from: number, to: number): Generator<Progress, Run> {
  const { start, stepCount } = whole;
  if (start.kind !== 'periodic') throw new Error('an assembled year starts periodic');
  const span = start.spanSteps;
  const week = segmentOf(whole, stepCount - span, span, start);
  return yield* marchPart(week, 'finding the start', from, to);
}

function* referenceYear(
  problem: Problem,
  plants: readonly RoomPlant[],
  largestW: readonly number[],
): Generator<Progress, ReferenceYear> {
  const whole = sized(problem, plants, largestW);
  const { stepCount } = problem;
  const lead = yield* lastWeek(whole, 0.02, 0.05);
  const blockSteps = (blockDays * 86_400) / problem.stepS;
  const blocks: Block[] = [];
  const traces = emptyTraces(plants, stepCount);
  let state = lead.finalC;
  for (let from = 0; from < stepCount; ) {
    const rest = stepCount - from;
    const count = rest < 1.5 * blockSteps ? rest : blockSteps;
    blocks.push({ from, count, startC: state });
    const part = segmentOf(whole, from, count, { kind: 'temperatures', tempC: state });
    const share = from / stepCount;
    const run = yield* marchPart(
      part,
      'running the year',
      0.05 + 0.25 * share,
      0.05 + (0.25 * (from + count)) / stepCount,
    );
    keep(run, plants, traces, from);
    state = run.finalC;
    from += count;
  }
  return { largestW, blocks, traces };
}

/** Where power jumps, the first stage of a step, which has this weight in its mean, may ask for all of it. */
const stageShare = Math.SQRT1_2; // 1 − γ

/** Whether some room may take more in a block than this size gives. */
function exceeds(traces: Traces, sizeW: readonly number[], { from, count }: Block): boolean {
  return sizeW.some((w, r) => {
    const power = traces.powerW[r];
    for (let k = from; k < from + count; k++) {
      if (power[k] > 0.95 * w) return true;
      const before = k > 0 ? power[k - 1] : power[k];
      if (power[k] > stageShare * w && power[k] - before > 0.1 * w) return true;
    }
    return false;
  });
}

function* sizedYear(
  problem: Problem,
  plants: readonly RoomPlant[],
  sizeW: readonly number[],
  year: ReferenceYear,
  done: number,
): Generator<Progress, { readonly traces: Traces; readonly stepsRun: number }> {
  const copy = (lists: readonly Float64Array[]) => lists.map((list) => list.slice());
  const traces: Traces = {
    sensorC: copy(year.traces.sensorC),
    operativeC: copy(year.traces.operativeC),
    powerW: copy(year.traces.powerW),
  };
  const { blocks } = year;
  const touched = blocks.map((block) => exceeds(year.traces, sizeW, block));
  const isReference = sizeW.every((w, r) => w === year.largestW[r]);
  if (isReference || !touched.includes(true)) return { traces, stepsRun: 0 };
  const small = sized(problem, plants, sizeW);
  let stepsRun = 0;
  // The year begins as any year run does: with its own last week, where this size can change that.
  let state: Float64Array | null = null;
  if (touched[blocks.length - 1]) {
    state = (yield* lastWeek(small, done, done)).finalC;
    if (isSame(state, blocks[0].startC)) state = null;
  }
  for (const [b, block] of blocks.entries()) {
    if (state && isSame(state, block.startC)) state = null;
    if (state === null && !touched[b]) continue;
    const part = segmentOf(small, block.from, block.count, {
      kind: 'temperatures',
      tempC: state ?? block.startC,
    });
    const run: Run = yield* marchPart(part, 'running the year', done, done);
    stepsRun += block.count;
    keep(run, plants, traces, block.from);
    state = run.finalC;
  }
  return { traces, stepsRun };
}

const isSame = (a: Float64Array, b: Float64Array) => a.every((c, i) => Math.abs(c - b[i]) <= sameK);

function outcomeOf(
  traces: Traces,
  plants: readonly RoomPlant[],
  sizeW: readonly number[],
  stepsRun: number,
  side: Side,
  stepS: number,
): SizeOutcome {
  const hourly = (lists: readonly Float64Array[]) => lists.map((list) => hourlyMeans(list, stepS));
  const sensorC = hourly(traces.sensorC);
  const operativeC = hourly(traces.operativeC);
  const powerW = hourly(traces.powerW);
  const rooms = plants.map((plant, r) =>
    shortfallOf(plant, side, sizeW[r], {
      sensorC: sensorC[r],
      operativeC: operativeC[r],
      powerW: powerW[r],
    }),
  );
  const count = powerW[0]?.length ?? 0;
  let unmetHours = 0;
  let peakW = 0;
  let peakHour = -1;
  let energyKWh = 0;
  for (let h = 0; h < count; h++) {
    if (rooms.some((room) => room.missedK[h] > 0)) unmetHours++;
    const sum = powerW.reduce((total, power) => total + power[h], 0);
    energyKWh += sum / 1000;
    if (sum > peakW) [peakW, peakHour] = [sum, h];
  }
  return {
    rooms: rooms.map(({ missedK: _, ...rest }) => rest),
    unmetHours,
    coincidentPeakW: peakW,
    coincidentPeakHour: peakHour,
    energyKWh,
    stepsRun,
  };
}

function hourlyMeans(steps: Float64Array, stepS: number): Float64Array {
  const perHour = 3600 / stepS;
  const hours = new Float64Array(steps.length / perHour);
  for (let k = 0; k < steps.length; k++) hours[Math.floor(k / perHour)] += steps[k] / perHour;
  return hours;
}
