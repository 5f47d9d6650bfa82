// The network behind a project, as data: every node and link with where it comes from.

import type { Assembly, Problem, Provenance } from '../../engine/index.ts';
import { linkSizeWPerK, yearMeans } from './link-size.ts';

export interface NodeEntry extends Provenance {
  readonly index: number;
  readonly capacityJPerK: number;
  readonly isBoundary: boolean;
  /** Capacity over the sum of the conductances at it; the network's own modes are slower and faster. */
  readonly ownTimeConstantH: number | null;
}

export interface LinkEntry extends Provenance {
  readonly law: string;
  readonly from: string;
  readonly to: string;
  readonly sizeWPerK: number;
}

export interface NetworkDocument {
  readonly project: string;
  readonly nodes: readonly NodeEntry[];
  readonly links: readonly LinkEntry[];
  /** Air that carries heat one way: the node at its end feels it. */
  readonly directed: readonly LinkEntry[];
  readonly enclosures: readonly { readonly name: string; readonly nodes: readonly string[] }[];
  readonly sources: readonly { readonly name: string; readonly node: string }[];
  readonly plants: readonly { readonly name: string; readonly kind: string }[];
  readonly timeConstants: TimeConstants;
}

/** Of the whole network, slowest first; null where a part hangs on no boundary. */
export interface TimeConstants {
  readonly basis: string;
  readonly constantsH: readonly (number | null)[];
}

/** Where a nodal model's parts come from: its file. */
const asGiven = (name: string): Provenance => ({
  name,
  what: name,
  method: 'as given in the model',
  inputs: {},
});

/** @param provenance of an assembled building; null for a nodal model */
export function networkDocument(
  name: string,
  problem: Problem,
  provenance: Assembly['provenance'] | null,
  timeConstants: TimeConstants,
): NetworkDocument {
  const { network } = problem;
  const { nodeNames } = network;
  const mean = yearMeans(problem);
  const sumWPerK = new Float64Array(nodeNames.length);
  const links = network.links.flatMap((group, g) =>
    Array.from(group.from, (from, k): LinkEntry => {
      const to = group.to[k];
      const sizeWPerK = linkSizeWPerK(group, k, mean);
      sumWPerK[from] += sizeWPerK;
      sumWPerK[to] += sizeWPerK;
      const ends = { from: nodeNames[from], to: nodeNames[to] };
      const about = provenance?.links[g][k] ?? asGiven(`${ends.from} to ${ends.to}`);
      return { ...about, law: group.law, ...ends, sizeWPerK };
    }),
  );
  const { directed } = network;
  const flows = Array.from(directed.from, (from, k): LinkEntry => {
    const to = directed.to[k];
    const scale = directed.series[k] < 0 ? 1 : mean(directed.series[k]);
    const sizeWPerK = directed.rateWPerK[k] * scale;
    sumWPerK[to] += sizeWPerK;
    return {
      ...(provenance?.directed[k] ?? asGiven(`${nodeNames[from]} to ${nodeNames[to]}`)),
      law: 'directed',
      from: nodeNames[from],
      to: nodeNames[to],
      sizeWPerK,
    };
  });
  const nodes = nodeNames.map((node, index): NodeEntry => {
    const isBoundary = network.boundarySeries[index] >= 0;
    const capacityJPerK = isBoundary ? 0 : network.capacityJPerK[index];
    const hasTime = capacityJPerK > 0 && sumWPerK[index] > 0;
    return {
      ...(provenance?.nodes[index] ?? asGiven(node)),
      index,
      capacityJPerK,
      isBoundary,
      ownTimeConstantH: hasTime ? capacityJPerK / sumWPerK[index] / 3600 : null,
    };
  });
  return {
    project: name,
    nodes,
    links,
    directed: flows,
    enclosures: network.enclosures.map((one) => ({
      name: one.name,
      nodes: Array.from(one.nodes, (node) => nodeNames[node]),
    })),
    sources: Array.from(network.sources.node, (node, k) => ({
      name: provenance?.sources[k] ?? 'source',
      node: nodeNames[node],
    })),
    plants: network.plants.map(({ name, kind }) => ({ name, kind })),
    timeConstants,
  };
}
