// What the faces of a room see of each other, for heat radiation and for light.
import { type Box, boxFaceOf, type Rectangle, type Room } from '../building/index.ts';
import {
  approximateViewFactors,
  type BoxFace,
  type BoxRectangle,
  boxFaces,
  boxViewFactors,
  closeExchange,
} from '../physics/index.ts';
import type { Face } from './room-parts.ts';

/** Exchange areas A_i·F_ij of a room's faces [m²]: `exchangeM2[i * n + j]`, symmetric, rows add up to A_i. */
export interface FaceViews {
  readonly areaM2: Float64Array;
  readonly exchangeM2: Float64Array;
  readonly method: string;
}

/** Exact where the room is a box, else by areas. */
export function faceViews(room: Room, faces: readonly Face[]): FaceViews {
  return room.box ? boxViews(room.box, faces) : estimatedViews(faces);
}

/** Names of the box's faces in the order of `boxFaceOf`. */
const faceNames: readonly BoxFace[] = ['front', 'left', 'back', 'right', 'floor', 'ceiling'];

/** The name in the physics' terms of the box face that a surface lies on. */
export function boxFaceName(box: Box, face: Pick<Face, 'tiltDeg' | 'azimuthDeg'>): BoxFace {
  const index = boxFaceOf(box, face);
  if (index === undefined) throw new Error('the parser lets no surface off the box pass');
  return faceNames[index];
}

/** A rectangle given as seen from inside, in the coordinates of the box. */
export function onBox(box: Box, face: BoxFace, rectangle: Rectangle): BoxRectangle {
  const { leftM, bottomM, widthM, heightM } = rectangle;
  const spanM = face === 'left' || face === 'right' ? box.depthM : box.lengthM;
  // Looking at the front from inside, x runs to the left; so does y when looking to the right.
  const mirrored = face === 'front' || face === 'right';
  const u0M = mirrored ? spanM - leftM - widthM : leftM;
  return { face, u0M, u1M: u0M + widthM, v0M: bottomM, v1M: bottomM + heightM };
}

/** Box in the physics' terms. */
export function physicsBox(box: Box): { lengthM: number; widthM: number; heightM: number } {
  return { lengthM: box.lengthM, widthM: box.depthM, heightM: box.heightM };
}

/**
 * Faces with a rectangle are cut out exactly; faces without share what is left of their box face by
 * area, which is exact when there is one of them.
 */
function boxViews(box: Box, faces: readonly Face[]): FaceViews {
  const n = faces.length;
  const placed = faces.flatMap((face, i) =>
    face.rectangle ? [{ i, rectangle: face.rectangle }] : [],
  );
  const exact = boxViewFactors(
    physicsBox(box),
    placed.map(({ i, rectangle }) => onBox(box, boxFaceName(box, faces[i]), rectangle)),
  );
  const regions = exact.areaM2.length;
  const region = new Int32Array(n);
  const freeM2 = new Float64Array(regions); // of faces that share a region
  for (let i = 0; i < n; i++) region[i] = boxFaces.indexOf(boxFaceName(box, faces[i]));
  placed.forEach(({ i }, p) => {
    region[i] = boxFaces.length + p;
  });
  for (let i = 0; i < n; i++) freeM2[region[i]] += faces[i].areaM2;
  const exchangeM2 = new Float64Array(n * n);
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      const shares = (faces[i].areaM2 / freeM2[region[i]]) * (faces[j].areaM2 / freeM2[region[j]]);
      exchangeM2[i * n + j] = shares * exact.exchangeM2[region[i] * regions + region[j]];
    }
  const areaM2 = Float64Array.from(faces, (face) => face.areaM2);
  closeExchange(areaM2, exchangeM2); // drawings round; the box's areas and the faces' differ a little
  return { areaM2, exchangeM2, method: 'view factors of the room’s box, closed form' };
}

function estimatedViews(faces: readonly Face[]): FaceViews {
  const areaM2 = Float64Array.from(faces, (face) => face.areaM2);
  const planes = new Map<string, number>();
  const plane = faces.map((face) => {
    const flat = face.tiltDeg < 5 || face.tiltDeg > 175;
    const key = `${Math.round(face.tiltDeg)} ${flat ? 0 : Math.round(face.azimuthDeg)}`;
    const known = planes.get(key) ?? planes.size;
    planes.set(key, known);
    return known;
  });
  const { exchangeM2 } = approximateViewFactors(areaM2, plane);
  return {
    areaM2,
    exchangeM2,
    method: 'view factors by area, none in a face’s own plane (Walton 1983)',
  };
}
