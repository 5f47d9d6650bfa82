// What sizing is asked and what it answers.
import { designConditions, type WeatherYear } from '../../weather/index.ts';
import type { PeakHour } from './peak-hour.ts';
import type { Side } from './room-plants.ts';
import type { SizeOutcome } from './sizes-job.ts';
import type { SteadyLoad, SteadyLoadOptions } from './steady-load.ts';

export interface SizeOptions extends SteadyLoadOptions {
  /** Key of the weather among those at hand. */
  readonly weather: string;
  readonly stepMinutes: number;
  /** Longest warm-up after a set-back on the design day. */
  readonly warmUpH: number;
  /** On top of the greater of steady load and design spell, 0.1 for a tenth. */
  readonly marginShare: number;
  /** Sizes come in steps: emitters (room chillers), and the plant that serves them. */
  readonly roomStepW: number;
  readonly plantStepW: number;
  /** Adds ideal cooling to this operative set-point in rooms without chiller; null: only rooms that have one. */
  readonly coolToC: number | null;
  /** Into how many jobs the curve is cut: the number of workers. */
  readonly pieces: number;
}

export const sizeDefaults = {
  stepMinutes: 30,
  leastAirChangesPerH: 0.5,
  reheatWPerM2: 0,
  warmUpH: 2,
  marginShare: 0.1,
  roomStepW: 50,
  plantStepW: 500,
  coolToC: null,
  pieces: 1,
} as const;

/** Design temperature where none is given: exceeded in 99.6 % of the table's hours. */
export function defaultDesignOutdoorC(weather: WeatherYear): number {
  return Math.round(designConditions(weather).heating996C * 10) / 10;
}

/** One room's way to its size. */
export interface SizedRoom {
  readonly room: string;
  readonly name: string;
  /** Steady load with supplement (heating), peak of the design day (cooling). */
  readonly designW: number;
  /** Heating: power that keeps the warm-up on the design spell within its limit; null where none tried does. Cooling: peak of the year. */
  readonly dynamicW: number | null;
  readonly chosenW: number;
  /** As found, Infinity without limit; NaN where the room has no plant of its own. */
  readonly presentW: number;
  /** How the size came about, in a sentence. */
  readonly why: string;
}

/** The year with all rooms at one share of the chosen sizes. */
export interface CurvePoint {
  readonly share: number;
  readonly totalW: number;
  readonly outcome: SizeOutcome;
}

/** How long the warm-up takes on the design spell with so much of the steady load. */
export interface WarmUpPoint {
  readonly share: number;
  readonly totalW: number;
  /** Slowest room; null: it is never warm. */
  readonly warmUpH: number | null;
  readonly rooms: readonly { readonly room: string; readonly warmUpH: number | null }[];
}

export interface SideSizing {
  readonly side: Side;
  readonly rooms: readonly SizedRoom[];
  readonly sumW: number;
  /** Greatest hour of all rooms together with the chosen sizes, over their sum. */
  readonly coincidentPeakW: number;
  readonly coincidenceShare: number;
  /** Plant in the user's steps. */
  readonly plantW: number;
  /** From the smallest to the largest. */
  readonly curve: readonly CurvePoint[];
  /** The year with what is there now; null where some room has no limit. */
  readonly present: CurvePoint | null;
  readonly warmUp: readonly WarmUpPoint[];
  /** Day of the design spell's end, or of the design day. */
  readonly designDay: string;
  readonly peak: PeakHour | null;
}

export interface Sizing {
  readonly study: 'size';
  readonly project: string;
  readonly options: SizeOptions;
  readonly steady: SteadyLoad;
  /** Null where no room is heated (cooled). */
  readonly heating: SideSizing | null;
  readonly cooling: SideSizing | null;
  readonly notes: readonly string[];
  readonly cautions: readonly string[];
}
