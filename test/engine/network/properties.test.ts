// Laws that hold for any network: conservation, the maximum principle, elimination as exact as the full
// system, steady states as ends of marches, L-stability, order, determinism, no allocation in a step.

import fc from 'fast-check';
import { Matrix, solve } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import {
  denseNetwork,
  type LinkGroup,
  march,
  marchSteps,
  type Network,
  type Problem,
  steadyState,
} from '../../../engine/network/index.ts';
import {
  constant,
  constantLinks,
  directedLinks,
  held,
  network,
  problem,
  sourceRows,
  straight,
  tight,
  usual,
} from './problems.ts';

/** Numbers that a test draws one after another. */
const numbers = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), {
  minLength: 97,
  maxLength: 97,
});

/** A random connected network: a tree with extra links, chains, loops, massless nodes, two boundaries. */
function randomNetwork(values: readonly number[], kinds: 'constant' | 'all') {
  let next = 0;
  const draw = (low = 0, high = 1) => low + (high - low) * values[next++ % values.length];
  const n = 3 + Math.floor(draw(0, 18));
  const caps = Array.from({ length: n }, () => (draw() < 0.3 ? 0 : 10 ** draw(3, 7)));
  const links: number[][] = [];
  for (let i = 1; i < n; i++) {
    const back = draw() < 0.6 ? i - 1 : Math.floor(draw(0, i - 1e-9));
    links.push([back, i, 10 ** draw(-1, 3)]);
  }
  for (let k = 0; k < n / 4; k++) {
    const a = Math.floor(draw(0, n - 1e-9));
    const b = Math.floor(draw(0, n - 1e-9));
    if (a !== b) links.push([a, b, 10 ** draw(-1, 3)]);
  }
  links.push([n, Math.floor(draw(0, n - 1e-9)), 10 ** draw(0, 2)]);
  links.push([n + 1, Math.floor(draw(0, n - 1e-9)), 10 ** draw(0, 2)]);
  const groups: LinkGroup[] = [constantLinks(links)];
  const flows: number[][] = [];
  const sources: number[][] = [];
  if (kinds === 'all') {
    const node = () => Math.floor(draw(0, n - 1e-9));
    const some = Array.from({ length: 3 }, () => [node(), draw() < 0.3 ? n : node()]).filter(
      ([a, b]) => a !== b,
    );
    const from = Int32Array.from(some, (l) => l[0]);
    const to = Int32Array.from(some, (l) => l[1]);
    const fill = (low: number, high: number) => Float64Array.from(some, () => draw(low, high));
    groups.push(
      {
        law: 'scaled',
        from,
        to,
        conductanceWPerK: fill(0, 50),
        series: Int32Array.from(some, () => 2),
      },
      {
        law: 'buoyant',
        from,
        to,
        warmerFrom: fill(0, 30),
        coolerFrom: fill(0, 30),
        exponent: [1 / 3, 1 / 4, 1, 0.31][Math.floor(draw(0, 3.999))],
        softeningK2: draw() < 0.5 ? 0 : 0.01,
        baseSeries: Int32Array.from(some, () => (draw() < 0.5 ? -1 : 2)),
        baseWPerK: fill(0, 10),
      },
      {
        law: 'mixed-film',
        from,
        to,
        areaM2: fill(0, 20),
        warmerFrom: fill(1, 2),
        coolerFrom: fill(0.5, 1.5),
        exponent: 1 / 3,
        forcedSeries: Int32Array.from(some, () => 2),
        roughness: fill(1, 2),
      },
      { law: 'radiant', from, to, exchangeAreaM2: fill(0, 20) },
      {
        law: 'function',
        from,
        to,
        conductanceWPerK: (k, a, b) => (k + 1) * (1 + 0.1 * Math.abs(a - b)),
      },
    );
    const [a, b, c] = [node(), node(), node()];
    const rate = draw(0, 60);
    if (a !== b && b !== c && c !== a) flows.push([a, b, rate], [b, c, rate], [c, a, rate]);
    flows.push([n, a, rate, 2], [a, n, rate, 2]);
    sources.push([b, draw(-50, 100), 2], [c, draw(0, 30), 2]);
  }
  const net = network(
    [...caps, 0, 0],
    { [n]: 0, [n + 1]: 1 },
    {
      links: groups,
      directed: directedLinks(flows),
      sources: sourceRows(sources),
    },
  );
  return { net, n, draw };
}

