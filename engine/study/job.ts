// The runs that studies ask for. Plain data in and out, so that they can go to another thread.
import type { WeatherYear } from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import type { Findings, Simulation } from '../findings/index.ts';
import type { CooldownJob, CooldownResult } from './cooldown-job.ts';
import type { DesignDayJob, DesignDayResult } from './design-day-job.ts';
import type { SizesJob, SizesResult } from './sizes-job.ts';
import type { SpellJob, SpellResult } from './spell-job.ts';

/** Weather tables by the name under which runs ask for them. */
export type Weathers = ReadonlyMap<string, WeatherYear>;

/** What every run needs. */
export interface RunOf {
  readonly building: Building;
  /** A key of the weathers at hand. */
  readonly weather: string;
  readonly stepMinutes: number;
  /** Multiplies the cells of every layer. */
  readonly refine: number;
}

/** A year with its findings. */
export interface YearJob extends RunOf {
  readonly kind: 'year';
  /** Whether the hours behind the findings are wanted too. */
  readonly withHours: boolean;
}

export interface YearResult {
  readonly kind: 'year';
  readonly findings: Findings;
  readonly simulation: Simulation | null;
}

export type Job = YearJob | SizesJob | SpellJob | DesignDayJob | CooldownJob;
export type JobResult = YearResult | SizesResult | SpellResult | DesignDayResult | CooldownResult;
export type JobResultOf<K extends Job['kind']> = Extract<JobResult, { kind: K }>;

export function weatherOf(job: RunOf, weathers: Weathers): WeatherYear {
  const year = weathers.get(job.weather);
  if (!year) throw new Error(`no weather "${job.weather}" at hand`);
  return year;
}
