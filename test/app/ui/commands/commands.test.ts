import { expect, test } from 'vitest';
import {
  allHits,
  commands,
  findHits,
  isPressed,
  mayActWhileTyping,
} from '../../../../app/ui/commands/index.ts';
import { firstState } from '../../../../app/ui/state/app-state.ts';
import { makeSimulation } from '../fixture.ts';

const press = (
  key: string,
  held: Partial<Record<'ctrl' | 'alt' | 'shift' | 'meta', true>> = {},
) => ({
  key,
  ctrlKey: held.ctrl ?? false,
  altKey: held.alt ?? false,
  shiftKey: held.shift ?? false,
  metaKey: held.meta ?? false,
});

test('a shortcut wants exactly its own keys', () => {
  expect(isPressed('Ctrl+K', press('k', { ctrl: true }))).toBe(true);
  expect(isPressed('Ctrl+K', press('k'))).toBe(false);
  expect(isPressed('Ctrl+K', press('K', { ctrl: true, shift: true }))).toBe(false);
  expect(isPressed('Alt+2', press('2', { alt: true }))).toBe(true);
  expect(isPressed('', press('a'))).toBe(false);
});

test('the command key of a Mac stands for Ctrl', () => {
  expect(isPressed('Ctrl+O', press('o', { meta: true }))).toBe(true);
});

test('a question mark works on keyboards that need Shift for it and on those that do not', () => {
  expect(isPressed('?', press('?', { shift: true }))).toBe(true);
  expect(isPressed('?', press('?'))).toBe(true);
});

test('plain signs belong to the field that is typed in', () => {
  expect(mayActWhileTyping('?')).toBe(false);
  expect(mayActWhileTyping('Ctrl+K')).toBe(true);
  expect(mayActWhileTyping('F9')).toBe(true);
});

test('no two commands share an id or a shortcut', () => {
  const keys = commands.map((command) => command.keys).filter(Boolean);
  expect(new Set(keys).size).toBe(keys.length);
  expect(new Set(commands.map((command) => command.id)).size).toBe(commands.length);
});

test('without a project nothing can be run, closed or shown', () => {
  const enabled = commands.filter((command) => command.isEnabled(firstState)).map(({ id }) => id);
  for (const id of ['run-year', 'close-project', 'show-house', 'show-room', 'cancel-run']) {
    expect(enabled).not.toContain(id);
  }
  expect(enabled).toContain('open-project');
});

const open = {
  ...firstState,
  project: { file: 'house.inglenook.json', text: '' },
  simulation: makeSimulation(240),
};

test('a room is found by any of its words, in any order', () => {
  const hits = findHits(allHits(open), 'roof study');
  expect(hits.map((hit) => hit.label)).toEqual(['Study under the roof']);
});

test('what begins with the typed word comes before what merely holds it', () => {
  const labels = findHits(allHits(open), 's').map((hit) => hit.label);
  expect(labels[0]?.startsWith('S')).toBe(true);
  const firstOther = labels.findIndex((label) => !label.toLowerCase().startsWith('s'));
  expect(labels.slice(firstOther).some((label) => label.toLowerCase().startsWith('s'))).toBe(false);
});

test('commands that cannot act now are not offered', () => {
  expect(allHits(firstState).map((hit) => hit.id)).not.toContain('run-year');
});
