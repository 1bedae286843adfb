import { z } from 'zod';
import { day, id, instant, notNegative, note, positive, shortText } from './common';
import { endpoint } from './endpoint';
import { measurementStates } from './measurements';
import { EVERYONE, MANAGER, STAFF } from './roles';

export const apertureKinds = ['pinhole', 'slit', 'wire', 'edge', 'beam'] as const;

export const clientBody = z.object({
  name: shortText('the name of the client'),
  address: z.string().trim().max(400).default(''),
});
export const clientSchema = clientBody.extend({ id, createdAt: instant });

export const lotBody = z.object({
  number: shortText('the number of the lot', 40),
  clientId: z.uuid('Choose the client.'),
  orderReference: z.string().trim().max(80).default(''),
  dueOn: day.nullable().default(null),
  note: note.default(''),
});

export const apertureBody = z.object({
  serial: shortText('the serial number', 40),
  kind: z.enum(apertureKinds, 'Choose what kind of aperture it is.'),
  nominalSizeUm: positive('The nominal size', 'µm', 100_000),
  /** Permitted deviation either way; null: none agreed. */
  toleranceUm: notNegative('The tolerance', 'µm', 100_000).nullable().default(null),
  note: note.default(''),
});

/** The newest measurement of an aperture, in short. */
export const apertureResultSchema = z.object({
  measurementId: id,
  state: z.enum(measurementStates),
  sizeUm: z.number().nullable(),
  expandedUncertaintyUm: z.number().nullable(),
  reason: z.string().nullable(),
});
export const apertureSchema = apertureBody.extend({
  id,
  lotId: id,
  lotNumber: z.string(),
  createdAt: instant,
  newest: apertureResultSchema.nullable(),
});
export const lotSchema = lotBody.extend({
  id,
  clientName: z.string(),
  createdAt: instant,
  apertureCount: z.number().int(),
  measuredCount: z.number().int(),
  refusedCount: z.number().int(),
});
export const lotDetailSchema = lotSchema.extend({ apertures: z.array(apertureSchema) });

export type ClientBody = z.output<typeof clientBody>;
export type Client = z.infer<typeof clientSchema>;
export type LotBody = z.output<typeof lotBody>;
export type Lot = z.infer<typeof lotSchema>;
export type LotDetail = z.infer<typeof lotDetailSchema>;
export type ApertureBody = z.output<typeof apertureBody>;
export type Aperture = z.infer<typeof apertureSchema>;
export type ApertureKind = (typeof apertureKinds)[number];

const lotParams = z.object({ lotId: id });
const apertureParams = z.object({ apertureId: id });

export const lotEndpoints = {
  clients: endpoint({
    method: 'get',
    path: '/clients',
    summary: 'Clients',
    access: STAFF,
    answer: z.array(clientSchema),
  }),
  createClient: endpoint({
    method: 'post',
    path: '/clients',
    summary: 'Add a client',
    access: STAFF,
    body: clientBody,
    answer: clientSchema,
  }),
  updateClient: endpoint({
    method: 'put',
    path: '/clients/:clientId',
    summary: 'Change a client',
    access: MANAGER,
    params: z.object({ clientId: id }),
    body: clientBody,
    answer: clientSchema,
  }),
  lots: endpoint({
    method: 'get',
    path: '/lots',
    summary: 'Lots; a client sees its own',
    access: EVERYONE,
    answer: z.array(lotSchema),
  }),
  lot: endpoint({
    method: 'get',
    path: '/lots/:lotId',
    summary: 'A lot with its apertures; a client sees no result before it is released',
    access: EVERYONE,
    params: lotParams,
    answer: lotDetailSchema,
  }),
  createLot: endpoint({
    method: 'post',
    path: '/lots',
    summary: 'Add a lot',
    access: STAFF,
    body: lotBody,
    answer: lotDetailSchema,
  }),
  updateLot: endpoint({
    method: 'put',
    path: '/lots/:lotId',
    summary: 'Change a lot',
    access: STAFF,
    params: lotParams,
    body: lotBody,
    answer: lotDetailSchema,
  }),
  addApertures: endpoint({
    method: 'post',
    path: '/lots/:lotId/apertures',
    summary: 'Add apertures to a lot, all or none',
    access: STAFF,
    params: lotParams,
    body: z.object({ apertures: z.array(apertureBody).min(1).max(500) }),
    answer: lotDetailSchema,
  }),
  apertures: endpoint({
    method: 'get',
    path: '/apertures',
    summary: 'Apertures of all lots, newest lot first',
    access: STAFF,
    query: z.object({ search: z.string().trim().max(80).optional() }),
    answer: z.array(apertureSchema),
  }),
  aperture: endpoint({
    method: 'get',
    path: '/apertures/:apertureId',
    summary: 'An aperture',
    access: STAFF,
    params: apertureParams,
    answer: apertureSchema,
  }),
  updateAperture: endpoint({
    method: 'put',
    path: '/apertures/:apertureId',
    summary: 'Change an aperture',
    access: STAFF,
    params: apertureParams,
    body: apertureBody,
    answer: apertureSchema,
  }),
};
