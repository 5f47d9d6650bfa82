// From a checked series of any length → one weather year: a calendar year, a run of twelve months, or a
// part of a year with its ends repeated, in hours and, where the table is finer, at its own interval.
import type { Finding } from '../check/finding.ts';
import type { Inspection } from '../check/inspect.ts';
import type { Fault, Parsed } from '../fault.ts';
import { type Quantity, quantities } from '../read/quantities.ts';
import type {
  FineQuantity,
  FineWeather,
  WeatherColumn,
  WeatherNote,
  WeatherYear,
} from '../weather-year.ts';
import { deriveColumns } from './derive.ts';
import { dividingHour, hourlyMeans, hourlyStands } from './resample.ts';
import { columnOf, type WeatherSeries } from './series.ts';
import { spanOf, type YearChoice } from './span.ts';

/** The year of a choice, or every reason why there is none. */
export function yearOf(
  inspection: Inspection,
  choice: YearChoice = { kind: 'auto' },
): Parsed<WeatherYear> {
  const { series: checked, findings } = inspection;
  const faults = findings.flatMap((one) => blockingFault(checked, one));
  if (faults.length > 0) return { ok: false, faults };
  const span = spanOf(checked, choice);
  if (!('hourS' in span)) return { ok: false, faults: [span] };
  const derived = deriveColumns(dividingHour(checked));
  if (derived.lacking.length > 0)
    return {
      ok: false,
      faults: derived.lacking.map((what) => ({
        file: checked.file,
        place: { path: 'columns' },
        found: `no column of ${what}`,
        expected: `a column of ${what}`,
        mend: 'Map the column, or choose a table that has it.',
      })),
    };
  const { series } = derived;
  const { hourS, year, notes: spanNotes, covers } = span;
  const hours = hourS.length;
  const share = (((hourS[0] - series.startS) / 3600) % 1) + 0;
  const part = series.intervalS === 3600 && Math.abs(share) > 1e-9 ? 1 - ((share + 1) % 1) : 0;
  // A step that begins within an hour is read for the hour in which it begins, `part` later.
  const asked = part > 0 ? hourS.map((s) => s + part * 3600) : hourS;
  const columns = new Map<Quantity, WeatherColumn>();
  for (const quantity of quantities) {
    const column = columnOf(series, quantity);
    if (!column) continue;
    const values = hourlyMeans(series, column, asked);
    if (quantity === 'relativeHumidity')
      for (let h = 0; h < hours; h++) values[h] = Math.min(1, values[h]);
    columns.set(quantity, {
      values,
      stands: hourlyStands(series, column.stands, part),
      origin: column.origin,
    });
  }
  const need = (quantity: Quantity): WeatherColumn => {
    const column = columns.get(quantity);
    if (!column) throw new Error(`${quantity} was neither read nor derived`);
    return column;
  };
  const sourceYear = Int16Array.from(hourS, (s) => {
    const k = Math.floor((s - series.startS) / series.intervalS + 1e-9);
    return series.sourceYear[Math.min(series.count - 1, Math.max(0, k))];
  });
  const spare = Object.fromEntries(
    (
      ['horizontalInfraredWPerM2', 'skyCover', 'opaqueSkyCover', 'ceilingM', 'albedo'] as const
    ).flatMap((q) => {
      const column = columns.get(q);
      return column ? [[q, column] as const] : [];
    }),
  );
  const notes: WeatherNote[] = [...series.notes, ...spanNotes, ...derived.notes];
  const fine = fineOf(series, hourS);
  if (checked.intervalS !== 3600)
    notes.push({
      kind: 'assumption',
      text:
        checked.intervalS < 3600
          ? `The table is every ${checked.intervalS / 60} minutes: hours are its means, and steps below an hour follow the table itself.`
          : `The table is every ${checked.intervalS / 3600} hours: radiation was laid over the hours along the sun with its energy kept, everything else along straight lines.`,
      count: checked.count,
    });
  return {
    ok: true,
    value: {
      site: series.site,
      form: series.form,
      year,
      hours,
      sourceYear,
      dryBulbC: need('dryBulbC'),
      dewPointC: need('dewPointC'),
      relativeHumidity: need('relativeHumidity'),
      pressurePa: need('pressurePa'),
      windMPerS: need('windMPerS'),
      windFromDeg: need('windFromDeg'),
      ghiWPerM2: need('ghiWPerM2'),
      dniWPerM2: need('dniWPerM2'),
      dhiWPerM2: need('dhiWPerM2'),
      ...spare,
      ...(fine ? { fine } : {}),
      ...(covers ? { covers } : {}),
      notes,
    },
  };
}

function blockingFault(series: WeatherSeries, one: Finding): Fault[] {
  if (one.level !== 'blocks' || one.isAccepted) return [];
  const row = one.places[0]?.row ?? 0;
  return [
    {
      file: series.file,
      place: row > 0 ? { row, column: one.quantity ?? 'stamp' } : { path: one.quantity ?? 'stamp' },
      found: one.text.replace(/\.$/, ''),
      expected: 'a table without, or its repair accepted',
      mend: one.repair
        ? `${one.repair} Accept it as "${one.id}".`
        : 'No repair is offered for this much: mend the table, or choose another run of dates.',
    },
  ];
}

const fineQuantities: readonly FineQuantity[] = [
  'dryBulbC',
  'dewPointC',
  'pressurePa',
  'windMPerS',
  'windFromDeg',
  'ghiWPerM2',
  'dniWPerM2',
  'dhiWPerM2',
];

/** The columns at the table's own interval, where it is shorter than an hour. */
function fineOf(series: WeatherSeries, hourS: Float64Array): FineWeather | null {
  const { intervalS, startS } = series;
  if (intervalS >= 3600 || (startS - hourS[0]) % intervalS !== 0) return null;
  const n = 3600 / intervalS;
  const first = (hourS[0] - startS) / intervalS;
  const isStraight = hourS.every((s, h) => s === hourS[0] + h * 3600);
  const columns = Object.fromEntries(
    fineQuantities.flatMap((quantity) => {
      const column = columnOf(series, quantity);
      if (!column) return [];
      const { stands, origin } = column;
      if (isStraight && first >= 0)
        return [
          [
            quantity,
            { values: column.values.subarray(first, first + hourS.length * n), stands, origin },
          ] as const,
        ];
      const values = new Float64Array(hourS.length * n);
      for (let h = 0; h < hourS.length; h++) {
        const from = Math.round((hourS[h] - startS) / intervalS);
        for (let s = 0; s < n; s++) values[h * n + s] = column.values[from + s];
      }
      return [[quantity, { values, stands, origin }] as const];
    }),
  );
  return { intervalS, columns };
}
