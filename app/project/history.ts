// The open document and its undo: a list of whole documents. They are immutable and share what did not
// change, so that a step costs no more than the edit.

export interface History<Doc> {
  readonly past: readonly Doc[];
  readonly now: Doc;
  readonly future: readonly Doc[];
}

/** Steps that are kept; older ones can no longer be undone. */
const most = 500;

export const begin = <Doc>(doc: Doc): History<Doc> => ({ past: [], now: doc, future: [] });

/** Takes an edit in. `merge` folds it into the last step, for a slider that is still moving. */
export function edit<Doc>(
  history: History<Doc>,
  next: Doc,
  how: 'step' | 'merge' = 'step',
): History<Doc> {
  if (next === history.now) return history; // nothing changed: no empty undo step
  const past = how === 'merge' ? history.past : [...history.past, history.now].slice(-most);
  return { past, now: next, future: [] };
}

export function undo<Doc>(history: History<Doc>): History<Doc> {
  const { past, now, future } = history;
  if (past.length === 0) return history;
  return { past: past.slice(0, -1), now: past[past.length - 1], future: [now, ...future] };
}

export function redo<Doc>(history: History<Doc>): History<Doc> {
  const { past, now, future } = history;
  if (future.length === 0) return history;
  return { past: [...past, now], now: future[0], future: future.slice(1) };
}
