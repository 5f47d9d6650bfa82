import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  hourlySky,
  julianDay,
  kastenYoungAirMass,
  monthAndDay,
  type PlaneIrradiance,
  perezDiffuse,
  planeIrradiance,
  type Site,
  sunEphemeris,
  sunPosition,
  sunsetHourAngleDeg,
  sunTrack,
  type WeatherYear,
  weatherSteps,
  windowStartH,
} from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';
import { optionsFor, pvgisTable, testTable, tmy3Tables, yearOf } from '../shared-tables.ts';

const radPerDeg = Math.PI / 180;
const mean = (values: Float64Array) => values.reduce((a, b) => a + b, 0) / values.length;

describe('the sun at every step', () => {
  const places: Site[] = [
    hillside,
    { name: 'polar', latitudeDeg: 78.2, longitudeDeg: 15.6, elevationM: 10, utcOffsetH: 1 },
    { name: 'south', latitudeDeg: -34.6, longitudeDeg: -58.4, elevationM: 25, utcOffsetH: -3 },
    { name: 'date line', latitudeDeg: 1.4, longitudeDeg: 173, elevationM: 3, utcOffsetH: 12 },
  ];
  for (const site of places) {
    test(`is that of the full algorithm at the middle of the sunlit part (${site.name})`, () => {
      // The track interpolates a daily ephemeris and takes a short form of the parallax: 0.001 degrees.
      const sourceYear = new Int16Array(8760).fill(2021);
      sourceYear.fill(1987, 1416, 2160); // March from another year, as in a typical year
      const track = sunTrack({ site, hours: 8760, sourceYear }, 900);
      for (let k = 11; k < track.count; k += 97) {
        const { month, day } = monthAndDay(Math.floor(k / 96), 365);
        const middle =
          track.sunlitShare[k] > 0 ? (track.sunlitFrom[k] + track.sunlitTo[k]) / 2 : 0.5;
        const year = sourceYear[Math.floor(k / 4)];
        const hourOfDay = ((k % 96) + middle) / 4 - site.utcOffsetH;
        const exact = sunPosition(Date.UTC(year, month - 1, day) + hourOfDay * 3600000, site);
        expect(Math.abs(track.altitudeDeg[k] - exact.altitudeDeg)).toBeLessThan(0.001);
        const turn = ((track.azimuthDeg[k] - exact.azimuthDeg + 540) % 360) - 180;
        expect(Math.abs(turn) * Math.cos(exact.altitudeDeg * radPerDeg)).toBeLessThan(0.001);
        const length = Math.hypot(track.east[k], track.north[k], track.up[k]);
        expect(Math.abs(length - 1)).toBeLessThan(1e-8);
      }
    });
  }

  test("a day's sunlit time is that of the sunset hour angle", () => {
    // Closed form: cos ω = -tan φ · tan δ for the centre of the disc; the declination of noon serves
    // the whole day to 0.0005 of it, and the parallax takes 2 s (0.00003).
    for (const latitudeDeg of [0, 30, -45, 60]) {
      const site = { ...hillside, latitudeDeg };
      const track = sunTrack(
        { site, hours: 8760, sourceYear: new Int16Array(8760).fill(2021) },
        900,
      );
      for (let d = 0; d < 365; d += 5) {
        const noonMs = Date.UTC(2021, 0, 1 + d, 11);
        const { declinationDeg } = sunEphemeris(julianDay(noonMs));
        const share = sunsetHourAngleDeg(latitudeDeg, declinationDeg) / 180;
        const found = mean(track.sunlitShare.subarray(d * 96, d * 96 + 96));
        expect(Math.abs(found - share)).toBeLessThan(0.0005);
      }
    }
  });

  test('polar summer is sunlit all day, polar winter not at all', () => {
    const site = { ...hillside, latitudeDeg: 80 };
    const track = sunTrack(
      { site, hours: 8760, sourceYear: new Int16Array(8760).fill(2021) },
      1800,
    );
    const day = (d: number) => track.sunlitShare.subarray(d * 48, d * 48 + 48);
    expect(day(172).every((share) => share === 1)).toBe(true);
    expect(day(355).every((share) => share === 0)).toBe(true);
  });
});

