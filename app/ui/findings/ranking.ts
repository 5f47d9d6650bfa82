// The rooms ranked by one finding: what the whole-house table draws.

import { figure, type Quantity, quantity, stampText } from '../format/index.ts';
import type { RoomTotals } from '../simulation.ts';
import type { FigureKey } from '../state/index.ts';

export interface FigureKind {
  readonly key: FigureKey;
  readonly label: string;
  /** What the column's figures are, as its head. */
  readonly head: string;
  /** An amount is a bar from zero; a level is a mark on a scale. */
  readonly kind: 'amount' | 'level';
  readonly ramp: 'amount' | 'chill';
  readonly of: (room: RoomTotals) => number;
  readonly write: (value: number) => Quantity;
  /** The figure beside it, and its head. */
  readonly besideHead: string;
  readonly beside: (room: RoomTotals) => string;
  /** Rooms nobody is in have no hours outside a band. */
  readonly needsPeople: boolean;
}

const perM2 = (value: number, room: RoomTotals) => figure(value / room.floorAreaM2);

export const figureKinds: readonly FigureKind[] = [
  {
    key: 'heating',
    label: 'Heating',
    head: 'Heating in a year',
    kind: 'amount',
    ramp: 'amount',
    of: (room) => room.heatingKWh,
    write: quantity.energyKWh,
    besideHead: 'kWh/m²',
    beside: (room) => perM2(room.heatingKWh, room),
    needsPeople: false,
  },
  {
    key: 'peak',
    label: 'Peak heating',
    head: 'Largest hour of heating',
    kind: 'amount',
    ramp: 'amount',
    of: (room) => room.peakHeatingW,
    write: quantity.roomPowerW,
    besideHead: 'W/m²; when',
    beside: (room) =>
      room.peakHeatingW > 0
        ? `${perM2(room.peakHeatingW, room)}; ${stampText(room.peakHeatingAt)}`
        : 'none called for',
    needsPeople: false,
  },
  {
    key: 'below',
    label: 'Hours below band',
    head: 'Occupied hours below the band',
    kind: 'amount',
    ramp: 'chill',
    of: (room) => room.hoursBelowBand,
    write: quantity.hours,
    besideHead: 'K·h below',
    beside: (room) => figure(room.degreeHoursBelow),
    needsPeople: true,
  },
  {
    key: 'above',
    label: 'Hours above band',
    head: 'Occupied hours above the band',
    kind: 'amount',
    ramp: 'amount',
    of: (room) => room.hoursAboveBand,
    write: quantity.hours,
    besideHead: 'K·h above',
    beside: (room) => figure(room.degreeHoursAbove),
    needsPeople: true,
  },
  {
    key: 'highest',
    label: 'Highest',
    head: 'Highest operative temperature',
    kind: 'level',
    ramp: 'amount',
    of: (room) => room.operativeTemperatureC.max,
    write: quantity.temperatureC,
    besideHead: 'when',
    beside: (room) => stampText(room.operativeTemperatureC.maxAt),
    needsPeople: false,
  },
  {
    key: 'lowest',
    label: 'Lowest',
    head: 'Lowest operative temperature',
    kind: 'level',
    ramp: 'chill',
    of: (room) => room.operativeTemperatureC.min,
    write: quantity.temperatureC,
    besideHead: 'when',
    beside: (room) => stampText(room.operativeTemperatureC.minAt),
    needsPeople: false,
  },
];

export interface Ranked {
  readonly room: RoomTotals;
  /** NaN where the finding does not apply. */
  readonly value: number;
}

/** Most striking first: largest, but for the lowest temperature the smallest. */
export function rankRooms(rooms: readonly RoomTotals[], kind: FigureKind): Ranked[] {
  const direction = kind.key === 'lowest' ? 1 : -1;
  return rooms
    .map((room) => ({
      room,
      value: kind.needsPeople && room.occupiedHours === 0 ? NaN : kind.of(room),
    }))
    .sort((a, b) => {
      if (Number.isNaN(a.value)) return Number.isNaN(b.value) ? 0 : 1;
      if (Number.isNaN(b.value)) return -1;
      return direction * (a.value - b.value);
    });
}
