import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Dimension, typedQuantity } from '../../../../app/ui/format/index.ts';

function value(text: string, dimension: Dimension = 'number', shown = 1): number {
  const typed = typedQuantity(text, dimension, shown);
  if (!typed.ok) throw new Error(typed.why);
  return typed.value;
}
const why = (text: string, dimension: Dimension = 'number') => {
  const typed = typedQuantity(text, dimension);
  return typed.ok ? `understood as ${typed.value}` : typed.why;
};

// Definitions: 1 in = 25.4 mm, 1 ft = 12 in, 1 lb = 0.45359237 kg; 1 BTU(IT) = 1055.05585262 J.
test.each([
  ['60', 'length', 0.001, 0.06],
  ['12 in', 'length', 0.001, 0.3048],
  ['12"', 'length', 0.001, 0.3048],
  ['5 ft 3 in', 'length', 1, 1.6002],
  ['1/2 in', 'length', 0.001, 0.0127],
  ['3*12 in', 'length', 1, 0.9144],
  ['12 cm + 30mm', 'length', 1, 0.15],
  ['(215 + 12) / 2', 'length', 0.001, 0.1135],
  ['2 m * 3', 'length', 1, 6],
  ['-4', 'temperature', 1, -4],
  ['−4,5 °C', 'temperature', 1, -4.5],
  ['68 F', 'temperature', 1, 20],
  ['30 %', 'share', 1, 0.3],
  ['10 sqft', 'area', 1, 0.9290304],
  ['100 cfm', 'flow', 1, 0.0471947],
  ['36 m³/h', 'flow', 1, 0.01],
  ['10 kW', 'power', 1, 10_000],
  ['62.4 lb/ft³', 'density', 1, 999.55],
] as const)('%s as %s with a field of size %d is %d', (text, dimension, shown, expected) => {
  expect(value(text, dimension, shown)).toBeCloseTo(expected, Math.abs(expected) > 100 ? 1 : 7);
});

describe('units of heat', () => {
  // Handbook factors: 1 BTU/(h·ft·°F) = 1.730735 W/(m·K), 1 BTU·in/(h·ft²·°F) = 0.1442279 W/(m·K),
  // 1 BTU/(h·ft²·°F) = 5.678263 W/(m²·K), 1 BTU/h = 0.2930711 W (NIST SP 811, appendix B.8).
  test.each([
    ['0.3 BTU/h·ft·F', 'conductivity', 0.3 * 1.730735],
    ['1 BTU/(h·ft·°F)', 'conductivity', 1.730735],
    ['1 BTU·in/(h·ft²·°F)', 'conductivity', 0.1442279],
    ['0,3 btu/(h ft2 F)', 'transmittance', 0.3 * 5.678263],
    ['20 h·ft²·F/BTU', 'resistance', 20 / 5.678263],
    ['1000 BTU/h', 'power', 293.0711],
    ['0.042 W/(m·K)', 'conductivity', 0.042],
  ] as const)('%s', (text, dimension, expected) => {
    expect(value(text, dimension) / expected).toBeCloseTo(1, 5);
  });
});

test('comma and point, in either use', () => {
  expect(value('0,035')).toBe(0.035);
  expect(value('1.234,5')).toBe(1234.5);
  expect(value('1,234.5')).toBe(1234.5);
  expect(value('1,234')).toBe(1.234); // a lone comma is a decimal comma
});

test.each([
  ['', 'Type a number'],
  ['abc', 'Type a number'],
  ['2 +', 'Type a number'],
  ['(2', 'A bracket is not closed'],
  ['2 furlong', '"furlong" is not understood here'],
  ['1/0', 'This comes to no number'],
])('%s is refused: %s', (text, expected) => {
  expect(why(text)).toBe(expected);
});

test('a sum of a number with a unit and one without is refused, as it could mean two things', () => {
  expect(why('5 cm + 20', 'length')).toBe('Give both parts a unit, or none');
  expect(why('(5 m) * (2 m)', 'length')).toBe('Only one of these can have a unit');
});

test('whatever number is written with 6 decimals is read back, with point and with comma', () => {
  fc.assert(
    fc.property(fc.integer({ min: -1e9, max: 1e9 }), (millionths) => {
      const text = (millionths / 1e6).toFixed(6);
      expect(value(text)).toBeCloseTo(millionths / 1e6, 9);
      expect(value(text.replace('.', ','))).toBe(value(text));
    }),
  );
});
