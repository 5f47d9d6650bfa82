// The front door: thermal networks that are no building.
export { isNodalModel, parseNodalModel, parseNodalProblem } from './parse-nodal.ts';
export type { NodalModel } from './schema.ts';
