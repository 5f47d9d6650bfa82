// The check numbers of the family's page of definitions.

import type { Family } from './family.ts';

/** Rooms: nodes, chains, shared chains, ΣC MJ/K, Σ fabric W/K, Σ inside convection L, Σ infiltration L, Σ window m². */
export const familySums: readonly (readonly [
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
])[] = [
  [1, 63, 7, 0, 63.528601, 18065.8907, 237.5, 8.739258, 3.241282],
  [4, 204, 24, 4, 243.184597, 67102.8853, 950, 44.105057, 13.607389],
  [16, 664, 84, 28, 668.852658, 235926.9712, 3800, 191.876589, 63.671238],
  [64, 2352, 312, 136, 2074.732543, 884154.0883, 15200, 722.442786, 245.209737],
  [256, 8800, 1200, 592, 7079.651554, 3405366.8426, 60800, 2840.840372, 1024.575355],
];

/** Name, found, expected of the sums that say that the right network was built. */
export function sumsOf(rooms: number, sums: Family['sums']): [string, number, number][] {
  const row = familySums.find(([n]) => n === rooms);
  if (!row) throw new Error(`the page has no check numbers for ${rooms} rooms`);
  const [, nodes, chains, , capacity, fabric, , , window] = row;
  return [
    ['nodes', sums.nodes, nodes],
    ['chains', sums.chains, chains],
    ['capacity MJ/K', sums.capacityJPerK / 1e6, capacity],
    ['fabric W/K', sums.fabricWPerK, fabric],
    ['window m²', sums.windowM2, window],
  ];
}
