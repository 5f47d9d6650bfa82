// The acts of the window: what a command, a click or a dropped file sets going. Components read the
// store and call these; nothing else changes the store.

import { createStore, type StoreApi } from 'zustand/vanilla';
import type { Fault, Site } from '../../../weather/index.ts';
import type { Desk, OpenedFile, OpenedProject, RecentProject } from '../desk/index.ts';
import type { Simulation } from '../simulation.ts';
import { type AppState, firstState, type Screen } from './app-state.ts';

export interface RunInput {
  readonly projectText: string;
  readonly projectFile: string;
  readonly weather: OpenedFile;
  /** Stands in for the site where the table has none. */
  readonly site: Site | null;
}

export interface Watch {
  readonly onProgress: (share: number, stage: string) => void;
  readonly signal: AbortSignal;
}

export type RunOutcome =
  | { readonly ok: true; readonly simulation: Simulation }
  | { readonly ok: false; readonly faults: readonly Fault[] };

/** Runs the year off the window's thread; rejects when the signal is aborted or something broke. */
export type RunYear = (input: RunInput, watch: Watch) => Promise<RunOutcome>;

export interface App {
  readonly store: StoreApi<AppState>;
  set(change: Partial<AppState>): void;
  go(screen: Screen, roomId?: string): void;
  openDemo(): Promise<void>;
  openProject(): Promise<void>;
  openRecent(project: RecentProject): Promise<void>;
  openWeather(): Promise<void>;
  take(files: { project: OpenedFile | null; weather: OpenedFile | null }): void;
  giveSite(site: Site): void;
  closeProject(): void;
  runYear(): Promise<void>;
  cancel(): void;
}

const unnamed = 'The machine gave no reason.';

export function createApp(desk: Desk, runYear: RunYear, start: Partial<AppState> = {}): App {
  const store = createStore<AppState>(() => ({ ...firstState, ...start }));
  const { getState: get, setState: set } = store;
  let running: AbortController | null = null;

  async function run() {
    const { project, weather, site } = get();
    if (!project || !weather) return;
    running?.abort();
    const mine = new AbortController();
    running = mine;
    set({ run: { kind: 'running', share: 0, stage: 'reading' } });
    const isCurrent = () => running === mine;
    try {
      const outcome = await runYear(
        { projectText: project.text, projectFile: project.file, weather, site },
        {
          signal: mine.signal,
          onProgress: (share, stage) => {
            if (isCurrent()) set({ run: { kind: 'running', share, stage } });
          },
        },
      );
      if (!isCurrent()) return;
      if (!outcome.ok) return set({ run: { kind: 'refused', faults: outcome.faults } });
      const rooms = outcome.simulation.rooms;
      const { roomId, screen } = get();
      const isKnown = rooms.some((room) => room.id === roomId);
      set({
        simulation: outcome.simulation,
        isStale: false,
        run: { kind: 'idle' },
        notice: null,
        roomId: isKnown ? roomId : (rooms[0]?.id ?? null),
        screen: screen === 'welcome' ? 'house' : screen,
      });
    } catch (error) {
      if (!isCurrent()) return;
      if (mine.signal.aborted) return set({ run: { kind: 'cancelled' } });
      const reason = error instanceof Error ? error.message : unnamed;
      set({ run: { kind: 'broken', reason } });
    }
  }

  function show(opened: OpenedProject) {
    set({
      project: { file: opened.file, text: opened.text },
      weather: opened.weather,
      site: null,
      simulation: null,
      isStale: false,
      mark: null,
      weeks: {},
      roomId: null,
      screen: 'house',
      run: { kind: 'idle' },
      notice: opened.trouble ?? null,
    });
    void run();
  }

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
    if (project) void run();
    else set({ notice: `${weather.file} is held ready. Open a project to use it.` });
  }

  return {
    store,
    set,
    go(screen, roomId) {
      set({
        screen,
        isDrawerOpen: false,
        notice: null,
        ...(roomId === undefined ? {} : { roomId }),
      });
    },
    openDemo: () =>
      ask(desk.demo, show, 'The example did not come with this copy. Open a project.'),
    openProject: () =>
      ask(desk.openProject, (opened) =>
        show({ ...opened, weather: opened.weather ?? get().weather }),
      ),
    openRecent: (project) => ask(() => desk.openRecent(project), show),
    openWeather: () => ask(desk.openWeather, holdWeather),
    take({ project, weather }) {
      if (project) show({ ...project, weather: weather ?? get().weather });
      else if (weather) holdWeather(weather);
    },
    giveSite(site) {
      set({ site, dialog: null, isStale: get().simulation !== null });
      void run();
    },
    closeProject() {
      running?.abort();
      running = null;
      const { scheme, recent } = get();
      set({ ...firstState, scheme, recent });
    },
    runYear: run,
    cancel: () => running?.abort(),
  };
}
