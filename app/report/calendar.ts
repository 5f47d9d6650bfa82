// Hours of the year as words, in local standard time.

import { hourName, monthOfHour } from '../../engine/index.ts';

export const monthNames = [
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

const dayNames = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'] as const;

export interface Month {
  readonly name: string;
  readonly firstHour: number;
  /** One past the last. */
  readonly endHour: number;
}

export function monthsOf(hours: number): Month[] {
  const months = monthNames.map((name) => ({ name, firstHour: hours, endHour: 0 }));
  for (let day = 0; day * 24 < hours; day++) {
    const month = months[monthOfHour(day * 24, hours)];
    if (!month) continue;
    month.firstHour = Math.min(month.firstHour, day * 24);
    month.endHour = Math.min(hours, day * 24 + 24);
  }
  return months;
}

/** `26 January, 07:00` from the engine's `2025-01-26T07:00`; empty stays empty. */
export function momentText(stamp: string): string {
  const [, month, day, time] = /^\d{4}-(\d{2})-(\d{2})T(\d{2}:\d{2})$/.exec(stamp) ?? [];
  const name = monthNames[Number(month) - 1];
  return name ? `${Number(day)} ${name}, ${time}` : stamp;
}

/** `26 January` from `2025-01-26`. */
export function dateText(date: string): string {
  const [, month, day] = /^\d{4}-(\d{2})-(\d{2})/.exec(date) ?? [];
  const name = monthNames[Number(month) - 1];
  return name ? `${Number(day)} ${name}` : date;
}

interface Year {
  readonly hours: number;
  readonly year: number;
}

/** `Wed 6 Aug`, for an axis. */
export function dayLabel(hour: number, { hours, year }: Year): string {
  const weekday = new Date(Date.UTC(year, 0, 1 + Math.floor(hour / 24))).getUTCDay();
  const [date = '', month = ''] = dateText(hourName(hour, hours, year)).split(' ');
  return `${dayNames[weekday]} ${date} ${month.slice(0, 3)}`;
}

const clock = (hour: number) => `${String(hour).padStart(2, '0')}:00`;

/** `Wed 6 Aug, 14:00 to 15:00` */
export function hourSpan(hour: number, year: Year): string {
  return `${dayLabel(hour, year)}, ${clock(hour % 24)} to ${clock((hour % 24) + 1)}`;
}
