import { z } from 'zod';

/** A segment in full-frame pixels (centre of the top-left pixel is 0, 0) and the width averaged across it. */
export const lineProfileQuery = z.object({
  x0: z.coerce.number(),
  y0: z.coerce.number(),
  x1: z.coerce.number(),
  y1: z.coerce.number(),
  widthPx: z.coerce.number().min(1).max(200).default(1),
  /** Turns pixels into millimetres in the CSV when given. */
  pixelPitchUm: z.coerce.number().positive().max(1000).optional(),
});
/** Arrays of equal length, one entry a step of one pixel along the segment; null where the line leaves the frame. */
export const lineProfileSchema = z.object({
  distancePx: z.array(z.number()),
  xPx: z.array(z.number()),
  yPx: z.array(z.number()),
  meanCounts: z.array(z.number().nullable()),
  /** Standard error from the scatter across the width; null for a width of one pixel. */
  standardErrorCounts: z.array(z.number().nullable()),
});
export type LineProfile = z.infer<typeof lineProfileSchema>;
