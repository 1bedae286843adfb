import type { CameraRecord, MeasureCase } from '../../../shared/contracts/measureCase';
import type { MeasurementSettings } from '../../../shared/contracts/measurements';
import type { FrameKind } from '../../../shared/contracts/captures';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import type { StoredFrameState } from '../../entities/FrameEntity';
import type { Illumination } from '../../../shared/contracts/benches';

/** A stored file that goes into a run. */
export interface RunFile {
  frameId: string;
  name: string;
  byteSize: number;
  chunkCount: number;
  state: StoredFrameState;
}

/** What a run of the engine is given. */
export interface RunInputs {
  captureId: string;
  captureFrameId: string;
  /** The kind of the frame that is to be measured; only a light can be. */
  kind: FrameKind;
  measureCase: MeasureCase;
  light: RunFile;
  darks: RunFile[];
  flats: RunFile[];
  /** True while a dark or flat of the capture has not been looked at, so that it is not known whether it can be used. */
  calibrationPending: boolean;
}

interface SettingRow {
  settings: MeasurementSettings;
  captureId: string;
  captureFrameId: string;
  wavelengthNm: number;
  wavelengthUncertaintyNm: number;
  distanceMm: number;
  distanceUncertaintyMm: number;
  illuminationKind: Illumination['kind'];
  sourceDistanceMm: number | null;
  beamRadiusUm: number | null;
  pixelPitchUm: number;
  pixelPitchUncertaintyUm: number;
  nominalSizeUm: number;
  camera: { [Key in keyof CameraRecord]: CameraRecord[Key] | null };
}
type PlaceRow = RunFile & { id: string; kind: FrameKind; leftOut: boolean };

const cameraColumns = `jsonb_build_object('bitDepth', camera.bit_depth, 'electronsPerCount', camera.electrons_per_count,
  'readNoiseElectrons', camera.read_noise_electrons, 'blackCount', camera.black_count, 'whiteCount', camera.white_count,
  'coverGlassMm', camera.cover_glass_mm, 'coverGlassIndex', camera.cover_glass_index)`;

const settingStatement = `
  select m.settings, m.capture_id as "captureId", m.capture_frame_id as "captureFrameId",
    laser.wavelength_nm as "wavelengthNm", laser.wavelength_uncertainty_nm as "wavelengthUncertaintyNm",
    revision.distance_mm as "distanceMm", revision.distance_uncertainty_mm as "distanceUncertaintyMm",
    revision.illumination_kind as "illuminationKind", revision.source_distance_mm as "sourceDistanceMm",
    revision.beam_radius_um as "beamRadiusUm", camera.pixel_pitch_um as "pixelPitchUm",
    camera.pixel_pitch_uncertainty_um as "pixelPitchUncertaintyUm", aperture.nominal_size_um as "nominalSizeUm",
    ${cameraColumns} as camera
  from measurement m
  join capture on capture.id = m.capture_id
  join aperture on aperture.id = capture.aperture_id
  join bench_revision revision on revision.id = capture.bench_revision_id
  join laser on laser.id = revision.laser_id
  join camera on camera.id = revision.camera_id
  where m.laboratory_id = $1 and m.id = $2`;

const placeStatement = `
  select place.id, place.kind, place.left_out as "leftOut", place.name, frame.id as "frameId",
    frame.byte_size as "byteSize", frame.chunk_count as "chunkCount", frame.state
  from capture_frame place
  join frame on frame.id = place.frame_id
  where place.laboratory_id = $1 and place.capture_id = $2
  order by place.created_at, place.id`;

/**
 * What a run would be given if it began now: the bench as revised for the capture, laser and camera as recorded now,
 * and the darks and flats that the capture now holds. Null when there is no such measurement.
 */
export async function readRunInputs(laboratory: LaboratoryScope, measurementId: string): Promise<RunInputs | null> {
  const [setting] = await laboratory.query<SettingRow>(settingStatement, [measurementId]);
  if (!setting) return null;
  const places = await laboratory.query<PlaceRow>(placeStatement, [setting.captureId]);
  const light = places.find((place) => place.id === setting.captureFrameId);
  if (!light) return null;
  const candidates = places.filter((place) => !place.leftOut && place.id !== light.id);
  const usable = (kind: FrameKind) => candidates.filter((place) => place.kind === kind && place.state === 'ready');
  const darks = setting.settings.useDarks ? usable('dark') : [];
  const flats = usable('flat');
  return {
    captureId: setting.captureId,
    captureFrameId: setting.captureFrameId,
    kind: light.kind,
    light,
    darks,
    flats,
    calibrationPending: candidates.some((place) => place.kind !== 'light' && place.state === 'stored'),
    measureCase: caseOf(measurementId, setting, { light, darks, flats }),
  };
}

function caseOf(
  id: string,
  setting: SettingRow,
  files: { light: RunFile; darks: RunFile[]; flats: RunFile[] },
): MeasureCase {
  const { settings } = setting;
  return {
    id,
    frame: files.light.name,
    darks: files.darks.map((file) => file.name),
    flats: files.flats.map((file) => file.name),
    pattern: settings.pattern,
    wavelengthNm: setting.wavelengthNm,
    distanceMm: setting.distanceMm,
    pixelPitchUm: setting.pixelPitchUm,
    uncertainty: {
      wavelengthNm: setting.wavelengthUncertaintyNm,
      distanceMm: setting.distanceUncertaintyMm,
      pixelPitchUm: setting.pixelPitchUncertaintyUm,
    },
    illumination: illuminationOf(setting),
    camera: withoutNulls(setting.camera),
    mosaic: settings.mosaic,
    encoding: settings.encoding,
    nominalSizeUm: setting.nominalSizeUm,
  };
}

function illuminationOf({ illuminationKind: kind, sourceDistanceMm, beamRadiusUm }: SettingRow): Illumination {
  if (kind === 'diverging' && sourceDistanceMm !== null) return { kind, sourceDistanceMm };
  if (kind === 'gaussian' && beamRadiusUm !== null) return { kind, beamRadiusUm };
  return { kind: 'plane' };
}

/** What the camera's record does not say is left out, for the engine to find from the frame. */
export function withoutNulls(camera: SettingRow['camera']): CameraRecord {
  const known = Object.entries(camera).filter(([, value]) => value !== null);
  return Object.fromEntries(known) as CameraRecord;
}

const cameraStatement = `
  select ${cameraColumns} as camera
  from capture_frame place
  join capture on capture.id = place.capture_id
  join bench_revision revision on revision.id = capture.bench_revision_id
  join camera on camera.id = revision.camera_id
  where place.laboratory_id = $1 and place.frame_id = $2
  order by place.created_at, place.id
  limit 1`;

/** The camera that took a frame, by the capture in which it was first placed. */
export async function readCameraOf(laboratory: LaboratoryScope, frameId: string): Promise<CameraRecord> {
  const [row] = await laboratory.query<Pick<SettingRow, 'camera'>>(cameraStatement, [frameId]);
  return row ? withoutNulls(row.camera) : {};
}
