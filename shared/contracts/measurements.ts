import { z } from 'zod';
import { id, instant } from './common';
import { endpoint } from './endpoint';
import { encodings, measureCaseSchema, mosaics, patterns } from './measureCase';
import {
  failureReasons,
  flags,
  measureResultSchema,
  radialProfileSchema,
  refusalReasons,
  ringSchema,
  stages,
} from './measureResult';
import { BENCH, STAFF } from './roles';

export const measurementStates = ['waiting', 'measuring', 'measured', 'refused', 'failed'] as const;
export type MeasurementState = (typeof measurementStates)[number];

export const measurementSettingsSchema = z.object({
  pattern: z.enum(patterns),
  mosaic: z.enum(mosaics).default('auto'),
  encoding: z.enum(encodings).default('auto'),
  useDarks: z.boolean().default(true),
});
export type MeasurementSettings = z.output<typeof measurementSettingsSchema>;
/** What is to differ from the settings of the run before; what is left out stays as it was. */
export const settingsChangeSchema = z
  .object({ pattern: z.enum(patterns), mosaic: z.enum(mosaics), encoding: z.enum(encodings), useDarks: z.boolean() })
  .partial();
export type SettingsChange = z.output<typeof settingsChangeSchema>;

/** A measurement in a list. */
export const measurementSchema = z.object({
  id,
  captureId: id,
  captureFrameId: id,
  frameId: id,
  frameName: z.string(),
  apertureId: id,
  apertureSerial: z.string(),
  lotId: id,
  lotNumber: z.string(),
  benchName: z.string(),
  benchRevision: z.number().int(),
  wavelengthNm: z.number(),
  distanceMm: z.number(),
  state: z.enum(measurementStates),
  stage: z.enum(stages).nullable(),
  sizeUm: z.number().nullable(),
  standardUncertaintyUm: z.number().nullable(),
  fitUncertaintyUm: z.number().nullable(),
  expandedUncertaintyUm: z.number().nullable(),
  coverageFactor: z.number().nullable(),
  reason: z.enum([...refusalReasons, ...failureReasons]).nullable(),
  message: z.string().nullable(),
  flags: z.array(z.enum(flags)),
  darkCount: z.number().int(),
  /** False when a newer run of the same frame exists. */
  newest: z.boolean(),
  createdAt: instant,
  createdBy: z.string(),
  finishedAt: instant.nullable(),
});
export type Measurement = z.infer<typeof measurementSchema>;

export const measurementDetailSchema = measurementSchema.extend({
  nominalSizeUm: z.number(),
  toleranceUm: z.number().nullable(),
  settings: measurementSettingsSchema,
  /** What the engine was given, kept with the result. File names stand where paths would. */
  inputs: measureCaseSchema,
  benchId: id,
  cameraName: z.string(),
  laserName: z.string(),
  /** Null until the run has ended. */
  result: measureResultSchema.nullable(),
  widthPx: z.number().int().nullable(),
  heightPx: z.number().int().nullable(),
  hasMisfit: z.boolean(),
  /** All runs of the same frame, newest first, this one included. */
  history: z.array(
    z.object({
      id,
      state: z.enum(measurementStates),
      sizeUm: z.number().nullable(),
      expandedUncertaintyUm: z.number().nullable(),
      darkCount: z.number().int(),
      createdAt: instant,
      createdBy: z.string(),
    }),
  ),
});
export type MeasurementDetail = z.infer<typeof measurementDetailSchema>;

/** A measured size with its rings, for Compare. */
export const comparedSchema = z.object({
  measurementId: id,
  apertureSerial: z.string(),
  lotNumber: z.string(),
  benchName: z.string(),
  nominalSizeUm: z.number(),
  sizeUm: z.number(),
  standardUncertaintyUm: z.number(),
  fitUncertaintyUm: z.number(),
  wavelengthNm: z.number(),
  distanceMm: z.number(),
  rings: z.array(ringSchema),
  measuredAt: instant,
});
export type Compared = z.infer<typeof comparedSchema>;

/** What is sent on the event stream: enough to know which lists to read again and which stage is running. */
export const progressEventSchema = z.discriminatedUnion('type', [
  z.object({ type: z.literal('frame'), captureId: id, captureFrameId: id, frameId: id, state: z.string() }),
  z.object({
    type: z.literal('measurement'),
    captureId: id,
    captureFrameId: id,
    measurementId: id,
    state: z.enum(measurementStates),
    stage: z.enum(stages).nullable(),
  }),
]);
export type ProgressEvent = z.infer<typeof progressEventSchema>;

const params = z.object({ measurementId: id });
const csvQuery = z.object({});

export const measurementEndpoints = {
  measurements: endpoint({
    method: 'get',
    path: '/measurements',
    summary: 'Measurements, newest first',
    access: STAFF,
    query: z.object({
      lotId: id.optional(),
      apertureId: id.optional(),
      state: z.enum(measurementStates).optional(),
      newestOnly: z.stringbool().default(true),
      limit: z.coerce.number().int().min(1).max(500).default(200),
    }),
    answer: z.array(measurementSchema),
  }),
  measurement: endpoint({
    method: 'get',
    path: '/measurements/:measurementId',
    summary: 'A measurement with its result',
    access: STAFF,
    params,
    answer: measurementDetailSchema,
  }),
  measureAgain: endpoint({
    method: 'post',
    path: '/measurements/:measurementId/again',
    summary: 'Measure the same frame again, with other settings if given; the old run stays',
    access: BENCH,
    params,
    body: settingsChangeSchema,
    answer: measurementSchema,
  }),
  radialProfile: endpoint({
    method: 'get',
    path: '/measurements/:measurementId/radial-profile',
    summary: 'Radial profile with standard errors and the fitted model',
    access: STAFF,
    params,
    answer: radialProfileSchema,
  }),
  radialProfileCsv: endpoint({
    method: 'get',
    path: '/measurements/:measurementId/radial-profile.csv',
    summary: 'The radial profile as CSV',
    access: STAFF,
    params,
    query: csvQuery,
    kind: 'csv',
  }),
  ringTableCsv: endpoint({
    method: 'get',
    path: '/measurements/:measurementId/rings.csv',
    summary: 'The ring table as CSV',
    access: STAFF,
    params,
    query: csvQuery,
    kind: 'csv',
  }),
  misfit: endpoint({
    method: 'get',
    path: '/measurements/:measurementId/misfit',
    summary: 'Misfit of each pixel: one byte, 0 masked, else 128 + 10 × misfit held to 1…255; rows from the top',
    access: STAFF,
    params,
    kind: 'bytes',
  }),
  compared: endpoint({
    method: 'get',
    path: '/comparison',
    summary: 'Sizes and rings of chosen measurements',
    access: STAFF,
    query: z.object({
      ids: z
        .string()
        .transform((s) => s.split(',').filter(Boolean))
        .pipe(z.array(id).max(100)),
    }),
    answer: z.array(comparedSchema),
  }),
  events: endpoint({
    method: 'get',
    path: '/events',
    summary: 'Server-sent events of the laboratory: a ProgressEvent each',
    access: STAFF,
    kind: 'events',
  }),
};
