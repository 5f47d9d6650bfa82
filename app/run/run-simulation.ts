import type { Simulation } from '../../engine/index.ts';
import { type AskOptions, ask, type RunWorker } from './ask.ts';
import type { RunRequest } from './request.ts';

/**
 * Runs the year in the worker. A newer run on the same worker stops this one; see `ask` for how the
 * promise rejects.
 */
export function runSimulation(
  worker: RunWorker,
  request: RunRequest,
  options: AskOptions = {},
): Promise<Simulation> {
  return ask(worker, request, options);
}
