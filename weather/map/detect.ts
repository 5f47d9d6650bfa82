// A table that nobody described → a proposed mapping, with the reason and the confidence of every
// guess, for a person to confirm. Nothing here is used for a run before that.
import type { Fault } from '../fault.ts';
import { FaultList } from '../read/fault-list.ts';
import { headingKey } from '../read/form.ts';
import { knownForm, notText } from '../read/recognise.ts';
import type { Site } from '../weather-year.ts';
import { cellsOf } from './cells.ts';
import { type ColumnGuess, detectColumns } from './detect-columns.ts';
import { clockIn, siteIn } from './detect-site.ts';
import { detectStamp } from './detect-stamp.ts';
import { detectLayout } from './detect-table.ts';
import { type Mapping, mappingFormat, mappingVersion, quantityWords } from './mapping.ts';
import { type Sample, sampleOf } from './sample.ts';
import { settleMarks } from './settle-marks.ts';
import { tableShape } from './shape.ts';

/** One thing that was found out about a table. */
export interface DetectedFact {
  readonly topic:
    | 'divider'
    | 'decimal mark'
    | 'headings'
    | 'stamp'
    | 'marks'
    | 'clock'
    | 'missing codes'
    | 'place'
    | 'encoding';
  readonly value: string;
  readonly confidence: number;
  readonly reason: string;
}

export interface Preview {
  readonly headings: readonly string[];
  readonly first: readonly (readonly string[])[];
  readonly last: readonly (readonly string[])[];
}

export interface Proposed {
  readonly kind: 'proposed';
  readonly mapping: Mapping;
  readonly facts: readonly DetectedFact[];
  readonly columns: readonly ColumnGuess[];
  /** What should be confirmed or is still lacking before the table is used, as sentences. */
  readonly questions: readonly string[];
  readonly preview: Preview;
  readonly shape: string;
  readonly intervalS: number;
}

export type Detected =
  | Proposed
  /** A data set that is read without a mapping. */
  | { readonly kind: 'known'; readonly form: string }
  | { readonly kind: 'refused'; readonly faults: readonly Fault[] };

export interface DetectOptions {
  readonly file?: string;
  /** Goes before what the table states. */
  readonly site?: Partial<Site>;
}

/** Confidence below which a guess is a question. */
export const sureConfidence = 0.6;

/** Looks at a table's text or bytes, in samples from all over it. */
export function detectTable(source: string | Uint8Array, options: DetectOptions = {}): Detected {
  const file = options.file ?? 'weather table';
  const sample = sampleOf(source);
  const known = knownForm(sample.head);
  if (known !== null) return { kind: 'known', form: known };
  const faults = new FaultList(file);
  const refused = (found: string, expected: string, mend: string): Detected => {
    faults.whole(found, expected, mend);
    return { kind: 'refused', faults: faults.list() };
  };
  const text = sample.head.join('\n');
  const complaint = notText(text);
  if (complaint) return refused(complaint.found, 'a table as text', complaint.mend);
  if (text.trim() === '')
    return refused('an empty file', 'a weather table', 'Choose a file that holds the table.');
  const layout = detectLayout(sample);
  if (layout === null)
    return refused(
      'lines that no comma, semicolon, tab, bar or blank parts into columns',
      'a table, one row a line, with numbers',
      'Save the table as CSV, or write a mapping by hand.',
    );
  const { table, decimal, headings, units, rows, columnCount } = layout;
  const stamp = detectStamp(rows, headings, table.value);
  if (stamp === null)
    return refused(
      `no column that tells the time, in rows like "${(rows[0] ?? []).slice(0, 6).join(' | ').slice(0, 80)}"`,
      'date and hour in one column or several, in rows that follow evenly (1 minute to 3 hours)',
      'Check that the table has a date, that its rows follow in time, or write a mapping by hand.',
    );
  const above = sample.head.slice(0, table.value.firstRow - 1);
  const preamble = above.slice(0, Math.max(0, table.value.headingRow - 1));
  const found = detectColumns(
    rows,
    headings,
    units,
    columnCount,
    stamp.used,
    table.value,
    stamp.intervalS,
  );
  const site = { ...siteIn(preamble), ...(options.site ?? {}) };
  const stampHeads = [...stamp.used].map((at) => headings[at] ?? '');
  const clock = clockIn(preamble, stampHeads, stamp.statesOffset);
  const shape = tableShape(table.value.delimiter, headings, units, columnCount);
  const named = (guess: ColumnGuess) =>
    guess.heading !== '' &&
    headings.filter((one) => headingKey(one) === headingKey(guess.heading)).length === 1
      ? guess.heading
      : guess.number;
  const proposal: Mapping = {
    format: mappingFormat,
    version: mappingVersion,
    name: site.name || 'my table',
    shape,
    table: table.value,
    stamp: { ...stamp.stamp, marks: stamp.marks.value, clock: clock.value },
    columns: found.columns.flatMap((guess) =>
      guess.quantity === null || guess.unit === null
        ? []
        : [
            {
              column: named(guess),
              quantity: guess.quantity,
              unit: guess.unit,
              stands: guess.stands,
            },
          ],
    ),
    missing: found.missing,
    site,
  };
  const byLight =
    stamp.marks.confidence < 0.9 ? settleMarks(source, proposal, site, stamp.intervalS) : null;
  const marks = byLight ?? stamp.marks;
  const mapping: Mapping = { ...proposal, stamp: { ...proposal.stamp, marks: marks.value } };
  const facts: DetectedFact[] = [
    {
      topic: 'divider',
      value: table.value.delimiter,
      confidence: table.confidence,
      reason: table.reason,
    },
    {
      topic: 'decimal mark',
      value: decimal.value,
      confidence: decimal.confidence,
      reason: decimal.reason,
    },
    {
      topic: 'headings',
      value: table.value.headingRow === 0 ? 'none' : `row ${table.value.headingRow}`,
      confidence: table.confidence,
      reason: table.reason,
    },
    {
      topic: 'stamp',
      value: mapping.stamp.parts.map(({ reads }) => reads).join(' + '),
      confidence: stamp.parts.confidence,
      reason: stamp.parts.reason,
    },
    {
      topic: 'marks',
      value: `${marks.value} of the interval`,
      confidence: marks.confidence,
      reason: marks.reason,
    },
    {
      topic: 'clock',
      value: clockText(mapping),
      confidence: clock.confidence,
      reason: clock.reason,
    },
    {
      topic: 'missing codes',
      value: found.missing.join(', ') || 'empty cells',
      confidence: 0.8,
      reason: found.missing.length > 0 ? 'outside what the columns can be' : 'no odd values seen',
    },
    {
      topic: 'place',
      value: placeText(site),
      confidence: site.latitudeDeg === undefined ? 0 : 0.9,
      reason: site.latitudeDeg === undefined ? 'the table states none' : 'as stated',
    },
    {
      topic: 'encoding',
      value: sample.encoding,
      confidence: sample.encoding === 'Windows-1252' ? 0.8 : 1,
      reason: 'by the bytes',
    },
  ];
  return {
    kind: 'proposed',
    mapping,
    facts,
    columns: found.columns,
    questions: questionsOf(mapping, facts, found.columns),
    preview: previewOf(sample, rows, headings, mapping),
    shape,
    intervalS: stamp.intervalS,
  };
}

