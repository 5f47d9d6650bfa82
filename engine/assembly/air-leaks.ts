// Leaks of one room under wind, stack and fans: the pressure at which as much air enters as leaves, and
// from it the air that comes in from outdoors, tabled by room temperature for each step as it is asked.
import type { Building, Leakage, Room } from '../building/index.ts';
import {
  dryAirKgPerM3,
  gravityMPerS2,
  type LeakPaths,
  leakageCoefficient,
  roofWindCoefficient,
} from '../physics/index.ts';
import { type AirSite, wallCoefficient, windAt } from './air-site.ts';
import { faceHeightM } from './fabric.ts';

/** Flow of a leak is straight in the pressure below this, so that the balance has a slope at rest [Pa]. */
const laminarPa = 1e-4;
const tableStepK = 1;
const coldestC = -60;
const tableLength = 181; // to 120 °C

export interface RoomLeaks {
  /** Air that enters through leaks [kg/s]. */
  readonly inflowKgPerS: (step: number, roomC: number) => number;
  /** Pressure in the room at its floor against outdoors [Pa]. */
  readonly pressurePa: (step: number, roomC: number) => number;
}

interface Leak {
  readonly coefficient: number;
  readonly heightM: number;
  /** Azimuth of a wall; null where the wind's direction does not matter. */
  readonly azimuthDeg: number | null;
  readonly windCoefficient: number;
}

/**
 * Leaks by the area of the room's outdoor surfaces: half of a wall's at a quarter of the room's height
 * and half at three quarters, a roof's at its height, a floor's at 0.
 */
export function leaksOf(room: Room, leakage: Leakage): Leak[] {
  const outdoor = room.surfaces.filter(({ boundary }) => boundary.kind === 'outdoors');
  const totalM2 = outdoor.reduce((sum, { areaM2 }) => sum + areaM2, 0);
  const total = leakageCoefficient(leakage.n50PerH, room.volumeM3, leakage.exponent);
  const heightM = roomHeightM(room);
  return outdoor.flatMap(({ areaM2, tiltDeg, azimuthDeg }): Leak[] => {
    const coefficient = (total * areaM2) / totalM2;
    if (tiltDeg < 60)
      return [{ coefficient, heightM, azimuthDeg: null, windCoefficient: roofWindCoefficient }];
    if (tiltDeg > 120) return [{ coefficient, heightM: 0, azimuthDeg: null, windCoefficient: 0 }];
    const half = { coefficient: coefficient / 2, azimuthDeg, windCoefficient: 0 };
    return [
      { ...half, heightM: heightM / 4 },
      { ...half, heightM: (3 * heightM) / 4 },
    ];
  });
}

function roomHeightM(room: Room): number {
  return room.box?.heightM ?? room.volumeM3 / room.floorAreaM2;
}

/** Height whose wind drives the leaks: the top of the room, or of its highest surface. */
export function windHeightM(room: Room): number {
  const surfaces = room.surfaces.filter(({ boundary }) => boundary.kind === 'outdoors');
  return Math.max(roomHeightM(room), ...surfaces.map((surface) => faceHeightM(room, surface)));
}

/**
 * @param fanKgPerS air that fans and paths bring into the room less what they take out, in each step
 */
