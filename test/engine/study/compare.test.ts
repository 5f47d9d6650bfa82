import { describe, expect, test } from 'vitest';
import {
  annuityFactor,
  type CaseResult,
  type CompareOptions,
  changeText,
  compare,
  comparedCases,
  finishStudy,
  isDifference,
  type Json,
  measureCostToday,
  netPresentValue,
  secondCut,
  simplePaybackYears,
  sortedCases,
} from '../../../engine/study/index.ts';
import { faultText, readWeather } from '../../../weather/index.ts';
import { sampleProject, sampleWeather } from '../../app/sample.ts';
import { building } from '../assembly/plain-room.ts';

const energy = {
  currency: 'crowns',
  carriers: [{ id: 'gas', name: 'Gas', costPerKWh: 0.1, co2KgPerKWh: 0.2 }],
  supplies: [{ id: 'boiler', kind: 'direct', carrier: 'gas', efficiency: 0.8 }],
};
const insulation = 'constructions[brick-wall].layers[0].resistanceM2KPerW';
const [room] = sampleProject.rooms;
const project = {
  ...sampleProject,
  energy,
  rooms: [{ ...room, heating: { ...room.heating, supply: 'boiler' } }],
  options: [
    { id: 'same', name: 'Nothing new', changes: [{ path: insulation, value: 2 }], measureCost: 0 },
    {
      id: 'thick',
      name: 'Twice the insulation',
      changes: [{ path: insulation, value: 4 }],
      measureCost: 2000,
      lifetimeYears: 20,
    },
    {
      id: 'warm',
      name: 'Set-point 21',
      note: 'As the tenants wish.',
      changes: [{ path: 'rooms[room].heating.setPointC', value: 21 }],
    },
  ],
};
const document = project as unknown as Json;
const base = building(document);
const read = readWeather(sampleWeather(), { file: 'year.csv' });
if (!read.ok) throw new Error('the sample weather is wrong');
const weathers = new Map([['w', read.value]]);
const options: CompareOptions = { stepMinutes: 30, accuracy: 'coarser', weatherOf: () => 'w' };

describe('base and options', () => {
  const { cases, faults } = comparedCases(base, document, 'p.json', [['thick', 'warm']]);
  const result = finishStudy(compare(cases, options), weathers);
  const of = (id: string): CaseResult => {
    const found = result.cases.find((one) => one.id === id);
    if (!found) throw new Error(`no case ${id}`);
    return found;
  };
  test('are all there, the combination too', () => {
    expect(faults).toEqual([]);
    expect(result.cases.map((one) => one.id)).toEqual([
      'base',
      'same',
      'thick',
      'warm',
      'thick+warm',
    ]);
  });
  test('an option that changes nothing differs by nothing, and is not sold as a difference', () => {
    for (const figure of Object.values(of('same').building)) {
      expect(figure).toMatchObject({ difference: 0, uncertainty: 0 });
      expect(isDifference(figure)).toBe(false);
    }
  });
  test('insulation saves more than the cutting of time and walls leaves open', () => {
    const { heatingKWh } = of('thick').building;
    expect(heatingKWh?.difference).toBeLessThan(0);
    expect(heatingKWh && isDifference(heatingKWh)).toBe(true);
    expect(heatingKWh?.uncertainty).toBeGreaterThan(0);
    expect(heatingKWh?.uncertainty).toBeLessThan(0.05 * Math.abs(heatingKWh?.difference ?? 0));
  });
  test('final energy, cost and CO₂ follow the heat by the given factors', () => {
    const { heatingKWh, finalEnergyKWh, cost, co2Kg } = of('thick').building;
    const heat = heatingKWh?.value ?? Number.NaN;
    expect(finalEnergyKWh?.value).toBeCloseTo(heat / 0.8, 6);
    expect(cost?.value).toBeCloseTo((heat / 0.8) * 0.1, 6);
    expect(co2Kg?.value).toBeCloseTo((heat / 0.8) * 0.2, 6);
  });
  test('payback and present value follow from the saving', () => {
    const { economy, building: figures } = of('thick');
    const saving = -(figures.cost?.difference ?? Number.NaN);
    expect(economy?.savingPerYear).toBeCloseTo(saving, 9);
    expect(economy?.simplePaybackYears).toBeCloseTo(2000 / saving, 9);
    // 30 years at 3 %: bought at 0 and 20, half of the second still good at 30.
    const annuity = (1 - 1.03 ** -30) / 0.03;
    const bought = 2000 + 2000 / 1.03 ** 20 - 1000 / 1.03 ** 30;
    expect(economy?.netPresentValue).toBeCloseTo(saving * annuity - bought, 6);
  });
  test('a measure without its cost has no payback, and one that costs more does not pay back', () => {
    expect(of('warm').economy).toBeNull();
    expect(of('same').economy?.simplePaybackYears).toBeNull();
    expect(result.notes.join(' ')).toContain('Set-point 21');
  });
  test('say what changed, and what follows', () => {
    expect(of('thick').changes).toEqual([
      'construction Brick with insulation, layer 1 (insulation): resistance: 2 m²K/W → 4 m²K/W',
    ]);
    // 1/(0.13 + 2 + 0.2/0.7 + 0.04) and with 4
    expect(of('thick').consequences).toEqual(['Brick with insulation: U 0.41 → 0.22 W/m²K']);
    expect(of('warm').changes).toEqual(['room Room, heating: set point: 20 °C → 21 °C']);
    expect(of('warm').note).toBe('As the tenants wish.');
  });
  test('come in order of any figure, the base first', () => {
    const names = sortedCases(result.cases, 'heatingKWh').map((one) => one.id);
    expect(names[0]).toBe('base');
    expect(names.indexOf('thick')).toBeLessThan(names.indexOf('warm'));
    expect(sortedCases(result.cases, 'netPresentValue')[0].id).toBe('base');
  });
  test('are the same again', () => {
    const two = finishStudy(compare([cases[0], cases[2]], options), weathers);
    expect(two.cases).toEqual([of('base'), of('thick')]);
  });
});

