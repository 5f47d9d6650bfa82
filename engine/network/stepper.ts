// Time integration: SDIRK2, two implicit stages with one matrix, L-stable and stiffly accurate.
//
//   γ = 1 − √2/2;  C·(T1 − T0) = γh·f(t + γh, T1);  C·(T2 − T0) = (1 − γ)h·f1 + γh·f(t + h, T2).
//
// With f1 = C·(T1 − T0)/(γh) the second stage reads like the first, started from
// T0 + (1 − γ)/γ·(T1 − T0): no explicit stage, and massless nodes obey their balance at both.
//
// Source: R. Alexander, "Diagonally implicit Runge-Kutta methods for stiff O.D.E.'s", SIAM J. Numer.
// Anal. 14 (1977) 1006-1021, doi:10.1137/0714068.

import { addStageFlows, type Balance, closeStep, compileBalance } from './balance.ts';
import { type Layout, layOut } from './layout.ts';
import type { Method, Problem } from './problem.ts';
import { addStage, endStep, type Recorder } from './recorder.ts';
import { readSeries } from './series.ts';
import { createStage, type Stage } from './stage.ts';
import { type Solved, solveStage } from './stage-solve.ts';
import { setUnitBounds } from './units-state.ts';

export const gamma = 1 - Math.SQRT1_2;

/** Weight of (T1 − T0) in the second stage's start. */
const carry = (1 - gamma) / gamma;

export interface Stepper {
  readonly problem: Problem;
  readonly method: Method;
  readonly layout: Layout;
  readonly stage: Stage;
  readonly balance: Balance;
  readonly series: Float64Array;
  /** Whether any driver differs between the stages of a step. */
  readonly hasLinear: boolean;
  /** States at the step's start, its first stage and its end; by slot. */
  x0: Float64Array;
  x1: Float64Array;
  x2: Float64Array;
  /** Modes of the plants in the first and second stage of the last step. */
  readonly modes1: Uint8Array;
  readonly modes2: Uint8Array;
  readonly solved: Solved;
  iterations: number;
  unconvergedSteps: number;
  worstBalance: number;
}

export function createStepper(problem: Problem, method: Method): Stepper {
  const layout = layOut(problem.network);
  const stage = createStage(layout, gamma * problem.stepS);
  const state = () => new Float64Array(layout.slotCount);
  return {
    problem,
    method,
    layout,
    stage,
    balance: compileBalance(stage),
    series: new Float64Array(problem.series.length),
    hasLinear: problem.series.some((one) => one.hold === 'linear'),
    x0: state(),
    x1: state(),
    x2: state(),
    modes1: new Uint8Array(layout.units.length),
    modes2: new Uint8Array(layout.units.length),
    solved: { iterations: 0, converged: false, singularRow: -1 },
    iterations: 0,
    unconvergedSteps: 0,
    worstBalance: 0,
  };
}

/**
 * Advances step `k` from the state in `x2` to the new one in `x2`.
 * @returns −1, or the slot of the first node that came out without a value
 */
export function advance(s: Stepper, k: number, recorder: Recorder | null): number {
  const { problem, method, stage, solved, series, balance } = s;
  const { units } = stage;
  const spent = s.x0;
  s.x0 = s.x2;
  s.x2 = spent;
  const { x0, x1, x2 } = s;
  const { rows } = s.layout;

  // First guesses go on along the last slope; exact wherever nothing bends.
  readSeries(problem.series, k, gamma, series);
  setUnitBounds(units, series, x0, 1);
  for (let i = s.layout.firstState; i < rows; i++) {
    x1[i] = x0[i] + (gamma / (1 - gamma)) * (x0[i] - x1[i]);
  }
  units.mode.set(s.modes1);
  const { toleranceK, maxIterations } = method;
  solveStage(stage, x0, x0, 1, 0, x1, series, k, toleranceK, maxIterations, solved);
  if (solved.singularRow >= 0) return solved.singularRow;
  s.modes1.set(units.mode);
  s.iterations += solved.iterations;
  let converged = solved.converged;
  addStageFlows(balance, stage, x1, series, 1 - gamma);
  if (recorder) addStage(recorder, stage, x1, 1 - gamma);

  if (s.hasLinear) readSeries(problem.series, k, 1, series);
  setUnitBounds(units, series, x1, gamma);
  for (let i = s.layout.firstState; i < rows; i++) x2[i] = x1[i] + carry * (x1[i] - x0[i]);
  units.mode.set(s.modes2);
  solveStage(stage, x0, x1, 1 - carry, carry, x2, series, k, toleranceK, maxIterations, solved);
  if (solved.singularRow >= 0) return solved.singularRow;
  s.modes2.set(units.mode);
  s.iterations += solved.iterations;
  converged = converged && solved.converged;
  addStageFlows(balance, stage, x2, series, gamma);
  if (!converged) s.unconvergedSteps++;
  const residual = closeStep(balance, x0, x2, problem.stepS);
  if (!(residual <= s.worstBalance)) {
    if (Number.isNaN(residual)) return firstWithout(s, x2);
    s.worstBalance = residual;
  }
  if (recorder) {
    addStage(recorder, stage, x2, gamma);
    endStep(recorder, stage, x2, k);
  }
  return -1;
}

/** First slot without a number. */
function firstWithout(s: Stepper, x: Float64Array): number {
  for (let i = 0; i < s.layout.slotCount; i++) {
    if (!Number.isFinite(x[i]) && s.layout.nodeOfSlot[i] >= 0) return i;
  }
  return 0;
}
