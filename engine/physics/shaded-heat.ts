// Heat through a glazing with its blind drawn, under standard conditions: U and the solar factor.
import { solveDense } from './dense.ts';

/** Layers from outside to inside as nodes, joined to each other and to the two airs [W/(m²·K)]. */
export interface LayerChain {
  /** Between layer l and the next. */
  readonly betweenWPerM2K: readonly number[];
  /** Of each layer with the outdoors (air and surroundings together), and with the room. */
  readonly outdoorsWPerM2K: readonly number[];
  readonly roomWPerM2K: readonly number[];
}

/**
 * Steady state of the chain: heat from room to outdoors per kelvin, and the share of the heat that
 * each layer absorbs which ends up in the room.
 *
 * Source: nodal heat balance, as in EN 13363-2:2005 / ISO 15099:2003.
 */
export function layerChainHeat(chain: LayerChain): {
  readonly uValueWPerM2K: number;
  readonly inwardShare: Float64Array;
} {
  const n = chain.outdoorsWPerM2K.length;
  const system = new Float64Array(n * n);
  // Right-hand sides: 1 K in the room, and 1 W in each layer.
  const columns = n + 1;
  const answers = new Float64Array(n * columns);
  for (let i = 0; i < n; i++) {
    system[i * n + i] += chain.outdoorsWPerM2K[i] + chain.roomWPerM2K[i];
    if (i + 1 < n) {
      const g = chain.betweenWPerM2K[i];
      system[i * n + i] += g;
      system[(i + 1) * n + i + 1] += g;
      system[i * n + i + 1] -= g;
      system[(i + 1) * n + i] -= g;
    }
    answers[i * columns] = chain.roomWPerM2K[i];
    answers[i * columns + 1 + i] = 1;
  }
  solveDense(system, answers, n, columns);
  let uValueWPerM2K = 0;
  const inwardShare = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    uValueWPerM2K += chain.outdoorsWPerM2K[i] * answers[i * columns];
    for (let l = 0; l < n; l++)
      inwardShare[l] += chain.roomWPerM2K[i] * answers[i * columns + 1 + l];
  }
  return { uValueWPerM2K, inwardShare };
}

/** Solar factor of a layered glazing: what passes, and what the layers give to the room. */
export function layeredSolarFactor(
  transmittance: number,
  absorptance: ArrayLike<number>,
  inwardShare: ArrayLike<number>,
): number {
  let g = transmittance;
  for (let l = 0; l < absorptance.length; l++) g += absorptance[l] * inwardShare[l];
  return g;
}

/** Where a blind hangs. */
export type BlindPosition = 'outside' | 'between' | 'inside';

/**
 * Solar factor of a glazing with its blind drawn by the simplified method, on the safe side.
 *
 *   outside  g_t = τ·g + α·G/G2 + τ·(1 − g)·G/G1,  G = 1/(1/U + 1/G1 + 1/G2), G1 = 5, G2 = 10
 *   inside   g_t = g·(1 − g·ρ − α·G/G2),           G = 1/(1/U + 1/G2),        G2 = 30
 *   between  g_t = g·τ + g·(α + (1 − g)·ρ)·G/G3,   G = 1/(1/U + 1/G3),        G3 = 3
 *
 * For glazings of U 1.2 and more, g 0.15 to 0.85 and blinds of τ to 0.5, ρ 0.1 to 0.8.
 *
 * Source: EN 13363-1:2003+A1:2007, clause 5.2 (coefficients from memory).
 */
export function simplifiedShadedSolarFactor(
  position: BlindPosition,
  uValueWPerM2K: number,
  g: number,
  transmittance: number,
  reflectance: number,
): number {
  const alpha = 1 - transmittance - reflectance;
  if (position === 'outside') {
    const total = 1 / (1 / uValueWPerM2K + 1 / 5 + 1 / 10);
    return transmittance * g + (alpha * total) / 10 + (transmittance * (1 - g) * total) / 5;
  }
  if (position === 'inside') {
    const total = 1 / (1 / uValueWPerM2K + 1 / 30);
    return g * (1 - g * reflectance - (alpha * total) / 30);
  }
  const total = 1 / (1 / uValueWPerM2K + 1 / 3);
  return g * transmittance + (g * (alpha + (1 - g) * reflectance) * total) / 3;
}
