// The program's own plain table, for weather from elsewhere, and its writer. `plainWeatherForm`
// describes it for people.
import type { Site, Stands, WeatherYear } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';
import { type ColumnForm, type Form, type Head, headingKey, plainNumber } from './form.ts';
import { limits, type Quantity, quantities } from './quantities.ts';

/** The plain form as Markdown, for the user's manual. */
export const plainWeatherForm = `A plain weather table is a CSV file in UTF-8 with one row an hour, 8760 rows (8784 with 29 February).

Lines that begin with \`#\` come first and state the place, one \`# name: value\` a line:
\`site\` (a name), \`latitudeDeg\` (north positive), \`longitudeDeg\` (east positive), \`elevationM\`,
\`utcOffsetH\` (local standard time minus UTC), and if wanted \`year\` (the calendar that weekdays follow).
Every value is the mean of its hour, unless a line such as \`# readAt dryBulbC: 1\` says that the column
holds readings at one moment of the hour: 0 its start, 0.5 its middle, 1 its end.

Then one line of column names, in any order, and the rows. A row's hour is given by \`hour\` (0 to 8759,
0 being 1 January 00:00 to 01:00) or by \`time\` (the hour's start, \`2019-01-31T14:00\`), always in local
standard time, without daylight saving.

| column | meaning | needed |
| --- | --- | --- |
| \`dryBulbC\` | air temperature, °C | yes |
| \`dewPointC\`, \`relativeHumidity\` | °C; share 0 to 1 | one of them |
| \`windMPerS\` | wind speed at 10 m, m/s | yes |
| \`windFromDeg\` | direction it comes from, clockwise from north | no |
| \`ghiWPerM2\`, \`dniWPerM2\`, \`dhiWPerM2\` | global horizontal, direct normal, diffuse horizontal, W/m² | global, or two of the three |
| \`pressurePa\` | air pressure at the place | no |
| \`horizontalInfraredWPerM2\` | long-wave radiation from the sky, W/m² | no |
| \`skyCover\`, \`opaqueSkyCover\` | share of the sky, 0 to 1 | no |
| \`ceilingM\` | height of the cloud base, or \`unlimited\` | no |
| \`albedo\` | ground reflectance, 0 to 1 | no |
| \`sourceYear\` | year the hour was taken from, where \`time\` does not say it | no |

An empty cell means "not measured". Gaps of up to 3 hours are filled and counted in the results.
`;

const isQuantity = (name: string): name is Quantity =>
  (quantities as readonly string[]).includes(name);

export const plain: Form = {
  name: 'plain table',
  recognises: (headings) =>
    headings.some((name) => quantities.some((quantity) => quantity.toLowerCase() === name)),
  open(head, faults) {
    const keys = head.headings.map(headingKey);
    const [hourAt, timeAt, yearAt] = ['hour', 'time', 'sourceyear'].map((name) =>
      keys.indexOf(name),
    );
    const { site, year, stands } = preambleOf(head, faults);
    if (hourAt < 0 && timeAt < 0)
      faults.cell(
        head.row,
        'hour',
        head.headings.join(head.delimiter),
        'a column "hour" or "time"',
        'Add a column "hour" that counts the hours of the year from 0.',
      );
    const columns: ColumnForm[] = quantities.map((quantity) => ({
      quantity,
      heading: quantity.toLowerCase(),
      scale: 1,
      missing: [-9999, 9999, -99999, 99999].filter(
        (code) => !(code >= limits[quantity][0] && code <= limits[quantity][1]),
      ),
      stands: stands.get(quantity) ?? { kind: 'mean' },
    }));
    const opened = {
      columns,
      site,
      stampHeading: head.headings[hourAt >= 0 ? hourAt : Math.max(0, timeAt)],
      hasFooter: false,
      minuteMeaning: 'start' as const,
      notes: [],
      stamp(cells: readonly string[]) {
        const cell = (at: number) => (at < 0 ? '' : (cells[at] ?? '').trim());
        const sourceYear = plainNumber(cell(yearAt));
        const hasYear = Number.isInteger(sourceYear) && sourceYear >= 1900 && sourceYear <= 2200;
        const known = hasYear ? sourceYear : year;
        if (hourAt >= 0) {
          const hour = plainNumber(cell(hourAt));
          if (!Number.isInteger(hour) || hour < 0 || hour > 8783)
            return 'the hour of the year as a whole number from 0';
          return { year: known ?? 0, month: 0, day: 0, minute: hour * 60 };
        }
        const found = /^(\d{4})-(\d\d)-(\d\d)[T ](\d\d):(\d\d)(?::00)?$/.exec(cell(timeAt));
        if (found === null) return 'local standard time like 2019-01-31T14:00';
        const [y, month, day, hour, minute] = found.slice(1).map(Number);
        return {
          year: hasYear ? sourceYear : y,
          month,
          day,
          minute: hour * 60 + minute,
        };
      },
    };
    return year === undefined ? opened : { ...opened, year };
  },
};

