// How a command reads a weather table: by itself where it is a known data set, else by a mapping; which
// repairs are accepted, and which year is meant.

import { createHash } from 'node:crypto';
import {
  type Accepted,
  createMappedReader,
  extremeRun,
  type Finding,
  type Inspection,
  inspectSeries,
  inspectTable,
  type MappedTable,
  type Mapping,
  packVersion,
  packYear,
  parseMapping,
  readWeather,
  type Site,
  seriesOfYear,
  unpackYear,
  type WeatherYear,
  type YearChoice,
  yearOf,
} from '../../weather/index.ts';
import { readBytes, readStored, readText, writeStored } from '../disk/index.ts';
import { version } from '../version.ts';
import { textOf } from './arguments.ts';
import type { Given, Option } from './command.ts';
import { need, WrongUsage } from './stop.ts';

/** A year of the table; or the hottest or coldest twelve months in it. */
export type Choice =
  | YearChoice
  | { readonly kind: 'extreme'; readonly which: 'hottest' | 'coldest' };

export interface Reading {
  /** Path of the mapping's file. */
  readonly mapping?: string;
  readonly accepted?: Accepted;
  readonly choice?: Choice;
}

export interface ReadTable {
  readonly year: WeatherYear;
  readonly sha256: string;
  /** Empty where the year came from the store and nobody asked for findings. */
  readonly findings: readonly Finding[];
}

/** Tables of minutes are large; a year of them is some 60 MB. */
const limitBytes = 500_000_000;

/** Options of every command that takes a weather table by a mapping. */
export const readingOptions: Readonly<Record<string, Option>> = {
  mapping: { value: 'FILE', help: 'how the weather table is read, for tables of no known form' },
  accept: { value: 'IDS', help: 'repairs to make, as "weather" lists them: id,id … or all' },
  year: { value: 'YEAR', help: 'the year to take from a table of several' },
  from: {
    value: 'DATE',
    help: 'twelve months from YYYY-MM-DD, or the hottest or coldest twelve of the table',
  },
  part: { help: 'take a table of less than a year; its first and last day are repeated outside' },
};

export function readingOf(command: string, given: Given): Reading {
  const mapping = textOf(given, 'mapping');
  const accept = textOf(given, 'accept');
  const choice = choiceOf(command, given);
  return {
    ...(mapping === null ? {} : { mapping }),
    ...(accept === null ? {} : { accepted: acceptedOf(accept.split(',')) }),
    ...(choice === null ? {} : { choice }),
  };
}

export function acceptedOf(ids: readonly string[]): Accepted {
  const clean = ids.map((id) => id.trim()).filter((id) => id !== '');
  return clean.includes('all') ? 'all' : new Set(clean);
}

function choiceOf(command: string, given: Given): Choice | null {
  const [year, from, part] = [textOf(given, 'year'), textOf(given, 'from'), given.part === true];
  if ([year !== null, from !== null, part].filter(Boolean).length > 1)
    throw new WrongUsage(`${command}: one of --year, --from and --part at a time.`);
  if (part) return { kind: 'part' };
  if (year !== null) {
    if (/^(19|20|21)\d\d$/.test(year)) return { kind: 'year', year: Number(year) };
    throw new WrongUsage(`${command}: --year: found "${year}", expected a year such as 2023.`);
  }
  return from === null ? null : fromDate(from, `${command}: --from`);
}

/** Twelve months from a day written YYYY-MM-DD. */
export function fromDate(text: string, where: string): Choice {
  if (text === 'hottest' || text === 'coldest') return { kind: 'extreme', which: text };
  const found = /^(\d{4})-(\d\d)-(\d\d)$/.exec(text);
  if (found === null)
    throw new WrongUsage(`${where}: found "${text}", expected YYYY-MM-DD, hottest or coldest.`);
  const [year, month, day] = found.slice(1).map(Number);
  return { kind: 'from', year, month, day };
}

/** A site from "LAT,LON,M,UTC". */
export function siteOf(command: string, text: string): Omit<Site, 'name'> {
  const parts = text.split(',').map((part) => (part.trim() === '' ? Number.NaN : Number(part)));
  const [latitudeDeg, longitudeDeg, elevationM, utcOffsetH] = parts;
  if (parts.length === 4 && parts.every(Number.isFinite))
    return { latitudeDeg, longitudeDeg, elevationM, utcOffsetH };
  throw new WrongUsage(
    `${command}: --site: found "${text}", expected latitude, longitude east, elevation in m and hours from UTC, as in --site=-33.9,18.4,40,2.`,
  );
}

