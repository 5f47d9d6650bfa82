// What the vapour balance needs of each room, step by step: sources, set humidities, buffering.
import type { Building, Room } from '../building/index.ts';
import type { AirSite } from './air-site.ts';
import { scheduledValues, scheduleValues } from './schedule-values.ts';

/** Limits of one device; `humidity` is a share, 0 to 1, in each step. */
export interface HumidityDevice {
  readonly humidity: Float64Array;
  readonly maxKgPerS: number;
}

export interface RoomVapour {
  /** Dry air in the room [kg]. */
  readonly airKg: number;
  /** Vapour of given sources in each step, without people; `null` where there is none. */
  readonly sourceKgPerS: Float64Array | null;
  /** Water that the buffer takes up from 0 to 100 % relative humidity; 0 without one [kg]. */
  readonly bufferKg: number;
  /** Vapour from the air to the buffer's surface, per Pa [kg/(s·Pa)]. */
  readonly bufferKgPerSPa: number;
  readonly humidifier: HumidityDevice | null;
  readonly dehumidifier: HumidityDevice | null;
}

/**
 * Vapour transfer at a surface by the analogy of heat and mass transfer (Lewis), h_c/(ρ·c·R_v·T) with
 * h_c = 3 W/(m²·K) at 20 °C: 1.8·10⁻⁸ kg/(m²·s·Pa).
 */
const surfaceKgPerM2SPa = 3 / (1.2 * 1006 * 461.5 * 293.15);

/** Inputs of every room, or null where no room asks for the balance. */
export function roomVapours(building: Building, site: AirSite): RoomVapour[] | null {
  if (building.rooms.every((room) => room.moisture === undefined)) return null;
  return building.rooms.map((room) => roomVapour(building, room, site));
}

function roomVapour(building: Building, room: Room, site: AirSite): RoomVapour {
  const { moisture } = room;
  const { clock, properties } = site;
  const sources = moisture?.sources ?? [];
  const sourceKgPerS = sources.length === 0 ? null : new Float64Array(clock.count);
  for (const { vapourKgPerS, schedule } of sources) {
    const share = schedule === undefined ? null : scheduleValues(building, schedule, clock);
    for (let k = 0; k < clock.count; k++)
      if (sourceKgPerS) sourceKgPerS[k] += vapourKgPerS * (share === null ? 1 : share[k]);
  }
  const buffer = moisture?.buffer;
  const { humidifier, dehumidifier } = moisture ?? {};
  return {
    airKg: room.volumeM3 * properties.densityKgPerM3,
    sourceKgPerS,
    bufferKg: buffer ? buffer.areaM2 * buffer.bufferKgPerM2Percent * 100 : 0,
    bufferKgPerSPa: buffer ? buffer.areaM2 * surfaceKgPerM2SPa : 0,
    humidifier: humidifier
      ? {
          humidity: scheduledValues(building, humidifier.humidityAbove, clock),
          maxKgPerS: humidifier.maxKgPerS ?? Number.POSITIVE_INFINITY,
        }
      : null,
    dehumidifier: dehumidifier
      ? {
          humidity: scheduledValues(building, dehumidifier.humidityBelow, clock),
          maxKgPerS: dehumidifier.maxKgPerS ?? Number.POSITIVE_INFINITY,
        }
      : null,
  };
}
