import {
  type CurvePoint,
  defaultDesignOutdoorC,
  type PeakHour,
  type SideSizing,
  type SizedRoom,
  type Sizing,
  size,
  sizeDefaults,
  standingCaution,
  type WarmUpPoint,
} from '../../engine/index.ts';
import { textOf } from './arguments.ts';
import type { Command, Given } from './command.ts';
import {
  numberOf,
  openStudy,
  resultJson,
  runStudyHere,
  stepOf,
  studyOptions,
  studyWeathers,
  threadsOf,
} from './study-inputs.ts';
import { listText, orDash } from './study-text.ts';
import { figure, table } from './table.ts';

const present = (w: number) =>
  Number.isNaN(w) ? 'none' : Number.isFinite(w) ? figure(w, 0) : 'no limit';

function roomsTable(side: SideSizing, sizing: Sizing): string {
  const at = side.curve.find((point) => point.share === 1);
  const outcome = (room: SizedRoom) => at?.outcome.rooms.find((one) => one.room === room.room);
  const heats = side.side === 'heating';
  return table<SizedRoom>(
    [
      { head: 'Room', of: (room) => room.name },
      {
        head: heats ? 'Steady load' : 'Design day',
        unit: heats
          ? `W at ${sizing.options.designOutdoorC} °C`
          : `W on ${side.designDay.slice(5)}`,
        digits: 0,
        of: (room) => room.designW,
      },
      {
        head: heats ? 'Warm-up' : 'Year',
        unit: heats ? `W for ${sizing.options.warmUpH} h` : 'W, peak',
        of: (room) => orDash(room.dynamicW, 0),
      },
      { head: 'Present', unit: 'W', of: (room) => present(room.presentW) },
      { head: 'Size', unit: 'W', digits: 0, of: (room) => room.chosenW },
      {
        head: 'Unmet',
        unit: 'h',
        digits: 0,
        of: (room) => outcome(room)?.unmetHours ?? Number.NaN,
      },
      {
        head: heats ? 'Lowest' : 'Highest',
        unit: '°C operative',
        digits: 1,
        of: (room) => outcome(room)?.extremeOperativeC ?? Number.NaN,
      },
    ],
    side.rooms,
  );
}

function curveTable(side: SideSizing): string {
  const points = [...side.curve, ...(side.present ? [side.present] : [])];
  const extreme = (point: CurvePoint) =>
    side.side === 'heating'
      ? Math.min(...point.outcome.rooms.map((room) => room.extremeOperativeC))
      : Math.max(...point.outcome.rooms.map((room) => room.extremeOperativeC));
  return table<CurvePoint>(
    [
      {
        head: 'Sizes',
        of: (point) => (point === side.present ? 'present' : point.share === 1 ? 'chosen' : ''),
      },
      { head: 'Together', unit: 'W', digits: 0, of: (point) => point.totalW },
      { head: 'Of chosen', digits: 2, of: (point) => point.share },
      { head: 'Unmet', unit: 'h, any room', digits: 0, of: (point) => point.outcome.unmetHours },
      {
        head: 'Missing',
        unit: 'K·h, all rooms',
        digits: 0,
        of: (point) => point.outcome.rooms.reduce((sum, room) => sum + room.unmetDegreeHours, 0),
      },
      {
        head: side.side === 'heating' ? 'Lowest' : 'Highest',
        unit: '°C operative',
        digits: 1,
        of: extreme,
      },
      {
        head: 'Peak',
        unit: 'W, together',
        digits: 0,
        of: (point) => point.outcome.coincidentPeakW,
      },
      { head: 'Energy', unit: 'kWh', digits: 0, of: (point) => point.outcome.energyKWh },
    ],
    points,
  );
}

function peakText(peak: PeakHour): string {
  const rows = Object.entries(peak.causesW).map(([cause, w]) => ({ cause, w }));
  return `Peak hour ${peak.at.replace('T', ' ')}, ${figure(peak.outdoorC, 1)} °C outdoors, ${figure(peak.totalW, 0)} W: heat into the rooms by cause\n${table<
    (typeof rows)[number]
  >(
    [
      { head: 'Cause', of: (row) => (row.cause === 'storage' ? 'taken up by masses' : row.cause) },
      { head: 'Heat', unit: 'W', digits: 0, of: (row) => row.w },
    ],
    rows,
  )}`;
}

