// The calendar of a weather year: months and days of its hours.

const commonDays = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
const leapDays = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

export function isLeapYear(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

/** Length of each month; `days` is that of the weather year, 365 or 366. */
export function monthLengths(days: number): readonly number[] {
  return days === 366 ? leapDays : commonDays;
}

/** Month, 1 to 12, and day of the month of a day counted from 0. */
export function monthAndDay(dayIndex: number, days: number): { month: number; day: number } {
  let left = dayIndex;
  const lengths = monthLengths(days);
  for (let m = 0; m < 12; m++) {
    if (left < lengths[m]) return { month: m + 1, day: left + 1 };
    left -= lengths[m];
  }
  throw new Error(`day ${dayIndex} is outside a year of ${days} days`);
}

/** Index of the first hour of each month, and the year's end as a thirteenth. */
export function monthStarts(hours: number): readonly number[] {
  const starts = [0];
  for (const length of monthLengths(hours / 24))
    starts.push(starts[starts.length - 1] + 24 * length);
  return starts;
}
