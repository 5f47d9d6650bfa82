// Thermal bridges carry l·ψ + n·χ: ISO 14683's sum as the only way out of a room in steady weather.
import { expect, test } from 'vitest';
import { type Json, messages, plainProject, plainRoom, plainYear, runYear } from './plain-room.ts';

function bridged(thermalBridges: Json[]): Json {
  const room = plainRoom();
  for (const surface of room.surfaces) surface.boundary = { kind: 'adiabatic' };
  return plainProject([{ ...room, heating: { setPointC: 20 }, thermalBridges }]);
}

test('bridges lose their conductance times the difference, to outdoors, b-spaces, ground and given air', () => {
  const { findings } = runYear(
    bridged([
      { id: 'sill', kind: 'linear', lengthM: 30, psiWPerMK: 0.1 }, // 3 W/K to 0 °C
      { id: 'corner', kind: 'linear', lengthM: 10, psiWPerMK: -0.06 }, // −0.6 W/K
      {
        id: 'loft',
        kind: 'linear',
        lengthM: 20,
        psiWPerMK: 0.1,
        beyond: { kind: 'outdoors', reductionShare: 0.5 },
      }, // 1 W/K
      {
        id: 'anchor',
        kind: 'point',
        count: 5,
        chiWPerK: 0.02,
        beyond: { kind: 'fixed', temperatureC: 10 },
      }, // 0.1 W/K to 10 °C
      {
        id: 'edge',
        kind: 'linear',
        lengthM: 10,
        psiWPerMK: 0.2,
        beyond: { kind: 'ground', temperatureC: 8 },
      }, // 2 W/K to 8 °C
    ]),
    plainYear({ dryBulbC: 0 }),
  );
  const { heatingKWh, balanceKWh } = findings.rooms[0];
  const outdoorsW = (3 - 0.6 + 1) * 20 + 0.1 * 10;
  const groundW = 2 * 12;
  expect(-balanceKWh.opaque).toBeCloseTo((outdoorsW * 8760) / 1000, 3);
  expect(-balanceKWh.ground).toBeCloseTo((groundW * 8760) / 1000, 3);
  expect(heatingKWh).toBeCloseTo(((outdoorsW + groundW) * 8760) / 1000, 3);
});

test('bridges that take more off than they add are named', () => {
  expect(
    messages(bridged([{ id: 'corner', kind: 'linear', lengthM: 10, psiWPerMK: -0.06 }])),
  ).toEqual([
    'plain.json, rooms[0].thermalBridges: found bridges that add up to -0.6 W/K, expected a sum of 0 or more. Negative ψ goes with areas by outside dimensions: enter areas and ψ by inside dimensions.',
  ]);
});
