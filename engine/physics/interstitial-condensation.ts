// Condensation inside an element month by month, by ISO 13788: water gathers in winter and must be gone
// by the end of the summer. Where it is not, or where much gathers, the build-up needs another design
// or a transient hygrothermal calculation by a specialist.
import { interfaceTemperaturesC } from './layered-element.ts';
import { cumulativeSdM, saturationsPa, type VapourLayer, vapourState } from './vapour-profile.ts';

/** Monthly means on both sides. */
export interface VapourMonth {
  readonly days: number;
  readonly insideC: number;
  readonly insideVapourPa: number;
  readonly outsideC: number;
  readonly outsideVapourPa: number;
}

export interface CondensationYear {
  /** Index into the months given at which the count began: the first to condense after a dry one. */
  readonly startMonth: number;
  /** For each month from `startMonth` on, the water at every interface at its end [kg/m²]. */
  readonly waterKgPerM2: readonly Float64Array[];
  /** Greatest water at each interface over the year [kg/m²]. */
  readonly peakKgPerM2: Float64Array;
  /** Whether any plane condensed. */
  readonly condenses: boolean;
  /** Whether all water is gone at the end of the twelve months; true where none condensed. */
  readonly driesOut: boolean;
}

/** Conditions of one month at the interfaces. */
interface Interfaces {
  readonly sdM: readonly number[];
  readonly saturationPa: readonly number[];
  readonly insideVapourPa: number;
  readonly outsideVapourPa: number;
}

/** Below this the plane counts as dry; a milligram per square metre [kg/m²]. */
const dryKgPerM2 = 1e-6;

/** Lets one month act on the water held, in place; a plane that runs dry within it splits the month. */
function passMonth(water: Float64Array, state: Interfaces, seconds: number): void {
  let left = seconds;
  const wet = Array.from(water, (w) => w > 0);
  // Each round ends the month or dries one plane, so there are no more rounds than planes and one.
  for (let round = 0; round <= water.length && left > 0; round++) {
    const { sdM, saturationPa, insideVapourPa, outsideVapourPa } = state;
    const { rateKgPerM2S: rate } = vapourState(
      sdM,
      saturationPa,
      insideVapourPa,
      outsideVapourPa,
      wet,
    );
    let span = left;
    let dried = -1;
    for (let k = 0; k < water.length; k++) {
      if (rate[k] < 0 && -water[k] / rate[k] < span) {
        span = -water[k] / rate[k];
        dried = k;
      }
    }
    for (let k = 0; k < water.length; k++) {
      water[k] = Math.max(0, water[k] + rate[k] * span);
      if (rate[k] > 0) wet[k] = true;
    }
    if (dried >= 0) {
      water[dried] = 0;
      wet[dried] = false;
    }
    left -= span;
  }
}

/**
 * Water at every interface over a year of monthly means.
 *
 * @param layers from the inside to the outside; `subdividedVapourLayers` splits thick ones first
 * @param outsideFilmM2KPerW and `insideFilmM2KPerW`: 0.04, and 0.13 (0.10 up, 0.17 down) [m²·K/W]
 * @param months twelve, in the order of the calendar
 *
 * Source: ISO 13788:2012, clause 6.
 */
export function condensationYear(
  layers: readonly VapourLayer[],
  insideFilmM2KPerW: number,
  outsideFilmM2KPerW: number,
  months: readonly VapourMonth[],
): CondensationYear {
  const sdM = cumulativeSdM(layers);
  const resistances = layers.map((l) => l.resistanceM2KPerW);
  const states: Interfaces[] = months.map((m) => ({
    sdM,
    saturationPa: saturationsPa(
      interfaceTemperaturesC(
        m.insideC,
        m.outsideC,
        insideFilmM2KPerW,
        resistances,
        outsideFilmM2KPerW,
      ),
    ),
    insideVapourPa: m.insideVapourPa,
    outsideVapourPa: m.outsideVapourPa,
  }));
  const none = sdM.map(() => false);
  const condensing = states.map((s) =>
    vapourState(s.sdM, s.saturationPa, s.insideVapourPa, s.outsideVapourPa, none).rateKgPerM2S.some(
      (r) => r > 0,
    ),
  );
  const count = months.length;
  const first = condensing.findIndex((now, m) => now && !condensing[(m + count - 1) % count]);
  const startMonth = Math.max(0, first);

  const water = new Float64Array(sdM.length);
  const peakKgPerM2 = new Float64Array(sdM.length);
  const waterKgPerM2: Float64Array[] = [];
  for (let i = 0; i < count; i++) {
    const m = (startMonth + i) % count;
    passMonth(water, states[m], months[m].days * 86400);
    waterKgPerM2.push(water.slice());
    for (let k = 0; k < water.length; k++) peakKgPerM2[k] = Math.max(peakKgPerM2[k], water[k]);
  }
  return {
    startMonth,
    waterKgPerM2,
    peakKgPerM2,
    condenses: condensing.includes(true),
    driesOut: water.every((w) => w < dryKgPerM2),
  };
}
