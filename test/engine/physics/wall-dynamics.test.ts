import { describe, expect, test } from 'vitest';
import {
  halfPartition,
  layerMatrix,
  penetrationDepthM,
  wallDynamics,
} from '../../../engine/physics/wall-dynamics.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';
import { caseLayers, solid } from './layers.ts';

describe('ISO 13786 characteristics', () => {
  for (const one of referenceCases('02a-wall-dynamics.json', /^iso13786-/)) {
    test(caseName(one), () => {
      const layers = caseLayers(one);
      const periodS = inputNumber(one, 'period_h') * 3600;
      const films = wallDynamics(layers, inputNumber(one, 'Rsi'), inputNumber(one, 'Rse'), periodS);
      const bare = wallDynamics(layers, 0, 0, periodS);
      expectCase(one, {
        U: films.uValueWPerM2K,
        Y_ie_abs: films.periodicTransmittanceWPerM2K,
        decrement: films.decrementFactor,
        time_shift: films.timeShiftH,
        Y_ii_abs: films.insideAdmittanceWPerM2K,
        Y_ii_lead: films.insideLeadH,
        Y_ee_abs: films.outsideAdmittanceWPerM2K,
        Y_ee_lead: films.outsideLeadH,
        kappa_i: films.insideCapacityJPerM2K / 1000,
        kappa_e: films.outsideCapacityJPerM2K / 1000,
        kappa_i_surface: bare.insideCapacityJPerM2K / 1000,
        kappa_e_surface: bare.outsideCapacityJPerM2K / 1000,
      });
    });
  }
  for (const one of referenceCases('02a-wall-dynamics.json', /^adiabatic-/)) {
    test(caseName(one), () => {
      const periodS = inputNumber(one, 'period_h') * 3600;
      const half = halfPartition(caseLayers(one), inputNumber(one, 'Rsi'), periodS);
      expectCase(one, {
        kappa: half.capacityJPerM2K / 1000,
        admittance: half.admittanceWPerM2K,
        lead_h: half.leadH,
      });
    });
  }
});

// A layer of many penetration depths is a semi-infinite solid to rounding.
describe('a very thick layer answers as a semi-infinite solid', () => {
  for (const one of referenceCases('02b-transient-conduction.json', /^periodic-semi-inf-/)) {
    test(caseName(one), () => {
      const [lambda, rho, c] = ['lambda', 'rho', 'c'].map((key) => inputNumber(one, key));
      const periodS = inputNumber(one, 'period_h') * 3600;
      const depth = penetrationDepthM(lambda, rho, c, periodS);
      const thick = wallDynamics([solid(18 * depth, lambda, rho, c)], 0, 0, periodS);
      const y = thick.insideAdmittanceWPerM2K;
      const lead = (thick.insideLeadH * 3600 * 2 * Math.PI) / periodS;
      const toH = periodS / 3600 / (2 * Math.PI);
      const inside = inputNumbers(one, 'x').map((x) => {
        const { z11, z12 } = layerMatrix(solid(x, lambda, rho, c), periodS);
        const re = z11.re + y * (z12.re * Math.cos(lead) - z12.im * Math.sin(lead));
        const im = z11.im + y * (z12.re * Math.sin(lead) + z12.im * Math.cos(lead));
        const lag = -Math.atan2(im, re);
        return { ratio: Math.hypot(re, im), lag: (lag < 0 ? lag + 2 * Math.PI : lag) * toH };
      });
      const h = inputNumber(one, 'h');
      const re = 1 + (y / h) * Math.cos(lead); // air over surface temperature
      const im = (y / h) * Math.sin(lead);
      expectCase(one, {
        damping_depth: depth,
        amplitude_ratio: inside.map((at) => at.ratio),
        lag_h: inside.map((at) => at.lag),
        effusivity: y / Math.sqrt((2 * Math.PI) / periodS),
        admittance: y,
        admittance_lead_h: thick.insideLeadH,
        surface_ratio: 1 / Math.hypot(re, im),
        surface_lag_h: Math.atan2(im, re) * toH,
      });
    });
  }
  for (const one of referenceCases('02b-transient-conduction.json', /^periodic-depth-/)) {
    test(caseName(one), () => {
      const [rho, c] = [inputNumbers(one, 'rho'), inputNumbers(one, 'c')];
      const periodS = inputNumber(one, 'period_h') * 3600;
      const depths = inputNumbers(one, 'lambda').map((l, i) =>
        penetrationDepthM(l, rho[i], c[i], periodS),
      );
      expectCase(one, { damping_depth: depths });
    });
  }
});

test('a transfer matrix has determinant one, as reciprocity asks', () => {
  for (const d of [0.01, 0.1, 0.4]) {
    const z = layerMatrix(solid(d, 0.8, 1800, 900), 86400);
    const re =
      z.z11.re * z.z22.re - z.z11.im * z.z22.im - z.z12.re * z.z21.re + z.z12.im * z.z21.im;
    const im =
      z.z11.re * z.z22.im + z.z11.im * z.z22.re - z.z12.re * z.z21.im - z.z12.im * z.z21.re;
    expect(re).toBeCloseTo(1, 9);
    expect(im).toBeCloseTo(0, 9);
  }
});
