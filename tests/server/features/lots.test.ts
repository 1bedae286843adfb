import { endpoints } from '../../../shared/contracts/endpoints';
import { scoped } from '../../../server/database/LaboratoryScope';
import { CaptureEntity } from '../../../server/entities/CaptureEntity';
import { CaptureFrameEntity } from '../../../server/entities/CaptureFrameEntity';
import { FrameEntity } from '../../../server/entities/FrameEntity';
import { MeasurementEntity } from '../../../server/entities/MeasurementEntity';
import { call } from '../support/call';
import { measuredResult, measuredRun } from '../support/fillLaboratory';
import { join, registerLaboratory, type SignedIn } from '../support/people';
import { addBench, addClient, addLot, pinhole } from '../support/records';
import { startTestApp, type TestApp } from '../support/startTestApp';

let app: TestApp;
let token: string;
let manager: SignedIn;
let clientId: string;
beforeAll(async () => {
  app = await startTestApp();
});
beforeEach(async () => {
  manager = await registerLaboratory(app);
  token = manager.token;
  clientId = await addClient(app, token);
});
afterAll(() => app?.stop());

let hashes = 0;
/** Keeps runs of one millisecond in the order in which they were added. */
let runs = 0;
/** Writes a capture of an aperture with one light, past the API; returns what adds runs of that frame. */
async function addLight(apertureId: string, leftOut = false) {
  const laboratory = scoped(app.database, manager.session.membership.laboratoryId);
  const createdBy = manager.session.user.id;
  const [known] = await laboratory.query<{ id: string }>('select id from bench_revision where laboratory_id = $1');
  const benchRevisionId = known?.id ?? (await addBench(app, token)).current.id;
  const captureId = await laboratory.insert(CaptureEntity, { apertureId, benchRevisionId, createdBy });
  const frameId = await laboratory.insert(FrameEntity, { sha256: String((hashes += 1)).padStart(64, '0') });
  const place = { captureId, frameId, kind: 'light', name: 'x.tif', leftOut, createdBy } as const;
  const captureFrameId = await laboratory.insert(CaptureFrameEntity, place);
  return (end: 'measured' | 'refused' | 'waiting', sizeUm = 200) => {
    const { settings } = measuredRun;
    const run = {
      captureId,
      captureFrameId,
      createdBy,
      settings,
      createdAt: new Date(Date.now() + (runs += 1)),
      finishedAt: new Date(),
    };
    const message = 'stands in for a result';
    if (end === 'measured') {
      const result = measuredResult('x');
      const { sizeUm: _size, ...measured } = measuredRun;
      return laboratory.insert(MeasurementEntity, { ...measured, flags: [], ...run, sizeUm, result });
    }
    if (end === 'refused') {
      const result = { id: 'x', status: 'refused', reason: 'clipped', message, engine: 'x', timingsMs: null } as const;
      return laboratory.insert(MeasurementEntity, { ...run, state: 'refused', reason: 'clipped', message, result });
    }
    return laboratory.insert(MeasurementEntity, { ...run, finishedAt: null });
  };
}

test('a lot is added for a client, changed and listed, newest first', async () => {
  const first = await addLot(app, token, { number: 'L-1', clientId, dueOn: '2027-03-04' });
  expect(first).toMatchObject({
    number: 'L-1',
    clientName: 'Fine Optics',
    dueOn: '2027-03-04',
    apertureCount: 0,
    measuredCount: 0,
    apertures: [],
  });
  await addLot(app, token, { number: 'L-2', clientId });
  const body = { number: 'L-1a', clientId, orderReference: 'PO 7', dueOn: null, note: 'careful' };
  const changed = await call(app, endpoints.updateLot, { token, params: { lotId: first.id }, body }).expect(200);
  expect(changed.body).toMatchObject(body);
  const list = await call(app, endpoints.lots, { token }).expect(200);
  expect(list.body.map(({ number }: { number: string }) => number)).toEqual(['L-2', 'L-1a']);
});

test('a lot number that is taken, and a client of another laboratory, are refused by field', async () => {
  await addLot(app, token, { number: 'L-1', clientId });
  const taken = await call(app, endpoints.createLot, { token, body: { number: 'L-1', clientId } }).expect(409);
  expect(taken.body.fields.number).toMatch(/has this number/);
  const other = await registerLaboratory(app);
  const foreign = await addClient(app, other.token);
  const body = { number: 'L-9', clientId: foreign };
  const refused = await call(app, endpoints.createLot, { token, body }).expect(400);
  expect(refused.body.fields).toEqual({ clientId: 'Choose a client of the laboratory.' });
  await addLot(app, other.token, { number: 'L-1', clientId: foreign });
});

