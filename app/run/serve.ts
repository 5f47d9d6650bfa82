// The worker's loop: drives one generator in short slices, so that a message to stop gets through
// between two of them, and hands the result's arrays over without copying them.
//
// One run at a time. A newer request takes the place of the one that is running: its answer is no
// longer wanted, because the project has changed.

import type { Parsed } from '../../weather/index.ts';
import type { FromWorker, Port, RunProgress, ToWorker } from './protocol.ts';

/** A piece of work: yields how far it is, returns what came out or what is wrong with the input. */
export type Work<Result> = Generator<RunProgress, Parsed<Result>, void>;

export interface Service<Request, Result> {
  readonly begin: (request: Request) => Work<Result>;
  /** Buffers of the result that go over to the client; this side loses them. */
  readonly transferables: (result: Result) => readonly ArrayBuffer[];
  /** Longest stretch of work between two looks at the messages [ms]. */
  readonly sliceMs?: number;
}

/** Answers requests on the port until the thread ends. */
export function serve<Request, Result>(port: Port, service: Service<Request, Result>): void {
  const sliceMs = service.sliceMs ?? 25;
  let current: { readonly id: number; readonly work: Work<Result> } | null = null;

  const say = (message: FromWorker<Result>, transfer: readonly ArrayBuffer[] = []) =>
    port.post(message, transfer);

  function stop(id: number) {
    if (current?.id !== id) return; // already over: its answer is on the way
    current = null;
    say({ kind: 'stopped', id });
  }

  function fail(id: number, error: unknown) {
    current = null;
    const known = error instanceof Error;
    const message = known ? error.message : String(error);
    say({ kind: 'failed', id, message, trace: (known && error.stack) || message });
  }

  function slice(id: number) {
    if (current?.id !== id) return;
    try {
      const until = performance.now() + sliceMs;
      let step = current.work.next();
      while (!step.done && performance.now() < until) step = current.work.next();
      if (!step.done) {
        say({ kind: 'progress', id, done: step.value.done, what: step.value.what });
        setTimeout(slice, 0, id); // after the messages that wait
        return;
      }
      current = null;
      if (!step.value.ok) return say({ kind: 'refused', id, faults: step.value.faults });
      const result = step.value.value;
      say({ kind: 'done', id, result }, service.transferables(result));
    } catch (error) {
      fail(id, error);
    }
  }

  port.listen((heard) => {
    const message = heard as ToWorker<Request>;
    if (message.kind === 'stop') return stop(message.id);
    const { id } = message;
    if (current) stop(current.id);
    try {
      current = { id, work: service.begin(message.request) };
    } catch (error) {
      return fail(id, error);
    }
    setTimeout(slice, 0, id); // a burst of requests: only the last one starts to work
  });
}
