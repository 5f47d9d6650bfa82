// One year in the window's worker, which is started once and kept.

import { RunRefused, runSimulation } from '../run/index.ts';
import type { RunYear } from './state/index.ts';

export function workerRun(): RunYear {
  let worker: Worker | null = null;
  const start = () => {
    worker ??= new Worker(new URL('../run/worker.browser.ts', import.meta.url), { type: 'module' });
    return worker;
  };
  return async (
    { projectText, projectFile, weather, site, stepMinutes },
    { onProgress, signal },
  ) => {
    const request = {
      projectText,
      projectFile,
      weatherText: weather.text,
      weatherFile: weather.file,
      site,
      ...(stepMinutes === undefined ? {} : { stepMinutes }),
    };
    try {
      const simulation = await runSimulation(start(), request, {
        signal,
        onProgress: ({ done, what }) => onProgress(done, what),
      });
      return { ok: true, simulation };
    } catch (error) {
      if (error instanceof RunRefused) return { ok: false, faults: error.faults };
      if (!signal.aborted) {
        worker?.terminate(); // a worker that broke is not asked again
        worker = null;
      }
      throw error;
    }
  };
}
