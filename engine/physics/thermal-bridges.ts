// Transmission of an envelope: areas, linear and point bridges by ISO 13789; and the conduction shape
// factor of a box-shaped shell.

/**
 * Transmission by areas, Σ A·U.
 *
 * @param areasM2 and `uValuesWPerM2K` run together
 */
export function areaTransmissionWPerK(
  areasM2: readonly number[],
  uValuesWPerM2K: readonly number[],
): number {
  return areasM2.reduce((sum, area, i) => sum + area * uValuesWPerM2K[i], 0);
}

/**
 * Transmission by thermal bridges, Σ l·ψ + Σ χ.
 *
 * ψ may be negative: the areas were then taken too large, as at an outer corner measured outside.
 *
 * Source: ISO 13789:2017, clause 6.2 and ISO 14683:2017.
 */
export function bridgeTransmissionWPerK(
  lengthsM: readonly number[],
  psiWPerMK: readonly number[],
  chiWPerK: readonly number[],
): number {
  const linear = lengthsM.reduce((sum, length, i) => sum + length * psiWPerMK[i], 0);
  return chiWPerK.reduce((sum, chi) => sum + chi, linear);
}

/** Share of an edge's length, and of a corner's thickness, in the shape factor of a shell. */
const edgeFactor = 0.54;
const cornerFactor = 0.15;

/**
 * Conduction shape factor of a closed box of one wall thickness, from its inner to its outer face.
 *
 *   S = A/t + 0.54 · Σ edges + 8 · 0.15 · t
 *
 * Holds where the inner dimensions exceed a fifth of the thickness. The edge value is the handbook's;
 * the exact square edge is 1 − (2/π)·ln 2 = 0.559.
 *
 * @param innerLengthM, innerWidthM, innerHeightM inside dimensions [m]
 * @returns heat flow = λ · S · ΔT [m]
 *
 * Source: conduction shape factors in heat-transfer handbooks (Langmuir 1913; from memory).
 */
export function boxShapeFactorM(
  innerLengthM: number,
  innerWidthM: number,
  innerHeightM: number,
  thicknessM: number,
): number {
  const area =
    2 * (innerLengthM * innerWidthM + innerLengthM * innerHeightM + innerWidthM * innerHeightM);
  const edges = 4 * (innerLengthM + innerWidthM + innerHeightM);
  return area / thicknessM + edgeFactor * edges + 8 * cornerFactor * thicknessM;
}
