// Which of the eight warm steps an hour takes: how the temperature lies against the room's own band
// in that hour. Three steps below the band, two inside it, three above.

/** Kelvin beyond the band where a further step begins. */
export const beyondK = [2, 4] as const;

/** 0 to 7; 3 and 4 are inside the band. */
export function warmStep(temperatureC: number, lowC: number, highC: number): number {
  if (temperatureC < lowC) {
    const below = lowC - temperatureC;
    return below > beyondK[1] ? 0 : below > beyondK[0] ? 1 : 2;
  }
  if (temperatureC > highC) {
    const above = temperatureC - highC;
    return above > beyondK[1] ? 7 : above > beyondK[0] ? 6 : 5;
  }
  return temperatureC < (lowC + highC) / 2 ? 3 : 4;
}

/** Step of a plain scale: how many of the rising `cuts` the value has reached. */
export function stepByCuts(value: number, cuts: readonly number[]): number {
  let step = 0;
  for (const cut of cuts) if (value >= cut) step++;
  return step;
}

export interface CarpetBand {
  readonly lowC: Float64Array;
  readonly highC: Float64Array;
  /** The one band of the whole year, where there is only one. */
  readonly constant: { readonly lowC: number; readonly highC: number } | null;
}

/**
 * A band for every hour, so that empty hours can be coloured too: an hour without people takes the
 * band of the last one with people. `null` where nobody is ever in.
 */
export function carpetBand(lowC: Float64Array, highC: Float64Array): CarpetBand | null {
  const hours = lowC.length;
  let last = -1;
  for (let h = hours - 1; h >= 0 && last < 0; h--) if (!Number.isNaN(lowC[h])) last = h;
  if (last < 0) return null;
  const low = new Float64Array(hours);
  const high = new Float64Array(hours);
  let isConstant = true;
  const first = last;
  for (let h = 0; h < hours; h++) {
    if (!Number.isNaN(lowC[h])) last = h;
    low[h] = lowC[last];
    high[h] = highC[last];
    if (low[h] !== lowC[first] || high[h] !== highC[first]) isConstant = false;
  }
  return {
    lowC: low,
    highC: high,
    constant: isConstant ? { lowC: lowC[first], highC: highC[first] } : null,
  };
}
