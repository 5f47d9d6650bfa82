// Tables of every form, written from the invented year, for tests that damage them.
import { monthAndDay, type WeatherYear, writePlainWeather } from '../../../weather/index.ts';
import { hillside, inventedYear } from '../invented-year.ts';

const two = (n: number) => String(n).padStart(2, '0');

export const invented = inventedYear();

/** Lines of a plain table: 6 site lines, the headings in row 7, the rows from row 8. */
export const plainLines = writePlainWeather(invented).trimEnd().split('\n');

/** A table with time stamps in place of counted hours. Headings in row 6, rows from row 7. */
export function stampedLines(year: WeatherYear = invented): string[] {
  const { site } = year;
  const lines = [
    `# site: ${site.name}`,
    `# latitudeDeg: ${site.latitudeDeg}`,
    `# longitudeDeg: ${site.longitudeDeg}`,
    `# elevationM: ${site.elevationM}`,
    `# utcOffsetH: ${site.utcOffsetH}`,
    'time,dryBulbC,dewPointC,windMPerS,ghiWPerM2,dniWPerM2,dhiWPerM2',
  ];
  for (let h = 0; h < year.hours; h++) {
    const { month, day } = monthAndDay(Math.floor(h / 24), year.hours / 24);
    const values = [
      year.dryBulbC,
      year.dewPointC,
      year.windMPerS,
      year.ghiWPerM2,
      year.dniWPerM2,
      year.dhiWPerM2,
    ];
    const cells = values.map((column) => column.values[h].toFixed(2));
    lines.push(`${year.year}-${two(month)}-${two(day)}T${two(h % 24)}:00,${cells.join(',')}`);
  }
  return lines;
}

export function tmy3Lines(year: WeatherYear = invented): string[] {
  const lines = [
    `999999,"HILLSIDE",ZZ,${hillside.utcOffsetH}.0,${hillside.latitudeDeg},${hillside.longitudeDeg},${hillside.elevationM}`,
    'Date (MM/DD/YYYY),Time (HH:MM),GHI (W/m^2),DNI (W/m^2),DHI (W/m^2),TotCld (tenths),OpqCld (tenths),Dry-bulb (C),Dew-point (C),RHum (%),Pressure (mbar),Wdir (degrees),Wspd (m/s),CeilHgt (m),Alb (unitless)',
  ];
  for (let h = 0; h < year.hours; h++) {
    const { month, day } = monthAndDay(Math.floor(h / 24), year.hours / 24);
    lines.push(
      [
        `${two(month)}/${two(day)}/${year.year}`,
        `${two((h % 24) + 1)}:00`,
        Math.round(year.ghiWPerM2.values[h]),
        year.dniWPerM2.values[h],
        year.dhiWPerM2.values[h],
        4,
        3,
        year.dryBulbC.values[h].toFixed(1),
        year.dewPointC.values[h].toFixed(1),
        Math.round(year.relativeHumidity.values[h] * 100),
        Math.round(year.pressurePa.values[h] / 100),
        year.windFromDeg.values[h],
        year.windMPerS.values[h].toFixed(1),
        h % 2 ? 77777 : 2000,
        0.2,
      ].join(','),
    );
  }
  return lines;
}

export function psmLines(year: WeatherYear = invented): string[] {
  const lines = [
    'Source,Location ID,City,State,Country,Latitude,Longitude,Time Zone,Elevation,Local Time Zone',
    `NSRDB,1234,-,-,-,${hillside.latitudeDeg},${hillside.longitudeDeg},${hillside.utcOffsetH},${hillside.elevationM},${hillside.utcOffsetH}`,
    'Year,Month,Day,Hour,Minute,GHI,DNI,DHI,Temperature,Dew Point,Relative Humidity,Pressure,Wind Direction,Wind Speed',
  ];
  for (let h = 0; h < year.hours; h++) {
    const { month, day } = monthAndDay(Math.floor(h / 24), year.hours / 24);
    lines.push(
      [
        year.year,
        month,
        day,
        h % 24,
        30,
        Math.round(year.ghiWPerM2.values[h]),
        year.dniWPerM2.values[h],
        year.dhiWPerM2.values[h],
        year.dryBulbC.values[h].toFixed(1),
        year.dewPointC.values[h].toFixed(1),
        (year.relativeHumidity.values[h] * 100).toFixed(1),
        Math.round(year.pressurePa.values[h] / 100),
        year.windFromDeg.values[h],
        year.windMPerS.values[h].toFixed(1),
      ].join(','),
    );
  }
  return lines;
}

export function pvgisLines(year: WeatherYear = invented): string[] {
  const lines = [
    `Latitude (decimal degrees): ${hillside.latitudeDeg}`,
    `Longitude (decimal degrees): ${hillside.longitudeDeg}`,
    `Elevation (m): ${hillside.elevationM}`,
    'time(UTC),T2m,RH,G(h),Gb(n),Gd(h),IR(h),WS10m,WD10m,SP',
  ];
  for (let h = 0; h < year.hours; h++) {
    const { month, day } = monthAndDay(Math.floor(h / 24), year.hours / 24);
    lines.push(
      [
        `${year.year}${two(month)}${two(day)}:${two(h % 24)}00`,
        year.dryBulbC.values[h].toFixed(2),
        (year.relativeHumidity.values[h] * 100).toFixed(2),
        year.ghiWPerM2.values[h].toFixed(1),
        year.dniWPerM2.values[h] === 0 ? '-0.0' : year.dniWPerM2.values[h].toFixed(1),
        year.dhiWPerM2.values[h].toFixed(1),
        300,
        year.windMPerS.values[h].toFixed(2),
        year.windFromDeg.values[h],
        Math.round(year.pressurePa.values[h]),
      ].join(','),
    );
  }
  lines.push(
    '',
    'T2m: 2-m air temperature (degree Celsius)',
    'SP: Surface (air) pressure (Pa)',
    '',
  );
  return lines;
}

/** A copy of the lines with one cell replaced; rows and columns counted from 1. */
export function withCell(
  lines: readonly string[],
  row: number,
  column: number,
  cell: string,
): string[] {
  const copy = [...lines];
  const cells = copy[row - 1].split(',');
  cells[column - 1] = cell;
  copy[row - 1] = cells.join(',');
  return copy;
}
