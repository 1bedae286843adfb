import type { LaboratoryScope } from '../../database/LaboratoryScope';

export interface WorkCounts {
  /** Runs that wait or are being measured. */
  running: number;
  /** Runs that ended with a size since the given time. */
  measured: number;
  /** Runs that ended without one since then. */
  refused: number;
}

export async function readWorkCounts(laboratory: LaboratoryScope, since: Date): Promise<WorkCounts> {
  const [counts] = await laboratory.query<WorkCounts>(
    `select count(*) filter (where state in ('waiting', 'measuring'))::int as running,
            count(*) filter (where state = 'measured' and finished_at >= $2)::int as measured,
            count(*) filter (where state in ('refused', 'failed') and finished_at >= $2)::int as refused
       from measurement where laboratory_id = $1`,
    [since],
  );
  return counts ?? { running: 0, measured: 0, refused: 0 };
}
