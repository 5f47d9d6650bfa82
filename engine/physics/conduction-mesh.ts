// A layered construction as a chain of nodes and links, per square metre.
//
// Each layer with mass is cut into equal cells; nodes stand on the cells' edges, so that both faces
// and all interfaces carry one, and every cell gives half its heat capacity to either end. Layers
// without mass are links only. Resistance and capacity of the construction are kept to rounding, so
// the steady state is exact at any fineness; fineness only bears on how fast changes pass.
// Convergence to the closed forms: test/engine/physics/conduction-mesh.test.ts.

/** One layer of a construction. */
export type Layer =
  | {
      readonly kind: 'solid';
      readonly thicknessM: number;
      readonly conductivityWPerMK: number;
      /** 0 makes the layer a plain resistance. */
      readonly densityKgPerM3: number;
      readonly specificHeatJPerKgK: number;
    }
  | { readonly kind: 'resistance'; readonly resistanceM2KPerW: number };

/** How finely to cut. */
export interface Spacing {
  /** `fine`: by diffusivity and step. `coarse`: one cell a layer, for quick studies. */
  readonly kind: 'fine' | 'coarse';
  /** Time step that the cells are to resolve [s]. */
  readonly stepS: number;
  /** Multiplies the cells of each layer; 2 for an accuracy check. A whole number, 1 or more. */
  readonly refine?: number;
}

/** The chain, outside to inside: link k joins nodes k and k + 1. */
export interface ConductionMesh {
  /** J/(m²·K) of each node; 0 for a face without mass. */
  readonly capacityJPerM2K: Float64Array;
  /** W/(m²·K) of each link; one fewer than nodes. */
  readonly conductanceWPerM2K: Float64Array;
  /** Resistance between the outside face and each node [m²·K/W]. */
  readonly nodeResistanceM2KPerW: Float64Array;
  /** Resistance between the outside face and each layer's outer edge, then the inside face [m²·K/W]. */
  readonly interfaceResistanceM2KPerW: Float64Array;
}

/** Inverse Fourier number Δx²/(α·Δt) of a fine cell. */
const inverseFourier = 0.5;
const fewestCells = 2;
const mostCells = 24;

/** Resistance of a layer, face to face [m²·K/W]. */
export function layerResistanceM2KPerW(layer: Layer): number {
  return layer.kind === 'resistance'
    ? layer.resistanceM2KPerW
    : layer.thicknessM / layer.conductivityWPerMK;
}

/** Heat capacity of a layer [J/(m²·K)]. */
export function layerCapacityJPerM2K(layer: Layer): number {
  return layer.kind === 'resistance'
    ? 0
    : layer.thicknessM * layer.densityKgPerM3 * layer.specificHeatJPerKgK;
}

/**
 * Cells of a layer with mass.
 *
 *   n = ⌈L/√(α·Δt/2)⌉,  α = λ/(ρ·c),  from 2 to 24
 *
 * √(α·Δt) is how far heat spreads in a step; a cell of that order resolves what the step can. A layer
 * that stores next to nothing (under 1/1000 of what its resistance could feel in a step) takes one.
 *
 * Source: Fourier-number spacing, common practice; the factor and the bounds are ours, proved by test.
 */
export function layerCells(layer: Layer, spacing: Spacing): number {
  const capacity = layerCapacityJPerM2K(layer);
  if (capacity === 0) return 0;
  const refine = spacing.refine ?? 1;
  if (spacing.kind === 'coarse') return refine;
  const fourier = spacing.stepS / (layerResistanceM2KPerW(layer) * capacity); // α·Δt/L²
  if (fourier > 1000) return refine;
  const cells = Math.ceil(1 / Math.sqrt(inverseFourier * fourier));
  return refine * Math.min(mostCells, Math.max(fewestCells, cells));
}

/**
 * Cuts a construction into its chain.
 *
 * @param layers from outside to inside; at least one, with a resistance above 0
 */
export function meshConstruction(layers: readonly Layer[], spacing: Spacing): ConductionMesh {
  const capacity: number[] = [0];
  const conductance: number[] = [];
  const position: number[] = [0];
  const edges: number[] = [0];
  let pending = 0; // resistance of plain layers since the last node
  let edge = 0;
  const addNode = (resistance: number, at: number) => {
    capacity.push(0);
    conductance.push(1 / resistance);
    position.push(at);
  };
  for (const layer of layers) {
    const resistance = layerResistanceM2KPerW(layer);
    const cells = layerCells(layer, spacing);
    if (cells === 0) pending += resistance;
    else if (pending > 0) {
      addNode(pending, edge);
      pending = 0;
    }
    for (let k = 1; k <= cells; k++) {
      const half = layerCapacityJPerM2K(layer) / cells / 2;
      capacity[capacity.length - 1] += half;
      addNode(resistance / cells, edge + (resistance * k) / cells);
      capacity[capacity.length - 1] += half;
    }
    edge += resistance;
    edges.push(edge);
  }
  if (pending > 0) addNode(pending, edge);
  return {
    capacityJPerM2K: Float64Array.from(capacity),
    conductanceWPerM2K: Float64Array.from(conductance),
    nodeResistanceM2KPerW: Float64Array.from(position),
    interfaceResistanceM2KPerW: Float64Array.from(edges),
  };
}

/**
 * Temperature inside a construction, straight between the nodes on the scale of resistance.
 *
 * @param tempC temperature of each node of the mesh [°C]
 * @param resistanceM2KPerW place, as resistance from the outside face [m²·K/W]
 */
export function temperatureInsideC(
  mesh: ConductionMesh,
  tempC: ArrayLike<number>,
  resistanceM2KPerW: number,
): number {
  const at = mesh.nodeResistanceM2KPerW;
  let k = 0;
  while (k < at.length - 2 && at[k + 1] < resistanceM2KPerW) k++;
  const share = (resistanceM2KPerW - at[k]) / (at[k + 1] - at[k]);
  return tempC[k] + Math.min(1, Math.max(0, share)) * (tempC[k + 1] - tempC[k]);
}
