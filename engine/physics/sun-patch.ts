// Where the beam lands that comes through a window of a box-shaped room: exact, by clipping polygons.
import type { Polygon } from './convex-cut.ts';
import type { Box, BoxFace, BoxRectangle } from './view-factors.ts';

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

type Axis = 0 | 1 | 2;

const planes: Readonly<Record<BoxFace, { readonly axis: Axis; readonly far: boolean }>> = {
  left: { axis: 0, far: false },
  right: { axis: 0, far: true },
  front: { axis: 1, far: false },
  back: { axis: 1, far: true },
  floor: { axis: 2, far: false },
  ceiling: { axis: 2, far: true },
};

/** The two axes along u and v of a face with this normal. */
const sides: readonly (readonly [Axis, Axis])[] = [
  [1, 2],
  [0, 2],
  [0, 1],
];

/** Component of a direction along an axis. */
function along(d: Direction, axis: Axis): number {
  if (axis === 2) return d.z;
  return axis === 0 ? d.x : d.y;
}

/** Cosine between a direction of travel and the inward normal of a face; above 0 where it comes in. */
export function inwardCosine(face: BoxFace, d: Direction): number {
  const { axis, far } = planes[face];
  return far ? -along(d, axis) : along(d, axis);
}

/** Numbers in each half of the scratch: 32 corners, more than any shadow leaves. */
const half = 64;

/** Room for two polygons; one for each caller. */
export function patchScratch(): Float64Array {
  return new Float64Array(2 * half);
}

/**
 * Share of the beam through a window that meets a rectangle on a face of the box.
 *
 * The window is carried along the rays into the plane of the target, where it becomes a parallelogram;
 * the share is how much of it the target covers. Over all five other faces the shares add up to 1.
 *
 * @param window on its face
 * @param travel direction of the rays, into the room through the window
 * @param target a face, or a rectangle on one
 * @param scratch from `patchScratch`
 * @param lit parts of the window in the sun, as `sunlitPieces` gives them; the whole if left out
 * @returns 0 to 1, of what comes through the lit parts
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
  lit?: readonly Polygon[],
): number {
  const from = planes[window.face];
  const to = planes[target.face];
  const rate = along(travel, to.axis);
  if (window.face === target.face || (to.far ? rate <= 1e-9 : rate >= -1e-9)) return 0;
  const { u0M, u1M, v0M, v1M } = window;
  const width = u1M - u0M;
  const height = v1M - v0M;
  const pieces = lit ?? [[0, 0, width, 0, width, height, 0, height]];
  // Looking out of front or right, u runs to the left.
  const mirrored = window.face === 'front' || window.face === 'right';
  const size = [box.lengthM, box.widthM, box.heightM];
  const [wu, wv] = sides[from.axis];
  const [tu, tv] = sides[to.axis];
  const plane = to.far ? size[to.axis] : 0;
  const corner = [0, 0, 0];
  corner[from.axis] = from.far ? size[from.axis] : 0;
  let whole = 0;
  let covered = 0;
  for (const piece of pieces) {
    for (let k = 0; k < piece.length; k += 2) {
      corner[wu] = mirrored ? u1M - piece[k] : u0M + piece[k];
      corner[wv] = v0M + piece[k + 1];
      const reach = (plane - corner[to.axis]) / rate;
      scratch[k] = corner[tu] + reach * along(travel, tu);
      scratch[k + 1] = corner[tv] + reach * along(travel, tv);
    }
    let corners = piece.length / 2;
    whole += areaOf(scratch, corners);
    corners = clip(scratch, corners, 0, 0, target.u0M, 1);
    corners = clip(scratch, corners, half, 0, target.u1M, -1);
    corners = clip(scratch, corners, 0, 1, target.v0M, 1);
    corners = clip(scratch, corners, half, 1, target.v1M, -1);
    covered += areaOf(scratch, corners);
  }
  return whole > 0 ? Math.min(1, covered / whole) : 0;
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
  const into = half - from;
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
