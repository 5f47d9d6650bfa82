import { statSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import { parseArgs } from 'node:util';

export const startHelp = `Opens the window.

  npm start                      files of the current folder
  npm start -- FOLDER            files of that folder
  npm start -- PROJECT           that project, and the files of its folder

  --window electron|browser|none   which window; without it, Electron where its program is
                                   installed, else an installed Chromium, Chrome or Edge.
                                   none: only print the address
  --port NUMBER                    port of the browser's window; without it, any free one
  --help                           this text

INGLENOOK_BROWSER names the browser's program, INGLENOOK_DATA the folder for the list of recent files.`;

const windows = ['electron', 'browser', 'none'] as const;

export interface StartOptions {
  readonly help: boolean;
  readonly window: (typeof windows)[number] | null;
  readonly port: number;
  readonly folder: string;
  readonly project: string | null;
}

/** Reads the command line; a string says what is wrong with it. */
export function startOptions(args: readonly string[], from: string): StartOptions | string {
  let parsed: ReturnType<typeof parse>;
  try {
    parsed = parse(args);
  } catch (error) {
    return error instanceof Error ? error.message : String(error);
  }
  const { values, positionals } = parsed;
  const window = windows.find((name) => name === values.window) ?? null;
  if (values.window !== undefined && window === null) {
    return `--window: found "${values.window}", expected ${windows.join(', ')}.`;
  }
  const port = Number(values.port ?? 0);
  if (!(Number.isInteger(port) && port >= 0 && port <= 65535)) {
    return `--port: found "${values.port}", expected a whole number from 0 to 65535.`;
  }
  if (positionals.length > 1) return `One folder or project, please: found ${positionals.length}.`;
  const named = resolve(from, positionals[0] ?? '.');
  let isFolder: boolean;
  try {
    isFolder = statSync(named).isDirectory();
  } catch {
    return `${named}: found nothing at this path, expected a folder or a project.`;
  }
  return {
    help: values.help === true,
    window,
    port,
    folder: isFolder ? named : dirname(named),
    project: isFolder ? null : named,
  };
}

function parse(args: readonly string[]) {
  return parseArgs({
    args: [...args],
    allowPositionals: true,
    options: {
      window: { type: 'string' },
      port: { type: 'string' },
      help: { type: 'boolean', short: 'h' },
    },
  });
}
