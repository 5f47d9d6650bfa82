// Comfort bands that follow the weather, for rooms whose people open windows and choose clothes.

/** Operative temperatures between which people are content. */
export interface ComfortBand {
  readonly lowC: number;
  readonly comfortC: number;
  readonly highC: number;
}

export type ComfortCategory = 'I' | 'II' | 'III';

/** Reach above and below comfort [K]. Source: EN 16798-1:2019, Annex B, Table B.2.2 (from memory). */
const reaches: Readonly<Record<ComfortCategory, readonly [number, number]>> = {
  I: [2, 3],
  II: [3, 4],
  III: [4, 5],
};

/**
 * Band for buildings without mechanical cooling.
 *
 *   t_comfort = 0.33·t_rm + 18.8;  I +2/−3 K, II +3/−4 K, III +4/−5 K
 *
 * @param runningMeanC of the outdoor air [°C]
 * @returns null outside 10 to 30 °C, where the method says nothing
 *
 * Source: EN 16798-1:2019, Annex B.2.2 (from memory; EN 15251:2007 had ±2, ±3, ±4 K).
 */
export function europeanAdaptiveBand(
  runningMeanC: number,
  category: ComfortCategory,
): ComfortBand | null {
  if (!(runningMeanC >= 10 && runningMeanC <= 30)) return null;
  const comfortC = 0.33 * runningMeanC + 18.8;
  const [above, below] = reaches[category];
  return { lowC: comfortC - below, comfortC, highC: comfortC + above };
}

/**
 * Band for rooms controlled by their occupants, naturally ventilated.
 *
 *   t_comfort = 0.31·t_pma + 17.8;  80 % accept ±3.5 K, 90 % accept ±2.5 K
 *
 * @param prevailingMeanC prevailing mean outdoor temperature [°C]
 * @param acceptability 80 or 90 percent
 * @returns null outside 10 to 33.5 °C, where the method says nothing
 *
 * Source: ASHRAE 55-2020, 5.4.2.
 */
export function americanAdaptiveBand(
  prevailingMeanC: number,
  acceptability: 80 | 90,
): ComfortBand | null {
  if (!(prevailingMeanC >= 10 && prevailingMeanC <= 33.5)) return null;
  const comfortC = 0.31 * prevailingMeanC + 17.8;
  const reach = acceptability === 80 ? 3.5 : 2.5;
  return { lowC: comfortC - reach, comfortC, highC: comfortC + reach };
}

/**
 * Raise of an adaptive upper limit where people can turn up the air speed, and it is above 25 °C:
 * 1.2 K from 0.6 m/s, 1.8 K from 0.9, 2.2 K from 1.2; nothing below.
 *
 * Source: ASHRAE 55-2020, 5.4.2.4; EN 16798-1:2019, Annex B (from memory).
 */
export function airSpeedRaiseK(airMPerS: number): number {
  if (airMPerS >= 1.2) return 2.2;
  if (airMPerS >= 0.9) return 1.8;
  return airMPerS >= 0.6 ? 1.2 : 0;
}

const weekWeights = [1, 0.8, 0.6, 0.5, 0.4, 0.3, 0.2];

/**
 * Running mean of the last seven days.
 *
 *   t_rm = (t₋₁ + 0.8·t₋₂ + 0.6·t₋₃ + 0.5·t₋₄ + 0.4·t₋₅ + 0.3·t₋₆ + 0.2·t₋₇)/3.8
 *
 * @param dailyMeanC yesterday first, seven values [°C]
 *
 * Source: EN 16798-1:2019, Annex B (from memory).
 */
export function weekRunningMeanC(dailyMeanC: ArrayLike<number>): number {
  let sum = 0;
  for (let k = 0; k < 7; k++) sum += weekWeights[k] * dailyMeanC[k];
  return sum / 3.8;
}

/**
 * Running mean of tomorrow from that of today.
 *
 *   t_rm = (1 − α)·t_day + α·t_rm,today
 *
 * @param todayMeanC mean outdoor temperature of the day that ends [°C]
 * @param alpha 0.8 in EN 16798-1; 0.6 to 0.9 in ASHRAE 55
 *
 * Source: EN 16798-1:2019, Annex B; ASHRAE 55-2020, appendix on the prevailing mean.
 */
export function nextRunningMeanC(todayMeanC: number, runningMeanC: number, alpha = 0.8): number {
  return (1 - alpha) * todayMeanC + alpha * runningMeanC;
}

/**
 * Running mean for each day of a year that is taken to follow on from itself.
 *
 * @param dailyMeanC one value a day
 * @returns value d is for day d, from the days before it
 */
export function yearRunningMeansC(dailyMeanC: Float64Array, alpha = 0.8): Float64Array {
  const days = dailyMeanC.length;
  const means = new Float64Array(days);
  let running = dailyMeanC[days - 1];
  for (let pass = 0; pass < 2; pass++)
    for (let d = 0; d < days; d++) {
      means[d] = running;
      running = nextRunningMeanC(dailyMeanC[d], running, alpha);
    }
  return means;
}
