import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  beamAbsorptance,
  beamTransmittance,
  glazingAngles,
} from '../../../engine/physics/glazing-angles.ts';
import {
  beamShares,
  diffuseShares,
  type GlazingShares,
} from '../../../engine/physics/glazing-stack.ts';
import {
  faceReflectance,
  glassPane,
  type PaneOptics,
  paneShares,
  uncoatedPane,
} from '../../../engine/physics/pane-optics.ts';
import { secondaryHeatFactor, solarFactor } from '../../../engine/physics/solar-factor.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';

const file = '10-glazing-optics-and-films.json';
const cosine = (deg: number) => Math.cos((deg * Math.PI) / 180);

describe('Fresnel optics', () => {
  for (const one of referenceCases(file, /^db-glass/)) {
    test(caseName(one), () => {
      const n = inputNumber(one, 'n');
      const mean = (deg: number) =>
        (faceReflectance(n, cosine(deg), 'parallel') +
          faceReflectance(n, cosine(deg), 'perpendicular')) /
        2;
      expectCase(one, { reflectance_surface: inputNumbers(one, 'incidence').map(mean) });
    });
  }
  for (const one of referenceCases(file, /^db-two-covers/)) {
    test(caseName(one), () => {
      const pane: PaneOptics = {
        kind: 'uncoated',
        refractiveIndex: inputNumber(one, 'n'),
        opticalDepth: 0,
      };
      const panes = new Array<PaneOptics>(inputNumber(one, 'n_covers')).fill(pane);
      expectCase(one, {
        transmittance: inputNumbers(one, 'incidence').map(
          (d) => beamShares(panes, cosine(d)).transmittance,
        ),
      });
    });
  }
  for (const one of referenceCases(file, /^(double-)?pane-/)) {
    test(caseName(one), () => {
      const refractiveIndex = inputNumber(one, 'n');
      const panes = inputNumbers(one, 'KL').map(
        (opticalDepth): PaneOptics => ({ kind: 'uncoated', refractiveIndex, opticalDepth }),
      );
      const shares = inputNumbers(one, 'incidence').map((deg) => beamShares(panes, cosine(deg)));
      const pane = (p: number) => shares.map((s) => s.absorptance[p]);
      expectCase(one, {
        transmittance: shares.map((s) => s.transmittance),
        reflectance: shares.map((s) => s.reflectance),
        ...(panes.length === 1
          ? { absorptance: pane(0) }
          : { absorptance_1: pane(0), absorptance_2: pane(1) }),
        transmittance_hemispherical: diffuseShares(panes).transmittance,
      });
    });
  }
});

describe('solar factor', () => {
  for (const one of referenceCases(file, /^solar-factor-/)) {
    test(caseName(one), () => {
      const number = (key: string) => inputNumber(one, key);
      const absorbed = [number('alpha_e1'), number('alpha_e2')];
      const films = [number('h_e'), number('h_i')] as const;
      expectCase(one, {
        q_i: secondaryHeatFactor(absorbed, [number('Lambda')], ...films),
        g: solarFactor(number('tau_e'), absorbed, [number('Lambda')], ...films),
      });
    });
  }
});

// fabric-cases.md, section 4: two panes of normal transmittance 0.834, index 1.526.
describe('the clear double glazing of the fabric cases', () => {
  const pane = glassPane(0.834);
  const table = glazingAngles([pane, pane]);
  const rows = [
    // degrees, transmittance, absorbed outer, absorbed inner
    [0, 0.7, 0.096, 0.075],
    [10, 0.699, 0.096, 0.076],
    [20, 0.696, 0.098, 0.077],
    [30, 0.69, 0.101, 0.079],
    [40, 0.678, 0.105, 0.081],
    [50, 0.653, 0.11, 0.083],
    [60, 0.597, 0.117, 0.083],
    [70, 0.464, 0.126, 0.076],
    [80, 0.215, 0.133, 0.056],
  ] as const;
  test.each(rows)(
    'at %i° it has the published shares within 0.002',
    (deg, through, outer, inner) => {
      const c = cosine(deg);
      expect(Math.abs(beamTransmittance(table, c) - through)).toBeLessThan(0.002);
      expect(Math.abs(beamAbsorptance(table, 0, c) - outer)).toBeLessThan(0.002);
      expect(Math.abs(beamAbsorptance(table, 1, c) - inner)).toBeLessThan(0.002);
    },
  );
  test('from the hemisphere too', () => {
    expect(Math.abs(table.diffuse.transmittance - 0.611)).toBeLessThan(0.002);
    expect(Math.abs(table.diffuse.absorptance[0] - 0.11)).toBeLessThan(0.002);
    expect(Math.abs(table.diffuse.absorptance[1] - 0.078)).toBeLessThan(0.002);
  });
  test('the pane has the normal transmittance that was asked for', () => {
    expect(paneShares(pane, 1, 'parallel').transmittance).toBeCloseTo(0.834, 12);
  });
  test('looking the table up between degrees errs by less than 4e-4 up to 80°, 2e-3 beyond', () => {
    for (let deg = 0.5; deg < 90; deg += 0.5) {
      const width = deg < 80 ? 4e-4 : 2e-3;
      const exact = beamShares([pane, pane], cosine(deg));
      const through = beamTransmittance(table, cosine(deg));
      const absorbed = beamAbsorptance(table, 1, cosine(deg));
      expect(Math.abs(through - exact.transmittance), `${deg}°`).toBeLessThan(width);
      expect(Math.abs(absorbed - exact.absorptance[1]), `${deg}°`).toBeLessThan(width);
    }
    expect(beamTransmittance(table, -0.3)).toBe(0);
  });
});

