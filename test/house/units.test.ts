import { expect, test } from 'vitest';
import { sourcesOf } from './sources.ts';
import { exportedNumbers, unitless } from './units.ts';

/** Numbers that have no one unit, each with the reason. */
const linear = 'a line in absolute temperature, λ = λ₀ + λ₁·T: unit and slope in the doc line';
const anyUnits = 'heat or vapour, as the header says: the units need only agree';
const allowed: Readonly<Record<string, string>> = {
  'engine/physics/cavity-convection.ts: conductivity0': linear,
  'engine/physics/cavity-convection.ts: conductivity1': linear,
  'engine/physics/cavity-convection.ts: viscosity0': linear,
  'engine/physics/cavity-convection.ts: viscosity1': linear,
  'engine/physics/cavity-convection.ts: specificHeat0': linear,
  'engine/physics/cavity-convection.ts: specificHeat1': linear,
  'engine/physics/pane-optics.ts: opticalDepth': 'a pure number by its definition',
  'engine/physics/two-openings.ts: pressureDifference': 'of pressure coefficients, a pure number',
  'engine/physics/well-mixed.ts: firstCapacity': anyUnits,
  'engine/physics/well-mixed.ts: secondCapacity': anyUnits,
};

test('every exported quantity of weather and engine has its unit in its name', () => {
  const sources = sourcesOf('weather', 'engine');
  expect(sources.flatMap(({ text }) => exportedNumbers(text)).length).toBeGreaterThan(200);
  const found = sources.flatMap(unitless);
  expect(found.filter((name) => !Object.hasOwn(allowed, name))).toEqual([]);
  // A reason without a name has outlived its use.
  expect(Object.keys(allowed).filter((name) => !found.includes(name))).toEqual([]);
});

test('names with a unit, pure numbers and words that are no quantity pass', () => {
  const text = `export interface Room {
  readonly areaM2: number;
  readonly uValueWPerM2K: number;
  readonly conductivityWPerMK: number;
  readonly flowM3PerS?: number;
  readonly pressurePa: Float64Array;
  readonly airTemperatureC: number | null;
  readonly heatShare: number;
  readonly heightFactor: number;
  readonly flowCount: number;
  readonly steps: number;
  readonly capacityJPerK: readonly number[];
}`;
  expect(unitless({ path: 'a.ts', text })).toEqual([]);
  expect(exportedNumbers(text)).toHaveLength(11);
});

test('a quantity without a unit is found in a type, and in the parameters of a function', () => {
  const text = `export type Wall = {
  readonly area: number;
  readonly airTemperature: Float64Array;
  readonly flowPerPerson: number;
  readonly name: string;
}
export function loss(height: number, tiltDeg: number): number {
  const width: number = 1;
  return height * tiltDeg * width;
}`;
  expect(unitless({ path: 'a.ts', text })).toEqual([
    'a.ts: area',
    'a.ts: airTemperature',
    'a.ts: flowPerPerson',
    'a.ts: height',
  ]);
});
