// The answers: the few figures that the report was asked for.

import type { RoomFindings } from '../../../engine/index.ts';
import { momentText } from '../calendar.ts';
import { figure } from '../figures.ts';
import { type Markup, markup, nothing } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';

interface Answer {
  readonly name: string;
  readonly value: string;
  readonly unit: string;
  readonly note: string;
}

/** The room that has most of it, as the end of a sentence; nothing where there is but one room. */
function mostly(rooms: readonly RoomFindings[], of: (room: RoomFindings) => number): string {
  const most = rooms.reduce((a, b) => (of(b) > of(a) ? b : a));
  return rooms.length > 1 && of(most) > 0 ? `; most in ${most.name}, ${figure(of(most))} h` : '';
}

const where = (rooms: readonly RoomFindings[], room: RoomFindings | undefined) =>
  rooms.length > 1 && room ? `${room.name}, ` : '';

export const answers: ChapterMaker = ({ simulation }) => {
  const { building, rooms } = simulation.findings;
  const { heatingKWh, coolingKWh, peakHeatingW, peakCoolingW, floorAreaM2 } = building;
  const range = building.operativeTemperatureC;
  const isOccupied = building.occupiedHours > 0;
  const hours = (
    value: number,
    of: (room: RoomFindings) => number,
  ): Pick<Answer, 'value' | 'note'> => ({
    value: figure(isOccupied ? value : NaN),
    note: isOccupied
      ? `of ${figure(building.occupiedHours)} occupied${mostly(rooms, of)}`
      : 'no hour is occupied',
  });
  const energy = (name: string, kWh: number): Answer => ({
    name,
    value: figure(kWh),
    unit: 'kWh',
    note: `${figure(kWh / floorAreaM2)} kWh/m² of floor`,
  });
  const peak = (name: string, watts: number, at: string): Answer => ({
    name,
    value: figure(watts / 1000, 1),
    unit: 'kW',
    note: watts > 0 ? momentText(at) : 'none called for',
  });
  const extreme = (name: string, value: number, at: string, room?: RoomFindings): Answer => ({
    name,
    value: figure(value, 1),
    unit: '°C',
    note: `${where(rooms, room)}${momentText(at)}`,
  });
  const list: Answer[] = [
    energy('Heating in a year', heatingKWh),
    peak('Largest hour of heating', peakHeatingW, building.peakHeatingAt),
    ...(coolingKWh > 0
      ? [
          energy('Cooling in a year', coolingKWh),
          peak('Largest hour of cooling', peakCoolingW, building.peakCoolingAt),
        ]
      : []),
    {
      name: rooms.length > 1 ? 'Room-hours above the band' : 'Hours above the band',
      unit: 'h',
      ...hours(building.hoursAboveBand, (room) => room.hoursAboveBand),
    },
    {
      name: rooms.length > 1 ? 'Room-hours below the band' : 'Hours below the band',
      unit: 'h',
      ...hours(building.hoursBelowBand, (room) => room.hoursBelowBand),
    },
    extreme(
      'Highest operative temperature',
      range.max,
      range.maxAt,
      rooms.find((room) => room.operativeTemperatureC.max === range.max),
    ),
    extreme(
      'Lowest operative temperature',
      range.min,
      range.minAt,
      rooms.find((room) => room.operativeTemperatureC.min === range.min),
    ),
  ];
  return {
    id: 'answers',
    title: 'Answers',
    html: markup`<dl class="answers">${list.map(drawn)}</dl>\n${dangers(simulation.findings.cautions)}`,
  };
};

const drawn = ({ name, value, unit, note }: Answer): Markup =>
  markup`<div><dt>${name}</dt><dd><b>${value}</b> ${unit}</dd><dd class="note">${note}</dd></div>\n`;

/** A danger must not wait for the last page: its name stands under the answers. */
function dangers(cautions: readonly string[]): Markup {
  if (cautions.length === 0) return nothing;
  const names = cautions.map((text) => text.split(':')[0] ?? text);
  return markup`<p class="danger"><a href="#cautions">${cautions.length === 1 ? 'One caution' : `${cautions.length} cautions`}</a>: ${names.join(', ').toLowerCase()}.</p>\n`;
}
