// What hangs together, and whether flows balance: nodes that nothing holds, and mass at every node.

import type { Breach } from './check.ts';
import type { Problem } from './problem.ts';

/** Groups of nodes without capacity and without a boundary: nothing determines their temperature. */
export function checkReach(problem: Problem): Breach[] {
  const { network } = problem;
  const { nodeNames: names, boundarySeries, capacityJPerK } = network;
  const parent = Int32Array.from(names, (_, i) => i);
  const linked = new Uint8Array(names.length);
  const find = (i: number): number => {
    let r = i;
    while (parent[r] !== r) r = parent[r];
    parent[i] = r;
    return r;
  };
  const join = (a: number, b: number) => {
    parent[find(a)] = find(b);
    linked[a] = 1;
    linked[b] = 1;
  };
  for (const group of network.links) {
    for (let k = 0; k < group.from.length; k++) {
      if (group.law === 'constant' && group.conductanceWPerK[k] === 0) continue;
      join(group.from[k], group.to[k]);
    }
  }
  const { directed } = network;
  for (let k = 0; k < directed.from.length; k++) join(directed.from[k], directed.to[k]);
  for (const e of network.enclosures) for (const v of e.nodes) join(e.nodes[0], v);
  const held = new Uint8Array(names.length);
  names.forEach((_, i) => {
    if (boundarySeries[i] >= 0 || capacityJPerK[i] > 0) held[find(i)] = 1;
  });
  const groups = new Map<number, string[]>();
  names.forEach((name, i) => {
    const root = find(i);
    if (held[root] === 0) groups.set(root, [...(groups.get(root) ?? []), name]);
  });
  const breaches: Breach[] = [];
  for (const nodes of groups.values()) {
    const text =
      nodes.length === 1
        ? `${nodes[0]} has no capacity and no link`
        : `${nodes.join(', ')} have no capacity and reach no boundary`;
    breaches.push({ nodes, text });
  }
  const used = new Set([
    ...network.sources.node,
    ...network.plants.flatMap((p) => [...p.deliveryNodes]),
  ]);
  names.forEach((name, i) => {
    if (boundarySeries[i] >= 0 || linked[i] === 1 || capacityJPerK[i] === 0 || used.has(i)) return;
    breaches.push({ nodes: [name], text: `${name} hangs on nothing: no link, source or plant` });
  });
  return breaches;
}

/** Share of the through-flow by which in and out may differ, from rounding. */
const massShare = 1e-9;

/**
 * Directed links: what flows into a node must flow out. Checked series by series, which settles most
 * nodes for all steps; where that fails, step by step.
 */
export function checkMass(problem: Problem): Breach[] {
  const { network, series } = problem;
  const { directed, nodeNames: names } = network;
  const byNode = new Map<number, number[]>();
  for (let k = 0; k < directed.from.length; k++) {
    for (const v of [directed.from[k], directed.to[k]]) {
      if (network.boundarySeries[v] < 0) byNode.set(v, [...(byNode.get(v) ?? []), k]);
    }
  }
  const breaches: Breach[] = [];
  for (const [v, links] of byNode) {
    const signed = (k: number) => (directed.to[k] === v ? 1 : 0) - (directed.from[k] === v ? 1 : 0);
    const net = new Map<number, number>();
    let total = 0;
    for (const k of links) {
      const s = directed.series[k];
      net.set(s, (net.get(s) ?? 0) + signed(k) * directed.rateWPerK[k]);
      total += directed.rateWPerK[k];
    }
    if ([...net.values()].every((x) => Math.abs(x) <= massShare * total)) continue;
    const rows = series.reduce((m, s) => Math.max(m, s.values.length), 1);
    for (let step = 0; step < rows; step++) {
      let into = 0;
      let out = 0;
      for (const k of links) {
        const s = directed.series[k];
        const values = s < 0 ? null : series[s].values;
        const scale = values === null ? 1 : values[Math.min(step, values.length - 1)];
        const rate = directed.rateWPerK[k] * scale;
        if (directed.to[k] === v) into += rate;
        else out += rate;
      }
      if (Math.abs(into - out) <= massShare * (into + out)) continue;
      const text = `${names[v]}: ${into} W/K of air flows in, ${out} W/K out at step ${step}`;
      breaches.push({ nodes: [names[v]], text });
      break;
    }
  }
  return breaches;
}
