import {
  type MethodId,
  methodNames,
  type Overheating,
  overheating,
  overheatingDefaults,
  type RoomOverheating,
  standingCaution,
  type TrialResult,
} from '../../engine/index.ts';
import { textOf } from './arguments.ts';
import type { Command } from './command.ts';
import { openWeather } from './inputs.ts';
import { WrongUsage } from './stop.ts';
import {
  choiceOf,
  openStudy,
  resultJson,
  runStudyHere,
  stepOf,
  studyOptions,
  studyWeathers,
} from './study-inputs.ts';
import { listText, uncertaintyText } from './study-text.ts';
import { figure, table } from './table.ts';

const methodIds = Object.keys(methodNames) as MethodId[];

function methodsOf(text: string | null): readonly MethodId[] {
  if (text === null) return overheatingDefaults.methods;
  return text.split(',').map((one) => {
    const found = methodIds.find((id) => id === one.trim());
    if (found) return found;
    throw new WrongUsage(
      `overheating: --criteria: found "${one}", expected a list out of ${methodIds.join(', ')}.`,
    );
  });
}

const verdictText = (room: RoomOverheating): string => {
  if (!room.judged) return 'not judged';
  return room.passed ? 'passes' : 'fails';
};

function criteriaTable(result: Overheating): string {
  const rows = result.rooms.flatMap((room) =>
    room.verdicts.flatMap((verdict) => verdict.criteria.map((one) => ({ room, verdict, one }))),
  );
  type Row = (typeof rows)[number];
  return table<Row>(
    [
      { head: 'Room', of: ({ room }) => room.name },
      { head: 'Method', of: ({ verdict }) => methodNames[verdict.method] },
      { head: 'Criterion', of: ({ one }) => one.name },
      {
        head: 'Found',
        of: ({ one }) =>
          `${figure(one.found, 1)}${one.uncertainty === null ? '' : ` ±${uncertaintyText(one.uncertainty, 1)}`}`,
      },
      { head: 'At most', of: ({ one }) => figure(one.limit, 1) },
      { head: '', of: ({ one }) => one.unit },
      {
        head: 'Verdict',
        of: ({ one }) =>
          one.atLimit
            ? 'at the limit, within ±'
            : one.met
              ? 'met'
              : `missed by ${figure(one.by, 1)}`,
      },
    ],
    rows,
  );
}

function roomTable(rooms: readonly RoomOverheating[]): string {
  return table<RoomOverheating>(
    [
      { head: 'Room', of: (room) => room.name },
      { head: 'Verdict', of: verdictText },
      { head: 'Highest', unit: '°C operative', digits: 1, of: (room) => room.highestOperativeC },
      { head: 'at', of: (room) => room.highestAt.slice(5).replace('T', ' ') },
      { head: 'Above band', unit: 'h', digits: 0, of: (room) => room.hoursAboveBand },
      { head: '', unit: 'K·h', digits: 0, of: (room) => room.degreeHoursAbove },
      { head: 'Nights over 26 °C', unit: 'h', digits: 0, of: (room) => room.hotNightHours },
      { head: 'Worst week', of: (room) => room.worst?.from ?? '–' },
      {
        head: 'Driven by',
        unit: 'kWh on hot days',
        of: ({ drivers }) =>
          drivers
            ? `${drivers.main}: ${Object.entries(drivers.kWh)
                .map(([name, kWh]) => `${name} ${figure(kWh, 0)}`)
                .join(', ')}`
            : '–',
      },
    ],
    rooms,
  );
}

function trialTable(result: Overheating): string[] {
  if (result.trials.length === 0) return [];
  return [
    `What would cure it, by trial runs on the rooms that fail\n${table<TrialResult>(
      [
        { head: 'Change', of: (one) => one.name },
        { head: 'Rooms that fail', digits: 0, of: (one) => one.roomsFailing.length },
        { head: 'Left above limits', unit: 'shares', digits: 2, of: (one) => one.severity },
        { head: 'Heating', unit: 'kWh', digits: 0, of: (one) => one.heatingKWh },
        { head: '', of: (one) => (one.id === result.cure ? 'cures it' : '') },
      ],
      [result.base, ...result.trials],
    )}`,
  ];
}

export function overheatingText(result: Overheating): string {
  return [
    `${result.project}: overheating by ${result.methods.join(' and ')}. Weather: ${result.weather}. Step: ${result.options.stepMinutes} min.`,
    roomTable(result.rooms),
    criteriaTable(result),
    ...trialTable(result),
    ...listText(
      'Other weather',
      result.otherWeathers.map(
        (one) =>
          `${one.weather} (${one.place}): ${one.roomsFailing.length === 0 ? 'no room fails' : `fail: ${one.roomsFailing.join(', ')}`}.`,
      ),
    ),
    ...listText('Notes', result.notes),
    ...listText('Cautions', [...result.cautions, standingCaution]),
  ].join('\n\n');
}

export const overheatingCommand: Command = {
  name: 'overheating',
  operand: 'PROJECT',
  summary:
    'Every room against published criteria; the worst week, its causes, and what would cure it.',
  options: {
    ...studyOptions,
    criteria: { value: 'LIST', help: `out of ${methodIds.join(', ')}; tm52 without it` },
    region: { value: 'REGION', help: 'summer region of DIN 4108-2: A, B (without it) or C' },
    use: { value: 'USE', help: 'dwelling (without it) or other, for DIN 4108-2' },
    'more-weather': { value: 'FILES', help: 'further weather tables, separated by commas' },
    accuracy: { value: 'CHECK', help: 'uncertainty: coarser (without it), finer or none' },
    'no-trials': { help: 'leave out the trial runs' },
  },
  examples: [
    'inglenook overheating house.inglenook.json',
    'inglenook overheating house.inglenook.json --criteria tm59,din-4108-2 --region C',
    'inglenook overheating house.inglenook.json --more-weather warm-year.csv,hot-year.csv --json',
  ],
  async run(operand, given, terminal, threads) {
    const open = await openStudy('overheating', operand);
    const stepMinutes = stepOf('overheating', given);
    const methods = methodsOf(textOf(given, 'criteria'));
    const region = choiceOf('overheating', given, 'region', ['A', 'B', 'C']);
    const use = choiceOf('overheating', given, 'use', ['dwelling', 'other']);
    const accuracy = choiceOf('overheating', given, 'accuracy', ['none', 'coarser', 'finer']);
    const read = await studyWeathers(open, textOf(given, 'weather'));
    const weathers = new Map(read.weathers);
    const others = textOf(given, 'more-weather')?.split(',') ?? [];
    for (const file of others)
      weathers.set(file, (await openWeather(file, open.building.weather?.site ?? null)).year);
    const study = overheating(open.building, read.main, {
      ...overheatingDefaults,
      weathers: [read.mainKey, ...others],
      stepMinutes,
      methods,
      region: region ?? overheatingDefaults.region,
      dwelling: use !== 'other',
      accuracy: accuracy ?? overheatingDefaults.accuracy,
      trials: given['no-trials'] !== true,
    });
    const found = await runStudyHere('overheating', study, weathers, given, terminal, threads);
    const result: Overheating = { ...found, notes: [...read.notes, ...found.notes] };
    terminal.print(given.json ? resultJson(result) : overheatingText(result));
  },
};
