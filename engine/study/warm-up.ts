// The constant powers that bring several rooms to their targets at the same moment.
import type { Problem } from '../network/index.ts';
import { marchPart } from './march-part.ts';
import type { RoomPlant } from './room-plants.ts';
import { type PlantChange, segmentOf, withPlants } from './segment.ts';

export interface WarmUpRoom {
  readonly room: string;
  readonly powerW: number;
}

export interface WarmUp {
  /** Hours from switching on to the hour by which it must be warm. */
  readonly hours: number;
  readonly rooms: readonly WarmUpRoom[];
  readonly totalW: number;
  /** Whether every target was met to 0.02 K; where not, gains alone warm a room above it. */
  readonly met: boolean;
}

const metWithinK = 0.02;
const mostRounds = 12;
/** So high that a heater with it never rests. */
const alwaysOnC = 190;

/**
 * Finds the powers by a secant for each room, all rooms moved at once: through a few hours of warm-up a
 * room answers its own heater far more than its neighbours', so the rounds close in quickly.
 */
export function* warmUpPowers(
  problem: Problem,
  plants: readonly RoomPlant[],
  targetC: readonly number[],
  from: number,
  count: number,
  stateC: Float64Array,
): Generator<unknown, WarmUp> {
  const part = segmentOf(problem, from, count, { kind: 'temperatures', tempC: stateC });
  const n = plants.length;
  function* reached(powerW: readonly number[]): Generator<unknown, number[]> {
    const changes = new Map<number, PlantChange>();
    plants.forEach(({ index, backup }, r) => {
      changes.set(index, { maxW: powerW[r], setPointC: alwaysOnC });
      if (backup >= 0) changes.set(backup, { setPointC: Number.NEGATIVE_INFINITY });
    });
    const run = yield* marchPart(withPlants(part, changes), 'finding the warm-up power');
    return plants.map(({ index }) => {
      const { sensorNodes, sensorWeights } = problem.network.plants[index];
      return sensorNodes.reduce((sum, node, i) => sum + sensorWeights[i] * run.finalC[node], 0);
    });
  }
  let powerW: number[] = new Array(n).fill(0);
  let atC = yield* reached(powerW);
  let slope = plants.map(({ room }) => 1 / (20 * room.room.floorAreaM2)); // K/W, a first guess
  for (let round = 0; round < mostRounds; round++) {
    const done = atC.every(
      (c, r) => Math.abs(c - targetC[r]) < metWithinK || (c >= targetC[r] && powerW[r] === 0),
    );
    if (done) break;
    const next = powerW.map((w, r) => Math.max(0, w + (targetC[r] - atC[r]) / slope[r]));
    const then = yield* reached(next);
    slope = slope.map((old, r) => {
      const moved = next[r] - powerW[r];
      const found = (then[r] - atC[r]) / moved;
      return Math.abs(moved) > 1 && found > 0 ? found : old;
    });
    powerW = next;
    atC = then;
  }
  return {
    hours: (count * problem.stepS) / 3600,
    rooms: plants.map(({ room }, r) => ({ room: room.room.id, powerW: powerW[r] })),
    totalW: powerW.reduce((a, b) => a + b, 0),
    met: atC.every((c, r) => Math.abs(c - targetC[r]) < metWithinK),
  };
}
