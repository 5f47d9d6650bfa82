// Hours of the year as text, in local standard time.

const daysBefore = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334, 365];

/** Month of an hour, 0 to 11. */
export function monthOfHour(hour: number, hoursInYear: number): number {
  const day = Math.floor(hour / 24);
  const leap = hoursInYear === 8784 ? 1 : 0;
  let month = 11;
  while (month > 0 && day < daysBefore[month] + (month > 1 ? leap : 0)) month--;
  return month;
}

/** "2025-01-17" for any hour of that day. */
export function dayName(hour: number, hoursInYear: number, year: number): string {
  const month = monthOfHour(hour, hoursInYear);
  const leap = hoursInYear === 8784 && month > 1 ? 1 : 0;
  const day = Math.floor(hour / 24) - daysBefore[month] - leap + 1;
  return `${year}-${two(month + 1)}-${two(day)}`;
}

/** "2025-01-17T07:00" for the hour from 07:00 to 08:00. */
export function hourName(hour: number, hoursInYear: number, year: number): string {
  return `${dayName(hour, hoursInYear, year)}T${two(hour % 24)}:00`;
}

const two = (n: number): string => String(n).padStart(2, '0');
