// An option is a named list of changes to the base: the base document with them made, parsed anew, so
// that a changed building passes through the same door as any other.
import type { Fault, Parsed } from '../../weather/index.ts';
import { type Building, parseProjectDocument } from '../building/index.ts';
import { changeAt, type Json } from './change-path.ts';

export interface Change {
  readonly path: string;
  /** Left out: the field or entry is taken out. */
  readonly value?: Json | undefined;
}

export interface Option {
  readonly id: string;
  readonly name: string;
  readonly changes: readonly Change[];
}

/** One line of "what changed". */
export interface ChangeLine {
  readonly path: string;
  readonly before: Json | undefined;
  readonly after: Json | undefined;
}

export interface ChangedBuilding {
  readonly building: Building;
  readonly document: Json;
  readonly lines: readonly ChangeLine[];
}

/** Makes every change, in order; each that does not fit the base is a fault with its place in the option. */
export function changedDocument(
  base: Json,
  changes: readonly Change[],
  where: string,
  file: string,
): Parsed<{ readonly document: Json; readonly lines: readonly ChangeLine[] }> {
  const faults: Fault[] = [];
  const lines: ChangeLine[] = [];
  let document = base;
  changes.forEach(({ path, value }, i) => {
    const changed = changeAt(document, path, value);
    if (changed.ok) {
      document = changed.document;
      lines.push({ path, before: changed.before, after: value });
    } else
      faults.push({
        file,
        place: { path: `${where}.changes[${i}].path` },
        found: `${path}, where ${changed.at} holds ${changed.found}`,
        expected: changed.expected,
        mend: 'The option no longer fits the base: correct the path, or take the change out.',
      });
  });
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: { document, lines } };
}

/**
 * The building of an option, or of several combined in the order given.
 *
 * @param base the project document as read from its file
 */
export function optionBuilding(
  base: Json,
  options: readonly Option[],
  file: string,
): Parsed<ChangedBuilding> {
  const faults: Fault[] = [];
  const lines: ChangeLine[] = [];
  let document = base;
  for (const option of options) {
    const changed = changedDocument(document, option.changes, `options[${option.id}]`, file);
    if (!changed.ok) faults.push(...changed.faults);
    else {
      document = changed.value.document;
      lines.push(...changed.value.lines);
    }
  }
  if (faults.length > 0) return { ok: false, faults };
  const parsed = parseProjectDocument(document, file);
  if (!parsed.ok) {
    const names = options.map((option) => option.name).join(' + ');
    return {
      ok: false,
      faults: parsed.faults.map((fault) => ({ ...fault, file: `${fault.file} with "${names}"` })),
    };
  }
  return { ok: true, value: { building: parsed.value, document, lines } };
}
