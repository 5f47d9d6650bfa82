// The browser for the tests of the built window: found, or installed where that is possible without
// asking (Debian's package, as root), else named as missing together with how to get one.
import { spawnSync } from 'node:child_process';
import { findBrowser } from '../host/find-browser.mjs';

const packages = ['chromium', 'fonts-dejavu-core'];
const apt = ['-qq', '-o', 'DPkg::Lock::Timeout=600', '-o', 'Acquire::Retries=3'];

function canInstall() {
  return (
    process.platform === 'linux' &&
    process.getuid?.() === 0 &&
    !process.env.INGLENOOK_BROWSER &&
    spawnSync('apt-get', ['--version'], { stdio: 'ignore' }).status === 0
  );
}

/** A browser's path, or null with the reason and the remedy printed. */
export function browserForTests() {
  const found = findBrowser();
  if (found) return found;
  if (canInstall()) {
    console.error(`No browser found: installing ${packages.join(' and ')} with apt-get …`);
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    const run = (...args) =>
      spawnSync('apt-get', [...apt, ...args], { env, stdio: ['ignore', 'ignore', 2] }).status === 0;
    if (run('update') && run('install', '-y', '--no-install-recommends', ...packages)) {
      const installed = findBrowser();
      if (installed) return installed;
    }
    console.error('apt-get could not install it.');
  }
  const wanted = process.env.INGLENOOK_BROWSER;
  console.error(
    wanted
      ? `INGLENOOK_BROWSER names "${wanted}", which is not a program on this machine.`
      : 'No Chromium, Chrome or Edge on the PATH.',
  );
  console.error(
    'Get one with "apt-get install chromium" (Debian), "brew install --cask chromium" (macOS) or from the ' +
      "system's store, or set INGLENOOK_BROWSER to the path of an installed one.",
  );
  return null;
}
