// Request → simulation, in steps that the worker's loop can pause between.

import { emptyMemory, parseProject, type Simulation, simulate } from '../../engine/index.ts';
import { type Parsed, readWeather, type WeatherYear } from '../../weather/index.ts';
import type { RunRequest } from './request.ts';
import type { Work } from './serve.ts';

/**
 * The work for one request after another. Remembers the last weather table: a change to the project
 * leaves it as it is, and reading 8760 rows again would be felt.
 */
export function simulationWork(): (request: RunRequest) => Work<Simulation> {
  let last: { readonly key: string; readonly text: string; readonly year: WeatherYear } | null =
    null;
  const memory = emptyMemory();

  function weatherOf(request: RunRequest, site: RunRequest['site']): Parsed<WeatherYear> {
    const { weatherText: text, weatherFile: file } = request;
    const key = JSON.stringify([file, site]);
    if (last?.key === key && last.text === text) return { ok: true, value: last.year };
    const read = readWeather(text, site === null ? { file } : { file, site });
    if (read.ok) last = { key, text, year: read.value };
    return read;
  }

  return function* work(request) {
    const started = performance.now();
    yield { done: 0, what: 'reading the project' };
    const project = parseProject(request.projectText, request.projectFile);
    if (!project.ok) return project;
    yield { done: 0.01, what: 'reading the weather' };
    const weather = weatherOf(request, project.value.weather?.site ?? request.site);
    if (!weather.ok) return weather;
    const { stepMinutes, refine } = request;
    const simulation = yield* simulate(project.value, weather.value, {
      ...(stepMinutes === undefined ? {} : { stepMinutes }),
      ...(refine === undefined ? {} : { refine }),
      memory,
      nowMs: () => performance.now(),
      readMs: performance.now() - started,
    });
    return { ok: true, value: simulation };
  };
}
