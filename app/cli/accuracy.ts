// How much of a result is due to the cutting of time and walls: the same run at half the step and twice
// the nodes, and what changed.

import type { Findings, SpaceFindings } from '../../engine/index.ts';
import { table } from './table.ts';

export interface Change {
  readonly run: number;
  readonly finer: number;
  readonly difference: number;
}

const figures = {
  heatingKWh: (of: SpaceFindings) => of.heatingKWh,
  coolingKWh: (of: SpaceFindings) => of.coolingKWh,
  peakHeatingW: (of: SpaceFindings) => of.peakHeatingW,
  peakCoolingW: (of: SpaceFindings) => of.peakCoolingW,
  meanAirC: (of: SpaceFindings) => of.airTemperatureC.mean,
  minAirC: (of: SpaceFindings) => of.airTemperatureC.min,
  maxAirC: (of: SpaceFindings) => of.airTemperatureC.max,
  hoursBelowBand: (of: SpaceFindings) => of.hoursBelowBand,
  hoursAboveBand: (of: SpaceFindings) => of.hoursAboveBand,
} as const;

type Changes = Readonly<Record<keyof typeof figures, Change>>;

export interface Accuracy {
  /** The finer run. */
  readonly stepMinutes: number;
  readonly nodes: number;
  readonly rooms: readonly ({ readonly id: string; readonly name: string } & Changes)[];
  readonly building: Changes;
}

function changes(run: SpaceFindings, finer: SpaceFindings): Changes {
  const entries = Object.entries(figures).map(([name, of]) => {
    const [a, b] = [of(run), of(finer)];
    return [name, { run: a, finer: b, difference: b - a }];
  });
  return Object.fromEntries(entries) as Changes; // one entry a name of the table above
}

export function accuracyOf(run: Findings, finer: Findings): Accuracy {
  return {
    stepMinutes: finer.stepMinutes,
    nodes: finer.quality.nodes,
    rooms: run.rooms.map((room, r) => ({
      id: room.id,
      name: room.name,
      ...changes(room, finer.rooms[r]),
    })),
    building: changes(run.building, finer.building),
  };
}

export function accuracyText(run: Findings, accuracy: Accuracy): string {
  const rows = [...accuracy.rooms, { name: 'Building', ...accuracy.building }];
  type Row = (typeof rows)[number];
  const change = (head: string, unit: string, digits: number, name: keyof Changes) => ({
    head,
    unit,
    digits,
    of: (row: Row) => row[name].difference,
  });
  return `Numerical uncertainty: change of the figures from ${run.stepMinutes} min and ${run.quality.nodes} nodes
to ${accuracy.stepMinutes} min and ${accuracy.nodes} nodes. It says nothing of the uncertainty of the inputs.

${table<Row>(
  [
    { head: 'Room', of: (row) => row.name },
    change('Heating', 'kWh', 2, 'heatingKWh'),
    change('Cooling', 'kWh', 2, 'coolingKWh'),
    change('Peak heating', 'W', 1, 'peakHeatingW'),
    change('Peak cooling', 'W', 1, 'peakCoolingW'),
    change('Mean air', 'K', 3, 'meanAirC'),
    change('Coldest air', 'K', 3, 'minAirC'),
    change('Warmest air', 'K', 3, 'maxAirC'),
    change('Below band', 'h', 0, 'hoursBelowBand'),
    change('Above band', 'h', 0, 'hoursAboveBand'),
  ],
  rows,
)}`;
}
