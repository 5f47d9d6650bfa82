import { type KeyboardEvent, useRef } from 'react';
import type { FigureKind } from '../findings/index.ts';
import type { FigureKey } from '../state/index.ts';

export interface FigureTabsProps {
  readonly kinds: readonly FigureKind[];
  readonly chosen: FigureKey;
  readonly onChoose: (key: FigureKey) => void;
}

/** Tabs for the finding shown; arrows move and choose at once. */
export function FigureTabs({ kinds, chosen, onChoose }: FigureTabsProps) {
  const list = useRef<HTMLDivElement>(null);

  function press(event: KeyboardEvent) {
    const at = kinds.findIndex((kind) => kind.key === chosen);
    const last = kinds.length - 1;
    const to = {
      ArrowRight: at === last ? 0 : at + 1,
      ArrowLeft: at === 0 ? last : at - 1,
      Home: 0,
      End: last,
    }[event.key];
    const next = to === undefined ? undefined : kinds[to];
    if (!next) return;
    event.preventDefault();
    onChoose(next.key);
    list.current?.querySelector<HTMLElement>(`#tab-${next.key}`)?.focus();
  }

  return (
    <div
      className="tabs"
      role="tablist"
      aria-label="Finding shown"
      ref={list}
      tabIndex={-1}
      onKeyDown={press}
    >
      {kinds.map((kind) => (
        <button
          key={kind.key}
          id={`tab-${kind.key}`}
          type="button"
          role="tab"
          aria-selected={kind.key === chosen}
          aria-controls="figure-panel"
          tabIndex={kind.key === chosen ? 0 : -1}
          onClick={() => onChoose(kind.key)}
        >
          {kind.label}
        </button>
      ))}
    </div>
  );
}
