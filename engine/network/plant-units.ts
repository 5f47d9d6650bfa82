// Plants as the solver sees them: units, each with one unknown power u (positive into its nodes).
// A heater and a chiller that share sensor and delivery are one unit with two set-points, so that
// they can never hold two set-points at once.

import type { Network, Plant } from './problem.ts';

export interface Unit {
  /** Plant numbers, or −1. */
  readonly heater: number;
  readonly chiller: number;
  readonly sensorNodes: Int32Array;
  readonly sensorWeights: Float64Array;
  readonly deliveryNodes: Int32Array;
  readonly deliveryShares: Float64Array;
  readonly bandK: number;
}

function sameArray(a: Int32Array | Float64Array, b: Int32Array | Float64Array): boolean {
  return a.length === b.length && a.every((v, i) => v === b[i]);
}

/** Whether a heater and a chiller act as one unit. */
export function isPair(a: Plant, b: Plant): boolean {
  return (
    a.kind !== b.kind &&
    a.bandK === 0 &&
    b.bandK === 0 &&
    sameArray(a.sensorNodes, b.sensorNodes) &&
    sameArray(a.sensorWeights, b.sensorWeights) &&
    sameArray(a.deliveryNodes, b.deliveryNodes) &&
    sameArray(a.deliveryShares, b.deliveryShares)
  );
}

/** Plants joined into units, in the order of their first plant. */
export function plantUnits(network: Network): Unit[] {
  const { plants } = network;
  const taken = new Uint8Array(plants.length);
  const waiting = new Map<string, number[]>();
  plants.forEach((p, i) => {
    const key = `${p.sensorNodes.join()}|${p.deliveryNodes.join()}`;
    waiting.set(key, [...(waiting.get(key) ?? []), i]);
  });
  const units: Unit[] = [];
  plants.forEach((p, i) => {
    if (taken[i] === 1) return;
    taken[i] = 1;
    const near = waiting.get(`${p.sensorNodes.join()}|${p.deliveryNodes.join()}`) ?? [];
    const other = near.find((j) => j > i && taken[j] === 0 && isPair(p, plants[j])) ?? -1;
    if (other >= 0) taken[other] = 1;
    units.push({
      heater: p.kind === 'heater' ? i : other,
      chiller: p.kind === 'chiller' ? i : other,
      sensorNodes: p.sensorNodes,
      sensorWeights: p.sensorWeights,
      deliveryNodes: p.deliveryNodes,
      deliveryShares: p.deliveryShares,
      bandK: p.bandK,
    });
  });
  return units;
}
