// The whole network's heat balance, added up apart from the equations that were solved: what crosses
// the boundary, what sources and plants give, and what the capacities took up.

import type { ChainModes } from './chain-modes.ts';
import type { Stage } from './stage.ts';

export interface Balance {
  /** Constant links with one end at a boundary. */
  readonly inside: Int32Array;
  readonly outside: Int32Array;
  readonly conductanceWPerK: Float64Array;
  /** Chains with an end at a boundary: which end (0 A, 1 B), its slot and the other end's, and what the
   * chain shows there: own entry and exchange [W/K]. */
  readonly chainEnd: Int32Array;
  readonly chainSlot: Int32Array;
  readonly chainOther: Int32Array;
  readonly chainOwnWPerK: Float64Array;
  readonly chainExchangeWPerK: Float64Array;
  /** State-dependent and driven links with one end at a boundary; +1 where `to` is inside. */
  readonly law: Int32Array;
  readonly lawSign: Float64Array;
  readonly driven: Int32Array;
  readonly drivenSign: Float64Array;
  readonly directedFrom: number;
  /** Enclosure members at boundaries: member, enclosure row, and the members it exchanges with. */
  readonly member: Int32Array;
  /** Enclosure of every member. */
  readonly memberEnclosure: Int32Array;
  /** Total and absolute factors of the sources into unknown nodes, by series. */
  readonly sourceSeries: Int32Array;
  readonly sourceSum: Float64Array;
  readonly sourceAbs: Float64Array;
  readonly unitShare: Float64Array;
  /** Capacity of each row that stores [J/K]. */
  readonly storing: Int32Array;
  readonly capacityJPerK: Float64Array;
  /** All capacities and constant conductances [J/K, W/K]: they set what counts as no flow. */
  readonly totalJPerK: number;
  readonly totalWPerK: number;
  /** Heat in each chain at the step's start [J]. */
  readonly chainJ: Float64Array;
  /** Running sums of a step [W]. */
  inW: number;
  throughputW: number;
}

export function compileBalance(stage: Stage, modes: ChainModes): Balance {
  const { layout, laws, driven, enclosures } = stage;
  const { network, rows, firstChain, slotOfNode } = layout;
  const isFixed = (slot: number) => slot >= rows && slot < firstChain;
  const crossing: [number, number, number][] = [];
  let totalWPerK = 0;
  for (const group of network.links) {
    if (group.law !== 'constant') continue;
    for (let k = 0; k < group.from.length; k++) {
      const a = slotOfNode[group.from[k]];
      const b = slotOfNode[group.to[k]];
      totalWPerK += group.conductanceWPerK[k];
      if (isFixed(a) === isFixed(b) || a >= firstChain || b >= firstChain) continue;
      crossing.push(
        isFixed(a) ? [b, a, group.conductanceWPerK[k]] : [a, b, group.conductanceWPerK[k]],
      );
    }
  }
  const ends: [number, number, number, number, number][] = [];
  for (let c = 0; c < layout.chains.count; c++) {
    const a = layout.chainSlotA[c];
    const b = layout.chainSlotB[c];
    const exchange = stage.chain.exchange[c];
    if (isFixed(a)) ends.push([2 * c, a, b, stage.chain.ownA[c], exchange]);
    if (isFixed(b)) ends.push([2 * c + 1, b, a, stage.chain.ownB[c], exchange]);
  }
  const over = (from: Int32Array, to: Int32Array, count: number) => {
    const list: number[] = [];
    for (let l = 0; l < count; l++) if (isFixed(from[l]) !== isFixed(to[l])) list.push(l);
    return Int32Array.from(list);
  };
  const law = over(laws.from, laws.to, laws.count);
  const scaled = over(driven.from, driven.to, driven.directedOffset);
  const members: number[] = [];
  enclosures.slot.forEach((slot, m) => {
    if (isFixed(slot)) members.push(m);
  });
  const sums = new Map<number, [number, number]>();
  const { sources } = network;
  for (let k = 0; k < sources.node.length; k++) {
    if (isFixed(slotOfNode[sources.node[k]])) continue;
    const [sum, abs] = sums.get(sources.series[k]) ?? [0, 0];
    sums.set(sources.series[k], [sum + sources.factor[k], abs + Math.abs(sources.factor[k])]);
  }
  const storing: number[] = [];
  const capacity: number[] = [];
  layout.nodeOfSlot.forEach((node, slot) => {
    if (node < 0 || slot >= rows || network.capacityJPerK[node] === 0) return;
    storing.push(slot);
    capacity.push(network.capacityJPerK[node]);
  });
  return {
    inside: Int32Array.from(crossing, (c) => c[0]),
    outside: Int32Array.from(crossing, (c) => c[1]),
    conductanceWPerK: Float64Array.from(crossing, (c) => c[2]),
    chainEnd: Int32Array.from(ends, (e) => e[0]),
    chainSlot: Int32Array.from(ends, (e) => e[1]),
    chainOther: Int32Array.from(ends, (e) => e[2]),
    chainOwnWPerK: Float64Array.from(ends, (e) => e[3]),
    chainExchangeWPerK: Float64Array.from(ends, (e) => e[4]),
    law,
    lawSign: Float64Array.from(law, (l) => (isFixed(laws.from[l]) ? 1 : -1)),
    driven: scaled,
    drivenSign: Float64Array.from(scaled, (l) => (isFixed(driven.from[l]) ? 1 : -1)),
    directedFrom: driven.directedOffset,
    member: Int32Array.from(members),
    memberEnclosure: enclosures.slot.map((_, m) => {
      let e = 0;
      while (enclosures.start[e + 1] <= m) e++;
      return e;
    }),
    sourceSeries: Int32Array.from(sums.keys()),
    sourceSum: Float64Array.from(sums.values(), (s) => s[0]),
    sourceAbs: Float64Array.from(sums.values(), (s) => s[1]),
    unitShare: Float64Array.from(layout.units, (unit) =>
      unit.deliveryNodes.reduce(
        (sum, v, i) => (isFixed(slotOfNode[v]) ? sum : sum + unit.deliveryShares[i]),
        0,
      ),
    ),
    storing: Int32Array.from(storing),
    capacityJPerK: Float64Array.from(capacity),
    totalJPerK: [...capacity, ...modes.capacityJPerK].reduce((a, b) => a + b, 0),
    totalWPerK,
    chainJ: new Float64Array(modes.heatJ.length),
    inW: 0,
    throughputW: 0,
  };
}

