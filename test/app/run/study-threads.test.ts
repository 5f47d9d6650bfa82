import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { bundleForNode } from '../../../app/build/build.mjs';
import { driveStudy } from '../../../app/cli/study-threads.ts';
import {
  compare,
  comparedCases,
  type Json,
  parseProjectDocument,
  type Study,
} from '../../../engine/index.ts';
import { readWeather } from '../../../weather/index.ts';
import { sampleProject, sampleWeather } from '../sample.ts';

// Studies on threads as they are shipped: the built worker.

const root = fileURLToPath(new URL('../../../', import.meta.url));
let folder: string;
let worker: URL;

beforeAll(async () => {
  mkdirSync(join(root, 'test/out'), { recursive: true });
  folder = mkdtempSync(join(root, 'test/out/threads-')); // below the root: it finds node_modules
  await bundleForNode({ worker: join(root, 'app/run/worker.node.ts') }, folder);
  worker = pathToFileURL(join(folder, 'worker.js'));
}, 60_000);
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const read = readWeather(sampleWeather(), { file: 'year.csv' });
if (!read.ok) throw new Error('the sample weather is wrong');
const weathers = new Map([['w', read.value]]);
const insulation = 'constructions[brick-wall].layers[0].resistanceM2KPerW';
const document = {
  ...sampleProject,
  options: [1, 3, 5].map((value) => ({
    id: `r-${value}`,
    name: `R ${value}`,
    changes: [{ path: insulation, value }],
  })),
} as unknown as Json;
const parsed = parseProjectDocument(document, 'p.json');
if (!parsed.ok) throw new Error('the sample is wrong');
const { cases } = comparedCases(parsed.value, document, 'p.json');
const study = () => compare(cases, { stepMinutes: 60, accuracy: 'none', weatherOf: () => 'w' });

test('a study comes out the same on one thread, on three, and here', async () => {
  const here = await driveStudy(study(), weathers, { worker: null, count: 1 });
  const shares: number[] = [];
  const there = await driveStudy(
    study(),
    weathers,
    { worker, count: 3 },
    {
      onProgress: ({ done }) => shares.push(done),
    },
  );
  expect(there).toEqual(here);
  expect(JSON.stringify(there)).toBe(JSON.stringify(here));
  expect(shares.at(-1)).toBeCloseTo(1, 9);
}, 60_000);

test.each([1, 2])(
  'a study can be stopped, with %i threads',
  async (count) => {
    const stop = new AbortController();
    const running = driveStudy(
      study(),
      weathers,
      { worker: count > 1 ? worker : null, count },
      {
        signal: stop.signal,
        onProgress: () => stop.abort(),
      },
    );
    await expect(running).rejects.toMatchObject({ name: 'AbortError' });
  },
  60_000,
);

test('a fault of the program comes back as an error, and the threads end', async () => {
  function* wrong(): Study<string> {
    yield {
      jobs: [1, 2].map(() => ({
        kind: 'year',
        building: cases[0].building,
        weather: 'not there',
        stepMinutes: 60,
        refine: 1,
        withHours: false,
      })),
      what: 'failing',
      from: 0,
      to: 1,
    };
    return 'never';
  }
  await expect(driveStudy(wrong(), weathers, { worker, count: 2 })).rejects.toThrow(
    'no weather "not there"',
  );
}, 60_000);
