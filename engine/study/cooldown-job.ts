// Heating off at an hour: how the rooms cool, how fast the network forgets, and what it takes to be
// back in time.
import { assemble, type Memory, type RoomParts } from '../assembly/index.ts';
import { type Problem, type Run, steadyState, timeConstantsS } from '../network/index.ts';
import type { Progress } from '../simulate.ts';
import { heldProblem } from './held.ts';
import { type RunOf, type Weathers, weatherOf } from './job.ts';
import { marchPart, studyMethod } from './march-part.ts';
import { operativeReading, readingOf, readRecords, roomPlants } from './room-plants.ts';
import { type PlantChange, segmentOf, withPlants } from './segment.ts';
import { steadyCold, withoutGains } from './spell-job.ts';
import { type WarmUp, warmUpPowers } from './warm-up.ts';

export interface CooldownJob extends RunOf {
  readonly kind: 'cooldown';
  /** Hour of the year at which heating goes off. */
  readonly offHour: number;
  readonly hours: number;
  /** Steady outdoor temperature without sun in place of the table's weather. */
  readonly designOutdoorC: number | null;
  /** Nobody there while the heating is off. */
  readonly vacant: boolean;
  /** Hours after switching off by which the rooms must be warm again, and when to switch on. */
  readonly backAfterH: number | null;
  readonly onAfterH: readonly number[];
}

/** One room from switching off on; values at the ends of steps, the first at the moment itself. */
export interface CooldownRoom {
  readonly room: string;
  readonly name: string;
  readonly airC: Float64Array;
  readonly operativeC: Float64Array;
  readonly coldestSurfaceC: Float64Array;
  readonly coldestSurface: string;
  /** Where the air would end if the spell's mean weather stayed for good. */
  readonly endC: number;
  /** From the decay under the spell's mean weather: between 40 % and 20 % of what it falls; null where it does not get there. */
  readonly decayTimeConstantH: number | null;
}

export interface CooldownResult {
  readonly kind: 'cooldown';
  readonly stepMinutes: number;
  readonly outdoorC: Float64Array;
  readonly rooms: readonly CooldownRoom[];
  /** Of the network with one node a layer, at the spell's mean weather, slowest first; null above 600 nodes. */
  readonly timeConstantsH: readonly number[] | null;
  readonly warmUps: readonly WarmUp[];
  /** What each heater may give today, Infinity without limit; NaN without heater. */
  readonly heaterMaxW: readonly number[];
  readonly targetC: readonly number[];
  readonly relativeBalanceResidual: number;
}

const leadDays = 7;
const mostEigenNodes = 600;

export function* cooldownJob(
  job: CooldownJob,
  weathers: Weathers,
  memory: Memory,
): Generator<Progress, CooldownResult> {
  const table = weatherOf(job, weathers);
  const weather = job.designOutdoorC === null ? table : steadyCold(table, job.designOutdoorC);
  yield { done: 0, what: 'assembling the network' };
  const assembly = assemble(job.building, weather, { ...job, memory });
  const { problem: year } = assembly;
  const perHour = 3600 / year.stepS;
  const off = job.offHour * perHour;
  const count = Math.min(job.hours * perHour, year.stepCount - off);
  const stateC = yield* stateAt(year, off);
  const left = job.vacant
    ? assemble(withoutGains(job.building), weather, { ...job, memory }).problem
    : year;
  const idle = withPlants(left, allOff(left));
  const free = yield* marchPart(
    { ...segmentOf(idle, off, count, { kind: 'temperatures', tempC: stateC }), stepsPerRecord: 1 },
    'cooling down',
    0.3,
    0.5,
  );
  const held = yield* heldDecay(idle, off, count, stateC);
  const plants = roomPlants(assembly, 'heating');
  const warmUps: WarmUp[] = [];
  const heated = new Map(plants.map((plant) => [plant.room.room.id, plant]));
  const backStep = job.backAfterH === null ? null : Math.round(job.backAfterH * perHour);
  const backHour = off / perHour + (job.backAfterH ?? 0);
  const targetOf = (setPointC: Float64Array) =>
    setPointC[Math.min(setPointC.length - 1, Math.floor(backHour))];
  if (backStep !== null && backStep <= count) {
    const warm = plants.filter(({ parts }) => Number.isFinite(targetOf(parts.setPointC)));
    const targetC = warm.map(({ parts }) => targetOf(parts.setPointC));
    const on = [...job.onAfterH].sort((a, b) => a - b).map((h) => Math.round(h * perHour));
    let at = 0;
    let state = stateC;
    for (const [i, onStep] of on.entries()) {
      if (onStep >= backStep) continue;
      if (onStep > at) {
        const part = segmentOf(idle, off + at, onStep - at, { kind: 'temperatures', tempC: state });
        state = (yield* marchPart(part, 'cooling down', 0.7, 0.7)).finalC;
        at = onStep;
      }
      yield { done: 0.7 + (0.3 * i) / on.length, what: 'finding the warm-up power' };
      warmUps.push(
        yield* progressOnly(
          warmUpPowers(left, warm, targetC, off + onStep, backStep - onStep, state),
          0.7 + (0.3 * i) / on.length,
        ),
      );
    }
  }
  return {
    kind: 'cooldown',
    stepMinutes: year.stepS / 60,
    outdoorC: withStart(
      readRecords(free, readingOf(free.problem, [assembly.outdoorNode], [1]), 'endC'),
      Number.NaN,
    ),
    rooms: assembly.rooms.map((parts) => roomCourse(parts, free, held, stateC)),
    timeConstantsH: coarseTimeConstantsH(job, weather, off, count),
    warmUps,
    heaterMaxW: assembly.rooms.map(({ room }) => heated.get(room.id)?.parts.maxW ?? Number.NaN),
    targetC: assembly.rooms.map(({ room }) => {
      const plant = heated.get(room.id);
      return plant && backStep !== null ? targetOf(plant.parts.setPointC) : Number.NaN;
    }),
    relativeBalanceResidual: free.quality.relativeBalanceResidual,
  };
}

