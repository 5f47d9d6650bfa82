// Drivers at a moment. A series either holds one value over a step or runs straight between the
// step's ends; the solver asks for it at the two stage times of a step, or for its mean over a span.

import type { Problem, Series } from './problem.ts';

/** Value of a series `share` of the way through step `step` (0 at its start, 1 at its end). */
export function seriesAt(series: Series, step: number, share: number): number {
  const { values } = series;
  if (series.hold === 'step') return values[step];
  if (series.hold === 'ramp')
    return values[2 * step] + share * (values[2 * step + 1] - values[2 * step]);
  return values[step] + share * (values[step + 1] - values[step]);
}

/** Series apart by whether they move within a step. */
export interface Readings {
  readonly series: readonly Series[];
  readonly held: Int32Array;
  readonly moving: Int32Array;
  /** 1 where a moving series is linear, 0 where it ramps. */
  readonly isLinear: Int32Array;
}

export function compileReadings(series: readonly Series[]): Readings {
  const pick = (isHeld: boolean) =>
    Int32Array.from(series.keys()).filter((i) => (series[i].hold === 'step') === isHeld);
  const moving = pick(false);
  const isLinear = moving.map((i) => (series[i].hold === 'linear' ? 1 : 0));
  return { series, held: pick(true), moving, isLinear };
}

/** Reads the held series of a step into `out`; true where any differs from what was there. */
export function readHeld(readings: Readings, step: number, out: Float64Array): boolean {
  const { series, held } = readings;
  let changed = false;
  for (let k = 0; k < held.length; k++) {
    const i = held[k];
    const v = series[i].values[step];
    if (v === out[i]) continue;
    out[i] = v;
    changed = true;
  }
  return changed;
}

/** Reads the moving series at `share` of a step into `out`. */
export function readMoving(
  readings: Readings,
  step: number,
  share: number,
  out: Float64Array,
): void {
  const { series, moving } = readings;
  for (let k = 0; k < moving.length; k++) {
    const { values, hold } = series[moving[k]];
    const at = hold === 'ramp' ? 2 * step : step;
    const v = values[at];
    out[moving[k]] = values[at + 1] === v ? v : v + share * (values[at + 1] - v);
  }
}

/** All series at `share` of step `step`, written into `out`, one entry a series. */
export function readSeries(
  all: readonly Series[],
  step: number,
  share: number,
  out: Float64Array,
): void {
  for (let i = 0; i < all.length; i++) {
    const { values, hold } = all[i];
    const at = hold === 'ramp' ? 2 * step : step;
    const v = values[at];
    out[i] = hold === 'step' || values[at + 1] === v ? v : v + share * (values[at + 1] - v);
  }
}

/**
 * Time mean of a series over steps `from` to `to` (exclusive). Infinite values (a set-point that
 * switches a plant off) are left out where finite ones exist.
 */
export function seriesMean(series: Series, from: number, to: number): number {
  let sum = 0;
  let count = 0;
  let infinite = NaN;
  for (let k = from; k < to; k++) {
    const v = seriesAt(series, k, 0.5); // the middle of a straight line is its mean
    if (Number.isFinite(v)) {
      sum += v;
      count++;
    } else infinite = v;
  }
  return count > 0 ? sum / count : infinite;
}

/** Means of all series over `steps` steps from step `from`. */
export function seriesMeans(problem: Problem, from: number, steps: number): Float64Array {
  return Float64Array.from(problem.series, (s) => seriesMean(s, from, from + steps));
}
