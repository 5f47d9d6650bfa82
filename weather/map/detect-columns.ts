// What each column holds and in which unit: by the words of its heading, by the unit that stands there,
// and by whether the values are such as nature makes them.
import { limits, type Quantity, quantities } from '../read/quantities.ts';
import {
  type MappedQuantity,
  type MappedStands,
  mappedQuantities,
  quantityWords,
  type TableMapping,
} from './mapping.ts';
import { numberOf } from './numbers.ts';
import { toSi, type Unit, unitSpelt, unitsOf } from './units.ts';
import { matchWords, standsWords, unitPart } from './words.ts';

export interface ColumnGuess {
  /** Counted from 1. */
  readonly number: number;
  readonly heading: string;
  readonly unitText: string;
  /** What it is taken for; null: left out. */
  readonly quantity: MappedQuantity | null;
  readonly unit: string | null;
  readonly stands: MappedStands;
  /** 0 to 1; below 0.6 it should be confirmed. */
  readonly confidence: number;
  readonly reasons: readonly string[];
}

export interface ColumnsGuess {
  readonly columns: readonly ColumnGuess[];
  readonly missing: readonly (number | string)[];
}

const codes = [
  -9999, -9999.9, -9900, -999, -999.9, -999.99, -99, -99.9, -99.99, 9999, 9999.9, 99999, 999999,
  999, 999.9, 999.99, 99.9, -7999, 7999, -6999, 6999, 32767, -32768, -8888, 8888, -1e30, 1e30,
];

/** Limits of what a mapped quantity may be, in SI. */
export function limitsOf(quantity: MappedQuantity): readonly [number, number] {
  if ((quantities as readonly string[]).includes(quantity)) return limits[quantity as Quantity];
  if (quantity === 'wetBulbC') return limits.dewPointC;
  if (quantity === 'humidityRatio') return [0, 0.05];
  if (quantity === 'vapourPressurePa') return [0, 9000];
  if (quantity === 'seaLevelPressurePa') return [87000, 109000]; // WMO records 870 and 1085 hPa
  return limits.ghiWPerM2;
}

interface Facts {
  readonly values: number[];
  readonly texts: ReadonlyMap<string, number>;
  readonly filled: number;
}

export function detectColumns(
  rows: readonly (readonly string[])[],
  headings: readonly string[],
  unitRow: readonly string[],
  columnCount: number,
  used: ReadonlySet<number>,
  table: TableMapping,
  intervalS: number,
): ColumnsGuess {
  const guesses: (ColumnGuess & { weight: number })[] = [];
  const missing = new Set<number | string>();
  for (let at = 0; at < columnCount; at++) {
    if (used.has(at)) continue;
    const facts = factsOf(rows, at, table);
    const heading = headings[at] ?? '';
    const unitText = unitRow[at] ?? '';
    const guess = guessColumn(at, heading, unitText, facts, intervalS);
    guesses.push(guess);
    if (guess.quantity === null) continue;
    for (const code of guess.missing) missing.add(code);
    for (const [text, times] of facts.texts)
      if (text !== '' && text.length <= 10 && times >= 2 && !text.startsWith('='))
        missing.add(text);
  }
  // One column a quantity: the one whose words mean it most surely.
  for (const quantity of mappedQuantities) {
    const rivals = guesses.filter((one) => one.quantity === quantity);
    rivals.sort((a, b) => b.weight - a.weight);
    rivals.slice(1).forEach((rival) => {
      const i = guesses.indexOf(rival);
      const isTie = rival.weight > rivals[0].weight - 0.15;
      guesses[i] = {
        ...rival,
        quantity: null,
        unit: null,
        confidence: isTie ? 0.5 : 0.8,
        reasons: [
          ...rival.reasons,
          `left out: column ${rivals[0].number} is taken for ${quantityWords[quantity]}`,
        ],
      };
      if (!isTie) return;
      const k = guesses.indexOf(rivals[0]);
      guesses[k] = {
        ...guesses[k],
        confidence: Math.min(guesses[k].confidence, 0.55),
        reasons: [...guesses[k].reasons, `column ${rival.number} might be it as well`],
      };
      rivals[0] = guesses[k];
    });
  }
  return {
    columns: guesses.map(({ weight: _, ...guess }) => guess),
    missing: [...missing],
  };
}

