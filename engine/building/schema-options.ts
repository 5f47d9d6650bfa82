// Options, and the economics by which they are weighed.
import { z } from 'zod';
import { between, id, text } from './schema-values.ts';

/** A named list of changes to the base: at `path` in this document the value becomes `value`. */
export const optionSchema = z.strictObject({
  id,
  name: text,
  note: text.default(''),
  /** `value` left out: what stands there is taken out. */
  changes: z.array(z.strictObject({ path: z.string().min(1), value: z.json().optional() })),
  /** What the measure costs at the start, in the currency of the energy prices; left out: not known. */
  measureCost: between(-1e9, 1e9).optional(),
  /** After so many years it is bought again; left out: it outlasts the time looked at. */
  lifetimeYears: between(1, 200).optional(),
});

/** How costs of different years are set against each other. */
export const economicsSchema = z.strictObject({
  /** The time looked at. */
  years: between(1, 100).default(30),
  /** Real, beside inflation: 0.03 for 3 % a year. */
  discountShare: between(-0.1, 0.5).default(0.03),
  /** Rise of energy prices beside inflation, a year. */
  priceRiseShare: between(-0.2, 0.5).default(0),
});

export type OptionOfProject = z.infer<typeof optionSchema>;
export type Economics = z.infer<typeof economicsSchema>;
