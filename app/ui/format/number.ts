// Figures as the window writes them: thousands by comma, a true minus sign, decimals by the
// quantity, and no digit more. SI is the only system so far; every screen formats through here.

const minus = '\u2212';

/** A number with fixed decimals. An en dash where there is none. */
export function figure(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return '\u2013';
  const text = Math.abs(value).toLocaleString('en-GB', {
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
  });
  const isZero = !/[1-9]/.test(text);
  return value < 0 && !isZero ? minus + text : text;
}

/** A difference: its sign is always shown, except on nought. */
export function difference(value: number, decimals = 0): string {
  const text = figure(value, decimals);
  return text.startsWith(minus) || !/[1-9]/.test(text) ? text : `+${text}`;
}

/** A quantity: the figure and its unit, kept apart because they are set in different weights. */
export interface Quantity {
  readonly figure: string;
  readonly unit: string;
}

const kWh = (value: number): Quantity => ({ figure: figure(value), unit: 'kWh' });

export const quantity = {
  energyKWh: kWh,
  /** Whole house in tenths of a kilowatt, a room in hundredths. */
  housePowerW: (watts: number): Quantity => ({ figure: figure(watts / 1000, 1), unit: 'kW' }),
  roomPowerW: (watts: number): Quantity => ({ figure: figure(watts / 1000, 2), unit: 'kW' }),
  heatW: (watts: number): Quantity => ({ figure: figure(watts), unit: 'W' }),
  temperatureC: (celsius: number): Quantity => ({ figure: figure(celsius, 1), unit: '°C' }),
  differenceK: (kelvin: number): Quantity => ({ figure: difference(kelvin, 1), unit: 'K' }),
  hours: (hours: number): Quantity => ({ figure: figure(hours), unit: 'h' }),
  areaM2: (area: number): Quantity => ({ figure: figure(area, 1), unit: 'm²' }),
  energyPerAreaKWhPerM2: (value: number): Quantity => ({ figure: figure(value), unit: 'kWh/m²' }),
} as const;

/** `21.4 °C` */
export function plain({ figure: value, unit }: Quantity): string {
  return `${value} ${unit}`;
}

/** A tiny share as mantissa and exponent: 3.2e-12 is 3 and 12 below nought. */
export function powerOfTen(value: number): { mantissa: string; exponent: string } | null {
  if (!(value > 0) || !Number.isFinite(value)) return null;
  let exponent = Math.floor(Math.log10(value));
  let mantissa = Math.round(value / 10 ** exponent);
  if (mantissa === 10) {
    mantissa = 1;
    exponent += 1;
  }
  return { mantissa: String(mantissa), exponent: figure(exponent) };
}

/** `0.21 s`, `340 ms` */
export function duration(milliseconds: number): string {
  return milliseconds < 100 ? `${figure(milliseconds)} ms` : `${figure(milliseconds / 1000, 2)} s`;
}
