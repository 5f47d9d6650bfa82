// What a study is: a generator that asks for batches of runs and is given their results, so that it
// knows nothing of who runs them. In the window's worker and in tests they run one after another
// (`runStudy`); the command line spreads them over worker threads. Results come back in the order
// asked for, whichever thread was first, so that a study's outcome never depends on the machine.
import { emptyMemory } from '../assembly/index.ts';
import type { Progress } from '../simulate.ts';
import type { Job, JobResult, JobResultOf, Weathers } from './job.ts';
import { runJob } from './run-job.ts';

/** Runs that may be done in any order or at once. */
export interface Batch {
  readonly jobs: readonly Job[];
  /** What they are for, in a few words. */
  readonly what: string;
  /** Where in the whole study they lie, 0 to 1. */
  readonly from: number;
  readonly to: number;
}

/** A study in progress. To stop it, stop driving it. */
export type Study<Result> = Generator<Batch, Result, readonly JobResult[]>;

/** Asks for runs of one kind and hands their results on with their type. */
export function* ask<K extends Job['kind']>(
  kind: K,
  jobs: readonly Extract<Job, { kind: K }>[],
  what: string,
  from: number,
  to: number,
): Generator<Batch, JobResultOf<K>[], readonly JobResult[]> {
  if (jobs.length === 0) return [];
  const results = yield { jobs, what, from, to };
  return results.map((result) => {
    if (result.kind !== kind) throw new Error(`a ${kind} run gave a ${result.kind} result`);
    return result as JobResultOf<K>; // its kind was looked at
  });
}

/** Drives a study here, one run after another. */
export function* runStudy<Result>(
  study: Study<Result>,
  weathers: Weathers,
): Generator<Progress, Result> {
  const memory = emptyMemory();
  let turn = study.next([]);
  while (!turn.done) {
    const { jobs, what, from, to } = turn.value;
    const results: JobResult[] = [];
    for (const [i, job] of jobs.entries()) {
      const run = runJob(job, weathers, memory);
      let step = run.next();
      while (!step.done) {
        const share = (i + step.value.done) / jobs.length;
        yield { done: from + (to - from) * share, what };
        step = run.next();
      }
      results.push(step.value);
    }
    turn = study.next(results);
  }
  return turn.value;
}

/** Drives a study to its end, for scripts and tests. */
export function finishStudy<Result>(study: Study<Result>, weathers: Weathers): Result {
  const steps = runStudy(study, weathers);
  let turn = steps.next();
  while (!turn.done) turn = steps.next();
  return turn.value;
}
