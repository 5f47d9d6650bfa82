// Panes with a blind before, between or behind: laws of light, limits with known answers, and the
// simplified method of EN 13363-1 (from memory), which states that it errs to the safe side.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  beamShares,
  diffuseShares,
  glassPane,
  type LayeredAngles,
  layerChainHeat,
  layeredAngles,
  layeredSolarFactor,
  type PaneOptics,
  paneStack,
  type ScatteringLayer,
  secondaryHeatFactor,
  simplifiedShadedSolarFactor,
} from '../../../engine/physics/index.ts';

const clear = glassPane(0.834);
const coated: PaneOptics = {
  kind: 'coated',
  transmittance: 0.58,
  frontReflectance: 0.27,
  backReflectance: 0.32,
};

const blinds = fc
  .record({
    passed: fc.double({ min: 0, max: 1, noNaN: true }),
    holes: fc.double({ min: 0, max: 1, noNaN: true }),
    front: fc.double({ min: 0, max: 1, noNaN: true }),
    back: fc.double({ min: 0, max: 1, noNaN: true }),
  })
  .map(({ passed, holes, front, back }): ScatteringLayer => {
    const transmittance = 0.9 * passed;
    return {
      transmittance,
      openness: transmittance * holes,
      frontReflectance: (1 - transmittance) * front,
      backReflectance: (1 - transmittance) * back,
    };
  });
const stacks = fc.array(fc.constantFrom(clear, coated), { minLength: 0, maxLength: 2 });

describe('any panes, any blind', () => {
  test('no share is negative, and even light is passed, thrown back and absorbed to the last bit', () => {
    fc.assert(
      fc.property(stacks, blinds, stacks, (front, blind, rear) => {
        const whole = layeredAngles(paneStack(front), blind, paneStack(rear));
        for (const shares of [whole.diffuse, whole.diffuseFromInside]) {
          const kept = shares.absorptance.reduce((sum, a) => sum + a, 0);
          expect(shares.transmittance + shares.reflectance + kept).toBeCloseTo(1, 12);
          for (const share of [shares.transmittance, shares.reflectance, ...shares.absorptance])
            expect(share).toBeGreaterThan(-1e-12);
        }
      }),
      { numRuns: 40, seed: 5 },
    );
  });

  test('even light passes as well one way as the other', () => {
    // Reciprocity for diffuse reflectors and panes alike on both sides.
    fc.assert(
      fc.property(blinds, (blind) => {
        const { diffuse, diffuseFromInside } = layeredAngles(
          paneStack([clear]),
          blind,
          paneStack([clear, clear]),
        );
        expect(diffuse.transmittance).toBeCloseTo(diffuseFromInside.transmittance, 12);
      }),
      { numRuns: 30, seed: 6 },
    );
  });

  test('a beam is never more than passed, scattered or absorbed, and all of it is where nothing reflects', () => {
    fc.assert(
      fc.property(stacks, blinds, stacks, (front, blind, rear) => {
        const whole = layeredAngles(paneStack(front), blind, paneStack(rear));
        for (const k of [0, 30, 60, 80]) {
          const taken = takenAt(whole, k);
          expect(taken).toBeLessThan(1 + 1e-12);
          expect(taken).toBeGreaterThan(-1e-12);
        }
      }),
      { numRuns: 30, seed: 7 },
    );
    const black = { transmittance: 0.2, openness: 0.1, frontReflectance: 0, backReflectance: 0 };
    expect(takenAt(layeredAngles(paneStack([]), black, paneStack([])), 20)).toBeCloseTo(1, 14);
  });
});

function takenAt(whole: LayeredAngles, k: number): number {
  const { layerCount, transmittance, scattered, absorptance } = whole;
  let sum = transmittance[k] + (scattered?.[k] ?? 0);
  for (let l = 0; l < layerCount; l++) sum += absorptance[k * layerCount + l];
  return sum;
}

