// Gathers faults of one file: several together, repeats folded, the list kept short.
import type { Fault } from '../fault.ts';

/** Faults shown for one column and kind before the rest are only counted. */
const shownPerKind = 3;

export class FaultList {
  private readonly faults: Fault[] = [];
  private readonly kinds = new Map<string, { shown: number; more: number; lastRow: number }>();
  private left = 0;

  readonly file: string;
  private readonly most: number;

  constructor(file: string, most = 20) {
    this.file = file;
    this.most = most;
  }

  get isEmpty(): boolean {
    return this.faults.length === 0;
  }

  /** How many faults were found, those folded away included. */
  get count(): number {
    let folded = 0;
    for (const kind of this.kinds.values()) folded += kind.more;
    return this.faults.length + this.left + folded;
  }

  /** A cell that is wrong; `text` is what the file has there. */
  cell(row: number, column: string, text: string, expected: string, mend: string): void {
    this.row(row, column, quoted(text), expected, mend);
  }

  /** Something wrong at a row, in our words. */
  row(row: number, column: string, found: string, expected: string, mend: string): void {
    const key = `${column}\n${expected}`;
    const kind = this.kinds.get(key) ?? { shown: 0, more: 0, lastRow: row };
    this.kinds.set(key, kind);
    kind.lastRow = row;
    if (kind.shown === shownPerKind) {
      kind.more++;
      return;
    }
    kind.shown++;
    this.push({ file: this.file, place: { row, column }, found, expected, mend });
  }

  whole(found: string, expected: string, mend: string, path = ''): void {
    this.push({ file: this.file, place: { path }, found, expected, mend });
  }

  /** The faults, with a last one that counts what is not shown. */
  list(): readonly Fault[] {
    const all = [...this.faults];
    for (const [key, kind] of this.kinds) {
      if (kind.more === 0) continue;
      const [column, expected] = key.split('\n');
      all.push({
        file: this.file,
        place: { row: kind.lastRow, column },
        found: `${kind.more} more cells like those above, the last in this row`,
        expected,
        mend: 'Mend all of them alike, or leave the column out.',
      });
    }
    const rest = this.left + Math.max(0, all.length - this.most);
    if (rest === 0) return all;
    const few = all.slice(0, this.most);
    few.push({
      file: this.file,
      place: { path: '' },
      found: `${rest} more faults`,
      expected: 'none',
      mend: 'Mend those above first, then read the file again.',
    });
    return few;
  }

  private push(fault: Fault): void {
    if (this.faults.length < this.most) this.faults.push(fault);
    else this.left++;
  }
}

/** A cell's text for a message: quoted, cut to a readable length, control characters as dots. */
function quoted(text: string): string {
  const clean = Array.from(text.slice(0, 40), (c) => (c < ' ' ? '·' : c)).join('');
  return `"${clean}${text.length > 40 ? '…' : ''}"`;
}
