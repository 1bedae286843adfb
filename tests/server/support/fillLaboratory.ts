import { randomUUID } from 'node:crypto';
import { gzipSync } from 'node:zlib';
import type { DataSource } from 'typeorm';
import type { Measured } from '../../../shared/contracts/measureResult';
import { scoped } from '../../../server/database/LaboratoryScope';
import { ApertureEntity } from '../../../server/entities/ApertureEntity';
import { BenchEntity } from '../../../server/entities/BenchEntity';
import { BenchRevisionEntity } from '../../../server/entities/BenchRevisionEntity';
import { CameraEntity } from '../../../server/entities/CameraEntity';
import { CaptureEntity } from '../../../server/entities/CaptureEntity';
import { CaptureFrameEntity } from '../../../server/entities/CaptureFrameEntity';
import { ClientEntity } from '../../../server/entities/ClientEntity';
import { FrameChunkEntity } from '../../../server/entities/FrameChunkEntity';
import { FrameEntity } from '../../../server/entities/FrameEntity';
import { InvitationEntity } from '../../../server/entities/InvitationEntity';
import { LaserEntity } from '../../../server/entities/LaserEntity';
import { LotEntity } from '../../../server/entities/LotEntity';
import { MeasurementEntity } from '../../../server/entities/MeasurementEntity';
import { ProfileEntity } from '../../../server/entities/ProfileEntity';
import { RenditionEntity } from '../../../server/entities/RenditionEntity';

/** One row of every kind, all belonging together. */
export interface Filled {
  clientId: string;
  laserId: string;
  cameraId: string;
  benchId: string;
  benchRevisionId: string;
  lotId: string;
  apertureId: string;
  captureId: string;
  frameId: string;
  captureFrameId: string;
  measurementId: string;
  invitationId: string;
  sha256: string;
}

/** What a finished run with a size has, in the columns that matter to lists. */
export const measuredRun = {
  state: 'measured',
  settings: { pattern: 'pinhole', mosaic: 'auto', encoding: 'auto', useDarks: true },
  sizeUm: 199.95,
  standardUncertaintyUm: 0.108,
  fitUncertaintyUm: 0.004,
  expandedUncertaintyUm: 0.216,
  coverageFactor: 2,
  flags: ['no-flat'],
} as const;

/** A result as the engine gives it, of one ring. */
export const measuredResult = (id: string): Measured => ({
  id,
  status: 'measured',
  pattern: 'pinhole',
  model: 'lommel',
  sizeUm: measuredRun.sizeUm,
  standardUncertaintyUm: measuredRun.standardUncertaintyUm,
  fitUncertaintyUm: measuredRun.fitUncertaintyUm,
  expandedUncertaintyUm: measuredRun.expandedUncertaintyUm,
  coverageFactor: measuredRun.coverageFactor,
  effectiveDegreesOfFreedom: null,
  axesUm: null,
  angleDeg: null,
  fringeScaleUm: null,
  fringeScaleUncertaintyUm: null,
  impliedDistanceMm: null,
  edgePx: null,
  beamRadiusUm: null,
  secondMomentWidthUm: null,
  centrePx: { x: 1, y: 0 },
  rings: [{ order: 1, kind: 'dark', radiusMm: 1.9301, uncertaintyMm: 0.0004, predictedMm: 1.9301, sizeUm: 199.95 }],
  ringSizeUm: 199.95,
  ringSizeUncertaintyUm: 0.04,
  secondOpinion: { sizeUm: null, standardUncertaintyUm: null, reason: 'one ring only' },
  reducedChiSquare: 1.02,
  fresnelNumber: 0.03,
  flags: [...measuredRun.flags],
  budget: [],
  assumed: [],
  engine: 'test',
  timingsMs: { decode: 1, calibrate: 1, centre: 1, profile: 1, fit: 1, total: 5 },
});

