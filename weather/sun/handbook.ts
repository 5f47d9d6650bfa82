// The handbook formulas of solar geometry: day-of-year series, sunset hour angle, radiation outside
// the atmosphere. Good to half a degree and half a minute: for checks and estimates by hand. The
// program's own sun is `sunPosition`.
//
// Source throughout: J. Duffie, W. Beckman, "Solar Engineering of Thermal Processes", chapter 1, with
// the equation's number; P. I. Cooper (1969); J. W. Spencer, "Fourier series representation of the
// position of the sun", Search 2 (1971), p. 172.
import { degPerRad, radPerDeg } from './ephemeris.ts';

const dayAngleRad = (dayOfYear: number) => (2 * Math.PI * (dayOfYear - 1)) / 365;

/** Declination, one term: δ = 23.45° · sin(360° · (284 + n) / 365) (equation 1.6.1a, Cooper). */
export function cooperDeclinationDeg(dayOfYear: number): number {
  return 23.45 * Math.sin((360 * (284 + dayOfYear) * radPerDeg) / 365);
}

/** Declination by Spencer's series (equation 1.6.1b). */
export function spencerDeclinationDeg(dayOfYear: number): number {
  const b = dayAngleRad(dayOfYear);
  return (
    (0.006918 -
      0.399912 * Math.cos(b) +
      0.070257 * Math.sin(b) -
      0.006758 * Math.cos(2 * b) +
      0.000907 * Math.sin(2 * b) -
      0.002697 * Math.cos(3 * b) +
      0.00148 * Math.sin(3 * b)) *
    degPerRad
  );
}

/** Sundial minus mean solar time by Spencer's series [min] (equation 1.5.3). */
export function equationOfTimeMin(dayOfYear: number): number {
  const b = dayAngleRad(dayOfYear);
  return (
    229.2 *
    (0.000075 +
      0.001868 * Math.cos(b) -
      0.032077 * Math.sin(b) -
      0.014615 * Math.cos(2 * b) -
      0.04089 * Math.sin(2 * b))
  );
}

/**
 * Solar time from clock time (equation 1.5.2, longitudes east positive here) [h].
 * @param meridianDeg meridian of the clock, 15 times its offset from UTC
 */
export function solarTimeH(
  clockH: number,
  dayOfYear: number,
  longitudeDeg: number,
  meridianDeg: number,
): number {
  return clockH + (4 * (longitudeDeg - meridianDeg) + equationOfTimeMin(dayOfYear)) / 60;
}

/** Zenith and azimuth (clockwise from north) of a sun given by declination and hour angle. */
export function sunFromHourAngle(
  latitudeDeg: number,
  declinationDeg: number,
  hourAngleDeg: number,
): { readonly zenithDeg: number; readonly azimuthDeg: number } {
  const phi = latitudeDeg * radPerDeg;
  const delta = declinationDeg * radPerDeg;
  const omega = hourAngleDeg * radPerDeg;
  const cosZenith =
    Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * Math.cos(omega);
  const fromSouth = Math.atan2(
    Math.sin(omega) * Math.cos(delta),
    Math.cos(omega) * Math.cos(delta) * Math.sin(phi) - Math.sin(delta) * Math.cos(phi),
  );
  return {
    zenithDeg: Math.acos(Math.max(-1, Math.min(1, cosZenith))) * degPerRad,
    azimuthDeg: (fromSouth * degPerRad + 180) % 360,
  };
}

/** Hour angle of sunset: cos ωs = −tan φ · tan δ; 180 in polar day, 0 in polar night (equation 1.6.10). */
export function sunsetHourAngleDeg(latitudeDeg: number, declinationDeg: number): number {
  const cosine = -Math.tan(latitudeDeg * radPerDeg) * Math.tan(declinationDeg * radPerDeg);
  return Math.acos(Math.max(-1, Math.min(1, cosine))) * degPerRad;
}

/** Irradiance on a plane that faces the sun outside the atmosphere, one term (equation 1.4.1a). */
export function simpleExtraterrestrialWPerM2(
  dayOfYear: number,
  solarConstantWPerM2 = 1367,
): number {
  return solarConstantWPerM2 * (1 + 0.033 * Math.cos((360 * dayOfYear * radPerDeg) / 365));
}

/** The same by Spencer's series (equation 1.4.1b). */
export function spencerExtraterrestrialWPerM2(
  dayOfYear: number,
  solarConstantWPerM2 = 1366.1,
): number {
  const b = dayAngleRad(dayOfYear);
  return (
    solarConstantWPerM2 *
    (1.00011 +
      0.034221 * Math.cos(b) +
      0.00128 * Math.sin(b) +
      0.000719 * Math.cos(2 * b) +
      0.000077 * Math.sin(2 * b))
  );
}

/** Energy on the horizontal outside the atmosphere between two hour angles [J/m²] (equation 1.10.4). */
export function extraterrestrialHorizontalJPerM2(
  dayOfYear: number,
  latitudeDeg: number,
  declinationDeg: number,
  fromHourAngleDeg: number,
  toHourAngleDeg: number,
  solarConstantWPerM2 = 1367,
): number {
  const phi = latitudeDeg * radPerDeg;
  const delta = declinationDeg * radPerDeg;
  const from = fromHourAngleDeg * radPerDeg;
  const to = toHourAngleDeg * radPerDeg;
  const shape =
    Math.cos(phi) * Math.cos(delta) * (Math.sin(to) - Math.sin(from)) +
    (to - from) * Math.sin(phi) * Math.sin(delta);
  const secondsPerRad = 43200 / Math.PI;
  return simpleExtraterrestrialWPerM2(dayOfYear, solarConstantWPerM2) * secondsPerRad * shape;
}
