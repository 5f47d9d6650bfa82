// Open windows: flow by wind and buoyancy, as far as the control has them open.
import type { AirOpening, Building, Room, Surface } from '../building/index.ts';
import { surfaceOf } from '../building/index.ts';
import {
  crossWindM3PerS,
  dryAirKgPerM3,
  joinedFlowM3PerS,
  roofWindCoefficient,
  singleSidedM3PerS,
  stackFlow,
} from '../physics/index.ts';
import { openShare } from './air-control.ts';
import { windHeightM } from './air-leaks.ts';
import { type AirSite, wallCoefficient, windAt } from './air-site.ts';

/** Dry air through an opening as it is controlled [kg/s]. */
export type OpeningFlow = (step: number, outdoorC: number, roomC: number) => number;

export const openingMethods = {
  'single-sided': 'EN 16798-7, airing through openings of one facade',
  cross: 'orifice flow by wind (Swami & Chandra 1988) and stack, joined by squares',
};

/** Mass flow of an opening: in equals out, the volume taken at the outdoor air's density. */
export function openingFlow(
  building: Building,
  room: Room,
  opening: AirOpening,
  site: AirSite,
): OpeningFlow {
  const share = openShare(building, opening.control, site);
  const full =
    opening.kind === 'single-sided'
      ? singleSided(opening, site)
      : crossing(building, room, opening, site);
  return (step, outdoorC, roomC) => {
    const open = share(step, roomC, outdoorC);
    return open === 0 ? 0 : open * full(step, outdoorC, roomC);
  };
}

function singleSided(
  opening: Extract<AirOpening, { kind: 'single-sided' }>,
  site: AirSite,
): OpeningFlow {
  const { areaM2, heightM } = opening;
  const { pressurePa } = site.properties;
  return (step, outdoorC, roomC) =>
    dryAirKgPerM3(outdoorC, pressurePa) *
    singleSidedM3PerS(areaM2, heightM, roomC, outdoorC, site.windMPerS[step]);
}

function crossing(
  building: Building,
  room: Room,
  opening: Extract<AirOpening, { kind: 'cross' }>,
  site: AirSite,
): OpeningFlow {
  const [one, other] = opening.openings;
  const [low, high] = one.heightM <= other.heightM ? [one, other] : [other, one];
  const distanceM = high.heightM - low.heightM;
  const { dischargeCoefficient, windShare } = opening;
  const { pressurePa } = site.properties;
  const heightM = windHeightM(room);
  const coefficient = (surface: Surface, step: number) =>
    surface.tiltDeg < 60
      ? roofWindCoefficient
      : surface.tiltDeg > 120
        ? 0
        : wallCoefficient(site, step, surface.azimuthDeg);
  const surfaces = [surfaceOf(room, low.surface), surfaceOf(room, high.surface)] as const;
  // The wind's part does not depend on temperature: once for every step.
  const windM3PerS = Float64Array.from(site.windMPerS, (_, k) =>
    crossWindM3PerS(
      low.areaM2,
      high.areaM2,
      windAt(building, site, k, heightM) * windShare,
      Math.abs(coefficient(surfaces[0], k) - coefficient(surfaces[1], k)),
      dischargeCoefficient,
    ),
  );
  return (step, outdoorC, roomC) => {
    const outside = dryAirKgPerM3(outdoorC, pressurePa);
    // The stack formula is for sea level; flow by mass goes with the density.
    const stack =
      distanceM === 0
        ? 0
        : stackFlow(low.areaM2, high.areaM2, distanceM, roomC, outdoorC, dischargeCoefficient)
            .massKgPerS / dryAirKgPerM3(outdoorC);
    return outside * joinedFlowM3PerS(windM3PerS[step], stack);
  };
}
