// Front door of the thermal network solver.

export { assertSound, type Breach, checkNetwork } from './check.ts';
export { type DenseNetwork, denseNetwork } from './dense.ts';
export { stefanBoltzmann, zeroC } from './law-radiant.ts';
export { march, marchSteps, type Progress } from './march.ts';
export type * from './problem.ts';
export { readSeries, seriesAt, seriesMean } from './series.ts';
export { type Held, type SteadyState, steadyState } from './steady.ts';
export { timeConstantsS } from './time-constants.ts';
