// Running the year: coarse first, so that an answer is there at once, then at the full step. A newer run
// takes the place of the one under way. The first answers of a document become its base.

import type { StoreApi } from 'zustand/vanilla';
import type { Fault, Site } from '../../../weather/index.ts';
import { projectText as textOf } from '../../project/index.ts';
import type { OpenedFile } from '../desk/index.ts';
import type { Simulation } from '../simulation.ts';
import type { AppState, Base } from './app-state.ts';

export interface RunInput {
  readonly projectText: string;
  readonly projectFile: string;
  readonly weather: OpenedFile;
  /** Stands in for the site where the table has none. */
  readonly site: Site | null;
  /** Left out: the engine's own. */
  readonly stepMinutes?: number;
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

export interface Runs {
  run(): Promise<void>;
  cancel(): void;
  /** Ends what runs without a word: its document is gone. */
  forget(): void;
}

export const unnamed = 'The machine gave no reason.';
const coarseMinutes = 60;
/** A full run as fast as this needs no coarse one before it [ms]. */
const atOnceMs = 150;

export function makeRuns(store: StoreApi<AppState>, runYear: RunYear): Runs {
  const { getState: get, setState: set } = store;
  let running: AbortController | null = null;
  /** How long the last full run took [ms]. */
  let lastFullMs = Infinity;

  function show(simulation: Simulation, step: 'coarse' | 'full') {
    const { roomId, screen, answered, base, document } = get();
    const { rooms } = simulation;
    const isKnown = rooms.some((room) => room.id === roomId);
    const now = document?.story.now.document;
    const isFirst = base !== null && base.coarse === null && base.full === null;
    const isBase = base !== null && now !== undefined && (isFirst || base.document === now);
    const filled: Base | null = isBase
      ? { ...base, document: now, [step]: base[step] ?? simulation }
      : base;
    set({
      simulation,
      answered: { ...answered, [step]: simulation },
      base: filled,
      isStale: false,
      notice: null,
      roomId: isKnown ? roomId : (rooms[0]?.id ?? null),
      screen: screen === 'welcome' ? 'house' : screen,
    });
  }

  async function run() {
    const { project, weather, site } = get();
    if (!project || !weather) return;
    running?.abort();
    const mine = new AbortController();
    running = mine;
    const isCurrent = () => running === mine;
    set({
      run: { kind: 'running', share: 0, stage: 'reading' },
      answered: { coarse: null, full: null },
    });
    const input = { projectText: project.text, projectFile: project.file, weather, site };
    const steps = lastFullMs < atOnceMs ? (['full'] as const) : (['coarse', 'full'] as const);
    try {
      for (const step of steps) {
        const outcome = await runYear(
          step === 'coarse' ? { ...input, stepMinutes: coarseMinutes } : input,
          {
            signal: mine.signal,
            onProgress: (share, stage) => {
              if (isCurrent()) set({ run: { kind: 'running', share, stage } });
            },
          },
        );
        if (!isCurrent()) return;
        if (!outcome.ok) return set({ run: { kind: 'refused', faults: outcome.faults } });
        const { timings } = outcome.simulation.findings;
        if (step === 'full') lastFullMs = timings.assembleMs + timings.runMs;
        show(outcome.simulation, step);
      }
      set({ run: { kind: 'idle' } });
      await completeBase(mine.signal);
    } catch (error) {
      if (!isCurrent()) return;
      if (mine.signal.aborted) return set({ run: { kind: 'cancelled' } });
      const reason = error instanceof Error ? error.message : unnamed;
      set({ run: { kind: 'broken', reason } });
    }
  }

  /** The base may have been edited away from before it was run at the full step: done when all is quiet. */
  async function completeBase(signal: AbortSignal) {
    const { base, project, weather, site } = get();
    if (!base || base.full || !project || !weather) return;
    const projectText = textOf(base.document);
    const input = { projectText, projectFile: project.file, weather, site };
    try {
      const outcome = await runYear(input, { signal, onProgress: () => {} });
      const held = get().base;
      if (outcome.ok && held?.document === base.document) {
        set({ base: { ...held, full: outcome.simulation } });
      }
    } catch {
      // stopped by an edit: the next quiet moment tries again
    }
  }

  return {
    run,
    cancel: () => running?.abort(),
    forget() {
      running?.abort();
      running = null;
    },
  };
}
