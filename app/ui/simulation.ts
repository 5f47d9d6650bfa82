// What one run of the year hands to the window. Arrays hold one value an hour; index h is the hour
// h:00 to h+1:00 of local standard time, counted from 1 January.

import type { Site, WeatherNote } from '../../weather/index.ts';

/** A moment in the year: the index of its hour, or words that the engine already wrote. */
export type When = number | string | null;

export interface TemperatureRange {
  readonly min: number;
  readonly max: number;
  readonly mean: number;
  readonly minAt: When;
  readonly maxAt: When;
}

export const streams = [
  'solar',
  'gains',
  'heating',
  'cooling',
  'opaque',
  'glazing',
  'ground',
  'infiltration',
  'ventilation',
  'rooms',
] as const;

/** A way that heat comes into a room or leaves it. */
export type Stream = (typeof streams)[number];

/** kWh in the year; positive into the room, storage positive when taken up. */
export type BalanceKWh = Readonly<Record<Stream | 'storage' | 'residual', number>>;

export interface Totals {
  readonly floorAreaM2: number;
  readonly heatingKWh: number;
  readonly coolingKWh: number;
  readonly peakHeatingW: number;
  readonly peakHeatingAt: When;
  readonly peakCoolingW: number;
  readonly peakCoolingAt: When;
  readonly airTemperatureC: TemperatureRange;
  readonly operativeTemperatureC: TemperatureRange;
  readonly occupiedHours: number;
  readonly hoursBelowBand: number;
  readonly hoursAboveBand: number;
  readonly degreeHoursBelow: number;
  readonly degreeHoursAbove: number;
  readonly balanceKWh: BalanceKWh;
}

export interface RoomTotals extends Totals {
  readonly id: string;
  readonly name: string;
}

/** The document that `simulate --json` prints. */
export interface Findings {
  readonly project: string;
  readonly weather: { readonly place: string; readonly hours: number; readonly repairs: number };
  readonly stepMinutes: number;
  readonly rooms: readonly RoomTotals[];
  readonly building: Totals;
  readonly quality: {
    readonly relativeBalanceResidual: number;
    readonly unconvergedSteps: number;
    readonly warmUpDays: number;
  };
  readonly timings: {
    readonly readMs: number;
    readonly assembleMs: number;
    readonly runMs: number;
  };
}

export interface RoomSeries {
  readonly id: string;
  readonly name: string;
  readonly floorAreaM2: number;
  readonly airC: Float64Array;
  readonly operativeC: Float64Array;
  readonly meanRadiantC: Float64Array;
  /** Both 0 or more. */
  readonly heatingW: Float64Array;
  readonly coolingW: Float64Array;
  /** NaN in an hour that nobody is in. */
  readonly bandLowC: Float64Array;
  readonly bandHighC: Float64Array;
  /** 1 in an occupied hour, else 0. */
  readonly occupied: Uint8Array;
  /** Positive into the room; storage positive when taken up. */
  readonly flowsW: Readonly<Record<Stream | 'storage', Float64Array>>;
}

/** What is known of the weather beyond its outside air. */
export interface WeatherFacts {
  readonly site: Site;
  /** Data-set form the table was recognised as. */
  readonly form: string;
  /** The calendar that weekdays follow. */
  readonly year: number;
}

export interface Simulation {
  readonly findings: Findings;
  readonly hours: number;
  readonly outdoorC: Float64Array;
  readonly rooms: readonly RoomSeries[];
  readonly weatherNotes: readonly WeatherNote[];
  readonly assumptions: readonly string[];
  readonly weather?: WeatherFacts;
}
