// How a layered wall answers a sinusoidal temperature, by heat transfer matrices in closed form.
//
//   (θ2, q2) = Z·(θ1, q1),   Z = Zs2·ZN·…·Z1·Zs1,   side 1 inside, side 2 outside
//
// θ and q are complex amplitudes. Exact for one-dimensional layers of constant properties.
// Source of all: ISO 13786:2017 (transfer matrices in clause 7, characteristics in clause 8).
import { type Layer, layerCapacityJPerM2K, layerResistanceM2KPerW } from './conduction-mesh.ts';

/** Complex number. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/** Two by two complex matrix. */
export interface TransferMatrix {
  readonly z11: Complex;
  readonly z12: Complex;
  readonly z21: Complex;
  readonly z22: Complex;
}

export interface WallDynamics {
  /** Steady transmittance with the given films [W/(m²·K)]. */
  readonly uValueWPerM2K: number;
  /** Periodic transmittance |Y12| [W/(m²·K)]. */
  readonly periodicTransmittanceWPerM2K: number;
  /** Share |Y12|/U, 0 to 1. */
  readonly decrementFactor: number;
  /** Delay of the inside heat flow behind the outside temperature, 0 to one period [h]. */
  readonly timeShiftH: number;
  readonly insideAdmittanceWPerM2K: number;
  /** Lead of the inside heat flow over the inside temperature [h]. */
  readonly insideLeadH: number;
  readonly outsideAdmittanceWPerM2K: number;
  readonly outsideLeadH: number;
  /** Areal heat capacities [J/(m²·K)]. */
  readonly insideCapacityJPerM2K: number;
  readonly outsideCapacityJPerM2K: number;
}

const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const size = (a: Complex): number => Math.hypot(a.re, a.im);
const phase = (a: Complex): number => Math.atan2(a.im, a.re);

/** −a/b. */
function minusQuotient(a: Complex, b: Complex): Complex {
  const square = b.re * b.re + b.im * b.im;
  return {
    re: -(a.re * b.re + a.im * b.im) / square,
    im: -(a.im * b.re - a.re * b.im) / square,
  };
}

/** Product left·right. */
function product(left: TransferMatrix, right: TransferMatrix): TransferMatrix {
  return {
    z11: plus(times(left.z11, right.z11), times(left.z12, right.z21)),
    z12: plus(times(left.z11, right.z12), times(left.z12, right.z22)),
    z21: plus(times(left.z21, right.z11), times(left.z22, right.z21)),
    z22: plus(times(left.z21, right.z12), times(left.z22, right.z22)),
  };
}

/** Matrix of a plain resistance R: (1, −R; 0, 1). */
function resistanceMatrix(resistanceM2KPerW: number): TransferMatrix {
  return {
    z11: { re: 1, im: 0 },
    z12: { re: -resistanceM2KPerW, im: 0 },
    z21: { re: 0, im: 0 },
    z22: { re: 1, im: 0 },
  };
}

/**
 * Depth at which a sinusoidal surface temperature has fallen to 1/e.
 *
 *   δ = √(λ·T/(π·ρ·c))
 *
 * Source: ISO 13786:2017, 7.2.2.
 */
export function penetrationDepthM(
  conductivityWPerMK: number,
  densityKgPerM3: number,
  specificHeatJPerKgK: number,
  periodS: number,
): number {
  const volumetric = densityKgPerM3 * specificHeatJPerKgK; // J/(m³·K)
  return Math.sqrt((conductivityWPerMK * periodS) / (Math.PI * volumetric));
}

/** Transfer matrix of one layer for a period [s]. Source: ISO 13786:2017, 7.2.3. */
export function layerMatrix(layer: Layer, periodS: number): TransferMatrix {
  const resistance = layerResistanceM2KPerW(layer);
  const capacity = layerCapacityJPerM2K(layer);
  if (capacity === 0) return resistanceMatrix(resistance);
  // ξ = d/δ; with R and C in place of λ and ρc, so that δ/λ = R/ξ and λ/δ = ξ/R.
  const xi = Math.sqrt((Math.PI * resistance * capacity) / periodS);
  const cc = Math.cosh(xi) * Math.cos(xi);
  const ss = Math.sinh(xi) * Math.sin(xi);
  const sc = Math.sinh(xi) * Math.cos(xi);
  const cs = Math.cosh(xi) * Math.sin(xi);
  const a = -resistance / (2 * xi);
  const b = -xi / resistance;
  return {
    z11: { re: cc, im: ss },
    z12: { re: a * (sc + cs), im: a * (cs - sc) },
    z21: { re: b * (sc - cs), im: b * (sc + cs) },
    z22: { re: cc, im: ss },
  };
}

