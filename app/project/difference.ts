// What differs between two documents, in lines a person can read: place, before, after. Entries of lists
// are told apart by their ids, so that an entry put in front does not make all others differ.

import type { Json } from '../../engine/index.ts';

export interface DifferenceLine {
  readonly path: string;
  /** `nothing` where there was none. */
  readonly before: string;
  readonly after: string;
}

const longest = 80;

export function differences(before: Json, after: Json): DifferenceLine[] {
  const lines: DifferenceLine[] = [];
  compare(before, after, '', lines);
  return lines;
}

type Fields = { readonly [key: string]: Json };
const isFields = (value: Json | undefined): value is Fields =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function compare(
  before: Json | undefined,
  after: Json | undefined,
  path: string,
  lines: DifferenceLine[],
): void {
  if (before === after) return;
  const old = parts(before);
  const now = parts(after);
  if (!old || !now) {
    if (JSON.stringify(before) === JSON.stringify(after)) return;
    lines.push({ path: path || 'the whole file', before: shown(before), after: shown(after) });
    return;
  }
  for (const key of new Set([...old.keys(), ...now.keys()])) {
    compare(old.get(key), now.get(key), `${path}${key}`.replace(/^\./, ''), lines);
  }
}

/** What can be compared part by part: fields, and lists whose entries have ids. */
function parts(value: Json | undefined): Map<string, Json> | null {
  if (isFields(value))
    return new Map(Object.entries(value).map(([key, held]) => [`.${key}`, held]));
  if (!Array.isArray(value)) return null;
  const entries: readonly Json[] = value;
  const ids = entries.map((entry) => (isFields(entry) ? entry.id : undefined));
  if (entries.length === 0 || ids.some((id) => typeof id !== 'string')) return null;
  return new Map(entries.map((entry, i) => [`[${String(ids[i])}]`, entry]));
}

function shown(value: Json | undefined): string {
  if (value === undefined) return 'nothing';
  const name = isFields(value) && typeof value.name === 'string' ? value.name : null;
  const text = name ?? JSON.stringify(value);
  return text.length > longest ? `${text.slice(0, longest - 1)}…` : text;
}
