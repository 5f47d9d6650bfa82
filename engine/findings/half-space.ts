// What a small plane element inside a box sees: shares of its half space that each face fills.

/** Distances from the element to the faces of the box [m]. */
export interface ElementPlace {
  /** To the face that it looks at. */
  readonly aheadM: number;
  /** To the two faces beside it, and the two above and below (as it looks). */
  readonly leftM: number;
  readonly rightM: number;
  readonly upM: number;
  readonly downM: number;
}

/** Shares that add up to 1. */
export interface ElementView {
  readonly ahead: number;
  readonly left: number;
  readonly right: number;
  readonly up: number;
  readonly down: number;
}

/**
 * Element parallel to a rectangle, one of whose corners lies on its normal.
 *
 *   F = (A/√(1+A²)·atan(B/√(1+A²)) + B/√(1+B²)·atan(A/√(1+B²)))/2π,  A = a/c, B = b/c
 *
 * Source: ISO 7726:1998, Annex C; J. R. Howell, A Catalog of Radiation Heat Transfer Configuration
 * Factors, B-3 (from memory; the shares of a half space add up to 1, which a test holds).
 */
function parallel(aM: number, bM: number, distanceM: number): number {
  const a = aM / distanceM;
  const b = bM / distanceM;
  const ra = Math.sqrt(1 + a * a);
  const rb = Math.sqrt(1 + b * b);
  return ((a / ra) * Math.atan(b / ra) + (b / rb) * Math.atan(a / rb)) / (2 * Math.PI);
}

/**
 * Element at right angles to a rectangle that begins in the element's own plane.
 *
 *   F = (atan(1/Y) − Y/√(X²+Y²)·atan(1/√(X²+Y²)))/2π,  X = a/b, Y = c/b
 *
 * @param aM reach of the rectangle along the element's normal, @param bM its width, @param distanceM c
 *
 * Source: as `parallel`; Howell B-4.
 */
function upright(aM: number, bM: number, distanceM: number): number {
  const x = aM / bM;
  const y = distanceM / bM;
  const r = Math.sqrt(x * x + y * y);
  return (Math.atan(1 / y) - (y / r) * Math.atan(1 / r)) / (2 * Math.PI);
}

/** Shares of the faces in what the element sees. */
export function elementView(place: ElementPlace): ElementView {
  const { aheadM, leftM, rightM, upM, downM } = place;
  const side = (distanceM: number, one: number, other: number) =>
    upright(aheadM, one, distanceM) + upright(aheadM, other, distanceM);
  return {
    ahead:
      parallel(leftM, upM, aheadM) +
      parallel(leftM, downM, aheadM) +
      parallel(rightM, upM, aheadM) +
      parallel(rightM, downM, aheadM),
    left: side(leftM, upM, downM),
    right: side(rightM, upM, downM),
    up: side(upM, leftM, rightM),
    down: side(downM, leftM, rightM),
  };
}
