// A building's parts explained before anything is run: derived values, and what looks unlikely.
import type { Building } from '../building/index.ts';
import {
  type ConstructionExplained,
  explainConstruction,
  unlikelyMaterials,
} from './explain-construction.ts';
import { explainGlazing, type GlazingExplained } from './explain-glazing.ts';
import { explainWindows, type WindowExplained } from './explain-window.ts';

/** Something that physics allows and practice hardly knows: worth a second look, no fault. */
export interface Unlikely {
  /** Path into the project. */
  readonly place: string;
  readonly text: string;
}

export interface BuildingExplained {
  readonly constructions: readonly ConstructionExplained[];
  readonly glazings: readonly GlazingExplained[];
  readonly windows: readonly WindowExplained[];
  readonly unlikely: readonly Unlikely[];
}

/** Least temperature factor that keeps ordinary dwellings free of mould; DIN 4108-2 asks for 0.70. */
const leastSurfaceFactor = 0.7;

export function explainBuilding(building: Building): BuildingExplained {
  const constructions = building.constructions.map((one) => explainConstruction(building, one));
  const glazings = building.glazings.map(explainGlazing);
  const windows = explainWindows(building);
  return {
    constructions,
    glazings,
    windows,
    unlikely: [
      ...unlikelyMaterials(building),
      ...constructions.flatMap((one, i) => unlikelyConstruction(building, one, i)),
      ...unlikelyGlazings(building, glazings),
      ...unlikelyOpenings(building),
    ],
  };
}

function unlikelyConstruction(
  building: Building,
  explained: ConstructionExplained,
  i: number,
): Unlikely[] {
  const place = `constructions[${i}]`;
  const list: Unlikely[] = [];
  const { insideEmissivity, outsideEmissivity } = building.constructions[i];
  for (const use of explained.uses) {
    if (use.behind === 'inside' || use.areaM2 === 0) continue;
    if (use.surfaceFactor !== null && use.surfaceFactor < leastSurfaceFactor)
      list.push({
        place,
        text: `f_Rsi ${use.surfaceFactor.toFixed(2)} is below ${leastSurfaceFactor.toFixed(2)}: mould may grow on its inner face in ordinary use (ISO 13788); local rules and a licensed practitioner decide.`,
      });
    if (use.uValueWPerM2K < 0.05)
      list.push({ place, text: `U ${use.uValueWPerM2K.toFixed(3)} W/(m²·K) is lower than built.` });
  }
  if (explained.thicknessM > 2)
    list.push({ place, text: `It is ${explained.thicknessM.toFixed(2)} m thick.` });
  for (const [face, value] of [
    ['insideEmissivity', insideEmissivity],
    ['outsideEmissivity', outsideEmissivity],
  ] as const)
    if (value < 0.7)
      list.push({
        place: `${place}.${face}`,
        text: `${value} is that of bare metal; paint, plaster, wood and stone have 0.85 to 0.95.`,
      });
  return list;
}

function unlikelyGlazings(building: Building, explained: readonly GlazingExplained[]): Unlikely[] {
  return building.glazings.flatMap((glazing, i) => {
    const { uValueWPerM2K, gValue } = explained[i];
    const list: Unlikely[] = [];
    if (uValueWPerM2K < 0.4)
      list.push({
        place: `glazings[${i}]`,
        text: `U ${uValueWPerM2K.toFixed(2)} W/(m²·K) is lower than triple glazing reaches.`,
      });
    if (glazing.kind === 'simple' && uValueWPerM2K < 1 && gValue > 0.7)
      list.push({
        place: `glazings[${i}]`,
        text: `g ${gValue.toFixed(2)} is more than glazings of this U pass.`,
      });
    if (glazing.kind === 'panes')
      glazing.gaps.forEach((gap, g) => {
        if (gap.thicknessM < 0.004 || gap.thicknessM > 0.03)
          list.push({
            place: `glazings[${i}].gaps[${g}].thicknessM`,
            text: `${gap.thicknessM} m; sealed units have 0.006 to 0.024 m.`,
          });
      });
    return list;
  });
}

function unlikelyOpenings(building: Building): Unlikely[] {
  return building.rooms.flatMap((room, i) =>
    room.surfaces.flatMap((surface, j) =>
      surface.openings.flatMap(({ frame }, k) => {
        const place = `rooms[${i}].surfaces[${j}].openings[${k}].frame`;
        const list: Unlikely[] = [];
        if (frame && frame.edgePsiWPerMK > 0.15)
          list.push({
            place: `${place}.edgePsiWPerMK`,
            text: `${frame.edgePsiWPerMK} W/(m·K) is more than ISO 10077-1 tables for aluminium spacers (0.15).`,
          });
        if (frame?.share !== undefined && frame.share > 0.5)
          list.push({ place: `${place}.share`, text: `More than half of the window is frame.` });
        return list;
      }),
    ),
  );
}
