import { z } from 'zod';
import { illuminationSchema } from './benches';

/** The contract of `npm run measure`: what goes in. Units are in the names; `uncertainty` holds standard uncertainties (k = 1). */
export const patterns = ['pinhole', 'slit', 'wire', 'edge', 'beam', 'auto'] as const;
export const mosaics = ['auto', 'mono', 'rggb', 'grbg', 'gbrg', 'bggr'] as const;
export const encodings = ['auto', 'linear', 'srgb', 'rendered'] as const;

const above0 = z.number().positive();

export const cameraRecordSchema = z.object({
  /** Significant bits. */
  bitDepth: z.number().int().min(1).max(32).optional(),
  electronsPerCount: above0.optional(),
  readNoiseElectrons: z.number().min(0).optional(),
  blackCount: z.number().optional(),
  whiteCount: above0.optional(),
  coverGlassMm: z.number().min(0).optional(),
  coverGlassIndex: z.number().min(1).max(4).optional(),
});
export type CameraRecord = z.infer<typeof cameraRecordSchema>;

export const rawLayoutSchema = z.object({
  width: z.number().int().positive(),
  height: z.number().int().positive(),
  bitsPerSample: z.number().int().min(8).max(32),
  byteOrder: z.enum(['little', 'big']).default('little'),
  packing: z.enum(['none', 'packed']).default('none'),
  offsetBytes: z.number().int().min(0).default(0),
});

export const measureCaseSchema = z
  .object({
    id: z.string().min(1).max(200),
    frame: z.string().optional(),
    frames: z.array(z.string()).min(1).optional(),
    scan: z.string().optional(),
    darks: z.array(z.string()).default([]),
    flats: z.array(z.string()).default([]),
    pattern: z.enum(patterns).default('auto'),
    /** In air. */
    wavelengthNm: above0.max(100_000),
    /** Aperture to sensitive plane. */
    distanceMm: above0.max(1e7),
    pixelPitchUm: above0.max(10_000).optional(),
    uncertainty: z
      .object({
        wavelengthNm: z.number().min(0).optional(),
        distanceMm: z.number().min(0).optional(),
        pixelPitchUm: z.number().min(0).optional(),
      })
      .optional(),
    illumination: illuminationSchema.default({ kind: 'plane' }),
    camera: cameraRecordSchema.default({}),
    mosaic: z.enum(mosaics).default('auto'),
    encoding: z.enum(encodings).default('auto'),
    /** Must not steer the result. */
    nominalSizeUm: above0.optional(),
    detectorApertureMm: above0.optional(),
    chordOffsetMm: z.number().min(0).optional(),
    raw: rawLayoutSchema.optional(),
  })
  .refine((c) => [c.frame, c.frames, c.scan].filter((x) => x !== undefined).length === 1, {
    error: 'Give exactly one of frame, frames and scan.',
  })
  .refine((c) => c.scan !== undefined || c.pixelPitchUm !== undefined, {
    path: ['pixelPitchUm'],
    error: 'Give the pixel pitch in µm.',
  });
export type MeasureCase = z.output<typeof measureCaseSchema>;
export type MeasureCaseInput = z.input<typeof measureCaseSchema>;
