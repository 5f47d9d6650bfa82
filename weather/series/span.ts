// Which hours of a series make the weather year, for each choice of year, run or part.
import { isLeapYear } from '../calendar.ts';
import type { Fault } from '../fault.ts';
import { dateOfDay, dayNumber } from '../map/date-text.ts';
import type { WeatherNote } from '../weather-year.ts';
import { momentText, type WeatherSeries } from './series.ts';

export type YearChoice =
  /** The only whole year that the table holds. */
  | { readonly kind: 'auto' }
  | { readonly kind: 'year'; readonly year: number }
  /** Twelve months from a day, laid on the calendar from January. */
  | { readonly kind: 'from'; readonly year: number; readonly month: number; readonly day: number }
  /** What there is of a year; its first and last day are repeated outside. */
  | { readonly kind: 'part' };

export interface HeldYear {
  readonly year: number;
  /** Share of its hours that the table holds, 0 to 1. */
  readonly share: number;
}

/** Hours at the ends of a year that may come round from its other end: the offsets from UTC. */
const mostWrappedH = 14;

/** Calendar years that a series touches, and how much of each. */
export function heldYears(series: WeatherSeries): readonly HeldYear[] {
  const { startS, intervalS, count } = series;
  const endS = startS + count * intervalS;
  const first = dateOfDay(Math.floor(startS / 86400)).year;
  const last = dateOfDay(Math.floor((endS - 1) / 86400)).year;
  return Array.from({ length: last - first + 1 }, (_, i) => {
    const from = dayNumber(first + i, 1, 1) * 86400;
    const to = dayNumber(first + i + 1, 1, 1) * 86400;
    return {
      year: first + i,
      share: Math.max(0, Math.min(to, endS) - Math.max(from, startS)) / (to - from),
    };
  });
}

export interface Span {
  readonly hourS: Float64Array;
  readonly year: number;
  readonly notes: readonly WeatherNote[];
  readonly covers?: { readonly fromHour: number; readonly toHour: number };
}

export function spanOf(series: WeatherSeries, choice: YearChoice): Span | Fault {
  const held = heldYears(series);
  const { startS, intervalS, count, file } = series;
  const endS = startS + count * intervalS;
  const fault = (found: string, expected: string, mend: string): Fault => ({
    file,
    place: { path: 'year' },
    found,
    expected,
    mend,
  });
  const whole = held.filter(
    ({ year, share }) => share * hoursOf(year) >= hoursOf(year) - mostWrappedH,
  );
  if (choice.kind === 'auto') {
    if (whole.length === 1) return calendarSpan(series, whole[0].year);
    const said = held.map(({ year, share }) => `${year} (${Math.round(share * 100)} %)`).join(', ');
    if (whole.length > 1)
      return fault(
        `several whole years: ${said}`,
        'the year that is meant',
        'Choose a year with --year, or a run of twelve months with --from.',
      );
    const isLong = endS - startS >= 365 * 86400;
    return fault(
      `no whole calendar year: ${momentText(startS)} to ${momentText(endS)}`,
      'a year from 1 January to 31 December',
      isLong
        ? 'Choose a run of twelve months with --from YYYY-MM-DD.'
        : 'Choose a longer table, or take the part with --part: outside it, its first and last day are repeated.',
    );
  }
  if (choice.kind === 'year') {
    if (whole.some(({ year }) => year === choice.year)) return calendarSpan(series, choice.year);
    return fault(
      `no whole year ${choice.year}`,
      `one of ${whole.map(({ year }) => year).join(', ') || 'none'}`,
      'Choose one of these years, or a run of twelve months with --from.',
    );
  }
  if (choice.kind === 'from') return runSpan(series, choice, fault);
  return partSpan(series);
}

const hoursOf = (year: number) => (isLeapYear(year) ? 8784 : 8760);

