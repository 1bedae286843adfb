import { fork, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { once } from 'node:events';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import sharp from 'sharp';
import type { DataSource } from 'typeorm';
import type { FrameKind } from '../../../shared/contracts/captures';
import { createDataSource } from '../../../server/database/createDataSource';
import { inLaboratory } from '../../../server/database/LaboratoryScope';
import { CaptureFrameEntity } from '../../../server/entities/CaptureFrameEntity';
import { LaboratoryEntity } from '../../../server/entities/LaboratoryEntity';
import { MembershipEntity } from '../../../server/entities/MembershipEntity';
import { UserEntity } from '../../../server/entities/UserEntity';
import { FrameWriter } from '../../../server/features/frames/FrameWriter';
import { addRun } from '../../../server/features/measurements/addRun';
import { simulateDark } from '../../../server/simulator/simulateDark';
import { simulatePinhole } from '../../../server/simulator/simulatePinhole';
import { createQueue } from '../../../server/worker/queue/createQueue';
import { createTestDatabase, type TestDatabase } from '../../support/testDatabase';
import { fillLaboratory, type Filled } from '../support/fillLaboratory';

const REPOSITORY = path.resolve(__dirname, '../../..');
const settings = { pattern: 'pinhole', mosaic: 'auto', encoding: 'auto', useDarks: true } as const;
/** The sensor of the laboratory that `fillLaboratory` makes, cut small. */
const sensor = {
  widthPx: 320,
  heightPx: 256,
  pixelPitchUm: 5.2,
  bitDepth: 12,
  electronsPerCount: 4,
  readNoiseElectrons: 8,
  blackCount: 64,
  seed: 3,
} as const;

/** A file of 16-bit grey levels as cameras' programs write them. */
const tiff = (counts: Uint16Array): Promise<Buffer> =>
  sharp(counts, { raw: { width: sensor.widthPx, height: sensor.heightPx, channels: 1 } })
    .toColourspace('grey16')
    .tiff({ compression: 'none' })
    .toBuffer();

/** A frame of a pinhole of about 830 µm, half a metre away. */
export const lightFile = (seed: number): Promise<Buffer> =>
  tiff(
    simulatePinhole({
      sensor,
      diameterUm: 830,
      wavelengthNm: 632.8,
      distanceMm: 500,
      centrePx: { x: 158 + seed / 7, y: 127 },
      peakElectrons: 12_000,
      seed,
    }).light,
  );
export const darkFile = (seed: number): Promise<Buffer> => tiff(simulateDark({ sensor, seed }));

/** A laboratory with one capture, and real worker processes on its database. */
export class Workbench {
  readonly workers = new Set<ChildProcess>();

  private constructor(
    readonly testDatabase: TestDatabase,
    readonly database: DataSource,
    readonly laboratoryId: string,
    readonly userId: string,
    readonly filled: Filled,
  ) {}

  static async open(): Promise<Workbench> {
    const testDatabase = await createTestDatabase();
    const database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
    const [laboratoryId, userId] = [randomUUID(), randomUUID()];
    await database.manager.insert(LaboratoryEntity, { id: laboratoryId, name: 'Laboratory' });
    const user = { id: userId, name: 'T. Tester', email: 't@lab.example', passwordHash: 'none' };
    await database.manager.insert(UserEntity, user);
    await database.manager.insert(MembershipEntity, { id: randomUUID(), laboratoryId, userId, role: 'technician' });
    const filled = await fillLaboratory(database, laboratoryId, userId, 'a');
    return new Workbench(testDatabase, database, laboratoryId, userId, filled);
  }

  /** Puts a file into the capture as an upload does; a light gets its run. */
  async put(bytes: Buffer, kind: FrameKind, name: string): Promise<{ frameId: string; measurementId: string | null }> {
    const { captureId } = this.filled;
    const queue = createQueue();
    return inLaboratory(this.database, this.laboratoryId, async (laboratory, manager) => {
      const writer = new FrameWriter(manager, this.laboratoryId);
      await writer.begin();
      await writer.write(bytes);
      const { frameId } = await writer.finish();
      const place = { captureId, frameId, kind, name, createdBy: this.userId };
      const captureFrameId = await laboratory.insert(CaptureFrameEntity, place);
      await queue.send(manager, 'inspect-frame', frameId);
      if (kind !== 'light') return { frameId, measurementId: null };
      const request = { captureId, captureFrameId, frameId, settings, createdBy: this.userId };
      return { frameId, measurementId: await addRun(laboratory, manager, queue, request) };
    });
  }

  /** Starts a worker process as the launcher does and waits until it works. */
  async startWorker(): Promise<ChildProcess> {
    const worker = fork(path.join(REPOSITORY, 'server/worker/workerMain.ts'), [], {
      cwd: REPOSITORY,
      execArgv: ['--import', 'tsx'],
      env: {
        ...process.env,
        TSX_TSCONFIG_PATH: 'server/tsconfig.json',
        DATABASE_URL: this.testDatabase.databaseUrl,
        TOKEN_SECRET: 'only for tests, and long enough for that',
        WORKER_PORT: '0',
        WORKER_CHILDREN: '2',
        LOG_LEVEL: 'info',
      },
      stdio: ['ignore', 'pipe', 'inherit', 'ipc'],
    });
    this.workers.add(worker);
    let said = '';
    await new Promise<void>((resolve, reject) => {
      worker.stdout?.on('data', (piece: Buffer) => {
        said += piece.toString();
        if (said.includes('worker works')) resolve();
      });
      worker.once('exit', (code) => reject(new Error(`The worker ended with ${code}: ${said}`)));
    });
    return worker;
  }

  /** Ends a worker with a signal; resolves with its exit code. */
  async end(worker: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
    if (worker.exitCode !== null || worker.signalCode !== null) return worker.exitCode;
    const over = once(worker, 'exit');
    worker.kill(signal);
    await over;
    return worker.exitCode;
  }

  /** States of the given runs, read again until the condition holds. */
  async until<Row>(sql: string, values: unknown[], condition: (rows: Row[]) => boolean, seconds = 90): Promise<Row[]> {
    const end = Date.now() + seconds * 1000;
    for (;;) {
      const rows = await this.database.query<Row[]>(sql, values);
      if (condition(rows)) return rows;
      if (Date.now() > end) throw new Error(`Still ${JSON.stringify(rows)} after ${seconds} s.`);
      await sleep(50);
    }
  }

  async close(): Promise<void> {
    await Promise.all([...this.workers].map((worker) => this.end(worker, 'SIGKILL')));
    await this.database.destroy();
    await this.testDatabase.drop();
  }
}