/** Greatest relative error of the hourly energies that the steps give back. */
function worstEnergyError(year: WeatherYear, stepS: number): number {
  const steps = weatherSteps(year, stepS);
  const perHour = 3600 / stepS;
  let worst = 0;
  for (const key of ['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'] as const) {
    const offset = windowStartH(year[key].stands) * perHour;
    for (let h = 0; h < year.hours; h++) {
      let sum = 0;
      for (let s = 0; s < perHour; s++)
        sum += steps[key][(h * perHour + s + offset + steps.count) % steps.count];
      const value = year[key].values[h];
      if (value === 0) continue;
      worst = Math.max(worst, Math.abs(sum / perHour / value - 1));
    }
  }
  return worst;
}

describe('radiation in steps', () => {
  const year = inventedYear();
  for (const stepS of [300, 600, 900, 1200, 1800, 3600])
    test(`keeps each hour's energy to 1e-12 at ${stepS} s`, () => {
      expect(worstEnergyError(year, stepS)).toBeLessThan(1e-12);
    });
  for (const name of tmy3Tables)
    testTable("keeps each hour's energy to 1e-12 at 15 min", name, (bytes) => {
      expect(worstEnergyError(yearOf(bytes, optionsFor(name)), 900)).toBeLessThan(1e-12);
    });

  testTable('keeps the energy of hours that do not begin with a step', pvgisTable, (bytes) => {
    const table = yearOf(bytes, optionsFor(pvgisTable));
    const steps = weatherSteps(table, 900);
    for (const key of ['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'] as const)
      expect(mean(steps[key]) / mean(table[key].values)).toBeCloseTo(1, 12);
  });

  test('falls only while the sun is up, but for hours with under 3 minutes of it', () => {
    const steps = weatherSteps(year, 600);
    for (let k = 0; k < steps.count; k++) {
      if (steps.sun.sunlitShare[k] > 0 || steps.dhiWPerM2[k] === 0) continue;
      const h = Math.floor(k / 6);
      const lit = mean(steps.sun.sunlitShare.subarray(h * 6, h * 6 + 6));
      expect(lit).toBeLessThan(0.05);
    }
  });

  test('is the same for any step where the hour is sunlit throughout', () => {
    const fine = weatherSteps(year, 300);
    const noon = (h: number) => h % 24 === 12;
    for (let h = 0; h < year.hours; h++)
      if (noon(h)) expect(fine.dniWPerM2[h * 12 + 5]).toBeCloseTo(year.dniWPerM2.values[h], 9);
  });
});

describe('states at the ends of steps', () => {
  test('are the readings at their moments and straight lines between', () => {
    fc.assert(
      fc.property(fc.constantFrom(0, 0.5, 1), fc.constantFrom(600, 900, 1800), (readAt, stepS) => {
        const year = inventedYear(hillside, { readAt });
        const steps = weatherSteps(year, stepS);
        const perHour = 3600 / stepS;
        const t = year.dryBulbC.values;
        for (const h of [0, 1, 5, 4000, 8758]) {
          const k = (h + readAt) * perHour;
          if (Number.isInteger(k)) expect(steps.dryBulbC[k]).toBeCloseTo(t[h], 10);
          if (Number.isInteger(k) && k < steps.count)
            expect(steps.dryBulbC[k + 1]).toBeCloseTo(t[h] + (t[h + 1] - t[h]) / perHour, 10);
        }
        expect(steps.dryBulbC.length).toBe(steps.count + 1);
        expect(steps.dryBulbC[0]).toBe(steps.dryBulbC[steps.count]); // the year closes on itself
        expect(mean(steps.dryBulbC.subarray(1))).toBeCloseTo(mean(t), 9);
      }),
      { numRuns: 9 },
    );
  });

  test('a wind that backs through north turns the short way', () => {
    const year = inventedYear(hillside, { readAt: 0 });
    year.windFromDeg.values.fill(350);
    year.windFromDeg.values[101] = 10;
    const steps = weatherSteps(year, 900);
    for (let k = 400; k < 408; k++) {
      const fromNorth = ((steps.windFromDeg[k] + 180) % 360) - 180;
      expect(Math.abs(fromNorth)).toBeLessThanOrEqual(10);
    }
  });

  testTable(
    'Denver has the mean sky temperature of the fabric suite, section 6',
    'tmy3-725650.csv',
    (bytes) => {
      // test/reference/fabric-cases.md, section 6: mean -6.8 °C, 17.7 K under the air.
      const year = yearOf(bytes, {});
      const sky = mean(hourlySky(year).temperatureC);
      expect(Math.abs(sky + 6.8)).toBeLessThan(0.05);
      expect(Math.abs(mean(year.dryBulbC.values) - sky - 17.7)).toBeLessThan(0.05);
    },
  );
});