/** Writes one row of every kind into a laboratory, past the API. */
export async function fillLaboratory(
  database: DataSource,
  laboratoryId: string,
  userId: string,
  mark: string,
): Promise<Filled> {
  const laboratory = scoped(database, laboratoryId);
  const sha256 = mark.padEnd(64, '0');
  const clientId = await laboratory.insert(ClientEntity, { name: `Client ${mark}` });
  const laserId = await laboratory.insert(LaserEntity, {
    name: `Laser ${mark}`,
    wavelengthNm: 632.8,
    wavelengthUncertaintyNm: 0.01,
    laserClass: '2',
  });
  const cameraId = await laboratory.insert(CameraEntity, {
    name: `Camera ${mark}`,
    pixelPitchUm: 5.2,
    pixelPitchUncertaintyUm: 0.001,
    widthPx: 1280,
    heightPx: 1024,
    bitDepth: 12,
  });
  const benchId = await laboratory.insert(BenchEntity, { name: `Bench ${mark}` });
  const benchRevisionId = await laboratory.insert(BenchRevisionEntity, {
    benchId,
    revision: 1,
    laserId,
    cameraId,
    distanceMm: 500,
    distanceUncertaintyMm: 0.25,
    illuminationKind: 'plane',
    createdBy: userId,
  });
  const lotId = await laboratory.insert(LotEntity, { number: `Lot ${mark}`, clientId });
  const apertureId = await laboratory.insert(ApertureEntity, {
    lotId,
    serial: `S${mark}`,
    kind: 'pinhole',
    nominalSizeUm: 200,
  });
  const captureId = await laboratory.insert(CaptureEntity, { apertureId, benchRevisionId, createdBy: userId });
  const frameId = await laboratory.insert(FrameEntity, {
    sha256,
    byteSize: 4,
    chunkCount: 1,
    state: 'ready',
    format: 'TIFF, 16-bit',
    widthPx: 2,
    heightPx: 1,
    bitDepth: 12,
    blackCount: 64,
    whiteCount: 4095,
    peakCounts: 3000,
    peakFraction: 0.75,
    clippedFraction: 0,
    noiseCounts: 2,
  });
  await database.manager.insert(FrameChunkEntity, { frameId, position: 0, bytes: Buffer.from('abcd') });
  const picture = { widthPx: 2, heightPx: 1 };
  const plane = {
    ...picture,
    kind: 'plane',
    encoding: 'uint16-le+gzip',
    bytes: gzipSync(Buffer.from([1, 0, 2, 1])),
  } as const;
  const tone = { ...picture, kind: 'thumbnail', encoding: 'tone8', bytes: Buffer.from([1, 2]) } as const;
  await laboratory.insertAll(RenditionEntity, [
    { ...plane, frameId },
    { ...tone, frameId },
  ]);
  const captureFrameId = await laboratory.insert(CaptureFrameEntity, {
    captureId,
    frameId,
    kind: 'light',
    name: `${mark}.tif`,
    createdBy: userId,
  });
  const measurementId = randomUUID();
  await laboratory.insert(MeasurementEntity, {
    ...measuredRun,
    id: measurementId,
    flags: [...measuredRun.flags],
    captureId,
    captureFrameId,
    createdBy: userId,
    inputs: {
      id: measurementId,
      frame: `${mark}.tif`,
      darks: [],
      flats: [],
      pattern: 'pinhole',
      wavelengthNm: 632.8,
      distanceMm: 500,
      pixelPitchUm: 5.2,
      illumination: { kind: 'plane' },
      camera: {},
      mosaic: 'auto',
      encoding: 'auto',
    },
    result: measuredResult(measurementId),
    startedAt: new Date(),
    finishedAt: new Date(),
  });
  const misfit = {
    ...picture,
    kind: 'misfit',
    encoding: 'misfit8+gzip',
    bytes: gzipSync(Buffer.from([128, 0])),
  } as const;
  await laboratory.insert(RenditionEntity, { ...misfit, measurementId });
  await laboratory.insert(ProfileEntity, {
    measurementId,
    radiusMm: [0, 0.1],
    meanCounts: [3000, 2900],
    standardErrorCounts: [1, 1],
    pixelCount: [1, 6],
    modelCounts: [3001, 2899],
  });
  const invitationId = await laboratory.insert(InvitationEntity, {
    email: `${mark}@guest.example`,
    role: 'technician',
    clientId: null,
    tokenHash: mark.repeat(8),
    invitedBy: userId,
    expiresAt: new Date(Date.now() + 86_400_000),
  });
  return {
    clientId,
    laserId,
    cameraId,
    benchId,
    benchRevisionId,
    lotId,
    apertureId,
    captureId,
    frameId,
    captureFrameId,
    measurementId,
    invitationId,
    sha256,
  };
}
