// Films, air layers, layered elements and thermal bridges against 03-steady-u-values.json.
import { describe, expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  inputText,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';
import { type CaseLayer, caseParts, caseResistance, inputAs } from './case-inputs.ts';

const file = '03-steady-u-values.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

const flowOf = (one: ReferenceCase) => inputText(one, 'direction') as physics.HeatFlow;

describe('surface resistances', () => {
  each(/^film-inside-/, (one) => {
    expectCase(one, { Rsi: physics.conventionalInsideFilmM2KPerW(flowOf(one)) });
  });
  each(/^film-outside$/, (one) => {
    expectCase(one, { Rse: physics.conventionalOutsideFilmM2KPerW });
  });
  each(/^film-outside-wind$/, (one) => {
    const winds = inputNumbers(one, 'wind');
    expectCase(one, { Rse: winds.map((v) => physics.outsideFilmM2KPerW(v, 0.9, 0)) });
  });
  each(/^film-outside-calc-/, (one, n) => {
    expectCase(one, {
      hr0: physics.blackRadiativeWPerM2K(n('t_mean')),
      Rse: physics.outsideFilmM2KPerW(n('wind'), n('emissivity'), n('t_mean')),
    });
  });
  test('the calculated inside film rounds to the conventional table (ISO 6946 Annex C)', () => {
    for (const flow of ['up', 'horizontal', 'down'] as const) {
      const exact = physics.insideFilmM2KPerW(flow, 0.9, 20);
      expect(exact).toBeCloseTo(physics.conventionalInsideFilmM2KPerW(flow), 2);
    }
  });
  test('a roof loses heat upwards, a wall sideways, a floor downwards (ISO 6946, 6.8)', () => {
    expect([0, 45, 60, 90, 120, 150, 180].map(physics.losingHeatFlow)).toEqual([
      'up',
      'up',
      'horizontal',
      'horizontal',
      'horizontal',
      'down',
      'down',
    ]);
  });
});

describe('air layers', () => {
  each(/^air-layer-(up|horizontal|down)$/, (one) => {
    const R = inputNumbers(one, 'thickness_mm').map((mm) =>
      physics.airLayerResistanceM2KPerW({
        flow: flowOf(one),
        thicknessM: mm / 1000,
        emissivity1: 0.9,
        emissivity2: 0.9,
        meanC: 10,
      }),
    );
    expectCase(one, { R });
  });
  each(/^air-layer-calc-/, (one, n) => {
    const R = physics.airLayerResistanceM2KPerW({
      flow: flowOf(one),
      thicknessM: n('thickness_mm') / 1000,
      emissivity1: n('eps1'),
      emissivity2: n('eps2'),
      meanC: n('t_mean'),
    });
    expectCase(one, { R });
  });
  const plain = { thicknessM: 0.05, emissivity1: 0.9, emissivity2: 0.9, meanC: 10 } as const;
  test('the forms for large differences join those for small ones at 5 K within 2 %', () => {
    for (const flow of ['up', 'horizontal', 'down'] as const) {
      const small = physics.airLayerConvectionWPerM2K(flow, 0.05, 5);
      const large = physics.airLayerConvectionWPerM2K(flow, 0.05, 5.0001);
      expect(large / small).toBeGreaterThan(0.98);
      expect(large / small).toBeLessThan(1.02);
    }
  });
  test('a very wide void is an air layer, a narrow one resists more (limit of the view factor)', () => {
    const layer = physics.airLayerResistanceM2KPerW({ flow: 'horizontal', ...plain });
    const wide = physics.airVoidResistanceM2KPerW({ flow: 'horizontal', ...plain }, 1000);
    const narrow = physics.airVoidResistanceM2KPerW({ flow: 'horizontal', ...plain }, 0.05);
    expect(wide).toBeCloseTo(layer, 4);
    expect(narrow).toBeGreaterThan(layer);
  });
  test('vents lead from the closed to the open element (ISO 6946, 6.9)', () => {
    expect(physics.ventilatedElementM2KPerW(0, 3, 2)).toBe(3);
    expect(physics.ventilatedElementM2KPerW(500e-6, 3, 2)).toBe(3);
    expect(physics.ventilatedElementM2KPerW(1000e-6, 3, 2)).toBeCloseTo(2.5, 12);
    expect(physics.ventilatedElementM2KPerW(0.01, 3, 2)).toBe(2);
  });
});

describe('layered elements', () => {
  each(/^homogeneous-/, (one, n) => {
    const layers = inputAs<CaseLayer[]>(one, 'layers').map(caseResistance);
    const total = physics.totalResistanceM2KPerW(n('Rsi'), layers, n('Rse'));
    const interfaces = physics.interfaceTemperaturesC(
      n('theta_i'),
      n('theta_e'),
      n('Rsi'),
      layers,
      n('Rse'),
    );
    expectCase(one, {
      R_total: total,
      U: 1 / total,
      q: (n('theta_i') - n('theta_e')) / total,
      interfaces,
    });
  });
  each(/^inhomogeneous-/, (one, n) => {
    const layers = inputAs<CaseLayer[]>(one, 'layers').map(caseParts);
    const found = physics.combinedResistance(n('Rsi'), layers, n('Rse'));
    const limits = { R_upper: found.upperM2KPerW, R_lower: found.lowerM2KPerW };
    if (one.id === 'inhomogeneous-worked') return expectCase(one, limits);
    return expectCase(one, {
      ...limits,
      R_total: found.totalM2KPerW,
      U: 1 / found.totalM2KPerW,
      max_error: found.maxRelativeError,
    });
  });
  each(/^corrections-/, (one, n) => {
    const dU_air = physics.airVoidCorrectionWPerM2K(
      n('level') as physics.AirVoidLevel,
      n('R_ins'),
      n('R_total'),
    );
    const fasteners = {
      conductivityWPerMK: n('lambda_fastener'),
      sectionAreaM2: n('area_fastener'),
      perM2: n('n_fasteners'),
      insulationM: n('d_ins'),
      penetrationM: n('d_ins'),
    };
    const dU_fast = physics.fastenerCorrectionWPerM2K(fasteners, n('R_ins'), n('R_total'));
    expectCase(one, { dU_air, dU_fast, U_corrected: 1 / n('R_total') + dU_air + dU_fast });
  });
  test('the inverted-roof correction is p·f·x of the insulation share squared (ISO 6946, F.4)', () => {
    expect(physics.invertedRoofCorrectionWPerM2K(2, 0.04, 3, 4)).toBeCloseTo(0.045, 12);
  });
});

describe('tapered layers', () => {
  each(/^tapered-/, (one, n) => {
    const forms: Record<string, (base: number, taper: number) => number> = {
      rectangular: physics.taperedRectangleWPerM2K,
      triangular_thick_apex: physics.taperedThickApexWPerM2K,
      triangular_thin_apex: physics.taperedThinApexWPerM2K,
    };
    expectCase(one, { U: forms[inputText(one, 'shape')]?.(n('R0'), n('R1')) });
  });
  test('the uneven triangle is the mean of 1/(R0 + R) over its face (numerical quadrature)', () => {
    // Corners 0, R1, R2 and R linear in the barycentric coordinates; midpoint rule on 400 × 400 cells.
    const [r0, r1, r2] = [0.6, 1.4, 3];
    const cells = 400;
    let sum = 0;
    for (let i = 0; i < cells; i++) {
      for (let j = 0; j < cells; j++) {
        const u = (i + 0.5) / cells;
        const v = (1 - u) * ((j + 0.5) / cells);
        sum += ((1 - u) * 2) / (r0 + u * r1 + v * r2);
      }
    }
    const found = physics.taperedTriangleWPerM2K(r0, r1, r2);
    expect(Math.abs(found - sum / cells ** 2)).toBeLessThan(1e-5);
  });
});

describe('bridges and shells', () => {
  each(/^bridges-/, (one, n) => {
    const areas = inputNumbers(one, 'areas');
    const uValues = inputNumbers(one, 'U');
    const H_area = physics.areaTransmissionWPerK(areas, uValues);
    const H_bridges = physics.bridgeTransmissionWPerK(
      inputNumbers(one, 'lengths'),
      inputNumbers(one, 'psi'),
      inputNumbers(one, 'chi'),
    );
    const area = areas.reduce((a, b) => a + b, 0);
    const raised = uValues.map((u) => u + n('dU_flat'));
    expectCase(one, {
      H_area,
      H_bridges,
      H_total: H_area + H_bridges,
      U_mean: (H_area + H_bridges) / area,
      H_flat: physics.areaTransmissionWPerK(areas, raised),
    });
  });
  each(/^box-shape-factor-/, (one, n) => {
    const [length = 0, width = 0, height = 0] = inputNumbers(one, 'inner_dims');
    const shape = physics.boxShapeFactorM(length, width, height, n('thickness'));
    expectCase(one, { shape_factor: shape, conductance: shape * n('lambda') });
  });
});
