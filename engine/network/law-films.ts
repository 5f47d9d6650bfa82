// Surface films: natural convection (a power of the temperature difference), alone or joined with a
// forced part. Both flows rise with the difference, so their slopes are never negative.

import type { Law, StateLinks } from './laws.ts';
import type { BuoyantLinks, MixedFilmLinks } from './problem.ts';

type Target = Omit<StateLinks, 'laws'>;

/** z^(exponent/2) for z = ΔT² (+ ε): by roots where the exponent is a usual one, since `pow` is slow. */
type Root = 'third' | 'quarter' | 'half' | 'one' | 'two thirds' | 'any';

function rootOf(exponent: number): Root {
  if (exponent === 1 / 3) return 'third';
  if (exponent === 1 / 4) return 'quarter';
  if (exponent === 1 / 2) return 'half';
  if (exponent === 1) return 'one';
  return exponent === 2 / 3 ? 'two thirds' : 'any';
}

function raise(z: number, root: Root, exponent: number): number {
  if (root === 'third') return Math.cbrt(Math.sqrt(z));
  if (root === 'one') return Math.sqrt(z);
  if (root === 'quarter') return Math.sqrt(Math.sqrt(Math.sqrt(z)));
  if (root === 'half') return Math.sqrt(Math.sqrt(z));
  if (root === 'two thirds') return Math.cbrt(z);
  return z ** (exponent / 2);
}

/**
 * flow = G·d, G = base·series + c·z^(n/2), z = d² + ε:  slope = G + n·c·z^(n/2)·d²/z.
 */
export function buoyantLaw(group: BuoyantLinks, set: Target, at: number): Law {
  const { warmerFrom, coolerFrom, exponent, softeningK2, baseSeries, baseWPerK } = group;
  const n = group.from.length;
  const { from, to, slopeFrom, slopeTo, flowW } = set;
  const root = rootOf(exponent);
  return (x, series) => {
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const d = x[from[l]] - x[to[l]];
      const square = d * d;
      const z = square + softeningK2;
      const natural = (d > 0 ? warmerFrom[k] : coolerFrom[k]) * raise(z, root, exponent);
      const s = baseSeries[k];
      const film = natural + (s < 0 ? baseWPerK[k] : baseWPerK[k] * series[s]);
      const slope = z > 0 ? film + (exponent * natural * square) / z : film;
      slopeFrom[l] = slope;
      slopeTo[l] = slope;
      flowW[l] = film * d;
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
  const root = rootOf(exponent);
  return (x, series) => {
    for (let k = 0; k < n; k++) {
      const l = at + k;
      const d = x[from[l]] - x[to[l]];
      const natural = (d > 0 ? warmerFrom[k] : coolerFrom[k]) * raise(d * d, root, exponent);
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
