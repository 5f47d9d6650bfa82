// Blocks: rows that the matrix couples, such as a room with its panes and plants, or an outer face by
// itself. A stage solves and iterates block by block, each as often as it needs.

import type { Enclosures } from './enclosures.ts';
import type { Layout } from './layout.ts';
import type { StateLinks } from './links.ts';

export interface Blocks {
  readonly count: number;
  /** Rows of block b: `rowStart[b]` to `rowStart[b + 1] − 1`; its links and units alike. */
  readonly rowStart: Int32Array;
  readonly linkStart: Int32Array;
  readonly enclosureStart: Int32Array;
  readonly enclosures: Int32Array;
  readonly unitStart: Int32Array;
  readonly units: Int32Array;
  /** 1 where laws or enclosures make the block depend on its state. */
  readonly bends: Uint8Array;
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

/** Block of each row. */
export function blockOfRow(layout: Layout): Int32Array {
  const { blockStart } = layout.order;
  const of = new Int32Array(layout.rows);
  for (let b = 0; b + 1 < blockStart.length; b++) of.fill(b, blockStart[b], blockStart[b + 1]);
  return of;
}

export function compileBlocks(layout: Layout, links: StateLinks, enclosures: Enclosures): Blocks {
  const { rows, order, rowOfUnit } = layout;
  const last = order.blockStart.length - 1;
  const count = last + 1;
  const of = blockOfRow(layout);
  const known = (slot: number) => slot < rows;
  // What lies between boundaries alone makes a last block without rows.
  const linkBlock = links.from.map((a, l) => {
    if (known(a)) return of[a];
    return known(links.to[l]) ? of[links.to[l]] : last;
  });
  const enclosureBlock = Int32Array.from({ length: enclosures.count }, (_, e) => {
    const members = enclosures.slot.subarray(enclosures.start[e], enclosures.start[e + 1]);
    const row = members.find(known);
    return row === undefined ? last : of[row];
  });
  const byLink = grouped(linkBlock, count);
  const byEnclosure = grouped(enclosureBlock, count);
  const byUnit = grouped(
    rowOfUnit.map((row) => of[row]),
    count,
  );
  const bends = new Uint8Array(count);
  for (let b = 0; b < count; b++) {
    const hasLinks = byLink.start[b + 1] > byLink.start[b];
    const hasEnclosures = byEnclosure.start[b + 1] > byEnclosure.start[b];
    bends[b] = hasLinks || hasEnclosures ? 1 : 0;
  }
  return {
    count,
    rowStart: Int32Array.from([...order.blockStart, rows]),
    linkStart: byLink.start,
    enclosureStart: byEnclosure.start,
    enclosures: byEnclosure.list,
    unitStart: byUnit.start,
    units: byUnit.list,
    bends,
  };
}
