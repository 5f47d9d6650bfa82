// Rows in order → WeatherYear: moved to local standard time, gaps bridged, missing columns computed.

import { standardPressurePa } from '../air/atmosphere.ts';
import { dewPointFromHumidityC, relativeHumidityFromDewPoint } from '../air/moist-air.ts';
import {
  bridgeAlong,
  bridgeHold,
  bridgeLinear,
  gapsIn,
  longestBridgedGap,
} from '../repair/gaps.ts';
import { completeRadiation, type RadiationColumns } from '../repair/radiation.ts';
import { hourlySun } from '../steps/hourly-sun.ts';
import type { Site, Stands, WeatherColumn, WeatherNote, WeatherYear } from '../weather-year.ts';
import { calendarOf } from './calendar-year.ts';
import type { FaultList } from './fault-list.ts';
import type { Head, Opened } from './form.ts';
import { type Quantity, radiationQuantities, spareQuantities } from './quantities.ts';
import type { RowStore } from './row-store.ts';
import { hourText, type Timeline } from './timeline.ts';

export interface Finishing {
  readonly formName: string;
  readonly opened: Opened;
  readonly head: Head;
  readonly store: RowStore;
  readonly time: Timeline;
  readonly site: Site;
  readonly stampOffsetH: number;
  readonly year: number | undefined;
  /** Columns that were complained of and are left out. */
  readonly broken: Set<Quantity>;
}

/** The year, or `null` after adding faults. */
export function finishYear(job: Finishing, faults: FaultList): WeatherYear | null {
  const { store, time, opened, site } = job;
  const { hours } = time;
  const notes: WeatherNote[] = [...opened.notes];
  // A stamp on the file's clock is `shiftH` later on the site's: whole hours move the row, the rest
  // moves the reading within its hour.
  const shiftH = site.utcOffsetH - job.stampOffsetH;
  const moved = Math.floor(shiftH + 1e-9);
  const within = shiftH - moved + (opened.minuteMeaning === 'moment' ? time.minute / 60 : 0);
  const rowAt = (h: number) => time.rowOfHour[(((h - moved) % hours) + hours) % hours];
  const stampedYear = Int16Array.from({ length: hours }, (_, h) => store.year[rowAt(h)]);
  const calendar = calendarOf(stampedYear, hours, job.year ?? opened.year, faults);
  const { sourceYear } = calendar;
  if (shiftH !== 0)
    notes.push({
      kind: 'assumption',
      text: `Stamps were moved by ${shiftH} h to local standard time (UTC${site.utcOffsetH < 0 ? '' : '+'}${site.utcOffsetH}); ${Math.abs(moved)} hours that pass the end of the year come to its other end.`,
      count: Math.abs(moved),
    });
  for (const mended of store.drawnBack.values())
    notes.push({
      kind: 'repair',
      text: `${mended.heading}: ${mended.count} values just outside their limits were drawn back to them (rows ${mended.rows.join(', ')}${mended.count > mended.rows.length ? ' …' : ''}).`,
      count: mended.count,
    });

  const sunFor = (stands: Stands) => hourlySun({ site, hours, sourceYear }, stands);
  const columns = new Map<Quantity, WeatherColumn>();
  for (const kept of store.columns) {
    const { quantity, stands } = kept.form;
    if (job.broken.has(quantity)) continue; // its cells are faults already
    const values = Float64Array.from({ length: hours }, (_, h) => kept.values[rowAt(h)]);
    const gaps = gapsIn(values);
    const long = gaps.filter((gap) => gap.count > longestBridgedGap);
    const rowOf = (h: number) => store.row[rowAt(h % hours)];
    if (long.length > 0) {
      const missing = gaps.reduce((sum, gap) => sum + gap.count, 0);
      if (spareQuantities.has(quantity) || missing === hours) {
        notes.push({
          kind: 'assumption',
          text: `${kept.heading}: left out, ${missing} of ${hours} values are missing.`,
          count: missing,
        });
        continue;
      }
      job.broken.add(quantity);
      for (const gap of long)
        faults.row(
          rowOf(gap.from),
          kept.heading,
          `${gap.count} hours in a row without a value from ${hourText(gap.from, hours)}`,
          `gaps of ${longestBridgedGap} hours at most`,
          'Fill in the values from another source, or choose another table.',
        );
      continue;
    }
    if (gaps.length > 0) {
      const course = radiationQuantities.has(quantity) ? sunFor(stands) : null;
      for (const gap of gaps) {
        if (course) bridgeAlong(values, courseOf(quantity, course), gap);
        else if (quantity === 'windFromDeg' || quantity === 'ceilingM') bridgeHold(values, gap);
        else bridgeLinear(values, gap);
      }
      const count = gaps.reduce((sum, gap) => sum + gap.count, 0);
      const rows = gaps.slice(0, 8).map((gap) => rowOf(gap.from));
      notes.push({
        kind: 'repair',
        text: `${kept.heading}: ${count} missing values in ${gaps.length} gaps were bridged (rows ${rows.join(', ')}${gaps.length > rows.length ? ' …' : ''}).`,
        count,
      });
    }
    columns.set(quantity, { values, stands: movedBy(stands, within), origin: 'read' });
  }
  addHumidity(columns, job, faults, notes);
  addRadiation(columns, job, faults, notes, sunFor);
  addAir(columns, job, faults, notes);
  if (calendar.note) notes.push(calendar.note);
  if (!faults.isEmpty) return null;

  const need = (quantity: Quantity): WeatherColumn => {
    const column = columns.get(quantity);
    if (column === undefined) throw new Error(`${quantity} was neither read nor computed`);
    return column;
  };
  const spare = Object.fromEntries(
    [...columns].filter(([quantity]) => spareQuantities.has(quantity)),
  );
  return {
    site,
    form: job.formName,
    year: calendar.year,
    hours,
    sourceYear,
    dryBulbC: need('dryBulbC'),
    dewPointC: need('dewPointC'),
    relativeHumidity: need('relativeHumidity'),
    pressurePa: need('pressurePa'),
    windMPerS: need('windMPerS'),
    windFromDeg: need('windFromDeg'),
    ghiWPerM2: need('ghiWPerM2'),
    dniWPerM2: need('dniWPerM2'),
    dhiWPerM2: need('dhiWPerM2'),
    ...spare,
    notes,
  };
}