test('uncertainty by halving lies close to that by doubling', () => {
  const { cases } = comparedCases(base, document, 'p.json');
  const two = [cases[0], cases[2]];
  const figures = (accuracy: 'coarser' | 'finer') =>
    finishStudy(compare(two, { ...options, accuracy }), weathers).cases[1].building.heatingKWh;
  const [coarser, finer] = [figures('coarser'), figures('finer')];
  expect(coarser?.difference).toBe(finer?.difference);
  // The estimates bound the same error: within an order of magnitude of each other.
  expect(finer?.uncertainty).toBeLessThan(10 * (coarser?.uncertainty ?? 0) + 0.1);
});

test('a step that cannot be doubled is halved instead', () => {
  expect(secondCut('coarser', { stepMinutes: 60, refine: 1 })).toMatchObject({
    stepMinutes: 30,
    refine: 2,
  });
  expect(secondCut('coarser', { stepMinutes: 15, refine: 1 })).toMatchObject({
    stepMinutes: 30,
    refine: 1,
  });
  expect(secondCut('none', { stepMinutes: 15, refine: 1 })).toBeNull();
});

describe('options that no longer fit', () => {
  test('are all named, with place and what is there', () => {
    const broken = {
      ...project,
      options: [
        { id: 'gone', name: 'Gone', changes: [{ path: 'rooms[attic].volumeM3', value: 50 }] },
        { id: 'odd', name: 'Odd', changes: [{ path: insulation, value: -3 }] },
      ],
    } as unknown as Json;
    const { cases, faults } = comparedCases(building(broken), broken, 'p.json', [['gone', 'lost']]);
    expect(cases.map((one) => one.id)).toEqual(['base']);
    const text = faults.map(faultText).join('\n');
    expect(text).toContain('options[gone].changes[0].path');
    expect(text).toContain('one of room');
    expect(text).toContain('"Odd"');
    expect(text).toContain('resistanceM2KPerW');
    expect(text).toContain('no option "lost"');
  });
});

describe('money', () => {
  test('an annuity is its closed form, also without interest and in a broken year', () => {
    expect(annuityFactor(30, 0.03)).toBeCloseTo((1 - 1.03 ** -30) / 0.03, 12);
    expect(annuityFactor(25, 0)).toBeCloseTo(25, 12);
    // Rising by e: (1 − ((1+e)/(1+i))^n)/(i − e)
    expect(annuityFactor(20, 0.04, 0.01)).toBeCloseTo((1 - (1.01 / 1.04) ** 20) / 0.03, 12);
    expect(annuityFactor(1.5, 0)).toBeCloseTo(1.5, 12);
  });
  test('a measure that outlasts the years is bought once', () => {
    const economics = { years: 30, discountShare: 0.03, priceRiseShare: 0 };
    expect(measureCostToday({ cost: 100, lifetimeYears: Infinity }, economics)).toBe(100);
    expect(measureCostToday({ cost: 100, lifetimeYears: 30 }, economics)).toBe(100);
    expect(measureCostToday({ cost: 100, lifetimeYears: 60 }, economics)).toBeCloseTo(
      100 - 50 / 1.03 ** 30,
      12,
    );
    expect(measureCostToday({ cost: 100, lifetimeYears: 15 }, economics)).toBeCloseTo(
      100 + 100 / 1.03 ** 15,
      12,
    );
  });
  test('nothing saved does not pay back', () => {
    expect(simplePaybackYears(100, 0)).toBeNull();
    expect(simplePaybackYears(100, 25)).toBe(4);
    expect(netPresentValue([], 0, { years: 30, discountShare: 0.03, priceRiseShare: 0 })).toBe(0);
  });
});

test('changes are told in words', () => {
  const line = (path: string, before: Json | undefined, after: Json | undefined) =>
    changeText(document, { path, before, after });
  expect(line('rooms[room].infiltration.airChangesPerH', 0.5, 0.2)).toBe(
    'room Room, infiltration: air changes: 0.5 1/h → 0.2 1/h',
  );
  expect(line('rooms[room].ventilation[+]', undefined, { id: 'fan', flowM3PerS: 0.01 })).toBe(
    'room Room: new ventilation: fan (nothing before)',
  );
  expect(line('rooms[room].comfort', { bandLowC: 19 }, undefined)).toBe(
    'room Room: comfort: band low 19 °C taken out',
  );
});