/** Adds the external flows of a stage that counts with `weight` in its step. */
export function addStageFlows(
  balance: Balance,
  stage: Stage,
  modes: ChainModes,
  x: Float64Array,
  series: Float64Array,
  weight: number,
): void {
  let sum = 0;
  let through = 0;
  const { inside, outside, conductanceWPerK, law, lawSign, sourceSeries } = balance;
  for (let k = 0; k < inside.length; k++) {
    const q = conductanceWPerK[k] * (x[outside[k]] - x[inside[k]]);
    sum += q;
    through += Math.abs(q);
  }
  const { chainEnd, chainSlot, chainOther, chainOwnWPerK, chainExchangeWPerK } = balance;
  for (let k = 0; k < chainEnd.length; k++) {
    const passed = chainOwnWPerK[k] * x[chainSlot[k]] - chainExchangeWPerK[k] * x[chainOther[k]];
    const q = passed - modes.now[chainEnd[k]];
    sum += q;
    through += Math.abs(q);
  }
  const { laws, slopeFrom, slopeTo, rest, driven, units } = stage;
  for (let k = 0; k < law.length; k++) {
    const l = law[k];
    const q = slopeFrom[l] * x[laws.from[l]] - slopeTo[l] * x[laws.to[l]] + rest[l];
    sum += lawSign[k] * q;
    through += Math.abs(q);
  }
  for (let k = 0; k < balance.driven.length; k++) {
    const l = balance.driven[k];
    const q = driven.conductanceWPerK[l] * (x[driven.from[l]] - x[driven.to[l]]);
    sum += balance.drivenSign[k] * q;
    through += Math.abs(q);
  }
  const { firstChain, rows } = stage.layout;
  for (let l = balance.directedFrom; l < driven.count; l++) {
    const a = driven.from[l];
    const b = driven.to[l];
    if (b >= rows && b < firstChain) continue; // a boundary does not feel it
    const q = driven.conductanceWPerK[l] * (x[a] - x[b]);
    sum += q;
    if (a >= rows && a < firstChain) through += Math.abs(q);
  }
  for (let k = 0; k < balance.member.length; k++) {
    const q = memberGainW(stage, balance.member[k], balance.memberEnclosure[balance.member[k]], x);
    sum -= q;
    through += Math.abs(q);
  }
  for (let k = 0; k < sourceSeries.length; k++) {
    const v = series[sourceSeries[k]];
    sum += balance.sourceSum[k] * v;
    through += balance.sourceAbs[k] * Math.abs(v);
  }
  for (let u = 0; u < units.count; u++) {
    const q = balance.unitShare[u] * x[units.row[u]];
    sum += q;
    through += Math.abs(q);
  }
  balance.inW += weight * sum;
  balance.throughputW += weight * through;
}

/** Net radiation that an enclosure member gains [W], from the linearised emissions. */
function memberGainW(stage: Stage, m: number, e: number, x: Float64Array): number {
  const { start, slot, row, exchangeM2, slope, rest } = stage.enclosures;
  const own = slope[m] * x[slot[m]] + rest[m];
  let q = 0;
  for (let j = start[e]; j < start[e + 1]; j++) {
    q += exchangeM2[row[m] + j - start[e]] * (slope[j] * x[slot[j]] + rest[j] - own);
  }
  return q;
}

/**
 * Flows below this change or difference of all temperatures count as this much [K]: a double near 20 °C
 * is known to 4e-15 K and a solve to some of these, so that less cannot be balanced to 1e-9.
 */
const stillK = 3e-5;

/** Takes note of where the stores stand before the first step. */
export function openBalance(balance: Balance, modes: ChainModes): void {
  balance.chainJ.set(modes.heatJ);
}

/**
 * Closes a step: imbalance over throughput (or over what stores took up and gave, where that is more,
 * or over a change of all temperatures by `stillK`, so that a network at rest is not judged by its
 * rounding). Resets the sums.
 */
export function closeStep(
  balance: Balance,
  start: Float64Array,
  end: Float64Array,
  modes: ChainModes,
  stepS: number,
): number {
  const { storing, capacityJPerK } = balance;
  let stored = 0;
  let moved = 0;
  for (let i = 0; i < storing.length; i++) {
    const q = capacityJPerK[i] * (end[storing[i]] - start[storing[i]]);
    stored += q;
    moved += Math.abs(q);
  }
  const { chainJ } = balance;
  const { heatJ } = modes;
  for (let c = 0; c < heatJ.length; c++) {
    const q = heatJ[c] - chainJ[c];
    chainJ[c] = heatJ[c];
    stored += q;
    moved += Math.abs(q);
  }
  const imbalance = Math.abs(balance.inW - stored / stepS);
  const still = stillK * (balance.totalJPerK / stepS + balance.totalWPerK);
  const through = Math.max(balance.throughputW, moved / stepS, still);
  balance.inW = 0;
  balance.throughputW = 0;
  return through === 0 ? 0 : imbalance / through; // NaN stays
}
