import { once } from 'node:events';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { Readable } from 'node:stream';
import { gzipSync } from 'node:zlib';
import express from 'express';
import { pino } from 'pino';
import request from 'supertest';
import { z } from 'zod';
import { endpoint } from '../../../shared/contracts/endpoint';
import { endpoints } from '../../../shared/contracts/endpoints';
import { STAFF } from '../../../shared/contracts/roles';
import { createAccessTokens } from '../../../server/http/accessTokens';
import { Api } from '../../../server/http/Api';
import type { EventStream } from '../../../server/http/EventStream';
import { logRequests } from '../../../server/http/logging';
import { problemHandler } from '../../../server/http/problemHandler';
import { ProblemError } from '../../../server/http/ProblemError';
import { webBuild } from '../../../server/http/webBuild';

const tokens = createAccessTokens('only for tests, and long enough for that', 3);
const ids = ['1', '2', '3', '4'].map((digit) => `${digit.repeat(8)}-1111-4111-8111-111111111111`) as [
  string,
  string,
  string,
  string,
];
const token = () =>
  tokens.issue({
    userId: ids[0],
    membershipId: ids[1],
    laboratoryId: ids[2],
    role: 'reviewer',
    clientId: null,
    familyId: ids[3],
  });

/** The kernel with endpoints of the test's own, and what it wrote into the log. */
function kernel(register: (api: Api) => void) {
  const lines: string[] = [];
  const log = pino({ level: 'info' }, { write: (line: string) => void lines.push(line) });
  const api = new Api(tokens, () => Promise.resolve(true));
  register(api);
  const app = express();
  app.use(logRequests(log), express.json({ limit: 1000 }), api.router);
  app.use(problemHandler);
  return { app, api, lines, get: (to: string) => request(app).get(to).set('Authorization', `Bearer ${token()}`) };
}

test('only what the contract declares leaves the service', async () => {
  const thing = endpoint({
    method: 'get',
    path: '/thing',
    summary: 'x',
    access: STAFF,
    answer: z.object({ a: z.number() }),
  });
  const { get } = kernel((api) => api.register(thing, async () => ({ a: 1, secret: 'x' }) as { a: number }));
  expect((await get('/thing').expect(200)).body).toEqual({ a: 1 });
});

test('an answer that breaks the contract is a fault here, not a wrong answer', async () => {
  const thing = endpoint({
    method: 'get',
    path: '/thing',
    summary: 'x',
    access: STAFF,
    answer: z.object({ a: z.number() }),
  });
  const { get, lines } = kernel((api) => api.register(thing, async () => ({ a: NaN })));
  const answer = await get('/thing').expect(500);
  expect(answer.body.detail).not.toMatch(/NaN|zod/i);
  expect(lines.join('')).toContain(answer.body.id);
});

test('what nobody foresaw is told in brief and logged whole, under the same number', async () => {
  const thing = endpoint({ method: 'get', path: '/thing', summary: 'x', access: STAFF });
  const { get, lines } = kernel((api) =>
    api.register(thing, async () => {
      throw new Error('password of the database is 123');
    }),
  );
  const answer = await get('/thing')
    .expect(500)
    .expect('Content-Type', /application\/problem\+json/);
  expect(answer.body).toMatchObject({ type: 'internal', status: 500, title: 'Something went wrong here' });
  expect(answer.text).not.toContain('123');
  const line = lines.map((each) => JSON.parse(each)).find(({ level }) => level === 50);
  expect(line).toMatchObject({ req: { id: answer.body.id }, err: { message: 'password of the database is 123' } });
});

test('secrets of links, headers and bodies do not reach the log', async () => {
  const { app, lines } = kernel((api) => {
    api.registerOpen(endpoints.invitation, async () => {
      throw new ProblemError('not-found', 'no');
    });
  });
  await request(app).get('/invitations/token/verysecret?token=secrettoo').set('Cookie', 'ringwright_refresh=third');
  expect(lines.join('')).toContain('/invitations/token/…');
  expect(lines.join('')).not.toMatch(/secret|third/);
});

test('bodies that are no JSON, too large or packed are refused in words', async () => {
  const body = z.object({ name: z.string() });
  const thing = endpoint({ method: 'post', path: '/thing', summary: 'x', access: 'public', body });
  const { app } = kernel((api) => api.registerOpen(thing, async () => undefined));
  const post = () => request(app).post('/thing').set('Content-Type', 'application/json');
  expect((await post().send('{"name":').expect(400)).body.detail).toBe('The body is not JSON.');
  expect(
    (
      await post()
        .send(JSON.stringify({ name: 'x'.repeat(2000) }))
        .expect(413)
    ).body.type,
  ).toBe('too-large');
  await post().set('Content-Encoding', 'packed').send('x').expect(415);
  expect((await post().set('Content-Encoding', 'gzip').send('x').expect(400)).body.type).toBe('invalid');
  expect((await request(app).post('/thing').expect(400)).body.fields).toHaveProperty('name');
  await post().send('{"name":"x","more":1}').expect(204);
});

