// What lies under a floor or behind a basement wall: ISO 13370's cases and the plain soil column.
//
// One contact stands for the whole floor of the building on the ground, across all rooms above it: the
// heat that leaves by the edge depends on the whole area and its exposed perimeter. Surfaces name the
// contact as their boundary and take their share by area.
import { z } from 'zod';
import { between, id, positive, temperatureC, text } from './schema-values.ts';

/** Defaults: ISO 13370's sand and gravel, which it takes where the ground is not known. */
const soilSchema = z.strictObject({
  conductivityWPerMK: positive(10).default(2),
  heatCapacityJPerM3K: between(1e5, 1e7).default(2e6),
});

/** Insulation along the edge of a slab. */
const edgeInsulationSchema = z.strictObject({
  kind: z.enum(['horizontal', 'vertical']),
  /** Width of a horizontal strip, depth of a vertical one below ground. */
  reachM: positive(10),
  resistanceM2KPerW: positive(50),
  thicknessM: positive(1),
});

const common = {
  id,
  name: text.optional(),
  soil: soilSchema.prefault({}),
  /**
   * Inside temperature of the rooms above, constant or twelve monthly means; left out: the heating
   * set-point's monthly mean, and no less than the outdoor air's.
   */
  insideC: z.union([temperatureC, z.array(temperatureC).length(12)]).optional(),
};

const floor = {
  ...common,
  /** Of the whole floor on the ground, not of one room's. */
  areaM2: positive(1e6),
  /** Edges towards outdoors and unheated spaces; 0 deep inside a large building is not accepted. */
  perimeterM: positive(1e5),
  /** Full thickness of the walls above. */
  wallThicknessM: between(0, 3).default(0.3),
};

export const groundContactSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('slab'),
    ...floor,
    edgeInsulation: edgeInsulationSchema.optional(),
  }),
  /** A floor over a void that outside air sweeps; the surfaces' construction is the deck. */
  z.strictObject({
    kind: z.literal('suspended-floor'),
    ...floor,
    /** Upper face of the deck above the ground outside. */
    floorHeightM: between(0, 10).default(0.5),
    /** U-value of the void's walls above ground. */
    voidWallWPerM2K: positive(10).default(1.7),
    /** Vent openings per metre of perimeter. */
    ventAreaM2PerM: between(0, 0.1).default(0.0015),
    shielding: z.enum(['sheltered', 'average', 'exposed']).default('average'),
    /** Insulation on the void's base. */
    baseResistanceM2KPerW: between(0, 50).default(0),
  }),
  /** Floors take the basement floor's value, upright surfaces the basement wall's. */
  z.strictObject({
    kind: z.literal('heated-basement'),
    ...floor,
    /** Depth of the floor below the ground outside. */
    depthM: positive(30),
  }),
  /** An unheated basement under the room; the surfaces' construction is the deck between. */
  z.strictObject({
    kind: z.literal('unheated-basement'),
    ...floor,
    depthM: positive(30),
    /** Basement walls above ground. */
    wallAboveM: between(0, 10).default(0.3),
    wallAboveWPerM2K: positive(10).default(1.5),
    /** Of the basement's floor and its walls below ground, films not included. */
    floorResistanceM2KPerW: between(0, 50).default(0),
    wallResistanceM2KPerW: between(0, 50).default(0),
    airChangesPerH: between(0, 20).default(0.3),
    volumeM3: positive(1e6),
  }),
  /** Soil straight down to a depth that keeps one temperature: one-dimensional, no edges. */
  z.strictObject({
    kind: z.literal('soil-column'),
    id,
    name: text.optional(),
    soil: soilSchema.prefault({}),
    depthM: between(0.5, 30).default(10),
    /** Left out: the year's mean of the outdoor air. */
    deepTemperatureC: temperatureC.optional(),
  }),
]);

export type GroundContact = z.infer<typeof groundContactSchema>;
