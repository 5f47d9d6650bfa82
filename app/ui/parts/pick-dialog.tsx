// Picks one of a long list: type a few letters, arrows choose, Enter takes.

import { type KeyboardEvent, useId, useState } from 'react';
import { SheetDialog } from './sheet-dialog.tsx';

export interface Pick {
  readonly id: string;
  readonly name: string;
  readonly kind: string;
  readonly aside: string;
}

export interface PickDialogProps {
  readonly label: string;
  readonly picks: readonly Pick[];
  readonly onPick: (id: string) => void;
  readonly onClose: () => void;
}

const shownAtMost = 200;

export function PickDialog({ label, picks, onPick, onClose }: PickDialogProps) {
  const id = useId();
  const [typed, setTyped] = useState('');
  const [chosen, setChosen] = useState(0);
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  const found = picks.filter(({ name, kind }) =>
    words.every((word) => `${name} ${kind}`.toLowerCase().includes(word)),
  );
  const shown = found.slice(0, shownAtMost);
  const at = Math.min(chosen, shown.length - 1);

  function take(pick: Pick | undefined) {
    if (!pick) return;
    onClose();
    onPick(pick.id);
  }

  function press(event: KeyboardEvent) {
    const step = { ArrowDown: 1, ArrowUp: -1, PageDown: 10, PageUp: -10 }[event.key];
    if (step !== undefined) {
      event.preventDefault();
      const next = Math.max(0, Math.min(shown.length - 1, at + step));
      setChosen(next);
      document.getElementById(`${id}-${next}`)?.scrollIntoView({ block: 'nearest' });
    }
    if (event.key === 'Enter') {
      event.preventDefault();
      take(shown[at]);
    }
  }

  return (
    <SheetDialog label={label} className="command-field pick" onClose={onClose}>
      <div className="command-input">
        <input
          role="combobox"
          aria-label={label}
          aria-expanded="true"
          aria-controls={`${id}-list`}
          aria-activedescendant={at >= 0 ? `${id}-${at}` : undefined}
          autoComplete="off"
          value={typed}
          onChange={(event) => {
            setTyped(event.target.value);
            setChosen(0);
          }}
          onKeyDown={press}
        />
        <kbd>Esc</kbd>
      </div>
      <div role="listbox" id={`${id}-list`} className="pick-list" aria-label={label} tabIndex={-1}>
        {shown.map((pick, i) => (
          // biome-ignore lint/a11y/useKeyWithClickEvents: the field above holds the focus and takes the keys
          // biome-ignore lint/a11y/useFocusableInteractive: the same
          <div
            key={pick.id}
            id={`${id}-${i}`}
            role="option"
            aria-selected={i === at}
            onPointerMove={() => setChosen(i)}
            onClick={() => take(pick)}
          >
            <i>{pick.kind}</i>
            <span>{pick.name}</span>
            <kbd>{pick.aside}</kbd>
          </div>
        ))}
      </div>
      <p className="note" role="status">
        {shown.length === 0
          ? 'Nothing is called that.'
          : `${label}: ${found.length} of ${picks.length}`}
      </p>
    </SheetDialog>
  );
}
