import { MessageChannel, type MessagePort } from 'node:worker_threads';
import { afterEach, expect, test } from 'vitest';
import { ask, RunRefused, type RunWorker } from '../../../app/run/ask.ts';
import { emitterPort, type RunProgress } from '../../../app/run/protocol.ts';
import { serve, type Work } from '../../../app/run/serve.ts';

// The loop and its client over a real message channel, driving work whose course the test decides.

interface Order {
  readonly name: string;
  readonly steps: number;
  /** Time that one step burns [ms]. */
  readonly stepMs?: number;
}
interface Made {
  readonly name: string;
  readonly values: Float64Array<ArrayBuffer>;
}

const begun: string[] = [];
const finished: string[] = [];
const kept: Float64Array[] = [];
let ports: MessagePort[] = [];

function* work({ name, steps, stepMs = 2 }: Order): Work<Made> {
  begun.push(name);
  if (name === 'wrong') {
    const place = { path: 'rooms[0].areaM2' };
    return {
      ok: false,
      faults: [
        { file: 'a.json', place, found: '-1', expected: 'more than 0', mend: 'Measure it.' },
      ],
    };
  }
  for (let step = 0; step < steps; step++) {
    if (name === 'broken' && step === 1) throw new RangeError('index 7 of 3');
    const until = performance.now() + stepMs;
    while (performance.now() < until);
    yield { done: step / steps, what: `step ${step}` };
  }
  finished.push(name);
  const values = new Float64Array([steps, steps * 2]);
  kept.push(values);
  return { ok: true, value: { name, values } };
}

function connect(): RunWorker {
  const { port1, port2 } = new MessageChannel();
  ports.push(port1, port2);
  serve(emitterPort(port2), {
    begin: work,
    transferables: (made: Made) => [made.values.buffer],
    sliceMs: 5,
  });
  return port1 as unknown as RunWorker;
}

const run = (worker: RunWorker, order: Order, options = {}) =>
  ask<Order, Made>(worker, order, options);

afterEach(() => {
  for (const port of ports) port.close();
  ports = [];
  begun.length = 0;
  finished.length = 0;
  kept.length = 0;
});

test('a run answers with its result, and the arrays are moved, not copied', async () => {
  const made = await run(connect(), { name: 'one', steps: 3 });
  expect([...made.values]).toEqual([3, 6]);
  expect(kept[0]?.length).toBe(0); // a moved buffer is empty on the side it left
});

test('progress is told and only ever rises', async () => {
  const told: RunProgress[] = [];
  await run(
    connect(),
    { name: 'one', steps: 40 },
    { onProgress: (p: RunProgress) => told.push(p) },
  );
  expect(told.length).toBeGreaterThan(3);
  expect(told.map((p) => p.done)).toEqual(told.map((p) => p.done).sort((a, b) => a - b));
  expect(told[0]?.what).toMatch(/^step \d+$/);
});

test('a stopped run rejects as aborted at once, and its work ends before it is done', async () => {
  const worker = connect();
  const stop = new AbortController();
  const promise = run(
    worker,
    { name: 'long', steps: 1000 },
    { signal: stop.signal, onProgress: () => stop.abort() },
  );
  await expect(promise).rejects.toMatchObject({ name: 'AbortError' });
  // The worker is free again: the next run is answered though the first had two seconds to go.
  const at = performance.now();
  await run(worker, { name: 'next', steps: 1 });
  expect(performance.now() - at).toBeLessThan(1000);
  expect(finished).toEqual(['next']);
});

test('a signal that was aborted before sends nothing', async () => {
  const promise = run(connect(), { name: 'never', steps: 1 }, { signal: AbortSignal.abort() });
  await expect(promise).rejects.toMatchObject({ name: 'AbortError' });
  expect(begun).toEqual([]);
});

test('a newer request takes the place of the one that runs', async () => {
  const worker = connect();
  const old = run(worker, { name: 'old', steps: 1000 });
  const refused = expect(old).rejects.toMatchObject({ name: 'AbortError' });
  const made = await run(worker, { name: 'new', steps: 2 });
  expect(made.name).toBe('new');
  await refused;
  expect(finished).toEqual(['new']);
});

test('of a burst of requests only the last does work', async () => {
  const worker = connect();
  const all = ['a', 'b', 'c', 'd'].map((name) => run(worker, { name, steps: 2 }));
  const ends = await Promise.allSettled(all);
  expect(ends.map((end) => end.status)).toEqual(['rejected', 'rejected', 'rejected', 'fulfilled']);
  expect(finished).toEqual(['d']);
});

test('faults of the input come back as faults, with place and mend', async () => {
  const promise = run(connect(), { name: 'wrong', steps: 1 });
  await expect(promise).rejects.toBeInstanceOf(RunRefused);
  await expect(promise).rejects.toThrow('a.json, rooms[0].areaM2: found -1');
});

test('a fault of the program names itself, and the worker goes on serving', async () => {
  const worker = connect();
  await expect(run(worker, { name: 'broken', steps: 3 })).rejects.toThrow('index 7 of 3');
  expect((await run(worker, { name: 'after', steps: 1 })).name).toBe('after');
});
