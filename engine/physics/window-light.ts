// Which surfaces of a box-shaped room the diffuse light through a window meets first.
//
// Light of the sky comes from above and heads down into the room; light from the ground comes from
// below and heads up. Seen from the window each is taken as even over its own part of the view.
import { type Direction, inwardCosine, patchScratch, patchShare } from './sun-patch.ts';
import type { Box, BoxRectangle } from './view-factors.ts';

export interface WindowLight {
  /** Share of the sky's light that meets each target first; adds up to 1 over all that is seen. */
  readonly sky: Float64Array;
  /** Likewise for light from the ground; all 0 where the window does not see the ground. */
  readonly ground: Float64Array;
}

const rings = 24;
const spokes = 64;

/**
 * Shares of sky and ground light through a window by target.
 *
 *   s_t = ∫ τ(θ)·cos θ·(share of the rays that meet t) dω / ∫ τ(θ)·cos θ dω
 *
 * over the directions that head down (sky) or up (ground). 24 × 64 directions of equal weight; the
 * error is under 0.002. With τ constant, the mean of both, weighted by what each half holds, is the
 * view factor of the window.
 *
 * @param targets whole faces or rectangles on them, without overlap
 * @param transmittanceAt transmittance by cosine of incidence; constant if left out
 *
 * Source: definition of diffuse irradiance; evenness over each half is our assumption.
 */
export function windowLight(
  box: Box,
  window: BoxRectangle,
  targets: readonly BoxRectangle[],
  transmittanceAt: (cosine: number) => number = () => 1,
): WindowLight {
  const sky = new Float64Array(targets.length);
  const ground = new Float64Array(targets.length);
  let skyWeight = 0;
  let groundWeight = 0;
  const scratch = patchScratch();
  for (let r = 0; r < rings; r++) {
    const sine = Math.sqrt((r + 0.5) / rings); // equal steps of sin² weigh by the cosine
    const cosine = Math.sqrt(1 - sine * sine);
    const weight = transmittanceAt(cosine);
    for (let s = 0; s < spokes; s++) {
      const turn = (2 * Math.PI * (s + 0.5)) / spokes;
      const d = inward(window, sine * Math.cos(turn), sine * Math.sin(turn), cosine);
      const into = d.z < 0 ? sky : ground;
      if (d.z < 0) skyWeight += weight;
      else groundWeight += weight;
      targets.forEach((target, t) => {
        into[t] += weight * patchShare(box, window, d, target, scratch);
      });
    }
  }
  for (let t = 0; t < targets.length; t++) {
    if (skyWeight > 0) sky[t] /= skyWeight;
    if (groundWeight > 0) ground[t] /= groundWeight;
  }
  return { sky, ground };
}

/** Direction with components along the window's sides and along its inward normal. */
function inward(window: BoxRectangle, a: number, b: number, normal: number): Direction {
  const sign = inwardCosine(window.face, { x: 1, y: 1, z: 1 });
  if (window.face === 'left' || window.face === 'right') return { x: sign * normal, y: a, z: b };
  if (window.face === 'front' || window.face === 'back') return { x: a, y: sign * normal, z: b };
  return { x: a, y: b, z: sign * normal };
}
