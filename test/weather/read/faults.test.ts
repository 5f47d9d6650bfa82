// What a reader says to a table that is wrong: as text, the way a person reads it.
import { describe, expect, test } from 'vitest';
import { faultText, type ReadWeatherOptions, readWeather } from '../../../weather/index.ts';
import { yearOf } from '../shared-tables.ts';
import { plainLines, pvgisLines, stampedLines, tmy3Lines, withCell } from './tables.ts';

const stamped = stampedLines();

function faultsOf(
  source: string | Uint8Array | readonly string[],
  options: ReadWeatherOptions = {},
) {
  const whole =
    typeof source === 'string' || source instanceof Uint8Array ? source : source.join('\n');
  const read = readWeather(whole, { file: 'valley.csv', ...options });
  return read.ok ? [] : read.faults.map(faultText);
}

describe('what is no table', () => {
  test('an empty file', () => {
    expect(faultsOf('')).toEqual([
      'valley.csv, the whole file: found an empty file, expected a weather table. Choose a file that holds the table.',
    ]);
    expect(faultsOf(' \r\n\n')).toHaveLength(1);
    expect(faultsOf(new Uint8Array(0))).toHaveLength(1);
  });
  test('a binary file', () => {
    const bytes = Uint8Array.from({ length: 5000 }, (_, i) => (i * 37) % 256);
    expect(faultsOf(bytes)[0]).toContain('found a binary file');
  });
  test('a zip archive or a spreadsheet file', () => {
    const bytes = new Uint8Array([0x50, 0x4b, 3, 4, ...new Uint8Array(400)]);
    expect(faultsOf(bytes)[0]).toContain('found a zip archive or a spreadsheet file');
  });
  test('a text of another kind', () => {
    expect(faultsOf('Dear all,\nplease find attached\n')[0]).toBe(
      'valley.csv, row 1, column first line: found "Dear all,", expected headings of TMY3, NSRDB PSM, PVGIS TMY or a plain table, separated by commas, semicolons or tabs. Choose a weather table of one of these forms, or have a mapping made for it (--make-mapping on the command line).',
    );
  });
  test('a text without line breaks', () => {
    expect(faultsOf('x'.repeat(5_000_000))).toHaveLength(1);
  });
  test('headings without rows', () => {
    expect(faultsOf(plainLines.slice(0, 7))[0]).toContain('found headings but no rows');
  });
});

describe('rows that do not make a year', () => {
  test('a table that was cut off', () => {
    expect(faultsOf(stamped.slice(0, 6 + 5000))).toEqual([
      'valley.csv, row 5007, column time: found 3760 hours missing from 28 Jul 08:00, where the table ends, expected 8760 hourly rows (5000 found). The table was cut off: fetch the whole file again.',
    ]);
  });
  test('an hour that is missing', () => {
    const lines = stamped.filter((_, i) => i !== 6 + 100);
    expect(faultsOf(lines)).toEqual([
      'valley.csv, row 107, column time: found 1 hour missing from 5 Jan 04:00, expected 8760 hourly rows (8759 found). Insert the rows, with empty cells where nothing was measured.',
    ]);
  });
  test('an hour twice', () => {
    const lines = [...stamped.slice(0, 107), ...stamped.slice(106)];
    expect(faultsOf(lines)).toEqual([
      'valley.csv, row 108, column time: found 5 Jan 04:00 2019, expected each hour once (row 107 has it too). Delete one of the two rows, or correct its stamp.',
    ]);
  });
  test('rows out of order', () => {
    const lines = [...stamped];
    [lines[206], lines[207]] = [lines[207], lines[206]];
    expect(faultsOf(lines)).toEqual([
      'valley.csv, row 208, column time: found 9 Jan 08:00 2019, expected a later hour than the row before. Sort the rows by time, from 1 January to 31 December.',
    ]);
  });
  test('clocks changed for summer: a day of 23 hours and one of 25', () => {
    const lines = stamped.map((line, i) => {
      const h = i - 6;
      const spring = (31 + 28 + 30) * 24 + 2; // 31 March 02:00
      const autumn = (304 - 4) * 24 + 2; // 28 October
      if (h < spring || h >= autumn) return line;
      const next = stamped[i + 1];
      return next.slice(0, 16) + line.slice(16);
    });
    const [said] = faultsOf(lines);
    expect(faultsOf(lines)).toHaveLength(1);
    expect(said).toContain('a second time, and no 31 Mar 02:00');
    expect(said).toContain('The clock was changed for summer.');
  });
  test('half-hourly rows, said once', () => {
    const half = stamped.flatMap((line, i) =>
      i < 6 ? [line] : [line, line.replace(/:00,/, ':30,')],
    );
    expect(faultsOf(half)).toEqual([
      'valley.csv, row 8, column time: found a row every 30 minutes, expected a row every 60 minutes. Average the table to hourly values: this version reads hourly tables only.',
    ]);
  });
  test('two years', () => {
    const next = stamped.slice(6).map((line) => line.replace('2019', '2020'));
    expect(faultsOf([...stamped, ...next])[0]).toContain(
      'more than a year: 17520 rows from 2019 to 2020',
    );
  });
  test('a stamp that is none, and a day that the calendar lacks', () => {
    const lines = [...stamped];
    lines[50] = lines[50].replace(/^[^,]+/, '05.01.2019 04:00');
    lines[3000] = lines[3000].replace(/^[^,]+/, '2019-04-31T10:00');
    const said = faultsOf(lines);
    expect(said[0]).toContain('row 51, column time: found "05.01.2019 04:00,');
    expect(said[0]).toContain('expected local standard time like 2019-01-31T14:00');
    expect(said[1]).toContain('expected a day and hour of the calendar');
  });
});

