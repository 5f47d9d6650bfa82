// How fast a network forgets: its time constants, for the documents and tables of the command line.

import { type Problem, steadyState, timeConstantsS } from '../../engine/index.ts';

const method = { toleranceK: 1e-6, maxIterations: 100 };
/** Dense eigenvalues grow with the cube of the nodes: beyond this a coarser network must do. */
export const mostNodesForModes = 400;

/** Slowest first [h]; null where a part hangs on no boundary. Linearised at the steady state of the mean drivers. */
export function timeConstantsH(problem: Problem): (number | null)[] {
  const mean = steadyState(problem, { kind: 'mean', steps: problem.stepCount }, method);
  return Array.from(timeConstantsS(problem, mean.tempC, 0), (s) =>
    Number.isFinite(s) ? s / 3600 : null,
  );
}

/** The slowest few in a line. */
export function timeConstantsText(constantsH: readonly (number | null)[], basis: string): string {
  const shown = constantsH
    .slice(0, 8)
    .map((h) => (h === null ? 'no end' : `${Number(h.toPrecision(3))} h`))
    .join(', ');
  return `Time constants (${basis}), slowest first: ${shown}${constantsH.length > 8 ? ', …' : ''}`;
}
