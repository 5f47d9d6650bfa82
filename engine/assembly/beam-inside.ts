// Where the beam through a window lands: on the floor, or on its geometric patch.
import type { SunTrack } from '../../weather/index.ts';
import type { Building, Room } from '../building/index.ts';
import {
  boxFaces,
  faceRectangle,
  patchScratch,
  patchShare,
  sunFromWindow,
  sunlitPieces,
  sunTravel,
} from '../physics/index.ts';
import { boxFaceName, onBox, physicsBox } from './enclosure.ts';
import type { Face } from './room-parts.ts';
import type { WindowParts } from './window.ts';

/** Light that meets the faces first in fixed shares, which add up to 1. */
export interface Rays {
  readonly shares: Float64Array;
  /** In each step [W]. */
  readonly lightW: Float64Array;
}

/**
 * The beam of one window, by the faces that it meets first.
 *
 * The patch needs a box and the window's rectangle; without them the beam falls on the floor.
 * @param beamW transmitted beam in each step [W]
 */
export function beamRays(
  building: Building,
  room: Room,
  faces: readonly Face[],
  window: WindowParts,
  beamW: Float64Array,
  sun: SunTrack,
): Rays[] {
  if (building.physics.beamInside !== 'patch' || !room.box || !window.opening.rectangle)
    return [{ shares: floorShares(faces), lightW: beamW }];
  const ofFace = faces.map(() => new Float64Array(beamW.length));
  addPatch(room.box, faces, window, beamW, sun, ofFace);
  return ofFace.map((lightW, f) => ({
    shares: Float64Array.from(faces, (_, j) => (j === f ? 1 : 0)),
    lightW,
  }));
}

/** The floor by area, or all opaque faces where there is none. */
function floorShares(faces: readonly Face[]): Float64Array {
  const isFloor = (face: Face) => face.tiltDeg > 135 && face.opening === undefined;
  const anyFloor = faces.some(isFloor);
  const weight = faces.map((face) =>
    (anyFloor ? isFloor(face) : face.opening === undefined) ? face.areaM2 : 0,
  );
  const total = weight.reduce((sum, w) => sum + w, 0);
  return Float64Array.from(weight, (w) => w / total);
}

function addPatch(
  roomBox: NonNullable<Room['box']>,
  faces: readonly Face[],
  window: WindowParts,
  beamW: Float64Array,
  sun: SunTrack,
  firstW: readonly Float64Array[],
): void {
  const box = physicsBox(roomBox);
  const rectangle = window.opening.rectangle;
  if (!rectangle) return;
  const opening = onBox(roomBox, boxFaceName(roomBox, window.face), rectangle);
  const names = faces.map((face) => boxFaceName(roomBox, face));
  const placed = faces.map((face, f) =>
    face.rectangle ? onBox(roomBox, names[f], face.rectangle) : null,
  );
  // Faces without a rectangle share by area what meets their box face outside all rectangles.
  const freeM2 = boxFaces.map((name) =>
    faces.reduce((sum, face, f) => sum + (names[f] === name && !placed[f] ? face.areaM2 : 0), 0),
  );
  const whole = boxFaces.map((name) => faceRectangle(box, name));
  const scratch = patchScratch();
  const share = new Float64Array(faces.length);
  const rest = new Float64Array(boxFaces.length);
  for (let k = 0; k < beamW.length; k++) {
    if (beamW[k] === 0) continue;
    const travel = sunTravel(roomBox.frontAzimuthDeg, sun.azimuthDeg[k], sun.altitudeDeg[k]);
    const lit = window.shaded
      ? sunlitPieces(
          window.shaded,
          sunFromWindow(
            window.face.tiltDeg,
            window.face.azimuthDeg,
            sun.azimuthDeg[k],
            sun.altitudeDeg[k],
          ),
        )
      : undefined;
    for (let b = 0; b < boxFaces.length; b++)
      rest[b] = patchShare(box, opening, travel, whole[b], scratch, lit);
    for (let f = 0; f < faces.length; f++) {
      const target = placed[f];
      if (!target) continue;
      share[f] = patchShare(box, opening, travel, target, scratch, lit);
      rest[boxFaces.indexOf(names[f])] -= share[f];
    }
    for (let f = 0; f < faces.length; f++) {
      const b = boxFaces.indexOf(names[f]);
      if (!placed[f]) share[f] = freeM2[b] > 0 ? (rest[b] * faces[f].areaM2) / freeM2[b] : 0;
      firstW[f][k] += share[f] * beamW[k];
    }
  }
}
