import { z } from 'zod';
import { id, instant, note, sha256 } from './common';
import { endpoint } from './endpoint';
import { lineProfileQuery, lineProfileSchema } from './lineProfile';
import { measurementSchema, settingsChangeSchema } from './measurements';
import { BENCH, STAFF } from './roles';

export const frameKinds = ['light', 'dark', 'flat'] as const;
export type FrameKind = (typeof frameKinds)[number];
/** stored: bytes are safe, not yet looked at; ready: decoded; unusable: cannot be decoded, `problem` says why. */
export const frameStates = ['stored', 'ready', 'unusable'] as const;

/** Largest file taken, bytes. */
export const MAX_FRAME_BYTES = 200 * 1024 * 1024;
/** Endings that are offered in file dialogs; what a file really is, its content says. */
export const FRAME_EXTENSIONS = ['.tif', '.tiff', '.png', '.jpg', '.jpeg'] as const;

/** Exposure health, from the decoded counts. */
export const frameHealthSchema = z.object({
  blackCount: z.number(),
  whiteCount: z.number(),
  /** 99.99th percentile above black. */
  peakCounts: z.number(),
  /** Peak as part of the range from black to white, 0 to 1. */
  peakFraction: z.number(),
  /** Part of the pixels at or above white, 0 to 1. */
  clippedFraction: z.number(),
  /** Standard deviation of one pixel in the quiet parts of the frame, counts. */
  noiseCounts: z.number(),
});
export const captureFrameSchema = z.object({
  /** The frame's place in this capture. */
  id,
  frameId: id,
  name: z.string(),
  kind: z.enum(frameKinds),
  leftOut: z.boolean(),
  sha256,
  byteSize: z.number().int(),
  state: z.enum(frameStates),
  problem: z.string().nullable(),
  format: z.string().nullable(),
  widthPx: z.number().int().nullable(),
  heightPx: z.number().int().nullable(),
  bitDepth: z.number().int().nullable(),
  exposureMs: z.number().nullable(),
  health: frameHealthSchema.nullable(),
  createdAt: instant,
  /** Newest measurement of this frame in this capture; null for darks and before it is asked for. */
  measurement: measurementSchema.nullable(),
});
export type CaptureFrame = z.infer<typeof captureFrameSchema>;

export const captureSchema = z.object({
  id,
  apertureId: id,
  apertureSerial: z.string(),
  nominalSizeUm: z.number(),
  toleranceUm: z.number().nullable(),
  lotId: id,
  lotNumber: z.string(),
  benchId: id,
  benchName: z.string(),
  benchRevisionId: id,
  benchRevision: z.number().int(),
  wavelengthNm: z.number(),
  lightCount: z.number().int(),
  darkCount: z.number().int(),
  measuredCount: z.number().int(),
  note: z.string(),
  createdAt: instant,
  createdBy: z.string(),
});
export type Capture = z.infer<typeof captureSchema>;
/** Mean of the newest measured sizes of the capture: what scatters shrinks with the number, what is common does not. */
export const captureMeanSchema = z.object({
  count: z.number().int(),
  sizeUm: z.number(),
  standardUncertaintyUm: z.number(),
  expandedUncertaintyUm: z.number(),
  coverageFactor: z.number(),
});
export const captureDetailSchema = captureSchema.extend({
  frames: z.array(captureFrameSchema),
  mean: captureMeanSchema.nullable(),
  /** Lights whose newest run used fewer darks than the capture now holds. */
  outdatedCount: z.number().int(),
});
export type CaptureDetail = z.infer<typeof captureDetailSchema>;

export const uploadFields = z.object({
  kind: z.enum(frameKinds),
  /** Given by a client that has hashed the file; checked against the bytes. */
  sha256: sha256.optional(),
});

const captureParams = z.object({ captureId: id });
const placeParams = z.object({ captureId: id, captureFrameId: id });
const frameParams = z.object({ frameId: id });

export const captureEndpoints = {
  captures: endpoint({
    method: 'get',
    path: '/captures',
    summary: 'Captures, newest first',
    access: STAFF,
    query: z.object({ apertureId: id.optional(), lotId: id.optional() }),
    answer: z.array(captureSchema),
  }),
  createCapture: endpoint({
    method: 'post',
    path: '/captures',
    summary: 'Begin a capture of an aperture on the current revision of a bench',
    access: BENCH,
    body: z.object({ apertureId: id, benchId: id, note: note.default('') }),
    answer: captureDetailSchema,
  }),
  capture: endpoint({
    method: 'get',
    path: '/captures/:captureId',
    summary: 'A capture with its frames and their newest measurements',
    access: STAFF,
    params: captureParams,
    answer: captureDetailSchema,
  }),
  placeKnown: endpoint({
    method: 'post',
    path: '/captures/:captureId/frames/known',
    summary: 'Put frames the laboratory already holds into the capture; answers with the hashes still to be sent',
    access: BENCH,
    params: captureParams,
    body: z.object({
      files: z
        .array(z.object({ name: z.string().min(1).max(255), kind: z.enum(frameKinds), sha256 }))
        .min(1)
        .max(1000),
    }),
    answer: z.object({ missing: z.array(sha256) }),
    status: 200,
  }),
  upload: endpoint({
    method: 'post',
    path: '/captures/:captureId/frames',
    summary: 'Send one frame; a light is measured by itself once it is stored',
    access: BENCH,
    params: captureParams,
    body: uploadFields,
    multipart: true,
    answer: captureFrameSchema,
  }),
  updatePlace: endpoint({
    method: 'patch',
    path: '/captures/:captureId/frames/:captureFrameId',
    summary: 'Change what a frame is, or leave it out',
    access: BENCH,
    params: placeParams,
    body: z.object({ kind: z.enum(frameKinds).optional(), leftOut: z.boolean().optional() }),
    answer: captureFrameSchema,
  }),
  measureCapture: endpoint({
    method: 'post',
    path: '/captures/:captureId/measurements',
    summary: 'Measure every light that has no run, or whose run used fewer darks than there are now',
    access: BENCH,
    params: captureParams,
    body: settingsChangeSchema,
    answer: z.object({ queued: z.number().int() }),
  }),
  original: endpoint({
    method: 'get',
    path: '/frames/:frameId/original',
    summary: 'The file as it came, byte for byte',
    access: STAFF,
    params: frameParams,
    kind: 'bytes',
  }),
  thumbnail: endpoint({
    method: 'get',
    path: '/frames/:frameId/thumbnail',
    summary: 'A small picture in the own colour of a wavelength',
    access: STAFF,
    params: frameParams,
    query: z.object({
      theme: z.enum(['dark', 'light']).default('dark'),
      wavelengthNm: z.coerce.number().min(200).max(2000).optional(),
    }),
    kind: 'png',
  }),
  plane: endpoint({
    method: 'get',
    path: '/frames/:frameId/plane',
    summary:
      'Decoded counts, 16-bit little-endian, rows from the top; X-Width, X-Height, X-Black and X-White say the rest',
    access: STAFF,
    params: frameParams,
    kind: 'bytes',
  }),
  lineProfile: endpoint({
    method: 'get',
    path: '/frames/:frameId/line-profile',
    summary: 'Mean counts along a line with standard errors',
    access: STAFF,
    params: frameParams,
    query: lineProfileQuery,
    answer: lineProfileSchema,
  }),
  lineProfileCsv: endpoint({
    method: 'get',
    path: '/frames/:frameId/line-profile.csv',
    summary: 'A line profile as CSV',
    access: STAFF,
    params: frameParams,
    query: lineProfileQuery,
    kind: 'csv',
  }),
};
