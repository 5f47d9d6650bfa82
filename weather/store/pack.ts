// A weather year as compact bytes and back, to the last bit: what was read once opens at once.
//
// Layout: "IWY1", length of the header (uint32, little endian), the header as JSON in ASCII, then the
// columns. A column whose values are whole multiples of 1, 0.1 … 0.0001 within 16 or 32 bits is kept as
// such numbers, all others as float64; each begins at a multiple of 8.
import type { Site, Stands, WeatherColumn, WeatherNote, WeatherYear } from '../weather-year.ts';

/** Goes into the name of a stored year: raised whenever readers or this layout change their results. */
export const packVersion = 1;

const magic = [0x49, 0x57, 0x59, 0x31];
type Kind = 'i16' | 'i32' | 'f64' | 'same';
const widths = { i16: 2, i32: 4, f64: 8, same: 8 } as const;

interface PackedColumn {
  readonly name: string;
  /** In `WeatherYear.fine` in place of the year itself. */
  readonly isFine: boolean;
  readonly kind: Kind;
  /** Value = stored / divisor. */
  readonly divisor: number;
  readonly count: number;
  readonly stands: Stands;
  readonly origin: WeatherColumn['origin'];
}

interface Header {
  readonly site: Site;
  readonly form: string;
  readonly year: number;
  readonly hours: number;
  readonly notes: readonly WeatherNote[];
  readonly covers?: { readonly fromHour: number; readonly toHour: number };
  readonly fineIntervalS: number;
  readonly columns: readonly PackedColumn[];
}

export function packYear(year: WeatherYear): Uint8Array {
  const columns: PackedColumn[] = [];
  const stored: ArrayLike<number>[] = [];
  const add = (name: string, isFine: boolean, { values, stands, origin }: WeatherColumn) => {
    const { kind, divisor } = formOf(values);
    columns.push({ name, isFine, kind, divisor, count: values.length, stands, origin });
    stored.push(
      kind === 'same'
        ? [values[0]]
        : kind === 'f64'
          ? values
          : values.map((v) => Math.round(v * divisor)),
    );
  };
  add('sourceYear', false, {
    values: Float64Array.from(year.sourceYear),
    stands: { kind: 'mean' },
    origin: 'read',
  });
  for (const [name, column] of Object.entries(year)) if (isColumn(column)) add(name, false, column);
  for (const [name, column] of Object.entries(year.fine?.columns ?? {}))
    if (isColumn(column)) add(name, true, column);
  const header: Header = {
    site: year.site,
    form: year.form,
    year: year.year,
    hours: year.hours,
    notes: year.notes,
    ...(year.covers ? { covers: year.covers } : {}),
    fineIntervalS: year.fine?.intervalS ?? 0,
    columns,
  };
  const text = JSON.stringify(header).replace(
    /[^\x20-\x7e]/g,
    (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
  const eight = (at: number) => Math.ceil(at / 8) * 8;
  const start = eight(8 + text.length);
  const length = columns.reduce(
    (at, { kind }, k) => eight(at + stored[k].length * widths[kind]),
    start,
  );
  const bytes = new Uint8Array(length);
  const view = new DataView(bytes.buffer);
  bytes.set(magic);
  view.setUint32(4, text.length, true);
  for (let i = 0; i < text.length; i++) bytes[8 + i] = text.charCodeAt(i);
  let at = start;
  columns.forEach(({ kind }, k) => {
    const values = stored[k];
    if (kind === 'i16') new Int16Array(bytes.buffer, at, values.length).set(values);
    else if (kind === 'i32') new Int32Array(bytes.buffer, at, values.length).set(values);
    else new Float64Array(bytes.buffer, at, values.length).set(values);
    at = eight(at + values.length * widths[kind]);
  });
  return bytes;
}

/** The year, or null for bytes that are no whole pack: then the table is read again. */
export function unpackYear(packed: Uint8Array): WeatherYear | null {
  if (packed.length < 16 || magic.some((byte, i) => packed[i] !== byte)) return null;
  // Typed arrays want their data at a multiple of 8, which a slice of a pool is not.
  const bytes = packed.byteOffset % 8 === 0 ? packed : packed.slice();
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const length = view.getUint32(4, true);
  if (8 + length > bytes.length) return null;
  const letters: string[] = [];
  for (let i = 8; i < 8 + length; i += 4096)
    letters.push(String.fromCharCode(...bytes.subarray(i, Math.min(8 + length, i + 4096))));
  let header: Header;
  try {
    header = JSON.parse(letters.join('')) as Header;
  } catch {
    return null;
  }
  const eight = (at: number) => Math.ceil(at / 8) * 8;
  let at = eight(8 + length);
  const own: Record<string, WeatherColumn> = {};
  const fine: Record<string, WeatherColumn> = {};
  let sourceYear: Int16Array | null = null;
  for (const { name, isFine, kind, divisor, count, stands, origin } of header.columns) {
    const items = kind === 'same' ? 1 : count;
    if (at + items * widths[kind] > bytes.length) return null;
    const from = bytes.byteOffset + at;
    const values = new Float64Array(count);
    if (kind === 'f64') values.set(new Float64Array(bytes.buffer, from, count));
    else if (kind === 'same') values.fill(new Float64Array(bytes.buffer, from, 1)[0]);
    else {
      const whole =
        kind === 'i16'
          ? new Int16Array(bytes.buffer, from, count)
          : new Int32Array(bytes.buffer, from, count);
      for (let k = 0; k < count; k++) values[k] = whole[k] / divisor;
    }
    if (name === 'sourceYear') sourceYear = Int16Array.from(values);
    else (isFine ? fine : own)[name] = { values, stands, origin };
    at = eight(at + items * widths[kind]);
  }
  if (sourceYear === null || !own.dryBulbC) return null;
  const { site, form, year, hours, notes, covers, fineIntervalS } = header;
  return {
    site,
    form,
    year,
    hours,
    sourceYear,
    ...(own as unknown as Pick<WeatherYear, 'dryBulbC'>),
    ...(fineIntervalS > 0 ? { fine: { intervalS: fineIntervalS, columns: fine } } : {}),
    ...(covers ? { covers } : {}),
    notes,
  } as WeatherYear;
}

function isColumn(value: unknown): value is WeatherColumn {
  return typeof value === 'object' && value !== null && 'values' in value && 'stands' in value;
}

/** The narrowest form that gives every value back to the last bit. */
function formOf(values: Float64Array): { kind: Kind; divisor: number } {
  if (values.length > 0 && values.every((value) => Object.is(value, values[0])))
    return { kind: 'same', divisor: 1 };
  for (const divisor of [1, 10, 100, 1000, 10000]) {
    let most = 0;
    let fits = true;
    for (let k = 0; k < values.length; k++) {
      const whole = Math.round(values[k] * divisor);
      if (!Object.is(whole / divisor, values[k]) || Math.abs(whole) > 2147483647) {
        fits = false;
        break;
      }
      most = Math.max(most, Math.abs(whole));
    }
    if (fits) return { kind: most <= 32767 ? 'i16' : 'i32', divisor };
  }
  return { kind: 'f64', divisor: 1 };
}
