// Each check on a table with one planted trouble: it is found where it was planted, only that is found,
// and the accepted repair brings the value back near the truth. Reference: the invented year before the
// trouble was planted.
import { describe, expect, test } from 'vitest';
import {
  type Accepted,
  type Inspection,
  inspectTable,
  type Mapping,
  readMapped,
  stationPressurePa,
  yearOf,
} from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';

const truth = inventedYear(hillside, { year: 2023 });
const names = [
  'dryBulbC',
  'relativeHumidity',
  'windMPerS',
  'ghiWPerM2',
  'dniWPerM2',
  'dhiWPerM2',
  'pressurePa',
] as const;
const units = ['°C', 'share', 'm/s', 'W/m²', 'W/m²', 'W/m²', 'Pa'];
const mapping: Mapping = {
  format: 'inglenook-weather-mapping',
  version: 1,
  name: 'test',
  table: { delimiter: ',', decimal: '.', thousands: '', headingRow: 1, firstRow: 2 },
  stamp: {
    parts: [{ column: 1, reads: 'dateTime', order: 'ymd' }],
    marks: 'start',
    clock: { kind: 'site' },
  },
  columns: names.map((quantity, k) => ({
    column: k + 2,
    quantity,
    unit: units[k],
    stands: 'mean',
  })),
  missing: [],
  site: hillside,
};

/** Rows of the year, a little ruffled so that no sensor seems stuck; cell 0 is the stamp. */
function rows(): string[][] {
  return Array.from({ length: 8760 }, (_, h) => [
    new Date(Date.UTC(2023, 0, 1) + h * 3600000).toISOString().slice(0, 16),
    ...names.map((name) => {
      const value = truth[name].values[h];
      const ruffle = name.endsWith('WPerM2') ? 0 : (h % 7) * 1e-4 * Math.abs(value);
      return String(Number((value + ruffle).toPrecision(8)));
    }),
  ]);
}

function inspect(
  table: readonly (readonly string[])[],
  accepted: Accepted = new Set(),
): Inspection {
  const text = [`time,${names.join(',')}`, ...table.map((row) => row.join(','))].join('\n');
  const read = readMapped(text, mapping);
  if (!read.ok) throw new Error(JSON.stringify(read.faults));
  const found = inspectTable(read.value, accepted);
  if (!found.ok) throw new Error(JSON.stringify(found.faults));
  return found.value;
}

const column = (name: (typeof names)[number]) => names.indexOf(name) + 1;
const mended = ({ series }: Inspection, name: string) =>
  series.columns.find(({ quantity }) => quantity === name)?.values ?? new Float64Array();

test('a sound table has no findings', () => {
  expect(inspect(rows()).findings.map(({ text }) => text)).toEqual([]);
});

interface Planted {
  readonly id: string;
  readonly plant: (table: string[][]) => void;
  /** Column and hours in which the repair must come near the truth. */
  readonly row?: number;
  readonly near?: readonly [
    name: (typeof names)[number],
    from: number,
    count: number,
    within: number,
  ];
}

const set =
  (name: (typeof names)[number], from: number, count: number, cell: string) =>
  (table: string[][]) => {
    for (let h = from; h < from + count; h++) table[h][column(name)] = cell;
  };

const planted: readonly Planted[] = [
  { id: 'gap-short-dryBulbC', plant: set('dryBulbC', 4000, 3, ''), near: ['dryBulbC', 4000, 3, 1] },
  // 21 June 04:00 to 07:00: sunrise inside the gap.
  {
    id: 'gap-short-ghiWPerM2',
    plant: set('ghiWPerM2', 171 * 24 + 4, 3, ''),
    near: ['ghiWPerM2', 171 * 24 + 4, 3, 60],
  },
  {
    id: 'gap-long-dryBulbC',
    plant: set('dryBulbC', 4000, 30, ''),
    near: ['dryBulbC', 4000, 30, 1],
  },
  {
    id: 'gap-long-ghiWPerM2',
    plant: set('ghiWPerM2', 4000, 30, ''),
    near: ['ghiWPerM2', 4000, 30, 30],
  },
  { id: 'gap-too-long-dryBulbC', plant: set('dryBulbC', 4000, 80, '') },
  { id: 'range-dryBulbC', plant: set('dryBulbC', 4000, 2, '720'), near: ['dryBulbC', 4000, 2, 1] },
  { id: 'offset-ghiWPerM2', plant: set('ghiWPerM2', 24, 4, '-3'), near: ['ghiWPerM2', 24, 4, 0] },
  { id: 'offset-relativeHumidity', plant: set('relativeHumidity', 24, 1, '1.04') },
  {
    id: 'stuck-windMPerS',
    plant: set('windMPerS', 800, 37, '1.9'),
    near: ['windMPerS', 800, 37, 1],
  },
  { id: 'spike-dryBulbC', plant: set('dryBulbC', 4000, 1, '-15'), near: ['dryBulbC', 4000, 1, 1] },
  {
    id: 'night-sun-ghiWPerM2',
    plant: set('ghiWPerM2', 171 * 24, 1, '300'),
    near: ['ghiWPerM2', 171 * 24, 1, 0],
  },
  {
    id: 'above-clear-dhiWPerM2',
    plant: set('dhiWPerM2', 20 * 24 + 9, 1, '900'),
    near: ['dhiWPerM2', 20 * 24 + 9, 1, 60],
  },
  {
    id: 'closure',
    plant: (table) => {
      for (let h = 4000; h < 4600; h++)
        table[h][column('dniWPerM2')] = String(truth.dniWPerM2.values[h] * 0.3);
    },
    // Hour 12 to 15 of 17 June: the check leaves low sun and little light alone.
    near: ['dniWPerM2', 4020, 3, 30],
    row: 4002,
  },
];

