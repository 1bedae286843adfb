import sharp from 'sharp';
import { endpoints } from '../../../shared/contracts/endpoints';
import { ownColourMap } from '../../../shared/optics/ownColour';
import { scoped } from '../../../server/database/LaboratoryScope';
import { FrameEntity } from '../../../server/entities/FrameEntity';
import { toCountPlane } from '../../../server/features/frames/toCountPlane';
import { call } from '../support/call';
import { fillLaboratory, type Filled } from '../support/fillLaboratory';
import { registerLaboratory, type SignedIn } from '../support/people';
import { startTestApp, type TestApp } from '../support/startTestApp';

let app: TestApp;
let manager: SignedIn;
let token: string;
let filled: Filled;
beforeAll(async () => {
  app = await startTestApp();
  manager = await registerLaboratory(app);
  token = manager.token;
  const { membership, user } = manager.session;
  filled = await fillLaboratory(app.database, membership.laboratoryId, user.id, 'cccccccc');
});
afterAll(() => app?.stop());

const params = () => ({ frameId: filled.frameId });

test('a file goes out under its hash, with the ending and type of what it is', async () => {
  const answer = await call(app, endpoints.original, { token, params: params() }).buffer(true).expect(200);
  expect(answer.headers['content-type']).toBe('image/tiff');
  expect(answer.headers['content-disposition']).toBe('attachment; filename=cccccccc0000.tif');
  expect(String(answer.body)).toBe('abcd');
});

test('the decoded counts come packed or plain, with size and levels beside them', async () => {
  for (const encoding of ['gzip', 'identity']) {
    const answer = await call(app, endpoints.plane, { token, params: params() })
      .set('Accept-Encoding', encoding)
      .buffer(true)
      .expect(200);
    expect(answer.headers['content-encoding']).toBe(encoding === 'gzip' ? 'gzip' : undefined);
    expect(answer.headers).toMatchObject({ 'x-width': '2', 'x-height': '1', 'x-black': '64', 'x-white': '4095' });
    expect([...(answer.body as Buffer)]).toEqual([1, 0, 2, 1]);
  }
});

test('counts are read little-endian, on even and odd addresses', () => {
  const bytes = Buffer.from([0, 1, 0, 2, 1]);
  for (const start of [0, 1]) {
    const plane = { widthPx: 2, heightPx: 1, encoding: 'uint16-le', bytes: bytes.subarray(start, start + 4) };
    expect([...toCountPlane(plane).data]).toEqual(start === 0 ? [256, 512] : [1, 258]);
  }
  const short = { widthPx: 3, heightPx: 1, encoding: 'uint16-le', bytes };
  expect(() => toCountPlane(short)).toThrow(/has 5 bytes/);
});

test('a thumbnail wears the own colour of its wavelength', async () => {
  for (const [theme, wavelengthNm] of [
    ['dark', 632.8],
    ['light', 532],
    ['dark', null],
  ] as const) {
    const query = { theme, ...(wavelengthNm !== null && { wavelengthNm: String(wavelengthNm) }) };
    const answer = await call(app, endpoints.thumbnail, { token, params: params(), query }).buffer(true).expect(200);
    expect(answer.headers['content-type']).toBe('image/png');
    const { data, info } = await sharp(answer.body as Buffer)
      .raw()
      .toBuffer({ resolveWithObject: true });
    expect(info).toMatchObject({ width: 2, height: 1, channels: 3 });
    const map = ownColourMap(wavelengthNm, theme);
    expect([...data]).toEqual([...map.subarray(3, 6), ...map.subarray(6, 9)]);
  }
});

test('a line profile is read from the decoded counts, as numbers and as CSV', async () => {
  const query = { x0: '0', y0: '0', x1: '1', y1: '0' };
  const answer = await call(app, endpoints.lineProfile, { token, params: params(), query }).expect(200);
  expect(answer.body).toMatchObject({ distancePx: [0, 1], xPx: [0, 1], meanCounts: [1, 258] });
  const csv = await call(app, endpoints.lineProfileCsv, {
    token,
    params: params(),
    query: { ...query, pixelPitchUm: '5' },
  });
  expect(csv.headers['content-type']).toBe('text/csv; charset=utf-8');
  expect(csv.text).toBe(
    'distance_px,distance_mm,x_px,y_px,mean_counts,standard_error_counts\r\npx,mm,px,px,counts,counts\r\n' +
      '0,0,0,0,1,\r\n1,0.005,1,0,258,\r\n',
  );
});

test('a line far outside of the frame is refused by its end', async () => {
  const query = { x0: '0', y0: '0', x1: '1e9', y1: '0' };
  const refused = await call(app, endpoints.lineProfile, { token, params: params(), query }).expect(400);
  expect(Object.keys(refused.body.fields)).toEqual(['x1']);
});

test('a frame that is not decoded yet, or cannot be, has its file and no picture', async () => {
  const laboratory = scoped(app.database, manager.session.membership.laboratoryId);
  const stored = { byteSize: 4, chunkCount: 1, state: 'stored', sha256: '7'.repeat(64) } as const;
  const frameId = await laboratory.insert(FrameEntity, stored);
  const waiting = await call(app, endpoints.plane, { token, params: { frameId } }).expect(404);
  expect(waiting.body.detail).toMatch(/not been decoded yet/);
  await laboratory.update(FrameEntity, { id: frameId }, { state: 'unusable', problem: 'It is cut off.' });
  const unusable = await call(app, endpoints.thumbnail, { token, params: { frameId } }).expect(404);
  expect(unusable.body.detail).toBe('There is no picture: It is cut off.');
});

test('a frame that is still arriving is shown to nobody', async () => {
  const laboratory = scoped(app.database, manager.session.membership.laboratoryId);
  const frameId = await laboratory.insert(FrameEntity, { state: 'storing' });
  for (const endpoint of [endpoints.original, endpoints.plane, endpoints.thumbnail]) {
    await call(app, endpoint, { token, params: { frameId } }).expect(404);
  }
});
