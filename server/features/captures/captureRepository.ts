import type { FrameKind } from '../../../shared/contracts/captures';
import type { ApertureKind } from '../../../shared/contracts/lots';
import type { BudgetLine } from '../../../shared/contracts/measureResult';
import type { MeasurementSettings, MeasurementState } from '../../../shared/contracts/measurements';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { BenchRevisionEntity } from '../../entities/BenchRevisionEntity';
import { CaptureEntity } from '../../entities/CaptureEntity';
import { CaptureFrameEntity } from '../../entities/CaptureFrameEntity';
import { FrameEntity, type StoredFrameState } from '../../entities/FrameEntity';
import { MeasurementEntity } from '../../entities/MeasurementEntity';

/** A capture with what it is of, as lists show it. */
export interface CaptureRow {
  id: string;
  apertureId: string;
  apertureSerial: string;
  nominalSizeUm: number;
  toleranceUm: number | null;
  apertureKind: ApertureKind;
  lotId: string;
  lotNumber: string;
  benchId: string;
  benchName: string;
  benchRevisionId: string;
  benchRevision: number;
  wavelengthNm: number;
  lightCount: number;
  darkCount: number;
  measuredCount: number;
  note: string;
  createdAt: Date;
  createdBy: string;
}

export interface CaptureFilter {
  id?: string | undefined;
  apertureId?: string | undefined;
  lotId?: string | undefined;
}

const captureStatement = `
  select capture.id, aperture.id as "apertureId", aperture.serial as "apertureSerial",
    aperture.nominal_size_um as "nominalSizeUm", aperture.tolerance_um as "toleranceUm",
    aperture.kind as "apertureKind", lot.id as "lotId",
    lot.number as "lotNumber", bench.id as "benchId", bench.name as "benchName", revision.id as "benchRevisionId",
    revision.revision as "benchRevision", laser.wavelength_nm as "wavelengthNm",
    places.light_count as "lightCount", places.dark_count as "darkCount", places.measured_count as "measuredCount",
    capture.note, capture.created_at as "createdAt", person.name as "createdBy"
  from capture
  join aperture on aperture.id = capture.aperture_id
  join lot on lot.id = aperture.lot_id
  join bench_revision revision on revision.id = capture.bench_revision_id
  join bench on bench.id = revision.bench_id
  join laser on laser.id = revision.laser_id
  join app_user person on person.id = capture.created_by
  cross join lateral (
    select count(*) filter (where place.kind = 'light')::int as light_count,
      count(*) filter (where place.kind = 'dark')::int as dark_count,
      count(*) filter (where place.kind = 'light' and newest.state = 'measured')::int as measured_count
    from capture_frame place
    left join lateral (
      select m.state from measurement m where m.capture_frame_id = place.id order by m.created_at desc, m.id desc limit 1
    ) newest on true
    where place.capture_id = capture.id
  ) places
  where capture.laboratory_id = $1
    and ($2::uuid is null or capture.id = $2)
    and ($3::uuid is null or capture.aperture_id = $3)
    and ($4::uuid is null or aperture.lot_id = $4)
  order by capture.created_at desc, capture.id desc`;

/** Captures, newest first. */
export function readCaptures(laboratory: LaboratoryScope, filter: CaptureFilter): Promise<CaptureRow[]> {
  return laboratory.query(captureStatement, [filter.id ?? null, filter.apertureId ?? null, filter.lotId ?? null]);
}

export const addCapture = (
  laboratory: LaboratoryScope,
  capture: Pick<CaptureEntity, 'apertureId' | 'benchRevisionId' | 'note' | 'createdBy'>,
): Promise<string> => laboratory.insert(CaptureEntity, capture);

/** Holds the capture's row until the transaction ends, so that its frames change one after the other. */
export const lockCapture = (laboratory: LaboratoryScope, id: string): Promise<CaptureEntity | null> =>
  laboratory.findOne(CaptureEntity, { where: { id }, lock: 'update' });

/** Key of the newest revision of a bench, or null when there is no such bench. */
export async function currentRevision(laboratory: LaboratoryScope, benchId: string): Promise<string | null> {
  const [revision] = await laboratory.find(BenchRevisionEntity, {
    where: { benchId },
    order: { revision: 'DESC' },
    take: 1,
  });
  return revision?.id ?? null;
}

/** Key of the frame with these bytes, if the laboratory holds them whole. */
export async function findStoredFrame(laboratory: LaboratoryScope, sha256: string): Promise<string | null> {
  const frame = await laboratory.findOne(FrameEntity, { where: { sha256 } });
  return frame === null || frame.state === 'storing' ? null : frame.id;
}

