// Moist air after the ASHRAE Handbook of Fundamentals, chapter "Psychrometrics" (perfect-gas
// equations, SI; number of the equation beside each). Valid from -100 to 200 °C.

const kelvin = 273.15;
/** Mass of water vapour over that of dry air, per mole. */
const massRatio = 0.621945;

/**
 * Pressure of water vapour at saturation, over ice below the triple point, over water above [Pa].
 * Source: equations 5 and 6 (R. Hyland, A. Wexler, ASHRAE Transactions 89(2A), 1983).
 */
export function saturationPressurePa(temperatureC: number): number {
  const t = temperatureC + kelvin;
  if (temperatureC <= 0.01) {
    const power = -9.677843e-3 + t * (6.2215701e-7 + t * (2.0747825e-9 - t * 9.484024e-13));
    return Math.exp(-5674.5359 / t + 6.3925247 + t * power + 4.1635019 * Math.log(t));
  }
  const power = -4.8640239e-2 + t * (4.1764768e-5 - t * 1.4452093e-8);
  return Math.exp(-5800.2206 / t + 1.3914993 + t * power + 6.5459673 * Math.log(t));
}

/** Water in the air per mass of dry air, from the vapour's partial pressure (equation 20) [kg/kg]. */
export function humidityRatio(vapourPa: number, pressurePa: number): number {
  return (massRatio * vapourPa) / (pressurePa - vapourPa);
}

/** Partial pressure of the vapour, the inverse of `humidityRatio` [Pa]. */
export function vapourPressurePa(ratio: number, pressurePa: number): number {
  return (pressurePa * ratio) / (massRatio + ratio);
}

/**
 * Temperature at which vapour of this pressure would begin to condense [°C].
 *
 * Inverts `saturationPressurePa` by Newton's method on the logarithm, to 1e-9 K.
 * @param vapourPa above 0; below saturation at -100 °C the answer stays at -100
 */
export function dewPointC(vapourPa: number): number {
  if (!(vapourPa > saturationPressurePa(-100))) return -100;
  const target = Math.log(vapourPa);
  // Magnus form for a start: within 0.5 K between -40 and 60 °C.
  const x = Math.log(vapourPa / 611.2);
  let t = Math.max(-99, Math.min(199, (243.04 * x) / (17.625 - x)));
  for (let i = 0; i < 30; i++) {
    const slope =
      (Math.log(saturationPressurePa(t + 0.01)) - Math.log(saturationPressurePa(t - 0.01))) / 0.02;
    const move = (target - Math.log(saturationPressurePa(t))) / slope;
    t = Math.max(-100, Math.min(200, t + move));
    if (Math.abs(move) < 1e-9) break;
  }
  return t;
}

/** Dew point from dry bulb and relative humidity, 0 to 1 [°C]. */
export function dewPointFromHumidityC(dryBulbC: number, relativeHumidity: number): number {
  return dewPointC(relativeHumidity * saturationPressurePa(dryBulbC));
}

/** Relative humidity, 0 to 1, from dry bulb and dew point. */
export function relativeHumidityFromDewPoint(dryBulbC: number, dewPointTemperatureC: number) {
  return saturationPressurePa(dewPointTemperatureC) / saturationPressurePa(dryBulbC);
}

/** Enthalpy per mass of dry air, 0 at 0 °C dry (equation 30) [J/kg]. */
export function enthalpyJPerKg(dryBulbC: number, ratio: number): number {
  return 1000 * (1.006 * dryBulbC + ratio * (2501 + 1.86 * dryBulbC));
}

/** Volume per mass of dry air (equation 26) [m³/kg]. */
export function specificVolumeM3PerKg(dryBulbC: number, ratio: number, pressurePa: number): number {
  return (287.042 * (dryBulbC + kelvin) * (1 + 1.607858 * ratio)) / pressurePa;
}

/** Mass of moist air per volume (equation 27) [kg/m³]. */
export function moistAirDensityKgPerM3(
  dryBulbC: number,
  ratio: number,
  pressurePa: number,
): number {
  return (1 + ratio) / specificVolumeM3PerKg(dryBulbC, ratio, pressurePa);
}

/** Humidity ratio from dry and wet bulb, over ice below 0 °C wet bulb (equations 33 and 35) [kg/kg]. */
export function humidityRatioFromWetBulb(
  dryBulbC: number,
  wetBulbTemperatureC: number,
  pressurePa: number,
): number {
  const saturated = humidityRatio(saturationPressurePa(wetBulbTemperatureC), pressurePa);
  const apart = dryBulbC - wetBulbTemperatureC;
  if (wetBulbTemperatureC >= 0)
    return (
      ((2501 - 2.326 * wetBulbTemperatureC) * saturated - 1.006 * apart) /
      (2501 + 1.86 * dryBulbC - 4.186 * wetBulbTemperatureC)
    );
  return (
    ((2830 - 0.24 * wetBulbTemperatureC) * saturated - 1.006 * apart) /
    (2830 + 1.86 * dryBulbC - 2.1 * wetBulbTemperatureC)
  );
}

/** Wet-bulb temperature, by bisection of `humidityRatioFromWetBulb` to 1e-6 K [°C]. */
export function wetBulbC(dryBulbC: number, ratio: number, pressurePa: number): number {
  let low = Math.min(dryBulbC, dewPointC(vapourPressurePa(Math.max(ratio, 1e-9), pressurePa))) - 1;
  let high = dryBulbC;
  while (high - low > 1e-6) {
    const middle = (low + high) / 2;
    if (humidityRatioFromWetBulb(dryBulbC, middle, pressurePa) > ratio) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}

/**
 * Wet bulb at sea level by a fit, within 1 K of the physical one for 5 to 99 % and -20 to 50 °C [°C].
 * Source: R. Stull, "Wet-bulb temperature from relative humidity and air temperature", J. Applied
 * Meteorology and Climatology 50 (2011), equation 1.
 */
export function stullWetBulbC(dryBulbC: number, relativeHumidity: number): number {
  const percent = relativeHumidity * 100;
  return (
    dryBulbC * Math.atan(0.151977 * Math.sqrt(percent + 8.313659)) +
    Math.atan(dryBulbC + percent) -
    Math.atan(percent - 1.676331) +
    0.00391838 * percent ** 1.5 * Math.atan(0.023101 * percent) -
    4.686035
  );
}

/**
 * Dew point by the Magnus form, within 0.1 K of the full equation [°C].
 * Source: O. Alduchov, R. Eskridge, "Improved Magnus form approximation of saturation vapor
 * pressure", J. Applied Meteorology 35 (1996).
 */
export function magnusDewPointC(dryBulbC: number, relativeHumidity: number): number {
  const x = Math.log(relativeHumidity) + (17.625 * dryBulbC) / (243.04 + dryBulbC);
  return (243.04 * x) / (17.625 - x);
}
