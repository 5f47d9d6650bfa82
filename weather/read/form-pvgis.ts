// PVGIS TMY: typical years of the European Commission's Joint Research Centre, as CSV.
//
// A preamble states place and the year of each month; the rows are in UTC, `20180101:0000`; a footer
// explains the columns. Air values are readings at the stamp. Radiation is a satellite's view a
// little later, by the preamble's "Irradiance Time Offset"; it stands for the hour centred on it. The
// rows are moved to local standard time: hours that pass the end of the year come to its start.
//
// Source: T. Huld et al., "Assembling typical meteorological years from reanalysis and satellite
// data", ISPRS Int. J. Geo-Information 7 (2018) 53; the file's own preamble and footer.
import type { Site, Stands, WeatherNote } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';
import { type ColumnForm, type Form, type Head, headingKey, plainNumber } from './form.ts';

const missing = [-9999, 9999, -99999, 99999];
const atStamp: Stands = { kind: 'reading', at: 0 };

function columnsWith(viewed: Stands): readonly ColumnForm[] {
  return [
    { quantity: 'dryBulbC', heading: 't2m', scale: 1, missing, stands: atStamp },
    { quantity: 'relativeHumidity', heading: 'rh', scale: 0.01, missing, stands: atStamp },
    { quantity: 'ghiWPerM2', heading: 'g(h)', scale: 1, missing, stands: viewed },
    { quantity: 'dniWPerM2', heading: 'gb(n)', scale: 1, missing, stands: viewed },
    { quantity: 'dhiWPerM2', heading: 'gd(h)', scale: 1, missing, stands: viewed },
    { quantity: 'horizontalInfraredWPerM2', heading: 'ir(h)', scale: 1, missing, stands: atStamp },
    { quantity: 'windMPerS', heading: 'ws10m', scale: 1, missing, stands: atStamp },
    { quantity: 'windFromDeg', heading: 'wd10m', scale: 1, missing, stands: atStamp },
    { quantity: 'pressurePa', heading: 'sp', scale: 1, missing, stands: atStamp },
  ];
}

export const pvgis: Form = {
  name: 'PVGIS TMY',
  recognises: (headings) => headings.includes('time(utc)') && headings.includes('t2m'),
  open(head, faults) {
    const timeAt = head.headings.map(headingKey).indexOf('time(utc)');
    const stated = statedValues(head);
    const offset = stated.get('irradiance time offset (h)') ?? 0;
    const notes: WeatherNote[] = [
      {
        kind: 'assumption',
        text: `Radiation is a view ${Math.round(offset * 60)} minutes after the stamp; it is taken as the mean of the hour centred on that moment.`,
        count: 0,
      },
    ];
    return {
      columns: columnsWith({ kind: 'reading', at: offset }),
      site: siteOf(head, stated, faults),
      stampOffsetH: 0,
      stampHeading: head.headings[timeAt],
      hasFooter: true,
      minuteMeaning: 'moment',
      notes,
      stamp(cells) {
        const found = /^(\d{4})(\d\d)(\d\d):(\d\d)(\d\d)$/.exec((cells[timeAt] ?? '').trim());
        if (found === null) return 'a UTC stamp YYYYMMDD:HHMM';
        const [year, month, day, hour, minute] = found.slice(1).map(Number);
        return { year, month, day, minute: hour * 60 + minute };
      },
    };
  },
};

/** Lines of the preamble of the form "Name (unit): number". */
function statedValues(head: Head): Map<string, number> {
  const stated = new Map<string, number>();
  for (const line of head.preamble) {
    const found = /^"?([^:]+):\s*([^,;"]+)/.exec(line);
    if (found === null) continue;
    const value = plainNumber(found[2].trim());
    if (Number.isFinite(value)) stated.set(headingKey(found[1]), value);
  }
  return stated;
}

function siteOf(head: Head, stated: Map<string, number>, faults: FaultList): Partial<Site> {
  const site: { -readonly [K in keyof Site]?: Site[K] } = {};
  const put = (
    field: 'latitudeDeg' | 'longitudeDeg' | 'elevationM',
    name: string,
    low: number,
    high: number,
  ) => {
    const value = stated.get(name);
    if (value === undefined) return; // asked for later, like any site field that a file lacks
    if (value >= low && value <= high) site[field] = value;
    else {
      const row = 1 + head.preamble.findIndex((line) => headingKey(line).startsWith(name));
      faults.cell(
        row,
        name,
        String(value),
        `${low} to ${high}`,
        'Correct the line in the preamble.',
      );
    }
  };
  put('latitudeDeg', 'latitude (decimal degrees)', -90, 90);
  put('longitudeDeg', 'longitude (decimal degrees)', -180, 180);
  put('elevationM', 'elevation (m)', -450, 9000);
  if (site.latitudeDeg !== undefined && site.longitudeDeg !== undefined)
    site.name = placeName(site.latitudeDeg, site.longitudeDeg);
  return site;
}

/** "45.000 N 8.000 E" for places without a name. */
export function placeName(latitudeDeg: number, longitudeDeg: number): string {
  const north = `${Math.abs(latitudeDeg).toFixed(3)} ${latitudeDeg < 0 ? 'S' : 'N'}`;
  return `${north} ${Math.abs(longitudeDeg).toFixed(3)} ${longitudeDeg < 0 ? 'W' : 'E'}`;
}
