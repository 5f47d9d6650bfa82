// The client of `serve`: one request, one promise.

import { type Fault, faultText } from '../../weather/index.ts';
import {
  emitterPort,
  eventPort,
  type FromWorker,
  type Port,
  type RunProgress,
} from './protocol.ts';

/** The input is at fault; the faults say where, and how to mend it. */
export class RunRefused extends Error {
  readonly faults: readonly Fault[];
  constructor(faults: readonly Fault[]) {
    super(faults.map(faultText).join('\n'));
    this.name = 'RunRefused';
    this.faults = faults;
  }
}

export interface AskOptions {
  readonly onProgress?: (progress: RunProgress) => void;
  readonly signal?: AbortSignal;
}

/** A browser's worker. */
interface BrowserWorker {
  postMessage(message: unknown, transfer: ArrayBuffer[]): void;
  addEventListener(type: 'message', hear: (event: { readonly data: unknown }) => void): void;
  addEventListener(type: 'error', hear: (event: { readonly message: string }) => void): void;
}

/** A worker thread of Node. */
interface NodeWorker {
  postMessage(message: unknown, transfer: ArrayBuffer[]): void;
  on(type: 'message', hear: (message: unknown) => void): unknown;
  on(type: 'error', hear: (error: Error) => void): unknown;
  on(type: 'exit', hear: (status: number) => void): unknown;
}

export type RunWorker = BrowserWorker | NodeWorker;

type Answer = FromWorker<unknown>;

interface Line {
  readonly port: Port;
  readonly waiting: Map<number, { hear(answer: Answer): void; lost(reason: Error): void }>;
  nextId: number;
}

/** One line a worker: its listeners are added once, however many runs it does. */
const lines = new WeakMap<RunWorker, Line>();

function lineTo(worker: RunWorker): Line {
  const known = lines.get(worker);
  if (known) return known;
  const port = 'on' in worker ? emitterPort(worker) : eventPort(worker);
  const line: Line = { port, waiting: new Map(), nextId: 1 };
  lines.set(worker, line);
  port.listen((message) => {
    const answer = message as Answer;
    line.waiting.get(answer.id)?.hear(answer);
  });
  const lose = (why: string) => {
    for (const { lost } of [...line.waiting.values()]) lost(new Error(why));
  };
  if ('on' in worker) {
    worker.on('error', (error) => lose(`The worker failed: ${error.message}`));
    worker.on('exit', (status) => lose(`The worker ended before its answer (status ${status}).`));
  } else {
    worker.addEventListener('error', (event) => lose(`The worker failed: ${event.message}`));
  }
  return line;
}

const stopped = () => new DOMException('The run was stopped.', 'AbortError');

/**
 * Sends one request and waits for its result. Rejects with `RunRefused` when the input is at fault,
 * with an `AbortError` when it was stopped (by the signal or by a newer request on the same worker),
 * and with an `Error` that holds the worker's trace when the program is at fault.
 */
export function ask<Request, Result>(
  worker: RunWorker,
  request: Request,
  { onProgress, signal }: AskOptions = {},
): Promise<Result> {
  if (signal?.aborted) return Promise.reject(stopped());
  const line = lineTo(worker);
  const id = line.nextId++;
  return new Promise<Result>((resolve, reject) => {
    const stop = () => {
      end();
      line.port.post({ kind: 'stop', id }, []);
      reject(stopped());
    };
    const end = () => {
      line.waiting.delete(id);
      signal?.removeEventListener('abort', stop);
    };
    signal?.addEventListener('abort', stop);
    line.waiting.set(id, {
      lost(reason) {
        end();
        reject(reason);
      },
      hear(answer) {
        if (answer.kind === 'progress') {
          onProgress?.({ done: answer.done, what: answer.what });
          return;
        }
        end();
        if (answer.kind === 'done') resolve(answer.result as Result);
        else if (answer.kind === 'refused') reject(new RunRefused(answer.faults));
        else if (answer.kind === 'stopped') reject(stopped());
        else reject(Object.assign(new Error(answer.message), { stack: answer.trace }));
      },
    });
    line.port.post({ kind: 'start', id, request }, []);
  });
}
