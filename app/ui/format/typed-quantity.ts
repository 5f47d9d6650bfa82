// What a person types into a number field: decimal comma or point, sums and products, and units with the
// number: `12 in`, `0,3 BTU/h·ft·F`, `3*5 cm`, `5 ft 3 in`. A number without a unit is in the unit that
// the field shows.
//
// Factors are exact by definition (1959 yard and pound; International Table BTU) or products of those.

export type Dimension =
  | 'length'
  | 'area'
  | 'volume'
  | 'conductivity'
  | 'transmittance'
  | 'resistance'
  | 'density'
  | 'specificHeat'
  | 'capacity'
  | 'power'
  | 'powerPerArea'
  | 'flow'
  | 'temperature'
  | 'difference'
  | 'share'
  | 'angle'
  | 'number';

const inch = 0.0254;
const foot = 12 * inch;
const pound = 0.453_592_37;
const btu = 1055.055_852_62;
const btuPerHour = btu / 3600;
const kelvinPerF = 5 / 9;

/** Spellings → size in SI. Points, spaces, degree signs and brackets are left out of spellings. */
const units: Readonly<Record<Dimension, Readonly<Record<string, number>>>> = {
  length: { mm: 0.001, cm: 0.01, dm: 0.1, m: 1, in: inch, '"': inch, ft: foot, "'": foot },
  area: { m2: 1, cm2: 1e-4, ft2: foot ** 2, sqft: foot ** 2 },
  volume: { m3: 1, l: 0.001, ft3: foot ** 3 },
  conductivity: {
    'W/mK': 1,
    'BTU/hftF': btuPerHour / (foot * kelvinPerF),
    'BTUin/hft2F': (btuPerHour * inch) / (foot ** 2 * kelvinPerF),
  },
  transmittance: { 'W/m2K': 1, 'BTU/hft2F': btuPerHour / (foot ** 2 * kelvinPerF) },
  resistance: { 'm2K/W': 1, 'hft2F/BTU': (foot ** 2 * kelvinPerF) / btuPerHour },
  density: { 'kg/m3': 1, 'lb/ft3': pound / foot ** 3 },
  specificHeat: { 'J/kgK': 1, 'kJ/kgK': 1000, 'BTU/lbF': btu / (pound * kelvinPerF) },
  capacity: { 'J/K': 1, 'kJ/K': 1000, 'MJ/K': 1e6, 'Wh/K': 3600, 'BTU/F': btu / kelvinPerF },
  power: { W: 1, kW: 1000, MW: 1e6, 'BTU/h': btuPerHour, 'kBTU/h': 1000 * btuPerHour },
  powerPerArea: { 'W/m2': 1, 'W/ft2': 1 / foot ** 2, 'BTU/hft2': btuPerHour / foot ** 2 },
  flow: {
    'm3/s': 1,
    'm3/h': 1 / 3600,
    'l/s': 0.001,
    'ft3/min': foot ** 3 / 60,
    cfm: foot ** 3 / 60,
  },
  temperature: { C: 1, F: kelvinPerF },
  difference: { K: 1, C: 1, F: kelvinPerF },
  share: { '%': 0.01 },
  angle: { deg: 1, rad: 180 / Math.PI },
  number: {},
};

export type Typed =
  | { readonly ok: true; readonly value: number; readonly hasUnit: boolean }
  | { readonly ok: false; readonly why: string };

/** A number on its way: with a unit it is in SI, without one it is still bare. */
interface Part {
  readonly value: number;
  readonly hasUnit: boolean;
}

class NotUnderstood extends Error {}

/**
 * @param shownSize size in SI of the unit that the field shows: 0.001 for millimetres
 * @returns the value in SI
 */
export function typedQuantity(text: string, dimension: Dimension, shownSize = 1): Typed {
  try {
    const part = new Reader(plain(text), dimension).whole();
    const value = part.hasUnit ? part.value : part.value * shownSize;
    if (!Number.isFinite(value)) return { ok: false, why: 'This comes to no number' };
    return { ok: true, value, hasUnit: part.hasUnit };
  } catch (error) {
    if (error instanceof NotUnderstood) return { ok: false, why: error.message };
    throw error;
  }
}

function plain(text: string): string {
  return text
    .trim()
    .replace(/\u2212/g, '-')
    .replace(/×/g, '*')
    .replace(/÷/g, '/')
    .replace(/²/g, '2')
    .replace(/³/g, '3')
    .replace(/[\u00a0\u202f]/g, ' ');
}

