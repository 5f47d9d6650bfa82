// Makes a checkout ready to run: packages installed, build fresh. Run before every npm script, so that
// each works on a fresh clone by itself; with nothing to do it costs a fraction of a second.
// Needs Node and npm alone. Speaks on standard error, because --json commands own standard output.
//
//   node app/build/set-up.mjs             packages
//   node app/build/set-up.mjs build       packages and build
//   node app/build/set-up.mjs rebuild     packages and build, even if it is fresh
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { alone } from './lock.mjs';
import { installPackages, packagesAreInstalled } from './packages.mjs';
import { isProgram, root } from './paths.mjs';
import { buildIsFresh } from './stamp.mjs';

const oldestNode = 20;

async function buildNow() {
  console.error('Building …');
  try {
    const { build } = await import('./build.mjs');
    await build();
    return true;
  } catch (error) {
    console.error(`The build failed: ${error.message}`);
    return false;
  }
}

/** Installs and builds what is missing or stale. False when that failed, with the reason printed. */
export async function setUp(what) {
  if (Number(process.versions.node.split('.')[0]) < oldestNode) {
    console.error(
      `Node ${process.version} is too old: Inglenook needs Node ${oldestNode} or newer.`,
    );
    return false;
  }
  const needsBuild = () => what === 'rebuild' || (what === 'build' && !buildIsFresh());
  if (packagesAreInstalled() && !needsBuild()) return true;
  return alone(async () => {
    if (!packagesAreInstalled() && !installPackages()) return false;
    return needsBuild() ? buildNow() : true;
  });
}

/** npm runs this after installing. Without the development packages there is nothing to build with. */
function prepare() {
  return buildIsFresh() || !existsSync(join(root, 'node_modules', 'vite')) || alone(buildNow);
}

if (isProgram(import.meta.url)) {
  const [what = 'packages'] = process.argv.slice(2);
  const isDone = await (what === 'prepare' ? prepare() : setUp(what));
  if (!isDone) process.exitCode = 1;
}
