// Humidity, latent loads and damp of every room, out of the vapour balance that follows the thermal run.
import { vapourPressurePa } from '../../weather/index.ts';
import { type Assembly, physicsLayers, type RoomParts, roomVapours } from '../assembly/index.ts';
import type { Run } from '../network/index.ts';
import { monthOfHour } from './hour-name.ts';
import { type InterstitialFindings, interstitialOf } from './interstitial.ts';
import {
  bridgeDampHours,
  type DampHours,
  dampHours,
  requiredTemperatureFactor,
  worstPlaneFactor,
} from './surface-damp.ts';
import { marchVapour, type VapourHours } from './vapour-march.ts';

/** Water over the year [kg]; all lines but the last two are vapour into the room's air. */
export interface VapourBalanceKg {
  readonly gains: number;
  readonly air: number;
  readonly humidifier: number;
  /** Negative. */
  readonly dehumidifier: number;
  /** Negative: what condensed because the air was saturated. */
  readonly condensed: number;
  /** Given off by linings and furniture, less taken up. */
  readonly buffer: number;
  readonly storage: number;
  readonly residual: number;
}

export interface MoistureFindings {
  /** Shares, 0 to 1. */
  readonly relativeHumidity: { readonly min: number; readonly max: number; readonly mean: number };
  /** Latent heat that the devices turn over [kWh], and their greatest hourly mean [W]. */
  readonly humidifyingKWh: number;
  readonly dehumidifyingKWh: number;
  readonly peakHumidifyingW: number;
  readonly peakDehumidifyingW: number;
  readonly balanceKg: VapourBalanceKg;
  /** Opaque face with the most hours above 80 % at its surface. */
  readonly worstFace: ({ readonly surface: string } & DampHours) | null;
  /** The same at the thermal bridge whose factor was given. */
  readonly bridge: DampHours | null;
  /** Hours with water on the inside of any pane. */
  readonly hoursGlassWet: number;
  readonly surfaceFactor: {
    /** Least f_Rsi against mould in the critical month (ISO 13788), and that month, 1 to 12. */
    readonly requiredFactor: number;
    readonly criticalMonth: number;
    /** Plane surface with the lowest f_Rsi. */
    readonly worstPlane: { readonly surface: string; readonly factor: number } | null;
    readonly bridgeFactor: number | null;
  };
  readonly interstitial: readonly InterstitialFindings[];
  /** Outdoor surfaces not judged because a layer has no vapour data. */
  readonly withoutVapourData: readonly string[];
}

export interface RoomMoisture {
  readonly findings: MoistureFindings;
  /** Share, 0 to 1, in each hour. */
  readonly relativeHumidity: Float64Array;
}

/** Heat of evaporation at 0 °C, to which air's enthalpy counts [J/kg]. */
const evaporationJPerKg = 2.501e6;

/** What the balance rests on, for the list of assumptions. */
export const moistureAssumption =
  'Humidity follows the thermal run: the heat balance does not feel it, coolers take out no vapour, and latent loads are reported beside the sensible ones.';

/**
 * Moisture of all rooms, or null where no room asks for it.
 *
 * @param airC mean air temperature of each room by hour
 */
export function moistureOf(
  assembly: Assembly,
  run: Run,
  airC: readonly Float64Array[],
  outdoorC: Float64Array,
): RoomMoisture[] | null {
  const vapours = roomVapours(assembly.building, assembly.airSite);
  if (vapours === null) return null;
  const hourly = marchVapour(assembly, vapours, airC);
  const outdoorVapourPa = outdoorVapour(assembly, outdoorC.length);
  return assembly.rooms.map((parts, r) => ({
    findings: roomFindings(assembly, run, parts, hourly[r], airC[r], outdoorC, outdoorVapourPa),
    relativeHumidity: hourly[r].relativeHumidity,
  }));
}

function outdoorVapour({ airSite }: Assembly, hours: number): Float64Array {
  const { humidityRatio, properties, clock } = airSite;
  const perHour = 3600 / clock.stepS;
  return Float64Array.from({ length: hours }, (_, h) => {
    let sum = 0;
    for (let k = h * perHour; k < (h + 1) * perHour; k++)
      sum += vapourPressurePa(humidityRatio[k], properties.pressurePa) / perHour;
    return sum;
  });
}

