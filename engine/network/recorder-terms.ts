// What the meters and records of a problem watch, and each meter as factors over it.

import type { Problem } from './problem.ts';
import type { Stage } from './stage.ts';

/**
 * What is summed, in the order of the sums: slots of rows and boundaries, nodes inside chains, law links,
 * driven links, enclosure members, series, heaters, chillers, changes of stored temperatures.
 */
export interface Watch {
  readonly slots: Int32Array;
  /** Number inside all chains, and the chain. */
  readonly inside: Int32Array;
  readonly chainOf: Int32Array;
  readonly lawLinks: Int32Array;
  readonly drivenLinks: Int32Array;
  readonly members: Int32Array;
  readonly ownSeries: Int32Array;
  readonly units: number;
  readonly heaterAt: number;
  readonly chillerAt: number;
  readonly storedAt: number;
  readonly stored: Int32Array;
  readonly storedChain: Int32Array;
  readonly size: number;
  /** Place of each recorded node's sum, its slot, and its chain or −1. */
  readonly recordedAt: Int32Array;
  readonly recordedSlot: Int32Array;
  readonly recordedChain: Int32Array;
}

/** Meter m is Σ factor[k]·sum[entry[k]], k from `start[m]` to `start[m + 1] − 1`. */
export interface MeterTerms {
  readonly start: Int32Array;
  readonly entry: Int32Array;
  readonly factor: Float64Array;
}

type Kind =
  | 'slot'
  | 'inside'
  | 'law'
  | 'driven'
  | 'member'
  | 'series'
  | 'heater'
  | 'chiller'
  | 'stored';
type Part = readonly [kind: Kind, index: number, factor: number];

/** Things of one kind in the order in which they were first asked for. */
class Listed {
  readonly place = new Map<number, number>();
  at(index: number): number {
    const known = this.place.get(index) ?? this.place.size;
    this.place.set(index, known);
    return known;
  }
  get list(): Int32Array {
    return Int32Array.from(this.place.keys());
  }
}

export function compileTerms(problem: Problem, stage: Stage): { watch: Watch; terms: MeterTerms } {
  const { layout } = stage;
  const { network, meters, recordNodes } = problem;
  const { slotOfNode, firstChain, chains, units } = layout;
  const chainOfInside = new Int32Array(chains.node.length);
  for (let c = 0; c < chains.count; c++)
    chainOfInside.fill(c, chains.start[c], chains.start[c + 1]);
  const node = (v: number, factor: number): Part => {
    const slot = slotOfNode[v];
    return slot < firstChain ? ['slot', slot, factor] : ['inside', slot - firstChain, factor];
  };

  const partsOf = ({ sign, of }: Problem['meters'][number]['terms'][number]): Part[] => {
    switch (of.kind) {
      case 'link': {
        const group = network.links[of.group];
        if (group.law === 'constant') {
          const g = sign * group.conductanceWPerK[of.index];
          return [node(group.from[of.index], g), node(group.to[of.index], -g)];
        }
        if (group.law === 'scaled') {
          return [['driven', stage.driven.offset[of.group] + of.index, sign]];
        }
        return [['law', stage.laws.place[stage.laws.offset[of.group] + of.index], sign]];
      }
      case 'directed':
        return [['driven', stage.driven.directedOffset + of.index, sign]];
      case 'source':
        return [
          ['series', network.sources.series[of.index], sign * network.sources.factor[of.index]],
        ];
      case 'plant': {
        const u = units.findIndex((unit) => unit.heater === of.index);
        if (u >= 0) return [['heater', u, sign]];
        return [['chiller', units.findIndex((unit) => unit.chiller === of.index), sign]];
      }
      case 'enclosure': {
        const { start, row, exchangeM2, rowSumM2 } = stage.enclosures;
        const first = start[of.enclosure];
        const own = first + of.position;
        const parts: Part[] = [['member', own, -sign * rowSumM2[own]]];
        for (let m = first; m < start[of.enclosure + 1]; m++) {
          const x = exchangeM2[row[own] + m - first];
          if (m !== own && x !== 0) parts.push(['member', m, sign * x]);
        }
        return parts;
      }
      case 'storage': {
        const c = (sign * network.capacityJPerK[of.node]) / problem.stepS;
        return [['stored', slotOfNode[of.node], c]];
      }
      default:
        return of satisfies never;
    }
  };

  const lists: Record<Exclude<Kind, 'heater' | 'chiller'>, Listed> = {
    slot: new Listed(),
    inside: new Listed(),
    law: new Listed(),
    driven: new Listed(),
    member: new Listed(),
    series: new Listed(),
    stored: new Listed(),
  };
  const recorded = Array.from(recordNodes, (v) => {
    const [kind, index] = node(v, 1);
    return [kind, index] as const;
  });
  const placeIn = (kind: Kind, index: number) =>
    kind === 'heater' || kind === 'chiller' ? index : lists[kind].at(index);
  for (const [kind, index] of recorded) placeIn(kind, index);
  const all = meters.map((meter) => {
    // Factors of one thing that is metered several times are added up.
    const sums = new Map<string, [Kind, number, number]>();
    for (const term of meter.terms) {
      for (const [kind, index, factor] of partsOf(term)) {
        const place = placeIn(kind, index);
        const key = `${kind} ${place}`;
        const known = sums.get(key);
        if (known) known[2] += factor;
        else sums.set(key, [kind, place, factor]);
      }
    }
    return [...sums.values()];
  });
  const size = (kind: Exclude<Kind, 'heater' | 'chiller'>) => lists[kind].place.size;
  const offset = { slot: 0 } as Record<Kind, number>;
  offset.inside = size('slot');
  offset.law = offset.inside + size('inside');
  offset.driven = offset.law + size('law');
  offset.member = offset.driven + size('driven');
  offset.series = offset.member + size('member');
  offset.heater = offset.series + size('series');
  offset.chiller = offset.heater + units.length;
  offset.stored = offset.chiller + units.length;
  const start = new Int32Array(meters.length + 1);
  all.forEach((parts, m) => {
    start[m + 1] = start[m] + parts.length;
  });
  const flat = all.flat();
  const inside = lists.inside.list;
  const stored = lists.stored.list;
  const chainOfSlot = (slot: number) => (slot < firstChain ? -1 : chainOfInside[slot - firstChain]);
  const recordedSlot = recordNodes.map((v) => slotOfNode[v]);
  return {
    watch: {
      slots: lists.slot.list,
      inside,
      chainOf: inside.map((i) => chainOfInside[i]),
      lawLinks: lists.law.list,
      drivenLinks: lists.driven.list,
      members: lists.member.list,
      ownSeries: lists.series.list,
      units: units.length,
      heaterAt: offset.heater,
      chillerAt: offset.chiller,
      storedAt: offset.stored,
      stored,
      storedChain: stored.map(chainOfSlot),
      size: offset.stored + stored.length,
      recordedAt: Int32Array.from(recorded, ([kind, index]) => offset[kind] + placeIn(kind, index)),
      recordedSlot,
      recordedChain: recordedSlot.map(chainOfSlot),
    },
    terms: {
      start,
      entry: Int32Array.from(flat, ([kind, place]) => offset[kind] + place),
      factor: Float64Array.from(flat, ([, , factor]) => factor),
    },
  };
}
