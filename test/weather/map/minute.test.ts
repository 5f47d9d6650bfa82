// A year of minutes: 525,600 rows, about 60 MB. The time is the processor's own, so that a busy machine
// does not fail the test; memory is what the process holds beyond the file's bytes.
import { expect, test } from 'vitest';
import { faultText, type Mapping, readMappedStream } from '../../../weather/index.ts';
import { hillside } from '../invented-year.ts';

const columns = [
  ['t', 'dryBulbC', '°C'],
  ['rh', 'relativeHumidity', '%'],
  ['ws', 'windMPerS', 'm/s'],
  ['wd', 'windFromDeg', '°'],
  ['ghi', 'ghiWPerM2', 'W/m²'],
  ['dhi', 'dhiWPerM2', 'W/m²'],
  ['dni', 'dniWPerM2', 'W/m²'],
  ['p', 'pressurePa', 'hPa'],
] as const;

const mapping: Mapping = {
  format: 'inglenook-weather-mapping',
  version: 1,
  name: 'minutes',
  table: { delimiter: ',', decimal: '.', thousands: '', headingRow: 1, firstRow: 2 },
  stamp: {
    parts: [{ column: 'time', reads: 'dateTime', order: 'ymd' }],
    marks: 'start',
    clock: { kind: 'site' },
  },
  columns: columns.map(([column, quantity, unit]) => ({ column, quantity, unit, stands: 'mean' })),
  missing: [-9999],
  site: hillside,
};

/** The table in pieces of a day, as bytes. */
function minutes(): Uint8Array[] {
  const encode = new TextEncoder();
  const pieces = [encode.encode(`time,${columns.map(([name]) => name).join(',')},status,note\n`)];
  for (let day = 0; day < 365; day++) {
    const date = new Date(Date.UTC(2023, 0, 1 + day)).toISOString().slice(0, 10);
    const lines: string[] = [];
    for (let m = 0; m < 1440; m++) {
      const sun = Math.max(0, 900 * Math.sin(((m - 360) / 720) * Math.PI));
      const clock = `${String(Math.floor(m / 60)).padStart(2, '0')}:${String(m % 60).padStart(2, '0')}:00`;
      const cells = [
        10 + m / 200,
        70 - m / 100,
        3.25,
        210 + (m % 90),
        sun,
        sun * 0.3,
        sun * 0.7,
        957.1,
      ];
      lines.push(
        `${date} ${clock},${cells.map((cell) => cell.toFixed(4)).join(',')},logger on,batt 12.61 V`,
      );
    }
    pieces.push(encode.encode(`${lines.join('\n')}\n`));
  }
  return pieces;
}

test('a year of minutes is read within 3 s of processor time and 400 MB, with progress', async () => {
  const pieces = minutes();
  const bytes = pieces.reduce((sum, piece) => sum + piece.length, 0);
  expect(bytes).toBeGreaterThan(50e6);
  let told = 0;
  let most = 0;
  const before = process.cpuUsage();
  const heldBefore = process.memoryUsage().rss;
  const read = await readMappedStream(pieces, mapping, {
    onProgress: () => {
      told++;
      most = Math.max(most, process.memoryUsage().rss);
    },
  });
  const { user, system } = process.cpuUsage(before);
  if (!read?.ok) throw new Error(read?.faults.map(faultText).join('\n'));
  expect(read.value.count).toBe(525600);
  expect(read.value.intervalS).toBe(60);
  expect(read.value.columns[0].values[1439]).toBeCloseTo(10 + 1439 / 200, 4);
  expect(told).toBe(366);
  console.info(
    `${(bytes / 1e6).toFixed(0)} MB in ${((user + system) / 1e6).toFixed(2)} s of processor time, ${((most - heldBefore) / 1e6).toFixed(0)} MB more held`,
  );
  expect((user + system) / 1e6).toBeLessThan(3);
  expect(most - heldBefore).toBeLessThan(400e6);
});

test('reading stops when it is cancelled, and gives nothing', async () => {
  const pieces = minutes().slice(0, 20);
  let asked = 0;
  const read = await readMappedStream(pieces, mapping, { isCancelled: () => ++asked > 5 });
  expect(read).toBe(null);
  expect(asked).toBe(6);
});