function sideText(side: SideSizing, sizing: Sizing): readonly string[] {
  const name = side.side === 'heating' ? 'Heating' : 'Cooling';
  const warmUp =
    side.warmUp.length === 0
      ? []
      : [
          `Warm-up on the design spell (week to ${side.designDay}, steady ${sizing.options.designOutdoorC} °C, no sun, no gains)\n${table<WarmUpPoint>(
            [
              { head: 'Of steady load', digits: 2, of: (point) => point.share },
              { head: 'Together', unit: 'W', digits: 0, of: (point) => point.totalW },
              {
                head: 'Slowest room',
                unit: 'h',
                of: (point) => (point.warmUpH === null ? 'never' : figure(point.warmUpH, 2)),
              },
            ],
            side.warmUp,
          )}`,
        ];
  return [
    `${name}\n${roomsTable(side, sizing)}`,
    `Rooms together ${figure(side.sumW, 0)} W; greatest hour of all together ${figure(side.coincidentPeakW, 0)} W, ${figure(side.coincidenceShare, 2)} of the sum; plant in steps of ${sizing.options.plantStepW} W: ${figure(side.plantW, 0)} W.`,
    `The year against size, from real runs\n${curveTable(side)}`,
    ...warmUp,
    ...(side.peak ? [peakText(side.peak)] : []),
    ...listText(
      'How each size came about',
      side.rooms.map((room) => `${room.name}: ${room.why}`),
    ),
  ];
}

export function sizingText(sizing: Sizing): string {
  return [
    `${sizing.project}: sizes of heaters and chillers. Step: ${sizing.options.stepMinutes} min.`,
    `Steady design load at ${sizing.steady.designOutdoorC} °C: ${figure(sizing.steady.totalW, 0)} W in all heated rooms.\n${sizing.steady.method}.`,
    ...(sizing.heating ? sideText(sizing.heating, sizing) : []),
    ...(sizing.cooling ? sideText(sizing.cooling, sizing) : []),
    ...listText('Assumptions', sizing.notes),
    ...listText('Cautions', [...sizing.cautions, standingCaution]),
  ].join('\n\n');
}

const number = (given: Given, name: string, range: readonly [number, number], unit: string) =>
  numberOf('size', given, name, range, unit);

export const sizeCommand: Command = {
  name: 'size',
  operand: 'PROJECT',
  summary: 'Heater and chiller sizes: design load, warm-up, design day, and the year against size.',
  options: {
    ...studyOptions,
    step: { value: 'MIN', help: 'step in minutes, a divisor of 60; 30 without it' },
    outdoor: { value: 'C', help: "design temperature; without it the table's 99.6 % value" },
    'least-air': { value: 'N', help: 'least air changes an hour of every room; 0.5 without it' },
    reheat: { value: 'W', help: 'supplement for warming up, W for each m² of floor; 0 without it' },
    'warm-up': { value: 'H', help: 'longest warm-up on the design spell, hours; 2 without it' },
    margin: { value: 'PERCENT', help: 'on top of the greater load; 10 without it' },
    'room-step': { value: 'W', help: 'steps of emitters and room chillers; 50 without it' },
    'plant-step': { value: 'W', help: 'steps of the plant; 500 without it' },
    'cool-to': {
      value: 'C',
      help: 'size cooling to this operative temperature in rooms without any',
    },
  },
  examples: [
    'inglenook size house.inglenook.json --outdoor -8',
    'inglenook size house.inglenook.json --warm-up 1 --margin 15 --room-step 100',
    'inglenook size house.inglenook.json --cool-to 26 --json > sizes.json',
  ],
  async run(operand, given, terminal, threads) {
    const open = await openStudy('size', operand);
    const stepMinutes = stepOf('size', given, sizeDefaults.stepMinutes);
    const outdoorC = number(given, 'outdoor', [-60, 30], '°C');
    const margin = number(given, 'margin', [0, 200], '%');
    const options = {
      leastAirChangesPerH: number(given, 'least-air', [0, 20], '1/h'),
      reheatWPerM2: number(given, 'reheat', [0, 200], 'W/m²'),
      warmUpH: number(given, 'warm-up', [0, 48], 'h'),
      roomStepW: number(given, 'room-step', [1, 100_000], 'W'),
      plantStepW: number(given, 'plant-step', [1, 1_000_000], 'W'),
      coolToC: number(given, 'cool-to', [10, 40], '°C'),
    };
    const { weathers, main, mainKey, notes } = await studyWeathers(open, textOf(given, 'weather'));
    const chosen = Object.fromEntries(
      Object.entries(options).filter(([, value]) => value !== null),
    );
    const study = size(open.building, main, {
      ...sizeDefaults,
      ...chosen,
      weather: mainKey,
      stepMinutes,
      designOutdoorC: outdoorC ?? defaultDesignOutdoorC(main),
      marginShare: margin === null ? sizeDefaults.marginShare : margin / 100,
      pieces: threadsOf('size', given, threads).count,
    });
    const found = await runStudyHere('size', study, weathers, given, terminal, threads);
    const design =
      outdoorC === null
        ? [
            `Design temperature ${found.options.designOutdoorC} °C: what 99.6 % of the table's hours exceed. The local code's value comes before it (--outdoor).`,
          ]
        : [];
    const result: Sizing = { ...found, notes: [...notes, ...design, ...found.notes] };
    terminal.print(given.json ? resultJson(result) : sizingText(result));
  },
};