test('a path parameter that can be no key names nothing', async () => {
  const params = z.object({ thingId: z.uuid() });
  const thing = endpoint({ method: 'get', path: '/things/:thingId', summary: 'x', access: STAFF, params });
  const { get } = kernel((api) => api.register(thing, async () => undefined));
  await get(`/things/${ids[0]}`).expect(204);
  expect((await get('/things/1;drop').expect(404)).body.type).toBe('not-found');
});

test('a file is sent whole or as a stream, with its name, and not again while it is the same', async () => {
  const file = endpoint({ method: 'get', path: '/file', summary: 'x', access: STAFF, kind: 'csv' });
  const stream = endpoint({ method: 'get', path: '/stream', summary: 'x', access: STAFF, kind: 'bytes' });
  const { get } = kernel((api) => {
    api.registerFile(file, async () => ({ content: 'a,b\n', fileName: 'Größe "µm".csv', etag: 'v1' }));
    api.registerFile(stream, async () => ({
      content: Readable.from([Buffer.from('abc'), Buffer.from('def')]),
      byteLength: 6,
      etag: 'v2',
      immutable: true,
      headers: { 'X-Width': '3' },
    }));
  });
  const csv = await get('/file').expect(200).expect('Content-Type', 'text/csv; charset=utf-8');
  expect(csv.text).toBe('a,b\n');
  expect(csv.headers['content-disposition']).toContain("filename*=UTF-8''Gr%C3%B6%C3%9Fe%20%22%C2%B5m%22.csv");
  await get('/file').set('If-None-Match', '"v1"').expect(304);
  const bytes = await get('/stream').buffer(true).expect(200).expect('Content-Length', '6').expect('X-Width', '3');
  expect(String(bytes.body)).toBe('abcdef');
  expect(bytes.headers['cache-control']).toBe('private, max-age=31536000, immutable');
  await get('/stream').set('If-None-Match', '"v2"').expect(304);
});

test('a handler of a file that fails answers with a problem', async () => {
  const file = endpoint({ method: 'get', path: '/file', summary: 'x', access: STAFF, kind: 'png' });
  const { get } = kernel((api) =>
    api.registerFile(file, async () => {
      throw new ProblemError('not-found', 'There is no picture.');
    }),
  );
  await get('/file')
    .expect(404)
    .expect('Content-Type', /problem\+json/);
});

async function until(reached: () => boolean): Promise<void> {
  while (!reached()) await new Promise((resolve) => setTimeout(resolve, 10));
}

describe('an event stream', () => {
  const stream = endpoint({ method: 'get', path: '/stream', summary: 'x', access: STAFF, kind: 'events' });

  /** Opens the stream over a real connection and collects what comes. */
  async function open(work: (events: EventStream) => void) {
    const { app, api } = kernel((each) => each.registerEvents(stream, ({ events }) => work(events)));
    const server = http.createServer(app).listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    const answer = await new Promise<http.IncomingMessage>((resolve, reject) => {
      const options = { port, path: '/stream', headers: { authorization: `Bearer ${token()}` } };
      http.get(options, resolve).on('error', reject);
    });
    let text = '';
    answer.on('data', (chunk: Buffer) => (text += chunk.toString()));
    const ended = new Promise((resolve) => answer.on('close', resolve));
    return { answer, api, ended, text: () => text, stop: () => new Promise((done) => server.close(done)) };
  }

  test('sends events as they come and tells when the reader leaves', async () => {
    let left = false;
    const opened = await open((events) => {
      events.send('measurement', { state: 'measured' });
      events.onClose(() => (left = true));
    });
    await until(() => opened.text().includes('measured'));
    expect(opened.answer.headers['content-type']).toBe('text/event-stream; charset=utf-8');
    expect(opened.text()).toBe(': open\n\nevent: measurement\ndata: {"state":"measured"}\n\n');
    expect(left).toBe(false);
    opened.answer.destroy();
    await until(() => left);
    await opened.stop();
  });

  test('ends when the access token does', async () => {
    const opened = await open(() => undefined);
    const before = Date.now();
    await opened.ended;
    expect(Date.now() - before).toBeLessThan(3500);
    expect(opened.answer.complete).toBe(true);
    await opened.stop();
  });

  test('ends when the service stops', async () => {
    const opened = await open(() => undefined);
    opened.api.endStreams();
    await opened.ended;
    await opened.stop();
  });
});

