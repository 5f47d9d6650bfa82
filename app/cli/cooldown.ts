import {
  type Cooldown,
  type CooldownLimit,
  cooldown,
  type RoomCooldown,
  standingCaution,
  usualLimits,
} from '../../engine/index.ts';
import { textOf } from './arguments.ts';
import type { Command } from './command.ts';
import { dayOfMonth } from './day-of-year.ts';
import { WrongUsage } from './stop.ts';
import {
  choiceOf,
  numberOf,
  openStudy,
  resultJson,
  runStudyHere,
  stepOf,
  studyOptions,
  studyWeathers,
} from './study-inputs.ts';
import { listText, orDash } from './study-text.ts';
import { figure, table } from './table.ts';

function roomTable(result: Cooldown): string {
  const limits = result.options.limits.map(({ limitC }, l) => ({
    head: `to ${limitC} °C`,
    unit: 'h, air',
    of: (room: RoomCooldown) => orDash(room.limits[l].airAfterH, 1),
  }));
  return table<RoomCooldown>(
    [
      { head: 'Room', of: (room) => room.name },
      { head: 'At off', unit: '°C', digits: 1, of: (room) => room.startC },
      ...limits,
      {
        head: `At ${result.backAt.slice(5).replace('T', ' ')}`,
        unit: '°C, unheated',
        of: (room) => orDash(room.airAtBackC, 1),
      },
      { head: 'Lowest', unit: '°C', digits: 1, of: (room) => room.lowestAirC },
      { head: 'Would end at', unit: '°C', digits: 1, of: (room) => room.endC },
      { head: 'Decay', unit: 'h', of: (room) => orDash(room.decayTimeConstantH, 1) },
      { head: 'Coldest surface', of: (room) => room.coldestSurface },
    ],
    result.rooms,
  );
}

function warmUpTable(result: Cooldown): string[] {
  if (result.warmUps.length === 0) return [];
  type Row = Cooldown['warmUps'][number];
  const name = (id: string) => result.rooms.find((room) => room.room === id)?.name ?? id;
  return [
    `Power to be warm by ${result.backAt.replace('T', ' ')}${Number.isFinite(result.presentW) ? `; present heaters ${figure(result.presentW, 0)} W` : ''}\n${table<Row>(
      [
        { head: 'On at', of: (row) => row.onAt.slice(5).replace('T', ' ') },
        { head: 'Before', unit: 'h', digits: 1, of: (row) => row.hours },
        { head: 'Together', unit: 'W', digits: 0, of: (row) => row.totalW },
        {
          head: 'Rooms short of power',
          of: (row) => row.shortRooms.map(name).join(', ') || 'none',
        },
      ],
      result.warmUps,
    )}`,
  ];
}

export function cooldownText(result: Cooldown): string {
  const { outdoor } = result;
  const constants = result.timeConstantsH
    ? [
        `Time constants of the network, slowest first: ${result.timeConstantsH
          .slice(0, 6)
          .map((h) => figure(h, 1))
          .join(', ')} h.`,
      ]
    : [];
  return [
    `${result.project}: heating off ${result.offAt.replace('T', ' ')}, outdoors ${figure(outdoor.minC, 1)} to ${figure(outdoor.maxC, 1)} °C, mean ${figure(outdoor.meanC, 1)} °C. Step: ${result.stepMinutes} min.`,
    roomTable(result),
    ...constants,
    ...warmUpTable(result),
    ...listText('Notes', result.notes),
    ...listText('Cautions', [...result.cautions, standingCaution]),
  ].join('\n\n');
}

/** "frost=5,store=10" or "5,10". */
function limitsOf(text: string | null): readonly CooldownLimit[] {
  if (text === null) return usualLimits;
  return text.split(',').map((one) => {
    const [first, second] = one.split('=');
    const limitC = Number(second ?? first);
    if (one.trim() === '' || !(limitC >= -50 && limitC <= 60))
      throw new WrongUsage(
        `cooldown: --limits: found "${one}", expected temperatures from -50 to 60 °C as 16,5 or named as frost=5.`,
      );
    return { name: second === undefined ? `${limitC} °C` : first, limitC };
  });
}

export const cooldownCommand: Command = {
  name: 'cooldown',
  operand: 'PROJECT',
  summary: 'Heating off at a chosen hour: how fast, how cold, time to a limit; warm-up power.',
  options: {
    ...studyOptions,
    mode: { value: 'MODE', help: 'overnight (without it), weekend or holiday' },
    day: {
      value: 'MM-DD',
      help: 'day of switching off; without it the coldest spell of the table',
    },
    off: { value: 'HOUR', help: 'hour of switching off, 0 to 24' },
    hours: { value: 'H', help: 'how long to look, hours' },
    back: { value: 'H', help: 'hours from off until the rooms must be warm again' },
    outdoor: { value: 'C', help: 'a design spell: steady outdoor temperature, no sun' },
    limits: { value: 'LIST', help: 'temperatures to reach: 16,5 or frost=5,store=10' },
  },
  examples: [
    'inglenook cooldown house.inglenook.json',
    'inglenook cooldown house.inglenook.json --mode holiday --outdoor -10 --limits frost=5',
    'inglenook cooldown house.inglenook.json --day 01-16 --off 21 --back 9 --json',
  ],
  async run(operand, given, terminal, threads) {
    const open = await openStudy('cooldown', operand);
    const stepMinutes = stepOf('cooldown', given);
    const mode = choiceOf('cooldown', given, 'mode', ['overnight', 'weekend', 'holiday']);
    const limits = limitsOf(textOf(given, 'limits'));
    const number = (name: string, range: readonly [number, number], unit: string) =>
      numberOf('cooldown', given, name, range, unit);
    const offAtH = number('off', [0, 24], 'h');
    const hours = number('hours', [1, 2000], 'h');
    const backAfterH = number('back', [0.25, 2000], 'h');
    const designOutdoorC = number('outdoor', [-60, 40], '°C');
    const { weathers, main, mainKey, notes } = await studyWeathers(open, textOf(given, 'weather'));
    const study = cooldown(open.building, main, {
      weather: mainKey,
      stepMinutes,
      mode: mode ?? 'overnight',
      day: dayOfMonth('cooldown', textOf(given, 'day'), main.hours / 24),
      offAtH,
      hours,
      backAfterH,
      designOutdoorC,
      limits,
    });
    const found = await runStudyHere('cooldown', study, weathers, given, terminal, threads);
    const result: Cooldown = { ...found, notes: [...notes, ...found.notes] };
    terminal.print(given.json ? resultJson(result) : cooldownText(result));
  },
};
