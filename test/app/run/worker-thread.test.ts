import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import { bundleForNode } from '../../../app/build/build.mjs';
import { RunRefused, runSimulation } from '../../../app/run/index.ts';
import type { RunRequest } from '../../../app/run/request.ts';
import { parseProject, simulate } from '../../../engine/index.ts';
import { readWeather } from '../../../weather/index.ts';
import { sampleText, sampleWeather } from '../sample.ts';

// The worker as it is shipped: built, in a thread of its own.

const root = fileURLToPath(new URL('../../../', import.meta.url));
let folder: string;
let worker: Worker;

beforeAll(async () => {
  mkdirSync(join(root, 'test/out'), { recursive: true });
  folder = mkdtempSync(join(root, 'test/out/worker-')); // below the root: it finds node_modules
  await bundleForNode({ worker: join(root, 'app/run/worker.node.ts') }, folder);
}, 60_000);
afterAll(() => rmSync(folder, { recursive: true, force: true }));
beforeEach(() => {
  worker = new Worker(join(folder, 'worker.js'));
});
afterEach(() => worker.terminate());

const request: RunRequest = {
  projectText: sampleText(),
  projectFile: 'house.inglenook.json',
  weatherText: sampleWeather(),
  weatherFile: 'year.csv',
  site: null,
  stepMinutes: 60,
};

test('a year comes back from the thread as the same year run here', async () => {
  const there = await runSimulation(worker, request);
  const project = parseProject(request.projectText, request.projectFile);
  const weather = readWeather(request.weatherText, { file: request.weatherFile });
  if (!project.ok || !weather.ok) throw new Error('the sample is wrong');
  const steps = simulate(project.value, weather.value, { stepMinutes: 60 });
  let step = steps.next();
  while (!step.done) step = steps.next();
  const here = step.value;
  expect(there.rooms[0]?.airC).toEqual(here.rooms[0]?.airC);
  expect({ ...there.findings, timings: null }).toEqual({ ...here.findings, timings: null });
});

test('a second run on the same worker gives the same bytes', async () => {
  const first = await runSimulation(worker, request);
  const second = await runSimulation(worker, request);
  expect(Buffer.from(second.rooms[0]?.airC.buffer ?? new ArrayBuffer(0))).toEqual(
    Buffer.from(first.rooms[0]?.airC.buffer ?? new ArrayBuffer(0)),
  );
});

test('a newer run stops the older and is answered', async () => {
  const older = runSimulation(worker, { ...request, stepMinutes: 1 });
  const stopped = expect(older).rejects.toMatchObject({ name: 'AbortError' });
  await new Promise((next) => setTimeout(next, 300)); // the older one is in the middle of its work
  const newer = await runSimulation(worker, request);
  expect(newer.findings.stepMinutes).toBe(60);
  await stopped;
});

test('a stop from outside ends a long run within a fraction of a second', async () => {
  const stop = new AbortController();
  let told = 0;
  const run = runSimulation(
    worker,
    { ...request, stepMinutes: 1 },
    {
      signal: stop.signal,
      onProgress: () => {
        told++;
        if (told === 3) stop.abort();
      },
    },
  );
  await expect(run).rejects.toMatchObject({ name: 'AbortError' });
  const at = performance.now();
  await expect(runSimulation(worker, { ...request, projectText: '{' })).rejects.toBeInstanceOf(
    RunRefused,
  );
  // A slice is 25 ms; the rest is room for a busy machine.
  expect(performance.now() - at).toBeLessThan(2000);
});

test('faults of project and weather come back with file, place and mend', async () => {
  const noRooms = runSimulation(worker, { ...request, projectText: sampleText({ rooms: [] }) });
  await expect(noRooms).rejects.toThrow(/^house\.inglenook\.json, rooms: found /);
  const noWeather = runSimulation(worker, { ...request, weatherText: 'a,b\n1,2\n' });
  await expect(noWeather).rejects.toThrow(/^year\.csv/);
});

test('a thread that ends before its answer rejects, and hangs nothing', async () => {
  const run = runSimulation(worker, { ...request, stepMinutes: 1 });
  const lost = expect(run).rejects.toThrow('The worker ended before its answer');
  await worker.terminate();
  await lost;
});
