import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { createApp, type App } from '../../../server/createApp';
import { createDataSource } from '../../../server/database/createDataSource';
import type { FakeInbox } from '../../../server/mail/startFakeInbox';
import { startProgressHub } from '../../../server/features/events/startProgressHub';
import type { DemoSignIn } from '../../../server/features/welcome/knownSignIns';
import { createTestDatabase, type TestDatabase } from '../../support/testDatabase';

export const tokenSecret = 'only for tests, and long enough for that';
export const publicUrl = 'https://rings.laboratory.example';

export interface TestApp extends App {
  database: DataSource;
  testDatabase: TestDatabase;
  /** Moves the application's clock forward, ms. Access tokens keep to the real clock. */
  passTime(ms: number): void;
  stop(): Promise<void>;
}

export interface TestAppChoice {
  rateLimitFactor?: number;
  demo?: boolean;
  demoSignIns?: readonly DemoSignIn[];
  inbox?: FakeInbox | null;
  webDir?: string | null;
  /** Hands the progress of laboratories to the event streams, as in the real process. */
  withProgress?: boolean;
}

/** The whole application on a database of its own, without a port; the clock can be moved. */
export async function startTestApp(choice: TestAppChoice = {}): Promise<TestApp> {
  const testDatabase = await createTestDatabase();
  const database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
  let aheadMs = 0;
  const log = pino({ level: 'silent' });
  const hub = choice.withProgress ? await startProgressHub({ databaseUrl: testDatabase.databaseUrl, log }) : null;
  const app = createApp({
    config: {
      publicUrl,
      tokenSecret,
      demo: choice.demo ?? false,
      passwordCost: 4,
      rateLimitFactor: choice.rateLimitFactor ?? 10_000,
    },
    database,
    log,
    webDir: choice.webDir ?? null,
    inbox: choice.inbox ?? null,
    demoSignIns: choice.demoSignIns ?? [],
    progress: hub ?? { join: () => undefined },
    now: () => new Date(Date.now() + aheadMs),
  });
  return {
    ...app,
    database,
    testDatabase,
    passTime(ms) {
      aheadMs += ms;
    },
    async stop() {
      app.endStreams();
      await hub?.stop();
      await app.background.idle();
      await database.destroy();
      await testDatabase.drop();
    },
  };
}
