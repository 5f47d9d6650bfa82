// The file in which a sweep keeps its rows: one JSON object a line, the first saying which sweep of
// which project and weather it is. A line that was cut off when the sweep was stopped is left out, and
// that run is done again.
import { createHash } from 'node:crypto';
import { appendFile, readFile, writeFile } from 'node:fs/promises';
import type { Json, Sweep, SweepRow } from '../../engine/index.ts';
import { InputFaults } from './stop.ts';

interface Head {
  readonly format: 'inglenook-sweep-rows';
  readonly version: 1;
  readonly sweep: string;
  readonly runs: number;
  /** Of the sweep, the project and the weather: rows of anything else are not taken over. */
  readonly sha256: string;
}

export function sweepDigest(sweep: Sweep, document: Json, weathers: readonly string[]): string {
  return createHash('sha256')
    .update(JSON.stringify([sweep, document, weathers]))
    .digest('hex');
}

const headOf = (sweep: Sweep, runs: number, sha256: string): Head => ({
  format: 'inglenook-sweep-rows',
  version: 1,
  sweep: sweep.name,
  runs,
  sha256,
});

/** Rows that are there already; begins the file where there is none. */
export async function openLines(
  file: string,
  sweep: Sweep,
  runs: number,
  sha256: string,
): Promise<Map<number, SweepRow>> {
  let text: string;
  try {
    text = await readFile(file, 'utf8');
  } catch (error) {
    if (!(error instanceof Error) || Reflect.get(error, 'code') !== 'ENOENT')
      throw refused(file, error);
    text = '';
  }
  if (text === '') {
    try {
      await writeFile(file, `${JSON.stringify(headOf(sweep, runs, sha256))}\n`);
    } catch (error) {
      throw refused(file, error);
    }
    return new Map();
  }
  const [first, ...lines] = text.split('\n');
  const head = parsed(first);
  if (Reflect.get(head ?? {}, 'sha256') !== sha256)
    throw new InputFaults([
      {
        file,
        place: { row: 1, column: 'sha256' },
        found: 'rows of another sweep, project or weather',
        expected: 'rows of this one',
        mend: 'Name another file with --rows, or delete this one to begin anew.',
      },
    ]);
  const rows = new Map<number, SweepRow>();
  for (const line of lines) {
    const row = parsed(line) as SweepRow | null;
    if (row && Number.isInteger(row.index) && row.index >= 0 && row.index < runs)
      rows.set(row.index, row);
  }
  const cut = !text.endsWith('\n');
  if (cut) await appendFile(file, '\n'); // what was cut off stands alone
  return rows;
}

export async function addLines(file: string, rows: readonly SweepRow[]): Promise<void> {
  await appendFile(file, rows.map((row) => `${JSON.stringify(row)}\n`).join(''));
}

function parsed(line: string): object | null {
  try {
    const value: unknown = JSON.parse(line);
    return typeof value === 'object' ? value : null;
  } catch {
    return null;
  }
}

function refused(file: string, error: unknown): InputFaults {
  const reason = error instanceof Error ? error.message.replace(/^[A-Z]+: /, '') : String(error);
  return new InputFaults([
    {
      file,
      place: { path: '' },
      found: reason,
      expected: 'a file that can be written',
      mend: 'Name another file with --rows.',
    },
  ]);
}
