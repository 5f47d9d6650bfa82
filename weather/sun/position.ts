// Where the sun stands over a place: altitude and azimuth as the observer sees it.
//
// Sections 3.9 to 3.15 of I. Reda, A. Andreas, "Solar Position Algorithm for Solar Radiation
// Applications", NREL/TP-560-34302 (2008): hour angle, parallax of the observer, refraction.
import {
  degPerRad,
  julianDay,
  radPerDeg,
  type SunEphemeris,
  sunEphemeris,
  wrapDeg,
} from './ephemeris.ts';

export interface SunPosition {
  /** Of the disc's centre above the horizon; refraction only where it was asked for. */
  readonly altitudeDeg: number;
  readonly zenithDeg: number;
  /** Clockwise from north, 0 to 360. */
  readonly azimuthDeg: number;
  /** As the observer sees it (topocentric). */
  readonly declinationDeg: number;
  /** Afternoon positive, -180 to 180. */
  readonly hourAngleDeg: number;
  readonly distanceAu: number;
}

export interface Observer {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly elevationM?: number;
}

/** Air that bends the light; absent: no refraction. */
export interface Refraction {
  readonly pressurePa: number;
  readonly dryBulbC: number;
}

export interface SunPositionOptions {
  readonly refraction?: Refraction;
  /** Terrestrial minus universal time; a fit to the Earth's rotation where absent. */
  readonly deltaTS?: number;
}

/** Where the sun stands, at a moment given as milliseconds since 1970-01-01T00:00:00Z. */
export function sunPosition(
  utcMs: number,
  observer: Observer,
  options: SunPositionOptions = {},
): SunPosition {
  const julian = julianDay(utcMs);
  return sunOver(sunEphemeris(julian, options.deltaTS), observer, options.refraction);
}

/** The same from an ephemeris already at hand. */
export function sunOver(
  sun: SunEphemeris,
  observer: Observer,
  refraction?: Refraction,
): SunPosition {
  const { latitudeDeg, longitudeDeg, elevationM = 0 } = observer;
  const phi = latitudeDeg * radPerDeg;
  const delta = sun.declinationDeg * radPerDeg;
  const hour = wrapDeg(sun.siderealDeg + longitudeDeg - sun.rightAscensionDeg) * radPerDeg;

  const parallax = (8.794 / (3600 * sun.distanceAu)) * radPerDeg;
  const u = Math.atan(0.99664719 * Math.tan(phi));
  const x = Math.cos(u) + (elevationM / 6378140) * Math.cos(phi);
  const y = 0.99664719 * Math.sin(u) + (elevationM / 6378140) * Math.sin(phi);
  const toward = Math.cos(delta) - x * Math.sin(parallax) * Math.cos(hour);
  const shift = Math.atan2(-x * Math.sin(parallax) * Math.sin(hour), toward);
  const deltaHere = Math.atan2(
    (Math.sin(delta) - y * Math.sin(parallax)) * Math.cos(shift),
    toward,
  );
  const hourHere = hour - shift;

  const sinAltitude =
    Math.sin(phi) * Math.sin(deltaHere) + Math.cos(phi) * Math.cos(deltaHere) * Math.cos(hourHere);
  const trueDeg = Math.asin(Math.max(-1, Math.min(1, sinAltitude))) * degPerRad;
  const altitudeDeg = refraction ? trueDeg + refractionDeg(trueDeg, refraction) : trueDeg;
  const fromSouth = Math.atan2(
    Math.sin(hourHere),
    Math.cos(hourHere) * Math.sin(phi) - Math.tan(deltaHere) * Math.cos(phi),
  );
  const hourAngle = wrapDeg(hourHere * degPerRad);
  return {
    altitudeDeg,
    zenithDeg: 90 - altitudeDeg,
    azimuthDeg: wrapDeg(fromSouth * degPerRad + 180),
    declinationDeg: deltaHere * degPerRad,
    hourAngleDeg: hourAngle > 180 ? hourAngle - 360 : hourAngle,
    distanceAu: sun.distanceAu,
  };
}

/**
 * How much the air lifts the sun; 0 while the whole disc is down [°].
 *
 *   Δe = (p / 1010 hPa) · (283 K / T) · 1.02 / (60 · tan(e + 10.3 / (e + 5.11)))
 *
 * Source: NREL/TP-560-34302, equation 42.
 */
export function refractionDeg(altitudeDeg: number, air: Refraction): number {
  if (altitudeDeg < -(0.26667 + 0.5667)) return 0;
  const angle = (altitudeDeg + 10.3 / (altitudeDeg + 5.11)) * radPerDeg;
  return ((air.pressurePa / 101000) * (283 / (273 + air.dryBulbC)) * 1.02) / (60 * Math.tan(angle));
}

/**
 * Cosine of the angle between the sun and the normal of a plane.
 *
 *   cos i = cos z · cos β + sin z · sin β · cos(A − Ap)
 *
 * @param zenithDeg of the sun, @param azimuthDeg of the sun, clockwise from north
 * @param tiltDeg of the plane, 0 flat, 90 upright; @param planeAzimuthDeg that it faces
 * Source: J. Duffie, W. Beckman, "Solar Engineering of Thermal Processes", equation 1.6.3.
 */
export function cosIncidence(
  zenithDeg: number,
  azimuthDeg: number,
  tiltDeg: number,
  planeAzimuthDeg: number,
): number {
  const z = zenithDeg * radPerDeg;
  const tilt = tiltDeg * radPerDeg;
  return (
    Math.cos(z) * Math.cos(tilt) +
    Math.sin(z) * Math.sin(tilt) * Math.cos((azimuthDeg - planeAzimuthDeg) * radPerDeg)
  );
}
