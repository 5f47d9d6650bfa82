// Openings, leaks, heat recovery and mixing against 08-airflow-moisture.json.
import { describe, expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';
import { inputAs } from './case-inputs.ts';

const file = '08-airflow-moisture.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

describe('openings', () => {
  each(/^single-sided-/, (one, n) => {
    const q = physics.singleSidedM3PerS(n('area'), n('height'), n('t_i'), n('t_e'), n('wind'));
    expectCase(one, { q, q_h: q * 3600 });
  });
  each(/^single-opening-stack-/, (one, n) => {
    expectCase(one, {
      q: physics.tallOpeningM3PerS(n('area'), n('height'), n('t_i'), n('t_e'), n('Cd')),
    });
  });
  each(/^two-openings-stack-/, (one, n) => {
    const [low, high, distance] = [n('area_low'), n('area_high'), n('distance')];
    const flow = physics.stackFlow(low, high, distance, n('t_i'), n('t_e'), n('Cd'));
    expectCase(one, {
      area_eff: physics.seriesAreaM2(low, high),
      dp_stack: physics.stackPressurePa(distance, n('t_i'), n('t_e')),
      neutral_height: flow.neutralHeightM,
      mass_flow: flow.massKgPerS,
    });
    expect(flow.downward).toBe(n('t_i') < n('t_e'));
  });
  each(/^cross-wind-/, (one, n) => {
    const [low, high] = [n('area_low'), n('area_high')];
    expectCase(one, {
      area_eff: physics.seriesAreaM2(low, high),
      q: physics.crossWindM3PerS(low, high, n('wind'), n('dCp'), n('Cd')),
    });
  });
  each(/^combined-quadrature-/, (one, n) => {
    expectCase(one, { q_total: physics.joinedFlowM3PerS(n('q_wind'), n('q_stack')) });
  });
  test('the doorway coefficient times |ΔT|^1.5 is ρc·q·ΔT of the tall opening', () => {
    const q = physics.tallOpeningM3PerS(1.6, 2, 23, 19, 0.5);
    const k = physics.doorwayExchangeWPerK15(1.6, 2, 21, 0.5, 1207);
    expect(k * 4 ** 1.5).toBeCloseTo(1207 * q * 4, 9);
  });
  test('a sash that hangs in at 8° opens about a seventh of its area (EN 16798-7, Annex B)', () => {
    expect(physics.sashOpeningShare(0)).toBe(0);
    expect(physics.sashOpeningShare(8)).toBeCloseTo(0.1413, 4); // its polynomial worked by hand
    expect(physics.sashOpeningShare(90)).toBeGreaterThan(0.85);
    expect(physics.sashOpeningShare(90)).toBeLessThan(1);
  });
});

describe('leaks', () => {
  each(/^leakage-/, (one, n) => {
    const C = physics.leakageCoefficient(n('n50'), n('volume'), n('n'));
    const q = physics.leakageM3PerS(C, n('n'), n('dp'));
    expectCase(one, { C, q, n_at_dp: (q * 3600) / n('volume') });
  });
  test('a leak passes as much outward as inward for the opposite pressure', () => {
    expect(physics.leakageM3PerS(0.01, 0.65, -4)).toBe(-physics.leakageM3PerS(0.01, 0.65, 4));
    expect(physics.leakageM3PerS(0.01, 0.65, 0)).toBe(0);
  });

  type Path = readonly [number, number, number, number];
  const leaks = (paths: readonly Path[]): physics.LeakPaths => ({
    coefficient: Float64Array.from(paths, (p) => p[0]),
    exponent: Float64Array.from(paths, (p) => p[1]),
    heightM: Float64Array.from(paths, (p) => p[2]),
    windCoefficient: Float64Array.from(paths, (p) => p[3]),
  });
  each(/^pressure-network-/, (one, n) => {
    const rows = inputAs<Path[]>(one, 'paths');
    const paths = leaks(rows);
    const air = {
      insideC: n('t_i'),
      outsideC: n('t_e'),
      windMPerS: n('wind'),
      fanKgPerS: n('supply'),
    };
    const p_internal = physics.zonePressurePa(paths, air);
    const flows = rows.map((_, k) => physics.leakKgPerS(paths, k, air, p_internal));
    expectCase(one, {
      p_internal,
      flows_kg_s: flows,
      infiltration: physics.infiltrationKgPerS(paths, air, p_internal),
    });
    const net = flows.reduce((a, b) => a + b, n('supply'));
    expect(Math.abs(net), 'mass balance [kg/s]').toBeLessThan(1e-8);
  });
  test('two orifices find the neutral height of the closed stack formula', () => {
    // C = Cd·A·√(2/ρ) with the density of the air that passes makes leak and orifice the same.
    const [inC, outC, area, distance] = [20, 0, 0.1, 4];
    const c = (t: number) => 0.6 * area * Math.sqrt(2 / physics.dryAirKgPerM3(t));
    const paths = leaks([
      [c(outC), 0.5, 0, 0],
      [c(inC), 0.5, distance, 0],
    ]);
    const air = { insideC: inC, outsideC: outC, windMPerS: 0, fanKgPerS: 0 };
    const p = physics.zonePressurePa(paths, air);
    const stack = physics.stackFlow(area, area, distance, inC, outC, 0.6);
    expect(physics.leakKgPerS(paths, 0, air, p)).toBeCloseTo(stack.massKgPerS, 8);
  });
  test('a strong fan pushes the zone beyond every leak, and all air leaves by them', () => {
    const paths = leaks([
      [0.001, 0.65, 0, 0.6],
      [0.001, 0.65, 3, -0.5],
    ]);
    const air = { insideC: 20, outsideC: 0, windMPerS: 5, fanKgPerS: 0.5 };
    const p = physics.zonePressurePa(paths, air);
    expect(physics.infiltrationKgPerS(paths, air, p)).toBe(0);
    expect(p).toBeGreaterThan(1000);
    const out = physics.leakKgPerS(paths, 0, air, p) + physics.leakKgPerS(paths, 1, air, p);
    expect(out).toBeCloseTo(-0.5, 9);
  });
  test('thin air at altitude lets stack and leak carry less (ideal gas)', () => {
    const paths = leaks([
      [0.01, 0.65, 0, 0],
      [0.01, 0.65, 4, 0],
    ]);
    const flow = (barometerPa: number) => {
      const air = { insideC: 20, outsideC: 0, windMPerS: 0, fanKgPerS: 0, barometerPa };
      return physics.infiltrationKgPerS(paths, air, physics.zonePressurePa(paths, air));
    };
    // mass flow goes with ρ·Δp^n and Δp with ρ: with the pressure to the power 1 + n
    expect(flow(83500) / flow(101325)).toBeCloseTo((83500 / 101325) ** 1.65, 6);
  });
  test('a zone without any leak is refused', () => {
    const air = { insideC: 20, outsideC: 0, windMPerS: 0, fanKgPerS: 0 };
    expect(() => physics.zonePressurePa(leaks([]), air)).toThrow(RangeError);
  });
});

describe('streams', () => {
  each(/^mixing-/, (one, n) => {
    const mixed = physics.mixedStream(
      { tempC: n('t1'), waterKgPerKg: n('w1'), massKgPerS: n('m1') },
      { tempC: n('t2'), waterKgPerKg: n('w2'), massKgPerS: n('m2') },
    );
    expectCase(one, {
      w_mix: mixed.waterKgPerKg,
      h_mix: physics.mixEnthalpyJPerKg(mixed.tempC, mixed.waterKgPerKg) / 1000,
      t_mix: mixed.tempC,
    });
  });
  each(/^heat-recovery-/, (one, n) => {
    const t_supply = physics.recoveredSupplyC(n('t1'), n('t2'), n('eff'));
    expectCase(one, {
      t_supply,
      t_exhaust: physics.recoveredExhaustC(n('t1'), n('t2'), n('eff')),
      q_room: physics.ventilationLossW(n('m'), physics.dryAirHeatJPerKgK, n('t1'), t_supply),
    });
  });
  test('the exchanger keeps the heat: what the supply gains the extract air loses', () => {
    const gained = 1.3 * (physics.recoveredSupplyC(21, -8, 0.6) - -8);
    const lost = 21 - physics.recoveredExhaustC(21, -8, 0.6, 1.3);
    expect(gained).toBeCloseTo(lost, 12);
  });
  test('with the greatest effectiveness no stream passes the other one’s inlet', () => {
    for (const ratio of [0.5, 1, 1.6]) {
      const best = physics.greatestEffectiveness(ratio);
      expect(physics.recoveredSupplyC(20, -10, best)).toBeLessThanOrEqual(20);
      expect(physics.recoveredExhaustC(20, -10, best, ratio)).toBeGreaterThanOrEqual(-10 - 1e-12);
    }
  });
  test('the frost limit lands the exhaust on its least temperature, and only in frost', () => {
    const cut = physics.frostLimitedEffectiveness(0.9, 20, -12, 2, 1.1);
    expect(cut).toBeLessThan(0.9);
    expect(physics.recoveredExhaustC(20, -12, cut, 1.1)).toBeCloseTo(2, 12);
    expect(physics.frostLimitedEffectiveness(0.9, 20, 8, 2)).toBe(0.9);
    expect(physics.frostLimitedEffectiveness(0.9, 20, 30, 2)).toBe(0.9);
    expect(physics.frostLimitedEffectiveness(0.9, 1, -5, 2)).toBe(0);
  });
  test('the bypass holds the wanted supply, opens fully at need, and stays shut in heat', () => {
    const part = physics.bypassedEffectiveness(0.8, 25, 12, 16);
    expect(physics.recoveredSupplyC(25, 12, part)).toBeCloseTo(16, 12);
    expect(physics.bypassedEffectiveness(0.8, 25, 20, 16)).toBe(0);
    expect(physics.bypassedEffectiveness(0.8, 25, 32, 16)).toBe(0.8);
    expect(physics.bypassedEffectiveness(0.8, 21, -10, 30)).toBe(0.8);
  });
  each(/^ventilation-loss-/, (one, n) => {
    const perH = n('n') * n('volume');
    const H_v = physics.airExchangeWPerK(n('n'), n('volume'), 1.2 * physics.dryAirHeatJPerKgK);
    expectCase(one, {
      q_h: perH,
      H_v,
      Q: H_v * (n('t_i') - n('t_e')),
      Q_latent: physics.latentExchangeW((1.2 * perH) / 3600, n('w_i'), n('w_e')),
    });
  });
});
