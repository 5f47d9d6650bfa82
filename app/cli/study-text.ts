// Pieces of text that several studies print.

import { type Figure, isDifference } from '../../engine/index.ts';
import { figure, wrap } from './table.ts';

/** "+298 ±18", "within ±18" where it is no more than the uncertainty, "+298" where that is not known. */
export function differenceText(one: Figure | undefined, digits: number): string {
  if (!one) return '–';
  const { difference, uncertainty } = one;
  const known = isDifference(one);
  const sure = uncertainty === null ? '' : ` ±${uncertaintyText(uncertainty, digits)}`;
  if (known === false) return `within${sure}`;
  return `${difference > 0 ? '+' : ''}${figure(difference, digits)}${sure}`;
}

/** An uncertainty with at least one digit that says something, up to two more than its figure has. */
export function uncertaintyText(value: number, digits: number): string {
  for (let more = digits; more < digits + 2; more++)
    if (value >= 0.5 * 10 ** -more) return figure(value, more);
  return figure(value, digits + 2);
}

export const orDash = (value: number | null, digits: number): string =>
  value === null ? '–' : figure(value, digits);

/** A titled list, or nothing where it is empty. */
export function listText(title: string, items: readonly string[]): readonly string[] {
  return items.length === 0 ? [] : [[title, ...items.map((item) => wrap(`- ${item}`))].join('\n')];
}
