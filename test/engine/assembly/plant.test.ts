// Emitters, backup, seasons and people against their closed forms in a plain room.
import { describe, expect, test } from 'vitest';
import { delivery, radiatorWPerK } from '../../../engine/assembly/emitter.ts';
import { NetworkBuilder } from '../../../engine/assembly/network-builder.ts';
import { march } from '../../../engine/index.ts';
import { personGain } from '../../../engine/physics/index.ts';
import { building, type Json, plainProject, plainRoom, plainYear, runYear } from './plain-room.ts';

const cold = plainYear({ dryBulbC: 0 });
const steps = { toleranceK: 1e-8, maxIterations: 50 };

/** The plain room with an hourly air change, so that it needs some 1.4 kW at 20 °C inside, 0 °C outside. */
function heated(heating: Json, more: Json = {}): Json {
  const room = { ...plainRoom(), infiltration: { airChangesPerH: 1 }, heating, ...more };
  return plainProject([room]);
}
const room = (document: Json, weather = cold) => runYear(document, weather).findings.rooms[0];
const hoursOf = (document: Json, weather = cold) => runYear(document, weather).rooms[0];

const radiator = {
  kind: 'radiator',
  nominalW: 2000,
  nominalExcessK: 50,
  exponent: 1.3,
  radiantShare: 0,
} as const;

