// The calendar that weekdays follow, and the years that the sun follows.
import { isLeapYear } from '../calendar.ts';
import type { WeatherNote } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';

/** Years for stitched tables: 1 January 2018 was a Monday, 2024 is the leap year that began so. */
const commonYear = 2018;
const leapYear = 2024;

export interface CalendarYear {
  readonly year: number;
  readonly sourceYear: Int16Array;
  readonly note?: WeatherNote;
}

/** @param stated year that the file or the caller gives */
export function calendarOf(
  sourceYear: Int16Array,
  hours: number,
  stated: number | undefined,
  faults: FaultList,
): CalendarYear {
  const isLeap = hours === 8784;
  if (stated !== undefined) {
    if (isLeap && !isLeapYear(stated))
      faults.whole(
        `the calendar year ${stated} for a table with 29 February`,
        'a leap year',
        'Choose a leap year, or a table of 8760 hours.',
        'year',
      );
    const filled = sourceYear.map((year) => (year === 0 ? stated : year));
    return { year: stated, sourceYear: filled };
  }
  const first = sourceYear[Math.floor(hours / 2)];
  const isOneYear = sourceYear.every((year) => year === first) && isLeapYear(first) === isLeap;
  if (isOneYear && first !== 0) return { year: first, sourceYear };
  const year = isLeap ? leapYear : commonYear;
  const filled = sourceYear.map((one) => (one === 0 ? year : one));
  return {
    year,
    sourceYear: filled,
    note: {
      kind: 'assumption',
      text: `The months come from different years or state none; weekdays follow ${year}, whose 1 January is a Monday.`,
      count: hours,
    },
  };
}
