// What overhangs, fins, reveals and the skyline leave of the sun on a face.
import type { PlaneIrradiance, SunTrack } from '../../weather/index.ts';
import {
  boxFaceAreasM2,
  boxFaceOf,
  type Opening,
  type Room,
  type Shading,
  type Surface,
} from '../building/index.ts';
import {
  diffuseShading,
  type Horizon,
  horizonAltitudeDeg,
  type ShadedWindow,
  sunFromWindow,
  sunlitByLines,
} from '../physics/index.ts';
import { sunlitTable } from './sunlit-table.ts';

/** Sunlight on a face by kind, means over the steps, shades taken off. */
export interface FaceSun {
  readonly beamWPerM2: Float64Array;
  /** Sky and ground together. */
  readonly diffuseWPerM2: Float64Array;
  /** Of that, what the ground throws back. */
  readonly groundWPerM2: Float64Array;
  readonly cosIncidence: Float64Array;
}

/**
 * Sun on a face, its beam by exact shadows in the middle of each step's sunlit part, its diffuse by
 * what is left of sky, horizon and ground in view.
 *
 * @param shaded the face with what stands before it, or null where nothing does
 */
export function faceSun(
  plane: PlaneIrradiance,
  face: { readonly tiltDeg: number; readonly azimuthDeg: number },
  shaded: ShadedWindow | null,
  horizon: Horizon,
  sun: SunTrack,
): FaceSun {
  const { beamWPerM2, isotropicWPerM2, horizonWPerM2, groundWPerM2, cosIncidence } = plane;
  const isFree = shaded === null && horizon.length === 0;
  const bare: ShadedWindow = shaded ?? { widthM: 1, heightM: 1, revealM: 0 };
  const exactly = shaded === null ? () => 1 : sunlitByLines(shaded);
  const litAt = shaded === null ? exactly : sunlitTable(exactly);
  const left = isFree
    ? { sky: 1, horizon: 1, ground: 1 }
    : diffuseShading(bare, face.tiltDeg, face.azimuthDeg, horizon, exactly);
  const diffuse = isotropicWPerM2.map(
    (dome, k) => left.sky * dome + left.horizon * horizonWPerM2[k] + left.ground * groundWPerM2[k],
  );
  const beam = isFree
    ? beamWPerM2
    : beamWPerM2.map((value, k) => {
        if (value === 0 || sun.altitudeDeg[k] < horizonAltitudeDeg(horizon, sun.azimuthDeg[k]))
          return 0;
        if (shaded === null) return value;
        const towards = sunFromWindow(
          face.tiltDeg,
          face.azimuthDeg,
          sun.azimuthDeg[k],
          sun.altitudeDeg[k],
        );
        return value * litAt(towards);
      });
  const ground = left.ground === 1 ? groundWPerM2 : groundWPerM2.map((g) => left.ground * g);
  return { beamWPerM2: beam, diffuseWPerM2: diffuse, groundWPerM2: ground, cosIncidence };
}

/** Width and height of a surface, from its box or as a square [m]. */
function surfaceSize(room: Room, surface: Surface): { widthM: number; heightM: number } {
  const { box } = room;
  const face = box && boxFaceOf(box, surface);
  if (
    box &&
    face !== undefined &&
    Math.abs(boxFaceAreasM2(box)[face] - surface.areaM2) < 0.01 * surface.areaM2
  ) {
    const widthM = face === 1 || face === 3 ? box.depthM : box.lengthM;
    return { widthM, heightM: surface.areaM2 / widthM };
  }
  const side = Math.sqrt(surface.areaM2);
  return { widthM: side, heightM: side };
}

/** The surface with what shades it, or null. */
export function shadedSurface(room: Room, surface: Surface): ShadedWindow | null {
  return surface.shading ? { ...surfaceSize(room, surface), ...surface.shading } : null;
}

/** The opening with its own shades, or with those of the wall it sits in, or null. */
export function shadedOpening(room: Room, surface: Surface, opening: Opening): ShadedWindow | null {
  const { rectangle } = opening;
  const side = Math.sqrt(opening.areaM2);
  const size = { widthM: rectangle?.widthM ?? side, heightM: rectangle?.heightM ?? side };
  if (opening.shading) return { ...size, ...opening.shading };
  if (!surface.shading) return null;
  const wall = surfaceSize(room, surface);
  const margins = rectangle
    ? {
        left: rectangle.leftM,
        right: wall.widthM - rectangle.leftM - rectangle.widthM,
        above: wall.heightM - rectangle.bottomM - rectangle.heightM,
        below: rectangle.bottomM,
      }
    : { left: 0, right: 0, above: 0, below: 0 };
  return { ...size, ...movedShading(surface.shading, margins) };
}

/** The wall's shades as measured from the edges of an opening in it. */
function movedShading(
  shading: Shading,
  by: { left: number; right: number; above: number; below: number },
): Shading {
  const { overhang, leftFin, rightFin } = shading;
  const standing = (fin: NonNullable<Shading['leftFin']>, beside: number) => ({
    ...fin,
    gapM: fin.gapM + beside,
    aboveM: fin.aboveM + by.above,
    belowM: fin.belowM + by.below,
  });
  return {
    revealM: shading.revealM,
    overhang: overhang && {
      depthM: overhang.depthM,
      gapM: overhang.gapM + by.above,
      leftM: overhang.leftM + by.left,
      rightM: overhang.rightM + by.right,
    },
    leftFin: leftFin && standing(leftFin, by.left),
    rightFin: rightFin && standing(rightFin, by.right),
  };
}
