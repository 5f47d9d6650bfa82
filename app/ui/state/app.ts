// The acts of the window: what a command, a click or a dropped file sets going. Components read the
// store and call these; nothing else changes the store.

import { createStore, type StoreApi } from 'zustand/vanilla';
import type { Site } from '../../../weather/index.ts';
import { emptyProject, projectText } from '../../project/index.ts';
import type { Desk, DeskFiles, OpenedFile, OpenedProject, RecentProject } from '../desk/index.ts';
import { type AppState, firstState, type Screen } from './app-state.ts';
import {
  adoptDraft,
  type Documents,
  fileName,
  makeDocuments,
  openDocument,
  weatherFileOf,
} from './documents.ts';
import { makeRuns, type RunYear, unnamed } from './runs.ts';

export interface App extends Documents {
  /** Absent in a plain page. */
  readonly files: DeskFiles | undefined;
  readonly store: StoreApi<AppState>;
  set(change: Partial<AppState>): void;
  go(screen: Screen, roomId?: string): void;
  /** Shows a screen with one of its things chosen. */
  choose(screen: Screen, id: string): void;
  newProject(): void;
  openDemo(): Promise<void>;
  openDraft(id: string): Promise<void>;
  dropDraft(id: string): Promise<void>;
  /** Sets the findings against the document as it is now. */
  takeAsBase(): void;
  openProject(): Promise<void>;
  openRecent(project: RecentProject): Promise<void>;
  openWeather(): Promise<void>;
  take(files: { project: OpenedFile | null; weather: OpenedFile | null }): void;
  giveSite(site: Site): void;
  closeProject(): void;
  runYear(): Promise<void>;
  cancel(): void;
}

export function createApp(
  desk: Desk,
  runYear: RunYear,
  start: Partial<AppState> = {},
  now: () => number = Date.now,
): App {
  const store = createStore<AppState>(() => ({ ...firstState, ...start }));
  const { getState: get, setState: set } = store;
  const runs = makeRuns(store, runYear);
  const documents = makeDocuments(store, runs, desk.files, now);
  const { guard } = documents;

  function show(opened: OpenedProject, screen: Screen = 'house') {
    runs.forget();
    const document = openDocument(opened.text, opened);
    set({
      project: { file: opened.file, text: opened.text },
      document,
      base: document && {
        name: 'as opened',
        document: document.story.now.document,
        coarse: null,
        full: null,
      },
      answered: { coarse: null, full: null },
      others: 0,
      isChangedOnDisk: false,
      guarded: null,
      chosen: {},
      weather: opened.weather,
      site: null,
      simulation: null,
      isStale: false,
      mark: null,
      weeks: {},
      roomId: null,
      screen,
      run: { kind: 'idle' },
      notice: opened.trouble ?? null,
    });
    void runs.run();
  }

  const guarded = (opened: OpenedProject) => guard(`opening ${opened.file}`, () => show(opened));

  /** Opening can fail on the machine's side; the open document is kept. */
  async function ask<T>(question: () => Promise<T | null>, use: (answer: T) => void, none = '') {
    try {
      const answer = await question();
      if (answer) use(answer);
      else if (none) set({ notice: none });
    } catch (error) {
      set({ notice: `Not opened. ${error instanceof Error ? error.message : unnamed}` });
    }
  }

  function holdWeather(weather: OpenedFile) {
    const { project, simulation } = get();
    set({ weather, site: null, isStale: simulation !== null, mark: null });
    if (project) {
      if (!nameWeather(weather)) void runs.run();
    } else set({ notice: `${weather.file} is held ready. Open a project to use it.` });
  }

  /** The project names the table it is run with. */
  function nameWeather({ relativePath, file, sha256 }: OpenedFile): boolean {
    const before = get().document?.story;
    documents.edit({
      name: `Weather table ${file}`,
      changes: [
        { path: 'weather.file', value: relativePath ?? file },
        { path: 'weather.sha256', value: sha256 },
      ],
    });
    return get().document?.story !== before;
  }

  return {
    ...documents,
    files: desk.files,
    store,
    set,
    choose(screen, id) {
      set({ screen, isDrawerOpen: false, chosen: { ...get().chosen, [screen]: id } });
    },
    newProject() {
      guard('starting a new project', () => {
        const name = 'New house';
        const text = projectText(emptyProject(name));
        show({ file: fileName(name), text, weather: get().weather }, 'plan');
        const { document } = get();
        if (document) set({ document: { ...document, saved: null } });
      });
    },
    takeAsBase() {
      const { document, answered } = get();
      if (!document) return;
      set({
        base: { name: document.story.now.name, document: document.story.now.document, ...answered },
      });
    },
    async openDraft(id) {
      const draft = await desk.files?.openDraft(id).catch(() => null);
      if (!draft) return set({ notice: 'That draft is no longer there.' });
      show({ ...draft, ...(draft.replaces === null ? {} : { sha256: draft.replaces }) });
      const { document } = get();
      if (document) {
        adoptDraft(document, id);
        set({ document: { ...document, saved: null } });
      }
      set({
        drafts: get().drafts.filter((one) => one.id !== id),
        notice: 'Opened as it was before it was lost. Save it to keep it.',
      });
    },
    async dropDraft(id) {
      await desk.files?.dropDraft(id);
      set({ drafts: get().drafts.filter((draft) => draft.id !== id) });
    },
    go(screen, roomId) {
      set({
        screen,
        isDrawerOpen: false,
        notice: null,
        ...(roomId === undefined ? {} : { roomId }),
      });
    },
    openDemo: () =>
      ask(desk.demo, guarded, 'The example did not come with this copy. Open a project.'),
    openProject: () =>
      ask(desk.openProject, (opened) =>
        guarded({ ...opened, weather: opened.weather ?? get().weather }),
      ),
    openRecent: (project) => ask(() => desk.openRecent(project), guarded),
    openWeather: () => ask(desk.openWeather, holdWeather),
    take({ project, weather }) {
      if (project) guarded({ ...project, weather: weather ?? get().weather });
      else if (weather) holdWeather(weather);
    },
    giveSite(site) {
      set({ site, dialog: null, isStale: get().simulation !== null });
      const { document } = get();
      // The project keeps the site with the table it names, so that it is not asked for again.
      const isNamed = document && weatherFileOf(document.story.now.document) !== null;
      if (isNamed) {
        const value = { ...site };
        documents.edit({ name: 'Site of the table', changes: [{ path: 'weather.site', value }] });
      }
      if (!isNamed || get().document?.story === document.story) void runs.run();
    },
    closeProject() {
      guard('closing the project', () => {
        runs.forget();
        const { scheme, units, recent, drafts } = get();
        set({ ...firstState, scheme, units, recent, drafts });
      });
    },
    runYear: runs.run,
    cancel: runs.cancel,
  };
}
