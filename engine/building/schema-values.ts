// The number and text kinds that the project schema is built from. Each says in its description what
// a person would have to type, since that text ends up in the message when they typed something else.
import { z } from 'zod';

/** Short, readable, used in references and file names. */
export const id = z
  .string()
  .regex(/^[a-z0-9][a-z0-9-]{0,59}$/, 'an id of lower-case letters, digits and hyphens');

export const text = z.string().max(2000);

/** Above 0 and at most `max`. */
export const positive = (max: number) => z.number().gt(0).lte(max);
/** From `min` to `max`, both included. */
export const between = (min: number, max: number) => z.number().gte(min).lte(max);
/** 0 to 1. */
export const share = between(0, 1);
export const temperatureC = between(-100, 200);

/** A constant, or the id of a schedule that gives the value hour by hour. */
export const scheduled = (value: z.ZodNumber) => z.union([value, z.strictObject({ schedule: id })]);

/** "MM-DD". */
export const monthDay = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, 'a day as MM-DD');
