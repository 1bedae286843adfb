import type { DataSource } from 'typeorm';
import { createDataSource } from '../../../server/database/createDataSource';
import { createQueue } from '../../../server/worker/queue/createQueue';
import { createTestDatabase, type TestDatabase } from '../../support/testDatabase';

let testDatabase: TestDatabase;
let database: DataSource;
beforeAll(async () => {
  testDatabase = await createTestDatabase();
  database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
});
afterAll(async () => {
  await database?.destroy();
  await testDatabase?.drop();
});

const queue = createQueue();
const first = '00000000-0000-4000-8000-000000000001';
const second = '00000000-0000-4000-8000-000000000002';

async function queued(): Promise<string[]> {
  const rows: { id: string }[] = await database.query(`select data ->> 'id' as id from queue.job order by created_on`);
  return rows.map(({ id }) => id);
}

test('a job comes and goes with the transaction of the row that it stands for', async () => {
  await expect(
    database.transaction(async (transaction) => {
      await queue.send(transaction, 'run-measurement', first);
      throw new Error('the row could not be written');
    }),
  ).rejects.toThrow('the row could not be written');
  expect(await queued()).toEqual([]);
  await database.transaction((transaction) => queue.send(transaction, 'run-measurement', second));
  expect(await queued()).toEqual([second]);
});

test('a job outside of a transaction is refused', async () => {
  await expect(queue.send(database.manager, 'run-measurement', first)).rejects.toThrow('within a transaction');
  expect(await queued()).toEqual([second]);
});
