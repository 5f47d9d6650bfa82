// Standard glazing by EN 673 and windows by ISO 10077-1 against 03-steady-u-values.json.
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
import { inputAs } from './case-inputs.ts';

const file = '03-steady-u-values.json';

function each(ids: RegExp, body: (one: ReferenceCase, n: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    test(caseName(one), () => body(one, (key) => inputNumber(one, key)));
  }
}

interface CaseGap {
  readonly s: number;
  readonly e1: number;
  readonly e2: number;
  readonly gas: Readonly<Record<string, number>>;
}

const tilts: Readonly<Record<string, number>> = { vertical: 90, '45deg': 45, horizontal: 0 };

describe('EN 673', () => {
  each(/^en673-/, (one, n) => {
    const gaps = inputAs<CaseGap[]>(one, 'gaps').map((gap) => ({
      thicknessM: gap.s,
      emissivity1: gap.e1,
      emissivity2: gap.e2,
      filling: Object.entries(gap.gas).map(([gas, share]) => ({
        gas: gas as physics.FillGas,
        share,
      })),
    }));
    const tiltDeg = tilts[inputText(one, 'position')] ?? Number.NaN;
    const found = physics.glazingTransmittance({
      panesM2KPerW: inputNumbers(one, 'panes_mm').map((mm) => mm / 1000),
      gaps,
      tiltDeg,
      outsideWPerM2K: n('he'),
      insideWPerM2K: n('hi'),
    });
    const convective = found.convectiveWPerM2K;
    expectCase(one, {
      U: found.uValueWPerM2K,
      h_gap: convective.map((h, i) => h + (found.radiativeWPerM2K[i] ?? Number.NaN)),
      h_radiative: found.radiativeWPerM2K,
      h_convective: convective,
      Nu: gaps.map((gap, i) => {
        const gas = physics.mixtureProperties(gap.filling, 10);
        const k = found.differenceK[i] ?? Number.NaN;
        return physics.gapNusselt(physics.gapRayleigh(gas, gap.thicknessM, k, 283), tiltDeg);
      }),
      dT_gap: found.differenceK,
    });
  });

  each(/^glazing-table-/, (one, n) => {
    const gases = inputAs<physics.FillGas[]>(one, 'gas');
    const layers = one.id.includes('triple') ? 2 : 1;
    const coated = physics.correctedEmissivity(n('eps_n'));
    const U = inputNumbers(one, 'gap_mm').map((mm, i) => {
      const gas = gases[i] ?? 'air';
      const gap: physics.GlazingGap = {
        thicknessM: mm / 1000,
        emissivity1: physics.plainGlassEmissivity,
        emissivity2: coated,
        filling:
          gas === 'air'
            ? [{ gas, share: 1 }]
            : [
                { gas, share: 0.9 },
                { gas: 'air', share: 0.1 },
              ],
      };
      return physics.glazingTransmittance({
        panesM2KPerW: new Array<number>(layers + 1).fill(n('panes_mm') / 1000),
        gaps: new Array<physics.GlazingGap>(layers).fill(gap),
        tiltDeg: 90,
        outsideWPerM2K: physics.glazingOutsideWPerM2K,
        insideWPerM2K: physics.glazingInsideWPerM2K,
      }).uValueWPerM2K;
    });
    expectCase(one, { U });
  });

  test('plain glass has the corrected emissivity 0.837 from its normal 0.89 (EN 673)', () => {
    expect(physics.correctedEmissivity(0.89)).toBeCloseTo(0.837, 3);
  });
  test('between the three positions of the standard the Nusselt number moves evenly', () => {
    const at = (tilt: number) => physics.gapNusselt(20000, tilt);
    expect(at(67.5)).toBeCloseTo((at(45) + at(90)) / 2, 12);
    expect(at(22.5)).toBeCloseTo((at(0) + at(45)) / 2, 12);
  });
  test('gas density falls as the absolute temperature rises (ideal gas, within 1 %)', () => {
    for (const gas of ['air', 'argon', 'krypton', 'xenon', 'sulphur-hexafluoride'] as const) {
      const cold = physics.gasProperties(gas, -10).densityKgPerM3 * 263.15;
      const warm = physics.gasProperties(gas, 20).densityKgPerM3 * 293.15;
      expect(Math.abs(cold / warm - 1)).toBeLessThan(0.01);
    }
  });
});

describe('ISO 10077-1', () => {
  each(/^window-/, (one, n) => {
    const parts = physics.windowParts(n('width'), n('height'), n('frame_width'), n('n_panes'));
    expectCase(one, {
      area_window: parts.windowAreaM2,
      area_glass: parts.glassAreaM2,
      area_frame: parts.frameAreaM2,
      length_edge: parts.edgeLengthM,
      U_w: physics.windowUValueWPerM2K(parts, n('U_g'), n('U_f'), n('psi_g')),
    });
  });
  each(/^shutter-/, (one, n) => {
    const dR = physics.shutterResistanceM2KPerW(
      n('R_shutter'),
      inputText(one, 'tightness') as physics.ShutterPermeability,
    );
    expectCase(one, { dR, U_ws: physics.shutteredUValueWPerM2K(n('U_w'), dR) });
  });
  each(/^double-window-/, (one, n) => {
    expectCase(one, {
      U_w: physics.doubleWindowUValueWPerM2K(n('U_w1'), n('U_w2'), n('R_gap')),
    });
  });
  test('a frame that leaves no glass is refused by name', () => {
    expect(() => physics.windowParts(0.4, 0.4, 0.2, 1)).toThrow('leaves no glass');
  });
});
