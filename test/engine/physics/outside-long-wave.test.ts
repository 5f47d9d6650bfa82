// Long-wave exchange and sol-air temperature outdoors: test/reference/06-air-and-sky.json.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { longWaveGainWPerM2, outsideViews, solAirC } from '../../../engine/physics/index.ts';
import { caseName, expectCase, inputNumber, referenceCases } from '../../reference/cases.ts';

const file = '06-air-and-sky.json';

for (const one of referenceCases(file, /^longwave-outside-/))
  test(caseName(one), () => {
    const n = (key: string) => inputNumber(one, key);
    const views = outsideViews(n('tilt'), true);
    const gain = (view: number, from: string) =>
      longWaveGainWPerM2(n('eps_surface'), view, n('t_surface'), n(from));
    expectCase(one, {
      sky_factor: views.sky + views.air,
      q_sky: gain(views.sky, 'sky_in'),
      q_air: gain(views.air, 't_air'),
      q_ground: gain(views.ground, 't_ground'),
    });
  });

for (const one of referenceCases(file, /^sol-air-/))
  test(caseName(one), () => {
    const n = (key: string) => inputNumber(one, key);
    // Half of the wall's view is sky; the rest is at air temperature and takes nothing.
    const sky = longWaveGainWPerM2(n('eps_surface'), 0.5, n('t'), n('sky_in'));
    expectCase(one, { t_equivalent: solAirC(n('t'), n('G'), n('absorptance'), sky, n('h_e')) });
  });

test('sky, low sky and ground fill the view of any face, and an unmixed sky has no low part', () => {
  fc.assert(
    fc.property(fc.double({ min: 0, max: 180, noNaN: true }), (tiltDeg) => {
      const { sky, air, ground } = outsideViews(tiltDeg, true);
      expect(sky + air + ground).toBeCloseTo(1, 12);
      expect(Math.min(sky, air, ground)).toBeGreaterThanOrEqual(-1e-15);
      expect(outsideViews(tiltDeg, false).air).toBe(0);
    }),
  );
});
