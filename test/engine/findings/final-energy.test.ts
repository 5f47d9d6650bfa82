// What is bought against hand calculations with the published efficiency formulas.
import { describe, expect, test } from 'vitest';
import { type Json, plainProject, plainRoom, plainYear, runYear } from '../assembly/plain-room.ts';

const carriers = [
  { id: 'power', name: 'Electricity', costPerKWh: 0.3, co2KgPerKWh: 0.4 },
  { id: 'gas', name: 'Gas', costPerKWh: 0.1, co2KgPerKWh: 0.2 },
];
const freezing = plainYear({ dryBulbC: 0 });

function served(supply: Json, plant: Json = {}, rooms = 1): Json {
  const list = Array.from({ length: rooms }, (_, i) => ({
    ...plainRoom(`room-${i}`),
    infiltration: { airChangesPerH: 1 + i },
    heating: { setPointC: 20, supply: supply.id, ...plant },
  }));
  return plainProject(list, { energy: { currency: 'EUR', carriers, supplies: [supply] } });
}
const findings = (document: Json, weather = freezing) => runYear(document, weather).findings;

test('without carriers nothing is said about what is bought', () => {
  const found = findings(plainProject([plainRoom()]));
  expect(found.supplies).toBeUndefined();
  expect(found.building.finalEnergyKWh).toBeUndefined();
});

test('electric heat is bought as it is given, with its cost and CO₂', () => {
  const { building, rooms, supplies, currency } = findings(
    served({ kind: 'direct', id: 'coil', carrier: 'power' }),
  );
  expect(building.finalEnergyKWh?.power).toBeCloseTo(building.heatingKWh, 6);
  expect(building.finalEnergyKWh?.gas).toBe(0);
  expect(building.cost).toBeCloseTo(0.3 * building.heatingKWh, 6);
  expect(rooms[0].co2Kg).toBeCloseTo(0.4 * building.heatingKWh, 6);
  expect(supplies?.[0].yearlyEfficiency).toBeCloseTo(1, 9);
  expect(currency).toBe('EUR');
});

test('losses of distribution and auxiliaries come on top', () => {
  const { building } = findings(
    served({
      kind: 'direct',
      id: 'heat',
      carrier: 'gas',
      distributionShare: 0.8,
      auxiliaryW: 50,
      auxiliaryCarrier: 'power',
    }),
  );
  expect(building.finalEnergyKWh?.gas).toBeCloseTo(building.heatingKWh / 0.8, 6);
  expect(building.finalEnergyKWh?.power).toBeCloseTo(50 * 8.76, 9);
});

describe('a boiler', () => {
  const boiler = (nominalW: number) => ({
    kind: 'boiler',
    id: 'boiler',
    carrier: 'gas',
    nominalW,
    fullLoadEfficiency: 0.9,
    partLoadEfficiency: 0.95,
    standbyLossShare: 0.01,
  });
  const steadyW = findings(served(boiler(1e5))).rooms[0].peakHeatingW;

  // EN 15316-4-1: at the loads of the tests the efficiencies are those of the tests.
  test.each([
    ['full load', 1, 0.9],
    ['part load', 0.3, 0.95],
  ])('has the efficiency of its test at %s', (_, load, efficiency) => {
    const { building } = findings(served(boiler(steadyW / load)));
    const bought = building.finalEnergyKWh?.gas ?? 0;
    expect(building.heatingKWh / bought).toBeCloseTo(efficiency, 4);
  });

  // Between standing by (0.01) and part load 0.3 (0.3·(1/0.95 − 1)) the loss is straight: at 0.15 midway.
  test('loses on a straight line below part load', () => {
    const { building } = findings(served(boiler(steadyW / 0.15)));
    const loss = (0.01 + 0.3 * (1 / 0.95 - 1)) / 2;
    expect((building.finalEnergyKWh?.gas ?? 0) / building.heatingKWh).toBeCloseTo(
      1 + loss / 0.15,
      4,
    );
  });

  test('too small is counted short every hour, and by how much', () => {
    const found = findings(served(boiler(steadyW / 2)));
    const [supply] = found.supplies ?? [];
    expect(supply.hoursShort).toBe(8760);
    expect(found.cautions.join()).toContain('"boiler" can give in 8760 h');
    expect(supply.shortKWh).toBeCloseTo(supply.outputKWh / 2, 1);
  });

  test('is shared between rooms by what they take; rooms add up to the building', () => {
    const found = findings(served(boiler(8000), {}, 3));
    const sum = found.rooms.reduce((total, room) => total + (room.finalEnergyKWh?.gas ?? 0), 0);
    expect(sum).toBeCloseTo(found.building.finalEnergyKWh?.gas ?? 0, 6);
    const perHeat = found.rooms.map((room) => (room.finalEnergyKWh?.gas ?? 0) / room.heatingKWh);
    expect(perHeat[1]).toBeCloseTo(perHeat[0], 9);
  });

  test('stands warm on days with heat only', () => {
    // One hour of heat a day in the first half of the year, none later.
    const profile = (id: string, values: number[]) => ({ kind: 'hours', id, values });
    const project = {
      ...served(boiler(10_000), { maxW: 1000, available: 'season' }),
      profiles: [
        profile(
          'one-hour',
          Array.from({ length: 24 }, (_, h) => (h === 6 ? 1 : 0)),
        ),
        profile(
          'never',
          Array.from({ length: 24 }, () => 0),
        ),
      ],
      schedules: [
        {
          id: 'season',
          profile: 'one-hour',
          periods: [{ from: '07-01', to: '12-31', profile: 'never' }],
        },
      ],
    };
    const [supply] = findings(project).supplies ?? [];
    const days = 181;
    // Load 0.1 for an hour, 23 hours at the standing loss of 0.01 · 10 kW.
    const loss = 0.01 + (0.1 / 0.3) * (0.3 * (1 / 0.95 - 1) - 0.01);
    expect(supply.outputKWh).toBeCloseTo(days, 6);
    expect(supply.inputKWh.gas).toBeCloseTo(days * (1 + 10 * loss + 23 * 0.1), 4);
  });
});

