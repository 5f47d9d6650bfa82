// Outdoor air step by step, as leaks, openings and vapour balances need it; and what flows have in common.
import { saturationPressurePa, type WeatherSteps } from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import {
  angleBetweenDeg,
  terrains,
  wallWindCoefficient,
  windAtHeightMPerS,
} from '../physics/index.ts';
import type { StepClock } from './step-clock.ts';

/** Air at the site: what a cubic metre of it carries per kelvin. */
export interface AirProperties {
  readonly pressurePa: number;
  readonly densityKgPerM3: number;
  readonly specificHeatJPerKgK: number;
}

/** Values in the middle of each step. */
export interface AirSite {
  readonly properties: AirProperties;
  readonly clock: StepClock;
  readonly outdoorC: Float64Array;
  /** At the weather station, 10 m up. */
  readonly windMPerS: Float64Array;
  readonly windFromDeg: Float64Array;
  readonly humidityRatio: Float64Array;
  /** Share, 0 to 1, in a step. */
  readonly relativeHumidity: (step: number) => number;
}

/** A stream of dry air between two rooms or from outdoors, for the vapour balance. */
export interface AirFlow {
  readonly name: string;
  /** Index of the room it comes from; −1 outdoors. */
  readonly from: number;
  readonly to: number;
  /** The same flow goes back: two rooms swap air. */
  readonly mutual: boolean;
  /** Share of the humidity difference that a recovery unit keeps in the room. */
  readonly keptShare: number;
  /** Dry air in a step, at air temperatures of both ends [kg/s]. */
  readonly massKgPerS: (step: number, fromC: number, toC: number) => number;
}

export function airSite(steps: WeatherSteps, clock: StepClock, properties: AirProperties): AirSite {
  const middle = (ends: Float64Array) => {
    const values = new Float64Array(steps.count);
    for (let k = 0; k < values.length; k++) values[k] = (ends[k] + ends[k + 1]) / 2;
    return values;
  };
  const outdoorC = middle(steps.dryBulbC);
  return {
    properties,
    clock,
    outdoorC,
    windMPerS: middle(steps.windMPerS),
    windFromDeg: steps.windFromDeg,
    humidityRatio: middle(steps.humidityRatio),
    relativeHumidity: (k) =>
      saturationPressurePa((steps.dewPointC[k] + steps.dewPointC[k + 1]) / 2) /
      saturationPressurePa(outdoorC[k]),
  };
}

/** Wind in a step at a height over the building's terrain; a share of it arrives [m/s]. */
export function windAt(building: Building, site: AirSite, step: number, heightM: number): number {
  return windAtHeightMPerS(site.windMPerS[step], heightM, terrains[building.site.terrain]);
}

/** Pressure coefficient of a wall in the wind of a step. */
export function wallCoefficient(site: AirSite, step: number, azimuthDeg: number): number {
  return wallWindCoefficient(angleBetweenDeg(site.windFromDeg[step], azimuthDeg));
}
