// What rooms are made of: materials, constructions, glazings.
import { z } from 'zod';
import { between, id, positive, share, text } from './schema-values.ts';

export const materialSchema = z.strictObject({
  id,
  name: text,
  conductivityWPerMK: positive(500),
  densityKgPerM3: positive(25000),
  specificHeatJPerKgK: positive(20000),
  /** Water-vapour resistance factor (dry), 1 or more; only for moisture. */
  vapourResistanceFactor: z.number().gte(1).optional(),
  source: text.optional(),
});

const solidLayer = z.strictObject({ material: id, thicknessM: positive(10) });
/** A layer that only resists: no mass, no thickness of its own in the mesh. */
const resistanceLayer = z.strictObject({
  name: text.default('resistance'),
  resistanceM2KPerW: positive(200),
  /** Diffusion-equivalent air layer thickness s_d; only for moisture (0.01 for an air layer). */
  vapourSdM: between(0, 10_000).optional(),
});

/** Layers run from outside to inside (from the other room to this one in a partition). */
export const constructionSchema = z.strictObject({
  id,
  name: text,
  layers: z.array(z.union([solidLayer, resistanceLayer])).min(1),
  outsideSolarAbsorptance: share.default(0.6),
  insideSolarAbsorptance: share.default(0.6),
  outsideEmissivity: share.default(0.9),
  insideEmissivity: share.default(0.9),
  /** Roughness of the outer face, for the wind-driven film. */
  outsideRoughness: z
    .enum(['very rough', 'rough', 'medium rough', 'medium smooth', 'smooth', 'very smooth'])
    .default('medium rough'),
});

/** One pane. Fronts face outside. Give the solar values of the bare pane at normal incidence. */
const paneSchema = z.strictObject({
  thicknessM: positive(0.1),
  conductivityWPerMK: positive(5).default(1),
  densityKgPerM3: positive(5000).default(2500),
  specificHeatJPerKgK: positive(2000).default(750),
  solarTransmittance: share,
  /** Left out for clear glass: then the reflectances follow from the refractive index. */
  frontSolarReflectance: share.optional(),
  backSolarReflectance: share.optional(),
  refractiveIndex: between(1.1, 3).default(1.526),
  frontEmissivity: between(0.01, 1).default(0.84),
  backEmissivity: between(0.01, 1).default(0.84),
});

const gapSchema = z.strictObject({
  gas: z.enum(['air', 'argon', 'krypton', 'xenon']),
  thicknessM: positive(0.2),
});

/** Panes and gaps from outside to inside, or a plate value pair of U and g. */
export const glazingSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('panes'),
    id,
    name: text,
    panes: z.array(paneSchema).min(1).max(5),
    gaps: z.array(gapSchema).max(4),
    source: text.optional(),
  }),
  z.strictObject({
    kind: z.literal('simple'),
    id,
    name: text,
    uValueWPerM2K: positive(7),
    gValue: share,
    source: text.optional(),
  }),
]);

export type Material = z.infer<typeof materialSchema>;
export type Construction = z.infer<typeof constructionSchema>;
export type Layer = Construction['layers'][number];
export type Glazing = z.infer<typeof glazingSchema>;
export type PaneGlazing = Extract<Glazing, { kind: 'panes' }>;
export type Pane = PaneGlazing['panes'][number];
