// View factors between rectangles on the six faces of a box-shaped room, in closed form.
//
// Everything is kept as the exchange area A_i·F_ij [m²], which is symmetric: reciprocity holds by
// construction. What is left of a face when its windows are cut out follows by subtraction.
import { closeExchange } from './close-exchange.ts';

/** Inside measures of the room. */
export interface Box {
  /** Along x: `left` is at x = 0, `right` at x = length. */
  readonly lengthM: number;
  /** Along y: `front` is at y = 0, `back` at y = width. */
  readonly widthM: number;
  /** Along z, up. */
  readonly heightM: number;
}

export type BoxFace = 'floor' | 'ceiling' | 'front' | 'back' | 'left' | 'right';

/** The order of the faces in every list and matrix here. */
export const boxFaces: readonly BoxFace[] = ['floor', 'ceiling', 'front', 'back', 'left', 'right'];

/**
 * A rectangle on a face. On floor and ceiling u runs along x and v along y; on front and back u runs
 * along x and v up; on left and right u runs along y and v up.
 */
export interface BoxRectangle {
  readonly face: BoxFace;
  readonly u0M: number;
  readonly u1M: number;
  readonly v0M: number;
  readonly v1M: number;
}

type Axis = 0 | 1 | 2;

/** Axis that each face is normal to, and whether it lies at its far end. */
const normals: Readonly<Record<BoxFace, { readonly axis: Axis; readonly far: boolean }>> = {
  floor: { axis: 2, far: false },
  ceiling: { axis: 2, far: true },
  front: { axis: 1, far: false },
  back: { axis: 1, far: true },
  left: { axis: 0, far: false },
  right: { axis: 0, far: true },
};

/** Rectangle in space: its extent along x, y, z; one of them has no length. */
type Extent = readonly [
  readonly [number, number],
  readonly [number, number],
  readonly [number, number],
];

const sizes = (box: Box): readonly [number, number, number] => [
  box.lengthM,
  box.widthM,
  box.heightM,
];

function extent(box: Box, r: BoxRectangle): Extent {
  const { axis, far } = normals[r.face];
  const at = far ? sizes(box)[axis] : 0;
  const u = [r.u0M, r.u1M] as const;
  const v = [r.v0M, r.v1M] as const;
  const w = [at, at] as const;
  if (axis === 2) return [u, v, w];
  return axis === 1 ? [u, w, v] : [w, u, v];
}

/** The whole of a face. */
export function faceRectangle(box: Box, face: BoxFace): BoxRectangle {
  const { axis } = normals[face];
  const size = sizes(box);
  return {
    face,
    u0M: 0,
    u1M: axis === 0 ? size[1] : size[0],
    v0M: 0,
    v1M: axis === 2 ? size[1] : size[2],
  };
}

export function rectangleAreaM2(r: BoxRectangle): number {
  return (r.u1M - r.u0M) * (r.v1M - r.v0M);
}

/** Corner term of two parallel rectangles: p, q are the corner's offsets, z the distance. */
function parallelTerm(p: number, q: number, z: number): number {
  const a = Math.hypot(p, z);
  const b = Math.hypot(q, z);
  const angles = q * a * Math.atan(q / a) + p * b * Math.atan(p / b);
  return angles - (z * z * Math.log(p * p + q * q + z * z)) / 2;
}

/** Corner term of two perpendicular rectangles: x, y from the common edge, q along it. */
function perpendicularTerm(x: number, y: number, q: number): number {
  const c2 = x * x + y * y;
  const q2 = q * q;
  const c = Math.sqrt(c2);
  const angle = c === 0 ? 0 : q * c * Math.atan(q / c);
  const log = c2 + q2 === 0 ? 0 : ((c2 - q2) * Math.log(c2 + q2)) / 4;
  return angle - log;
}

/**
 * Exchange area A1·F12 of two parallel rectangles at a distance.
 *
 *   A1·F12 = (1/2π)·Σ ± [ q·a·atan(q/a) + p·b·atan(p/b) − (z²/2)·ln(p² + q² + z²) ]
 *
 * with p, q the offsets of the corners along the two sides, a² = p² + z², b² = q² + z².
 *
 * @param first and @param second extents [from, to] along the two sides
 *
 * Source: J. R. Ehlert, T. F. Smith, "View factors for perpendicular and parallel rectangular
 * plates", Journal of Thermophysics and Heat Transfer 7 (1993), pp. 173–175.
 */
export function parallelExchangeM2(
  first: readonly [readonly [number, number], readonly [number, number]],
  second: readonly [readonly [number, number], readonly [number, number]],
  distanceM: number,
): number {
  let sum = 0;
  for (let i = 0; i < 2; i++)
    for (let k = 0; k < 2; k++)
      for (let j = 0; j < 2; j++)
        for (let l = 0; l < 2; l++) {
          const sign = (i + j + k + l) % 2 === 0 ? 1 : -1;
          sum +=
            sign * parallelTerm(first[0][i] - second[0][k], first[1][j] - second[1][l], distanceM);
        }
  return sum / (2 * Math.PI);
}

