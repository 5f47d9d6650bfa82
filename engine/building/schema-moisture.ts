// Water vapour of a room: sources, buffering, humidifier, dehumidifier, and the surface to watch.
import { z } from 'zod';
import { between, id, positive, scheduled, share, text } from './schema-values.ts';

/** Giving it, even empty, turns the vapour balance of the whole building on. */
export const moistureSchema = z.strictObject({
  /** Vapour at schedule value 1, beside what people in `gains` give off. */
  sources: z
    .array(
      z.strictObject({
        id,
        name: text.optional(),
        vapourKgPerS: between(0, 10),
        schedule: id.optional(),
      }),
    )
    .default([]),
  /** Linings and furniture that take up vapour; left out: none. */
  buffer: z
    .strictObject({
      areaM2: positive(1e5),
      /** Practical moisture buffer value: 0.0002 poor to 0.002 very good; per kg/(m²·% RH). */
      bufferKgPerM2Percent: between(1e-6, 0.05),
    })
    .optional(),
  /** Keeps the room at this relative humidity or above, 0 to 1. */
  humidifier: z
    .strictObject({ humidityAbove: scheduled(share), maxKgPerS: between(0, 10).optional() })
    .optional(),
  /** Keeps the room at this relative humidity or below, 0 to 1. */
  dehumidifier: z
    .strictObject({ humidityBelow: scheduled(share), maxKgPerS: between(0, 10).optional() })
    .optional(),
  /** Temperature factor f_Rsi of the worst thermal bridge, from its own calculation (ISO 10211). */
  bridgeTemperatureFactor: share.optional(),
});

export type Moisture = z.infer<typeof moistureSchema>;
