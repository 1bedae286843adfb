import { endpoints } from '../../../shared/contracts/endpoints';
import { call } from '../support/call';
import { registerLaboratory, type SignedIn } from '../support/people';
import { addBench, addLaser, camera, laser } from '../support/records';
import { startTestApp, type TestApp } from '../support/startTestApp';

let app: TestApp;
let token: string;
let manager: SignedIn;
beforeAll(async () => {
  app = await startTestApp();
});
beforeEach(async () => {
  manager = await registerLaboratory(app);
  token = manager.token;
});
afterAll(() => app?.stop());

test('a laser is added, listed by name and changed', async () => {
  const added = await addLaser(app, token);
  expect(added).toEqual({ ...laser, note: '', id: added.id, createdAt: expect.stringMatching(/Z$/) });
  await call(app, endpoints.createLaser, { token, body: { ...laser, name: 'Green', powerMw: null } }).expect(201);
  const changed = { ...laser, name: 'HeNe, new tube', wavelengthNm: 632.816 };
  const params = { laserId: added.id };
  const answer = await call(app, endpoints.updateLaser, { token, params, body: changed }).expect(200);
  expect(answer.body).toMatchObject({ ...changed, id: added.id });
  const list = await call(app, endpoints.lasers, { token }).expect(200);
  expect(list.body.map(({ name }: { name: string }) => name)).toEqual(['Green', 'HeNe, new tube']);
});

test('what is left out of a changed laser goes back to its default, and null clears', async () => {
  const { id: laserId } = await addLaser(app, token);
  const body = { ...laser, serial: undefined, powerMw: null };
  const answer = await call(app, endpoints.updateLaser, { token, params: { laserId }, body }).expect(200);
  expect(answer.body).toMatchObject({ serial: '', powerMw: null });
});

test('mistakes are told by field, with the unit', async () => {
  const body = { ...laser, name: ' ', wavelengthNm: -1, laserClass: '5' };
  const refused = await call(app, endpoints.createLaser, { token, body: body as typeof laser }).expect(400);
  expect(refused.body).toMatchObject({ type: 'invalid', status: 400, detail: 'Check the marked fields.' });
  expect(refused.body.fields).toEqual({
    name: 'Enter a name for the laser.',
    wavelengthNm: 'The wavelength must be more than 0 nm.',
    laserClass: 'Choose the class printed on the label.',
  });
  const levels = { ...camera, blackCount: 5000, coverGlassIndex: null };
  const pixel = await call(app, endpoints.createCamera, { token, body: levels }).expect(400);
  expect(Object.keys(pixel.body.fields).sort()).toEqual(['coverGlassIndex', 'whiteCount']);
});

test('a name that is taken is a conflict that says what to do; another laboratory may use it', async () => {
  await addBench(app, token);
  for (const [endpoint, body] of [
    [endpoints.createLaser, laser],
    [endpoints.createCamera, camera],
  ] as const) {
    const refused = await call(app, endpoint, { token, body }).expect(409);
    expect(refused.body.type).toBe('conflict');
    expect(refused.body.fields.name).toMatch(/has this name\. Choose another/);
  }
  const other = await registerLaboratory(app);
  await addBench(app, other.token);
});

test('a camera keeps every value, with or without', async () => {
  const full = await call(app, endpoints.createCamera, {
    token,
    body: { ...camera, electronsPerCount: 4, readNoiseElectrons: 10, serial: 'C-7', note: 'mono' },
  }).expect(201);
  expect(full.body).toMatchObject({ electronsPerCount: 4, readNoiseElectrons: 10, serial: 'C-7', note: 'mono' });
  const {
    name: _name,
    blackCount: _black,
    whiteCount: _white,
    coverGlassMm: _mm,
    coverGlassIndex: _n,
    ...rest
  } = camera;
  const bare = await call(app, endpoints.createCamera, { token, body: { ...rest, name: 'Bare' } }).expect(201);
  expect(bare.body).toMatchObject({ blackCount: null, whiteCount: null, coverGlassMm: null, electronsPerCount: null });
});

