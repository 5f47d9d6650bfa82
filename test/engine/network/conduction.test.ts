// Transient conduction against Fourier series and error functions: test/reference/02b-transient-
// conduction.json. A wall is a chain of nodes; mesh and step are stated with each claim, and the error
// has to fall as both are refined.

import { describe, expect, test } from 'vitest';
import { type Meter, march, steadyState, timeConstantsS } from '../../../engine/network/index.ts';
import {
  constant,
  constantLinks,
  network,
  problem,
  sourceRows,
  straight,
  tight,
} from './problems.ts';
import { cases, largestGap, meetsCase } from './reference.ts';
import { addNode, addWall, type Draft } from './walls.ts';

const file = '02b-transient-conduction.json';

interface Slab {
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly thicknessM: number;
  readonly slices: number;
  readonly startC: number;
  /** Film and air at the first face [W/(m²K), °C]; a film of Infinity holds the face itself. */
  readonly film: number;
  readonly airC: number;
  /** Temperature of the far face; null for an adiabatic one. */
  readonly farC: number | null;
  readonly fluxWPerM2?: number;
}

/**
 * End temperatures at nodes `at` of the slab after each of `times` [s], and the heat that entered
 * through the film by then.
 */
function conduct(slab: Slab, stepS: number, times: readonly number[], at: readonly number[]) {
  const draft: Draft = { capacities: [], links: [] };
  const layer = { d: slab.thicknessM, lambda: slab.lambda, rho: slab.rho, c: slab.c };
  const nodes = addWall(draft, [layer], 1, slab.slices);
  const steps = Math.round(Math.max(...times) / stepS);
  const series = [
    constant('air', slab.airC, steps),
    constant('far', slab.farC ?? 0, steps),
    constant('flux', slab.fluxWPerM2 ?? 0, steps),
  ];
  const boundaries: Record<number, number> = {};
  const filmLink = draft.links.length;
  if (slab.film === Infinity) boundaries[nodes[0]] = 0;
  else {
    const air = addNode(draft, 0);
    boundaries[air] = 0;
    draft.links.push([air, nodes[0], slab.film]);
  }
  if (slab.farC !== null) boundaries[nodes[nodes.length - 1]] = 1;
  const net = network(draft.capacities, boundaries, {
    links: [constantLinks(draft.links)],
    sources: sourceRows([[nodes[0], 1, 2]]),
  });
  const meter: Meter = {
    name: 'into the face',
    terms:
      slab.film === Infinity ? [] : [{ sign: 1, of: { kind: 'link', group: 0, index: filmLink } }],
  };
  const start = draft.capacities.map(() => slab.startC);
  const run = march(
    problem(net, series, stepS, steps, start, {
      recordNodes: Int32Array.from(at, (k) => nodes[k]),
      meters: [meter],
    }),
    tight,
  );
  expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  const n = at.length;
  return times.map((t) => {
    const k = Math.round(t / stepS);
    let inJ = 0;
    for (let i = 0; i < k; i++) inJ += run.meterW[i] * stepS;
    return { tempC: run.endC.subarray((k - 1) * n, k * n), inJPerM2: inJ };
  });
}

interface PlaneWall {
  readonly Bi: number;
  readonly Fo: number[];
  readonly x_over_L: number[];
}

describe.each(
  cases<PlaneWall, { theta: number[][]; Q_ratio: number[] }>(file, (id) =>
    /^plane-wall-Bi/.test(id),
  ),
)('$id', ({ inputs, expected }) => {
  // Unit slab: L = λ = ρc = 1, so Fo is the time; the mid plane is adiabatic.
  const error = (slices: number, step: number) => {
    const at = conduct(
      {
        lambda: 1,
        rho: 1,
        c: 1,
        thicknessM: 1,
        slices,
        startC: 1,
        film: inputs.Bi,
        airC: 0,
        farC: null,
      },
      step,
      inputs.Fo,
      inputs.x_over_L.map((x) => Math.round((1 - x) * slices)),
    );
    return at.map(({ tempC, inJPerM2 }, row) => {
      return Math.max(
        largestGap(tempC, expected.theta[row]),
        Math.abs(-inJPerM2 - expected.Q_ratio[row]),
      );
    });
  };

  test('temperatures and heat are the series’, within 0.005 at 20 slices', () => {
    expect(Math.max(...error(20, 0.0025))).toBeLessThan(0.005);
  });

  test('the error falls threefold or more with half the slice and half the step', () => {
    const ratio = Math.max(...error(10, 0.005)) / Math.max(...error(20, 0.0025));
    expect(ratio).toBeGreaterThan(3);
  });
});

interface Dimensional {
  readonly half_thickness: number;
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly h: number;
  readonly T_start: number;
  readonly T_inf: number;
  readonly times_h: number[];
}

