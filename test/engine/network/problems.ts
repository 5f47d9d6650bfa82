// Small helpers for tests that write a network by hand.

import type {
  ConstantLinks,
  DirectedLinks,
  Method,
  Network,
  Problem,
  Series,
  Sources,
} from '../../../engine/network/index.ts';

export const tight: Method = { toleranceK: 1e-9, maxIterations: 60 };
export const usual: Method = { toleranceK: 1e-6, maxIterations: 40 };

export function constantLinks(links: readonly (readonly number[])[]): ConstantLinks {
  return {
    law: 'constant',
    from: Int32Array.from(links, (l) => l[0]),
    to: Int32Array.from(links, (l) => l[1]),
    conductanceWPerK: Float64Array.from(links, (l) => l[2]),
  };
}

/** Rows of from, to, rate, series. */
export function directedLinks(links: readonly (readonly number[])[]): DirectedLinks {
  return {
    from: Int32Array.from(links, (l) => l[0]),
    to: Int32Array.from(links, (l) => l[1]),
    rateWPerK: Float64Array.from(links, (l) => l[2]),
    series: Int32Array.from(links, (l) => l[3] ?? -1),
  };
}

/** Rows of node, factor, series. */
export function sourceRows(rows: readonly (readonly number[])[]): Sources {
  return {
    node: Int32Array.from(rows, (r) => r[0]),
    factor: Float64Array.from(rows, (r) => r[1]),
    series: Int32Array.from(rows, (r) => r[2]),
  };
}

/** A network of `capacities.length` nodes; boundaries are given as node → series. */
export function network(
  capacities: readonly number[],
  boundaries: Readonly<Record<number, number>>,
  parts: Partial<Network>,
): Network {
  return {
    nodeNames: capacities.map((_, i) => `n${i}`),
    capacityJPerK: Float64Array.from(capacities),
    boundarySeries: Int32Array.from(capacities, (_, i) => boundaries[i] ?? -1),
    links: [],
    enclosures: [],
    directed: directedLinks([]),
    sources: sourceRows([]),
    plants: [],
    ...parts,
  };
}

export function held(name: string, values: ArrayLike<number>): Series {
  return { name, hold: 'step', values: Float64Array.from(values) };
}

export function constant(name: string, value: number, steps: number): Series {
  return { name, hold: 'step', values: new Float64Array(steps).fill(value) };
}

/** Straight lines between the values of f at the steps' ends. */
export function straight(
  name: string,
  stepS: number,
  steps: number,
  f: (timeS: number) => number,
): Series {
  return {
    name,
    hold: 'linear',
    values: Float64Array.from({ length: steps + 1 }, (_, k) => f(k * stepS)),
  };
}

/** A problem that records every node at the end of every step. */
export function problem(
  net: Network,
  series: readonly Series[],
  stepS: number,
  stepCount: number,
  startC: ArrayLike<number>,
  more: Partial<Problem> = {},
): Problem {
  return {
    network: net,
    stepS,
    stepCount,
    series,
    start: { kind: 'temperatures', tempC: Float64Array.from(startC) },
    stepsPerRecord: 1,
    recordNodes: Int32Array.from(net.nodeNames, (_, i) => i),
    meters: [],
    ...more,
  };
}
