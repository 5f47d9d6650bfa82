// Elements with studs, rafters or joints: the combined method of ISO 6946.
//
// The true resistance lies between two limits: no heat moves sideways (upper), or each layer is at
// one temperature over its face (lower). Their mean is the method's answer; half their distance over
// the mean is the greatest relative error. Not meant for metal that bridges insulation.

/** One part of a layer, by its share of the face. The shares of a layer add up to 1. */
export interface LayerPart {
  /** Share of the face, 0 to 1. */
  readonly share: number;
  readonly resistanceM2KPerW: number;
}

export interface CombinedResistance {
  readonly upperM2KPerW: number;
  readonly lowerM2KPerW: number;
  readonly totalM2KPerW: number;
  /** (upper − lower) / (2 · total), a share. */
  readonly maxRelativeError: number;
}

/** Σ share / R of every path through the layers from index `k` on; layers cross independently. */
function pathConductance(layers: readonly (readonly LayerPart[])[], k: number, r: number): number {
  if (k === layers.length) return 1 / r;
  return layers[k].reduce(
    (sum, part) => sum + part.share * pathConductance(layers, k + 1, r + part.resistanceM2KPerW),
    0,
  );
}

/**
 * Resistance of an element whose layers consist of parts side by side.
 *
 * Parts of different layers are taken as crossing each other, so a path's share is the product of the
 * shares on its way. Battens that run along their studs need a layer that joins both.
 *
 * @param layers from the inside to the outside; a plain layer has one part of share 1
 *
 * Source: ISO 6946:2017, clause 6.7.2.
 */
export function combinedResistance(
  insideFilmM2KPerW: number,
  layers: readonly (readonly LayerPart[])[],
  outsideFilmM2KPerW: number,
): CombinedResistance {
  const films = insideFilmM2KPerW + outsideFilmM2KPerW;
  const upper = 1 / pathConductance(layers, 0, films);
  const lower = layers.reduce(
    (sum, parts) =>
      sum + 1 / parts.reduce((layer, part) => layer + part.share / part.resistanceM2KPerW, 0),
    films,
  );
  const total = (upper + lower) / 2;
  return {
    upperM2KPerW: upper,
    lowerM2KPerW: lower,
    totalM2KPerW: total,
    maxRelativeError: (upper - lower) / (2 * total),
  };
}
