import type { z } from 'zod';
import type { frameHealthSchema } from '../../../shared/contracts/captures';
import type { CameraRecord, MeasureCase } from '../../../shared/contracts/measureCase';
import type { MeasureResult, RadialProfile } from '../../../shared/contracts/measureResult';

export interface InspectAnswer {
  format: string;
  widthPx: number;
  heightPx: number;
  bitDepth: number;
  exposureMs: number | null;
  health: z.infer<typeof frameHealthSchema>;
  thumbnail: { widthPx: number; heightPx: number };
}

export interface MeasureAnswer {
  result: MeasureResult;
  radialProfile: RadialProfile | null;
  misfit: { widthPx: number; heightPx: number } | null;
}

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
