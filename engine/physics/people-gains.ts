// Heat, vapour and carbon dioxide of people by activity and room air, from the body's heat balance of
// ISO 7730, so that the dry share falls as the room warms and no table ends.

/** Metabolic rate of one met [W/m²]. Source: ISO 7730:2005. */
export const metWPerM2 = 58.15;
/** Skin area of an average adult. Source: ISO 8996 (DuBois), 1.8 m². */
export const adultSkinM2 = 1.8;

/** Activities by their metabolic rate. Source: ISO 7730:2005, Annex B and ISO 8996 (from memory). */
export const activityMet = {
  sleeping: 0.8,
  reclining: 0.8,
  seated: 1.0,
  'seated-work': 1.2,
  'standing-light': 1.6,
  'standing-medium': 2.0,
  'walking-3-km-per-h': 2.4,
  'heavy-work': 3.0,
  exercise: 5.0,
} as const;

export type Activity = keyof typeof activityMet;

/** What one person gives to the room. */
export interface PersonGain {
  readonly sensibleW: number;
  readonly latentW: number;
  readonly vapourKgPerS: number;
}

const latentJPerKg = 2.43e6; // evaporation at skin temperature

/**
 * Sensible and latent heat of one person.
 *
 *   latent = A · (3.05·10⁻³·(5733 − 6.99·M − p_a) + 0.42·(M − 58.15) + 1.7·10⁻⁵·M·(5867 − p_a))
 *
 * The equations hold for a person near comfort. Warmer rooms are answered by more sweat: above 24 °C
 * the dry heat is let fall in proportion to the distance from 36 °C, the rest becomes vapour, so the
 * sum stays the metabolic rate.
 *
 * @param metRate activity [met]
 * @param airC air temperature of the room; used above 24 °C only [°C]
 * @param vapourPa vapour pressure of the room air [Pa]
 * @param skinM2 skin area; 1.8 adult, about 1.1 for a child of ten
 *
 * Source: ISO 7730:2005, clause 4 (terms of the heat balance); the fall above 24 °C is common
 * practice, no source (handbook tables drop the dry heat by about 20 % at 27 °C).
 */
export function personGain(
  metRate: number,
  airC: number,
  vapourPa: number,
  skinM2 = adultSkinM2,
): PersonGain {
  const m = metRate * metWPerM2; // W/m²
  const skin = 3.05e-3 * (5733 - 6.99 * m - vapourPa);
  const sweat = 0.42 * Math.max(0, m - 58.15);
  const breath = 1.7e-5 * m * (5867 - vapourPa);
  const comfortable = m - Math.max(0, skin) - sweat - Math.max(0, breath);
  const warm = Math.min(1, Math.max(0, (36 - airC) / (36 - 24)));
  const sensibleW = skinM2 * Math.max(0, comfortable) * warm;
  const latentW = skinM2 * m - sensibleW;
  return { sensibleW, latentW, vapourKgPerS: latentW / latentJPerKg };
}

/**
 * Carbon dioxide of one person.
 *
 *   q = 0.00276 · A · M · RQ / (0.23·RQ + 0.77) l/s,  RQ = 0.83
 *
 * Source: ASHRAE Handbook of Fundamentals, chapter on physiological principles; EN 16798-2 uses
 * 20 l/h for a seated adult at work (from memory).
 */
export function personCo2M3PerS(metRate: number, skinM2 = adultSkinM2): number {
  const rq = 0.83;
  return (0.00276e-3 * skinM2 * metRate * rq) / (0.23 * rq + 0.77);
}
