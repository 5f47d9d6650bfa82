// U-values of what a building is made of, air to air under conventional films: for design loads and
// for saying what an option changed. The hourly run does not use them.
import { groundPart, windowSize } from '../assembly/index.ts';
import {
  type Building,
  constructionOf,
  type Glazing,
  glazingOf,
  groundContactOf,
  materialOf,
  type Opening,
  type Surface,
} from '../building/index.ts';
import {
  conventionalInsideFilmM2KPerW,
  conventionalOutsideFilmM2KPerW,
  glazingInsideWPerM2K,
  glazingOutsideWPerM2K,
  glazingTransmittance,
  losingHeatFlow,
  totalResistanceM2KPerW,
  windowUValueWPerM2K,
} from '../physics/index.ts';

/** Resistance of a construction without films [m²·K/W]. */
export function constructionM2KPerW(building: Building, id: string): number {
  return constructionOf(building, id).layers.reduce(
    (sum, layer) =>
      sum +
      ('material' in layer
        ? layer.thicknessM / materialOf(building, layer.material).conductivityWPerMK
        : layer.resistanceM2KPerW),
    0,
  );
}

/** U-value of an opaque surface by ISO 6946; the far film is outdoors or that of another room. */
export function surfaceUWPerM2K(building: Building, surface: Surface): number {
  const inside = conventionalInsideFilmM2KPerW(losingHeatFlow(surface.tiltDeg));
  const { kind } = surface.boundary;
  const far = kind === 'outdoors' ? conventionalOutsideFilmM2KPerW : kind === 'ground' ? 0 : inside;
  return (
    1 / totalResistanceM2KPerW(inside, [constructionM2KPerW(building, surface.construction)], far)
  );
}

/** U-value of a construction as an outside wall, for naming it. */
export function wallUWPerM2K(building: Building, id: string): number {
  const films = [
    conventionalInsideFilmM2KPerW('horizontal'),
    conventionalOutsideFilmM2KPerW,
  ] as const;
  return 1 / totalResistanceM2KPerW(films[0], [constructionM2KPerW(building, id)], films[1]);
}

/** U-value of glass in its middle, by EN 673 for panes, as given for a plate pair. */
export function glassUWPerM2K(glazing: Glazing, tiltDeg = 90): number {
  if (glazing.kind === 'simple') return glazing.uValueWPerM2K;
  return glazingTransmittance({
    panesM2KPerW: glazing.panes.map((pane) => pane.thicknessM / pane.conductivityWPerMK),
    gaps: glazing.gaps.map((gap, g) => ({
      thicknessM: gap.thicknessM,
      emissivity1: glazing.panes[g].backEmissivity,
      emissivity2: glazing.panes[g + 1].frontEmissivity,
      filling: [{ gas: gap.gas, share: 1 }],
    })),
    tiltDeg: Math.min(90, tiltDeg),
    outsideWPerM2K: glazingOutsideWPerM2K,
    insideWPerM2K: glazingInsideWPerM2K,
  }).uValueWPerM2K;
}

/** U-value of a whole window by ISO 10077-1. */
export function openingUWPerM2K(building: Building, opening: Opening, tiltDeg: number): number {
  const glass = glassUWPerM2K(glazingOf(building, opening.glazing), tiltDeg);
  const { frame, areaM2 } = opening;
  if (!frame) return glass;
  const parts = { ...windowSize(opening), windowAreaM2: areaM2 };
  return windowUValueWPerM2K(parts, glass, frame.uValueWPerM2K, frame.edgePsiWPerMK);
}

/** U-value to outdoors through the ground by ISO 13370, or null over a column of soil. */
export function groundUWPerM2K(
  building: Building,
  surface: Surface,
  contactId: string,
  meanWindMPerS: number,
): number | null {
  const contact = groundContactOf(building, contactId);
  if (contact.kind === 'soil-column') return null;
  const upright = surface.tiltDeg > 45 && surface.tiltDeg < 135;
  const face = {
    areaM2: surface.areaM2,
    upright,
    resistanceM2KPerW: constructionM2KPerW(building, surface.construction),
    floorResistanceM2KPerW: Number.NaN,
  };
  return groundPart(contact, face, meanWindMPerS).uValueWPerM2K;
}
