// Radiation as a conductance, for links whose emissivity changes from step to step.
import { stefanBoltzmannWPerM2K4 } from '../physics/index.ts';
import type { FlowRef, NetworkBuilder, Provenance } from './network-builder.ts';

/** σ·(Ta⁴ − Tb⁴)/(Ta − Tb) of two black faces [W/(m²·K)]. */
export function greyConductanceWPerM2K(aC: number, bC: number): number {
  const a = aC + 273.15;
  const b = bC + 273.15;
  return stefanBoltzmannWPerM2K4 * (a * a + b * b) * (a + b);
}

/** An emissivity that holds all year, or one for each step. */
export type Emissivity = number | Float64Array;

/** Radiation between a grey face and black surroundings: `viewM2` times the face's emissivity. */
export function addGreyLink(
  builder: NetworkBuilder,
  face: number,
  surroundings: number,
  viewM2: number,
  emissivity: Emissivity,
  about: Provenance,
): FlowRef {
  if (typeof emissivity === 'number')
    return builder.radiantLink(face, surroundings, viewM2 * emissivity, about);
  return builder.functionLink(
    face,
    surroundings,
    (a, b, step) => viewM2 * emissivity[step] * greyConductanceWPerM2K(a, b),
    about,
  );
}

/** Blend of two emissivities by a share, or one number where they hardly differ. */
export function blendedEmissivity(
  bare: number,
  covered: number,
  drawn: Float64Array | undefined,
): Emissivity {
  if (drawn === undefined || Math.abs(bare - covered) < 0.005) return bare;
  return drawn.map((s) => bare + s * (covered - bare));
}