/** A frame's place with what is known of the frame. */
export type PlaceRow = Pick<CaptureFrameEntity, 'id' | 'frameId' | 'name' | 'kind' | 'leftOut' | 'createdAt'> &
  Pick<
    FrameEntity,
    | 'byteSize'
    | 'problem'
    | 'format'
    | 'widthPx'
    | 'heightPx'
    | 'bitDepth'
    | 'exposureMs'
    | 'blackCount'
    | 'whiteCount'
    | 'peakCounts'
    | 'peakFraction'
    | 'clippedFraction'
    | 'noiseCounts'
  > & { sha256: string; state: Exclude<StoredFrameState, 'storing'> };

const placeStatement = `
  select place.id, place.frame_id as "frameId", place.name, place.kind, place.left_out as "leftOut", frame.sha256,
    frame.byte_size as "byteSize", frame.state, frame.problem, frame.format, frame.width_px as "widthPx",
    frame.height_px as "heightPx", frame.bit_depth as "bitDepth", frame.exposure_ms as "exposureMs",
    frame.black_count as "blackCount", frame.white_count as "whiteCount", frame.peak_counts as "peakCounts",
    frame.peak_fraction as "peakFraction", frame.clipped_fraction as "clippedFraction",
    frame.noise_counts as "noiseCounts", place.created_at as "createdAt"
  from capture_frame place
  join frame on frame.id = place.frame_id
  where place.laboratory_id = $1 and place.capture_id = $2 and ($3::uuid is null or place.id = $3)
  order by place.created_at, place.id`;

/** The frames of a capture in the order in which they came. */
export function readPlaces(laboratory: LaboratoryScope, captureId: string, placeId?: string): Promise<PlaceRow[]> {
  return laboratory.query(placeStatement, [captureId, placeId ?? null]);
}

/** Puts a frame into a capture; where it is already, that place stays as it is. */
export async function addPlace(
  laboratory: LaboratoryScope,
  place: { captureId: string; frameId: string; kind: FrameKind; name: string; createdBy: string },
): Promise<{ id: string; isNew: boolean }> {
  const { captureId, frameId } = place;
  const held = await laboratory.findOne(CaptureFrameEntity, { where: { captureId, frameId } });
  if (held) return { id: held.id, isNew: false };
  return { id: await laboratory.insert(CaptureFrameEntity, { ...place, createdAt: new Date() }), isNew: true };
}

/** Changes a place; what is undefined stays as it is. */
export async function changePlace(
  laboratory: LaboratoryScope,
  captureId: string,
  id: string,
  { kind, leftOut }: { kind?: FrameKind | undefined; leftOut?: boolean | undefined },
): Promise<void> {
  const change = { ...(kind !== undefined && { kind }), ...(leftOut !== undefined && { leftOut }) };
  if (Object.keys(change).length > 0) await laboratory.update(CaptureFrameEntity, { id, captureId }, change);
}

/** Sizes of the lights that are not left out, by their newest runs, with what makes up their uncertainty. */
export function readSizes(
  laboratory: LaboratoryScope,
  captureId: string,
): Promise<{ sizeUm: number; budget: BudgetLine[] }[]> {
  return laboratory.query(
    `select newest.size_um as "sizeUm", newest.result -> 'budget' as budget
       from capture_frame place
       cross join lateral (
         select m.size_um, m.result from measurement m
         where m.capture_frame_id = place.id order by m.created_at desc, m.id desc limit 1
       ) newest
      where place.laboratory_id = $1 and place.capture_id = $2 and place.kind = 'light' and not place.left_out
        and newest.size_um is not null
      order by place.created_at, place.id`,
    [captureId],
  );
}

/** Lights of a capture with their newest run. */
export interface LightRow {
  captureFrameId: string;
  frameId: string;
  leftOut: boolean;
  frameState: StoredFrameState;
  state: MeasurementState | null;
  settings: MeasurementSettings | null;
  darkCount: number | null;
  /** Why the newest run has no size. */
  reason: string | null;
}

const lightStatement = `
  select place.id as "captureFrameId", place.frame_id as "frameId", place.left_out as "leftOut",
    frame.state as "frameState", newest.state, newest.settings, newest.dark_count as "darkCount",
    newest.reason
  from capture_frame place
  join frame on frame.id = place.frame_id
  left join lateral (
    select m.state, m.settings, m.dark_count, m.reason from measurement m
    where m.capture_frame_id = place.id order by m.created_at desc, m.id desc limit 1
  ) newest on true
  where place.laboratory_id = $1 and place.capture_id = $2 and place.kind = 'light'
  order by place.created_at, place.id`;

/** The lights of a capture, each with its newest run. */
export function readLights(laboratory: LaboratoryScope, captureId: string): Promise<LightRow[]> {
  return laboratory.query(lightStatement, [captureId]);
}

/** Keys of the runs of a capture that have not begun, in the order in which they were asked for. */
export async function readWaitingRuns(laboratory: LaboratoryScope, captureId: string): Promise<string[]> {
  const runs = await laboratory.find(MeasurementEntity, {
    where: { captureId, state: 'waiting' },
    order: { createdAt: 'ASC' },
  });
  return runs.map((run) => run.id);
}
