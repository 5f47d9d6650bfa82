// The drawing that rooms were made from. The engine computes with the rooms alone; the drawing is kept so
// that it can be drawn on.
import { z } from 'zod';
import { between, id, positive, text } from './schema-values.ts';

const place = z.number().gte(-10_000).lte(10_000);

export const planSchema = z.strictObject({
  /** Where the top of the drawing looks to, clockwise from north. */
  topAzimuthDeg: between(0, 360).default(0),
  /** From the ground up. */
  storeys: z.array(z.strictObject({ id, name: text, heightM: positive(50) })).default([]),
  /** Rectangles of rooms, inner sizes, on the grid of the drawing: x to the right, y to the top. */
  rooms: z
    .array(
      z.strictObject({
        room: id,
        storey: id,
        xM: place,
        yM: place,
        widthM: positive(300),
        depthM: positive(300),
      }),
    )
    .default([]),
});
