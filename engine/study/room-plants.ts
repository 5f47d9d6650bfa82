// Which plants of the network belong to which room, and what their sensors read.
import type { Assembly, PlantParts, RoomParts } from '../assembly/index.ts';
import type { Problem, Run } from '../network/index.ts';

export type Side = 'heating' | 'cooling';

/** A room's main heater or chiller. */
export interface RoomPlant {
  readonly room: RoomParts;
  readonly parts: PlantParts;
  /** Place in the network's list. */
  readonly index: number;
  /** The room's backup heater, −1 where there is none. */
  readonly backup: number;
}

/** Rooms with a heater (chiller), in the project's order. */
export function roomPlants(assembly: Assembly, side: Side): RoomPlant[] {
  let next = 0;
  return assembly.rooms.flatMap((room) => {
    const first = next;
    next += room.plants.length;
    const at = room.plants.findIndex((one) => one.field === side);
    const backup = room.plants.findIndex((one) => one.field === 'backupHeating');
    if (at < 0) return [];
    const index = first + at;
    return [{ room, parts: room.plants[at], index, backup: backup < 0 ? -1 : first + backup }];
  });
}

/** Recorded columns and weights of a reading: Σ weight · T. */
export interface Reading {
  readonly columns: Int32Array;
  readonly weights: Float64Array;
}

export function readingOf(
  problem: Problem,
  nodes: ArrayLike<number>,
  weights: ArrayLike<number>,
): Reading {
  const columns = Int32Array.from(nodes, (node) => problem.recordNodes.indexOf(node));
  if (columns.includes(-1)) throw new Error('a node that a study reads was not recorded');
  return { columns, weights: Float64Array.from(weights) };
}

/** What the plant's own sensor reads. */
export function sensorReading(problem: Problem, plant: RoomPlant): Reading {
  const { sensorNodes, sensorWeights } = problem.network.plants[plant.index];
  return readingOf(problem, sensorNodes, sensorWeights);
}

/** Operative temperature as the findings take it: half air, half faces by area and emissivity. */
export function operativeReading(problem: Problem, { airNode, faces }: RoomParts): Reading {
  const total = faces.reduce((sum, face) => sum + face.areaM2 * face.emissivity, 0);
  return readingOf(
    problem,
    [airNode, ...faces.map((face) => face.node)],
    [0.5, ...faces.map((face) => (face.areaM2 * face.emissivity) / total / 2)],
  );
}

/** The reading in every record, of means or of values at the records' ends. */
export function readRecords(run: Run, reading: Reading, of: 'meanC' | 'endC'): Float64Array {
  const width = run.problem.recordNodes.length;
  const values = run[of];
  const { columns, weights } = reading;
  return Float64Array.from({ length: run.records }, (_, r) => {
    let sum = 0;
    for (let i = 0; i < columns.length; i++) sum += weights[i] * values[r * width + columns[i]];
    return sum;
  });
}

/** A meter in every record [W]. */
export function meterRecords(run: Run, meter: number): Float64Array {
  const width = run.problem.meters.length;
  return Float64Array.from({ length: run.records }, (_, r) => run.meterW[r * width + meter]);
}