export async function openMapping(file: string): Promise<{ mapping: Mapping; sha256: string }> {
  const { text, sha256 } = need(
    await readText(file, { expected: 'a weather mapping', limitBytes: 1_000_000 }),
  );
  return { mapping: need(parseMapping(text, file)), sha256 };
}

export async function readTableBytes(file: string) {
  return need(await readBytes(file, { expected: 'a weather table', limitBytes }));
}

function hashOf(parts: readonly unknown[]): string {
  const text = JSON.stringify(parts, (_, value) =>
    value instanceof Set ? [...value].sort() : value,
  );
  return createHash('sha256').update(text).digest('hex');
}

/**
 * The year of a table. What was read before, in the same way, comes from the store.
 *
 * @param wantsFindings also runs the checks, which the store does not hold
 * @param onProgress told the share that is read, 0 to 1
 */
export async function readTable(
  file: string,
  site: Partial<Site> | null,
  reading: Reading,
  wantsFindings = false,
  onProgress: (done: number) => void = () => {},
): Promise<ReadTable> {
  const { data, sha256 } = await readTableBytes(file);
  const opened = reading.mapping === undefined ? null : await openMapping(reading.mapping);
  const how = [reading.accepted ?? null, reading.choice ?? null, opened?.sha256 ?? null];
  const key = hashOf([packVersion, version, sha256, site, ...how]);
  if (!(wantsFindings && opened)) {
    const stored = await readStored(key);
    const year = stored && unpackYear(stored);
    if (year) return { year, sha256, findings: wantsFindings ? findingsOf(year, file) : [] };
  }
  const { year, findings } = opened
    ? mappedYear(data, file, site, opened.mapping, reading, onProgress)
    : plainYear(data, file, site, wantsFindings, reading);
  await writeStored(key, packYear(year));
  return { year, sha256, findings };
}

function plainYear(
  data: Uint8Array,
  file: string,
  site: Partial<Site> | null,
  wantsFindings: boolean,
  reading: Reading,
) {
  if (reading.choice !== undefined || reading.accepted !== undefined)
    throw new WrongUsage(
      '--accept, --year, --from and --part go with a --mapping: a table of a known form is one year as it is.',
    );
  const year = need(readWeather(data, site ? { file, site } : { file }));
  return { year, findings: wantsFindings ? findingsOf(year, file) : [] };
}

const findingsOf = (year: WeatherYear, file: string) =>
  inspectSeries(seriesOfYear(year, file)).findings;

function mappedYear(
  data: Uint8Array,
  file: string,
  site: Partial<Site> | null,
  mapping: Mapping,
  reading: Reading,
  onProgress: (done: number) => void,
) {
  const table = mappedTable(data, file, site, mapping, onProgress);
  const inspection = need(inspectTable(table, reading.accepted ?? new Set()));
  const read = need(yearOf(inspection, choiceIn(inspection, reading.choice, file)));
  const ids = inspection.findings.map(({ id }) => id);
  const accepted = reading.accepted === 'all' ? [] : [...(reading.accepted ?? [])];
  const unknown = accepted.filter((id) => !ids.includes(id));
  if (unknown.length === 0) return { year: read, findings: inspection.findings };
  const text = `Accepted, but not found in this table: ${unknown.join(', ')}. Nothing was done for it.`;
  const notes = [...read.notes, { kind: 'assumption' as const, text, count: 0 }];
  return { year: { ...read, notes }, findings: inspection.findings };
}

/** The hottest or coldest run is looked for in the table itself. */
function choiceIn({ series }: Inspection, choice: Choice | undefined, file: string): YearChoice {
  if (choice === undefined) return { kind: 'auto' };
  if (choice.kind !== 'extreme') return choice;
  const run = extremeRun(series, choice.which);
  if (run) return run.choice;
  throw new WrongUsage(
    `--from ${choice.which}: ${file} holds no twelve months in a row with air temperature.`,
  );
}

function mappedTable(
  data: Uint8Array,
  file: string,
  site: Partial<Site> | null,
  mapping: Mapping,
  onProgress: (done: number) => void,
): MappedTable {
  const reader = createMappedReader(mapping, site ? { file, site } : { file });
  const piece = 4_000_000;
  for (let at = 0; at < data.length; at += piece) {
    if (!reader.push(data.subarray(at, at + piece))) break;
    onProgress(Math.min(1, (at + piece) / data.length));
  }
  return need(reader.end());
}
