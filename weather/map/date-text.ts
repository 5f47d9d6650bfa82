// A date, a time of day or both, as people and loggers write them → numbers, without a string for each.
//
// Taken: 2023-01-31T14:05, 31.1.2023 14:05:00, 1/31/23 2:05 PM, 31-Jan-2023, 20230131:1405,
// 20230131140500, 2023-01-31T14:05:00+01:00, 2023-01-31 24:00. The order of the parts is the mapping's.
import { isLeapYear, monthLengths } from '../calendar.ts';
import type { DateOrder } from './mapping.ts';

/** What was read, in seconds since 1970-01-01 00:00 of the stamp's own clock. */
export interface DateReading {
  seconds: number;
  /** Where the text states its offset from UTC [s]; else NaN. */
  utcOffsetS: number;
}

/** Days since 1970-01-01 of the Gregorian calendar, or NaN for a day that it does not have. */
export function dayNumber(year: number, month: number, day: number): number {
  if (!(year >= 1900 && year <= 2200 && month >= 1 && month <= 12 && day >= 1)) return Number.NaN;
  if (day > 28 && day > monthLengths(isLeapYear(year) ? 366 : 365)[month - 1]) return Number.NaN;
  // Days from civil, counted from 1 March so that the leap day comes last.
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfEra =
    yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146097 + dayOfEra - 719468;
}

/** Year, month 1 to 12 and day of a day number. */
export function dateOfDay(days: number): { year: number; month: number; day: number } {
  const z = days + 719468;
  const era = Math.floor(z / 146097);
  const dayOfEra = z - era * 146097;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36524) -
      Math.floor(dayOfEra / 146096)) /
      365,
  );
  const dayOfYear =
    dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const part = Math.floor((5 * dayOfYear + 2) / 153);
  const month = part < 10 ? part + 3 : part - 9;
  const day = dayOfYear - Math.floor((153 * part + 2) / 5) + 1;
  return { year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0), month, day };
}

const monthStems: readonly (readonly string[])[] = [
  ['jan', 'ene', 'gen', 'jän'],
  ['feb', 'fév', 'fev'],
  ['mar', 'mär', 'mrz', 'maa'],
  ['apr', 'avr', 'abr'],
  ['may', 'mai', 'mag', 'mei'],
  ['jun', 'jui', 'giu'],
  ['jul', 'lug'],
  ['aug', 'aoû', 'aou', 'ago'],
  ['sep', 'set'],
  ['oct', 'okt', 'ott', 'out'],
  ['nov'],
  ['dec', 'dez', 'déc', 'dic'],
];

/** Month of a name in the commoner European languages, 1 to 12, or 0. */
export function monthNamed(word: string): number {
  const small = word.toLowerCase();
  if (small.startsWith('juil')) return 7;
  return monthStems.findIndex((stems) => stems.some((stem) => small.startsWith(stem))) + 1;
}

