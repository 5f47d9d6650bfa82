// The solver's WebAssembly kernel beside the built program. Without it everything runs in JavaScript, to
// the same figures in two to three times the time.

import { readFileSync } from 'node:fs';

/** The kernel's bytes, or null where the build has none (as in tests, which run from the sources). */
export function readKernel(): Uint8Array | null {
  // Built code lies in dist/ or in dist/chunks/.
  for (const place of ['./kernel.wasm', '../kernel.wasm']) {
    try {
      return new Uint8Array(readFileSync(new URL(place, import.meta.url)));
    } catch {
      // not there: the next place, or none
    }
  }
  return null;
}
