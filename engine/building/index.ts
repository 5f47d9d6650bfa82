// The front door: the building as data, its parser, and looking things up in it.
export { type Box, boxFaceAreasM2, boxFaceOf } from './box-face.ts';
export {
  constructionOf,
  coveringOf,
  glazingOf,
  groundContactOf,
  materialOf,
  profileOf,
  roomOf,
  scheduleOf,
  surfaceOf,
} from './find.ts';
export {
  libraryConstructions,
  libraryGlazings,
  libraryMaterials,
  libraryUsages,
  projectConstruction,
} from './library/index.ts';
export { parseProject, parseProjectDocument } from './parse-project.ts';
export type {
  AirControl,
  AirOpening,
  AirUnit,
  Doorway,
  Leakage,
} from './schema-air.ts';
export type { ThermalBridge } from './schema-bridges.ts';
export type { Comfort, LocalComfort, Votes } from './schema-comfort.ts';
export type { Carrier, Energy, Supply, SupplyOf } from './schema-energy.ts';
export type { Construction, Glazing, Layer, Material, Pane, PaneGlazing } from './schema-fabric.ts';
export { schemaFaults } from './schema-faults.ts';
export type { Gain, Usage } from './schema-gains.ts';
export type { GroundContact } from './schema-ground.ts';
export type { Moisture } from './schema-moisture.ts';
export type { Economics, OptionOfProject } from './schema-options.ts';
export type { Emitter, Heating, Radiator, Scheduled } from './schema-plant.ts';
export { type Building, type Physics, projectSchema } from './schema-project.ts';
export type {
  Boundary,
  Opening,
  Rectangle,
  Room,
  Shading,
  Surface,
} from './schema-room.ts';
export type { Calendar, Profile, Schedule } from './schema-use.ts';
export type {
  BlindAtWindow,
  Covering,
  CoveringControl,
  CoveringOf,
  Frame,
  NightInsulation,
} from './schema-window.ts';