/** Passes a part's pauses on as progress that stands still. */
function* progressOnly<T>(part: Generator<unknown, T>, done: number): Generator<Progress, T> {
  let turn = part.next();
  while (!turn.done) {
    yield { done, what: 'finding the warm-up power' };
    turn = part.next();
  }
  return turn.value;
}

function allOff(problem: Problem): Map<number, PlantChange> {
  return new Map(
    problem.network.plants.map(({ kind }, p) => [
      p,
      { setPointC: kind === 'heater' ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY },
    ]),
  );
}

/** All nodes at a step: the week before it repeated until periodic, or the turn of the year. */
function* stateAt(year: Problem, step: number): Generator<Progress, Float64Array> {
  const span = (leadDays * 86_400) / year.stepS;
  const start = { kind: 'periodic', spanSteps: span, toleranceK: 0.01, maxPasses: 60 } as const;
  const from = step >= span ? step - span : year.stepCount - span;
  const lead = yield* marchPart(segmentOf(year, from, span, start), 'finding the start', 0.05, 0.3);
  if (step >= span || step === 0) return lead.finalC;
  const rest = segmentOf(year, 0, step, { kind: 'temperatures', tempC: lead.finalC });
  return (yield* marchPart(rest, 'finding the start', 0.3, 0.3)).finalC;
}

interface Held {
  readonly run: Run;
  readonly endC: Float64Array;
}

/** The decay under the spell's mean weather, and where it ends. */
function* heldDecay(
  idle: Problem,
  off: number,
  count: number,
  stateC: Float64Array,
): Generator<Progress, Held> {
  const longest = (14 * 86_400) / idle.stepS;
  const problem = {
    ...heldProblem(idle, off, off + count, longest, { kind: 'temperatures', tempC: stateC }),
    stepsPerRecord: 1,
  };
  const run = yield* marchPart(problem, 'decaying under steady weather', 0.5, 0.7);
  return { run, endC: steadyState(problem, { kind: 'step', step: 0 }, studyMethod).tempC };
}

const withStart = (values: Float64Array, first: number) => Float64Array.of(first, ...values);

function roomCourse(parts: RoomParts, free: Run, held: Held, stateC: Float64Array): CooldownRoom {
  const { problem } = free;
  const air = readingOf(problem, [parts.airNode], [1]);
  const operative = operativeReading(problem, parts);
  const faces = parts.faces.map((face) => ({
    face,
    endC: readRecords(free, readingOf(problem, [face.node], [1]), 'endC'),
  }));
  const coldest = Float64Array.from({ length: free.records }, (_, r) =>
    faces.reduce((least, { endC }) => Math.min(least, endC[r]), Infinity),
  );
  const last = free.records - 1;
  const at = faces.find(({ endC }) => endC[last] === coldest[last])?.face;
  const startOperativeC = operative.columns.reduce(
    (sum, column, i) => sum + operative.weights[i] * stateC[problem.recordNodes[column]],
    0,
  );
  const decay = readRecords(held.run, air, 'endC');
  const endC = held.endC[parts.airNode];
  return {
    room: parts.room.id,
    name: parts.room.name,
    airC: withStart(readRecords(free, air, 'endC'), stateC[parts.airNode]),
    operativeC: withStart(readRecords(free, operative, 'endC'), startOperativeC),
    coldestSurfaceC: withStart(
      coldest,
      parts.faces.reduce((least, face) => Math.min(least, stateC[face.node]), Infinity),
    ),
    coldestSurface: at ? (at.opening ? `${at.surface}, ${at.opening}` : at.surface) : '',
    endC,
    decayTimeConstantH: decayH(decay, stateC[parts.airNode], endC, problem.stepS),
  };
}

/** Time constant between 40 % and 20 % of the whole fall: ln 2 times it passes between them. */
export function decayH(
  values: Float64Array,
  startC: number,
  endC: number,
  stepS: number,
): number | null {
  const passes = (share: number) => {
    const level = endC + share * (startC - endC);
    let before = startC;
    for (let k = 0; k < values.length; k++) {
      if ((before - level) * (values[k] - level) <= 0 && before !== values[k])
        return k + (before - level) / (before - values[k]);
      before = values[k];
    }
    return null;
  };
  const [high, low] = [passes(0.4), passes(0.2)];
  if (high === null || low === null || low <= high) return null;
  return ((low - high) * stepS) / 3600 / Math.LN2;
}

function coarseTimeConstantsH(
  job: CooldownJob,
  weather: Parameters<typeof assemble>[1],
  off: number,
  count: number,
): number[] | null {
  const { physics } = job.building;
  const building = { ...job.building, physics: { ...physics, conduction: 'coarse' as const } };
  const { problem } = assemble(building, weather, { stepMinutes: job.stepMinutes, refine: 1 });
  if (problem.network.nodeNames.length > mostEigenNodes) return null;
  const idle = withPlants(problem, allOff(problem));
  const held = heldProblem(idle, off, off + count, 1, {
    kind: 'temperatures',
    tempC: new Float64Array(),
  });
  const { tempC } = steadyState(held, { kind: 'step', step: 0 }, studyMethod);
  return Array.from(timeConstantsS(held, tempC, 0), (s) => s / 3600);
}
