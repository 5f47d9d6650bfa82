// Air in the hourly run: closed forms under steady weather, the one-zone pressure cases of
// 08-airflow-moisture.json, and laws that hold for any wind and temperature.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { balancedPa, roomLeaks } from '../../../engine/assembly/air-leaks.ts';
import { airSite } from '../../../engine/assembly/air-site.ts';
import { stepClock } from '../../../engine/assembly/step-clock.ts';
import {
  doorwayExchangeWPerK15,
  dryAirKgPerM3,
  type LeakPaths,
  leakKgPerS,
  singleSidedM3PerS,
  wallWindCoefficient,
  zonePressurePa,
} from '../../../engine/physics/index.ts';
import { standardPressurePa, type WeatherYear, weatherSteps } from '../../../weather/index.ts';
import { caseName, expectCase, inputNumber, referenceCases } from '../../reference/cases.ts';
import {
  building,
  type Json,
  messages,
  plainProject,
  plainRoom,
  plainYear,
  runYear,
  seaside,
} from './plain-room.ts';

/** Dry air at 20 °C and sea level, as the assembly takes volume flows. */
const density = dryAirKgPerM3(20);
const heat = 1006;

/** A room without any loss but by air, held at 20 °C. */
function airRoom(more: Json, id = 'room'): Json {
  const room = plainRoom(id);
  // A resistance of 200 m²·K/W leaves 1 W/K; what it lets pass stands in the balance under `opaque`.
  return { ...room, heating: { setPointC: 20 }, cooling: { setPointC: 20 }, ...more };
}

/** Mean loss of a line of the year's balance [W]. */
const lossW = (kWh: number) => 0 - (kWh * 1000) / 8760;

describe('the pressure of a leaky room', () => {
  for (const one of referenceCases('08-airflow-moisture.json', /^pressure-network-/))
    test(caseName(one), () => {
      const rows = one.inputs.paths as number[][];
      const column = (i: number) => Float64Array.from(rows, (row) => row[i]);
      const paths: LeakPaths = {
        coefficient: column(0),
        exponent: column(1),
        heightM: column(2),
        windCoefficient: column(3),
      };
      const n = (key: string) => inputNumber(one, key);
      const air = {
        insideC: n('t_i'),
        outsideC: n('t_e'),
        windMPerS: n('wind'),
        fanKgPerS: n('supply'),
      };
      const outside = dryAirKgPerM3(air.outsideC);
      const windPa = paths.windCoefficient.map((cp) => cp * 0.5 * outside * air.windMPerS ** 2);
      const p = balancedPa(paths, windPa, outside, dryAirKgPerM3(air.insideC), air.fanKgPerS, 0);
      const flows = rows.map((_, k) => leakKgPerS(paths, k, air, p));
      expectCase(one, {
        p_internal: p,
        flows_kg_s: flows,
        infiltration: flows.reduce((sum, flow) => sum + Math.max(0, flow), 0),
      });
    });

  test('is the one that the slow and sure search finds, in any wind, cold or fan', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            c: fc.double({ min: 1e-4, max: 0.1, noNaN: true }),
            n: fc.double({ min: 0.5, max: 1, noNaN: true }),
            z: fc.double({ min: 0, max: 12, noNaN: true }),
            cp: fc.double({ min: -1, max: 0.8, noNaN: true }),
          }),
          { minLength: 1, maxLength: 8 },
        ),
        fc.double({ min: -10, max: 35, noNaN: true }),
        fc.double({ min: -20, max: 40, noNaN: true }),
        fc.double({ min: 0, max: 15, noNaN: true }),
        fc.double({ min: -0.2, max: 0.2, noNaN: true }),
        (leaks, insideC, outsideC, windMPerS, fanKgPerS) => {
          const column = (of: (leak: (typeof leaks)[number]) => number) =>
            Float64Array.from(leaks, of);
          const paths: LeakPaths = {
            coefficient: column((l) => l.c),
            exponent: column((l) => l.n),
            heightM: column((l) => l.z),
            windCoefficient: column((l) => l.cp),
          };
          const air = { insideC, outsideC, windMPerS, fanKgPerS };
          const outside = dryAirKgPerM3(outsideC);
          const windPa = paths.windCoefficient.map((cp) => cp * 0.5 * outside * windMPerS ** 2);
          const p = balancedPa(paths, windPa, outside, dryAirKgPerM3(insideC), fanKgPerS, 0);
          const sure = zonePressurePa(paths, air);
          // Flow is taken straight below 1e-4 Pa: the two may differ by that much.
          expect(Math.abs(p - sure)).toBeLessThan(2e-4 + 1e-9 * Math.abs(sure));
          const net = leaks.reduce((sum, _, k) => sum + leakKgPerS(paths, k, air, p), fanKgPerS);
          const through = leaks.reduce(
            (sum, _, k) => sum + Math.abs(leakKgPerS(paths, k, air, p)),
            0,
          );
          const straight = leaks.reduce((sum, leak) => sum + 1.4 * leak.c * 1e-4 ** leak.n, 0);
          expect(Math.abs(net)).toBeLessThan(straight + 1e-6 * through);
        },
      ),
      { numRuns: 200 },
    );
  });
});

