// What every study reads: the project as text and as building, and the weather of all its cases.

import type { Building, Json, Study, Weathers } from '../../engine/index.ts';
import type { WeatherYear } from '../../weather/index.ts';
import { readText } from '../disk/index.ts';
import { textOf } from './arguments.ts';
import type { Given, Option } from './command.ts';
import { openModel, weatherFor } from './inputs.ts';
import { need, WrongUsage } from './stop.ts';
import { driveStudy, type StudyThreads } from './study-threads.ts';
import type { Terminal } from './terminal.ts';

export interface OpenStudy {
  readonly file: string;
  readonly building: Building;
  readonly document: Json;
}

/** Options that all studies take. */
export const studyOptions = {
  weather: { value: 'FILE', help: "a weather table instead of the project's" },
  step: { value: 'MIN', help: 'step in minutes, a divisor of 60; 15 without it' },
  threads: { value: 'N', help: 'most threads to use; all cores without it' },
  json: { help: 'one JSON document on standard output' },
  progress: { help: 'tell how far it is even where standard error is no terminal' },
} as const satisfies Readonly<Record<string, Option>>;

export async function openStudy(command: string, file: string): Promise<OpenStudy> {
  const project = await openModel(file);
  if ('model' in project)
    throw new WrongUsage(`${command}: ${file} is a nodal model; this study needs a building.`);
  const { text } = need(
    await readText(file, { expected: 'a project file', limitBytes: 32_000_000 }),
  );
  return { file, building: project.building, document: JSON.parse(text) as Json }; // parsed just before
}

/** Weather tables by the name under which a study asks for them, and what was assumed in taking them. */
export interface StudyWeathers {
  readonly weathers: Weathers;
  readonly main: WeatherYear;
  readonly mainKey: string;
  readonly keyOf: (building: Building) => string;
  readonly notes: readonly string[];
}

/** The base's table, and that of every other building that names one of its own. */
export async function studyWeathers(
  { file, building }: OpenStudy,
  named: string | null,
  others: readonly Building[] = [],
): Promise<StudyWeathers> {
  const keyOf = (one: Building) => named ?? one.weather?.file ?? '';
  const base = await weatherFor({ file, building }, named);
  const weathers = new Map([[keyOf(building), base.year]]);
  const notes = [...base.notes];
  for (const other of others) {
    const key = keyOf(other);
    if (weathers.has(key) || !other.weather) continue;
    const { sha256: _, ...weather } = other.weather; // the digest is that of the base's table
    const opened = await weatherFor({ file, building: { ...other, weather } }, null);
    weathers.set(key, opened.year);
    notes.push(...opened.notes);
  }
  return { weathers, main: base.year, mainKey: keyOf(building), keyOf, notes };
}

const stepsMinutes = [1, 2, 3, 4, 5, 6, 10, 12, 15, 20, 30, 60];

export function stepOf(command: string, given: Given, otherwise = 15): number {
  const text = textOf(given, 'step');
  if (text === null) return otherwise;
  const step = Number(text);
  if (stepsMinutes.includes(step)) return step;
  throw new WrongUsage(
    `${command}: --step: found "${text}", expected minutes that divide the hour: ${stepsMinutes.join(', ')}.`,
  );
}

/** A number in range out of an option; null where it is not given. */
export function numberOf(
  command: string,
  given: Given,
  name: string,
  [low, high]: readonly [number, number],
  unit: string,
): number | null {
  const text = textOf(given, name);
  if (text === null) return null;
  const value = Number(text);
  if (text.trim() !== '' && value >= low && value <= high) return value;
  throw new WrongUsage(
    `${command}: --${name}: found "${text}", expected a number from ${low} to ${high}${unit && ` ${unit}`}.`,
  );
}

/** One word out of a list. */
export function choiceOf<T extends string>(
  command: string,
  given: Given,
  name: string,
  choices: readonly T[],
): T | null {
  const text = textOf(given, name);
  if (text === null) return null;
  const found = choices.find((choice) => choice === text);
  if (found !== undefined) return found;
  throw new WrongUsage(
    `${command}: --${name}: found "${text}", expected one of ${choices.join(', ')}.`,
  );
}

/** Runs a study with the progress line of the terminal. */
export async function runStudyHere<Result>(
  command: string,
  study: Study<Result>,
  weathers: Weathers,
  given: Given,
  terminal: Terminal,
  threads: StudyThreads,
): Promise<Result> {
  const result = await driveStudy(study, weathers, threadsOf(command, given, threads), {
    onProgress: ({ done, what }) => terminal.progress(done, what),
  });
  terminal.endProgress();
  return result;
}

export function threadsOf(command: string, given: Given, threads: StudyThreads): StudyThreads {
  const most = numberOf(command, given, 'threads', [1, 256], '');
  return most === null ? threads : { ...threads, count: Math.floor(most) };
}

/** JSON of a result: typed arrays as lists, what is not a finite number as null. */
export function resultJson(result: unknown): string {
  return JSON.stringify(
    result,
    (_, value: unknown) =>
      value instanceof Float64Array || value instanceof Uint8Array ? Array.from(value) : value,
    2,
  );
}
