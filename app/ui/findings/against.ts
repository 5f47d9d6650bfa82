// Each answer set against the base: the difference, and what it is sure to.
//
// Both runs of a pair are cut alike, coarse with coarse and full with full, so that what both get wrong
// alike cancels. Where all four are there, Richardson's estimate says what the step leaves unsure: walls
// are cut with the step, so what is left falls in first order, and with steps in the ratio 4 (60 and
// 15 min) the error of the finer run is |D(4h) − D(h)|/(4 − 1).

import type { Simulation } from '../simulation.ts';
import type { Answered } from '../state/index.ts';
import type { Answer } from './answers.ts';

export interface Against {
  /** In the unit shown. */
  readonly base: number;
  readonly difference: number;
  /** Of the difference; null while only coarse runs, or only full ones, are there. */
  readonly plusMinus: number | null;
  /** The difference is more than its ±, and more than the last digit shown. */
  readonly isSure: boolean;
}

/** The present house and its base, each as far as it has been run. */
export interface Pair {
  readonly now: Answered;
  readonly base: Answered;
}

const stepRatio = 4;

/**
 * @param answersOf the answers of a simulation, in any order
 * @returns by the key of the answer; empty where the two cannot be compared yet
 */
export function setAgainst(
  { now, base }: Pair,
  answersOf: (simulation: Simulation) => readonly Answer[],
): ReadonlyMap<string, Against> {
  const found = new Map<string, Against>();
  const cut = now.full && base.full ? 'full' : now.coarse && base.coarse ? 'coarse' : null;
  if (cut === null) return found;
  const valuesOf = (simulation: Simulation | null) =>
    new Map(simulation ? answersOf(simulation).map((one) => [one.key, one.value]) : []);
  const isBoth = now.full && now.coarse && base.full && base.coarse;
  const [nowCoarse, baseCoarse] = isBoth
    ? [valuesOf(now.coarse), valuesOf(base.coarse)]
    : [null, null];
  const baseValues = valuesOf(base[cut]);
  const simulation = now[cut];
  if (!simulation) return found;
  for (const { key, value, decimals } of answersOf(simulation)) {
    const old = baseValues.get(key);
    if (old === undefined || !Number.isFinite(value) || !Number.isFinite(old)) continue;
    const difference = value - old;
    const plusMinus =
      nowCoarse && baseCoarse
        ? Math.abs((nowCoarse.get(key) ?? NaN) - (baseCoarse.get(key) ?? NaN) - difference) /
          (stepRatio - 1)
        : null;
    const least = 0.5 * 10 ** -decimals;
    const isSure = Math.abs(difference) >= Math.max(least, plusMinus ?? 0);
    found.set(key, { base: old, difference, plusMinus, isSure });
  }
  return found;
}
