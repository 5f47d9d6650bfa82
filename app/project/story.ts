// The open document and how it came to be: every edit is a named step of the history. An edit is a list
// of changes at paths, as options of a project have them, so that what was done in the window can be
// written down as an option too.

import { type Change, changeAt, type Json } from '../../engine/index.ts';
import { begin, edit, type History } from './history.ts';

/** The document after a step. */
export interface Revision {
  readonly document: Json;
  /** What was done, as the list of steps shows it: `Brick 103 to 215 mm`. */
  readonly name: string;
  /** Steps of one gesture (a handle that is still moving) are one step of the history. */
  readonly gesture: string | null;
}

export type Story = History<Revision>;

export interface Edit {
  readonly name: string;
  readonly changes: readonly Change[];
  readonly gesture?: string;
}

export type Edited =
  | { readonly ok: true; readonly story: Story }
  /** Our own mistake: the path does not fit the document. */
  | { readonly ok: false; readonly why: string };

export function beginStory(document: Json): Story {
  return begin({ document, name: 'Opened', gesture: null });
}

/** Takes an edit in; the same gesture as the last step is merged into it. */
export function tell(story: Story, { name, changes, gesture = '' }: Edit): Edited {
  let document = story.now.document;
  for (const change of changes) {
    const changed = changeMakingParents(document, change);
    if (typeof changed === 'string') return { ok: false, why: changed };
    document = changed.document;
  }
  if (document === story.now.document) return { ok: true, story };
  const next: Revision = { document, name, gesture: gesture === '' ? null : gesture };
  const isSame = next.gesture !== null && next.gesture === story.now.gesture;
  return { ok: true, story: edit(story, next, isSame && story.past.length > 0 ? 'merge' : 'step') };
}

/** The gesture is over: the next edit is a step of its own. */
export function endGesture(story: Story): Story {
  return story.now.gesture === null ? story : { ...story, now: { ...story.now, gesture: null } };
}

const deepest = 8;

/** A field whose parent was left out (its default holds) needs the parent first. */
function changeMakingParents(
  start: Json,
  { path, value }: Change,
): { readonly document: Json } | string {
  let document = start;
  for (let i = 0; i < deepest; i++) {
    const changed = changeAt(document, path, value);
    if (changed.ok) return changed.before === value ? { document } : changed;
    if (value === undefined && changed.found === 'nothing') return { document }; // gone already
    // A list where the path goes on with an entry, else an object.
    const empty: Json = path.startsWith(`${changed.at}[`) ? [] : {};
    const made = changed.found === 'nothing' && changeAt(document, changed.at, empty);
    if (made === false || !made.ok)
      return `${path}: ${changed.at} holds ${changed.found}, not ${changed.expected}`;
    document = made.document;
  }
  return `${path} lies too deep`;
}
