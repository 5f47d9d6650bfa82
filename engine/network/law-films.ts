// Surface films: natural convection (a power of the temperature difference), alone or joined with a
// forced part. Both flows rise with the difference, so their slopes are never negative.

import type { Law, StateLinks } from './laws.ts';
import type { BuoyantLinks, MixedFilmLinks } from './problem.ts';

type Target = Omit<StateLinks, 'laws'>;

/** h = z^(n/2) for z = ΔT² (+ ε); roots where the exponent is a usual one, since `pow` is slow. */
function raise(z: Float64Array, h: Float64Array, exponent: number): void {
  const n = z.length;
  if (exponent === 1 / 3) for (let k = 0; k < n; k++) h[k] = Math.cbrt(Math.sqrt(z[k]));
  else if (exponent === 1 / 4)
    for (let k = 0; k < n; k++) h[k] = Math.sqrt(Math.sqrt(Math.sqrt(z[k])));
  else if (exponent === 1 / 2) for (let k = 0; k < n; k++) h[k] = Math.sqrt(Math.sqrt(z[k]));
  else if (exponent === 1) for (let k = 0; k < n; k++) h[k] = Math.sqrt(z[k]);
  else if (exponent === 2 / 3) for (let k = 0; k < n; k++) h[k] = Math.cbrt(z[k]);
  else if (exponent === 0) h.fill(1);
  else for (let k = 0; k < n; k++) h[k] = z[k] ** (exponent / 2);
}

/**
 * flow = G·d, G = base·series + c·z^(n/2), z = d² + ε:  slope = G + n·c·z^(n/2)·d²/z.
 */
export function buoyantLaw(group: BuoyantLinks, set: Target, at: number): Law {
  const { warmerFrom, coolerFrom, exponent, softeningK2, baseSeries, baseWPerK } = group;
  const n = group.from.length;
  const { from, to, slopeFrom, slopeTo, flowW } = set;
  const z = new Float64Array(n);
  const h = new Float64Array(n);
  return (x, series) => {
    for (let k = 0; k < n; k++) {
      const d = x[from[at + k]] - x[to[at + k]];
      z[k] = d * d + softeningK2;
    }
    raise(z, h, exponent);
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const d = x[from[l]] - x[to[l]];
      const natural = (d > 0 ? warmerFrom[k] : coolerFrom[k]) * h[k];
      const base = baseSeries[k] < 0 ? baseWPerK[k] : baseWPerK[k] * series[baseSeries[k]];
      const share = z[k] > 0 ? (d * d) / z[k] : 0;
      const slope = base + natural * (1 + exponent * share);
      slopeFrom[l] = slope;
      slopeTo[l] = slope;
      flowW[l] = (base + natural) * d;
    }
  };
}

/**
 * flow = A·(hn + R·(s − hn))·d with hn = c·|d|^n, s = √(hn² + hf²):
 * slope = A·[hn + R·(s − hn) + n·hn·(1 − R + R·hn/s)].
 */
export function mixedFilmLaw(group: MixedFilmLinks, set: Target, at: number): Law {
  const { areaM2, warmerFrom, coolerFrom, exponent, forcedSeries, roughness } = group;
  const n = group.from.length;
  const { from, to, slopeFrom, slopeTo, flowW } = set;
  const z = new Float64Array(n);
  const h = new Float64Array(n);
  return (x, series) => {
    for (let k = 0; k < n; k++) {
      const d = x[from[at + k]] - x[to[at + k]];
      z[k] = d * d;
    }
    raise(z, h, exponent);
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const d = x[from[l]] - x[to[l]];
      const natural = (d > 0 ? warmerFrom[k] : coolerFrom[k]) * h[k];
      const forced = series[forcedSeries[k]];
      const rough = roughness[k];
      const joined = Math.sqrt(natural * natural + forced * forced);
      const film = natural + rough * (joined - natural);
      const bend = joined > 0 ? 1 - rough + (rough * natural) / joined : 0;
      const slope = areaM2[k] * (film + exponent * natural * bend);
      slopeFrom[l] = slope;
      slopeTo[l] = slope;
      flowW[l] = areaM2[k] * film * d;
    }
  };
}
