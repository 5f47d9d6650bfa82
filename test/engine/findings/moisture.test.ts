// Vapour in rooms: the closed trajectories of 08-airflow-moisture.json for the integrator, steady states by
// hand for the whole path from project file to findings, and ISO 13788 for surfaces and build-ups.
import { describe, expect, test } from 'vitest';
import type { VapourRooms } from '../../../engine/findings/vapour-stage.ts';
import { advanceVapour, vapourState } from '../../../engine/findings/vapour-step.ts';
import {
  bufferVolumeM3,
  hygricDewPointC,
  hygricSaturationPa,
  personGain,
} from '../../../engine/physics/index.ts';
import {
  dryAirDensityKgPerM3,
  humidityRatio,
  saturationPressurePa,
} from '../../../weather/index.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  referenceCases,
} from '../../reference/cases.ts';
import {
  type Json,
  messages,
  plainProject,
  plainRoom,
  plainYear,
  runYear,
} from '../assembly/plain-room.ts';

const pressurePa = 101_325;
const density = dryAirDensityKgPerM3(20, pressurePa);
const evaporation = 2.501e6;

describe('the integrator follows closed trajectories', () => {
  // Concentrations stand for ratios, scaled down so far that p = P·w/(0.622 + w) is a straight line; with
  // P = 0.621945 Pa and 1 Pa of saturation the buffer's humidity is a concentration too.
  const scale = 1e-12;
  for (const one of referenceCases('08-airflow-moisture.json', /^moisture-(step|buffer)-/))
    test(caseName(one), () => {
      const n = (key: string) => inputNumber(one, key);
      const single = (value: number) => Float64Array.of(value);
      const hasBuffer = 'buffer' in one.inputs;
      const rooms: VapourRooms = {
        count: 1,
        airKg: single(n('volume')),
        bufferKg: single(hasBuffer ? n('buffer') : 0),
        bufferKgPerSPa: single(hasBuffer ? n('exchange') / 3600 : 0),
        gainKgPerS: single((n('source_g') / 3600) * scale),
        saturationPa: single(1),
        wetEnoughRatio: single(-1),
        dryEnoughRatio: single(Number.POSITIVE_INFINITY),
        saturatedRatio: single(Number.POSITIVE_INFINITY),
        maxHumidifyKgPerS: single(0),
        maxDryKgPerS: single(0),
        freshKgPerS: single((n('n') * n('volume')) / 3600),
        outdoorRatio: n('v_out') * scale,
        streamFrom: new Int32Array(0),
        streamTo: new Int32Array(0),
        streamKgPerS: new Float64Array(0),
        pressurePa: 0.621945,
      };
      const trajectory = (spanS: number) => {
        const state = vapourState(1);
        state.ratio[0] = n('v0') * scale;
        state.buffer[0] = n('v0') * scale;
        const v: number[] = [];
        let timeS = 0;
        for (const hour of inputNumbers(one, 'times_h'))
          for (; ; timeS += spanS) {
            if (timeS >= hour * 3600 - 1e-6) {
              v.push(state.ratio[0] / scale);
              break;
            }
            advanceVapour(rooms, state, spanS);
          }
        return v;
      };
      // The case's tolerance asks for steps of seconds; the run's 15 min stay within 0.5 % of them.
      expectCase(one, { v: trajectory(5) }, { v_end: 'a steady state, tested below' });
      const fine = trajectory(5);
      trajectory(900).forEach((value, i) => {
        expect(Math.abs(value / fine[i] - 1)).toBeLessThan(0.005);
      });
    });
});

/** A room at 20 °C with half an air change of outdoor air. */
function dampRoom(moisture: Json, id = 'room', more: Json = {}): Json {
  return {
    ...plainRoom(id),
    heating: { setPointC: 20 },
    cooling: { setPointC: 20 },
    infiltration: { airChangesPerH: 0.5 },
    moisture,
    ...more,
  };
}

const mild = plainYear({ dryBulbC: 5, relativeHumidity: 0.8 });
const outdoorRatio = humidityRatio(0.8 * saturationPressurePa(5), pressurePa);
const freshKgPerS = (0.5 * 200 * density) / 3600;
const humidityAt = (ratio: number) =>
  (pressurePa * ratio) / (0.621945 + ratio) / saturationPressurePa(20);

