// Place and clock, as far as the lines above the table or its stamps state them.
import type { Site } from '../weather-year.ts';
import type { Guess } from './detect-table.ts';
import type { Clock } from './mapping.ts';

const fields: readonly (readonly [
  'latitudeDeg' | 'longitudeDeg' | 'elevationM',
  RegExp,
  number,
  number,
])[] = [
  ['latitudeDeg', /\b(?:latitude|lat\.?|breite(?:ngrad)?|latitud|latitudine)\b/i, -90, 90],
  [
    'longitudeDeg',
    /\b(?:longitude|long?\.?|l[äa]nge(?:ngrad)?|longitud|longitudine)\b/i,
    -180,
    180,
  ],
  [
    'elevationM',
    /\b(?:elevation|altitude|elev\.?|alt\.?|h[öo]he|altitud|quota|seeh[öo]he)\b/i,
    -450,
    9000,
  ],
];

/** "Latitude: 47.5", "lat;47,5 N", "Elevation (m) 480" in any line. */
export function siteIn(lines: readonly string[]): Partial<Site> {
  const site: { -readonly [K in keyof Site]?: Site[K] } = {};
  for (const line of lines)
    for (const [field, words, low, high] of fields) {
      if (site[field] !== undefined) continue;
      const found = words.exec(line);
      if (found === null) continue;
      const rest = line.slice(found.index + found[0].length);
      const number =
        /^[^\d\p{L}+−-]*(?:\([^)]*\)|\[[^\]]*\]|deg|in m|m)?[\s:=;,|"\t°]*([-+−]?\d+(?:[.,]\d+)?)\s*°?\s*([NSEWO])?\b/iu.exec(
          rest,
        );
      if (number === null) continue;
      const value = Number(number[1].replace(',', '.').replace('−', '-'));
      const side = (number[2] ?? '').toUpperCase();
      const signed = (side === 'S' || side === 'W') && value > 0 ? -value : value;
      if (signed >= low && signed <= high) site[field] = signed;
    }
  const name = lines
    .join('\n')
    .match(
      /^[#"\s]*(?:site|station|location|standort|lieu|ort|place)(?: name)?\s*[:=;,\t]\s*"?([\p{L}][^,;:\t"\n]{1,60})/imu,
    );
  if (name) site.name = name[1].trim();
  return site;
}

/** Abbreviations of standard times without a second meaning in weather tables. Common usage, no source. */
const zones: Readonly<Record<string, number>> = { CET: 1, MEZ: 1, EET: 2, OEZ: 2, WET: 0, UT: 0 };

export function clockIn(
  lines: readonly string[],
  headings: readonly string[],
  statesOffset: boolean,
): Guess<Clock> {
  if (statesOffset)
    return {
      value: { kind: 'offset', utcOffsetH: 0 },
      confidence: 1,
      reason: 'the stamps state their offset from UTC',
    };
  const text = [...lines, ...headings].join('\n');
  const zone =
    /\b(?:Africa|America|Asia|Atlantic|Australia|Europe|Indian|Pacific)\/[A-Z][A-Za-z_]+/.exec(
      text,
    );
  if (zone)
    return {
      value: { kind: 'zone', zone: zone[0] },
      confidence: 0.6,
      reason: `"${zone[0]}" stands above the table`,
    };
  const offset = /\b(?:UTC|GMT)\s*([-+−]\s*\d{1,2})(?::?([0-5]\d))?/i.exec(text);
  if (offset) {
    const hours = Number(offset[1].replace('−', '-').replace(/\s/g, ''));
    const utcOffsetH = hours + (Math.sign(hours) || 1) * (Number(offset[2] ?? 0) / 60);
    return {
      value: { kind: 'offset', utcOffsetH },
      confidence: 0.9,
      reason: `"${offset[0].trim()}" stands in the table`,
    };
  }
  const word = /\b(UTC|GMT)\b/i.exec(text);
  if (word)
    return {
      value: { kind: 'offset', utcOffsetH: 0 },
      confidence: 0.85,
      reason: `"${word[0]}" stands in the table`,
    };
  const short = /\b(CET|MEZ|EET|OEZ|WET|UT)\b/.exec(text);
  if (short)
    return {
      value: { kind: 'offset', utcOffsetH: zones[short[1]] },
      confidence: 0.7,
      reason: `"${short[1]}" stands in the table`,
    };
  if (/local standard time|standard time|\bLST\b|ortszeit|normalzeit/i.test(text))
    return {
      value: { kind: 'site' },
      confidence: 0.9,
      reason: 'the table speaks of standard time',
    };
  return {
    value: { kind: 'site' },
    confidence: 0.5,
    reason: 'nothing in the table says which clock it keeps',
  };
}
