// The march: a Problem through all its steps, with start-up, records, and word on how it went.

import { assertSound } from './check.ts';
import { mostSteps } from './kernel/host.ts';
import type { Method, Outcome, Problem, Run } from './problem.ts';
import { createRecorder } from './recorder.ts';
import { steadyState } from './steady.ts';
import {
  beginRecords,
  createStepper,
  enterKernel,
  placeState,
  readState,
  type Stepper,
  takeSteps,
} from './stepper.ts';

/** How far the march is. */
export interface Progress {
  readonly phase: 'start-up' | 'run';
  /** Steps done, of `stepCount`, in this phase (in this pass of the start-up). */
  readonly step: number;
  readonly stepCount: number;
  /** Passes of the start-up done. */
  readonly pass: number;
}

interface StartUp {
  readonly passes: number;
  readonly steps: number;
  readonly driftK: number;
  readonly failedSlot: number;
  readonly failedStep: number;
}

/** Fixed start, or the steady state and then the span over and over until it repeats itself. */
function* startUp(stepper: Stepper): Generator<Progress, StartUp> {
  const { problem, method } = stepper;
  const { start } = problem;
  if (start.kind === 'temperatures') {
    placeState(stepper, start.tempC);
    return { passes: 0, steps: 0, driftK: 0, failedSlot: -1, failedStep: 0 };
  }
  const { spanSteps, toleranceK, maxPasses } = start;
  const first = problem.stepCount - spanSteps;
  const begin = steadyState(problem, { kind: 'mean', steps: spanSteps, from: first }, method);
  placeState(stepper, begin.tempC);
  const nodes = problem.network.nodeNames.length;
  const before = new Float64Array(nodes);
  const after = new Float64Array(nodes);
  let driftK = Infinity;
  let pass = 0;
  while (pass < maxPasses && driftK > toleranceK) {
    readState(stepper, before);
    for (let k = 0; k < spanSteps; k += mostSteps) {
      yield { phase: 'start-up', step: k, stepCount: spanSteps, pass };
      const count = Math.min(mostSteps, spanSteps - k);
      const done = takeSteps(stepper, first + k, count, null);
      if (done < count) {
        const { failedSlot } = stepper;
        const steps = pass * spanSteps + k + done;
        return { passes: pass, steps, driftK, failedSlot, failedStep: first + k + done };
      }
    }
    readState(stepper, after);
    driftK = 0;
    for (let i = 0; i < nodes; i++) {
      if (problem.network.boundarySeries[i] >= 0) continue; // driven, whatever the start
      driftK = Math.max(driftK, Math.abs(after[i] - before[i]));
    }
    pass++;
  }
  return { passes: pass, steps: pass * spanSteps, driftK, failedSlot: -1, failedStep: 0 };
}

/**
 * The march as a generator that pauses every few hundred steps (`mostSteps`), so that a worker can report and take
 * in a cancel. `next(false)` stops it: the Run then holds what was computed.
 */
export function* marchSteps(
  problem: Problem,
  method: Method,
): Generator<Progress, Run, boolean | undefined> {
  assertSound(problem);
  const stepper = createStepper(problem, method);
  const { layout, stage } = stepper;
  const recorder = createRecorder(problem, stage);
  if (method.kernel) enterKernel(stepper, recorder, method.kernel);
  const nodeName = (slot: number) => {
    const node = layout.nodeOfSlot[slot];
    return node >= 0 ? problem.network.nodeNames[node] : 'a plant';
  };
  let outcome: Outcome = { kind: 'finished' };
  let steps = 0;

  const starting = startUp(stepper);
  let stopped = false;
  let turn = starting.next();
  while (!turn.done) {
    if ((yield turn.value) === false) {
      stopped = true;
      break;
    }
    turn = starting.next();
  }
  const begun: StartUp = turn.done
    ? turn.value
    : { passes: turn.value.pass, steps: 0, driftK: Infinity, failedSlot: -1, failedStep: 0 };
  if (stopped) outcome = { kind: 'stopped', atStep: 0 };
  else if (begun.failedSlot >= 0) {
    outcome = { kind: 'diverged', atStep: begun.failedStep, node: nodeName(begun.failedSlot) };
  } else {
    beginRecords(stepper, recorder);
    const { stepCount } = problem;
    for (let k = 0; k < stepCount; k += mostSteps) {
      const go = yield { phase: 'run', step: k, stepCount, pass: begun.passes };
      if (go === false) {
        outcome = { kind: 'stopped', atStep: k };
        break;
      }
      const count = Math.min(mostSteps, stepCount - k);
      const done = takeSteps(stepper, k, count, recorder);
      steps += done;
      if (done < count) {
        outcome = { kind: 'diverged', atStep: k + done, node: nodeName(stepper.failedSlot) };
        break;
      }
    }
  }
  const finalC = new Float64Array(problem.network.nodeNames.length);
  readState(stepper, finalC);
  return {
    problem,
    method,
    outcome,
    records: recorder.records,
    meanC: recorder.meanC,
    endC: recorder.endC,
    meterW: recorder.meterW,
    finalC,
    quality: {
      relativeBalanceResidual: stepper.worstBalance,
      unconvergedSteps: stepper.unconvergedSteps,
      iterations: stepper.iterations,
      steps,
      warmUpPasses: begun.passes,
      warmUpSteps: begun.steps,
      warmUpDriftK: begun.driftK,
    },
  };
}

/**
 * Marches a problem from start to end.
 * @param report told how far it is; stops the march by returning false
 */
export function march(
  problem: Problem,
  method: Method,
  report?: (progress: Progress) => boolean | undefined,
): Run {
  const steps = marchSteps(problem, method);
  let turn = steps.next();
  while (!turn.done) turn = steps.next(report?.(turn.value));
  return turn.value;
}
