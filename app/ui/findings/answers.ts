// The findings in their fixed order, as figures with a note; one list for the house, one for a room.

import { figure, type Quantity, quantity, stampText } from '../format/index.ts';
import type { RoomTotals, Totals } from '../simulation.ts';

export interface Answer {
  readonly key: string;
  readonly name: string;
  /** At the right of the name, in small: the same per area, or where. */
  readonly aside: string;
  readonly quantity: Quantity;
  /** The figure as a number, in the unit shown. */
  readonly value: number;
  readonly decimals: number;
  readonly note: string;
  readonly isMain: boolean;
  /** A level (a temperature) has no share of its base. */
  readonly kind: 'amount' | 'level';
}

/** A quantity with the number behind it. */
function shown(
  quantityOf: Quantity,
  value: number,
  decimals: number,
  kind: Answer['kind'] = 'amount',
) {
  return { quantity: quantityOf, value, decimals, kind };
}

/** How many percent of `whole`, as words; empty where there is no whole. */
const shareOf = (part: number, whole: number) =>
  whole > 0 ? `${figure((100 * part) / whole)} % of ${figure(whole)} occupied` : 'nobody is in';

const nameWhere = (
  rooms: readonly RoomTotals[],
  of: (room: RoomTotals) => number,
  value: number,
) => {
  const room = rooms.find((one) => of(one) === value);
  return room ? `, ${room.name.charAt(0).toLowerCase()}${room.name.slice(1)}` : '';
};

/** `rooms` are the rooms of a house, to say where an extreme lies; empty for a single room. */
export function findAnswers(totals: Totals, rooms: readonly RoomTotals[]): Answer[] {
  const isHouse = rooms.length > 0;
  const power = (watts: number) =>
    isHouse
      ? shown(quantity.housePowerW(watts), watts / 1000, 1)
      : shown(quantity.roomPowerW(watts), watts / 1000, 2);
  const energy = (kWh: number) => shown(quantity.energyKWh(kWh), kWh, 0);
  const hours = (count: number) => shown(quantity.hours(count), count, 0);
  const level = (celsius: number) => shown(quantity.temperatureC(celsius), celsius, 1, 'level');
  const perArea = (kWh: number) => `${figure(kWh / totals.floorAreaM2)} kWh/m²`;
  const range = totals.operativeTemperatureC;
  const highestIn = nameWhere(rooms, (room) => room.operativeTemperatureC.max, range.max);
  const lowestIn = nameWhere(rooms, (room) => room.operativeTemperatureC.min, range.min);
  const isOccupied = totals.occupiedHours > 0;
  const answers: Answer[] = [
    {
      key: 'heating',
      name: 'Heating in a year',
      aside: perArea(totals.heatingKWh),
      ...energy(totals.heatingKWh),
      note: '',
      isMain: true,
    },
    {
      key: 'peak',
      name: isHouse ? 'Peak heating, whole house' : 'Peak heating',
      aside:
        totals.peakHeatingW > 0 ? `${figure(totals.peakHeatingW / totals.floorAreaM2)} W/m²` : '',
      ...power(totals.peakHeatingW),
      note: totals.peakHeatingW > 0 ? stampText(totals.peakHeatingAt) : 'no heat was called for',
      isMain: true,
    },
    {
      key: 'below',
      name: 'Hours below the band',
      aside: shareOf(totals.hoursBelowBand, totals.occupiedHours),
      ...hours(isOccupied ? totals.hoursBelowBand : NaN),
      note: isOccupied ? `${figure(totals.degreeHoursBelow)} K·h in all` : '',
      isMain: true,
    },
    {
      key: 'above',
      name: 'Hours above the band',
      aside: shareOf(totals.hoursAboveBand, totals.occupiedHours),
      ...hours(isOccupied ? totals.hoursAboveBand : NaN),
      note: isOccupied ? `${figure(totals.degreeHoursAbove)} K·h in all` : '',
      isMain: true,
    },
    {
      key: 'highest',
      name: `Highest${highestIn}`,
      aside: stampText(range.maxAt),
      ...level(range.max),
      note: '',
      isMain: false,
    },
    {
      key: 'lowest',
      name: `Lowest${lowestIn}`,
      aside: stampText(range.minAt),
      ...level(range.min),
      note: '',
      isMain: false,
    },
  ];
  if (totals.coolingKWh > 0) {
    answers.splice(
      2,
      0,
      {
        key: 'cooling',
        name: 'Cooling in a year',
        aside: perArea(totals.coolingKWh),
        ...energy(totals.coolingKWh),
        note: '',
        isMain: false,
      },
      {
        key: 'peak-cooling',
        name: 'Peak cooling',
        aside: stampText(totals.peakCoolingAt),
        ...power(totals.peakCoolingW),
        note: '',
        isMain: false,
      },
    );
  }
  return answers;
}
