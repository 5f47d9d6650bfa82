// Columns of a table that hold dates and times as text.
import { createDateReader } from './date-text.ts';
import type { DateOrder } from './mapping.ts';

const share = (cells: readonly string[], fits: (cell: string) => boolean) =>
  cells.length === 0 ? 0 : cells.filter(fits).length / cells.length;

/** Columns whose cells are dates, times or both, by trying to read them in every order. */
export function textColumns(rows: readonly (readonly string[])[], columnCount: number) {
  const dateTime: { at: number; order: DateOrder }[] = [];
  const date: { at: number; order: DateOrder }[] = [];
  const time: number[] = [];
  for (let at = 0; at < columnCount; at++) {
    const cells = rows
      .slice(0, 400)
      .map((row) => row[at] ?? '')
      .filter((cell) => cell !== '');
    if (cells.length < 2) continue;
    for (const order of ['ymd', 'dmy', 'mdy'] as const) {
      const readDate = createDateReader(order, 'date');
      const readBoth = createDateReader(order, 'dateTime');
      const isDate = share(cells, (cell) => readDate(cell, 0, cell.length) !== null);
      if (isDate > 0.95) date.push({ at, order });
      // A date and its midnight, all the way down, is a date: another column holds the time.
      if (share(cells, (cell) => readBoth(cell, 0, cell.length) !== null) > 0.95)
        dateTime.push({ at, order });
    }
    const readTime = createDateReader('ymd', 'time');
    if (
      share(cells, (cell) => /\d:\d/.test(cell) && readTime(cell, 0, cell.length) !== null) > 0.95
    )
      time.push(at);
  }
  return { dateTime, date, time };
}