/**
 * Matrix of a whole construction from inside to outside.
 *
 * @param layers from outside to inside
 */
export function wallMatrix(
  layers: readonly Layer[],
  insideFilmM2KPerW: number,
  outsideFilmM2KPerW: number,
  periodS: number,
): TransferMatrix {
  let matrix = resistanceMatrix(outsideFilmM2KPerW);
  for (const layer of layers) matrix = product(matrix, layerMatrix(layer, periodS));
  return product(matrix, resistanceMatrix(insideFilmM2KPerW));
}

/**
 * Dynamic characteristics of a construction with its films.
 *
 *   Y12 = −1/Z12,  Y11 = −Z11/Z12,  Y22 = −Z22/Z12,  κ = (T/2π)·|(Z − 1)/Z12|
 *
 * @param layers from outside to inside
 * @param insideFilmM2KPerW surface resistances, 0 for surface to surface [m²·K/W]
 * @param periodS one day is 86 400 [s]
 *
 * Source: ISO 13786:2017, clause 8.
 */
export function wallDynamics(
  layers: readonly Layer[],
  insideFilmM2KPerW: number,
  outsideFilmM2KPerW: number,
  periodS: number,
): WallDynamics {
  const z = wallMatrix(layers, insideFilmM2KPerW, outsideFilmM2KPerW, periodS);
  let resistance = insideFilmM2KPerW + outsideFilmM2KPerW;
  for (const layer of layers) resistance += layerResistanceM2KPerW(layer);
  const hPerRad = periodS / 3600 / (2 * Math.PI);
  const one: Complex = { re: 1, im: 0 };
  const y12 = minusQuotient(one, z.z12);
  const y11 = minusQuotient(z.z11, z.z12);
  const y22 = minusQuotient(z.z22, z.z12);
  const less = (a: Complex): Complex => ({ re: a.re - 1, im: a.im });
  const capacity = (a: Complex) => (periodS / (2 * Math.PI)) * (size(less(a)) / size(z.z12));
  const lag = -phase(y12);
  return {
    uValueWPerM2K: 1 / resistance,
    periodicTransmittanceWPerM2K: size(y12),
    decrementFactor: size(y12) * resistance,
    timeShiftH: (lag < 0 ? lag + 2 * Math.PI : lag) * hPerRad,
    insideAdmittanceWPerM2K: size(y11),
    insideLeadH: phase(y11) * hPerRad,
    outsideAdmittanceWPerM2K: size(y22),
    outsideLeadH: phase(y22) * hPerRad,
    insideCapacityJPerM2K: capacity(z.z11),
    outsideCapacityJPerM2K: capacity(z.z22),
  };
}

/**
 * Half of a partition with the same room on both sides: no heat passes its middle.
 *
 *   Y = −Z21/Z22,  κ = (T/2π)·|Y|
 *
 * @param layers from the middle to the room's face
 *
 * Source: ISO 13786:2017, clause 8, with the zero-flow condition at the plane of symmetry.
 */
export function halfPartition(
  layers: readonly Layer[],
  insideFilmM2KPerW: number,
  periodS: number,
): {
  readonly admittanceWPerM2K: number;
  readonly leadH: number;
  readonly capacityJPerM2K: number;
} {
  const z = wallMatrix(layers, insideFilmM2KPerW, 0, periodS);
  // q2 = Z21·θ1 + Z22·q1 = 0, so q1 = −(Z21/Z22)·θ1, positive into the wall as seen from side 1.
  const y = minusQuotient(z.z21, z.z22);
  return {
    admittanceWPerM2K: size(y),
    leadH: (phase(y) * periodS) / 3600 / (2 * Math.PI),
    capacityJPerM2K: (size(y) * periodS) / (2 * Math.PI),
  };
}
