// How the cells of pasted surfaces are read.

import type { Building } from '../../../engine/index.ts';
import type { SurfaceRow } from '../../project/index.ts';
import { type Dimension, figure, typedQuantity } from '../format/index.ts';
import type { PasteColumn } from '../parts/paste-dialog.tsx';

function number(
  name: string,
  dimension: Dimension,
  min: number,
  max: number,
  empty?: number,
): PasteColumn {
  return {
    name,
    read(text) {
      if (text === '' && empty !== undefined)
        return { ok: true, shown: figure(empty), value: empty };
      const typed = typedQuantity(text, dimension);
      if (!typed.ok) return { ok: false, why: typed.why.toLowerCase() };
      if (!(typed.value >= min && typed.value <= max))
        return { ok: false, why: `${min} to ${max}` };
      return { ok: true, shown: figure(typed.value, 3).replace(/\.?0+$/, ''), value: typed.value };
    },
  };
}

/** Name, area, tilt, azimuth, construction by its name or id. */
export function surfaceColumns(building: Building): PasteColumn[] {
  const { constructions } = building;
  return [
    {
      name: 'Surface',
      read: (text) =>
        text === '' ? { ok: false, why: 'give it a name' } : { ok: true, shown: text, value: text },
    },
    number('Area', 'area', 0.01, 1e5),
    number('Tilt', 'angle', 0, 180, 90),
    number('Azimuth', 'angle', 0, 360, 0),
    {
      name: 'Construction',
      read(text) {
        const wanted = text.toLowerCase();
        const found = constructions.find(
          ({ id, name }) => id === wanted || name.toLowerCase() === wanted,
        );
        if (found) return { ok: true, shown: found.name, value: found.id };
        return { ok: false, why: 'no construction of this house' };
      },
    },
  ];
}

export function surfaceRow(cells: readonly (string | number)[]): SurfaceRow {
  const [name, areaM2, tiltDeg, azimuthDeg, construction] = cells;
  return {
    name: String(name),
    areaM2: Number(areaM2),
    tiltDeg: Number(tiltDeg),
    azimuthDeg: Number(azimuthDeg),
    construction: String(construction),
  };
}
