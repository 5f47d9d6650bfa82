// The hours of a run as comma-separated text, one file a room, unit in every head.

import { hourName, type RoomHours, type Simulation } from '../../engine/index.ts';
import { csvText } from './csv-text.ts';

const number = (value: number) => (Number.isNaN(value) ? '' : String(Number(value.toPrecision(9))));

export function roomCsv(simulation: Simulation, room: RoomHours): string {
  const { hours, year, outdoorC } = simulation;
  const columns: readonly (readonly [head: string, values: ArrayLike<number>])[] = [
    ['outdoorC', outdoorC],
    ['airC', room.airC],
    ['meanRadiantC', room.meanRadiantC],
    ['operativeC', room.operativeC],
    ['bandLowC', room.bandLowC],
    ['bandHighC', room.bandHighC],
    ['occupied', room.occupied],
    ['heatingW', room.heatingW],
    ['coolingW', room.coolingW],
    // The balance: heat into the room; what goes out is negative, storage is what is taken up.
    ...Object.entries(room.flowsW).map(([name, values]) => [`${name}FlowW`, values] as const),
  ];
  const lines = [['hourBeginning', ...columns.map(([head]) => csvText(head))].join(',')];
  for (let h = 0; h < hours; h++) {
    const cells = columns.map(([, values]) => number(values[h]));
    lines.push([hourName(h, hours, year), ...cells].join(','));
  }
  return `${lines.join('\n')}\n`;
}

/** The files of a results folder, by name: the findings, and each room's hours. */
export function resultFiles(simulation: Simulation, document: unknown): Map<string, string> {
  const files = new Map([['findings.json', `${JSON.stringify(document, null, 2)}\n`]]);
  for (const room of simulation.rooms) files.set(`room-${room.id}.csv`, roomCsv(simulation, room));
  return files;
}
