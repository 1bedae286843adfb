import type { MeasureCase } from '../../shared/contracts/measureCase';
import type { Flag, Measured, RadialProfile } from '../../shared/contracts/measureResult';
import { NEAR_FIELD_FRESNEL_NUMBER } from '../../shared/optics/fresnelNumber';
import type { Rounded } from './calibrate/rounding';
import type { CalibratedFrame } from './calibrate/CalibratedFrame';
import { findCentre } from './centre/findCentre';
import { ENGINE } from './engineName';
import { cellModel, expectedInCell, radiusOf } from './fit/fitCells';
import { fitPinhole, type PinholeFit } from './fit/fitPinhole';
import { fresnelU, pinholeOptics, type PinholeOptics } from './fit/PinholeOptics';
import { joinPrior } from './fit/posterior';
import { judgePinhole, type PinholeJudgement } from './judge/judgePinhole';
import type { Refusal } from './judge/Refusal';
import { profileOfCells, type FittedProfile } from './profile/profileOfCells';
import { budget } from './report/budget';
import { misfit, type Misfit } from './report/misfit';
import { ringTable, sizeOfDarkRings } from './report/ringTable';
import { secondOpinion } from './report/secondOpinion';
import type { Stopwatch, Timings } from './stopwatch';

export interface PinholeMeasurement {
  measured: Measured;
  radialProfile: RadialProfile;
  misfit: Misfit;
}

/** Uncertainty of the fit, relative, beyond which the light was low. */
const LOW_SIGNAL = 0.0005;
/** Standard deviations by which two opinions must differ to be flagged. */
const DISAGREEMENT = 3.5;
/** Share of the rings' power left unexplained that is worth a warning. */
const POOR_FIT = 0.01;
const FIRST_DARK = 3.83;
/**
 * Fresnel number from which on the transform gives no second opinion: the transform of a near-field pattern changes sign
 * with frequency, and its modulus, all that is left without a centre, no longer follows one size alone. Found on
 * simulated frames: up to here the opinion's errors are as it states them, beyond they are up to ten times larger.
 */
const NO_OPINION_FRESNEL_NUMBER = 0.5;

/** Measures a calibrated frame as a pinhole's pattern, or says why it cannot be. */
export function measurePinhole(
  frame: CalibratedFrame,
  measureCase: MeasureCase,
  watch: Stopwatch,
): PinholeMeasurement | Refusal {
  const optics = pinholeOptics(measureCase);
  watch.begin('centre');
  const centres = findCentre(frame);
  watch.begin('fit');
  const found = bestFit(frame, optics, centres);
  const verdict = judgePinhole(frame, optics, centres, found);
  if ('refusal' in verdict) return verdict.refusal;
  if (found === null)
    return {
      reason: 'centre-not-found',
      message: 'No centre of rings was found in this frame. Check that the pattern falls on the sensor.',
    };
  const spread = joinPrior(found, optics, frame.hasFlats);
  const { values } = spread;
  watch.begin('profile');
  const { cells } = found;
  const evaluated = cellModel(cells, optics, values, false);
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  const counts = evaluated.model.map(
    (level, c) => level + expectedInCell(found.noise, level, evaluated.blur[c], expected).offset,
  );
  const profile = profileOfCells(cells, counts);
  const rings = ringTable(profile, values, optics, frame.noise);
  if (!rings.some((ring) => ring.kind === 'dark')) {
    return {
      reason: 'too-few-rings',
      message:
        'No single dark ring stands out of the noise, so nothing supports the size. Lengthen the exposure or move the camera so that more rings fall on the sensor.',
    };
  }
  watch.begin('fit');
  const sizeMm = 2 * radiusOf(values);
  const sizeUm = 1000 * sizeMm;
  const fresnelNumber = fresnelU(optics, sizeMm / 2) / (2 * Math.PI);
  const rendered = frame.flags.includes('camera-rendered');
  const tally = budget(sizeUm, spread, measureCase, optics.distanceMm, rendered, found.shape === 'tilted');
  const residual = misfit(frame, optics, values, found.fit.free.length);
  const opinion = secondOpinion(
    frame,
    optics,
    values.illumination,
    sizeMm,
    whyNoOpinion(frame, found, { x: values.x, y: values.y, rendered, fresnelNumber }),
  );
  const ringSize = sizeOfDarkRings(rings);
  const own = Math.hypot(spread.fit, spread.response, spread.illumination) * sizeUm;
  const disagree =
    opinion.sizeUm !== null &&
    opinion.standardUncertaintyUm !== null &&
    Math.abs(opinion.sizeUm - sizeUm) > DISAGREEMENT * Math.hypot(own, opinion.standardUncertaintyUm) &&
    Math.abs(opinion.sizeUm / sizeUm - 1) > 0.003;
  const flags = flagsOf(frame, found, verdict.judgement, {
    unevenLight: spread.unevenLight,
    fresnelNumber,
    lowSignal: spread.fit > LOW_SIGNAL,
    noOpinion: opinion.sizeUm === null,
    disagree,
    x: values.x,
    y: values.y,
    outliers: residual.outliers,
  });
  const oval = Math.hypot(values.ovalCos, values.ovalSin);
  const stretch = Math.sqrt(Math.sqrt(1 + oval * oval) + oval);
  return {
    measured: {
      id: measureCase.id,
      status: 'measured',
      pattern: 'pinhole',
      model: 'lommel',
      sizeUm,
      standardUncertaintyUm: tally.standardUncertaintyUm,
      fitUncertaintyUm: spread.fit * sizeUm,
      expandedUncertaintyUm: tally.expandedUncertaintyUm,
      coverageFactor: tally.coverageFactor,
      effectiveDegreesOfFreedom: tally.effectiveDegreesOfFreedom,
      axesUm:
        found.shape === 'oval'
          ? { major: sizeUm * stretch, minor: sizeUm / stretch, angleDeg: angleOf(values.ovalCos, values.ovalSin) }
          : null,
      angleDeg: null,
      fringeScaleUm: null,
      fringeScaleUncertaintyUm: null,
      impliedDistanceMm: null,
      edgePx: null,
      beamRadiusUm: null,
      secondMomentWidthUm: null,
      centrePx: { x: values.x, y: values.y },
      rings,
      ringSizeUm: ringSize?.sizeUm ?? null,
      ringSizeUncertaintyUm: ringSize?.uncertaintyUm ?? null,
      secondOpinion: opinion,
      reducedChiSquare: residual.reducedChiSquare,
      fresnelNumber,
      flags,
      budget: tally.lines,
      assumed: assumptions(
        frame,
        measureCase,
        found,
        values.tiltX,
        values.tiltY,
        spread.unevenLight,
        values.illumination,
        sizeMm,
      ),
      engine: ENGINE,
      timingsMs: watch.timings() satisfies Timings,
    },
    radialProfile: toMillimetres(profile, optics),
    misfit: residual,
  };
}

