// One surface on the ground by ISO 13370: its steady U-value and its share of the yearly swing.
import type { GroundContact } from '../building/index.ts';
import {
  basementFloorWPerM2K,
  basementWallWPerM2K,
  characteristicDimensionM,
  edgedSlabOutsidePeriodicWPerK,
  edgeInsulationPsiWPerMK,
  edgeInsulationSoilM,
  equivalentSoilM,
  type GroundCycle,
  insidePeriodicWPerK,
  moderateFloorWPerM2K,
  slabOutsidePeriodicWPerK,
  slabUValueWPerM2K,
  suspendedFloorUValueWPerM2K,
  suspendedPeriodic,
  type UnheatedBasement,
  unheatedBasementPeriodic,
  unheatedBasementUValueWPerM2K,
  voidToOutsideWPerM2K,
  yearlyPenetrationM,
} from '../physics/index.ts';

/** A contact that ISO 13370 covers. */
export type StandardContact = Exclude<GroundContact, { kind: 'soil-column' }>;

/** What the standard says of one surface. */
export interface GroundPart {
  /** From inside air to outdoors. */
  readonly uValueWPerM2K: number;
  /** Of the surface's area. */
  readonly cycle: GroundCycle;
  readonly insideFilmM2KPerW: number;
  /** Soil right behind the construction; false over a void or an unheated basement. */
  readonly touchesSoil: boolean;
  readonly method: string;
}

/** The surface: its area, and the resistance of its own construction without films. */
export interface GroundFace {
  readonly areaM2: number;
  readonly upright: boolean;
  readonly resistanceM2KPerW: number;
  /** Mean resistance of the floors on the same contact, for the walls of a basement; NaN without any. */
  readonly floorResistanceM2KPerW: number;
}

const floorFilm = 0.17; // ISO 6946, heat flow downwards
const wallFilm = 0.13;
const outsideFilm = 0.04;

/** Wind shielding of a void's vents. Source: ISO 13370:2017, table (from memory). */
const shieldFactor = { sheltered: 0.02, average: 0.05, exposed: 0.1 };

/**
 * The part that one surface has in a ground contact: by area for floors, by area over z·P for basement
 * walls; the exposed perimeter is shared out in the same way.
 *
 * Source: ISO 13370:2017, clauses 7.1 to 7.4 and Annexes B, C (as in `engine/physics/ground-*.ts`).
 */
export function groundPart(
  contact: StandardContact,
  face: GroundFace,
  meanWindMPerS: number,
): GroundPart {
  const { conductivityWPerMK: soil, heatCapacityJPerM3K } = contact.soil;
  const { perimeterM, wallThicknessM } = contact;
  const penetrationM = yearlyPenetrationM(soil, heatCapacityJPerM3K);
  const dimensionM = characteristicDimensionM(contact.areaM2, perimeterM);
  const floorM = (r: number) => equivalentSoilM(wallThicknessM, soil, floorFilm, r, outsideFilm);
  const share = face.areaM2 / contact.areaM2; // of the floor, so of its perimeter
  const d = floorM(face.resistanceM2KPerW);
  const floorPart = { insideFilmM2KPerW: floorFilm, touchesSoil: true };
  switch (contact.kind) {
    case 'slab': {
      const edge = contact.edgeInsulation;
      const bareU = slabUValueWPerM2K(dimensionM, soil, d);
      const inside = insidePeriodicWPerK(face.areaM2, soil, d, penetrationM);
      const perimeter = share * perimeterM;
      if (!edge)
        return part(
          bareU,
          face,
          inside,
          slabOutsidePeriodicWPerK(perimeter, soil, d, penetrationM),
          1,
          { ...floorPart, method: 'ISO 13370, slab on ground' },
        );
      const reachM = edge.kind === 'vertical' ? 2 * edge.reachM : edge.reachM;
      const extraM = edgeInsulationSoilM(edge.resistanceM2KPerW, edge.thicknessM, soil);
      const psi = edgeInsulationPsiWPerMK(reachM, soil, d, extraM);
      return part(
        bareU + (2 * psi) / dimensionM,
        face,
        inside,
        edgedSlabOutsidePeriodicWPerK(perimeter, soil, d, penetrationM, reachM, extraM),
        1,
        { ...floorPart, method: `ISO 13370, slab on ground with ${edge.kind} edge insulation` },
      );
    }
    case 'suspended-floor': {
      const deck = 1 / (face.resistanceM2KPerW + 2 * floorFilm);
      const base = floorM(contact.baseResistanceM2KPerW);
      const outside = voidToOutsideWPerM2K(
        { ...contact, windMPerS: meanWindMPerS, shieldFactor: shieldFactor[contact.shielding] },
        dimensionM,
      );
      const periodic = suspendedPeriodic(
        face.areaM2,
        share * perimeterM,
        soil,
        base,
        deck,
        outside,
        penetrationM,
      );
      const ground = moderateFloorWPerM2K(dimensionM, soil, base);
      return part(
        suspendedFloorUValueWPerM2K(deck, ground, outside),
        face,
        periodic.insideWPerK,
        periodic.outsideWPerK,
        0,
        { ...floorPart, touchesSoil: false, method: 'ISO 13370, suspended floor' },
      );
    }
    case 'heated-basement':
      return heatedBasement(contact, face, dimensionM, penetrationM, floorM);
    case 'unheated-basement': {
      const deck = 1 / (face.resistanceM2KPerW + 2 * floorFilm);
      const basement: UnheatedBasement = { ...contact, deckWPerM2K: deck };
      const dFloor = floorM(contact.floorResistanceM2KPerW);
      const dWall = equivalentSoilM(0, soil, wallFilm, contact.wallResistanceM2KPerW, outsideFilm);
      const u = unheatedBasementUValueWPerM2K(
        basement,
        basementFloorWPerM2K(dimensionM, contact.depthM, soil, dFloor),
        basementWallWPerM2K(contact.depthM, soil, dFloor, dWall),
      );
      const periodic = unheatedBasementPeriodic(basement, soil, dFloor, penetrationM);
      return part(u, face, share * periodic.insideWPerK, share * periodic.outsideWPerK, 0, {
        ...floorPart,
        touchesSoil: false,
        method: 'ISO 13370, unheated basement',
      });
    }
    default:
      return contact satisfies never;
  }
}

