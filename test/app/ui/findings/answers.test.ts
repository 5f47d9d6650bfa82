import { expect, test } from 'vitest';
import { figureKinds, findAnswers, rankRooms } from '../../../../app/ui/findings/index.ts';
import { makeSimulation } from '../fixture.ts';

const { findings } = makeSimulation();

test('findings stand in a fixed order, whatever their values', () => {
  const keys = (answers: readonly { key: string }[]) => answers.map((answer) => answer.key);
  const fixed = ['heating', 'peak', 'below', 'above', 'highest', 'lowest'];
  expect(keys(findAnswers(findings.building, findings.rooms))).toEqual(fixed);
  for (const room of findings.rooms) expect(keys(findAnswers(room, []))).toEqual(fixed);
});

test('cooling comes in only where there is some', () => {
  const cooled = { ...findings.building, coolingKWh: 120, peakCoolingW: 900 };
  expect(findAnswers(cooled, findings.rooms).map((answer) => answer.key)).toContain('cooling');
});

test('an extreme of the house says in which room it lies', () => {
  const highest = findAnswers(findings.building, findings.rooms).find((a) => a.key === 'highest');
  const hottest = findings.rooms.reduce((a, b) =>
    b.operativeTemperatureC.max > a.operativeTemperatureC.max ? b : a,
  );
  expect(highest?.name.toLowerCase()).toBe(`highest, ${hottest.name.toLowerCase()}`);
});

test('a room nobody is in has no hours outside a band, not nought hours', () => {
  const hall = findings.rooms.find((room) => room.id === 'hall');
  if (!hall) throw new Error('the fixture has a hall');
  const below = findAnswers(hall, []).find((answer) => answer.key === 'below');
  expect(below?.quantity.figure).toBe('\u2013');
  expect(below?.aside).toBe('nobody is in');
});

test('rooms rank from the most striking, and those without the finding come last', () => {
  for (const kind of figureKinds) {
    const values = rankRooms(findings.rooms, kind).map(({ value }) => value);
    const known = values.filter((value) => !Number.isNaN(value));
    const sorted = [...known].sort((a, b) => (kind.key === 'lowest' ? a - b : b - a));
    expect(values.slice(0, known.length)).toEqual(sorted);
    expect(values.slice(known.length).every(Number.isNaN)).toBe(true);
  }
});