/** The fit from the centre whose rings explain most; a second centre is tried when it explains nearly as much. */
function bestFit(
  frame: CalibratedFrame,
  optics: PinholeOptics,
  centres: ReturnType<typeof findCentre>,
): PinholeFit | null {
  let best: PinholeFit | null = null;
  for (const centre of centres.slice(0, 2)) {
    if (centre.score < centres[0].score - 0.05) break;
    const fit = fitPinhole(frame, optics, centre);
    if (
      fit !== null &&
      (best === null || fit.fit.cellChiSquare / fit.fit.cellCount < best.fit.cellChiSquare / best.fit.cellCount)
    )
      best = fit;
  }
  return best;
}

/** Direction of the major axis of the hole: across its long axis the pattern is narrow. Degrees from +x towards +y. */
function angleOf(cos: number, sin: number): number {
  const angle = (Math.atan2(sin, cos) * 90) / Math.PI;
  return angle < 0 ? angle + 180 : angle;
}

function isCropped(frame: CalibratedFrame, x: number, y: number, firstDarkPx: number): boolean {
  return (
    x < firstDarkPx || y < firstDarkPx || x > frame.widthPx - 1 - firstDarkPx || y > frame.heightPx - 1 - firstDarkPx
  );
}

function whyNoOpinion(
  frame: CalibratedFrame,
  found: PinholeFit,
  { x, y, rendered, fresnelNumber }: { x: number; y: number; rendered: boolean; fresnelNumber: number },
): string | null {
  if (frame.clippedFraction > 0) return 'The core is clipped, and the transform needs all of the light.';
  if (isCropped(frame, x, y, (FIRST_DARK / Math.PI) * found.fringePx))
    return 'The pattern is cropped, and the transform needs all of it.';
  if (frame.step > 1) return 'A colour mosaic samples the frame too coarsely for the transform.';
  if (rendered) return 'The tone curve of a rendered frame changes the transform.';
  if (found.second !== null && found.second.explained > 0.5 && found.second.relative > 0.003) {
    return 'A second pattern lies in the frame, and the transform cannot tell the two apart.';
  }
  if (fresnelNumber > NO_OPINION_FRESNEL_NUMBER)
    return 'In the near field the transform no longer follows the size alone.';
  if (found.shape !== 'round') return 'The pattern is not round, and the transform was fitted for round holes only.';
  return null;
}