test('the wall coefficient meets its published marks: head-on, along, behind', () => {
  // Swami & Chandra 1988: C_p(0) = 0.6; figures for the side and the back from memory.
  expect(wallWindCoefficient(0)).toBeCloseTo(0.6, 2);
  expect(wallWindCoefficient(90)).toBeCloseTo(-0.44, 2);
  expect(wallWindCoefficient(180)).toBeCloseTo(-0.36, 2);
});

describe('leaks in the run', () => {
  const windy = plainYear({ dryBulbC: 0, windMPerS: 4, windFromDeg: 180 });
  const leaky = plainProject([airRoom({ leakage: { n50PerH: 5 } })]);

  /** The model by itself, without a run. */
  function leaks(weather: WeatherYear, fan = 0) {
    const steps = weatherSteps(weather, 3600);
    const clock = stepClock({ holidays: [] }, { year: 2019, hours: 8760, utcOffsetH: 0 }, 3600);
    const site = airSite(steps, clock, {
      pressurePa: standardPressurePa(0),
      densityKgPerM3: density,
      specificHeatJPerKgK: heat,
    });
    const house = building(leaky);
    return roomLeaks(
      house,
      house.rooms[0],
      { n50PerH: 5, exponent: 0.65, windShare: 1 },
      site,
      new Float64Array(8760).fill(fan),
    );
  }

  test('carry the heat of their mass flow', () => {
    const { findings } = runYear(leaky, windy);
    const kgPerS = leaks(windy).inflowKgPerS(100, 20);
    expect(kgPerS).toBeGreaterThan(0.01); // 5/h at 50 Pa in 200 m³ is 0.33 kg/s; some Pa drive it
    expect(kgPerS).toBeLessThan(0.1);
    expect(lossW(findings.rooms[0].balanceKWh.infiltration)).toBeCloseTo(kgPerS * heat * 20, 1);
    expect(findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
    expect(findings.quality.unconvergedSteps).toBe(0);
  });

  test('between the tabled degrees the flow is straight, within 0.5 % of the exact one', () => {
    const model = leaks(plainYear({ dryBulbC: (h) => -10 + (h % 30), windMPerS: (h) => h % 9 }));
    for (let k = 0; k < 400; k += 7) {
      const at = (roomC: number) => model.inflowKgPerS(k, roomC);
      const middle = at(20.5);
      expect(Math.abs(middle / ((at(20) + at(21)) / 2) - 1)).toBeLessThan(1e-12);
      // The second difference bounds what a straight piece misses: h²·f″/8.
      const bend = Math.abs(at(22) - 2 * at(21) + at(20)) / 8;
      expect(bend / middle).toBeLessThan(0.005);
    }
  });

  test('stack alone: twice the height difference of temperature grows the flow by the power law', () => {
    const still = leaks(plainYear({ dryBulbC: 0, windMPerS: 0 }));
    // Flow goes with Δρ^0.65 up to the densities themselves, which change by 4 %: 2 to 3 % of flow.
    const ratio = still.inflowKgPerS(0, 20) / still.inflowKgPerS(0, 10);
    const drive = (roomC: number) => dryAirKgPerM3(0) - dryAirKgPerM3(roomC);
    expect(Math.abs(ratio / (drive(20) / drive(10)) ** 0.65 - 1)).toBeLessThan(0.03);
  });

  test('an extract stronger than wind and stack draws all its air through the leaks', () => {
    const strong = 0.3;
    const { findings } = runYear(
      plainProject([
        airRoom({
          leakage: { n50PerH: 1 },
          ventilation: [{ id: 'hood', flowM3PerS: 0, extractM3PerS: strong }],
        }),
      ]),
      plainYear({ dryBulbC: 0, windMPerS: 1 }),
    );
    const { infiltration } = findings.rooms[0].balanceKWh;
    expect(lossW(infiltration) / (strong * density * heat * 20)).toBeCloseTo(1, 6);
    // Power law: 0.3 m³/s through 1/h at 50 Pa of 200 m³ needs 50·(0.3·3600/200)^(1/0.65) = 669 Pa.
    expect(findings.cautions.join(' ')).toContain('fans draw 669 Pa below outdoors in room');
  });

  test('a path into a leaky room leaves through its leaks, one out of it is made up there', () => {
    const rooms = [
      airRoom({ leakage: { n50PerH: 1 } }, 'hall'),
      airRoom({ leakage: { n50PerH: 1 } }, 'stair'),
    ];
    const flowM3PerS = 0.3; // far above what wind and stack drive through so few leaks
    const { findings } = runYear(
      plainProject(rooms, { airPaths: [{ from: 'hall', to: 'stair', flowM3PerS }] }),
      plainYear({ dryBulbC: 0, windMPerS: 1 }),
    );
    const [hall, stair] = findings.rooms;
    expect(lossW(hall.balanceKWh.infiltration)).toBeCloseTo(flowM3PerS * density * heat * 20, 1);
    expect(lossW(stair.balanceKWh.infiltration)).toBeCloseTo(0, 6);
    expect(findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  });
});

describe('open windows', () => {
  const cool = plainYear({ dryBulbC: 10, windMPerS: 1 });
  const single = (control: Json = {}) =>
    airRoom({
      airOpenings: [{ id: 'sash', kind: 'single-sided', areaM2: 1.2, heightM: 1.2, control }],
    });
  const ventilationW = (room: Json, weather = cool) =>
    lossW(runYear(plainProject([room]), weather).findings.rooms[0].balanceKWh.ventilation);

  test('single-sided airing carries the flow of EN 16798-7', () => {
    const flow = singleSidedM3PerS(1.2, 1.2, 20, 10, 1);
    expect(ventilationW(single())).toBeCloseTo(flow * dryAirKgPerM3(10) * heat * 10, 1);
  });

  test('they are shut by wind, cold, damp, schedule and a cool room, each by itself', () => {
    for (const control of [
      { windBelowMPerS: 0.9 },
      { outdoorAboveC: 12 },
      { outdoorHumidityBelow: 0.6 },
      { roomAboveC: 21 },
      { warmerThanOutdoorsK: 10.5 },
    ])
      expect(ventilationW(single(control)), JSON.stringify(control)).toBe(0);
    for (const control of [
      { windBelowMPerS: 1.1 },
      { outdoorAboveC: 9 },
      { outdoorHumidityBelow: 0.8 },
      { roomAboveC: 19 },
      { warmerThanOutdoorsK: 9 },
    ])
      expect(ventilationW(single(control)), JSON.stringify(control)).toBeCloseTo(
        ventilationW(single()),
        3,
      );
  });

  test('a limit by humidity says that it stands in for rain', () => {
    const { findings } = runYear(plainProject([single({ outdoorHumidityBelow: 0.8 })]), cool);
    expect(findings.assumptions.join(' ')).toContain('stands in for rain');
  });

  test('cross openings take wind by the difference of pressure on their sides', () => {
    const room = airRoom({
      airOpenings: [
        {
          id: 'through',
          kind: 'cross',
          openings: [
            { surface: 'south', areaM2: 0.5, heightM: 1.5 },
            { surface: 'north', areaM2: 0.5, heightM: 1.5 },
          ],
        },
      ],
    });
    // Wind from the south at 2.5 m over open land: 4 m/s of the 10 m mast times (2.5/10)^0.14.
    const windMPerS = 4 * (2.5 / 10) ** 0.14;
    const difference = wallWindCoefficient(0) - wallWindCoefficient(180);
    const flow = 0.6 * (0.5 / Math.SQRT2) * windMPerS * Math.sqrt(difference);
    const expected = flow * dryAirKgPerM3(10) * heat * 10;
    const found = ventilationW(room, plainYear({ dryBulbC: 10, windMPerS: 4, windFromDeg: 180 }));
    expect(found / expected).toBeCloseTo(1, 6);
  });

  test('night cooling takes the peak off a hot spell and never warms the room', () => {
    const summer = plainYear({
      dryBulbC: (h) => 22 + 7 * Math.sin((2 * Math.PI * ((h % 24) - 9)) / 24),
    });
    const free = (airOpenings: Json[]) => {
      const room = airRoom({
        airOpenings,
        gains: [{ id: 'machines', kind: 'equipment', powerW: 600 }],
      });
      room.heating = undefined;
      room.cooling = undefined;
      const { findings } = runYear(plainProject([JSON.parse(JSON.stringify(room))]), summer);
      return findings.rooms[0].airTemperatureC;
    };
    const shut = free([]);
    const open = free([
      {
        id: 'night',
        kind: 'single-sided',
        areaM2: 1,
        heightM: 1.2,
        control: { roomAboveC: 22, warmerThanOutdoorsK: 1, windBelowMPerS: 8 },
      },
    ]);
    expect(open.max).toBeLessThan(shut.max - 5);
    expect(open.min).toBeGreaterThan(20); // it shuts again at 22 °C, and outdoors falls to 15
  });
});

describe('ventilation with recovery', () => {
  const cold = plainYear({ dryBulbC: -10 });
  const full = 0.05 * density * heat * 30; // W without recovery
  const lossOf = (one: Json, weather = cold) =>
    lossW(
      runYear(
        plainProject([airRoom({ ventilation: [{ id: 'unit', flowM3PerS: 0.05, ...one }] })]),
        weather,
      ).findings.rooms[0].balanceKWh.ventilation,
    );

  test('loses 1 − η of the difference', () => {
    expect(lossOf({ heatRecovery: 0.8 })).toBeCloseTo(0.2 * full, 3);
  });

  test('a frost limit keeps the exhaust at its temperature', () => {
    // Exhaust at 5 °C: η = (20 − 5)/30 = 0.5, from the balance of the exchanger.
    expect(lossOf({ heatRecovery: 0.8, leastExhaustC: 5 })).toBeCloseTo(0.5 * full, 3);
    expect(lossOf({ heatRecovery: 0.4, leastExhaustC: 5 })).toBeCloseTo(0.6 * full, 3);
  });

  test('a bypass supplies no warmer than asked in mild air, and stays shut in the cold', () => {
    const mild = plainYear({ dryBulbC: 12 });
    const supplyAt = (supplyC: number) => 0.05 * density * heat * (20 - supplyC);
    expect(lossOf({ heatRecovery: 0.8, bypassAboveSupplyC: 16 }, mild)).toBeCloseTo(
      supplyAt(16),
      2,
    );
    expect(lossOf({ heatRecovery: 0.8, bypassAboveSupplyC: 16 })).toBeCloseTo(supplyAt(14), 2);
  });

  test('a unit for two rooms, supply here and extract there, keeps mass and heat', () => {
    const flowM3PerS = 0.04;
    const { findings } = runYear(
      plainProject([airRoom({}, 'living'), airRoom({}, 'kitchen')], {
        airUnits: [
          {
            id: 'central',
            supply: [{ room: 'living', flowM3PerS }],
            extract: [{ room: 'kitchen', flowM3PerS }],
            heatRecovery: 0.75,
          },
        ],
        airPaths: [{ from: 'living', to: 'kitchen', flowM3PerS }],
      }),
      cold,
    );
    const [living, kitchen] = findings.rooms;
    // Both rooms at 20 °C: the supply comes at −10 + 0.75·30 = 12.5 °C, the path carries nothing.
    expect(lossW(living.balanceKWh.ventilation)).toBeCloseTo(flowM3PerS * density * heat * 7.5, 2);
    expect(lossW(kitchen.balanceKWh.rooms)).toBeCloseTo(0, 6);
    expect(lossW(kitchen.balanceKWh.ventilation)).toBe(0);
    expect(findings.quality.relativeBalanceResidual).toBeLessThan(1e-9);
  });

  test('supply without extract passes on by a path and takes outdoor heat once', () => {
    const flowM3PerS = 0.03;
    const { findings } = runYear(
      plainProject(
        [
          airRoom({ ventilation: [{ id: 'in', flowM3PerS, extractM3PerS: 0 }] }, 'living'),
          airRoom(
            { ventilation: [{ id: 'out', flowM3PerS: 0, extractM3PerS: flowM3PerS }] },
            'bath',
          ),
        ],
        { airPaths: [{ from: 'living', to: 'bath', flowM3PerS }] },
      ),
      cold,
    );
    const [living, bath] = findings.rooms;
    expect(lossW(living.balanceKWh.ventilation)).toBeCloseTo(flowM3PerS * density * heat * 30, 2);
    expect(lossW(bath.balanceKWh.ventilation)).toBe(0);
  });
});

test('a doorway carries K·ΔT^1.5 between two rooms', () => {
  const warm = airRoom({}, 'warm');
  const cold = { ...airRoom({}, 'cold'), heating: { setPointC: 15 }, cooling: { setPointC: 15 } };
  const { findings } = runYear(
    plainProject([warm, cold], {
      doorways: [{ rooms: ['warm', 'cold'], widthM: 0.8, heightM: 2, dischargeCoefficient: 0.5 }],
    }),
    plainYear({ dryBulbC: 10 }),
  );
  const expected = doorwayExchangeWPerK15(1.6, 2, 20, 0.5, density * heat) * 5 ** 1.5;
  expect(lossW(findings.rooms[0].balanceKWh.rooms) / expected).toBeCloseTo(1, 4);
  expect(lossW(findings.rooms[1].balanceKWh.rooms) / expected).toBeCloseTo(-1, 4);
});

test('at a height the same volume carries less heat', () => {
  const room = airRoom({ infiltration: { airChangesPerH: 1 } });
  const loss = (elevationM: number) =>
    lossW(
      runYear(plainProject([room]), plainYear({ dryBulbC: 0 }, { ...seaside, elevationM })).findings
        .rooms[0].balanceKWh.infiltration,
    );
  expect(loss(1600) / loss(0)).toBeCloseTo(standardPressurePa(1600) / standardPressurePa(0), 6);
});

describe('air that cannot flow is named', () => {
  const faults = (room: Json, more: Json = {}) => messages(plainProject([airRoom(room)], more));

  test('more exhaust than supply with no make-up path', () => {
    expect(
      faults({ ventilation: [{ id: 'hood', flowM3PerS: 0.01, extractM3PerS: 0.05 }] }),
    ).toEqual([
      'plain.json, rooms[0]: found more exhaust than supply in room "room": 50 L/s out, 10 L/s in, and no path that makes up 40 L/s, expected as much air into the room as out of it. Add an airPath to the room under the same schedule, supply more, or give the room leakage.',
    ]);
  });

  test('recovery beyond 1 and beyond what the extract gives', () => {
    expect(
      faults({ ventilation: [{ id: 'unit', flowM3PerS: 0.05, heatRecovery: 1.2 }] })[0],
    ).toContain('rooms[0].ventilation[0].heatRecovery: found 1.2, expected a number of at most 1');
    expect(
      faults({
        leakage: { n50PerH: 3 },
        ventilation: [{ id: 'unit', flowM3PerS: 0.05, extractM3PerS: 0.025, heatRecovery: 0.8 }],
      })[0],
    ).toContain('found 0.8 with 25 L/s of extract for 50 L/s of supply, expected at most 0.5');
  });

  test('negative flows', () => {
    expect(faults({ ventilation: [{ id: 'unit', flowM3PerS: -0.05 }] })[0]).toContain(
      'rooms[0].ventilation[0].flowM3PerS: found -0.05, expected a number of at least 0',
    );
  });

  test('leaks twice, lost rooms and surfaces, a doorway into itself, all together', () => {
    expect(faults({ leakage: { n50PerH: 3 }, infiltration: { airChangesPerH: 0.5 } })[0]).toContain(
      'rooms[0].leakage: found leakage beside infiltration by air changes',
    );
    const lost = faults(
      {
        airOpenings: [
          {
            id: 'x',
            kind: 'cross',
            openings: [
              { surface: 'sout', areaM2: 1, heightM: 1 },
              { surface: 'north', areaM2: 1, heightM: 1 },
            ],
            control: { occupied: 'people' },
          },
        ],
      },
      { airUnits: [{ id: 'u', supply: [{ room: 'rom', flowM3PerS: 1 }], extract: [] }] },
    );
    expect(lost).toHaveLength(3);
    expect(lost.join('\n')).toContain('Did you mean "south"?');
    expect(lost.join('\n')).toContain('Did you mean "room"?');
    expect(
      faults({}, { doorways: [{ rooms: ['room', 'room'], widthM: 1, heightM: 2 }] })[0],
    ).toContain('doorways[0].rooms: found "room" twice');
  });
});