const share = fc.double({ min: 0.02, max: 0.9, noNaN: true });
const panes = fc.array(
  fc.oneof(
    fc.record({
      kind: fc.constant('uncoated' as const),
      refractiveIndex: fc.double({ min: 1.3, max: 1.8, noNaN: true }),
      opticalDepth: fc.double({ min: 0, max: 2, noNaN: true }),
    }),
    fc.tuple(share, share, share).map(([t, f, b]) => ({
      kind: 'coated' as const,
      transmittance: t * 0.9,
      frontReflectance: f * (1 - t * 0.9),
      backReflectance: b * (1 - t * 0.9),
    })),
  ),
  { minLength: 1, maxLength: 4 },
);

// The definition by the midpoint rule in μ = cos θ with 20 000 points; four panes, one of them coated.
test('the hemispherical values meet a fine sum over all angles within 1e-5', () => {
  const stack: PaneOptics[] = [
    glassPane(0.85),
    { kind: 'coated', transmittance: 0.6, frontReflectance: 0.2, backReflectance: 0.3 },
    glassPane(0.8),
    glassPane(0.9),
  ];
  const n = 20_000;
  let through = 0;
  let inner = 0;
  for (let k = 0; k < n; k++) {
    const mu = (k + 0.5) / n;
    const s = beamShares(stack, mu);
    through += (2 * mu * s.transmittance) / n;
    inner += (2 * mu * s.absorptance[3]) / n;
  }
  const found = diffuseShares(stack);
  expect(Math.abs(found.transmittance - through)).toBeLessThan(1e-5);
  expect(Math.abs(found.absorptance[3] - inner)).toBeLessThan(1e-5);
});

describe('laws that any stack keeps', () => {
  const total = (s: GlazingShares) =>
    s.transmittance + s.reflectance + s.absorptance.reduce((a, b) => a + b, 0);

  test('all light is passed, reflected or absorbed, from either side, and nothing is negative', () => {
    fc.assert(
      fc.property(panes, fc.double({ min: 0.01, max: 1, noNaN: true }), (stack, c) => {
        for (const s of [
          beamShares(stack, c),
          beamShares(stack, c, 'inside'),
          diffuseShares(stack),
        ]) {
          expect(total(s)).toBeCloseTo(1, 9);
          expect(s.transmittance).toBeGreaterThanOrEqual(0);
          for (const a of s.absorptance) expect(a).toBeGreaterThan(-1e-12);
        }
      }),
    );
  });

  test('as much light passes inwards as outwards, for each direction of a stack (reciprocity)', () => {
    fc.assert(
      fc.property(panes, fc.double({ min: 0.01, max: 1, noNaN: true }), (stack, c) => {
        const [a, b] = [beamShares(stack, c), beamShares(stack, c, 'inside')];
        expect(a.transmittance).toBeCloseTo(b.transmittance, 12);
      }),
    );
  });

  test('a pane turned round has its sides exchanged', () => {
    const coated: PaneOptics = {
      kind: 'coated',
      transmittance: 0.6,
      frontReflectance: 0.15,
      backReflectance: 0.3,
    };
    const turned: PaneOptics = { ...coated, frontReflectance: 0.3, backReflectance: 0.15 };
    const clear = glassPane(0.85);
    const a = beamShares([clear, coated], 0.7, 'inside');
    const b = beamShares([turned, clear], 0.7);
    expect(a.reflectance).toBeCloseTo(b.reflectance, 12);
    expect(a.absorptance[0]).toBeCloseTo(b.absorptance[1], 12);
  });

  test('a coated pane has its given values at normal incidence and reflects all at grazing', () => {
    const coated: PaneOptics = {
      kind: 'coated',
      transmittance: 0.6,
      frontReflectance: 0.15,
      backReflectance: 0.3,
    };
    const normal = beamShares([coated], 1);
    expect(normal.transmittance).toBeCloseTo(0.6, 12);
    expect(normal.reflectance).toBeCloseTo(0.15, 12);
    expect(beamShares([coated], 1e-9).reflectance).toBeCloseTo(1, 6);
  });

  test('index and depth come back from the normal values that they give', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1.3, max: 1.9, noNaN: true }),
        fc.double({ min: 0.001, max: 1.5, noNaN: true }),
        (refractiveIndex, opticalDepth) => {
          const s = beamShares([{ kind: 'uncoated', refractiveIndex, opticalDepth }], 1);
          const back = uncoatedPane(s.transmittance, s.reflectance);
          const again = beamShares([back], 1);
          expect(again.transmittance).toBeCloseTo(s.transmittance, 9);
          expect(again.reflectance).toBeCloseTo(s.reflectance, 9);
          if (back.kind === 'uncoated')
            expect(back.refractiveIndex).toBeCloseTo(refractiveIndex, 5);
        },
      ),
    );
  });
});
