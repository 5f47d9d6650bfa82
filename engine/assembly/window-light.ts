// Light through a window step by step: what passes as a beam and scattered, and what its layers keep.
import { absorbedAt, incidenceDeg, passedAt, scatteredAt } from '../physics/index.ts';
import type { NetworkBuilder } from './network-builder.ts';
import type { WindowParts, WindowState } from './window.ts';

/** Light that one window lets in, in each step [W]. */
export interface Transmitted {
  readonly beamW: Float64Array;
  /** From sky and horizon, and from the ground: scattered outdoors, passed by bare glass. */
  readonly skyW: Float64Array;
  readonly groundW: Float64Array;
  /** Scattered by a blind; null without one. */
  readonly scatteredW: Float64Array | null;
}

/** Angle of incidence in each step with a beam [°]. */
export function incidences(window: WindowParts): Float64Array {
  const { beamWPerM2, cosIncidence } = window.sun;
  return beamWPerM2.map((beam, k) => (beam > 0 ? incidenceDeg(cosIncidence[k]) : 90));
}

export function transmitted(window: WindowParts, degrees: Float64Array): Transmitted {
  const { states, sun, glassAreaM2: area } = window;
  const count = degrees.length;
  const beamW = new Float64Array(count);
  const skyW = new Float64Array(count);
  const groundW = new Float64Array(count);
  const scatteredW = states.some(({ light }) => light.scattered) ? new Float64Array(count) : null;
  for (const { weight, light } of states) {
    const ofDiffuse = light.diffuse.transmittance;
    for (let k = 0; k < count; k++) {
      const share = weight ? weight[k] : 1;
      if (share === 0) continue;
      const beam = sun.beamWPerM2[k];
      const diffuse = sun.diffuseWPerM2[k];
      const lit = area * share;
      if (beam > 0) beamW[k] += lit * beam * passedAt(light, degrees[k]);
      if (light.scattered && scatteredW) {
        if (beam > 0) scatteredW[k] += lit * beam * scatteredAt(light, degrees[k]);
        scatteredW[k] += lit * ofDiffuse * diffuse;
        continue;
      }
      const ground = sun.groundWPerM2[k];
      skyW[k] += lit * ofDiffuse * (diffuse - ground);
      groundW[k] += lit * ofDiffuse * ground;
    }
  }
  return { beamW, skyW, groundW, scatteredW };
}

/** Nodes of each layer of a window that takes up light, in a fixed order; states may share layers. */
function takingLayers(window: WindowParts): Map<string, readonly number[]> {
  const layers = new Map<string, readonly number[]>();
  for (const { layerNodes } of window.states)
    for (const nodes of layerNodes) layers.set(nodes.join(' '), nodes);
  return layers;
}

/** What panes and coverings keep of the light from outside, one series a layer [W]. */
export function layersSun(window: WindowParts, degrees: Float64Array): Float64Array[] {
  const { sun, glassAreaM2: area } = window;
  const taken = new Map(
    [...takingLayers(window).keys()].map((key) => [key, new Float64Array(degrees.length)]),
  );
  for (const { weight, light, layerNodes } of window.states)
    layerNodes.forEach((nodes, l) => {
      const values = taken.get(nodes.join(' '));
      if (!values) throw new Error('a layer is among the layers');
      const ofDiffuse = light.diffuse.absorptance[l];
      for (let k = 0; k < degrees.length; k++) {
        const share = weight ? weight[k] : 1;
        if (share === 0) continue;
        const beam = sun.beamWPerM2[k];
        const direct = beam > 0 ? beam * absorbedAt(light, l, degrees[k]) : 0;
        values[k] += area * share * (direct + ofDiffuse * sun.diffuseWPerM2[k]);
      }
    });
  return [...taken.values()];
}

/** Puts the light that layers keep at their nodes, in equal parts. */
export function addLayersSun(
  window: WindowParts,
  valuesW: readonly Float64Array[],
  builder: NetworkBuilder,
): void {
  [...takingLayers(window).values()].forEach((nodes, l) => {
    const name = `${window.name} sun in layer ${l + 1}`;
    const series = builder.series(name, 'step', valuesW[l]);
    for (const node of nodes) builder.source(node, 1 / nodes.length, series, name);
  });
}

/** What the layers of a window keep of light from the room; `lightW` meets the window in each step. */
export function addLightFromInside(
  window: WindowParts,
  lightW: Float64Array,
  builder: NetworkBuilder,
): void {
  const name = `${window.name} light from inside`;
  const bare = window.states.length === 1 ? builder.series(name, 'step', lightW) : -1;
  for (const { weight, light, layerNodes } of window.states) {
    const series =
      weight === null
        ? bare
        : builder.series(
            name,
            'step',
            lightW.map((w, k) => w * weight[k]),
          );
    layerNodes.forEach((nodes, l) => {
      const share = light.diffuseFromInside.absorptance[l];
      if (share === 0) return;
      for (const node of nodes) builder.source(node, share / nodes.length, series, name);
    });
  }
}

/** Share of light from inside that the window throws back, in one step. */
export function thrownBack(states: readonly WindowState[], step: number): number {
  let sum = 0;
  for (const { weight, light } of states)
    sum += (weight ? weight[step] : 1) * light.diffuseFromInside.reflectance;
  return sum;
}
