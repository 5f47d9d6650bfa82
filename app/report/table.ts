// A table: words to the left, figures to the right, the unit in the head.

import { figure } from './figures.ts';
import { type Markup, markup } from './markup.ts';

export interface Column<Row> {
  readonly head: string;
  readonly unit?: string;
  readonly decimals?: number;
  readonly of: (row: Row) => string | number;
}

/** The first column names the row. The last `sums` rows are set off as sums. */
export function table<Row>(
  columns: readonly Column<Row>[],
  rows: readonly Row[],
  sums = 0,
): Markup {
  const isFigure = columns.map(({ of }) => rows.every((row) => typeof of(row) === 'number'));
  const heads = columns.map(
    ({ head, unit = '' }, c) =>
      markup`<th scope="col" class="${isFigure[c] ? 'number' : 'word'}">${head}${unit === '' ? '' : markup`<span>${unit}</span>`}</th>`,
  );
  const body = rows.map((row, r) => {
    const cells = columns.map(({ decimals = 0, of }, c) => {
      const value = of(row);
      const text = typeof value === 'number' ? figure(value, decimals) : value;
      return c === 0
        ? markup`<th scope="row">${text}</th>`
        : markup`<td class="${isFigure[c] ? 'number' : 'word'}">${text}</td>`;
    });
    return markup`<tr${r >= rows.length - sums ? markup` class="sum"` : ''}>${cells}</tr>\n`;
  });
  return markup`<table>\n<thead><tr>${heads}</tr></thead>\n<tbody>\n${body}</tbody>\n</table>\n`;
}
