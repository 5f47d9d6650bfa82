import { hourName } from '../../engine/index.ts';
import {
  type ClimateSummary,
  climateSummary,
  type DesignTable,
  designTable,
  type Finding,
  type MonthClimate,
  type WeatherColumn,
  type WeatherYear,
  writePlainWeather,
} from '../../weather/index.ts';
import { writeFileWhole } from '../disk/index.ts';
import { textOf } from './arguments.ts';
import type { Command } from './command.ts';
import { need } from './stop.ts';
import { figure, table, wrap } from './table.ts';
import { changedYear } from './weather-changes.ts';
import { makeMapping } from './weather-map.ts';
import { readingOf, readingOptions, readTable, siteOf } from './weather-reading.ts';

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

const readingAt = (at: number) =>
  at === 0 ? 'reading at its start' : at === 1 ? 'reading at its end' : `reading ${at} h into it`;

function columnsOf(year: WeatherYear): readonly ColumnEntry[] {
  return Object.entries(year).flatMap(([column, value]: readonly [string, unknown]) => {
    if (!isColumn(value)) return [];
    const { stands, origin, values } = value;
    // An unlimited cloud base is no number to take a mean of.
    const finite = values.filter(Number.isFinite);
    const mean = finite.reduce((sum, one) => sum + one, 0) / finite.length;
    const min = finite.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
    const max = finite.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
    const said = stands.kind === 'mean' ? 'mean of the hour' : readingAt(stands.at);
    return [{ column, origin, stands: said, min, mean, max }];
  });
}

const months = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

function weatherDocument(
  file: string,
  sha256: string,
  year: WeatherYear,
  findings: readonly Finding[],
) {
  return {
    file,
    sha256,
    site: year.site,
    form: year.form,
    year: year.year,
    hours: year.hours,
    columns: columnsOf(year),
    climate: climateSummary(year),
    design: designTable(year),
    findings,
    notes: year.notes,
  };
}

type WeatherDocument = ReturnType<typeof weatherDocument>;

function climateText(climate: ClimateSummary, hours: number, year: number): string {
  const { design } = climate;
  const c = (value: number) => `${figure(value, 1)} °C`;
  const at = (hour: number) => hourName(hour, hours, year).slice(5).replace('T', ' ');
  const spell = ({ firstDay, days, meanDryBulbC }: ClimateSummary['coldestSpell']) =>
    `${days} days from ${at(firstDay * 24).slice(0, 5)}, mean ${c(meanDryBulbC)}`;
  return `Year: mean ${c(climate.meanDryBulbC)}; coldest hour ${c(climate.minDryBulbC)} at ${at(climate.coldestHour)}, hottest ${c(climate.maxDryBulbC)} at ${at(climate.hottestHour)}
Coldest spell: ${spell(climate.coldestSpell)}; hottest: ${spell(climate.hottestSpell)}
Degree days to 18 °C, from daily means: ${figure(climate.heatingDegreeDays18Kd, 0)} K·d below, ${figure(climate.coolingDegreeDays18Kd, 0)} K·d above
Heating design: ${c(design.heating996C)} exceeded in 99.6 % of the hours, ${c(design.heating99C)} in 99 %
Cooling design, dry bulb / wet bulb: ${c(design.cooling04C)} / ${c(design.wetBulbAtCooling04C)} exceeded in 0.4 % of the hours, ${c(design.cooling1C)} / ${c(design.wetBulbAtCooling1C)} in 1 %, ${c(design.cooling2C)} / ${c(design.wetBulbAtCooling2C)} in 2 %
One year gives milder design values than a climate table of many years, which sizing for people who
could come to harm should use.`;
}

function designText(
  { coldest, hottest, winter, degreeDays }: DesignTable,
  hours: number,
  year: number,
) {
  const day = (index: number) => hourName(index * 24, hours, year).slice(5, 10);
  const spells = (all: DesignTable['coldest']) =>
    all
      .map(
        ({ days, firstDay, meanDryBulbC }) =>
          `${days} d ${figure(meanDryBulbC, 1)} °C (from ${day(firstDay)})`,
      )
      .join(', ');
  const bases = degreeDays.map(
    ({ baseC, heatingKd, coolingKd }) =>
      `${baseC} °C ${figure(heatingKd, 0)} / ${figure(coolingKd, 0)}`,
  );
  return [
    `Coldest runs of days: ${spells(coldest)}`,
    `Hottest runs of days: ${spells(hottest)}`,
    `Winter design in the manner of ISO 15927-5, from this table alone: ${winter.map(({ days, spell, windMPerS }) => `${days} d ${figure(spell.meanDryBulbC, 1)} °C with ${figure(windMPerS, 1)} m/s`).join(', ')}`,
    `Degree days below / above a base [K·d]: ${bases.join(', ')}`,
  ]
    .map((line) => wrap(line))
    .join('\n');
}

