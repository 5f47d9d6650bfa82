// Synthetic tables: one invented month or more of weather, written in many dialects.
import { hillside, inventedYear } from '../invented-year.ts';

export const truth = inventedYear(hillside, { year: 2023 });
export { hillside };

export interface Dialect {
  readonly name: string;
  /** The table; `hours` rows from 1 January 2023 00:00 local standard time. */
  readonly write: (hours?: number) => string;
}

const pad = (n: number, width = 2) => String(n).padStart(width, '0');

export interface Moment {
  readonly y: number;
  readonly m: number;
  readonly d: number;
  readonly h: number;
  readonly min: number;
}

/** Calendar time of an hour of 2023 on the table's clock, moved by hours. */
export function momentOf(hour: number, movedH = 0): Moment {
  const date = new Date(Date.UTC(2023, 0, 1) + (hour + movedH) * 3600000);
  return {
    y: date.getUTCFullYear(),
    m: date.getUTCMonth() + 1,
    d: date.getUTCDate(),
    h: date.getUTCHours(),
    min: date.getUTCMinutes(),
  };
}

export type Cell = (h: number) => string;
/** A value of the invented year, times a factor plus a shift, with so many decimals. */
export const value =
  (
    key:
      | 'dryBulbC'
      | 'dewPointC'
      | 'relativeHumidity'
      | 'pressurePa'
      | 'windMPerS'
      | 'windFromDeg'
      | 'ghiWPerM2'
      | 'dhiWPerM2'
      | 'dniWPerM2',
    factor = 1,
    shift = 0,
    digits = 3,
  ): Cell =>
  (h) =>
    (truth[key].values[h] * factor + shift).toFixed(digits);

export const comma =
  (cell: Cell): Cell =>
  (h) =>
    cell(h).replace('.', ',');

export function rows(cells: readonly Cell[], delimiter: string, hours: number): string[] {
  return Array.from({ length: hours }, (_, h) => cells.map((cell) => cell(h)).join(delimiter));
}

const at =
  (write: (t: Moment) => string, movedH = 0): Cell =>
  (h) =>
    write(momentOf(h, movedH));
const air = value('dryBulbC');
const humid = value('relativeHumidity', 100);
const wind = value('windMPerS');
const from = value('windFromDeg', 1, 0, 0);
const sun = value('ghiWPerM2');
const diffuse = value('dhiWPerM2');
const pressure = value('pressurePa', 0.01);
const iso = at((t) => `${t.y}-${pad(t.m)}-${pad(t.d)} ${pad(t.h)}:${pad(t.min)}`);
const german = at((t) => `${pad(t.d)}.${pad(t.m)}.${t.y} ${pad(t.h)}:${pad(t.min)}`, 1);
const months = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');
const stateNames = [
  'air temperature [°C]',
  'relative humidity [%]',
  'wind speed [m/s]',
  'global radiation [W/m²]',
  'diffuse radiation [W/m²]',
];
const states = [air, humid, wind, sun, diffuse];

const plain = (
  name: string,
  head: readonly string[],
  cells: readonly Cell[],
  delimiter = ',',
  before: readonly string[] = [],
  newline = '\n',
): Dialect => ({
  name,
  write: (hours = 8760) =>
    [
      ...before,
      ...(head.length > 0 ? [head.join(delimiter)] : []),
      ...rows(cells, delimiter, hours),
    ].join(newline) + newline,
});

