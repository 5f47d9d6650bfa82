// Temperature and dew point through a construction in one steady state, as its drawn section shows them.
// Where the dew point lies above the temperature, vapour would condense: a picture of one cold day, not a
// count over the year (that is `interstitialOf`).
import { type Building, type Construction, materialOf } from '../building/index.ts';
import {
  conventionalInsideFilmM2KPerW,
  conventionalOutsideFilmM2KPerW,
  cumulativeSdM,
  type HeatFlow,
  hygricDewPointC,
  hygricSaturationPa,
  interfaceTemperaturesC,
} from '../physics/index.ts';
import { vapourLayers } from './interstitial.ts';

/** Air on both sides. */
export interface SectionClimate {
  readonly insideC: number;
  readonly outsideC: number;
  /** Shares, 0 to 1. */
  readonly insideHumidity: number;
  readonly outsideHumidity: number;
}

export interface SectionLayer {
  readonly name: string;
  /** 0 for a layer that only resists. */
  readonly thicknessM: number;
  readonly resistanceM2KPerW: number;
  /** Of its outer and its inner plane. */
  readonly outerC: number;
  readonly innerC: number;
  /** Across the layer, from its outer to its inner plane, evenly spaced; null where vapour data lack. */
  readonly dewPointC: readonly number[] | null;
}

export interface ConstructionSection {
  readonly climate: SectionClimate;
  readonly outsideFilmM2KPerW: number;
  readonly insideFilmM2KPerW: number;
  /** Outside first. */
  readonly layers: readonly SectionLayer[];
  readonly outerFaceC: number;
  readonly innerFaceC: number;
  readonly insideDewPointC: number;
  readonly outsideDewPointC: number;
  /** Names of materials without a vapour resistance factor. */
  readonly vapourUnknown: readonly string[];
}

const pointsPerLayer = 9;

/** @param behind `outdoors` has the outside film; `ground` none, `inside` that of a room */
export function constructionSection(
  building: Building,
  construction: Construction,
  heatFlow: HeatFlow,
  behind: 'outdoors' | 'ground' | 'inside',
  climate: SectionClimate,
): ConstructionSection {
  const insideFilm = conventionalInsideFilmM2KPerW(heatFlow);
  const outsideFilm =
    behind === 'outdoors' ? conventionalOutsideFilmM2KPerW : behind === 'ground' ? 0 : insideFilm;
  const plain = construction.layers.map((layer) => {
    if (!('material' in layer))
      return { name: layer.name, thicknessM: 0, resistanceM2KPerW: layer.resistanceM2KPerW };
    const { name, conductivityWPerMK } = materialOf(building, layer.material);
    const { thicknessM } = layer;
    return { name, thicknessM, resistanceM2KPerW: thicknessM / conductivityWPerMK };
  });
  // The physics counts from the inside out; the section is drawn from the outside in.
  const planes = interfaceTemperaturesC(
    climate.insideC,
    climate.outsideC,
    insideFilm,
    plain.map((layer) => layer.resistanceM2KPerW).reverse(),
    outsideFilm,
  ).reverse();
  const insidePa = climate.insideHumidity * hygricSaturationPa(climate.insideC);
  const outsidePa = climate.outsideHumidity * hygricSaturationPa(climate.outsideC);
  const vapour = vapourLayers(building, construction);
  const fromInside = vapour && cumulativeSdM(vapour);
  const whole = fromInside?.at(-1) ?? 0;
  /** s_d from the outer face to each plane, outside first. */
  const fromOutside = fromInside?.map((sd) => whole - sd).reverse();
  const dewPoints = (i: number): number[] | null => {
    if (!fromOutside) return null;
    return Array.from({ length: pointsPerLayer }, (_, p) => {
      const share = p / (pointsPerLayer - 1);
      const sd = fromOutside[i] + share * (fromOutside[i + 1] - fromOutside[i]);
      return hygricDewPointC(outsidePa + ((insidePa - outsidePa) * sd) / whole);
    });
  };
  return {
    climate,
    outsideFilmM2KPerW: outsideFilm,
    insideFilmM2KPerW: insideFilm,
    layers: plain.map((layer, i) => ({
      ...layer,
      outerC: planes[i],
      innerC: planes[i + 1],
      dewPointC: dewPoints(i),
    })),
    outerFaceC: planes[0],
    innerFaceC: planes[planes.length - 1],
    insideDewPointC: hygricDewPointC(insidePa),
    outsideDewPointC: hygricDewPointC(outsidePa),
    vapourUnknown: construction.layers.flatMap((layer) => {
      if (!('material' in layer)) return layer.vapourSdM === undefined ? [layer.name] : [];
      const material = materialOf(building, layer.material);
      return material.vapourResistanceFactor === undefined ? [material.name] : [];
    }),
  };
}