test('an endpoint is registered once, and in the way of its kind', () => {
  const api = new Api(tokens, () => Promise.resolve(true));
  api.register(endpoints.lasers, async () => []);
  expect(() => api.register(endpoints.lasers, async () => [])).toThrow('GET /lasers is registered already');
  expect(() => api.registerOpen(endpoints.cameras, async () => [])).toThrow('is not open');
  expect(() => api.register(endpoints.signIn, async () => Promise.reject(new Error()))).toThrow('open to anybody');
  expect(() => api.registerFile(endpoints.cameras, async () => ({ content: '' }))).toThrow('answers with json');
});

describe('the web build', () => {
  const dir = mkdtempSync(path.join(tmpdir(), 'ringwright-web-'));
  const script = 'console.log(1);'.repeat(200);
  const app = express().use(webBuild(dir));
  const scriptName = 'index-0123456789abcdef0123456789abcdef.js';
  beforeAll(() => {
    mkdirSync(path.join(dir, '_expo/static/js'), { recursive: true });
    mkdirSync(path.join(dir, 'assets/node_modules/font'), { recursive: true });
    writeFileSync(path.join(dir, 'index.html'), '<title>start page</title>');
    writeFileSync(path.join(dir, 'canvaskit.wasm'), 'wasm');
    writeFileSync(path.join(dir, 'canvaskit.wasm.gz'), gzipSync('wasm'));
    writeFileSync(path.join(dir, '_expo/static/js', scriptName), script);
    writeFileSync(path.join(dir, '_expo/static/js', `${scriptName}.gz`), gzipSync(script));
    writeFileSync(path.join(dir, 'assets/node_modules/font/Sans.0123456789abcdef0123456789abcdef.ttf'), 'font');
    writeFileSync(path.join(path.dirname(dir), 'outside.txt.gz'), 'not for you');
  });
  afterAll(() => rmSync(dir, { recursive: true, force: true }));

  test('every address of a page gives the start page, which is asked for again each time', async () => {
    for (const address of ['/', '/captures/1/frames/2', '/reset?token=x']) {
      const page = await request(app).get(address).set('Accept', 'text/html,*/*').expect(200);
      expect(page.text).toContain('start page');
      expect(page.headers['cache-control']).toBe('no-cache');
    }
    await request(app).get('/missing.js').set('Accept', '*/*').expect(404);
    await request(app).get('/some/data').set('Accept', 'application/json').expect(404);
    await request(app).post('/').expect(404);
  });

  test('hashed files are kept for good, the others are asked for again', async () => {
    const js = await request(app).get(`/_expo/static/js/${scriptName}`).expect(200);
    expect(js.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const font = await request(app).get('/assets/node_modules/font/Sans.0123456789abcdef0123456789abcdef.ttf');
    expect(font.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const wasm = await request(app).get('/canvaskit.wasm').expect(200);
    expect(wasm.headers['cache-control']).toBe('no-cache');
    expect(wasm.headers['content-type']).toBe('application/wasm');
  });

  test('the packed form goes to browsers that take it', async () => {
    const get = (encoding: string) =>
      request(app)
        .get(`/_expo/static/js/${scriptName}`)
        .set('Accept-Encoding', encoding)
        .buffer(true)
        .parse((response, done) => {
          const chunks: Buffer[] = [];
          response.on('data', (chunk: Buffer) => chunks.push(chunk));
          response.on('end', () => done(null, Buffer.concat(chunks)));
        });
    const plain = await get('identity');
    expect(String(plain.body)).toBe(script);
    expect(plain.headers['content-encoding']).toBeUndefined();
    const packed = await request(app).get(`/_expo/static/js/${scriptName}`).set('Accept-Encoding', 'gzip, br');
    expect(packed.headers['content-encoding']).toBe('gzip');
    expect(packed.headers['content-type']).toMatch(/javascript/);
    expect(packed.text).toBe(script);
    expect(Number(packed.headers['content-length'])).toBeLessThan(script.length / 4);
  });

  test('nothing outside of the build is served', async () => {
    for (const address of ['/../outside.txt', '/%2e%2e/outside.txt', '/..%2foutside.txt', '/%zz']) {
      const answer = await request(app).get(address);
      expect([address, answer.status]).toEqual([address, expect.any(Number)]);
      expect(answer.text).not.toContain('not for you');
      expect(answer.status).toBeGreaterThanOrEqual(400);
    }
  });
});
