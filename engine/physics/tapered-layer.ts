// Roof insulation laid to falls: mean U-value over the wedge by ISO 6946, Annex E. Slope up to 5 %.

/**
 * Mean U-value of a rectangular area whose tapered layer rises evenly along one side.
 *
 *   U = ln(1 + R_1/R_0) / R_1
 *
 * @param baseM2KPerW resistance of all that is not tapered, films included [m²·K/W]
 * @param taperM2KPerW greatest resistance of the tapered layer [m²·K/W]
 *
 * Source: ISO 6946:2017, Annex E, E.2.2.
 */
export function taperedRectangleWPerM2K(baseM2KPerW: number, taperM2KPerW: number): number {
  return Math.log1p(taperM2KPerW / baseM2KPerW) / taperM2KPerW;
}

/**
 * Mean U-value of a triangle, thickest at the apex and running out along the base.
 *
 *   U = (2/R_1) · ((1 + R_0/R_1) · ln(1 + R_1/R_0) − 1)
 *
 * Source: ISO 6946:2017, Annex E, E.2.3.
 */
export function taperedThickApexWPerM2K(baseM2KPerW: number, taperM2KPerW: number): number {
  const ratio = baseM2KPerW / taperM2KPerW;
  return (2 / taperM2KPerW) * ((1 + ratio) * Math.log1p(1 / ratio) - 1);
}

/**
 * Mean U-value of a triangle, running out at the apex and thickest along the base.
 *
 *   U = (2/R_1) · (1 − (R_0/R_1) · ln(1 + R_1/R_0))
 *
 * Source: ISO 6946:2017, Annex E, E.2.4.
 */
export function taperedThinApexWPerM2K(baseM2KPerW: number, taperM2KPerW: number): number {
  const ratio = baseM2KPerW / taperM2KPerW;
  return (2 / taperM2KPerW) * (1 - ratio * Math.log1p(1 / ratio));
}

/**
 * Mean U-value of a triangle whose three corners have different thickness, nothing at one of them.
 *
 *   U = 2 · (R_0·R_1·ln(1 + R_2/R_0) − R_0·R_2·ln(1 + R_1/R_0) + R_1·R_2·ln((R_0+R_2)/(R_0+R_1)))
 *       / (R_1·R_2·(R_2 − R_1))
 *
 * @param middleM2KPerW resistance R_1 of the tapered layer at the middle corner, above 0 [m²·K/W]
 * @param greatestM2KPerW resistance R_2 at the thickest corner, above R_1 [m²·K/W]
 *
 * Source: ISO 6946:2017, Annex E, E.2.5 (checked in the tests by quadrature).
 */
export function taperedTriangleWPerM2K(
  baseM2KPerW: number,
  middleM2KPerW: number,
  greatestM2KPerW: number,
): number {
  const r0 = baseM2KPerW;
  const r1 = middleM2KPerW;
  const r2 = greatestM2KPerW;
  const sum =
    r0 * r1 * Math.log1p(r2 / r0) -
    r0 * r2 * Math.log1p(r1 / r0) +
    r1 * r2 * Math.log((r0 + r2) / (r0 + r1));
  return (2 * sum) / (r1 * r2 * (r2 - r1));
}
