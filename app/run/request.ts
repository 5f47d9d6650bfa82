// One run of the year, as it travels to the worker: texts as the user's files hold them. Parsing is
// part of the run, so that it never holds the window up.

import type { Site } from '../../weather/index.ts';

export interface RunRequest {
  readonly projectText: string;
  /** Name for faults. */
  readonly projectFile: string;
  readonly weatherText: string;
  readonly weatherFile: string;
  /** Stands in for the site where neither the table nor the project names one. */
  readonly site: Site | null;
  /** A divisor of 60, or 60; default 15. */
  readonly stepMinutes?: number;
  /** Multiplies the cells of every wall layer; default 1. */
  readonly refine?: number;
}
