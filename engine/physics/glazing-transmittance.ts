// Standard U-value of multiple glazing in its middle, by EN 673.
import { type GasShare, mixtureProperties } from './fill-gas.ts';
import { gapConvectiveWPerM2K, gapRadiativeWPerM2K } from './glazing-gap.ts';

/** Corrected emissivity of uncoated soda-lime glass. Source: EN 673:2011, clause 5.2. */
export const plainGlassEmissivity = 0.837;
/** Conventional surface coefficients of EN 673 for upright glazing [W/(m²·K)]. */
export const glazingOutsideWPerM2K = 25;
export const glazingInsideWPerM2K = 7.7;

// Mean temperature and total difference over the gaps that EN 673 prescribes for its U-value.
const standardMeanK = 283;
const standardMeanC = 10;
const standardDifferenceK = 15;

/** A gap between two panes. */
export interface GlazingGap {
  readonly thicknessM: number;
  /** Corrected emissivities of the two faces that look into the gap. */
  readonly emissivity1: number;
  readonly emissivity2: number;
  readonly filling: readonly GasShare[];
}

export interface GlazingUnit {
  readonly panesM2KPerW: readonly number[];
  /** One fewer than panes, in their order. */
  readonly gaps: readonly GlazingGap[];
  /** Slope, 0 flat to 90 upright [°]. */
  readonly tiltDeg: number;
  readonly outsideWPerM2K: number;
  readonly insideWPerM2K: number;
}

export interface GlazingTransmittance {
  readonly uValueWPerM2K: number;
  /** For each gap. */
  readonly convectiveWPerM2K: readonly number[];
  readonly radiativeWPerM2K: readonly number[];
  /** Share of the standard 15 K that falls on each gap [K]. */
  readonly differenceK: readonly number[];
}

/**
 * U-value of a glazing unit under the standard's conditions: 283 K, 15 K over all gaps together.
 *
 * With several gaps the 15 K are shared out by resistance and the conductances found anew until the
 * shares stand still (a few rounds).
 *
 * Source: EN 673:2011, clauses 5 and 7.
 */
export function glazingTransmittance(unit: GlazingUnit): GlazingTransmittance {
  const { gaps, tiltDeg } = unit;
  const radiative = gaps.map((g) =>
    gapRadiativeWPerM2K(g.emissivity1, g.emissivity2, standardMeanK),
  );
  const gases = gaps.map((g) => mixtureProperties(g.filling, standardMeanC));
  let difference = gaps.map(() => standardDifferenceK / gaps.length);
  let convective: number[] = [];
  let resistance: number[] = [];
  for (let round = 0; round < 100; round++) {
    const k = difference;
    convective = gaps.map((g, i) =>
      gapConvectiveWPerM2K(gases[i], g.thicknessM, k[i], standardMeanK, tiltDeg),
    );
    resistance = convective.map((h, i) => 1 / (h + radiative[i]));
    const sum = resistance.reduce((a, b) => a + b, 0);
    difference = resistance.map((r) => (standardDifferenceK * r) / sum);
    if (difference.every((d, i) => Math.abs(d - k[i]) < 1e-10)) break;
  }
  const glass = unit.panesM2KPerW.reduce((a, b) => a + b, 0);
  const gas = resistance.reduce((a, b) => a + b, 0);
  const total = 1 / unit.outsideWPerM2K + glass + gas + 1 / unit.insideWPerM2K;
  return {
    uValueWPerM2K: 1 / total,
    convectiveWPerM2K: convective,
    radiativeWPerM2K: radiative,
    differenceK: difference,
  };
}

// Normal emissivity and the factor from it to the corrected one.
// Source: EN 673:2011, Annex A, Table A.2 (from memory).
const normalEmissivity = [0.03, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.89];
const correctionFactor = [1.22, 1.18, 1.14, 1.1, 1.06, 1.03, 1, 0.98, 0.96, 0.95, 0.94];

/**
 * Corrected (hemispherical) emissivity of a glass face from the measured normal one.
 *
 * @param normal normal emissivity, 0 to 1; outside 0.03 to 0.89 the end factors are kept
 *
 * Source: EN 673:2011, Annex A, Table A.2 (from memory), straight between its rows.
 */
export function correctedEmissivity(normal: number): number {
  const last = normalEmissivity.length - 1;
  if (normal <= normalEmissivity[0]) return normal * correctionFactor[0];
  if (normal >= normalEmissivity[last]) return normal * correctionFactor[last];
  let k = 0;
  while (normal > normalEmissivity[k + 1]) k++;
  const t = (normal - normalEmissivity[k]) / (normalEmissivity[k + 1] - normalEmissivity[k]);
  return normal * (correctionFactor[k] + t * (correctionFactor[k + 1] - correctionFactor[k]));
}
