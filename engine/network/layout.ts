// From a network to slots: which nodes are unknowns of the reduced system (in elimination order, plant
// units among them), which are boundaries, which lie inside chains. One state vector holds all three:
//   rows 0 … rows − 1 | boundaries | chain interiors.

import { type Chains, findChains } from './chains.ts';
import { eliminationOrder, type Late, type Order } from './ordering.ts';
import { plantUnits, type Unit } from './plant-units.ts';
import type { Network } from './problem.ts';

export interface Layout {
  readonly network: Network;
  readonly units: readonly Unit[];
  readonly chains: Chains;
  /** 1 for a chain whose ends are coupled by the iteration and not by the matrix. */
  readonly faint: Uint8Array;
  readonly order: Order;
  readonly rows: number;
  /** First slot of the boundaries (= rows) and of the chain interiors. */
  readonly firstFixed: number;
  readonly firstChain: number;
  readonly slotCount: number;
  readonly slotOfNode: Int32Array;
  /** Node of each slot; −1 for a unit. */
  readonly nodeOfSlot: Int32Array;
  /** Series of each boundary slot, counted from `firstFixed`. */
  readonly fixedSeries: Int32Array;
  readonly rowOfUnit: Int32Array;
  readonly chainSlotA: Int32Array;
  readonly chainSlotB: Int32Array;
}

/** The couplings between unknowns (nodes outside chains first, then units), and how they change. */
function couplings(
  network: Network,
  chains: Chains,
  units: readonly Unit[],
  vertex: Int32Array,
  faint: Uint8Array,
) {
  const nodes = vertex.reduce((n, v) => (v >= 0 ? n + 1 : n), 0);
  const count = nodes + units.length;
  const neighbours = Array.from({ length: count }, () => new Set<number>());
  const level = new Uint8Array(count);
  const late = new Map<number, Late>();
  const couple = (a: number, b: number, atLevel: number) => {
    if (a >= 0) level[a] = Math.max(level[a], atLevel);
    if (b >= 0) level[b] = Math.max(level[b], atLevel);
    if (a < 0 || b < 0 || a === b) return;
    neighbours[a].add(b);
    neighbours[b].add(a);
  };
  for (const group of network.links) {
    const atLevel = group.law === 'constant' ? 0 : group.law === 'scaled' ? 1 : 2;
    for (let k = 0; k < group.from.length; k++) {
      couple(vertex[group.from[k]], vertex[group.to[k]], atLevel);
    }
  }
  for (let c = 0; c < chains.count; c++) {
    const [a, b] = [vertex[chains.endA[c]], vertex[chains.endB[c]]];
    if (faint[c] === 0) couple(a, b, 0);
  }
  for (const { nodes: members } of network.enclosures) {
    for (const a of members) for (const b of members) couple(vertex[a], vertex[b], 2);
  }
  const { directed } = network;
  for (let k = 0; k < directed.from.length; k++) {
    couple(vertex[directed.from[k]], vertex[directed.to[k]], directed.series[k] < 0 ? 0 : 1);
  }
  units.forEach((unit, u) => {
    const free = (list: Int32Array) => [...list].map((v) => vertex[v]).filter((v) => v >= 0);
    const sensors = free(unit.sensorNodes);
    const deliveries = free(unit.deliveryNodes);
    late.set(nodes + u, { sensors, deliveries });
    for (const v of [...sensors, ...deliveries]) couple(v, nodes + u, 2);
  });
  return { neighbours, level, late };
}

/**
 * Lays a network out.
 *
 * @param faintFor tells the chains whose ends are coupled so faintly that it is left to the iteration
 */
export function layOut(
  network: Network,
  faintFor: (chains: Chains) => Uint8Array = (chains) => new Uint8Array(chains.count),
): Layout {
  const nodeCount = network.nodeNames.length;
  const chains = findChains(network);
  const faint = faintFor(chains);
  const units = plantUnits(network);
  const vertex = new Int32Array(nodeCount);
  for (const v of chains.node) vertex[v] = -2;
  const unknownNodes: number[] = [];
  const fixedNodes: number[] = [];
  for (let i = 0; i < nodeCount; i++) {
    if (network.boundarySeries[i] >= 0) {
      vertex[i] = -1;
      fixedNodes.push(i);
    } else if (vertex[i] !== -2) {
      vertex[i] = unknownNodes.length;
      unknownNodes.push(i);
    }
  }
  const graph = couplings(network, chains, units, vertex, faint);
  const order = eliminationOrder(graph);
  const rows = order.sequence.length;
  const firstChain = rows + fixedNodes.length;
  const slotCount = firstChain + chains.node.length;
  const slotOfNode = new Int32Array(nodeCount);
  const nodeOfSlot = new Int32Array(slotCount).fill(-1);
  const rowOfUnit = new Int32Array(units.length);
  order.sequence.forEach((v, row) => {
    if (v < unknownNodes.length) {
      slotOfNode[unknownNodes[v]] = row;
      nodeOfSlot[row] = unknownNodes[v];
    } else rowOfUnit[v - unknownNodes.length] = row;
  });
  fixedNodes.forEach((v, i) => {
    slotOfNode[v] = rows + i;
    nodeOfSlot[rows + i] = v;
  });
  chains.node.forEach((v, i) => {
    slotOfNode[v] = firstChain + i;
    nodeOfSlot[firstChain + i] = v;
  });
  return {
    network,
    units,
    chains,
    faint,
    order,
    rows,
    firstFixed: rows,
    firstChain,
    slotCount,
    slotOfNode,
    nodeOfSlot,
    fixedSeries: Int32Array.from(fixedNodes, (v) => network.boundarySeries[v]),
    rowOfUnit,
    chainSlotA: chains.endA.map((v) => slotOfNode[v]),
    chainSlotB: chains.endB.map((v) => slotOfNode[v]),
  };
}

/** Copies a state by slot into one by node. */
export function toNodes(layout: Layout, x: Float64Array, tempC: Float64Array): void {
  for (let i = 0; i < tempC.length; i++) tempC[i] = x[layout.slotOfNode[i]];
}

/** Copies a state by node into one by slot; units keep their entries. */
export function toSlots(layout: Layout, tempC: Float64Array, x: Float64Array): void {
  for (let i = 0; i < tempC.length; i++) x[layout.slotOfNode[i]] = tempC[i];
}
