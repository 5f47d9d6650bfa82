// What a command reads from disk: a project, and the weather table that it names.

import { dirname, isAbsolute, join } from 'node:path';
import { type Building, parseProject } from '../../engine/index.ts';
import type { WeatherYear } from '../../weather/index.ts';
import { readText } from '../disk/index.ts';
import { checkWeatherDigest } from '../project/index.ts';
import { type OpenNodal, openNodal } from './nodal.ts';
import { InputFaults, need, WrongUsage } from './stop.ts';
import { acceptedOf, fromDate, type Reading, readTable } from './weather-reading.ts';

export interface OpenProject {
  /** As the user wrote it. */
  readonly file: string;
  readonly building: Building;
}

const projectRead = { expected: 'a project file', limitBytes: 32_000_000 };

/** A project, or a plain nodal model: the file says which. */
export async function openModel(file: string): Promise<OpenProject | OpenNodal> {
  const { text } = need(await readText(file, projectRead));
  const nodal = await openNodal(file, text);
  return nodal ?? { file, building: need(parseProject(text, file)) };
}

export interface OpenWeather {
  readonly file: string;
  readonly year: WeatherYear;
  readonly sha256: string;
  /** What was assumed in taking this table, as sentences for the results. */
  readonly notes: readonly string[];
}

/** A table as the user names it; `reading` for tables that need a mapping. */
export async function openWeather(
  file: string,
  site: NonNullable<Building['weather']>['site'] | null = null,
  reading: Reading = {},
): Promise<OpenWeather> {
  const { year, sha256 } = await readTable(file, site, reading);
  const notes =
    reading.mapping === undefined ? [] : [`Weather read by the mapping ${reading.mapping}.`];
  return { file, year, sha256, notes };
}

/** How the project says that its weather is read; paths start where the project lies. */
function ownReading({ file, building }: OpenProject): Reading {
  const { mapping, accept, year, from } = building.weather ?? {};
  return {
    ...(mapping === undefined ? {} : { mapping: beside(file, mapping) }),
    ...(accept === undefined ? {} : { accepted: acceptedOf(accept) }),
    ...(year === undefined ? {} : { choice: { kind: 'year' as const, year } }),
    ...(from === undefined ? {} : { choice: fromDate(from, `${file}: weather.from`) }),
  };
}

const beside = (project: string, path: string) =>
  isAbsolute(path) ? path : join(dirname(project), path);

/**
 * The weather for a project: the table that the user names (from where they are), or the one that the
 * project names (from where the project lies), which must be the one it was made with.
 */
export async function weatherFor(
  { file, building }: OpenProject,
  named: string | null,
  reading: Reading = {},
): Promise<OpenWeather> {
  const site = building.weather?.site ?? null;
  if (named !== null) {
    const weather = await openWeather(named, site, reading);
    const own = building.weather?.file;
    const instead =
      own === undefined ? 'The project names no weather.' : `The project names ${own}.`;
    const notes = [...weather.notes, `Weather as given on the command line: ${named}. ${instead}`];
    return { ...weather, notes };
  }
  if (!building.weather) {
    throw new WrongUsage(
      `${file} names no weather table: give one with --weather FILE, or add "weather" to the project.`,
    );
  }
  const own = building.weather.file;
  const how = { ...ownReading({ file, building }), ...reading };
  const weather = await openWeather(beside(file, own), site, how);
  const digest = checkWeatherDigest(building, file, weather.sha256);
  if (digest.kind === 'different') throw new InputFaults([digest.fault]);
  return digest.kind === 'unknown'
    ? { ...weather, notes: [...weather.notes, digest.note] }
    : weather;
}
