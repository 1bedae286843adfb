import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { endpoints } from '../../../shared/contracts/endpoints';
import { inLaboratory } from '../../../server/database/LaboratoryScope';
import { publishProgress } from '../../../server/features/events/publishProgress';
import { pathOf } from '../support/call';
import { registerLaboratory, type SignedIn } from '../support/people';
import { startTestApp, type TestApp } from '../support/startTestApp';

let app: TestApp;
let server: http.Server;
let own: SignedIn;
let other: SignedIn;
beforeAll(async () => {
  app = await startTestApp({ withProgress: true });
  server = http.createServer(app.express).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  own = await registerLaboratory(app);
  other = await registerLaboratory(app);
});
afterAll(async () => {
  server?.closeAllConnections();
  server?.close();
  await app?.stop();
});

const path = pathOf(endpoints.events, {});

/** Opens the stream of a person and keeps what comes. */
async function open(person: SignedIn | null) {
  const { port } = server.address() as AddressInfo;
  const headers = person === null ? {} : { authorization: `Bearer ${person.token}` };
  const request = http.get({ port, path, headers });
  const response = await new Promise<http.IncomingMessage>((resolve) => request.once('response', resolve));
  let text = '';
  response.setEncoding('utf8').on('data', (piece: string) => (text += piece));
  const until = async (words: string) => {
    for (const end = Date.now() + 10_000; !text.includes(words);) {
      if (Date.now() > end) throw new Error(`${words} has not come: ${text}`);
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
  };
  return { response, request, text: () => text, until };
}

const ids = { captureId: 'c', captureFrameId: 'p', frameId: 'f' } as const;

/** Tells the laboratory of a person about a frame, in a transaction that is committed or rolled back. */
async function publish(person: SignedIn, state: 'placed' | 'ready' | 'changed', rollBack = false): Promise<void> {
  const { laboratoryId } = person.session.membership;
  const done = inLaboratory(app.database, laboratoryId, async (_laboratory, transaction) => {
    await publishProgress(transaction, laboratoryId, [{ type: 'frame', ...ids, state }]);
    if (rollBack) throw new Error('not this time');
  });
  await done.catch((error: Error) => {
    if (!rollBack || error.message !== 'not this time') throw error;
  });
}

test('progress of the own laboratory arrives as it is committed, and nothing of another', async () => {
  const [mine, theirs] = await Promise.all([open(own), open(other)]);
  expect(mine.response.statusCode).toBe(200);
  expect(mine.response.headers['content-type']).toBe('text/event-stream; charset=utf-8');
  await Promise.all([mine.until(': open'), theirs.until(': open')]);
  await publish(own, 'placed', true);
  await publish(own, 'ready');
  await publish(other, 'changed');
  await mine.until('"state":"ready"');
  await theirs.until('"state":"changed"');
  expect(mine.text()).toBe(
    `: open\n\nevent: frame\ndata: ${JSON.stringify({ type: 'frame', ...ids, state: 'ready' })}\n\n`,
  );
  expect(theirs.text()).not.toContain('ready');
  mine.request.destroy();
  theirs.request.destroy();
});

test('a stream that a browser leaves is forgotten, and the others go on', async () => {
  const [left, stays] = await Promise.all([open(own), open(own)]);
  await Promise.all([left.until(': open'), stays.until(': open')]);
  left.request.destroy();
  await publish(own, 'ready');
  await stays.until('"state":"ready"');
  stays.request.destroy();
});

test('without a token there is no stream', async () => {
  const { response } = await open(null);
  expect(response.statusCode).toBe(401);
  response.resume();
});
