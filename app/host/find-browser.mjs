// Finds an installed browser of the Chromium family. Plain JavaScript, because the set-up scripts need
// it before anything is built; the host's window and the browser tests use the same search.
import { accessSync, constants, statSync } from 'node:fs';
import { delimiter, isAbsolute, join, resolve } from 'node:path';

const names = [
  'chromium',
  'chromium-browser',
  'google-chrome',
  'google-chrome-stable',
  'chrome',
  'microsoft-edge',
  'microsoft-edge-stable',
  'msedge',
];

/** Where installers put the browser on systems that do not list it on the PATH. */
const usualPlaces = {
  darwin: [
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
    '/Applications/Chromium.app/Contents/MacOS/Chromium',
    '/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge',
  ],
  win32: [
    'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe',
    'C:\\Program Files (x86)\\Google\\Chrome\\Application\\chrome.exe',
    'C:\\Program Files (x86)\\Microsoft\\Edge\\Application\\msedge.exe',
    'C:\\Program Files\\Microsoft\\Edge\\Application\\msedge.exe',
  ],
};

function isProgram(path) {
  try {
    accessSync(path, constants.X_OK);
    return statSync(path).isFile();
  } catch {
    return false;
  }
}

/**
 * The path of a browser, or null. `INGLENOOK_BROWSER` (a path or a name) wins: where it is set and
 * points nowhere, there is no browser, so that a spelling mistake is not passed over in silence.
 */
export function findBrowser(env = process.env, platform = process.platform) {
  const onPath = (name) =>
    (env.PATH ?? env.Path ?? '')
      .split(delimiter)
      .filter(Boolean)
      .map((folder) => join(folder, platform === 'win32' ? `${name}.exe` : name))
      .find(isProgram) ?? null;
  const wanted = env.INGLENOOK_BROWSER;
  if (wanted) {
    const path = isAbsolute(wanted) || /[\\/]/.test(wanted) ? resolve(wanted) : null;
    return path ? (isProgram(path) ? path : null) : onPath(wanted);
  }
  for (const name of names) {
    const path = onPath(name);
    if (path) return path;
  }
  return usualPlaces[platform]?.find(isProgram) ?? null;
}
