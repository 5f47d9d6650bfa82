import {
  buildingAt,
  type FigureName,
  figureKinds,
  type Influence,
  parseSweep,
  runCount,
  runSweep,
  type SweepResult,
  type SweepRow,
  standingCaution,
  sweepPoints,
} from '../../engine/index.ts';
import { readText } from '../disk/index.ts';
import { textOf } from './arguments.ts';
import type { Command } from './command.ts';
import { need, WrongUsage } from './stop.ts';
import {
  openStudy,
  resultJson,
  runStudyHere,
  studyOptions,
  studyWeathers,
  threadsOf,
} from './study-inputs.ts';
import { listText } from './study-text.ts';
import { addLines, openLines, sweepDigest } from './sweep-lines.ts';
import { figure, table } from './table.ts';

/** Rows that a terminal still shows whole. */
const mostShown = 200;

const figuresOf = ({ sweep }: SweepResult): FigureName[] => [
  ...new Set([...sweep.figures, ...(sweep.front ?? [])]),
];

const cell = (value: unknown): string =>
  typeof value === 'number'
    ? String(Number(value.toPrecision(5)))
    : typeof value === 'string'
      ? value
      : JSON.stringify(value);

function rowTable(result: SweepResult): string {
  const { sweep, front } = result;
  const shown = result.rows.slice(0, mostShown);
  const more = result.rows.length - shown.length;
  const text = table<SweepRow>(
    [
      { head: 'Run', digits: 0, of: (row) => row.index },
      ...sweep.parameters.map((parameter) => ({
        head: parameter.name ?? parameter.id,
        of: (row: SweepRow) => cell(row.values[parameter.id]),
      })),
      ...figuresOf(result).map((name) => ({
        head: figureKinds[name].label,
        unit: figureKinds[name].unit,
        of: (row: SweepRow) => figure(row.figures[name] ?? Number.NaN, figureKinds[name].digits),
      })),
      ...(front
        ? [{ head: 'Front', of: (row: SweepRow) => (front.includes(row.index) ? 'yes' : '') }]
        : []),
    ],
    shown,
  );
  return more > 0 ? `${text}\n… and ${more} more rows; --json or --rows holds all.` : text;
}

function influenceTable(result: SweepResult): string[] {
  const { influences, sweep } = result;
  if (influences.length === 0) return [];
  const name = (id: string) => sweep.parameters.find((one) => one.id === id)?.name ?? id;
  const weight = (one: Influence) => one.effects?.meanAmount ?? one.shares?.total ?? 0;
  const rows = influences.toSorted((a, b) => (a.figure === b.figure ? weight(b) - weight(a) : 0));
  const common = [
    { head: 'Figure', of: (one: Influence) => figureKinds[one.figure].label },
    { head: 'Parameter', of: (one: Influence) => name(one.parameter) },
  ];
  const effects = sweep.sample.kind === 'elementary-effects';
  return [
    effects
      ? `What matters: elementary effects over the whole range (Morris 1991; Campolongo et al. 2007)\n${table<Influence>(
          [
            ...common,
            { head: 'Mean amount', digits: 2, of: (one) => one.effects?.meanAmount ?? Number.NaN },
            { head: 'Mean', digits: 2, of: (one) => one.effects?.mean ?? Number.NaN },
            { head: 'Deviation', digits: 2, of: (one) => one.effects?.deviation ?? Number.NaN },
          ],
          rows,
        )}`
      : `What matters: shares of the variance (Saltelli et al. 2010)\n${table<Influence>(
          [
            ...common,
            { head: 'Alone', digits: 3, of: (one) => one.shares?.first ?? Number.NaN },
            { head: 'With others', digits: 3, of: (one) => one.shares?.total ?? Number.NaN },
          ],
          rows,
        )}`,
  ];
}

export function sweepText(result: SweepResult): string {
  return [
    `${result.project}: ${result.name}, ${result.rows.length} runs. Step: ${result.sweep.stepMinutes} min.`,
    rowTable(result),
    ...influenceTable(result),
    ...listText('Notes', result.notes),
    standingCaution,
  ].join('\n\n');
}

const { step: _, ...options } = studyOptions;

export const sweepCommand: Command = {
  name: 'sweep',
  operand: 'PROJECT',
  second: 'STUDY',
  summary: 'Many runs over ranges and choices: table, front, and which inputs matter.',
  options: {
    ...options,
    rows: {
      value: 'FILE',
      help: 'keep rows there as they come (JSON lines), and go on from what it holds',
    },
    check: { help: 'say how many runs it would be, and run none' },
  },
  examples: [
    'inglenook sweep house.inglenook.json walls.sweep.json',
    'inglenook sweep house.inglenook.json walls.sweep.json --rows walls.jsonl',
    'inglenook sweep house.inglenook.json what-matters.sweep.json --json > out.json',
  ],
  async run(operand, given, terminal, threads, second) {
    if (second === null) throw new WrongUsage('sweep: STUDY is missing.');
    const open = await openStudy('sweep', operand);
    const { text } = need(
      await readText(second, { expected: 'a sweep file', limitBytes: 8_000_000 }),
    );
    const sweep = need(parseSweep(text, second, open.building, open.document));
    const runs = runCount(sweep);
    if (given.check) return terminal.print(`${sweep.name}: ${runs} runs. No faults.`);
    const choosesWeather =
      JSON.stringify(sweep.parameters).includes('weather') ||
      open.building.options.some((option) =>
        option.changes.some((change) => change.path.startsWith('weather')),
      );
    const buildings = choosesWeather
      ? sweepPoints(sweep).flatMap((point) => {
          const made = buildingAt(open.building, open.document, sweep, point, open.file);
          return made.ok ? [made.value] : [];
        })
      : [];
    const { weathers, keyOf, notes } = await studyWeathers(
      open,
      textOf(given, 'weather'),
      buildings,
    );
    const file = textOf(given, 'rows');
    const digest = sweepDigest(
      sweep,
      open.document,
      [...weathers].map(
        ([key, year]) =>
          `${key} ${year.site.name} ${year.dryBulbC.values.join()} ${year.ghiWPerM2.values.join()}`,
      ),
    );
    const known =
      file === null ? new Map<number, SweepRow>() : await openLines(file, sweep, runs, digest);
    if (known.size > 0) terminal.note(`${known.size} of ${runs} runs are there already.`);
    let written: Promise<void> = Promise.resolve();
    const { count } = threadsOf('sweep', given, threads);
    const study = runSweep(open.building, open.document, sweep, {
      file: open.file,
      weatherOf: keyOf,
      known,
      batch: 8 * count,
      onRows: (rows) => {
        if (file !== null) written = written.then(() => addLines(file, rows));
      },
    });
    const found = await runStudyHere('sweep', study, weathers, given, terminal, threads);
    await written;
    const result: SweepResult = { ...found, notes: [...notes, ...found.notes] };
    terminal.print(given.json ? resultJson(result) : sweepText(result));
  },
};
