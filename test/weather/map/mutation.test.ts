// 5,000 damaged tables: whatever is done to one, reading comes back soon, with faults or with rows, and
// every value is the one that stands in its row under its heading. Reference: a plain split of the
// damaged text by the test itself.
import { expect, test } from 'vitest';
import {
  detectTable,
  faultText,
  inspectTable,
  type MappedTable,
  type Mapping,
  readMapped,
  unitsOf,
} from '../../../weather/index.ts';
import { dialects, hillside } from './tables.ts';

// The same damage every time; other damage, or more of it, by `MUTATION_SEED=7 MUTATION_MORE=4`.
const runs = 5000 * Number(process.env.MUTATION_MORE ?? 1);
let state = Number(process.env.MUTATION_SEED ?? 11) >>> 0;

/** Mulberry32: a small generator with a fixed course. */
function random(): number {
  state = (state + 0x6d2b79f5) >>> 0;
  let t = state;
  t = Math.imul(t ^ (t >>> 15), t | 1);
  t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
  return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
}
const below = (n: number) => Math.floor(random() * n);
const pick = <T>(all: readonly T[]): T => all[below(all.length)];

const bases = dialects.slice(0, 20).flatMap((dialect) => {
  const lines = dialect.write(96).split(/\r\n|\r|\n/);
  if (lines.at(-1) === '') lines.pop();
  const found = detectTable(lines.join('\n'), { site: hillside });
  if (found.kind !== 'proposed' || found.mapping.table.delimiter === ' ') return [];
  return [{ lines, mapping: found.mapping }];
});

const junk = [
  '',
  ' ',
  'NaN',
  '-9999',
  '=1+1',
  '"',
  '1e400',
  '1.2.3',
  '1,2,3',
  'x',
  '--',
  '0x1F',
  '١٢',
  '\0',
  '999999999999',
  '-0',
  '1e',
  '+',
  '24:00',
  '31.02.2023 10:00',
  '2023-13-45 99:99',
];

type Change = (lines: string[], mapping: Mapping) => string[];

const rowOf = (lines: readonly string[], mapping: Mapping) =>
  mapping.table.firstRow - 1 + below(Math.max(1, lines.length - mapping.table.firstRow + 1));
const cellsOf = (line: string, mapping: Mapping) => line.split(mapping.table.delimiter);
const inCells =
  (change: (cells: string[]) => void): Change =>
  (lines, mapping) => {
    const at = rowOf(lines, mapping);
    const cells = cellsOf(lines[at] ?? '', mapping);
    change(cells);
    lines[at] = cells.join(mapping.table.delimiter);
    return lines;
  };
/** Headings and values of whole columns; lines above them stay. */
const inColumns =
  (change: (cells: string[], one: number, two: number) => void): Change =>
  (lines, mapping) => {
    const start =
      mapping.table.headingRow > 0 ? mapping.table.headingRow - 1 : mapping.table.firstRow - 1;
    const width = cellsOf(lines[start] ?? '', mapping).length;
    const [one, two] = [below(width), below(width)];
    return lines.map((line, i) => {
      if (i < start) return line;
      const cells = cellsOf(line, mapping);
      change(cells, one, two);
      return cells.join(mapping.table.delimiter);
    });
  };

const changes: readonly Change[] = [
  inCells((cells) => cells.splice(below(cells.length), 1)),
  inCells((cells) => cells.splice(below(cells.length), 0, pick(junk))),
  inCells((cells) => {
    cells[below(cells.length)] = pick(junk);
  }),
  inCells((cells) => {
    const [a, b] = [below(cells.length), below(cells.length)];
    [cells[a], cells[b]] = [cells[b], cells[a]];
  }),
  inColumns((cells, a, b) => {
    [cells[a], cells[b]] = [cells[b], cells[a]];
  }),
  inColumns((cells, a) => cells.splice(a, 1)),
  inColumns((cells, a) => cells.splice(a, 0, '7')),
  (lines, mapping) => {
    lines.splice(rowOf(lines, mapping), 1 + below(5));
    return lines;
  },
  (lines, mapping) => {
    lines.splice(rowOf(lines, mapping), 0, lines[rowOf(lines, mapping)] ?? '');
    return lines;
  },
  (lines, mapping) => {
    const [a, b] = [rowOf(lines, mapping), rowOf(lines, mapping)];
    [lines[a], lines[b]] = [lines[b], lines[a]];
    return lines;
  },
  (lines) => {
    lines.splice(below(lines.length), 0, pick(['', '# remark', ';;;;', 'The end', '\f']));
    return lines;
  },
  (lines) => lines.slice(0, below(lines.length)),
  (lines) => lines.slice(below(4)),
  (lines, mapping) =>
    lines.map((line) =>
      line.replaceAll(mapping.table.delimiter, pick([mapping.table.delimiter, '|', '~'])),
    ),
  (lines) => {
    const text = lines.join('\n');
    const at = below(text.length);
    return (text.slice(0, at) + pick(junk) + text.slice(at + below(30))).split('\n');
  },
];