function preambleOf(head: Head, faults: FaultList) {
  const site: { -readonly [K in keyof Site]?: Site[K] } = {};
  const stands = new Map<Quantity, Stands>();
  let year: number | undefined;
  head.preamble.forEach((line, i) => {
    const found = /^"?#\s*([^:]+?)\s*:\s*(.*?)[\s,;"]*$/.exec(line);
    if (found === null) return;
    const [name, text] = [found[1], found[2]];
    const number = plainNumber(head.delimiter === ',' ? text : text.replace(',', '.'));
    const want = (low: number, high: number): number | undefined => {
      if (number >= low && number <= high) return number;
      faults.cell(i + 1, name, text, `a number from ${low} to ${high}`, 'Correct the line.');
      return undefined;
    };
    const set = (
      field: 'latitudeDeg' | 'longitudeDeg' | 'elevationM' | 'utcOffsetH',
      v?: number,
    ) => {
      if (v !== undefined) site[field] = v;
    };
    if (name === 'site') site.name = text;
    else if (name === 'latitudeDeg') set(name, want(-90, 90));
    else if (name === 'longitudeDeg') set(name, want(-180, 180));
    else if (name === 'elevationM') set(name, want(-450, 9000));
    else if (name === 'utcOffsetH') set(name, want(-12, 14));
    else if (name === 'year') year = want(1900, 2200);
    else if (name.startsWith('readAt ')) {
      const quantity = name.slice(7).trim();
      const at = want(-1, 2);
      if (isQuantity(quantity) && at !== undefined) stands.set(quantity, { kind: 'reading', at });
      else if (!isQuantity(quantity))
        faults.cell(i + 1, name, quantity, 'the name of a column', 'Correct the line.');
    }
  });
  return { site, year, stands };
}

/**
 * The name as one cell: in quotation marks where a spreadsheet would part it, so that no part of it stands
 * alone and is worked out as a formula; quotation marks within become single ones.
 */
function siteLine(name: string): string {
  const line = `# site: ${name.replace(/[\r\n]+/g, ' ').replaceAll('"', "'")}`;
  return /[,;\t]/.test(line) ? `"${line}"` : line;
}

/** A weather year as a plain table; `readWeather` gives back the same values to the last bit. */
export function writePlainWeather(year: WeatherYear): string {
  const lines = [
    siteLine(year.site.name),
    `# latitudeDeg: ${year.site.latitudeDeg}`,
    `# longitudeDeg: ${year.site.longitudeDeg}`,
    `# elevationM: ${year.site.elevationM}`,
    `# utcOffsetH: ${year.site.utcOffsetH}`,
    `# year: ${year.year}`,
  ];
  const present = quantities.flatMap((quantity) => {
    const column = year[quantity];
    return column === undefined ? [] : [{ quantity, column }];
  });
  for (const { quantity, column } of present)
    if (column.stands.kind === 'reading') lines.push(`# readAt ${quantity}: ${column.stands.at}`);
  lines.push(['hour', 'sourceYear', ...present.map(({ quantity }) => quantity)].join(','));
  for (let h = 0; h < year.hours; h++) {
    const cells = present.map(({ column }) => {
      const value = column.values[h];
      return value === Number.POSITIVE_INFINITY ? 'unlimited' : String(value);
    });
    lines.push(`${h},${year.sourceYear[h]},${cells.join(',')}`);
  }
  return `${lines.join('\n')}\n`;
}