function movedBy(stands: Stands, hours: number): Stands {
  return stands.kind === 'mean' ? stands : { kind: 'reading', at: stands.at + hours };
}

/** What a radiation value is in proportion to on a day of even sky. */
function courseOf(quantity: Quantity, sun: ReturnType<typeof hourlySun>): Float64Array {
  return quantity === 'dniWPerM2' ? sun.sunlitShare : sun.extraterrestrialWPerM2;
}

type Columns = Map<Quantity, WeatherColumn>;

/** Adds the fault of a column that is not there; not when its cells were complained of already. */
function lacking(
  faults: FaultList,
  job: Finishing,
  which: readonly Quantity[],
  what: string,
): void {
  if (
    job.store.columns.some(
      (kept) => which.includes(kept.form.quantity) && job.broken.has(kept.form.quantity),
    )
  )
    return;
  faults.cell(
    job.head.row,
    what,
    job.head.headings.slice(0, 8).join(job.head.delimiter),
    `a column of ${what}`,
    'Add the column, or choose a table that has it.',
  );
}

function addHumidity(columns: Columns, job: Finishing, faults: FaultList, notes: WeatherNote[]) {
  const air = columns.get('dryBulbC');
  const dew = columns.get('dewPointC');
  const humid = columns.get('relativeHumidity');
  if (air === undefined) return lacking(faults, job, ['dryBulbC'], 'air temperature');
  if (dew && humid) return;
  if (!dew && !humid)
    return lacking(
      faults,
      job,
      ['dewPointC', 'relativeHumidity'],
      'dew point or relative humidity',
    );
  const derived = (values: Float64Array): WeatherColumn => ({
    values,
    stands: (dew ?? humid ?? air).stands,
    origin: 'derived',
  });
  if (humid) {
    const values = air.values.map((t, h) =>
      dewPointFromHumidityC(t, Math.max(0.001, humid.values[h])),
    );
    columns.set('dewPointC', derived(values));
    notes.push({
      kind: 'assumption',
      text: 'Dew point was computed from temperature and relative humidity.',
      count: job.time.hours,
    });
  } else if (dew) {
    const values = air.values.map((t, h) =>
      Math.min(1, relativeHumidityFromDewPoint(t, dew.values[h])),
    );
    columns.set('relativeHumidity', derived(values));
    notes.push({
      kind: 'assumption',
      text: 'Relative humidity was computed from temperature and dew point.',
      count: job.time.hours,
    });
  }
}

function addRadiation(
  columns: Columns,
  job: Finishing,
  faults: FaultList,
  notes: WeatherNote[],
  sunFor: (stands: Stands) => ReturnType<typeof hourlySun>,
) {
  const [ghi, dni, dhi] = (['ghiWPerM2', 'dniWPerM2', 'dhiWPerM2'] as const).map((q) =>
    columns.get(q),
  );
  const one = ghi ?? dni ?? dhi;
  if (ghi && dni && dhi) return;
  const expected = 'global radiation, or two of global, direct normal and diffuse';
  if (one === undefined) return lacking(faults, job, [...radiationQuantities], expected);
  const all: RadiationColumns = { ghi: ghi?.values, dni: dni?.values, dhi: dhi?.values };
  const said = completeRadiation(all, sunFor(one.stands));
  if (said === null) return lacking(faults, job, [...radiationQuantities], expected);
  const put = (quantity: Quantity, values: Float64Array | undefined) => {
    if (values && !columns.has(quantity))
      columns.set(quantity, { values, stands: one.stands, origin: 'derived' });
  };
  put('ghiWPerM2', all.ghi);
  put('dniWPerM2', all.dni);
  put('dhiWPerM2', all.dhi);
  notes.push({ kind: 'assumption', text: said, count: job.time.hours });
}

function addAir(columns: Columns, job: Finishing, faults: FaultList, notes: WeatherNote[]) {
  const { hours } = job.time;
  const assumed = (quantity: Quantity, value: number, text: string) => {
    const values = new Float64Array(hours).fill(value);
    columns.set(quantity, { values, stands: { kind: 'mean' }, origin: 'assumed' });
    notes.push({ kind: 'assumption', text, count: hours });
  };
  if (!columns.has('windMPerS')) lacking(faults, job, ['windMPerS'], 'wind speed');
  if (!columns.has('windFromDeg'))
    assumed(
      'windFromDeg',
      0,
      'The table has no wind direction: wind is taken to come from the north.',
    );
  if (!columns.has('pressurePa')) {
    const pressure = standardPressurePa(job.site.elevationM);
    assumed(
      'pressurePa',
      pressure,
      `The table has no air pressure: ${Math.round(pressure)} Pa of the standard atmosphere at ${job.site.elevationM} m are taken.`,
    );
  }
}
