import { createHash } from 'node:crypto';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import sharp from 'sharp';
import type { CaptureDetail, CaptureFrame, FrameKind } from '../../../shared/contracts/captures';
import { endpoints } from '../../../shared/contracts/endpoints';
import { scoped } from '../../../server/database/LaboratoryScope';
import { FrameEntity } from '../../../server/entities/FrameEntity';
import { MeasurementEntity } from '../../../server/entities/MeasurementEntity';
import { call, pathOf } from '../support/call';
import { measuredResult } from '../support/fillLaboratory';
import { registerLaboratory, type SignedIn } from '../support/people';
import { addBench, addClient, addLot, laser } from '../support/records';
import { startTestApp, type TestApp } from '../support/startTestApp';

let app: TestApp;
let manager: SignedIn;
let token: string;
let benchId: string;
let apertureId: string;
let captureId: string;
beforeAll(async () => {
  app = await startTestApp();
});
beforeEach(async () => {
  manager = await registerLaboratory(app);
  token = manager.token;
  benchId = (await addBench(app, token)).id;
  const lot = await addLot(app, token, { number: 'L-1', clientId: await addClient(app, token) }, ['P1']);
  apertureId = lot.apertures[0]?.id as string;
  const made = await call(app, endpoints.createCapture, { token, body: { apertureId, benchId, note: 'first' } });
  captureId = made.body.id;
});
afterAll(() => app?.stop());

const hashOf = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');

let pictures = 0;
/** A small 16-bit TIFF that no other call gives. */
function picture(): Promise<Buffer> {
  const counts = new Uint16Array(64).fill((pictures += 1));
  const raw = { width: 8, height: 8, channels: 1 } as const;
  return sharp(counts, { raw }).toColourspace('grey16').tiff({ compression: 'none' }).toBuffer();
}

function upload(bytes: Buffer, kind: FrameKind = 'light', fields: Record<string, string> = {}, name = 'f.tif') {
  const test = call(app, endpoints.upload, { token, params: { captureId } }).field('kind', kind);
  for (const [field, value] of Object.entries(fields)) void test.field(field, value);
  return test.attach('file', bytes, name);
}
const detail = async (): Promise<CaptureDetail> =>
  (await call(app, endpoints.capture, { token, params: { captureId } }).expect(200)).body as CaptureDetail;
const laboratory = () => scoped(app.database, manager.session.membership.laboratoryId);
const count = async (table: string): Promise<number> =>
  (await app.database.query(`select count(*)::int as n from ${table}`))[0].n;
const jobs = async (name: string): Promise<string[]> => {
  const rows: { id: string }[] = await app.database.query(
    `select data ->> 'id' as id from queue.job where name = $1 order by created_on`,
    [name],
  );
  return rows.map(({ id }) => id);
};

/** Ends the newest run of a place with a size, as the worker would. */
async function endRun(place: CaptureFrame, sizeUm: number, darkCount = 0): Promise<void> {
  const id = place.measurement?.id as string;
  const budget = [
    {
      source: 'fit',
      contributionUm: 0.03,
      standardUncertainty: null,
      unit: null,
      sensitivity: null,
      degreesOfFreedom: null,
      evaluation: 'A',
    },
    {
      source: 'distance',
      contributionUm: 0.1,
      standardUncertainty: 0.25,
      unit: 'mm',
      sensitivity: 0.4,
      degreesOfFreedom: null,
      evaluation: 'B',
    },
  ] as const;
  const result = { ...measuredResult(id), sizeUm, budget: [...budget] };
  const run = { state: 'measured', sizeUm, darkCount, result, finishedAt: new Date() } as const;
  expect(await laboratory().update(MeasurementEntity, { id, state: 'waiting' }, run)).toBe(1);
}

test('a capture is begun on the current revision of a bench and keeps it', async () => {
  const before = await detail();
  expect(before).toMatchObject({
    apertureSerial: 'P1',
    lotNumber: 'L-1',
    benchName: 'Bench A',
    benchRevision: 1,
    wavelengthNm: laser.wavelengthNm,
    note: 'first',
    createdBy: 'Mara Manager',
    frames: [],
    mean: null,
    outdatedCount: 0,
  });
  const bench = await call(app, endpoints.bench, { token, params: { benchId } });
  const { laserId, cameraId } = bench.body.current;
  const revision = {
    laserId,
    cameraId,
    distanceMm: 700,
    distanceUncertaintyMm: 0.1,
    illumination: { kind: 'plane' } as const,
  };
  await call(app, endpoints.reviseBench, { token, params: { benchId }, body: revision }).expect(201);
  expect((await detail()).benchRevision).toBe(1);
  const next = await call(app, endpoints.createCapture, { token, body: { apertureId, benchId } }).expect(201);
  expect(next.body.benchRevision).toBe(2);
  const list = await call(app, endpoints.captures, { token, query: { apertureId } }).expect(200);
  expect(list.body.map(({ id }: { id: string }) => id)).toEqual([next.body.id, captureId]);
});