function moistureOf(document: Json, weather = mild, room = 0) {
  const { findings, rooms } = runYear(document, weather);
  const { moisture } = findings.rooms[room];
  if (!moisture) throw new Error('no moisture in the findings');
  return { moisture, hours: rooms[room], findings };
}

describe('the room balance', () => {
  const source = { id: 'wash', vapourKgPerS: 1e-4 };

  test('settles where the air carries away what the source gives', () => {
    const { moisture, hours } = moistureOf(plainProject([dampRoom({ sources: [source] })]));
    const steady = outdoorRatio + 1e-4 / freshKgPerS;
    expect(moisture.relativeHumidity.mean).toBeCloseTo(humidityAt(steady), 5);
    expect(hours.relativeHumidity?.[4000]).toBeCloseTo(humidityAt(steady), 5);
    const yearKg = 1e-4 * 8760 * 3600;
    expect(moisture.balanceKg.gains).toBeCloseTo(yearKg, 6);
    expect(moisture.balanceKg.air).toBeCloseTo(-yearKg, 3);
    expect(Math.abs(moisture.balanceKg.residual)).toBeLessThan(1e-9 * yearKg);
  });

  test('passes vapour on with the air that moves between rooms', () => {
    const still = { infiltration: { airChangesPerH: 0 } };
    const flowM3PerS = 0.02;
    const document = plainProject(
      [dampRoom({ sources: [source] }, 'bath', still), dampRoom({}, 'hall', still)],
      {
        airPaths: [
          { from: 'outdoors', to: 'bath', flowM3PerS },
          { from: 'bath', to: 'hall', flowM3PerS },
          { from: 'hall', to: 'outdoors', flowM3PerS },
        ],
      },
    );
    const steady = humidityAt(outdoorRatio + 1e-4 / (flowM3PerS * density));
    expect(moistureOf(document, mild, 0).moisture.relativeHumidity.mean).toBeCloseTo(steady, 5);
    expect(moistureOf(document, mild, 1).moisture.relativeHumidity.mean).toBeCloseTo(steady, 5);
  });

  test('counts people by what they do', () => {
    const gains = [{ id: 'people', kind: 'people', persons: 2, activity: 'seated' }];
    const { moisture } = moistureOf(plainProject([dampRoom({}, 'room', { gains })]));
    // At this air: the vapour pressure of the room itself, near 1000 Pa.
    const vapourPa = moisture.relativeHumidity.mean * saturationPressurePa(20);
    const each = personGain(1, 20, vapourPa).vapourKgPerS;
    expect(moisture.balanceKg.gains / (2 * each * 8760 * 3600)).toBeCloseTo(1, 4);
  });

  test('keeps back the share that a recovery unit returns', () => {
    const unit = { id: 'unit', flowM3PerS: 0.02, heatRecovery: 0.8, moistureRecovery: 0.6 };
    const { moisture } = moistureOf(
      plainProject([
        dampRoom({ sources: [{ id: 'wash', vapourKgPerS: 5e-5 }] }, 'room', {
          infiltration: { airChangesPerH: 0 },
          ventilation: [unit],
        }),
      ]),
    );
    const steady = outdoorRatio + 5e-5 / (0.4 * 0.02 * density);
    expect(moisture.relativeHumidity.mean).toBeCloseTo(humidityAt(steady), 5);
  });

  test('buffering damps the daily swing and leaves the mean', () => {
    const schedules = [{ id: 'evening', profile: 'evening' }];
    const profiles = [
      {
        id: 'evening',
        kind: 'hours',
        values: Array.from({ length: 24 }, (_, h) => (h >= 18 ? 1 : 0)),
      },
    ];
    const run = (moisture: Json) => {
      const sources = [{ ...source, schedule: 'evening' }];
      const { moisture: found } = moistureOf(
        plainProject([dampRoom({ sources, ...moisture })], { schedules, profiles }),
      );
      return found.relativeHumidity;
    };
    const bare = run({});
    const lined = run({ buffer: { areaM2: 100, bufferKgPerM2Percent: 0.001 } });
    // Closed form of one well mixed store under a block of 6 h a day: the swing goes with
    // (1 − e^(−6/τ))·(1 − e^(−18/τ))/(1 − e^(−24/τ)). τ is 2 h for the air; the lining counts as 578 m³
    // more (Rode 2005: A·MBV/(0.01·v_sat)), so 7.8 h. The film before it lets the air swing a little on.
    const swing = (tauH: number) =>
      ((1 - Math.exp(-6 / tauH)) * (1 - Math.exp(-18 / tauH))) / (1 - Math.exp(-24 / tauH));
    const tauH = (200 + bufferVolumeM3(100, 0.001, 20)) / (0.5 * 200);
    const ratio = (lined.max - lined.min) / (bare.max - bare.min);
    expect(Math.abs(ratio / (swing(tauH) / swing(2)) - 1)).toBeLessThan(0.05);
    expect(lined.mean).toBeCloseTo(bare.mean, 3);
  });

  test('fog is taken out where the air would pass saturation', () => {
    const { moisture } = moistureOf(
      plainProject([dampRoom({ sources: [{ id: 'pool', vapourKgPerS: 1e-3 }] })]),
    );
    const most = humidityRatio(saturationPressurePa(20), pressurePa);
    const condensed = (1e-3 - freshKgPerS * (most - outdoorRatio)) * 8760 * 3600;
    expect(moisture.relativeHumidity.max).toBeCloseTo(1, 9);
    expect(-moisture.balanceKg.condensed / condensed).toBeCloseTo(1, 4);
    expect(Math.abs(moisture.balanceKg.residual)).toBeLessThan(1e-6);
  });
});

