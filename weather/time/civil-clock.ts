// How far the clock on the wall is ahead of local standard time, hour by hour.
import { DateTime, IANAZone } from 'luxon';

/** Whether luxon's time zone data holds this IANA name, like "Europe/Lisbon". */
export function isTimeZone(name: string): boolean {
  return IANAZone.isValidZone(name);
}

/**
 * Civil time minus local standard time at the start of every hour of a year.
 *
 * @param year calendar year that decides when the clocks change
 * @param utcOffsetH local standard time minus UTC [h]
 * @param zone IANA time zone, or undefined for standard time all year
 * @param hours length of the year, 8760 or 8784
 * @returns `ahead[h]` [h]; in a zone with daylight saving mostly 0 or 1
 */
export function civilAheadH(
  year: number,
  utcOffsetH: number,
  zone: string | undefined,
  hours: number,
): Float64Array {
  const ahead = new Float64Array(hours);
  if (zone === undefined) return ahead;
  const startMs = Date.UTC(year, 0, 1) - utcOffsetH * 3_600_000;
  const clock = IANAZone.create(zone);
  const at = (h: number) => clock.offset(startMs + h * 3_600_000) / 60 - utcOffsetH;
  // Asking for an offset is slow. A day that begins and ends with the same one holds it throughout.
  for (let h = 0, from = at(0); h < hours; h += 24) {
    const to = at(h + 24);
    for (let i = h; i < Math.min(h + 24, hours); i++) ahead[i] = from === to ? from : at(i);
    from = to;
  }
  return ahead;
}

/** Day of the week of 1 January: 1 Monday to 7 Sunday. */
export function firstWeekday(year: number): number {
  return DateTime.utc(year, 1, 1).weekday;
}
