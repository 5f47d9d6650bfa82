// Blocks: unknowns that state-dependent laws tie together, such as the faces and the air of one room.
// Slopes are judged and renewed block by block, so that a room in the sun does not cost the others.

import type { Enclosures } from './enclosures.ts';
import type { StateLinks } from './laws.ts';

export interface Blocks {
  readonly count: number;
  readonly ofLink: Int32Array;
  readonly ofMember: Int32Array;
  /** Links of block b: `links[linkStart[b]]` to `links[linkStart[b + 1] − 1]`; enclosures alike. */
  readonly linkStart: Int32Array;
  readonly links: Int32Array;
  readonly enclosureStart: Int32Array;
  readonly enclosures: Int32Array;
  /** Lag of the slopes in the matrix at the last evaluation, largest of the block. */
  readonly lag: Float64Array;
}

function grouped(of: Int32Array, count: number): { start: Int32Array; list: Int32Array } {
  const start = new Int32Array(count + 1);
  for (const b of of) start[b + 1]++;
  for (let b = 0; b < count; b++) start[b + 1] += start[b];
  const next = start.slice(0, count);
  const list = new Int32Array(of.length);
  of.forEach((b, i) => {
    list[next[b]++] = i;
  });
  return { start, list };
}

/** @param rows slots below are unknowns */
export function compileBlocks(laws: StateLinks, enclosures: Enclosures, rows: number): Blocks {
  const parent = Int32Array.from({ length: rows + 1 }, (_, i) => i);
  const find = (i: number): number => {
    let r = i;
    while (parent[r] !== r) {
      parent[r] = parent[parent[r]];
      r = parent[r];
    }
    return r;
  };
  const { from, to, count } = laws;
  for (let l = 0; l < count; l++) {
    if (from[l] < rows && to[l] < rows) parent[find(from[l])] = find(to[l]);
  }
  const firstRow = (e: number) => {
    for (let m = enclosures.start[e]; m < enclosures.start[e + 1]; m++) {
      if (enclosures.slot[m] < rows) return enclosures.slot[m];
    }
    return rows; // nothing but boundaries
  };
  for (let e = 0; e < enclosures.count; e++) {
    const first = firstRow(e);
    for (let m = enclosures.start[e]; m < enclosures.start[e + 1]; m++) {
      if (enclosures.slot[m] < rows) parent[find(enclosures.slot[m])] = find(first);
    }
  }
  const number = new Map<number, number>();
  const blockOf = (slot: number) => {
    const root = find(Math.min(slot, rows));
    const known = number.get(root) ?? number.size;
    number.set(root, known);
    return known;
  };
  const ofLink = Int32Array.from(from, (a, l) => blockOf(a < rows ? a : to[l]));
  const ofEnclosure = Int32Array.from({ length: enclosures.count }, (_, e) => blockOf(firstRow(e)));
  const links = grouped(ofLink, number.size);
  const rooms = grouped(ofEnclosure, number.size);
  const ofMember = new Int32Array(enclosures.slot.length);
  ofEnclosure.forEach((b, e) => {
    ofMember.fill(b, enclosures.start[e], enclosures.start[e + 1]);
  });
  return {
    count: number.size,
    ofLink,
    ofMember,
    linkStart: links.start,
    links: links.list,
    enclosureStart: rooms.start,
    enclosures: rooms.list,
    lag: new Float64Array(number.size),
  };
}
