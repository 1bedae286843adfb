import type { Measurement, MeasurementState } from '../../../shared/contracts/measurements';
import type { LaboratoryScope } from '../../database/LaboratoryScope';

export interface MeasurementFilter {
  ids?: readonly string[];
  states?: readonly MeasurementState[];
  captureId?: string | undefined;
  lotId?: string | undefined;
  apertureId?: string | undefined;
  /** Only the newest run of each frame. */
  newestOnly?: boolean;
  /** Ended at this time or later. */
  finishedSince?: Date;
  limit?: number;
}

type MeasurementRow = Omit<Measurement, 'createdAt' | 'finishedAt'> & { createdAt: Date; finishedAt: Date | null };

const newer = `exists (select from measurement later where later.laboratory_id = $1
  and later.capture_frame_id = m.capture_frame_id and (later.created_at, later.id) > (m.created_at, m.id))`;

const statement = `
  select m.id, m.capture_id as "captureId", m.capture_frame_id as "captureFrameId", place.frame_id as "frameId",
    place.name as "frameName", capture.aperture_id as "apertureId", aperture.serial as "apertureSerial",
    lot.id as "lotId", lot.number as "lotNumber", bench.name as "benchName", revision.revision as "benchRevision",
    coalesce((m.inputs ->> 'wavelengthNm')::double precision, laser.wavelength_nm) as "wavelengthNm",
    revision.distance_mm as "distanceMm", m.state, m.stage, m.size_um as "sizeUm",
    m.standard_uncertainty_um as "standardUncertaintyUm", m.fit_uncertainty_um as "fitUncertaintyUm",
    m.expanded_uncertainty_um as "expandedUncertaintyUm", m.coverage_factor as "coverageFactor", m.reason, m.message,
    m.flags, m.dark_count as "darkCount", not ${newer} as newest, m.created_at as "createdAt",
    person.name as "createdBy", m.finished_at as "finishedAt"
  from measurement m
  join capture_frame place on place.id = m.capture_frame_id
  join capture on capture.id = m.capture_id
  join aperture on aperture.id = capture.aperture_id
  join lot on lot.id = aperture.lot_id
  join bench_revision revision on revision.id = capture.bench_revision_id
  join bench on bench.id = revision.bench_id
  join laser on laser.id = revision.laser_id
  join app_user person on person.id = m.created_by
  where m.laboratory_id = $1
    and ($2::uuid[] is null or m.id = any ($2))
    and ($3::text[] is null or m.state = any ($3))
    and ($4::uuid is null or m.capture_id = $4)
    and ($5::uuid is null or aperture.lot_id = $5)
    and ($6::uuid is null or capture.aperture_id = $6)
    and (not $7::boolean or not ${newer})
    and ($8::timestamptz is null or m.finished_at >= $8)
  order by m.created_at desc, m.id desc
  limit $9`;

/** Measurements of a laboratory as lists show them, newest first. */
export async function readMeasurements(laboratory: LaboratoryScope, filter: MeasurementFilter): Promise<Measurement[]> {
  const rows = await laboratory.query<MeasurementRow>(statement, [
    filter.ids ?? null,
    filter.states ?? null,
    filter.captureId ?? null,
    filter.lotId ?? null,
    filter.apertureId ?? null,
    filter.newestOnly ?? false,
    filter.finishedSince ?? null,
    filter.limit ?? null,
  ]);
  return rows.map((row) => ({
    ...row,
    createdAt: row.createdAt.toISOString(),
    finishedAt: row.finishedAt?.toISOString() ?? null,
  }));
}
