// Findings for a person at a terminal.

import {
  type BalanceKWh,
  type Findings,
  type SpaceFindings,
  standingCaution,
} from '../../engine/index.ts';
import { figure, table, wrap } from './table.ts';

type Row = SpaceFindings & { readonly name: string };

const moment = (at: string) => (at === '' ? '–' : at.replace('T', ' ').slice(5));

function energyTable(rows: readonly Row[]): string {
  return table<Row>(
    [
      { head: 'Room', of: (row) => row.name },
      { head: 'Floor', unit: 'm²', digits: 1, of: (row) => row.floorAreaM2 },
      { head: 'Heating', unit: 'kWh', of: (row) => row.heatingKWh },
      { head: 'Cooling', unit: 'kWh', of: (row) => row.coolingKWh },
      { head: 'Peak heating', unit: 'W', of: (row) => row.peakHeatingW },
      { head: 'at', unit: 'month-day hour', of: (row) => moment(row.peakHeatingAt) },
      { head: 'Peak cooling', unit: 'W', of: (row) => row.peakCoolingW },
      { head: 'at', unit: 'month-day hour', of: (row) => moment(row.peakCoolingAt) },
    ],
    rows,
  );
}

function comfortTable(rows: readonly Row[]): string {
  return table<Row>(
    [
      { head: 'Room', of: (row) => row.name },
      { head: 'Coldest air', unit: '°C', digits: 1, of: (row) => row.airTemperatureC.min },
      { head: 'at', unit: 'month-day hour', of: (row) => moment(row.airTemperatureC.minAt) },
      { head: 'Warmest air', unit: '°C', digits: 1, of: (row) => row.airTemperatureC.max },
      { head: 'at', unit: 'month-day hour', of: (row) => moment(row.airTemperatureC.maxAt) },
      { head: 'Mean air', unit: '°C', digits: 1, of: (row) => row.airTemperatureC.mean },
      { head: 'Occupied', unit: 'h', of: (row) => row.occupiedHours },
      { head: 'Below band', unit: 'h', of: (row) => row.hoursBelowBand },
      { head: '', unit: 'K·h', of: (row) => row.degreeHoursBelow },
      { head: 'Above band', unit: 'h', of: (row) => row.hoursAboveBand },
      { head: '', unit: 'K·h', of: (row) => row.degreeHoursAbove },
    ],
    rows,
  );
}

const balanceHeads: Readonly<Record<keyof BalanceKWh, string>> = {
  solar: 'Sun',
  gains: 'Gains',
  heating: 'Heating',
  cooling: 'Cooling',
  opaque: 'Opaque',
  glazing: 'Glazing',
  ground: 'Ground',
  infiltration: 'Infiltration',
  ventilation: 'Ventilation',
  rooms: 'Rooms',
  storage: 'Storage',
  residual: 'Residual',
};

function balanceTable(rows: readonly Row[]): string {
  const lines = Object.keys(balanceHeads) as (keyof BalanceKWh)[];
  return table<Row>(
    [
      { head: 'Room', of: (row) => row.name },
      ...lines.map((line) => ({
        head: balanceHeads[line],
        unit: 'kWh',
        digits: line === 'residual' ? 3 : 0,
        of: (row: Row) => row.balanceKWh[line],
      })),
    ],
    rows,
  );
}

/** Windows beside their values under standard conditions. */
function windowTable(windows: NonNullable<Findings['windows']>): string {
  return table(
    [
      { head: 'Window', of: (one) => `${one.room}/${one.surface}/${one.opening}` },
      { head: 'Area', unit: 'm²', digits: 2, of: (one) => one.areaM2 },
      { head: 'U_w', unit: 'W/(m²·K)', digits: 2, of: (one) => one.uValueWPerM2K },
      { head: 'U seen', unit: 'W/(m²·K)', digits: 2, of: (one) => one.seenUValueWPerM2K ?? NaN },
      { head: 'g', unit: '–', digits: 2, of: (one) => one.gValue },
      { head: 'Sun on glass', unit: 'kWh', of: (one) => one.incidentKWh },
      { head: 'Let in', unit: 'kWh', of: (one) => one.transmittedKWh },
      { head: 'Share', unit: '–', digits: 2, of: (one) => one.transmittedShare ?? NaN },
      { head: 'Blind', unit: 'h', of: (one) => one.blindHours ?? NaN },
      { head: 'Insulated', unit: 'h', of: (one) => one.nightInsulationHours ?? NaN },
    ],
    windows,
  );
}

function list(title: string, items: readonly string[]): readonly string[] {
  if (items.length === 0) return [];
  return [[title, ...items.map((item) => wrap(`- ${item}`))].join('\n')];
}

export function findingsText(findings: Findings): string {
  const { weather, quality, timings } = findings;
  const rows: Row[] =
    findings.rooms.length > 1
      ? [...findings.rooms, { name: 'Building', ...findings.building }]
      : [...findings.rooms];
  const repaired = weather.repairs.filter((note) => note.kind === 'repair');
  const assumed = weather.repairs.filter((note) => note.kind === 'assumption');
  const total = (timings.readMs + timings.assembleMs + timings.runMs) / 1000;
  return [
    `${findings.project}
Weather: ${weather.place} (${weather.form}), ${weather.hours} hours. Step: ${findings.stepMinutes} min.`,
    energyTable(rows),
    comfortTable(rows),
    `Heat into each room over the year; losses are negative\n${balanceTable(rows)}`,
    ...(findings.windows?.length
      ? [
          `Windows: U and g by standard (ISO 10077-1, EN 673, EN 410), and as the run saw them: U in dark heated hours, sun over the year\n${windowTable(findings.windows)}`,
        ]
      : []),
    ...list('Cautions', [...findings.cautions, standingCaution]),
    ...list('Assumptions', [...findings.assumptions, ...assumed.map((note) => note.text)]),
    ...list(
      'Weather repairs',
      repaired.map((note) => note.text),
    ),
    `Energy balance closes to ${quality.relativeBalanceResidual.toExponential(1)} of its throughput; ` +
      `${quality.unconvergedSteps} steps not converged; warm-up ${figure(quality.warmUpDays, 0)} days; ` +
      `${quality.nodes} nodes; ${total.toFixed(2)} s.`,
  ].join('\n\n');
}
