// The whole path for one building and one weather year, told in steps so that a worker can breathe.
import type { WeatherYear } from '../weather/index.ts';
import {
  type Assembly,
  type AssemblyOptions,
  assemble,
  emptyMemory,
  type Memory,
} from './assembly/index.ts';
import type { Building } from './building/index.ts';
import {
  drawnText,
  learnStarts,
  mostPasses,
  nextDrawn,
  type Simulation,
  settledShare,
  simulationOf,
  startsText,
} from './findings/index.ts';
import { marchSteps, type Run } from './network/index.ts';

export interface SimulationOptions {
  /** Default 15. */
  readonly stepMinutes?: number;
  /** Cells of every wall layer, times this; default 1. */
  readonly refine?: number;
  /** Kept from run to run by whoever runs many: what an edit did not touch is not computed again. */
  readonly memory?: Memory;
  /** Clock for the timings [ms]; the engine has none of its own. Without it they stay 0. */
  readonly nowMs?: () => number;
  /** Time that reading took, passed through to the findings [ms]. */
  readonly readMs?: number;
}

export interface Progress {
  /** 0 to 1. */
  readonly done: number;
  readonly what: string;
}

/**
 * Assembles, marches, and draws the findings. Where a heater starts ahead of its set-point, a first run
 * without early starts shows how early it has to. Where a blind asks for the room's temperature, the year
 * is run again until what was drawn and what the room asks for agree.
 *
 * @throws Error when the march diverged, naming hour and node: a fault of the model or the program
 */
export function* simulate(
  building: Building,
  weather: WeatherYear,
  options: SimulationOptions = {},
): Generator<Progress, Simulation> {
  const now = options.nowMs ?? (() => 0);
  const started = now();
  const memory = options.memory ?? emptyMemory();
  const how: Changing<AssemblyOptions> = {
    stepMinutes: options.stepMinutes ?? 15,
    refine: options.refine ?? 1,
    memory,
  };
  const learns = building.rooms.some((room) => room.heating?.optimumStart !== undefined);
  yield { done: 0, what: 'assembling the network' };
  let assembly = assemble(building, weather, how);
  let assembleMs = now() - started;
  const notes: string[] = [];
  if (learns) {
    const starts = learnStarts(
      assembly,
      yield* wholeMarch(assembly, memory.kernel, 'learning when to start', 0),
    );
    const again = now();
    how.heatingRamps = new Map([...starts].map(([room, { ramp }]) => [room, ramp]));
    assembly = assemble(building, weather, how);
    assembleMs += now() - again;
    for (const { id, name } of building.rooms) {
      const early = starts.get(id);
      if (early) notes.push(startsText(name, early));
    }
  }
  const asks = assembly.rooms.some((room) => room.windows.some((one) => one.byRoom.length > 0));
  let run = yield* wholeMarch(assembly, memory.kernel, 'running the year', learns ? 0.5 : 0);
  let drawn = asks ? nextDrawn(assembly, run, null) : null;
  let passes = 1;
  while (drawn && drawn.gapShare > settledShare && passes < mostPasses) {
    const again = now();
    how.drawnByRoom = drawn.next;
    assembly = assemble(building, weather, how);
    assembleMs += now() - again;
    run = yield* wholeMarch(assembly, memory.kernel, 'settling the blinds', 0.5);
    drawn = nextDrawn(assembly, run, drawn);
    passes++;
  }
  if (drawn) notes.push(drawnText(passes, drawn.gapShare));
  return simulationOf(
    { ...assembly, assumptions: [...assembly.assumptions, ...notes] },
    weather,
    run,
    { readMs: options.readMs ?? 0, assembleMs, runMs: now() - started - assembleMs },
  );
}

type Changing<T> = { -readonly [K in keyof T]: T[K] };

/** One march to its end; `from` is how much of the work lies behind it already. */
function* wholeMarch(
  assembly: Assembly,
  kernel: Uint8Array | null,
  what: string,
  from: number,
): Generator<Progress, Run> {
  const method = { toleranceK: 1e-6, maxIterations: 50, ...(kernel ? { kernel } : {}) };
  const march = marchSteps(assembly.problem, method);
  const part = (done: number) => from + (1 - from) * done;
  let next = march.next();
  while (!next.done) {
    const { phase, step, stepCount } = next.value;
    yield phase === 'start-up'
      ? { done: part(0.05), what: 'finding the start' }
      : { done: part(0.1 + (0.88 * step) / stepCount), what };
    next = march.next();
  }
  const { outcome } = next.value;
  if (outcome.kind === 'diverged')
    throw new Error(`the run diverged at step ${outcome.atStep} at "${outcome.node}"`);
  return next.value;
}
