// NSRDB PSM: hourly tables of the National Solar Radiation Data Base's physical solar model.
//
// Two lines may come first: names of site fields and their values. Then the headings Year, Month, Day,
// Hour, Minute and the values. Where the two lines are missing, the site has to be given. A row is a
// satellite's view at its minute, usually the middle of the hour: all columns are readings at that
// minute, and radiation stands for the hour centred on it. Missing: -9999, 9999, nan.
//
// Source: M. Sengupta et al., "The National Solar Radiation Data Base (NSRDB)", Renewable and
// Sustainable Energy Reviews 89 (2018), pp. 51-60.
import Papa from 'papaparse';
import type { Site, Stands } from '../weather-year.ts';
import { type ColumnForm, type Form, type Head, headingKey, plainNumber } from './form.ts';

/** The minute is added when the rows are known. */
const moment: Stands = { kind: 'reading', at: 0 };
const missing = [-9999, 9999, -99999, 99999];

const columns: readonly ColumnForm[] = (
  [
    ['ghiWPerM2', 'ghi', 1],
    ['dniWPerM2', 'dni', 1],
    ['dhiWPerM2', 'dhi', 1],
    ['dryBulbC', 'temperature', 1],
    ['dewPointC', 'dew point', 1],
    ['relativeHumidity', 'relative humidity', 0.01],
    ['pressurePa', 'pressure', 100],
    ['windFromDeg', 'wind direction', 1],
    ['windMPerS', 'wind speed', 1],
    ['albedo', 'surface albedo', 1],
  ] as const
).map(([quantity, heading, scale]) => ({ quantity, heading, scale, missing, stands: moment }));

export const psm: Form = {
  name: 'NSRDB PSM',
  recognises: (headings) =>
    ['year', 'month', 'day', 'hour'].every((name) => headings.includes(name)) &&
    headings.some((name) => columns.some((column) => column.heading === name)),
  open(head) {
    const keys = head.headings.map(headingKey);
    const at = ['year', 'month', 'day', 'hour', 'minute'].map((name) => keys.indexOf(name));
    const { site, stampOffsetH } = siteOf(head);
    const opened = {
      columns,
      site,
      stampHeading: head.headings[at[3]],
      hasFooter: false,
      minuteMeaning: 'moment' as const,
      notes: [
        {
          kind: 'assumption' as const,
          text: 'Radiation is a view at one minute of the hour; it is taken as the mean of the hour centred on that minute.',
          count: 0,
        },
      ],
      stamp(cells: readonly string[]) {
        const [year, month, day, hour, minute] = at.map((i) =>
          i < 0 ? 0 : plainNumber((cells[i] ?? '').trim()),
        );
        if (![year, month, day, hour, minute].every(Number.isInteger) || hour < 0 || hour > 23)
          return 'year, month, day, hour 0 to 23 and minute as whole numbers';
        return { year, month, day, minute: hour * 60 + minute };
      },
    };
    return stampOffsetH === undefined ? opened : { ...opened, stampOffsetH };
  },
};

/** Site from the two lines before the headings, as far as they are there. */
function siteOf(head: Head): { site: Partial<Site>; stampOffsetH?: number } {
  const lines = head.preamble.map(
    (line) => Papa.parse<string[]>(line, { delimiter: head.delimiter }).data[0] ?? [],
  );
  const names = lines.findIndex((cells) => cells.map(headingKey).includes('latitude'));
  if (names < 0 || names + 1 >= lines.length) return { site: {} };
  const keys = lines[names].map(headingKey);
  const text = (name: string) => (lines[names + 1][keys.indexOf(name)] ?? '').trim();
  const site: { -readonly [K in keyof Site]?: Site[K] } = {};
  const place = ['city', 'state', 'country']
    .map(text)
    .filter((part) => part !== '' && part !== '-');
  const location = text('location id');
  if (place.length > 0) site.name = place.join(', ');
  else if (location !== '') site.name = `location ${location}`;
  const put = (
    field: 'latitudeDeg' | 'longitudeDeg' | 'elevationM' | 'utcOffsetH',
    name: string,
  ) => {
    const value = plainNumber(text(name));
    if (Number.isFinite(value)) site[field] = value;
  };
  put('latitudeDeg', 'latitude');
  put('longitudeDeg', 'longitude');
  put('elevationM', 'elevation');
  put('utcOffsetH', 'time zone');
  const clock = site.utcOffsetH;
  put('utcOffsetH', 'local time zone');
  return clock === undefined ? { site } : { site, stampOffsetH: clock };
}
