// The whole network as dense matrices, linearised at a state: for eigenvalues, and for tests that
// solve the same system without elimination.

import { Matrix } from 'ml-matrix';
import { stefanBoltzmann, zeroC } from './law-radiant.ts';
import { compileLinks, evaluateLinks } from './links.ts';
import type { Network } from './problem.ts';

export interface DenseNetwork {
  /** Nodes that are not boundaries, in order; row and column r of K belong to `nodes[r]`. */
  readonly nodes: Int32Array;
  /** Minus the slope of each node's heat gain by each temperature [W/K]. */
  readonly conductanceWPerK: Matrix;
  readonly capacityJPerK: Float64Array;
  /** Whether K is symmetric (no advection, no T⁴). */
  readonly isSymmetric: boolean;
}

/**
 * @param tempC state of all nodes, boundaries too
 * @param series drivers at the moment
 */
export function denseNetwork(
  network: Network,
  tempC: Float64Array,
  series: Float64Array,
  step: number,
): DenseNetwork {
  const n = network.nodeNames.length;
  const nodes: number[] = [];
  const place = new Int32Array(n).fill(-1);
  for (let i = 0; i < n; i++) {
    if (network.boundarySeries[i] >= 0) continue;
    place[i] = nodes.length;
    nodes.push(i);
  }
  const k = Matrix.zeros(nodes.length, nodes.length);
  const put = (row: number, col: number, g: number) => {
    if (place[row] < 0 || place[col] < 0) return;
    k.set(place[row], place[col], k.get(place[row], place[col]) + g);
  };
  /** Heat from a to b with slopes by T_a and (negative) by T_b. */
  const flow = (a: number, b: number, byA: number, byB: number) => {
    put(a, a, byA);
    put(a, b, -byB);
    put(b, b, byB);
    put(b, a, -byA);
  };
  const own = Int32Array.from({ length: n }, (_, i) => i);
  const laws = compileLinks(network, own, n, () => 0);
  evaluateLinks(laws, 0, laws.count, tempC, series, step);
  network.links.forEach((group, g) => {
    for (let l = 0; l < group.from.length; l++) {
      const a = group.from[l];
      const b = group.to[l];
      if (group.law === 'constant') {
        flow(a, b, group.conductanceWPerK[l], group.conductanceWPerK[l]);
      } else if (group.law === 'scaled') {
        const scaled = group.conductanceWPerK[l] * series[group.series[l]];
        flow(a, b, scaled, scaled);
      } else {
        const at = laws.place[laws.offset[g] + l];
        flow(a, b, laws.slopeFrom[at], laws.slopeTo[at]);
      }
    }
  });
  for (const e of network.enclosures) {
    const m = e.nodes.length;
    for (let i = 0; i < m; i++) {
      for (let j = 0; j < i; j++) {
        const a = e.nodes[i];
        const b = e.nodes[j];
        const x = 4 * stefanBoltzmann * e.exchangeAreaM2[i * m + j];
        flow(a, b, x * (tempC[a] + zeroC) ** 3, x * (tempC[b] + zeroC) ** 3);
      }
    }
  }
  const { directed } = network;
  for (let l = 0; l < directed.from.length; l++) {
    const s = directed.series[l];
    const rate = directed.rateWPerK[l] * (s < 0 ? 1 : series[s]);
    put(directed.to[l], directed.to[l], rate);
    put(directed.to[l], directed.from[l], -rate);
  }
  let isSymmetric = true;
  for (let i = 0; i < nodes.length; i++) {
    for (let j = 0; j < i; j++) if (k.get(i, j) !== k.get(j, i)) isSymmetric = false;
  }
  return {
    nodes: Int32Array.from(nodes),
    conductanceWPerK: k,
    capacityJPerK: Float64Array.from(nodes, (v) => network.capacityJPerK[v]),
    isSymmetric,
  };
}
