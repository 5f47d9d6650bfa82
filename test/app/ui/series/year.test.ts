import { expect, test } from 'vitest';
import { makeCalendar } from '../../../../app/ui/format/index.ts';
import {
  byDuration,
  houseFlowsOfHour,
  monthlyHours,
  weekAt,
  weeksOf,
  worstWeek,
} from '../../../../app/ui/series/year.ts';
import { makeSimulation } from '../fixture.ts';

const { months } = makeCalendar(8760, 2023);

test('hours above the band by month add up to the finding of the year', () => {
  const { rooms, findings } = makeSimulation();
  const above = monthlyHours(rooms, months, 1);
  expect(above.reduce((sum, month) => sum + month, 0)).toBe(findings.building.hoursAboveBand);
});

// 1 January 2023 was a Sunday (calendar), so the first Monday is 2 January.
test('weeks start on Mondays and reach both ends of the year', () => {
  const weeks = weeksOf(8760, 0);
  expect(weeks[1]?.firstHour).toBe(24);
  expect(weeks[0]?.firstHour).toBe(0);
  expect(weeks.at(-1)?.endHour).toBe(8760);
  for (const hour of [0, 23, 24, 4000, 8759]) {
    const week = weeks[weekAt(weeks, hour)];
    expect(hour >= (week?.firstHour ?? NaN) && hour < (week?.endHour ?? NaN)).toBe(true);
  }
});

test('the worst week holds the one spell that leaves the band', () => {
  const [room] = makeSimulation().rooms;
  if (!room) throw new Error('the fixture has rooms');
  const operativeC = new Float64Array(8760).fill(22);
  operativeC.fill(35, 4800, 4830);
  const weeks = weeksOf(8760, 0);
  const worst = weeks[worstWeek({ ...room, operativeC }, weeks)];
  expect(worst && worst.firstHour <= 4800 && worst.endHour > 4800).toBe(true);
});

test('a duration curve only falls and keeps the sum', () => {
  const curve = byDuration(Float64Array.of(3, 9, 0, 5));
  expect(Array.from(curve)).toEqual([9, 5, 3, 0]);
});

test('heat from room to room cancels out in the house', () => {
  expect(houseFlowsOfHour(makeSimulation(), 100).rooms).toBe(0);
});
