// Heaters and chillers of a room: set-point, sensor, control, and the emitter that gives the heat.
import { z } from 'zod';
import { between, id, positive, scheduled, share, temperatureC } from './schema-values.ts';

/**
 * A body with inertia between heater and room: Φ = nominalW · (ΔT/nominalExcessK)^exponent, ΔT between
 * the body and the room.
 */
const radiatorSchema = z.strictObject({
  kind: z.literal('radiator'),
  /** Output at `nominalExcessK`, as EN 442 tests it. */
  nominalW: positive(1e6),
  nominalExcessK: between(5, 100).default(50),
  /** 1.3 for panels and columns, 1.1 for floors and ceilings, 1.4 for convectors. */
  exponent: between(1, 1.6).default(1.3),
  /** Metal and water; left out: 30 J/K for each watt of nominal output. */
  capacityJPerK: positive(1e9).optional(),
  /** The rest warms the air. */
  radiantShare: share.default(0.3),
});

/**
 * Pipes or wires in the middle of a layer of one of the room's surfaces. Ideal control through so slow a
 * layer jumps between nothing and full power; a `bandK` of about 1 K runs it as real controls do.
 */
const embeddedSchema = z.strictObject({
  kind: z.literal('embedded'),
  surface: id,
  /** Place of the layer in the construction's list; 0 is the first. */
  layer: z.int().gte(0),
});

export const heatingSchema = z.strictObject({
  setPointC: scheduled(temperatureC),
  /** Left out: without limit, or what a radiator gives at its nominal excess. */
  maxW: between(0, 1e7).optional(),
  /** Of ideal air without emitter. The rest reaches the room's surfaces as radiation, by area. */
  convectiveShare: share.default(1),
  sensor: z.enum(['air', 'operative']).default('air'),
  /** 0: ideal control to the set-point. */
  bandK: between(0, 10).default(0),
  /** Left out: the heat goes to the room at once. */
  emitter: z.discriminatedUnion('kind', [radiatorSchema, embeddedSchema]).optional(),
  /** Runs only where this is above 0; left out: always. */
  available: id.optional(),
  /** Starts ahead of a rise of the set-point, as early as past warm-ups show to be needed. */
  optimumStart: z.strictObject({ mostHours: between(0.25, 24).default(6) }).optional(),
  /** Id of the boiler, heat pump or chiller that serves it; left out: no final energy. */
  supply: id.optional(),
});

export type Heating = z.infer<typeof heatingSchema>;
export type Scheduled = Heating['setPointC'];
export type Emitter = NonNullable<Heating['emitter']>;
export type Radiator = z.infer<typeof radiatorSchema>;
