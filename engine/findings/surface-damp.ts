// Damp at the inside faces: relative humidity hour by hour, and the temperature factor by ISO 13788.
//
// An estimate for comparing designs. Thermal bridges and places behind furniture are colder than the plane
// faces of the run; give the bridge's own f_Rsi for them. Local rules and a specialist decide.
import { type Building, constructionOf, type Room } from '../building/index.ts';
import {
  hygricSaturationPa,
  layerResistanceM2KPerW,
  lowestSurfaceC,
  planeTemperatureFactor,
  surfaceByFactorC,
  surfaceHumidity,
  temperatureFactor,
} from '../physics/index.ts';

/** Surface humidity above which mould may grow. Source: ISO 13788:2012, clause 5.2. */
export const mouldHumidity = 0.8;

/** Inside film of opaque parts when judging mould. Source: ISO 13788:2012, clause 4.4 [m²·K/W]. */
const mouldFilm = 0.25;
const outsideFilm = 0.04;

/** Below this difference to outdoors a month does not ask anything of the fabric [K]. */
const leastDifferenceK = 5;

export interface DampHours {
  readonly hoursAbove80: number;
  readonly longestSpellH: number;
  /** Hours at 100 % and above: water stands on it. */
  readonly hoursWet: number;
  readonly highestHumidity: number;
}

/** Counts over a year of one face. */
export function dampHours(vapourPa: Float64Array, faceC: (hour: number) => number): DampHours {
  let hoursAbove80 = 0;
  let hoursWet = 0;
  let spell = 0;
  let longestSpellH = 0;
  let highestHumidity = 0;
  for (let h = 0; h < vapourPa.length; h++) {
    const humidity = surfaceHumidity(vapourPa[h], faceC(h));
    if (humidity > highestHumidity) highestHumidity = humidity;
    if (humidity >= 1) hoursWet++;
    spell = humidity > mouldHumidity ? spell + 1 : 0;
    if (spell > 0) hoursAbove80++;
    if (spell > longestSpellH) longestSpellH = spell;
  }
  return { hoursAbove80, longestSpellH, hoursWet, highestHumidity };
}

/** The same at a bridge of known temperature factor. */
export function bridgeDampHours(
  factor: number,
  vapourPa: Float64Array,
  airC: Float64Array,
  outdoorC: Float64Array,
): DampHours {
  return dampHours(vapourPa, (h) => surfaceByFactorC(factor, airC[h], outdoorC[h]));
}

/** Monthly means of a room and of outdoors. */
export interface DampMonth {
  readonly insideC: number;
  readonly outsideC: number;
  readonly insideVapourPa: number;
}

export interface RequiredFactor {
  /** f_Rsi that keeps the surface at 80 % in the worst month; 0 where no month asks for any. */
  readonly factor: number;
  /** 1 to 12; 0 where no month asks. */
  readonly month: number;
}

/**
 * f_Rsi,min of the critical month.
 *
 * Source: ISO 13788:2012, clause 5.2, with the run's own monthly means of temperature and vapour.
 */
export function requiredTemperatureFactor(months: readonly DampMonth[]): RequiredFactor {
  let factor = 0;
  let month = 0;
  months.forEach(({ insideC, outsideC, insideVapourPa }, m) => {
    if (insideC - outsideC < leastDifferenceK) return;
    const humidity = insideVapourPa / hygricSaturationPa(insideC);
    const lowest = lowestSurfaceC(insideC, humidity, mouldHumidity);
    const needed = temperatureFactor(lowest, insideC, outsideC);
    if (needed > factor) [factor, month] = [needed, m + 1];
  });
  return { factor, month };
}

/** Plane outdoor surface of a room with the lowest f_Rsi, by its U-value with a film of 0.25 m²·K/W. */
export function worstPlaneFactor(
  building: Building,
  room: Room,
  layersOf: (
    construction: ReturnType<typeof constructionOf>,
  ) => Parameters<typeof layerResistanceM2KPerW>[0][],
): { readonly surface: string; readonly factor: number } | null {
  let worst: { surface: string; factor: number } | null = null;
  for (const surface of room.surfaces) {
    if (surface.boundary.kind !== 'outdoors') continue;
    const layers = layersOf(constructionOf(building, surface.construction));
    const resistance = layers.reduce((sum, layer) => sum + layerResistanceM2KPerW(layer), 0);
    const uValue = 1 / (mouldFilm + resistance + outsideFilm);
    const factor = planeTemperatureFactor(uValue, mouldFilm);
    if (worst === null || factor < worst.factor) worst = { surface: surface.id, factor };
  }
  return worst;
}