describe('a heat pump', () => {
  const pump = (fields: Json) => ({
    kind: 'heat-pump',
    id: 'pump',
    carrier: 'power',
    cycling: 'none',
    ...fields,
  });

  // Carnot: COP = 0.45·(35 + 5 + 273.15)/(35 + 5 − (0 − 5)).
  test('has its share of the Carnot limit at the outdoor temperature', () => {
    const [supply] = findings(served(pump({ carnot: { flowC: 35 } }))).supplies ?? [];
    expect(supply.yearlyEfficiency).toBeCloseTo((0.45 * 313.15) / 45, 6);
  });

  test('follows its tested points from hour to hour', () => {
    const weather = plainYear({ dryBulbC: (h) => (h < 4380 ? -7 : 7) });
    const cop = [
      { outdoorC: -7, value: 2 },
      { outdoorC: 7, value: 4 },
    ];
    const run = runYear(served(pump({ cop })), weather);
    const [{ heatingW }] = run.rooms;
    let bought = 0;
    heatingW.forEach((w, h) => {
      const at = run.outdoorC[h];
      bought += w / (3 + at / 7) / 1000;
    });
    expect(run.findings.building.finalEnergyKWh?.power).toBeCloseTo(bought, 6);
  });

  test('warms its flow by the weather', () => {
    const flowC = [
      { outdoorC: -10, value: 45 },
      { outdoorC: 10, value: 25 },
    ];
    const [supply] = findings(served(pump({ carnot: { flowC } }))).supplies ?? [];
    expect(supply.yearlyEfficiency).toBeCloseTo((0.45 * 313.15) / 45, 6); // 35 °C at 0 °C
  });

  test('leaves to its backup what it cannot give, or is short', () => {
    const cop = [{ outdoorC: 0, value: 3 }];
    const capacityW = [{ outdoorC: 0, value: 1000 }];
    const alone = findings(served(pump({ cop, capacityW })));
    const backed = findings(
      served(pump({ cop, capacityW, backup: { carrier: 'gas', efficiency: 0.8 } })),
    );
    const heat = alone.building.heatingKWh;
    expect(alone.supplies?.[0].hoursShort).toBe(8760);
    expect(alone.supplies?.[0].shortKWh).toBeCloseTo(heat - 8760, 3);
    expect(backed.supplies?.[0].hoursShort).toBe(0);
    expect(backed.building.finalEnergyKWh?.power).toBeCloseTo(8760 / 3, 6);
    expect(backed.building.finalEnergyKWh?.gas).toBeCloseTo((heat - 8760) / 0.8, 3);
  });

  // EN 14825: f = CR/(0.9·CR + 0.1) below the least continuous output.
  test('loses by switching on and off below its least output', () => {
    const steadyW = findings(served(pump({ cop: [{ outdoorC: 0, value: 3 }] }))).rooms[0]
      .peakHeatingW;
    const [supply] =
      findings(
        served(
          pump({
            cop: [{ outdoorC: 0, value: 3 }],
            capacityW: [{ outdoorC: 0, value: 5 * steadyW }],
            leastShare: 0.4,
            cycling: 'water',
          }),
        ),
      ).supplies ?? [];
    expect(supply.yearlyEfficiency).toBeCloseTo((3 * 0.5) / (0.9 * 0.5 + 0.1), 4);
  });
});

// Carnot: EER = 0.4·((35 + 5 + 273.15)/(35 + 5 − (7 − 5)) − 1).
test('a chiller has its share of the Carnot limit', () => {
  const room = {
    ...plainRoom(),
    infiltration: { airChangesPerH: 1 },
    cooling: { setPointC: 25, supply: 'chiller' },
  };
  const supply = {
    kind: 'chiller',
    id: 'chiller',
    carrier: 'power',
    carnot: { flowC: 7, qualityShare: 0.4 },
  };
  const project = plainProject([room], { energy: { carriers, supplies: [supply] } });
  const found = findings(project, plainYear({ dryBulbC: 35 }));
  expect(found.supplies?.[0].yearlyEfficiency).toBeCloseTo(0.4 * (313.15 / 38 - 1), 6);
});

test('lights with a carrier are bought too, and plant without supply is named', () => {
  const room = {
    ...plainRoom(),
    gains: [{ id: 'lamps', kind: 'lighting', powerWPerM2: 5, carrier: 'power' }],
    heating: { setPointC: 20 },
  };
  const found = findings(plainProject([room], { energy: { carriers } }));
  expect(found.rooms[0].finalEnergyKWh?.power).toBeCloseTo(5 * 80 * 8.76, 9);
  expect(found.assumptions.join()).toContain('leaves out heating of room');
});