export const dialects: readonly Dialect[] = [
  plain('ISO dates, comma, point', ['time', ...stateNames], [iso, ...states]),
  plain(
    'German dates at the end of the hour, semicolon, decimal comma, units row',
    ['Zeit', 'Luft', 'Feuchte', 'Wind', 'Global', 'Diffus', 'Druck'],
    [german, ...[...states, pressure].map(comma)],
    ';',
    ['Wetterstation Schuldach', 'Breite: 47,5 N; Länge: 9,0 E'],
  ),
  {
    name: 'row of units below the headings',
    write: (hours = 8760) =>
      [
        'Zeit;Luft;Feuchte;Wind;Global;Diffus',
        'dd.mm.yyyy hh:mm;°C;%;km/h;W/m²;W/m²',
        ...rows(
          [
            german,
            comma(air),
            comma(humid),
            comma(value('windMPerS', 3.6, 0, 4)),
            comma(sun),
            comma(diffuse),
          ],
          ';',
          hours,
        ),
      ].join('\n'),
  },
  plain(
    'date and time apart, month first, 12-hour clock',
    ['Date', 'Time', ...stateNames],
    [
      at((t) => `${t.m}/${t.d}/${t.y}`),
      at((t) => `${t.h % 12 || 12}:00 ${t.h < 12 ? 'AM' : 'PM'}`),
      ...states,
    ],
  ),
  plain(
    'year, month, day, hour in columns, hours 1 to 24',
    ['Year', 'Month', 'Day', 'Hour', ...stateNames],
    [
      at((t) => String(t.y)),
      at((t) => String(t.m)),
      at((t) => String(t.d)),
      at((t) => String(t.h + 1)),
      ...states,
    ],
  ),
  plain(
    'no headings at all',
    [],
    [
      at((t) => String(t.y)),
      at((t) => String(t.m)),
      at((t) => String(t.d)),
      at((t) => String(t.h)),
      air,
      humid,
      from,
      sun,
      pressure,
    ],
  ),
  plain(
    'tabs, day of the year and HHMM',
    ['year', 'doy', 'hhmm', 'Tair', 'RH', 'ws', 'GHI', 'DHI'],
    [
      at((t) => String(t.y)),
      (h) => String(Math.floor(h / 24) + 1),
      at((t) => `${t.h}00`),
      ...states,
    ],
    '\t',
  ),
  plain(
    'columns by blanks',
    ['date', 'time', 'temp', 'rh', 'wind', 'ghi', 'dhi'],
    [
      at((t) => `${t.y}-${pad(t.m)}-${pad(t.d)}`),
      at((t) => `${pad(t.h)}:00`),
      ...states.map(
        (cell): Cell =>
          (h) =>
            cell(h).padStart(12),
      ),
    ],
    '  ',
  ),
  plain(
    'Fahrenheit, mph, inHg',
    [
      'Timestamp',
      'Outdoor Temp (F)',
      'Humidity (%)',
      'Wind Speed (mph)',
      'Pressure (inHg)',
      'Solar Radiation (W/m2)',
      'DHI (W/m2)',
    ],
    [
      iso,
      value('dryBulbC', 1.8, 32, 4),
      humid,
      value('windMPerS', 1 / 0.44704, 0, 4),
      value('pressurePa', 1 / 3386.389, 0, 5),
      sun,
      diffuse,
    ],
  ),
  plain(
    'kelvin, pascal, kilojoules per hour',
    [
      'time',
      't2m [K]',
      'rh [%]',
      'wind speed [m/s]',
      'pressure [Pa]',
      'global radiation [kJ/m²]',
      'diffuse radiation [kJ/m²]',
    ],
    [
      iso,
      value('dryBulbC', 1, 273.15),
      humid,
      wind,
      value('pressurePa', 1, 0, 1),
      value('ghiWPerM2', 3.6, 0, 4),
      value('dhiWPerM2', 3.6, 0, 4),
    ],
  ),
  plain(
    'seconds since 1970',
    ['epoch', ...stateNames],
    [(h) => String(Date.UTC(2023, 0, 1) / 1000 + (h - 1) * 3600), ...states],
  ),
  plain(
    'days of a spreadsheet',
    ['Date serial', ...stateNames],
    [(h) => String(Number((44927 + h / 24).toFixed(8))), ...states],
    ';',
  ),
  plain(
    'stamps with Z',
    ['timestamp', ...stateNames],
    [at((t) => `${t.y}-${pad(t.m)}-${pad(t.d)}T${pad(t.h)}:00:00Z`, -1), ...states],
  ),
  plain(
    'stamps with an offset',
    ['timestamp', ...stateNames],
    [at((t) => `${t.y}-${pad(t.m)}-${pad(t.d)}T${pad(t.h)}:00:00+01:00`), ...states],
  ),
  plain(
    'names of months',
    ['Date', ...stateNames],
    [at((t) => `${pad(t.d)}-${months[t.m - 1]}-${t.y} ${pad(t.h)}:00`), ...states],
  ),
  plain(
    'two-digit years, bars',
    ['date', ...stateNames],
    [at((t) => `${pad(t.d)}/${pad(t.m)}/${pad(t.y % 100)} ${pad(t.h)}:00`), ...states],
    '|',
  ),
  plain(
    'quoted cells with commas inside',
    [
      '"time"',
      '"air temperature, outside [°C]"',
      '"relative humidity [%]"',
      '"wind speed [m/s]"',
      '"global radiation ""GHI"" [W/m²]"',
      '"diffuse radiation [W/m²]"',
    ],
    [iso, ...states].map(
      (cell): Cell =>
        (h) =>
          `"${cell(h)}"`,
    ),
  ),
  plain(
    'decimal comma in quotes between commas',
    ['time', ...stateNames],
    [
      iso,
      ...states.map(
        (cell): Cell =>
          (h) =>
            `"${cell(h).replace('.', ',')}"`,
      ),
    ],
  ),
  plain(
    'thousands marks',
    [
      'time',
      'air temperature [°C]',
      'relative humidity [%]',
      'wind speed [m/s]',
      'global radiation [J/m²]',
      'diffuse radiation [J/m²]',
    ],
    [
      iso,
      comma(air),
      comma(humid),
      comma(wind),
      ...[sun, diffuse].map(
        (cell): Cell =>
          (h) =>
            Math.round(Number(cell(h)) * 3600)
              .toString()
              .replace(/\B(?=(\d{3})+$)/g, '.'),
      ),
    ],
    ';',
  ),
  plain(
    'compact stamps, returns alone',
    ['stamp', ...stateNames],
    [at((t) => `${t.y}${pad(t.m)}${pad(t.d)}${pad(t.h)}00`), ...states],
    ';',
    [],
    '\r',
  ),
  plain(
    'hour of the year from 1',
    ['Hour of year', ...stateNames],
    [(h) => String(h + 1), ...states],
  ),
  plain(
    'missing codes and an error text',
    ['time', ...stateNames],
    [
      iso,
      (h) => (h % 500 === 7 ? '-99.9' : air(h)),
      (h) => (h % 700 === 3 ? 'ERR' : humid(h)),
      wind,
      (h) => (h % 900 === 11 ? '-9999' : sun(h)),
      diffuse,
    ],
  ),
  plain(
    'UTC named in the heading, French words',
    [
      'Date (UTC)',
      "Température de l'air (°C)",
      'Humidité relative (%)',
      'Vitesse du vent (m/s)',
      'Rayonnement global (W/m²)',
      'Rayonnement diffus (W/m²)',
    ],
    [at((t) => `${pad(t.d)}/${pad(t.m)}/${t.y} ${pad(t.h)}:00`, -1), ...states],
    ';',
  ),
  plain(
    'trailing delimiter and mixed line ends',
    ['time', ...stateNames, ''],
    [iso, ...states, (h) => (h % 2 === 0 ? '\r' : '')],
  ),
];
