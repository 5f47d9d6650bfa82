// Figures as the report writes them: thousands by comma, a true minus sign, no digit more than the
// quantity bears.

import { type Markup, markup } from './markup.ts';

const minus = '\u2212';

/** A number with fixed decimals; an en dash where there is none. */
export function figure(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return '\u2013';
  const [whole = '', part] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  const text = part === undefined ? grouped : `${grouped}.${part}`;
  return value < 0 && /[1-9]/.test(text) ? minus + text : text;
}

/** 3.3 × 10⁻¹³, for shares that are next to nothing. */
export function powerOfTen(value: number): Markup {
  if (!(value > 0) || !Number.isFinite(value)) return markup`${figure(value)}`;
  const [mantissa = '', exponent = ''] = value.toExponential(1).split('e');
  return markup`${mantissa} × 10<sup>${figure(Number(exponent))}</sup>`;
}
