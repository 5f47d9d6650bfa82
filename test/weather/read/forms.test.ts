// What counts as the same table: encodings, line ends, delimiters, forms, pieces of any size.
import { describe, expect, test } from 'vitest';
import {
  faultText,
  plainWeatherForm,
  readWeather,
  readWeatherStream,
  splitGlobal,
  standardPressurePa,
  type WeatherYear,
  writePlainWeather,
} from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';
import { yearOf } from '../shared-tables.ts';
import {
  invented,
  plainLines,
  psmLines,
  pvgisLines,
  stampedLines,
  tmy3Lines,
  withCell,
} from './tables.ts';

const plainText = `${plainLines.join('\n')}\n`;
const columnsOf = (year: WeatherYear) => ({
  air: year.dryBulbC,
  dew: year.dewPointC,
  wind: year.windMPerS,
  ghi: year.ghiWPerM2,
  dni: year.dniWPerM2,
  dhi: year.dhiWPerM2,
  sourceYear: year.sourceYear,
});
const total = (values: Float64Array) => values.reduce((a, b) => a + b, 0);

describe('the plain table', () => {
  test('gives back what was written, to the last bit', () => {
    const year: WeatherYear = {
      ...inventedYear(hillside, { readAt: 0.25 }),
      ceilingM: {
        values: Float64Array.from({ length: 8760 }, (_, h) =>
          h % 3 ? Number.POSITIVE_INFINITY : 1200.5,
        ),
        stands: { kind: 'reading', at: 0 },
        origin: 'read',
      },
    };
    const back = yearOf(writePlainWeather(year), {});
    expect(back).toEqual(year);
  });
  test('is described with every column that the writer writes', () => {
    for (const name of plainLines[6].split(',')) expect(plainWeatherForm).toContain(name);
    for (const line of plainLines.slice(0, 6))
      expect(plainWeatherForm).toContain(line.slice(2).split(':')[0]);
  });
  test('may hold its columns in any order', () => {
    const turned = plainLines.map((line, i) =>
      i < 6 ? line : line.split(',').reverse().join(','),
    );
    expect(yearOf(turned.join('\n'), {})).toEqual(yearOf(plainText, {}));
  });
});

describe('the same text, written otherwise', () => {
  const expected = columnsOf(yearOf(stampedLines().join('\n'), {}));
  const same = (source: string | Uint8Array) =>
    expect(columnsOf(yearOf(source, {}))).toEqual(expected);
  const lines = stampedLines();
  test('with CR LF, with CR alone, without a last line break', () => {
    same(lines.join('\r\n'));
    same(`${lines.join('\r')}\r`);
  });
  test('with a byte order mark', () => {
    same(`\uFEFF${lines.join('\n')}`);
    same(new Uint8Array([0xef, 0xbb, 0xbf, ...new TextEncoder().encode(lines.join('\n'))]));
  });
  test('with all cells in quotes', () => {
    same(lines.map((line, i) => (i < 5 ? line : `"${line.replaceAll(',', '","')}"`)).join('\n'));
  });
  test('with tabs, or with semicolons and decimal commas, which is noted', () => {
    same(lines.map((line) => line.replaceAll(',', '\t')).join('\n'));
    const comma = lines.map((line, i) =>
      i < 5 ? line : line.replaceAll(',', ';').replaceAll('.', ','),
    );
    same(comma.join('\n'));
    const year = yearOf(comma.join('\n'), {});
    expect(
      year.notes.some((note) =>
        note.text.includes('a comma within a cell is read as the decimal mark'),
      ),
    ).toBe(true);
  });
  test('with blank lines, comments and trailing empty cells', () => {
    const loose = lines.flatMap((line, i) => (i % 500 === 30 ? [line, '', '# checked'] : [line]));
    same(loose.join('\n'));
    same(lines.map((line, i) => (i < 5 ? line : `${line},,,`)).join('\n'));
  });
  test('in UTF-16 of either order, with and without a mark', () => {
    const text = lines.join('\n');
    for (const isBig of [false, true])
      for (const mark of ['', '\uFEFF']) {
        const all = mark + text;
        const bytes = new Uint8Array(all.length * 2);
        for (let i = 0; i < all.length; i++) {
          bytes[2 * i + (isBig ? 1 : 0)] = all.charCodeAt(i) & 255;
          bytes[2 * i + (isBig ? 0 : 1)] = all.charCodeAt(i) >> 8;
        }
        same(bytes);
      }
  });
  test('with an accent in UTF-8 or in an old encoding', () => {
    const named = lines.map((line) => line.replace('Hillside', 'Zürich–Höngg'));
    const utf8 = new TextEncoder().encode(named.join('\n'));
    expect(yearOf(utf8, {}).site.name).toBe('Zürich–Höngg');
    const old = Uint8Array.from(named.join('\n'), (c) => (c === '–' ? 0x96 : c.charCodeAt(0)));
    const year = yearOf(old, {});
    expect(year.site.name).toBe('Zürich–Höngg');
    expect(year.notes.some((note) => note.text.includes('Windows-1252'))).toBe(true);
  });
});

