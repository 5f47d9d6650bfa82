import { expect, test } from 'vitest';
import { findCautions } from '../../../../app/ui/findings/index.ts';
import type { RoomTotals } from '../../../../app/ui/simulation.ts';
import { cautions as engineCautions } from '../../../../engine/index.ts';
import { makeSimulation } from '../fixture.ts';

const [mild] = makeSimulation(240).findings.rooms;
if (!mild) throw new Error('the fixture has rooms');

/** A room in no danger, changed where the test says. */
function room(change: Partial<RoomTotals>): RoomTotals {
  const range = {
    min: 18,
    max: 25,
    mean: 21,
    minAt: '2023-01-16T03:00',
    maxAt: '2023-07-19T17:00',
  };
  return {
    ...(mild as RoomTotals),
    airTemperatureC: range,
    operativeTemperatureC: range,
    hoursHeatingShort: 0,
    ...change,
  };
}

const cold = (min: number) => ({ min, max: 25, mean: 15, minAt: '2023-01-16T03:00', maxAt: '' });
const hot = (max: number) => ({ min: 18, max, mean: 24, minAt: '', maxAt: '2023-07-19T17:00' });

test('a mild house has no cautions', () => {
  expect(findCautions([room({})])).toEqual([]);
});

test('frost names the coldest room, when, what to do, and the others', () => {
  const [caution] = findCautions([
    room({ id: 'a', name: 'Hall', airTemperatureC: cold(4.2) }),
    room({ id: 'b', name: 'Bathroom', airTemperatureC: cold(1.1) }),
  ]);
  expect(caution?.roomId).toBe('b');
  expect(caution?.title).toBe('Frost.');
  expect(caution?.text).toContain('Bathroom falls to 1.1 °C on 16 January, 03:00');
  expect(caution?.text).toContain('Keep a frost guard on, or drain; follow the local code');
  expect(caution?.text).toContain('Also: Hall.');
});

test('a heater at its limit is not taken for a need', () => {
  const [caution] = findCautions([
    room({ name: 'Study', hoursHeatingShort: 42, peakHeatingW: 800 }),
  ]);
  expect(caution?.text).toBe(
    'Study misses its set-point for 42 h with the heater at its largest, 0.80 kW. That peak is a limit, not the need. Have the size checked by a licensed practitioner.',
  );
});

// The engine's own list is what the command line and the report print: the window must not warn of
// less, nor of more.
test('the window warns of the same dangers as the engine, at the same limits', () => {
  const rooms = [
    [room({ airTemperatureC: cold(4.9) })],
    [room({ airTemperatureC: cold(5) })],
    [room({ operativeTemperatureC: hot(32) })],
    [room({ operativeTemperatureC: hot(32.1) })],
    [room({ hoursHeatingShort: 1 })],
    [room({ airTemperatureC: cold(-3), operativeTemperatureC: hot(40), hoursHeatingShort: 9 })],
  ];
  const counts = rooms.map((list) => findCautions(list).length);
  expect(counts).toEqual([1, 0, 0, 1, 1, 3]);
  expect(counts).toEqual(rooms.map((list) => engineCautions(list).length));
});
