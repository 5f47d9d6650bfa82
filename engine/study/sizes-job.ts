// The year with many sizes of heater or chiller, from one assembly.
//
// A smaller plant changes nothing until a larger one would have given more than it has. So the year is
// run once with the largest sizes, in blocks of two weeks with the state kept at each start, and every
// other size runs only the stretches of blocks that it can change, each from the kept state, on past
// the last block that it changes until every node is back to within `sameK` of the kept state. What
// comes out is what a whole year would give, to that tolerance; a test holds the two side by side.
import type { WeatherYear } from '../../weather/index.ts';
import { assemble } from '../assembly/index.ts';
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

const blockDays = 14;
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

export function* sizesJob(job: SizesJob, weathers: Weathers): Generator<Progress, SizesResult> {
  const { building, side, sizesW } = job;
  const weather: WeatherYear = weatherOf(job, weathers);
  yield { done: 0, what: 'assembling the network' };
  const assembly = assemble(building, weather, job);
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

function* referenceYear(
  problem: Problem,
  plants: readonly RoomPlant[],
  largestW: readonly number[],
): Generator<Progress, ReferenceYear> {
  const whole = sized(problem, plants, largestW);
  const { start, stepCount } = problem;
  if (start.kind !== 'periodic') throw new Error('an assembled year starts periodic');
  // The state at new year: the last week until it repeats itself.
  const span = start.spanSteps;
  const lead = yield* marchPart(
    segmentOf(whole, stepCount - span, span, start),
    'finding the start',
    0.02,
    0.05,
  );
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
  return { blocks, traces };
}

/** Whether some room takes more in a block than this size gives. */
function exceeds(traces: Traces, sizeW: readonly number[], { from, count }: Block): boolean {
  return sizeW.some((w, r) => {
    const power = traces.powerW[r];
    // A step's mean below the size can hide a stage above it: leave a margin.
    for (let k = from; k < from + count; k++) if (power[k] > 0.95 * w) return true;
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
  if (!touched.includes(true)) return { traces, stepsRun: 0 };
  const small = sized(problem, plants, sizeW);
  // Go round the year from a block that this size leaves as it is, so that new year is passed warm.
  const first = Math.max(0, touched.indexOf(false));
  let state: Float64Array | null = null;
  let stepsRun = 0;
  if (!touched.includes(false)) {
    // No rest anywhere: a start of its own.
    const span = Math.min(...blocks.map((block) => block.count));
    const last = problem.stepCount - span;
    const start = { kind: 'periodic', spanSteps: span, toleranceK: 0.01, maxPasses: 40 } as const;
    const lead = yield* marchPart(
      segmentOf(small, last, span, start),
      'finding the start',
      done,
      done,
    );
    state = lead.finalC;
  }
  const rests = touched.includes(false);
  for (let i = 0; i < blocks.length || (rests && state && i < 2 * blocks.length); i++) {
    const at = (first + i) % blocks.length;
    const block = blocks[at];
    if (state && rests && isSame(state, block.startC)) state = null;
    if (state === null && (!touched[at] || i >= blocks.length)) continue;
    const part = segmentOf(small, block.from, block.count, {
      kind: 'temperatures',
      tempC: state ?? block.startC,
    });
    const run = yield* marchPart(part, 'running the year', done, done);
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
