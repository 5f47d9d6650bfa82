// View factors of rooms that are no box: by area, without geometry.
import { closeExchange } from './close-exchange.ts';
import type { ViewFactors } from './view-factors.ts';

/** Exchange areas estimated from areas alone, with what could not be closed. */
export interface ApproximateViewFactors extends ViewFactors {
  /** Largest share of a surface that is taken to see itself, because it outweighs all it can see. */
  readonly largestSelfShare: number;
}

/**
 * Each surface sees the others in proportion to their areas, but none in its own plane; then made
 * reciprocal and closed. Good where the surfaces see each other evenly, as in a cube; in flat rooms
 * floor and ceiling get too little of each other (8 × 6 × 2.7 m: 0.455 in place of 0.494).
 *
 * @param areaM2 of each surface, above 0
 * @param plane a number for each surface; surfaces of one number lie in one plane. A negative number
 *   stands for furniture and the like, that sees all other surfaces
 *
 * Source: area weighting without coplanar surfaces after G. N. Walton, NBSIR 83-2655, 1983.
 */
export function approximateViewFactors(
  areaM2: Float64Array,
  plane: readonly number[],
): ApproximateViewFactors {
  const n = areaM2.length;
  const exchangeM2 = new Float64Array(n * n);
  const total = areaM2.reduce((sum, a) => sum + a, 0);
  for (let i = 0; i < n; i++) {
    let seen = 0;
    for (let j = 0; j < n; j++) {
      const apart = plane[i] < 0 ? i !== j : plane[i] !== plane[j];
      if (!apart) continue;
      exchangeM2[i * n + j] = (areaM2[i] * areaM2[j]) / total;
      seen += areaM2[j];
    }
    // The surface's plane outweighs all that it sees: without a view of itself nothing could close.
    if (total - seen > seen) exchangeM2[i * n + i] = (areaM2[i] * areaM2[i]) / total;
  }
  closeExchange(areaM2, exchangeM2);
  let largestSelfShare = 0;
  for (let i = 0; i < n; i++)
    largestSelfShare = Math.max(largestSelfShare, exchangeM2[i * n + i] / areaM2[i]);
  return { areaM2, exchangeM2, largestSelfShare };
}
