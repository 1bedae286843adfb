import pino from 'pino';
import { stages, type Measured } from '../../../shared/contracts/measureResult';
import type { ProgressEvent } from '../../../shared/contracts/measurements';
import { listen, type Listening } from '../../../server/database/listen';
import { PROGRESS_CHANNEL, type ProgressNotice } from '../../../server/features/events/publishProgress';
import { darkFile, lightFile, Workbench } from './workbench';

interface RunRow {
  id: string;
  state: string;
  sizeUm: number | null;
  darkCount: number;
  attempts: number;
  reason: string | null;
  message: string | null;
  result: Measured;
  profiles: number;
  misfits: number;
}
const runs = `select id, state, size_um as "sizeUm", dark_count as "darkCount", attempts, reason, message, result,
    (select count(*)::int from profile where measurement_id = m.id) as profiles,
    (select count(*)::int from rendition where measurement_id = m.id) as misfits
  from measurement m where id = any ($1) order by created_at`;
const ended = (rows: RunRow[]) => rows.every((row) => !['waiting', 'measuring'].includes(row.state));

let bench: Workbench;
let listening: Listening | null = null;
beforeEach(async () => {
  bench = await Workbench.open();
}, 60_000);
afterEach(async () => {
  await listening?.stop();
  listening = null;
  await bench.close();
});

test('a frame is looked at and measured with the darks of its capture, and its stages are told', async () => {
  const events: ProgressEvent[] = [];
  listening = await listen({
    databaseUrl: bench.testDatabase.databaseUrl,
    channel: PROGRESS_CHANNEL,
    applicationName: 'ringwright-test',
    log: pino({ level: 'silent' }),
    onNotice: (payload) => events.push((JSON.parse(payload) as ProgressNotice).event),
  });
  const light = await bench.put(await lightFile(1), 'light', 'light.tif');
  for (const seed of [2, 3, 4]) await bench.put(await darkFile(seed), 'dark', `dark-${seed}.tif`);
  const worker = await bench.startWorker();

  const [run] = await bench.until<RunRow>(runs, [[light.measurementId]], ended);
  expect(run).toMatchObject({ state: 'measured', darkCount: 3, attempts: 1, profiles: 1, misfits: 1 });
  // The simulator knows the size: 830 µm, within three stated standard uncertainties.
  expect(Math.abs((run?.sizeUm ?? 0) - 830)).toBeLessThan(3 * (run?.result.standardUncertaintyUm ?? 0));
  const renditions = await bench.database.query<{ kind: string; encoding: string }[]>(
    'select kind, encoding from rendition where frame_id = $1 order by kind',
    [light.frameId],
  );
  expect(renditions).toEqual([
    { kind: 'plane', encoding: 'uint16-le+gzip' },
    { kind: 'thumbnail', encoding: 'tone8' },
  ]);
  await bench.until('select 1', [], () => events.some((e) => e.type === 'measurement' && e.state === 'measured'), 5);
  const own = events.filter((e) => e.type === 'measurement' && e.measurementId === light.measurementId);
  const told = own.map((e) => (e.type === 'measurement' ? (e.stage ?? e.state) : ''));
  expect(told.slice(0, 3)).toEqual(['waiting', 'measuring', 'decode']);
  expect(told.at(-1)).toBe('measured');
  expect([...new Set(told)].sort()).toEqual(['measured', 'measuring', 'waiting', ...stages].sort());
  expect(await bench.end(worker, 'SIGTERM')).toBe(0);
}, 120_000);

test('a worker killed in the middle of a batch loses nothing, and nothing is measured twice', async () => {
  const ids: string[] = [];
  const put = async (seed: number) => {
    const { measurementId } = await bench.put(await lightFile(seed), 'light', `light-${seed}.tif`);
    ids.push(measurementId as string);
  };
  for (let seed = 1; seed <= 8; seed += 1) await put(seed);
  const first = await bench.startWorker();
  await bench.until<RunRow>(runs, [ids], (rows) => {
    const under = rows.filter((row) => row.state === 'measuring').length;
    return under > 0 && rows.filter((row) => row.state === 'measured').length >= 2;
  });
  await bench.end(first, 'SIGKILL');
  const atDeath = await bench.database.query<RunRow[]>(runs, [ids]);
  expect(atDeath.some((row) => row.state !== 'measured')).toBe(true);

  await bench.startWorker();
  const rows = await bench.until<RunRow>(runs, [ids], ended, 60);
  expect(rows).toHaveLength(8);
  for (const row of rows) expect(row).toMatchObject({ state: 'measured', profiles: 1, misfits: 1 });
  // What had ended before the worker died was not touched again.
  const early = atDeath.filter((row) => row.state === 'measured');
  for (const row of early) expect(rows.find((other) => other.id === row.id)).toEqual(row);
  expect(rows.reduce((sum, row) => sum + row.attempts, 0)).toBeLessThanOrEqual(8 + 2);
}, 180_000);

test('two workers share one queue without doing anything twice', async () => {
  await Promise.all([bench.startWorker(), bench.startWorker()]);
  const ids: string[] = [];
  for (let seed = 1; seed <= 6; seed += 1) {
    const { measurementId } = await bench.put(await lightFile(seed), 'light', `light-${seed}.tif`);
    ids.push(measurementId as string);
  }
  const rows = await bench.until<RunRow>(runs, [ids], ended);
  for (const row of rows) expect(row).toMatchObject({ state: 'measured', attempts: 1, profiles: 1 });
}, 120_000);

test('a file that cannot be decoded ends its run with the reason in words', async () => {
  await bench.startWorker();
  const whole = await lightFile(1);
  const { frameId, measurementId } = await bench.put(whole.subarray(0, 40_000), 'light', 'cut.tif');
  const [run] = await bench.until<RunRow>(runs, [[measurementId]], ended);
  expect(run).toMatchObject({ state: 'failed', reason: 'unreadable', sizeUm: null, profiles: 0 });
  const [frame] = await bench.database.query<{ state: string; problem: string }[]>(
    'select state, problem from frame where id = $1',
    [frameId],
  );
  expect(frame).toEqual({ state: 'unusable', problem: run?.message });
}, 120_000);

test('a worker that is asked to stop hands back what it has in hand', async () => {
  const { measurementId } = await bench.put(await lightFile(1), 'light', 'light.tif');
  const worker = await bench.startWorker();
  expect(await bench.end(worker, 'SIGTERM')).toBe(0);
  const [run] = await bench.database.query<(RunRow & { leaseOwner: string | null })[]>(
    'select state, lease_owner as "leaseOwner" from measurement where id = $1',
    [measurementId],
  );
  expect(run?.leaseOwner).toBeNull();
  expect(['waiting', 'measured']).toContain(run?.state);
}, 60_000);
