// Inputs of the check cases that are lists of objects, read into the shapes the formulas take.
import type { LayerPart } from '../../../engine/physics/index.ts';
import type { ReferenceCase } from '../../reference/cases.ts';

/** A layer as the cases write it: by thickness and conductivity, by resistance, or in parts. */
export interface CaseLayer {
  readonly d?: number;
  readonly lambda?: number;
  readonly R?: number;
  readonly mu?: number;
  readonly sd?: number;
  readonly parts?: readonly (readonly [number, number])[];
}

/** An input as the case file holds it; the caller states its shape. */
export function inputAs<T>(one: ReferenceCase, key: string): T {
  const value: unknown = one.inputs[key];
  if (value === undefined) throw new Error(`${one.id}: no input ${key}`);
  return value as T;
}

/** Resistance of a plain layer [m²·K/W]. */
export function caseResistance(layer: CaseLayer): number {
  if (layer.R !== undefined) return layer.R;
  if (layer.d === undefined || layer.lambda === undefined) throw new Error('layer without R');
  return layer.d / layer.lambda;
}

/** The parts of a layer, one of share 1 for a plain layer. */
export function caseParts(layer: CaseLayer): LayerPart[] {
  const { d, parts } = layer;
  if (parts === undefined || d === undefined) {
    return [{ share: 1, resistanceM2KPerW: caseResistance(layer) }];
  }
  return parts.map(([share, lambda]) => ({ share, resistanceM2KPerW: d / lambda }));
}
