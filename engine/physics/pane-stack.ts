// Panes on one side of a blind, seen as one body: their shares for light from either side.
import type { GlazingAngles } from './glazing-angles.ts';
import { beamShares, diffuseShares, type GlazingShares } from './glazing-stack.ts';
import type { PaneOptics } from './pane-optics.ts';

export interface PaneStack {
  readonly paneCount: number;
  /** At k degrees, k from 0 to 89; absorptances outermost pane first, whichever way the light comes. */
  readonly beam: readonly GlazingShares[];
  readonly beamFromBehind: readonly GlazingShares[];
  readonly even: { readonly front: GlazingShares; readonly back: GlazingShares };
}

const nothing: GlazingShares = {
  transmittance: 1,
  reflectance: 0,
  absorptance: new Float64Array(0),
};
const degrees = Array.from({ length: 90 }, (_, k) => Math.cos((k * Math.PI) / 180));

/** Panes, outermost first; none gives a stack that lets all light by. */
export function paneStack(panes: readonly PaneOptics[]): PaneStack {
  if (panes.length === 0)
    return {
      paneCount: 0,
      beam: degrees.map(() => nothing),
      beamFromBehind: degrees.map(() => nothing),
      even: { front: nothing, back: nothing },
    };
  return {
    paneCount: panes.length,
    beam: degrees.map((cosine) => beamShares(panes, cosine)),
    beamFromBehind: degrees.map((cosine) => beamShares(panes, cosine, 'inside')),
    even: { front: diffuseShares(panes), back: diffuseShares(panes, 'inside') },
  };
}

/** A glazing known by its tables only; both sides are taken to be alike. */
export function stackOfAngles(angles: GlazingAngles): PaneStack {
  const { paneCount } = angles;
  const beam = degrees.map((_, k) => ({
    transmittance: angles.transmittance[k],
    reflectance: angles.reflectance[k],
    absorptance: angles.absorptance.slice(k * paneCount, (k + 1) * paneCount),
  }));
  return {
    paneCount,
    beam,
    beamFromBehind: beam,
    even: { front: angles.diffuse, back: angles.diffuseFromInside },
  };
}
