import { randomUUID } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { createDataSource } from '../../../server/database/createDataSource';
import { brokenConstraint } from '../../../server/database/constraintProblems';
import { scoped } from '../../../server/database/LaboratoryScope';
import { migrateDatabase } from '../../../server/database/migrateDatabase';
import { ApertureEntity } from '../../../server/entities/ApertureEntity';
import { BenchRevisionEntity } from '../../../server/entities/BenchRevisionEntity';
import { CaptureEntity } from '../../../server/entities/CaptureEntity';
import { CaptureFrameEntity } from '../../../server/entities/CaptureFrameEntity';
import { FrameEntity } from '../../../server/entities/FrameEntity';
import { LaserEntity } from '../../../server/entities/LaserEntity';
import { LotEntity } from '../../../server/entities/LotEntity';
import { MeasurementEntity } from '../../../server/entities/MeasurementEntity';
import { createTestDatabase, type TestDatabase } from '../../support/testDatabase';
import { fillLaboratory, measuredRun, type Filled } from '../support/fillLaboratory';

let testDatabase: TestDatabase;
let database: DataSource;
let owner: DataSource;
const one = { laboratoryId: randomUUID(), userId: randomUUID() };
const other = { laboratoryId: randomUUID(), userId: randomUUID() };
let ours: Filled;
let theirs: Filled;

beforeAll(async () => {
  testDatabase = await createTestDatabase();
  database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
  owner = await createDataSource(testDatabase.ownerDatabaseUrl, 'ringwright-test').initialize();
  for (const { laboratoryId, userId } of [one, other]) {
    await database.query('insert into laboratory (id, name) values ($1, $2)', [laboratoryId, 'Lab']);
    await database.query('insert into app_user (id, name, email, password_hash) values ($1, $2, $3, $4)', [
      userId,
      'Person',
      `${userId}@laboratory.example`,
      'x',
    ]);
    await database.query(`insert into membership (id, laboratory_id, user_id, role) values ($1, $2, $3, 'manager')`, [
      randomUUID(),
      laboratoryId,
      userId,
    ]);
  }
  ours = await fillLaboratory(database, one.laboratoryId, one.userId, 'aaaaaaaa');
  theirs = await fillLaboratory(database, other.laboratoryId, other.userId, 'bbbbbbbb');
});
afterAll(async () => {
  await database?.destroy();
  await owner?.destroy();
  await testDatabase?.drop();
});

/** Name of the constraint that the work breaks. */
async function broken(work: Promise<unknown>): Promise<string | null> {
  const error: unknown = await work.then(
    () => null,
    (reason: unknown) => reason,
  );
  return brokenConstraint(error);
}
const lab = () => scoped(database, one.laboratoryId);

test('entities and migrations agree', async () => {
  const { upQueries } = await owner.driver.createSchemaBuilder().log();
  expect(upQueries.map(({ query }) => query)).toEqual([]);
});

test('check constraints of entities and migrations say the same', async () => {
  const checks = owner.entityMetadatas.flatMap((entity) =>
    entity.checks.map((check) => ({ table: entity.tableName, name: check.name, expression: check.expression })),
  );
  expect(checks.length).toBeGreaterThan(60);
  const runner = owner.createQueryRunner();
  await runner.startTransaction();
  try {
    // PostgreSQL rewrites expressions; the same text added again is rewritten the same way.
    for (const { table, name, expression } of checks) {
      await runner.query(`alter table ${table} add constraint ${name}_again check (${expression})`);
    }
    const rows: { name: string; text: string }[] = await runner.query(
      `select conname as name, pg_get_constraintdef(oid) as text from pg_constraint where contype = 'c'`,
    );
    const textOf = new Map(rows.map(({ name, text }) => [name, text]));
    for (const { name } of checks) expect([name, textOf.get(name)]).toEqual([name, textOf.get(`${name}_again`)]);
  } finally {
    await runner.rollbackTransaction();
    await runner.release();
  }
});

test('migrating again does nothing', async () => {
  expect(await migrateDatabase(testDatabase.ownerDatabaseUrl)).toEqual([]);
});

test('migrations can be taken back to an empty database and run again', async () => {
  const spare = await createTestDatabase();
  const source = await createDataSource(spare.ownerDatabaseUrl, 'ringwright-test').initialize();
  try {
    for (const _ of source.migrations) await source.undoLastMigration();
    const left: { name: string }[] = await source.query(
      `select tablename as name from pg_tables where schemaname = 'public' and tablename <> 'schema_migration'`,
    );
    expect(left).toEqual([]);
    const functions = await source.query(`select 1 from pg_proc where proname = 'refuse_change'`);
    expect(functions).toEqual([]);
    expect(await source.runMigrations()).toHaveLength(source.migrations.length);
  } finally {
    await source.destroy();
    await spare.drop();
  }
});

