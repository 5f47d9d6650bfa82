// The simple hourly method of ISO 13790:2008, Annex C: five resistances, one capacity. A reference for
// tests only; the program itself does not use it.

export interface HourlyRoom {
  readonly massAreaM2: number;
  readonly capacityJPerK: number;
  /** Conductances of the method's network [W/K]. */
  readonly window: number;
  readonly massToOutside: number;
  readonly massToSurface: number;
  readonly surfaceToAir: number;
  readonly ventilation: number;
  readonly totalAreaM2: number;
}

export interface HourlyDrive {
  readonly outsideC: number;
  readonly internalW: number;
  readonly solarW: number;
  readonly heatSetC: number;
  readonly coolSetC: number;
  readonly greatestHeatW: number;
  /** Negative. */
  readonly greatestCoolW: number;
}

export interface HourlyState {
  readonly powerW: number;
  readonly airC: number;
  readonly surfaceC: number;
  /** At the end of the hour. */
  readonly massC: number;
  readonly operativeC: number;
}

/** One hour with a given plant power, Crank–Nicolson (ISO 13790:2008, C.3). */
export function hourWith(room: HourlyRoom, drive: HourlyDrive, massC: number, powerW: number) {
  const { ventilation: ve, window, massToSurface: ms, surfaceToAir: is, massToOutside: em } = room;
  const te = drive.outsideC;
  const halfGain = 0.5 * drive.internalW;
  const massShare = room.massAreaM2 / room.totalAreaM2;
  const lit = halfGain + drive.solarW;
  const toAir = halfGain;
  const toMass = massShare * lit;
  const toSurface = (1 - massShare - window / (9.1 * room.totalAreaM2)) * lit;
  const h1 = 1 / (1 / ve + 1 / is);
  const h2 = h1 + window;
  const h3 = 1 / (1 / h2 + 1 / ms);
  const airDrive = (toAir + powerW) / ve + te;
  const total = toMass + em * te + (h3 * (toSurface + window * te + h1 * airDrive)) / h2;
  const store = room.capacityJPerK / 3600;
  const half = 0.5 * (h3 + em);
  const end = (massC * (store - half) + total) / (store + half);
  const mean = (massC + end) / 2;
  const surfaceC = (ms * mean + toSurface + window * te + h1 * airDrive) / (ms + window + h1);
  const airC = (is * surfaceC + ve * te + toAir + powerW) / (is + ve);
  return { powerW, airC, surfaceC, massC: end, operativeC: 0.3 * airC + 0.7 * surfaceC };
}

/** One hour under control of the air temperature (ISO 13790:2008, C.4). */
export function controlledHour(room: HourlyRoom, drive: HourlyDrive, massC: number): HourlyState {
  const free = hourWith(room, drive, massC, 0);
  if (free.airC >= drive.heatSetC && free.airC <= drive.coolSetC) return free;
  const set = free.airC < drive.heatSetC ? drive.heatSetC : drive.coolSetC;
  const trial = hourWith(room, drive, massC, 1000);
  const wanted = (1000 * (set - free.airC)) / (trial.airC - free.airC);
  const power = Math.min(drive.greatestHeatW, Math.max(drive.greatestCoolW, wanted));
  return hourWith(room, drive, massC, power);
}
