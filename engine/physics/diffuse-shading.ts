// What shading leaves of the light that comes from sky and ground: computed once a window.
import { type Horizon, horizonAltitudeDeg } from './horizon.ts';
import { type ShadedWindow, type SunFromWindow, sunlitFraction } from './window-shading.ts';

/** Shares of what the bare window would get, 0 to 1. */
export interface DiffuseShading {
  /** Of an even sky. */
  readonly sky: number;
  /** Of a bright band low at the horizon. */
  readonly horizon: number;
  /** Of an even ground; 1 where the window does not see the ground. */
  readonly ground: number;
}

const rings = 24;
const spokes = 64;
const bandDirections = 180;
const degPerRad = 180 / Math.PI;

/**
 * Shading of diffuse light by plates and skyline.
 *
 *   f = ∫ lit(ω)·cos θ dω / ∫ cos θ dω
 *
 * over the sky, or the ground, that the window faces; lit is the share of the window that a ray from
 * there reaches. What hides the sky is taken as dark, so the result is on the low side for pale
 * surroundings. 24 × 64 directions of equal weight; the error is under 0.005.
 *
 * @param tiltDeg 0 flat roof, 90 wall, @param azimuthDeg where the window looks [°]
 * @param litAt share of the window that a ray from there reaches; the exact shadow if left out
 *
 * Source: definition of the view factor to a visible part of the sky.
 */
export function diffuseShading(
  window: ShadedWindow,
  tiltDeg: number,
  azimuthDeg: number,
  horizon: Horizon = [],
  litAt: (sun: SunFromWindow) => number = (sun) => sunlitFraction(window, sun),
): DiffuseShading {
  const [c, s] = [Math.cos(tiltDeg / degPerRad), Math.sin(tiltDeg / degPerRad)];
  const seen = { sky: 0, ground: 0 };
  const whole = { sky: 0, ground: 0 };
  for (let r = 0; r < rings; r++) {
    const sine = Math.sqrt((r + 0.5) / rings); // equal steps of sin² weigh by the cosine
    const out = Math.sqrt(1 - sine * sine);
    for (let k = 0; k < spokes; k++) {
      const turn = (2 * Math.PI * (k + 0.5)) / spokes;
      const sun = { right: sine * Math.cos(turn), up: sine * Math.sin(turn), out };
      const altitude = Math.asin(Math.min(1, Math.max(-1, c * out + s * sun.up)));
      const ahead = s * out - c * sun.up;
      const where = altitude > 0 ? 'sky' : 'ground';
      whole[where]++;
      const skyline = horizonAltitudeDeg(
        horizon,
        azimuthDeg + Math.atan2(sun.right, ahead) * degPerRad,
      );
      if (where === 'ground' || altitude * degPerRad > skyline) seen[where] += litAt(sun);
    }
  }
  return {
    sky: whole.sky > 0 ? seen.sky / whole.sky : 1,
    horizon: bandShading(litAt, s, c, azimuthDeg, horizon),
    ground: whole.ground > 0 ? seen.ground / whole.ground : 1,
  };
}

/** Share of a band at altitude 0 that is left, weighted by the cosine of incidence. */
function bandShading(
  litAt: (sun: SunFromWindow) => number,
  s: number,
  c: number,
  azimuthDeg: number,
  horizon: Horizon,
): number {
  let seen = 0;
  let whole = 0;
  for (let k = 0; k < bandDirections; k++) {
    const turn = (Math.PI * (k + 0.5)) / bandDirections - Math.PI / 2;
    const ahead = Math.cos(turn);
    const out = s * ahead;
    if (out <= 0) continue;
    whole += out;
    if (horizonAltitudeDeg(horizon, azimuthDeg + turn * degPerRad) > 0) continue;
    seen += out * litAt({ right: Math.sin(turn), up: -c * ahead, out });
  }
  return whole > 0 ? seen / whole : 1;
}
