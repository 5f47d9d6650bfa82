// Diffuse share of global radiation from the clearness index, for tables that hold the global only.

/**
 * Erbs, Klein and Duffie: the default split.
 * Source: D. Erbs, S. Klein, J. Duffie, "Estimation of the diffuse radiation fraction for hourly,
 * daily and monthly-average global radiation", Solar Energy 28 (1982), pp. 293-302.
 * @param clearnessIndex global over extraterrestrial, both on the horizontal, 0 to 1
 */
export function erbsDiffuseShare(clearnessIndex: number): number {
  const k = clearnessIndex;
  if (k <= 0.22) return 1 - 0.09 * k;
  if (k > 0.8) return 0.165;
  return 0.9511 + k * (-0.1604 + k * (4.388 + k * (-16.638 + k * 12.336)));
}

/** Source: J. Orgill, K. Hollands, Solar Energy 19 (1977), pp. 357-359. */
export function orgillHollandsDiffuseShare(clearnessIndex: number): number {
  if (clearnessIndex < 0.35) return 1 - 0.249 * clearnessIndex;
  if (clearnessIndex <= 0.75) return 1.557 - 1.84 * clearnessIndex;
  return 0.177;
}

/** One-variable form. Source: D. Reindl, W. Beckman, J. Duffie, Solar Energy 45 (1990), pp. 1-7. */
export function reindlDiffuseShare(clearnessIndex: number): number {
  if (clearnessIndex <= 0.3) return Math.min(1, 1.02 - 0.248 * clearnessIndex);
  if (clearnessIndex < 0.78) return 1.45 - 1.67 * clearnessIndex;
  return 0.147;
}

/** One-variable logistic form. Source: J. Boland, L. Scott, M. Luther, Environmetrics 12 (2001). */
export function bolandDiffuseShare(clearnessIndex: number): number {
  return 1 / (1 + Math.exp(8.645 * (clearnessIndex - 0.613)));
}

/**
 * Boland, Ridley and Lauret's logistic form with five predictors.
 * Source: B. Ridley, J. Boland, P. Lauret, "Modelling of diffuse solar fraction with multiple
 * predictors", Renewable Energy 35 (2010), pp. 478-483 (coefficients from memory).
 * @param solarTimeH apparent solar time
 * @param daily clearness index of the whole day
 * @param persistence mean of the hourly index before and after
 */
export function bolandRidleyLauretDiffuseShare(
  clearnessIndex: number,
  solarTimeH: number,
  altitudeDeg: number,
  daily: number,
  persistence: number,
): number {
  const power =
    -5.38 +
    6.63 * clearnessIndex +
    0.006 * solarTimeH -
    0.007 * altitudeDeg +
    1.75 * daily +
    1.31 * persistence;
  return 1 / (1 + Math.exp(power));
}

/** Above this zenith a beam is not derived: dividing by the cosine would invent one. */
export const splitMaxZenithDeg = 87;

/** Least cosine of the zenith in the clearness index: about 86.3 degrees. */
const leastCosZenith = 0.065;

export interface SplitIrradiance {
  readonly clearnessIndex: number;
  readonly diffuseShare: number;
  readonly dhiWPerM2: number;
  readonly dniWPerM2: number;
}

/**
 * Global split into beam and diffuse, closed so that GHI = DNI·cos z + DHI. With the sun under 3
 * degrees all of it counts as diffuse.
 */
export function splitGlobal(
  ghiWPerM2: number,
  zenithDeg: number,
  extraterrestrialWPerM2: number,
  share: (clearnessIndex: number) => number = erbsDiffuseShare,
): SplitIrradiance {
  const cosZenith = Math.cos((zenithDeg * Math.PI) / 180);
  const outside = extraterrestrialWPerM2 * Math.max(cosZenith, leastCosZenith);
  const clearnessIndex = Math.max(0, Math.min(1, ghiWPerM2 / outside));
  const diffuseShare = share(clearnessIndex);
  if (zenithDeg > splitMaxZenithDeg)
    return { clearnessIndex, diffuseShare, dhiWPerM2: ghiWPerM2, dniWPerM2: 0 };
  const dhiWPerM2 = diffuseShare * ghiWPerM2;
  return {
    clearnessIndex,
    diffuseShare,
    dhiWPerM2,
    dniWPerM2: Math.max(0, (ghiWPerM2 - dhiWPerM2) / cosZenith),
  };
}
