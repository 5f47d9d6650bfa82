// Elements of plane layers: resistances in series, the U-value and the temperatures between layers.

/**
 * Total resistance of layers in series between two films.
 *
 * Source: ISO 6946:2017, clause 6.7.1.
 */
export function totalResistanceM2KPerW(
  insideFilmM2KPerW: number,
  layersM2KPerW: readonly number[],
  outsideFilmM2KPerW: number,
): number {
  return layersM2KPerW.reduce((sum, r) => sum + r, insideFilmM2KPerW) + outsideFilmM2KPerW;
}

/**
 * Steady temperatures of the inside surface, of every interface and of the outside surface.
 *
 * @param layersM2KPerW resistances from the inside to the outside [m²·K/W]
 * @returns one more value than layers, from the inside to the outside [°C]
 */
export function interfaceTemperaturesC(
  insideC: number,
  outsideC: number,
  insideFilmM2KPerW: number,
  layersM2KPerW: readonly number[],
  outsideFilmM2KPerW: number,
): number[] {
  const total = totalResistanceM2KPerW(insideFilmM2KPerW, layersM2KPerW, outsideFilmM2KPerW);
  const flux = (insideC - outsideC) / total; // W/m²
  let temp = insideC - flux * insideFilmM2KPerW;
  const temps = [temp];
  for (const r of layersM2KPerW) {
    temp -= flux * r;
    temps.push(temp);
  }
  return temps;
}