test('clients are added, changed, and have names of their own', async () => {
  const taken = await call(app, endpoints.createClient, { token, body: { name: 'Fine Optics' } }).expect(409);
  expect(taken.body.fields.name).toMatch(/has this name/);
  const body = { name: 'Finer Optics', address: '1 Lens Lane' };
  const changed = await call(app, endpoints.updateClient, { token, params: { clientId }, body }).expect(200);
  expect(changed.body).toMatchObject({ id: clientId, ...body });
  expect((await call(app, endpoints.clients, { token })).body).toHaveLength(1);
});

test('apertures are added all or none, and repeated serials are named', async () => {
  const lot = await addLot(app, token, { number: 'L-1', clientId }, ['P10', 'P2', 'P1']);
  expect(lot.apertures.map(({ serial }) => serial)).toEqual(['P1', 'P2', 'P10']);
  expect(lot.apertures[0]).toMatchObject({ lotNumber: 'L-1', nominalSizeUm: 200, toleranceUm: 2, newest: null });
  const body = { apertures: ['P3', 'P2', 'P4', 'P4'].map(pinhole) };
  const params = { lotId: lot.id };
  const refused = await call(app, endpoints.addApertures, { token, params, body }).expect(409);
  expect(refused.body.fields).toEqual({
    'apertures.1.serial': 'P2 is in the lot already. Serial numbers are unique within a lot.',
    'apertures.3.serial': 'P4 is in this list twice. Serial numbers are unique within a lot.',
  });
  const after = await call(app, endpoints.lot, { token, params }).expect(200);
  expect(after.body.apertureCount).toBe(3);
  await addLot(app, token, { number: 'L-2', clientId }, ['P1']);
});

test('five hundred apertures are added at once, and no more', async () => {
  const serials = Array.from({ length: 500 }, (_, index) => `P${index + 1}`);
  const lot = await addLot(app, token, { number: 'L-1', clientId }, serials);
  expect(lot.apertureCount).toBe(500);
  expect(lot.apertures.map(({ serial }) => serial)).toEqual(serials);
  const body = { apertures: Array.from({ length: 501 }, (_, index) => pinhole(`Q${index}`)) };
  await call(app, endpoints.addApertures, { token, params: { lotId: lot.id }, body }).expect(400);
});

test('an aperture is changed, and its serial stays unique in the lot', async () => {
  const lot = await addLot(app, token, { number: 'L-1', clientId }, ['P1', 'P2']);
  const params = { apertureId: lot.apertures[0]?.id as string };
  const body = { ...pinhole('P1b'), nominalSizeUm: 150, toleranceUm: null };
  const changed = await call(app, endpoints.updateAperture, { token, params, body }).expect(200);
  expect(changed.body).toMatchObject({ ...body, lotNumber: 'L-1' });
  const taken = await call(app, endpoints.updateAperture, { token, params, body: pinhole('P2') }).expect(409);
  expect(taken.body.fields).toHaveProperty('serial');
  expect((await call(app, endpoints.aperture, { token, params })).body).toEqual(changed.body);
});

test('apertures are searched by part of serial, lot number or client, whatever the case', async () => {
  const other = await addClient(app, token, 'Slit & Co 100%');
  await addLot(app, token, { number: 'A-7', clientId }, ['P1', 'Q_2']);
  await addLot(app, token, { number: 'B-8', clientId: other }, ['P3']);
  const search = async (text: string): Promise<string[]> => {
    const answer = await call(app, endpoints.apertures, { token, query: { search: text } }).expect(200);
    return answer.body.map(({ serial }: { serial: string }) => serial);
  };
  expect(await search('')).toEqual(['P3', 'P1', 'Q_2']);
  expect(await search('q_')).toEqual(['Q_2']);
  expect(await search('a-7')).toEqual(['P1', 'Q_2']);
  expect(await search('100%')).toEqual(['P3']);
  expect(await search('%')).toEqual(['P3']);
  expect(await search('nothing')).toEqual([]);
});

test('counts and newest results follow the newest run of each frame that is not left out', async () => {
  const lot = await addLot(app, token, { number: 'L-1', clientId }, ['P1', 'P2', 'P3', 'P4']);
  const [p1, p2, p3] = lot.apertures.map(({ id }) => id) as [string, string, string, string];
  const one = await addLight(p1);
  await one('refused');
  await one('measured', 201);
  await (
    await addLight(p2)
  )('refused');
  const third = await addLight(p3);
  await third('measured');
  await third('refused');
  await (
    await addLight(p3, true)
  )('measured', 999);
  const detail = await call(app, endpoints.lot, { token, params: { lotId: lot.id } }).expect(200);
  expect(detail.body).toMatchObject({ apertureCount: 4, measuredCount: 1, refusedCount: 2 });
  expect(detail.body.apertures.map((aperture: { newest: unknown }) => aperture.newest)).toMatchObject([
    { state: 'measured', sizeUm: 201, expandedUncertaintyUm: 0.216, reason: null },
    { state: 'refused', sizeUm: null, reason: 'clipped' },
    { state: 'refused' },
    null,
  ]);
});

