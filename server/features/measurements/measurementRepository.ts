import type { MeasurementDetail } from '../../../shared/contracts/measurements';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { ProfileEntity } from '../../entities/ProfileEntity';

/** What a measurement's page shows besides what lists show. */
export type MeasurementExtra = Pick<
  MeasurementDetail,
  | 'nominalSizeUm'
  | 'toleranceUm'
  | 'settings'
  | 'result'
  | 'benchId'
  | 'cameraName'
  | 'laserName'
  | 'widthPx'
  | 'heightPx'
  | 'hasMisfit'
> & { inputs: MeasurementDetail['inputs'] | null };

const extraStatement = `
  select aperture.nominal_size_um as "nominalSizeUm", aperture.tolerance_um as "toleranceUm", m.settings, m.inputs,
    m.result, revision.bench_id as "benchId", camera.name as "cameraName", laser.name as "laserName",
    frame.width_px as "widthPx", frame.height_px as "heightPx",
    exists (select from rendition where rendition.measurement_id = m.id and kind = 'misfit') as "hasMisfit"
  from measurement m
  join capture_frame place on place.id = m.capture_frame_id
  join frame on frame.id = place.frame_id
  join capture on capture.id = m.capture_id
  join aperture on aperture.id = capture.aperture_id
  join bench_revision revision on revision.id = capture.bench_revision_id
  join camera on camera.id = revision.camera_id
  join laser on laser.id = revision.laser_id
  where m.laboratory_id = $1 and m.id = $2`;

export async function readExtra(laboratory: LaboratoryScope, measurementId: string): Promise<MeasurementExtra | null> {
  const [row] = await laboratory.query<MeasurementExtra>(extraStatement, [measurementId]);
  return row ?? null;
}

const historyStatement = `
  select m.id, m.state, m.size_um as "sizeUm", m.expanded_uncertainty_um as "expandedUncertaintyUm",
    m.dark_count as "darkCount", m.created_at as "createdAt", person.name as "createdBy"
  from measurement m
  join app_user person on person.id = m.created_by
  where m.laboratory_id = $1 and m.capture_frame_id = $2
  order by m.created_at desc, m.id desc`;

/** All runs of the same frame in the same capture, newest first. */
export async function readHistory(
  laboratory: LaboratoryScope,
  captureFrameId: string,
): Promise<MeasurementDetail['history']> {
  type Row = Omit<MeasurementDetail['history'][number], 'createdAt'> & { createdAt: Date };
  const rows = await laboratory.query<Row>(historyStatement, [captureFrameId]);
  return rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() }));
}

/** The radial profile of a measurement, or null when it has none. */
export function readProfile(laboratory: LaboratoryScope, measurementId: string): Promise<ProfileEntity | null> {
  return laboratory.findOne(ProfileEntity, { where: { measurementId } });
}

export interface StoredMisfit {
  encoding: string;
  bytes: Buffer;
}

/** The misfit of a measurement with its bytes, or null when it has none. */
export async function readMisfit(laboratory: LaboratoryScope, measurementId: string): Promise<StoredMisfit | null> {
  const [row] = await laboratory.query<StoredMisfit>(
    `select encoding, bytes from rendition where laboratory_id = $1 and measurement_id = $2 and kind = 'misfit'`,
    [measurementId],
  );
  return row ?? null;
}
