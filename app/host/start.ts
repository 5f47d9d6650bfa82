// npm start: chooses the window, and ties its life to this program's.

import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { version } from '../version.ts';
import { hasScreen, openAppWindow } from './app-window.ts';
import { electronProgram } from './electron-program.ts';
import { findBrowser } from './find-browser.mjs';
import { makeHandlers } from './handlers.ts';
import { startLoopback } from './loopback/loopback.ts';
import { dataFolder } from './recent.ts';
import { type StartOptions, startHelp, startOptions } from './start-options.ts';

// This file is built to dist/start.js: everything is found from there.
const dist = fileURLToPath(new URL('.', import.meta.url));
const demoFolder = fileURLToPath(new URL('../demo/', import.meta.url));

const signals = ['SIGINT', 'SIGTERM', 'SIGHUP'] as const;

/** Runs Electron until its window closes, and ends with its status. */
function runElectron(program: string, { folder, project }: StartOptions): void {
  const sandbox = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  const args = [...sandbox, join(dist, 'electron-main.js'), project ?? folder];
  const child = spawn(program, args, { stdio: 'inherit' });
  for (const signal of signals) process.on(signal, () => child.kill(signal));
  child.on('error', (error) => {
    console.error(`Electron could not be started: ${error.message}`);
    process.exitCode = 1;
  });
  child.on('exit', (status) => {
    process.exitCode = status ?? 1;
  });
}

async function runBrowser(options: StartOptions): Promise<void> {
  const { folder, project, port } = options;
  const host = await startLoopback({
    handlers: makeHandlers({
      kind: 'browser',
      version,
      folders: [folder],
      demoFolder,
      dataFolder: dataFolder(process.env, process.platform),
      startWith: project,
      dialogs: null,
    }),
    pageFolder: join(dist, 'renderer'),
    report: (error) => console.error(error),
    port,
  });
  const browser = options.window === 'none' ? null : findBrowser();
  const screen = hasScreen(process.env, process.platform);
  const window = browser && screen ? await openAppWindow(browser, host.startAddress) : null;
  if (window) {
    console.log(`The window is open on ${folder}. Close it, or press Ctrl+C here, to end.`);
  } else {
    if (options.window !== 'none') {
      console.log(screen ? 'No Chromium, Chrome or Edge was found.' : 'There is no screen here.');
    }
    console.log(
      `Open this address in a browser on this machine. It is good once:\n${host.startAddress}`,
    );
    console.log('Press Ctrl+C to end.');
  }
  let ending = false;
  const end = async () => {
    if (ending) return;
    ending = true;
    await window?.close(); // the window first: it must not be left without its host
    await host.close();
  };
  for (const signal of signals) process.on(signal, () => void end());
  void window?.closed.then(end);
}

async function start(): Promise<void> {
  // npm runs scripts in the project's folder and says where the user was.
  const options = startOptions(process.argv.slice(2), process.env.INIT_CWD ?? process.cwd());
  if (typeof options === 'string') {
    console.error(`${options}\n\n${startHelp}`);
    process.exitCode = 2;
    return;
  }
  if (options.help) return console.log(startHelp);
  if (!existsSync(join(dist, 'renderer', 'index.html'))) {
    console.error('The page of the window is not built: run "npm run build".');
    process.exitCode = 1;
    return;
  }
  const electron = electronProgram(import.meta.url);
  if (options.window === 'electron' && electron === null) {
    console.error(
      'Electron\'s program is not installed. "npx install-electron" fetches it; ' +
        'without it, "npm start" uses an installed browser.',
    );
    process.exitCode = 1;
    return;
  }
  const screen = hasScreen(process.env, process.platform);
  if (electron && (options.window === 'electron' || (options.window === null && screen))) {
    return runElectron(electron, options);
  }
  await runBrowser(options);
}

try {
  await start();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