interface FlagInputs {
  unevenLight: boolean;
  fresnelNumber: number;
  lowSignal: boolean;
  noOpinion: boolean;
  disagree: boolean;
  x: number;
  y: number;
  outliers: number;
}

function flagsOf(frame: CalibratedFrame, found: PinholeFit, judgement: PinholeJudgement, inputs: FlagInputs): Flag[] {
  const flags = new Set<Flag>(frame.flags);
  const firstDarkPx = (FIRST_DARK / Math.PI) * found.fringePx;
  if (frame.clippedFraction > 1e-4) flags.add('clipped-core');
  if (isCropped(frame, inputs.x, inputs.y, firstDarkPx)) flags.add('cropped');
  if (inputs.fresnelNumber >= NEAR_FIELD_FRESNEL_NUMBER) flags.add('near-field');
  if (inputs.lowSignal) flags.add('low-signal');
  if (inputs.noOpinion) flags.add('no-second-opinion');
  if (found.shape === 'oval') flags.add('out-of-round');
  if (found.shape === 'tilted') flags.add('tilted-sensor');
  if (inputs.unevenLight) flags.add('uneven-illumination');
  if (inputs.disagree) flags.add('opinions-disagree');
  if (found.fringePx < 4) flags.add('under-sampled');
  if (judgement.second !== null && judgement.second.explained > 0.5 && judgement.second.relative > 0.004)
    flags.add('second-pattern');
  if (frame.defectCount > frame.counts.length * 2e-3) flags.add('hot-pixels');
  if (inputs.outliers > frame.counts.length * 2e-3 && !flags.has('second-pattern') && !flags.has('camera-rendered'))
    flags.add('dust');
  if (
    judgement.unexplained > POOR_FIT &&
    found.fit.cellChiSquare / found.fit.cellCount > 2 &&
    !flags.has('camera-rendered')
  )
    flags.add('poor-fit');
  return [...flags];
}

function assumptions(
  frame: CalibratedFrame,
  measureCase: MeasureCase,
  found: PinholeFit,
  tiltX: number,
  tiltY: number,
  unevenLight: boolean,
  illumination: number,
  sizeMm: number,
): string[] {
  const said = [...frame.assumed];
  const { uncertainty } = measureCase;
  const missing = [
    uncertainty?.wavelengthNm === undefined ? 'wavelength' : null,
    uncertainty?.distanceMm === undefined ? 'distance' : null,
    uncertainty?.pixelPitchUm === undefined ? 'pixel pitch' : null,
  ].filter((m) => m !== null);
  if (missing.length > 0)
    said.push(`No uncertainty of ${missing.join(', ')} was given; the budget holds only what the frame itself shows.`);
  if (!frame.hasFlats)
    said.push(
      'No flat was given: a smooth unevenness of the pixel response of 0.1 % was assumed beside what the misfit shows.',
    );
  if (found.shape === 'oval')
    said.push(
      'An oval hole and a tilted sensor look nearly alike in one frame; here the oval fits better. Turn the aperture by 90° and measure again to tell them apart.',
    );
  if (found.shape === 'tilted') {
    const degrees = (radians: number) => ((radians * 180) / Math.PI).toFixed(1);
    said.push(
      `The rings are stretched as on a sensor tilted by ${degrees(tiltX)}° across and ${degrees(tiltY)}° down; the size is corrected for it.`,
    );
  }
  if (found.noise.rounding !== undefined) {
    said.push(
      'The noise at black is under half a count, so rounding to whole counts was made part of the model. More gain or more bits would measure better.',
    );
  }
  if (unevenLight) {
    said.push(
      illumination > 0
        ? `The light over the hole falls off as in a beam of about ${Math.round((500 * sizeMm) / Math.sqrt(illumination))} µm radius, other than stated; the size is corrected for it.`
        : 'The light over the hole is stronger at its edge than in its middle, other than stated; the size is corrected for it.',
    );
  }
  return said;
}

function toMillimetres(profile: FittedProfile, optics: PinholeOptics): RadialProfile {
  return {
    radiusMm: Array.from(profile.radiusPx, (r) => r * optics.pitchMm),
    meanCounts: Array.from(profile.meanCounts),
    standardErrorCounts: Array.from(profile.standardErrorCounts),
    pixelCount: Array.from(profile.pixelCount),
    modelCounts: Array.from(profile.modelCounts),
  };
}
