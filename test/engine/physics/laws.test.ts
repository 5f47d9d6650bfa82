// Laws that must hold for any input: mass balances, limits that bracket, pressures below saturation.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import * as physics from '../../../engine/physics/index.ts';

const within = (min: number, max: number) => fc.double({ min, max, noNaN: true });

test('any zone balances its air mass to a millionth of what passes', () => {
  const leak = fc.tuple(within(1e-4, 0.1), within(0.5, 1), within(0, 20), within(-1, 1));
  fc.assert(
    fc.property(
      fc.array(leak, { minLength: 1, maxLength: 8 }),
      within(-30, 40),
      within(10, 30),
      within(0, 20),
      within(-0.5, 0.5),
      (rows, outsideC, insideC, windMPerS, fanKgPerS) => {
        const column = (i: 0 | 1 | 2 | 3) => Float64Array.from(rows, (row) => row[i]);
        const paths = {
          coefficient: column(0),
          exponent: column(1),
          heightM: column(2),
          windCoefficient: column(3),
        };
        const air = { insideC, outsideC, windMPerS, fanKgPerS };
        const p = physics.zonePressurePa(paths, air);
        let net = fanKgPerS;
        let passing = Math.abs(fanKgPerS);
        for (let k = 0; k < rows.length; k++) {
          const flow = physics.leakKgPerS(paths, k, air, p);
          net += flow;
          passing += Math.abs(flow);
        }
        // Near Δp = 0 the flow of a square-root leak turns 1e-9 Pa into 0.1·√1e-9 = 3e-6 m³/s.
        expect(Math.abs(net)).toBeLessThan(1e-6 * passing + 4e-6 * rows.length);
      },
    ),
    { numRuns: 300 },
  );
});

test('the lower limit of the combined method never exceeds the upper one (ISO 6946)', () => {
  const part = fc.tuple(within(0.01, 0.99), within(0.02, 5), within(0.02, 5));
  fc.assert(
    fc.property(fc.array(part, { minLength: 1, maxLength: 4 }), (rows) => {
      const layers = rows.map(([share, a, b]) => [
        { share, resistanceM2KPerW: a },
        { share: 1 - share, resistanceM2KPerW: b },
      ]);
      const found = physics.combinedResistance(0.13, layers, 0.04);
      expect(found.lowerM2KPerW).toBeLessThanOrEqual(found.upperM2KPerW * (1 + 1e-12));
      expect(found.maxRelativeError).toBeLessThan(1);
    }),
  );
});

const layer = fc.record({ resistanceM2KPerW: within(0.01, 3), sdM: within(0.01, 50) });

test('vapour pressure never passes saturation, and water arriving is flow in less flow out', () => {
  fc.assert(
    fc.property(
      fc.array(layer, { minLength: 2, maxLength: 7 }),
      within(-20, 15),
      within(0.2, 0.9),
      fc.array(fc.boolean(), { minLength: 9, maxLength: 9 }),
      (layers, outsideC, humidity, flags) => {
        const resistances = layers.map((l) => l.resistanceM2KPerW);
        const t = physics.interfaceTemperaturesC(20, outsideC, 0.13, resistances, 0.04);
        const saturation = physics.saturationsPa(t);
        const sd = physics.cumulativeSdM(layers);
        const last = sd.length - 1;
        const wet = sd.map((_, k) => k > 0 && k < last && flags[k] === true);
        const inside = humidity * physics.hygricSaturationPa(20);
        const outside = 0.8 * physics.hygricSaturationPa(outsideC);
        const state = physics.vapourState(sd, saturation, inside, outside, wet);
        const p = [...state.vapourPa];
        p.forEach((value, k) => {
          expect(value).toBeLessThanOrEqual((saturation[k] ?? 0) + 1e-6);
        });
        const at = (list: ArrayLike<number>, k: number) => list[k] ?? Number.NaN;
        const flow = (
          k: number, // from interface k to k + 1
        ) =>
          (physics.airVapourPermeability * (at(p, k) - at(p, k + 1))) / (at(sd, k + 1) - at(sd, k));
        const water = [...state.rateKgPerM2S].reduce((a, b) => a + b, 0);
        expect(Math.abs(flow(0) - flow(last - 1) - water)).toBeLessThan(1e-15);
        state.rateKgPerM2S.forEach((rate, k) => {
          if (wet[k] !== true) expect(rate).toBeGreaterThanOrEqual(0);
        });
      },
    ),
    { numRuns: 300 },
  );
});

test('water in a wall never falls below nothing, and a wall that stays dry holds none all year', () => {
  fc.assert(
    fc.property(
      fc.array(layer, { minLength: 2, maxLength: 6 }),
      fc.array(within(-15, 25), { minLength: 12, maxLength: 12 }),
      within(0.3, 0.8),
      (layers, outsideC, humidity) => {
        const months = outsideC.map((t) => ({
          days: 30,
          insideC: 20,
          insideVapourPa: humidity * physics.hygricSaturationPa(20),
          outsideC: t,
          outsideVapourPa: 0.8 * physics.hygricSaturationPa(t),
        }));
        const year = physics.condensationYear(layers, 0.13, 0.04, months);
        for (const water of year.waterKgPerM2) {
          for (let k = 0; k < water.length; k++) {
            expect(water[k]).toBeGreaterThanOrEqual(0);
            expect(water[k]).toBeLessThanOrEqual(year.peakKgPerM2[k] ?? 0);
          }
        }
        if (!year.condenses) expect(year.peakKgPerM2.every((w) => w === 0)).toBe(true);
      },
    ),
  );
});

test('two stores stepped twice end where one long step ends (semigroup of the exponential)', () => {
  fc.assert(
    fc.property(
      within(0.1, 10),
      within(0.1, 10),
      within(0.01, 10),
      within(0, 5),
      within(0.01, 5),
      within(0.01, 5),
      (c1, c2, between, g1, g2, time) => {
        const stores = {
          firstCapacity: c1,
          secondCapacity: c2,
          between,
          firstToOutside: g1,
          secondToOutside: g2,
        };
        const end = physics.steadyStores(stores, 3, 1, -2);
        const once = physics.storesAfter(stores, [20, -5], end, 2 * time);
        const half = physics.storesAfter(stores, [20, -5], end, time);
        const twice = physics.storesAfter(stores, half, end, time);
        expect(Math.abs(once[0] - twice[0])).toBeLessThan(1e-9 * (1 + Math.abs(end[0])));
        expect(Math.abs(once[1] - twice[1])).toBeLessThan(1e-9 * (1 + Math.abs(end[1])));
      },
    ),
  );
});
