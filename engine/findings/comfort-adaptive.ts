// Bands that follow the running mean of the outdoor air, and the hours outside them.
import {
  americanAdaptiveBand,
  bandExceedance,
  type ComfortBand,
  europeanAdaptiveBand,
  yearRunningMeansC,
} from '../physics/index.ts';

/** One band over the year, in occupied hours. */
export interface AdaptiveFindings {
  readonly band: string;
  /** Document and edition. */
  readonly method: string;
  /** False in a cooled room, for which the method is not made. */
  readonly applies: boolean;
  /** Occupied hours in which the method speaks, and in which the running mean lies outside its range. */
  readonly occupiedHours: number;
  readonly hoursOutOfRange: number;
  readonly hoursBelow: number;
  readonly hoursAbove: number;
  readonly degreeHoursBelow: number;
  readonly degreeHoursAbove: number;
  /** Hours outside over hours judged, 0 to 1. */
  readonly shareOutside: number;
}

/** Running mean of the outdoor air, in each hour that of its day. Source: EN 16798-1:2019, α = 0.8. */
export function runningMeanHoursC(outdoorC: Float64Array): Float64Array {
  const days = outdoorC.length / 24;
  const dailyC = Float64Array.from({ length: days }, (_, d) => {
    let sum = 0;
    for (let h = 24 * d; h < 24 * d + 24; h++) sum += outdoorC[h];
    return sum / 24;
  });
  const meansC = yearRunningMeansC(dailyC);
  return outdoorC.map((_, h) => meansC[Math.floor(h / 24)]);
}

const european = 'EN 16798-1:2019, Annex B, buildings without mechanical cooling';
const american = 'ASHRAE 55-2020, 5.4, occupant-controlled naturally conditioned spaces';

const bands: readonly {
  readonly band: string;
  readonly method: string;
  readonly of: (runningMeanC: number) => ComfortBand | null;
}[] = [
  ...(['I', 'II', 'III'] as const).map((category) => ({
    band: `EN 16798-1 category ${category}`,
    method: european,
    of: (c: number) => europeanAdaptiveBand(c, category),
  })),
  ...([80, 90] as const).map((percent) => ({
    band: `ASHRAE 55, ${percent} % acceptability`,
    method: american,
    of: (c: number) => americanAdaptiveBand(c, percent),
  })),
];

/** All adaptive bands against a room's operative temperatures. */
export function adaptiveFindings(
  operativeC: Float64Array,
  occupied: Uint8Array,
  runningMeanC: Float64Array,
  applies: boolean,
): AdaptiveFindings[] {
  const count = operativeC.length;
  return bands.map(({ band, method, of }) => {
    const low = new Float64Array(count);
    const high = new Float64Array(count);
    const judged = new Uint8Array(count);
    let hoursOutOfRange = 0;
    for (let h = 0; h < count; h++) {
      if (occupied[h] === 0) continue;
      const limits = of(runningMeanC[h]);
      if (!limits) {
        hoursOutOfRange++;
        continue;
      }
      judged[h] = 1;
      low[h] = limits.lowC;
      high[h] = limits.highC;
    }
    return {
      band,
      method,
      applies,
      hoursOutOfRange,
      ...bandExceedance(operativeC, low, high, judged),
    };
  });
}
