// A study with its runs spread over worker threads. Results go back to the study in the order in which
// it asked, so it comes out the same on any number of threads.
import { Worker } from 'node:worker_threads';
import {
  type Job,
  type JobResult,
  runStudy,
  type Study,
  type Weathers,
} from '../../engine/index.ts';
import { readKernel } from '../disk/index.ts';
import { ask, type JobThreadData, type RunProgress } from '../run/index.ts';

export interface StudyThreads {
  /** Address of the built worker; null: everything runs here. */
  readonly worker: URL | null;
  /** Most threads to start. */
  readonly count: number;
}

export interface DriveOptions {
  readonly onProgress?: (progress: RunProgress) => void;
  /** Stops between two slices of work; the promise rejects with an `AbortError`. */
  readonly signal?: AbortSignal;
}

const stopped = () => new DOMException('The study was stopped.', 'AbortError');

/** Drives a study to its end. */
export async function driveStudy<Result>(
  study: Study<Result>,
  weathers: Weathers,
  threads: StudyThreads,
  options: DriveOptions = {},
): Promise<Result> {
  const { worker, count } = threads;
  if (worker === null || count < 2) return driveHere(study, weathers, options);
  const pool: Worker[] = [];
  const workerData: JobThreadData = {
    serves: 'jobs',
    weathers: [...weathers],
    kernel: readKernel(),
  };
  const start = () => {
    const thread = new Worker(worker, { workerData });
    pool.push(thread);
    return thread;
  };
  try {
    let turn = study.next([]);
    while (!turn.done) {
      const { jobs, what, from, to } = turn.value;
      while (pool.length < Math.min(count, jobs.length)) start();
      const onDone = (share: number) =>
        options.onProgress?.({ done: from + (to - from) * share, what });
      turn = study.next(await runBatch(pool, jobs, onDone, options.signal));
    }
    return turn.value;
  } finally {
    await Promise.all(pool.map((thread) => thread.terminate()));
  }
}

async function runBatch(
  pool: readonly Worker[],
  jobs: readonly Job[],
  onDone: (share: number) => void,
  signal: AbortSignal | undefined,
): Promise<JobResult[]> {
  const results: JobResult[] = [];
  const shares = new Float64Array(jobs.length);
  let next = 0;
  const tell = (i: number, share: number) => {
    shares[i] = share;
    onDone(shares.reduce((a, b) => a + b, 0) / jobs.length);
  };
  await Promise.all(
    pool.map(async (thread) => {
      while (next < jobs.length) {
        const i = next++;
        results[i] = await ask<Job, JobResult>(thread, jobs[i], {
          onProgress: ({ done }) => tell(i, done),
          ...(signal ? { signal } : {}),
        });
        tell(i, 1);
      }
    }),
  );
  return results;
}

/** One run after another on this thread, in slices, so that a stop is heard. */
async function driveHere<Result>(
  study: Study<Result>,
  weathers: Weathers,
  { onProgress, signal }: DriveOptions,
): Promise<Result> {
  const steps = runStudy(study, weathers);
  let until = performance.now() + 100;
  let turn = steps.next();
  while (!turn.done) {
    if (signal?.aborted) throw stopped();
    if (performance.now() > until) {
      onProgress?.(turn.value);
      await new Promise((resolve) => setImmediate(resolve));
      until = performance.now() + 100;
    }
    turn = steps.next();
  }
  return turn.value;
}
