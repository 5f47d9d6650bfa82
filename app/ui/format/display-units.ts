// The units that figures are shown and typed in: SI, or inch-pound. The document is in SI always.

import type { Dimension } from './typed-quantity.ts';

export type UnitSystem = 'SI' | 'IP';

export interface ShownUnit {
  readonly unit: string;
  /** In SI. */
  readonly size: number;
  /** Figures after the point at most. */
  readonly decimals: number;
}

interface Shown {
  readonly dimension: Dimension;
  readonly SI: ShownUnit;
  readonly IP: ShownUnit;
}

const inch = 0.0254;
const foot = 0.3048;
const btuPerHour = 0.293_071_07;
const kelvinPerF = 5 / 9;
const shown = (unit: string, size: number, decimals: number): ShownUnit => ({
  unit,
  size,
  decimals,
});
const same = (dimension: Dimension, unit: string, size: number, decimals: number): Shown => {
  const one = shown(unit, size, decimals);
  return { dimension, SI: one, IP: one };
};

export const shownQuantities = {
  thickness: { dimension: 'length', SI: shown('mm', 0.001, 1), IP: shown('in', inch, 2) },
  length: { dimension: 'length', SI: shown('m', 1, 3), IP: shown('ft', foot, 2) },
  area: { dimension: 'area', SI: shown('m²', 1, 3), IP: shown('ft²', foot ** 2, 1) },
  volume: { dimension: 'volume', SI: shown('m³', 1, 2), IP: shown('ft³', foot ** 3, 0) },
  conductivity: {
    dimension: 'conductivity',
    SI: shown('W/(m·K)', 1, 4),
    IP: shown('BTU/(h·ft·°F)', btuPerHour / (foot * kelvinPerF), 4),
  },
  transmittance: {
    dimension: 'transmittance',
    SI: shown('W/(m²·K)', 1, 3),
    IP: shown('BTU/(h·ft²·°F)', btuPerHour / (foot ** 2 * kelvinPerF), 3),
  },
  resistance: {
    dimension: 'resistance',
    SI: shown('m²·K/W', 1, 3),
    IP: shown('h·ft²·°F/BTU', (foot ** 2 * kelvinPerF) / btuPerHour, 2),
  },
  density: { dimension: 'density', SI: shown('kg/m³', 1, 1), IP: shown('lb/ft³', 16.018_463, 1) },
  specificHeat: {
    dimension: 'specificHeat',
    SI: shown('J/(kg·K)', 1, 0),
    IP: shown('BTU/(lb·°F)', 4186.8, 3),
  },
  capacity: { dimension: 'capacity', SI: shown('kJ/K', 1000, 1), IP: shown('BTU/°F', 1899.1, 0) },
  power: { dimension: 'power', SI: shown('W', 1, 1), IP: shown('BTU/h', btuPerHour, 0) },
  powerPerArea: {
    dimension: 'powerPerArea',
    SI: shown('W/m²', 1, 2),
    IP: shown('BTU/(h·ft²)', btuPerHour / foot ** 2, 2),
  },
  flow: { dimension: 'flow', SI: shown('l/s', 0.001, 2), IP: shown('cfm', foot ** 3 / 60, 1) },
  temperature: {
    dimension: 'temperature',
    SI: shown('°C', 1, 2),
    IP: shown('°F', kelvinPerF, 1),
  },
  difference: { dimension: 'difference', SI: shown('K', 1, 2), IP: shown('°F', kelvinPerF, 2) },
  angle: same('angle', '°', 1, 1),
  share: same('share', '', 1, 4),
  perHour: same('number', '1/h', 1, 3),
  hours: same('number', 'h', 1, 2),
  number: same('number', '', 1, 6),
} as const satisfies Readonly<Record<string, Shown>>;

export type QuantityName = keyof typeof shownQuantities;

export function shownUnit(name: QuantityName, system: UnitSystem): ShownUnit {
  return shownQuantities[name][system];
}

/** A value in SI as the number that stands in a field, without grouping. */
export function shownValue(value: number, name: QuantityName, system: UnitSystem): string {
  const { size, decimals } = shownUnit(name, system);
  const isF = name === 'temperature' && system === 'IP';
  const number = value / size + (isF ? 32 : 0);
  return String(Number(number.toFixed(decimals))).replace('-', '\u2212');
}
