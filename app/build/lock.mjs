// One set-up at a time in a checkout: a second one waits, then finds everything done.
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './paths.mjs';

const folder = join(root, '.inglenook');
const file = join(folder, 'set-up.lock');

function ownerIsGone() {
  try {
    process.kill(Number(readFileSync(file, 'utf8')) || Number.NaN, 0);
    return false;
  } catch (error) {
    return error.code !== 'EPERM'; // EPERM: it lives, but is another user's
  }
}

/** Runs `work` while no other process of this checkout does. */
export async function alone(work) {
  mkdirSync(folder, { recursive: true });
  for (let waitedMs = 0; ; waitedMs += 200) {
    try {
      writeFileSync(file, String(process.pid), { flag: 'wx' });
      break;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
      // A new lock is empty for a moment, so a dead owner counts only after the first look.
      if (waitedMs > 0 && ownerIsGone()) rmSync(file, { force: true });
      else await new Promise((done) => setTimeout(done, 200));
    }
  }
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}
