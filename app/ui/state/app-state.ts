// What the window shows and holds. Results are derived from project and weather and are never saved.

import type { Fault, Site } from '../../../weather/index.ts';
import type { OpenedFile, RecentProject } from '../desk/index.ts';
import type { Simulation } from '../simulation.ts';

export type Screen = 'welcome' | 'site' | 'house' | 'room';

export type Scheme = 'system' | 'light' | 'dark';

/** The finding that the rooms are ranked by. */
export type FigureKey = 'heating' | 'peak' | 'below' | 'above' | 'highest' | 'lowest';

export type RunState =
  | { readonly kind: 'idle' }
  /** `share` from 0 to 1. */
  | { readonly kind: 'running'; readonly share: number; readonly stage: string }
  | { readonly kind: 'cancelled' }
  | { readonly kind: 'refused'; readonly faults: readonly Fault[] }
  /** Our own mistake, or the machine's: in plain words. */
  | { readonly kind: 'broken'; readonly reason: string };

export type Dialog = 'commands' | 'shortcuts' | 'site' | null;

/** The hour under the pointer or, once pinned, the hour that stays. */
export interface HourMark {
  readonly hour: number;
  readonly isPinned: boolean;
}

export interface AppState {
  readonly project: OpenedFile | null;
  readonly weather: OpenedFile | null;
  /** Given by the user where the weather table names no site. */
  readonly site: Site | null;
  readonly simulation: Simulation | null;
  /** The simulation is from before the last change. */
  readonly isStale: boolean;
  readonly run: RunState;
  readonly recent: readonly RecentProject[];
  readonly screen: Screen;
  readonly roomId: string | null;
  readonly figure: FigureKey;
  readonly mark: HourMark | null;
  /** Index of the chosen week, by room; the worst one where nothing was chosen. */
  readonly weeks: Readonly<Record<string, number>>;
  readonly scheme: Scheme;
  readonly dialog: Dialog;
  readonly isDrawerOpen: boolean;
  /** One line to say after an action that changed nothing on the sheet. */
  readonly notice: string | null;
}

/** Whether the run was refused because nobody says where the table was measured. */
export function asksForSite({ run, site }: AppState): boolean {
  if (site) return true;
  if (run.kind !== 'refused') return false;
  return run.faults.some(({ place, expected, mend }) => {
    const where = 'path' in place ? place.path : place.column;
    return /\b(site|latitude|longitude|utc)/i.test(`${where} ${expected} ${mend}`);
  });
}

export const firstState: AppState = {
  project: null,
  weather: null,
  site: null,
  simulation: null,
  isStale: false,
  run: { kind: 'idle' },
  recent: [],
  screen: 'welcome',
  roomId: null,
  figure: 'heating',
  mark: null,
  weeks: {},
  scheme: 'system',
  dialog: null,
  isDrawerOpen: false,
  notice: null,
};
