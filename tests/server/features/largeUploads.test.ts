import { createHash } from 'node:crypto';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { MAX_FRAME_BYTES } from '../../../shared/contracts/captures';
import { endpoints } from '../../../shared/contracts/endpoints';
import { call, pathOf } from '../support/call';
import { registerLaboratory, type SignedIn } from '../support/people';
import { addBench, addClient, addLot } from '../support/records';
import { startTestApp, type TestApp } from '../support/startTestApp';

const MIB = 1024 * 1024;

let app: TestApp;
let server: http.Server;
let manager: SignedIn;
let captureId: string;
beforeAll(async () => {
  app = await startTestApp();
  server = http.createServer(app.express).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  manager = await registerLaboratory(app);
  const { token } = manager;
  const benchId = (await addBench(app, token)).id;
  const lot = await addLot(app, token, { number: 'L-1', clientId: await addClient(app, token) }, ['P1']);
  const body = { apertureId: lot.apertures[0]?.id as string, benchId };
  captureId = (await call(app, endpoints.createCapture, { token, body }).expect(201)).body.id;
});
afterAll(async () => {
  server?.closeAllConnections();
  server?.close();
  await app?.stop();
});

/** A little-endian TIFF's first eight bytes, which say that the directory begins at byte 8. */
const HEAD = Buffer.from([0x49, 0x49, 42, 0, 8, 0, 0, 0]);
/** The same MiB again and again, told apart by its first byte. */
const block = Buffer.alloc(MIB, 7);

/** Sends a form whose file has the given number of bytes, made while it is sent; samples memory as it goes. */
async function send(byteCount: number) {
  const hash = createHash('sha256');
  const before = process.memoryUsage().rss;
  let most = before;
  const form =
    '--x\r\nContent-Disposition: form-data; name="kind"\r\n\r\ndark\r\n--x\r\nContent-Disposition: form-data; name="file"; filename="large.tif"\r\n\r\n';
  const request = http.request({
    port: (server.address() as AddressInfo).port,
    method: 'POST',
    path: pathOf(endpoints.upload, { captureId }),
    headers: { authorization: `Bearer ${manager.token}`, 'content-type': 'multipart/form-data; boundary=x' },
  });
  const answer = new Promise<{ status: number; body: Record<string, unknown> }>((resolve, reject) => {
    request.on('error', reject).on('response', (response) => {
      let text = '';
      response.setEncoding('utf8').on('data', (piece: string) => (text += piece));
      response.on('end', () => resolve({ status: response.statusCode ?? 0, body: JSON.parse(text) }));
    });
  });
  let answered = false;
  void answer.then(
    () => (answered = true),
    () => (answered = true),
  );
  request.write(form);
  for (let sent = 0; sent < byteCount && !answered;) {
    const piece = Buffer.from(sent === 0 ? HEAD : block.subarray(0, Math.min(MIB, byteCount - sent)));
    if (sent > 0) piece[0] = Math.floor(sent / MIB) % 256;
    hash.update(piece);
    sent += piece.length;
    await new Promise<void>((resolve) => request.write(piece, () => resolve()));
    most = Math.max(most, process.memoryUsage().rss);
  }
  request.end('\r\n--x--\r\n');
  return { ...(await answer), sha256: hash.digest('hex'), grownBytes: most - before };
}

const stored = async () => (await app.database.query('select count(*)::int as n from frame_chunk'))[0].n as number;

test('a file over the limit is refused in words, and nothing of it stays', async () => {
  const before = await stored();
  const { status, body } = await send(MAX_FRAME_BYTES + 1);
  expect(status).toBe(413);
  expect(body).toMatchObject({ title: expect.any(String), detail: 'A frame may have 200 MiB at most.' });
  expect(await stored()).toBe(before);
}, 120_000);

test('150 MiB go in and come out byte for byte without being held in memory', async () => {
  const { status, body, sha256, grownBytes } = await send(150 * MIB);
  expect(status).toBe(201);
  expect(body).toMatchObject({ sha256, kind: 'dark' });
  // Sender and server share this process: were the file held once, it would grow by 150 MiB.
  expect(grownBytes).toBeLessThan(100 * MIB);

  const hash = createHash('sha256');
  const before = process.memoryUsage().rss;
  let most = before;
  const { port } = server.address() as AddressInfo;
  const path = pathOf(endpoints.original, { frameId: body.frameId as string });
  await new Promise<void>((resolve, reject) => {
    http.get({ port, path, headers: { authorization: `Bearer ${manager.token}` } }, (response) => {
      response.on('data', (piece: Buffer) => {
        hash.update(piece);
        most = Math.max(most, process.memoryUsage().rss);
      });
      response.on('end', resolve).on('error', reject);
    });
  });
  expect(hash.digest('hex')).toBe(sha256);
  expect(most - before).toBeLessThan(100 * MIB);
}, 120_000);