describe.each(planted)('$id', ({ id, plant, near, row }) => {
  const table = rows();
  plant(table);
  const open = inspect(table);
  test('is found where it was planted, and nothing else', () => {
    expect(open.findings.map((one) => one.id)).toEqual([id]);
    const [finding] = open.findings;
    expect(finding.isAccepted).toBe(false);
    if (near) expect(finding.places[0]).toMatchObject({ row: row ?? near[1] + 2 });
  });
  test('stays as it is until the repair is accepted, which is then listed', () => {
    if (!near) {
      expect(open.findings[0].repair === null || id.startsWith('offset')).toBe(true);
      return;
    }
    const [name, from, count, within] = near;
    const done = inspect(table, new Set([id]));
    expect(done.findings[0].isAccepted).toBe(true);
    expect(done.series.notes.at(-1)).toMatchObject({ kind: 'repair' });
    const values = mended(done, name);
    const off = Array.from({ length: count }, (_, k) =>
      Math.abs(values[from + k] - truth[name].values[from + k]),
    );
    expect(Math.max(...off)).toBeLessThanOrEqual(within);
  });
});

describe('rows', () => {
  test('out of order and twice block the year until both repairs are accepted', () => {
    const table = rows();
    [table[100], table[200]] = [table[200], table[100]];
    table.splice(300, 0, [...table[299]]);
    const open = inspect(table);
    expect(open.findings.map(({ id }) => id)).toEqual(['order', 'duplicates']);
    expect(open.findings[1].text).toContain('their values are the same');
    const refused = yearOf(open);
    expect(refused.ok ? [] : refused.faults.map(({ mend }) => mend)).toEqual([
      'Sort the rows by time. Accept it as "order".',
      'Keep the first of each. Accept it as "duplicates".',
    ]);
    const made = yearOf(inspect(table, new Set(['order', 'duplicates'])));
    expect(made.ok && made.value.dryBulbC.values[100]).toBe(Number(rows()[100][1]));
  });
  test('missing rows are gaps of all columns', () => {
    const table = rows();
    table.splice(500, 4);
    const ids = inspect(table).findings.map(({ id }) => id);
    expect(ids).toEqual(names.map((name) => `gap-long-${name}`));
  });
  test('a clock an hour late is found, and mended by a shift', () => {
    const table = rows().map((row, h, all) => [row[0], ...all[(h + 8759) % 8760].slice(1)]);
    const open = inspect(table);
    expect(open.findings.map(({ id }) => id)).toEqual(expect.arrayContaining(['sun-time']));
    expect(open.findings.find(({ id }) => id === 'sun-time')?.title).toBe(
      'The table runs 60 min late against the sun',
    );
    const made = yearOf(inspect(table, 'all'));
    if (!made.ok) throw new Error(JSON.stringify(made.faults));
    expect(made.value.ghiWPerM2.values[4380]).toBeCloseTo(truth.ghiWPerM2.values[4380], 4);
  });
  test('a stamp far away is refused, not stretched over', () => {
    const table = rows().slice(0, 100);
    table[50][0] = '1950-01-01T00:00';
    expect(() => inspect(table)).toThrow('Correct the stamps that lie far from the rest');
  });
});

test('pressure at a height follows the standard atmosphere from 1013.25 hPa and 15 °C at sea level', () => {
  // ICAO standard atmosphere: 898.75 hPa and 8.5 °C at 1000 m (published table).
  expect(stationPressurePa(101325, 1000, 8.5)).toBeCloseTo(89875, -2);
});
