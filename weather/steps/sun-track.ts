// The sun over a whole weather year, at every step: where it stands in the middle of the step's
// sunlit part, and how much of the step is sunlit.
//
// The full ephemeris is computed once a day and interpolated by cubics (error below 1e-5 degrees);
// only the turning of the Earth is done step by step. A typical year is stitched from several years;
// each day's sun is that of the year the day was taken from. "Sunlit" means the disc's centre above
// the horizon in plain geometry. An arc of sun that begins and ends within one step (polar dawn, less
// than a degree high) is left out.
import { monthAndDay } from '../calendar.ts';
import { julianDay, radPerDeg, sunEphemeris } from '../sun/ephemeris.ts';
import type { WeatherYear } from '../weather-year.ts';

/** One value a step, `count` of them. */
export interface SunTrack {
  readonly stepS: number;
  readonly count: number;
  /** Of the disc's centre, without refraction; negative at night. */
  readonly altitudeDeg: Float64Array;
  /** Clockwise from north. */
  readonly azimuthDeg: Float64Array;
  /** Unit vector towards the sun. */
  readonly east: Float64Array;
  readonly north: Float64Array;
  readonly up: Float64Array;
  /** Share of the step with the sun up, 0 to 1, and the part of the step in which it is. */
  readonly sunlitShare: Float64Array;
  readonly sunlitFrom: Float64Array;
  readonly sunlitTo: Float64Array;
  /** On a plane that faces the sun outside the atmosphere: 1366.1 W/m² over the distance squared. */
  readonly extraterrestrialWPerM2: Float64Array;
}

export const solarConstantWPerM2 = 1366.1; // ASTM E490-00a

/** Day's sun for interpolation: equation of time as an angle, declination, distance, at four midnights. */
interface Knot {
  readonly equationDeg: number;
  readonly declinationDeg: number;
  readonly distanceAu: number;
}

type Sky = Pick<WeatherYear, 'site' | 'hours' | 'sourceYear'>;

export function sunTrack(year: Sky, stepS: number): SunTrack {
  const perDay = 86400 / stepS;
  const count = (year.hours / 24) * perDay;
  const series = () => new Float64Array(count);
  const track = {
    stepS,
    count,
    altitudeDeg: series(),
    azimuthDeg: series(),
    east: series(),
    north: series(),
    up: series(),
    sunlitShare: series(),
    sunlitFrom: series(),
    sunlitTo: series(),
    extraterrestrialWPerM2: series(),
  };
  const { latitudeDeg, longitudeDeg, utcOffsetH } = year.site;
  const sinPhi = Math.sin(latitudeDeg * radPerDeg);
  const cosPhi = Math.cos(latitudeDeg * radPerDeg);
  const days = year.hours / 24;
  const knots = new Map<number, Knot>();
  for (let d = 0; d < days; d++) {
    const { month, day } = monthAndDay(d, days);
    const midnightMs =
      Date.UTC(year.sourceYear[d * 24 + 12], month - 1, day) - utcOffsetH * 3600000;
    const at = [-1, 0, 1, 2].map((n) => knotAt(knots, midnightMs + n * 86400000));
    const equation = cubic(at.map((knot) => knot.equationDeg));
    const declination = cubic(at.map((knot) => knot.declinationDeg));
    const distance = cubic(at.map((knot) => knot.distanceAu));
    const clockDeg = longitudeDeg - utcOffsetH * 15 - 180;

    let sinDelta = 0;
    let cosDelta = 0;
    let hour = 0;
    let parallax = 0;
    // Moves the sun to a time of the day, 0 to 1, and gives the sine of its altitude.
    const look = (u: number): number => {
      const delta = at4(declination, u) * radPerDeg;
      sinDelta = Math.sin(delta);
      cosDelta = Math.cos(delta);
      hour = (at4(equation, u) + 360 * u + clockDeg) * radPerDeg;
      const sine = sinPhi * sinDelta + cosPhi * cosDelta * Math.cos(hour);
      return sine - parallax * (1 - sine * sine); // the observer stands on the surface, not at the centre
    };
    parallax = (8.794 / 3600) * radPerDeg;
    let startUp = look(0);
    for (let s = 0; s < perDay; s++) {
      const k = d * perDay + s;
      const u0 = s / perDay;
      const u1 = (s + 1) / perDay;
      const endUp = look(u1);
      let from = 0;
      let to = 1;
      if (startUp <= 0 && endUp <= 0) to = 0;
      else if (startUp <= 0) from = crossing(look, u0, u1, startUp, endUp);
      else if (endUp <= 0) to = crossing(look, u0, u1, startUp, endUp);
      const isUp = to > from;
      const middle = isUp ? (from + to) / 2 : 0.5;
      const u = u0 + (u1 - u0) * middle;
      const sine = look(u);
      const scale = 1 + parallax * sine;
      const cosHour = Math.cos(hour);
      const east = -cosDelta * Math.sin(hour) * scale;
      const north = (cosPhi * sinDelta - sinPhi * cosDelta * cosHour) * scale;
      track.east[k] = east;
      track.north[k] = north;
      track.up[k] = sine;
      track.altitudeDeg[k] = Math.asin(Math.max(-1, Math.min(1, sine))) / radPerDeg;
      const azimuth = Math.atan2(east, north) / radPerDeg;
      track.azimuthDeg[k] = azimuth < 0 ? azimuth + 360 : azimuth;
      track.sunlitFrom[k] = isUp ? from : 0;
      track.sunlitTo[k] = isUp ? to : 0;
      track.sunlitShare[k] = isUp ? to - from : 0;
      const r = at4(distance, u);
      track.extraterrestrialWPerM2[k] = solarConstantWPerM2 / (r * r);
      startUp = endUp;
    }
  }
  return track;
}

