// Sunlight at one pane: what passes, what comes back, what stays, for each polarisation.
//
// An uncoated pane follows Snell, Fresnel and Bouguer with all reflections inside it. A coated pane
// is known by its normal values only, and borrows the shape of its angular curve from bare glass.

export type PaneOptics =
  | {
      readonly kind: 'uncoated';
      readonly refractiveIndex: number;
      /** Extinction coefficient times thickness, for a ray straight through. */
      readonly opticalDepth: number;
    }
  | {
      /** Normal solar values, 0 to 1; the front looks outdoors. */
      readonly kind: 'coated';
      readonly transmittance: number;
      readonly frontReflectance: number;
      readonly backReflectance: number;
    };

export type Polarisation = 'perpendicular' | 'parallel';

/** Shares of the light that meets a pane at one angle; transmittance is the same both ways. */
export interface PaneShares {
  readonly transmittance: number;
  readonly frontReflectance: number;
  readonly backReflectance: number;
}

/** Refractive index of soda-lime glass in sunlight. Source: Duffie & Beckman, table 5.1.1. */
export const glassRefractiveIndex = 1.526;

/**
 * Reflectance of one face of glass.
 *
 *   r⊥ = (cos θ1 − n·cos θ2)²/(cos θ1 + n·cos θ2)²,  r∥ = (n·cos θ1 − cos θ2)²/(n·cos θ1 + cos θ2)²
 *
 * @param cosine of the angle of incidence, 0 to 1
 *
 * Source: Fresnel; J. A. Duffie, W. A. Beckman, Solar Engineering of Thermal Processes, 5.1.
 */
export function faceReflectance(
  refractiveIndex: number,
  cosine: number,
  polarisation: Polarisation,
): number {
  const inner = refractedCosine(refractiveIndex, cosine);
  const [a, b] =
    polarisation === 'perpendicular'
      ? [cosine, refractiveIndex * inner]
      : [refractiveIndex * cosine, inner];
  return ((a - b) / (a + b)) ** 2;
}

/** Cosine of the ray inside the glass, by Snell. */
function refractedCosine(refractiveIndex: number, cosine: number): number {
  return Math.sqrt(1 - (1 - cosine * cosine) / refractiveIndex ** 2);
}

/**
 * Shares of a pane for one polarisation.
 *
 *   uncoated:  τ = a·(1 − r)²/(1 − r²a²),  ρ = r·(1 + a·τ),  a = exp(−KL/cos θ2)
 *   coated:    τ = τ0·(1 − w),  ρ = ρ0 + (1 − ρ0)·w,  w = (ρg(θ) − ρg(0))/(1 − ρg(0))
 *
 * ρg is a pane of clear glass without absorption. So a coated pane's shares never exceed 1, and all
 * light is reflected at grazing incidence.
 *
 * Source: uncoated, Duffie & Beckman, 5.1 to 5.3. Coated, scaling to bare glass as proposed by
 * M. Rubin, R. Powles, K. von Rottkay, "Models for the angle-dependent optical properties of coated
 * glazing materials", Solar Energy 66 (1999), pp. 267–276; the form that keeps the sum is ours.
 */
export function paneShares(
  pane: PaneOptics,
  cosine: number,
  polarisation: Polarisation,
): PaneShares {
  if (pane.kind === 'uncoated') {
    const n = pane.refractiveIndex;
    const r = faceReflectance(n, cosine, polarisation);
    const a = Math.exp(-pane.opticalDepth / refractedCosine(n, cosine));
    const transmittance = (a * (1 - r) ** 2) / (1 - (r * a) ** 2);
    const reflectance = r * (1 + a * transmittance);
    return { transmittance, frontReflectance: reflectance, backReflectance: reflectance };
  }
  const at = clearReflectance(faceReflectance(glassRefractiveIndex, cosine, polarisation));
  const normal = clearReflectance(faceReflectance(glassRefractiveIndex, 1, polarisation));
  const w = (at - normal) / (1 - normal);
  return {
    transmittance: pane.transmittance * (1 - w),
    frontReflectance: pane.frontReflectance + (1 - pane.frontReflectance) * w,
    backReflectance: pane.backReflectance + (1 - pane.backReflectance) * w,
  };
}

/** Reflectance of a pane that does not absorb, from that of its faces: 2r/(1 + r). */
function clearReflectance(r: number): number {
  return (2 * r) / (1 + r);
}

/**
 * Uncoated pane from its measured normal transmittance and reflectance.
 *
 *   β = τ² − ρ² + 2ρ + 1,  r = (β − √(β² − 4·(2 − ρ)·ρ))/(2·(2 − ρ)),  a = (ρ − r)/(r·τ)
 *   n = (1 + √r)/(1 − √r),  KL = −ln a
 *
 * @param transmittance above 0, @param reflectance above 0; together at most 1
 *
 * Source: M. Rubin, "Optical properties of soda lime silica glasses", Solar Energy Materials 12
 * (1985), pp. 275–288.
 */
export function uncoatedPane(transmittance: number, reflectance: number): PaneOptics {
  const [t, rho] = [transmittance, reflectance];
  const beta = t * t - rho * rho + 2 * rho + 1;
  const r = (beta - Math.sqrt(beta * beta - 4 * (2 - rho) * rho)) / (2 * (2 - rho));
  const a = Math.min(1, (rho - r) / (r * t));
  const root = Math.sqrt(r);
  return {
    kind: 'uncoated',
    refractiveIndex: (1 + root) / (1 - root),
    opticalDepth: -Math.log(a),
  };
}

/**
 * Uncoated pane from its normal transmittance and a refractive index.
 *
 *   τ·r²·a² + (1 − r)²·a − τ = 0
 *
 * @param transmittance above 0 and at most that of clear glass of this index
 */
export function glassPane(
  transmittance: number,
  refractiveIndex: number = glassRefractiveIndex,
): PaneOptics {
  const r = faceReflectance(refractiveIndex, 1, 'parallel');
  const p = (1 - r) ** 2;
  const q = transmittance * r * r;
  const a = (2 * transmittance) / (p + Math.sqrt(p * p + 4 * q * transmittance));
  return { kind: 'uncoated', refractiveIndex, opticalDepth: Math.max(0, -Math.log(a)) };
}
