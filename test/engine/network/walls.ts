// Layered walls as chains of nodes, for tests: finite volumes with a node on every slice boundary.

/** A massive layer, or an air layer that only resists. */
export type Layer =
  | { readonly d: number; readonly lambda: number; readonly rho: number; readonly c: number }
  | { readonly R: number };

/** Growing lists of a hand-written network. */
export interface Draft {
  readonly capacities: number[];
  readonly links: number[][];
}

/** Adds a node; gives its number. */
export function addNode(draft: Draft, capacityJPerK: number): number {
  draft.capacities.push(capacityJPerK);
  return draft.capacities.length - 1;
}

/** Adds a wall of `areaM2`, `slices` slices a layer; gives its nodes from first face to last. */
export function addWall(
  draft: Draft,
  layers: readonly Layer[],
  areaM2: number,
  slices: number,
): number[] {
  const nodes = [addNode(draft, 0)];
  for (const layer of layers) {
    if ('R' in layer) {
      const last = nodes[nodes.length - 1];
      nodes.push(addNode(draft, 0));
      draft.links.push([last, nodes[nodes.length - 1], areaM2 / layer.R]);
      continue;
    }
    const { d, lambda, rho, c } = layer;
    const dx = d / slices;
    for (let s = 0; s < slices; s++) {
      const half = (rho * c * areaM2 * dx) / 2;
      const last = nodes[nodes.length - 1];
      draft.capacities[last] += half;
      nodes.push(addNode(draft, half));
      draft.links.push([last, nodes[nodes.length - 1], (lambda * areaM2) / dx]);
    }
  }
  return nodes;
}
