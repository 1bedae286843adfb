import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { createApp, type App } from '../../../server/createApp';
import { createDataSource } from '../../../server/database/createDataSource';
import type { FakeInbox } from '../../../server/mail/startFakeInbox';
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
}

/** The whole application on a database of its own, without a port; the clock can be moved. */
export async function startTestApp(choice: TestAppChoice = {}): Promise<TestApp> {
  const testDatabase = await createTestDatabase();
  const database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
  let aheadMs = 0;
  const app = createApp({
    config: {
      publicUrl,
      tokenSecret,
      demo: choice.demo ?? false,
      passwordCost: 4,
      rateLimitFactor: choice.rateLimitFactor ?? 10_000,
    },
    database,
    log: pino({ level: 'silent' }),
    webDir: choice.webDir ?? null,
    inbox: choice.inbox ?? null,
    demoSignIns: choice.demoSignIns ?? [],
    progress: { join: () => undefined },
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
      await app.background.idle();
      await database.destroy();
      await testDatabase.drop();
    },
  };
}
