// Another split of the global radiation than the reader's own, for tables that hold the global only.
import {
  bolandDiffuseShare,
  bolandRidleyLauretDiffuseShare,
  erbsDiffuseShare,
  orgillHollandsDiffuseShare,
  reindlDiffuseShare,
  splitGlobal,
} from '../sky/diffuse-split.ts';
import { type HourlySun, hourlySun } from '../steps/hourly-sun.ts';
import { sunTrack } from '../steps/sun-track.ts';
import { degPerRad, radPerDeg } from '../sun/ephemeris.ts';
import type { WeatherColumn, WeatherYear } from '../weather-year.ts';

export type DiffuseSplit =
  | 'erbs'
  | 'orgill-hollands'
  | 'reindl'
  | 'boland'
  | 'boland-ridley-lauret';

const names: Readonly<Record<DiffuseSplit, string>> = {
  erbs: 'Erbs, Klein and Duffie (1982)',
  'orgill-hollands': 'Orgill and Hollands (1977)',
  reindl: 'Reindl, Beckman and Duffie (1990)',
  boland: 'Boland, Scott and Luther (2001)',
  'boland-ridley-lauret': 'Ridley, Boland and Lauret (2010)',
};

/** Whether beam and diffuse were both computed from a lone global. */
const isSplit = (year: WeatherYear) =>
  year.dniWPerM2.origin === 'derived' && year.dhiWPerM2.origin === 'derived';

/**
 * The year with its global split in the way chosen. A table that holds beam or diffuse itself stays as it
 * is, with a note that says so.
 */
export function withDiffuseSplit(year: WeatherYear, split: DiffuseSplit): WeatherYear {
  if (split === 'erbs') return year;
  if (!isSplit(year)) {
    const text = `The table holds beam or diffuse radiation itself: the split after ${names[split]} is not needed.`;
    return { ...year, notes: [...year.notes, { kind: 'assumption', text, count: 0 }] };
  }
  const sun = hourlySun(year, year.ghiWPerM2.stands);
  const ghi = year.ghiWPerM2.values;
  const shareAt = split === 'boland-ridley-lauret' ? predictors(year, sun) : oneVariable(split);
  const dni = new Float64Array(year.hours);
  const dhi = new Float64Array(year.hours);
  for (let h = 0; h < year.hours; h++) {
    const lit = sun.sunlitShare[h];
    dhi[h] = ghi[h];
    if (lit === 0) continue;
    const zenithDeg = Math.acos(Math.min(1, sun.meanUp[h])) * degPerRad;
    const strength = ghi[h] / lit; // while the sun is up
    const parts = splitGlobal(strength, zenithDeg, sun.normalWPerM2[h], (kt) => shareAt(kt, h));
    const beam = Math.min(parts.dniWPerM2, sun.normalWPerM2[h]);
    dni[h] = beam * lit;
    dhi[h] = Math.max(0, ghi[h] - dni[h] * sun.meanUp[h]);
  }
  const column = (values: Float64Array): WeatherColumn => ({ ...year.dhiWPerM2, values });
  const text = `Direct and diffuse radiation were split from the global after ${names[split]}, as the project asks.`;
  return {
    ...year,
    dniWPerM2: column(dni),
    dhiWPerM2: column(dhi),
    notes: [...year.notes, { kind: 'assumption', text, count: year.hours }],
  };
}

function oneVariable(split: Exclude<DiffuseSplit, 'boland-ridley-lauret'>) {
  return {
    erbs: erbsDiffuseShare,
    'orgill-hollands': orgillHollandsDiffuseShare,
    reindl: reindlDiffuseShare,
    boland: bolandDiffuseShare,
  }[split] as (clearnessIndex: number, hour: number) => number;
}

/** Solar time, the day's clearness and that of the hours beside, for the logistic form of five predictors. */
function predictors(year: WeatherYear, sun: HourlySun): (kt: number, h: number) => number {
  const { hours, site } = year;
  const ghi = year.ghiWPerM2.values;
  const clearness = Float64Array.from(ghi, (value, h) => {
    const outside = sun.extraterrestrialWPerM2[h];
    return outside > 1 ? Math.min(1, Math.max(0, value / outside)) : Number.NaN;
  });
  const daily = new Float64Array(hours / 24);
  for (let d = 0; d < daily.length; d++) {
    let global = 0;
    let outside = 0;
    for (let h = 24 * d; h < 24 * d + 24; h++) {
      global += ghi[h];
      outside += sun.extraterrestrialWPerM2[h];
    }
    daily[d] = outside > 0 ? Math.min(1, global / outside) : 0;
  }
  const track = sunTrack(year, 3600);
  const latitude = site.latitudeDeg * radPerDeg;
  return (kt, h) => {
    const north = track.up[h] * Math.cos(latitude) - track.north[h] * Math.sin(latitude);
    const hourAngleDeg = Math.atan2(-track.east[h], north) * degPerRad;
    const before = clearness[(h + hours - 1) % hours];
    const after = clearness[(h + 1) % hours];
    const beside = Number.isNaN(before)
      ? after
      : Number.isNaN(after)
        ? before
        : (before + after) / 2;
    return bolandRidleyLauretDiffuseShare(
      kt,
      12 + hourAngleDeg / 15,
      track.altitudeDeg[h],
      daily[Math.floor(h / 24)],
      Number.isNaN(beside) ? kt : beside,
    );
  };
}
