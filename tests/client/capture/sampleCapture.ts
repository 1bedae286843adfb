import type { CaptureDetail, CaptureFrame } from '@/shared/contracts/captures';
import type { Measurement } from '@/shared/contracts/measurements';

const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const at = (second: number) => `2026-03-04T07:21:${String(second).padStart(2, '0')}.000Z`;

export function sampleMeasurement(n: number, change: Partial<Measurement> = {}): Measurement {
  return {
    id: uuid(100 + n),
    captureId: uuid(1),
    captureFrameId: uuid(10 + n),
    frameId: uuid(50 + n),
    frameName: `0417-07-${n}.tif`,
    apertureId: uuid(2),
    apertureSerial: 'PO-100-07',
    lotId: uuid(3),
    lotNumber: 'L-0417',
    benchName: 'Bench 2',
    benchRevision: 7,
    wavelengthNm: 632.8,
    distanceMm: 100,
    state: 'measured',
    stage: null,
    sizeUm: 100.37,
    standardUncertaintyUm: 0.0544,
    fitUncertaintyUm: 0.006,
    expandedUncertaintyUm: 0.11,
    coverageFactor: 2,
    reason: null,
    message: null,
    flags: [],
    darkCount: 2,
    newest: true,
    createdAt: at(n),
    createdBy: 'T. Aldana',
    finishedAt: at(n + 2),
    ...change,
  };
}

export function sampleFrame(n: number, change: Partial<CaptureFrame> = {}): CaptureFrame {
  return {
    id: uuid(10 + n),
    frameId: uuid(50 + n),
    name: `0417-07-${n}.tif`,
    kind: 'light',
    leftOut: false,
    sha256: String(n).padStart(64, '0'),
    byteSize: 2_621_716,
    state: 'ready',
    problem: null,
    format: 'TIFF',
    widthPx: 1280,
    heightPx: 1024,
    bitDepth: 12,
    exposureMs: 6,
    health: {
      blackCount: 64,
      whiteCount: 4095,
      peakCounts: 3300,
      peakFraction: 0.82,
      clippedFraction: 0,
      noiseCounts: 2.13,
    },
    createdAt: at(n),
    measurement: sampleMeasurement(n),
    ...change,
  };
}

export function sampleCapture(frames: CaptureFrame[], change: Partial<CaptureDetail> = {}): CaptureDetail {
  return {
    id: uuid(1),
    apertureId: uuid(2),
    apertureSerial: 'PO-100-07',
    nominalSizeUm: 100,
    toleranceUm: 1,
    lotId: uuid(3),
    lotNumber: 'L-0417',
    benchId: uuid(4),
    benchName: 'Bench 2',
    benchRevisionId: uuid(5),
    benchRevision: 7,
    wavelengthNm: 632.8,
    lightCount: frames.filter((frame) => frame.kind === 'light').length,
    darkCount: frames.filter((frame) => frame.kind === 'dark').length,
    measuredCount: frames.filter((frame) => frame.measurement?.state === 'measured').length,
    note: '',
    createdAt: at(0),
    createdBy: 'T. Aldana',
    frames,
    mean: null,
    outdatedCount: 0,
    ...change,
  };
}
