// Design temperatures: those that the year stays above or below but for a few hours.
//
// From one typical year they are milder than those of a climate table, which ranks the hours of 25
// years and more: a typical year leaves the extremes out by its making. Sizing for people who could
// come to harm should use the climate table of the place.
import { humidityRatio, saturationPressurePa, wetBulbC } from '../air/moist-air.ts';
import type { WeatherYear } from '../weather-year.ts';

export interface DesignConditions {
  /** Dry bulb exceeded for 99.6 and 99 % of the hours. */
  readonly heating996C: number;
  readonly heating99C: number;
  /** Dry bulb exceeded for 0.4, 1 and 2 % of the hours, and the mean wet bulb of such hours. */
  readonly cooling04C: number;
  readonly cooling1C: number;
  readonly cooling2C: number;
  readonly wetBulbAtCooling04C: number;
  readonly wetBulbAtCooling1C: number;
  readonly wetBulbAtCooling2C: number;
  /** Dew point exceeded for 0.4 % of the hours: design for drying the air. */
  readonly dewPoint04C: number;
}

/**
 * Source: ASHRAE Handbook of Fundamentals, chapter "Climatic design information", for the annual
 * percentiles and the mean coincident wet bulb.
 */
export function designConditions(year: WeatherYear): DesignConditions {
  const air = Float64Array.from(year.dryBulbC.values).sort();
  const dew = Float64Array.from(year.dewPointC.values).sort();
  const cooling04C = exceeded(air, 0.004);
  const cooling1C = exceeded(air, 0.01);
  const cooling2C = exceeded(air, 0.02);
  return {
    heating996C: exceeded(air, 0.996),
    heating99C: exceeded(air, 0.99),
    cooling04C,
    cooling1C,
    cooling2C,
    wetBulbAtCooling04C: coincidentWetBulbC(year, cooling04C),
    wetBulbAtCooling1C: coincidentWetBulbC(year, cooling1C),
    wetBulbAtCooling2C: coincidentWetBulbC(year, cooling2C),
    dewPoint04C: exceeded(dew, 0.004),
  };
}

/** Value that a share of the hours exceeds, from values sorted upwards; linear between ranks. */
export function exceeded(sorted: Float64Array, share: number): number {
  const at = (1 - share) * (sorted.length - 1);
  const low = Math.floor(at);
  const high = Math.min(low + 1, sorted.length - 1);
  return sorted[low] + (sorted[high] - sorted[low]) * (at - low);
}

/** Mean wet bulb of the hours within half a kelvin of a dry bulb, or of the nearest where none are. */
function coincidentWetBulbC(year: WeatherYear, dryBulbC: number): number {
  const air = year.dryBulbC.values;
  const nearest = air.reduce((least, t) => Math.min(least, Math.abs(t - dryBulbC)), Infinity);
  const width = Math.max(0.5, nearest);
  let total = 0;
  let count = 0;
  for (let h = 0; h < year.hours; h++) {
    if (Math.abs(air[h] - dryBulbC) > width) continue;
    const pressure = year.pressurePa.values[h];
    const ratio = humidityRatio(saturationPressurePa(year.dewPointC.values[h]), pressure);
    total += Math.min(air[h], wetBulbC(air[h], ratio, pressure));
    count++;
  }
  return total / count;
}
