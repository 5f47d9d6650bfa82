// Windows on walls that change their length: each keeps its distance from the left end, is pushed inside
// where it would stick out, made smaller where the wall is too short, and is lost where no wall is left.

import type { OpeningForm } from './form.ts';

export interface WallPiece {
  readonly surface: { readonly id: string };
  /** Along the side, from its left end as seen from inside. */
  readonly fromM: number;
  readonly toM: number;
}

export interface Refitted {
  readonly byWall: ReadonlyMap<string, readonly OpeningForm[]>;
  readonly lost: readonly OpeningForm[];
}

const leastM = 0.1;
const round = (value: number) => Number(value.toFixed(6));

export function refitOpenings(
  walls: readonly WallPiece[],
  openings: readonly OpeningForm[],
  heightM: number,
  lengthM: number,
): Refitted {
  const byWall = new Map<string, OpeningForm[]>();
  const lost: OpeningForm[] = [];
  for (const opening of openings) {
    const old = opening.rectangle ?? unplaced(opening, lengthM);
    const middle = old.leftM + old.widthM / 2;
    const nearest = [...walls].sort((a, b) => distance(a, middle) - distance(b, middle))[0];
    if (!nearest || nearest.toM - nearest.fromM < leastM) {
      lost.push(opening);
      continue;
    }
    const widthM = Math.min(old.widthM, nearest.toM - nearest.fromM);
    const height = Math.min(old.heightM, heightM);
    const rectangle = {
      leftM: round(Math.max(nearest.fromM, Math.min(old.leftM, nearest.toM - widthM))),
      bottomM: round(Math.max(0, Math.min(old.bottomM, heightM - height))),
      widthM: round(widthM),
      heightM: round(height),
    };
    const own = byWall.get(nearest.surface.id) ?? [];
    own.push({ ...opening, rectangle, areaM2: round(rectangle.widthM * rectangle.heightM) });
    byWall.set(nearest.surface.id, own);
  }
  return { byWall, lost };
}

function distance({ fromM, toM }: WallPiece, middle: number): number {
  return Math.max(fromM - middle, middle - toM, 0);
}

/** A window given by its area alone gets a place: in the middle, a usual height. */
function unplaced({ areaM2 }: OpeningForm, lengthM: number) {
  const heightM = Math.min(1.4, Math.max(0.3, Math.sqrt(areaM2)));
  const widthM = Math.min(lengthM, areaM2 / heightM);
  return { leftM: (lengthM - widthM) / 2, bottomM: 0.9, widthM, heightM };
}
