import { expect, test } from 'vitest';
import { type Answer, setAgainst } from '../../../../app/ui/findings/index.ts';
import type { Simulation } from '../../../../app/ui/simulation.ts';
import { makeSimulation } from '../fixture.ts';

const some = makeSimulation(48);
/** A simulation that stands for one figure. */
const figures = new Map<Simulation, number>();
function run(value: number): Simulation {
  const simulation = { ...some };
  figures.set(simulation, value);
  return simulation;
}
const answersOf = (simulation: Simulation): Answer[] => [
  {
    key: 'heating',
    name: 'Heating',
    aside: '',
    quantity: { figure: '', unit: 'kWh' },
    value: figures.get(simulation) ?? NaN,
    decimals: 0,
    note: '',
    isMain: true,
    kind: 'amount',
  },
];
const against = (
  now: readonly [number | null, number | null],
  base: readonly [number | null, number | null],
) => {
  const cut = ([coarse, full]: typeof now) => ({
    coarse: coarse === null ? null : run(coarse),
    full: full === null ? null : run(full),
  });
  return setAgainst({ now: cut(now), base: cut(base) }, answersOf).get('heating');
};

test('runs of the same step are set against each other, never a coarse one against a full one', () => {
  expect(against([900, null], [1010, 1000])).toMatchObject({ base: 1010, difference: -110 });
  expect(against([900, 890], [1010, 1000])).toMatchObject({ base: 1000, difference: -110 });
  expect(against([900, null], [null, 1000])).toBeUndefined();
});

test('an error that both houses share cancels; what differs is Richardson’s third of the change', () => {
  // Each run is exact + c·h; steps 4 and 1. Exact difference −100, errors 2·h and 5·h.
  const nowRun = (h: number) => 900 + 5 * h;
  const baseRun = (h: number) => 1000 + 2 * h;
  const found = against([nowRun(4), nowRun(1)], [baseRun(4), baseRun(1)]);
  expect(found?.difference).toBe(-97);
  // The true error of −97 is 3, and that is what the estimate gives for an error of first order.
  expect(found?.plusMinus).toBeCloseTo(3, 9);
  expect(against([nowRun(4), nowRun(1)], [nowRun(4) + 100, nowRun(1) + 100])?.plusMinus).toBe(0);
});

test('a difference inside its ± is not sure, and neither is one that no digit shows', () => {
  expect(against([1000, 1001], [1000, 1000])).toMatchObject({ isSure: true });
  expect(against([1010, 1002], [1000, 1000])).toMatchObject({ isSure: false });
  expect(against([1000.2, 1000.2], [1000, 1000])).toMatchObject({ isSure: false });
});
