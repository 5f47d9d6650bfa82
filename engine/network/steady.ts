// Steady state of a network: the stage equation without storage, plants and nonlinear laws included.

import { steadyInside } from './chain-sweeps.ts';
import { holdLoads } from './driver-loads.ts';
import { type Layout, layOut, toNodes } from './layout.ts';
import type { Method, Problem } from './problem.ts';
import { readSeries, seriesMeans } from './series.ts';
import { createStage } from './stage.ts';
import { loadStage, type Solved, solveStage } from './stage-solve.ts';
import { setUnitBounds } from './units-state.ts';

/** Drivers held for ever: those in the middle of one step, or the means of `steps` steps from step `from` (0). */
export type Held =
  | { readonly kind: 'step'; readonly step: number }
  | { readonly kind: 'mean'; readonly steps: number; readonly from?: number };

export interface SteadyState {
  readonly tempC: Float64Array;
  /** Power of each plant, 0 or more. */
  readonly plantW: Float64Array;
  readonly iterations: number;
  readonly converged: boolean;
}

/** Rounds are cheap here, and the first guess is far away. */
const leastIterations = 100;

/** Temperatures and plant powers that stay as they are under constant drivers. */
export function steadyState(problem: Problem, held: Held, method: Method): SteadyState {
  const layout = layOut(problem.network);
  const series =
    held.kind === 'mean'
      ? seriesMeans(problem, held.from ?? 0, held.steps)
      : new Float64Array(problem.series.length);
  if (held.kind === 'step') readSeries(problem.series, held.step, 0.5, series);
  const stage = createStage(layout, problem.series, Infinity);
  const x = new Float64Array(layout.slotCount);
  x.fill(meanBoundaryC(layout, series));
  setUnitBounds(stage.units, series, x, 1);
  const solved: Solved = { iterations: 0, converged: false, singularRow: -1 };
  const most = Math.max(leastIterations, method.maxIterations);
  const step = held.kind === 'step' ? held.step : 0;
  holdLoads(stage.loads, series);
  loadStage(stage, x, x, 0, 0, x, series);
  solveStage(stage, x, series, step, method.toleranceK, most, solved);
  if (solved.singularRow >= 0) {
    const node = layout.nodeOfSlot[solved.singularRow];
    const name = node >= 0 ? problem.network.nodeNames[node] : 'a plant';
    throw new Error(`no steady state: ${name} is not tied to any boundary`);
  }
  const { chains, chainSlotA, chainSlotB, firstChain } = layout;
  steadyInside(chains, stage.chain, chainSlotA, chainSlotB, firstChain, x);
  const tempC = new Float64Array(layout.slotOfNode.length);
  toNodes(layout, x, tempC);
  const plantW = new Float64Array(problem.network.plants.length);
  layout.units.forEach((unit, u) => {
    const power = x[layout.rowOfUnit[u]];
    if (unit.heater >= 0) plantW[unit.heater] = Math.max(0, power);
    if (unit.chiller >= 0) plantW[unit.chiller] = Math.max(0, -power);
  });
  return { tempC, plantW, iterations: solved.iterations, converged: solved.converged };
}

/** A first guess for every node: the mean of the boundaries, 20 °C without any. */
function meanBoundaryC(layout: Layout, series: Float64Array): number {
  const { fixedSeries } = layout;
  if (fixedSeries.length === 0) return 20;
  return fixedSeries.reduce((sum, s) => sum + series[s], 0) / fixedSeries.length;
}
