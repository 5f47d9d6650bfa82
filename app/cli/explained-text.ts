// A building's derived values for a person at a terminal.

import type {
  BuildingExplained,
  ConstructionExplained,
  ConstructionUse,
} from '../../engine/index.ts';
import { figure, table, wrap } from './table.ts';

interface UseRow {
  readonly construction: ConstructionExplained;
  readonly use: ConstructionUse;
}

const ways: Readonly<Record<ConstructionUse['heatFlow'], string>> = {
  up: 'heat up',
  horizontal: 'heat across',
  down: 'heat down',
};
const behind: Readonly<Record<ConstructionUse['behind'], string>> = {
  outdoors: 'outdoors',
  ground: 'ground',
  inside: 'inside',
};

function constructions(list: readonly ConstructionExplained[]): string {
  const rows = list.flatMap((construction) =>
    construction.uses.map((use): UseRow => ({ construction, use })),
  );
  return table<UseRow>(
    [
      { head: 'Construction', of: ({ construction }) => construction.name },
      { head: 'To', of: ({ use }) => `${behind[use.behind]}, ${ways[use.heatFlow]}` },
      { head: 'Area', unit: 'm²', digits: 1, of: ({ use }) => use.areaM2 },
      { head: 'U', unit: 'W/(m²·K)', digits: 3, of: ({ use }) => use.uValueWPerM2K },
      {
        head: 'κ inside',
        unit: 'kJ/(m²·K)',
        digits: 1,
        of: ({ use }) => use.insideCapacityJPerM2K / 1000,
      },
      {
        head: 'Y12',
        unit: 'W/(m²·K)',
        digits: 3,
        of: ({ use }) => use.periodicTransmittanceWPerM2K,
      },
      { head: 'Decrement', unit: '–', digits: 3, of: ({ use }) => use.decrementFactor },
      { head: 'Shift', unit: 'h', digits: 1, of: ({ use }) => use.timeShiftH },
      {
        head: 'f_Rsi',
        unit: '–',
        digits: 2,
        of: ({ use }) => use.surfaceFactor ?? Number.NaN,
      },
    ],
    rows,
  );
}

const glazings = (list: BuildingExplained['glazings']) =>
  table(
    [
      { head: 'Glazing', of: (one) => one.name },
      { head: 'U_g', unit: 'W/(m²·K)', digits: 2, of: (one) => one.uValueWPerM2K },
      { head: 'g', unit: '–', digits: 3, of: (one) => one.gValue },
      { head: 'τ', unit: '–', digits: 3, of: (one) => one.transmittance },
      ...(list[0]?.angles.slice(1) ?? []).map(({ incidenceDeg }, a) => ({
        head: `τ ${incidenceDeg}°`,
        unit: '–',
        digits: 3,
        of: (one: BuildingExplained['glazings'][number]) => one.angles[a + 1].transmittance,
      })),
      { head: 'τ diffuse', unit: '–', digits: 3, of: (one) => one.diffuseTransmittance },
    ],
    list,
  );

const windows = (list: BuildingExplained['windows']) =>
  table(
    [
      { head: 'Window', of: (one) => `${one.room}/${one.surface}/${one.opening}` },
      { head: 'Area', unit: 'm²', digits: 2, of: (one) => one.areaM2 },
      { head: 'Glass', unit: 'm²', digits: 2, of: (one) => one.glassAreaM2 },
      { head: 'U_g', unit: 'W/(m²·K)', digits: 2, of: (one) => one.glassUValueWPerM2K },
      { head: 'U_w', unit: 'W/(m²·K)', digits: 2, of: (one) => one.uValueWPerM2K },
      { head: 'g', unit: '–', digits: 2, of: (one) => one.gValue },
      { head: 'g, blind', unit: '–', digits: 2, of: (one) => one.blindGValue ?? Number.NaN },
      {
        head: 'U, insulated',
        unit: 'W/(m²·K)',
        digits: 2,
        of: (one) => one.insulatedUValueWPerM2K ?? Number.NaN,
      },
    ],
    list,
  );

/** All derived values as tables, each with the standards behind it. */
export function explainedText(explained: BuildingExplained): string {
  const parts = [
    `Constructions: U and films by ISO 6946; κ, Y12, decrement and time shift by ISO 13786 for one day; f_Rsi by ISO 13788\n${constructions(explained.constructions)}`,
  ];
  if (explained.glazings.length > 0)
    parts.push(
      `Glazings: U_g by EN 673, g and τ by EN 410, upright; τ by angle of incidence\n${glazings(explained.glazings)}`,
    );
  if (explained.windows.length > 0)
    parts.push(
      `Windows: U_w by ISO 10077-1 with frame and edge; g of the whole window\n${windows(explained.windows)}`,
    );
  if (explained.unlikely.length > 0)
    parts.push(
      [
        `Worth a second look (${figure(explained.unlikely.length, 0)})`,
        ...explained.unlikely.map(({ place, text }) => wrap(`- ${place}: ${text}`)),
      ].join('\n'),
    );
  return parts.join('\n\n');
}
