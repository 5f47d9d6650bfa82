// Thermal bridges: what leaves a room beside the plane parts of its envelope (ISO 14683, ISO 10211).
import { z } from 'zod';
import { between, id, scheduled, share, temperatureC, text } from './schema-values.ts';

const beyond = {
  id,
  name: text.optional(),
  /** Surface it belongs to, for the provenance only. */
  surface: id.optional(),
  /** Where the heat goes; a space of given temperature stands for ground or an unheated space. */
  beyond: z
    .discriminatedUnion('kind', [
      z.strictObject({
        kind: z.literal('outdoors'),
        /** b of ISO 13789 for an unheated space between: 1 straight to outdoors. */
        reductionShare: share.default(1),
      }),
      z.strictObject({ kind: z.literal('fixed'), temperatureC: scheduled(temperatureC) }),
      z.strictObject({
        kind: z.literal('ground'),
        temperatureC: z.union([temperatureC, z.array(temperatureC).length(12)]),
      }),
    ])
    .prefault({ kind: 'outdoors' }),
};

export const thermalBridgeSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('linear'),
    ...beyond,
    lengthM: between(0, 1e5),
    /** Goes with the areas as entered: inside or outside dimensions. May be negative. */
    psiWPerMK: between(-2, 10),
  }),
  z.strictObject({
    kind: z.literal('point'),
    ...beyond,
    count: between(0, 1e6).default(1),
    chiWPerK: between(0, 100),
  }),
]);

export type ThermalBridge = z.infer<typeof thermalBridgeSchema>;
