import { pino } from 'pino';
import type { EngineJobs } from '../../../server/worker/child/engineJobs';
import { createMetrics } from '../../../server/worker/metrics';
import type { Pool } from '../../../server/worker/pool/createPool';
import { createQueue } from '../../../server/worker/queue/createQueue';
import { runMeasurement } from '../../../server/worker/runs/runMeasurement';
import { measuredResult } from '../support/fillLaboratory';
import { lightFile, Workbench } from './workbench';

let bench: Workbench;
let seed = 0;
beforeAll(async () => {
  bench = await Workbench.open();
});
afterAll(() => bench?.close());

const profile = {
  radiusMm: [0.1, 0.2],
  meanCounts: [5, 4],
  standardErrorCounts: [0.1, 0.1],
  pixelCount: [8, 16],
  modelCounts: [5, 4],
};

/** Runs a measurement with a pool that answers as given, and reads what was written. */
async function runWith(answer: unknown) {
  seed += 1;
  const { frameId, measurementId } = await bench.put(await lightFile(seed), 'light', `light-${seed}.tif`);
  await bench.database.query(
    `update frame set state = 'ready', format = 'TIFF, 16-bit', width_px = 320, height_px = 256, bit_depth = 12,
       black_count = 64, white_count = 4095, peak_counts = 3000, peak_fraction = 0.75, clipped_fraction = 0,
       noise_counts = 2 where id = $1`,
    [frameId],
  );
  const pool = { run: () => Promise.resolve({ answer, blobs: [] }) } as unknown as Pool<EngineJobs>;
  const log = pino({ level: 'silent' });
  const metrics = createMetrics();
  const context = { database: bench.database, pool, queue: createQueue(), owner: `owner-${seed}`, metrics, log };
  await runMeasurement(context, measurementId as string);
  const [run] = await bench.database.query(
    `select state, reason, size_um as "sizeUm", lease_owner as "leaseOwner",
       (select count(*)::int from profile where profile.measurement_id = measurement.id) as profiles
     from measurement where id = $1`,
    [measurementId],
  );
  return run as object;
}

test('an answer of the engine that keeps its contract is written', async () => {
  const answer = { result: measuredResult('x'), radialProfile: profile, misfit: null };
  expect(await runWith(answer)).toEqual({
    state: 'measured',
    reason: null,
    sizeUm: 199.95,
    leaseOwner: null,
    profiles: 1,
  });
});

test.each([
  ['a size that is no number', { result: { ...measuredResult('x'), sizeUm: NaN }, radialProfile: profile }],
  ['a profile of uneven length', { result: measuredResult('x'), radialProfile: { ...profile, modelCounts: [5] } }],
  ['an unknown state', { result: { ...measuredResult('x'), status: 'guessed' }, radialProfile: null }],
])('%s never becomes a size', async (_what, answer) => {
  expect(await runWith({ ...answer, misfit: null })).toEqual({
    state: 'failed',
    reason: 'unsupported',
    sizeUm: null,
    leaseOwner: null,
    profiles: 0,
  });
});