test.each(
  cases<Dimensional, { T_mid: number[]; T_surface: number[]; heat_lost: number[] }>(file, (id) =>
    id.startsWith('plane-wall-dimensional'),
  ),
)('$id: mid, surface and heat lost with 20 slices and 5 min steps', ({ inputs: i, expected }) => {
  const at = conduct(
    {
      ...i,
      thicknessM: i.half_thickness,
      slices: 20,
      startC: i.T_start,
      film: i.h,
      airC: i.T_inf,
      farC: null,
    },
    300,
    i.times_h.map((h) => h * 3600),
    [20, 0],
  );
  at.forEach(({ tempC, inJPerM2 }, k) => {
    expect(Math.abs(tempC[0] - expected.T_mid[k])).toBeLessThan(0.1);
    expect(Math.abs(tempC[1] - expected.T_surface[k])).toBeLessThan(0.1);
    expect(Math.abs(-inJPerM2 / 1000 / expected.heat_lost[k] - 1)).toBeLessThan(0.005);
  });
});

interface Step {
  readonly thickness: number;
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly x: number[];
  readonly times_h: number[];
}

test.each(cases<Step, { T: number[][] }>(file, (id) => id.startsWith('slab-surface-step')))(
  '$id: a stepped face, within 0.01 at 40 slices and 15 s steps',
  ({ inputs: i, expected }) => {
    const at = conduct(
      { ...i, thicknessM: i.thickness, slices: 40, startC: 0, film: Infinity, airC: 1, farC: 0 },
      15,
      i.times_h.map((h) => h * 3600),
      i.x.map((x) => Math.round((x / i.thickness) * 40)),
    );
    at.forEach(({ tempC }, k) => {
      expect(largestGap(tempC, expected.T[k])).toBeLessThan(0.01);
    });
  },
);

interface Deep {
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly T_start: number;
  readonly T_surface?: number;
  readonly T_inf?: number;
  readonly h?: number;
  readonly q0?: number;
  readonly x: number[];
  readonly times_h: number[];
}

test.each(cases<Deep, { T: number[][] }>(file, (id) => id.startsWith('semi-inf')))(
  '$id: a deep solid, within 0.05 K at 5 mm and 5 min',
  ({ inputs: i, expected }) => {
    // Deep enough that the far end does not feel it: five diffusion lengths at the last time.
    const lastS = Math.max(...i.times_h) * 3600;
    const dx = 0.005;
    const slices = Math.ceil((5 * Math.sqrt((i.lambda / i.rho / i.c) * lastS)) / dx);
    const film = i.q0 !== undefined ? 0 : (i.h ?? Infinity);
    const at = conduct(
      {
        ...i,
        thicknessM: slices * dx,
        slices,
        startC: i.T_start,
        film,
        airC: i.T_inf ?? i.T_surface ?? i.T_start,
        farC: i.T_start,
        fluxWPerM2: i.q0 ?? 0,
      },
      300,
      i.times_h.map((h) => h * 3600),
      i.x.map((x) => Math.round(x / dx)),
    );
    at.forEach(({ tempC }, k) => {
      expect(largestGap(tempC, expected.T[k])).toBeLessThan(0.05);
    });
  },
);

interface Periodic {
  readonly lambda: number;
  readonly rho: number;
  readonly c: number;
  readonly period_h: number;
  readonly x: number[];
  readonly h: number;
}

