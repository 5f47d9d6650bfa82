// Compiles the solver's kernel (engine/network/kernel/*.as, AssemblyScript) to WebAssembly.
//
// The sources end in .as, so that the TypeScript compiler and the linter leave them alone; the compiler
// of AssemblyScript is handed them as if they ended in .ts.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import asc from 'assemblyscript/asc';
import { root } from './paths.mjs';

const folder = join(root, 'engine', 'network', 'kernel');

/** The kernel's bytes. */
export async function compileKernel() {
  const sources = new Map(
    readdirSync(folder)
      .filter((name) => name.endsWith('.as'))
      .map((name) => [name.replace(/\.as$/, '.ts'), readFileSync(join(folder, name), 'utf8')]),
  );
  let bytes = null;
  const { error, stderr } = await asc.main(
    ['kernel.ts', '-O3', '--noAssert', '--runtime', 'stub', '--enable', 'simd'].concat([
      '--importMemory',
      '--outFile',
      'kernel.wasm',
    ]),
    {
      readFile: (name) => sources.get(name) ?? null,
      writeFile: (name, contents) => {
        if (name === 'kernel.wasm') bytes = contents;
      },
      listFiles: () => [],
    },
  );
  if (error || bytes === null) {
    throw new Error(`the solver's kernel does not compile: ${error?.message}\n${stderr}`);
  }
  return new Uint8Array(bytes);
}
