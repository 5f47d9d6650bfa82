// Every dialect is proposed, then read by its proposal. Reference: the invented values themselves,
// written into the table by the dialect; tolerances are those of the decimals written.
import { describe, expect, test } from 'vitest';
import { detectTable, faultText, readMapped } from '../../../weather/index.ts';
import { dialects, hillside, truth } from './tables.ts';

const startS = Date.UTC(2023, 0, 1) / 1000;

describe.each(dialects)('$name', ({ write }) => {
  test('is proposed and read to the values that were written', () => {
    const text = write();
    const found = detectTable(text, { site: hillside });
    if (found.kind !== 'proposed') throw new Error(JSON.stringify(found).slice(0, 400));
    const read = readMapped(text, found.mapping, { site: hillside });
    if (!read.ok) throw new Error(read.faults.map(faultText).join('\n'));
    const { columns, count, intervalS } = read.value;
    expect(intervalS).toBe(3600);
    expect(count).toBe(8760);
    const isYearless = found.mapping.stamp.parts.some(({ reads }) => reads === 'hourOfYear');
    const begins = isYearless ? Date.UTC(2018, 0, 1) / 1000 : startS;
    expect(read.value.startS[0]).toBe(begins);
    expect(read.value.startS[8759]).toBe(begins + 8759 * 3600);
    const quantities = columns.map(({ quantity }) => quantity);
    expect(quantities).toEqual(expect.arrayContaining(['dryBulbC', 'ghiWPerM2']));
    // A humidity without a name between 55 and 85 could be many things: it is asked for, not guessed.
    if (!quantities.includes('relativeHumidity'))
      expect(found.questions.join()).toContain('Which column holds humidity');
    expect(quantities.includes('relativeHumidity')).toBe(found.mapping.table.headingRow > 0);
    for (const { quantity, values } of columns) {
      if (!(quantity in truth)) throw new Error(`nothing was written for ${quantity}`);
      const wanted = truth[quantity as 'dryBulbC'].values;
      let worst = 0;
      let missing = 0;
      for (let h = 0; h < 8760; h++)
        if (Number.isNaN(values[h])) missing++;
        else worst = Math.max(worst, Math.abs(values[h] - wanted[h]));
      // Three decimals, and once more a whole J/m² an hour: 5e-4 + 0.5 / 3600.
      const digit = { pressurePa: 0.6, relativeHumidity: 6e-5, windFromDeg: 0.51 }[
        quantity as string
      ];
      expect(`${quantity} off by ${worst <= (digit ?? 6.5e-4) ? 'nothing' : worst}`).toBe(
        `${quantity} off by nothing`,
      );
      expect(missing).toBeLessThan(25);
    }
  });
});
