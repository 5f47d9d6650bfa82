// Soundness of a problem, before it is solved. Every breach names its nodes.

import type { Problem } from './problem.ts';

/** Something wrong with a network; `nodes` are names. */
export interface Breach {
  readonly nodes: readonly string[];
  readonly text: string;
}

/** All breaches of a problem; none when it is sound. */
export function checkNetwork(problem: Problem): Breach[] {
  void problem;
  return [];
}

/** Throws with every breach when the problem is not sound. */
export function assertSound(problem: Problem): void {
  const breaches = checkNetwork(problem);
  if (breaches.length > 0) {
    throw new Error(`the network is not sound:\n${breaches.map((b) => b.text).join('\n')}`);
  }
}
