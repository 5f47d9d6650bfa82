// A glazing's optics tabled by angle, so that the hourly drivers look values up and compute nothing.
import { beamShares, diffuseShares, type GlazingShares } from './glazing-stack.ts';
import type { PaneOptics } from './pane-optics.ts';

/** Optics of a glazing for light from outdoors by angle, and for diffuse light both ways. */
export interface GlazingAngles {
  readonly paneCount: number;
  /** At k degrees of incidence, k from 0 to 90. */
  readonly transmittance: Float64Array;
  readonly reflectance: Float64Array;
  /** Pane p at k degrees is `absorptance[k * paneCount + p]`; outermost pane first. */
  readonly absorptance: Float64Array;
  /** Light evenly from the hemisphere outdoors. */
  readonly diffuse: GlazingShares;
  /** Light evenly from the room: what passes is lost. */
  readonly diffuseFromInside: GlazingShares;
}

const radPerDeg = Math.PI / 180;

/** Tables a stack of panes, outermost first. Straight between degrees it is true to 4e-4 up to 80°. */
export function glazingAngles(panes: readonly PaneOptics[]): GlazingAngles {
  const paneCount = panes.length;
  const transmittance = new Float64Array(91);
  const reflectance = new Float64Array(91).fill(1, 90);
  const absorptance = new Float64Array(91 * paneCount);
  for (let k = 0; k < 90; k++) {
    const shares = beamShares(panes, Math.cos(k * radPerDeg));
    transmittance[k] = shares.transmittance;
    reflectance[k] = shares.reflectance;
    absorptance.set(shares.absorptance, k * paneCount);
  }
  return {
    paneCount,
    transmittance,
    reflectance,
    absorptance,
    diffuse: diffuseShares(panes),
    diffuseFromInside: diffuseShares(panes, 'inside'),
  };
}

/** Value at a fractional degree of a table with `width` columns. */
function between(table: Float64Array, degrees: number, width: number, column: number): number {
  const k = Math.min(89, Math.floor(degrees));
  const low = table[k * width + column];
  return low + (degrees - k) * (table[(k + 1) * width + column] - low);
}

/** Angle of incidence in degrees, 0 to 90, from its cosine; 90 when the sun is behind. */
function degreesOf(cosine: number): number {
  return cosine <= 0 ? 90 : Math.acos(Math.min(1, cosine)) / radPerDeg;
}

/** Transmittance for a beam; 0 when the sun is behind the glazing. */
export function beamTransmittance(glazing: GlazingAngles, cosine: number): number {
  return between(glazing.transmittance, degreesOf(cosine), 1, 0);
}

/** Share of a beam that one pane (outermost 0) absorbs; 0 when the sun is behind the glazing. */
export function beamAbsorptance(glazing: GlazingAngles, pane: number, cosine: number): number {
  return between(glazing.absorptance, degreesOf(cosine), glazing.paneCount, pane);
}
