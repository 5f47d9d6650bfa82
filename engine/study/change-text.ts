// "What changed" as a person reads it: "Cavity wall, layer 2 (Mineral wool): thickness 0.05 m → 0.12 m".
import type { Building } from '../building/index.ts';
import { type Json, pathSteps, readAt } from './change-path.ts';
import type { ChangeLine } from './options.ts';
import { glassUWPerM2K, wallUWPerM2K } from './u-values.ts';

/** Suffixes of field names, longest first, and how the unit is written. */
const units: readonly (readonly [string, string])[] = [
  ['WPerM2K', 'W/m²K'],
  ['M2KPerW', 'm²K/W'],
  ['JPerKgK', 'J/kgK'],
  ['JPerM3K', 'J/m³K'],
  ['KgPerM3', 'kg/m³'],
  ['KgPerKWh', 'kg/kWh'],
  ['WPerMK', 'W/mK'],
  ['WPerM2', 'W/m²'],
  ['M2PerM', 'm²/m'],
  ['M3PerS', 'm³/s'],
  ['MPerS', 'm/s'],
  ['JPerK', 'J/K'],
  ['WPerK', 'W/K'],
  ['PerKWh', '1/kWh'],
  ['PerH', '1/h'],
  ['Deg', '°'],
  ['KWh', 'kWh'],
  ['M2', 'm²'],
  ['M3', 'm³'],
  ['Pa', 'Pa'],
  ['W', 'W'],
  ['C', '°C'],
  ['K', 'K'],
  ['M', 'm'],
  ['H', 'h'],
];

/** Field name → words and unit: `thicknessM` → thickness, m. */
export function fieldWords(field: string): { readonly words: string; readonly unit: string } {
  const found = units.find(([suffix]) => field.endsWith(suffix) && field.length > suffix.length);
  const bare = found ? field.slice(0, -found[0].length) : field;
  const words = bare.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
  return { words: words === 'u value' ? 'U-value' : words, unit: found?.[1] ?? '' };
}

const singular: Readonly<Record<string, string>> = {
  rooms: 'room',
  surfaces: 'surface',
  openings: 'opening',
  constructions: 'construction',
  glazings: 'glazing',
  materials: 'material',
  coverings: 'covering',
  profiles: 'profile',
  schedules: 'schedule',
  layers: 'layer',
  panes: 'pane',
  gaps: 'gap',
  gains: 'gains',
  ventilation: 'ventilation',
  internalMasses: 'internal mass',
  thermalBridges: 'thermal bridge',
  airOpenings: 'air opening',
  supplies: 'supply',
  carriers: 'carrier',
  airUnits: 'air unit',
};

function nameOf(item: Json | undefined): string | null {
  if (typeof item !== 'object' || item === null) return null;
  for (const key of ['name', 'id', 'material']) {
    const value: unknown = Reflect.get(item, key);
    if (typeof value === 'string' && value !== '') return value;
  }
  return null;
}

/** @param document the base, so that entries can be called by their names */
export function changeText(document: Json, line: ChangeLine): string {
  const steps = pathSteps(line.path) ?? [];
  const parts: string[] = [];
  let walked = '';
  let list = '';
  let unit = '';
  for (const [k, step] of steps.entries()) {
    if ('field' in step) {
      walked = walked === '' ? step.field : `${walked}.${step.field}`;
      const isLast = k === steps.length - 1;
      if (isLast || !('entry' in steps[k + 1])) {
        const said = fieldWords(step.field);
        unit = said.unit;
        parts.push(said.words);
      } else list = step.field;
      continue;
    }
    walked += `[${step.entry}]`;
    const word = singular[list] ?? fieldWords(list).words;
    if (step.entry === '+') {
      parts.push(`new ${word}`);
      continue;
    }
    const name = nameOf(readAt(document, walked));
    const isNumbered = /^\d+$/.test(step.entry) && (list === 'layers' || list === 'panes');
    const numbered = isNumbered ? `${word} ${Number(step.entry) + 1}` : word;
    parts.push(isNumbered && name ? `${numbered} (${name})` : `${numbered} ${name ?? step.entry}`);
  }
  const where = parts.length > 1 ? `${parts.slice(0, -1).join(', ')}: ${parts.at(-1)}` : parts[0];
  if (line.after === undefined) return `${where}: ${valueText(line.before, unit)} taken out`;
  if (line.before === undefined) return `${where}: ${valueText(line.after, unit)} (nothing before)`;
  return `${where}: ${valueText(line.before, unit)} → ${valueText(line.after, unit)}`;
}

function valueText(value: Json | undefined, unit: string): string {
  if (value === undefined) return 'nothing';
  if (typeof value === 'number') return unit ? `${value} ${unit}` : String(value);
  if (typeof value === 'string') return value;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (value === null) return 'nothing';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  return (
    nameOf(value) ??
    Object.entries(value)
      .slice(0, 6)
      .map(([key, held]) => {
        const { words, unit: own } = fieldWords(key);
        return `${words} ${valueText(held, own)}`;
      })
      .join(', ')
  );
}

/** U-values that came out different, as sentences; parts are told apart by id. */
export function uValueChanges(base: Building, changed: Building): string[] {
  const lines: string[] = [];
  const say = (name: string, before: number, after: number) => {
    if (Math.abs(after - before) > 0.0005)
      lines.push(`${name}: U ${before.toFixed(2)} → ${after.toFixed(2)} W/m²K`);
  };
  for (const one of changed.constructions)
    if (base.constructions.some((other) => other.id === one.id))
      say(one.name, wallUWPerM2K(base, one.id), wallUWPerM2K(changed, one.id));
  for (const one of changed.glazings) {
    const before = base.glazings.find((other) => other.id === one.id);
    if (before) say(one.name, glassUWPerM2K(before), glassUWPerM2K(one));
  }
  return lines;
}
