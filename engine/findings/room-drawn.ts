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
  /** Change of the miss with the share, as far as it is known. */
  readonly slope: Float64Array;
}

export interface DrawnPasses {
  readonly next: ReadonlyMap<string, Float64Array>;
  readonly last: ReadonlyMap<string, Pass>;
  /** Mean distance of the shares in the run from those of the next, 0 to 1, where they may be drawn. */
  readonly gapShare: number;
}

/** Settled where the mean distance is this small; given up after so many runs. */
export const settledShare = 0.01;
export const mostPasses = 8;

/** A first guess of the slope, and its bounds: a blind may cool a glass room by many bands. */
const firstSlope = -3;
const [steepest, flattest] = [-40, -1];
/** Smaller moves of the share tell nothing of the slope. */
const leastMove = 0.03;

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
      const slope = old ? old.slope.slice() : new Float64Array(run.records).fill(firstSlope);
      const moved = new Float64Array(run.records);
      for (let h = 0; h < run.records; h++) {
        const airC = run.meanC[h * recordNodes.length + column];
        miss[h] = (airC - roomAboveC) / bandK - share[h];
        const step = old ? share[h] - old.share[h] : 0;
        if (old && Math.abs(step) >= leastMove)
          slope[h] = Math.min(flattest, Math.max(steepest, (miss[h] - old.miss[h]) / step));
        moved[h] = Math.min(1, Math.max(0, share[h] - miss[h] / slope[h]));
        if (allowedHours[h] === 0) continue;
        gap += Math.abs(moved[h] - share[h]);
        hours++;
      }
      next.set(key, moved);
      last.set(key, { share, miss, slope });
    }
  }
  return { next, last, gapShare: hours > 0 ? gap / hours : 0 };
}

/** What was assumed, as a sentence. */
export function drawnText(passes: number, gapShare: number): string {
  const state =
    gapShare <= settledShare
      ? `another run would move them by ${(100 * gapShare).toFixed(1)} % of the glass in the mean`
      : `another run would still move them by ${(100 * gapShare).toFixed(1)} % of the glass in the mean: take the shading by room temperature as approximate`;
  return `Coverings by room temperature follow the mean air temperature of each hour, found in ${passes} runs of the year; ${state}.`;
}
