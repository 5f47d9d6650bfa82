// One run of a study, whatever its kind.
import { emptyMemory, type Memory } from '../assembly/index.ts';
import { type Progress, simulate } from '../simulate.ts';
import { cooldownJob } from './cooldown-job.ts';
import { designDayJob } from './design-day-job.ts';
import {
  type Job,
  type JobResult,
  type Weathers,
  weatherOf,
  type YearJob,
  type YearResult,
} from './job.ts';
import { sizesJob } from './sizes-job.ts';
import { spellJob } from './spell-job.ts';

/**
 * Runs one job; to stop it, stop driving it.
 *
 * @param memory kept from job to job by whoever runs many
 */
export function runJob(
  job: Job,
  weathers: Weathers,
  memory: Memory = emptyMemory(),
): Generator<Progress, JobResult> {
  switch (job.kind) {
    case 'year':
      return yearJob(job, weathers, memory);
    case 'sizes':
      return sizesJob(job, weathers, memory);
    case 'spell':
      return spellJob(job, weathers);
    case 'design-day':
      return designDayJob(job, weathers, memory);
    case 'cooldown':
      return cooldownJob(job, weathers, memory);
    default:
      return job satisfies never;
  }
}

function* yearJob(
  job: YearJob,
  weathers: Weathers,
  memory: Memory,
): Generator<Progress, YearResult> {
  const { building, stepMinutes, refine, withHours } = job;
  const simulation = yield* simulate(building, weatherOf(job, weathers), {
    stepMinutes,
    refine,
    memory,
  });
  const { findings } = simulation;
  return { kind: 'year', findings, simulation: withHours ? simulation : null };
}
