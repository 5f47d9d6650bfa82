// Electron's main process: one window, shut off from Node and from the web, and the bridge behind it.

import { existsSync, statSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { app, BrowserWindow, dialog, ipcMain, protocol, session } from 'electron';
import { dispatch } from '../../bridge/index.ts';
import { version } from '../../version.ts';
import { makeHandlers } from '../handlers.ts';
import { answerPage, pageOrigin, scheme } from './page-scheme.ts';

const dist = fileURLToPath(new URL('.', import.meta.url));

// Must be said before Electron is ready.
protocol.registerSchemesAsPrivileged([
  { scheme, privileges: { standard: true, secure: true, supportFetchAPI: true } },
]);

const filters = {
  project: [{ name: 'Inglenook project', extensions: ['json'] }],
  weather: [{ name: 'Weather table', extensions: ['csv', 'txt'] }],
};

/** The last argument, where it is a file or folder. */
function namedPath(): string | null {
  const last = process.argv.slice(1).at(-1);
  const path = last === undefined ? null : resolve(last);
  return path !== null && existsSync(path) && !path.endsWith('electron-main.js') ? path : null;
}

function answerCalls(window: BrowserWindow): void {
  const named = namedPath();
  const isFile = named !== null && statSync(named).isFile();
  const folder = named === null ? null : isFile ? dirname(named) : named;
  const handlers = makeHandlers({
    kind: 'electron',
    version,
    folders: folder === null ? [] : [folder],
    demoFolder: join(dist, '..', 'demo'),
    dataFolder: app.getPath('userData'),
    startWith: isFile ? named : null,
    dialogs: {
      async pickOpen(kind) {
        const { canceled, filePaths } = await dialog.showOpenDialog(window, {
          properties: ['openFile'],
          filters: filters[kind],
        });
        return canceled ? null : (filePaths[0] ?? null);
      },
      async pickSave(name) {
        const { canceled, filePath } = await dialog.showSaveDialog(window, {
          defaultPath: name,
          filters: filters.project,
        });
        return canceled ? null : filePath;
      },
    },
  });
  ipcMain.handle('inglenook', (event, name: unknown, input: unknown) => {
    if (event.senderFrame?.origin !== pageOrigin) throw new Error('A stranger called.');
    return dispatch(handlers, String(name), input, (error) => console.error(error));
  });
}

async function start(): Promise<void> {
  await app.whenReady();
  protocol.handle(scheme, (request) => answerPage(join(dist, 'renderer'), request));
  session.defaultSession.setPermissionRequestHandler((_page, _permission, answer) => answer(false));
  session.defaultSession.setPermissionCheckHandler(() => false);
  app.on('web-contents-created', (_event, contents) => {
    contents.setWindowOpenHandler(() => ({ action: 'deny' }));
    contents.on('will-navigate', (event) => event.preventDefault());
    contents.on('will-redirect', (event) => event.preventDefault());
    contents.on('will-attach-webview', (event) => event.preventDefault());
  });
  const window = new BrowserWindow({
    width: 1440,
    height: 900,
    show: false,
    webPreferences: {
      preload: join(dist, 'preload.cjs'),
      contextIsolation: true,
      sandbox: true,
      nodeIntegration: false,
      webSecurity: true,
      webviewTag: false,
    },
  });
  answerCalls(window);
  // The page holds its closing up while there is unsaved work.
  window.webContents.on('will-prevent-unload', (event) => {
    const choice = dialog.showMessageBoxSync(window, {
      type: 'warning',
      message: 'There are changes that no file holds.',
      detail: 'They stay among the unsaved work that is offered at the next start.',
      buttons: ['Stay here', 'Close all the same'],
      defaultId: 0,
      cancelId: 0,
    });
    if (choice === 1) event.preventDefault(); // in Electron this lets the window go
  });
  window.once('ready-to-show', () => window.show());
  await window.loadURL(`${pageOrigin}/`);
}

app.on('window-all-closed', () => app.quit());

// Not awaited: Electron becomes ready only after this module has been read to its end.
void start().catch((error: unknown) => {
  console.error(error);
  app.exit(1);
});
