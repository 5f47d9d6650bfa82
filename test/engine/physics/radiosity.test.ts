import { describe, expect, test } from 'vitest';
import { solveDense } from '../../../engine/physics/dense.ts';
import {
  absorptionFactors,
  blackCoefficientWPerM2K,
  greyExchangeAreasM2,
  greyPairExchangeM2,
  stefanBoltzmannWPerM2K4 as sigma,
  starExchangeAreasM2,
} from '../../../engine/physics/radiosity.ts';
import { boxViewFactors } from '../../../engine/physics/view-factors.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '07-radiation-exchange.json';

function enclosure(one: ReferenceCase) {
  const areaM2 = Float64Array.from(inputNumbers(one, 'areas'));
  const factors = one.inputs.F_matrix as unknown as readonly (readonly number[])[];
  const exchangeM2 = Float64Array.from(factors.flatMap((row, i) => row.map((f) => f * areaM2[i])));
  return { areaM2, exchangeM2, emissivity: inputNumbers(one, 'emissivity') };
}

/** Black emissive powers where some are given and the net flow of the others is [W, leaving]. */
function emissivePowers(
  x: Float64Array,
  known: readonly (number | null)[],
  leavingW: readonly number[],
) {
  const n = known.length;
  const a = new Float64Array(n * n);
  const b = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const given = known[i];
    if (given !== null) {
      a[i * n + i] = 1;
      b[i] = given;
      continue;
    }
    for (let j = 0; j < n; j++)
      if (j !== i) {
        a[i * n + i] += x[i * n + j];
        a[i * n + j] -= x[i * n + j];
      }
    b[i] = leavingW[i];
  }
  solveDense(a, b, n);
  return b;
}

const leaving = (x: Float64Array, e: Float64Array) =>
  e.map((own, i) => e.reduce((s, other, j) => s + x[i * e.length + j] * (own - other), 0));

describe('grey enclosures', () => {
  for (const one of referenceCases(file, /^enclosure-[36]/)) {
    test(caseName(one), () => {
      const { areaM2, exchangeM2, emissivity } = enclosure(one);
      const x = greyExchangeAreasM2(areaM2, exchangeM2, emissivity);
      const temperatures = one.inputs.temperatures as unknown as readonly (number | null)[];
      const given = new Array<number>(areaM2.length).fill(0);
      for (const [i, q] of one.inputs.net_flow_given as unknown as readonly (readonly [
        number,
        number,
      ])[])
        given[i] = q * areaM2[i];
      const known = temperatures.map((t) => (t === null ? null : sigma * (t + 273.15) ** 4));
      const e = emissivePowers(x, known, given);
      const flow = leaving(x, e);
      const flux = flow.map((q, i) => q / areaM2[i]);
      expectCase(one, {
        net_flow: flow,
        net_flux: flux,
        radiosity: e.map((own, i) => own - (flux[i] * (1 - emissivity[i])) / emissivity[i]),
        temperature_out: e.map((own) => (own / sigma) ** 0.25 - 273.15),
        sum_net_flow: flow.reduce((s, q) => s + q, 0),
      });
    });
  }
  for (const one of referenceCases(file, /^enclosure-oven/)) {
    test(caseName(one), () => {
      const { areaM2, exchangeM2, emissivity } = enclosure(one);
      const x = greyExchangeAreasM2(areaM2, exchangeM2, emissivity);
      const kelvin = one.inputs.temperature_K as unknown as readonly (number | null)[];
      const e = emissivePowers(
        x,
        kelvin.map((t) => (t === null ? null : sigma * t ** 4)),
        [0, 0, 0],
      );
      expectCase(one, { q_kW_per_m: leaving(x, e)[0] / 1000, T_insulated: (e[1] / sigma) ** 0.25 });
    });
  }
  for (const one of referenceCases(file, /^absorption-factors/)) {
    test(caseName(one), () => {
      const { areaM2, exchangeM2, emissivity } = enclosure(one);
      const g = absorptionFactors(areaM2, exchangeM2, emissivity);
      const n = areaM2.length;
      const rows = [...areaM2].map((_, i) => g.slice(i * n, i * n + n));
      expectCase(one, {
        G_matrix: rows,
        row_sums: rows.map((row) => row.reduce((s, v) => s + v, 0)),
      });
    });
  }

  test('total exchange areas are symmetric and rows add up to ε·A, a covered face among them', () => {
    const box = { lengthM: 5, widthM: 4, heightM: 2.5 };
    const glass = { face: 'front', u0M: 0, u1M: 5, v0M: 0, v1M: 2.5 } as const;
    const { areaM2, exchangeM2 } = boxViewFactors(box, [glass]);
    const emissivity = [0.9, 0.9, 0.9, 0.05, 0.6, 0, 0.84];
    const x = greyExchangeAreasM2(areaM2, exchangeM2, emissivity);
    for (let i = 0; i < 7; i++) {
      let row = 0;
      for (let j = 0; j < 7; j++) {
        row += x[i * 7 + j];
        expect(x[i * 7 + j]).toBe(x[j * 7 + i]);
      }
      expect(row).toBeCloseTo(emissivity[i] * areaM2[i], 11);
    }
  });
});

