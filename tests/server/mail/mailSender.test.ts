import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import { SMTPServer } from 'smtp-server';
import type { DataSource } from 'typeorm';
import { createDataSource } from '../../../server/database/createDataSource';
import { backOffMs, createMailSender, MAX_ATTEMPTS } from '../../../server/mail/createMailSender';
import { createMailTexts } from '../../../server/mail/mailTexts';
import { postMail } from '../../../server/mail/outbox';
import { startFakeInbox, type FakeInbox } from '../../../server/mail/startFakeInbox';
import { createTestDatabase, type TestDatabase } from '../../support/testDatabase';

const log = pino({ level: 'silent' });
const from = 'Ringwright <no-reply@laboratory.example>';
const texts = createMailTexts('https://rings.laboratory.example');

let testDatabase: TestDatabase;
let database: DataSource;
let inbox: FakeInbox;
beforeAll(async () => {
  testDatabase = await createTestDatabase();
  database = await createDataSource(testDatabase.databaseUrl, 'ringwright-test').initialize();
  inbox = await startFakeInbox();
});
afterAll(async () => {
  await inbox?.stop();
  await database?.destroy();
  await testDatabase?.drop();
});
beforeEach(() => database.query('delete from mail_message'));

const post = (to: string) =>
  database.transaction((transaction) => postMail(transaction, null, texts.passwordReset(to, 'Zoë', 'sécret', 60)));
const outbox = (): Promise<{ state: string; attempts: number; body_text: string; last_error: string | null }[]> =>
  database.query('select state, attempts, body_text, last_error from mail_message order by created_at');
const sender = (smtpUrl: string, aheadMs = 0) =>
  createMailSender({ database, smtpUrl, from, log, now: () => new Date(Date.now() + aheadMs) });

/** A mail server that answers every recipient with one reply code. */
async function refusingServer(responseCode: number): Promise<{ url: string; stop: () => Promise<void> }> {
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    onRcptTo: (_address, _session, done) => done(Object.assign(new Error('no room'), { responseCode })),
  });
  server.listen(0, '127.0.0.1');
  await once(server.server, 'listening');
  const { port } = server.server.address() as AddressInfo;
  return { url: `smtp://127.0.0.1:${port}`, stop: () => new Promise((resolve) => server.close(resolve)) };
}

test('a mail in the outbox arrives, and its text is dropped once it is sent', async () => {
  await post('zoe@laboratory.example');
  expect(await sender(inbox.smtpUrl).sendDue()).toBe(1);
  const [mail] = inbox.mails();
  expect(mail).toMatchObject({ to: 'zoe@laboratory.example', subject: 'Set a new password for Ringwright' });
  expect(mail?.text).toContain('Hello Zoë,');
  expect(mail?.text).toContain('https://rings.laboratory.example/reset?token=s%C3%A9cret');
  expect(await outbox()).toEqual([{ state: 'sent', attempts: 1, body_text: '', last_error: null }]);
  expect(await sender(inbox.smtpUrl).sendDue()).toBe(0);
});

test('a mail whose cause is rolled back is never written', async () => {
  const failing = database.transaction(async (transaction) => {
    await postMail(transaction, null, texts.passwordChanged('x@laboratory.example', 'X'));
    throw new Error('the cause failed');
  });
  await expect(failing).rejects.toThrow('the cause failed');
  expect(await outbox()).toEqual([]);
});

test('two senders share the outbox: every mail goes out once', async () => {
  const before = inbox.mails().length;
  for (let index = 0; index < 10; index += 1) await post(`p${index}@laboratory.example`);
  const tried = await Promise.all([sender(inbox.smtpUrl).sendDue(), sender(inbox.smtpUrl).sendDue()]);
  expect(tried[0] + tried[1]).toBe(10);
  const fresh = inbox.mails().slice(0, inbox.mails().length - before);
  expect(new Set(fresh.map(({ to }) => to)).size).toBe(10);
  expect(fresh).toHaveLength(10);
});

test('what fails for now is tried again after a pause, and given up in the end', async () => {
  const busy = await refusingServer(451);
  await post('x@laboratory.example');
  expect(await sender(busy.url).sendDue()).toBe(1);
  expect(await outbox()).toMatchObject([
    { state: 'waiting', attempts: 1, last_error: expect.stringMatching(/no room/) },
  ]);
  expect(await sender(busy.url).sendDue()).toBe(0);
  let aheadMs = 0;
  for (let attempts = 1; attempts < MAX_ATTEMPTS; attempts += 1) {
    aheadMs += backOffMs(attempts) + 1000;
    expect(await sender(busy.url, aheadMs).sendDue()).toBe(1);
  }
  expect(await outbox()).toMatchObject([{ state: 'failed', attempts: MAX_ATTEMPTS, body_text: '' }]);
  await busy.stop();
});

test('a mail that failed once goes out at the next attempt', async () => {
  const busy = await refusingServer(451);
  await post('later@laboratory.example');
  await sender(busy.url).sendDue();
  await busy.stop();
  expect(await sender(inbox.smtpUrl, backOffMs(1) + 1000).sendDue()).toBe(1);
  expect(await outbox()).toMatchObject([{ state: 'sent', attempts: 2, last_error: null }]);
  expect(inbox.mails()[0]?.to).toBe('later@laboratory.example');
});

test('what is refused for good is given up at once', async () => {
  const strict = await refusingServer(550);
  await post('nobody@laboratory.example');
  await sender(strict.url).sendDue();
  expect(await outbox()).toMatchObject([{ state: 'failed', attempts: 1 }]);
  await strict.stop();
});

test('a mail server that is not there leaves the mail waiting', async () => {
  await post('x@laboratory.example');
  await sender('smtp://127.0.0.1:9').sendDue();
  expect(await outbox()).toMatchObject([{ state: 'waiting', attempts: 1 }]);
});

test('started, it sends what comes in, and stops', async () => {
  const running = sender(inbox.smtpUrl);
  running.start();
  await post('soon@laboratory.example');
  const deadline = Date.now() + 10_000;
  while (inbox.mails()[0]?.to !== 'soon@laboratory.example' && Date.now() < deadline) {
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  expect(inbox.mails()[0]?.to).toBe('soon@laboratory.example');
  await running.stop();
  await post('never@laboratory.example');
  await new Promise((resolve) => setTimeout(resolve, 1500));
  expect(await outbox()).toMatchObject([{ state: 'sent' }, { state: 'waiting', attempts: 0 }]);
});

test('pauses double up to an hour', () => {
  expect([1, 2, 3, 7, 8].map((attempts) => backOffMs(attempts) / 60_000)).toEqual([1, 2, 4, 60, 60]);
});
