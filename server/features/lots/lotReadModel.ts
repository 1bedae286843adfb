import type { Lot } from '../../../shared/contracts/lots';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { newestRuns } from '../apertures/apertureReadModel';

export interface LotFilter {
  lotId?: string;
  /** Only the lots of one client; null: of all. */
  clientId?: string | null;
  /** Only lots in which an aperture has no size yet. */
  unfinished?: boolean;
}

type LotRow = Omit<Lot, 'createdAt'> & { createdAt: Date };

const statement = `${newestRuns}, result as (
    select aperture_id, bool_or(state = 'measured') as measured from run group by aperture_id
  ), counted as (
    select a.lot_id, count(*)::int as apertures, count(*) filter (where result.measured)::int as measured,
           count(*) filter (where not result.measured and newest.state in ('refused', 'failed'))::int as refused
      from aperture a
      left join result on result.aperture_id = a.id
      left join newest on newest.aperture_id = a.id
     where a.laboratory_id = $1
     group by a.lot_id
  )
  select lot.id, lot.number, lot.client_id as "clientId", client.name as "clientName",
         lot.order_reference as "orderReference", lot.due_on::text as "dueOn", lot.note, lot.created_at as "createdAt",
         coalesce(counted.apertures, 0) as "apertureCount", coalesce(counted.measured, 0) as "measuredCount",
         coalesce(counted.refused, 0) as "refusedCount"
    from lot
    join client on client.id = lot.client_id
    left join counted on counted.lot_id = lot.id
   where lot.laboratory_id = $1
     and ($2::uuid is null or lot.id = $2)
     and ($3::uuid is null or lot.client_id = $3)
     and (not $4::boolean or coalesce(counted.measured < counted.apertures, true))
   order by case when $4::boolean then lot.due_on end nulls last, lot.created_at desc, lot.id`;

/**
 * Lots with the number of their apertures, of those that have a size, and of those that have none because the newest
 * run was refused or failed. Newest lot first; the unfinished ones by the day they are due.
 */
export async function readLots(laboratory: LaboratoryScope, filter: LotFilter): Promise<Lot[]> {
  const rows = await laboratory.query<LotRow>(statement, [
    filter.lotId ?? null,
    filter.clientId ?? null,
    filter.unfinished ?? false,
  ]);
  return rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() }));
}
