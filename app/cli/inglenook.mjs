#!/usr/bin/env node
// The command. Committed, so that it exists before anything is built; the program itself is dist/cli.js.
import { existsSync } from 'node:fs';

const program = new URL('../../dist/cli.js', import.meta.url);

if (existsSync(program)) {
  // npm runs scripts in the project's folder: paths are meant from where the user is.
  const { npm_lifecycle_event: script, INIT_CWD: from } = process.env;
  if (script === 'inglenook' && from) process.chdir(from);
  await import(program.href);
} else {
  console.error(
    'Not built yet: run "npm run build" once in the checkout, or use "npm run inglenook".',
  );
  process.exitCode = 1;
}
