// Soundness of a problem, before it is solved: what the solver takes for granted is looked at here,
// once. Every breach names its nodes; all are listed together.
//
// Symmetric links need no check of row sums: each is assembled as one conductance into four places.

import { checkDrivers } from './check-drivers.ts';
import { checkMass, checkReach } from './check-graph.ts';
import { checkIndices } from './check-indices.ts';
import { checkPlants } from './check-plants.ts';
import type { Problem } from './problem.ts';

/** Something wrong with a problem; `nodes` are names, empty where no node is concerned. */
export interface Breach {
  readonly nodes: readonly string[];
  readonly text: string;
}

/** All breaches of a problem; none when it is sound. Wrong indices are reported alone: they hide the rest. */
export function checkNetwork(problem: Problem): Breach[] {
  const indices = checkIndices(problem);
  if (indices.length > 0) return indices;
  return [
    ...checkDrivers(problem),
    ...checkReach(problem),
    ...checkMass(problem),
    ...checkPlants(problem),
  ];
}

/** Throws, listing every breach, when the problem is not sound. */
export function assertSound(problem: Problem): void {
  const breaches = checkNetwork(problem);
  if (breaches.length > 0) {
    throw new Error(`the network is not sound:\n${breaches.map((b) => b.text).join('\n')}`);
  }
}