describe('limits', () => {
  const panes = [clear, coated];
  const opaque = { transmittance: 0, openness: 0, frontReflectance: 0.7, backReflectance: 0.7 };
  const gone = { transmittance: 1, openness: 1, frontReflectance: 0, backReflectance: 0 };

  test('a blind that is all hole leaves the glazing as it was, outside and inside', () => {
    for (const whole of [
      layeredAngles(paneStack([]), gone, paneStack(panes)),
      layeredAngles(paneStack(panes), gone, paneStack([])),
    ]) {
      for (const k of [0, 40, 70]) {
        const bare = beamShares(panes, Math.cos((k * Math.PI) / 180));
        expect(whole.transmittance[k]).toBeCloseTo(bare.transmittance, 12);
        expect(whole.scattered?.[k]).toBeCloseTo(0, 12);
      }
      expect(whole.diffuse.transmittance).toBeCloseTo(diffuseShares(panes).transmittance, 12);
      expect(whole.diffuseFromInside.reflectance).toBeCloseTo(
        diffuseShares(panes, 'inside').reflectance,
        12,
      );
    }
  });

  test('between two panes it differs from the bare unit by less than 0.035: polarisation is averaged', () => {
    // The worst case: the error falls with the holes, under 0.005 for a blind with a tenth of them.
    const whole = layeredAngles(paneStack([clear]), gone, paneStack([clear]));
    for (let k = 0; k <= 80; k += 5) {
      const bare = beamShares([clear, clear], Math.cos((k * Math.PI) / 180));
      expect(Math.abs(whole.transmittance[k] - bare.transmittance)).toBeLessThan(0.035);
    }
  });

  test('nothing passes an opaque blind, and outside it absorbs exactly what it does not reflect', () => {
    const whole = layeredAngles(paneStack([]), opaque, paneStack(panes));
    for (const k of [0, 50, 85]) {
      expect(takenAt(whole, k)).toBeCloseTo(0.3, 12);
      expect(whole.absorptance[k * 3]).toBeCloseTo(0.3, 12);
    }
    expect(whole.diffuse.transmittance).toBe(0);
  });

  // One pane τ 0.8, ρ 0.1 and an opaque blind ρ 0.5 behind it, by the geometric series:
  // the blind meets 0.8/(1 − 0.1·0.5) = 0.842105 and keeps half of it, 0.421053.
  test('pane and blind reflect to and fro as the geometric series has it', () => {
    const flat: PaneOptics = {
      kind: 'coated',
      transmittance: 0.8,
      frontReflectance: 0.1,
      backReflectance: 0.1,
    };
    const even = { transmittance: 0.8, reflectance: 0.1, absorptance: Float64Array.of(0.1) };
    const stack = { ...paneStack([flat]), even: { front: even, back: even } };
    const blind = { transmittance: 0, openness: 0, frontReflectance: 0.5, backReflectance: 0.5 };
    const whole = layeredAngles(stack, blind, paneStack([]));
    expect(whole.diffuse.absorptance[1]).toBeCloseTo(0.421053, 6);
    expect(whole.absorptance[1]).toBeCloseTo(0.421053, 6);
    // Back out: 0.1 + 0.8²·0.5/(1 − 0.05) = 0.436842.
    expect(whole.diffuse.reflectance).toBeCloseTo(0.436842, 6);
  });
});

describe('heat through layers', () => {
  test('panes alone give the U-value in series and the inward shares of EN 410', () => {
    const { uValueWPerM2K, inwardShare } = layerChainHeat({
      betweenWPerM2K: [2.5, 4],
      outdoorsWPerM2K: [23, 0, 0],
      roomWPerM2K: [0, 0, 8],
    });
    expect(uValueWPerM2K).toBeCloseTo(1 / (1 / 23 + 1 / 2.5 + 1 / 4 + 1 / 8), 12);
    const absorptance = [0.12, 0.08, 0.05];
    expect(layeredSolarFactor(0, absorptance, inwardShare)).toBeCloseTo(
      secondaryHeatFactor(absorptance, [2.5, 4], 23, 8),
      12,
    );
  });

  // Double clear, U 2.9 and g 0.76, behind an outside blind of ρ 0.7, τ 0.1, worked by hand: G = 1/(1/2.9 + 0.2 + 0.1) = 1.5508,
  // 0.1·0.76 + 0.2·1.5508/10 + 0.1·0.24·1.5508/5 = 0.076 + 0.03102 + 0.00744.
  test('the simplified method is the formula worked by hand', () => {
    expect(simplifiedShadedSolarFactor('outside', 2.9, 0.76, 0.1, 0.7)).toBeCloseTo(0.11446, 4);
  });
});
