// A room as one capacity and one conductance: cool-down, reheat and the daily set-back cycle in closed
// form. Quick answers and checks; real rooms drop faster at first (air before walls), so frost dates
// and warm-up times for decisions come from the hourly run.
import { decayed, timeToReach } from './well-mixed.ts';

/** A lumped room in steady surroundings. */
export interface LumpedRoom {
  readonly capacityJPerK: number;
  readonly conductanceWPerK: number;
  readonly outsideC: number;
  /** Gains other than the heater. */
  readonly gainW: number;
}

/** Time constant C/H [h]. */
export function roomTimeConstantH(room: LumpedRoom): number {
  return room.capacityJPerK / room.conductanceWPerK / 3600;
}

/** Temperature that the room ends at with a steady heater power, θ_e + (gain + power)/H [°C]. */
export function roomEndC(room: LumpedRoom, heaterW: number): number {
  return room.outsideC + (room.gainW + heaterW) / room.conductanceWPerK;
}

/** Temperature after some hours at a steady heater power. Source: closed form, exponential. */
export function roomAfterC(
  room: LumpedRoom,
  startC: number,
  heaterW: number,
  hoursH: number,
): number {
  return decayed(startC, roomEndC(room, heaterW), hoursH, roomTimeConstantH(room));
}

/** Hours until a temperature is reached at a steady heater power; Infinity where it never is [h]. */
export function roomHoursToH(
  room: LumpedRoom,
  startC: number,
  targetC: number,
  heaterW: number,
): number {
  return timeToReach(startC, roomEndC(room, heaterW), targetC, roomTimeConstantH(room));
}

/** Heater power that holds a temperature, 0 or more [W]. */
export function holdingW(room: LumpedRoom, heldC: number): number {
  return Math.max(0, room.conductanceWPerK * (heldC - room.outsideC) - room.gainW);
}

/**
 * Heater power that warms the room to a target within a given time.
 *
 *   θ_∞ = (θ_target − θ_0·e^(−t/τ)) / (1 − e^(−t/τ)),  P = H·(θ_∞ − θ_e) − gain
 *
 * Source: closed form, the exponential solved for its end.
 */
export function reheatW(
  room: LumpedRoom,
  startC: number,
  targetC: number,
  availableH: number,
): number {
  const left = Math.exp(-availableH / roomTimeConstantH(room));
  const endC = (targetC - startC * left) / (1 - left);
  return Math.max(0, room.conductanceWPerK * (endC - room.outsideC) - room.gainW);
}

export interface SetbackCycle {
  readonly lowestC: number;
  /** Hours of cooling before the set-back value is held, or the whole set-back where it is not reached. */
  readonly coolingH: number;
  readonly reheatH: number;
  readonly energyJ: number;
  readonly meanW: number;
  /** False where full power does not reach the comfort value within its period: then nothing else holds. */
  readonly reachesComfort: boolean;
}

/**
 * A day of set-back and comfort that repeats: heater off, hold the set-back, full power, hold comfort.
 *
 * Source: closed form, pieces of exponentials.
 */
export function setbackCycle(
  room: LumpedRoom,
  comfortC: number,
  setbackC: number,
  setbackH: number,
  comfortH: number,
  greatestW: number,
): SetbackCycle {
  const coolingH = Math.min(setbackH, roomHoursToH(room, comfortC, setbackC, 0));
  const lowestC = coolingH < setbackH ? setbackC : roomAfterC(room, comfortC, 0, setbackH);
  const reheatH = roomHoursToH(room, lowestC, comfortC, greatestW);
  const reachesComfort = reheatH <= comfortH;
  const heldLowH = setbackH - coolingH;
  const wattHours =
    heldLowH * holdingW(room, setbackC) +
    Math.min(reheatH, comfortH) * greatestW +
    Math.max(0, comfortH - reheatH) * holdingW(room, comfortC);
  return {
    lowestC,
    coolingH,
    reheatH,
    energyJ: wattHours * 3600,
    meanW: wattHours / (setbackH + comfortH),
    reachesComfort,
  };
}
