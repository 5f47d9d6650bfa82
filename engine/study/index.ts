// The front door of the studies: many runs of changed buildings, the same path each time.
export * from './accuracy.ts';
export { changeAt, type Json, readAt } from './change-path.ts';
export { changeText, fieldWords, uValueChanges } from './change-text.ts';
export * from './compare.ts';
export * from './cooldown.ts';
export type { CooldownResult, CooldownRoom } from './cooldown-job.ts';
export * from './economics.ts';
export * from './figures.ts';
export type * from './job.ts';
export {
  type Judged,
  type JudgeOptions,
  type MethodId,
  methodNames,
  type Verdict,
} from './judge.ts';
export * from './options.ts';
export { overheating } from './overheating.ts';
export * from './overheating-types.ts';
export * from './peak-hour.ts';
export type { Side } from './room-plants.ts';
export { runJob } from './run-job.ts';
export * from './sampling.ts';
export * from './sensitivity.ts';
export { leastPower, size, withCooling } from './size.ts';
export { curveShares } from './size-curve.ts';
export * from './size-types.ts';
export type { SizeOutcome } from './sizes-job.ts';
export { type SteadyElement, type SteadyLoad, type SteadyRoom, steadyLoad } from './steady-load.ts';
export { type Batch, finishStudy, runStudy, type Study } from './study.ts';
export * from './sweep.ts';
export { parseSweep, runCount, type Sweep, sweepSchema } from './sweep-file.ts';
export type { WarmUp, WarmUpRoom } from './warm-up.ts';
export type { Driver, Drivers, WorstDays } from './worst-days.ts';