describe('pieces', () => {
  const bytes = new TextEncoder().encode(tmy3Lines().join('\r\n').replace('HILLSIDE', 'Höhe'));
  function* cut(size: number) {
    for (let i = 0; i < bytes.length; i += size) yield bytes.subarray(i, i + size);
  }
  test('of any size give the whole', async () => {
    const whole = yearOf(bytes, {});
    expect(whole.site.name).toBe('Höhe, ZZ');
    for (const size of [7, 1000, 65536]) {
      const seen: number[] = [];
      const read = await readWeatherStream(cut(size), {
        onProgress: ({ rows }) => seen.push(rows),
      });
      expect(read).toEqual({ ok: true, value: whole });
      expect(seen.at(-1)).toBeGreaterThan(8000);
      expect(seen.every((rows, i) => i === 0 || rows >= seen[i - 1])).toBe(true);
    }
  });
  test('stop when they are cancelled', async () => {
    let pieces = 0;
    const read = await readWeatherStream(cut(1000), {
      onProgress: () => pieces++,
      isCancelled: () => pieces === 5,
    });
    expect(read).toBeNull();
    expect(pieces).toBe(5);
  });
  test('of a file of minutes stop once the fault is clear', async () => {
    let asked = 0;
    function* minutes() {
      yield `${stampedLines().slice(0, 6).join('\n')}\n`;
      for (let m = 0; m < 525600; m++) {
        asked = m;
        const day = new Date(Date.UTC(2019, 0, 1) + m * 60000).toISOString().slice(0, 16);
        yield `${day},5,3,2,0,0,0\n`;
      }
    }
    const read = await readWeatherStream(minutes(), { file: 'minutes.csv' });
    expect(read?.ok).toBe(false);
    if (read && !read.ok) expect(read.faults.map(faultText)[0]).toContain('a row every 1 minutes');
    expect(asked).toBeLessThan(30000);
  });
});

describe('years', () => {
  test('of 8784 hours are read where 29 February is there', () => {
    const leap = inventedYear(hillside, { hours: 8784, year: 2020 });
    const year = yearOf(stampedLines(leap).join('\n'), {});
    expect(year.hours).toBe(8784);
    expect(year.year).toBe(2020);
    expect(year.dryBulbC.values[59 * 24]).toBeCloseTo(leap.dryBulbC.values[59 * 24], 2);
    const wrong = readWeather(stampedLines(leap).join('\n'), { file: 'leap', year: 2019 });
    expect(wrong.ok ? [] : wrong.faults.map(faultText)).toEqual([
      'leap, year: found the calendar year 2019 for a table with 29 February, expected a leap year. Choose a leap year, or a table of 8760 hours.',
    ]);
  });
  test('of one leap year without 29 February keep 8760 hours', () => {
    const lines = stampedLines().map((line) => line.replace(/^2019/, '2020'));
    const year = yearOf(lines.join('\n'), {});
    expect(year.hours).toBe(8760);
    expect(year.sourceYear[5000]).toBe(2020);
    expect(year.year).toBe(2018); // 2020 would put every weekday after February out by one
  });
});

