import { describe, expect, test } from 'vitest';
import {
  type ConductionMesh,
  type Layer,
  layerCapacityJPerM2K,
  layerCells,
  layerResistanceM2KPerW,
  meshConstruction,
  temperatureInsideC,
} from '../../../engine/physics/conduction-mesh.ts';
import { wallDynamics } from '../../../engine/physics/wall-dynamics.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';
import { harmonicChain, marchChain } from './chain.ts';
import { caseLayers, solid } from './layers.ts';

const quarterHour = { kind: 'fine', stepS: 900 } as const;
const sum = (list: Iterable<number>) => [...list].reduce((a, b) => a + b, 0);
const walls = referenceCases('02a-wall-dynamics.json', /^iso13786-/);

describe('the chain keeps the construction', () => {
  const every: Layer[] = [
    { kind: 'resistance', resistanceM2KPerW: 0.04 },
    { kind: 'resistance', resistanceM2KPerW: 0.13 },
    solid(0.1025, 0.77, 1700, 840),
    { kind: 'resistance', resistanceM2KPerW: 0.18 },
    solid(1.003, 0.04, 0, 0), // no mass: a plain resistance
    solid(0.0006, 50, 7800, 450),
    solid(0.1, 0.025, 40, 1400),
  ];
  for (const spacing of [
    quarterHour,
    { kind: 'coarse', stepS: 900 },
    { kind: 'fine', stepS: 60, refine: 2 },
  ] as const) {
    for (const layers of [every, [...every].reverse(), ...walls.map(caseLayers)]) {
      test(`resistance and capacity to 1e-12, ${layers.length} layers, ${JSON.stringify(spacing)}`, () => {
        const mesh = meshConstruction(layers, spacing);
        const resistance = sum(layers.map(layerResistanceM2KPerW));
        const capacity = sum(layers.map(layerCapacityJPerM2K));
        const chain = sum(mesh.conductanceWPerM2K.map((g) => 1 / g));
        expect(Math.abs(chain / resistance - 1)).toBeLessThan(1e-12);
        expect(Math.abs(sum(mesh.capacityJPerM2K) / capacity - 1)).toBeLessThan(1e-12);
        expect(mesh.conductanceWPerM2K.length).toBe(mesh.capacityJPerM2K.length - 1);
        expect(mesh.nodeResistanceM2KPerW.at(-1)).toBeCloseTo(resistance, 12);
        expect(mesh.interfaceResistanceM2KPerW.at(-1)).toBeCloseTo(resistance, 12);
        expect(mesh.interfaceResistanceM2KPerW.length).toBe(layers.length + 1);
      });
    }
  }

  test('a construction without mass is two bare faces and one link', () => {
    const mesh = meshConstruction(every.slice(0, 2), quarterHour);
    expect([...mesh.capacityJPerM2K]).toEqual([0, 0]);
    expect(mesh.conductanceWPerM2K[0]).toBeCloseTo(1 / 0.17, 12);
  });

  test('a face is half a cell where its layer has mass, and bare where it has none', () => {
    const mesh = meshConstruction([every[1], solid(0.1, 1, 2000, 1000)], {
      kind: 'coarse',
      stepS: 1,
    });
    expect([...mesh.capacityJPerM2K]).toEqual([0, 1e5, 1e5]);
    expect([...mesh.nodeResistanceM2KPerW]).toEqual([0, 0.13, 0.23]);
  });

  test('refining multiplies the cells of every layer', () => {
    for (const layer of walls.flatMap(caseLayers)) {
      const cells = layerCells(layer, quarterHour);
      expect(layerCells(layer, { ...quarterHour, refine: 2 })).toBe(2 * cells);
    }
  });
});

