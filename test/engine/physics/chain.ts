// Small solvers for one chain of the mesh, so that the mesh is tested by itself: a march in time
// (two-stage diagonally implicit Runge-Kutta, second order, L-stable) and the harmonic response.
import type { ConductionMesh } from '../../../engine/physics/conduction-mesh.ts';

/** What stands at one face: a film to a given temperature, or a given heat flow (film 0). */
export interface Face {
  readonly filmWPerM2K: number;
  readonly tempC: number;
  readonly fluxWPerM2?: number;
}

const gamma = 1 - Math.SQRT1_2;

/** Solves (C/(γΔt) + K)·T = right hand side in place; K from links and films. */
function solve(
  mesh: ConductionMesh,
  outside: Face,
  inside: Face,
  perStep: number,
  rhs: Float64Array,
) {
  const { capacityJPerM2K: c, conductanceWPerM2K: g } = mesh;
  const n = c.length;
  const diagonal = new Float64Array(n);
  for (let i = 0; i < n; i++) diagonal[i] = c[i] * perStep + (g[i - 1] ?? 0) + (g[i] ?? 0);
  diagonal[0] += outside.filmWPerM2K;
  diagonal[n - 1] += inside.filmWPerM2K;
  for (let i = 1; i < n; i++) {
    const w = g[i - 1] / diagonal[i - 1];
    diagonal[i] -= w * g[i - 1];
    rhs[i] += w * rhs[i - 1];
  }
  rhs[n - 1] /= diagonal[n - 1];
  for (let i = n - 2; i >= 0; i--) rhs[i] = (rhs[i] + g[i] * rhs[i + 1]) / diagonal[i];
}

/** Temperatures of the nodes at each of the asked times (rising, from 0), faces held constant. */
export function marchChain(
  mesh: ConductionMesh,
  outside: Face,
  inside: Face,
  startC: number,
  stepS: number,
  timesS: readonly number[],
  each?: (tempC: Float64Array, dtS: number) => void,
): Float64Array[] {
  const { capacityJPerM2K: c, conductanceWPerM2K: g } = mesh;
  const n = c.length;
  let t = new Float64Array(n).fill(startC);
  const found: Float64Array[] = [];
  let now = 0;
  const driven = (rhs: Float64Array) => {
    rhs[0] += outside.filmWPerM2K * outside.tempC + (outside.fluxWPerM2 ?? 0);
    rhs[n - 1] += inside.filmWPerM2K * inside.tempC + (inside.fluxWPerM2 ?? 0);
  };
  for (const until of timesS) {
    const count = Math.max(1, Math.round((until - now) / stepS));
    const dt = (until - now) / count;
    const perStep = 1 / (gamma * dt);
    for (let k = 0; k < count; k++) {
      const first = new Float64Array(n);
      for (let i = 0; i < n; i++) first[i] = c[i] * perStep * t[i];
      driven(first);
      solve(mesh, outside, inside, perStep, first);
      const second = new Float64Array(n);
      for (let i = 0; i < n; i++) {
        // heat into node i at the first stage
        let f = 0;
        if (i > 0) f += g[i - 1] * (first[i - 1] - first[i]);
        if (i < n - 1) f += g[i] * (first[i + 1] - first[i]);
        if (i === 0)
          f += outside.filmWPerM2K * (outside.tempC - first[0]) + (outside.fluxWPerM2 ?? 0);
        if (i === n - 1)
          f += inside.filmWPerM2K * (inside.tempC - first[i]) + (inside.fluxWPerM2 ?? 0);
        second[i] = c[i] * perStep * t[i] + ((1 - gamma) / gamma) * f;
      }
      driven(second);
      solve(mesh, outside, inside, perStep, second);
      t = second;
      each?.(t, dt);
    }
    now = until;
    found.push(t.slice());
  }
  return found;
}

/** |Y12| and |Y11| of the chain with films, for a sinusoid at the outside and at the inside air. */
export function harmonicChain(
  mesh: ConductionMesh,
  insideFilmM2KPerW: number,
  outsideFilmM2KPerW: number,
  periodS: number,
): { y12: number; y11: number } {
  const omega = (2 * Math.PI) / periodS;
  const { capacityJPerM2K: c, conductanceWPerM2K: g } = mesh;
  // March from the outside air held at 0, unit flow q through the film, towards the inside air.
  let tr = outsideFilmM2KPerW; // node temperature when 1 W/m² leaves to the outside air
  let ti = 0;
  let qr = 1; // flow out of the wall towards the outside film, seen at the node's outer side
  let qi = 0;
  for (let k = 0; k < c.length; k++) {
    // flow from the inner side: what leaves plus what is stored, jωC·T
    qr += -omega * c[k] * ti;
    qi += omega * c[k] * tr;
    const r = k < g.length ? 1 / g[k] : insideFilmM2KPerW;
    tr += r * qr;
    ti += r * qi;
  }
  const inside = Math.hypot(tr, ti);
  return { y12: 1 / inside, y11: Math.hypot(qr, qi) / inside };
}
