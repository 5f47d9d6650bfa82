// Text of a project file → Building, or every fault in it. Past this door nothing is checked again.
import type { Fault, Parsed } from '../../weather/index.ts';
import { airFaults } from './check-air.ts';
import { airReferenceFaults } from './check-air-references.ts';
import { geometryFaults } from './check-geometry.ts';
import { groundFaults } from './check-ground.ts';
import { moistureFaults } from './check-moisture.ts';
import { plantFaults } from './check-plant.ts';
import { referenceFaults } from './check-references.ts';
import { useFaults } from './check-use.ts';
import { windowFaults, windowReferenceFaults } from './check-windows.ts';
import { withLibrary } from './from-library.ts';
import { schemaFaults } from './schema-faults.ts';
import { type Building, projectSchema } from './schema-project.ts';

const largestFile = 50e6; // characters; a project of thousands of rooms stays far below

/** Reads a project: JSON, then the schema, then what the schema cannot see (references, geometry). */
export function parseProject(text: string, file: string): Parsed<Building> {
  const whole = (found: string, expected: string, mend: string): Parsed<Building> => ({
    ok: false,
    faults: [{ file, place: { path: '' }, found, expected, mend }],
  });
  if (text.trim() === '')
    return whole(
      'an empty file',
      'a project in JSON',
      'Choose another file or start a new project.',
    );
  if (text.length > largestFile)
    return whole(
      `${Math.round(text.length / 1e6)} million characters`,
      `at most ${largestFile / 1e6} million`,
      'This is hardly a project file; weather tables are opened as weather.',
    );
  if (text.includes('\u0000'))
    return whole('binary data', 'a project in JSON', 'Choose the .inglenook.json file.');
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch (error) {
    return whole(
      `text that is not JSON (${jsonMistake(text, error)})`,
      'a project in JSON',
      'Mend the mistake there; a file that was cut off must be restored from a copy.',
    );
  }
  return parseProjectDocument(document, file);
}

/** The same for a document that has been taken apart already. */
export function parseProjectDocument(document: unknown, file: string): Parsed<Building> {
  const door = doorFaults(document, file);
  if (door.length > 0) return { ok: false, faults: door };
  const parsed = projectSchema.safeParse(document);
  if (!parsed.success) return { ok: false, faults: schemaFaults(parsed.error, document, file) };
  const building = withLibrary(parsed.data);
  const references = [
    ...referenceFaults(building, file),
    ...airReferenceFaults(building, file),
    ...windowReferenceFaults(building, file),
  ];
  const later = [
    geometryFaults,
    airFaults,
    windowFaults,
    groundFaults,
    moistureFaults,
    useFaults,
    plantFaults,
  ];
  const faults =
    references.length > 0 ? references : later.flatMap((check) => check(building, file));
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: building };
}

/** Format and version first: their message is worth more than a hundred unknown fields. */
function doorFaults(document: unknown, file: string): Fault[] {
  const at = (path: string, found: string, expected: string, mend: string): Fault[] => [
    { file, place: { path }, found, expected, mend },
  ];
  if (typeof document !== 'object' || document === null || Array.isArray(document))
    return at(
      '',
      'JSON that is no object',
      'an object { "format": "inglenook-project", … }',
      'Choose the .inglenook.json file.',
    );
  const format: unknown = Reflect.get(document, 'format');
  if (format !== 'inglenook-project')
    return at(
      'format',
      JSON.stringify(format) ?? 'nothing',
      '"inglenook-project"',
      'Choose a project file of this program.',
    );
  const version: unknown = Reflect.get(document, 'version');
  if (version !== 1)
    return at(
      'version',
      JSON.stringify(version) ?? 'nothing',
      '1',
      'The file comes from another version of the program; open it there.',
    );
  return [];
}

/** Line and column of a JSON mistake where the engine's message gives the position. */
function jsonMistake(text: string, error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  const position = /position (\d+)/.exec(message)?.[1];
  if (position === undefined)
    return message.includes('end of JSON') ? 'it ends too early' : message;
  const before = text.slice(0, Number(position));
  const line = before.split('\n').length;
  const column = before.length - before.lastIndexOf('\n');
  return `line ${line}, column ${column}`;
}
