// The skyline round a building: what stands before the sun and the low sky.

/** A point of the skyline; between points it runs straight, all the way round. */
export interface HorizonPoint {
  readonly azimuthDeg: number;
  readonly altitudeDeg: number;
}

/** Skyline with its points in order of azimuth from 0 to 360; none for a free view. */
export type Horizon = readonly HorizonPoint[];

/** Puts points in order, azimuths from 0 up to 360. */
export function orderedHorizon(points: readonly HorizonPoint[]): Horizon {
  return points
    .map(({ azimuthDeg, altitudeDeg }) => ({ azimuthDeg: turned(azimuthDeg), altitudeDeg }))
    .sort((a, b) => a.azimuthDeg - b.azimuthDeg);
}

const turned = (deg: number): number => ((deg % 360) + 360) % 360;

/** Altitude of the skyline in a direction; 0 for a free view [°]. */
export function horizonAltitudeDeg(horizon: Horizon, azimuthDeg: number): number {
  const count = horizon.length;
  if (count === 0) return 0;
  const at = turned(azimuthDeg);
  let k = count - 1; // the last point at or before the direction; before the first, the last of all
  for (let i = 0; i < count && horizon[i].azimuthDeg <= at; i++) k = i;
  const from = horizon[k];
  const to = horizon[(k + 1) % count];
  const span = turned(to.azimuthDeg - from.azimuthDeg);
  if (span === 0) return from.altitudeDeg;
  const share = turned(at - from.azimuthDeg) / span;
  return from.altitudeDeg + share * (to.altitudeDeg - from.altitudeDeg);
}

/** Whether the skyline lets the sun through. */
export function isAboveHorizon(
  horizon: Horizon,
  sunAzimuthDeg: number,
  sunAltitudeDeg: number,
): boolean {
  return sunAltitudeDeg > Math.max(0, horizonAltitudeDeg(horizon, sunAzimuthDeg));
}
