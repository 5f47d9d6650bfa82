// Sunrise, sunset and transit, polar day and night included.
//
// Between its highest and lowest point the sun's altitude only rises or only falls, so each such
// stretch is bisected at most once and no event is missed, however short the day.
import { degPerRad, julianDay, type SunEphemeris, sunEphemeris } from './ephemeris.ts';
import { type Observer, type SunPosition, sunOver } from './position.ts';

/** Moments as milliseconds since 1970-01-01T00:00:00Z; `null` where there is none in the 24 hours. */
export interface SunEvents {
  readonly sunriseMs: number | null;
  readonly sunsetMs: number | null;
  readonly transitMs: number | null;
  readonly transitAltitudeDeg: number | null;
}

/**
 * What counts as risen. `upperLimb`: the disc's upper edge, lifted 34 arc minutes by the air, as in
 * almanacs. `centre`: the disc's centre in plain geometry, minutes later in the morning.
 */
export type Horizon = 'upperLimb' | 'centre';

const dayMs = 86400000;

/** What the sun does in the 24 hours after a moment. */
export function sunEvents(
  fromMs: number,
  observer: Observer,
  horizon: Horizon = 'upperLimb',
): SunEvents {
  const at = (ms: number) => sunEphemeris(julianDay(ms));
  const seen = (ms: number) => sunOver(at(ms), observer);
  const above = (ms: number) => {
    const sun = at(ms);
    return sunOver(sun, observer).altitudeDeg - limitDeg(sun, horizon);
  };
  const toMs = fromMs + dayMs;
  const noons: number[] = [];
  const turns = [fromMs, toMs];
  for (const targetDeg of [0, 180]) {
    for (const near of [fromMs, fromMs + dayMs / 2, toMs]) {
      const turn = hourAngleAtMs(near, targetDeg, seen);
      if (turn < fromMs || turn >= toMs || turns.some((ms) => Math.abs(ms - turn) < 1000)) continue;
      turns.push(turn);
      if (targetDeg === 0) noons.push(turn);
    }
  }
  turns.sort((a, b) => a - b);
  let sunriseMs: number | null = null;
  let sunsetMs: number | null = null;
  for (let i = 0; i + 1 < turns.length; i++) {
    const starts = above(turns[i]);
    const ends = above(turns[i + 1]);
    if (starts <= 0 === ends <= 0) continue;
    const crossing = bisectMs(turns[i], turns[i + 1], above);
    if (starts <= 0) sunriseMs ??= crossing;
    else sunsetMs ??= crossing;
  }
  const transitMs = noons.length > 0 ? Math.min(...noons) : null;
  const transitAltitudeDeg = transitMs === null ? null : seen(transitMs).altitudeDeg;
  return { sunriseMs, sunsetMs, transitMs, transitAltitudeDeg };
}

/** Altitude of the centre at which the sun counts as rising: minus 34' of air and the half disc. */
function limitDeg(sun: SunEphemeris, horizon: Horizon): number {
  if (horizon === 'centre') return 0;
  const radiusDeg = Math.asin(0.0046524 / sun.distanceAu) * degPerRad; // 695700 km in AU
  return -34 / 60 - radiusDeg;
}

/** Moment near `nearMs` at which the hour angle reaches the target, by a few fixed-point steps. */
function hourAngleAtMs(nearMs: number, targetDeg: number, seen: (ms: number) => SunPosition) {
  let ms = nearMs;
  for (let k = 0; k < 5; k++) {
    const off = (((seen(ms).hourAngleDeg - targetDeg + 180) % 360) + 360) % 360;
    ms -= ((off - 180) / 360) * dayMs;
  }
  return ms;
}

function bisectMs(lowMs: number, highMs: number, value: (ms: number) => number): number {
  const negativeLow = value(lowMs) <= 0;
  let low = lowMs;
  let high = highMs;
  while (high - low > 50) {
    const middle = (low + high) / 2;
    if (value(middle) <= 0 === negativeLow) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
