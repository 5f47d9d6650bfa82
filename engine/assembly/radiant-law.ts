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

/**
 * A node at the radiosity of a face whose emissivity changes: the enclosure sees it as black, and the
 * surface's own resistance (1 − ε)/(ε·A) lies between it and the face.
 */
export function addRadiantFace(
  face: number,
  areaM2: number,
  emissivity: Float64Array,
  about: { readonly name: string; readonly room: string; readonly surface: string },
  builder: NetworkBuilder,
): number {
  const told = {
    ...about,
    name: `${about.name}/radiosity`,
    what: 'long-wave radiation that leaves the face',
    method: 'surface resistance (1 − ε)/(ε·A) of a grey face',
    inputs: { areaM2 },
  };
  const node = builder.node(told, 0);
  builder.functionLink(
    face,
    node,
    (a, b, step) => {
      const e = Math.min(0.999, emissivity[step]);
      return (areaM2 * e * greyConductanceWPerM2K(a, b)) / (1 - e);
    },
    told,
  );
  return node;
}
