import { z } from 'zod';
import { apertureBody } from '@/shared/contracts/lots';
import { serialSeries } from './serialSeries';

/** Several alike pieces at once: what one has, and how many there are. */
export const seriesSchema = apertureBody
  .extend({
    count: z
      .number({ error: 'Enter how many pieces as a number.' })
      .int('Whole pieces only.')
      .min(1, 'At least one piece.')
      .max(500, 'At most 500 pieces at once.'),
  })
  .refine((values) => serialSeries(values.serial, values.count) !== null, {
    path: ['serial'],
    error: 'End the first serial in digits, so that the others can count up from it.',
  });
export type SeriesInput = z.input<typeof seriesSchema>;
export type Series = z.output<typeof seriesSchema>;

/** The pieces that the form stands for. */
export function seriesApertures({ count, serial, ...piece }: Series): z.output<typeof apertureBody>[] {
  return (serialSeries(serial, count) ?? []).map((one) => ({ ...piece, serial: one }));
}
