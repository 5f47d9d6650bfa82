// TMY3: typical meteorological years of the National Solar Radiation Data Base.
//
// Row 1 is the site, row 2 the headings, then 8760 rows stamped with the hour's end in local standard
// time, MM/DD/YYYY and 01:00 to 24:00. Radiation is the mean of the hour that ends at the stamp; all
// else is a reading at the stamp. Tables saved again by a spreadsheet come with trailing commas,
// `1/1/1995`, `1:00` and `24:00:00`. Missing: -9900 and strings of nines; ceiling 77777 unlimited,
// 88888 cirrus.
//
// Source: S. Wilcox, W. Marion, "Users Manual for TMY3 Data Sets", NREL/TP-581-43156 (2008).
import Papa from 'papaparse';
import type { Site, Stands } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';
import { type ColumnForm, type Form, type Head, headingKey, plainNumber } from './form.ts';

const mean: Stands = { kind: 'mean' };
const atEnd: Stands = { kind: 'reading', at: 1 };
const missing = [-9900, -9999, -99999, 9999, 99999, 999999];

const columns: readonly ColumnForm[] = [
  { quantity: 'ghiWPerM2', heading: 'ghi (w/m^2)', scale: 1, missing, stands: mean },
  { quantity: 'dniWPerM2', heading: 'dni (w/m^2)', scale: 1, missing, stands: mean },
  { quantity: 'dhiWPerM2', heading: 'dhi (w/m^2)', scale: 1, missing, stands: mean },
  {
    quantity: 'skyCover',
    heading: 'totcld (tenths)',
    scale: 0.1,
    missing: [...missing, 99],
    stands: atEnd,
  },
  {
    quantity: 'opaqueSkyCover',
    heading: 'opqcld (tenths)',
    scale: 0.1,
    missing: [...missing, 99],
    stands: atEnd,
  },
  {
    quantity: 'dryBulbC',
    heading: 'dry-bulb (c)',
    scale: 1,
    missing: [...missing, 999.9],
    stands: atEnd,
  },
  {
    quantity: 'dewPointC',
    heading: 'dew-point (c)',
    scale: 1,
    missing: [...missing, 999.9],
    stands: atEnd,
  },
  {
    quantity: 'relativeHumidity',
    heading: 'rhum (%)',
    scale: 0.01,
    missing: [...missing, 999],
    stands: atEnd,
  },
  { quantity: 'pressurePa', heading: 'pressure (mbar)', scale: 100, missing, stands: atEnd },
  {
    quantity: 'windFromDeg',
    heading: 'wdir (degrees)',
    scale: 1,
    missing: [...missing, 999],
    stands: atEnd,
  },
  {
    quantity: 'windMPerS',
    heading: 'wspd (m/s)',
    scale: 1,
    missing: [...missing, 999, 999.9],
    stands: atEnd,
  },
  {
    quantity: 'ceilingM',
    heading: 'ceilhgt (m)',
    scale: 1,
    missing,
    special: { 77777: Number.POSITIVE_INFINITY, 88888: Number.POSITIVE_INFINITY },
    stands: atEnd,
  },
  { quantity: 'albedo', heading: 'alb (unitless)', scale: 1, missing, stands: mean },
];

const dateHeading = 'date (mm/dd/yyyy)';
const timeHeading = 'time (hh:mm)';

export const tmy3: Form = {
  name: 'TMY3',
  recognises: (headings) => headings.includes(dateHeading) && headings.includes(timeHeading),
  open(head, faults) {
    const keys = head.headings.map(headingKey);
    const dateAt = keys.indexOf(dateHeading);
    const timeAt = keys.indexOf(timeHeading);
    return {
      columns,
      site: siteOf(head, faults),
      stampHeading: head.headings[timeAt],
      hasFooter: false,
      minuteMeaning: 'start',
      notes: [],
      stamp(cells) {
        const date = /^(\d{1,2})\/(\d{1,2})\/(\d{4})$/.exec((cells[dateAt] ?? '').trim());
        const time = /^(\d{1,2}):(\d\d)(?::00)?$/.exec((cells[timeAt] ?? '').trim());
        if (date === null || time === null)
          return "a date MM/DD/YYYY and the hour's end, 01:00 to 24:00";
        return {
          year: Number(date[3]),
          month: Number(date[1]),
          day: Number(date[2]),
          minute: Number(time[1]) * 60 + Number(time[2]) - 60,
        };
      },
    };
  },
};

/** Row 1: station number, name, state, offset from UTC, latitude, longitude, elevation. */
function siteOf(head: Head, faults: FaultList): Partial<Site> {
  const line = head.preamble.at(-1) ?? '';
  const cells = Papa.parse<string[]>(line, { delimiter: head.delimiter }).data[0] ?? [];
  const row = head.row - 1;
  const place = [cells[1], cells[2]].map((cell) => (cell ?? '').trim()).filter(Boolean);
  const read = (at: number, column: string, low: number, high: number) => {
    const text = (cells[at] ?? '').trim();
    const value = plainNumber(head.delimiter === ',' ? text : text.replace(',', '.'));
    if (value >= low && value <= high) return value;
    faults.cell(
      Math.max(1, row),
      column,
      cells[at] ?? '',
      `a number from ${low} to ${high}`,
      'Restore the first row: station, name, state, offset from UTC, latitude, longitude, elevation.',
    );
    return 0;
  };
  return {
    name: place.join(', '),
    utcOffsetH: read(3, 'offset from UTC', -12, 14),
    latitudeDeg: read(4, 'latitude', -90, 90),
    longitudeDeg: read(5, 'longitude', -180, 180),
    elevationM: read(6, 'elevation', -450, 9000),
  };
}
