// JSON → Mapping: every field checked, every fault with its path.
import type { Fault, Parsed } from '../fault.ts';
import { isTimeZone } from '../time/civil-clock.ts';
import type { Site } from '../weather-year.ts';
import {
  type Clock,
  type ColumnMapping,
  type ColumnRef,
  dateOrders,
  delimiters,
  type Mapping,
  mappedQuantities,
  mappingFormat,
  mappingVersion,
  type StampPart,
  stampReads,
  thousandsMarks,
} from './mapping.ts';
import { unitNamed, unitsOf } from './units.ts';

type Plain = Readonly<Record<string, unknown>>;

/** A mapping from the text of its file. */
export function parseMapping(text: string, file: string): Parsed<Mapping> {
  let data: unknown;
  try {
    data = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (error) {
    const found = error instanceof Error ? error.message : 'text that is no JSON';
    const mend = 'Write the mapping again with "inglenook weather FILE --make-mapping OUT".';
    return {
      ok: false,
      faults: [{ file, place: { path: '' }, found, expected: 'a weather mapping as JSON', mend }],
    };
  }
  return checkMapping(data, file);
}

/** A mapping from parsed JSON, of which nothing is known. */
export function checkMapping(data: unknown, file: string): Parsed<Mapping> {
  const faults: Fault[] = [];
  const door = new Door(file, faults);
  const top = door.object(data, '', [
    'format',
    'version',
    'name',
    'shape',
    'table',
    'stamp',
    'columns',
    'missing',
    'site',
  ]);
  const format = door.oneOf(top.format, 'format', [mappingFormat] as const);
  const version = door.oneOf(top.version, 'version', [mappingVersion] as const);
  const name = door.text(top.name, 'name');
  const table = door.object(top.table, 'table', [
    'delimiter',
    'decimal',
    'thousands',
    'headingRow',
    'firstRow',
  ]);
  const stamp = door.object(top.stamp, 'stamp', ['parts', 'marks', 'clock', 'year']);
  const missing = codesOf(door, top.missing ?? [], 'missing');
  const mapping: Mapping = {
    format,
    version,
    name,
    ...(top.shape === undefined ? {} : { shape: door.text(top.shape, 'shape') }),
    table: {
      delimiter: door.oneOf(table.delimiter, 'table.delimiter', delimiters),
      decimal: door.oneOf(table.decimal, 'table.decimal', ['.', ','] as const),
      thousands: door.oneOf(table.thousands ?? '', 'table.thousands', thousandsMarks),
      headingRow: door.whole(table.headingRow, 'table.headingRow', 0, 10000),
      firstRow: door.whole(table.firstRow, 'table.firstRow', 1, 10001),
    },
    stamp: {
      parts: door.list(stamp.parts, 'stamp.parts').map((part, i) => partOf(door, part, i)),
      marks: door.oneOf(stamp.marks, 'stamp.marks', ['start', 'middle', 'end'] as const),
      clock: clockOf(door, stamp.clock),
      ...(stamp.year === undefined
        ? {}
        : { year: door.whole(stamp.year, 'stamp.year', 1900, 2200) }),
    },
    columns: door.list(top.columns, 'columns').map((column, i) => columnOf(door, column, i)),
    missing,
    ...(top.site === undefined ? {} : { site: siteOf(door, top.site) }),
  };
  if (faults.length === 0) checkTogether(door, mapping);
  return faults.length > 0
    ? { ok: false, faults: faults.slice(0, 20) }
    : { ok: true, value: mapping };
}

function checkTogether(door: Door, { table, stamp, columns }: Mapping): void {
  if (table.firstRow <= table.headingRow)
    door.fault('table.firstRow', String(table.firstRow), `a row below ${table.headingRow}`);
  if (table.decimal === table.delimiter && table.delimiter === ',') return; // quoted cells
  if (table.thousands === table.decimal)
    door.fault('table.thousands', `"${table.thousands}"`, 'another mark than the decimal one');
  if (stamp.parts.length === 0) door.fault('stamp.parts', 'an empty list', 'at least one column');
  const seen = new Set<string>();
  columns.forEach(({ quantity }, i) => {
    if (seen.has(quantity))
      door.fault(`columns[${i}].quantity`, `${quantity} twice`, 'each quantity once');
    seen.add(quantity);
  });
}

function partOf(door: Door, data: unknown, i: number): StampPart {
  const at = `stamp.parts[${i}]`;
  const part = door.object(data, at, ['column', 'reads', 'order']);
  const reads = door.oneOf(part.reads, `${at}.reads`, stampReads);
  const column = refOf(door, part.column, `${at}.column`);
  if (part.order === undefined) {
    if (reads === 'date' || reads === 'dateTime')
      door.fault(`${at}.order`, 'nothing', `one of ${dateOrders.join(', ')}`);
    return { column, reads };
  }
  return { column, reads, order: door.oneOf(part.order, `${at}.order`, dateOrders) };
}

function columnOf(door: Door, data: unknown, i: number): ColumnMapping {
  const at = `columns[${i}]`;
  const column = door.object(data, at, ['column', 'quantity', 'unit', 'stands', 'missing']);
  const quantity = door.oneOf(column.quantity, `${at}.quantity`, mappedQuantities);
  const unit = door.text(column.unit, `${at}.unit`);
  if (unitNamed(quantity, unit) === undefined)
    door.fault(
      `${at}.unit`,
      `"${unit}"`,
      `one of ${unitsOf(quantity)
        .map((one) => one.name)
        .join(', ')}`,
    );
  return {
    column: refOf(door, column.column, `${at}.column`),
    quantity,
    unit,
    stands: door.oneOf(column.stands ?? 'mean', `${at}.stands`, ['mean', 'reading'] as const),
    ...(column.missing === undefined
      ? {}
      : { missing: codesOf(door, column.missing, `${at}.missing`) }),
  };
}

function clockOf(door: Door, data: unknown): Clock {
  const clock = door.object(data, 'stamp.clock', ['kind', 'utcOffsetH', 'zone']);
  const kind = door.oneOf(clock.kind, 'stamp.clock.kind', ['site', 'offset', 'zone'] as const);
  if (kind === 'offset')
    return { kind, utcOffsetH: door.number(clock.utcOffsetH, 'stamp.clock.utcOffsetH', -14, 14) };
  if (kind === 'site') return { kind };
  const zone = door.text(clock.zone, 'stamp.clock.zone');
  if (zone !== '' && !isTimeZone(zone))
    door.fault('stamp.clock.zone', `"${zone}"`, 'a time zone such as Europe/Lisbon');
  return { kind, zone };
}

const siteLimits = {
  latitudeDeg: [-90, 90],
  longitudeDeg: [-180, 180],
  elevationM: [-450, 9000],
  utcOffsetH: [-12, 14],
} as const;

function siteOf(door: Door, data: unknown): Partial<Site> {
  const fields = door.object(data, 'site', ['name', ...Object.keys(siteLimits)]);
  const site: { -readonly [K in keyof Site]?: Site[K] } = {};
  if (fields.name !== undefined) site.name = door.text(fields.name, 'site.name');
  for (const field of Object.keys(siteLimits) as (keyof typeof siteLimits)[]) {
    const [low, high] = siteLimits[field];
    if (fields[field] !== undefined)
      site[field] = door.number(fields[field], `site.${field}`, low, high);
  }
  return site;
}

function refOf(door: Door, data: unknown, path: string): ColumnRef {
  if (typeof data === 'string' && data !== '') return data;
  if (typeof data === 'number' && Number.isInteger(data) && data >= 1 && data <= 4096) return data;
  door.fault(path, shown(data), "a column's heading, or its number from 1");
  return 1;
}

function codesOf(door: Door, data: unknown, path: string): (number | string)[] {
  return door.list(data, path).flatMap((code, i) => {
    if (typeof code === 'string' || (typeof code === 'number' && Number.isFinite(code)))
      return [code];
    door.fault(`${path}[${i}]`, shown(code), 'a number or a text');
    return [];
  });
}

function shown(data: unknown): string {
  if (data === undefined) return 'nothing';
  const text = JSON.stringify(data) ?? String(data);
  return text.length > 60 ? `${text.slice(0, 60)}…` : text;
}

/** Takes unknown data apart; what does not fit becomes a fault, and a harmless value goes on. */
class Door {
  private readonly file: string;
  private readonly faults: Fault[];
  constructor(file: string, faults: Fault[]) {
    this.file = file;
    this.faults = faults;
  }
  fault(path: string, found: string, expected: string, mend = 'Correct the mapping.'): void {
    this.faults.push({ file: this.file, place: { path }, found, expected, mend });
  }
  object(data: unknown, path: string, fields: readonly string[]): Plain {
    if (typeof data !== 'object' || data === null || Array.isArray(data)) {
      this.fault(path, shown(data), 'an object');
      return {};
    }
    for (const key of Object.keys(data))
      if (!fields.includes(key))
        this.fault(
          path === '' ? key : `${path}.${key}`,
          `the field "${key}"`,
          fields.join(', '),
          'Delete the field.',
        );
    return data as Plain;
  }
  list(data: unknown, path: string): readonly unknown[] {
    if (Array.isArray(data) && data.length <= 500) return data;
    this.fault(path, shown(data), 'a list of at most 500');
    return [];
  }
  text(data: unknown, path: string): string {
    if (typeof data === 'string' && data.length <= 200) return data;
    this.fault(path, shown(data), 'a text of at most 200 letters');
    return '';
  }
  number(data: unknown, path: string, low: number, high: number): number {
    if (typeof data === 'number' && data >= low && data <= high) return data;
    this.fault(path, shown(data), `a number from ${low} to ${high}`);
    return low;
  }
  whole(data: unknown, path: string, low: number, high: number): number {
    if (typeof data === 'number' && Number.isInteger(data) && data >= low && data <= high)
      return data;
    this.fault(path, shown(data), `a whole number from ${low} to ${high}`);
    return low;
  }
  oneOf<T extends string | number>(data: unknown, path: string, all: readonly T[]): T {
    const found = all.find((one) => one === data);
    if (found !== undefined) return found;
    this.fault(
      path,
      shown(data),
      `one of ${all.map((one) => (typeof one === 'number' ? String(one) : JSON.stringify(one))).join(', ')}`,
    );
    return all[0];
  }
}