const drivers = (steps: number, draw: (a: number, b: number) => number) => [
  held(
    'cold',
    Array.from({ length: steps }, () => draw(-10, 10)),
  ),
  held(
    'warm',
    Array.from({ length: steps }, () => draw(15, 40)),
  ),
  held(
    'scale',
    Array.from({ length: steps }, () => draw(0, 4)),
  ),
];

/** One step of the method by dense algebra on the whole network, for constant links. */
function denseStep(p: Problem): Float64Array {
  const { network: net, series, stepS } = p;
  const gamma = 1 - Math.SQRT1_2;
  const now = Float64Array.from(series, (s) => s.values[0]);
  const dense = denseNetwork(net, new Float64Array(net.nodeNames.length), now, 0);
  const m = dense.nodes.length;
  const known = new Float64Array(m);
  const place = new Map([...dense.nodes].map((v, r) => [v, r]));
  for (const group of net.links) {
    if (group.law !== 'constant') continue;
    group.from.forEach((a, k) => {
      const b = group.to[k];
      const ends = [
        [a, b],
        [b, a],
      ];
      for (const [inside, outside] of ends) {
        const s = net.boundarySeries[outside];
        const row = place.get(inside);
        if (s >= 0 && row !== undefined) known[row] += group.conductanceWPerK[k] * now[s];
      }
    });
  }
  const c = dense.capacityJPerK.map((v) => v / (gamma * stepS));
  const system = Matrix.add(dense.conductanceWPerK, Matrix.diag([...c]));
  if (p.start.kind !== 'temperatures') throw new Error('needs a fixed start');
  const { tempC } = p.start;
  const start = Float64Array.from(dense.nodes, (v) => tempC[v]);
  const stage = (from: Float64Array) =>
    Float64Array.from(
      solve(system, Matrix.columnVector(from.map((t, i) => c[i] * t + known[i]))).getColumn(0),
    );
  const first = stage(start);
  const carry = (1 - gamma) / gamma;
  return stage(start.map((t, i) => t + carry * (first[i] - t)));
}

