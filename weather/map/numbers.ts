// Numbers as tables write them: decimal comma, thousands marks, blanks around; nothing else passes.
import type { ThousandsMark } from './mapping.ts';

export interface NumberForm {
  readonly decimal: '.' | ',';
  readonly thousands: ThousandsMark;
}

const pow10 = Array.from({ length: 16 }, (_, k) => 10 ** k);

/**
 * The number in `text` from `from` to `to`, or NaN. A mantissa below 2^53 over a power of ten up to 15
 * rounds as the decimal was meant (both are exact), so the quick way gives what `Number` gives.
 */
export function numberIn(text: string, from: number, to: number, form: NumberForm): number {
  let i = from;
  let end = to;
  while (i < end && text.charCodeAt(i) <= 32) i++;
  while (end > i && text.charCodeAt(end - 1) <= 32) end--;
  const start = i;
  const point = form.decimal === '.' ? 46 : 44;
  let sign = 1;
  const first = text.charCodeAt(i);
  if (i < end && (first === 45 || first === 43)) {
    if (first === 45) sign = -1;
    i++;
  }
  let mantissa = 0;
  let digits = 0;
  let behind = 0;
  let hasPoint = false;
  for (; i < end; i++) {
    const c = text.charCodeAt(i);
    if (c >= 48 && c <= 57) {
      mantissa = mantissa * 10 + (c - 48);
      digits++;
      if (hasPoint) behind++;
    } else if (c === point && !hasPoint) hasPoint = true;
    else break;
  }
  if (i === end && digits > 0 && digits <= 15) {
    const value = behind === 0 ? mantissa : mantissa / pow10[behind];
    return value === 0 ? 0 : sign * value;
  }
  return slowNumber(text.slice(start, end), form);
}

export function numberOf(text: string, form: NumberForm): number {
  return numberIn(text, 0, text.length, form);
}

/** With thousands marks, exponents and the true minus; NaN for anything else. */
function slowNumber(text: string, { decimal, thousands }: NumberForm): number {
  const point = decimal === '.' ? '\\.' : ',';
  let whole = '\\d+';
  if (thousands !== '') {
    const mark =
      thousands === ' ' ? '[ \\u00a0\\u202f]' : thousands === '.' ? '\\.' : `[${thousands}’]`;
    whole = `(?:\\d{1,3}(?:${mark}\\d{3})+|\\d+)`;
  }
  const form = new RegExp(
    `^[-+−]?(?:${whole}(?:${point}\\d*)?|${point}\\d+)(?:[eE][-+]?\\d{1,3})?$`,
  );
  if (!form.test(text)) return Number.NaN;
  const plain = text
    .replace('−', '-')
    .replace(thousands === '.' ? /\./g : thousands === '' ? /$^/ : /[ \u00a0\u202f'’]/g, '')
    .replace(thousands === ',' ? /,/g : /$^/, '')
    .replace(decimal, '.');
  const value = Number(plain);
  if (!Number.isFinite(value)) return Number.NaN;
  return value === 0 ? 0 : value;
}
