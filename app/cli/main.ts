// The command line's entry, built to dist/cli.js.

import { availableParallelism } from 'node:os';
import { runCli } from './run-cli.ts';

// "inglenook … | head": the reader has gone, and nobody is left to complain to.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') process.exit();
  throw error;
});

const streams = {
  out: process.stdout,
  err: process.stderr,
  env: process.env,
  // Beside this file once built.
  threads: { worker: new URL('./worker.js', import.meta.url), count: availableParallelism() },
};
process.exitCode = await runCli(process.argv.slice(2), streams);
