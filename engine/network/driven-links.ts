// Links whose conductance the drivers set: scaled symmetric links and directed (advective) ones.

import type { Layout } from './layout.ts';
import { entryOf, type SparseLu } from './sparse-lu.ts';

/** Flat; scaled group g starts at `offset[g]`, the directed links at `directedOffset`. */
export interface DrivenLinks {
  readonly count: number;
  readonly offset: Int32Array;
  readonly directedOffset: number;
  readonly from: Int32Array;
  readonly to: Int32Array;
  readonly rateWPerK: Float64Array;
  /** Series index, or −1 for a constant rate. */
  readonly series: Int32Array;
  /** Entries of the matrix (own and exchange, at either end); the spare entry where there is none. */
  readonly ownFrom: Int32Array;
  readonly ownTo: Int32Array;
  readonly atFrom: Int32Array;
  readonly atTo: Int32Array;
  /** Links that a series drives. */
  readonly driven: Int32Array;
  /** Conductance now, which is the one in the matrix [W/K]. */
  readonly conductanceWPerK: Float64Array;
  /** Links that bring a boundary's temperature to a row. */
  readonly inflowLink: Int32Array;
  readonly inflowRow: Int32Array;
  readonly inflowSlot: Int32Array;
}

/**
 * Lays the driven links out over the pattern of `lu`; `spare` is the index of an unused entry. Those of
 * constant rate go into the constant layer of the matrix, `constant`, at once.
 */
export function compileDriven(
  layout: Layout,
  lu: SparseLu,
  spare: number,
  constant: Float64Array,
): DrivenLinks {
  const { network, slotOfNode, rows } = layout;
  const offset = new Int32Array(network.links.length);
  let count = 0;
  network.links.forEach((group, g) => {
    offset[g] = count;
    if (group.law === 'scaled') count += group.from.length;
  });
  const directedOffset = count;
  count += network.directed.from.length;
  const ints = () => new Int32Array(count);
  const from = ints();
  const to = ints();
  const series = ints();
  const ownFrom = ints().fill(spare);
  const ownTo = ints().fill(spare);
  const atFrom = ints().fill(spare);
  const atTo = ints().fill(spare);
  const rateWPerK = new Float64Array(count);
  const conductanceWPerK = new Float64Array(count);
  const inflow: [number, number, number][] = [];
  const put = (l: number, a: number, b: number, rate: number, s: number, mutual: boolean) => {
    from[l] = a;
    to[l] = b;
    rateWPerK[l] = rate;
    series[l] = s;
    if (s < 0) {
      conductanceWPerK[l] = rate;
    }
    if (b < rows) {
      ownTo[l] = entryOf(lu, b, b);
      if (a < rows) atTo[l] = entryOf(lu, b, a);
      else inflow.push([l, b, a]);
      if (s < 0) {
        constant[ownTo[l]] += rate;
        constant[atTo[l]] -= rate;
      }
    }
    if (mutual && a < rows) {
      ownFrom[l] = entryOf(lu, a, a);
      if (b < rows) atFrom[l] = entryOf(lu, a, b);
      else inflow.push([l, a, b]);
    }
  };
  network.links.forEach((group, g) => {
    if (group.law !== 'scaled') return;
    for (let k = 0; k < group.from.length; k++) {
      const a = slotOfNode[group.from[k]];
      const b = slotOfNode[group.to[k]];
      put(offset[g] + k, a, b, group.conductanceWPerK[k], group.series[k], true);
    }
  });
  const { directed } = network;
  for (let k = 0; k < directed.from.length; k++) {
    const a = slotOfNode[directed.from[k]];
    const b = slotOfNode[directed.to[k]];
    put(directedOffset + k, a, b, directed.rateWPerK[k], directed.series[k], false);
  }
  return {
    count,
    offset,
    directedOffset,
    from,
    to,
    rateWPerK,
    series,
    ownFrom,
    ownTo,
    atFrom,
    atTo,
    driven: Int32Array.from(series.keys()).filter((l) => series[l] >= 0),
    conductanceWPerK,
    inflowLink: Int32Array.from(inflow, (e) => e[0]),
    inflowRow: Int32Array.from(inflow, (e) => e[1]),
    inflowSlot: Int32Array.from(inflow, (e) => e[2]),
  };
}

/**
 * Sets the conductances of a stage, brings the matrix entries `a` up to them and marks the rows.
 */
export function driveLinks(
  links: DrivenLinks,
  seriesNow: Float64Array,
  a: Float64Array,
  dirty: Uint8Array,
): void {
  const { driven, rateWPerK, series, conductanceWPerK, from, to } = links;
  const { ownFrom, ownTo, atFrom, atTo } = links;
  for (let k = 0; k < driven.length; k++) {
    const l = driven[k];
    const g = rateWPerK[l] * seriesNow[series[l]];
    const change = g - conductanceWPerK[l];
    if (change === 0) continue;
    conductanceWPerK[l] = g;
    a[ownFrom[l]] += change;
    a[atFrom[l]] -= change;
    a[ownTo[l]] += change;
    a[atTo[l]] -= change;
    dirty[from[l]] = 1;
    dirty[to[l]] = 1;
  }
}

/** Adds the conductances in use to the matrix entries `a`, those of constant rate apart. */
export function assembleDriven(links: DrivenLinks, a: Float64Array): void {
  const { driven, ownFrom, ownTo, atFrom, atTo, conductanceWPerK } = links;
  for (let k = 0; k < driven.length; k++) {
    const l = driven[k];
    const g = conductanceWPerK[l];
    a[ownFrom[l]] += g;
    a[atFrom[l]] -= g;
    a[ownTo[l]] += g;
    a[atTo[l]] -= g;
  }
}
