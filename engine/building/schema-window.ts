// What belongs to an opening beside its glass: frame and edge, blinds, night insulation.
import { z } from 'zod';
import { between, id, positive, share, temperatureC, text } from './schema-values.ts';

/**
 * Frame and glass edge by ISO 10077-1. The opening's area is that of the whole window: the glass has
 * what the frame leaves. The amount stands in exactly one of `share` and `widthM`.
 */
export const frameSchema = z.strictObject({
  /** Of the opening's area. */
  share: between(0.01, 0.9).optional(),
  /** Visible width all round; needs the opening's rectangle. */
  widthM: between(0.005, 0.5).optional(),
  /** Panes side by side, with `widthM`; mullions are as wide as the frame. */
  panes: z.int().gte(1).lte(50).default(1),
  uValueWPerM2K: between(0.2, 15),
  /** Spacer, glass edge and frame together. */
  edgePsiWPerMK: between(0, 0.5),
  /** Left out: from the rectangle, or as if glass and opening were square. */
  edgeLengthM: positive(1000).optional(),
  solarAbsorptance: share.default(0.6),
  emissivity: between(0.01, 1).default(0.9),
});

/** A covering that windows may share. Fronts face outside. */
export const coveringSchema = z.discriminatedUnion('kind', [
  /** A screen, slats or cloth as one layer that scatters light. */
  z.strictObject({
    kind: z.literal('blind'),
    id,
    name: text,
    /** Of all sunlight, holes included. */
    solarTransmittance: share,
    /** Share of holes that let a beam through as it comes; part of the transmittance. */
    openness: share.default(0),
    solarReflectance: share,
    /** Left out: as the front. */
    backSolarReflectance: share.optional(),
    frontEmissivity: between(0.01, 1).default(0.9),
    backEmissivity: between(0.01, 1).default(0.9),
    source: text.optional(),
  }),
  /** Opaque and insulating: its resistance and that of the air behind it by ISO 10077-1. */
  z.strictObject({
    kind: z.literal('shutter'),
    id,
    name: text,
    /** Of the shutter itself. */
    resistanceM2KPerW: between(0, 3),
    /** How much air passes at its edges. */
    permeability: z.enum(['very-high', 'high', 'average', 'low', 'tight']).default('average'),
    solarReflectance: share.default(0.5),
    emissivity: between(0.01, 1).default(0.9),
    source: text.optional(),
  }),
]);

/** When a covering is drawn. All that is given holds together; nothing given: always drawn. */
export const coveringControlSchema = z.strictObject({
  /** 0 not drawn to 1 drawn over the whole glass, or the share that is covered. */
  schedule: id.optional(),
  /** Drawn while the sun on the window (beam and diffuse, shades taken off) is more than this. */
  sunAboveWPerM2: between(0, 1500).optional(),
  /** Once drawn it stays until the sun falls below this; left out: the same limit. */
  sunBelowWPerM2: between(0, 1500).optional(),
  /** Drawn while outdoor air is warmer than this. */
  outdoorAboveC: temperatureC.optional(),
  /** Drawn as the room's air gets warmer than this, fully so above by `bandK`. */
  roomAboveC: temperatureC.optional(),
  bandK: between(0.2, 10).default(1),
  /** Drawn only while the sun is below the horizon. */
  atNight: z.boolean().default(false),
});

/** A blind at a window. */
export const blindAtWindowSchema = z.strictObject({
  covering: id,
  position: z.enum(['outside', 'between', 'inside']),
  /** Which gap it hangs in, 0 the outermost; for `between`. */
  gap: z.int().gte(0).lte(3).default(0),
  /** From the glass, outside and inside. */
  distanceM: between(0.005, 0.3).default(0.05),
  /** Share of the edge where the air behind it is open to outdoors or the room: 0 sealed, 1 free. */
  openShare: share.default(1),
  control: coveringControlSchema.prefault({}),
});

/** Movable insulation at a window. */
export const nightInsulationSchema = z.strictObject({
  covering: id,
  position: z.enum(['outside', 'inside']),
  control: coveringControlSchema.prefault({ atNight: true }),
});

export type Frame = z.infer<typeof frameSchema>;
export type Covering = z.infer<typeof coveringSchema>;
export type CoveringOf<K extends Covering['kind']> = Extract<Covering, { kind: K }>;
export type CoveringControl = z.infer<typeof coveringControlSchema>;
export type BlindAtWindow = z.infer<typeof blindAtWindowSchema>;
export type NightInsulation = z.infer<typeof nightInsulationSchema>;
