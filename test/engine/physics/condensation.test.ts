// ISO 13788: saturation, surface factor and condensation against 03-steady-u-values.json.
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
import { type CaseLayer, caseResistance, inputAs } from './case-inputs.ts';

const file = '03-steady-u-values.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

const vapourLayer = (layer: CaseLayer): physics.VapourLayer => ({
  resistanceM2KPerW: caseResistance(layer),
  sdM: layer.sd ?? (layer.mu ?? 0) * (layer.d ?? 0),
});

describe('surfaces', () => {
  each(/^psat$/, (one) => {
    expectCase(one, { p_sat: inputNumbers(one, 'theta').map(physics.hygricSaturationPa) });
  });
  each(/^f-rsi-/, (one, n) => {
    const f = physics.planeTemperatureFactor(n('U'), n('Rsi'));
    const surface = physics.surfaceByFactorC(f, n('theta_i'), n('theta_e'));
    const lowest = physics.lowestSurfaceC(n('theta_i'), n('rh_i') / 100, n('critical_rh') / 100);
    expectCase(one, {
      f_Rsi: f,
      theta_si: surface,
      theta_si_min: lowest,
      f_Rsi_min: physics.temperatureFactor(lowest, n('theta_i'), n('theta_e')),
      mould_risk: surface < lowest,
    });
  });
  test('the dew point undoes the saturation pressure on both sides of freezing', () => {
    for (const t of [-20, -3, 0, 4, 25, 40]) {
      expect(physics.hygricDewPointC(physics.hygricSaturationPa(t))).toBeCloseTo(t, 9);
    }
  });
  test('a surface at its lowest temperature is at the critical humidity', () => {
    const vapour = 0.5 * physics.hygricSaturationPa(20);
    const lowest = physics.lowestSurfaceC(20, 0.5, 0.8);
    expect(physics.surfaceHumidity(vapour, lowest)).toBeCloseTo(0.8, 12);
  });
  test('the vapour excess is full in frost, half at 10 °C, none at 20 °C (ISO 13788, Annex A)', () => {
    const at = (t: number) => physics.classVapourExcessKgPerM3(3, t);
    expect([-10, 0, 10, 20, 30].map(at)).toEqual([0.006, 0.006, 0.003, 0, 0]);
  });
});

describe('inside the element', () => {
  each(/^glaser-/, (one, n) => {
    const layers = inputAs<CaseLayer[]>(one, 'layers').map(vapourLayer);
    const interfaces = physics.interfaceTemperaturesC(
      n('theta_i'),
      n('theta_e'),
      n('Rsi'),
      layers.map((l) => l.resistanceM2KPerW),
      n('Rse'),
    );
    const saturation = physics.saturationsPa(interfaces);
    const sd = physics.cumulativeSdM(layers);
    const p_i = (n('rh_i') / 100) * physics.hygricSaturationPa(n('theta_i'));
    const p_e = (n('rh_e') / 100) * physics.hygricSaturationPa(n('theta_e'));
    const dry = sd.map(() => false);
    const rate = physics.vapourState(sd, saturation, p_i, p_e, dry).rateKgPerM2S;
    const planes = [...rate.keys()].filter((k) => (rate[k] ?? 0) > 0);
    const rates = planes.map((k) => rate[k] ?? Number.NaN);
    expectCase(one, {
      interfaces,
      p_sat_interfaces: saturation,
      sd,
      p_i,
      p_e,
      planes,
      rates,
      monthly_30d: rates.map((r) => r * 30 * 86400),
    });
  });

  const unsafe: physics.VapourLayer[] = [
    { resistanceM2KPerW: 0.05, sdM: 0.125 },
    { resistanceM2KPerW: 2, sdM: 0.08 },
    { resistanceM2KPerW: 0.296, sdM: 2.4 },
    { resistanceM2KPerW: 0.022, sdM: 0.5 },
  ];
  const outsideC = [-2, -1, 3, 8, 13, 16, 18, 18, 14, 9, 3, 0];
  const months = (rhInside: number): physics.VapourMonth[] =>
    outsideC.map((t) => ({
      days: 30,
      insideC: 20,
      insideVapourPa: rhInside * physics.hygricSaturationPa(20),
      outsideC: t,
      outsideVapourPa: 0.8 * physics.hygricSaturationPa(t),
    }));

  test('a plane that condenses gathers what a steady month gathers, from the first cold month on', () => {
    const year = physics.condensationYear(unsafe, 0.13, 0.04, months(0.6));
    expect(year.condenses).toBe(true);
    const first = months(0.6)[year.startMonth];
    const t = physics.interfaceTemperaturesC(
      20,
      first?.outsideC ?? Number.NaN,
      0.13,
      unsafe.map((l) => l.resistanceM2KPerW),
      0.04,
    );
    // Glaser by hand, one plane at interface 2: flow in less flow out.
    const sat = physics.hygricSaturationPa(t[2] ?? Number.NaN);
    const inflow = ((first?.insideVapourPa ?? 0) - sat) / 0.205;
    const outflow = (sat - (first?.outsideVapourPa ?? 0)) / 2.9;
    const expected = 2e-10 * (inflow - outflow) * 30 * 86400;
    expect(year.waterKgPerM2[0]?.[2]).toBeCloseTo(expected, 9);
  });
  test('water that summer can take is gone at the end of the year, and never below nothing', () => {
    const year = physics.condensationYear(unsafe, 0.13, 0.04, months(0.45));
    expect(year.condenses).toBe(true);
    expect(year.driesOut).toBe(true);
    for (const month of year.waterKgPerM2)
      for (const w of month) expect(w).toBeGreaterThanOrEqual(0);
  });
  test('drying within a month stops at the moment the plane is dry', () => {
    // One month of frost, then eleven so dry that the water is gone in hours: nothing is overdrawn.
    const wet = months(0.6)[0];
    const dryMonth = {
      days: 30,
      insideC: 20,
      insideVapourPa: 300,
      outsideC: 18,
      outsideVapourPa: 300,
    };
    const list = Array.from({ length: 12 }, (_, m) => (m === 0 && wet ? wet : dryMonth));
    const year = physics.condensationYear(unsafe, 0.13, 0.04, list);
    expect(year.startMonth).toBe(0);
    expect(year.waterKgPerM2[0]?.[2]).toBeGreaterThan(0.1);
    expect(year.driesOut).toBe(true);
    expect([...(year.waterKgPerM2[11] ?? [])]).toEqual([0, 0, 0, 0, 0]);
  });
  test('a vapour barrier inside keeps the same wall dry', () => {
    const barrier = { resistanceM2KPerW: 0, sdM: 100 };
    const [lining = barrier, ...rest] = unsafe;
    const year = physics.condensationYear([lining, barrier, ...rest], 0.13, 0.04, months(0.6));
    expect(year.condenses).toBe(false);
    expect(year.driesOut).toBe(true);
  });
  test('splitting thick layers keeps their sums and leaves none above 0.25 m²·K/W', () => {
    const split = physics.subdividedVapourLayers(unsafe);
    const sum = (list: readonly physics.VapourLayer[], key: 'resistanceM2KPerW' | 'sdM') =>
      list.reduce((a, l) => a + l[key], 0);
    expect(sum(split, 'sdM')).toBeCloseTo(sum(unsafe, 'sdM'), 12);
    expect(sum(split, 'resistanceM2KPerW')).toBeCloseTo(sum(unsafe, 'resistanceM2KPerW'), 12);
    expect(Math.max(...split.map((l) => l.resistanceM2KPerW))).toBeLessThanOrEqual(0.25 + 1e-12);
  });
});
