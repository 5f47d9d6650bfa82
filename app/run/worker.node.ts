// The worker thread for Node, built to dist/worker.js. Its address is made in the entry that starts it,
// new URL('./worker.js', import.meta.url): shared code ends up in another folder.

import { parentPort, workerData } from 'node:worker_threads';
import { transferables } from '../../engine/index.ts';
import { jobThreadData, jobWork } from './job-service.ts';
import { emitterPort } from './protocol.ts';
import { serve } from './serve.ts';
import { simulationWork } from './simulation-work.ts';

if (!parentPort) throw new Error('This file runs as a worker thread.');
const port = emitterPort(parentPort);
const jobs = jobThreadData(workerData);
if (jobs) serve(port, { begin: jobWork(jobs), transferables: () => [], sliceMs: 200 });
else serve(port, { begin: simulationWork(), transferables });
