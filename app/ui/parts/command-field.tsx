// The command field: type a few letters of a screen, a room or a command; arrows choose, Enter does.

import { type KeyboardEvent, useId, useState } from 'react';
import { allHits, findHits, type Hit } from '../commands/index.ts';
import { useApp, useAppState } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

const shownAtMost = 12;

/** The label with what was typed in bold. */
function Marked({ text, typed }: { text: string; typed: string }) {
  const word = typed.trim().toLowerCase().split(/\s+/)[0] ?? '';
  const at = word ? text.toLowerCase().indexOf(word) : -1;
  if (at < 0) return text;
  return (
    <>
      {text.slice(0, at)}
      <b className="typed">{text.slice(at, at + word.length)}</b>
      {text.slice(at + word.length)}
    </>
  );
}

export function CommandField() {
  const app = useApp();
  const state = useAppState((all) => all);
  const id = useId();
  const [typed, setTyped] = useState('');
  const [chosen, setChosen] = useState(0);
  const all = allHits(state);
  const hits = findHits(all, typed);
  const shown = hits.slice(0, shownAtMost);
  const at = Math.min(chosen, shown.length - 1);
  const close = () => app.set({ dialog: null });

  function act(hit: Hit | undefined) {
    if (!hit) return;
    close();
    if (hit.roomId !== null) app.go('room', hit.roomId);
    if (hit.place) app.choose(hit.place.screen, hit.place.id);
    hit.command?.run(app);
  }

  function press(event: KeyboardEvent) {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined) {
      event.preventDefault();
      setChosen((at + step + shown.length) % Math.max(1, shown.length));
    }
    if (event.key === 'Enter') {
      event.preventDefault();
      act(shown[at]);
    }
  }

  return (
    <SheetDialog label="Find or do" className="command-field" onClose={close}>
      <div className="command-input">
        <input
          role="combobox"
          aria-label="Find or do"
          aria-expanded="true"
          aria-controls={`${id}-list`}
          aria-activedescendant={at >= 0 ? `${id}-${at}` : undefined}
          autoComplete="off"
          spellCheck={false}
          value={typed}
          onChange={(event) => {
            setTyped(event.target.value);
            setChosen(0);
          }}
          onKeyDown={press}
        />
        <kbd>Esc</kbd>
      </div>
      <div role="listbox" id={`${id}-list`} aria-label="Found">
        {shown.map((hit, i) => (
          // biome-ignore lint/a11y/useKeyWithClickEvents: the field above holds the focus and takes the keys
          // biome-ignore lint/a11y/useFocusableInteractive: the same
          <div
            key={hit.id}
            id={`${id}-${i}`}
            role="option"
            aria-selected={i === at}
            onPointerMove={() => setChosen(i)}
            onClick={() => act(hit)}
          >
            <i>{hit.kind}</i>
            <span>
              <Marked text={hit.label} typed={typed} />
            </span>
            <kbd>{hit.keys}</kbd>
          </div>
        ))}
      </div>
      <p className="note" role="status">
        {shown.length === 0
          ? 'Nothing is called that. Try a room, a screen or a verb.'
          : `${shown.length} of ${all.length}`}
      </p>
    </SheetDialog>
  );
}