function findingsText(findings: readonly Finding[]): string {
  if (findings.length === 0)
    return 'Checks of order, gaps, limits, stuck sensors, jumps, closure, clear sky and sun time found nothing.';
  const lines = findings.map(({ id, title, text, repair, isAccepted }) => {
    const does =
      repair === null
        ? ''
        : isAccepted
          ? ` Done: ${repair}`
          : ` ${repair} Left as it is; --accept ${id} does it.`;
    return wrap(`- ${title}. ${text}${does}`);
  });
  return `Checks:\n${lines.join('\n')}`;
}

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
    table<MonthClimate>(
      [
        { head: 'Month', of: (row) => months[row.month - 1] },
        { head: 'Mean air', unit: '°C', digits: 1, of: (row) => row.meanDryBulbC },
        { head: 'Coldest', unit: '°C', digits: 1, of: (row) => row.minDryBulbC },
        { head: 'Warmest', unit: '°C', digits: 1, of: (row) => row.maxDryBulbC },
        { head: 'Sun, horizontal', unit: 'kWh/m²', digits: 1, of: (row) => row.ghiJPerM2 / 3.6e6 },
        { head: 'Sun, beam', unit: 'kWh/m²', digits: 1, of: (row) => row.dniJPerM2 / 3.6e6 },
        { head: 'Mean wind', unit: 'm/s', digits: 1, of: (row) => row.meanWindMPerS },
      ],
      rest.climate.months,
    ),
    climateText(rest.climate, hours, year),
    designText(rest.design, hours, year),
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
    findingsText(rest.findings),
    notes.length > 0 ? notes.join('\n') : 'Nothing was repaired or assumed.',
  ].join('\n\n');
}

export const weatherCommand: Command = {
  name: 'weather',
  operand: 'FILE',
  summary:
    'Shows what was read from a weather table: place, columns, months, repairs, assumptions.',
  options: {
    ...readingOptions,
    'make-mapping': {
      value: 'OUT',
      help: 'look at a table of no known form and write how to read it',
    },
    site: {
      value: 'LAT,LON,M,UTC',
      help: 'the place, for tables that do not say (--site=-33.9,18.4,40,2)',
    },
    changes: {
      value: 'FILE',
      help: 'monthly changes (JSON) by which the year is shifted and stretched',
    },
    plain: { value: 'OUT', help: 'also write the year as a plain weather table' },
    json: { help: 'one JSON document on standard output' },
  },
  examples: [
    'inglenook weather year.csv',
    'inglenook weather year.csv --json',
    'inglenook weather roof.txt --make-mapping roof.mapping.json --site 47.5,9,480,1',
    'inglenook weather roof.txt --mapping roof.mapping.json --accept gap-short-dryBulbC,order',
  ],
  async run(operand, given, terminal) {
    const place = textOf(given, 'site');
    const site = place === null ? null : siteOf('weather', place);
    const out = textOf(given, 'make-mapping');
    if (out !== null) return makeMapping(operand, out, site, given.json === true, terminal);
    const reading = readingOf('weather', given);
    const tell = (done: number) => terminal.progress(done, 'reading the table');
    const { sha256, year, findings } = await readTable(operand, site, reading, true, tell);
    terminal.endProgress();
    const changes = textOf(given, 'changes');
    const shown = changes === null ? year : await changedYear(changes, year);
    const plain = textOf(given, 'plain');
    if (plain !== null) {
      need(await writeFileWhole(plain, writePlainWeather(shown)));
      terminal.note(`Written to ${plain}: the year as a plain weather table.`);
    }
    const document = weatherDocument(operand, sha256, shown, findings);
    terminal.print(given.json ? JSON.stringify(document, null, 2) : weatherText(document));
  },
};
