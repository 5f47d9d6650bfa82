// Encodings, line ends, quotes, formulas: what comes in as text stays text, in and out.
import { describe, expect, test } from 'vitest';
import { csvText } from '../../../app/cli/csv-text.ts';
import {
  detectTable,
  faultText,
  type Mapping,
  readMapped,
  writePlainWeather,
} from '../../../weather/index.ts';
import { yearOf } from '../shared-tables.ts';
import { type Dialect, dialects, hillside, truth } from './tables.ts';

const german = dialects.find(({ name }) => name.startsWith('German')) as Dialect;
const text = german.write(1000);

function utf16(words: string, big: boolean, hasMark: boolean): Uint8Array {
  const all = (hasMark ? '\uFEFF' : '') + words;
  const bytes = new Uint8Array(all.length * 2);
  const view = new DataView(bytes.buffer);
  for (let i = 0; i < all.length; i++) view.setUint16(i * 2, all.charCodeAt(i), !big);
  return bytes;
}

const latin = (words: string) => Uint8Array.from(words, (c) => c.charCodeAt(0) & 0xff);
const utf8 = (words: string) => new TextEncoder().encode(words);

describe.each([
  ['UTF-8', utf8(text)],
  ['UTF-8 with its mark', utf8(`\uFEFF${text}`)],
  ['UTF-16 little end first', utf16(text, false, true)],
  ['UTF-16 big end first', utf16(text, true, true)],
  ['UTF-16 without a mark', utf16(text, false, false)],
  ['Latin-1', latin(text)],
  ['returns and line feeds', utf8(text.replaceAll('\n', '\r\n'))],
  ['returns alone', utf8(text.replaceAll('\n', '\r'))],
  [
    'line ends of every kind',
    utf8(
      text
        .split('\n')
        .map((line, i) => line + ['\n', '\r\n', '\r'][i % 3])
        .join(''),
    ),
  ],
] as const)('%s', (_, bytes) => {
  test('is proposed and read alike', () => {
    const found = detectTable(bytes, { site: hillside });
    if (found.kind !== 'proposed') throw new Error(JSON.stringify(found));
    const read = readMapped(bytes, found.mapping, { site: hillside });
    if (!read.ok) throw new Error(read.faults.map(faultText).join('\n'));
    expect(read.value.count).toBe(1000);
    const air = read.value.columns.find(({ quantity }) => quantity === 'dryBulbC');
    expect(air?.values[500]).toBeCloseTo(truth.dryBulbC.values[500], 2);
  });
});

function proposed(table: string): Mapping {
  const found = detectTable(table, { site: hillside });
  if (found.kind !== 'proposed') throw new Error(JSON.stringify(found));
  return found.mapping;
}

describe('formulas', () => {
  test('in a mapped column are a fault that shows them as text, not a value', () => {
    const lines = text.split('\n');
    lines[40] = lines[40].replace(/;[^;]*;/, ';=1+1;');
    lines[41] = lines[41].replace(/;[^;]*;/, ';=1+1;');
    const read = readMapped(lines.join('\n'), proposed(lines.join('\n')), {
      file: 'roof.csv',
      site: hillside,
    });
    expect(read.ok ? '' : read.faults.map(faultText).join('\n')).toContain(
      'roof.csv, row 41, column Luft: found "=1+1", expected a number (decimal comma)',
    );
  });
  test('in a heading and in a column that nobody uses do no harm', () => {
    const table = text
      .split('\n')
      .map((line, i) => `${line};${i === 2 ? '=HYPERLINK("x")' : '=A1'}`)
      .slice(2)
      .join('\n');
    const read = readMapped(table, proposed(table), { site: hillside });
    expect(read.ok).toBe(true);
  });
  test('are never written out as such', () => {
    for (const words of ['=1+1', '+1', '-x', '@sum(a)', ' =2', '\t=2'])
      expect(csvText(words)).toMatch(/^"?'/);
    expect(csvText('north, "upper" room')).toBe('"north, ""upper"" room"');
    const named = { ...truth, site: { ...truth.site, name: 'Mill,=HYPERLINK("x"),+1' } };
    const written = writePlainWeather(named);
    expect(written.split('\n')[0]).toBe(`"# site: Mill,=HYPERLINK('x'),+1"`);
    expect(yearOf(written, {}).site.name).toBe("Mill,=HYPERLINK('x'),+1");
  });
});

describe('a saved mapping', () => {
  test('is offered again for the same shape, not for another', () => {
    const one = proposed(text);
    const two = proposed(german.write(2000).split('\n').slice(0, 1500).join('\n'));
    expect(two.shape).toBe(one.shape);
    expect(proposed(text.replace('Druck', 'Pression')).shape).not.toBe(one.shape);
  });
  test('refuses a table of another shape', () => {
    const read = readMapped(text.replace('Luft', 'Keller'), proposed(text), {
      file: 'x.csv',
      site: hillside,
    });
    expect(read.ok ? '' : read.faults.map(faultText).join()).toContain(
      'expected a column headed "Luft"',
    );
  });
});

test('a row with a cell too few is refused: what follows would slide into the wrong column', () => {
  const lines = text.split('\n');
  lines[40] = lines[40].replace(/;[^;]*;/, ';');
  const read = readMapped(lines.join('\n'), proposed(text), { file: 'roof.csv', site: hillside });
  expect(read.ok ? '' : read.faults.map(faultText).join()).toBe(
    'roof.csv, row 41, column all: found 6 cells, expected 7 cells as in the headings. Check the mark between cells, and the decimal mark.',
  );
});

describe('the end of the interval that a stamp marks', () => {
  const part = (movedH: number) => {
    const [head, ...rows] = dialects[0].write(3000).trimEnd().split('\n');
    const shifted = rows.map((row, h) => {
      const at = new Date(Date.UTC(2023, 0, 1) + (h + movedH) * 3600000).toISOString().slice(0, 16);
      return row.replace(/^[^,]+/, at);
    });
    return [head, ...shifted.slice(101, 2950)].join('\n');
  };
  test.each([
    ['start', 0],
    ['middle', 0.5],
    ['end', 1],
  ] as const)('is told by the light where nothing else says it: %s', (marks, movedH) => {
    const found = detectTable(part(movedH), { site: hillside });
    expect(found.kind === 'proposed' && found.mapping.stamp.marks).toBe(marks);
    if (found.kind !== 'proposed') return;
    const fact = found.facts.find(({ topic }) => topic === 'marks');
    expect(fact?.reason).toContain(`if stamps mark the ${marks}`);
  });
});
