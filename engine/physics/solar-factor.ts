// From what the panes absorb to the heat that reaches the room: the solar factor g.

/**
 * Secondary heat factor: share of the sunlight that panes absorb and then give to the room.
 *
 *   q_i = Σ α_p·(R from outdoors to pane p)/(R from outdoors to room)
 *
 * A pane stands at one temperature here, as the standard has it.
 *
 * @param absorptance of each pane, outermost first, 0 to 1
 * @param gapWPerM2K conductance pane to pane, one fewer than panes
 * @param outsideWPerM2K and @param insideWPerM2K surface coefficients; 23 and 8 by convention
 *
 * Source: EN 410:2011, 5.4.6 (double and triple glazing, here for any number of panes).
 */
export function secondaryHeatFactor(
  absorptance: ArrayLike<number>,
  gapWPerM2K: readonly number[],
  outsideWPerM2K = 23,
  insideWPerM2K = 8,
): number {
  let resistance = 1 / outsideWPerM2K;
  let weighted = absorptance[0] * resistance;
  for (let p = 1; p < absorptance.length; p++) {
    resistance += 1 / gapWPerM2K[p - 1];
    weighted += absorptance[p] * resistance;
  }
  return weighted / (resistance + 1 / insideWPerM2K);
}

/** Solar factor g: direct transmittance and secondary heat together. Source: EN 410:2011, 5.4.1. */
export function solarFactor(
  transmittance: number,
  absorptance: ArrayLike<number>,
  gapWPerM2K: readonly number[],
  outsideWPerM2K = 23,
  insideWPerM2K = 8,
): number {
  return (
    transmittance + secondaryHeatFactor(absorptance, gapWPerM2K, outsideWPerM2K, insideWPerM2K)
  );
}
