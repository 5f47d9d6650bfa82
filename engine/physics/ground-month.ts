// From ISO 13370's yearly swing to what an hourly run needs: the monthly heat flow, and the virtual
// layer and monthly virtual temperature that let a floor be simulated like any other wall.

/** Steady and periodic conductances of one floor, and how its cycle is shifted. */
export interface GroundCycle {
  readonly steadyWPerK: number;
  readonly insidePeriodicWPerK: number;
  readonly outsidePeriodicWPerK: number;
  /** Months by which the flow leads the inside temperature; 0 for every floor (from memory). */
  readonly leadMonths: number;
  /** Months by which the flow lags the outside one: 1 slab and heated basement, else 0 (from memory). */
  readonly lagMonths: number;
}

/** A yearly temperature cycle: mean, half swing, and the month of the coldest value (1 January). */
export interface YearlyCycle {
  readonly meanC: number;
  /** Half of the difference between the warmest and the coldest month, 0 or more [K]. */
  readonly amplitudeK: number;
}

/**
 * Mean heat flow from the room into the ground in one month.
 *
 *   Φ_m = H_g·(θ̄_i − θ̄_e) − H_pi·θ̂_i·cos(2π(m − τ + α)/12) + H_pe·θ̂_e·cos(2π(m − τ − β)/12)
 *
 * @param month 1 January to 12 December
 * @param coldestMonth τ, the month of the lowest outside temperature: 1 north, 7 south
 * @returns positive out of the room [W]
 *
 * Source: ISO 13370:2017, Annex C (ISO 13370:2007, Annex A).
 */
export function groundMonthFlowW(
  cycle: GroundCycle,
  inside: YearlyCycle,
  outside: YearlyCycle,
  month: number,
  coldestMonth: number,
): number {
  const turn = Math.PI / 6; // a twelfth of the circle
  const insideSwing = Math.cos(turn * (month - coldestMonth + cycle.leadMonths));
  const outsideSwing = Math.cos(turn * (month - coldestMonth - cycle.lagMonths));
  return (
    cycle.steadyWPerK * (inside.meanC - outside.meanC) -
    cycle.insidePeriodicWPerK * inside.amplitudeK * insideSwing +
    cycle.outsidePeriodicWPerK * outside.amplitudeK * outsideSwing
  );
}

/** Soil that is simulated with its heat capacity, beneath the floor [m]. */
export const simulatedSoilM = 0.5;

/**
 * Resistance of the virtual layer beneath the floor construction and 0.5 m of soil.
 *
 *   R_v = 1/U − R_si − R_f − 0.5/λ
 *
 * Chosen so that the whole has the steady U-value of the floor. A negative result is possible with a
 * small, hardly insulated floor: see `virtualLayerFits`.
 *
 * @param floorWPerM2K steady U-value of the floor including the ground [W/(m²·K)]
 *
 * Source: ISO 13370:2017, Annex F (ISO 13370:2007, Annex D).
 */
export function virtualLayerM2KPerW(
  floorWPerM2K: number,
  insideFilmM2KPerW: number,
  floorM2KPerW: number,
  soilWPerMK: number,
): number {
  return 1 / floorWPerM2K - insideFilmM2KPerW - floorM2KPerW - simulatedSoilM / soilWPerMK;
}

/** Whether the virtual layer has a resistance at all; if not, simulate less soil. */
export function virtualLayerFits(virtualM2KPerW: number): boolean {
  return virtualM2KPerW >= 0;
}

/**
 * Virtual temperature on the far side of the virtual layer in one month.
 *
 *   θ_v,m = θ̄_i,m − Φ_m / (A·U)
 *
 * @param insideMonthC monthly mean of the inside temperature that went into Φ_m [°C]
 *
 * Source: ISO 13370:2017, Annex F.
 */
export function virtualGroundC(
  insideMonthC: number,
  monthFlowW: number,
  areaM2: number,
  floorWPerM2K: number,
): number {
  return insideMonthC - monthFlowW / (areaM2 * floorWPerM2K);
}

/**
 * Temperature of undisturbed ground under a yearly wave at its surface.
 *
 *   θ(z, t) = θ̄ − θ̂ · e^(−z/δ) · cos(2π·(t − t_0) − z/δ)
 *
 * @param yearShare t, share of the year gone, 0 to 1
 * @param coldestShare t_0, when the surface is coldest, 0 to 1
 *
 * Source: closed form of the half-space with a periodic surface (Carslaw & Jaeger 1959, 2.6).
 */
export function undisturbedGroundC(
  surface: YearlyCycle,
  depthM: number,
  penetrationM: number,
  yearShare: number,
  coldestShare: number,
): number {
  const x = depthM / penetrationM;
  const phase = 2 * Math.PI * (yearShare - coldestShare) - x;
  return surface.meanC - surface.amplitudeK * Math.exp(-x) * Math.cos(phase);
}
