// A plain nodal model as a file: nodes, links and sources, no room and no weather table needed.
import { z } from 'zod';

const id = z
  .string()
  .regex(/^[a-z0-9][a-z0-9-]{0,59}$/, 'an id of lower-case letters, digits and hyphens');
const temperature = z.number().gte(-273.15).lte(5000);
/** A constant, or a column of the model's table. */
const driven = (value: z.ZodNumber) =>
  z.union([value, z.strictObject({ column: z.string().min(1) })]);

const nodeSchema = z.union([
  z.strictObject({
    id,
    name: z.string().optional(),
    /** 0: a node without mass. */
    capacityJPerK: z.number().gte(0).lte(1e15),
    startC: temperature.optional(),
  }),
  z.strictObject({ id, name: z.string().optional(), boundaryC: driven(temperature) }),
]);

const ends = { from: id, to: id, name: z.string().optional() };

const linkSchema = z.union([
  z.strictObject({ ...ends, conductanceWPerK: driven(z.number().gte(0).lte(1e12)) }),
  /** Grey-body exchange, q = σ · area · (T⁴ − T⁴). */
  z.strictObject({ ...ends, exchangeAreaM2: z.number().gte(0).lte(1e9) }),
  /** q = c · |ΔT|^(1 + n) with the sign of ΔT; c in W/K per Kⁿ. */
  z.strictObject({
    ...ends,
    buoyantWPerK: z.number().gte(0).lte(1e12),
    /** Where `from` is cooler than `to`; left out: the same. */
    coolerFromWPerK: z.number().gte(0).lte(1e12).optional(),
    exponent: z.number().gt(0).lte(2),
  }),
]);

const directedSchema = z.strictObject({
  ...ends,
  massFlowKgPerS: z.number().gt(0).lte(1e6),
  specificHeatJPerKgK: z.number().gt(0).lte(20000),
  /** Multiplies the flow; the same column all round a loop keeps its mass in balance. */
  column: z.string().min(1).optional(),
});

const sourceSchema = z.strictObject({
  node: id,
  name: z.string().optional(),
  powerW: z.number(),
  /** Multiplies the power. */
  column: z.string().min(1).optional(),
});

const controlSchema = z.strictObject({
  id,
  name: z.string().optional(),
  kind: z.enum(['heater', 'chiller']),
  sensor: id,
  node: id,
  setPointC: driven(temperature),
  /** Left out: without limit. */
  maxW: driven(z.number().gte(0)).optional(),
  bandK: z.number().gte(0).lte(50).default(0),
});

export const nodalSchema = z.strictObject({
  format: z.literal('inglenook-network'),
  version: z.literal(1),
  name: z.string(),
  notes: z.string().default(''),
  time: z.strictObject({
    stepS: z.number().gt(0).lte(86400),
    stepCount: z.int().gte(1).lte(10_000_000),
    /** Steps in one line of the results. */
    stepsPerRecord: z.int().gte(1).default(1),
    /** `steady`: begin from the steady state of the first step; `given`: from each node's `startC`. */
    start: z.enum(['given', 'steady']).default('given'),
  }),
  /** A CSV with a heading; its rows follow each other every `rowS` seconds. */
  table: z
    .strictObject({
      file: z.string().min(1),
      rowS: z.number().gt(0),
      /** `mean`: a row holds for its interval; `reading`: at the interval's start, straight in between. */
      stands: z.enum(['mean', 'reading']).default('mean'),
    })
    .optional(),
  nodes: z.array(nodeSchema).min(1),
  links: z.array(linkSchema).default([]),
  directedLinks: z.array(directedSchema).default([]),
  sources: z.array(sourceSchema).default([]),
  controls: z.array(controlSchema).default([]),
});

export type NodalModel = z.infer<typeof nodalSchema>;
export type Driven = number | { readonly column: string };
