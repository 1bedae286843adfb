import type { BudgetLine } from '../../../shared/contracts/measureResult';
import type { MeasureCase } from '../../../shared/contracts/measureCase';
import { combineUncertainty } from '../../../shared/metrology/budget';
import type { SizeSpread } from '../fit/posterior';

export interface Budget {
  lines: BudgetLine[];
  standardUncertaintyUm: number;
  effectiveDegreesOfFreedom: number | null;
  coverageFactor: number;
  expandedUncertaintyUm: number;
}

/** Standard uncertainty of an index of refraction and, relative, of a thickness taken from a data sheet. Common practice, no source. */
const GLASS_INDEX = 0.01;
const GLASS_THICKNESS = 0.05;
/** Standard uncertainty of how squarely the sensor stands, degrees. Common practice, no source. */
const TILT_DEG = 1;
/** Scalar theory, obliquity and tables, relative. Common practice, no source. */
const MODEL = 2e-5;
/** Unknown tone curve of a rendered frame, relative. Common practice, no source. */
const MODEL_RENDERED = 1.2e-3;

/**
 * The size's uncertainty by JCGM 100:2008: contributions |∂D/∂x| u(x) added in quadrature (eq. 10), effective degrees of
 * freedom by Welch–Satterthwaite (G.2b), U = k u with k from Student's distribution.
 * D = v λ √(r² + z²) / (π r): relative uncertainties of wavelength, distance and pitch carry over one to one.
 */
export function budget(
  sizeUm: number,
  spread: SizeSpread,
  measureCase: MeasureCase,
  distanceMm: number,
  rendered: boolean,
  tiltFitted: boolean,
): Budget {
  const { uncertainty, camera } = measureCase;
  const lines: BudgetLine[] = [
    {
      source: 'fit',
      contributionUm: spread.fit * sizeUm,
      standardUncertainty: null,
      unit: null,
      sensitivity: null,
      degreesOfFreedom: null,
      evaluation: 'A',
    },
    {
      source: 'pixel-response',
      contributionUm: spread.response * sizeUm,
      standardUncertainty: null,
      unit: null,
      sensitivity: null,
      degreesOfFreedom: spread.responseDegreesOfFreedom,
      evaluation: spread.responseDegreesOfFreedom === null ? 'B' : 'A',
    },
    {
      source: 'illumination',
      contributionUm: spread.illumination * sizeUm,
      standardUncertainty: spread.illuminationDeviation,
      unit: '1',
      sensitivity: spread.illuminationSensitivity * sizeUm,
      degreesOfFreedom: null,
      evaluation: 'B',
    },
  ];
  const input = (source: BudgetLine['source'], u: number | undefined, unit: string, sensitivity: number) => {
    if (u === undefined || u === 0) return;
    lines.push({
      source,
      contributionUm: Math.abs(sensitivity) * u,
      standardUncertainty: u,
      unit,
      sensitivity,
      degreesOfFreedom: null,
      evaluation: 'B',
    });
  };
  input('wavelength', uncertainty?.wavelengthNm, 'nm', sizeUm / measureCase.wavelengthNm);
  input('distance', uncertainty?.distanceMm, 'mm', sizeUm / distanceMm);
  input('pixel-pitch', uncertainty?.pixelPitchUm, 'µm', -sizeUm / (measureCase.pixelPitchUm ?? 1));
  const { coverGlassMm = 0, coverGlassIndex } = camera;
  if (coverGlassMm > 0 && coverGlassIndex !== undefined) {
    const path = Math.hypot(
      GLASS_THICKNESS * coverGlassMm * (1 - 1 / coverGlassIndex),
      (GLASS_INDEX * coverGlassMm) / coverGlassIndex ** 2,
    );
    input('cover-glass', path, 'mm', -sizeUm / distanceMm);
  }
  // A tilt τ shortens the rings by τ²/4 on average over the turn.
  const tilt = (TILT_DEG * Math.PI) / 180;
  if (!tiltFitted) {
    lines.push({
      source: 'tilt',
      contributionUm: (sizeUm * tilt ** 2) / 4,
      standardUncertainty: TILT_DEG,
      unit: '°',
      sensitivity: null,
      degreesOfFreedom: null,
      evaluation: 'B',
    });
  }
  lines.push({
    source: 'model',
    contributionUm: sizeUm * (rendered ? MODEL_RENDERED : MODEL),
    standardUncertainty: null,
    unit: null,
    sensitivity: null,
    degreesOfFreedom: null,
    evaluation: 'B',
  });
  return combine(lines);
}

/** Adds the lines up. */
export function combine(lines: BudgetLine[]): Budget {
  const combined = combineUncertainty(
    lines.map(({ source, contributionUm, degreesOfFreedom }) => ({
      name: source,
      standardUncertainty: contributionUm,
      sensitivity: 1,
      degreesOfFreedom,
    })),
  );
  return {
    lines,
    standardUncertaintyUm: combined.standardUncertainty,
    effectiveDegreesOfFreedom: combined.effectiveDegreesOfFreedom,
    coverageFactor: combined.coverageFactor,
    expandedUncertaintyUm: combined.expandedUncertainty,
  };
}