test('a bench begins with revision 1 and shows its laser and camera', async () => {
  const bench = await addBench(app, token);
  expect(bench.current).toMatchObject({
    revision: 1,
    distanceMm: 500,
    illumination: { kind: 'plane' },
    createdBy: 'Mara Manager',
    laser: { name: 'HeNe 1', wavelengthNm: 632.8 },
    camera: { name: 'Sensor 1', pixelPitchUm: 5.2 },
  });
});

test('a revision adds to a bench; the earlier ones stay as they were', async () => {
  const bench = await addBench(app, token);
  const { laserId, cameraId } = bench.current;
  const params = { benchId: bench.id };
  const diverging = { kind: 'diverging', sourceDistanceMm: 800 } as const;
  const body = {
    laserId,
    cameraId,
    distanceMm: 512.5,
    distanceUncertaintyMm: 0.2,
    illumination: diverging,
    note: 'moved',
  };
  await call(app, endpoints.reviseBench, { token, params, body }).expect(201);
  const gaussian = { ...body, illumination: { kind: 'gaussian', beamRadiusUm: 900 } as const };
  const answer = await call(app, endpoints.reviseBench, { token, params, body: gaussian }).expect(201);
  expect(answer.body.current).toMatchObject({ revision: 3, illumination: gaussian.illumination });
  const detail = await call(app, endpoints.bench, { token, params }).expect(200);
  expect(detail.body.revisions).toMatchObject([
    { revision: 3, distanceMm: 512.5, illumination: gaussian.illumination },
    { revision: 2, distanceMm: 512.5, illumination: diverging, note: 'moved' },
    { revision: 1, distanceMm: 500, illumination: { kind: 'plane' } },
  ]);
  const list = await call(app, endpoints.benches, { token }).expect(200);
  expect(list.body).toMatchObject([{ id: bench.id, current: { revision: 3 } }]);
});

test('two revisions at once get two numbers', async () => {
  const bench = await addBench(app, token);
  const { laserId, cameraId } = bench.current;
  const illumination = { kind: 'plane' } as const;
  const body = { laserId, cameraId, distanceMm: 400, distanceUncertaintyMm: 0.2, illumination };
  const revise = () => call(app, endpoints.reviseBench, { token, params: { benchId: bench.id }, body }).expect(201);
  await Promise.all([revise(), revise(), revise()]);
  const detail = await call(app, endpoints.bench, { token, params: { benchId: bench.id } }).expect(200);
  expect(detail.body.revisions.map(({ revision }: { revision: number }) => revision)).toEqual([4, 3, 2, 1]);
});

test('a laser or camera of another laboratory cannot be put on a bench', async () => {
  const bench = await addBench(app, token);
  const other = await registerLaboratory(app);
  const foreign = await addBench(app, other.token);
  const { laserId, cameraId } = bench.current;
  const revision = {
    laserId,
    cameraId,
    distanceMm: 400,
    distanceUncertaintyMm: 0.2,
    illumination: { kind: 'plane' } as const,
  };
  const withLaser = { ...revision, laserId: foreign.current.laserId };
  const added = await call(app, endpoints.createBench, { token, body: { name: 'B', revision: withLaser } }).expect(400);
  expect(added.body.fields).toEqual({ 'revision.laserId': 'Choose a laser of the laboratory.' });
  const params = { benchId: bench.id };
  const withCamera = { ...revision, cameraId: foreign.current.cameraId };
  const revised = await call(app, endpoints.reviseBench, { token, params, body: withCamera }).expect(400);
  expect(revised.body.fields).toEqual({ cameraId: 'Choose a camera of the laboratory.' });
  const list = await call(app, endpoints.benches, { token }).expect(200);
  expect(list.body).toHaveLength(1);
});
