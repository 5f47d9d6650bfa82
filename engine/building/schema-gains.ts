// Heat of people, lights and equipment, given outright or by use.
import { z } from 'zod';
import { type Activity, activityMet } from '../physics/index.ts';
import { between, id, positive, share, text } from './schema-values.ts';

const activities = Object.keys(activityMet) as [Activity, ...Activity[]];

/** The amount stands in exactly one of `powerW`, `powerWPerM2`, `persons`, `floorPerPersonM2`. */
export const gainSchema = z.strictObject({
  id,
  name: text.optional(),
  kind: z.enum(['people', 'lighting', 'equipment']),
  /** Sensible heat at schedule value 1. */
  powerW: between(0, 1e6).optional(),
  /** The same for each square metre of floor. */
  powerWPerM2: between(0, 1e4).optional(),
  /** People at schedule value 1; their heat follows from what they do. */
  persons: between(0, 1e5).optional(),
  /** The same as floor for each person. */
  floorPerPersonM2: positive(1e4).optional(),
  /** For people by number; left out: seated at light work. */
  activity: z.enum(activities).optional(),
  /**
   * Of people by number: `by-room-temperature` lets their dry heat fall above 24 °C as they sweat;
   * `at-24-c` keeps it at its value there.
   */
  dryHeat: z.enum(['by-room-temperature', 'at-24-c']).default('by-room-temperature'),
  /** Multiplies the amount; left out: always on. */
  schedule: id.optional(),
  radiantShare: share.default(0.5),
  /** Id of the carrier that the power is drawn from, for final energy; left out: not counted there. */
  carrier: id.optional(),
});

/** A usage profile of the library by its id, or with changes. It adds gains, and outdoor air if asked. */
export const usageSchema = z.union([
  id,
  z.strictObject({
    profile: id,
    floorPerPersonM2: positive(1e4).optional(),
    lightingWPerM2: between(0, 1000).optional(),
    equipmentWPerM2: between(0, 1e4).optional(),
    /** Brings in the outdoor air of the profile. */
    ventilation: z.boolean().default(false),
    heatRecovery: share.default(0),
    /** Of lights and equipment, for final energy. */
    carrier: id.optional(),
  }),
]);

export type Gain = z.infer<typeof gainSchema>;
export type Usage = z.infer<typeof usageSchema>;
