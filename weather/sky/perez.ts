// Sky light after Perez 1990: an even dome, a bright patch around the sun, a band along the horizon.
//
// Source: R. Perez, P. Ineichen, R. Seals, J. Michalsky, R. Stewart, "Modeling daylight availability
// and irradiance components from direct and global irradiance", Solar Energy 44(5) (1990),
// pp. 271-289, doi:10.1016/0038-092X(90)90055-H; coefficients of its table 6, all sites.

/** Lower bounds of the clearness bins, 1 overcast to 8 clear. A bound belongs to the bin above it. */
export const perezBinBounds = [1, 1.065, 1.23, 1.5, 1.95, 2.8, 4.5, 6.2] as const;

/** Rows are bins; columns f11, f12, f13, f21, f22, f23. */
export const perezCoefficients = [
  [-0.008, 0.588, -0.062, -0.06, 0.072, -0.022],
  [0.13, 0.683, -0.151, -0.019, 0.066, -0.029],
  [0.33, 0.487, -0.221, 0.055, -0.064, -0.026],
  [0.568, 0.187, -0.295, 0.109, -0.152, -0.014],
  [0.873, -0.392, -0.362, 0.226, -0.462, 0.001],
  [1.132, -1.237, -0.412, 0.288, -0.823, 0.056],
  [1.06, -1.6, -0.359, 0.264, -1.127, 0.131],
  [0.678, -0.327, -0.25, 0.156, -1.377, 0.251],
] as const;

/** Clearness ε = ((D + I) / D + κ·z³) / (1 + κ·z³) with κ = 1.041 and z in radians. */
export function perezClearness(dhiWPerM2: number, dniWPerM2: number, zenithRad: number): number {
  const third = 1.041 * zenithRad ** 3;
  return ((dhiWPerM2 + dniWPerM2) / dhiWPerM2 + third) / (1 + third);
}

/** Index of the bin, 0 to 7. */
export function perezBin(clearness: number): number {
  let bin = 7;
  while (bin > 0 && clearness < perezBinBounds[bin]) bin--;
  return bin;
}

/** Share F1 of the diffuse light that comes from around the sun, 0 or more. */
export function perezCircumsolar(bin: number, brightness: number, zenithRad: number): number {
  const f = perezCoefficients[bin];
  return Math.max(0, f[0] + f[1] * brightness + f[2] * zenithRad);
}

/** Strength F2 of the horizon band; negative when the sky is darker there. */
export function perezHorizon(bin: number, brightness: number, zenithRad: number): number {
  const f = perezCoefficients[bin];
  return f[3] + f[4] * brightness + f[5] * zenithRad;
}

/** Least cosine of the zenith by which circumsolar light is brought onto the horizontal: 85 degrees. */
export const perezLeastCosZenith = Math.cos((85 * Math.PI) / 180);

export interface PerezParts {
  readonly isotropicWPerM2: number;
  readonly circumsolarWPerM2: number;
  /** Negative where the horizon is darker than the dome; never below minus the other two. */
  readonly horizonWPerM2: number;
}

/**
 * Diffuse irradiance on a tilted plane in its three parts.
 *
 *   D · ((1 − F1)·(1 + cos β)/2 + F1·max(0, cos i)/max(cos 85°, cos z) + F2·sin β)
 *
 * @param brightness Δ = D · m / I0, with the relative air mass m and the extraterrestrial normal I0
 */
export function perezDiffuse(
  dhiWPerM2: number,
  dniWPerM2: number,
  zenithRad: number,
  brightness: number,
  cosIncidence: number,
  tiltRad: number,
): PerezParts {
  if (!(dhiWPerM2 > 0)) return { isotropicWPerM2: 0, circumsolarWPerM2: 0, horizonWPerM2: 0 };
  const bin = perezBin(perezClearness(dhiWPerM2, dniWPerM2, zenithRad));
  const f1 = perezCircumsolar(bin, brightness, zenithRad);
  const f2 = perezHorizon(bin, brightness, zenithRad);
  const isotropicWPerM2 = (dhiWPerM2 * (1 - f1) * (1 + Math.cos(tiltRad))) / 2;
  const toward = Math.max(0, cosIncidence) / Math.max(perezLeastCosZenith, Math.cos(zenithRad));
  const circumsolarWPerM2 = dhiWPerM2 * f1 * toward;
  const horizon = dhiWPerM2 * f2 * Math.sin(tiltRad);
  const horizonWPerM2 = Math.max(horizon, -isotropicWPerM2 - circumsolarWPerM2);
  return { isotropicWPerM2, circumsolarWPerM2, horizonWPerM2 };
}