describe('any network', () => {
  test('elimination of chains gives the full system’s temperatures', () => {
    fc.assert(
      fc.property(numbers, fc.constantFrom(1, 60, 900, 3600), (values, stepS) => {
        const { net, n, draw } = randomNetwork(values, 'constant');
        const start = Float64Array.from(net.nodeNames, () => draw(0, 30));
        const p = problem(net, drivers(1, draw), stepS, 1, start);
        const want = denseStep(p);
        const got = march(p, tight).finalC;
        for (let i = 0; i < n; i++) expect(Math.abs(got[i] - want[i])).toBeLessThan(1e-8);
      }),
      { numRuns: 200, seed: 5 },
    );
  });

  test('heat is conserved in every step, by every law, at every step length', () => {
    fc.assert(
      fc.property(numbers, fc.constantFrom(1, 60, 900, 3600), (values, stepS) => {
        const { net, draw } = randomNetwork(values, 'all');
        const start = Float64Array.from(net.nodeNames, () => draw(0, 30));
        const run = march(problem(net, drivers(20, draw), stepS, 20, start), usual);
        expect(run.outcome.kind).toBe('finished');
        expect(run.quality.unconvergedSteps).toBe(0);
        expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
      }),
      { numRuns: 200, seed: 6 },
    );
  });

  test('meters at a node add up to its storage', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        const { net, n, draw } = randomNetwork(values, 'all');
        const meters = Array.from({ length: n }, (_, node) => ({
          name: `balance ${node}`,
          terms: [
            ...net.links.flatMap((group, g) =>
              [...group.from].flatMap((from, index) => {
                const of = { kind: 'link', group: g, index } as const;
                if (from === node) return [{ sign: -1, of }];
                return group.to[index] === node ? [{ sign: 1, of }] : [];
              }),
            ),
            ...[...net.directed.to].flatMap((to, index) =>
              to === node ? [{ sign: 1, of: { kind: 'directed', index } as const }] : [],
            ),
            ...[...net.sources.node].flatMap((at, index) =>
              at === node ? [{ sign: 1, of: { kind: 'source', index } as const }] : [],
            ),
            { sign: -1, of: { kind: 'storage', node } as const },
          ],
        }));
        const start = Float64Array.from(net.nodeNames, () => draw(0, 30));
        const p = problem(net, drivers(12, draw), 900, 12, start, { meters, stepsPerRecord: 4 });
        const run = march(p, usual);
        // Flows of up to 1e5 W at the stiffest node, in doubles.
        for (const w of run.meterW) expect(Math.abs(w)).toBeLessThan(1e-6);
        expect(run.meterW.length).toBe(3 * n);
      }),
      { numRuns: 60, seed: 7 },
    );
  });

  test('a march under constant drivers ends in the steady state', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        const { net, n, draw } = randomNetwork(values, 'all');
        const series = drivers(1, draw).map((s) => held(s.name, new Array(300).fill(s.values[0])));
        // The year-long step forgets any start: L-stability at work.
        const p = problem(net, series, 1e9, 300, new Float64Array(n + 2).fill(20));
        const steady = steadyState(p, { kind: 'step', step: 0 }, tight);
        const run = march(p, tight);
        expect(steady.converged).toBe(true);
        for (let i = 0; i < n; i++)
          expect(Math.abs(run.finalC[i] - steady.tempC[i])).toBeLessThan(1e-5);
      }),
      { numRuns: 60, seed: 8 },
    );
  });

  test('steady temperatures lie between those of the boundaries', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        const { net, n, draw } = randomNetwork(values, 'all');
        const idle: Network = { ...net, sources: sourceRows([]) };
        const series = drivers(1, draw);
        const { tempC } = steadyState(
          problem(idle, series, 900, 1, []),
          { kind: 'step', step: 0 },
          tight,
        );
        const low = Math.min(series[0].values[0], series[1].values[0]);
        const high = Math.max(series[0].values[0], series[1].values[0]);
        for (let i = 0; i < n; i++) {
          expect(tempC[i]).toBeGreaterThan(low - 1e-7);
          expect(tempC[i]).toBeLessThan(high + 1e-7);
        }
      }),
      { numRuns: 100, seed: 9 },
    );
  });
});

