// Answers to every call of the bridge, for both shells.

import { readdir, stat } from 'node:fs/promises';
import { basename, dirname, join, relative, resolve, sep } from 'node:path';
import { type Fault, faultText, type Parsed } from '../../weather/index.ts';
import { BridgeError, type Handlers } from '../bridge/index.ts';
import { readText, type TextFile, writeFileWhole } from '../disk/index.ts';
import { allowed } from './allowed.ts';
import { keepingHandlers } from './keeping.ts';
import { listFiles } from './list-files.ts';
import { recentList } from './recent.ts';
import { sha256Of } from './sha256.ts';
import type { Dialogs, Shell } from './shell.ts';
import { fileVersions } from './versions.ts';

const projectEnding = '.inglenook.json';
const projectRead = { expected: 'a project file', limitBytes: 32_000_000 };
const weatherRead = {
  expected: 'a weather table',
  limitBytes: 64_000_000,
  allowLegacyText: true,
};

function inputError(faults: readonly Fault[]): BridgeError {
  return new BridgeError('input', faults.map(faultText).join('\n'), [...faults]);
}

function wrongPath(file: string, found: string, expected: string, mend: string): BridgeError {
  return inputError([{ file, place: { path: '' }, found, expected, mend }]);
}

function need<T>(parsed: Parsed<T>): T {
  if (parsed.ok) return parsed.value;
  throw inputError(parsed.faults);
}

export function makeHandlers(shell: Shell, now: () => number = Date.now): Handlers {
  const { folders, demoFolder, dialogs } = shell;
  const paths = allowed(folders, [demoFolder]);
  const recent = recentList(shell.dataFolder, now);
  const versions = fileVersions(shell.dataFolder, now);
  const named = shell.startWith ? paths.picked(shell.startWith) : Promise.resolve();

  const outside = (path: string) =>
    wrongPath(
      path,
      'a path outside the folders that this window may use',
      folders.length > 0 ? `a file below ${folders.join(' or ')}` : 'a file picked in the dialog',
      dialogs
        ? 'Pick the file in the dialog.'
        : 'Start the program with its folder: npm start -- FOLDER.',
    );

  async function pick(ask: (shown: Dialogs) => Promise<string | null>): Promise<string | null> {
    if (!dialogs) throw new BridgeError('call', 'This window has no file dialog: name a path.');
    const path = await ask(dialogs);
    if (path !== null) await paths.picked(path);
    return path;
  }

  async function project(path: string) {
    await named;
    if (!(await paths.mayRead(path))) throw outside(path);
    const file: TextFile = need(await readText(path, projectRead));
    return { path, name: basename(path), text: file.text, sha256: file.sha256 };
  }

  /** Files opened in earlier sessions were the user's choice then. */
  async function knownFromBefore(path: string): Promise<void> {
    if (!dialogs) return; // the browser's window keeps to its folders
    if ((await recent.files()).some((entry) => entry.path === path)) await paths.picked(path);
  }

  return {
    ...keepingHandlers({
      dataFolder: shell.dataFolder,
      versions,
      now,
      mayRead: async (path) => {
        await named;
        if (!(await paths.mayRead(path))) throw outside(path);
      },
      pickedBefore: async (path) => {
        if (dialogs) await paths.picked(path); // the browser's window keeps to its folders
      },
    }),

    appInfo: async () => ({
      version: shell.version,
      shell: shell.kind,
      hasDialogs: dialogs !== null,
      folders: [...folders],
      versions: { node: process.versions.node, ...electronVersion() },
      startWith: shell.startWith,
    }),

    listFiles: ({ kind }) => listFiles([...folders, demoFolder], kind),

    async openProject({ path: asked }) {
      const path = asked ?? (await pick((dialog) => dialog.pickOpen('project')));
      if (path === null) return null;
      await knownFromBefore(path);
      const opened = await project(resolve(path));
      await recent.used(opened.path);
      return opened;
    },

    async readDemo() {
      const names = await readdir(demoFolder).catch(() => []);
      const name = names.filter((entry) => entry.endsWith(projectEnding)).sort()[0];
      return name === undefined ? null : project(join(demoFolder, name));
    },

    async readWeather({ path: asked, projectPath }) {
      await named;
      const base = projectPath === null ? null : dirname(resolve(projectPath));
      const given = asked ?? (await pick((dialog) => dialog.pickOpen('weather')));
      if (given === null) return null;
      const path = base === null ? resolve(given) : resolve(base, given);
      if (!(await paths.mayRead(path))) throw outside(path);
      const { text, sha256, notes } = need(await readText(path, weatherRead));
      const relativePath = base === null ? path : relative(base, path).split(sep).join('/');
      return { path, name: basename(path), relativePath, text, sha256, notes: [...notes] };
    },

    async saveProject({ path: asked, name, text, replaces }) {
      await named;
      const given = asked ?? (await pick((dialog) => dialog.pickSave(name)));
      if (given === null) return null;
      const path = resolve(given);
      if (!path.endsWith(projectEnding)) {
        const mend = `Name it NAME${projectEnding}.`;
        throw wrongPath(path, 'another ending', `a name that ends in ${projectEnding}`, mend);
      }
      if (!(await paths.mayWrite(path))) throw outside(path);
      // The system's dialog has asked before it lets a file be replaced.
      if (replaces !== 'anything' && asked !== null) {
        const there = (await stat(path).catch(() => null)) !== null;
        if (there !== (replaces !== null)) {
          throw new BridgeError(
            'changed',
            there ? `There is a file at ${path} already.` : `The file at ${path} is gone.`,
          );
        }
        if (there && need(await readText(path, projectRead)).sha256 !== replaces) {
          throw new BridgeError(
            'changed',
            `Another program has changed ${path} since it was read.`,
          );
        }
      }
      await versions.keep(path);
      need(await writeFileWhole(path, text));
      await recent.used(path);
      return { path, name: basename(path), sha256: sha256Of(text) };
    },

    async recentFiles() {
      const there = [];
      for (const { path, usedAt } of await recent.files()) {
        const seen = dialogs !== null || (await paths.mayRead(path));
        if (!seen || !(await stat(path).catch(() => null))?.isFile()) continue;
        there.push({ path, name: basename(path), usedAt });
      }
      return there;
    },
  };
}

function electronVersion(): Record<string, string> {
  const { electron, chrome } = process.versions;
  return electron && chrome ? { electron, chrome } : {};
}
