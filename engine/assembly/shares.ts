// Nodes that feel a room's heat, and how radiation is shared out between the faces.
import type { Face } from './room-parts.ts';

export interface RoomNodes {
  readonly airNode: number;
  readonly faces: readonly Face[];
}

/** Share of each face when radiation reaches all of them by area; adds up to 1. */
export function areaShares(faces: readonly Face[]): Float64Array {
  const total = faces.reduce((sum, face) => sum + face.areaM2, 0);
  return Float64Array.from(faces, (face) => face.areaM2 / total);
}
