// Aligned text: words to the left, numbers to the right, the unit under each head.

export interface Column<Row> {
  readonly head: string;
  readonly unit?: string;
  /** Digits after the point, for numbers. */
  readonly digits?: number;
  readonly of: (row: Row) => string | number;
}

/** A number as it stands in a table; never "-0". */
export function figure(value: number, digits: number): string {
  if (!Number.isFinite(value)) return '–';
  const text = value.toFixed(digits);
  return Number(text) === 0 ? (0).toFixed(digits) : text;
}

/** Width on a terminal: combining marks take none (wide scripts are not told apart). */
const width = (text: string) => [...text.normalize('NFC').replace(/\p{M}/gu, '')].length;
const fill = (text: string, to: number) => ' '.repeat(Math.max(0, to - width(text)));

export function table<Row>(columns: readonly Column<Row>[], rows: readonly Row[]): string {
  const parts = columns.map(({ head, unit = '', digits = 0, of }) => {
    const values = rows.map(of);
    const isNumber = values.length > 0 && values.every((value) => typeof value === 'number');
    const cells = values.map((value) =>
      typeof value === 'number' ? figure(value, digits) : value,
    );
    const to = Math.max(...[head, unit, ...cells].map(width));
    const lay = (text: string) => (isNumber ? fill(text, to) + text : text + fill(text, to));
    return { head: lay(head), unit: lay(unit), cells: cells.map(lay) };
  });
  const line = (texts: readonly string[]) => texts.join('  ').trimEnd();
  const heads = [line(parts.map((part) => part.head)), line(parts.map((part) => part.unit))];
  const body = rows.map((_, i) => line(parts.map((part) => part.cells[i] ?? '')));
  return [...heads.filter((text) => text !== ''), ...body].join('\n');
}

/** Text broken at words, every line after the first indented. */
export function wrap(text: string, columns = 96, indent = '  '): string {
  const lines: string[] = [];
  for (const word of text.split(/\s+/)) {
    const last = lines.at(-1);
    if (last === undefined || width(last) + 1 + width(word) > columns) {
      lines.push(lines.length === 0 ? word : indent + word);
    } else {
      lines[lines.length - 1] = `${last} ${word}`;
    }
  }
  return lines.join('\n');
}