/** `1.234,5` and `1,234.5` are the same; a lone comma is a decimal comma. */
function numberOf(digits: string): number {
  const comma = digits.lastIndexOf(',');
  const point = digits.lastIndexOf('.');
  const decimal = Math.max(comma, point);
  if (decimal < 0) return Number(digits);
  const isBoth = comma >= 0 && point >= 0;
  const whole = digits.slice(0, decimal).replace(isBoth ? /[.,]/g : /$^/g, '');
  return Number(`${whole}.${digits.slice(decimal + 1)}`);
}

/** Sums of products of numbers; a unit belongs to the product before it. */
class Reader {
  readonly #text: string;
  readonly #dimension: Dimension;
  #at = 0;
  constructor(text: string, dimension: Dimension) {
    this.#text = text;
    this.#dimension = dimension;
  }

  whole(): Part {
    if (this.#text === '') throw new NotUnderstood('Type a number');
    const part = this.#sum();
    this.#space();
    if (this.#at < this.#text.length) {
      throw new NotUnderstood(`"${this.#text.slice(this.#at)}" is not understood here`);
    }
    return part;
  }

  #space() {
    while (this.#text[this.#at] === ' ') this.#at++;
  }
  #take(...signs: string[]): string | null {
    this.#space();
    const found = signs.find((sign) => this.#text.startsWith(sign, this.#at));
    if (found === undefined) return null;
    this.#at += found.length;
    return found;
  }

  #sum(): Part {
    let left = this.#product();
    for (;;) {
      const sign = this.#take('+', '-');
      this.#space();
      // Feet and inches side by side add up.
      const isBeside = sign === null && left.hasUnit && /[\d(]/.test(this.#text[this.#at] ?? '');
      if (sign === null && !isBeside) return left;
      const right = this.#product();
      if (left.hasUnit !== right.hasUnit)
        throw new NotUnderstood('Give both parts a unit, or none');
      left = { ...left, value: sign === '-' ? left.value - right.value : left.value + right.value };
    }
  }

  #product(): Part {
    let part = this.#unit(this.#factor());
    for (;;) {
      const sign = this.#take('*', '/');
      if (sign === null) return part;
      const next = this.#factor();
      if (part.hasUnit && next.hasUnit)
        throw new NotUnderstood('Only one of these can have a unit');
      if (sign === '/' && next.hasUnit) throw new NotUnderstood('Divide by a plain number');
      part = this.#unit({
        value: sign === '*' ? part.value * next.value : part.value / next.value,
        hasUnit: part.hasUnit || next.hasUnit,
      });
    }
  }

  #factor(): Part {
    if (this.#take('-')) {
      const { value, hasUnit } = this.#unit(this.#factor());
      return { value: -value, hasUnit };
    }
    if (this.#take('+')) return this.#factor();
    if (this.#take('(')) {
      const inner = this.#sum();
      if (!this.#take(')')) throw new NotUnderstood('A bracket is not closed');
      return inner;
    }
    this.#space();
    const digits = /^(\d[\d.,]*|[.,]\d+)(e[+-]?\d+)?/i.exec(this.#text.slice(this.#at));
    if (!digits) throw new NotUnderstood('Type a number');
    this.#at += digits[0].length;
    const value = numberOf(digits[1] ?? '') * 10 ** Number(digits[2]?.slice(1) ?? 0);
    if (Number.isNaN(value)) throw new NotUnderstood(`"${digits[0]}" is no number`);
    return { value, hasUnit: false };
  }

  #unit(part: Part): Part {
    if (part.hasUnit) return part;
    this.#space();
    const spellings = Object.entries(units[this.#dimension]).sort(
      ([a], [b]) => b.length - a.length,
    );
    for (const [spelling, size] of spellings) {
      const end = this.#endOf(spelling);
      if (end === null) continue;
      this.#at = end;
      const isF = this.#dimension === 'temperature' && spelling === 'F';
      return { value: isF ? (part.value - 32) * size : part.value * size, hasUnit: true };
    }
    return part;
  }

  /** Where a spelling ends that begins here, with dots and brackets let pass; null where it does not. */
  #endOf(spelling: string): number | null {
    let at = this.#at;
    let open = 0;
    for (const sign of spelling) {
      while (/[ ·.*°(^]/.test(this.#text[at] ?? '') && at < this.#text.length) {
        if (this.#text[at] === '(') open++;
        at++;
      }
      const found = this.#text[at];
      // m and M, k and K must stay apart; only words may be written in either case.
      if (found !== sign && !(spelling.length > 1 && found?.toLowerCase() === sign.toLowerCase())) {
        return null;
      }
      at++;
    }
    while (open > 0 && this.#text[at] === ')') {
      at++;
      open--;
    }
    const next = this.#text[at] ?? '';
    return /[a-z0-9²³"']/i.test(next) && /[a-z]/i.test(spelling) && /[a-z]/i.test(next) ? null : at;
  }
}
