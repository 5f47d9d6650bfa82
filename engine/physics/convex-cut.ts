// Convex polygons in a plane: cutting by lines, taking one out of another, areas.

/** Corners x0, y0, x1, y1, … in order round the polygon. */
export type Polygon = readonly number[];

/** The part of a polygon on one side of the line through (ax, ay) and (bx, by): left of a→b, or right. */
function cut(
  polygon: Polygon,
  ax: number,
  ay: number,
  bx: number,
  by: number,
  side: 1 | -1,
): number[] {
  const kept: number[] = [];
  const count = polygon.length;
  for (let k = 0; k < count; k += 2) {
    const x = polygon[k];
    const y = polygon[k + 1];
    const nx = polygon[(k + 2) % count];
    const ny = polygon[(k + 3) % count];
    const here = side * ((bx - ax) * (y - ay) - (by - ay) * (x - ax));
    const next = side * ((bx - ax) * (ny - ay) - (by - ay) * (nx - ax));
    if (here >= 0) kept.push(x, y);
    if (here >= 0 !== next >= 0) {
      const t = here / (here - next);
      kept.push(x + t * (nx - x), y + t * (ny - y));
    }
  }
  return kept;
}

/** Area, above 0 where the corners run counterclockwise. */
export function polygonArea(polygon: Polygon): number {
  let twice = 0;
  const count = polygon.length;
  for (let k = 0; k < count; k += 2)
    twice += polygon[k] * polygon[(k + 3) % count] - polygon[(k + 2) % count] * polygon[k + 1];
  return twice / 2;
}

/**
 * What is left of a convex polygon when another is taken out, as convex pieces: one for each side of
 * the hole that has something outside it.
 *
 * @param hole convex; either sense of turning
 */
export function takeOut(polygon: Polygon, hole: Polygon): Polygon[] {
  const area = polygonArea(hole);
  if (Math.abs(area) < 1e-12) return [polygon]; // a plate seen edge-on throws no shadow
  const turn = area > 0 ? 1 : -1;
  const pieces: Polygon[] = [];
  let rest: Polygon = polygon;
  const count = hole.length;
  for (let k = 0; k < count && rest.length >= 6; k += 2) {
    const [ax, ay] = [hole[k], hole[k + 1]];
    const [bx, by] = [hole[(k + 2) % count], hole[(k + 3) % count]];
    const outside = cut(rest, ax, ay, bx, by, turn === 1 ? -1 : 1);
    if (outside.length >= 6) pieces.push(outside);
    rest = cut(rest, ax, ay, bx, by, turn);
  }
  return rest.length < 6 ? [polygon] : pieces; // nothing of it lay in the hole: leave it whole
}
