import type { Measured } from '@/shared/contracts/measureResult';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { sampleMeasurement } from '../capture/sampleCapture';

export function sampleResult(change: Partial<Measured> = {}): Measured {
  return {
    id: 'a01',
    status: 'measured',
    pattern: 'pinhole',
    model: 'airy',
    sizeUm: 100.37,
    standardUncertaintyUm: 0.0544,
    fitUncertaintyUm: 0.006,
    expandedUncertaintyUm: 0.109,
    coverageFactor: 2,
    effectiveDegreesOfFreedom: null,
    axesUm: null,
    angleDeg: null,
    fringeScaleUm: null,
    fringeScaleUncertaintyUm: null,
    impliedDistanceMm: null,
    edgePx: null,
    beamRadiusUm: null,
    secondMomentWidthUm: null,
    centrePx: { x: 640, y: 512 },
    rings: [1, 2].map((order) => ({
      order,
      kind: 'dark',
      radiusMm: 0.7689 * order,
      uncertaintyMm: 0.0002,
      predictedMm: 0.769 * order,
      sizeUm: 100.38,
    })),
    ringSizeUm: 100.38,
    ringSizeUncertaintyUm: 0.021,
    secondOpinion: { sizeUm: 100.34, standardUncertaintyUm: 0.034, reason: null },
    reducedChiSquare: 1.02,
    fresnelNumber: 0.04,
    flags: ['no-flat'],
    budget: [
      { source: 'fit', contributionUm: 0.006 },
      { source: 'distance', contributionUm: 0.0502 },
      { source: 'pixel-response', contributionUm: 0.01 },
    ].map((line) => ({
      ...line,
      source: line.source as 'fit',
      standardUncertainty: null,
      unit: null,
      sensitivity: null,
      degreesOfFreedom: null,
      evaluation: 'B' as const,
    })),
    assumed: [],
    engine: '1.0.0',
    timingsMs: { decode: 1, calibrate: 1, centre: 1, profile: 1, fit: 1, total: 5 },
    ...change,
  };
}

export function sampleDetail(change: Partial<MeasurementDetail> = {}): MeasurementDetail {
  const measurement = sampleMeasurement(1, { flags: ['no-flat'] });
  const { id, state, sizeUm, expandedUncertaintyUm, darkCount, createdAt, createdBy } = measurement;
  return {
    ...measurement,
    nominalSizeUm: 100,
    toleranceUm: 1,
    settings: { pattern: 'pinhole', mosaic: 'auto', encoding: 'auto', useDarks: true },
    inputs: {
      id,
      frame: '0417-07-1.tif',
      darks: [],
      flats: [],
      pattern: 'pinhole',
      wavelengthNm: 632.82,
      distanceMm: 100,
      pixelPitchUm: 3.45,
      uncertainty: { distanceMm: 0.05 },
      illumination: { kind: 'plane' },
      camera: {},
      mosaic: 'auto',
      encoding: 'auto',
    },
    benchId: '00000000-0000-4000-8000-000000000004',
    cameraName: 'S-4417',
    laserName: 'HN-2',
    result: sampleResult(),
    widthPx: 1280,
    heightPx: 1024,
    hasMisfit: false,
    history: [{ id, state, sizeUm, expandedUncertaintyUm, darkCount, createdAt, createdBy }],
    ...change,
  };
}