function knotAt(knots: Map<number, Knot>, utcMs: number): Knot {
  const known = knots.get(utcMs);
  if (known !== undefined) return known;
  const julian = julianDay(utcMs);
  const sun = sunEphemeris(julian);
  const universalDeg = 360 * (julian - 0.5 - Math.floor(julian - 0.5));
  const raw = sun.siderealDeg - sun.rightAscensionDeg - universalDeg + 180;
  const knot = {
    equationDeg: raw - 360 * Math.round(raw / 360),
    declinationDeg: sun.declinationDeg,
    distanceAu: sun.distanceAu,
  };
  knots.set(utcMs, knot);
  return knot;
}

/** Coefficients of the cubic through values at -1, 0, 1, 2. */
function cubic([a, b, c, d]: readonly number[]): readonly [number, number, number, number] {
  return [b, -a / 3 - b / 2 + c - d / 6, (a + c) / 2 - b, (d - a) / 6 + (b - c) / 2];
}

function at4(c: readonly [number, number, number, number], u: number): number {
  return c[0] + u * (c[1] + u * (c[2] + u * c[3]));
}

/** Part of the step at which the sun passes the horizon, by secants (error below 0.1 s). */
function crossing(
  look: (u: number) => number,
  u0: number,
  u1: number,
  startUp: number,
  endUp: number,
): number {
  let low = 0;
  let high = 1;
  let atLow = startUp;
  let atHigh = endUp;
  for (let i = 0; i < 8; i++) {
    const guess = low + ((high - low) * atLow) / (atLow - atHigh);
    const value = look(u0 + (u1 - u0) * guess);
    if (value === 0 || Math.abs(value) < 1e-9) return guess;
    if (value > 0 === atLow > 0) {
      low = guess;
      atLow = value;
      atHigh /= 2; // Illinois rule: keeps the far end from sticking
    } else {
      high = guess;
      atHigh = value;
      atLow /= 2;
    }
  }
  return (low + high) / 2;
}
