// When things happen: profiles (one day), schedules (profiles over the year), the calendar.
import { z } from 'zod';
import { id, monthDay, text } from './schema-values.ts';

/** One day: 24 values, each held for its hour, or points joined by straight lines. */
export const profileSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('hours'),
    id,
    name: text.optional(),
    values: z.array(z.number()).length(24),
  }),
  z.strictObject({
    kind: z.literal('points'),
    id,
    name: text.optional(),
    /** In order of time; two points at the same hour make a jump. Before the first and after the last the value holds. */
    points: z.array(z.strictObject({ atH: z.number().gte(0).lte(24), value: z.number() })).min(1),
  }),
]);

const week = {
  profile: id,
  saturday: id.optional(),
  sunday: id.optional(),
  holiday: id.optional(),
};

/** Which profile holds on which day. A period (from and to included, may cross new year) comes before the rest. */
export const scheduleSchema = z.strictObject({
  id,
  name: text.optional(),
  ...week,
  periods: z.array(z.strictObject({ from: monthDay, to: monthDay, ...week })).default([]),
});

/** Schedules run in civil time. */
export const calendarSchema = z.strictObject({
  /** Year whose weekdays count; left out: the weather file's. */
  year: z.int().gte(1900).lte(2200).optional(),
  /** IANA time zone whose daylight saving the people keep; left out: standard time all year. */
  zone: z.string().optional(),
  holidays: z.array(monthDay).default([]),
});

export type Profile = z.infer<typeof profileSchema>;
export type Schedule = z.infer<typeof scheduleSchema>;
export type Calendar = z.infer<typeof calendarSchema>;
