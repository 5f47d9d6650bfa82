// Which face of a room's box a surface lies on. Faces in plan, clockwise from the front by azimuth:
// 0 front, 1 left (as seen when looking at the front from outside), 2 back, 3 right; 4 floor, 5 ceiling.
import type { Room, Surface } from './schema-room.ts';

export type Box = NonNullable<Room['box']>;

/** Areas in the order front, left, back, right, floor, ceiling [m²]. */
export function boxFaceAreasM2(box: Box): number[] {
  const { lengthM, depthM, heightM } = box;
  const front = lengthM * heightM;
  const side = depthM * heightM;
  return [front, side, front, side, lengthM * depthM, lengthM * depthM];
}

/** The face, or undefined where the surface looks another way than any face (5° are let pass). */
export function boxFaceOf(
  box: Box,
  surface: Pick<Surface, 'tiltDeg' | 'azimuthDeg'>,
): number | undefined {
  if (surface.tiltDeg < 5) return 5;
  if (surface.tiltDeg > 175) return 4;
  if (Math.abs(surface.tiltDeg - 90) > 5) return undefined;
  const turned = (((surface.azimuthDeg - box.frontAzimuthDeg) % 360) + 360) % 360;
  const face = Math.round(turned / 90);
  return Math.abs(turned - face * 90) > 5 ? undefined : face % 4;
}
