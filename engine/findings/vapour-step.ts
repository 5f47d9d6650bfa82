// One step of the vapour balance: SDIRK2, as in the thermal march. Two implicit stages, L-stable, second
// order, and water is kept to rounding: what the stages book adds up to the change of the state.
//
// Source: R. Alexander, "Diagonally implicit Runge-Kutta methods for stiff O.D.E.'s", SIAM J. Numer.
// Anal. 14 (1977) 1006-1021, doi:10.1137/0714068.
import { solveVapour, type VapourRooms, type VapourStage, vapourStage } from './vapour-stage.ts';

const gamma = 1 - Math.SQRT1_2;
const carry = (1 - gamma) / gamma;

/** Share of the first stage's flows in the step; the second has the rest. */
export const firstShare = 1 - gamma;

/** State of all rooms, and the two stages of the last step. */
export interface VapourState {
  /** Water per kg of dry air. */
  readonly ratio: Float64Array;
  /** Relative humidity of the buffers, 0 to 1. */
  readonly buffer: Float64Array;
  readonly one: VapourStage;
  readonly two: VapourStage;
  readonly startRatio: Float64Array;
  readonly startBuffer: Float64Array;
}

export function vapourState(count: number): VapourState {
  const values = () => new Float64Array(count);
  return {
    ratio: values(),
    buffer: values(),
    one: vapourStage(count),
    two: vapourStage(count),
    startRatio: values(),
    startBuffer: values(),
  };
}

/** Moves `ratio` and `buffer` on by a step; allocates nothing. */
export function advanceVapour(rooms: VapourRooms, state: VapourState, spanS: number): void {
  const { ratio, buffer, one, two, startRatio, startBuffer } = state;
  one.ratio.set(ratio);
  one.buffer.set(buffer);
  solveVapour(rooms, ratio, buffer, gamma * spanS, one);
  for (let r = 0; r < rooms.count; r++) {
    startRatio[r] = ratio[r] + carry * (one.ratio[r] - ratio[r]);
    startBuffer[r] = buffer[r] + carry * (one.buffer[r] - buffer[r]);
  }
  two.ratio.set(one.ratio);
  two.buffer.set(one.buffer);
  solveVapour(rooms, startRatio, startBuffer, gamma * spanS, two);
  ratio.set(two.ratio);
  buffer.set(two.buffer);
}
