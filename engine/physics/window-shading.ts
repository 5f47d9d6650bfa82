// What overhang, fins and reveal leave of the sun on a rectangular window or wall: exact shadows.
//
// Left and right are as seen from inside, looking out. Lengths are in the plane of the window, depths
// outwards from the outer face of the wall; the window stands behind that face by its reveal.
import { type Polygon, polygonArea, takeOut } from './convex-cut.ts';

/** A plate above, square to the wall. */
export interface Overhang {
  readonly depthM: number;
  /** Between the head of the window and the plate. */
  readonly gapM: number;
  /** How far it goes on beyond the sides of the window; Infinity for a long one. */
  readonly leftM: number;
  readonly rightM: number;
}

/** An upright plate beside, square to the wall. */
export interface Fin {
  readonly depthM: number;
  /** Between the side of the window and the plate. */
  readonly gapM: number;
  /** How far it goes on above the head and below the sill; Infinity for a tall one. */
  readonly aboveM: number;
  readonly belowM: number;
}

/** A window with what shades it. Leave out what is not there. */
export interface ShadedWindow {
  readonly widthM: number;
  readonly heightM: number;
  /** How far the glass stands behind the outer face of the wall. */
  readonly revealM: number;
  readonly overhang?: Overhang | undefined;
  readonly leftFin?: Fin | undefined;
  readonly rightFin?: Fin | undefined;
}

/** Direction towards the sun in the frame of a window, a unit vector. */
export interface SunFromWindow {
  readonly right: number;
  /** Up along the window; straight up for a wall. */
  readonly up: number;
  /** Along the outward normal: the cosine of incidence. */
  readonly out: number;
}

const radPerDeg = Math.PI / 180;
/** In place of Infinity, where corners have to be reckoned with. */
const farM = 1e5;

/**
 * Direction of the sun as a window sees it.
 *
 * @param tiltDeg 0 flat roof, 90 wall, @param azimuthDeg where it looks, clockwise from north [°]
 */
export function sunFromWindow(
  tiltDeg: number,
  azimuthDeg: number,
  sunAzimuthDeg: number,
  sunAltitudeDeg: number,
): SunFromWindow {
  const turned = (sunAzimuthDeg - azimuthDeg) * radPerDeg;
  const level = Math.cos(sunAltitudeDeg * radPerDeg);
  const high = Math.sin(sunAltitudeDeg * radPerDeg);
  const ahead = level * Math.cos(turned);
  const [c, s] = [Math.cos(tiltDeg * radPerDeg), Math.sin(tiltDeg * radPerDeg)];
  return { right: level * Math.sin(turned), up: s * high - c * ahead, out: s * ahead + c * high };
}

/**
 * Profile angle of the sun for a wall: its altitude seen along the wall.
 *
 *   tan Ω = tan h/cos γ
 *
 * Source: Duffie & Beckman, 1.9.
 */
export function profileAngleDeg(sun: SunFromWindow): number {
  return Math.atan2(sun.up, sun.out) / radPerDeg;
}

/**
 * Parts of the window that the sun reaches, as convex pieces; x from the left side, y from the sill.
 * None where the sun is behind the window's plane.
 *
 * Each plate throws a parallelogram: its far edge moves by depth·right/out sideways and depth·up/out
 * down. The reveal is four plates round the window's edge.
 *
 * Source: geometry of shadows on a plane (Duffie & Beckman, 14.4, without its long-overhang limit).
 */
export function sunlitPieces(window: ShadedWindow, sun: SunFromWindow): readonly Polygon[] {
  if (sun.out <= 0) return [];
  const { widthM: w, heightM: h, revealM: reveal } = window;
  const side = -sun.right / sun.out; // sideways move of a shadow per metre of depth
  const down = -sun.up / sun.out;
  const shadows: Polygon[] = [];
  /** Shadow of a plate that stands on the line (x0, y0) to (x1, y1), x0 ≤ x1 and y0 ≤ y1, from one depth to another. */
  const cast = (x0: number, y0: number, x1: number, y1: number, near: number, far: number) => {
    const [nx, ny, fx, fy] = [near * side, near * down, far * side, far * down];
    const beside = Math.max(x1 + nx, x1 + fx) <= 0 || Math.min(x0 + nx, x0 + fx) >= w;
    const beyond = Math.max(y1 + ny, y1 + fy) <= 0 || Math.min(y0 + ny, y0 + fy) >= h;
    if (beside || beyond) return; // clear of the window
    shadows.push([x0 + nx, y0 + ny, x1 + nx, y1 + ny, x1 + fx, y1 + fy, x0 + fx, y0 + fy]);
  };
  const reach = (length: number) => Math.min(length, farM);
  const { overhang, leftFin, rightFin } = window;
  if (reveal > 0) {
    if (down < 0) cast(0, h, w, h, 0, reveal);
    if (down > 0) cast(0, 0, w, 0, 0, reveal);
    if (side > 0) cast(0, 0, 0, h, 0, reveal);
    if (side < 0) cast(w, 0, w, h, 0, reveal);
  }
  if (overhang !== undefined && overhang.depthM > 0) {
    const y = h + overhang.gapM;
    const end = reveal + overhang.depthM;
    cast(-reach(overhang.leftM), y, w + reach(overhang.rightM), y, reveal, end);
  }
  const standing = (x: number, fin: Fin) =>
    cast(x, -reach(fin.belowM), x, h + reach(fin.aboveM), reveal, reveal + fin.depthM);
  if (leftFin !== undefined && leftFin.depthM > 0) standing(-leftFin.gapM, leftFin);
  if (rightFin !== undefined && rightFin.depthM > 0) standing(w + rightFin.gapM, rightFin);
  let lit: Polygon[] = [[0, 0, w, 0, w, h, 0, h]];
  for (const shadow of shadows) lit = lit.flatMap((piece) => takeOut(piece, shadow));
  return lit;
}

/** Share of the window that the sun reaches, 0 to 1; 0 where it stands behind the window's plane. */
export function sunlitFraction(window: ShadedWindow, sun: SunFromWindow): number {
  let area = 0;
  for (const piece of sunlitPieces(window, sun)) area += Math.abs(polygonArea(piece));
  return Math.min(1, area / (window.widthM * window.heightM));
}