export function roomLeaks(
  building: Building,
  room: Room,
  leakage: Leakage,
  site: AirSite,
  fanKgPerS: Float64Array,
): RoomLeaks {
  const leaks = leaksOf(room, leakage);
  const count = leaks.length;
  const paths: LeakPaths = {
    coefficient: Float64Array.from(leaks, (leak) => leak.coefficient),
    exponent: new Float64Array(count).fill(leakage.exponent),
    heightM: Float64Array.from(leaks, (leak) => leak.heightM),
    windCoefficient: Float64Array.from(leaks, (leak) => leak.windCoefficient),
  };
  const heightM = windHeightM(room);
  const barometerPa = site.properties.pressurePa;
  const windPa = new Float64Array(count);
  const table = new Float64Array(tableLength);
  const filledFor = new Int32Array(tableLength).fill(-1);
  let windStep = -1;
  let lastPa = 0;

  function loadWind(step: number): void {
    if (step === windStep) return;
    windStep = step;
    const windMPerS = windAt(building, site, step, heightM) * leakage.windShare;
    const dynamicPa = 0.5 * dryAirKgPerM3(site.outdoorC[step], barometerPa) * windMPerS * windMPerS;
    for (let k = 0; k < count; k++) {
      const { azimuthDeg } = leaks[k];
      if (azimuthDeg !== null) paths.windCoefficient[k] = wallCoefficient(site, step, azimuthDeg);
      windPa[k] = dynamicPa * paths.windCoefficient[k];
    }
  }

  function pressurePa(step: number, roomC: number): number {
    loadWind(step);
    const outside = dryAirKgPerM3(site.outdoorC[step], barometerPa);
    const inside = dryAirKgPerM3(roomC, barometerPa);
    lastPa = balancedPa(paths, windPa, outside, inside, fanKgPerS[step], lastPa);
    return lastPa;
  }

  function exactKgPerS(step: number, roomC: number): number {
    const zonePa = pressurePa(step, roomC);
    const outside = dryAirKgPerM3(site.outdoorC[step], barometerPa);
    const weight = (outside - dryAirKgPerM3(roomC, barometerPa)) * gravityMPerS2;
    let sum = 0;
    for (let k = 0; k < count; k++) {
      const drop = windPa[k] - zonePa - weight * paths.heightM[k];
      if (drop > 0) sum += outside * paths.coefficient[k] * drop ** paths.exponent[k];
    }
    return sum;
  }

  function tabled(step: number, at: number): number {
    if (filledFor[at] !== step) {
      filledFor[at] = step;
      table[at] = exactKgPerS(step, coldestC + at * tableStepK);
    }
    return table[at];
  }

  return {
    pressurePa,
    inflowKgPerS(step, roomC) {
      const place = Math.min(tableLength - 1.001, Math.max(0, (roomC - coldestC) / tableStepK));
      const at = Math.floor(place);
      const low = tabled(step, at);
      return low + (place - at) * (tabled(step, at + 1) - low);
    },
  };
}

/**
 * Root of the mass balance: Newton's method from the last pressure, kept between bounds that close in;
 * where it would leave them the middle is taken. The balance falls steadily, so there is one root.
 *
 * Source: one-zone pressure network, as in `zonePressurePa` of the physics, whose slow and sure search
 * the tests hold it to.
 */
export function balancedPa(
  paths: LeakPaths,
  windPa: Float64Array,
  outsideKgPerM3: number,
  insideKgPerM3: number,
  fanKgPerS: number,
  guessPa: number,
): number {
  const { coefficient, exponent, heightM } = paths;
  const weight = (outsideKgPerM3 - insideKgPerM3) * gravityMPerS2;
  let low = Number.NEGATIVE_INFINITY; // more enters than leaves
  let high = Number.POSITIVE_INFINITY;
  let pressure = guessPa;
  let moved = Number.POSITIVE_INFINITY;
  for (let round = 0; round < 200; round++) {
    let net = fanKgPerS;
    let slope = 0;
    for (let k = 0; k < coefficient.length; k++) {
      const drop = windPa[k] - pressure - weight * heightM[k];
      const size = Math.abs(drop);
      const n = exponent[k];
      const c = coefficient[k] * (drop > 0 ? outsideKgPerM3 : insideKgPerM3);
      if (size < laminarPa) {
        const straight = c * laminarPa ** (n - 1);
        net += straight * drop;
        slope += straight;
      } else {
        const flow = c * size ** n;
        net += drop > 0 ? flow : -flow;
        slope += (n * flow) / size;
      }
    }
    if (net > 0) low = pressure;
    else high = pressure;
    let next = pressure + net / slope;
    // Near a root law with n = ½ Newton's step swings from side to side: halve the bounds then.
    const swings = Math.abs(next - pressure) > 0.7 * moved;
    if (swings || !(next > low && next < high)) {
      const middle = (low + high) / 2;
      if (Number.isFinite(middle)) next = middle;
    }
    moved = Math.abs(next - pressure);
    if (moved < 1e-9) return next;
    pressure = next;
  }
  return pressure;
}
