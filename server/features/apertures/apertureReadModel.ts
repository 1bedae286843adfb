import type { Aperture, ApertureKind } from '../../../shared/contracts/lots';
import type { MeasurementState } from '../../../shared/contracts/measurements';
import type { LaboratoryScope } from '../../database/LaboratoryScope';

interface ApertureRow {
  id: string;
  lotId: string;
  lotNumber: string;
  serial: string;
  kind: ApertureKind;
  nominalSizeUm: number;
  toleranceUm: number | null;
  note: string;
  createdAt: Date;
  measurementId: string | null;
  state: MeasurementState | null;
  sizeUm: number | null;
  expandedUncertaintyUm: number | null;
  reason: string | null;
}

export interface ApertureFilter {
  apertureId?: string;
  lotId?: string;
  /** Part of a serial, of a lot's number or of a client's name, in any case. */
  search?: string | undefined;
}

/** Most apertures that a list shows. */
export const MAX_APERTURES = 1000;

/**
 * The newest run of each frame that is not left out (`run`), and of those the newest per aperture (`newest`): a run
 * that was refused or failed stands for its aperture only where no other does, so that a later bad frame does not hide
 * a size.
 * To be put before a statement whose $1 is the laboratory.
 */
export const newestRuns = `
  with run as (
    select distinct on (m.capture_frame_id) capture.aperture_id, m.id, m.state, m.size_um, m.expanded_uncertainty_um,
           m.reason, m.created_at
      from measurement m
      join capture_frame place on place.id = m.capture_frame_id and not place.left_out
      join capture on capture.id = m.capture_id
     where m.laboratory_id = $1
     order by m.capture_frame_id, m.created_at desc, m.id desc
  ), newest as (
    select distinct on (aperture_id) * from run order by aperture_id, state in ('refused', 'failed'), created_at desc, id desc
  )`;

const statement = `${newestRuns}
  select a.id, a.lot_id as "lotId", lot.number as "lotNumber", a.serial, a.kind, a.nominal_size_um as "nominalSizeUm",
         a.tolerance_um as "toleranceUm", a.note, a.created_at as "createdAt", newest.id as "measurementId",
         newest.state, newest.size_um as "sizeUm", newest.expanded_uncertainty_um as "expandedUncertaintyUm",
         newest.reason
    from aperture a
    join lot on lot.id = a.lot_id
    join client on client.id = lot.client_id
    left join newest on newest.aperture_id = a.id
   where a.laboratory_id = $1
     and ($2::uuid is null or a.id = $2)
     and ($3::uuid is null or a.lot_id = $3)
     and ($4::text is null or position(lower($4) in lower(a.serial)) > 0
          or position(lower($4) in lower(lot.number)) > 0 or position(lower($4) in lower(client.name)) > 0)
   order by lot.created_at desc, lot.id, a.created_at, length(a.serial), a.serial
   limit ${MAX_APERTURES}`;

/** As people order serials: S2 before S10. */
const bySerial = new Intl.Collator('en', { numeric: true });

/** Apertures with their newest measurement in short: newest lot first, within a lot by serial. */
export async function readApertures(laboratory: LaboratoryScope, filter: ApertureFilter): Promise<Aperture[]> {
  const rows = await laboratory.query<ApertureRow>(statement, [
    filter.apertureId ?? null,
    filter.lotId ?? null,
    filter.search || null,
  ]);
  const lots = new Map<string, Aperture[]>();
  for (const row of rows) {
    const apertures = lots.get(row.lotId) ?? [];
    apertures.push(present(row));
    lots.set(row.lotId, apertures);
  }
  return [...lots.values()].flatMap((apertures) =>
    apertures.sort((one, other) => bySerial.compare(one.serial, other.serial)),
  );
}

function present(row: ApertureRow): Aperture {
  const { measurementId, state, sizeUm, expandedUncertaintyUm, reason, createdAt, ...aperture } = row;
  const newest =
    measurementId === null || state === null ? null : { measurementId, state, sizeUm, expandedUncertaintyUm, reason };
  return { ...aperture, createdAt: createdAt.toISOString(), newest };
}
