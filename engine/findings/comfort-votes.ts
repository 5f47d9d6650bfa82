// Predicted mean vote hour by hour, and what of it counts.
import {
  cloM2KPerW,
  metWPerM2,
  predictedDissatisfied,
  predictedMeanVote,
} from '../physics/index.ts';

export interface VoteFindings {
  /** Document and edition. */
  readonly method: string;
  readonly meanVote: number;
  readonly coldestVote: number;
  readonly warmestVote: number;
  /** Mean share of dissatisfied people in occupied hours, 0 to 1. */
  readonly meanDissatisfied: number;
  /** Occupied hours by category: I within ±0.2, II ±0.5, III ±0.7, outside beyond. Each hour counts once. */
  readonly hoursByCategory: {
    readonly I: number;
    readonly II: number;
    readonly III: number;
    readonly outside: number;
  };
  /** Hours warmer (colder) than the room's category allows, each weighted by PPD over the limit's PPD. */
  readonly weightedHoursWarm: number;
  readonly weightedHoursCold: number;
}

/** Vote at which a category ends. Source: EN 16798-1:2019, Table B.1 (from memory). */
const voteLimit = { I: 0.2, II: 0.5, III: 0.7 } as const;

/**
 * Clothing that people choose by the outdoor temperature at six in the morning.
 *
 * Source: ASHRAE 55-2020, 5.2.2.2 (after Schiavon and Lee 2013; from memory: the four pieces join).
 */
export function morningClothingClo(outdoorAtSixC: number): number {
  if (outdoorAtSixC < -5) return 1;
  if (outdoorAtSixC < 5) return 0.818 - 0.0364 * outdoorAtSixC;
  return outdoorAtSixC < 26 ? 10 ** (-0.1635 - 0.0066 * outdoorAtSixC) : 0.46;
}

/** What votes are reckoned from, one value an hour. */
export interface VoteHours {
  readonly airC: Float64Array;
  readonly meanRadiantC: Float64Array;
  readonly occupied: Uint8Array;
  /** Left out: by the weather. */
  readonly clothingClo: Float64Array | null;
  readonly metRate: Float64Array;
  readonly outdoorC: Float64Array;
  readonly airMPerS: number;
  readonly relativeHumidity: number | Float64Array;
}

/** Vote of each occupied hour; NaN in all others. Source: ISO 7730:2005. */
export function hourlyVotes(hours: VoteHours): Float64Array {
  const { airC, meanRadiantC, occupied, clothingClo, metRate, outdoorC, relativeHumidity } = hours;
  const votes = new Float64Array(airC.length).fill(Number.NaN);
  for (let h = 0; h < votes.length; h++) {
    if (occupied[h] === 0) continue;
    const clo = clothingClo ? clothingClo[h] : morningClothingClo(outdoorC[h - (h % 24) + 6]);
    votes[h] = predictedMeanVote({
      airC: airC[h],
      meanRadiantC: meanRadiantC[h],
      airMPerS: hours.airMPerS,
      relativeHumidity:
        typeof relativeHumidity === 'number' ? relativeHumidity : relativeHumidity[h],
      metabolicWPerM2: metRate[h] * metWPerM2,
      workWPerM2: 0,
      clothingM2KPerW: clo * cloM2KPerW,
    }).pmv;
  }
  return votes;
}

/** Counts of a year of votes; null where nobody ever is there. Source: EN 15251:2007, Annex F, method C. */
export function voteFindings(
  votes: Float64Array,
  category: keyof typeof voteLimit,
): VoteFindings | null {
  const limit = voteLimit[category];
  const atLimit = predictedDissatisfied(limit);
  const byCategory = { I: 0, II: 0, III: 0, outside: 0 };
  let count = 0;
  let sum = 0;
  let dissatisfied = 0;
  let coldest = Number.POSITIVE_INFINITY;
  let warmest = Number.NEGATIVE_INFINITY;
  let warm = 0;
  let cold = 0;
  for (const vote of votes) {
    if (Number.isNaN(vote)) continue;
    const share = predictedDissatisfied(vote);
    count++;
    sum += vote;
    dissatisfied += share;
    coldest = Math.min(coldest, vote);
    warmest = Math.max(warmest, vote);
    byCategory[categoryOf(Math.abs(vote))]++;
    if (vote > limit) warm += share / atLimit;
    if (vote < -limit) cold += share / atLimit;
  }
  if (count === 0) return null;
  return {
    method: 'ISO 7730:2005; categories of EN 16798-1:2019; weighting of EN 15251:2007, method C',
    meanVote: sum / count,
    coldestVote: coldest,
    warmestVote: warmest,
    meanDissatisfied: dissatisfied / count,
    hoursByCategory: byCategory,
    weightedHoursWarm: warm,
    weightedHoursCold: cold,
  };
}

function categoryOf(size: number): keyof VoteFindings['hoursByCategory'] {
  if (size <= voteLimit.I) return 'I';
  if (size <= voteLimit.II) return 'II';
  return size <= voteLimit.III ? 'III' : 'outside';
}
