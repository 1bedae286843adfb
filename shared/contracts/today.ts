import { z } from 'zod';
import { id } from './common';
import { endpoint } from './endpoint';
import { lotSchema } from './lots';
import { measurementSchema } from './measurements';
import { EVERYONE } from './roles';

/** What waits for the person who asks. Empty lists where a role has nothing to do with them. */
export const todaySchema = z.object({
  /** First aperture without a size of the lot that is due first. */
  next: z
    .object({
      apertureId: id,
      serial: z.string(),
      nominalSizeUm: z.number(),
      toleranceUm: z.number().nullable(),
      lotId: id,
      lotNumber: z.string(),
    })
    .nullable(),
  /** Waiting or measuring now. */
  running: z.number().int(),
  /** Newest runs that were refused or failed. */
  refusals: z.array(measurementSchema),
  /** Newest sizes. */
  recent: z.array(measurementSchema),
  /** Lots that are not fully measured, due first on top. */
  lots: z.array(lotSchema),
  week: z.object({ measured: z.number().int(), refused: z.number().int() }),
});
export type Today = z.infer<typeof todaySchema>;

export const todayEndpoints = {
  today: endpoint({
    method: 'get',
    path: '/today',
    summary: 'What waits for me',
    access: EVERYONE,
    answer: todaySchema,
  }),
};
