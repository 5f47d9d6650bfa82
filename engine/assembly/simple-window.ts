// A window known by U and g only: two faces with the equivalent layer between.
import type { Glazing } from '../building/index.ts';
import { simpleGlazing } from '../physics/index.ts';
import type { NetworkBuilder, Provenance } from './network-builder.ts';
import type { Glass } from './window-panes.ts';

const glassEmissivity = 0.84; // uncoated glass; EN 673 (corrected emissivity 0.837)

/** Adds the two face nodes and the layer between them. */
export function addSimpleWindow(
  glazing: Extract<Glazing, { kind: 'simple' }>,
  areaM2: number,
  place: Pick<Provenance, 'name' | 'room' | 'surface'>,
  builder: NetworkBuilder,
): Glass {
  const layer = simpleGlazing(glazing.uValueWPerM2K, glazing.gValue);
  const about = (what: string): Provenance => ({
    ...place,
    what,
    method: 'equivalent layer from U and g under the conditions of EN 673 and EN 410',
    inputs: { areaM2, uValueWPerM2K: glazing.uValueWPerM2K, gValue: glazing.gValue },
  });
  const face = (side: string) =>
    builder.node({ ...about(`${side} face of the glazing`), name: `${place.name}/${side}` }, 0);
  const nodes = [face('outer'), face('inner')] as const;
  const through = builder.constantLink(
    nodes[0],
    nodes[1],
    areaM2 / layer.resistanceM2KPerW,
    about('conduction through the glazing'),
  );
  return {
    paneNodes: [nodes],
    blindNode: -1,
    through,
    outerEmissivity: glassEmissivity,
    innerEmissivity: glassEmissivity,
  };
}
