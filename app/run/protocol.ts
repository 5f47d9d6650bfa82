// What the worker that runs the engine and its client say to each other, and the two kinds of port
// they say it over. A request carries an id; every answer names the request it belongs to.

import type { Fault } from '../../weather/index.ts';

/** How far a run has come. */
export interface RunProgress {
  /** Share of the work, 0 to 1. */
  readonly done: number;
  /** What is being done, in a few words. */
  readonly what: string;
}

export type ToWorker<Request> =
  | { readonly kind: 'start'; readonly id: number; readonly request: Request }
  | { readonly kind: 'stop'; readonly id: number };

export type FromWorker<Result> =
  | ({ readonly kind: 'progress'; readonly id: number } & RunProgress)
  | { readonly kind: 'done'; readonly id: number; readonly result: Result }
  /** The input is at fault. */
  | { readonly kind: 'refused'; readonly id: number; readonly faults: readonly Fault[] }
  /** Stopped on request, or because a newer run took its place. */
  | { readonly kind: 'stopped'; readonly id: number }
  /** A fault of the program. */
  | {
      readonly kind: 'failed';
      readonly id: number;
      readonly message: string;
      readonly trace: string;
    };

/** One end of the line, whatever it is made of. */
export interface Port {
  post(message: unknown, transfer: readonly ArrayBuffer[]): void;
  listen(hear: (message: unknown) => void): void;
}

/** A port or worker of the browser. */
interface EventPort {
  postMessage(message: unknown, transfer: ArrayBuffer[]): void;
  addEventListener(type: 'message', hear: (event: { readonly data: unknown }) => void): void;
}

/** A port or worker thread of Node. */
interface EmitterPort {
  postMessage(message: unknown, transfer: ArrayBuffer[]): void;
  on(type: 'message', hear: (message: unknown) => void): unknown;
}

export function eventPort(port: EventPort): Port {
  return {
    post: (message, transfer) => port.postMessage(message, [...transfer]),
    listen: (hear) => port.addEventListener('message', (event) => hear(event.data)),
  };
}

export function emitterPort(port: EmitterPort): Port {
  return {
    post: (message, transfer) => port.postMessage(message, [...transfer]),
    listen: (hear) => port.on('message', hear),
  };
}
