// Light inside a room from where it first falls to where it stays: all reflections followed, or fixed
// shares; and where diffuse light through a window first falls.
import type { Building, Room } from '../building/index.ts';
import {
  type BoxRectangle,
  boxFaces,
  faceRectangle,
  incidenceDeg,
  lightMatrix,
  passedAt,
  spreadLight,
  type WindowLight,
  windowLight,
} from '../physics/index.ts';
import type { Rays } from './beam-inside.ts';
import { boxFaceName, type FaceViews, onBox, physicsBox } from './enclosure.ts';
import type { Face } from './room-parts.ts';
import type { WindowParts } from './window.ts';
import { thrownBack } from './window-light.ts';

/** Diffuse light spreads as the window sees the faces. */
export function viewShares(views: FaceViews, windowFace: number): Float64Array {
  const n = views.areaM2.length;
  return Float64Array.from(
    { length: n },
    (_, j) => views.exchangeM2[windowFace * n + j] / views.areaM2[windowFace],
  );
}

/** Faces that light of the sky and light of the ground meet first; by view where the room has no box. */
export function diffuseShares(
  building: Building,
  room: Room,
  faces: readonly Face[],
  window: WindowParts,
  views: FaceViews,
): WindowLight {
  const seen = viewShares(views, faces.indexOf(window.face));
  const { rectangle } = window.face;
  if (building.physics.diffuseInside !== 'sky-and-ground' || !room.box || !rectangle)
    return { sky: seen, ground: seen };
  const roomBox = room.box;
  const box = physicsBox(roomBox);
  const names = faces.map((face) => boxFaceName(roomBox, face));
  const placed = faces.flatMap((face, f): { f: number; target: BoxRectangle }[] =>
    face.rectangle ? [{ f, target: onBox(roomBox, names[f], face.rectangle) }] : [],
  );
  const { light } = window.states[0];
  const { sky, ground } = windowLight(
    box,
    onBox(roomBox, boxFaceName(roomBox, window.face), rectangle),
    [...boxFaces.map((name) => faceRectangle(box, name)), ...placed.map((one) => one.target)],
    (cosine) => passedAt(light, incidenceDeg(cosine)),
  );
  const onFaces = (met: Float64Array): Float64Array => {
    // Faces without a rectangle share by area what meets their box face outside all rectangles.
    const rest = met.slice(0, boxFaces.length);
    const shares = new Float64Array(faces.length);
    placed.forEach(({ f }, p) => {
      shares[f] = met[boxFaces.length + p];
      rest[boxFaces.indexOf(names[f])] -= shares[f];
    });
    const freeM2 = boxFaces.map((name) =>
      faces.reduce(
        (sum, face, f) => sum + (names[f] === name && !face.rectangle ? face.areaM2 : 0),
        0,
      ),
    );
    faces.forEach((face, f) => {
      const b = boxFaces.indexOf(names[f]);
      if (!face.rectangle && freeM2[b] > 0) shares[f] = (rest[b] * face.areaM2) / freeM2[b];
    });
    const total = shares.reduce((sum, one) => sum + one, 0); // 1 but for the wall that holds the window
    return total > 0 ? shares.map((one) => one / total) : seen;
  };
  return { sky: onFaces(sky), ground: onFaces(ground) };
}

/**
 * Light that meets each face in the end, all reflections followed, from the rays that come in. What
 * faces absorb and glass lets out is this times their shares. Steps in which the windows stand alike
 * share one matrix.
 */
export function followed(
  faces: readonly Face[],
  windows: readonly WindowParts[],
  views: FaceViews,
  rays: readonly Rays[],
  steps: number,
): Float64Array[] {
  const n = faces.length;
  const totalW = faces.map(() => new Float64Array(steps));
  const spread = new Float64Array(n);
  for (const alike of likeSteps(windows, steps)) {
    const first = alike ? alike[0] : 0;
    const reflectance = faces.map((face) => {
      const window = windows.find((one) => one.face === face);
      return window
        ? thrownBack(window.states, first)
        : 1 - face.light.absorbed - face.light.transmitted;
    });
    const matrix = lightMatrix(views.areaM2, views.exchangeM2, reflectance);
    for (const { shares, lightW } of rays) {
      spreadLight(matrix, shares, spread);
      for (let i = 0; i < n; i++) addScaled(spread[i], lightW, totalW[i], alike);
    }
  }
  return totalW;
}

/** Steps grouped by the state of all windows; one group of all (null) where none ever changes. */
function likeSteps(windows: readonly WindowParts[], steps: number): readonly (Int32Array | null)[] {
  const moving = windows.flatMap((one) =>
    one.states.flatMap(({ weight }) => (weight ? [weight] : [])),
  );
  if (moving.length === 0) return [null];
  const groups = new Map<string, number[]>();
  for (let k = 0; k < steps; k++) {
    let key = '';
    for (const weight of moving) key += `${weight[k]} `;
    const group = groups.get(key);
    if (group) group.push(k);
    else groups.set(key, [k]);
  }
  return [...groups.values()].map((group) => Int32Array.from(group));
}

function addScaled(
  factor: number,
  values: Float64Array,
  into: Float64Array,
  only: Int32Array | null,
): void {
  if (factor === 0) return;
  if (only) for (let i = 0; i < only.length; i++) into[only[i]] += factor * values[only[i]];
  else for (let k = 0; k < into.length; k++) into[k] += factor * values[k];
}

/**
 * Fixed shares: floors take their absorptance of all light that comes in, the other opaque faces the
 * rest by area; none is lost through glass. Common practice, no source.
 * @returns light on each face such that its absorbed share is what it takes
 */
export function fixedShares(
  faces: readonly Face[],
  rays: readonly Rays[],
  steps: number,
): Float64Array[] {
  const isFloor = (face: Face) => face.tiltDeg > 135;
  const takes = (face: Face) => face.opening === undefined && face.light.absorbed > 0;
  const sumOf = (of: (face: Face) => number) =>
    faces.reduce((sum, face) => sum + (takes(face) ? of(face) : 0), 0);
  const floorM2 = sumOf((face) => (isFloor(face) ? face.areaM2 : 0));
  const otherM2 = sumOf((face) => (isFloor(face) ? 0 : face.areaM2));
  const floorTakes =
    floorM2 === 0
      ? 0
      : otherM2 === 0
        ? 1
        : sumOf((face) => (isFloor(face) ? face.areaM2 * face.light.absorbed : 0)) / floorM2;
  const inW = new Float64Array(steps);
  for (const { shares, lightW } of rays)
    addScaled(
      shares.reduce((sum, one) => sum + one, 0),
      lightW,
      inW,
      null,
    );
  return faces.map((face) => {
    if (!takes(face)) return new Float64Array(steps);
    const share = isFloor(face)
      ? (floorTakes * face.areaM2) / floorM2
      : ((1 - floorTakes) * face.areaM2) / otherM2;
    return inW.map((w) => (share * w) / face.light.absorbed);
  });
}