describe('a radiator', () => {
  // Closed form of C·dΔ/dt = −Φn·(Δ/Δn)^n:  Δ^(1−n) = Δ0^(1−n) + (n − 1)·Φn·t/(C·Δn^n).
  test('cools down by the closed form of its characteristic equation', () => {
    const builder = new NetworkBuilder(240);
    const about = { name: 'air', what: 'air', method: 'given', inputs: {} };
    const airNode = builder.node(about, 0, builder.constantSeries(20));
    const one = building(heated({ setPointC: 20, emitter: radiator })).rooms[0];
    const plant = one.heating;
    if (!plant) throw new Error('the room has a heater');
    const { bodyNode } = delivery(one, plant, 'heater', { airNode, faces: [] }, builder);
    const run = march(
      {
        network: builder.network(),
        stepS: 60,
        stepCount: 240,
        series: builder.allSeries(),
        start: { kind: 'temperatures', tempC: Float64Array.of(20, 80) },
        stepsPerRecord: 60,
        recordNodes: Int32Array.of(bodyNode),
        meters: [],
      },
      steps,
    );
    const capacityJPerK = 30 * 2000;
    for (let h = 0; h < 4; h++) {
      const fall = (0.3 * 2000 * 3600 * (h + 1)) / (capacityJPerK * 50 ** 1.3);
      const excessK = (60 ** -0.3 + fall) ** (-1 / 0.3);
      expect(Math.abs(run.endC[h] - 20 - excessK)).toBeLessThan(0.002);
    }
  });

  // EN 442: nominal output at nominal excess.
  test('gives its nominal output at its nominal excess', () => {
    expect(radiatorWPerK({ ...radiator, capacityJPerK: 1 }, 2000, 50) * 50).toBeCloseTo(2000, 3);
  });

  // First law: in steady state it makes no difference to the heat which way it takes to the air.
  test('needs the heat of ideal air in steady state, and its balance closes', () => {
    const ideal = room(heated({ setPointC: 20 }));
    const warm = room(heated({ setPointC: 20, emitter: radiator }));
    expect(warm.heatingKWh / ideal.heatingKWh).toBeCloseTo(1, 5);
    expect(Math.abs(warm.balanceKWh.residual)).toBeLessThan(1e-9 * warm.heatingKWh);
  });

  test('closes its balance with radiation to the faces as well', () => {
    const mixed = runYear(
      heated({ setPointC: 20, emitter: { ...radiator, radiantShare: 0.35 }, bandK: 1 }),
      plainYear({ dryBulbC: (h) => 5 * Math.sin(h / 9) }),
    ).findings;
    expect(mixed.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    expect(mixed.quality.unconvergedSteps).toBe(0);
    expect(mixed.rooms[0].heatingKWh).toBeGreaterThan(5000);
  });

  test('never gives more in steady state than its nominal output, left without a limit of its own', () => {
    const small = room(heated({ setPointC: 20, emitter: { ...radiator, nominalW: 700 } }));
    expect(small.peakHeatingW).toBeCloseTo(700, 6);
    expect(small.hoursHeatingShort).toBe(8760);
  });
});

describe('floor heating inside a layer', () => {
  const floor = (layer: number) => ({ kind: 'embedded', surface: 'floor', layer });

  // First law: under an insulated, adiabatic floor all heat has to come up.
  test('needs the heat of ideal air in steady state above an adiabatic floor', () => {
    const embedded = room(heated({ setPointC: 20, maxW: 5000, emitter: floor(0) }));
    // The floor is warmer than the room and the walls see it: compared with heat put on the floor's face.
    expect(Math.abs(embedded.balanceKWh.residual)).toBeLessThan(1e-9 * embedded.heatingKWh);
    const { infiltration, opaque, heating } = embedded.balanceKWh;
    expect(infiltration + opaque + heating).toBeCloseTo(0, 3);
    expect(embedded.airTemperatureC.min).toBeCloseTo(20, 6);
  });

  // Two resistances from the pipes, up to the room and down to the ground, share the heat: q = ΔT/R.
  test('loses to the ground what the resistance below it lets through', () => {
    const project = heated({ setPointC: 20, maxW: 9000, emitter: floor(1) });
    project.constructions[1].layers = [
      { name: 'insulation', resistanceM2KPerW: 1 },
      { material: 'concrete', thicknessM: 0.1 },
    ];
    project.rooms[0].surfaces[5].boundary = { kind: 'ground', temperatureC: 10 };
    const { balanceKWh, heatingKWh } = room(project);
    const upW = (-1000 * (balanceKWh.infiltration + balanceKWh.opaque)) / 8760;
    const downW = (1000 * heatingKWh) / 8760 - upW;
    // The pipes lie half the concrete (0.025 m²·K/W) above the insulation, 0.0001 more joins the ground.
    const again = heated({ setPointC: 20, maxW: 9000, emitter: floor(1) });
    again.constructions[1].layers = [
      { name: 'insulation', resistanceM2KPerW: 2 },
      { material: 'concrete', thicknessM: 0.1 },
    ];
    again.rooms[0].surfaces[5].boundary = { kind: 'ground', temperatureC: 10 };
    const other = room(again);
    const upOtherW = (-1000 * (other.balanceKWh.infiltration + other.balanceKWh.opaque)) / 8760;
    const downOtherW = (1000 * other.heatingKWh) / 8760 - upOtherW;
    // The upward flow and so the pipes' temperature are the same; downward flow goes as 1/R.
    expect(upOtherW / upW).toBeCloseTo(1, 4);
    expect(downW / downOtherW).toBeCloseTo((2 + 0.0251) / (1 + 0.0251), 4);
  });

  test('is slower than ideal air: after a rise of the set-point the room lags', () => {
    const rise = {
      profiles: [
        {
          kind: 'hours',
          id: 'p',
          values: Array.from({ length: 24 }, (_, h) => (h >= 6 ? 20 : 15)),
        },
      ],
      schedules: [{ id: 's', profile: 'p' }],
    };
    const project = (heating: Json) => ({ ...heated(heating), ...rise });
    const limited = { setPointC: { schedule: 's' }, maxW: 6000 };
    const air = hoursOf(project(limited));
    const embedded = hoursOf(project({ ...limited, emitter: floor(0) }));
    const at = 24 * 30 + 6;
    expect(air.airC[at] - embedded.airC[at]).toBeGreaterThan(0.1);
  });
});

// A second heater stands for what the first cannot give: their sum is the demand (first law), and the
// first comes first (its set-point is the higher one).
test('a backup gives nothing while the main heater holds the set-point, and the rest when it cannot', () => {
  const wave = plainYear({ dryBulbC: (h) => 8 * Math.cos((2 * Math.PI * h) / 8760) });
  const main = { setPointC: 20, maxW: 1400 };
  const project = heated(main, { backupHeating: { setPointC: 20, maxW: 3000 } });
  const both = runYear(project, wave);
  const alone = hoursOf(heated({ setPointC: 20 }), wave);
  const [hours] = both.rooms;
  let most = 0;
  for (let h = 0; h < 8760; h++) {
    if (alone.heatingW[h] < 1300) expect(hours.heatingW[h]).toBeCloseTo(alone.heatingW[h], 0);
    else expect(Math.abs(hours.heatingW[h] - alone.heatingW[h])).toBeLessThan(60);
    most = Math.max(most, hours.heatingW[h]);
  }
  expect(most).toBeGreaterThan(1800);
  expect(both.findings.quality.unconvergedSteps).toBe(0);
  expect(Math.min(...hours.airC)).toBeGreaterThan(19.4); // within the backup's band of 0.5 K
});

test('a heater gives nothing outside its season', () => {
  const values = (v: number) => Array.from({ length: 24 }, () => v);
  const project = {
    ...heated({ setPointC: 20, available: 'winter' }),
    profiles: [
      { kind: 'hours', id: 'on', values: values(1) },
      { kind: 'hours', id: 'off', values: values(0) },
    ],
    schedules: [
      { id: 'winter', profile: 'on', periods: [{ from: '05-01', to: '09-30', profile: 'off' }] },
    ],
  };
  const { heatingByMonthKWh } = room(project);
  expect(heatingByMonthKWh.slice(4, 9)).toEqual([0, 0, 0, 0, 0]);
  expect(heatingByMonthKWh[9]).toBeGreaterThan(500);
});

describe('people by number', () => {
  const crowd = (dryHeat: string) => ({ id: 'crowd', kind: 'people', persons: 10, dryHeat });
  const kept = (setPointC: number, dryHeat: string) =>
    room(
      plainProject([
        {
          ...plainRoom(),
          gains: [crowd(dryHeat)],
          heating: { setPointC },
          cooling: { setPointC },
        },
      ]),
    );

  // The heat balance of ISO 7730 in `personGain`, at the temperature that the room is kept at.
  test.each([20, 24, 27, 30, 35])('give their dry heat at %s °C', (airC) => {
    const expected = 10 * personGain(1.2, airC, 1400).sensibleW * 8.76;
    expect(kept(airC, 'by-room-temperature').balanceKWh.gains).toBeCloseTo(expected, 4);
  });

  test('give the dry heat of 24 °C at all temperatures where that is chosen', () => {
    const expected = 10 * personGain(1.2, 24, 1400).sensibleW * 8.76;
    expect(kept(30, 'at-24-c').balanceKWh.gains).toBeCloseTo(expected, 4);
  });

  // ASHRAE Handbook of Fundamentals, people at moderately active office work: 75 W dry, 55 W latent at
  // 24 °C; 70 and 45 W at very light work (from memory). A balance of the body, so within 15 %.
  test('come near the handbook at light work', () => {
    const { sensibleW, latentW } = personGain(1.2, 24, 1400);
    expect(Math.abs(sensibleW / 75 - 1)).toBeLessThan(0.15);
    expect(Math.abs((sensibleW + latentW) / 130 - 1)).toBeLessThan(0.15);
  });

  test('by floor area are as many as by heads', () => {
    const by = (amount: Json) =>
      room(plainProject([{ ...plainRoom(), gains: [{ id: 'g', kind: 'people', ...amount }] }]))
        .balanceKWh.gains;
    expect(by({ floorPerPersonM2: 16 })).toBeCloseTo(by({ persons: 5 }), 9);
  });
});
