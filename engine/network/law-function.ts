// Links whose conductance is the caller's own function of the end temperatures and the step.

import type { Law, StateLinks } from './laws.ts';
import type { FunctionLinks } from './problem.ts';

/** Half-width of the difference quotient [K]: error of the slope about 1e-8 of its second derivative. */
const probeK = 1e-4;

/**
 * flow = G(T_from, T_to)·(T_from − T_to); slopes by central differences. A negative slope (a
 * conductance that falls faster than the difference rises) is taken as 0, which keeps the matrix an
 * M-matrix and leaves the solution as it is; the iteration then converges more slowly.
 */
export function functionLaw(group: FunctionLinks, set: Omit<StateLinks, 'laws'>, at: number): Law {
  const conductance = group.conductanceWPerK;
  const n = group.from.length;
  const { from, to, slopeFrom, slopeTo, flowW } = set;
  const flow = (k: number, a: number, b: number, step: number) =>
    conductance(k, a, b, step) * (a - b);
  return (x, _series, step) => {
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const a = x[from[l]];
      const b = x[to[l]];
      flowW[l] = flow(k, a, b, step);
      const up = flow(k, a + probeK, b, step) - flow(k, a - probeK, b, step);
      const down = flow(k, a, b - probeK, step) - flow(k, a, b + probeK, step);
      slopeFrom[l] = Math.max(0, up / (2 * probeK));
      slopeTo[l] = Math.max(0, down / (2 * probeK));
    }
  };
}
