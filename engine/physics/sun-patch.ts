// Where the beam lands that comes through a window of a box-shaped room: exact, by clipping polygons.
import { type Box, type BoxFace, type BoxRectangle, rectangleAreaM2 } from './view-factors.ts';

/** A direction in the box's own axes: x from left to right, y from front to back, z up. */
export interface Direction {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

const radPerDeg = Math.PI / 180;

/**
 * Direction in which sunlight travels, in the axes of a box.
 *
 * @param frontAzimuthDeg where the outside of the front looks, clockwise from north [°]
 * @param sunAzimuthDeg clockwise from north, @param sunAltitudeDeg above the horizon [°]
 */
export function sunTravel(
  frontAzimuthDeg: number,
  sunAzimuthDeg: number,
  sunAltitudeDeg: number,
): Direction {
  const turned = (sunAzimuthDeg - frontAzimuthDeg) * radPerDeg;
  const level = Math.cos(sunAltitudeDeg * radPerDeg);
  return {
    x: level * Math.sin(turned),
    y: level * Math.cos(turned),
    z: -Math.sin(sunAltitudeDeg * radPerDeg),
  };
}

const planes: Readonly<Record<BoxFace, { readonly axis: 0 | 1 | 2; readonly far: boolean }>> = {
  left: { axis: 0, far: false },
  right: { axis: 0, far: true },
  front: { axis: 1, far: false },
  back: { axis: 1, far: true },
  floor: { axis: 2, far: false },
  ceiling: { axis: 2, far: true },
};

/** The two axes along u and v of a face with this normal. */
const along = [
  [1, 2],
  [0, 2],
  [0, 1],
] as const;

/** Cosine between a direction of travel and the inward normal of a face; above 0 where it comes in. */
export function inwardCosine(face: BoxFace, d: Direction): number {
  const { axis, far } = planes[face];
  const component = axis === 0 ? d.x : axis === 1 ? d.y : d.z;
  return far ? -component : component;
}

/** Room for two polygons of up to eight corners; one for each caller. */
export function patchScratch(): Float64Array {
  return new Float64Array(32);
}

/**
 * Share of the beam through a window that meets a rectangle on a face of the box.
 *
 * The window is carried along the rays into the plane of the target, where it becomes a parallelogram;
 * the share is how much of it the target covers. Over all five other faces the shares add up to 1.
 *
 * @param window on its face; for a part in the sun, that part
 * @param travel direction of the rays, into the room through the window
 * @param target a face, or a rectangle on one
 * @param scratch from `patchScratch`
 * @returns 0 to 1
 *
 * Source: geometry; clipping by I. E. Sutherland, G. W. Hodgman, "Reentrant polygon clipping",
 * Communications of the ACM 17 (1974), pp. 32–42.
 */
export function patchShare(
  box: Box,
  window: BoxRectangle,
  travel: Direction,
  target: BoxRectangle,
  scratch: Float64Array,
): number {
  const size = [box.lengthM, box.widthM, box.heightM];
  const d = [travel.x, travel.y, travel.z];
  const from = planes[window.face];
  const to = planes[target.face];
  const rate = d[to.axis];
  if (window.face === target.face || (to.far ? rate <= 1e-9 : rate >= -1e-9)) return 0;
  const [wu, wv] = along[from.axis];
  const [tu, tv] = along[to.axis];
  const plane = to.far ? size[to.axis] : 0;
  for (let k = 0; k < 4; k++) {
    const corner = [0, 0, 0];
    corner[from.axis] = from.far ? size[from.axis] : 0;
    corner[wu] = k === 0 || k === 3 ? window.u0M : window.u1M;
    corner[wv] = k < 2 ? window.v0M : window.v1M;
    const reach = (plane - corner[to.axis]) / rate;
    scratch[2 * k] = corner[tu] + reach * d[tu];
    scratch[2 * k + 1] = corner[tv] + reach * d[tv];
  }
  // The projection scales areas by the ratio of the cosines at window and target.
  const whole = (rectangleAreaM2(window) * Math.abs(d[from.axis])) / Math.abs(rate);
  let corners = 4;
  corners = clip(scratch, corners, 0, 0, target.u0M, 1);
  corners = clip(scratch, corners, 16, 0, target.u1M, -1);
  corners = clip(scratch, corners, 0, 1, target.v0M, 1);
  corners = clip(scratch, corners, 16, 1, target.v1M, -1);
  return Math.min(1, areaOf(scratch, corners) / whole);
}

/** Keeps the part of a polygon on one side of a line; reads at `from`, writes to the other half. */
function clip(
  points: Float64Array,
  count: number,
  from: number,
  axis: 0 | 1,
  limit: number,
  side: 1 | -1,
): number {
  const into = 16 - from;
  let kept = 0;
  for (let k = 0; k < count; k++) {
    const a = from + 2 * k;
    const b = from + 2 * ((k + 1) % count);
    const over = side * (points[a + axis] - limit);
    const next = side * (points[b + axis] - limit);
    if (over >= 0) {
      points[into + 2 * kept] = points[a];
      points[into + 2 * kept + 1] = points[a + 1];
      kept++;
    }
    if (over >= 0 !== next >= 0) {
      const t = over / (over - next);
      points[into + 2 * kept] = points[a] + t * (points[b] - points[a]);
      points[into + 2 * kept + 1] = points[a + 1] + t * (points[b + 1] - points[a + 1]);
      kept++;
    }
  }
  return kept;
}

/** Area of the polygon in the first half of the scratch. */
function areaOf(points: Float64Array, count: number): number {
  let twice = 0;
  for (let k = 0; k < count; k++) {
    const a = 2 * k;
    const b = 2 * ((k + 1) % count);
    twice += points[a] * points[b + 1] - points[b] * points[a + 1];
  }
  return Math.abs(twice) / 2;
}
