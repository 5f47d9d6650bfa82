// A number that leaves its file carries its unit in its name. Read from the exported types of weather
// and engine: a numeric field whose name speaks of a quantity must end in a unit, or in a word that
// says it is a pure number (share, factor, count, index …).

import type { Source } from './sources.ts';

/** Units as names spell them, alone or joined by Per: M, WPerM2K, KgPerM3 … */
const unit =
  'M2?3?4?|C|K[24]?|W|J|KJ|MJ|S2?|H|Kg|Mol|Deg|Rad|Pa|KWh|Ms|Mm|Au|Minutes|Days|Hours|Months|Kd';
const endsInUnit = new RegExp(`(?:^|[a-z0-9])(?:${unit})?(?:Per(?:${unit}|M2K|KgK|MK|M2K4)+)?$`);
const hasUnit = (name: string) => {
  const match = new RegExp(`(?:${unit})(?:Per(?:${unit})+)?$|Per(?:${unit})+$`).exec(name);
  return match !== null && match.index > 0 && endsInUnit.test(name);
};

/** Words that name a quantity with a unit. */
const quantities = new Set(
  (
    'temperature area volume height width length depth thickness distance elevation power energy ' +
    'heat conductance conductivity resistance capacity density flow speed velocity pressure ' +
    'irradiance radiation azimuth tilt latitude longitude angle duration viscosity'
  ).split(' '),
);

/** Last words that say: a pure number, or an index into something. */
const pure = new Set(
  (
    'share shares factor ratio count index exponent coefficient efficiency effectiveness sign ' +
    'number node nodes series row rows position residual slope group sum'
  ).split(' '),
);

const wordsOf = (name: string) =>
  name
    .replace(/([a-z0-9])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .split(' ');

const isNamedWell = (name: string) => {
  const words = wordsOf(name);
  if (!words.some((word) => quantities.has(word.replace(/\d+$/, '')))) return true;
  return hasUnit(name) || pure.has(words.at(-1) ?? '');
};

const numeric = String.raw`(?:readonly\s+)?(?:number(?:\[\])?|Float64Array|Float32Array)(?:\s*\|\s*(?:null|undefined))?`;

/** Names of numbers in exported interfaces, object types and the parameters of exported functions. */
export function exportedNumbers(text: string): readonly string[] {
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/\/\/.*$/gm, '');
  const blocks = [
    ...code.matchAll(/^export (?:interface|type) [\s\S]*?^\}/gm),
    ...code.matchAll(/^export function \w+(?:<[^>]*>)?\([\s\S]*?\)(?=\s*[:{])/gm),
  ].map((match) => match[0]);
  const name = new RegExp(String.raw`(\w+)\??:\s*${numeric}(?=\s*[;,)=\n])`, 'g');
  return blocks.flatMap((block) => [...block.matchAll(name)].map((match) => match[1] ?? ''));
}

/** Every exported number of a file that speaks of a quantity and names no unit. */
export function unitless({ path, text }: Source): readonly string[] {
  return exportedNumbers(text)
    .filter((name) => !isNamedWell(name))
    .map((name) => `${path}: ${name}`);
}
