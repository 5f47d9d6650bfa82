// Design heat load, cool-down, reheat, degree days and utilisation against 09-heat-load-and-energy.json;
// plant curves.
import { describe, expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';
import { inputAs } from './case-inputs.ts';

const file = '09-heat-load-and-energy.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

type Read = (key: string) => number;

const lumped = (n: Read): physics.LumpedRoom => ({
  capacityJPerK: n('C'),
  conductanceWPerK: n('H'),
  outsideC: n('T_out'),
  gainW: n('gain'),
});

describe('design heat load', () => {
  interface CaseElement {
    readonly area: number;
    readonly U: number;
    readonly dU_tb: number;
    readonly f: number;
  }
  each(/^design-load-/, (one, n) => {
    const elements = inputAs<CaseElement[]>(one, 'elements').map((e) => ({
      areaM2: e.area,
      uValueWPerM2K: e.U,
      bridgesWPerM2K: e.dU_tb,
      temperatureFactor: e.f,
    }));
    const H_T_e = physics.designTransmissionWPerK(elements);
    const H_T_g = physics.designGroundWPerK(
      n('area_ground'),
      n('U_equiv'),
      n('theta_i'),
      n('theta_e'),
      n('theta_me'),
      n('G_w'),
      n('f_g1'),
    );
    const V_inf = physics.designInfiltrationM3PerH(
      n('volume'),
      n('n50'),
      n('e_shield'),
      n('eps_height'),
    );
    const V_min = n('n_min') * n('volume');
    const H_V = physics.designVentilationWPerK(V_inf, V_min);
    const load = physics.designHeatLoad(
      H_T_e + H_T_g,
      H_V,
      n('theta_i'),
      n('theta_e'),
      n('area_floor'),
      n('f_RH'),
    );
    expectCase(one, {
      f_g2: (n('theta_i') - n('theta_me')) / (n('theta_i') - n('theta_e')),
      H_T_e,
      H_T_g,
      V_inf,
      V_min,
      H_V,
      Phi_T: load.transmissionW,
      Phi_V: load.ventilationW,
      Phi_RH: load.reheatW,
      Phi_HL: load.totalW,
    });
  });
});

describe('a lumped room', () => {
  each(/^cool-down-/, (one, n) => {
    const room = lumped(n);
    expectCase(one, {
      tau_h: physics.roomTimeConstantH(room),
      T_end: physics.roomEndC(room, 0),
      T: inputNumbers(one, 'times_h').map((h) => physics.roomAfterC(room, n('T0'), 0, h)),
      time_h: physics.roomHoursToH(room, n('T0'), n('target'), 0),
    });
  });
  each(/^reheat-/, (one, n) => {
    const room = lumped(n);
    expectCase(one, {
      reheat_h: physics.roomHoursToH(room, n('T0'), n('target'), n('power')),
      power_needed: physics.reheatW(room, n('T0'), n('target'), n('time_available_h')),
      power_steady: physics.holdingW(room, n('target')),
    });
  });
  each(/^setback-cycle-/, (one, n) => {
    const room = lumped((key) => (key === 'gain' ? 0 : n(key)));
    const cycle = physics.setbackCycle(
      room,
      n('T_comfort'),
      n('T_setback'),
      n('t_low'),
      n('t_high'),
      n('power_max'),
    );
    expect(cycle.reachesComfort).toBe(true);
    expectCase(one, {
      T_min: cycle.lowestC,
      time_to_setback_h: cycle.coolingH,
      reheat_h: cycle.reheatH,
      energy_kWh: cycle.energyJ / 3.6e6,
      mean_power: cycle.meanW,
    });
  });
  const house = { capacityJPerK: 2e7, conductanceWPerK: 150, outsideC: -5, gainW: 0 };
  test('a heater too small for the comfort value is said to be, instead of a made-up cycle', () => {
    const cycle = physics.setbackCycle(house, 20, 16, 8, 16, 3800);
    expect(cycle.reachesComfort).toBe(false);
  });
  test('the power that reheats in the given time does so', () => {
    const power = physics.reheatW(house, 15, 20, 3);
    expect(physics.roomAfterC(house, 15, power, 3)).toBeCloseTo(20, 9);
  });
  test('surplus gains ask for no heat', () => {
    expect(physics.holdingW({ ...house, gainW: 5000 }, 20)).toBe(0);
  });
  each(/^two-node-cool-down-/, (one, n) => {
    const stores: physics.TwoStores = {
      firstCapacity: n('C_air'),
      secondCapacity: n('C_mass'),
      between: n('G_am'),
      firstToOutside: n('G_ao'),
      secondToOutside: n('G_mo'),
    };
    const end = physics.steadyStores(stores, n('T_out'), 0, 0);
    const start = [n('T0'), n('T0')] as const;
    const at = inputNumbers(one, 'times_h').map((h) =>
      physics.storesAfter(stores, start, end, h * 3600),
    );
    const [tau1, tau2] = physics.storeTimeConstants(stores);
    expectCase(one, {
      T_air: at.map((pair) => pair[0]),
      T_mass: at.map((pair) => pair[1]),
      tau1_h: tau1 / 3600,
      tau2_h: tau2 / 3600,
    });
  });
});

describe('degree days', () => {
  each(/^degree-days-\d/, (one, n) => {
    const days = inputNumbers(one, 'daily_means');
    const limited = physics.limitedDegreeDays(days, 20, n('limit'));
    expectCase(one, {
      hdd: physics.heatingDegreeDaysKd(days, n('base_heating')),
      cdd: physics.coolingDegreeDaysKd(days, n('base_cooling')),
      hdd_limit: limited.sumKd,
      heating_days: limited.heatingDays,
    });
  });
  each(/^degree-days-hourly$/, (one, n) => {
    const hourly = inputNumbers(one, 'hourly');
    const mean = hourly.reduce((a, b) => a + b, 0) / hourly.length;
    expectCase(one, {
      hdd: physics.heatingDegreeDaysKd([mean], n('base_heating')),
      hdd_hourly: physics.hourlyHeatingDegreeDaysKd(hourly, n('base_heating')),
    });
  });
  each(/^balance-point-/, (one, n) => {
    const balance = physics.balanceC(n('theta_i'), n('gain_W'), n('H'));
    const hdd = physics.heatingDegreeDaysKd(inputNumbers(one, 'daily_means'), balance);
    expectCase(one, {
      balance,
      hdd,
      energy_kWh: physics.degreeDayHeatJ(n('H'), hdd, n('eff')) / 3.6e6,
    });
  });
});

describe('gain utilisation', () => {
  each(/^utilisation-/, (one, n) => {
    const gamma = n('Q_gn') / n('Q_ht');
    const a = physics.utilisationExponent(n('tau_h'), n('a0'), n('tau0_h'));
    expectCase(one, {
      gamma,
      a,
      eta: physics.gainUtilisation(gamma, a),
      Q_need: physics.monthlyHeatingNeed(n('Q_ht'), n('Q_gn'), a),
    });
  });
  test('the factor passes a gain ratio of one without a jump', () => {
    const [below, at, above] = [1 - 1e-5, 1, 1 + 1e-5].map((g) => physics.gainUtilisation(g, 4));
    expect(below).toBeCloseTo(at ?? Number.NaN, 4);
    expect(above).toBeCloseTo(at ?? Number.NaN, 4);
  });
  test('far more gains than losses leave no need (limit)', () => {
    expect(physics.monthlyHeatingNeed(100, 1e5, 5)).toBeLessThan(1e-9);
  });
});

describe('plant', () => {
  test('a boiler meets its two tests and idles at nothing', () => {
    const at = (load: number) => physics.boilerEfficiency(load, 0.96, 1.07, 0.01);
    expect(at(1)).toBeCloseTo(0.96, 12);
    expect(at(0.3)).toBeCloseTo(1.07, 12);
    expect(at(0)).toBe(0);
    expect(at(0.02)).toBeLessThan(at(0.3));
  });
  test('Carnot from 0 to 35 °C is 308.15/35 (second law)', () => {
    expect(physics.carnotHeatingCop(0, 35)).toBeCloseTo(308.15 / 35, 12);
  });
  test('a heat pump gets better with a warmer source and a cooler sink, and never beats Carnot', () => {
    const cop = (source: number, sink: number) => physics.heatPumpCop(source, sink, 0.45, 5);
    expect(cop(7, 35)).toBeGreaterThan(cop(-7, 35));
    expect(cop(7, 35)).toBeGreaterThan(cop(7, 55));
    expect(physics.heatPumpCop(7, 35, 1, 0)).toBeCloseTo(physics.carnotHeatingCop(7, 35), 12);
    // air at 7 °C, water at 35 °C: tested machines reach 4 to 5 (common practice, no source)
    expect(cop(7, 35)).toBeGreaterThan(3.5);
    expect(cop(7, 35)).toBeLessThan(5);
  });
  test('a chiller tires as it gets hot outside, and has an end value when it is colder than its water', () => {
    const eer = [5, 20, 30, 40].map((t) => physics.chillerEer(t, 7, 0.4, 5));
    for (let i = 0; i + 1 < eer.length; i++) expect(eer[i + 1]).toBeLessThan(eer[i] ?? 0);
    expect(Number.isFinite(eer[0])).toBe(true);
  });
  test('test points are met, joined straight, and kept level beyond', () => {
    const points = [
      { outdoorC: -7, value: 2.8 },
      { outdoorC: 2, value: 3.6 },
      { outdoorC: 7, value: 4.4 },
    ];
    const at = (t: number) => physics.ratedAt(points, t);
    expect([-20, -7, 2, 4.5, 7, 30].map(at)).toEqual([2.8, 2.8, 3.6, 4, 4.4, 4.4]);
    expect(() => physics.ratedAt([], 0)).toThrow(RangeError);
  });
  test('cycling costs nothing at full load (EN 14825)', () => {
    expect(physics.cyclingFactorWater(1)).toBe(1);
    expect(physics.cyclingFactorAir(1)).toBe(1);
    expect(physics.cyclingFactorWater(0.5)).toBeCloseTo(0.5 / 0.55, 12);
    expect(physics.cyclingFactorAir(0.5)).toBeCloseTo(0.875, 12);
  });
});