describe('cells that are wrong', () => {
  test('a word, a value out of physical range and a hexadecimal, all listed', () => {
    let lines: string[] = withCell(stamped, 4017, 2, 'warm');
    lines = withCell(lines, 4018, 5, '4000');
    lines = withCell(lines, 4019, 4, '0x1F');
    expect(faultsOf(lines)).toEqual([
      'valley.csv, row 4017, column dryBulbC: found "warm", expected a number from -90 to 65. Correct the value, or leave the cell empty if it was not measured.',
      'valley.csv, row 4018, column ghiWPerM2: found "4000", expected a number from 0 to 1600. Correct the value, or leave the cell empty if it was not measured.',
      'valley.csv, row 4019, column windMPerS: found "0x1F", expected a number from 0 to 115. Correct the value, or leave the cell empty if it was not measured.',
    ]);
  });
  test('limits are told in the unit of the file', () => {
    expect(faultsOf(withCell(tmy3Lines(), 10, 11, '95000'))).toEqual([
      'valley.csv, row 10, column Pressure (mbar): found "95000", expected a number from 300 to 1100. Correct the value, or leave the cell empty if it was not measured.',
    ]);
  });
  test('a column in another unit: the first cells, then a count', () => {
    const kelvin = stamped.map((line, i) => {
      const cells = line.split(',');
      if (i >= 6) cells[1] = String(Number(cells[1]) + 273.15);
      return cells.join(',');
    });
    const said = faultsOf(kelvin);
    expect(said).toHaveLength(4);
    expect(said[3]).toContain('found 8757 more cells like those above');
  });
  test('many different faults: twenty, then a count of the rest', () => {
    const lines = stamped.map((line, i) =>
      i >= 6 && i % 97 === 0 ? line.replace(/,.*/, ',,,,,,') : line,
    );
    const holes = lines.map((line, i) =>
      i >= 6 && i % 300 < 5 ? line.replace(/,.*/, ',,,,,,') : line,
    );
    const said = faultsOf(holes);
    expect(said.length).toBeLessThanOrEqual(21);
    expect(said.at(-1)).toMatch(/more (faults|cells)/);
  });
  test('a decimal comma in a table parted by commas', () => {
    const lines = stamped.map((line, i) => (i < 6 ? line : line.replaceAll('.', ',')));
    const said = faultsOf(lines);
    expect(said[0]).toContain('column all: found 13 cells, expected 7 cells as in the headings');
    expect(said[0]).toContain('Check that the decimals are points');
  });
  test('an unclosed quotation mark neither hangs nor passes', () => {
    const said = faultsOf(withCell(stamped, 300, 3, '"4.5'));
    expect(said.some((text) => text.includes('quotation mark'))).toBe(true);
  });
});

