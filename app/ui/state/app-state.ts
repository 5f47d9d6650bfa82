// What the window shows and holds. Results are derived from project and weather and are never saved.

import type { Json } from '../../../engine/index.ts';
import type { Fault, Site } from '../../../weather/index.ts';
import type { Story } from '../../project/index.ts';
import type { DraftNote, OpenedFile, RecentProject } from '../desk/index.ts';
import type { UnitSystem } from '../format/index.ts';
import type { Simulation } from '../simulation.ts';

export type Screen =
  | 'welcome'
  | 'site'
  | 'plan'
  | 'rooms'
  | 'fabric'
  | 'use'
  | 'plant'
  | 'methods'
  | 'house'
  | 'room';

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

export type Dialog =
  | 'commands'
  | 'shortcuts'
  | 'site'
  | 'steps'
  | 'save-as'
  | 'versions'
  | 'about'
  | null;

/** The document that is edited, and what its file holds. */
export interface OpenDocument {
  readonly story: Story;
  /** The document as it was last opened or saved; null for work that no file holds. */
  readonly saved: Json | null;
  /** Where it is saved to; null until the user has named a place. */
  readonly path: string | null;
  /** SHA-256 of the file as it was last read or written here. */
  readonly sha256: string | null;
  readonly savedAt: number | null;
}

/** One cut of the year: how coarse the steps were, and what came out. */
export interface Answered {
  /** At hour steps, which come first. */
  readonly coarse: Simulation | null;
  /** At quarter-hour steps. */
  readonly full: Simulation | null;
}

/** What the findings are set against. */
export interface Base extends Answered {
  readonly name: string;
  readonly document: Json;
}

/** What the user wants to do while there is unsaved work. */
export interface Guarded {
  readonly words: string;
  readonly go: () => void;
}

/** The hour under the pointer or, once pinned, the hour that stays. */
export interface HourMark {
  readonly hour: number;
  readonly isPinned: boolean;
}

export interface AppState {
  /** Name and present text; the text follows every edit. */
  readonly project: OpenedFile | null;
  /** Null where nothing is open, or where the file is no JSON. */
  readonly document: OpenDocument | null;
  readonly base: Base | null;
  /** The present document's answers, as far as they have come. */
  readonly answered: Answered;
  /** Other windows with the same file open. */
  readonly others: number;
  /** Another program has written the file since. */
  readonly isChangedOnDisk: boolean;
  readonly drafts: readonly DraftNote[];
  readonly guarded: Guarded | null;
  /** Which construction, room, profile … is shown on a screen. */
  readonly chosen: Readonly<Partial<Record<Screen, string>>>;
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
  /** Of display; the document is in SI. */
  readonly units: UnitSystem;
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

/** Whether there is work that no file holds. */
export function isDirty({ document }: Pick<AppState, 'document'>): boolean {
  return document !== null && document.story.now.document !== document.saved;
}

export const firstState: AppState = {
  project: null,
  document: null,
  base: null,
  answered: { coarse: null, full: null },
  others: 0,
  isChangedOnDisk: false,
  drafts: [],
  guarded: null,
  chosen: {},
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
  units: 'SI',
  dialog: null,
  isDrawerOpen: false,
  notice: null,
};
