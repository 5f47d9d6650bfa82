// Ground floors and basements by ISO 13370 against 03-steady-u-values.json, and what the hourly run
// takes from them.
import { describe, expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputText,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '03-steady-u-values.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

type Read = (key: string) => number;

const equivalent = (n: Read) =>
  physics.equivalentSoilM(n('wall_thickness'), n('lambda_ground'), n('Rsi'), n('R_f'), n('Rse'));

describe('slabs', () => {
  each(/^slab-\d/, (one, n) => {
    const B = physics.characteristicDimensionM(n('area'), n('perimeter'));
    const d_t = equivalent(n);
    const U = physics.slabUValueWPerM2K(B, n('lambda_ground'), d_t);
    expectCase(one, { B, d_t, U, H_g: U * n('area') });
  });
  each(/^slab-periodic-/, (one, n) => {
    const delta = physics.yearlyPenetrationM(n('lambda_ground'), n('rho_c'));
    const d = equivalent(n);
    expectCase(one, {
      delta,
      H_pi: physics.insidePeriodicWPerK(n('area'), n('lambda_ground'), d, delta),
      H_pe: physics.slabOutsidePeriodicWPerK(n('perimeter'), n('lambda_ground'), d, delta),
    });
  });
  each(/^slab-edge-/, (one, n) => {
    const soil = n('lambda_ground');
    const B = physics.characteristicDimensionM(n('area'), n('perimeter'));
    const d_t = equivalent(n);
    const U = physics.slabUValueWPerM2K(B, soil, d_t);
    const extra = physics.edgeInsulationSoilM(n('R_edge'), n('t_edge'), soil);
    const reach = inputText(one, 'kind') === 'vertical' ? 2 * n('D_edge') : n('D_edge');
    const psi = physics.edgeInsulationPsiWPerMK(reach, soil, d_t, extra);
    expectCase(one, { B, d_t, U, psi_ge: psi, U_with_edge: U + (2 * psi) / B });
  });
});

describe('basements and suspended floors', () => {
  each(/^basement-/, (one, n) => {
    const soil = n('lambda_ground');
    const B = physics.characteristicDimensionM(n('area'), n('perimeter'));
    const d_t = equivalent(n);
    const d_w = physics.equivalentSoilM(0, soil, 0.13, n('R_w'), n('Rse'));
    const U_bf = physics.basementFloorWPerM2K(B, n('z'), soil, d_t);
    const U_bw = physics.basementWallWPerM2K(n('z'), soil, d_t, d_w);
    const H_g = physics.heatedBasementWPerK(n('area'), n('perimeter'), n('z'), U_bf, U_bw);
    expectCase(one, { B, d_t, U_bf, U_bw, H_g });
  });
  each(/^suspended-/, (one, n) => {
    const soil = n('lambda_ground');
    const B = physics.characteristicDimensionM(n('area'), n('perimeter'));
    const d_g = physics.equivalentSoilM(n('wall_thickness'), soil, 0.17, n('R_g'), 0.04);
    const U_g = physics.moderateFloorWPerM2K(B, soil, d_g);
    const U_f = 1 / (n('R_f') + 2 * 0.17);
    const U_x = physics.voidToOutsideWPerM2K(
      {
        floorHeightM: n('h_floor'),
        voidWallWPerM2K: n('U_wall_void'),
        ventAreaM2PerM: n('eps_vent'),
        windMPerS: n('wind'),
        shieldFactor: n('f_w'),
      },
      B,
    );
    const U = physics.suspendedFloorUValueWPerM2K(U_f, U_g, U_x);
    expectCase(one, { B, U_g, U_x, U_f, U, H_g: U * n('area') });
  });

  const cellar: physics.UnheatedBasement = {
    areaM2: 80,
    perimeterM: 36,
    depthM: 2,
    wallAboveM: 0.4,
    deckWPerM2K: 0.8,
    wallAboveWPerM2K: 1.2,
    airChangesPerH: 0.3,
    volumeM3: 180,
  };
  test('a cellar aired without end leaves the deck alone (limit of ISO 13370, 9.4)', () => {
    const storm = { ...cellar, airChangesPerH: 1e7 };
    expect(physics.unheatedBasementUValueWPerM2K(storm, 0.3, 0.4)).toBeCloseTo(0.8, 5);
  });
  test('deck and cellar in series lose less than either alone', () => {
    const u = physics.unheatedBasementUValueWPerM2K(cellar, 0.3, 0.4);
    expect(u).toBeLessThan(cellar.deckWPerM2K);
    const below =
      physics.heatedBasementWPerK(80, 36, 2, 0.3, 0.4) + physics.basementToOutsideWPerK(cellar);
    expect(1 / u).toBeCloseTo(1 / 0.8 + 80 / below, 12);
  });
  test('edge insulation of no reach or no thickness changes no periodic flow', () => {
    const bare = physics.slabOutsidePeriodicWPerK(40, 2, 0.7, 3.2);
    expect(physics.edgedSlabOutsidePeriodicWPerK(40, 2, 0.7, 3.2, 0, 3)).toBeCloseTo(bare, 12);
    expect(physics.edgedSlabOutsidePeriodicWPerK(40, 2, 0.7, 3.2, 2, 0)).toBeCloseTo(bare, 12);
  });
  test('a basement of no depth swings as a slab does (limit of ISO 13370, Annex C)', () => {
    const slab = physics.slabOutsidePeriodicWPerK(40, 2, 0.7, 3.2);
    expect(physics.basementOutsidePeriodicWPerK(40, 0, 2, 0.7, 3, 3.2)).toBeCloseTo(slab, 12);
  });
  test('a void swept without end swings with the outside through the deck alone', () => {
    const pair = physics.suspendedPeriodic(80, 36, 2, 1, 0.5, 1e9, 3.2);
    expect(pair.insideWPerK).toBeCloseTo(40, 5);
    expect(pair.outsideWPerK).toBeCloseTo(40, 5);
    const aired = { ...cellar, airChangesPerH: 1e9 };
    const cellarPair = physics.unheatedBasementPeriodic(aired, 2, 1, 3.2);
    expect(cellarPair.insideWPerK).toBeCloseTo(64, 4);
    expect(cellarPair.outsideWPerK).toBeCloseTo(64, 4);
  });
});

describe('what the hourly run takes', () => {
  const cycle: physics.GroundCycle = {
    steadyWPerK: 76,
    insidePeriodicWPerK: 71,
    outsidePeriodicWPerK: 50,
    leadMonths: 0,
    lagMonths: 1,
  };
  const inside = { meanC: 20, amplitudeK: 2 };
  const outside = { meanC: 10, amplitudeK: 9 };
  const months = Array.from({ length: 12 }, (_, m) => m + 1);

  test('the monthly flows average to the steady flow (the swings cancel over a year)', () => {
    const flows = months.map((m) => physics.groundMonthFlowW(cycle, inside, outside, m, 1));
    expect(flows.reduce((a, b) => a + b, 0) / 12).toBeCloseTo(760, 9);
  });
  test('the loss is greatest one month after the coldest outside, without an inside swing', () => {
    const still = { meanC: 20, amplitudeK: 0 };
    const flows = months.map((m) => physics.groundMonthFlowW(cycle, still, outside, m, 1));
    expect(flows.indexOf(Math.max(...flows)) + 1).toBe(2);
    expect(Math.max(...flows)).toBeCloseTo(760 + 450, 9);
  });
  test('steady heat through films, floor, soil, virtual layer to the virtual temperature is Φ', () => {
    // ISO 13370 chooses layer and temperature so that U·A·(θ_i − θ_v) is the month's flow.
    const [area, uValue, film, floor, soil] = [100, 0.25, 0.17, 2.5, 2];
    const layer = physics.virtualLayerM2KPerW(uValue, film, floor, soil);
    expect(physics.virtualLayerFits(layer)).toBe(true);
    expect(film + floor + physics.simulatedSoilM / soil + layer).toBeCloseTo(1 / uValue, 12);
    const flow = physics.groundMonthFlowW(cycle, inside, outside, 3, 1);
    const virtual = physics.virtualGroundC(19, flow, area, uValue);
    expect((area * (19 - virtual)) / (film + floor + 0.25 + layer)).toBeCloseTo(flow, 9);
  });
  test('undisturbed ground follows its surface at the top and rests at the mean far down', () => {
    const at = (z: number, t: number) => physics.undisturbedGroundC(outside, z, 3.2, t, 0.05);
    expect(at(0, 0.05)).toBeCloseTo(1, 12);
    expect(at(0, 0.55)).toBeCloseTo(19, 12);
    expect(Math.abs(at(50, 0.3) - 10)).toBeLessThan(1e-5);
    // at π·δ the wave is upside down and 23 times smaller (Carslaw & Jaeger, 2.6)
    expect(at(Math.PI * 3.2, 0.05)).toBeCloseTo(10 + 9 * Math.exp(-Math.PI), 12);
  });
});
