// One room: faces, openings, masses, use, air and plant.
import { z } from 'zod';
import { airControlSchema, airOpeningSchema, leakageSchema, recoveryFields } from './schema-air.ts';
import { thermalBridgeSchema } from './schema-bridges.ts';
import { comfortSchema } from './schema-comfort.ts';
import { gainSchema, usageSchema } from './schema-gains.ts';
import { moistureSchema } from './schema-moisture.ts';
import { heatingSchema } from './schema-plant.ts';
import { between, id, positive, scheduled, temperatureC, text } from './schema-values.ts';
import { blindAtWindowSchema, frameSchema, nightInsulationSchema } from './schema-window.ts';

/** Lower left corner and size on the wall as seen from inside, or on the floor seen from above. */
const rectangleSchema = z.strictObject({
  leftM: z.number().gte(0),
  bottomM: z.number().gte(0),
  widthM: positive(200),
  heightM: positive(200),
});

const extent = z.number().gte(0).lte(1000);
/** A plate that stands off the wall beside a window; left and right as seen from inside. */
const finSchema = z.strictObject({
  depthM: positive(100),
  gapM: extent.default(0),
  aboveM: extent.default(0),
  belowM: extent.default(0),
});
/** What stands before a window or a wall. */
const shadingSchema = z.strictObject({
  overhang: z
    .strictObject({
      depthM: positive(100),
      /** From the head up to the plate. */
      gapM: extent.default(0),
      /** How far it goes on beyond the sides. */
      leftM: extent.default(0),
      rightM: extent.default(0),
    })
    .optional(),
  leftFin: finSchema.optional(),
  rightFin: finSchema.optional(),
  /** How far the glass stands behind the outer face. */
  revealM: extent.default(0),
});

const openingSchema = z.strictObject({
  id,
  name: text.optional(),
  glazing: id,
  /** Of the whole window, frame included. */
  areaM2: positive(1000),
  /** Place on the face; its size must give `areaM2`. Used for view factors, shading and the sun's patch. */
  rectangle: rectangleSchema.optional(),
  /** Left out: what shades the wall shades the opening too, where both have their place on a box. */
  shading: shadingSchema.optional(),
  /** Left out: the whole opening is glass. */
  frame: frameSchema.optional(),
  blind: blindAtWindowSchema.optional(),
  nightInsulation: nightInsulationSchema.optional(),
});

const boundarySchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('outdoors') }),
  /** Temperature under the construction: constant, or twelve monthly means. */
  z.strictObject({
    kind: z.literal('ground'),
    temperatureC: z.union([temperatureC, z.array(temperatureC).length(12)]),
  }),
  /** On the ground as described by one of the project's ground contacts. */
  z.strictObject({ kind: z.literal('ground-contact'), contact: id }),
  /** The other room lists the same partition and names this surface. */
  z.strictObject({ kind: z.literal('room'), room: id, surface: id }),
  z.strictObject({ kind: z.literal('fixed'), temperatureC: scheduled(temperatureC) }),
  z.strictObject({ kind: z.literal('adiabatic') }),
]);

const surfaceSchema = z.strictObject({
  id,
  name: text.optional(),
  construction: id,
  /** The layers run the other way round: from this room to the other. Partitions only. */
  reversed: z.boolean().default(false),
  /** Gross: openings included. */
  areaM2: positive(1e5),
  /** Of the outward normal: 0 a roof, 90 a wall, 180 a floor. */
  tiltDeg: between(0, 180),
  /** Outward normal, clockwise from north; of no account when flat. */
  azimuthDeg: between(0, 360).default(0),
  /** Height of its middle above the ground outside, for the wind; left out: 1.35 m for walls, room height for roofs. */
  heightAboveGroundM: between(0, 500).optional(),
  boundary: boundarySchema,
  /** What shades the whole surface, measured from its edges. */
  shading: shadingSchema.optional(),
  openings: z.array(openingSchema).default([]),
});

/** Furniture and the like: a capacity that follows the air through its own surface. */
const internalMassSchema = z.strictObject({
  id,
  name: text.optional(),
  capacityJPerK: positive(1e10),
  areaM2: positive(1e5),
});

const ventilationSchema = z.strictObject({
  id,
  name: text.optional(),
  /** Outdoor air brought in. */
  flowM3PerS: between(0, 1000),
  /** Air taken out to outdoors; left out: as much as is brought in. */
  extractM3PerS: between(0, 1000).optional(),
  schedule: id.optional(),
  ...recoveryFields,
  /** For a fan that runs on conditions, as in night cooling. */
  control: airControlSchema.optional(),
});

export const roomSchema = z.strictObject({
  id,
  name: text,
  floorAreaM2: positive(1e5),
  volumeM3: positive(1e6),
  /**
   * Inside size where the room is a box: `lengthM` runs along the face that looks towards
   * `frontAzimuthDeg`. Then view factors are exact.
   */
  box: z
    .strictObject({
      lengthM: positive(300),
      depthM: positive(300),
      heightM: positive(100),
      frontAzimuthDeg: between(0, 360),
    })
    .optional(),
  surfaces: z.array(surfaceSchema).min(1),
  internalMasses: z.array(internalMassSchema).default([]),
  /** What goes on in it, by a usage profile of the library; its gains come on top of `gains`. */
  usage: usageSchema.optional(),
  gains: z.array(gainSchema).default([]),
  infiltration: z
    .strictObject({ airChangesPerH: between(0, 100), schedule: id.optional() })
    .default({ airChangesPerH: 0 }),
  /** Leaks driven by wind and stack, in place of fixed air changes. */
  leakage: leakageSchema.optional(),
  ventilation: z.array(ventilationSchema).default([]),
  airOpenings: z.array(airOpeningSchema).default([]),
  thermalBridges: z.array(thermalBridgeSchema).default([]),
  moisture: moistureSchema.optional(),
  heating: heatingSchema.optional(),
  /** Takes over where `heating` gives all it has; needs `maxW`. */
  backupHeating: heatingSchema.optional(),
  cooling: heatingSchema.optional(),
  comfort: comfortSchema.optional(),
});

/** Air that moves one way between rooms, or from or to `outdoors`. In and out balance in every room. */
export const airPathSchema = z.strictObject({
  from: id,
  to: id,
  flowM3PerS: positive(1000),
  schedule: id.optional(),
});

/** Air that two rooms swap through an open door, the same flow each way. */
export const airExchangeSchema = z.strictObject({
  rooms: z.tuple([id, id]),
  flowM3PerS: positive(1000),
  schedule: id.optional(),
});

export type Room = z.infer<typeof roomSchema>;
export type Surface = Room['surfaces'][number];
export type Opening = Surface['openings'][number];
export type Boundary = Surface['boundary'];
export type Shading = z.infer<typeof shadingSchema>;
export type Rectangle = z.infer<typeof rectangleSchema>;
