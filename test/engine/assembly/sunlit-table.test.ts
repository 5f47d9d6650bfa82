// The table of sunlit shares against the exact shadow that it stands for (law: the same geometry), at
// random suns and over the course of days.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { sunlitTable } from '../../../engine/assembly/sunlit-table.ts';
import {
  type ShadedWindow,
  sunFromWindow,
  sunlitByLines,
  sunlitFraction,
} from '../../../engine/physics/index.ts';

const shades: ShadedWindow[] = [
  { widthM: 1.8, heightM: 1.4, revealM: 0.1 },
  {
    widthM: 3,
    heightM: 2,
    revealM: 0,
    overhang: { depthM: 1, gapM: 0.5, leftM: 0.5, rightM: 4.5 },
  },
  {
    widthM: 1.2,
    heightM: 1.5,
    revealM: 0.08,
    overhang: { depthM: 0.6, gapM: 0.1, leftM: 0.2, rightM: 0.2 },
    rightFin: { depthM: 0.8, gapM: 0.1, aboveM: 0.1, belowM: 0 },
  },
];

test('the light that a looked-up share lets in is within 0.02 of the exact, per unit of beam, for any sun', () => {
  for (const window of shades) {
    const litAt = sunlitTable((sun) => sunlitFraction(window, sun));
    fc.assert(
      fc.property(
        fc.double({ min: -88, max: 88, noNaN: true }),
        fc.double({ min: 0.5, max: 88, noNaN: true }),
        (turn, altitude) => {
          const sun = sunFromWindow(90, 180, 180 + turn, altitude);
          return sun.out * Math.abs(litAt(sun) - sunlitFraction(window, sun)) < 0.02;
        },
      ),
      { numRuns: 400 },
    );
  }
});

test('weighted by the cosine of incidence over a spread of suns, the mean differs by less than 0.002', () => {
  for (const window of shades) {
    const litAt = sunlitTable((sun) => sunlitFraction(window, sun));
    let off = 0;
    let weight = 0;
    for (let turn = -87; turn <= 87; turn += 1.7)
      for (let altitude = 2; altitude < 75; altitude += 1.3) {
        const sun = sunFromWindow(90, 180, 180 + turn, altitude);
        off += sun.out * (litAt(sun) - sunlitFraction(window, sun));
        weight += sun.out;
      }
    expect(Math.abs(off / weight)).toBeLessThan(0.002);
  }
});

test('a sun behind the face lights nothing', () => {
  expect(sunlitTable((sun) => sunlitFraction(shades[0], sun))(sunFromWindow(90, 180, 0, 30))).toBe(
    0,
  );
});

test('a share read along lines is within 0.005 of the exact cut, but for slivers at grazing sun', () => {
  for (const window of shades) {
    const byLines = sunlitByLines(window);
    fc.assert(
      fc.property(
        fc.double({ min: -80, max: 80, noNaN: true }),
        fc.double({ min: -80, max: 80, noNaN: true }),
        (turn, altitude) => {
          const sun = sunFromWindow(90, 180, 180 + turn, altitude);
          return sun.out * Math.abs(byLines(sun) - sunlitFraction(window, sun)) < 0.005;
        },
      ),
      { numRuns: 1000 },
    );
  }
});
