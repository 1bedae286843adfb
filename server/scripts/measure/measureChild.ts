import { measure } from '../../analysis/measure';
import { serveJobs } from '../../worker/pool/serveJobs';
import type { MeasureJobs } from './measureJobs';

/** A child of the measure command: one case after the other. */
serveJobs<MeasureJobs>({
  async measure({ measureCase, frameCount, darkCount }, files) {
    const { result } = await measure(measureCase, {
      frames: files.slice(0, frameCount),
      darks: files.slice(frameCount, frameCount + darkCount),
      flats: files.slice(frameCount + darkCount),
    });
    return { answer: result };
  },
});
