import { monthOfHour } from '../../engine/index.ts';
import type { WeatherColumn, WeatherYear } from '../../weather/index.ts';
import type { Command } from './command.ts';
import { openWeather } from './inputs.ts';
import { table, wrap } from './table.ts';

interface ColumnEntry {
  readonly column: string;
  readonly origin: WeatherColumn['origin'];
  readonly stands: string;
  readonly min: number;
  readonly mean: number;
  readonly max: number;
}

function isColumn(value: unknown): value is WeatherColumn {
  return typeof value === 'object' && value !== null && 'values' in value && 'stands' in value;
}

function columnsOf(year: WeatherYear): readonly ColumnEntry[] {
  return Object.entries(year).flatMap(([column, value]: readonly [string, unknown]) => {
    if (!isColumn(value)) return [];
    const { stands, origin, values } = value;
    // An unlimited cloud base is no number to take a mean of.
    const finite = values.filter(Number.isFinite);
    const mean = finite.reduce((sum, one) => sum + one, 0) / finite.length;
    const min = finite.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
    const max = finite.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
    const said = stands.kind === 'mean' ? 'mean of the hour' : `reading at ${stands.at} h`;
    return [{ column, origin, stands: said, min, mean, max }];
  });
}

interface MonthEntry {
  readonly month: number;
  readonly meanC: number;
  readonly minC: number;
  readonly maxC: number;
  readonly ghiKWhPerM2: number;
  readonly dniKWhPerM2: number;
  readonly meanWindMPerS: number;
}

function monthsOf(year: WeatherYear): readonly MonthEntry[] {
  const hoursOf = Array.from({ length: 12 }, (): number[] => []);
  for (let h = 0; h < year.hours; h++) hoursOf[monthOfHour(h, year.hours)].push(h);
  return hoursOf.map((hours, m) => {
    const of = (column: WeatherColumn) => hours.map((h) => column.values[h]);
    const sum = (values: readonly number[]) => values.reduce((a, b) => a + b, 0);
    const tempC = of(year.dryBulbC);
    return {
      month: m + 1,
      meanC: sum(tempC) / hours.length,
      minC: Math.min(...tempC),
      maxC: Math.max(...tempC),
      ghiKWhPerM2: sum(of(year.ghiWPerM2)) / 1000,
      dniKWhPerM2: sum(of(year.dniWPerM2)) / 1000,
      meanWindMPerS: sum(of(year.windMPerS)) / hours.length,
    };
  });
}

const months = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

function weatherDocument(file: string, sha256: string, year: WeatherYear) {
  return {
    file,
    sha256,
    site: year.site,
    form: year.form,
    year: year.year,
    hours: year.hours,
    columns: columnsOf(year),
    months: monthsOf(year),
    notes: year.notes,
  };
}

type WeatherDocument = ReturnType<typeof weatherDocument>;

function weatherText({ site, form, year, hours, sha256, ...rest }: WeatherDocument): string {
  const side = (deg: number, plus: string, minus: string) =>
    `${Math.abs(deg).toFixed(2)}° ${deg < 0 ? minus : plus}`;
  const zone = `UTC${site.utcOffsetH < 0 ? '−' : '+'}${Math.abs(site.utcOffsetH)}`;
  const notes = rest.notes.map((note) =>
    wrap(`- ${note.kind === 'repair' ? 'Repair' : 'Assumption'}: ${note.text}`),
  );
  return [
    `${site.name}, ${side(site.latitudeDeg, 'N', 'S')}, ${side(site.longitudeDeg, 'E', 'W')}, ${site.elevationM} m, ${zone}
Form: ${form}. ${hours} hours, calendar of ${year}. SHA-256 ${sha256}`,
    table<MonthEntry>(
      [
        { head: 'Month', of: (row) => months[row.month - 1] },
        { head: 'Mean air', unit: '°C', digits: 1, of: (row) => row.meanC },
        { head: 'Coldest', unit: '°C', digits: 1, of: (row) => row.minC },
        { head: 'Warmest', unit: '°C', digits: 1, of: (row) => row.maxC },
        { head: 'Sun, horizontal', unit: 'kWh/m²', digits: 1, of: (row) => row.ghiKWhPerM2 },
        { head: 'Sun, beam', unit: 'kWh/m²', digits: 1, of: (row) => row.dniKWhPerM2 },
        { head: 'Mean wind', unit: 'm/s', digits: 1, of: (row) => row.meanWindMPerS },
      ],
      rest.months,
    ),
    table<ColumnEntry>(
      [
        { head: 'Column', of: (row) => row.column },
        { head: 'Origin', of: (row) => row.origin },
        { head: 'Stands for', of: (row) => row.stands },
        { head: 'Least', digits: 2, of: (row) => row.min },
        { head: 'Mean', digits: 2, of: (row) => row.mean },
        { head: 'Greatest', digits: 2, of: (row) => row.max },
      ],
      rest.columns,
    ),
    notes.length > 0 ? notes.join('\n') : 'Nothing was repaired or assumed.',
  ].join('\n\n');
}

export const weatherCommand: Command = {
  name: 'weather',
  operand: 'FILE',
  summary:
    'Shows what was read from a weather table: place, columns, months, repairs, assumptions.',
  options: { json: { help: 'one JSON document on standard output' } },
  examples: ['inglenook weather year.csv', 'inglenook weather year.csv --json'],
  async run(operand, given, terminal) {
    const { file, sha256, year } = await openWeather(operand);
    const document = weatherDocument(file, sha256, year);
    terminal.print(given.json ? JSON.stringify(document, null, 2) : weatherText(document));
  },
};
