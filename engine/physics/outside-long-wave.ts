// What a face outdoors sees, and the long-wave heat that it gains from sky, air and ground.
import { stefanBoltzmannWPerM2K4 } from './radiosity.ts';

/** Shares of a face's view, 0 to 1; together 1. */
export interface OutsideViews {
  readonly sky: number;
  /** Low sky, seen through so much air that it counts at air temperature. */
  readonly air: number;
  readonly ground: number;
}

/**
 * View of a face by its tilt.
 *
 *   F_sky = (1 + cos β)/2,  F_ground = (1 − cos β)/2;  of the sky's share √F_sky is cold, the rest at
 *   air temperature
 *
 * @param lowSkyAtAir false: the whole sky at its own temperature
 *
 * Source: G. N. Walton, NBSIR 83-2655, 1983 (split of the sky); isotropic dome and level ground.
 */
export function outsideViews(tiltDeg: number, lowSkyAtAir: boolean): OutsideViews {
  const sky = (1 + Math.cos((tiltDeg * Math.PI) / 180)) / 2;
  const cold = lowSkyAtAir ? sky * Math.sqrt(sky) : sky;
  return { sky: cold, air: sky - cold, ground: 1 - sky };
}

/**
 * Long-wave heat that a grey face gains from black surroundings of one temperature.
 *
 *   q = ε·F·σ·(T_surroundings⁴ − T_face⁴)
 *
 * @param view share of its view, 0 to 1
 * @returns positive where it warms the face [W/m²]
 */
export function longWaveGainWPerM2(
  emissivity: number,
  view: number,
  faceC: number,
  surroundingsC: number,
): number {
  const [a, b] = [surroundingsC + 273.15, faceC + 273.15];
  return emissivity * view * stefanBoltzmannWPerM2K4 * (a ** 4 - b ** 4);
}

/**
 * Sol-air temperature: air that, without sun and cold sky, would bring the face the same heat.
 *
 *   t = t_air + (α·G + q_lw)/h_e
 *
 * @param longWaveWPerM2 gain of a face at air temperature, negative under a cold sky
 * @param filmWPerM2K convection and radiation together
 *
 * Source: C. O. Mackey, L. T. Wright, ASHVE Transactions 50 (1944); ASHRAE Handbook of Fundamentals.
 */
export function solAirC(
  airC: number,
  sunWPerM2: number,
  absorptance: number,
  longWaveWPerM2: number,
  filmWPerM2K: number,
): number {
  return airC + (absorptance * sunWPerM2 + longWaveWPerM2) / filmWPerM2K;
}
