export { type AskOptions, ask, RunRefused, type RunWorker } from './ask.ts';
export type { JobThreadData } from './job-service.ts';
export type { RunProgress } from './protocol.ts';
export type { RunRequest } from './request.ts';
export { runSimulation } from './run-simulation.ts';