test.each(
  cases<
    Periodic,
    { amplitude_ratio: number[]; lag_h: number[]; surface_ratio: number; surface_lag_h: number }
  >(file, (id) => id.startsWith('periodic-semi-inf')),
)(
  '$id: a harmonic dies away and lags with depth as the closed form says',
  ({ inputs: i, expected }) => {
    const depthM = Math.sqrt((i.lambda * i.period_h * 3600) / (Math.PI * i.rho * i.c));
    // Ten damping depths (e⁻¹⁰ left), with a slice on every depth asked for: 0.01 m or finer.
    const dx =
      Math.min(0.01, depthM / 25) > 0.008
        ? 0.01
        : Math.min(0.01, depthM / 25) > 0.004
          ? 0.005
          : 0.0025;
    const slices = Math.ceil((10 * depthM) / dx);
    const draft: Draft = { capacities: [], links: [] };
    const nodes = addWall(
      draft,
      [{ d: slices * dx, lambda: i.lambda, rho: i.rho, c: i.c }],
      1,
      slices,
    );
    const air = addNode(draft, 0);
    draft.links.push([air, nodes[0], i.h]);
    const perPeriod = 288;
    const stepS = (i.period_h * 3600) / perPeriod;
    const angle = (s: number) => (2 * Math.PI * s) / perPeriod;
    const series = [
      straight('air', stepS, perPeriod, (t) => Math.cos((2 * Math.PI * t) / (i.period_h * 3600))),
    ];
    const net = network(draft.capacities, { [air]: 0 }, { links: [constantLinks(draft.links)] });
    const run = march(
      problem(net, series, stepS, perPeriod, [], {
        recordNodes: Int32Array.from(nodes),
        start: { kind: 'periodic', spanSteps: perPeriod, toleranceK: 1e-6, maxPasses: 200 },
      }),
      tight,
    );
    const wave = (node: number) => {
      let cos = 0;
      let sin = 0;
      for (let s = 0; s < perPeriod; s++) {
        const t = run.endC[s * nodes.length + node];
        cos += t * Math.cos(angle(s + 1));
        sin += t * Math.sin(angle(s + 1));
      }
      return { amplitude: (2 * Math.hypot(cos, sin)) / perPeriod, lag: Math.atan2(sin, cos) };
    };
    const surface = wave(0);
    const hours = (lag: number) => ((lag / (2 * Math.PI)) * i.period_h + i.period_h) % i.period_h;
    // 25 slices a damping depth: the mesh costs up to (dx/depth)²/6 a damping depth, 0.1 %.
    expect(Math.abs(surface.amplitude / expected.surface_ratio - 1)).toBeLessThan(0.005);
    expect(Math.abs(hours(surface.lag) - expected.surface_lag_h)).toBeLessThan(0.005 * i.period_h);
    i.x.forEach((x, k) => {
      const there = wave(Math.round(x / dx));
      if (expected.amplitude_ratio[k] < 1e-3) return; // less than the far end's own disturbance
      expect(
        Math.abs(there.amplitude / surface.amplitude / expected.amplitude_ratio[k] - 1),
      ).toBeLessThan(0.02);
      const gap = Math.abs(hours(there.lag - surface.lag) - (expected.lag_h[k] % i.period_h));
      expect(Math.min(gap, i.period_h - gap)).toBeLessThan(0.005 * i.period_h);
    });
  },
);

interface Lumped {
  readonly C: number;
  readonly H: number;
  readonly T0: number;
  readonly T_out: number;
  readonly gain: number;
  readonly ramp?: number;
  readonly times_h: number[];
}

test.each(cases<Lumped, { T: number[] }>(file, (id) => /^lumped-(step|ramp)/.test(id)))(
  '$id: one capacity follows the exponential within 0.001 K at 1 min',
  ({ id, inputs: i }) => {
    const steps = Math.max(...i.times_h) * 60;
    const series = [
      straight('out', 60, steps, (t) => i.T_out + ((i.ramp ?? 0) * t) / 3600),
      constant('gain', i.gain, steps),
    ];
    const net = network(
      [i.C, 0],
      { 1: 0 },
      {
        links: [constantLinks([[1, 0, i.H]])],
        sources: sourceRows([[0, 1, 1]]),
      },
    );
    const p = problem(net, series, 60, steps, [i.T0, 0]);
    const run = march(p, tight);
    const T = i.times_h.map((h) => run.endC[(h * 60 - 1) * 2]);
    if (i.ramp !== undefined) return meetsCase(file, id, { T });
    const [tauS] = timeConstantsS(p, new Float64Array(2), 0);
    const [T_end] = steadyState(p, { kind: 'step', step: 0 }, tight).tempC;
    return meetsCase(file, id, { T, tau_h: tauS / 3600, T_end });
  },
);

interface Swung {
  readonly C: number;
  readonly H: number;
  readonly mean: number;
  readonly amplitude: number;
  readonly period_h: number;
  readonly gain: number;
}

test.each(cases<Swung, object>(file, (id) => /^lumped-periodic/.test(id)))(
  '$id: one capacity swings behind the outside as the phasor has it, at 2 min',
  ({ id, inputs: i }) => {
    const stepS = 120;
    const steps = (i.period_h * 3600) / stepS;
    const angle = (s: number) => (2 * Math.PI * s) / steps;
    const series = [
      straight('out', stepS, steps, (t) => i.mean + i.amplitude * Math.cos(angle(t / stepS))),
      constant('gain', i.gain, steps),
    ];
    const net = network(
      [i.C, 0],
      { 1: 0 },
      { links: [constantLinks([[1, 0, i.H]])], sources: sourceRows([[0, 1, 1]]) },
    );
    const run = march(
      problem(net, series, stepS, steps, [], {
        start: { kind: 'periodic', spanSteps: steps, toleranceK: 1e-6, maxPasses: 200 },
      }),
      tight,
    );
    let [mean, cos, sin] = [0, 0, 0];
    for (let s = 0; s < steps; s++) {
      const tempC = run.endC[s * 2];
      mean += tempC / steps;
      cos += (2 * tempC * Math.cos(angle(s + 1))) / steps;
      sin += (2 * tempC * Math.sin(angle(s + 1))) / steps;
    }
    meetsCase(file, id, {
      T_amplitude: Math.hypot(cos, sin),
      T_lag_h: (Math.atan2(sin, cos) / (2 * Math.PI)) * i.period_h,
      T_end: mean,
    });
  },
);