describe('each form', () => {
  test('TMY3 keeps special ceilings apart from missing values', () => {
    let lines: string[] = tmy3Lines();
    lines = withCell(lines, 3, 14, '88888');
    lines = withCell(lines, 5, 14, '99999');
    lines = withCell(lines, 6, 8, '-9900');
    const year = yearOf(lines.join('\n'), {});
    expect(year.form).toBe('TMY3');
    expect(year.ceilingM?.values[0]).toBe(Number.POSITIVE_INFINITY);
    expect(year.ceilingM?.values[1]).toBe(Number.POSITIVE_INFINITY);
    expect(year.ceilingM?.values[2]).toBe(Number.POSITIVE_INFINITY); // held from the hour before
    const t = year.dryBulbC.values;
    expect(t[3]).toBeCloseTo((t[2] + t[4]) / 2, 10);
    expect(year.notes.filter((note) => note.kind === 'repair')).toHaveLength(2);
  });
  test('PSM with its site lines needs nothing more', () => {
    const year = yearOf(psmLines().join('\n'), {});
    expect(year.form).toBe('NSRDB PSM');
    expect(year.site).toEqual({ ...hillside, name: 'location 1234' });
    expect(total(year.dniWPerM2.values)).toBe(total(invented.dniWPerM2.values));
    expect(year.relativeHumidity.values[0]).toBeCloseTo(invented.relativeHumidity.values[0], 3);
  });
  test('PSM in UTC is moved to its local time zone', () => {
    const lines = psmLines();
    lines[1] = lines[1].replace(/,1,480,1$/, ',0,480,1');
    const year = yearOf(lines.join('\n'), {});
    expect(year.site.utcOffsetH).toBe(1);
    expect(year.dryBulbC.values[1]).toBeCloseTo(invented.dryBulbC.values[0], 1);
  });
  test('PVGIS ends at its footer', () => {
    const year = yearOf(pvgisLines().join('\n'), {});
    expect(year.form).toBe('PVGIS TMY');
    expect(year.hours).toBe(8760);
    expect(Object.is(year.dniWPerM2.values[1], 0)).toBe(true);
  });
});

describe('what a table lacks', () => {
  const only = (...names: string[]) => {
    const headings = stampedLines()[5].split(',');
    const keep = headings.map((name) => name === 'time' || names.includes(name));
    return stampedLines()
      .map((line, i) =>
        i < 5
          ? line
          : line
              .split(',')
              .filter((_, k) => keep[k])
              .join(','),
      )
      .join('\n');
  };
  const air = ['dryBulbC', 'dewPointC', 'windMPerS'];
  test('pressure and wind direction are assumed and noted', () => {
    const year = yearOf(stampedLines().join('\n'), {});
    expect(year.pressurePa.values[100]).toBe(standardPressurePa(480));
    expect(year.pressurePa.origin).toBe('assumed');
    expect(year.windFromDeg.origin).toBe('assumed');
    const said = year.notes.map((note) => note.text).join(' ');
    expect(said).toContain('no air pressure: 95690 Pa of the standard atmosphere at 480 m');
    expect(said).toContain('no wind direction');
  });
  for (const lost of ['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'] as const)
    test(`${lost} is computed so that the hour closes`, () => {
      const names = ['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'].filter((name) => name !== lost);
      const year = yearOf(only(...air, ...names), {});
      expect(year[lost].origin).toBe('derived');
      const [found, whole] = [total(year[lost].values), total(invented[lost].values)];
      // The invented table closes with the sun at mid-hour, the reader with its mean: under 2 %.
      expect(Math.abs(found / whole - 1)).toBeLessThan(0.02);
    });
  test('a lone global is split after Erbs', () => {
    const year = yearOf(only(...air, 'ghiWPerM2'), {});
    const noon = 171 * 24 + 12;
    const ghi = year.ghiWPerM2.values[noon];
    // Sun at 12:30 on 21 June at 47.5 N, 9 E: 65.9 degrees high, 1323 W/m² outside the air.
    const split = splitGlobal(ghi, 90 - 65.9, 1323);
    expect(Math.abs(year.dhiWPerM2.values[noon] / split.dhiWPerM2 - 1)).toBeLessThan(0.02);
    expect(year.notes.some((note) => note.text.includes('Erbs, Klein and Duffie'))).toBe(true);
    expect(Math.max(...year.dniWPerM2.values)).toBeLessThan(1100);
  });
  test('a spare column with long gaps is left out and noted', () => {
    const lines = tmy3Lines().map((line, i) =>
      i > 500 && i < 600 ? line.replace(/[^,]*$/, '-9900') : line,
    );
    const year = yearOf(lines.join('\n'), {});
    expect(year.albedo).toBeUndefined();
    expect(
      year.notes.some((note) => note.text.startsWith('Alb (unitless): left out, 99 of 8760')),
    ).toBe(true);
  });
  test('values just outside their limits are drawn back and counted', () => {
    let lines: string[] = stampedLines();
    lines = withCell(lines, 7, 5, '-3.2');
    lines = withCell(lines, 8, 5, '-1');
    const year = yearOf(lines.join('\n'), {});
    expect(year.ghiWPerM2.values[0]).toBe(0);
    expect(year.notes[0]).toEqual({
      kind: 'repair',
      text: 'ghiWPerM2: 2 values just outside their limits were drawn back to them (rows 7, 8).',
      count: 2,
    });
  });
});
