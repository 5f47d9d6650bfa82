// The site of a table: what the file states, what the caller gives, and what has to be asked for.
import type { Site, WeatherNote } from '../weather-year.ts';
import type { FaultList } from './fault-list.ts';
import { placeName } from './form-pvgis.ts';

const asked = [
  ['latitudeDeg', 'the latitude in degrees, north positive', -90, 90],
  ['longitudeDeg', 'the longitude in degrees, east positive', -180, 180],
  ['elevationM', 'the elevation above the sea in metres', -450, 9000],
  ['utcOffsetH', 'local standard time minus UTC in hours', -12, 14],
] as const;

/**
 * @param given by the caller; goes before what the file states
 * @param clockFromLongitude whether the table is in UTC, so that any local clock may be chosen
 */
export function completeSite(
  stated: Partial<Site>,
  given: Partial<Site>,
  clockFromLongitude: boolean,
  faults: FaultList,
  notes: WeatherNote[],
): Site | null {
  const site: { -readonly [K in keyof Site]?: Site[K] } = { ...stated, ...given };
  if (site.utcOffsetH === undefined && clockFromLongitude && site.longitudeDeg !== undefined) {
    site.utcOffsetH = Math.round(site.longitudeDeg / 15);
    notes.push({
      kind: 'assumption',
      text: `The table is in UTC and names no local clock; standard time UTC${site.utcOffsetH < 0 ? '' : '+'}${site.utcOffsetH} was taken from the longitude.`,
      count: 0,
    });
  }
  for (const [field, what, low, high] of asked) {
    const value = site[field];
    if (value !== undefined && value >= low && value <= high) continue;
    faults.whole(
      value === undefined ? 'no such value in the file' : String(value),
      `${what}, ${low} to ${high}`,
      `State the site's ${field} beside the file.`,
      `site.${field}`,
    );
  }
  const { latitudeDeg, longitudeDeg, elevationM, utcOffsetH } = site;
  if (latitudeDeg === undefined || longitudeDeg === undefined) return null;
  if (elevationM === undefined || utcOffsetH === undefined) return null;
  if (
    Math.abs(longitudeDeg - utcOffsetH * 15) > 52.5 &&
    Math.abs(longitudeDeg - utcOffsetH * 15) < 307.5
  )
    faults.whole(
      `a clock of UTC${utcOffsetH < 0 ? '' : '+'}${utcOffsetH} at longitude ${longitudeDeg}`,
      'a clock within 3.5 hours of the sun',
      'Check the signs: longitude is positive east of Greenwich, and the offset is local minus UTC.',
      'site.utcOffsetH',
    );
  const name = site.name || placeName(latitudeDeg, longitudeDeg);
  return { name, latitudeDeg, longitudeDeg, elevationM, utcOffsetH };
}