describe('radiation on planes', () => {
  const year = inventedYear();
  const steps = weatherSteps(year, 900);
  const on = (tiltDeg: number, azimuthDeg: number, rest = {}) =>
    planeIrradiance(steps, { tiltDeg, azimuthDeg, groundReflectance: 0.2, ...rest });
  const totalOf = (p: PlaneIrradiance, k: number) =>
    p.beamWPerM2[k] +
    p.circumsolarWPerM2[k] +
    p.isotropicWPerM2[k] +
    p.horizonWPerM2[k] +
    p.groundWPerM2[k];

  for (const skyModel of ['perez', 'hay-davies', 'isotropic'] as const)
    test(`a flat plane receives beam and the whole diffuse light (${skyModel})`, () => {
      const flat = on(0, 180, { skyModel });
      for (let k = 0; k < steps.count; k += 7) {
        if (steps.sun.altitudeDeg[k] < 5) continue; // below, the guards hold back a part
        const closed = steps.dniWPerM2[k] * steps.sun.up[k] + steps.dhiWPerM2[k];
        expect(totalOf(flat, k)).toBeCloseTo(closed, 9);
      }
    });

  test('a plane that faces down sees the ground alone', () => {
    const down = on(180, 0);
    for (let k = 0; k < steps.count; k += 13) {
      expect(totalOf(down, k)).toBeCloseTo(0.2 * steps.ghiWPerM2[k], 9);
    }
  });

  test('circumsolar light counted as beam moves, and nothing else changes', () => {
    const [apart, joined] = [on(90, 135), on(90, 135, { circumsolarAsBeam: true })];
    expect(joined.circumsolarIsBeam).toBe(true);
    expect(joined.circumsolarWPerM2.every((v) => v === 0)).toBe(true);
    for (let k = 0; k < steps.count; k += 5)
      expect(totalOf(joined, k)).toBeCloseTo(totalOf(apart, k), 9);
  });

  test('steps give the parts of the published Perez formula', () => {
    const plane = on(90, 220);
    let compared = 0;
    for (let k = 0; k < steps.count; k += 11) {
      if (steps.sun.sunlitShare[k] < 1 || steps.dhiWPerM2[k] === 0) continue;
      const zenithDeg = 90 - steps.sun.altitudeDeg[k];
      const brightness =
        (steps.dhiWPerM2[k] * kastenYoungAirMass(zenithDeg)) / steps.sun.extraterrestrialWPerM2[k];
      const parts = perezDiffuse(
        steps.dhiWPerM2[k],
        steps.dniWPerM2[k],
        zenithDeg * radPerDeg,
        brightness,
        plane.cosIncidence[k],
        90 * radPerDeg,
      );
      expect(plane.isotropicWPerM2[k]).toBeCloseTo(parts.isotropicWPerM2, 9);
      expect(plane.circumsolarWPerM2[k]).toBeCloseTo(parts.circumsolarWPerM2, 9);
      expect(plane.horizonWPerM2[k]).toBeCloseTo(parts.horizonWPerM2, 9);
      compared++;
    }
    expect(compared).toBeGreaterThan(1000);
  });

  test('no plane receives a negative total, none more beam than the sun gives', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 180 }),
        fc.integer({ min: 0, max: 359 }),
        (tilt, azimuth) => {
          const plane = on(tilt, azimuth);
          for (let k = 0; k < steps.count; k += 3) {
            expect(totalOf(plane, k)).toBeGreaterThanOrEqual(-1e-9);
            expect(plane.beamWPerM2[k]).toBeLessThanOrEqual(steps.dniWPerM2[k] * (1 + 1e-12));
          }
        },
      ),
      { numRuns: 6 },
    );
  });

  test('a year of 15 min costs under 60 ms for the sun and 10 ms a plane', () => {
    const cost = (work: () => void) => {
      const costs = Array.from({ length: 8 }, () => {
        const before = process.cpuUsage();
        work();
        const used = process.cpuUsage(before);
        return (used.user + used.system) / 1000;
      });
      return Math.min(...costs); // other work on the machine only ever adds
    };
    expect(cost(() => sunTrack(year, 900))).toBeLessThan(60);
    expect(cost(() => on(90, 180))).toBeLessThan(10);
  });
});
