// Front door of the thermal network solver.

export { assertSound, type Breach, checkNetwork } from './check.ts';
export { march, marchSteps, type Progress } from './march.ts';
export type * from './problem.ts';
export { seriesAt, seriesMean } from './series.ts';
export { type Held, type SteadyState, steadyState } from './steady.ts';
