// Air: leaks by pressure, openings to the air outside, supply and extract, doorways between rooms.
import { z } from 'zod';
import { between, id, positive, scheduled, share, temperatureC, text } from './schema-values.ts';

/**
 * When an opening is used, or a night-cooling fan runs. Each limit left out does not count; all that
 * are given hold together. Limits by temperature open gradually over `bandK`, so that a run does not
 * flutter.
 */
export const airControlSchema = z.strictObject({
  /** Multiplies the free area or the flow: 0 shut to 1 open. */
  schedule: id.optional(),
  /** Used only while this schedule is above 0: somebody is there to open it. */
  occupied: id.optional(),
  /** Opens where the room is warmer than this. */
  roomAboveC: scheduled(temperatureC).optional(),
  /** Opens where the room is warmer than outdoors by this: night cooling. */
  warmerThanOutdoorsK: between(0, 50).optional(),
  /** Shut in outdoor air colder than this. */
  outdoorAboveC: temperatureC.optional(),
  /** Shut in wind (10 m, as in the weather) above this. */
  windBelowMPerS: between(0, 100).optional(),
  /** Shut in outdoor air damper than this, 0 to 1: weather tables without rain leave no better sign. */
  outdoorHumidityBelow: share.optional(),
  bandK: between(0.1, 10).default(1),
});

const place = {
  /** Surface whose orientation the wind sees. */
  surface: id,
  /** Free area when open. */
  areaM2: positive(1000),
  /** Middle of the opening above the room's floor. */
  heightM: between(0, 100),
};

/** Leaks of a room by the power law of a pressure test, driven by wind and stack. */
export const leakageSchema = z.strictObject({
  /** Air changes at 50 Pa, shared out over the room's outdoor surfaces by area. */
  n50PerH: positive(100),
  exponent: between(0.5, 1).default(0.65),
  /** Multiplies the wind at the building: 1 free, less behind trees and houses. */
  windShare: share.default(1),
});

export const airOpeningSchema = z.discriminatedUnion('kind', [
  /** One opening, or several on one facade (EN 16798-7). */
  z.strictObject({
    kind: z.literal('single-sided'),
    id,
    name: text.optional(),
    areaM2: positive(1000),
    /** Height of the opening, or from the lowest edge to the highest. */
    heightM: positive(100),
    control: airControlSchema.prefault({}),
  }),
  /** Two openings on different sides or heights: wind and stack joined. */
  z.strictObject({
    kind: z.literal('cross'),
    id,
    name: text.optional(),
    openings: z.tuple([z.strictObject(place), z.strictObject(place)]),
    dischargeCoefficient: between(0.1, 1).default(0.6),
    windShare: share.default(1),
    control: airControlSchema.prefault({}),
  }),
]);

/** Heat recovery's fields, in a room's own ventilation and in a unit for several rooms. */
export const recoveryFields = {
  /** Sensible effectiveness on the supply side. */
  heatRecovery: share.default(0),
  /** Share of the humidity difference that comes back. */
  moistureRecovery: share.default(0),
  /** Bypass: the supply air is not warmed above this by recovery. */
  bypassAboveSupplyC: temperatureC.optional(),
  /** Frost limit: recovery is cut so that the exhaust air stays this warm. */
  leastExhaustC: temperatureC.optional(),
};

/** A ventilation unit that supplies some rooms and extracts from others; flows at schedule value 1. */
export const airUnitSchema = z.strictObject({
  id,
  name: text.optional(),
  supply: z.array(z.strictObject({ room: id, flowM3PerS: positive(1000) })),
  extract: z.array(z.strictObject({ room: id, flowM3PerS: positive(1000) })),
  schedule: id.optional(),
  ...recoveryFields,
  /** Extract temperature by which bypass and frost limit are set. */
  designExtractC: temperatureC.default(21),
});

/** An open doorway: the rooms swap air by their temperature difference. */
export const doorwaySchema = z.strictObject({
  rooms: z.tuple([id, id]),
  widthM: positive(50),
  heightM: positive(50),
  dischargeCoefficient: between(0.1, 1).default(0.4),
  /** 0 shut to 1 open. */
  schedule: id.optional(),
});

export type AirControl = z.infer<typeof airControlSchema>;
export type Leakage = z.infer<typeof leakageSchema>;
export type AirOpening = z.infer<typeof airOpeningSchema>;
export type AirUnit = z.infer<typeof airUnitSchema>;
export type Doorway = z.infer<typeof doorwaySchema>;
