// U-value of whole windows by ISO 10077-1: glass and frame by area, the glass edge by length; closed
// shutters; two windows one behind the other.

export interface WindowParts {
  readonly windowAreaM2: number;
  readonly glassAreaM2: number;
  readonly frameAreaM2: number;
  /** Visible edge of the glass, all panes together [m]. */
  readonly edgeLengthM: number;
}

/**
 * Areas and edge of a window with equal panes side by side, the mullions as wide as the frame.
 *
 * @param paneCount panes side by side, 1 or more
 *
 * Source: ISO 10077-1:2017, clause 5 (definitions of areas and of the visible edge).
 */
export function windowParts(
  widthM: number,
  heightM: number,
  frameWidthM: number,
  paneCount: number,
): WindowParts {
  const paneWidthM = (widthM - (paneCount + 1) * frameWidthM) / paneCount;
  const paneHeightM = heightM - 2 * frameWidthM;
  if (!(paneWidthM > 0 && paneHeightM > 0)) {
    throw new RangeError(
      `a frame ${frameWidthM} m wide leaves no glass in ${widthM} × ${heightM} m`,
    );
  }
  const windowAreaM2 = widthM * heightM;
  const glassAreaM2 = paneCount * paneWidthM * paneHeightM;
  return {
    windowAreaM2,
    glassAreaM2,
    frameAreaM2: windowAreaM2 - glassAreaM2,
    edgeLengthM: paneCount * 2 * (paneWidthM + paneHeightM),
  };
}

/**
 * U-value of a window.
 *
 *   U_w = (A_g·U_g + A_f·U_f + l_g·ψ_g) / (A_g + A_f)
 *
 * @param edgePsiWPerMK linear transmittance of spacer, glass edge and frame together [W/(m·K)]
 *
 * Source: ISO 10077-1:2017, clause 6.4.
 */
export function windowUValueWPerM2K(
  parts: WindowParts,
  glassWPerM2K: number,
  frameWPerM2K: number,
  edgePsiWPerMK: number,
): number {
  const { glassAreaM2, frameAreaM2, edgeLengthM, windowAreaM2 } = parts;
  const sum = glassAreaM2 * glassWPerM2K + frameAreaM2 * frameWPerM2K + edgeLengthM * edgePsiWPerMK;
  return sum / windowAreaM2;
}

/** How much air passes a closed shutter at its edges, from loose to sealed. */
export type ShutterPermeability = 'very-high' | 'high' | 'average' | 'low' | 'tight';

/**
 * Resistance that a closed shutter and the air behind it add.
 *
 *   very high 0.08;  high 0.25·R_sh + 0.09;  average 0.55·R_sh + 0.11;  low 0.80·R_sh + 0.14;
 *   tight 0.95·R_sh + 0.17
 *
 * @param shutterM2KPerW resistance of the shutter itself, below 0.3 [m²·K/W]
 *
 * Source: ISO 10077-1:2017, clause 6.4.4 and Annex C (coefficients from memory).
 */
export function shutterResistanceM2KPerW(
  shutterM2KPerW: number,
  permeability: ShutterPermeability,
): number {
  switch (permeability) {
    case 'very-high':
      return 0.08;
    case 'high':
      return 0.25 * shutterM2KPerW + 0.09;
    case 'average':
      return 0.55 * shutterM2KPerW + 0.11;
    case 'low':
      return 0.8 * shutterM2KPerW + 0.14;
    case 'tight':
      return 0.95 * shutterM2KPerW + 0.17;
  }
}

/** U-value of a window behind a closed shutter, 1 / (1/U_w + ΔR). Source: ISO 10077-1:2017, 6.4.4. */
export function shutteredUValueWPerM2K(windowWPerM2K: number, addedM2KPerW: number): number {
  return 1 / (1 / windowWPerM2K + addedM2KPerW);
}

/**
 * U-value of two windows in series.
 *
 *   U = 1 / (1/U_1 − R_si + R_s − R_se + 1/U_2),  R_si = 0.13, R_se = 0.04
 *
 * @param gapM2KPerW resistance of the air between them [m²·K/W]
 *
 * Source: ISO 10077-1:2017, clause 6.4.2.
 */
export function doubleWindowUValueWPerM2K(
  firstWPerM2K: number,
  secondWPerM2K: number,
  gapM2KPerW: number,
): number {
  return 1 / (1 / firstWPerM2K - 0.13 + gapM2KPerW - 0.04 + 1 / secondWPerM2K);
}
