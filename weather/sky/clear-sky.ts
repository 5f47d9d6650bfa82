// What the sun sends through a cloudless sky.
import { radPerDeg } from '../sun/ephemeris.ts';

export interface ClearSky {
  readonly ghiWPerM2: number;
  readonly dniWPerM2: number;
  readonly dhiWPerM2: number;
}

/**
 * Global on the horizontal from the zenith alone: 1098 · cos z · exp(−0.059 / cos z) [W/m²].
 * Source: B. Haurwitz, "Insolation in relation to cloudiness and cloud density", J. Meteorology 2
 * (1945), pp. 154-166.
 */
export function haurwitzWPerM2(zenithDeg: number): number {
  const cosine = Math.cos(zenithDeg * radPerDeg);
  return cosine > 0 ? 1098 * cosine * Math.exp(-0.059 / cosine) : 0;
}

/**
 * Beam and diffuse from the two optical depths that a climate table lists for each month.
 *
 *   DNI = I0 · exp(−τb · m^b),  DHI = I0 · exp(−τd · m^d)
 *
 * Source: ASHRAE Handbook of Fundamentals, chapter "Climatic design information" (coefficients from
 * memory). `edition` picks the exponents: 2013 and later, or 2009.
 */
export function opticalDepthSky(
  zenithDeg: number,
  extraterrestrialWPerM2: number,
  airMass: number,
  tauBeam: number,
  tauDiffuse: number,
  edition: 2009 | 2013 = 2013,
): ClearSky {
  const both = tauBeam * tauDiffuse;
  const [beam, diffuse] =
    edition === 2009
      ? [
          1.219 - 0.043 * tauBeam - 0.151 * tauDiffuse - 0.204 * both,
          0.202 + 0.852 * tauBeam - 0.007 * tauDiffuse - 0.357 * both,
        ]
      : [
          1.454 - 0.406 * tauBeam - 0.268 * tauDiffuse + 0.021 * both,
          0.507 + 0.205 * tauBeam - 0.08 * tauDiffuse - 0.19 * both,
        ];
  const dniWPerM2 = extraterrestrialWPerM2 * Math.exp(-tauBeam * airMass ** beam);
  const dhiWPerM2 = extraterrestrialWPerM2 * Math.exp(-tauDiffuse * airMass ** diffuse);
  const cosine = Math.max(0, Math.cos(zenithDeg * radPerDeg));
  return { dniWPerM2, dhiWPerM2, ghiWPerM2: dniWPerM2 * cosine + dhiWPerM2 };
}

/**
 * Clear sky from the Linke turbidity (2 very clear, 3 clear, 5 hazy) and the elevation.
 * Source: P. Ineichen, R. Perez, "A new airmass independent formulation for the Linke turbidity
 * coefficient", Solar Energy 73 (2002), pp. 151-157.
 * @param airMass absolute: relative air mass times pressure over 101325 Pa
 */
export function turbiditySky(
  zenithDeg: number,
  extraterrestrialWPerM2: number,
  airMass: number,
  linkeTurbidity: number,
  elevationM: number,
): ClearSky {
  const cosine = Math.max(0, Math.cos(zenithDeg * radPerDeg));
  if (cosine === 0) return { ghiWPerM2: 0, dniWPerM2: 0, dhiWPerM2: 0 };
  const f1 = Math.exp(-elevationM / 8000);
  const f2 = Math.exp(-elevationM / 1250);
  const c1 = 5.09e-5 * elevationM + 0.868;
  const c2 = 3.92e-5 * elevationM + 0.0387;
  const depth = c2 * airMass * (f1 + f2 * (linkeTurbidity - 1));
  const ghiWPerM2 = c1 * extraterrestrialWPerM2 * cosine * Math.exp(-depth);
  const b = 0.664 + 0.163 / f1;
  const beam = b * extraterrestrialWPerM2 * Math.exp(-0.09 * airMass * (linkeTurbidity - 1));
  const leastDiffuse = (0.1 - 0.2 * Math.exp(-linkeTurbidity)) / (0.1 + 0.882 / f1);
  const dniWPerM2 = Math.min(beam, Math.max(0, (ghiWPerM2 * (1 - leastDiffuse)) / cosine));
  return { ghiWPerM2, dniWPerM2, dhiWPerM2: ghiWPerM2 - dniWPerM2 * cosine };
}
