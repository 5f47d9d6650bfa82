// Degree days in their usual forms, and the balance temperature that gives them their base.

/** Heating degree days of daily means: Σ max(0, base − t) [K·d]. Source: common definition. */
export function heatingDegreeDaysKd(dailyMeansC: ArrayLike<number>, baseC: number): number {
  let sum = 0;
  for (let d = 0; d < dailyMeansC.length; d++) sum += Math.max(0, baseC - dailyMeansC[d]);
  return sum;
}

/** Cooling degree days of daily means: Σ max(0, t − base) [K·d]. Source: common definition. */
export function coolingDegreeDaysKd(dailyMeansC: ArrayLike<number>, baseC: number): number {
  let sum = 0;
  for (let d = 0; d < dailyMeansC.length; d++) sum += Math.max(0, dailyMeansC[d] - baseC);
  return sum;
}

/** Heating degree days counted by the hour, never fewer than by daily means [K·d]. */
export function hourlyHeatingDegreeDaysKd(hourlyC: ArrayLike<number>, baseC: number): number {
  return heatingDegreeDaysKd(hourlyC, baseC) / 24;
}

export interface LimitedDegreeDays {
  /** Σ (inside − t) over the heating days [K·d]. */
  readonly sumKd: number;
  readonly heatingDays: number;
}

/**
 * Degree days with a heating limit, such as 20/15: on days colder than the limit, inside less outside.
 *
 * A day exactly at the limit does not count.
 *
 * Source: common European form (VDI 3807 and others; from memory).
 */
export function limitedDegreeDays(
  dailyMeansC: ArrayLike<number>,
  insideC: number,
  limitC: number,
): LimitedDegreeDays {
  let sumKd = 0;
  let heatingDays = 0;
  for (let d = 0; d < dailyMeansC.length; d++) {
    if (dailyMeansC[d] >= limitC) continue;
    sumKd += insideC - dailyMeansC[d];
    heatingDays++;
  }
  return { sumKd, heatingDays };
}

/** Outside temperature at which gains alone hold the room, θ_i − gain/H [°C]. */
export function balanceC(insideC: number, gainW: number, conductanceWPerK: number): number {
  return insideC - gainW / conductanceWPerK;
}

/** Heat by variable-base degree days, H · 86400 · HDD / efficiency [J]. */
export function degreeDayHeatJ(
  conductanceWPerK: number,
  degreeDaysKd: number,
  efficiency: number,
): number {
  return (conductanceWPerK * 86400 * degreeDaysKd) / efficiency;
}
