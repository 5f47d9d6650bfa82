// The whole project file: one JSON document, checked by one schema.
import { z } from 'zod';
import { airUnitSchema, doorwaySchema } from './schema-air.ts';
import { energySchema } from './schema-energy.ts';
import { constructionSchema, glazingSchema, materialSchema } from './schema-fabric.ts';
import { groundContactSchema } from './schema-ground.ts';
import { economicsSchema, optionSchema } from './schema-options.ts';
import { planSchema } from './schema-plan.ts';
import { airExchangeSchema, airPathSchema, roomSchema } from './schema-room.ts';
import { calendarSchema, profileSchema, scheduleSchema } from './schema-use.ts';
import { between, share, text } from './schema-values.ts';
import { coveringSchema } from './schema-window.ts';

/** Which published method computes what; the defaults are the first of each list. */
const physicsSchema = z.strictObject({
  conduction: z.enum(['fine', 'coarse']).default('fine'),
  insideConvection: z.enum(['walton', 'alamdari-hammond', 'iso-6946']).default('walton'),
  outsideConvection: z
    .enum(['yazdanian-klems', 'iso-6946', 'mcadams', 'constant'])
    .default('yazdanian-klems'),
  insideLongWave: z.enum(['grey-enclosure', 'mean-radiant-node']).default('grey-enclosure'),
  outsideLongWave: z.enum(['low-sky-at-air', 'unmixed-sky']).default('low-sky-at-air'),
  /** `auto`: horizontal infrared of the table, else Berdahl & Martin from dew point and cloud. */
  skyTemperature: z
    .enum(['auto', 'berdahl-martin', 'clark-allen', 'brunt', 'air-11'])
    .default('auto'),
  diffuseSky: z.enum(['perez', 'hay-davies', 'isotropic']).default('perez'),
  /** Of tables that hold the global radiation only. */
  diffuseSplit: z
    .enum(['erbs', 'orgill-hollands', 'reindl', 'boland', 'boland-ridley-lauret'])
    .default('erbs'),
  beamInside: z.enum(['floor', 'patch']).default('floor'),
  /** Where diffuse light meets the faces first: as the window sees them, or sky light down and ground light up. */
  diffuseInside: z.enum(['view-factors', 'sky-and-ground']).default('view-factors'),
  /** `fixed-shares`: no reflections are followed and no light is lost through glass. */
  solarInside: z.enum(['radiosity', 'fixed-shares']).default('radiosity'),
});

const siteSchema = z.strictObject({
  /** Land around the building, for the wind at the height of a face. */
  terrain: z.enum(['water', 'open', 'suburban', 'city']).default('open'),
  groundReflectance: share.default(0.2),
  /** Skyline round the building, straight between its points; left out: a free view. */
  horizon: z
    .array(z.strictObject({ azimuthDeg: between(0, 360), altitudeDeg: between(0, 90) }))
    .default([]),
});

const weatherSourceSchema = z.strictObject({
  /** Relative to the project file. */
  file: z.string().min(1),
  /** Of the bytes that were read when the project was made. */
  sha256: z
    .string()
    .regex(/^[0-9a-f]{64}$/, '64 hexadecimal digits')
    .optional(),
  /** How the table is read, for tables of no known form: a mapping's file, relative to the project. */
  mapping: z.string().min(1).optional(),
  /** Repairs that were accepted for it, by their ids. */
  accept: z.array(z.string().min(1)).optional(),
  /** The year taken from a table of several; or twelve months from a day, or the hottest or coldest. */
  year: z.int().min(1900).max(2200).optional(),
  from: z
    .string()
    .regex(/^(\d{4}-\d\d-\d\d|hottest|coldest)$/, 'a day as YYYY-MM-DD, hottest or coldest')
    .optional(),
  /** Where the weather was taken, for tables that do not say; goes before what the table says. */
  site: z
    .strictObject({
      name: text.default(''),
      latitudeDeg: between(-90, 90),
      longitudeDeg: between(-180, 180),
      elevationM: between(-500, 9000),
      utcOffsetH: between(-12, 14),
    })
    .optional(),
});

export const projectSchema = z.strictObject({
  format: z.literal('inglenook-project'),
  version: z.literal(1),
  name: text,
  notes: text.default(''),
  weather: weatherSourceSchema.optional(),
  site: siteSchema.prefault({}),
  calendar: calendarSchema.prefault({}),
  physics: physicsSchema.prefault({}),
  materials: z.array(materialSchema).default([]),
  constructions: z.array(constructionSchema).default([]),
  glazings: z.array(glazingSchema).default([]),
  /** Blinds and shutters that windows refer to. */
  coverings: z.array(coveringSchema).default([]),
  profiles: z.array(profileSchema).default([]),
  schedules: z.array(scheduleSchema).default([]),
  rooms: z.array(roomSchema).min(1),
  /** The drawing the rooms were made from, where there is one. */
  plan: planSchema.optional(),
  energy: energySchema.prefault({}),
  airPaths: z.array(airPathSchema).default([]),
  airExchanges: z.array(airExchangeSchema).default([]),
  airUnits: z.array(airUnitSchema).default([]),
  doorways: z.array(doorwaySchema).default([]),
  groundContacts: z.array(groundContactSchema).default([]),
  options: z.array(optionSchema).default([]),
  economics: economicsSchema.prefault({}),
});

/** The project with every default filled in. */
export type Building = z.infer<typeof projectSchema> & {
  /** What the parser took from the generic library, as sentences; no field of the file. */
  readonly fromLibrary?: readonly string[];
};
export type Physics = Building['physics'];
