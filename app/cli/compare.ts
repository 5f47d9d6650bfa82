import {
  type CaseResult,
  type Comparison,
  compare,
  comparedCases,
  type FigureName,
  figureKinds,
  figureNames,
  sortedCases,
  standingCaution,
} from '../../engine/index.ts';
import { textOf } from './arguments.ts';
import type { Command } from './command.ts';
import { InputFaults } from './stop.ts';
import {
  choiceOf,
  openStudy,
  resultJson,
  runStudyHere,
  stepOf,
  studyOptions,
  studyWeathers,
} from './study-inputs.ts';
import { differenceText, listText, orDash } from './study-text.ts';
import { figure, table } from './table.ts';

const sortKeys = [...figureNames, 'netPresentValue', 'simplePaybackYears', 'name'] as const;

/** "insulation+blinds,insulation+glass" → lists of ids. */
const combinationsOf = (text: string | null): string[][] =>
  text === null ? [] : text.split(',').map((one) => one.split('+').map((id) => id.trim()));

/** Figures that are not 0 in every case. */
function shownFigures(cases: readonly CaseResult[]): FigureName[] {
  return figureNames.filter((name) =>
    cases.some((one) => one.building[name] !== undefined && one.building[name].value !== 0),
  );
}

function caseTable(comparison: Comparison): string {
  const { cases } = comparison;
  const columns = shownFigures(cases).map((name) => {
    const { label, unit, digits } = figureKinds[name];
    return {
      head: label,
      unit,
      of: (one: CaseResult) => {
        const value = figure(one.building[name]?.value ?? Number.NaN, digits);
        return one.id === 'base'
          ? value
          : `${value} (${differenceText(one.building[name], digits)})`;
      },
    };
  });
  return table<CaseResult>([{ head: 'Case', of: (one) => one.name }, ...columns], cases);
}

function moneyTable({ cases, currency, economics }: Comparison): string[] {
  const priced = cases.filter((one) => one.economy !== null);
  if (priced.length === 0) return [];
  const of =
    (pick: (economy: NonNullable<CaseResult['economy']>) => number | null, digits: number) =>
    (one: CaseResult) =>
      one.economy ? orDash(pick(one.economy), digits) : '–';
  const npv = (one: CaseResult) => {
    const sure = one.economy?.netPresentValueUncertainty;
    const text = of((economy) => economy.netPresentValue, 0)(one);
    return typeof sure === 'number' ? `${text} ±${figure(sure, 0)}` : text;
  };
  return [
    `Money in ${currency || 'the currency of the prices'}; net present value over ${economics.years} years at ${figure(economics.discountShare * 100, 1)} %, prices rising ${figure(economics.priceRiseShare * 100, 1)} % a year\n${table<CaseResult>(
      [
        { head: 'Case', of: (one) => one.name },
        { head: 'Cost', of: of((economy) => economy.measureCost, 0) },
        { head: 'Saving', unit: 'a year', of: of((economy) => economy.savingPerYear, 0) },
        {
          head: 'Simple payback',
          unit: 'years',
          of: of((economy) => economy.simplePaybackYears, 1),
        },
        { head: 'Net present value', of: npv },
      ],
      priced,
    )}`,
  ];
}

function roomTable(comparison: Comparison): string {
  const rows = comparison.cases.flatMap((one) =>
    one.rooms.map((room) => ({ ...room, case: one.name, isBase: one.id === 'base' })),
  );
  type Row = (typeof rows)[number];
  const column = (name: FigureName) => ({
    head: figureKinds[name].label,
    unit: figureKinds[name].unit,
    of: (row: Row) => {
      const { digits } = figureKinds[name];
      const value = figure(row.figures[name]?.value ?? Number.NaN, digits);
      return row.isBase ? value : `${value} (${differenceText(row.figures[name], digits)})`;
    },
  });
  return table<Row>(
    [
      { head: 'Case', of: (row) => row.case },
      { head: 'Room', of: (row) => row.name },
      column('heatingKWh'),
      column('peakHeatingW'),
      column('hoursBelowBand'),
      column('hoursAboveBand'),
      column('highestOperativeC'),
    ],
    rows,
  );
}

export function comparisonText(comparison: Comparison, rooms: boolean): string {
  const changes = comparison.cases.flatMap((one) =>
    listText(one.name, [...one.changes, ...one.consequences, ...(one.note ? [one.note] : [])]),
  );
  return [
    `${comparison.project}: base and ${comparison.cases.length - 1} case(s). Step: ${comparison.stepMinutes} min.`,
    ...(changes.length > 0 ? [`What changed\n${changes.join('\n')}`] : []),
    caseTable(comparison),
    ...moneyTable(comparison),
    ...(rooms ? [roomTable(comparison)] : []),
    comparison.accuracy
      ? `In brackets the difference from the base and its numerical uncertainty, ${comparison.accuracy};\n"within" where the difference is no more than that. It says nothing of the inputs.`
      : 'In brackets the difference from the base; its uncertainty was not asked for (--accuracy).',
    ...listText('Notes', comparison.notes),
    ...listText('Cautions', [
      ...new Set(
        comparison.cases.flatMap((one) => one.cautions.map((text) => `${one.name}. ${text}`)),
      ),
      standingCaution,
    ]),
  ].join('\n\n');
}

export const compareCommand: Command = {
  name: 'compare',
  operand: 'PROJECT',
  summary: 'Base and all options side by side: energy, cost, comfort, payback, and what changed.',
  options: {
    ...studyOptions,
    combine: { value: 'IDS', help: 'options to take together as well: a+b, or several a+b,a+c' },
    accuracy: {
      value: 'CHECK',
      help: 'how to find the uncertainty: coarser (quick, without it), finer or none',
    },
    sort: { value: 'FIGURE', help: 'put cases in order, e.g. heatingKWh, cost, netPresentValue' },
    rooms: { help: 'also every room of every case' },
  },
  examples: [
    'inglenook compare house.inglenook.json',
    'inglenook compare house.inglenook.json --combine wall-120+study-shade --sort netPresentValue',
    'inglenook compare house.inglenook.json --accuracy finer --json > options.json',
  ],
  async run(operand, given, terminal, threads) {
    const open = await openStudy('compare', operand);
    const stepMinutes = stepOf('compare', given);
    const accuracy = choiceOf('compare', given, 'accuracy', ['none', 'coarser', 'finer']);
    const sort = choiceOf('compare', given, 'sort', sortKeys);
    const combinations = combinationsOf(textOf(given, 'combine'));
    const { cases, faults } = comparedCases(open.building, open.document, open.file, combinations);
    if (faults.length > 0) throw new InputFaults(faults);
    const buildings = cases.map((one) => one.building);
    const { weathers, keyOf, notes } = await studyWeathers(
      open,
      textOf(given, 'weather'),
      buildings,
    );
    const study = compare(cases, {
      stepMinutes,
      accuracy: accuracy ?? 'coarser',
      weatherOf: keyOf,
    });
    const found = await runStudyHere('compare', study, weathers, given, terminal, threads);
    const result: Comparison = {
      ...found,
      notes: [
        ...notes,
        ...found.notes,
        ...(cases.length === 1 ? ['The project has no options.'] : []),
      ],
      cases: sort ? sortedCases(found.cases, sort) : found.cases,
    };
    terminal.print(given.json ? resultJson(result) : comparisonText(result, given.rooms === true));
  },
};
