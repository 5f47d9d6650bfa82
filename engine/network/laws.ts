// State-dependent links: flow and exact slopes of each law at given temperatures.
//
// Every link is written as  flow = slopeFrom·T_from − slopeTo·T_to + rest  around the state at which
// it was evaluated, so that one loop assembles all laws. A boundary end has no slope: it is known.

import { buoyantLaw, mixedFilmLaw } from './law-films.ts';
import { functionLaw } from './law-function.ts';
import { radiantLaw } from './law-radiant.ts';
import type { Network } from './problem.ts';

/** Evaluates one group into its range of the flat arrays. */
export type Law = (x: Float64Array, series: Float64Array, step: number) => void;

/** All state-dependent links of a network, flat; link k of group g is at `offset[g] + k`. */
export interface StateLinks {
  readonly count: number;
  readonly offset: Int32Array;
  readonly from: Int32Array;
  readonly to: Int32Array;
  /** 1 where the end is unknown, 0 where it is a boundary. */
  readonly freeFrom: Float64Array;
  readonly freeTo: Float64Array;
  /** Slopes at the state last evaluated [W/K], and the flow there [W]. */
  readonly slopeFrom: Float64Array;
  readonly slopeTo: Float64Array;
  readonly flowW: Float64Array;
  readonly laws: readonly Law[];
}

/**
 * @param slotOf place of each node in the state vector that the laws read
 * @param firstFixed slots from here on are boundaries
 */
export function compileLaws(network: Network, slotOf: Int32Array, firstFixed: number): StateLinks {
  const offset = new Int32Array(network.links.length);
  let count = 0;
  network.links.forEach((group, g) => {
    offset[g] = count;
    if (group.law !== 'constant' && group.law !== 'scaled') count += group.from.length;
  });
  const set: StateLinks = {
    count,
    offset,
    from: new Int32Array(count),
    to: new Int32Array(count),
    freeFrom: new Float64Array(count),
    freeTo: new Float64Array(count),
    slopeFrom: new Float64Array(count),
    slopeTo: new Float64Array(count),
    flowW: new Float64Array(count),
    laws: [],
  };
  const laws: Law[] = [];
  network.links.forEach((group, g) => {
    if (group.law === 'constant' || group.law === 'scaled') return;
    const at = offset[g];
    for (let k = 0; k < group.from.length; k++) {
      const a = slotOf[group.from[k]];
      const b = slotOf[group.to[k]];
      set.from[at + k] = a;
      set.to[at + k] = b;
      set.freeFrom[at + k] = a < firstFixed ? 1 : 0;
      set.freeTo[at + k] = b < firstFixed ? 1 : 0;
    }
    if (group.law === 'buoyant') laws.push(buoyantLaw(group, set, at));
    else if (group.law === 'mixed-film') laws.push(mixedFilmLaw(group, set, at));
    else if (group.law === 'radiant') laws.push(radiantLaw(group, set, at));
    else laws.push(functionLaw(group, set, at));
  });
  return { ...set, laws };
}

/** Evaluates all laws at state `x`. Slopes at boundary ends are left in: mask them by `freeFrom`, `freeTo`. */
export function evaluateLaws(
  set: StateLinks,
  x: Float64Array,
  series: Float64Array,
  step: number,
): void {
  const { laws } = set;
  for (let i = 0; i < laws.length; i++) laws[i](x, series, step);
}
