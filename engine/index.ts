// The front door of the engine: all that the app may import.
export * from './assembly/index.ts';
export {
  type Building,
  libraryConstructions,
  libraryGlazings,
  libraryMaterials,
  libraryUsages,
  parseProject,
  parseProjectDocument,
  projectConstruction,
  projectSchema,
} from './building/index.ts';
export * from './findings/index.ts';
export * from './network/index.ts';
export * from './nodal/index.ts';
export { type Progress, type SimulationOptions, simulate } from './simulate.ts';
export * from './study/index.ts';