/**
 * Exchange area A1·F12 of two rectangles in planes at right angles.
 *
 *   A1·F12 = (1/2π)·Σ ± [ q·c·atan(q/c) − ((c² − q²)/4)·ln(c² + q²) ],  c² = x² + y²
 *
 * with x, y the distances of the corners from the line where the planes meet, q along it.
 *
 * @param firstAcross distances of the first rectangle from that line, @param firstAlong along it [m]
 *
 * Source: Ehlert & Smith 1993, as above.
 */
export function perpendicularExchangeM2(
  firstAcross: readonly [number, number],
  firstAlong: readonly [number, number],
  secondAcross: readonly [number, number],
  secondAlong: readonly [number, number],
): number {
  let sum = 0;
  for (let i = 0; i < 2; i++)
    for (let k = 0; k < 2; k++)
      for (let j = 0; j < 2; j++)
        for (let l = 0; l < 2; l++) {
          const sign = (i + j + k + l) % 2 === 0 ? 1 : -1;
          sum +=
            sign *
            perpendicularTerm(firstAcross[i], secondAcross[k], firstAlong[j] - secondAlong[l]);
        }
  return sum / (2 * Math.PI);
}

/** Exchange area A1·F12 [m²] of any two rectangles on faces of a box; 0 on the same face. */
export function boxExchangeM2(box: Box, one: BoxRectangle, two: BoxRectangle): number {
  const a = normals[one.face];
  const b = normals[two.face];
  const e = extent(box, one);
  const f = extent(box, two);
  if (a.axis === b.axis) {
    if (a.far === b.far) return 0;
    const [p, q] = ([0, 1, 2] as const).filter((axis) => axis !== a.axis);
    return parallelExchangeM2([e[p], e[q]], [f[p], f[q]], sizes(box)[a.axis]);
  }
  const along = (3 - a.axis - b.axis) as Axis;
  // Distance from the common edge: of the first along the second's normal, and the other way round.
  const across = (span: readonly [number, number], far: boolean, size: number) =>
    far ? ([size - span[1], size - span[0]] as const) : span;
  const firstAcross = across(e[b.axis], b.far, sizes(box)[b.axis]);
  const secondAcross = across(f[a.axis], a.far, sizes(box)[a.axis]);
  return perpendicularExchangeM2(firstAcross, e[along], secondAcross, f[along]);
}

/** Areas and exchange areas of a room's surfaces. */
export interface ViewFactors {
  readonly areaM2: Float64Array;
  /** A_i·F_ij = `exchangeM2[i * n + j]`, symmetric; each row adds up to A_i. */
  readonly exchangeM2: Float64Array;
}

/**
 * All exchange areas of a box room with rectangles cut out of its faces (windows, doors, parts of a
 * wall). First the six faces less their rectangles, then the rectangles in the order given. A face
 * that is wholly covered keeps its place with area 0.
 *
 * @param rectangles inside their faces and not overlapping
 */
export function boxViewFactors(box: Box, rectangles: readonly BoxRectangle[] = []): ViewFactors {
  const whole = [...boxFaces.map((face) => faceRectangle(box, face)), ...rectangles];
  const n = whole.length;
  const areaM2 = Float64Array.from(whole, rectangleAreaM2);
  const exchangeM2 = new Float64Array(n * n);
  for (let i = 0; i < n; i++)
    for (let j = i + 1; j < n; j++) {
      exchangeM2[i * n + j] = boxExchangeM2(box, whole[i], whole[j]);
      exchangeM2[j * n + i] = exchangeM2[i * n + j];
    }
  // Take each rectangle's share out of its face: row, column, area.
  for (let r = boxFaces.length; r < n; r++) {
    const f = boxFaces.indexOf(whole[r].face);
    areaM2[f] -= areaM2[r];
    for (let j = 0; j < n; j++) exchangeM2[f * n + j] -= exchangeM2[r * n + j];
    for (let j = 0; j < n; j++) exchangeM2[j * n + f] -= exchangeM2[j * n + r];
  }
  for (let f = 0; f < boxFaces.length; f++)
    if (areaM2[f] < 1e-9) {
      areaM2[f] = 0;
      for (let j = 0; j < n; j++) {
        exchangeM2[f * n + j] = 0;
        exchangeM2[j * n + f] = 0;
      }
    }
  for (let i = 0; i < n * n; i++) if (exchangeM2[i] < 0) exchangeM2[i] = 0; // rounding of a difference
  closeExchange(areaM2, exchangeM2);
  return { areaM2, exchangeM2 };
}
