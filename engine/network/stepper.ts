// Time integration: SDIRK2, two implicit stages with one matrix, L-stable and stiffly accurate.
//
//   γ = 1 − √2/2;  C·(T1 − T0) = γh·f(t + γh, T1);  C·(T2 − T0) = (1 − γ)h·f1 + γh·f(t + h, T2).
//
// With f1 = C·(T1 − T0)/(γh) the second stage reads like the first, started from
// T0 + (1 − γ)/γ·(T1 − T0): no explicit stage, and massless nodes obey their balance at both.
//
// Source: R. Alexander, "Diagonally implicit Runge-Kutta methods for stiff O.D.E.'s", SIAM J. Numer.
// Anal. 14 (1977) 1006-1021, doi:10.1137/0714068.

import { addStageFlows, type Balance, closeStep, compileBalance, openBalance } from './balance.ts';
import {
  addFirstHistory,
  addSecondHistory,
  advanceModes,
  type ChainModes,
  compileModes,
  insideC,
  placeModes,
} from './chain-modes.ts';
import { factorChains } from './chain-sweeps.ts';
import { holdLoads } from './driver-loads.ts';
import { faintChains } from './faint.ts';
import { createHost, type KernelHost, pullState, pushState, runInKernel } from './kernel/host.ts';
import { type Layout, layOut, toNodes, toSlots } from './layout.ts';
import type { Method, Problem } from './problem.ts';
import { addStage, endStep, openRecorder, type Recorder } from './recorder.ts';
import { compileReadings, type Readings, readHeld, readMoving } from './series.ts';
import { createStage, type Stage } from './stage.ts';
import { loadStage, type Solved, solveStage } from './stage-solve.ts';
import { setUnitBounds } from './units-state.ts';

export const gamma = 1 - Math.SQRT1_2;

/** Weight of (T1 − T0) in the second stage's start. */
const carry = (1 - gamma) / gamma;

export interface Stepper {
  readonly problem: Problem;
  readonly method: Method;
  readonly layout: Layout;
  readonly stage: Stage;
  readonly modes: ChainModes;
  readonly balance: Balance;
  readonly readings: Readings;
  readonly series: Float64Array;
  /** States at the step's start, its first stage and its end; by slot, without what is inside chains. */
  x0: Float64Array;
  x1: Float64Array;
  x2: Float64Array;
  /** Modes of the plants in the first and second stage of the last step. */
  readonly modes1: Uint8Array;
  readonly modes2: Uint8Array;
  readonly solved: Solved;
  /** Slot of the first node that came out without a value in the last step taken, or −1. */
  failedSlot: number;
  host: KernelHost | null;
  iterations: number;
  unconvergedSteps: number;
  worstBalance: number;
}

export function createStepper(problem: Problem, method: Method): Stepper {
  const { network, stepS } = problem;
  const tauS = gamma * stepS;
  const layout = layOut(network, (chains) => {
    const factors = factorChains(chains, network.capacityJPerK, tauS);
    return faintChains(network, chains, factors, tauS);
  });
  const stage = createStage(layout, problem.series, tauS);
  const modes = compileModes(layout.chains, network.capacityJPerK, tauS, carry);
  const state = () => new Float64Array(layout.slotCount);
  return {
    problem,
    method,
    layout,
    stage,
    modes,
    balance: compileBalance(stage, modes),
    readings: compileReadings(problem.series),
    series: new Float64Array(problem.series.length).fill(NaN),
    x0: state(),
    x1: state(),
    x2: state(),
    modes1: new Uint8Array(layout.units.length),
    modes2: new Uint8Array(layout.units.length),
    solved: { iterations: 0, converged: false, singularRow: -1 },
    failedSlot: -1,
    host: null,
    iterations: 0,
    unconvergedSteps: 0,
    worstBalance: 0,
  };
}

/** Sets the state, by node. */
export function placeState(s: Stepper, tempC: Float64Array): void {
  const { layout } = s;
  toSlots(layout, tempC, s.x2);
  s.x1.set(s.x2);
  placeModes(layout.chains, s.modes, s.x2, layout.firstChain);
  openBalance(s.balance, s.modes);
  if (s.host) pushState(s.host, s);
}

/** Copies the state, by node. */
export function readState(s: Stepper, tempC: Float64Array): void {
  if (s.host) pullState(s.host, s);
  const { layout, modes, x2 } = s;
  const { chains, chainSlotA, chainSlotB, firstChain } = layout;
  for (let c = 0; c < chains.count; c++) {
    for (let i = chains.start[c]; i < chains.start[c + 1]; i++) {
      x2[firstChain + i] = insideC(modes, c, i, x2[chainSlotA[c]], x2[chainSlotB[c]], false);
    }
  }
  toNodes(layout, x2, tempC);
}

