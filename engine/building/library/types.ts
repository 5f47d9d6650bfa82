// What the generic library holds: plain data, one entry an object. A project takes copies, so that it
// stays whole when the library changes.
import type { Activity, FillGas } from '../../physics/index.ts';
import type { Construction, Glazing } from '../schema-fabric.ts';

/** A building material without a maker. */
export interface LibraryMaterial {
  readonly id: string;
  readonly name: string;
  readonly conductivityWPerMK: number;
  readonly densityKgPerM3: number;
  readonly specificHeatJPerKgK: number;
  /** μ of the dry material, 1 or more; `vapourTight` stands for materials that let none through. */
  readonly vapourResistanceFactor: number;
  readonly source: string;
}

/** μ that stands for "without end": metals, glass. */
export const vapourTight = 1e6;

/** One layer: a material, an air layer by its thickness, or a plain resistance. */
export type LayerSpec =
  | { readonly materialId: string; readonly thicknessM: number }
  | {
      readonly airLayerM: number;
      /** Emissivity of one face where it is a foil; left out: both faces ordinary, 0.9. */
      readonly foilEmissivity?: number;
    }
  | { readonly resistanceM2KPerW: number; readonly name: string };

export type ConstructionKind =
  | 'wall'
  | 'roof'
  | 'floor'
  | 'partition'
  | 'intermediate floor'
  | 'ground floor'
  | 'door';

/** A build-up, from outside to inside. */
export interface LibraryConstruction {
  readonly id: string;
  readonly name: string;
  readonly kind: ConstructionKind;
  readonly layers: readonly LayerSpec[];
  /**
   * U-value that such a build-up has in the trade, lowest and highest, for a check of the entry. On the
   * ground: of the floor construction between films, the soil left out.
   */
  readonly typicalUWPerM2K: readonly [number, number];
  readonly outsideSolarAbsorptance: number;
  readonly outsideRoughness: Construction['outsideRoughness'];
  readonly source: string;
}

/** A glazing, with the standard values that such a unit has in the trade. */
export interface LibraryGlazing {
  readonly glazing: Glazing;
  readonly typicalUWPerM2K: readonly [number, number];
  readonly typicalG: readonly [number, number];
}

/** A gas for gaps; its properties come from the physics by this id. */
export interface LibraryGas {
  readonly id: FillGas;
  readonly name: string;
}

/** 24 shares of the full value, hour 0 to 1 first. */
export type DayShares = readonly number[];

/** How a kind of room is used. */
export interface UsageProfile {
  readonly id: string;
  readonly name: string;
  readonly floorPerPersonM2: number;
  readonly activity: Activity;
  readonly lightingWPerM2: number;
  readonly equipmentWPerM2: number;
  /** Outdoor air for people and for the building, to be added up. */
  readonly airPerPersonM3PerS: number;
  readonly airPerAreaM3PerSM2: number;
  readonly heatingSetPointC: number;
  readonly heatingSetBackC: number;
  readonly coolingSetPointC: number;
  readonly coolingSetBackC: number;
  readonly weekday: UsageDay;
  readonly weekend: UsageDay;
  readonly source: string;
}

export interface UsageDay {
  readonly occupancy: DayShares;
  readonly lighting: DayShares;
  readonly equipment: DayShares;
}
