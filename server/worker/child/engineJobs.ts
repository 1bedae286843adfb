import { z } from 'zod';
import type { frameHealthSchema } from '../../../shared/contracts/captures';
import type { CameraRecord, MeasureCase } from '../../../shared/contracts/measureCase';
import { measureResultSchema, radialProfileSchema, type RadialProfile } from '../../../shared/contracts/measureResult';

export interface InspectAnswer {
  format: string;
  widthPx: number;
  heightPx: number;
  bitDepth: number;
  exposureMs: number | null;
  health: z.infer<typeof frameHealthSchema>;
  thumbnail: { widthPx: number; heightPx: number };
}

const isEven = (profile: RadialProfile): boolean =>
  Object.values(profile).every((array) => array.length === profile.radiusMm.length);

/** What a child answers to `measure`; the worker lets nothing else into the database. */
export const measureAnswerSchema = z.object({
  result: measureResultSchema,
  radialProfile: radialProfileSchema.refine(isEven, 'The arrays of a profile have one length.').nullable(),
  misfit: z.object({ widthPx: z.number().int().positive(), heightPx: z.number().int().positive() }).nullable(),
});
export type MeasureAnswer = z.infer<typeof measureAnswerSchema>;

/** The jobs that the engine's child processes do. */
export type EngineJobs = {
  /** File: the frame. Blobs: the decoded plane (16-bit little-endian, gzip) and the tone of the thumbnail (8-bit). */
  inspect: { data: { camera: CameraRecord }; answer: InspectAnswer };
  /** Files: frames, darks, flats in this order. Blob: the misfit (8-bit, gzip), if there is one. */
  measure: {
    data: { measureCase: MeasureCase; frameCount: number; darkCount: number };
    answer: MeasureAnswer;
  };
};
