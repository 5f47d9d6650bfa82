// Which end of its interval a stamp marks, told by the light: read each way, the light comes earlier or
// later against the sun of the site.
import { sunTimeOfTable } from '../check/inspect.ts';
import type { Site } from '../weather-year.ts';
import type { Guess } from './detect-table.ts';
import type { Mapping, StampMapping } from './mapping.ts';
import { readMapped } from './read-mapped.ts';

/** Intervals shorter than this are not told apart by the light [s]. */
const leastIntervalS = 1800;
const places = { start: 0, middle: 0.5, end: 1 } as const;

/** Null where the light cannot tell: no site, no global radiation, too few clear days, or a wrong clock. */
export function settleMarks(
  source: string | Uint8Array,
  mapping: Mapping,
  site: Partial<Site>,
  intervalS: number,
): Guess<StampMapping['marks']> | null {
  const hasSun = mapping.columns.some(({ quantity }) => quantity === 'ghiWPerM2');
  if (intervalS < leastIntervalS || !hasSun) return null;
  const asStart: Mapping = { ...mapping, stamp: { ...mapping.stamp, marks: 'start' } };
  const read = readMapped(source, asStart, { site });
  if (!read.ok) return null;
  const shift = sunTimeOfTable(read.value)?.shiftMinutes ?? null;
  if (shift === null) return null;
  const place = (shift * 60) / intervalS;
  for (const marks of ['start', 'middle', 'end'] as const)
    if (Math.abs(place - places[marks]) * intervalS < 600)
      return {
        value: marks,
        confidence: 0.9,
        reason: `the light agrees with the sun of the site to ${Math.round(Math.abs(place - places[marks]) * (intervalS / 60))} min if stamps mark the ${marks}`,
      };
  return null;
}