// Closed form: ISO 13786 matrices. The mesh stands alone here: exact in time, cells as for 15 min.
describe('the chain answers sinusoids as the continuous wall', () => {
  const error = (one: ReferenceCase, spacing: Parameters<typeof meshConstruction>[1]) => {
    const layers = caseLayers(one);
    const periodS = inputNumber(one, 'period_h') * 3600;
    const [rsi, rse] = [inputNumber(one, 'Rsi'), inputNumber(one, 'Rse')];
    const exact = wallDynamics(layers, rsi, rse, periodS);
    const chain = harmonicChain(meshConstruction(layers, spacing), rsi, rse, periodS);
    return {
      through: Math.abs(chain.y12 - exact.periodicTransmittanceWPerM2K) / exact.uValueWPerM2K,
      inside: Math.abs(chain.y11 / exact.insideAdmittanceWPerM2K - 1),
    };
  };
  for (const one of walls) {
    test(`within 0.5 % of U through the wall and of its admittance: ${caseName(one)}`, () => {
      const found = error(one, quarterHour);
      expect(found.through).toBeLessThan(0.005);
      expect(found.inside).toBeLessThan(0.005);
    });
  }

  test('halving the cells quarters the error, as a second-order mesh must', () => {
    for (const one of walls.filter((w) => w.inputs.period_h === 24)) {
      const ratio = (key: 'through' | 'inside') =>
        error(one, { ...quarterHour, refine: 2 })[key] /
        error(one, { ...quarterHour, refine: 4 })[key];
      expect(Math.abs(ratio('inside') - 4), one.id).toBeLessThan(0.1);
      expect(Math.abs(ratio('through') - 4), one.id).toBeLessThan(0.1);
    }
  });

  test('one cell a layer errs by less than 7 % of U through the wall over a day', () => {
    for (const one of walls.filter((w) => w.inputs.period_h === 24))
      expect(error(one, { kind: 'coarse', stepS: 900 }).through, one.id).toBeLessThan(0.07);
  });
});

describe('the chain answers a step as the continuous wall', () => {
  for (const one of referenceCases('02a-wall-dynamics.json', /^step-/)) {
    test(`${caseName(one)}, cells and step of 15 min`, () => {
      const mesh = meshConstruction(caseLayers(one), quarterHour);
      const [hi, he] = [1 / inputNumber(one, 'Rsi'), 1 / inputNumber(one, 'Rse')];
      const times = inputNumbers(one, 'times_h').map((h) => h * 3600);
      const march = (outC: number, inC: number) =>
        marchChain(
          mesh,
          { filmWPerM2K: he, tempC: outC },
          { filmWPerM2K: hi, tempC: inC },
          0,
          900,
          times,
        ).map((t) => hi * (t[t.length - 1] - inC));
      const resistance = 1 / hi + 1 / he + sum(mesh.conductanceWPerM2K.map((g) => 1 / g));
      expectCase(one, {
        q_in_outside_step: march(1, 0),
        q_in_inside_step: march(0, 1).map((q) => -q),
        U_value: 1 / resistance,
      });
    });
  }
});

/** Temperatures at depths from the outside face of one homogeneous layer. */
function atDepths(mesh: ConductionMesh, tempC: Float64Array, depthsM: number[], lambda: number) {
  return depthsM.map((x) => temperatureInsideC(mesh, tempC, x / lambda));
}

