// What is found out about a table of no known form, and the mapping that it proposes.

import {
  type Detected,
  detectTable,
  type Proposed,
  quantityWords,
  type Site,
} from '../../weather/index.ts';
import { writeFileWhole } from '../disk/index.ts';
import { InputFaults, need, WrongUsage } from './stop.ts';
import { table, wrap } from './table.ts';
import type { Terminal } from './terminal.ts';
import { readTableBytes } from './weather-reading.ts';

const sure = (confidence: number) => `${Math.round(confidence * 100)} %`;
const show = (text: string) => (text === '\t' ? 'tab' : text === ' ' ? 'blanks' : text);

function proposalText(found: Proposed): string {
  const { facts, columns, preview, questions } = found;
  const width = Math.min(10, Math.max(...preview.first.map((row) => row.length)));
  const rows = [...preview.first, Array.from({ length: width }, () => '…'), ...preview.last];
  const heads = Array.from({ length: width }, (_, k) => preview.headings[k] ?? `${k + 1}`);
  return [
    table(
      [
        { head: 'Found', of: (row) => row.topic },
        { head: 'As', of: (row) => show(row.value) },
        { head: 'Sure', of: (row) => sure(row.confidence) },
        { head: 'Because', of: (row) => row.reason },
      ],
      facts,
    ),
    table(
      [
        { head: 'Column', of: (row) => String(row.number) },
        { head: 'Heading', of: (row) => row.heading || '–' },
        {
          head: 'Taken for',
          of: (row) => (row.quantity === null ? 'left out' : quantityWords[row.quantity]),
        },
        { head: 'Unit', of: (row) => row.unit ?? '' },
        { head: 'Sure', of: (row) => sure(row.confidence) },
        { head: 'Because', of: (row) => row.reasons.join('; ') },
      ],
      columns,
    ),
    table(
      heads.map((head, k) => ({
        head: head.slice(0, 20),
        of: (row: readonly string[]) => (row[k] ?? '').slice(0, 20),
      })),
      rows,
    ),
    questions.length > 0
      ? `To be confirmed, in the mapping or with --site:\n${questions.map((one) => wrap(`- ${one}`)).join('\n')}`
      : 'Nothing is left to be asked.',
  ].join('\n\n');
}

/** Looks at a table and writes the mapping that it proposes. */
export async function makeMapping(
  file: string,
  out: string,
  site: Partial<Site> | null,
  wantsJson: boolean,
  terminal: Terminal,
): Promise<void> {
  const { data } = await readTableBytes(file);
  const found: Detected = detectTable(data, site ? { file, site } : { file });
  if (found.kind === 'refused') throw new InputFaults(found.faults);
  if (found.kind === 'known')
    throw new WrongUsage(`weather: ${file} is a ${found.form} and is read without a mapping.`);
  need(await writeFileWhole(out, `${JSON.stringify(found.mapping, null, 2)}\n`));
  if (wantsJson) return terminal.print(JSON.stringify(found, null, 2));
  terminal.print(proposalText(found));
  terminal.note(
    `Written to ${out}. Read the table by it with: inglenook weather ${file} --mapping ${out}`,
  );
}
