// Condensation inside the outdoor surfaces of a room, month by month, by ISO 13788.
import {
  type Building,
  type Construction,
  constructionOf,
  materialOf,
  type Surface,
} from '../building/index.ts';
import {
  condensationYear,
  subdividedVapourLayers,
  type VapourLayer,
  type VapourMonth,
} from '../physics/index.ts';

export interface InterstitialFindings {
  readonly surface: string;
  readonly construction: string;
  readonly condenses: boolean;
  /** Whether all of it is gone after twelve months. */
  readonly driesOut: boolean;
  /** Most water that any plane holds at a month's end [kg/m²]. */
  readonly peakKgPerM2: number;
  /** First month of the count, 1 to 12: the first that condenses. */
  readonly firstMonth: number;
  /** Water of all planes at the end of each month, from `firstMonth` on [kg/m²]. */
  readonly waterKgPerM2: readonly number[];
}

const outsideFilm = 0.04;

/** Inside film by direction of heat flow in winter. Source: ISO 6946:2017, table 7 [m²·K/W]. */
function insideFilm(tiltDeg: number): number {
  return tiltDeg < 30 ? 0.1 : tiltDeg > 150 ? 0.17 : 0.13;
}

/**
 * Layers from the inside to the outside; null where a layer has no vapour data. s_d is μ times thickness,
 * or what a plain resistance states itself.
 */
export function vapourLayers(building: Building, construction: Construction): VapourLayer[] | null {
  const layers: VapourLayer[] = [];
  for (const layer of [...construction.layers].reverse()) {
    if (!('material' in layer)) {
      if (layer.vapourSdM === undefined) return null;
      layers.push({ resistanceM2KPerW: layer.resistanceM2KPerW, sdM: layer.vapourSdM });
      continue;
    }
    const { vapourResistanceFactor, conductivityWPerMK } = materialOf(building, layer.material);
    if (vapourResistanceFactor === undefined) return null;
    layers.push({
      resistanceM2KPerW: layer.thicknessM / conductivityWPerMK,
      sdM: vapourResistanceFactor * layer.thicknessM,
    });
  }
  return layers;
}

/** One surface over the year; null where its construction lacks vapour data. Source: ISO 13788:2012, clause 6. */
export function interstitialOf(
  building: Building,
  surface: Surface,
  months: readonly VapourMonth[],
): InterstitialFindings | null {
  const construction = constructionOf(building, surface.construction);
  const layers = vapourLayers(building, construction);
  if (layers === null) return null;
  const year = condensationYear(
    subdividedVapourLayers(layers),
    insideFilm(surface.tiltDeg),
    outsideFilm,
    months,
  );
  return {
    surface: surface.id,
    construction: construction.id,
    condenses: year.condenses,
    driesOut: year.driesOut,
    peakKgPerM2: Math.max(...year.peakKgPerM2),
    firstMonth: year.startMonth + 1,
    waterKgPerM2: year.waterKgPerM2.map((planes) => planes.reduce((sum, w) => sum + w, 0)),
  };
}
