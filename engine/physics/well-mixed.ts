// A well mixed room with a steady source: the exponential that carbon dioxide, vapour and a lumped
// temperature share, and the two coupled stores of air with furniture, walls or a hygroscopic lining.

/**
 * Value after a time on the way to its end, x_∞ + (x_0 − x_∞)·e^(−t/τ).
 *
 * @param time in the same unit as the time constant
 */
export function decayed(start: number, end: number, time: number, timeConstant: number): number {
  return end + (start - end) * Math.exp(-time / timeConstant);
}

/**
 * Time until a decaying value passes a target.
 *
 * @returns in the unit of the time constant; 0 where the target is the start; Infinity where the value
 *   never gets there
 */
export function timeToReach(
  start: number,
  end: number,
  target: number,
  timeConstant: number,
): number {
  if (target === start) return 0;
  const ratio = (start - end) / (target - end);
  return ratio >= 1 && Number.isFinite(ratio)
    ? timeConstant * Math.log(ratio)
    : Number.POSITIVE_INFINITY;
}

/** End value of a gas in a room: c_out + 10⁶ · source / (n·V). [ppm by volume] */
export function steadyGasPpm(
  outsidePpm: number,
  sourceM3PerH: number,
  changesPerH: number,
  volumeM3: number,
): number {
  return outsidePpm + (1e6 * sourceM3PerH) / (changesPerH * volumeM3);
}

/** End value of the vapour in a room: v_out + source / (n·V). [kg/m³] */
export function steadyVapourKgPerM3(
  outsideKgPerM3: number,
  sourceKgPerH: number,
  changesPerH: number,
  volumeM3: number,
): number {
  return outsideKgPerM3 + sourceKgPerH / (changesPerH * volumeM3);
}

/**
 * Two stores, joined with each other and each with the surroundings, under steady drive:
 *
 *   C_1·x_1' = G_1·(x_e − x_1) + G·(x_2 − x_1) + q_1
 *   C_2·x_2' = G_2·(x_e − x_2) + G·(x_1 − x_2) + q_2
 *
 * Temperatures (J/K, W/K, W) or vapour (m³, m³/h, kg/h): units need only agree with the time.
 */
export interface TwoStores {
  readonly firstCapacity: number;
  readonly secondCapacity: number;
  readonly between: number;
  readonly firstToOutside: number;
  readonly secondToOutside: number;
}

/** Time constants, the slow one first, in the unit of capacity over conductance. */
export function storeTimeConstants(stores: TwoStores): readonly [number, number] {
  const { firstCapacity: c1, secondCapacity: c2, between: g } = stores;
  const a = (stores.firstToOutside + g) / c1;
  const d = (stores.secondToOutside + g) / c2;
  const root = Math.hypot(a - d, 2 * Math.sqrt((g / c1) * (g / c2)));
  const fast = (a + d + root) / 2;
  const slow = (a * d - (g / c1) * (g / c2)) / fast; // product over the larger: no cancellation
  return [1 / slow, 1 / fast];
}

/** End state of two stores under steady drive. At least one must touch the surroundings. */
export function steadyStores(
  stores: TwoStores,
  outside: number,
  firstSource: number,
  secondSource: number,
): readonly [number, number] {
  const { between: g, firstToOutside: g1, secondToOutside: g2 } = stores;
  const det = (g1 + g) * (g2 + g) - g * g;
  const first = ((g2 + g) * firstSource + g * secondSource) / det;
  const second = (g * firstSource + (g1 + g) * secondSource) / det;
  return [outside + first, outside + second];
}

/**
 * State of two stores after a time: the exact exponential of the 2 × 2 system.
 *
 * @param start values of both at time 0
 * @param end from `steadyStores`
 *
 * Source: closed form, matrix exponential by the two eigenvalues (Sylvester's formula).
 */
export function storesAfter(
  stores: TwoStores,
  start: readonly [number, number],
  end: readonly [number, number],
  time: number,
): readonly [number, number] {
  const { firstCapacity: c1, secondCapacity: c2, between: g } = stores;
  const [tauSlow, tauFast] = storeTimeConstants(stores);
  const slow = 1 / tauSlow;
  const fast = 1 / tauFast;
  const a = (stores.firstToOutside + g) / c1;
  const d = (stores.secondToOutside + g) / c2;
  const es = Math.exp(-slow * time);
  const ef = Math.exp(-fast * time);
  const x = start[0] - end[0];
  const y = start[1] - end[1];
  // exp(−Mt) = (es·(fast·I − M) + ef·(M − slow·I)) / (fast − slow), M = [[a, −g/c1], [−g/c2, d]]
  const span = fast - slow;
  const first =
    (es * ((fast - a) * x + (g / c1) * y) + ef * ((a - slow) * x - (g / c1) * y)) / span;
  const second =
    (es * ((g / c2) * x + (fast - d) * y) + ef * (-(g / c2) * x + (d - slow) * y)) / span;
  return [end[0] + first, end[1] + second];
}
