// A window known by two numbers only, U and g: an equivalent single layer with an angular curve.
import type { GlazingAngles } from './glazing-angles.ts';
import { glazingInsideWPerM2K, glazingOutsideWPerM2K } from './glazing-transmittance.ts';

/** The layer that stands for the glazing. */
export interface SimpleGlazing {
  /** Between its faces, films taken off [m²·K/W]. */
  readonly resistanceM2KPerW: number;
  /** Normal transmittance and absorptance; the heat is absorbed half-way through the layer. */
  readonly transmittance: number;
  readonly absorptance: number;
  readonly angles: GlazingAngles;
}

/** A sheet of glass has about this much; U-values that leave less are taken to be single glass. */
const leastResistanceM2KPerW = 0.003;
/** Most that is passed and absorbed together at normal incidence; the rest is reflected. */
const mostTaken = 0.92;

/**
 * Share of g that comes straight through, from U and g.
 *
 *   U ≥ 4.5: τ = 0.939998·g² + 0.20332·g for g < 0.7206, else 1.30415·g − 0.30515
 *   U ≤ 3.4: τ = 0.41040·g for g ≤ 0.15, else 0.085775·g² + 0.963954·g − 0.084958
 *
 * straight in between. A fit over many real glazings: one of them may lie off it.
 *
 * Source: D. Arasteh, C. Kohler, B. Griffith, report LBNL-2804E, 2009 (constants from memory).
 */
export function directTransmittance(uValueWPerM2K: number, g: number): number {
  const high = g < 0.7206 ? 0.939998 * g * g + 0.20332 * g : 1.30415 * g - 0.30515;
  const low = g <= 0.15 ? 0.4104 * g : 0.085775 * g * g + 0.963954 * g - 0.084958;
  const share = Math.min(1, Math.max(0, (uValueWPerM2K - 3.4) / (4.5 - 3.4)));
  return Math.max(0, low + share * (high - low));
}

/**
 * How g falls with the angle of incidence, as a share of its normal value.
 *
 *   g(θ)/g(0) = 1 − a·z^α − b·z^β − c·z^γ,  z = θ/90°
 *   a = 8, b = 0.25/q, c = 1 − a − b, α = 5.2 + 0.7·q, β = 2, γ = 5.26 + 0.06·p + (0.73 + 0.04·p)·q
 *
 * @param panes p, 1 to 3
 * @param category q, 1 to 10; 4 for uncoated and most low-emissivity glazings
 *
 * Source: J. Karlsson, A. Roos, "Modelling the angular behaviour of the total solar energy
 * transmittance of windows", Solar Energy 69 (2000), pp. 321–329 (constants from memory).
 */
export function angularShare(incidenceDeg: number, panes: number, category = 4): number {
  const z = Math.min(1, incidenceDeg / 90);
  const [a, b] = [8, 0.25 / category];
  const alpha = 5.2 + 0.7 * category;
  const gamma = 5.26 + 0.06 * panes + (0.73 + 0.04 * panes) * category;
  const share = 1 - a * z ** alpha - b * z * z - (1 - a - b) * z ** gamma;
  return Math.min(1, Math.max(0, share));
}

/** Likely number of panes behind a U-value: the curve depends on it only a little. */
export function likelyPanes(uValueWPerM2K: number): number {
  if (uValueWPerM2K > 4) return 1;
  return uValueWPerM2K > 0.9 ? 2 : 3;
}

/**
 * Equivalent layer of a glazing by U and g, both under the conditions of EN 673 and EN 410.
 *
 *   R = 1/U − 1/25 − 1/7.7,  α = (g − τ)/N,  N = (1/25 + R/2)·U'
 *
 * with U' of the layer and its films, so that the layer under standard films gives back U and g.
 * Where the two shares would exceed 0.92, more is taken to come straight through: bare glass reflects
 * some 8 %.
 *
 * @param uValueWPerM2K of the glazing, 0.2 to 5.8
 * @param g solar factor at normal incidence, 0 to 0.9
 */
export function simpleGlazing(uValueWPerM2K: number, g: number): SimpleGlazing {
  const films = 1 / glazingOutsideWPerM2K + 1 / glazingInsideWPerM2K;
  const resistance = Math.max(leastResistanceM2KPerW, 1 / uValueWPerM2K - films);
  const inward = (1 / glazingOutsideWPerM2K + resistance / 2) / (films + resistance);
  const direct = directTransmittance(uValueWPerM2K, g);
  const crowded = direct + (g - direct) / inward > mostTaken;
  const transmittance = crowded ? (g - mostTaken * inward) / (1 - inward) : direct;
  const absorptance = (g - transmittance) / inward;
  const panes = likelyPanes(uValueWPerM2K);
  const curve = Float64Array.from({ length: 91 }, (_, k) => angularShare(k, panes));
  let diffuse = 0; // 2·∫ share·cos·sin dθ, by degrees
  for (let k = 0; k < 90; k++) {
    const middle = ((k + 0.5) * Math.PI) / 180;
    diffuse += (((curve[k] + curve[k + 1]) / 2) * Math.sin(2 * middle) * Math.PI) / 180;
  }
  const shares = {
    transmittance: transmittance * diffuse,
    reflectance: 1 - (transmittance + absorptance) * diffuse,
    absorptance: Float64Array.of(absorptance * diffuse),
  };
  return {
    resistanceM2KPerW: resistance,
    transmittance,
    absorptance,
    angles: {
      paneCount: 1,
      transmittance: curve.map((f) => f * transmittance),
      reflectance: curve.map((f) => 1 - f * (transmittance + absorptance)),
      absorptance: curve.map((f) => f * absorptance),
      diffuse: shares,
      diffuseFromInside: shares,
    },
  };
}
