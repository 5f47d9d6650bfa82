// Builds dist/: the Node programs (command line, worker, host, Electron) and the window's page.
//
// Everything goes into a new folder that takes the place of dist/ when it is whole, so that a failed
// build leaves the last good one. Run by `npm run build`, and by every other command when it is stale.
import { spawnSync } from 'node:child_process';
import { existsSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { compileKernel } from './kernel.mjs';
import { dist, root, stampFile } from './paths.mjs';
import { sourcesStamp } from './stamp.mjs';

/** Programs that Node or Electron runs, as ES modules: name in dist/ → entry. */
const programs = {
  cli: 'app/cli/main.ts',
  worker: 'app/run/worker.node.ts',
  start: 'app/host/start.ts',
  'electron-main': 'app/host/electron/main.ts',
  demo: 'demo/run.ts',
  'demo-weather': 'demo/write-weather.ts',
};
/** A sandboxed preload must be one CommonJS file. */
const preload = { preload: 'app/host/electron/preload.ts' };

const present = (entries) =>
  Object.fromEntries(
    Object.entries(entries)
      .map(([name, file]) => [name, join(root, file)])
      .filter(([, file]) => existsSync(file)),
  );

function nodeBuild(input, format, extension, outDir) {
  return {
    root,
    configFile: false,
    logLevel: 'warn',
    build: {
      ssr: true,
      outDir,
      emptyOutDir: false,
      copyPublicDir: false,
      target: 'node20',
      sourcemap: true,
      minify: false,
      rolldownOptions: {
        checks: { pluginTimings: false },
        input,
        output: {
          format,
          entryFileNames: `[name].${extension}`,
          chunkFileNames: `chunks/[name]-[hash].${extension}`,
        },
      },
    },
  };
}

async function rendererBuild(outDir) {
  const { default: react } = await import('@vitejs/plugin-react');
  return {
    root: join(root, 'app', 'ui'),
    configFile: false,
    logLevel: 'warn',
    base: './',
    plugins: [react()],
    worker: { format: 'es' },
    build: {
      outDir: join(outDir, 'renderer'),
      emptyOutDir: true,
      target: 'es2022',
      assetsInlineLimit: 0,
      modulePreload: { polyfill: false },
      chunkSizeWarningLimit: 1500,
      rolldownOptions: { checks: { pluginTimings: false } },
    },
  };
}

/** Bundles other entries for Node, for the benchmarks. */
export async function bundleForNode(input, outDir) {
  const vite = await import('vite');
  await vite.build(nodeBuild(input, 'esm', 'js', outDir));
}

/** So that the demo's project runs without the demo having been run. */
function makeDemoWeather() {
  const { status } = spawnSync(process.execPath, [join(dist, 'demo-weather.js')], {
    stdio: ['ignore', 2, 2],
  });
  if (status !== 0) throw new Error("the demo's weather could not be written");
}

export async function build() {
  const vite = await import('vite');
  const stamp = sourcesStamp(); // before the build: an edit during it makes the result stale
  const fresh = `${dist}.tmp`;
  rmSync(fresh, { recursive: true, force: true });
  const entries = present(programs);
  if (Object.keys(entries).length > 0) await vite.build(nodeBuild(entries, 'esm', 'js', fresh));
  const cjs = present(preload);
  if (Object.keys(cjs).length > 0) await vite.build(nodeBuild(cjs, 'cjs', 'cjs', fresh));
  if (existsSync(join(root, 'app', 'ui', 'index.html')))
    await vite.build(await rendererBuild(fresh));
  writeFileSync(join(fresh, 'kernel.wasm'), await compileKernel());
  rmSync(dist, { recursive: true, force: true });
  renameSync(fresh, dist);
  makeDemoWeather();
  writeFileSync(stampFile, stamp);
}
