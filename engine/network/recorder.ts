// Means over record intervals: temperatures of the recorded nodes and the meters' flows.
//
// A step's mean is (1 − γ)·stage 1 + γ·stage 2, the weights with which the step itself integrates the
// flows: a meter's mean flow is exactly the conductance times the recorded mean difference, and the
// meters balance the change of the stores to rounding. As a time mean it is second-order accurate.
//
// All that meters ask for is summed in one flat array, step by step; at a record's end a meter is a sum
// of factors times entries of it.

import { type ChainModes, insideC } from './chain-modes.ts';
import type { Problem } from './problem.ts';
import { compileTerms, type MeterTerms, type Watch } from './recorder-terms.ts';
import type { Stage } from './stage.ts';

export interface Recorder {
  readonly problem: Problem;
  readonly meanC: Float64Array;
  readonly endC: Float64Array;
  readonly meterW: Float64Array;
  readonly watch: Watch;
  readonly terms: MeterTerms;
  /** Sums over the record so far, in the order of `watch`. */
  readonly sum: Float64Array;
  /** Power of each unit in the step at hand [W]. */
  readonly unitW: Float64Array;
  /** Stored temperatures at the record's start. */
  readonly startC: Float64Array;
  stepsInRecord: number;
  records: number;
}

export function createRecorder(problem: Problem, stage: Stage): Recorder {
  const { meters, recordNodes, stepCount, stepsPerRecord } = problem;
  const records = Math.floor(stepCount / stepsPerRecord);
  const { watch, terms } = compileTerms(problem, stage);
  return {
    problem,
    meanC: new Float64Array(records * recordNodes.length),
    endC: new Float64Array(records * recordNodes.length),
    meterW: new Float64Array(records * meters.length),
    watch,
    terms,
    sum: new Float64Array(watch.size),
    unitW: new Float64Array(watch.units),
    startC: new Float64Array(watch.stored.length),
    stepsInRecord: 0,
    records: 0,
  };
}

/** Adds a stage's temperatures and flows with its weight in the step. */
export function addStage(
  r: Recorder,
  stage: Stage,
  modes: ChainModes,
  x: Float64Array,
  series: Float64Array,
  weight: number,
  isFirst: boolean,
): void {
  const { sum, watch, unitW } = r;
  const { slots, inside, chainOf, lawLinks, drivenLinks, members, ownSeries } = watch;
  let at = 0;
  for (let i = 0; i < slots.length; i++) sum[at++] += weight * x[slots[i]];
  if (inside.length > 0) {
    const { chainSlotA, chainSlotB } = stage.layout;
    for (let i = 0; i < inside.length; i++) {
      const c = chainOf[i];
      const a = x[chainSlotA[c]];
      sum[at++] += weight * insideC(modes, c, inside[i], a, x[chainSlotB[c]], isFirst);
    }
  }
  const { laws, slopeFrom, slopeTo, rest, driven, enclosures, units } = stage;
  for (let i = 0; i < lawLinks.length; i++) {
    const l = lawLinks[i];
    const q = slopeFrom[l] * x[laws.from[l]] - slopeTo[l] * x[laws.to[l]] + rest[l];
    sum[at++] += weight * q;
  }
  for (let i = 0; i < drivenLinks.length; i++) {
    const l = drivenLinks[i];
    sum[at++] += weight * driven.conductanceWPerK[l] * (x[driven.from[l]] - x[driven.to[l]]);
  }
  for (let i = 0; i < members.length; i++) {
    const m = members[i];
    sum[at++] += weight * (enclosures.slope[m] * x[enclosures.slot[m]] + enclosures.rest[m]);
  }
  for (let i = 0; i < ownSeries.length; i++) sum[at++] += weight * series[ownSeries[i]];
  for (let u = 0; u < unitW.length; u++) unitW[u] += weight * x[units.row[u]];
}

/** Temperature of a stored node, in a row or inside a chain, at a step's end. */
function storedC(r: Recorder, stage: Stage, modes: ChainModes, x: Float64Array, i: number): number {
  const slot = r.watch.stored[i];
  const { firstChain, chainSlotA, chainSlotB } = stage.layout;
  if (slot < firstChain) return x[slot];
  const c = r.watch.storedChain[i];
  return insideC(modes, c, slot - firstChain, x[chainSlotA[c]], x[chainSlotB[c]], false);
}

/** Takes note of where the stores stand before the first step. */
export function openRecorder(r: Recorder, stage: Stage, modes: ChainModes, x: Float64Array): void {
  for (let i = 0; i < r.startC.length; i++) r.startC[i] = storedC(r, stage, modes, x, i);
}

/** Ends a step at state `x`; at a record's end writes the record and starts the next. */
export function endStep(r: Recorder, stage: Stage, modes: ChainModes, x: Float64Array): void {
  const { unitW, sum, watch, terms } = r;
  const { heaterAt, chillerAt, storedAt } = watch;
  for (let u = 0; u < unitW.length; u++) {
    if (unitW[u] > 0) sum[heaterAt + u] += unitW[u];
    else sum[chillerAt + u] -= unitW[u];
    unitW[u] = 0;
  }
  r.stepsInRecord++;
  if (r.stepsInRecord < r.problem.stepsPerRecord) return;
  const n = r.stepsInRecord;
  for (let i = 0; i < watch.stored.length; i++) {
    const end = storedC(r, stage, modes, x, i);
    sum[storedAt + i] = end - r.startC[i];
    r.startC[i] = end;
  }
  const { recordedAt, recordedSlot, recordedChain } = watch;
  const nodes = recordedAt.length;
  const { firstChain, chainSlotA, chainSlotB } = stage.layout;
  for (let i = 0; i < nodes; i++) {
    const at = r.records * nodes + i;
    const slot = recordedSlot[i];
    r.meanC[at] = sum[recordedAt[i]] / n;
    if (slot < firstChain) r.endC[at] = x[slot];
    else {
      const c = recordedChain[i];
      const a = x[chainSlotA[c]];
      r.endC[at] = insideC(modes, c, slot - firstChain, a, x[chainSlotB[c]], false);
    }
  }
  const { start, entry, factor } = terms;
  const meters = start.length - 1;
  for (let m = 0; m < meters; m++) {
    let total = 0;
    for (let k = start[m]; k < start[m + 1]; k++) total += factor[k] * sum[entry[k]];
    r.meterW[r.records * meters + m] = total / n;
  }
  r.records++;
  r.stepsInRecord = 0;
  sum.fill(0);
}