function clockText({ stamp: { clock } }: Mapping): string {
  if (clock.kind === 'site') return 'local standard time of the site';
  if (clock.kind === 'zone') return `civil time of ${clock.zone}`;
  return `UTC${clock.utcOffsetH < 0 ? '−' : '+'}${Math.abs(clock.utcOffsetH)}`;
}

function placeText({ latitudeDeg, longitudeDeg, elevationM }: Partial<Site>): string {
  const parts = [latitudeDeg, longitudeDeg, elevationM].map((value) =>
    value === undefined ? '?' : String(value),
  );
  return `${parts[0]}°, ${parts[1]}°, ${parts[2]} m`;
}

function questionsOf(
  mapping: Mapping,
  facts: readonly DetectedFact[],
  columns: readonly ColumnGuess[],
): string[] {
  const questions = facts
    .filter(({ topic, confidence }) => confidence < sureConfidence && topic !== 'place')
    .map(
      ({ topic, value, reason }) =>
        `Is the ${topic} right: ${value === '\t' ? 'tab' : value}? (${reason})`,
    );
  for (const { heading, number, quantity, unit, confidence, reasons } of columns) {
    if (confidence >= sureConfidence) continue;
    const name = heading === '' ? `column ${number}` : `"${heading}" (column ${number})`;
    questions.push(
      quantity === null
        ? `Is ${name} rightly left out? (${reasons.join('; ')})`
        : `Is ${name} ${quantityWords[quantity]} in ${unit}? (${reasons.join('; ')})`,
    );
  }
  const has = (...names: string[]) =>
    mapping.columns.some(({ quantity }) => names.includes(quantity));
  if (!has('dryBulbC')) questions.push('Which column holds the air temperature?');
  if (!has('dewPointC', 'relativeHumidity', 'wetBulbC', 'humidityRatio', 'vapourPressurePa'))
    questions.push(
      'Which column holds humidity (relative, dew point, wet bulb, ratio or vapour pressure)?',
    );
  if (!has('ghiWPerM2', 'dniWPerM2', 'dhiWPerM2', 'beamHorizontalWPerM2'))
    questions.push('Which column holds the sun (global, direct or diffuse)?');
  const site = mapping.site ?? {};
  const lacking = (['latitudeDeg', 'longitudeDeg', 'elevationM', 'utcOffsetH'] as const).filter(
    (field) =>
      site[field] === undefined && !(field === 'utcOffsetH' && mapping.stamp.clock.kind !== 'site'),
  );
  if (lacking.length > 0)
    questions.push(`Where was it measured? ${lacking.join(', ')} to be given.`);
  return questions;
}

const previewRows = 3;

function previewOf(
  sample: Sample,
  rows: readonly (readonly string[])[],
  headings: readonly string[],
  mapping: Mapping,
): Preview {
  const tail = (sample.isWhole ? sample.head : (sample.runs.at(-1) ?? []))
    .filter((line) => line.trim() !== '')
    .slice(-previewRows)
    .map((line) => cellsOf(line, mapping.table.delimiter));
  return { headings, first: rows.slice(0, previewRows), last: tail };
}

/** Of saved mappings those that were made for tables of this shape. */
export function mappingsFor(shape: string, saved: readonly Mapping[]): readonly Mapping[] {
  return saved.filter((mapping) => mapping.shape === shape);
}
