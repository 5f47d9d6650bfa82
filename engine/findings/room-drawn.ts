// Coverings that ask for the room's temperature: over which share of each hour they are drawn, found by
// running the year again until what was drawn and what the room asks for agree.
import type { Assembly } from '../assembly/index.ts';
import type { Run } from '../network/index.ts';

/** One pass of one covering, hour by hour. */
interface Pass {
  /** Share that was drawn in the run. */
  readonly share: Float64Array;
  /** What the room asked for, unbounded, less what was drawn. */
  readonly miss: Float64Array;
}

export interface DrawnPasses {
  readonly next: ReadonlyMap<string, Float64Array>;
  readonly last: ReadonlyMap<string, Pass>;
  /** Mean distance of the share in the run from the one its temperatures ask for, 0 to 1. */
  readonly gapShare: number;
}

/** Settled where the mean distance is this small; given up after so many runs. */
export const settledShare = 0.02;
export const mostPasses = 8;

/** Change of the miss with the share: a first guess, and its bounds (a blind may cool by many bands). */
const firstSlope = -3;
const [steepest, flattest] = [-30, -1];

/**
 * The rule: of what its other conditions allow, a covering is drawn over (T_air − limit)/band, 0 to 1,
 * by the hour's own mean air temperature. Each run moves every hour by its own secant (a quasi-Newton
 * step with a diagonal slope), since what is drawn in an hour acts most on that hour.
 */
export function nextDrawn(assembly: Assembly, run: Run, before: DrawnPasses | null): DrawnPasses {
  const { recordNodes } = run.problem;
  const next = new Map<string, Float64Array>();
  const last = new Map<string, Pass>();
  let gap = 0;
  let hours = 0;
  for (const parts of assembly.rooms) {
    const column = recordNodes.indexOf(parts.airNode);
    for (const { key, roomAboveC, bandK, allowedHours } of parts.windows.flatMap((w) => w.byRoom)) {
      const share = before?.next.get(key) ?? new Float64Array(run.records);
      const old = before?.last.get(key);
      const miss = new Float64Array(run.records);
      const moved = new Float64Array(run.records);
      for (let h = 0; h < run.records; h++) {
        const airC = run.meanC[h * recordNodes.length + column];
        const asked = (airC - roomAboveC) / bandK;
        miss[h] = asked - share[h];
        const secant = old ? (miss[h] - old.miss[h]) / (share[h] - old.share[h]) : firstSlope;
        const slope = Number.isFinite(secant)
          ? Math.min(flattest, Math.max(steepest, secant))
          : firstSlope;
        moved[h] = bounded(share[h] - miss[h] / slope);
        if (allowedHours[h] === 0) continue;
        gap += Math.abs(bounded(asked) - share[h]);
        hours++;
      }
      next.set(key, moved);
      last.set(key, { share, miss });
    }
  }
  return { next, last, gapShare: hours > 0 ? gap / hours : 0 };
}

const bounded = (share: number) => Math.min(1, Math.max(0, share));

/** What was assumed, as a sentence. */
export function drawnText(passes: number, gapShare: number): string {
  const state =
    gapShare <= settledShare
      ? `agree to ${(100 * gapShare).toFixed(1)} % of the glass`
      : `still differ by ${(100 * gapShare).toFixed(1)} % of the glass: take the shading by room temperature as approximate`;
  return `Coverings by room temperature were found in ${passes} runs of the year; what was drawn and what the hourly temperatures ask for ${state} in the mean.`;
}
