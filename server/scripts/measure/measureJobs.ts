import type { MeasureCase } from '../../../shared/contracts/measureCase';
import type { MeasureResult } from '../../../shared/contracts/measureResult';

/** Files: frames, darks, flats in this order. */
export type MeasureJobs = {
  measure: { data: { measureCase: MeasureCase; frameCount: number; darkCount: number }; answer: MeasureResult };
};
