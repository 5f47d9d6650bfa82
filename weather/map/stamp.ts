// The stamp of a row, from one column or several → seconds since 1970-01-01 00:00, in UTC.
//
// Civil time of a zone is brought back to UTC by the zone's own rules; the hour that comes twice in
// autumn is told apart by the order of the rows.
import { IANAZone } from 'luxon';
import { type Cells, cellText } from './cells.ts';
import { createDateReader, dayNumber } from './date-text.ts';
import type { Clock, StampMapping, StampReads } from './mapping.ts';
import { type NumberForm, numberIn } from './numbers.ts';

/** A part of the stamp with the place of its column, from 0. */
export interface PlacedPart {
  readonly at: number;
  readonly reads: StampReads;
  readonly order?: 'ymd' | 'dmy' | 'mdy';
}

export interface StampReader {
  /** Seconds in UTC, or NaN for a stamp that cannot be read. */
  read(cells: Cells): number;
  /** Year that the last stamp stated, on its own clock; 0 where it stated none. */
  readonly year: number;
  /** Whether stamps state their offset from UTC themselves. */
  readonly statesOffset: boolean;
}

const nominalYear = 2018;

export function createStampReader(
  stamp: StampMapping,
  parts: readonly PlacedPart[],
  form: NumberForm,
  siteUtcOffsetH: number,
): StampReader {
  const has = (reads: StampReads) => parts.find((part) => part.reads === reads);
  const dates = new Map(
    parts
      .filter(({ reads }) => reads === 'dateTime' || reads === 'date' || reads === 'time')
      .map((part) => [
        part.at,
        createDateReader(part.order ?? 'ymd', part.reads as 'date' | 'time' | 'dateTime'),
      ]),
  );
  const toUtc = clockToUtc(stamp.clock, siteUtcOffsetH);
  const wholeOf = (cells: Cells, at: number) =>
    at < cells.count ? numberIn(cells.text, cells.from[at], cells.to[at], form) : Number.NaN;
  let year = 0;
  let statesOffset = false;
  let lastUtcS = Number.NEGATIVE_INFINITY;

  /** Reads one part that is a text; adds its offset where it states one. */
  let offsetS = Number.NaN;
  function textPart(cells: Cells, at: number): number {
    if (at >= cells.count) return Number.NaN;
    const found = dates.get(at)?.(cells.text, cells.from[at], cells.to[at]);
    if (!found) return Number.NaN;
    if (!Number.isNaN(found.utcOffsetS)) offsetS = found.utcOffsetS;
    return found.seconds;
  }

  const dateTime = has('dateTime');
  const date = has('date');
  const time = has('time');
  const [years, months, days] = [has('year'), has('month'), has('day')];
  const [hours, minutes, hourMinute] = [has('hour'), has('minute'), has('hourMinute')];
  const [dayOfYear, hourOfYear] = [has('dayOfYear'), has('hourOfYear')];
  const epoch = has('epochSeconds') ?? has('epochMilliseconds') ?? has('spreadsheetDay');

  function local(cells: Cells): number {
    if (epoch) {
      const value = wholeOf(cells, epoch.at);
      if (epoch.reads === 'spreadsheetDay')
        return value >= 1 && value < 110000
          ? Math.round((value - 25569) * 1440) * 60 // to the minute: days are fractions with a rounding
          : Number.NaN;
      const seconds = epoch.reads === 'epochMilliseconds' ? value / 1000 : value;
      if (!(seconds >= -2.3e9 && seconds <= 7.3e9)) return Number.NaN;
      offsetS = 0;
      return seconds;
    }
    let seconds = 0;
    if (dateTime) seconds = textPart(cells, dateTime.at);
    else if (date) seconds = textPart(cells, date.at);
    else {
      let y = stamp.year ?? nominalYear;
      if (years) {
        y = wholeOf(cells, years.at);
        if (y < 100 && cellText(cells, years.at).length === 2) y += y < 70 ? 2000 : 1900;
        year = y;
      }
      if (months && days)
        seconds = dayNumber(y, wholeOf(cells, months.at), wholeOf(cells, days.at)) * 86400;
      else if (dayOfYear) {
        const n = wholeOf(cells, dayOfYear.at);
        const length = dayNumber(y + 1, 1, 1) - dayNumber(y, 1, 1);
        seconds = n >= 1 && n <= length ? (dayNumber(y, 1, 1) + n - 1) * 86400 : Number.NaN;
      } else if (hourOfYear) {
        const n = wholeOf(cells, hourOfYear.at);
        return n >= 0 && n <= 8784 ? dayNumber(y, 1, 1) * 86400 + n * 3600 : Number.NaN;
      } else return Number.NaN;
    }
    if (time) seconds += textPart(cells, time.at);
    if (hours) {
      const hour = wholeOf(cells, hours.at);
      seconds += hour >= 0 && hour <= 24 ? hour * 3600 : Number.NaN;
    }
    if (hourMinute) {
      const packed = wholeOf(cells, hourMinute.at);
      const [h, m] = [Math.floor(packed / 100), packed % 100];
      seconds +=
        h >= 0 && h <= 24 && m < 60 && Number.isInteger(m) ? h * 3600 + m * 60 : Number.NaN;
    }
    if (minutes) {
      const minute = wholeOf(cells, minutes.at);
      seconds += minute >= 0 && minute <= 60 ? minute * 60 : Number.NaN;
    }
    if (dateTime || date) year = yearOfSeconds(seconds);
    return seconds;
  }

  return {
    get year() {
      return year;
    },
    get statesOffset() {
      return statesOffset;
    },
    read(cells) {
      offsetS = Number.NaN;
      const seconds = local(cells);
      if (!(Math.abs(seconds) < 1e10)) return Number.NaN;
      if (!Number.isNaN(offsetS)) {
        statesOffset = true;
        lastUtcS = seconds - offsetS;
      } else lastUtcS = toUtc(seconds, lastUtcS);
      return lastUtcS;
    },
  };
}

/** Civil year of seconds since 1970, quick: within a day of the new year it may be asked of the date. */
function yearOfSeconds(seconds: number): number {
  const days = Math.floor(seconds / 86400);
  let year = 1970 + Math.floor(days / 365.2425);
  while (days < dayNumber(year, 1, 1)) year--;
  while (days >= dayNumber(year + 1, 1, 1)) year++;
  return year;
}

type ToUtc = (localS: number, previousUtcS: number) => number;

function clockToUtc(clock: Clock, siteUtcOffsetH: number): ToUtc {
  if (clock.kind !== 'zone') {
    const offsetS = (clock.kind === 'offset' ? clock.utcOffsetH : siteUtcOffsetH) * 3600;
    return (localS) => localS - offsetS;
  }
  const zone = IANAZone.create(clock.zone);
  const offsetAt = (utcS: number) => zone.offset(utcS * 1000) * 60;
  let knownDay = Number.NaN;
  let early = 0;
  let late = 0;
  return (localS, previousUtcS) => {
    const day = Math.floor(localS / 86400);
    if (day !== knownDay) {
      // Offsets well before and well after the day: only a day of change has two.
      knownDay = day;
      early = offsetAt(day * 86400 - 15 * 3600);
      late = offsetAt((day + 1) * 86400 + 15 * 3600);
    }
    if (early === late) return localS - early;
    const valid = [early, late]
      .map((offset) => localS - offset)
      .filter((utcS, k) => offsetAt(utcS) === [early, late][k]);
    if (valid.length === 0) return localS - early; // an hour that the clock left out
    valid.sort((a, b) => a - b);
    return valid.find((utcS) => utcS > previousUtcS) ?? valid[0];
  };
}
