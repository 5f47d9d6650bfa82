import fc from 'fast-check';
import { expect, test } from 'vitest';
import { roundedBalance, streams } from '../../../app/report/balance.ts';
import { flowPicture } from '../../../app/report/drawing/flow-picture.ts';
import type { BalanceKWh } from '../../../engine/index.ts';
import { balanceKWh } from './sample.ts';

const kWh = fc.double({ min: -1e5, max: 1e5, noNaN: true });
const heat = fc.double({ min: 0, max: 1e5, noNaN: true });
/** A balance that closes: what the streams bring in, the fabric takes up. */
const closed = fc
  .record({ solar: heat, gains: heat, heating: heat, opaque: kWh, glazing: kWh, ground: kWh })
  .chain((part) =>
    fc.record({ infiltration: kWh, rooms: kWh }).map((more) => ({ ...part, ...more })),
  )
  .map((part): BalanceKWh => {
    const storage = Object.values(part).reduce((a, b) => a + b, 0);
    return { ...part, cooling: 0, ventilation: 0, storage, residual: 0 };
  });

const exact = (balance: BalanceKWh, key: (typeof streams)[number]) =>
  key === 'storage' || key === 'residual' ? -balance[key] : balance[key];

test('rounded, the balance adds up to nought, each line within 1 kWh of what it was', () => {
  fc.assert(
    fc.property(closed, (balance) => {
      const rounded = roundedBalance(balance);
      expect(streams.reduce((sum, key) => sum + rounded[key], 0)).toBe(0);
      for (const key of streams) {
        expect(Math.abs(rounded[key] - exact(balance, key))).toBeLessThanOrEqual(1);
        expect(Number.isInteger(rounded[key])).toBe(true);
      }
      expect(rounded.heating).toBe(Math.round(balance.heating));
      expect(rounded.ventilation).toBe(0);
    }),
  );
});

test('what does not add up is shown, not spread over the rest', () => {
  const rounded = roundedBalance({ ...balanceKWh, opaque: -1000.2, residual: 500 });
  expect(rounded.residual).toBe(-500);
  expect(rounded.opaque).toBeGreaterThanOrEqual(-1001);
});

/** Figures beside the streams, left and right of the bar, and the sum on it. */
function shownIn(svg: string) {
  const texts = [...svg.matchAll(/<text[^>]*class="([^"]*)"[^>]*>([\d,]+)<\/text>/g)];
  const of = (kind: string) =>
    texts
      .filter(([, name]) => name === kind)
      .map(([, , text]) => Number(text?.replaceAll(',', '')))
      .reduce((a, b) => a + b, 0);
  return { into: of('end strong'), out: of('strong'), sum: of('middle strong') };
}

test('both sides of the flow picture add up, as shown, to the sum on the building', () => {
  const { into, out, sum } = shownIn(flowPicture(roundedBalance(balanceKWh)).markup);
  // By hand from sample.ts: 2001 of heating, and 1234.5 + 700.4 rounded.
  expect(sum).toBeGreaterThanOrEqual(3935);
  expect(sum).toBeLessThanOrEqual(3937);
  expect(into).toBe(sum);
  expect(out).toBe(sum);
});

test('streams are as wide as their heat', () => {
  const { markup } = flowPicture(
    roundedBalance({
      ...balanceKWh,
      solar: 100,
      gains: 0,
      heating: 300,
      opaque: -400,
      glazing: 0,
      ground: 0,
      infiltration: 0,
      ventilation: 0,
    }),
  );
  const widthOf = (kind: string) => {
    const [, d = ''] = new RegExp(`d="([^"]+)" class="${kind}"`).exec(markup) ?? [];
    const [, from, to] =
      (/^M[\d.]+ ([\d.-]+)C.*Z$/.exec(d) && /^M[\d.]+ ([\d.-]+).* ([\d.-]+)Z$/.exec(d)) || [];
    return Number(to) - Number(from);
  };
  expect(widthOf('stream-in') / widthOf('stream-sun')).toBeCloseTo(3, 1);
});