/**
 * Floor or wall of a heated basement. The standard's sum for the outside swing falls apart into its two
 * terms: 2·(1 − e^(−z/δ))·ln(δ/d_w + 1) for the walls, e^(−z/δ)·ln(δ/d + 1) for the floor.
 */
function heatedBasement(
  contact: Extract<StandardContact, { kind: 'heated-basement' }>,
  face: GroundFace,
  dimensionM: number,
  penetrationM: number,
  floorM: (resistanceM2KPerW: number) => number,
): GroundPart {
  const { depthM, perimeterM, areaM2 } = contact;
  const soil = contact.soil.conductivityWPerMK;
  const below = Math.exp(-depthM / penetrationM);
  if (!face.upright) {
    const d = floorM(face.resistanceM2KPerW);
    const edge = slabOutsidePeriodicWPerK(
      (perimeterM * face.areaM2) / areaM2,
      soil,
      d,
      penetrationM,
    );
    return part(
      basementFloorWPerM2K(dimensionM, depthM, soil, d),
      face,
      insidePeriodicWPerK(face.areaM2, soil, d, penetrationM),
      below * edge,
      1,
      { insideFilmM2KPerW: floorFilm, touchesSoil: true, method: 'ISO 13370, basement floor' },
    );
  }
  const dWall = equivalentSoilM(0, soil, wallFilm, face.resistanceM2KPerW, outsideFilm);
  const dFloor = Number.isNaN(face.floorResistanceM2KPerW)
    ? dWall
    : floorM(face.floorResistanceM2KPerW);
  const edge = slabOutsidePeriodicWPerK(face.areaM2 / depthM, soil, dWall, penetrationM);
  return part(
    basementWallWPerM2K(depthM, soil, dFloor, dWall),
    face,
    insidePeriodicWPerK(face.areaM2, soil, dWall, penetrationM),
    2 * (1 - below) * edge,
    1,
    { insideFilmM2KPerW: wallFilm, touchesSoil: true, method: 'ISO 13370, basement wall' },
  );
}

function part(
  uValueWPerM2K: number,
  face: GroundFace,
  insidePeriodic: number,
  outsidePeriodic: number,
  lagMonths: number,
  rest: Omit<GroundPart, 'uValueWPerM2K' | 'cycle'>,
): GroundPart {
  return {
    uValueWPerM2K,
    cycle: {
      steadyWPerK: uValueWPerM2K * face.areaM2,
      insidePeriodicWPerK: insidePeriodic,
      outsidePeriodicWPerK: outsidePeriodic,
      leadMonths: 0,
      lagMonths,
    },
    ...rest,
  };
}
