import type { MeasureCase } from '../../shared/contracts/measureCase';
import type { FailureReason, MeasureResult, RadialProfile, Stage } from '../../shared/contracts/measureResult';
import { calibrateFrame } from './calibrate/calibrateFrame';
import { decodeFrame } from './decode/decodeFrame';
import type { DecodedFrame } from './decode/DecodedFrame';
import { FrameProblem } from './decode/FrameProblem';
import { ENGINE } from './engineName';
import type { Refusal } from './judge/Refusal';
import { measurePinhole } from './measurePinhole';
import { Stopwatch } from './stopwatch';

export interface MeasureFiles {
  frames: Buffer[];
  darks: Buffer[];
  flats: Buffer[];
}

export interface MeasureOutput {
  result: MeasureResult;
  radialProfile: RadialProfile | null;
  misfit: { widthPx: number; heightPx: number; bytes: Uint8Array } | null;
}

/**
 * Measures one case. Bad input never throws: a file that cannot be used ends as `failed`, a frame that cannot be
 * measured as `refused`, both in words.
 */
export async function measure(
  measureCase: MeasureCase,
  files: MeasureFiles,
  onStage?: (stage: Stage) => void,
): Promise<MeasureOutput> {
  const watch = new Stopwatch(onStage);
  const failed = (reason: FailureReason, message: string): MeasureOutput => ({
    result: { id: measureCase.id, status: 'failed', reason, message },
    radialProfile: null,
    misfit: null,
  });
  const refused = ({ reason, message }: Refusal): MeasureOutput => ({
    result: { id: measureCase.id, status: 'refused', reason, message, engine: ENGINE, timingsMs: watch.timings() },
    radialProfile: null,
    misfit: null,
  });
  if (measureCase.scan !== undefined) {
    return failed(
      'unsupported',
      'Scans of a detector are not measured by this version. Give a frame of a camera sensor.',
    );
  }
  if (measureCase.raw !== undefined) {
    return failed(
      'unsupported',
      'Headerless raw files are not read by this version. Send the frame as a 16-bit TIFF, PNG, PGM or FITS file.',
    );
  }
  if (files.frames.length === 0) return failed('bad-case', 'frame: no frame was given.');
  if (files.frames.length > 1) {
    return failed('unsupported', 'Several frames of one aperture are not yet measured together. Give them one by one.');
  }
  try {
    watch.begin('decode');
    const light = await decodeFrame(files.frames[0], measureCase.camera);
    const darks = await decodeAll(files.darks, measureCase, light);
    const flats = await decodeAll(files.flats, measureCase, light);
    if (measureCase.pattern !== 'pinhole' && measureCase.pattern !== 'auto') {
      return refused({
        reason: 'wrong-pattern',
        message: `This version measures pinholes; a ${measureCase.pattern} is not measured. The frame itself was read without fault.`,
      });
    }
    watch.begin('calibrate');
    const calibrated = calibrateFrame({ light, darks, flats, measureCase });
    const outcome = measurePinhole(calibrated, measureCase, watch);
    if ('reason' in outcome) return refused(outcome);
    const { widthPx, heightPx, bytes } = outcome.misfit;
    return { result: outcome.measured, radialProfile: outcome.radialProfile, misfit: { widthPx, heightPx, bytes } };
  } catch (error) {
    if (error instanceof FrameProblem) return failed(error.reason, error.message);
    throw error;
  }
}

/** Darks and flats are decoded with the light frame's significant bits, so that their counts mean the same. */
async function decodeAll(files: Buffer[], { camera }: MeasureCase, light: DecodedFrame): Promise<DecodedFrame[]> {
  const decoded: DecodedFrame[] = [];
  for (const file of files)
    decoded.push(await decodeFrame(file, { ...camera, bitDepth: camera.bitDepth ?? Math.min(16, light.bitDepth) }));
  return decoded;
}
