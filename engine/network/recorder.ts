// Means over record intervals: temperatures of the recorded nodes and the meters' flows.
//
// A step's mean is (1 − γ)·stage 1 + γ·stage 2, the weights with which the step itself integrates the
// flows: a meter's mean flow is exactly the conductance times the recorded mean difference, and the
// meters balance the change of the stores to rounding. As a time mean it is second-order accurate.

import type { Layout } from './layout.ts';
import type { Problem } from './problem.ts';
import { seriesAt } from './series.ts';
import type { Stage } from './stage.ts';

export interface Recorder {
  readonly problem: Problem;
  readonly layout: Layout;
  readonly meanC: Float64Array;
  readonly endC: Float64Array;
  readonly meterW: Float64Array;
  /** Recorded slots. */
  readonly slots: Int32Array;
  /** Sums over the record so far, and what feeds them: slots watched, links, members, units. */
  readonly watched: Int32Array;
  readonly watchedSum: Float64Array;
  readonly lawList: Int32Array;
  readonly lawSum: Float64Array;
  readonly drivenList: Int32Array;
  readonly drivenSum: Float64Array;
  readonly emissionSum: Float64Array;
  readonly unitSum: Float64Array;
  readonly heaterSum: Float64Array;
  readonly chillerSum: Float64Array;
  readonly startC: Float64Array;
  readonly terms: readonly Term[];
  stepsInRecord: number;
  records: number;
}

/** One meter term, ready to be added up at a record's end. */
type Term = (r: Recorder, stage: Stage, x: Float64Array, firstStep: number) => number;

/** Mean drivers over the record are wanted from `firstStep` on. */
function seriesSum(r: Recorder, series: number, firstStep: number): number {
  let sum = 0;
  const s = r.problem.series[series];
  for (let k = 0; k < r.stepsInRecord; k++) sum += seriesAt(s, firstStep + k, 0.5);
  return sum;
}

export function createRecorder(problem: Problem, stage: Stage): Recorder {
  const { layout } = stage;
  const { network, meters, recordNodes, stepCount, stepsPerRecord } = problem;
  const records = Math.floor(stepCount / stepsPerRecord);
  const slots = recordNodes.map((v) => layout.slotOfNode[v]);
  const watched: number[] = [];
  const place = new Map<number, number>();
  const watch = (slot: number): number => {
    const known = place.get(slot);
    if (known !== undefined) return known;
    place.set(slot, watched.length);
    watched.push(slot);
    return watched.length - 1;
  };
  for (const slot of slots) watch(slot);
  const laws = new Map<number, number>();
  const driven = new Map<number, number>();
  const enlist = (map: Map<number, number>, l: number): number => {
    const at = map.get(l) ?? map.size;
    map.set(l, at);
    return at;
  };
  const drivenTerm = (l: number, sign: number): Term => {
    const at = enlist(driven, l);
    return (r) => sign * r.drivenSum[at];
  };
  const terms = meters.map((meter): Term => {
    const parts = meter.terms.map(({ sign, of }): Term => {
      switch (of.kind) {
        case 'link': {
          const group = network.links[of.group];
          if (group.law === 'constant') {
            const a = watch(layout.slotOfNode[group.from[of.index]]);
            const b = watch(layout.slotOfNode[group.to[of.index]]);
            const g = sign * group.conductanceWPerK[of.index];
            return (r) => g * (r.watchedSum[a] - r.watchedSum[b]);
          }
          if (group.law === 'scaled') {
            return drivenTerm(stage.driven.offset[of.group] + of.index, sign);
          }
          const at = enlist(laws, stage.laws.offset[of.group] + of.index);
          return (r) => sign * r.lawSum[at];
        }
        case 'directed':
          return drivenTerm(stage.driven.directedOffset + of.index, sign);
        case 'source': {
          const factor = sign * network.sources.factor[of.index];
          const series = network.sources.series[of.index];
          return (r, _stage, _x, first) => factor * seriesSum(r, series, first);
        }
        case 'plant': {
          const u = layout.units.findIndex((unit) => unit.heater === of.index);
          const v = layout.units.findIndex((unit) => unit.chiller === of.index);
          return u >= 0 ? (r) => sign * r.heaterSum[u] : (r) => sign * r.chillerSum[v];
        }
        case 'enclosure':
          return (r, s) => sign * gainW(r, s, of.enclosure, of.position);
        case 'storage': {
          const slot = layout.slotOfNode[of.node];
          const c = (sign * network.capacityJPerK[of.node]) / problem.stepS;
          return (r, _stage, x) => c * (x[slot] - r.startC[slot]);
        }
        default:
          return of satisfies never;
      }
    });
    return (r, s, x, first) => {
      let sum = 0;
      for (const part of parts) sum += part(r, s, x, first);
      return sum;
    };
  });
  return {
    problem,
    layout,
    meanC: new Float64Array(records * slots.length),
    endC: new Float64Array(records * slots.length),
    meterW: new Float64Array(records * meters.length),
    slots,
    watched: Int32Array.from(watched),
    watchedSum: new Float64Array(watched.length),
    lawList: Int32Array.from(laws.keys()),
    lawSum: new Float64Array(laws.size),
    drivenList: Int32Array.from(driven.keys()),
    drivenSum: new Float64Array(driven.size),
    emissionSum: new Float64Array(stage.enclosures.slot.length),
    unitSum: new Float64Array(layout.units.length),
    heaterSum: new Float64Array(layout.units.length),
    chillerSum: new Float64Array(layout.units.length),
    startC: new Float64Array(layout.slotCount),
    terms,
    stepsInRecord: 0,
    records: 0,
  };
}

