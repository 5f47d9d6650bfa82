// How far a plant of a given size falls short of its set-point over a year.
import type { RoomPlant, Side } from './room-plants.ts';

/** Missing less than this is control, not size [K]. As the findings count hours short; common practice, no source. */
export const metWithinK = 0.2;

/** One room's year with one size. */
export interface RoomShortfall {
  readonly room: string;
  readonly sizeW: number;
  /** Hours in which the sensor's hourly mean misses the set-point by more than 0.2 K. */
  readonly unmetHours: number;
  /** What is missing in them, summed up [K·h]. */
  readonly unmetDegreeHours: number;
  /** Greatest miss of any hour. */
  readonly worstMissK: number;
  /** Extreme operative temperature in occupied hours (all hours where nobody is named) [°C]. */
  readonly extremeOperativeC: number;
  readonly extremeHour: number;
  readonly peakW: number;
  readonly peakHour: number;
  readonly energyKWh: number;
  /** Miss in every hour, 0 where met. */
  readonly missedK: Float64Array;
}

interface RoomYear {
  readonly sensorC: Float64Array;
  readonly operativeC: Float64Array;
  readonly powerW: Float64Array;
}

export function shortfallOf(
  { room, parts }: RoomPlant,
  side: Side,
  sizeW: number,
  { sensorC, operativeC, powerW }: RoomYear,
): RoomShortfall {
  const sign = side === 'heating' ? 1 : -1;
  const occupied = room.comfort?.occupied;
  const anyone = occupied?.includes(1) === true;
  const missedK = new Float64Array(sensorC.length);
  let unmetHours = 0;
  let unmetDegreeHours = 0;
  let worstMissK = 0;
  let extreme = sign * Infinity;
  let extremeHour = -1;
  let peakW = 0;
  let peakHour = -1;
  let energyKWh = 0;
  for (let h = 0; h < sensorC.length; h++) {
    const miss = sign * (parts.setPointC[h] - sensorC[h]);
    if (miss > metWithinK && Number.isFinite(miss)) {
      missedK[h] = miss;
      unmetHours++;
      unmetDegreeHours += miss;
      worstMissK = Math.max(worstMissK, miss);
    }
    const judged = !anyone || occupied[h] === 1;
    if (judged && sign * operativeC[h] < sign * extreme)
      [extreme, extremeHour] = [operativeC[h], h];
    if (powerW[h] > peakW) [peakW, peakHour] = [powerW[h], h];
    energyKWh += powerW[h] / 1000;
  }
  return {
    room: room.room.id,
    sizeW,
    unmetHours,
    unmetDegreeHours,
    worstMissK,
    extremeOperativeC: extreme,
    extremeHour,
    peakW,
    peakHour,
    energyKWh,
    missedK,
  };
}
