import { gzip } from 'node:zlib';
import { promisify } from 'node:util';
import { FrameProblem } from '../../analysis/decode/FrameProblem';
import { inspectFrame } from '../../analysis/inspectFrame';
import { measure } from '../../analysis/measure';
import { JobFailure } from '../pool/jobFailure';
import { serveJobs } from '../pool/serveJobs';
import type { EngineJobs } from './engineJobs';

/** The script of the pool's children: the engine, one job at a time. */
serveJobs<EngineJobs>({
  async inspect({ camera }, [file]) {
    if (!file) throw new JobFailure('bad-case', 'An inspection needs one file.');
    const { plane, thumbnailTone, ...inspection } = await inspectFrame(file, camera).catch(asFailure);
    const bytes = new Uint8Array(plane.buffer, plane.byteOffset, plane.byteLength);
    const { widthPx, heightPx } = thumbnailTone;
    return {
      answer: { ...inspection, thumbnail: { widthPx, heightPx } },
      blobs: [await packed(bytes), thumbnailTone.bytes],
    };
  },
  async measure({ measureCase, frameCount, darkCount }, files, onStage) {
    const sorted = {
      frames: files.slice(0, frameCount),
      darks: files.slice(frameCount, frameCount + darkCount),
      flats: files.slice(frameCount + darkCount),
    };
    const { misfit, ...output } = await measure(measureCase, sorted, onStage);
    if (!misfit) return { answer: { ...output, misfit } };
    const { widthPx, heightPx, bytes } = misfit;
    return { answer: { ...output, misfit: { widthPx, heightPx } }, blobs: [await packed(bytes)] };
  },
});

/** Fast rather than small: noise hardly compresses. */
function packed(bytes: Uint8Array): Promise<Buffer> {
  return promisify<Uint8Array, { level: number }, Buffer>(gzip)(bytes, { level: 1 });
}

function asFailure(error: unknown): never {
  if (error instanceof FrameProblem) throw new JobFailure(error.reason, error.message);
  throw error;
}
