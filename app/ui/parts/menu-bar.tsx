// Menus drawn from the commands. Left and right move between menus, up and down within one.

import { type KeyboardEvent, useEffect, useRef, useState } from 'react';
import { commands, type MenuName } from '../commands/index.ts';
import { useApp, useAppState } from '../state/index.ts';

const menus: readonly MenuName[] = ['File', 'Edit', 'View', 'Run', 'Help'];

export function MenuBar() {
  const [open, setOpen] = useState<MenuName | null>(null);
  const bar = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (!open) return;
    const leave = (event: PointerEvent) => {
      if (!bar.current?.contains(event.target as Node)) setOpen(null);
    };
    document.addEventListener('pointerdown', leave);
    return () => document.removeEventListener('pointerdown', leave);
  }, [open]);

  function focusHead(name: MenuName) {
    bar.current?.querySelector<HTMLElement>(`[data-menu="${name}"]`)?.focus();
  }

  function press(event: KeyboardEvent) {
    const heads = menus;
    const head = (event.target as HTMLElement).closest<HTMLElement>('[data-menu]')?.dataset.menu;
    const at = heads.findIndex((name) => name === (open ?? head));
    if (event.key === 'Escape' && open) {
      event.stopPropagation();
      setOpen(null);
      focusHead(open);
    } else if (event.key === 'ArrowLeft' || event.key === 'ArrowRight') {
      const step = event.key === 'ArrowLeft' ? -1 : 1;
      const next = heads[(at + step + heads.length) % heads.length];
      if (!next) return;
      event.preventDefault();
      focusHead(next);
      if (open) setOpen(next);
    } else if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      if (!open && head) setOpen(head as MenuName);
      else moveInMenu(event.key === 'ArrowDown' ? 1 : -1);
    }
  }

  function moveInMenu(step: number) {
    const items = [
      ...(bar.current?.querySelectorAll<HTMLButtonElement>('.menu-list button:not(:disabled)') ??
        []),
    ];
    const at = items.indexOf(document.activeElement as HTMLButtonElement);
    items[(at + step + items.length) % items.length]?.focus();
  }

  return (
    <div
      className="menus"
      role="menubar"
      aria-label="Menus"
      ref={bar}
      onKeyDown={press}
      tabIndex={-1}
    >
      {menus.map((name, i) => (
        <div key={name} className="menu" role="none">
          <button
            type="button"
            role="menuitem"
            className="menu-head"
            data-menu={name}
            tabIndex={i === 0 || open === name ? 0 : -1}
            aria-haspopup="menu"
            aria-expanded={open === name}
            onClick={() => setOpen(open === name ? null : name)}
            onPointerEnter={() => open && setOpen(name)}
          >
            {name}
          </button>
          {open === name && (
            <MenuList
              name={name}
              onDone={() => {
                setOpen(null);
                focusHead(name);
              }}
              onLeave={() => setOpen(null)}
            />
          )}
        </div>
      ))}
    </div>
  );
}

interface MenuListProps {
  readonly name: MenuName;
  readonly onDone: () => void;
  readonly onLeave: () => void;
}

function MenuList({ name, onDone, onLeave }: MenuListProps) {
  const app = useApp();
  const state = useAppState((all) => all);
  const list = useRef<HTMLDivElement>(null);

  useEffect(() => {
    list.current?.querySelector<HTMLButtonElement>('button:not(:disabled)')?.focus();
  }, []);

  return (
    <div
      className="menu-list"
      role="menu"
      aria-label={name}
      ref={list}
      tabIndex={-1}
      onBlur={(event) => {
        const next = event.relatedTarget;
        if (next && !event.currentTarget.contains(next as Node)) onLeave();
      }}
    >
      {commands
        .filter((command) => command.menu === name)
        .map((command) => {
          const isOn = command.isOn?.(state);
          return (
            <button
              key={command.id}
              type="button"
              {...(isOn === undefined
                ? { role: 'menuitem' }
                : { role: 'menuitemcheckbox', 'aria-checked': isOn })}
              tabIndex={-1}
              disabled={!command.isEnabled(state)}
              onClick={() => {
                onDone();
                command.run(app);
              }}
            >
              <span className="tick" aria-hidden="true">
                {isOn && <Tick />}
              </span>
              <span>{command.labelNow?.(state) ?? command.label}</span>
              {command.keys && <kbd>{command.keys}</kbd>}
            </button>
          );
        })}
    </div>
  );
}

function Tick() {
  return (
    <svg width="12" height="12" aria-hidden="true">
      <path d="M1.5 6.5L4.5 9.5L10.5 2.5" fill="none" stroke="currentColor" strokeWidth="1.5" />
    </svg>
  );
}
