// How a room is judged: its own band, the category for published methods, what people wear and do.
import { z } from 'zod';
import { between, id, scheduled, share, temperatureC } from './schema-values.ts';

/** Predicted mean vote hour by hour. */
const votesSchema = z.strictObject({
  /** In clo; `by-weather` follows the outdoor temperature at six in the morning (ASHRAE 55-2020, 5.2.2). */
  clothingClo: z.union([scheduled(between(0, 2)), z.literal('by-weather')]).default('by-weather'),
  /** Activity in met. */
  metRate: scheduled(between(0.8, 4)).default(1.2),
  airMPerS: between(0, 1).default(0.1),
  /** Used where the run has no vapour balance. */
  relativeHumidity: share.default(0.5),
});

/** Draught, floor temperature, and radiation from one side (in a room with a box). */
const localSchema = z.strictObject({
  airMPerS: between(0, 0.5).default(0.1),
  /** Turbulence intensity, 0.1 to 0.6. */
  turbulence: between(0.1, 0.6).default(0.4),
  /** Height of the person's middle above the floor: 0.6 seated, 1.1 standing. */
  heightM: between(0.1, 2).default(0.6),
});

export const comfortSchema = z.strictObject({
  bandLowC: scheduled(temperatureC),
  bandHighC: scheduled(temperatureC),
  /** Occupied where the value is above 0; left out: every hour. */
  occupied: id.optional(),
  /** Expectation of the people there: I high (ill, old, very young), II normal, III moderate. */
  category: z.enum(['I', 'II', 'III']).default('II'),
  /** Judged at night as well, by methods that do so. */
  bedroom: z.boolean().default(false),
  /** Left out: no votes. */
  votes: votesSchema.optional(),
  /** Left out: not judged. */
  local: localSchema.optional(),
});

export type Comfort = z.infer<typeof comfortSchema>;
export type Votes = z.infer<typeof votesSchema>;
export type LocalComfort = z.infer<typeof localSchema>;
