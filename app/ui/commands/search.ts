// The command field's search: screens, rooms and commands by any of their words.

import type { AppState } from '../state/index.ts';
import type { Command } from './command.ts';
import { commands } from './commands.ts';

export interface Hit {
  readonly id: string;
  readonly kind: 'Do' | 'Screen' | 'Room';
  readonly label: string;
  readonly keys: string;
  readonly command: Command | null;
  readonly roomId: string | null;
}

export function allHits(state: AppState): Hit[] {
  const rooms = (state.simulation?.rooms ?? []).map(
    (room): Hit => ({
      id: `room-${room.id}`,
      kind: 'Room',
      label: room.name,
      keys: '',
      command: null,
      roomId: room.id,
    }),
  );
  const acts = commands
    .filter((command) => command.id !== 'find' && command.isEnabled(state))
    .map(
      (command): Hit => ({
        id: command.id,
        kind: command.id.startsWith('show-') ? 'Screen' : 'Do',
        label: command.labelNow?.(state) ?? command.label,
        keys: command.keys,
        command,
        roomId: null,
      }),
    );
  return [...rooms, ...acts];
}

/** Hits that hold every word typed; those that begin with the first word come first. */
export function findHits(hits: readonly Hit[], typed: string): Hit[] {
  const words = typed.toLowerCase().split(/\s+/).filter(Boolean);
  const matches = hits.filter((hit) => {
    const text = `${hit.kind} ${hit.label}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const first = words[0] ?? '';
  const begins = (hit: Hit) => (first && hit.label.toLowerCase().startsWith(first) ? 0 : 1);
  return matches.sort((a, b) => begins(a) - begins(b));
}
