import { measure } from '../../server/analysis/measure';
import { measureCaseSchema } from '../../shared/contracts/measureCase';
import { drawStudyCase, type StudyCase } from './drawStudyCase';
import { drawResponse, electronsPerCount, expectedFrame, exposeFrame, graymapFile } from './exposeFrame';
import { RandomSource } from './RandomSource';
import { sizeBound, type SizeBound } from './sizeBound';

/** `ideal`: shot, read and rounding noise only. `uneven`: unequal pixels beside, and no flat. */
export type StudyKind = 'ideal' | 'uneven';

export interface StudyOutcome {
  seed: number;
  study: StudyCase;
  bound: SizeBound;
  /** The reason of a refusal; null when a size was measured. */
  refusal: string | null;
  /** Measured over true size, less 1. */
  error: number;
  /** Relative fit uncertainty (k = 1) and expanded uncertainty as stated. */
  fit: number;
  expanded: number;
  flags: string[];
  /** Of the second opinion, relative; null where there is none. */
  opinion: { error: number; uncertainty: number } | null;
}

/** Frames whose size could not be known better than this are no test of the engine. */
const WELL_POSED = 0.0005;
/** What "even light" leaves open of (a / w)², and how well a beam radius is believed: as the engine says. */
const EVEN_DEVIATION = 0.003;
const BEAM_DEVIATION = 0.15;
/** Stated standard uncertainties of the bench, relative; the wavelength's in nm. */
const BENCH = { distance: 3e-4, pitch: 1e-4, wavelengthNm: 0.02 };

/**
 * One frame of the study, made and measured.
 * @param drawn what the engine is told of the bench is off by its stated uncertainties; else exact and without any
 * @returns null when the frame is not well posed
 */
export async function studyFrame(seed: number, kind: StudyKind, drawn: boolean): Promise<StudyOutcome | null> {
  const random = new RandomSource(seed);
  const study = drawStudyCase(random);
  const expected = expectedFrame(study);
  const response = kind === 'uneven' ? drawResponse(study, random) : null;
  const deviation = Math.max(EVEN_DEVIATION, 2 * BEAM_DEVIATION * study.taper);
  const bound = sizeBound(study, expected, response, deviation);
  if (!(bound.free < WELL_POSED)) return null;
  const counts = exposeFrame(study, expected.electrons, response, random);
  const off = (relative: number) => (drawn ? 1 + relative * random.normal() : 1);
  const told = {
    distanceMm: study.distanceMm * off(BENCH.distance),
    pixelPitchUm: study.pitchUm * off(BENCH.pitch),
    wavelengthNm: study.wavelengthNm * off(BENCH.wavelengthNm / study.wavelengthNm),
    beamRadiusUm: (study.sizeUm / 2 / Math.sqrt(study.taper)) * off(BEAM_DEVIATION),
  };
  const { result } = await measure(
    measureCaseSchema.parse({
      id: `study-${seed}`,
      frame: 'frame.pgm',
      pattern: 'pinhole',
      wavelengthNm: told.wavelengthNm,
      distanceMm: told.distanceMm,
      pixelPitchUm: told.pixelPitchUm,
      illumination:
        study.taper === 0 ? { kind: 'plane' } : { kind: 'gaussian', beamRadiusUm: Math.max(1, told.beamRadiusUm) },
      uncertainty: drawn
        ? {
            distanceMm: BENCH.distance * study.distanceMm,
            pixelPitchUm: BENCH.pitch * study.pitchUm,
            wavelengthNm: BENCH.wavelengthNm,
          }
        : undefined,
      camera: study.onRecord
        ? {
            bitDepth: study.bitDepth,
            electronsPerCount: electronsPerCount(study),
            readNoiseElectrons: study.readNoiseElectrons,
            blackCount: study.blackCount,
          }
        : { bitDepth: study.bitDepth },
    }),
    { frames: [graymapFile(counts, study)], darks: [], flats: [] },
  );
  if (result.status !== 'measured' || result.sizeUm === null) {
    const reason = result.status === 'measured' ? 'no-size' : result.reason;
    return { seed, study, bound, refusal: reason, error: NaN, fit: NaN, expanded: NaN, flags: [], opinion: null };
  }
  const { sizeUm, standardUncertaintyUm } = result.secondOpinion ?? {};
  return {
    seed,
    study,
    bound,
    refusal: null,
    error: result.sizeUm / study.sizeUm - 1,
    fit: (result.fitUncertaintyUm ?? NaN) / study.sizeUm,
    expanded: (result.expandedUncertaintyUm ?? NaN) / study.sizeUm,
    flags: result.flags,
    opinion:
      sizeUm == null || standardUncertaintyUm == null
        ? null
        : { error: sizeUm / study.sizeUm - 1, uncertainty: standardUncertaintyUm / study.sizeUm },
  };
}
