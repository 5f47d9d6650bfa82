// The front door: from a run to what a person wants to know.
export { cautions, standingCaution } from './cautions.ts';
export { bandFindings } from './comfort-band.ts';
export { simulationOf } from './findings.ts';
export { dayName, hourName, monthOfHour } from './hour-name.ts';
export * from './simulation.ts';
