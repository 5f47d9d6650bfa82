// Hours of the year as dates. Index 0 is 1 January 00:00 of local standard time; there is no
// daylight saving, so a day always has 24 hours.

const monthNames = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;
const dayNames = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

export interface Month {
  readonly name: string;
  readonly short: string;
  readonly firstHour: number;
  /** One past the last. */
  readonly endHour: number;
}

export interface Calendar {
  readonly hours: number;
  readonly days: number;
  readonly months: readonly Month[];
  /** 0 is Sunday; null where the weather gave no year, so that no weekday is made up. */
  readonly firstWeekday: number | null;
}

export function makeCalendar(hours: number, year?: number): Calendar {
  const days = Math.round(hours / 24);
  const lengths = [31, days >= 366 ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  let day = 0;
  const months = lengths.map((length, i) => {
    const name = monthNames[i] ?? '';
    const firstHour = day * 24;
    day += length;
    return { name, short: name.slice(0, 3), firstHour, endHour: Math.min(day * 24, hours) };
  });
  const firstWeekday = year === undefined ? null : new Date(Date.UTC(year, 0, 1)).getUTCDay();
  return { hours, days, months, firstWeekday };
}

function monthOf(calendar: Calendar, hour: number): number {
  const at = calendar.months.findIndex((month) => hour < month.endHour);
  return at < 0 ? 11 : at;
}

function dayOf(calendar: Calendar, hour: number) {
  const month = calendar.months[monthOf(calendar, hour)];
  const date = month ? Math.floor((hour - month.firstHour) / 24) + 1 : 1;
  const weekday =
    calendar.firstWeekday === null
      ? ''
      : (dayNames[(calendar.firstWeekday + Math.floor(hour / 24)) % 7] ?? '');
  return { date, month: month?.name ?? '', weekday };
}

/** `Fri 18` for an axis; `18 Jul` where the weekday is unknown. */
export function axisDay(calendar: Calendar, hour: number): string {
  const { date, month, weekday } = dayOf(calendar, hour);
  return weekday ? `${weekday.slice(0, 3)} ${date}` : `${date} ${month.slice(0, 3)}`;
}

/** `18 July` */
export function dayText(calendar: Calendar, hour: number): string {
  const { date, month } = dayOf(calendar, hour);
  return `${date} ${month}`;
}

export function clock(hour: number): string {
  return `${String(hour % 24).padStart(2, '0')}:00`;
}

/** `Fri 18 July, 16:00 to 17:00` */
export function hourSpan(calendar: Calendar, hour: number): string {
  const { date, month, weekday } = dayOf(calendar, hour);
  const end = `${String((hour % 24) + 1).padStart(2, '0')}:00`;
  return `${weekday ? `${weekday.slice(0, 3)} ` : ''}${date} ${month}, ${clock(hour)} to ${end}`;
}

/** `17 January, 07:00` */
export function hourText(calendar: Calendar, when: number): string {
  return `${dayText(calendar, when)}, ${clock(when)}`;
}

/** `17 January, 07:00` from the engine's `2025-01-17T07:00`; empty stays empty. */
export function stampText(stamp: string): string {
  const [, month, day, time] = /^\d{4}-(\d{2})-(\d{2})T(\d{2}:\d{2})$/.exec(stamp) ?? [];
  const name = monthNames[Number(month) - 1];
  return name ? `${Number(day)} ${name}, ${time}` : stamp;
}

/** A moment of this machine's clock: `3 Dec, 10:42`. */
export function clockText(milliseconds: number): string {
  return new Date(milliseconds).toLocaleString('en-GB', {
    day: 'numeric',
    month: 'short',
    hour: '2-digit',
    minute: '2-digit',
  });
}