describe('two surfaces', () => {
  for (const one of referenceCases(file, /^(two-plates|one-shield|enclosed-body)-/)) {
    test(caseName(one), () => {
      const number = (key: string) => inputNumber(one, key);
      const [e1, e2] = [number('eps1'), number('eps2')];
      const ratio = 'area_ratio' in one.inputs ? number('area_ratio') : 1;
      const drive = sigma * (number('T1') ** 4 - number('T2') ** 4);
      if ('eps_shield' in one.inputs) {
        const es = number('eps_shield');
        const series = 1 / greyPairExchangeM2(1, 1, e1, es) + 1 / greyPairExchangeM2(1, 1, es, e2);
        expectCase(one, { q: drive / series });
      } else expectCase(one, { q: drive * greyPairExchangeM2(1, 1 / ratio, e1, e2) });
    });
  }
  for (const one of referenceCases(file, /^linear-hr-/)) {
    test(caseName(one), () => {
      const pair = greyPairExchangeM2(1, 1, inputNumber(one, 'eps1'), inputNumber(one, 'eps2'));
      expectCase(one, { h_r: blackCoefficientWPerM2K(inputNumber(one, 'T_mean')) * pair });
    });
  }
});

describe('mean radiant node', () => {
  test('two equal parallel plates are exact: the star is two halves of 1/(2/ε − 1)', () => {
    const x = starExchangeAreasM2(Float64Array.of(3, 3), [0.8, 0.8]);
    expect(1 / (1 / x[0] + 1 / x[1])).toBeCloseTo(greyPairExchangeM2(3, 3, 0.8, 0.8), 9);
  });

  test('a room with a cold window loses within 3 % of what the full enclosure says', () => {
    const window = { face: 'front', u0M: 1, u1M: 3, v0M: 0.9, v1M: 2.1 } as const;
    const { areaM2, exchangeM2 } = boxViewFactors({ lengthM: 5, widthM: 4, heightM: 2.5 }, [
      window,
    ]);
    const emissivity = [0.9, 0.9, 0.9, 0.9, 0.9, 0.9, 0.84];
    const e = Float64Array.from([21, 20, 20, 20, 20, 20, 8], (t) => sigma * (t + 273.15) ** 4);
    const exact = leaving(greyExchangeAreasM2(areaM2, exchangeM2, emissivity), e)[6];
    const star = starExchangeAreasM2(areaM2, emissivity);
    const total = star.reduce((s, v) => s + v, 0);
    const mean = star.reduce((s, v, i) => s + v * e[i], 0) / total;
    expect(Math.abs((star[6] * (e[6] - mean)) / exact - 1)).toBeLessThan(0.03);
  });
});

test('elimination solves a system that needs row exchange', () => {
  const a = Float64Array.of(0, 2, 1, 1, 1, 1, 2, 1, -1);
  const b = Float64Array.of(7, 6, 1); // x = (1, 2, 3)
  solveDense(a, b, 3);
  for (const [i, x] of [1, 2, 3].entries()) expect(b[i]).toBeCloseTo(x, 12);
  expect(() => solveDense(Float64Array.of(1, 2, 2, 4), Float64Array.of(1, 1), 2)).toThrow(
    'singular',
  );
});
