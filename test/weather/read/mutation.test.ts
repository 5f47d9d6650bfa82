// Damaged tables: whatever is done to one, the reader comes back with a year or with faults, soon, and
// never with a value from the wrong place.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { faultText, type Parsed, readWeather, type WeatherYear } from '../../../weather/index.ts';
import { yearOf } from '../shared-tables.ts';
import { plainLines, psmLines, pvgisLines, stampedLines, tmy3Lines } from './tables.ts';

// The same damage every time; other damage, and more of it, by `MUTATION_SEED=7 MUTATION_MORE=10`.
const seed = Number(process.env.MUTATION_SEED ?? 20);
const more = Number(process.env.MUTATION_MORE ?? 1);

const tables = [plainLines, stampedLines(), tmy3Lines(), psmLines(), pvgisLines()];
const columns = [
  'dryBulbC',
  'dewPointC',
  'windMPerS',
  'ghiWPerM2',
  'dniWPerM2',
  'dhiWPerM2',
] as const;

function isSound(read: Parsed<WeatherYear>): void {
  if (!read.ok) {
    expect(read.faults.length).toBeGreaterThan(0);
    expect(read.faults.length).toBeLessThanOrEqual(21);
    for (const fault of read.faults) {
      expect(faultText(fault).length).toBeLessThan(600);
      expect(fault.mend).not.toBe('');
    }
    return;
  }
  for (const key of columns) {
    expect(read.value[key].values.length).toBe(read.value.hours);
    expect(read.value[key].values.every(Number.isFinite)).toBe(true);
  }
}

const piece = fc.oneof(
  fc.string({ maxLength: 12 }),
  fc.constantFrom(
    '"',
    ',',
    ';',
    '\n',
    '\r',
    '\t',
    '\0',
    '-',
    'NaN',
    '1e400',
    '#',
    '24:00',
    ',,,,',
    '\uFEFF',
    '9999',
  ),
);

test('text cut, doubled, or strewn with pieces', () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...tables),
      fc.array(fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.nat(400), piece), {
        maxLength: 6,
      }),
      (lines, edits) => {
        let text = lines.join('\n');
        for (const [where, cut, put] of edits) {
          const at = Math.floor(where * text.length);
          text = text.slice(0, at) + put + text.slice(at + cut);
        }
        isSound(readWeather(text, { file: 'damaged' }));
      },
    ),
    { numRuns: 30 * more, seed },
  );
});

test('any bytes and any text', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 3000 }), (bytes) => isSound(readWeather(bytes))),
    { numRuns: 100 * more, seed },
  );
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 2000 }), (text) =>
      isSound(readWeather(text)),
    ),
    { numRuns: 100 * more, seed },
  );
  fc.assert(
    fc.property(fc.constantFrom(...tables), fc.array(piece, { maxLength: 300 }), (lines, pieces) =>
      isSound(readWeather(lines.slice(0, 12).join('\n') + pieces.join(''))),
    ),
    { numRuns: 100 * more, seed },
  );
});

test('one cell changed changes that hour alone, or is a fault', () => {
  const lines = stampedLines();
  const whole = yearOf(lines.join('\n'), {});
  const headings = lines[5].split(',');
  fc.assert(
    fc.property(
      fc.integer({ min: 6, max: lines.length - 1 }),
      fc.constantFrom(...columns),
      fc.oneof(piece, fc.double({ min: -200, max: 5000, noNaN: true }).map(String)),
      (row, key, put) => {
        fc.pre(!/[\n\r"]/.test(put));
        const copy = [...lines];
        const cells = copy[row].split(',');
        cells[headings.indexOf(key)] = put;
        copy[row] = cells.join(',');
        const read = readWeather(copy.join('\n'));
        isSound(read);
        if (!read.ok) return;
        for (const other of columns) {
          const [found, expected] = [read.value[other].values, whole[other].values];
          for (let h = 0; h < whole.hours; h++)
            if (found[h] !== expected[h]) expect([other, h]).toEqual([key, row - 6]);
        }
      },
    ),
    { numRuns: 25 * more, seed },
  );
});

test('columns in any order, with strangers between them, give the same year', () => {
  const lines = stampedLines();
  const whole = yearOf(lines.join('\n'), {});
  const headings = lines[5].split(',');
  fc.assert(
    fc.property(
      fc.shuffledSubarray([...headings.keys()], { minLength: headings.length }),
      fc.nat(headings.length),
      (order, at) => {
        const turned = lines.map((line, i) => {
          if (i < 5) return line;
          const cells = line.split(',');
          const moved = order.map((k) => cells[k]);
          moved.splice(at, 0, i === 5 ? 'remark' : '77');
          return moved.join(',');
        });
        const year = yearOf(turned.join('\n'), {});
        for (const key of columns)
          expect(year[key].values.every((value, h) => value === whole[key].values[h])).toBe(true);
      },
    ),
    { numRuns: 5 * more, seed },
  );
});

test('rows lost or doubled anywhere are never passed over', () => {
  const lines = stampedLines();
  fc.assert(
    fc.property(fc.integer({ min: 6, max: lines.length - 1 }), fc.boolean(), (row, isLost) => {
      const copy = [...lines];
      if (isLost) copy.splice(row, 1);
      else copy.splice(row, 0, copy[row]);
      expect(readWeather(copy.join('\n')).ok).toBe(false);
    }),
    { numRuns: 12 * more, seed },
  );
});
