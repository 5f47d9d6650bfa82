// The whole path for one building and one weather year, told in steps so that a worker can breathe.
import type { WeatherYear } from '../weather/index.ts';
import { assemble } from './assembly/index.ts';
import type { Building } from './building/index.ts';
import { type Simulation, simulationOf } from './findings/index.ts';
import { marchSteps } from './network/index.ts';

export interface SimulationOptions {
  /** Default 15. */
  readonly stepMinutes?: number;
  /** Cells of every wall layer, times this; default 1. */
  readonly refine?: number;
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
 * Assembles, marches, and draws the findings.
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
  yield { done: 0, what: 'assembling the network' };
  const assembly = assemble(building, weather, {
    stepMinutes: options.stepMinutes ?? 15,
    refine: options.refine ?? 1,
  });
  const assembled = now();
  const march = marchSteps(assembly.problem, { toleranceK: 1e-6, maxIterations: 50 });
  let next = march.next();
  while (!next.done) {
    const { phase, step, stepCount } = next.value;
    yield phase === 'start-up'
      ? { done: 0.05, what: 'finding the start' }
      : { done: 0.1 + (0.88 * step) / stepCount, what: 'running the year' };
    next = march.next();
  }
  const run = next.value;
  const { outcome } = run;
  if (outcome.kind === 'diverged')
    throw new Error(`the run diverged at step ${outcome.atStep} at "${outcome.node}"`);
  return simulationOf(assembly, weather, run, {
    readMs: options.readMs ?? 0,
    assembleMs: assembled - started,
    runMs: now() - assembled,
  });
}
