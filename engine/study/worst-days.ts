// The worst week of a room, and what drives its heat.
import { dayName, type RoomHours, type Simulation } from '../findings/index.ts';

/** Seven days with the most degree hours above the adaptive limit in occupied hours, one value an hour. */
export interface WorstDays {
  readonly from: string;
  readonly firstHour: number;
  readonly degreeHours: number;
  readonly operativeC: Float64Array;
  readonly outdoorC: Float64Array;
  readonly limitC: Float64Array;
  readonly occupied: Uint8Array;
}

/** Null where the limit is never passed. */
export function worstDays(
  { outdoorC, hours, year }: Simulation,
  room: RoomHours,
  limitC: Float64Array,
): WorstDays | null {
  const ofDay = new Float64Array(hours / 24);
  for (let h = 0; h < hours; h++)
    if (room.occupied[h] === 1)
      ofDay[Math.floor(h / 24)] += Math.max(0, room.operativeC[h] - limitC[h]);
  let best = 0;
  let first = -1;
  for (let d = 0; d + 7 <= ofDay.length; d++) {
    const sum = ofDay.subarray(d, d + 7).reduce((a, b) => a + b, 0);
    if (sum > best + 1e-9) [best, first] = [sum, d];
  }
  if (first < 0) return null;
  const from = 24 * first;
  const week = <T extends Float64Array | Uint8Array>(values: T) =>
    values.slice(from, from + 168) as T;
  return {
    from: dayName(from, hours, year),
    firstHour: from,
    degreeHours: best,
    operativeC: week(room.operativeC),
    outdoorC: week(outdoorC),
    limitC: week(limitC),
    occupied: week(room.occupied),
  };
}

export type Driver = 'sun' | 'gains' | 'air' | 'fabric';

/** Heat into the room on the days on which its limit is passed, by cause [kWh]; losses are negative. */
export interface Drivers {
  readonly days: number;
  readonly kWh: Readonly<Record<Driver, number>>;
  /** The largest source of heat among them. */
  readonly main: Driver;
}

/**
 * Sums over whole days: heat that comes in the morning is what is too much in the evening.
 *
 * @returns null where the limit is never passed
 */
export function driversOf(room: RoomHours, limitC: Float64Array): Drivers | null {
  const { flowsW, operativeC, occupied } = room;
  const kWh = { sun: 0, gains: 0, air: 0, fabric: 0 };
  let days = 0;
  for (let d = 0; d < operativeC.length / 24; d++) {
    let hot = false;
    for (let h = 24 * d; h < 24 * d + 24; h++)
      if (occupied[h] === 1 && operativeC[h] > limitC[h]) hot = true;
    if (!hot) continue;
    days++;
    for (let h = 24 * d; h < 24 * d + 24; h++) {
      kWh.sun += flowsW.solar[h] / 1000;
      kWh.gains += flowsW.gains[h] / 1000;
      kWh.air += (flowsW.infiltration[h] + flowsW.ventilation[h]) / 1000;
      kWh.fabric +=
        (flowsW.opaque[h] + flowsW.glazing[h] + flowsW.ground[h] + flowsW.rooms[h]) / 1000;
    }
  }
  if (days === 0) return null;
  const entries = Object.entries(kWh) as [Driver, number][];
  return { days, kWh, main: entries.reduce((a, b) => (b[1] > a[1] ? b : a))[0] };
}
