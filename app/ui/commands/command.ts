// A command is one object; menu, shortcut, command field and button are drawn from it.

import type { App, AppState } from '../state/index.ts';

export type MenuName = 'File' | 'Edit' | 'View' | 'Run' | 'Help';

export interface Command {
  readonly id: string;
  readonly label: string;
  /** The label with what it acts on, where that changes: `Undo Brick 103 to 215 mm`. */
  readonly labelNow?: (state: AppState) => string;
  readonly menu: MenuName;
  /** As written beside the label, for example `Ctrl+O`; empty where there is none. */
  readonly keys: string;
  /** In a menu, a tick beside what is the case; absent where the command is an act. */
  readonly isOn?: (state: AppState) => boolean;
  readonly isEnabled: (state: AppState) => boolean;
  readonly run: (app: App) => void;
}

/** The parts of a key event that decide. */
export interface KeyPress {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
  readonly shiftKey: boolean;
}

/** Whether a key press is what `keys` says. On a Mac the command key stands for Ctrl. */
export function isPressed(keys: string, press: KeyPress): boolean {
  if (keys === '') return false;
  const parts = keys.split('+');
  const key = parts.at(-1) ?? '';
  const wants = (name: string) => parts.slice(0, -1).includes(name);
  if (wants('Ctrl') !== (press.ctrlKey || press.metaKey)) return false;
  if (wants('Alt') !== press.altKey) return false;
  // A sign such as `?` needs Shift on some keyboards and not on others.
  const isSign = key.length === 1 && !/[a-z0-9]/i.test(key);
  if (!isSign && wants('Shift') !== press.shiftKey) return false;
  return press.key.toLowerCase() === key.toLowerCase();
}

/** Keys without Ctrl or Alt belong to the field while something is typed. */
export function mayActWhileTyping(keys: string): boolean {
  return /^(Ctrl|Alt)\+|^F\d+$|^Escape$/.test(keys);
}