function gainW(r: Recorder, stage: Stage, e: number, position: number): number {
  const { start, row, exchangeM2 } = stage.enclosures;
  const first = start[e];
  const n = start[e + 1] - first;
  let q = 0;
  for (let j = 0; j < n; j++) {
    const x = exchangeM2[row[first + position] + j];
    q += x * (r.emissionSum[first + j] - r.emissionSum[first + position]);
  }
  return q;
}

/** Adds a stage's flows with its weight in the step. */
export function addStage(r: Recorder, stage: Stage, x: Float64Array, weight: number): void {
  const { watched, watchedSum, lawList, lawSum, drivenList, drivenSum, emissionSum, unitSum } = r;
  for (let i = 0; i < watched.length; i++) watchedSum[i] += weight * x[watched[i]];
  const { laws, slopeFrom, slopeTo, rest, driven, enclosures, units } = stage;
  for (let i = 0; i < lawList.length; i++) {
    const l = lawList[i];
    const q = slopeFrom[l] * x[laws.from[l]] - slopeTo[l] * x[laws.to[l]] + rest[l];
    lawSum[i] += weight * q;
  }
  for (let i = 0; i < drivenList.length; i++) {
    const l = drivenList[i];
    drivenSum[i] += weight * driven.conductanceWPerK[l] * (x[driven.from[l]] - x[driven.to[l]]);
  }
  const { slot, slope } = enclosures;
  for (let m = 0; m < slot.length; m++) {
    emissionSum[m] += weight * (slope[m] * x[slot[m]] + enclosures.rest[m]);
  }
  for (let u = 0; u < units.count; u++) unitSum[u] += weight * x[units.row[u]];
}

/** Ends a step at state `x`; at a record's end writes the record and starts the next. */
export function endStep(r: Recorder, stage: Stage, x: Float64Array, step: number): void {
  const { unitSum, heaterSum, chillerSum } = r;
  for (let u = 0; u < unitSum.length; u++) {
    if (unitSum[u] > 0) heaterSum[u] += unitSum[u];
    else chillerSum[u] -= unitSum[u];
    unitSum[u] = 0;
  }
  r.stepsInRecord++;
  if (r.stepsInRecord < r.problem.stepsPerRecord) return;
  const n = r.stepsInRecord;
  const { slots, terms, records, watchedSum } = r;
  for (let i = 0; i < slots.length; i++) {
    const at = records * slots.length + i;
    r.meanC[at] = watchedSum[r.watched.indexOf(slots[i])] / n;
    r.endC[at] = x[slots[i]];
  }
  for (let m = 0; m < terms.length; m++) {
    r.meterW[records * terms.length + m] = terms[m](r, stage, x, step + 1 - n) / n;
  }
  r.records++;
  r.stepsInRecord = 0;
  r.watchedSum.fill(0);
  r.lawSum.fill(0);
  r.drivenSum.fill(0);
  r.emissionSum.fill(0);
  heaterSum.fill(0);
  chillerSum.fill(0);
  r.startC.set(x);
}
