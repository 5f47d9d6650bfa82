// Are the installed packages those of package-lock.json? If not: npm ci.
//
// npm writes what it installed into node_modules/.package-lock.json, in the lock file's own form. The
// two are compared by content, so that a checkout which only touches the file's date costs nothing.
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './paths.mjs';

function packagesOf(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages;
  } catch {
    return null;
  }
}

/** True where every package of the lock file is installed in its version. */
export function packagesMatch(wanted, installed) {
  if (!wanted || !installed) return false;
  return Object.entries(wanted).every(([path, entry]) => {
    if (path === '') return true; // the project itself
    const found = installed[path];
    if (!found) return Boolean(entry.optional || entry.os || entry.cpu); // for another platform
    return found.version === entry.version && found.integrity === entry.integrity;
  });
}

export function packagesAreInstalled(folder = root) {
  return packagesMatch(
    packagesOf(join(folder, 'package-lock.json')),
    packagesOf(join(folder, 'node_modules', '.package-lock.json')),
  );
}

/** Installs what the lock file says. Speaks on standard error only, and returns false on failure. */
export function installPackages() {
  console.error('Installing the packages of package-lock.json (npm ci) …');
  const args = ['ci', '--no-audit', '--no-fund', '--ignore-scripts', '--loglevel=error'];
  const npm = process.env.npm_execpath;
  const [command, first] = npm ? [process.execPath, [npm]] : ['npm', []];
  const { status, error } = spawnSync(command, [...first, ...args], {
    cwd: root,
    stdio: ['ignore', 2, 2],
    shell: !npm && process.platform === 'win32',
  });
  if (status === 0) return true;
  console.error(
    `The packages could not be installed (npm ci: ${error ? error.message : `status ${status}`}). ` +
      'Check the network and the npm settings, then run the same command again.',
  );
  return false;
}
