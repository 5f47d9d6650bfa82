// Where a change goes in a project document: `rooms[study].surfaces[south].openings[window].areaM2`.
// Square brackets hold the id of an entry or, where entries have none, its number from 0; `[+]` after a
// list means a new entry at its end.

/** One step of a path: a field's name, or an entry of a list. */
type Step = { readonly field: string } | { readonly entry: string };

export type Json =
  | string
  | number
  | boolean
  | null
  | readonly Json[]
  | { readonly [key: string]: Json };

/** What came of a change: the new document, or why it cannot be made. */
export type Changed =
  | { readonly ok: true; readonly document: Json; readonly before: Json | undefined }
  | { readonly ok: false; readonly at: string; readonly found: string; readonly expected: string };

/** The steps of a path, or null where it is not one. */
export function pathSteps(path: string): Step[] | null {
  const steps: Step[] = [];
  let rest = path;
  while (rest !== '') {
    const field = /^\.?([A-Za-z][A-Za-z0-9]*)/.exec(rest);
    const entry = /^\[([^\]]+)\]/.exec(rest);
    const found = entry ?? field;
    if (!found) return null;
    steps.push(entry ? { entry: entry[1] } : { field: found[1] });
    rest = rest.slice(found[0].length);
  }
  return steps.length > 0 ? steps : null;
}

/** Puts `value` at `path`; the document given stays as it is. `undefined` takes the field or entry out. */
export function changeAt(document: Json, path: string, value: Json | undefined): Changed {
  const steps = pathSteps(path);
  if (!steps)
    return {
      ok: false,
      at: path,
      found: `"${path}"`,
      expected: 'a path like rooms[study].volumeM3',
    };
  let before: Json | undefined;
  let failure: Extract<Changed, { ok: false }> | undefined;

  function place(node: Json | undefined, k: number, walked: string): Json | undefined {
    if (k === steps?.length) {
      before = node;
      return value;
    }
    const step = steps?.[k];
    if (!step) return node;
    if ('field' in step) {
      if (typeof node !== 'object' || node === null || Array.isArray(node))
        return fail(walked, node, 'an object');
      const at = walked === '' ? step.field : `${walked}.${step.field}`;
      const held = Object.hasOwn(node, step.field) ? Reflect.get(node, step.field) : undefined;
      if (held === undefined && k < steps.length - 1)
        return fail(at, undefined, 'a field that is there');
      const next = place(held, k + 1, at);
      const { [step.field]: _, ...others } = node as { readonly [key: string]: Json };
      if (next === undefined) return others;
      // Keep the field's place where it has one, so that documents stay readable side by side.
      return held === undefined
        ? { ...node, [step.field]: next }
        : Object.fromEntries(
            Object.entries(node).map(([key, old]) => [key, key === step.field ? next : old]),
          );
    }
    const at = `${walked}[${step.entry}]`;
    if (!Array.isArray(node)) return fail(walked, node, 'a list');
    const list: readonly Json[] = node;
    const index = step.entry === '+' ? list.length : entryIndex(list, step.entry);
    if (index < 0 || index > list.length || (index === list.length && step.entry !== '+'))
      return fail(at, undefined, `one of ${entryNames(list)}`);
    const next = place(list[index], k + 1, at);
    if (next === undefined) return list.filter((_, i) => i !== index);
    return [...list.slice(0, index), next, ...list.slice(index + 1)];
  }

  function fail(at: string, found: Json | undefined, expected: string): Json | undefined {
    failure ??= {
      ok: false,
      at,
      found: found === undefined ? 'nothing' : cut(JSON.stringify(found)),
      expected,
    };
    return found;
  }

  const changed = place(document, 0, '');
  if (failure) return failure;
  return changed === undefined
    ? { ok: false, at: path, found: 'the whole document', expected: 'a part of it' }
    : { ok: true, document: changed, before };
}

/** Reads what stands at a path; undefined where it leads nowhere. */
export function readAt(document: Json, path: string): Json | undefined {
  const read = changeAt(document, path, null);
  return read.ok ? read.before : undefined;
}

function entryIndex(list: readonly Json[], entry: string): number {
  const byId = list.findIndex((item) => idOf(item) === entry);
  if (byId >= 0) return byId;
  return /^\d+$/.test(entry) ? Number(entry) : -1;
}

function idOf(item: Json): string | undefined {
  if (typeof item !== 'object' || item === null) return undefined;
  const id: unknown = Reflect.get(item, 'id');
  return typeof id === 'string' ? id : undefined;
}

function entryNames(list: readonly Json[]): string {
  const names = list.map((item, i) => idOf(item) ?? String(i));
  return names.length === 0 ? 'no entries (use [+] to add one)' : names.slice(0, 12).join(', ');
}

const cut = (text: string): string => (text.length > 60 ? `${text.slice(0, 57)}…` : text);
