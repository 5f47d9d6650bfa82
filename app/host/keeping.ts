// Answers to the calls that keep work from being lost: who else has the file open, whether it changed on
// disk, earlier versions, drafts.

import { resolve } from 'node:path';
import { BridgeError, type Handlers } from '../bridge/index.ts';
import { readText } from '../disk/index.ts';
import { draftFiles } from './drafts.ts';
import type { Versions } from './versions.ts';
import { openWindows } from './windows.ts';

type Calls =
  | 'watchProject'
  | 'listVersions'
  | 'readVersion'
  | 'keepDraft'
  | 'dropDraft'
  | 'listDrafts'
  | 'readDraft';

export interface KeepingParts {
  readonly dataFolder: string | null;
  readonly versions: Versions;
  readonly now: () => number;
  /** Refuses a path that the window may not read. */
  readonly mayRead: (path: string) => Promise<void>;
  /** A file named in a draft was the user's choice when the draft was made. */
  readonly pickedBefore: (path: string) => Promise<void>;
}

export function keepingHandlers(parts: KeepingParts): Pick<Handlers, Calls> {
  const { dataFolder, versions, now, mayRead, pickedBefore } = parts;
  const windows = openWindows(dataFolder, now);
  const drafts = draftFiles(dataFolder, now);

  return {
    async watchProject({ window, path: asked }) {
      const path = asked === null ? null : resolve(asked);
      if (path !== null) await mayRead(path);
      await windows.seen(window, path);
      if (path === null) return { sha256: null, others: 0 };
      const others = [...(await windows.open())].filter(
        ([other, theirs]) => other !== window && theirs === path,
      );
      const read = await readText(path, { expected: 'a project file', limitBytes: 32_000_000 });
      return { sha256: read.ok ? read.value.sha256 : null, others: others.length };
    },

    async listVersions({ path: asked }) {
      const path = resolve(asked);
      await mayRead(path);
      return [...(await versions.list(path))];
    },

    async readVersion({ path: asked, id }) {
      const path = resolve(asked);
      await mayRead(path);
      const text = await versions.read(path, id);
      if (text === null) throw new BridgeError('call', 'That version is no longer kept.');
      return { text };
    },

    async keepDraft({ id, ...draft }) {
      await drafts.keep(id, draft);
      return {};
    },

    async dropDraft({ id }) {
      await drafts.drop(id);
      return {};
    },

    async listDrafts({ window }) {
      const open = await windows.open();
      return (await drafts.all())
        .filter((draft) => draft.window === window || !open.has(draft.window))
        .map(({ id, path, name, changedAt }) => ({ id, path, name, changedAt }));
    },

    async readDraft({ id }) {
      const draft = (await drafts.all()).find((one) => one.id === id);
      if (!draft) return null;
      for (const path of [draft.path, draft.weatherPath])
        if (path !== null) await pickedBefore(path);
      const { path, name, weatherPath, replaces, text } = draft;
      return { path, name, weatherPath, replaces, text };
    },
  };
}
