// What a command reads from disk: a project, and the weather table that it names.

import { dirname, isAbsolute, join } from 'node:path';
import { type Building, parseProject } from '../../engine/index.ts';
import { readWeather, type WeatherYear } from '../../weather/index.ts';
import { readBytes, readText } from '../disk/index.ts';
import { checkWeatherDigest } from '../project/index.ts';
import { type OpenNodal, openNodal } from './nodal.ts';
import { InputFaults, need, WrongUsage } from './stop.ts';

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

export async function openWeather(
  file: string,
  site: NonNullable<Building['weather']>['site'] | null = null,
): Promise<OpenWeather> {
  const limits = { expected: 'a weather table', limitBytes: 64_000_000 };
  const { data, sha256 } = need(await readBytes(file, limits));
  const year = need(readWeather(data, site ? { file, site } : { file }));
  return { file, year, sha256, notes: [] };
}

/**
 * The weather for a project: the table that the user names (from where they are), or the one that the
 * project names (from where the project lies), which must be the one it was made with.
 */
export async function weatherFor(
  { file, building }: OpenProject,
  named: string | null,
): Promise<OpenWeather> {
  const site = building.weather?.site ?? null;
  if (named !== null) {
    const weather = await openWeather(named, site);
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
  const weather = await openWeather(isAbsolute(own) ? own : join(dirname(file), own), site);
  const digest = checkWeatherDigest(building, file, weather.sha256);
  if (digest.kind === 'different') throw new InputFaults([digest.fault]);
  return digest.kind === 'unknown'
    ? { ...weather, notes: [...weather.notes, digest.note] }
    : weather;
}
