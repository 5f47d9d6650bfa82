// The front door: from a run to what a person wants to know.
export { cautions, standingCaution } from './cautions.ts';
export type { AdaptiveFindings } from './comfort-adaptive.ts';
export { bandFindings } from './comfort-band.ts';
export type { AsymmetryFindings, LocalFindings } from './comfort-local.ts';
export type { VoteFindings } from './comfort-votes.ts';
export { type BuildingExplained, explainBuilding, type Unlikely } from './explain-building.ts';
export type { ConstructionExplained, ConstructionUse } from './explain-construction.ts';
export type { GlazingAt, GlazingExplained } from './explain-glazing.ts';
export {
  type ConstructionSection,
  constructionSection,
  type SectionClimate,
  type SectionLayer,
} from './explain-section.ts';
export type { WindowExplained } from './explain-window.ts';
export type { SpaceEnergy, SupplyFindings } from './final-energy.ts';
export { simulationOf } from './findings.ts';
export { dayName, hourName, monthOfHour } from './hour-name.ts';
export type { InterstitialFindings } from './interstitial.ts';
export type { MoistureFindings, VapourBalanceKg } from './moisture.ts';
export { type EarlyStarts, earlyStarts, learnStarts, startsText } from './optimum-start.ts';
export type { Criterion, OverheatingFindings } from './overheating.ts';
export { drawnText, mostPasses, nextDrawn, settledShare } from './room-drawn.ts';
export * from './simulation.ts';
export type { DampHours } from './surface-damp.ts';
