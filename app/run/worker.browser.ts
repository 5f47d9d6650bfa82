// The window's worker: start it with
//   new Worker(new URL('../run/worker.browser.ts', import.meta.url), { type: 'module' })
// written literally like that, which is the form that the bundler finds.

import { z } from 'zod';
import { transferables } from '../../engine/index.ts';
import { eventPort } from './protocol.ts';
import { serve } from './serve.ts';
import { simulationWork } from './simulation-work.ts';

// The page's policy forbids compiling code; zod would try.
z.config({ jitless: true });

interface WorkerScope {
  postMessage(message: unknown, transfer: ArrayBuffer[]): void;
  addEventListener(type: 'message', hear: (event: { readonly data: unknown }) => void): void;
}

// Typed as what it is in a worker; the page's types know `self` as a window.
const scope = globalThis as unknown as WorkerScope;
serve(eventPort(scope), { begin: simulationWork(), transferables });