test('the application owns no table and may not change the schema', async () => {
  const owned = await database.query(`select tablename from pg_tables where tableowner = current_user`);
  expect(owned).toEqual([]);
  await expect(database.query('alter table lot add column x int')).rejects.toThrow(/must be owner/);
  await expect(database.query('alter table measurement disable trigger all')).rejects.toThrow(/must be owner/);
  await expect(database.query('truncate measurement cascade')).rejects.toThrow(/permission denied/);
  await expect(database.query('create table x (y int)')).rejects.toThrow(/permission denied/);
});

test('every foreign key of the laboratory carries the laboratory', async () => {
  const rows: { name: string; text: string }[] = await owner.query(
    `select conname as name, pg_get_constraintdef(c.oid) as text
       from pg_constraint c
      where contype = 'f' and connamespace = 'public'::regnamespace
        and exists (select from pg_attribute where attrelid = c.conrelid and attname = 'laboratory_id' and attnotnull)
        and exists (select from pg_attribute where attrelid = c.confrelid and attname = 'laboratory_id' and attnotnull)`,
  );
  expect(rows.length).toBeGreaterThan(15);
  for (const { name, text } of rows) expect([name, text]).toEqual([name, expect.stringMatching(/\(laboratory_id, /)]);
});

test.each([
  ['fk_lot_client_id', () => lab().insert(LotEntity, { number: 'x', clientId: theirs.clientId })],
  [
    'fk_aperture_lot_id',
    () => lab().insert(ApertureEntity, { lotId: theirs.lotId, serial: 'x', kind: 'pinhole', nominalSizeUm: 1 }),
  ],
  ['fk_bench_revision_bench_id', () => addRevision({ benchId: theirs.benchId })],
  ['fk_bench_revision_laser_id', () => addRevision({ laserId: theirs.laserId })],
  ['fk_bench_revision_camera_id', () => addRevision({ cameraId: theirs.cameraId })],
  ['fk_bench_revision_created_by', () => addRevision({ createdBy: other.userId })],
  ['fk_capture_aperture_id', () => addCapture({ apertureId: theirs.apertureId })],
  ['fk_capture_bench_revision_id', () => addCapture({ benchRevisionId: theirs.benchRevisionId })],
  ['fk_capture_created_by', () => addCapture({ createdBy: other.userId })],
  ['fk_capture_frame_frame_id', () => addPlace({ frameId: theirs.frameId })],
  ['fk_capture_frame_capture_id', () => addPlace({ captureId: theirs.captureId })],
  [
    'fk_measurement_capture_id_capture_frame_id',
    () => addRun({ captureId: theirs.captureId, captureFrameId: theirs.captureFrameId }),
  ],
  ['fk_measurement_capture_id_capture_frame_id', () => addRun({ captureFrameId: theirs.captureFrameId })],
])('a row that points into another laboratory is refused by %s', async (constraint, work) => {
  expect(await broken(work())).toBe(constraint);
});

const addRevision = (change: Partial<BenchRevisionEntity>) =>
  lab().insert(BenchRevisionEntity, {
    benchId: ours.benchId,
    revision: 9,
    laserId: ours.laserId,
    cameraId: ours.cameraId,
    distanceMm: 500,
    distanceUncertaintyMm: 0.25,
    illuminationKind: 'plane',
    createdBy: one.userId,
    ...change,
  });
const addCapture = (change: Partial<CaptureEntity>) =>
  lab().insert(CaptureEntity, {
    apertureId: ours.apertureId,
    benchRevisionId: ours.benchRevisionId,
    createdBy: one.userId,
    ...change,
  });
const addPlace = (change: Partial<CaptureFrameEntity>) =>
  lab().insert(CaptureFrameEntity, {
    captureId: ours.captureId,
    frameId: ours.frameId,
    kind: 'light',
    name: 'x.tif',
    createdBy: one.userId,
    ...change,
  });
const addRun = (change: Partial<MeasurementEntity>) =>
  lab().insert(MeasurementEntity, {
    captureId: ours.captureId,
    captureFrameId: ours.captureFrameId,
    settings: measuredRun.settings,
    createdBy: one.userId,
    ...change,
  });

test.each([
  ['ck_laser_wavelength', () => lab().update(LaserEntity, { id: ours.laserId }, { wavelengthNm: 0 })],
  ['ck_laser_wavelength', () => lab().update(LaserEntity, { id: ours.laserId }, { wavelengthNm: NaN })],
  ['ck_laser_wavelength', () => lab().update(LaserEntity, { id: ours.laserId }, { wavelengthNm: Infinity })],
  ['ck_bench_revision_source', () => addRevision({ illuminationKind: 'diverging' })],
  ['ck_bench_revision_beam', () => addRevision({ beamRadiusUm: 900 })],
  ['uq_bench_revision_revision', () => addRevision({ revision: 1 })],
  ['uq_capture_frame_frame', () => addPlace({})],
  ['ck_measurement_finished', () => addRun({ finishedAt: new Date() })],
  ['ck_measurement_size_state', () => addRun({ sizeUm: 200 })],
  ['ck_measurement_lease', () => addRun({ leaseOwner: 'worker' })],
  ['ck_frame_stored', () => lab().insert(FrameEntity, { state: 'stored' })],
  ['uq_frame_sha256', () => lab().insert(FrameEntity, { sha256: ours.sha256 })],
])('%s keeps out what cannot be', async (constraint, work) => {
  expect(await broken(work())).toBe(constraint);
});

test('the same bytes may be in two laboratories, once in each', async () => {
  const laboratory = scoped(database, other.laboratoryId);
  await laboratory.insert(FrameEntity, { sha256: ours.sha256 });
  expect(await broken(laboratory.insert(FrameEntity, { sha256: ours.sha256 }))).toBe('uq_frame_sha256');
});

test.each([
  ['bench_revision', `update bench_revision set distance_mm = 501`],
  ['bench_revision', `delete from bench_revision`],
  ['measurement', `update measurement set size_um = 201 where state = 'measured'`],
  ['measurement', `update measurement set state = 'waiting', finished_at = null where state = 'measured'`],
  ['measurement', `delete from measurement where state = 'measured'`],
  ['profile', `update profile set mean_counts = radius_mm`],
  ['profile', `delete from profile`],
  ['frame_chunk', `update frame_chunk set bytes = 'x'`],
  ['frame', `update frame set sha256 = repeat('c', 64) where state = 'ready'`],
  ['frame', `update frame set state = 'storing' where state = 'ready'`],
])('what a measurement rests on does not change: %s, %s', async (table, statement) => {
  for (const role of [database, owner]) {
    await expect(role.query(statement)).rejects.toThrow(`a row of ${table} never changes`);
  }
});

test('a run that has not ended can be taken up, ended and then no longer changed', async () => {
  const id = await addRun({});
  const until = new Date(Date.now() + 60_000);
  const taken = { state: 'measuring', leaseOwner: 'worker', leaseUntil: until, attempts: 1 } as const;
  expect(await lab().update(MeasurementEntity, { id }, taken)).toBe(1);
  const result = { id, status: 'failed', reason: 'unreadable', message: 'not a picture' } as const;
  const ended = { state: 'failed', reason: 'unreadable', result, finishedAt: new Date() } as const;
  expect(await lab().update(MeasurementEntity, { id }, { ...ended, leaseOwner: null, leaseUntil: null })).toBe(1);
  await expect(lab().update(MeasurementEntity, { id }, { message: 'x' })).rejects.toThrow(/never changes/);
});

test('bytes are stored out of line and uncompressed', async () => {
  const rows = await owner.query(
    `select attrelid::regclass::text as name from pg_attribute
      where attname = 'bytes' and attstorage = 'e' and attrelid::regclass::text in ('frame_chunk', 'rendition')`,
  );
  expect(rows).toHaveLength(2);
});

test('the scope reads, changes and deletes nothing of another laboratory', async () => {
  const laboratory = lab();
  expect(await laboratory.findOne(LotEntity, { where: { id: theirs.lotId } })).toBeNull();
  expect((await laboratory.find(LotEntity)).map(({ id }) => id)).toEqual([ours.lotId]);
  expect(await laboratory.update(LotEntity, { id: theirs.lotId }, { note: 'x' })).toBe(0);
  expect(await laboratory.delete(LotEntity, { id: theirs.lotId })).toBe(0);
  const rows = await laboratory.query<{ id: string }>('select id from lot where laboratory_id = $1');
  expect(rows).toEqual([{ id: ours.lotId }]);
  await expect(laboratory.query('select id from lot')).rejects.toThrow(/must use \$1/);
});
