// Vapour through a layered element in one steady state: the tangent construction of ISO 13788 (Glaser).
//
// Over the diffusion-equivalent thickness the vapour pressure without condensation is a straight line.
// Where it would pass the saturation pressure, water condenses, and the true line is the string pulled
// tight under the saturation points: the lower convex hull. Planes that hold water from before are
// pinned at saturation, and may give water off. Liquid transport, air flow, solar gain and the layers'
// own moisture are not in it: the result is a comparison of designs, not a moisture forecast.
import { hygricSaturationPa } from './surface-humidity.ts';

/** Vapour permeability of still air. Source: ISO 13788:2012, clause 4.2 [kg/(m·s·Pa)]. */
export const airVapourPermeability = 2e-10;

/** A layer as ISO 13788 sees it. */
export interface VapourLayer {
  readonly resistanceM2KPerW: number;
  /** Diffusion-equivalent air layer thickness, s_d = μ·d [m]. */
  readonly sdM: number;
}

/** Layers without vapour resistance get this much, so that the planes on both sides stay apart [m]. */
const leastSdM = 1e-6;

/** Sum of s_d from the inside surface to every interface; one more value than layers [m]. */
export function cumulativeSdM(layers: readonly VapourLayer[]): number[] {
  const sums = [0];
  for (const layer of layers) sums.push(sums[sums.length - 1] + Math.max(layer.sdM, leastSdM));
  return sums;
}

/**
 * Splits layers of more than 0.25 m²·K/W into equal parts, as the standard asks.
 *
 * Source: ISO 13788:2012, clause 6.4.2.
 */
export function subdividedVapourLayers(layers: readonly VapourLayer[]): VapourLayer[] {
  return layers.flatMap((layer) => {
    const parts = Math.max(1, Math.ceil(layer.resistanceM2KPerW / 0.25 - 1e-9));
    const part = { resistanceM2KPerW: layer.resistanceM2KPerW / parts, sdM: layer.sdM / parts };
    return Array.from({ length: parts }, () => part);
  });
}

export interface VapourState {
  /** Vapour pressure at every interface, inside surface first [Pa]. */
  readonly vapourPa: Float64Array;
  /** Water gained at every interface; negative dries [kg/(m²·s)]. */
  readonly rateKgPerM2S: Float64Array;
}

/**
 * Vapour pressures and condensing planes of one steady state.
 *
 * @param sdM cumulative s_d at every interface, as `cumulativeSdM` gives it [m]
 * @param saturationPa saturation pressure at every interface [Pa]
 * @param wet planes that hold water already; the two surfaces are never wet
 * @returns pressures never above saturation; the ends are cut to it where the air is damper
 *
 * Source: ISO 13788:2012, clauses 6.4.3 to 6.4.5.
 */
export function vapourState(
  sdM: readonly number[],
  saturationPa: readonly number[],
  insideVapourPa: number,
  outsideVapourPa: number,
  wet: readonly boolean[],
): VapourState {
  const last = sdM.length - 1;
  const held = saturationPa.slice();
  held[0] = Math.min(insideVapourPa, held[0]);
  held[last] = Math.min(outsideVapourPa, held[last]);

  // Lower hull from left to right; a wet plane is an anchor that the hull may not cut off.
  const hull: number[] = [0];
  let anchor = 0; // place in `hull` of the last pinned point
  for (let k = 1; k <= last; k++) {
    while (hull.length - 1 > anchor) {
      const a = hull[hull.length - 2];
      const b = hull[hull.length - 1];
      const rise =
        (held[b] - held[a]) * (sdM[k] - sdM[a]) - (held[k] - held[a]) * (sdM[b] - sdM[a]);
      if (rise < 0) break; // b lies under the line from a to k: the string touches it
      hull.pop();
    }
    hull.push(k);
    if (wet[k]) anchor = hull.length - 1;
  }

  const vapourPa = new Float64Array(last + 1);
  for (let h = 0; h < hull.length - 1; h++) {
    const a = hull[h];
    const b = hull[h + 1];
    const slope = (held[b] - held[a]) / (sdM[b] - sdM[a]);
    for (let k = a; k <= b; k++) vapourPa[k] = held[a] + slope * (sdM[k] - sdM[a]);
  }
  const rateKgPerM2S = new Float64Array(last + 1);
  for (let h = 1; h < hull.length - 1; h++) {
    const [a, b, c] = [hull[h - 1], hull[h], hull[h + 1]];
    const arrives = (held[a] - held[b]) / (sdM[b] - sdM[a]);
    const leaves = (held[b] - held[c]) / (sdM[c] - sdM[b]);
    rateKgPerM2S[b] = airVapourPermeability * (arrives - leaves);
  }
  return { vapourPa, rateKgPerM2S };
}

/** Saturation pressures of a list of temperatures [Pa]. */
export function saturationsPa(temperaturesC: readonly number[]): number[] {
  return temperaturesC.map(hygricSaturationPa);
}
