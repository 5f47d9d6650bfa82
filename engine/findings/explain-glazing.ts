// What a glazing is worth under standard conditions: U by EN 673, light and g by EN 410, and by angle.
import { bareLight } from '../assembly/index.ts';
import type { Glazing, PaneGlazing } from '../building/index.ts';
import {
  absorbedAt,
  type GlazingTransmittance,
  glazingOutsideWPerM2K,
  glazingTransmittance,
  type LayeredAngles,
  plainGlassEmissivity,
  secondaryHeatFactor,
  simpleGlazing,
} from '../physics/index.ts';

export interface GlazingAt {
  readonly incidenceDeg: number;
  readonly transmittance: number;
  readonly reflectance: number;
  readonly gValue: number;
}

export interface GlazingExplained {
  readonly id: string;
  readonly name: string;
  readonly kind: Glazing['kind'];
  /** EN 673, upright, in its middle; as given for a simple glazing. */
  readonly uValueWPerM2K: number;
  /** EN 410, normal incidence; as given for a simple glazing. */
  readonly gValue: number;
  readonly transmittance: number;
  readonly reflectance: number;
  /** Of each pane, outermost first. */
  readonly absorptances: readonly number[];
  /** Light evenly from the hemisphere. */
  readonly diffuseTransmittance: number;
  readonly diffuseGValue: number;
  readonly angles: readonly GlazingAt[];
}

const shownDeg = [0, 30, 45, 60, 75];

/** EN 410:2011, 5.4.6: h_e 23, h_i = 3.6 + 4.4·ε/0.837. */
const sunOutsideWPerM2K = 23;
const sunInsideWPerM2K = (emissivity: number) => 3.6 + (4.4 * emissivity) / plainGlassEmissivity;

/** EN 673:2011, clause 9: h_i = 3.6 + 4.1·ε/0.837. */
const heatInsideWPerM2K = (emissivity: number) => 3.6 + (4.1 * emissivity) / plainGlassEmissivity;

/** Heat through panes and gaps under the conditions of EN 673; emissivities count as corrected ones. */
export function standardTransmittance(glazing: PaneGlazing): GlazingTransmittance {
  const { panes, gaps } = glazing;
  return glazingTransmittance({
    panesM2KPerW: panes.map((pane) => pane.thicknessM / pane.conductivityWPerMK),
    gaps: gaps.map((gap, g) => ({
      thicknessM: gap.thicknessM,
      emissivity1: panes[g].backEmissivity,
      emissivity2: panes[g + 1].frontEmissivity,
      filling: [{ gas: gap.gas, share: 1 }],
    })),
    tiltDeg: 90,
    outsideWPerM2K: glazingOutsideWPerM2K,
    insideWPerM2K: heatInsideWPerM2K(panes[panes.length - 1].backEmissivity),
  });
}

/** Explains each glazing once, however many windows hold it. */
export function explainedOnce(): (glazing: Glazing) => GlazingExplained {
  const known = new Map<Glazing, GlazingExplained>();
  return (glazing) => {
    const found = known.get(glazing) ?? explainGlazing(glazing);
    known.set(glazing, found);
    return found;
  };
}

/** U-value of either kind of glazing. */
function glazingUValueWPerM2K(glazing: Glazing): number {
  return glazing.kind === 'simple'
    ? glazing.uValueWPerM2K
    : standardTransmittance(glazing).uValueWPerM2K;
}

export function explainGlazing(glazing: Glazing): GlazingExplained {
  const light = bareLight(glazing);
  const inward = inwardHeat(glazing);
  const at = (degrees: number): GlazingAt => {
    const absorptance = Array.from({ length: light.layerCount }, (_, l) =>
      absorbedAt(light, l, degrees),
    );
    const transmittance = light.transmittance[degrees];
    return {
      incidenceDeg: degrees,
      transmittance,
      reflectance: 1 - transmittance - absorptance.reduce((sum, a) => sum + a, 0),
      gValue: transmittance + inward(absorptance),
    };
  };
  const [normal] = shownDeg.map(at);
  return {
    id: glazing.id,
    name: glazing.name,
    kind: glazing.kind,
    uValueWPerM2K: glazingUValueWPerM2K(glazing),
    gValue: normal.gValue,
    transmittance: normal.transmittance,
    reflectance: normal.reflectance,
    absorptances: absorbed(light, 0),
    diffuseTransmittance: light.diffuse.transmittance,
    diffuseGValue: light.diffuse.transmittance + inward(light.diffuse.absorptance),
    angles: shownDeg.map(at),
  };
}

function absorbed(light: LayeredAngles, degrees: number): number[] {
  return Array.from({ length: light.layerCount }, (_, l) => absorbedAt(light, l, degrees));
}

/** Share of what each pane absorbs that reaches the room. */
function inwardHeat(glazing: Glazing): (absorptance: ArrayLike<number>) => number {
  if (glazing.kind === 'simple') {
    // The equivalent layer absorbs in its middle, under the films of its own definition.
    const { gValue, uValueWPerM2K } = glazing;
    const { transmittance, absorptance } = simpleGlazing(uValueWPerM2K, gValue);
    const share = absorptance > 0 ? (gValue - transmittance) / absorptance : 0;
    return (taken) => taken[0] * share;
  }
  const { convectiveWPerM2K, radiativeWPerM2K } = standardTransmittance(glazing);
  const gaps = convectiveWPerM2K.map((h, g) => h + radiativeWPerM2K[g]);
  const inside = sunInsideWPerM2K(glazing.panes[glazing.panes.length - 1].backEmissivity);
  return (taken) => secondaryHeatFactor(taken, gaps, sunOutsideWPerM2K, inside);
}
