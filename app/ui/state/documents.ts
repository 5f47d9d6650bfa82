// The acts on the open document: edits with undo, saving, drafts, and the guard over unsaved work.

import type { StoreApi } from 'zustand/vanilla';
import type { Json } from '../../../engine/index.ts';
import {
  beginStory,
  type Edit,
  edit,
  endGesture,
  projectText,
  readDocument,
  redo,
  type Story,
  tell,
  undo,
} from '../../project/index.ts';
import type { DeskFiles } from '../desk/index.ts';
import { type AppState, isDirty, type OpenDocument } from './app-state.ts';
import type { Runs } from './runs.ts';

export interface Documents {
  /** Makes a named step and runs the year again. */
  edit(edit: Edit): void;
  /** A handle was let go: the next edit is a step of its own. */
  endGesture(): void;
  undo(): void;
  redo(): void;
  /** Goes back, or forward, until so many steps lie behind. */
  goToStep(past: number): void;
  /** Puts a whole document in place of the present one, as a step. */
  goBackTo(document: Json, name: string): void;
  /** False when it was not saved: the user left the dialog, or the file changed. */
  save(): Promise<boolean>;
  saveTo(path: string | null, name: string, replaces?: 'anything'): Promise<boolean>;
  /** Does it at once, or asks about unsaved work first. */
  guard(words: string, go: () => void): void;
  /** The text of the present document. */
  text(): string;
}

const draftAfterMs = 1000;

export function openDocument(
  text: string,
  file: { readonly path?: string | undefined; readonly sha256?: string | undefined },
): OpenDocument | null {
  const document = readDocument(text);
  if (document === null) return null;
  return {
    story: beginStory(document),
    saved: document,
    path: file.path ?? null,
    sha256: file.sha256 ?? null,
    savedAt: null,
  };
}

