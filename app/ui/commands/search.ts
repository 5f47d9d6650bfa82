// The command field's search: screens, rooms and commands by any of their words.

import { type AppState, readProject, type Screen } from '../state/index.ts';
import type { Command } from './command.ts';
import { commands } from './commands.ts';

export interface Hit {
  readonly id: string;
  readonly kind: 'Do' | 'Screen' | 'Room' | 'Fabric' | 'Use' | 'Surfaces';
  readonly label: string;
  readonly keys: string;
  readonly command: Command | null;
  readonly roomId: string | null;
  /** A thing of the building and the screen that edits it. */
  readonly place?: { readonly screen: Screen; readonly id: string };
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
  return [...rooms, ...places(state), ...acts];
}

/** Constructions, glazings, schedules and the tables of rooms. */
function places({ document, project }: AppState): Hit[] {
  if (!document || !project) return [];
  const { building } = readProject(document.story.now.document, project.file);
  if (!building) return [];
  const hit = (kind: Hit['kind'], screen: Screen, id: string, label: string): Hit => ({
    id: `${screen} ${id}`,
    kind,
    label,
    keys: '',
    command: null,
    roomId: null,
    place: { screen, id },
  });
  return [
    ...building.constructions.map(({ id, name }) =>
      hit('Fabric', 'fabric', `construction:${id}`, name),
    ),
    ...building.glazings.map(({ id, name }) => hit('Fabric', 'fabric', `glazing:${id}`, name)),
    ...building.schedules.map(({ id, name }) => hit('Use', 'use', id, name ?? id)),
    ...building.rooms.map(({ id, name }) => hit('Surfaces', 'rooms', id, `Surfaces of ${name}`)),
  ];
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