/** Reads dates and times of one order into a record of its own, reused from call to call. */
export function createDateReader(order: DateOrder, has: 'date' | 'time' | 'dateTime') {
  const numbers = new Float64Array(8);
  const lengths = new Int32Array(8);
  const reading: DateReading = { seconds: Number.NaN, utcOffsetS: Number.NaN };

  /** The reading, or null where the text is none. */
  return function read(text: string, from: number, to: number): DateReading | null {
    let count = 0;
    let month = 0;
    let half = -1; // 0 am, 1 pm
    let fraction = 0;
    reading.utcOffsetS = Number.NaN;
    let i = from;
    while (i < to) {
      const c = text.charCodeAt(i);
      if (c >= 48 && c <= 57) {
        if (count === 8) return null;
        let value = 0;
        const start = i;
        while (i < to) {
          const d = text.charCodeAt(i);
          if (d < 48 || d > 57) break;
          value = value * 10 + (d - 48);
          i++;
        }
        if (i - start > 14) return null;
        const previous = start > from ? text.charCodeAt(start - 1) : 0;
        const timeParts = count - (has === 'time' ? 0 : month > 0 ? 2 : 3);
        if ((previous === 46 || previous === 44) && timeParts === 3) {
          fraction = value / 10 ** (i - start);
          continue;
        }
        numbers[count] = value;
        lengths[count] = i - start;
        count++;
        continue;
      }
      const isLetter = (c >= 65 && c <= 90) || (c >= 97 && c <= 122) || c >= 192;
      if (isLetter) {
        const start = i;
        while (i < to) {
          const d = text.charCodeAt(i);
          if (!((d >= 65 && d <= 90) || (d >= 97 && d <= 122) || d >= 192)) break;
          i++;
        }
        const word = text.slice(start, i).toLowerCase();
        if (word === 't') continue;
        if (word === 'z' || word === 'utc' || word === 'gmt') reading.utcOffsetS = 0;
        else if (word === 'am' || word === 'a') half = 0;
        else if (word === 'pm' || word === 'p') half = 1;
        else if (word === 'm' && half >= 0)
          continue; // a.m.
        else if (word === 'h' || word === 'uhr') continue;
        else if (isWeekday(word)) continue;
        else if (month === 0 && has !== 'time' && monthNamed(word) > 0) month = monthNamed(word);
        else return null;
        continue;
      }
      const isSign = c === 43 || c === 45;
      if (isSign && has !== 'date' && hasTimeAlready(count, month, has) && !seesDate(text, i, to)) {
        const zone = /^([+-])(\d\d):?(\d\d)?$/.exec(text.slice(i, to).trim());
        if (zone === null) return null;
        const seconds = Number(zone[2]) * 3600 + Number(zone[3] ?? 0) * 60;
        reading.utcOffsetS = zone[1] === '-' ? -seconds : seconds;
        break;
      }
      // A blank, or one of - / . , : '
      if (
        !(
          c <= 32 ||
          c === 45 ||
          c === 47 ||
          c === 46 ||
          c === 44 ||
          c === 58 ||
          c === 39 ||
          c === 160
        )
      )
        return null;
      i++;
    }
    const seconds = assemble(count, month, half, fraction);
    if (Number.isNaN(seconds)) return null;
    reading.seconds = seconds;
    return reading;
  };

  function assemble(count: number, month: number, half: number, fraction: number): number {
    let at = 0;
    let days = 0;
    if (has !== 'time') {
      if (lengths[0] >= 8 && count > 0) {
        if (lengths[0] === 8) {
          const [y, m, d] = compactDate(numbers[0]);
          days = dayNumber(y, m, d);
          at = 1;
        } else if (lengths[0] === 12 || lengths[0] === 14) {
          const packed = lengths[0] === 14 ? numbers[0] : numbers[0] * 100;
          const time = packed % 1e6;
          const [y, m, d] = compactDate(Math.floor(packed / 1e6));
          if (count !== 1) return Number.NaN;
          days = dayNumber(y, m, d);
          return (
            days * 86400 +
            clock(Math.floor(time / 10000), Math.floor(time / 100) % 100, time % 100, half)
          );
        } else return Number.NaN;
      } else if (month > 0) {
        if (count < 2) return Number.NaN;
        const yearFirst = lengths[0] === 4;
        days = dayNumber(wholeYear(yearFirst ? 0 : 1), month, numbers[yearFirst ? 1 : 0]);
        at = 2;
      } else {
        if (count < 3) return Number.NaN;
        const [y, m, d] = order === 'ymd' ? [0, 1, 2] : order === 'dmy' ? [2, 1, 0] : [2, 0, 1];
        if (lengths[0] === 4 && order !== 'ymd') return Number.NaN;
        days = dayNumber(wholeYear(y), numbers[m], numbers[d]);
        at = 3;
      }
    }
    const left = count - at;
    if (has === 'date')
      return left === 0 ? days * 86400 : midnightOnly(at, count) ? days * 86400 : Number.NaN;
    if (left === 0) return has === 'dateTime' && half < 0 ? days * 86400 : Number.NaN;
    if (left > 3) return Number.NaN;
    if (left === 1 && (lengths[at] === 4 || lengths[at] === 3))
      return days * 86400 + clock(Math.floor(numbers[at] / 100), numbers[at] % 100, 0, half);
    const minute = left > 1 ? numbers[at + 1] : 0;
    const second = left > 2 ? numbers[at + 2] : 0;
    return days * 86400 + clock(numbers[at], minute, second, half) + fraction;
  }

  /** A date column that a spreadsheet wrote with its midnight: 2023-01-31 00:00:00. */
  function midnightOnly(at: number, count: number): boolean {
    for (let k = at; k < count; k++) if (numbers[k] !== 0) return false;
    return count - at >= 2;
  }

  function compactDate(packed: number): readonly [number, number, number] {
    const one = Math.floor(packed / 10000);
    if (order === 'ymd') return [one, Math.floor(packed / 100) % 100, packed % 100];
    const [a, b] = [Math.floor(packed / 1e6), one % 100];
    return order === 'dmy' ? [packed % 10000, b, a] : [packed % 10000, a, b];
  }

  function wholeYear(at: number): number {
    const value = numbers[at];
    if (lengths[at] === 4) return value;
    if (lengths[at] !== 2) return Number.NaN;
    return value < 70 ? 2000 + value : 1900 + value;
  }
}

function hasTimeAlready(count: number, month: number, has: 'date' | 'time' | 'dateTime'): boolean {
  return count >= (has === 'time' ? 2 : month > 0 ? 4 : 5);
}

/** Whether a part of a date still follows a hyphen: only then it is no sign of an offset. */
function seesDate(text: string, at: number, to: number): boolean {
  return text.slice(at, to).includes('-', 1);
}

const weekdays =
  /^((mon|tue|wed|thu|fri|sat|sun)(day|sday|nesday|rsday|urday)?|mo|di|mi|do|fr|sa|so)$/;
const isWeekday = (word: string) => weekdays.test(word) && monthNamed(word) === 0;

/** Seconds of the day, NaN where there is no such time; 24:00 is the day's end. */
function clock(hour: number, minute: number, second: number, half: number): number {
  let h = hour;
  if (half >= 0) {
    if (h < 1 || h > 12) return Number.NaN;
    h = (h % 12) + 12 * half;
  }
  if (h > 24 || minute > 59 || second > 60 || (h === 24 && (minute > 0 || second > 0)))
    return Number.NaN;
  return h * 3600 + minute * 60 + second;
}