/** Forgets what was counted so far, and where the records begin is now. */
export function beginRecords(s: Stepper, recorder: Recorder): void {
  s.iterations = 0;
  s.unconvergedSteps = 0;
  s.worstBalance = 0;
  if (s.host) {
    s.host.exports.clear();
    s.host.exports.openRecords();
  } else openRecorder(recorder, s.stage, s.modes, s.x2);
}

/** Moves the stepper into the kernel. */
export function enterKernel(s: Stepper, recorder: Recorder, bytes: Uint8Array): void {
  s.host = createHost(s, recorder, bytes);
}

/**
 * Takes `count` steps (at most `mostSteps`) from step `first` on.
 * @returns steps taken; fewer than `count` where one failed at `failedSlot`
 */
export function takeSteps(
  s: Stepper,
  first: number,
  count: number,
  recorder: Recorder | null,
): number {
  let done = 0;
  if (s.host) done = runInKernel(s.host, s, first, count, recorder);
  else {
    s.failedSlot = -1;
    while (done < count) {
      s.failedSlot = advance(s, first + done, recorder);
      if (s.failedSlot >= 0) break;
      done++;
    }
  }
  if (done < count && s.failedSlot < 0) {
    // The kernel saw the balance without a value.
    if (s.host) pullState(s.host, s);
    s.failedSlot = firstWithout(s, s.x2);
  }
  return done;
}

/**
 * Advances step `k` from the state in `x2` to the new one in `x2`.
 * @returns −1, or the slot of the first node that came out without a value
 */
function advance(s: Stepper, k: number, recorder: Recorder | null): number {
  const { problem, method, stage, solved, series, balance, modes, readings } = s;
  const { units, before } = stage;
  const { chainSlotA, chainSlotB } = s.layout;
  const { toleranceK, maxIterations } = method;
  const spent = s.x0;
  s.x0 = s.x2;
  s.x2 = spent;
  const { x0, x1, x2 } = s;

  if (readHeld(readings, k, series)) holdLoads(stage.loads, series);
  readMoving(readings, k, gamma, series);
  setUnitBounds(units, series, x0, 1);
  units.mode.set(s.modes1);
  // First guesses, which faint couplings start from, go on along the last slope.
  const { rows } = s.layout;
  for (let i = 0; i < rows; i++) x1[i] = x0[i] + (gamma / (1 - gamma)) * (x0[i] - x1[i]);
  loadStage(stage, x0, x0, 1, 0, x1, series);
  addFirstHistory(modes, chainSlotA, chainSlotB, before);
  solveStage(stage, x1, series, k, toleranceK, maxIterations, solved);
  if (solved.singularRow >= 0) return solved.singularRow;
  s.modes1.set(units.mode);
  s.iterations += solved.iterations;
  let converged = solved.converged;
  addStageFlows(balance, stage, modes, x1, series, 1 - gamma);
  if (recorder) addStage(recorder, stage, modes, x1, series, 1 - gamma, true);

  readMoving(readings, k, 1, series);
  setUnitBounds(units, series, x1, gamma);
  units.mode.set(s.modes2);
  for (let i = 0; i < rows; i++) x2[i] = x1[i] + carry * (x1[i] - x0[i]);
  loadStage(stage, x0, x1, 1 - carry, carry, x2, series);
  addSecondHistory(modes, chainSlotA, chainSlotB, x1, before);
  solveStage(stage, x2, series, k, toleranceK, maxIterations, solved);
  if (solved.singularRow >= 0) return solved.singularRow;
  s.modes2.set(units.mode);
  s.iterations += solved.iterations;
  converged = converged && solved.converged;
  addStageFlows(balance, stage, modes, x2, series, gamma);
  if (!converged) s.unconvergedSteps++;
  advanceModes(modes, chainSlotA, chainSlotB, x1, x2);
  const residual = closeStep(balance, x0, x2, modes, problem.stepS);
  if (!(residual <= s.worstBalance)) {
    if (Number.isNaN(residual)) return firstWithout(s, x2);
    s.worstBalance = residual;
  }
  if (recorder) {
    addStage(recorder, stage, modes, x2, series, gamma, false);
    endStep(recorder, stage, modes, x2);
  }
  return -1;
}

/** First row without a number. */
function firstWithout(s: Stepper, x: Float64Array): number {
  const { rows, nodeOfSlot } = s.layout;
  for (let i = 0; i < rows; i++) if (!Number.isFinite(x[i]) && nodeOfSlot[i] >= 0) return i;
  return 0;
}