describe('humidifier and dehumidifier', () => {
  const ratioAt = (humidity: number) =>
    humidityRatio(humidity * saturationPressurePa(20), pressurePa);

  test('hold their limit, and their latent heat is the water they turn over', () => {
    const { moisture } = moistureOf(
      plainProject([dampRoom({ humidifier: { humidityAbove: 0.5 } })]),
    );
    expect(moisture.relativeHumidity.min).toBeCloseTo(0.5, 6);
    const kgPerS = freshKgPerS * (ratioAt(0.5) - outdoorRatio);
    expect(moisture.humidifyingKWh).toBeCloseTo((kgPerS * evaporation * 8760) / 1000, 2);
    expect(moisture.peakHumidifyingW).toBeCloseTo(kgPerS * evaporation, 2);
    const humid = moistureOf(
      plainProject([
        dampRoom({
          sources: [{ id: 'wash', vapourKgPerS: 3e-4 }],
          dehumidifier: { humidityBelow: 0.6 },
        }),
      ]),
    ).moisture;
    expect(humid.relativeHumidity.max).toBeCloseTo(0.6, 6);
    const dryKgPerS = 3e-4 - freshKgPerS * (ratioAt(0.6) - outdoorRatio);
    expect(humid.dehumidifyingKWh).toBeCloseTo((dryKgPerS * evaporation * 8760) / 1000, 2);
  });

  test('give no more than their power', () => {
    const maxKgPerS = 2e-5;
    const { moisture } = moistureOf(
      plainProject([dampRoom({ humidifier: { humidityAbove: 0.9, maxKgPerS } })]),
    );
    expect(moisture.peakHumidifyingW).toBeCloseTo(maxKgPerS * evaporation, 6);
    expect(moisture.relativeHumidity.mean).toBeCloseTo(
      humidityAt(outdoorRatio + maxKgPerS / freshKgPerS),
      5,
    );
  });

  test('limits that cross are named', () => {
    expect(
      messages(
        plainProject([
          dampRoom({ humidifier: { humidityAbove: 0.6 }, dehumidifier: { humidityBelow: 0.4 } }),
        ]),
      ),
    ).toEqual([
      "plain.json, rooms[0].moisture.dehumidifier.humidityBelow: found 0.4, expected at least the humidifier's 0.6. Humidifier and dehumidifier would work against each other.",
    ]);
  });
});