/** A calendar year; hours at its ends may come round from the other end. */
function calendarSpan(series: WeatherSeries, year: number): Span {
  const { startS, intervalS, count } = series;
  const endS = startS + count * intervalS;
  const from = dayNumber(year, 1, 1) * 86400;
  const leapAt = isLeapYear(year)
    ? (dayNumber(year, 2, 29) * 86400 - startS) / intervalS
    : Number.NaN;
  const hasLeapDay = Number.isNaN(leapAt)
    ? false
    : series.rowOf[Math.max(0, Math.round(leapAt))] > 0;
  const hours = hasLeapDay ? 8784 : 8760;
  const skipsLeap = isLeapYear(year) && !hasLeapDay;
  let wrapped = 0;
  const hourS = Float64Array.from({ length: hours }, (_, h) => {
    const moved = skipsLeap && h >= 59 * 24 ? h + 24 : h;
    const at = from + moved * 3600;
    const length = hoursOf(year) * 3600;
    if (at >= startS - 1 && at + 3600 <= endS + 1) return at;
    wrapped++;
    // From the other end; where that is not held either, the nearest hour.
    const other = at < startS ? at + length : at - length;
    if (other >= startS - 1 && other + 3600 <= endS + 1) return other;
    return at < startS
      ? at + Math.ceil((startS - at) / 3600) * 3600
      : at - Math.ceil((at + 3600 - endS) / 3600) * 3600;
  });
  const notes: WeatherNote[] =
    wrapped > 0
      ? [
          {
            kind: 'assumption',
            text: `${wrapped} hours at the ends of the year are not in the table; they were taken from its other end.`,
            count: wrapped,
          },
        ]
      : [];
  return { hourS, year: skipsLeap ? calendarLike(year) : year, notes };
}

/** A year of 365 days that begins on the same weekday. */
function calendarLike(year: number): number {
  for (let other = year - 1; ; other--)
    if (!isLeapYear(other) && (dayNumber(year, 1, 1) - dayNumber(other, 1, 1)) % 7 === 0)
      return other;
}

function runSpan(
  series: WeatherSeries,
  { year, month, day }: { readonly year: number; readonly month: number; readonly day: number },
  fault: (found: string, expected: string, mend: string) => Fault,
): Span | Fault {
  const { startS, intervalS, count } = series;
  const first = dayNumber(year, month, day);
  const name = `${year}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
  const hourS = new Float64Array(8760);
  let filled = 0;
  for (let d = first; filled < 365; d++) {
    const date = dateOfDay(d);
    if (Number.isNaN(first)) break;
    if (date.month === 2 && date.day === 29) continue;
    const at = dayNumber(2018, date.month, date.day) - dayNumber(2018, 1, 1);
    for (let h = 0; h < 24; h++) hourS[at * 24 + h] = d * 86400 + h * 3600;
    filled++;
    if (d * 86400 < startS - 1 || (d + 1) * 86400 > startS + count * intervalS + 3601)
      return fault(
        `a table from ${momentText(startS)} to ${momentText(startS + count * intervalS)}`,
        `twelve months from ${name}`,
        'Choose another day to begin with.',
      );
  }
  if (Number.isNaN(first)) return fault(name, 'a day of the calendar', 'Correct the day.');
  return {
    hourS,
    year: month === 1 && day === 1 && !isLeapYear(year) ? year : 2018,
    notes: [
      {
        kind: 'assumption',
        text: `Twelve months from ${name} were laid on the calendar from January; where they join, the weather jumps. 29 February is left out.`,
        count: 8760,
      },
    ],
  };
}

/** Less than a year: outside what the table holds, its first and last whole day are repeated. */
function partSpan(series: WeatherSeries): Span | Fault {
  const { startS, intervalS, count } = series;
  const endS = startS + count * intervalS;
  const firstDay = Math.ceil(startS / 86400 - 1e-9);
  const lastDay = Math.floor(endS / 86400 + 1e-9) - 1;
  const { year } = dateOfDay(firstDay);
  const from = dayNumber(year, 1, 1);
  const days = hoursOf(year) / 24;
  if (lastDay < firstDay || lastDay >= from + days) {
    return {
      file: series.file,
      place: { path: 'year' },
      found: `${momentText(startS)} to ${momentText(endS)}`,
      expected: 'at least one whole day, all within one calendar year',
      mend: 'Choose a year with --year, or a run of twelve months with --from.',
    };
  }
  const hourS = Float64Array.from({ length: days * 24 }, (_, h) => {
    const day = from + Math.floor(h / 24);
    return Math.min(lastDay, Math.max(firstDay, day)) * 86400 + (h % 24) * 3600;
  });
  const outside = (days - (lastDay - firstDay + 1)) * 24;
  return {
    hourS,
    year,
    covers: { fromHour: (firstDay - from) * 24, toHour: (lastDay + 1 - from) * 24 },
    notes: [
      {
        kind: 'repair',
        text: `The table covers ${momentText(firstDay * 86400).slice(0, 10)} to ${momentText(lastDay * 86400).slice(0, 10)} only. Outside, its first and last day are repeated: annual sums, degree days and design values mean nothing, and results hold between these days alone.`,
        count: outside,
      },
    ],
  };
}
