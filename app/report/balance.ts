// The year's heat of a room in whole kilowatt hours that add up: what is shown in the flow picture and
// in the table beneath it.

import type { BalanceKWh } from '../../engine/index.ts';

export const streams = [
  'solar',
  'gains',
  'heating',
  'cooling',
  'opaque',
  'glazing',
  'ground',
  'infiltration',
  'ventilation',
  'rooms',
  'storage',
  'residual',
] as const satisfies readonly (keyof BalanceKWh)[];

export type Stream = (typeof streams)[number];

/** Findings of their own, so they keep their own rounding. */
const findings: readonly Stream[] = ['heating', 'cooling'];

/**
 * Heat into the room, whole kWh, by stream; the sum is nought. What the fabric took up counts as
 * leaving, and so does what does not add up (the residual), if it is as large as a kilowatt hour.
 *
 * By largest remainder: each part gets its floor, what is left over goes to the largest remainders.
 */
export function roundedBalance(balance: BalanceKWh): Readonly<Record<Stream, number>> {
  const exact = (key: Stream) =>
    key === 'storage' || key === 'residual' ? -balance[key] : balance[key];
  const rounded = Object.fromEntries(
    streams.map((key) => [
      key,
      findings.includes(key) ? Math.round(exact(key)) : Math.floor(exact(key)),
    ]),
  ) as Record<Stream, number>; // one entry a stream
  const open = streams
    .filter((key) => !findings.includes(key) && Math.abs(exact(key)) > 1e-6)
    .sort((a, b) => exact(b) - Math.floor(exact(b)) - (exact(a) - Math.floor(exact(a))));
  for (const key of streams) if (!findings.includes(key) && !open.includes(key)) rounded[key] = 0;
  let left = -streams.reduce((sum, key) => sum + rounded[key], 0);
  for (const key of open) {
    if (left < 1) break;
    rounded[key] += 1;
    left -= 1;
  }
  for (const key of open.toReversed()) {
    if (left > -1) break;
    rounded[key] -= 1;
    left += 1;
  }
  for (const key of streams) if (Object.is(rounded[key], -0)) rounded[key] = 0;
  return rounded;
}