describe('columns', () => {
  const without = (name: string) => {
    const at = stamped[5].split(',').indexOf(name);
    return stamped.map((line, i) =>
      i < 5
        ? line
        : line
            .split(',')
            .filter((_, k) => k !== at)
            .join(','),
    );
  };
  test('that are missing and needed', () => {
    expect(faultsOf(without('dryBulbC'))[0]).toContain('expected a column of air temperature');
    expect(faultsOf(without('dewPointC'))[0]).toContain(
      'expected a column of dew point or relative humidity',
    );
    expect(faultsOf(without('windMPerS'))[0]).toContain('expected a column of wind speed');
    const noSun = stamped.map((line, i) => (i < 5 ? line : line.split(',').slice(0, 4).join(',')));
    expect(faultsOf(noSun)[0]).toContain('expected a column of global radiation, or two of');
    expect(faultsOf(without('time'))[0]).toContain('expected a column "hour" or "time"');
  });
  test('that come twice', () => {
    const lines = stamped.map((line, i) => (i < 5 ? line : `${line},${line.split(',')[1]}`));
    expect(faultsOf(lines)[0]).toContain(
      'column dryBulbC: found "dryBulbC", expected each heading once',
    );
  });
  test('with a gap of 4 hours are a fault, of 3 are bridged and noted', () => {
    const emptied = (count: number) =>
      stamped.map((line, i) => {
        const cells = line.split(',');
        if (i >= 999 && i < 999 + count) cells[1] = '-9999';
        return cells.join(',');
      });
    expect(faultsOf(emptied(4))).toEqual([
      'valley.csv, row 1000, column dryBulbC: found 4 hours in a row without a value from 11 Feb 09:00, expected gaps of 3 hours at most. Fill in the values from another source, or choose another table.',
    ]);
    const year = yearOf(emptied(3).join('\n'), {});
    const whole = yearOf(stamped.join('\n'), {});
    const h = 999 - 6;
    const [before, after] = [whole.dryBulbC.values[h - 1], whole.dryBulbC.values[h + 3]];
    expect(year.dryBulbC.values[h + 1]).toBeCloseTo((before + after) / 2, 10);
    const note = year.notes.find((one) => one.kind === 'repair');
    expect(note).toEqual({
      kind: 'repair',
      text: 'dryBulbC: 3 missing values in 1 gaps were bridged (rows 1000).',
      count: 3,
    });
  });
});

describe('sites', () => {
  test('that a file states wrongly or not at all are asked for', () => {
    const lines = [...plainLines];
    lines[1] = '# latitudeDeg: 147.5';
    lines.splice(3, 1);
    expect(faultsOf(lines)).toEqual([
      'valley.csv, row 2, column latitudeDeg: found "147.5", expected a number from -90 to 90. Correct the line.',
      "valley.csv, site.latitudeDeg: found no such value in the file, expected the latitude in degrees, north positive, -90 to 90. State the site's latitudeDeg beside the file.",
      "valley.csv, site.elevationM: found no such value in the file, expected the elevation above the sea in metres, -450 to 9000. State the site's elevationM beside the file.",
    ]);
  });
  test('whose clock is on the other side of the world have a sign wrong', () => {
    expect(faultsOf(plainLines, { site: { longitudeDeg: -109 } })[0]).toContain('Check the signs');
  });
  test('a first row of TMY3 that lost its numbers', () => {
    const lines = tmy3Lines();
    lines[0] = 'HILLSIDE';
    expect(faultsOf(lines).length).toBeGreaterThanOrEqual(4);
    expect(faultsOf(lines)[0]).toContain('row 1, column offset from UTC');
  });
});

test('a second table after the footer is not taken for a part of the first', () => {
  const lines = [...pvgisLines(), ...pvgisLines().slice(4, 20)];
  expect(faultsOf(lines)[0]).toContain('expected one table without lines between');
});