describe('the time integration', () => {
  // Air with a time constant of 20 s, a wall's face of minutes, a mass of days.
  const stiff = (stepS: number, steps: number, drive: (t: number) => number) =>
    problem(
      network(
        [1e3, 5e4, 2e7, 0],
        { 3: 0 },
        {
          links: [
            constantLinks([
              [0, 1, 50],
              [1, 2, 80],
              [0, 3, 10],
            ]),
          ],
        },
      ),
      [straight('out', stepS, steps, drive)],
      stepS,
      steps,
      [25, 15, 20, 0],
    );

  test.each([1, 10, 60, 600, 3600])(
    'at steps of %i s nothing overshoots the drivers after a jump',
    (stepS) => {
      const run = march(
        stiff(stepS, 200, () => 0),
        tight,
      );
      for (const t of run.endC) {
        expect(t).toBeGreaterThan(-1e-9);
        expect(t).toBeLessThan(25);
      }
      expect(run.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    },
  );

  test('the error falls fourfold with half the step under a smooth driver', () => {
    const wave = (t: number) => 10 * Math.sin((2 * Math.PI * t) / 7200);
    const end = (stepS: number) => march(stiff(stepS, 14400 / stepS, wave), tight).finalC[0];
    const exact = end(0.5);
    const [a, b, c] = [end(8) - exact, end(4) - exact, end(2) - exact];
    expect(a / b).toBeGreaterThan(3.5);
    expect(b / c).toBeGreaterThan(3.5);
  });

  test('the same problem gives the same bytes', () => {
    const p = stiff(60, 300, (t) => Math.sin(t / 500));
    expect(march(p, usual).endC).toEqual(march(p, usual).endC);
  });

  test('a stop keeps what was computed and says where', () => {
    const p = stiff(60, 1000, () => 0);
    let calls = 0;
    const run = march(p, usual, () => ++calls < 3);
    expect(run.outcome).toEqual({ kind: 'stopped', atStep: 400 });
    expect(run.records).toBe(400);
    expect(run.endC.subarray(0, 1600)).toEqual(march(p, usual).endC.subarray(0, 1600));
  });

  test('the generator tells its progress', () => {
    const steps = marchSteps(
      stiff(60, 450, () => 0),
      usual,
    );
    const seen: number[] = [];
    let turn = steps.next();
    while (!turn.done) {
      seen.push(turn.value.step);
      turn = steps.next();
    }
    expect(seen).toEqual([0, 200, 400]);
    expect(turn.value.outcome.kind).toBe('finished');
  });

  test('a law that yields no number ends the march at its node', () => {
    const net = network(
      [1e5, 1e5, 0],
      { 2: 0 },
      {
        links: [
          constantLinks([[1, 2, 5]]),
          {
            law: 'function',
            from: Int32Array.of(0),
            to: Int32Array.of(1),
            conductanceWPerK: (_k, _a, _b, step) => (step === 3 ? Number.NaN : 10),
          },
        ],
      },
    );
    const run = march(problem(net, [constant('out', 0, 9)], 900, 9, [20, 20, 0]), usual);
    expect(run.outcome.kind).toBe('diverged');
    if (run.outcome.kind === 'diverged') {
      expect(run.outcome.atStep).toBe(3);
      expect(['n0', 'n1']).toContain(run.outcome.node);
    }
    expect(run.records).toBe(3);
  });

  test('steps that run out of iterations are counted', () => {
    const net = network(
      [1e3, 0],
      { 1: 0 },
      {
        links: [
          {
            law: 'radiant',
            from: Int32Array.of(0),
            to: Int32Array.of(1),
            exchangeAreaM2: Float64Array.of(50),
          },
        ],
      },
    );
    const p = problem(net, [constant('out', 0, 5)], 3600, 5, [400, 0]);
    expect(
      march(p, { toleranceK: 1e-9, maxIterations: 2 }).quality.unconvergedSteps,
    ).toBeGreaterThan(0);
    expect(march(p, tight).quality.unconvergedSteps).toBe(0);
  });

  test('a step allocates nothing: ten thousand more steps leave the heap where it was', () => {
    // Two problems that differ in steps only; what they allocate besides steps is the series and the
    // records (none here). Collected before and after, the difference per step stays below a byte or so.
    const usedBy = (steps: number) => {
      const draw = (a: number, b: number) => (a + b) / 2;
      const { net } = randomNetwork(
        Array.from({ length: 97 }, (_, i) => ((i * 37) % 97) / 97),
        'all',
      );
      const series = drivers(steps, draw);
      const p = problem(net, series, 900, steps, new Float64Array(net.nodeNames.length).fill(20), {
        stepsPerRecord: steps,
      });
      const march1 = marchSteps(p, usual);
      march1.next(); // set-up is done once the first step is due
      const before = process.memoryUsage().heapUsed;
      let turn = march1.next();
      while (!turn.done) turn = march1.next();
      return process.memoryUsage().heapUsed - before;
    };
    usedBy(2000); // warm
    const least = Math.min(...Array.from({ length: 5 }, () => usedBy(10_200)));
    // Boxed numbers of unoptimised code and the 50 progress objects; one array a step would be 1 MB.
    expect(least).toBeLessThan(400_000);
  });
});
