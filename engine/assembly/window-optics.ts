// A window's glazing in the terms of the physics: optics bare and with a covering drawn.
import type { Covering, Glazing, Pane } from '../building/index.ts';
import {
  type BlindPosition,
  type GlazingAngles,
  glassPane,
  glazingAngles,
  type LayeredAngles,
  layeredAngles,
  type PaneOptics,
  paneStack,
  type ScatteringLayer,
  simpleGlazing,
  stackOfAngles,
} from '../physics/index.ts';

/** Optics of a pane as given: by its coating's values, or as clear glass of its transmittance. */
export function paneOptics(pane: Pane): PaneOptics {
  const { solarTransmittance, frontSolarReflectance, backSolarReflectance, refractiveIndex } = pane;
  if (frontSolarReflectance === undefined && backSolarReflectance === undefined)
    return glassPane(solarTransmittance, refractiveIndex);
  return {
    kind: 'coated',
    transmittance: solarTransmittance,
    frontReflectance: frontSolarReflectance ?? backSolarReflectance ?? 0,
    backReflectance: backSolarReflectance ?? frontSolarReflectance ?? 0,
  };
}

/** Optics of the bare glazing, layer by layer. */
export function bareLight(glazing: Glazing): LayeredAngles {
  const angles = anglesOf(glazing);
  return { ...angles, layerCount: angles.paneCount };
}

function anglesOf(glazing: Glazing): GlazingAngles {
  return glazing.kind === 'panes'
    ? glazingAngles(glazing.panes.map(paneOptics))
    : simpleGlazing(glazing.uValueWPerM2K, glazing.gValue).angles;
}

/** The covering as a layer that scatters; a shutter lets nothing by. */
export function scatteringLayer(covering: Covering): ScatteringLayer {
  if (covering.kind === 'shutter')
    return {
      transmittance: 0,
      openness: 0,
      frontReflectance: covering.solarReflectance,
      backReflectance: covering.solarReflectance,
    };
  return {
    transmittance: covering.solarTransmittance,
    openness: covering.openness,
    frontReflectance: covering.solarReflectance,
    backReflectance: covering.backSolarReflectance ?? covering.solarReflectance,
  };
}

/** Place of the covering in the list of layers, outermost first. */
export function coveringLayer(glazing: Glazing, position: BlindPosition, gap: number): number {
  if (position === 'outside') return 0;
  if (position === 'between') return gap + 1;
  return glazing.kind === 'panes' ? glazing.panes.length : 1;
}

/** Optics with the covering drawn; its layer is at `coveringLayer`. */
export function coveredLight(
  glazing: Glazing,
  covering: Covering,
  position: BlindPosition,
  gap: number,
): LayeredAngles {
  const layer = scatteringLayer(covering);
  const none = paneStack([]);
  if (position === 'between' && glazing.kind === 'panes') {
    const panes = glazing.panes.map(paneOptics);
    return layeredAngles(
      paneStack(panes.slice(0, gap + 1)),
      layer,
      paneStack(panes.slice(gap + 1)),
    );
  }
  const whole =
    glazing.kind === 'panes'
      ? paneStack(glazing.panes.map(paneOptics))
      : stackOfAngles(anglesOf(glazing));
  return position === 'outside'
    ? layeredAngles(none, layer, whole)
    : layeredAngles(whole, layer, none);
}
