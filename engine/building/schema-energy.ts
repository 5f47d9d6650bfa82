// Where heat and cold come from: carriers with the user's factors, and the machines that turn them over.
import { z } from 'zod';
import { between, id, positive, temperatureC, text } from './schema-values.ts';

/** What is bought. Cost and CO₂ are the user's own figures; the program knows none. */
const carrierSchema = z.strictObject({
  id,
  name: text,
  costPerKWh: between(-1000, 1000).default(0),
  co2KgPerKWh: between(-10, 10).default(0),
});

const points = (what: z.ZodNumber) =>
  z.array(z.strictObject({ outdoorC: temperatureC, value: what })).min(1);

const common = {
  id,
  name: text.optional(),
  carrier: id,
  /** Share of the heat made that reaches the rooms' emitters. */
  distributionShare: between(0.05, 1).default(1),
  /** Pumps, fans and controls while it runs. */
  auxiliaryW: between(0, 1e6).default(0),
  /** Left out: the carrier of the machine itself. */
  auxiliaryCarrier: id.optional(),
};

const leastShare = between(0, 0.99).default(0.3);
/** Temperature of the water (or air) it makes: constant, or by outdoor temperature. */
const flowC = z.union([temperatureC, points(temperatureC)]);
/** Share of the Carnot limit between the temperatures of source and flow, each worse by `exchangerK`. */
const carnotSchema = z.strictObject({
  qualityShare: between(0.05, 0.8).default(0.45),
  exchangerK: between(0, 20).default(5),
  flowC,
});
/** Below its least continuous output a machine switches on and off. */
const cycling = z.enum(['water', 'air', 'none']);

export const supplySchema = z.discriminatedUnion('kind', [
  /** Heat for energy at a fixed ratio: electric heaters, district heat. */
  z.strictObject({
    kind: z.literal('direct'),
    ...common,
    efficiency: between(0.05, 1).default(1),
  }),
  z.strictObject({
    kind: z.literal('boiler'),
    ...common,
    nominalW: positive(1e8),
    /** Output over fuel, in the calorific value that the carrier's factors are for. */
    fullLoadEfficiency: between(0.3, 1.11),
    partLoadEfficiency: between(0.3, 1.11),
    /** Load of the part-load test over nominal. */
    partLoadShare: between(0.05, 0.95).default(0.3),
    /** Losses standing ready over nominal output. */
    standbyLossShare: between(0, 0.1).default(0.01),
  }),
  z.strictObject({
    kind: z.literal('heat-pump'),
    ...common,
    /** Constant temperature of ground or water; left out: outdoor air. */
    sourceC: temperatureC.optional(),
    /** Either tested values by the temperature of the source or a share of Carnot. */
    cop: points(between(1, 20)).optional(),
    carnot: carnotSchema.optional(),
    /** Greatest heat output by the temperature of the source; left out: without limit. */
    capacityW: points(between(0, 1e8)).optional(),
    leastShare,
    cycling: cycling.default('water'),
    /** Makes up what the machine cannot; left out: such hours are counted and nothing is added. */
    backup: z.strictObject({ carrier: id, efficiency: between(0.05, 1).default(1) }).optional(),
  }),
  z.strictObject({
    kind: z.literal('chiller'),
    ...common,
    eer: points(between(0.5, 50)).optional(),
    carnot: carnotSchema.optional(),
    /** Greatest cold by outdoor temperature; left out: without limit. */
    capacityW: points(between(0, 1e8)).optional(),
    leastShare,
    cycling: cycling.default('air'),
  }),
]);

export const energySchema = z.strictObject({
  /** Shown beside costs. */
  currency: z.string().max(20).default(''),
  carriers: z.array(carrierSchema).default([]),
  supplies: z.array(supplySchema).default([]),
});

export type Energy = z.infer<typeof energySchema>;
export type Carrier = Energy['carriers'][number];
export type Supply = Energy['supplies'][number];
export type SupplyOf<K extends Supply['kind']> = Extract<Supply, { kind: K }>;
