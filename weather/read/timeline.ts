// Whether the rows make one whole year of hours, in order, each once; and where each row belongs.
import type { FaultList } from './fault-list.ts';
import type { RowStore } from './row-store.ts';

export interface Timeline {
  /** 8760, or 8784 where the table holds 29 February. */
  readonly hours: number;
  /** Index of the row in the store for each hour of the file's clock. */
  readonly rowOfHour: Int32Array;
  /** Minute of the hour at which the rows are stamped. */
  readonly minute: number;
}

const leapFrom = 59 * 24;
const leapTo = 60 * 24;

/** Orders the rows; faults are added where they do not make a year. */
export function timeline(store: RowStore, heading: string, faults: FaultList): Timeline | null {
  const n = store.count;
  if (n === 0) {
    if (faults.isEmpty)
      faults.whole(
        'headings but no rows',
        '8760 hourly rows',
        'Choose the file with the whole table.',
      );
    return null;
  }
  if (!isHourly(store, heading, faults)) return null;
  if (n > 8784 + 24) {
    faults.whole(
      `more than a year: ${n === store.row.length ? 'over ' : ''}${n} rows from ${store.year[0]} to ${store.year[n - 1]}`,
      'one year, 8760 rows (8784 with 29 February)',
      'Cut the table to the year that is wanted.',
    );
    return null;
  }
  const minute = store.minute[0] % 60;
  const hasLeapDay = store.isCounted ? n > 8760 : holdsLeapDay(store);
  const hours = hasLeapDay ? 8784 : 8760;
  const rowOfHour = new Int32Array(hours).fill(-1);
  const before = faults.count;
  const twice: number[] = [];
  let last = -1;
  for (let i = 0; i < n; i++) {
    let hour = Math.floor(store.minute[i] / 60);
    if (!hasLeapDay && !store.isCounted && hour >= leapTo) hour -= 24;
    if (hour >= hours || store.minute[i] % 60 !== minute) {
      faults.row(
        store.row[i],
        heading,
        stampText(store, i),
        hour >= hours ? `an hour below ${hours}` : `minute ${minute} as in the first row`,
        'Correct the stamp.',
      );
      continue;
    }
    if (rowOfHour[hour] >= 0) twice.push(i);
    else if (hour < last)
      faults.row(
        store.row[i],
        heading,
        stampText(store, i),
        'a later hour than the row before',
        'Sort the rows by time, from 1 January to 31 December.',
      );
    if (rowOfHour[hour] < 0) rowOfHour[hour] = i;
    last = hour;
  }
  const gaps = gapsOf(rowOfHour);
  if (isClockChange(gaps, twice)) {
    faults.row(
      store.row[twice[0]],
      heading,
      `${stampText(store, twice[0])} a second time, and no ${hourText(gaps[0].from, hours)}`,
      'local standard time all year: every hour once',
      'The clock was changed for summer. Move the summer rows back by an hour, or export the table in standard time.',
    );
    return null;
  }
  for (const i of twice) {
    const hour =
      Math.floor(store.minute[i] / 60) -
      (!hasLeapDay && !store.isCounted && store.minute[i] >= leapTo * 60 ? 24 : 0);
    faults.row(
      store.row[i],
      heading,
      stampText(store, i),
      `each hour once (row ${store.row[rowOfHour[hour]]} has it too)`,
      'Delete one of the two rows, or correct its stamp.',
    );
  }
  for (const gap of gaps) {
    const toEnd = gap.from + gap.count === hours;
    const after = gap.from === 0 ? 0 : store.row[rowOfHour[gap.from - 1]];
    faults.row(
      after + 1,
      heading,
      `${gap.count} ${gap.count === 1 ? 'hour' : 'hours'} missing from ${hourText(gap.from, hours)}${toEnd ? ', where the table ends' : ''}`,
      `${hours} hourly rows (${n} found)`,
      toEnd
        ? 'The table was cut off: fetch the whole file again.'
        : 'Insert the rows, with empty cells where nothing was measured.',
    );
  }
  return faults.count > before ? null : { hours, rowOfHour, minute };
}

/** The step between most rows has to be an hour; anything else is said once, not row by row. */
function isHourly(store: RowStore, heading: string, faults: FaultList): boolean {
  const seen = new Map<number, number>();
  const n = Math.min(store.count, 2000);
  for (let i = 1; i < n; i++) {
    const apart = store.minute[i] - store.minute[i - 1];
    seen.set(apart, (seen.get(apart) ?? 0) + 1);
  }
  let usual = 60;
  let most = 0;
  for (const [apart, times] of seen)
    if (times > most) {
      usual = apart;
      most = times;
    }
  if (usual === 60 || most < 2) return true;
  faults.row(
    store.row[Math.min(1, store.count - 1)],
    heading,
    usual <= 0 ? 'the same or earlier time from row to row' : `a row every ${usual} minutes`,
    'a row every 60 minutes',
    usual > 0 && usual < 60
      ? 'Average the table to hourly values: this version reads hourly tables only.'
      : 'Use a table with hourly values: this version reads hourly tables only.',
  );
  return false;
}

function holdsLeapDay(store: RowStore): boolean {
  for (let i = 0; i < store.count; i++) {
    const hour = Math.floor(store.minute[i] / 60);
    if (hour >= leapFrom && hour < leapTo) return true;
  }
  return false;
}

function gapsOf(rowOfHour: Int32Array): { from: number; count: number }[] {
  const gaps: { from: number; count: number }[] = [];
  for (let h = 0; h < rowOfHour.length; h++) {
    if (rowOfHour[h] >= 0) continue;
    const last = gaps.at(-1);
    if (last !== undefined && last.from + last.count === h) last.count++;
    else gaps.push({ from: h, count: 1 });
  }
  return gaps;
}

/** One hour gone and another twice, months apart: the signature of summer time. */
function isClockChange(gaps: readonly { from: number; count: number }[], twice: readonly number[]) {
  return gaps.length === 1 && gaps[0].count === 1 && twice.length === 1;
}

const monthNames = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

/** "31 Mar 02:00" for an hour of the year. */
export function hourText(hour: number, hours: number): string {
  const lengths = [31, hours === 8784 ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  let day = Math.floor(hour / 24);
  let month = 0;
  while (month < 11 && day >= lengths[month]) day -= lengths[month++];
  return `${day + 1} ${monthNames[month]} ${String(hour % 24).padStart(2, '0')}:00`;
}

function stampText(store: RowStore, i: number): string {
  const minute = store.minute[i];
  if (store.isCounted) return `hour ${minute / 60}`;
  return `${hourText(Math.floor(minute / 60), 8784)} ${store.year[i]}`.replace(
    ':00 ',
    `:${String(minute % 60).padStart(2, '0')} `,
  );
}
