// What may lie behind a shift between the light of a table and the sun of its site.
import type { Site } from '../weather-year.ts';
import { wrapMinutes } from './sun-phase.ts';

export interface ShiftCause {
  readonly text: string;
  /** The shift that it would make. */
  readonly minutes: number;
}

/** How near a cause has to come. */
const nearMinutes = 9;

/**
 * Causes that would make this shift, the nearest first.
 * @param shiftMinutes how late the light is
 */
export function shiftCauses(shiftMinutes: number, site: Site): readonly ShiftCause[] {
  const { longitudeDeg, utcOffsetH } = site;
  const offset = utcOffsetH * 60;
  const signed = (hours: number) => `UTC${hours < 0 ? '−' : '+'}${Math.abs(hours)}`;
  const causes: ShiftCause[] = [
    {
      // The sun of the other longitude comes 4 minutes a degree earlier or later.
      text: `the longitude has the wrong sign: ${-longitudeDeg} in place of ${longitudeDeg}`,
      minutes: 8 * longitudeDeg,
    },
    { text: 'the clock is put forward for summer all year', minutes: 60 },
    { text: 'rows are stamped at the end of their hour and read as its start', minutes: 60 },
    { text: 'rows are stamped at the start of their hour and read as its end', minutes: -60 },
    { text: 'rows are stamped half an interval from where they are read', minutes: 30 },
    { text: 'rows are stamped half an interval from where they are read', minutes: -30 },
    { text: `the stamps are in UTC, not in ${signed(utcOffsetH)}`, minutes: -offset },
    {
      text: `the offset from UTC has the wrong sign: ${signed(-utcOffsetH)} in place of ${signed(utcOffsetH)}`,
      minutes: -2 * offset,
    },
    {
      text: `the offset from UTC has the wrong sign, and so has the longitude`,
      minutes: 8 * longitudeDeg - 2 * offset,
    },
    {
      text: 'the table is in solar time',
      minutes:
        offset - 4 * longitudeDeg === 0 ? Number.NaN : wrapMinutes(4 * longitudeDeg - offset),
    },
  ];
  const far = (cause: ShiftCause) => Math.abs(wrapMinutes(cause.minutes - shiftMinutes));
  const hours = Math.round(shiftMinutes / 60);
  const fitting = causes.filter(
    (cause) => Math.abs(wrapMinutes(cause.minutes)) > 8 && far(cause) <= nearMinutes,
  );
  fitting.sort((a, b) => far(a) - far(b));
  if (fitting.length === 0 && hours !== 0 && Math.abs(shiftMinutes - hours * 60) <= nearMinutes)
    fitting.push({
      text: `the offset from UTC is ${signed(utcOffsetH + hours)}`,
      minutes: hours * 60,
    });
  return fitting;
}