test('a light that is sent is stored byte for byte, looked at and measured by itself', async () => {
  const bytes = await picture();
  const answer = await upload(bytes, 'light', {}, 'C:\\frames\\Größe 5 µm.tif').expect(201);
  expect(answer.body).toMatchObject({
    name: 'Größe 5 µm.tif',
    kind: 'light',
    leftOut: false,
    sha256: hashOf(bytes),
    byteSize: bytes.length,
    state: 'stored',
    health: null,
    measurement: { state: 'waiting', sizeUm: null, newest: true, apertureSerial: 'P1' },
  });
  expect(await jobs('inspect-frame')).toContain(answer.body.frameId);
  // The run's job waits until the frame has been looked at.
  expect(await jobs('run-measurement')).not.toContain(answer.body.measurement.id);
  const original = await call(app, endpoints.original, { token, params: { frameId: answer.body.frameId } })
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
  expect(bytes.equals(original.body as Buffer)).toBe(true);
  expect(original.headers['content-length']).toBe(String(bytes.length));
  expect((await detail()).lightCount).toBe(1);
});

test('a dark is stored and not measured', async () => {
  const answer = await upload(await picture(), 'dark').expect(201);
  expect(answer.body.measurement).toBeNull();
  expect(await detail()).toMatchObject({ lightCount: 0, darkCount: 1 });
});

test('a file of many chunks comes back whole', async () => {
  const side = 1200;
  const counts = Uint16Array.from({ length: side * side }, (_, index) => (index * 40_503) % 65_536);
  const raw = { width: side, height: side, channels: 1 } as const;
  const bytes = await sharp(counts, { raw }).toColourspace('grey16').tiff({ compression: 'none' }).toBuffer();
  const answer = await upload(bytes).expect(201);
  const { frameId } = answer.body as CaptureFrame;
  const [frame] = await laboratory().find(FrameEntity, { where: { id: frameId } });
  expect(frame?.chunkCount).toBe(Math.ceil(bytes.length / 1024 / 1024));
  const original = await call(app, endpoints.original, { token, params: { frameId } }).buffer(true);
  expect(hashOf(original.body as Buffer)).toBe(hashOf(bytes));
});

test('the same bytes are stored once in a laboratory and once more in another', async () => {
  const bytes = await picture();
  const frames = await count('frame');
  const first = await upload(bytes).expect(201);
  const again = await upload(bytes, 'dark', {}, 'other name.tif').expect(201);
  expect(again.body).toMatchObject({ id: first.body.id, frameId: first.body.frameId, kind: 'light' });
  expect(await count('frame')).toBe(frames + 1);
  const second = await call(app, endpoints.createCapture, { token, body: { apertureId, benchId } });
  captureId = second.body.id;
  const elsewhere = await upload(bytes).expect(201);
  expect(elsewhere.body.frameId).toBe(first.body.frameId);
  expect(elsewhere.body.id).not.toBe(first.body.id);
  expect(await count('frame')).toBe(frames + 1);
});

test('the same file sent twice at once is stored once and has one run', async () => {
  const bytes = await picture();
  const answers = await Promise.all([upload(bytes), upload(bytes), upload(bytes)]);
  expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
  expect(new Set(answers.map(({ body }) => body.id)).size).toBe(1);
  const runs = await laboratory().find(MeasurementEntity, { where: { captureId } });
  expect(runs).toHaveLength(1);
});

test('ten frames at once all arrive', async () => {
  const files = await Promise.all(Array.from({ length: 10 }, () => picture()));
  const answers = await Promise.all(files.map((bytes) => upload(bytes)));
  expect(answers.map(({ status }) => status)).toEqual(Array(10).fill(201));
  expect((await detail()).lightCount).toBe(10);
});

test.each([
  ['a text', Buffer.from('this is only text, whatever the name says'), 415, /not a picture/],
  ['an empty file', Buffer.alloc(0), 400, /empty/],
  ['a GIF', Buffer.from('GIF89a_______________'), 415, /GIF/],
  [
    'an HEIC picture',
    Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic____________')]),
    415,
    /HEIC.*JPEG/,
  ],
])('%s is refused in words, and nothing of it stays', async (_what, bytes, status, words) => {
  const [frames, chunks] = [await count('frame'), await count('frame_chunk')];
  const refused = await upload(bytes).expect(status);
  expect(refused.body.detail).toMatch(words);
  expect([await count('frame'), await count('frame_chunk')]).toEqual([frames, chunks]);
});