function factsOf(rows: readonly (readonly string[])[], at: number, table: TableMapping): Facts {
  const values: number[] = [];
  const texts = new Map<string, number>();
  let filled = 0;
  for (const row of rows) {
    const cell = row[at] ?? '';
    if (cell === '') continue;
    filled++;
    const value = numberOf(cell, table);
    if (Number.isNaN(value)) texts.set(cell, (texts.get(cell) ?? 0) + 1);
    else values.push(value);
  }
  return { values, texts, filled };
}

function guessColumn(
  at: number,
  heading: string,
  unitText: string,
  facts: Facts,
  intervalS: number,
) {
  const base = {
    number: at + 1,
    heading,
    unitText,
    stands: standsWords(heading) ?? ('mean' as const),
  };
  const none = (reason: string, confidence: number) => ({
    ...base,
    quantity: null,
    unit: null,
    confidence,
    reasons: [reason],
    weight: 0,
    missing: [],
  });
  if (facts.values.length < Math.max(2, facts.filled * 0.5))
    return none(facts.filled === 0 ? 'the column is empty' : 'most cells are no numbers', 0.9);
  const stated = [...unitPart(heading), unitText].filter((text) => text !== '');
  const matches = matchWords(heading).filter(({ weight }) => weight > 0.35);
  let best: ReturnType<typeof judge> | null = null;
  for (const match of matches) {
    const found = judge(match.quantity, match.weight, `"${match.word}" in the heading`);
    if (found !== null && (best === null || found.weight > best.weight)) best = found;
  }
  if (best !== null) return best;
  if (matches.length > 0) {
    const { word, quantity } = matches[0];
    return none(
      `"${word}" in the heading, but the values are not such as ${quantityWords[quantity]} has`,
      0.4,
    );
  }
  if (heading !== '' && /\p{L}{3}/u.test(heading))
    return none('the heading names nothing that is used', 0.7);
  const byValues = guessByValues(facts.values, stated);
  if (byValues === null) return none('neither heading nor values tell what it is', 0.5);
  return (
    judge(byValues, 0.4, 'by its values alone') ??
    none('neither heading nor values tell what it is', 0.5)
  );

  function judge(quantity: MappedQuantity, weight: number, why: string) {
    const bySpelling = stated
      .map((text) => unitSpelt(quantity, text))
      .find((one) => one !== undefined);
    const tried = bySpelling ? [bySpelling] : unitsOf(quantity);
    let chosen: { unit: Unit; missing: number[]; likely: number } | null = null;
    for (const unit of tried) {
      const fit = fits(quantity, unit, facts.values, intervalS);
      if (fit !== null && (chosen === null || fit.likely > chosen.likely + 0.01))
        chosen = { unit, ...fit };
    }
    if (chosen === null) return null;
    const confidence = Math.min(weight, bySpelling ? 1 : chosen.likely);
    return {
      ...base,
      quantity,
      unit: chosen.unit.name,
      confidence: Number(confidence.toFixed(2)),
      reasons: [
        why,
        bySpelling
          ? `unit ${chosen.unit.name} as written`
          : `unit ${chosen.unit.name} by the size of the values`,
      ],
      weight: weight + (bySpelling ? 0.1 : 0),
      missing: chosen.missing,
    };
  }
}

