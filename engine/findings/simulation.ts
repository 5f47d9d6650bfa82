// What one run of a building gives: findings as figures, and the hours behind them.
import type { WeatherNote } from '../../weather/index.ts';
import type { SpaceEnergy, SupplyFindings } from './final-energy.ts';
import type { MoistureFindings } from './moisture.ts';
import type { RoomComfort } from './room-comfort.ts';

/** Highest, lowest and mean over the year, with the start of the hour in local standard time. */
export interface Extremes {
  readonly min: number;
  readonly max: number;
  readonly mean: number;
  readonly minAt: string;
  readonly maxAt: string;
}

/**
 * Heat over the year [kWh]. All lines but the last two are heat into the room (cooling and losses are
 * negative); `storage` is what air and masses took up; `residual` is what does not add up.
 */
export interface BalanceKWh {
  readonly solar: number;
  readonly gains: number;
  readonly heating: number;
  readonly cooling: number;
  readonly opaque: number;
  readonly glazing: number;
  readonly ground: number;
  readonly infiltration: number;
  readonly ventilation: number;
  readonly rooms: number;
  readonly storage: number;
  readonly residual: number;
}

/** Seven days from `from` (YYYY-MM-DD) with the most degree hours outside the band. */
export interface WorstWeek {
  readonly from: string;
  readonly firstHour: number;
  readonly degreeHours: number;
}

/** Figures of one room, or of the whole building. Energy that is bought is there where carriers are named. */
export interface SpaceFindings extends Partial<SpaceEnergy> {
  readonly floorAreaM2: number;
  readonly heatingKWh: number;
  readonly coolingKWh: number;
  /** Greatest hourly mean; `…At` is the start of that hour, empty where there was none. */
  readonly peakHeatingW: number;
  readonly peakHeatingAt: string;
  readonly peakCoolingW: number;
  readonly peakCoolingAt: string;
  readonly airTemperatureC: Extremes;
  readonly operativeTemperatureC: Extremes;
  readonly occupiedHours: number;
  readonly hoursBelowBand: number;
  readonly hoursAboveBand: number;
  readonly degreeHoursBelow: number;
  readonly degreeHoursAbove: number;
  readonly heatingByMonthKWh: readonly number[];
  readonly coolingByMonthKWh: readonly number[];
  readonly balanceKWh: BalanceKWh;
}

export interface RoomFindings extends SpaceFindings, RoomComfort {
  readonly id: string;
  readonly name: string;
  readonly worstWeekBelow: WorstWeek | null;
  readonly worstWeekAbove: WorstWeek | null;
  /** Hours in which the heater (chiller) gave all it had and the set-point was missed by more than 0.2 K. */
  readonly hoursHeatingShort: number;
  readonly hoursCoolingShort: number;
  /** Vapour that people give off, as heat [kWh]; 0 where they are not counted by heads. */
  readonly latentGainsKWh?: number;
  /** Humidity and damp; where any room of the project asks for the vapour balance. */
  readonly moisture?: MoistureFindings;
}

/** A window over the year, beside its values under standard conditions. */
export interface WindowFindings {
  readonly room: string;
  readonly surface: string;
  readonly opening: string;
  readonly areaM2: number;
  /** ISO 10077-1 and EN 673; EN 410 with the frame's part. */
  readonly uValueWPerM2K: number;
  readonly gValue: number;
  /** Mean over the dark hours in which the room was heated; null where there were none. */
  readonly seenUValueWPerM2K: number | null;
  readonly seenHours: number;
  /** Sunlight on the glass, shades taken off, and what came through; null where none fell on it. */
  readonly incidentKWh: number;
  readonly transmittedKWh: number;
  readonly transmittedShare: number | null;
  /** Hours of covering over the whole glass; null without. */
  readonly blindHours: number | null;
  readonly nightInsulationHours: number | null;
}

export interface RunQuality {
  /** Largest imbalance in any step of the network, or over the year in any room, over the throughput. */
  readonly relativeBalanceResidual: number;
  readonly unconvergedSteps: number;
  readonly warmUpDays: number;
  readonly warmUpDriftK: number;
  readonly nodes: number;
}

/** Everything `simulate --json` prints. */
export interface Findings {
  readonly project: string;
  readonly weather: {
    readonly place: string;
    readonly form: string;
    readonly hours: number;
    readonly repairs: readonly WeatherNote[];
  };
  readonly stepMinutes: number;
  readonly rooms: readonly RoomFindings[];
  readonly building: SpaceFindings;
  /** Machines behind the rooms, and the currency of all costs, where carriers are named. */
  readonly supplies?: readonly SupplyFindings[];
  readonly currency?: string;
  readonly windows?: readonly WindowFindings[];
  readonly assumptions: readonly string[];
  readonly cautions: readonly string[];
  readonly quality: RunQuality;
  readonly timings: {
    readonly readMs: number;
    readonly assembleMs: number;
    readonly runMs: number;
  };
}

/** Mean heat into the room in each hour [W]; `cooling` is negative, `storage` positive when taken up. */
export type HourlyFlows = Readonly<Record<Exclude<keyof BalanceKWh, 'residual'>, Float64Array>>;

/** One value an hour. Band limits hold all day (NaN without a band); they are judged where `occupied` is 1. */
export interface RoomHours {
  readonly id: string;
  readonly name: string;
  readonly floorAreaM2: number;
  readonly airC: Float64Array;
  readonly meanRadiantC: Float64Array;
  readonly operativeC: Float64Array;
  /** Both 0 or more. */
  readonly heatingW: Float64Array;
  readonly coolingW: Float64Array;
  readonly bandLowC: Float64Array;
  readonly bandHighC: Float64Array;
  readonly occupied: Uint8Array;
  /** Predicted mean vote, NaN in empty hours; where votes were asked for. */
  readonly vote?: Float64Array;
  /** Share, 0 to 1; where the run has a vapour balance. */
  readonly relativeHumidity?: Float64Array;
  readonly flowsW: HourlyFlows;
}

export interface Simulation {
  readonly findings: Findings;
  readonly hours: number;
  /** Year whose calendar the hours are laid on. */
  readonly year: number;
  readonly outdoorC: Float64Array;
  readonly rooms: readonly RoomHours[];
}

/** The buffers of a simulation, to hand over to another thread without copying. */
export function transferables(simulation: Simulation): ArrayBuffer[] {
  const arrays: ArrayBufferView[] = [simulation.outdoorC];
  for (const room of simulation.rooms) {
    for (const value of Object.values(room)) if (ArrayBuffer.isView(value)) arrays.push(value);
    arrays.push(...Object.values(room.flowsW));
  }
  return [...new Set(arrays.map((array) => array.buffer))].filter((b) => b instanceof ArrayBuffer);
}