test('a file that is not the one announced is refused, and nothing of it stays', async () => {
  const frames = await count('frame');
  const bytes = await picture();
  const refused = await upload(bytes, 'light', { sha256: 'a'.repeat(64) }).expect(400);
  expect(refused.body.fields).toHaveProperty('sha256');
  expect(await count('frame')).toBe(frames);
  await upload(bytes, 'light', { sha256: hashOf(bytes) }).expect(201);
});

test('a form without a file, and one without the kind, are refused by field', async () => {
  const noFile = await call(app, endpoints.upload, { token, params: { captureId } }).field('kind', 'light').expect(400);
  expect(noFile.body.fields).toHaveProperty('file');
  const params = { captureId };
  const noKind = await call(app, endpoints.upload, { token, params }).attach('file', await picture(), 'f.tif');
  expect(noKind.status).toBe(400);
  expect(noKind.body.fields).toHaveProperty('kind');
  await call(app, endpoints.upload, { token, params, body: { kind: 'light' } }).expect(400);
});

test('an upload that breaks off leaves nothing behind, and gives its connection back', async () => {
  const server = http.createServer(app.express).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const { port } = server.address() as AddressInfo;
  const [frames, chunks] = [await count('frame'), await count('frame_chunk')];
  const tiff = await picture();
  for (let attempt = 0; attempt < 12; attempt += 1) {
    await new Promise<void>((resolve) => {
      const headers = {
        authorization: `Bearer ${token}`,
        'content-type': 'multipart/form-data; boundary=x',
        'content-length': '3000000',
      };
      const request = http.request({ port, method: 'POST', path: pathOf(endpoints.upload, { captureId }), headers });
      request.on('error', () => resolve());
      request.write('--x\r\nContent-Disposition: form-data; name="kind"\r\n\r\nlight\r\n');
      request.write('--x\r\nContent-Disposition: form-data; name="file"; filename="f.tif"\r\n\r\n');
      request.write(Buffer.concat([tiff, Buffer.alloc(1_200_000)]), () => setTimeout(() => request.destroy(), 20));
      request.on('close', () => resolve());
    });
  }
  const open = async () => {
    const rows = await app.database.query(
      `select count(*)::int as n from pg_stat_activity where datname = current_database() and state like 'idle in%'`,
    );
    return rows[0].n as number;
  };
  for (const deadline = Date.now() + 10_000; (await open()) > 0 && Date.now() < deadline;) {
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  expect(await open()).toBe(0);
  expect([await count('frame'), await count('frame_chunk')]).toEqual([frames, chunks]);
  await upload(tiff).expect(201);
  await new Promise((resolve) => server.close(resolve));
});

test('frames that the laboratory holds are placed without being sent again', async () => {
  const bytes = await picture();
  const held = await upload(bytes).expect(201);
  const second = await call(app, endpoints.createCapture, { token, body: { apertureId, benchId } });
  captureId = second.body.id;
  const missing = 'f'.repeat(64);
  const files = [
    { name: 'again.tif', kind: 'light' as const, sha256: hashOf(bytes) },
    { name: 'new.tif', kind: 'light' as const, sha256: missing },
    { name: 'new too.tif', kind: 'light' as const, sha256: missing },
  ];
  const ask = () => call(app, endpoints.placeKnown, { token, params: { captureId }, body: { files } }).expect(200);
  expect((await ask()).body).toEqual({ missing: [missing] });
  expect((await ask()).body).toEqual({ missing: [missing] });
  const { frames } = await detail();
  expect(frames).toMatchObject([{ name: 'again.tif', frameId: held.body.frameId, measurement: { state: 'waiting' } }]);
});

test('a frame changes from dark to light and gets its run then; left out, it has none', async () => {
  const dark = await upload(await picture(), 'dark').expect(201);
  const params = { captureId, captureFrameId: dark.body.id };
  const change = (body: object) => call(app, endpoints.updatePlace, { token, params, body }).expect(200);
  expect((await change({ leftOut: true })).body).toMatchObject({ leftOut: true, measurement: null });
  expect((await change({ kind: 'light' })).body).toMatchObject({ kind: 'light', leftOut: true, measurement: null });
  expect((await change({ leftOut: false })).body).toMatchObject({ leftOut: false, measurement: { state: 'waiting' } });
  expect((await change({ kind: 'flat' })).body).toMatchObject({ kind: 'flat', measurement: null });
  expect((await change({})).body).toMatchObject({ kind: 'flat' });
});

test('a light that was a dark when its run began gets another run when it is a light again', async () => {
  const light = await upload(await picture()).expect(201);
  const params = { captureId, captureFrameId: light.body.id };
  const id = light.body.measurement.id as string;
  const change = (body: object) => call(app, endpoints.updatePlace, { token, params, body }).expect(200);
  await change({ kind: 'dark' });
  const message = 'stands in for the words of the worker';
  const result = { id, status: 'failed', reason: 'bad-case', message } as const;
  const ended = { state: 'failed', reason: 'bad-case', message, result, finishedAt: new Date() } as const;
  expect(await laboratory().update(MeasurementEntity, { id }, ended)).toBe(1);
  expect((await change({ kind: 'light' })).body.measurement).toMatchObject({ state: 'waiting' });
  expect(await laboratory().find(MeasurementEntity, { where: { captureId } })).toHaveLength(2);
  await change({ kind: 'light' });
  expect(await laboratory().find(MeasurementEntity, { where: { captureId } })).toHaveLength(2);
});

test('runs that waited for a dark are queued when it is left out before it was looked at', async () => {
  const light = await upload(await picture()).expect(201);
  const run = light.body.measurement.id as string;
  const dark = await upload(await picture(), 'dark').expect(201);
  const before = (await jobs('run-measurement')).filter((id) => id === run);
  const params = { captureId, captureFrameId: dark.body.id };
  await call(app, endpoints.updatePlace, { token, params, body: { leftOut: true } }).expect(200);
  const after = (await jobs('run-measurement')).filter((id) => id === run);
  expect(after).toHaveLength(before.length + 1);
});

test('a light that cannot be read is not asked for when darks come later', async () => {
  const light = await upload(await picture()).expect(201);
  await endRun(light.body, 200);
  await laboratory().update(FrameEntity, { id: light.body.frameId }, { state: 'unusable', problem: 'cut off' });
  await upload(await picture(), 'dark').expect(201);
  expect((await detail()).outdatedCount).toBe(0);
  const again = { token, params: { captureId }, body: { useDarks: false } };
  expect((await call(app, endpoints.measureCapture, again).expect(201)).body.queued).toBe(0);
});

test('measuring again takes the lights whose run used fewer darks than there are, and others when settings change', async () => {
  const measure = async (body: object = {}): Promise<number> =>
    (await call(app, endpoints.measureCapture, { token, params: { captureId }, body }).expect(201)).body.queued;
  await upload(await picture()).expect(201);
  await upload(await picture()).expect(201);
  expect(await measure()).toBe(0);
  for (const place of (await detail()).frames) await endRun(place, 200);
  expect(await measure()).toBe(0);
  await upload(await picture(), 'dark').expect(201);
  expect((await detail()).outdatedCount).toBe(2);
  const leftOut = (await detail()).frames[1]?.id as string;
  const params = { captureId, captureFrameId: leftOut };
  await call(app, endpoints.updatePlace, { token, params, body: { leftOut: true } }).expect(200);
  expect((await detail()).outdatedCount).toBe(1);
  expect(await measure()).toBe(1);
  expect(await detail()).toMatchObject({ outdatedCount: 0 });
  expect((await detail()).frames[0]?.measurement?.state).toBe('waiting');
  await endRun((await detail()).frames[0] as CaptureFrame, 200, 1);
  expect(await measure()).toBe(0);
  expect(await measure({ useDarks: false })).toBe(1);
  await endRun((await detail()).frames[0] as CaptureFrame, 200, 0);
  // This run was told to use none, so that it does not wait for darks.
  expect((await detail()).outdatedCount).toBe(0);
  const runs = await laboratory().find(MeasurementEntity, { where: { captureId } });
  expect(runs).toHaveLength(4);
});

test('the mean takes the newest sizes of the lights that are not left out', async () => {
  for (const _ of [1, 2, 3]) await upload(await picture()).expect(201);
  expect((await detail()).mean).toBeNull();
  const places = (await detail()).frames;
  for (const [index, place] of places.entries()) await endRun(place, [200, 200.06, 500][index] as number);
  const params = { captureId, captureFrameId: places[2]?.id as string };
  await call(app, endpoints.updatePlace, { token, params, body: { leftOut: true } }).expect(200);
  const { mean, measuredCount } = await detail();
  expect(measuredCount).toBe(3);
  // Fit terms scatter (0.03 and a spread of 0.06: the Birge ratio is √2), the distance is common to both.
  expect(mean?.count).toBe(2);
  expect(mean?.sizeUm).toBeCloseTo(200.03, 10);
  expect(mean?.standardUncertaintyUm).toBeCloseTo(Math.hypot(0.1, 0.03), 3);
});

test('a capture of an aperture or bench that is not there is refused by field', async () => {
  const other = '11111111-1111-4111-8111-111111111111';
  const noAperture = await call(app, endpoints.createCapture, { token, body: { apertureId: other, benchId } }).expect(
    400,
  );
  expect(noAperture.body.fields).toHaveProperty('apertureId');
  const noBench = await call(app, endpoints.createCapture, { token, body: { apertureId, benchId: other } }).expect(400);
  expect(noBench.body.fields).toHaveProperty('benchId');
});
