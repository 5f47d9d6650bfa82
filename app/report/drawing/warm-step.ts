// Which of the eight warm steps an hour takes: how its temperature lies against the room's own band.

/** Kelvin beyond the band where a further step begins. */
const beyondK = [2, 4] as const;

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

export const stepNames = [
  'over 4 K',
  '2 to 4 K',
  'up to 2 K',
  'lower half',
  'upper half',
  'up to 2 K',
  '2 to 4 K',
  'over 4 K',
] as const;

/**
 * The step of every hour. An hour when nobody is there takes the band of the last one with people;
 * null where nobody ever is.
 */
export function warmSteps(
  temperatureC: Float64Array,
  lowC: Float64Array,
  highC: Float64Array,
): Uint8Array | null {
  let last = lowC.findLastIndex((value) => !Number.isNaN(value));
  if (last < 0) return null;
  const steps = new Uint8Array(temperatureC.length);
  for (let h = 0; h < steps.length; h++) {
    if (!Number.isNaN(lowC[h])) last = h;
    steps[h] = warmStep(temperatureC[h], lowC[last], highC[last]);
  }
  return steps;
}