function roomFindings(
  assembly: Assembly,
  run: Run,
  parts: RoomParts,
  hours: VapourHours,
  airC: Float64Array,
  outdoorC: Float64Array,
  outdoorVapourPa: Float64Array,
): MoistureFindings {
  const { building } = assembly;
  const { room } = parts;
  const { vapourPa } = hours;
  const faceC = faceHours(run);
  let worstFace: MoistureFindings['worstFace'] = null;
  let hoursGlassWet = 0;
  for (const face of parts.faces) {
    const damp = dampHours(vapourPa, faceC(face.node));
    if (face.opening !== undefined) hoursGlassWet = Math.max(hoursGlassWet, damp.hoursWet);
    else if (worstFace === null || isDamper(damp, worstFace))
      worstFace = { surface: face.surface, ...damp };
  }
  const bridgeFactor = room.moisture?.bridgeTemperatureFactor ?? null;
  const months = monthMeans([airC, outdoorC, vapourPa, outdoorVapourPa]).map((mean, m) => ({
    days: daysOf(airC.length, m),
    insideC: mean[0],
    outsideC: mean[1],
    insideVapourPa: mean[2],
    outsideVapourPa: mean[3],
  }));
  const required = requiredTemperatureFactor(months);
  const outdoorSurfaces = room.surfaces.filter(({ boundary }) => boundary.kind === 'outdoors');
  const judged = outdoorSurfaces.map((surface) => interstitialOf(building, surface, months));
  const latent = (kgPerS: Float64Array) => kgPerS.reduce((sum, m) => sum + m, 0) * 3600;
  const kWh = (kgPerS: Float64Array) => (latent(kgPerS) * evaporationJPerKg) / 3.6e6;
  const peakW = (kgPerS: Float64Array) =>
    kgPerS.reduce((most, m) => Math.max(most, m), 0) * evaporationJPerKg;
  return {
    relativeHumidity: {
      min: hours.relativeHumidity.reduce((a, b) => Math.min(a, b)),
      max: hours.relativeHumidity.reduce((a, b) => Math.max(a, b)),
      mean: hours.relativeHumidity.reduce((a, b) => a + b, 0) / airC.length,
    },
    humidifyingKWh: kWh(hours.humidifyKgPerS),
    dehumidifyingKWh: kWh(hours.dryKgPerS),
    peakHumidifyingW: peakW(hours.humidifyKgPerS),
    peakDehumidifyingW: peakW(hours.dryKgPerS),
    balanceKg: balance(hours, latent),
    worstFace,
    bridge: bridgeFactor === null ? null : bridgeDampHours(bridgeFactor, vapourPa, airC, outdoorC),
    hoursGlassWet,
    surfaceFactor: {
      requiredFactor: required.factor,
      criticalMonth: required.month,
      worstPlane: worstPlaneFactor(building, room, (construction) =>
        physicsLayers(building, construction),
      ),
      bridgeFactor,
    },
    interstitial: judged.filter((one) => one !== null),
    withoutVapourData: outdoorSurfaces
      .filter((_, s) => judged[s] === null)
      .map((surface) => surface.id),
  };
}

/** More hours above 80 %, or as many and damper at its worst. */
function isDamper(one: DampHours, other: DampHours): boolean {
  if (one.hoursAbove80 !== other.hoursAbove80) return one.hoursAbove80 > other.hoursAbove80;
  return one.highestHumidity > other.highestHumidity;
}

function balance(hours: VapourHours, kg: (perS: Float64Array) => number): VapourBalanceKg {
  const lines = {
    gains: kg(hours.gainKgPerS),
    air: kg(hours.airKgPerS),
    humidifier: kg(hours.humidifyKgPerS),
    dehumidifier: 0 - kg(hours.dryKgPerS),
    condensed: 0 - kg(hours.condenseKgPerS),
    buffer: 0 - kg(hours.bufferKgPerS),
  };
  const into = Object.values(lines).reduce((sum, line) => sum + line, 0);
  return { ...lines, storage: hours.storedKg, residual: into - hours.storedKg };
}

function faceHours(run: Run): (node: number) => (hour: number) => number {
  const { recordNodes } = run.problem;
  const width = recordNodes.length;
  const { meanC } = run;
  return (node) => {
    const at = recordNodes.indexOf(node);
    if (at < 0) throw new Error(`node ${node} was not recorded`);
    return (hour) => meanC[hour * width + at];
  };
}

/** Means of several hourly series in each month: `[month][series]`. */
function monthMeans(series: readonly Float64Array[]): number[][] {
  const hours = series[0].length;
  const sums = Array.from({ length: 12 }, () => series.map(() => 0));
  const counts = new Float64Array(12);
  for (let h = 0; h < hours; h++) {
    const m = monthOfHour(h, hours);
    counts[m]++;
    series.forEach((values, s) => {
      sums[m][s] += values[h];
    });
  }
  return sums.map((row, m) => row.map((sum) => sum / counts[m]));
}

function daysOf(hours: number, month: number): number {
  const days = [31, hours === 8784 ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  return days[month];
}
