// What a construction is worth by itself: steady and periodic transmittance, capacity, surface factor.
import { physicsLayers } from '../assembly/index.ts';
import { type Building, type Construction, materialOf } from '../building/index.ts';
import {
  conventionalInsideFilmM2KPerW,
  conventionalOutsideFilmM2KPerW,
  type HeatFlow,
  type Layer,
  losingHeatFlow,
  planeTemperatureFactor,
  totalResistanceM2KPerW,
  wallDynamics,
} from '../physics/index.ts';

/** What lies on the other side, as far as the films go. */
type Behind = 'outdoors' | 'ground' | 'inside';

/** A construction in one of its uses: films differ with the direction of the heat and what lies behind. */
export interface ConstructionUse {
  readonly heatFlow: HeatFlow;
  readonly behind: Behind;
  /** Surfaces of the project in this use, openings taken off; 0 where it is not used yet. */
  readonly areaM2: number;
  /** ISO 6946, with its conventional films. */
  readonly uValueWPerM2K: number;
  /** ISO 13786, one day, with the same films. */
  readonly periodicTransmittanceWPerM2K: number;
  readonly decrementFactor: number;
  readonly timeShiftH: number;
  readonly insideCapacityJPerM2K: number;
  readonly outsideCapacityJPerM2K: number;
  /** ISO 13788, plane part with 0.25 m²K/W inside; null where no outdoor air or ground lies behind. */
  readonly surfaceFactor: number | null;
}

export interface ConstructionExplained {
  readonly id: string;
  readonly name: string;
  /** Layers that only resist count with no thickness. */
  readonly thicknessM: number;
  readonly massKgPerM2: number;
  /** From face to face. */
  readonly resistanceM2KPerW: number;
  /** Of all layers, whole depth. */
  readonly capacityJPerM2K: number;
  readonly uses: readonly ConstructionUse[];
}

const dayS = 86_400;
/** Inside resistance at which ISO 13788:2012 judges mould on opaque parts. */
const mouldFilmM2KPerW = 0.25;

export function explainConstruction(
  building: Building,
  construction: Construction,
): ConstructionExplained {
  const layers = physicsLayers(building, construction);
  const resistances = layers.map((layer) =>
    layer.kind === 'resistance'
      ? layer.resistanceM2KPerW
      : layer.thicknessM / layer.conductivityWPerMK,
  );
  const sum = (of: (layer: Extract<Layer, { kind: 'solid' }>) => number) =>
    layers.reduce((total, layer) => total + (layer.kind === 'solid' ? of(layer) : 0), 0);
  const found = usesOf(building, construction.id);
  const uses: (readonly [HeatFlow, Behind, number])[] =
    found.length > 0 ? found : [['horizontal', 'outdoors', 0]];
  return {
    id: construction.id,
    name: construction.name,
    thicknessM: sum((layer) => layer.thicknessM),
    massKgPerM2: sum((layer) => layer.thicknessM * layer.densityKgPerM3),
    resistanceM2KPerW: resistances.reduce((total, r) => total + r, 0),
    capacityJPerM2K: sum(
      (layer) => layer.thicknessM * layer.densityKgPerM3 * layer.specificHeatJPerKgK,
    ),
    uses: uses.map(([heatFlow, behind, areaM2]) => {
      const inside = conventionalInsideFilmM2KPerW(heatFlow);
      const outside =
        behind === 'outdoors' ? conventionalOutsideFilmM2KPerW : behind === 'ground' ? 0 : inside;
      const dynamics = wallDynamics(layers, inside, outside, dayS);
      const mouldU = 1 / totalResistanceM2KPerW(mouldFilmM2KPerW, resistances, outside);
      return {
        heatFlow,
        behind,
        areaM2,
        uValueWPerM2K: dynamics.uValueWPerM2K,
        periodicTransmittanceWPerM2K: dynamics.periodicTransmittanceWPerM2K,
        decrementFactor: dynamics.decrementFactor,
        timeShiftH: dynamics.timeShiftH,
        insideCapacityJPerM2K: dynamics.insideCapacityJPerM2K,
        outsideCapacityJPerM2K: dynamics.outsideCapacityJPerM2K,
        surfaceFactor:
          behind === 'inside' ? null : planeTemperatureFactor(mouldU, mouldFilmM2KPerW),
      };
    }),
  };
}

/** Kinds of surfaces that a construction is used for, with their area. A partition counts once for each face. */
function usesOf(building: Building, id: string): (readonly [HeatFlow, Behind, number])[] {
  const areas = new Map<string, number>();
  for (const room of building.rooms)
    for (const surface of room.surfaces) {
      if (surface.construction !== id) continue;
      const { kind } = surface.boundary;
      const behind: Behind =
        kind === 'outdoors'
          ? 'outdoors'
          : kind === 'ground' || kind === 'ground-contact'
            ? 'ground'
            : 'inside';
      const openings = surface.openings.reduce((total, one) => total + one.areaM2, 0);
      const key = `${losingHeatFlow(surface.tiltDeg)} ${behind}`;
      areas.set(key, (areas.get(key) ?? 0) + surface.areaM2 - openings);
    }
  return [...areas].map(([key, areaM2]) => {
    const [heatFlow, behind] = key.split(' ') as [HeatFlow, Behind];
    return [heatFlow, behind, areaM2];
  });
}

/** Materials whose values are unlikely, as sentences. */
export function unlikelyMaterials(building: Building): { place: string; text: string }[] {
  return building.materials.flatMap((material, i) => {
    const { id } = material;
    const { conductivityWPerMK, densityKgPerM3, specificHeatJPerKgK } = materialOf(building, id);
    const list: { place: string; text: string }[] = [];
    const warn = (field: string, text: string) =>
      list.push({ place: `materials[${i}].${field}`, text });
    if (conductivityWPerMK < 0.004)
      warn('conductivityWPerMK', `${conductivityWPerMK} is less than vacuum panels have (0.004).`);
    if (densityKgPerM3 > 500 && conductivityWPerMK < 0.05)
      warn('conductivityWPerMK', `${conductivityWPerMK} is unusual at ${densityKgPerM3} kg/m³.`);
    if (specificHeatJPerKgK < 350 || specificHeatJPerKgK > 4300)
      warn(
        'specificHeatJPerKgK',
        `${specificHeatJPerKgK} lies outside 380 (copper) to 4200 (water).`,
      );
    return list;
  });
}