describe('damp surfaces', () => {
  const cold = plainYear({ dryBulbC: 0, relativeHumidity: 0.9 });

  test('the required f_Rsi is that of ISO 13788 for the run’s own humidity', () => {
    const { moisture } = moistureOf(
      plainProject([
        dampRoom({ humidifier: { humidityAbove: 0.5 }, bridgeTemperatureFactor: 0.6 }),
      ]),
      cold,
    );
    // By hand: 50 % at 20 °C, 80 % at the surface, 0 °C outside.
    const vapourPa = 0.5 * saturationPressurePa(20);
    const lowestC = hygricDewPointC(vapourPa / 0.8);
    const { requiredFactor, worstPlane, bridgeFactor } = moisture.surfaceFactor;
    expect(requiredFactor).toBeCloseTo(lowestC / 20, 3);
    expect(worstPlane?.factor).toBeCloseTo(1 - 0.25 / (0.25 + 20 + 0.04), 9);
    expect(bridgeFactor).toBe(0.6);
    // The bridge's face is at 12 °C: 50 % in the room is 83 % there, all year.
    expect(moisture.bridge?.hoursAbove80).toBe(8760);
    expect(moisture.bridge?.longestSpellH).toBe(8760);
    expect(moisture.bridge?.highestHumidity).toBeCloseTo(vapourPa / hygricSaturationPa(12), 3);
    expect(moisture.worstFace?.hoursAbove80).toBe(0);
  });

  test('a damp bridge draws the caution about mould, a dry room none', () => {
    const cautions = (moisture: Json) =>
      moistureOf(plainProject([dampRoom(moisture)]), cold).findings.cautions.join(' ');
    expect(
      cautions({ humidifier: { humidityAbove: 0.5 }, bridgeTemperatureFactor: 0.6 }),
    ).toContain('Damp: surfaces in room stay humid enough for mould');
    expect(cautions({})).not.toContain('Damp');
  });
});

describe('condensation inside the envelope', () => {
  const winter = plainYear({
    dryBulbC: (h) => 8 - 10 * Math.cos((2 * Math.PI * (h - 372)) / 8760),
    relativeHumidity: 0.75,
  });
  const layers = (barrierSdM: number) => [
    { name: 'masonry', resistanceM2KPerW: 0.3, vapourSdM: 5 },
    { name: 'insulation', resistanceM2KPerW: 3, vapourSdM: 0.1 },
    { name: 'lining', resistanceM2KPerW: 0.05, vapourSdM: barrierSdM },
  ];
  const wallOf = (shell: Json[]) => {
    const document = plainProject([dampRoom({ humidifier: { humidityAbove: 0.5 } })]);
    document.constructions[0].layers = shell;
    const { moisture } = moistureOf(document, winter);
    return moisture;
  };

  test('inside insulation without a barrier gathers water in winter, with one it stays dry', () => {
    const open = wallOf(layers(0.1)).interstitial.find((one) => one.surface === 'south');
    expect(open?.condenses).toBe(true);
    expect(open?.peakKgPerM2).toBeGreaterThan(0.5);
    // Water comes in the cold half of the year: the count begins in autumn.
    expect([9, 10, 11, 12]).toContain(open?.firstMonth);
    const tight = wallOf(layers(100)).interstitial.find((one) => one.surface === 'south');
    expect(tight?.condenses).toBe(false);
    expect(tight?.peakKgPerM2).toBe(0);
  });

  test('surfaces without vapour data are listed, not guessed', () => {
    const bare = wallOf([{ name: 'insulation', resistanceM2KPerW: 3 }]);
    expect(bare.interstitial).toEqual([]);
    expect(bare.withoutVapourData).toEqual(['south', 'west', 'north', 'east', 'roof']);
  });
});

test('a project that asks for no moisture has none, and says nothing of it', () => {
  const { findings, rooms } = runYear(plainProject([plainRoom()]), mild);
  expect(findings.rooms[0].moisture).toBeUndefined();
  expect(rooms[0].relativeHumidity).toBeUndefined();
  expect(findings.assumptions.join(' ')).not.toContain('Humidity');
});