export function makeDocuments(
  store: StoreApi<AppState>,
  runs: Runs,
  files: DeskFiles | undefined,
  now: () => number,
): Documents {
  const { getState: get, setState: set } = store;
  let draftTimer: ReturnType<typeof setTimeout> | undefined;

  /** Puts a story in place of the present one; what changed is run and drafted. */
  function take(story: Story) {
    const { document, project } = get();
    if (!document || !project || story === document.story) return;
    const isSame = story.now.document === document.story.now.document;
    set({
      document: { ...document, story },
      ...(isSame
        ? {}
        : {
            project: { ...project, text: projectText(story.now.document) },
            isStale: get().simulation !== null,
          }),
    });
    if (isSame) return;
    void runs.run();
    clearTimeout(draftTimer);
    draftTimer = setTimeout(() => void keepDraft(), draftAfterMs);
  }

  async function keepDraft() {
    const { document, project, weather } = get();
    if (!files || !document || !project) return;
    try {
      if (!isDirty(get())) return await files.dropDraft(draftId(document));
      await files.keepDraft({
        id: draftId(document),
        path: document.path,
        name: project.file,
        weatherPath: weather?.path ?? null,
        replaces: document.sha256,
        text: project.text,
      });
    } catch (error) {
      set({
        notice: `Not kept aside: ${error instanceof Error ? error.message : 'no reason given'}`,
      });
    }
  }

  async function saveTo(path: string | null, name: string, force?: 'anything'): Promise<boolean> {
    const { document, project, weather } = get();
    if (!document || !project) return false;
    if (!files) {
      download(name, project.text);
      set({ document: { ...document, saved: document.story.now.document, savedAt: now() } });
      return true;
    }
    try {
      const isOwn = path !== null && path === document.path;
      const answer = await files.save({
        path,
        name,
        text: project.text,
        replaces: force ?? (isOwn ? document.sha256 : null),
      });
      if (answer.kind === 'left') return false;
      if (answer.kind === 'changed') {
        set({ isChangedOnDisk: true, notice: `Not saved. ${answer.message}` });
        return false;
      }
      const held = get().document;
      if (!held || draftId(held) !== draftId(document)) return true; // another one is open by now
      const isMoved = answer.path !== document.path;
      set({
        document: {
          ...held,
          saved: document.story.now.document,
          path: answer.path,
          sha256: answer.sha256,
          savedAt: now(),
        },
        project: { ...project, text: get().project?.text ?? project.text, file: answer.name },
        isChangedOnDisk: false,
        notice: `Saved as ${answer.name}.`,
      });
      await files.dropDraft(draftId(document));
      if (isMoved && weather?.path) await nameWeather(weather.path, answer.path);
      return true;
    } catch (error) {
      set({
        notice: `Not saved. ${error instanceof Error ? error.message : 'No reason was given.'}`,
      });
      return false;
    }
  }

  /** A project that moved names its weather table anew, and is saved with it. */
  async function nameWeather(weatherPath: string, projectPath: string) {
    const relative = await files?.weatherPathFrom(weatherPath, projectPath);
    const { document } = get();
    if (!relative || !document || weatherFileOf(document.story.now.document) === relative) return;
    const told = tell(document.story, {
      name: 'Weather table named from the new place',
      changes: [{ path: 'weather.file', value: relative }],
    });
    if (!told.ok) return;
    take(told.story);
    await save();
  }

  async function save(): Promise<boolean> {
    const { document, project } = get();
    if (!document || !project) return false;
    if (document.path !== null) return saveTo(document.path, project.file);
    if (!files || files.hasDialogs) return saveTo(null, fileName(project.file));
    set({ dialog: 'save-as' });
    return false;
  }

  const step = (move: (story: Story) => Story) => {
    const { document } = get();
    if (document) take(move(endGesture(document.story)));
  };

  return {
    edit(change) {
      const { document } = get();
      if (!document) return;
      const told = tell(document.story, change);
      if (told.ok) take(told.story);
      else set({ notice: `Not changed: ${told.why}.` });
    },
    endGesture: () => step((story) => story),
    undo: () => step(undo),
    redo: () => step(redo),
    goToStep(past) {
      step((story) => {
        let at = story;
        while (at.past.length > past) at = undo(at);
        while (at.past.length < past && at.future.length > 0) at = redo(at);
        return at;
      });
    },
    goBackTo(before, name) {
      step((story) => edit(story, { document: before, name, gesture: null }));
    },
    save,
    saveTo,
    guard(words, go) {
      if (isDirty(get())) set({ guarded: { words, go } });
      else go();
    },
    text: () => get().project?.text ?? '',
  };
}

/** One draft a document: named after where it begins, so that a reload finds its own. */
const draftIds = new WeakMap<object, string>();

function firstOf({ story }: OpenDocument): object {
  const first = (story.past[0] ?? story.now).document;
  return typeof first === 'object' && first !== null ? first : story;
}

/** The document was opened from this draft, and takes its place. */
export function adoptDraft(document: OpenDocument, id: string): void {
  draftIds.set(firstOf(document), id);
}

function draftId(document: OpenDocument): string {
  const key = firstOf(document);
  const known = draftIds.get(key);
  if (known) return known;
  const fresh = crypto.randomUUID();
  draftIds.set(key, fresh);
  return fresh;
}

export function weatherFileOf(document: Json): string | null {
  if (typeof document !== 'object' || document === null || !('weather' in document)) return null;
  const { weather } = document as { readonly weather?: Json };
  if (typeof weather !== 'object' || weather === null || !('file' in weather)) return null;
  const { file } = weather as { readonly file?: Json };
  return typeof file === 'string' ? file : null;
}

const ending = '.inglenook.json';
/** A file's name with the right ending. */
export function fileName(name: string): string {
  return name.endsWith(ending) ? name : `${name.replace(/\.json$/i, '')}${ending}`;
}

/** A plain page can only hand the text over. */
function download(name: string, text: string) {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  link.download = fileName(name);
  link.click();
  URL.revokeObjectURL(link.href);
}
