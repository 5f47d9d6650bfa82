// Chains: paths of nodes that hang on exactly two constant links and on nothing else, such as the
// layers of a wall between its two surfaces. They are eliminated onto their end nodes, so that a step
// costs one pass over them, whatever happens at the ends. Longer ones are cut, so that their modes
// (chain-modes.ts) stay quick to find.

import type { Network } from './problem.ts';

/**
 * All chains in flat arrays. Chain c has the interior nodes `start[c]` to `start[c + 1] − 1`, in order
 * from its end A to its end B.
 */
export interface Chains {
  readonly count: number;
  readonly start: Int32Array;
  /** Node numbers of the ends. */
  readonly endA: Int32Array;
  readonly endB: Int32Array;
  /** Node number of each interior node. */
  readonly node: Int32Array;
  /** Conductance towards A and towards B of each interior node [W/K]. */
  readonly towardsA: Float64Array;
  readonly towardsB: Float64Array;
}

/** Most nodes inside one chain. */
const longest = 64;

interface Ends {
  readonly links: Int32Array;
  readonly others: Int32Array;
}

/** Nodes that hang on two constant links of positive conductance and nothing else; the links are given too. */
function candidates(network: Network): { free: Uint8Array; ends: Ends; g: Float64Array } {
  const n = network.nodeNames.length;
  const degree = new Int32Array(n);
  const links = new Int32Array(2 * n);
  const others = new Int32Array(2 * n);
  const free = new Uint8Array(n).fill(1);
  const conductances: number[] = [];
  const put = (node: number, other: number) => {
    if (degree[node] < 2) {
      links[2 * node + degree[node]] = conductances.length;
      others[2 * node + degree[node]] = other;
    }
    degree[node]++;
  };
  for (const group of network.links) {
    for (let k = 0; k < group.from.length; k++) {
      const a = group.from[k];
      const b = group.to[k];
      if (group.law === 'constant') {
        if (group.conductanceWPerK[k] === 0) continue;
        put(a, b);
        put(b, a);
        conductances.push(group.conductanceWPerK[k]);
      } else {
        free[a] = 0;
        free[b] = 0;
      }
    }
  }
  const hold = (nodes: Int32Array) => {
    for (const node of nodes) free[node] = 0;
  };
  for (const enclosure of network.enclosures) hold(enclosure.nodes);
  hold(network.directed.from);
  hold(network.directed.to);
  hold(network.sources.node);
  for (const plant of network.plants) {
    hold(plant.sensorNodes);
    hold(plant.deliveryNodes);
  }
  for (let i = 0; i < n; i++) {
    if (degree[i] !== 2 || network.boundarySeries[i] >= 0) free[i] = 0;
  }
  return { free, ends: { links, others }, g: Float64Array.from(conductances) };
}

/** Finds the chains of a network, in the order of their first node. */
export function findChains(network: Network): Chains {
  const { free, ends, g } = candidates(network);
  const start = [0];
  const endA: number[] = [];
  const endB: number[] = [];
  const node: number[] = [];
  const towardsA: number[] = [];
  const towardsB: number[] = [];
  const done = new Uint8Array(free.length);

  /** From free node i out through its link of `side` to the first node that is not free, or back to i. */
  const walk = (i: number, side: 0 | 1) => {
    const nodes: number[] = [];
    const links: number[] = [];
    let at = 2 * i + side;
    for (;;) {
      const link = ends.links[at];
      const next = ends.others[at];
      links.push(link);
      if (free[next] === 0 || next === i) return { nodes, links, end: next };
      nodes.push(next);
      at = ends.links[2 * next] === link ? 2 * next + 1 : 2 * next;
    }
  };
  const add = (a: number, nodes: readonly number[], links: readonly number[], b: number): void => {
    if (nodes.length > longest) {
      const cut = nodes[longest]; // outside any chain, it is the end of what lies on either side
      done[cut] = 1;
      add(a, nodes.slice(0, longest), links.slice(0, longest + 1), cut);
      const rest = nodes.slice(longest + 1);
      if (rest.length > 0) add(cut, rest, links.slice(longest + 1), b);
      return;
    }
    nodes.forEach((v, k) => {
      done[v] = 1;
      node.push(v);
      towardsA.push(g[links[k]]);
      towardsB.push(g[links[k + 1]]);
    });
    endA.push(a);
    endB.push(b);
    start.push(node.length);
  };
  for (let i = 0; i < free.length; i++) {
    if (free[i] === 0 || done[i] === 1) continue;
    const left = walk(i, 0);
    if (left.end === i) {
      free[i] = 0; // a ring without end is opened at its first node
      if (left.nodes.length > 0) add(i, left.nodes, left.links, i);
      continue;
    }
    const right = walk(i, 1);
    const nodes = [...left.nodes.reverse(), i, ...right.nodes];
    add(left.end, nodes, [...left.links.reverse(), ...right.links], right.end);
  }
  return {
    count: endA.length,
    start: Int32Array.from(start),
    endA: Int32Array.from(endA),
    endB: Int32Array.from(endB),
    node: Int32Array.from(node),
    towardsA: Float64Array.from(towardsA),
    towardsB: Float64Array.from(towardsB),
  };
}
