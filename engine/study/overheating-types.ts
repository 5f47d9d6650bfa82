// What the study of overheating is asked and what it answers.
import type { AccuracyCheck } from './accuracy.ts';
import type { Judged, JudgeOptions, MethodId, Verdict } from './judge.ts';
import type { Drivers, WorstDays } from './worst-days.ts';

export interface OverheatingOptions extends Omit<JudgeOptions, 'methods'> {
  /** Keys of weathers at hand; the first is the one that is looked into, the others are verdicts only. */
  readonly weathers: readonly string[];
  readonly stepMinutes: number;
  readonly methods: readonly MethodId[];
  readonly accuracy: AccuracyCheck;
  readonly trials: boolean;
}

export const overheatingDefaults = {
  stepMinutes: 15,
  methods: ['tm52'] as readonly MethodId[],
  region: 'B',
  dwelling: true,
  bandShare: 0.03,
  accuracy: 'coarser',
  trials: true,
} as const;

export interface RoomOverheating {
  readonly room: string;
  readonly name: string;
  /** False: the room has no occupied hours, so nothing is judged. */
  readonly judged: boolean;
  readonly verdicts: readonly Verdict[];
  /** Methods not asked for that would fail, so that nothing is passed by choice of method unsaid. */
  readonly wouldFail: readonly MethodId[];
  readonly passed: boolean;
  readonly highestOperativeC: number;
  readonly highestAt: string;
  readonly hoursAboveBand: number;
  readonly degreeHoursAbove: number;
  readonly hotNightHours: number;
  readonly worst: WorstDays | null;
  readonly drivers: Drivers | null;
}

export interface TrialResult {
  readonly id: string;
  readonly name: string;
  readonly what: string;
  /** More than one: several changes together. */
  readonly parts: readonly string[];
  readonly roomsFailing: readonly string[];
  /** Sum over rooms and criteria of what is left above the limits, as a share of each limit. */
  readonly severity: number;
  readonly heatingKWh: number;
  readonly rooms: readonly {
    readonly room: string;
    readonly criteria: readonly Omit<Judged, 'uncertainty' | 'atLimit'>[];
  }[];
}

export interface Overheating {
  readonly study: 'overheating';
  readonly project: string;
  readonly options: OverheatingOptions;
  readonly methods: readonly string[];
  readonly weather: string;
  readonly accuracy: string | null;
  readonly rooms: readonly RoomOverheating[];
  readonly base: TrialResult;
  /** Single changes first, from the best; then combinations. */
  readonly trials: readonly TrialResult[];
  /** The best single change that cures every room; else the first combination; null: none does. */
  readonly cure: string | null;
  readonly otherWeathers: readonly {
    readonly weather: string;
    readonly place: string;
    readonly roomsFailing: readonly string[];
  }[];
  readonly notes: readonly string[];
  readonly cautions: readonly string[];
}
