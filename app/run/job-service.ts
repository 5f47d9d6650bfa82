// A worker thread that does the runs of studies: it is given the weather once, when it starts, and one
// run after another from then on.
import { emptyMemory, type Job, type JobResult, runJob } from '../../engine/index.ts';
import type { WeatherYear } from '../../weather/index.ts';
import type { Work } from './serve.ts';

/** What such a thread is started with. */
export interface JobThreadData {
  readonly serves: 'jobs';
  readonly weathers: readonly (readonly [string, WeatherYear])[];
  /** The solver's kernel, where whoever starts the thread could load it. */
  readonly kernel: Uint8Array | null;
}

/** The weather where a thread was started for the runs of studies, null otherwise. */
export function jobThreadData(workerData: unknown): JobThreadData | null {
  if (typeof workerData !== 'object' || workerData === null) return null;
  return Reflect.get(workerData, 'serves') === 'jobs' ? (workerData as JobThreadData) : null;
}

export function jobWork({ weathers, kernel }: JobThreadData): (job: Job) => Work<JobResult> {
  const byName = new Map(weathers);
  const memory = emptyMemory(kernel);
  return function* work(job) {
    return { ok: true, value: yield* runJob(job, byName, memory) };
  };
}
