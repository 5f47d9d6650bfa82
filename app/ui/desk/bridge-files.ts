// Saving, drafts, earlier versions and who else has a file open, by the host behind the bridge.

import { type Bridge, BridgeError, type CallOut } from '../../bridge/index.ts';
import type { DeskFiles, OpenedProject } from './desk.ts';

type ProjectFile = NonNullable<CallOut<'openProject'>>;

const windowKey = 'inglenook-window';

/** This window's mark. It outlasts a reload, so that the draft of a page that broke is offered again. */
function windowMark(): string {
  const known = sessionStorage.getItem(windowKey);
  if (known) return known;
  const fresh = crypto.randomUUID();
  sessionStorage.setItem(windowKey, fresh);
  return fresh;
}

export function bridgeFiles(
  bridge: Bridge,
  info: CallOut<'appInfo'>,
  opened: (file: ProjectFile) => Promise<OpenedProject | null>,
): DeskFiles {
  return {
    version: info.version,
    parts: Object.entries(info.versions)
      .map(([name, version]) => `${name} ${version}`)
      .join(', '),
    hasDialogs: info.hasDialogs,
    folders: info.folders,
    async save(request) {
      try {
        const saved = await bridge.saveProject(request);
        return saved ? { kind: 'saved', ...saved } : { kind: 'left' };
      } catch (error) {
        if (!(error instanceof BridgeError && error.kind === 'changed')) throw error;
        return { kind: 'changed', message: error.message };
      }
    },
    watch: (path) => bridge.watchProject({ window: windowMark(), path }),
    versions: (path) => bridge.listVersions({ path }),
    readVersion: async (path, id) => (await bridge.readVersion({ path, id })).text,
    async weatherPathFrom(weatherPath, projectPath) {
      const read = await bridge.readWeather({ path: weatherPath, projectPath }).catch(() => null);
      return read?.relativePath ?? null;
    },
    async keepDraft(draft) {
      await bridge.keepDraft({ ...draft, window: windowMark() });
    },
    async dropDraft(id) {
      await bridge.dropDraft({ id });
    },
    drafts: () => bridge.listDrafts({ window: windowMark() }),
    async openDraft(id) {
      const draft = await bridge.readDraft({ id });
      if (!draft) return null;
      const { path, name, weatherPath, replaces, text } = draft;
      const project = path === null ? null : await opened({ path, name, text, sha256: '' });
      const table =
        weatherPath === null
          ? null
          : await bridge
              .readWeather({ path: weatherPath, projectPath: path })
              .then((read) => read && { file: read.name, ...read })
              .catch(() => null);
      const weather = table ?? project?.weather ?? null;
      return { file: name, text, ...(path === null ? {} : { path }), weather, replaces };
    },
  };
}
