// The desk of a shell with a host behind it: files by path, recent projects, the example that came
// with the program. Where the shell has no dialogs of its own, the page's file inputs stand in.

import type { Bridge, CallOut } from '../../bridge/index.ts';
import { bridgeFiles } from './bridge-files.ts';
import { browserDesk } from './browser-desk.ts';
import type { Desk, OpenedFile, OpenedProject, RecentProject } from './desk.ts';

type ProjectFile = NonNullable<CallOut<'openProject'>>;
type AppInfo = CallOut<'appInfo'>;
type WeatherFile = NonNullable<CallOut<'readWeather'>>;

const openedTable = ({
  name: file,
  path,
  sha256,
  relativePath,
  text,
}: WeatherFile): OpenedFile => ({
  file,
  path,
  sha256,
  relativePath,
  text,
});

/** The weather table a project names; `null` where it names none or is no project at all. */
export function weatherNamed(projectText: string): string | null {
  try {
    const project: unknown = JSON.parse(projectText);
    if (typeof project !== 'object' || project === null || !('weather' in project)) return null;
    const { weather } = project;
    if (typeof weather !== 'object' || weather === null || !('file' in weather)) return null;
    return typeof weather.file === 'string' ? weather.file : null;
  } catch {
    return null; // the run reads the text again and says what is wrong with it
  }
}

export function bridgeDesk(bridge: Bridge, info: AppInfo): Desk {
  const page = browserDesk(null);

  async function weatherOf(project: ProjectFile): Promise<OpenedFile | null> {
    const path = weatherNamed(project.text);
    if (path === null) return null;
    const table = await bridge.readWeather({ path, projectPath: project.path });
    return table && openedTable(table);
  }

  /** A table that cannot be read leaves the project open, and says why. */
  async function opened(project: ProjectFile | null): Promise<OpenedProject | null> {
    if (!project) return null;
    const { name: file, ...rest } = project;
    try {
      return { file, ...rest, weather: await weatherOf(project) };
    } catch (error) {
      const trouble = error instanceof Error ? error.message : 'The weather table was not read.';
      return { file, ...rest, weather: null, trouble };
    }
  }

  async function openWeather(): Promise<OpenedFile | null> {
    if (!info.hasDialogs) return page.openWeather();
    const table = await bridge.readWeather({ path: null, projectPath: null });
    return table && openedTable(table);
  }

  async function recent(): Promise<readonly RecentProject[]> {
    const used = await bridge.recentFiles({});
    const near = await bridge.listFiles({ kind: 'project' });
    const seen = new Set(used.map((file) => file.path));
    return [
      ...used.map(({ name, path }) => ({ file: name, note: path })),
      ...near
        .filter(({ path }) => !seen.has(path))
        .map(({ name, path }) => ({ file: name, note: path })),
    ];
  }

  return {
    openProject: async () =>
      info.hasDialogs ? opened(await bridge.openProject({ path: null })) : page.openProject(),
    openWeather,
    recent,
    openRecent: async ({ note }) => opened(await bridge.openProject({ path: note })),
    // The example is a copy to work on: it has no path to be saved to.
    demo: async () => {
      const example = await opened(await bridge.readDemo({}));
      if (!example) return null;
      const { path: _path, sha256: _sha256, ...copy } = example;
      return copy;
    },
    files: bridgeFiles(bridge, info, opened),
  };
}