/** The number that a cell says, by the plainest reading there is; NaN for anything else. */
function plainly(cell: string, mapping: Mapping): number {
  let text = cell.trim();
  if (mapping.table.thousands !== '') text = text.replaceAll(mapping.table.thousands, '');
  if (mapping.table.decimal === ',') text = text.replace(',', '.');
  return /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(text) ? Number(text) : Number.NaN;
}

/** Every value against its cell; returns how many were compared. */
function compare(table: MappedTable, lines: readonly string[], mapping: Mapping): number {
  const { headingRow } = mapping.table;
  const headings =
    headingRow > 0 ? cellsOf(lines[headingRow - 1] ?? '', mapping).map((name) => name.trim()) : [];
  let compared = 0;
  mapping.columns.forEach((own) => {
    const column = table.columns.find(({ quantity }) => quantity === own.quantity);
    const at = typeof own.column === 'number' ? own.column - 1 : headings.indexOf(own.column);
    const unit = unitsOf(own.quantity).find(({ name }) => name === own.unit);
    if (!column || !unit) throw new Error(`${own.quantity} was not read`);
    for (let i = 0; i < table.count; i++) {
      const line = lines[table.row[i] - 1] ?? '';
      if (line.includes('"')) continue;
      const found = plainly(cellsOf(line, mapping)[at] ?? '', mapping);
      const isCode = mapping.missing.includes(found);
      const wanted = isCode
        ? Number.NaN
        : ((found + unit.before) * unit.scale) / (unit.isEnergy ? table.intervalS : 1);
      const value = column.values[i];
      const isSame = Number.isNaN(wanted)
        ? Number.isNaN(value)
        : Math.abs(value - wanted) <= 1e-9 * Math.max(1, Math.abs(wanted));
      if (!isSame)
        throw new Error(`row ${table.row[i]}, ${own.column}: ${value} read from "${line}"`);
      compared++;
    }
  });
  return compared;
}

test(`${runs} damaged tables: no crash, no hang, no value from the wrong place`, {
  timeout: 240_000,
}, () => {
  expect(bases.length).toBeGreaterThan(14);
  let read = 0;
  let refused = 0;
  let compared = 0;
  let proposed = 0;
  let slowestMs = 0;
  for (let k = 0; k < runs; k++) {
    const { lines: original, mapping } = pick(bases);
    let lines = [...original];
    for (let n = 1 + below(3); n > 0; n--) lines = pick(changes)(lines, mapping);
    const text = lines.join(k % 7 === 0 ? '\r\n' : '\n');
    lines = text.split(/\r\n|\r|\n/);
    const before = process.cpuUsage();
    const found = readMapped(text, mapping, { file: 'damaged' });
    if (found.ok) {
      read++;
      compared += compare(found.value, lines, mapping);
      if (k % 25 === 0) inspectTable(found.value, k % 2 === 0 ? 'all' : new Set());
    } else {
      refused++;
      expect(found.faults.length).toBeGreaterThan(0);
      for (const fault of found.faults.slice(0, 3))
        expect(faultText(fault).length).toBeLessThan(700);
    }
    if (k % 10 === 0) {
      const guess = detectTable(text, { site: hillside });
      if (guess.kind === 'proposed') {
        const again = readMapped(text, guess.mapping, { site: hillside });
        if (again.ok) {
          proposed++;
          compare(again.value, lines, guess.mapping);
        }
      }
    }
    const { user, system } = process.cpuUsage(before);
    slowestMs = Math.max(slowestMs, (user + system) / 1000);
  }
  console.info(
    `${read} read, ${refused} refused, ${compared} values compared, ${proposed} proposed anew, slowest ${slowestMs.toFixed(0)} ms`,
  );
  expect(read).toBeGreaterThan(runs * 0.2);
  expect(refused).toBeGreaterThan(runs * 0.2);
  expect(slowestMs).toBeLessThan(3000);
});