test('a later frame that is refused does not hide the size of an aperture; one under way shows', async () => {
  const lot = await addLot(app, token, { number: 'L-1', clientId }, ['P1']);
  const apertureId = lot.apertures[0]?.id as string;
  const read = async () => {
    const { body } = await call(app, endpoints.lot, { token, params: { lotId: lot.id } }).expect(200);
    return { newest: body.apertures[0].newest, refusedCount: body.refusedCount };
  };
  await (
    await addLight(apertureId)
  )('measured', 201);
  await (
    await addLight(apertureId)
  )('refused');
  expect(await read()).toMatchObject({ newest: { state: 'measured', sizeUm: 201 }, refusedCount: 0 });
  await (
    await addLight(apertureId)
  )('waiting');
  expect(await read()).toMatchObject({ newest: { state: 'waiting' } });
});

test('a client sees its own lots and how far they are, and no result, note or refusal', async () => {
  const otherClient = await addClient(app, token, 'Other');
  const own = await addLot(app, token, { number: 'L-1', clientId, note: 'handle with care' }, ['P1', 'P2']);
  const foreign = await addLot(app, token, { number: 'L-2', clientId: otherClient }, ['P1']);
  await (
    await addLight(own.apertures[0]?.id as string)
  )('measured');
  await (
    await addLight(own.apertures[1]?.id as string)
  )('refused');
  const person = await join(app, manager, 'client', clientId);
  const lots = await call(app, endpoints.lots, { token: person.token }).expect(200);
  expect(lots.body).toMatchObject([{ id: own.id, measuredCount: 1, refusedCount: 0, note: '' }]);
  expect(lots.body).toHaveLength(1);
  const detail = await call(app, endpoints.lot, { token: person.token, params: { lotId: own.id } }).expect(200);
  expect(detail.body.apertures).toMatchObject([{ newest: null }, { newest: null }]);
  await call(app, endpoints.lot, { token: person.token, params: { lotId: foreign.id } }).expect(404);
  const today = await call(app, endpoints.today, { token: person.token }).expect(200);
  expect(today.body).toEqual({
    next: null,
    running: 0,
    refusals: [],
    recent: [],
    lots: [expect.objectContaining({ id: own.id, note: '' })],
    week: { measured: 0, refused: 0 },
  });
});

test('today shows what is next, what runs, what was refused and what is new', async () => {
  await addLot(app, token, { number: 'Later', clientId, dueOn: '2027-05-01' }, ['P1']);
  const soon = await addLot(app, token, { number: 'Soon', clientId, dueOn: '2027-01-02' }, ['P10', 'P2', 'P1', 'P3']);
  await addLot(app, token, { number: 'Undated', clientId }, ['P1']);
  const done = await addLot(app, token, { number: 'Done', clientId, dueOn: '2026-12-24' }, ['P1']);
  const [p1, p2] = soon.apertures.map(({ id }) => id) as [string, string];
  await (
    await addLight(done.apertures[0]?.id as string)
  )('measured', 150);
  await (
    await addLight(p1)
  )('refused');
  await (
    await addLight(p2)
  )('waiting');
  const today = (await call(app, endpoints.today, { token }).expect(200)).body;
  expect(today.next).toMatchObject({ serial: 'P3', lotNumber: 'Soon', nominalSizeUm: 200, toleranceUm: 2 });
  expect(today.running).toBe(1);
  expect(today.week).toEqual({ measured: 1, refused: 1 });
  expect(today.refusals).toMatchObject([{ state: 'refused', reason: 'clipped', apertureSerial: 'P1' }]);
  expect(today.recent).toMatchObject([{ state: 'measured', sizeUm: 150, lotNumber: 'Done' }]);
  expect(today.lots.map(({ number }: { number: string }) => number)).toEqual(['Soon', 'Later', 'Undated']);
});

test('today is calm in a laboratory that has nothing yet', async () => {
  const fresh = await registerLaboratory(app);
  const today = await call(app, endpoints.today, { token: fresh.token }).expect(200);
  expect(today.body).toEqual({
    next: null,
    running: 0,
    refusals: [],
    recent: [],
    lots: [],
    week: { measured: 0, refused: 0 },
  });
});
