// Where the sun stands among the stars: apparent right ascension and declination seen from the
// Earth's centre, and the sidereal time that turns them into an hour angle.
//
// Follows sections 3.1 to 3.8 of I. Reda, A. Andreas, "Solar Position Algorithm for Solar Radiation
// Applications", NREL/TP-560-34302 (2008); stated there to 0.0003 degrees from -2000 to 6000. Civil
// dates are Gregorian and times UTC; the difference to UT1 (under 0.9 s, 0.004 degrees of rotation)
// is left out, as weather tables know no better.
import { latitudeTerms, longitudeTerms, nutationTerms, radiusTerms } from './series.ts';

export const degPerRad = 180 / Math.PI;
export const radPerDeg = Math.PI / 180;

export interface SunEphemeris {
  /** Of the Earth about the sun. */
  readonly heliocentricLongitudeDeg: number;
  readonly heliocentricLatitudeDeg: number;
  readonly distanceAu: number;
  readonly nutationLongitudeDeg: number;
  readonly obliquityDeg: number;
  /** Of the sun, with aberration and nutation, 0 to 360: 0 at the March equinox. */
  readonly apparentLongitudeDeg: number;
  readonly rightAscensionDeg: number;
  readonly declinationDeg: number;
  /** Apparent sidereal time at Greenwich. */
  readonly siderealDeg: number;
}

/** Julian day of a moment given as milliseconds since 1970-01-01T00:00:00Z [d]. */
export function julianDay(utcMs: number): number {
  return utcMs / 86400000 + 2440587.5;
}

/**
 * Terrestrial time minus universal time [s].
 *
 * One second of error moves the sun by 0.00001 degrees. Outside 1941 to 2050 the long parabola.
 * Source: F. Espenak, J. Meeus, "Five Millennium Canon of Solar Eclipses", NASA/TP-2006-214141,
 * polynomial expressions for delta T (coefficients from memory).
 */
export function deltaTS(julian: number): number {
  const year = 2000 + (julian - 2451544.5) / 365.25;
  if (year >= 2005 && year < 2050) {
    const t = year - 2000;
    return 62.92 + t * (0.32217 + t * 0.005589);
  }
  if (year >= 1986 && year < 2005) {
    const t = year - 2000;
    const high = t * (0.0017275 + t * (0.000651814 + t * 0.00002373599));
    return 63.86 + t * (0.3345 + t * (-0.060374 + high));
  }
  if (year >= 1961 && year < 1986) {
    const t = year - 1975;
    return 45.45 + t * (1.067 - t * (1 / 260 + t / 718));
  }
  if (year >= 1941 && year < 1961) {
    const t = year - 1950;
    return 29.07 + t * (0.407 - t * (1 / 233 - t / 2547));
  }
  const u = (year - 1820) / 100;
  return -20 + 32 * u * u;
}

/** The sun at a Julian day of universal time; `terrestrialMinusUniversalS` as `deltaTS` by default. */
export function sunEphemeris(
  julian: number,
  terrestrialMinusUniversalS = deltaTS(julian),
): SunEphemeris {
  const century = (julian - 2451545 + terrestrialMinusUniversalS / 86400) / 36525;
  const millennium = century / 10;
  const longitude = wrapDeg(series(longitudeTerms, millennium) * degPerRad);
  const latitude = series(latitudeTerms, millennium) * degPerRad;
  const distanceAu = series(radiusTerms, millennium);
  const nutation = nutationDeg(century);
  const obliquity = meanObliquityDeg(millennium) + nutation.obliquity;
  const aberration = -20.4898 / (3600 * distanceAu);
  const apparent = wrapDeg(longitude + 180 + nutation.longitude + aberration);

  const lambda = apparent * radPerDeg;
  const beta = -latitude * radPerDeg;
  const eps = obliquity * radPerDeg;
  const rightAscension = Math.atan2(
    Math.sin(lambda) * Math.cos(eps) - Math.tan(beta) * Math.sin(eps),
    Math.cos(lambda),
  );
  const declination = Math.asin(
    Math.sin(beta) * Math.cos(eps) + Math.cos(beta) * Math.sin(eps) * Math.sin(lambda),
  );

  const days = julian - 2451545;
  const t = days / 36525;
  const meanSidereal = 280.46061837 + 360.98564736629 * days + t * t * (0.000387933 - t / 38710000);
  return {
    heliocentricLongitudeDeg: longitude,
    heliocentricLatitudeDeg: latitude,
    distanceAu,
    nutationLongitudeDeg: nutation.longitude,
    obliquityDeg: obliquity,
    apparentLongitudeDeg: apparent,
    rightAscensionDeg: wrapDeg(rightAscension * degPerRad),
    declinationDeg: declination * degPerRad,
    siderealDeg: wrapDeg(meanSidereal + nutation.longitude * Math.cos(eps)),
  };
}

/** The angle between 0 and 360. */
export function wrapDeg(angleDeg: number): number {
  const turned = angleDeg % 360;
  return turned < 0 ? turned + 360 : turned;
}

function series(tables: readonly (readonly number[])[], millennium: number): number {
  let sum = 0;
  for (let power = tables.length - 1; power >= 0; power--) {
    const terms = tables[power];
    let part = 0;
    for (let k = 0; k < terms.length; k += 3)
      part += terms[k] * Math.cos(terms[k + 1] + terms[k + 2] * millennium);
    sum = sum * millennium + part;
  }
  return sum / 1e8;
}

function nutationDeg(t: number): { longitude: number; obliquity: number } {
  const elongation = 297.85036 + t * (445267.11148 + t * (-0.0019142 + t / 189474));
  const sunAnomaly = 357.52772 + t * (35999.05034 + t * (-0.0001603 - t / 300000));
  const moonAnomaly = 134.96298 + t * (477198.867398 + t * (0.0086972 + t / 56250));
  const moonLatitude = 93.27191 + t * (483202.017538 + t * (-0.0036825 + t / 327270));
  const node = 125.04452 + t * (-1934.136261 + t * (0.0020708 + t / 450000));
  let longitude = 0;
  let obliquity = 0;
  for (const [d, m, mm, f, o, a, aRate, b, bRate] of nutationTerms) {
    const angle =
      (d * elongation + m * sunAnomaly + mm * moonAnomaly + f * moonLatitude + o * node) *
      radPerDeg;
    longitude += (a + aRate * t) * Math.sin(angle);
    obliquity += (b + bRate * t) * Math.cos(angle);
  }
  return { longitude: longitude / 36000000, obliquity: obliquity / 36000000 };
}

/** Tilt of the Earth's axis without nutation, J. Laskar's polynomial as in the report, equation 24. */
function meanObliquityDeg(millennium: number): number {
  const terms = [
    84381.448, -4680.93, -1.55, 1999.25, -51.38, -249.67, -39.05, 7.12, 27.87, 5.79, 2.45,
  ];
  const u = millennium / 10;
  let sum = 0;
  for (let i = terms.length - 1; i >= 0; i--) sum = sum * u + terms[i];
  return sum / 3600;
}
