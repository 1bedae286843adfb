import type { Database, Transaction } from '../../database/Database';

/** How long a worker that says nothing keeps what it has in hand, seconds. */
export const LEASE_SECONDS = 15;
/** Workers that may die over one row before it is given up. */
export const MAX_ATTEMPTS = 3;

const leaseEnd = `now() + interval '${LEASE_SECONDS} seconds'`;
const isFree = '(lease_until is null or lease_until < now())';

/** A row that a worker has taken in hand. */
export interface Claim {
  id: string;
  laboratoryId: string;
  /** How often it has been taken in hand, this time included. */
  attempts: number;
}

/** A stored frame that is to be looked at. */
export interface FrameClaim extends Claim {
  byteSize: number;
  chunkCount: number;
}

async function rows<Row>(source: Database | Transaction, sql: string, values: unknown[]): Promise<Row[]> {
  const manager = 'manager' in source ? source.manager : source;
  const runner = manager.queryRunner ?? manager.dataSource.createQueryRunner();
  try {
    const { records } = await runner.query(sql, values, true);
    return (records ?? []) as Row[];
  } finally {
    if (runner !== manager.queryRunner) await runner.release();
  }
}

/** Takes a stored frame in hand; null when another worker has it or nothing is left to do. */
export async function claimFrame(database: Database, id: string, owner: string): Promise<FrameClaim | null> {
  const [claim] = await rows<FrameClaim>(
    database,
    `update frame set lease_owner = $2, lease_until = ${leaseEnd}, attempts = attempts + 1
     where id = $1 and state = 'stored' and ${isFree}
     returning id, laboratory_id as "laboratoryId", attempts, byte_size as "byteSize", chunk_count as "chunkCount"`,
    [id, owner],
  );
  return claim ?? null;
}

/** The laboratory of a run that nobody has in hand; null when there is nothing to do. */
export async function findFreeRun(database: Database, id: string): Promise<string | null> {
  const [row] = await rows<{ laboratoryId: string }>(
    database,
    `select laboratory_id as "laboratoryId" from measurement
     where id = $1 and state in ('waiting', 'measuring') and ${isFree}`,
    [id],
  );
  return row?.laboratoryId ?? null;
}

/** Takes a run in hand with what it is given; null when another worker was faster. */
export async function claimRun(
  database: Database,
  id: string,
  owner: string,
  given: { inputs: unknown; darkCount: number },
): Promise<Claim | null> {
  const [claim] = await rows<Claim>(
    database,
    `update measurement set state = 'measuring', stage = null, lease_owner = $2, lease_until = ${leaseEnd},
       attempts = attempts + 1, started_at = now(), inputs = $3, dark_count = $4
     where id = $1 and state in ('waiting', 'measuring') and ${isFree}
     returning id, laboratory_id as "laboratoryId", attempts`,
    [id, owner, JSON.stringify(given.inputs), given.darkCount],
  );
  return claim ?? null;
}

export type Leased = 'frame' | 'measurement';

/** Renews a lease; false when it is no longer held. */
export async function renewLease(database: Database, table: Leased, id: string, owner: string): Promise<boolean> {
  const renewed = await rows(
    database,
    `update ${table} set lease_until = ${leaseEnd} where id = $1 and lease_owner = $2 returning id`,
    [id, owner],
  );
  return renewed.length > 0;
}

/** Hands a row back as it was, so that another worker may take it at once; the attempt does not count. */
export async function handBack(database: Database, table: Leased, id: string, owner: string): Promise<void> {
  const state = table === 'measurement' ? `state = 'waiting', stage = null,` : '';
  await rows(
    database,
    `update ${table} set ${state} lease_owner = null, lease_until = null, attempts = attempts - 1
     where id = $1 and lease_owner = $2`,
    [id, owner],
  );
}

/** Notes the stage of a run; false when the lease is no longer held. */
export async function noteStage(source: Transaction, id: string, owner: string, stage: string): Promise<boolean> {
  const noted = await rows(
    source,
    `update measurement set stage = $3 where id = $1 and lease_owner = $2 and state = 'measuring' returning id`,
    [id, owner, stage],
  );
  return noted.length > 0;
}

/** A place in a capture that a frame has. */
export interface Place {
  captureId: string;
  captureFrameId: string;
}

/** Where a frame is placed. */
export function readPlaces(manager: Transaction, laboratoryId: string, frameId: string): Promise<Place[]> {
  return rows<Place>(
    manager,
    `select capture_id as "captureId", id as "captureFrameId" from capture_frame
     where laboratory_id = $1 and frame_id = $2`,
    [laboratoryId, frameId],
  );
}

/** Runs that wait in any capture that holds the frame, and whether they are runs of this very frame. */
export function readRunsWaitingFor(
  manager: Transaction,
  laboratoryId: string,
  frameId: string,
): Promise<(Place & { id: string; isOwn: boolean })[]> {
  return rows(
    manager,
    `select m.id, m.capture_id as "captureId", m.capture_frame_id as "captureFrameId", own.frame_id = $2 as "isOwn"
     from measurement m
     join capture_frame own on own.id = m.capture_frame_id
     where m.laboratory_id = $1 and m.state = 'waiting'
       and exists (select from capture_frame place where place.capture_id = m.capture_id and place.frame_id = $2)
     order by m.created_at, m.id`,
    [laboratoryId, frameId],
  );
}

/** Rows that should have been taken in hand by now: their worker has died, or their job got lost. */
export async function findForgotten(
  database: Database,
  graceSeconds: number,
): Promise<{ frames: string[]; measurements: string[] }> {
  const overdue = `(lease_until < now() or (lease_until is null and created_at < now() - make_interval(secs => $1)))`;
  const frames = await rows<{ id: string }>(
    database,
    `select id from frame where state = 'stored' and ${overdue} order by created_at limit 1000`,
    [graceSeconds],
  );
  const measurements = await rows<{ id: string }>(
    database,
    `select id from measurement where state in ('waiting', 'measuring') and ${overdue} order by created_at limit 1000`,
    [graceSeconds],
  );
  return { frames: frames.map((row) => row.id), measurements: measurements.map((row) => row.id) };
}
