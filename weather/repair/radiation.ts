// Radiation columns that a table lacks, computed from those it has.
import { erbsDiffuseShare, splitGlobal, splitMaxZenithDeg } from '../sky/diffuse-split.ts';
import type { HourlySun } from '../steps/hourly-sun.ts';
import { degPerRad } from '../sun/ephemeris.ts';

export interface RadiationColumns {
  ghi?: Float64Array | undefined;
  dni?: Float64Array | undefined;
  dhi?: Float64Array | undefined;
}

/**
 * Fills in the missing of global, beam and diffuse so that GHI = DNI·sin(altitude) + DHI, with the
 * sun's mean over the sunlit part of the hour; a lone global is split by Erbs.
 *
 * Low-sun guard: with the sun under 3 degrees no beam is derived, and none above the extraterrestrial.
 * @returns a sentence on what was computed, or `null` if there is too little to compute from
 */
export function completeRadiation(columns: RadiationColumns, sun: HourlySun): string | null {
  const { ghi, dni, dhi } = columns;
  const leastUp = Math.cos(splitMaxZenithDeg / degPerRad);
  const each = (value: (h: number) => number) =>
    Float64Array.from(sun.sunlitShare, (_, h) => Math.max(0, value(h)));
  const onFlat = (beam: Float64Array, h: number) => beam[h] * sun.meanUp[h];
  if (ghi && dni && dhi) return '';
  if (dni && dhi) {
    columns.ghi = each((h) => onFlat(dni, h) + dhi[h]);
    return 'Global radiation was computed from direct normal and diffuse.';
  }
  if (ghi && dni) {
    columns.dhi = each((h) => Math.min(ghi[h], ghi[h] - onFlat(dni, h)));
    return 'Diffuse radiation was computed from global and direct normal.';
  }
  if (ghi && dhi) {
    columns.dni = each((h) =>
      sun.meanUp[h] < leastUp
        ? 0
        : Math.min(sun.normalWPerM2[h] * sun.sunlitShare[h], (ghi[h] - dhi[h]) / sun.meanUp[h]),
    );
    return 'Direct normal radiation was computed from global and diffuse; none with the sun under 3 degrees.';
  }
  if (!ghi) return null;
  const split = Array.from(ghi, (value, h) => {
    const lit = sun.sunlitShare[h];
    if (lit === 0) return { dniWPerM2: 0, dhiWPerM2: value };
    const zenithDeg = Math.acos(Math.min(1, sun.meanUp[h])) * degPerRad;
    const parts = splitGlobal(value / lit, zenithDeg, sun.normalWPerM2[h], erbsDiffuseShare);
    const most = Math.min(parts.dniWPerM2, sun.normalWPerM2[h]);
    const diffuse = most < parts.dniWPerM2 ? value / lit - most * sun.meanUp[h] : parts.dhiWPerM2;
    return { dniWPerM2: most * lit, dhiWPerM2: diffuse * lit };
  });
  columns.dni = Float64Array.from(split, (parts) => parts.dniWPerM2);
  columns.dhi = Float64Array.from(split, (parts) => parts.dhiWPerM2);
  return 'Direct and diffuse radiation were split from the global after Erbs, Klein and Duffie (1982); all of it counts as diffuse with the sun under 3 degrees.';
}
