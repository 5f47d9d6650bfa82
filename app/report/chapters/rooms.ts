// Every room on a line.

import type { SpaceFindings } from '../../../engine/index.ts';
import { markup, nothing } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';
import { table } from '../table.ts';

type Row = SpaceFindings & { readonly name: string };

export const rooms: ChapterMaker = ({ simulation }) => {
  const { findings } = simulation;
  const hasCooling = findings.building.coolingKWh > 0;
  const rows: Row[] =
    findings.rooms.length > 1
      ? [...findings.rooms, { ...findings.building, name: 'Building' }]
      : [...findings.rooms];
  const peopled = (row: Row, value: number) => (row.occupiedHours > 0 ? value : NaN);
  return {
    id: 'rooms',
    title: 'Rooms',
    html: markup`${table<Row>(
      [
        { head: 'Room', of: (row) => row.name },
        { head: 'Floor', unit: 'm²', decimals: 1, of: (row) => row.floorAreaM2 },
        { head: 'Heating', unit: 'kWh', of: (row) => row.heatingKWh },
        { head: 'Peak', unit: 'W', of: (row) => row.peakHeatingW },
        ...(hasCooling
          ? [
              { head: 'Cooling', unit: 'kWh', of: (row: Row) => row.coolingKWh },
              { head: 'Peak', unit: 'W', of: (row: Row) => row.peakCoolingW },
            ]
          : []),
        { head: 'Lowest', unit: '°C', decimals: 1, of: (row) => row.operativeTemperatureC.min },
        { head: 'Highest', unit: '°C', decimals: 1, of: (row) => row.operativeTemperatureC.max },
        { head: 'Occupied', unit: 'h', of: (row) => row.occupiedHours },
        { head: 'Below', unit: 'h', of: (row) => peopled(row, row.hoursBelowBand) },
        { head: '', unit: 'K·h', of: (row) => peopled(row, row.degreeHoursBelow) },
        { head: 'Above', unit: 'h', of: (row) => peopled(row, row.hoursAboveBand) },
        { head: '', unit: 'K·h', of: (row) => peopled(row, row.degreeHoursAbove) },
      ],
      rows,
      findings.rooms.length > 1 ? 1 : 0,
    )}<p class="note">Temperatures are operative, hourly means. Below and above: occupied hours outside the room’s comfort band, and by how much.${
      findings.rooms.length > 1
        ? markup` In the building’s line hours are those of all rooms together, and the peak is the one at the same hour.`
        : nothing
    }</p>\n`,
  };
};