// Fourier series, error functions: Carslaw & Jaeger forms, as named by each case.
describe('a slab and a half space follow the closed forms of transient conduction', () => {
  // First root and coefficient of the series are the slowest mode of the chain: its decay and its
  // share in an even start. 960 cells, as the cases ask for 1e-6.
  const slowestMode = (biot: number) => {
    const finest = { kind: 'fine', stepS: 1e-9, refine: 40 } as const;
    const mesh = meshConstruction([solid(1, 1, 1, 1)], finest);
    const outside = { filmWPerM2K: biot, tempC: 0 };
    const middle = { filmWPerM2K: 0, tempC: 0 };
    const [mode] = marchChain(mesh, outside, middle, 1, 0.01, [4]);
    const g = mesh.conductanceWPerM2K;
    const stored = (f: (v: number) => number) =>
      sum(mode.map((v, i) => f(v) * mesh.capacityJPerM2K[i]));
    const lost = biot * mode[0] ** 2 + sum(g.map((c, i) => c * (mode[i + 1] - mode[i]) ** 2));
    const top = mode[mode.length - 1];
    return {
      zeta1: Math.sqrt(lost / stored((v) => v * v)), // Rayleigh quotient
      C1: (top * stored((v) => v)) / stored((v) => v * v),
    };
  };
  for (const one of referenceCases('02b-transient-conduction.json', /^plane-wall-table/)) {
    test(caseName(one), () => {
      const modes = inputNumbers(one, 'Bi').map(slowestMode);
      expectCase(one, { zeta1: modes.map((m) => m.zeta1), C1: modes.map((m) => m.C1) });
    });
  }
  for (const one of referenceCases('02b-transient-conduction.json', /^plane-wall-Bi/)) {
    test(caseName(one), () => {
      // L 1 m, λ 1 W/(m·K), ρc 1 J/(m³·K): seconds are Fourier numbers. Half wall, middle inside.
      const mesh = meshConstruction([solid(1, 1, 1, 1)], { kind: 'fine', stepS: 1e-9 });
      const outside = { filmWPerM2K: inputNumber(one, 'Bi'), tempC: 0 };
      const middle = { filmWPerM2K: 0, tempC: 0 };
      const rows = marchChain(mesh, outside, middle, 1, 0.002, inputNumbers(one, 'Fo'));
      const depths = inputNumbers(one, 'x_over_L').map((x) => 1 - x);
      expectCase(one, {
        theta: rows.map((t) => atDepths(mesh, t, depths, 1)),
        Q_ratio: rows.map((t) => 1 - sum(t.map((v, i) => v * mesh.capacityJPerM2K[i]))),
        ...slowestMode(inputNumber(one, 'Bi')),
      });
    });
  }
  for (const one of referenceCases('02b-transient-conduction.json', /^plane-wall-dimensional/)) {
    test(caseName(one), () => {
      const [half, lambda, rho, c] = ['half_thickness', 'lambda', 'rho', 'c'].map((key) =>
        inputNumber(one, key),
      );
      const mesh = meshConstruction([solid(half, lambda, rho, c)], { kind: 'fine', stepS: 60 });
      const start = inputNumber(one, 'T_start');
      const rows = marchChain(
        mesh,
        { filmWPerM2K: inputNumber(one, 'h'), tempC: inputNumber(one, 'T_inf') },
        { filmWPerM2K: 0, tempC: 0 },
        start,
        60,
        inputNumbers(one, 'times_h').map((h) => h * 3600),
      );
      expectCase(one, {
        T_mid: rows.map((t) => t[t.length - 1]),
        T_surface: rows.map((t) => t[0]),
        heat_lost: rows.map(
          (t) => sum(t.map((v, i) => (start - v) * mesh.capacityJPerM2K[i])) / 1e3,
        ),
      });
    });
  }
  for (const one of referenceCases('02b-transient-conduction.json', /^slab-surface-step/)) {
    test(caseName(one), () => {
      const [d, lambda, rho, c] = ['thickness', 'lambda', 'rho', 'c'].map((k) =>
        inputNumber(one, k),
      );
      const mesh = meshConstruction([solid(d, lambda, rho, c)], { kind: 'fine', stepS: 10 });
      const rows = marchChain(
        mesh,
        { filmWPerM2K: 1e9, tempC: 1 }, // a held face
        { filmWPerM2K: 1e9, tempC: 0 },
        0,
        10,
        inputNumbers(one, 'times_h').map((h) => h * 3600),
      );
      const last = mesh.conductanceWPerM2K.length - 1;
      const g = mesh.conductanceWPerM2K[last];
      expectCase(one, {
        T: rows.map((t) => atDepths(mesh, t, inputNumbers(one, 'x'), lambda)),
        q_out: rows.map((t) => g * (t[last] - t[last + 1])),
      });
    });
  }
  for (const one of referenceCases('02b-transient-conduction.json', /^semi-inf-/)) {
    test(caseName(one), () => {
      const [lambda, rho, c] = ['lambda', 'rho', 'c'].map((key) => inputNumber(one, key));
      const times = inputNumbers(one, 'times_h').map((h) => h * 3600);
      // Deep enough that the far side stays at rest: 6·√(αt). Fine near the face, coarser below.
      const deep = 6 * Math.sqrt((lambda / (rho * c)) * times[times.length - 1]);
      const cuts = [0, 0.03, 0.1, 0.3, 0.6, 1.2, deep].filter((x) => x <= deep);
      const layers = cuts.slice(1).map((x, i) => solid(x - cuts[i], lambda, rho, c));
      const mesh = meshConstruction(layers, { kind: 'fine', stepS: 10 });
      const flux = 'q0' in one.inputs ? inputNumber(one, 'q0') : 0;
      const held = 'T_surface' in one.inputs;
      const film = held ? 1e9 : flux ? 0 : inputNumber(one, 'h');
      const airC = held ? inputNumber(one, 'T_surface') : flux ? 0 : inputNumber(one, 'T_inf');
      const start = inputNumber(one, 'T_start');
      const outside = { filmWPerM2K: film, tempC: airC, fluxWPerM2: flux };
      const inside = { filmWPerM2K: 0, tempC: 0 };
      const rows = marchChain(mesh, outside, inside, start, 120, times);
      const stored = (t: Float64Array) =>
        sum(t.map((v, i) => (v - start) * mesh.capacityJPerM2K[i]));
      const g = mesh.conductanceWPerM2K[0];
      expectCase(one, {
        T: rows.map((t) => atDepths(mesh, t, inputNumbers(one, 'x'), lambda)),
        ...(flux
          ? {}
          : { q_surface: rows.map((t) => (held ? g * (t[0] - t[1]) : film * (airC - t[0]))) }),
        ...(held ? { heat_in: rows.map((t) => stored(t) / 1000) } : {}),
      });
    });
  }
});
