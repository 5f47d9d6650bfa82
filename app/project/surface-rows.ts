// Surfaces of a room pasted as rows: name, area, tilt, azimuth, construction.

import type { Json } from '../../engine/index.ts';
import { freeId, type RoomForm, type SurfaceForm } from './form.ts';
import { nameOf } from './room-edits.ts';
import type { Edit } from './story.ts';

export interface SurfaceRow {
  readonly name: string;
  readonly areaM2: number;
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly construction: string;
}

/** Rows of a name that is there change that surface; others are added, outdoors behind them. */
export function surfaceRowsEdit(room: RoomForm, rows: readonly SurfaceRow[]): Edit {
  const surfaces = [...room.surfaces];
  for (const { name, ...values } of rows) {
    const at = surfaces.findIndex((one) => nameOf(one).toLowerCase() === name.toLowerCase());
    const old = surfaces[at];
    if (old) surfaces[at] = { ...old, ...values };
    else {
      const id = freeId(
        name,
        surfaces.map((one) => one.id),
      );
      const surface: SurfaceForm = { id, name, ...values, boundary: { kind: 'outdoors' } };
      surfaces.push(surface);
    }
  }
  return {
    name: `${rows.length} surfaces pasted into ${nameOf(room)}`,
    changes: [{ path: `rooms[${room.id}].surfaces`, value: surfaces as unknown as Json }],
  };
}