/** Codes outside the limits, and how likely the rest is in this unit; null where it cannot be. */
function fits(quantity: MappedQuantity, unit: Unit, values: readonly number[], intervalS: number) {
  const [low, high] = limitsOf(quantity);
  const missing = new Set<number>();
  let good = 0;
  let top = Number.NEGATIVE_INFINITY;
  let least = Number.POSITIVE_INFINITY;
  let bad = 0;
  for (const value of values) {
    const si = toSi(unit, value, intervalS);
    const margin =
      quantity === 'relativeHumidity' ? 0.1 : unit.isEnergy || /WPerM2/.test(quantity) ? 30 : 0;
    if (si >= low - margin && si <= high + margin) {
      good++;
      top = Math.max(top, si);
      least = Math.min(least, si);
    } else if (codes.includes(value)) missing.add(value);
    else bad++;
  }
  if (good === 0 || bad > values.length * 0.02) return null;
  return { missing: [...missing], likely: likelihood(quantity, unit, least, top) };
}

/** How well the range of a sample from all over the table suits the unit, 0 to 1. Common practice, no source. */
function likelihood(quantity: MappedQuantity, unit: Unit, least: number, top: number): number {
  if (quantity === 'relativeHumidity' || quantity === 'albedo')
    return top <= 0.011 && unit.name === '%' ? 0.1 : top > 0.3 ? 0.95 : 0.6;
  if (quantity === 'dryBulbC' || quantity === 'wetBulbC' || quantity === 'dewPointC') {
    const isNatural = least > -60 && top < 50 && top > -5;
    return isNatural ? (unit.name === '°C' ? 0.85 : unit.name === 'K' ? 0.9 : 0.7) : 0.3;
  }
  if (/Pressure/.test(quantity) || quantity === 'pressurePa')
    return quantity === 'vapourPressurePa' ? 0.6 : least > 45000 && top < 109000 ? 0.95 : 0.4;
  if (quantity === 'windMPerS')
    return unit.name === 'm/s' ? (top > 45 ? 0.3 : 0.65) : top < 30 ? 0.5 : 0.2;
  if (quantity === 'horizontalInfraredWPerM2') return least > 100 && top < 550 ? 0.9 : 0.3;
  if (/WPerM2/.test(quantity)) {
    const most = quantity === 'dhiWPerM2' ? [120, 700] : [450, 1350];
    const isUsual = top >= most[0] && top <= most[1];
    return isUsual ? (unit.name === 'W/m²' ? 0.85 : 0.75) : unit.name === 'W/m²' ? 0.45 : 0.3;
  }
  if (quantity === 'skyCover' || quantity === 'opaqueSkyCover')
    return top > 0.95 && top <= 1 ? 0.8 : 0.4;
  return 0.8;
}

/** A guess for a column without a name: only shapes that hardly anything else has. */
function guessByValues(
  values: readonly number[],
  stated: readonly string[],
): MappedQuantity | null {
  for (const text of stated)
    for (const quantity of ['ghiWPerM2', 'dryBulbC', 'windMPerS', 'pressurePa'] as const)
      if (unitSpelt(quantity, text)) return quantity;
  if (stated.length > 0 || values.length < 48) return null;
  const sorted = [...values].sort((a, b) => a - b);
  const at = (share: number) => sorted[Math.floor(share * (sorted.length - 1))];
  const zeros = values.filter((value) => value === 0).length / values.length;
  if (at(0.05) > 850 && at(0.95) < 1090) return 'pressurePa';
  if (zeros > 0.35 && at(1) > 450 && at(1) < 1400 && at(0) >= 0) return 'ghiWPerM2';
  if (at(0) >= 0 && at(1) <= 360 && at(0.9) > 250 && at(0.1) < 120 && zeros < 0.3)
    return 'windFromDeg';
  if (at(0.02) > 5 && at(1) <= 100.5 && at(0.95) > 85 && at(0.5) > 40) return 'relativeHumidity';
  if (at(0) < 5 && at(1) < 45 && at(0) > -50 && at(0.02) < 0 && zeros < 0.1) return 'dryBulbC';
  return null;
}
