// One implicit stage of the vapour balance of several rooms.
//
//   M·dw_i/dt = G_i + Σ ṁ_ji·(w_j − w_i) + F_i + humidifier − dehumidifier − condensate
//   S·dφ_i/dt = −F_i,   F_i = β·A·(φ_i·p_sat − p_i)
//
// w is the water per kg of dry air, φ the relative humidity of the buffer, p = P·w/(0.622 + w). The
// buffer is eliminated onto its room; rooms are swept by Gauss-Seidel until nothing moves, which is sure
// to end since every room weighs its own state more than the others'. Devices are complementary: they
// run only where the room would leave their limit, and hold it as far as their power goes.

/** Drivers and state of all rooms; index i is one room throughout. */
export interface VapourRooms {
  readonly count: number;
  readonly airKg: Float64Array;
  readonly bufferKg: Float64Array;
  readonly bufferKgPerSPa: Float64Array;
  /** Gains [kg/s]. */
  readonly gainKgPerS: Float64Array;
  readonly saturationPa: Float64Array;
  /** Limits as water per kg of dry air; −1 and Infinity where there is no device. */
  readonly wetEnoughRatio: Float64Array;
  readonly dryEnoughRatio: Float64Array;
  readonly saturatedRatio: Float64Array;
  readonly maxHumidifyKgPerS: Float64Array;
  readonly maxDryKgPerS: Float64Array;
  /** From outdoors, times the share that recovery does not keep [kg/s]. */
  readonly freshKgPerS: Float64Array;
  readonly outdoorRatio: number;
  /** Streams between rooms: `streamKgPerS[s]` from `streamFrom[s]` to `streamTo[s]`. */
  readonly streamFrom: Int32Array;
  readonly streamTo: Int32Array;
  readonly streamKgPerS: Float64Array;
  readonly pressurePa: number;
}

/** Result of a stage; `ratio` and `buffer` are in and out. */
export interface VapourStage {
  readonly ratio: Float64Array;
  readonly buffer: Float64Array;
  readonly humidifyKgPerS: Float64Array;
  readonly dryKgPerS: Float64Array;
  readonly condenseKgPerS: Float64Array;
}

const massRatio = 0.621945; // water over dry air, per mole
const toleranceShare = 1e-12;
const mostSweeps = 500;

export function vapourStage(count: number): VapourStage {
  const values = () => new Float64Array(count);
  return {
    ratio: values(),
    buffer: values(),
    humidifyKgPerS: values(),
    dryKgPerS: values(),
    condenseKgPerS: values(),
  };
}

/**
 * Solves the stage of length `spanS` that starts from `startRatio` and `startBuffer`.
 *
 * @returns sweeps it took; `mostSweeps` where it did not settle
 */
export function solveVapour(
  rooms: VapourRooms,
  startRatio: Float64Array,
  startBuffer: Float64Array,
  spanS: number,
  out: VapourStage,
): number {
  const { count, airKg, bufferKg, bufferKgPerSPa, gainKgPerS, saturationPa, pressurePa } = rooms;
  const { streamFrom, streamTo, streamKgPerS, freshKgPerS, outdoorRatio } = rooms;
  const { ratio, buffer } = out;
  let sweep = 0;
  let moved = Number.POSITIVE_INFINITY;
  while (sweep < mostSweeps && moved > toleranceShare) {
    moved = 0;
    sweep++;
    for (let i = 0; i < count; i++) {
      const storage = airKg[i] / spanS;
      let own = storage + freshKgPerS[i];
      let into = storage * startRatio[i] + gainKgPerS[i] + freshKgPerS[i] * outdoorRatio;
      for (let s = 0; s < streamTo.length; s++) {
        if (streamTo[s] !== i) continue;
        own += streamKgPerS[s];
        into += streamKgPerS[s] * ratio[streamFrom[s]];
      }
      const store = bufferKg[i] / spanS;
      let link = 0; // kg/s per Pa between the air and the buffer as it was
      const perRatioPa = pressurePa / (massRatio + ratio[i]);
      if (store > 0) {
        const surface = bufferKgPerSPa[i];
        link = (surface * store) / (store + surface * saturationPa[i]);
        own += link * perRatioPa;
        into += link * saturationPa[i] * startBuffer[i];
      }
      let next = into / own;
      let wet = 0;
      let dry = 0;
      let fog = 0;
      if (next < rooms.wetEnoughRatio[i]) {
        wet = Math.min(rooms.maxHumidifyKgPerS[i], own * rooms.wetEnoughRatio[i] - into);
        next = (into + wet) / own;
      } else if (next > rooms.dryEnoughRatio[i]) {
        dry = Math.min(rooms.maxDryKgPerS[i], into - own * rooms.dryEnoughRatio[i]);
        next = (into - dry) / own;
      }
      if (next > rooms.saturatedRatio[i]) {
        fog = into + wet - dry - own * rooms.saturatedRatio[i];
        next = rooms.saturatedRatio[i];
      }
      const change = Math.abs(next - ratio[i]) / (Math.abs(next) + 1e-9);
      if (change > moved) moved = change;
      ratio[i] = next;
      out.humidifyKgPerS[i] = wet;
      out.dryKgPerS[i] = dry;
      out.condenseKgPerS[i] = fog;
      if (store > 0) {
        const vapourPa = perRatioPa * next;
        buffer[i] = startBuffer[i] + (link * (vapourPa - saturationPa[i] * startBuffer[i])) / store;
      }
    }
  }
  return sweep;
}
