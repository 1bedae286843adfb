import type { DataSource } from 'typeorm';
import { endpoints } from '../../shared/contracts/endpoints';
import type { Endpoint } from '../../shared/contracts/endpoint';
import { roles, type Role } from '../../shared/contracts/roles';
import { nameOf } from '../../server/http/Api';
import { call } from './support/call';
import { fillLaboratory, type Filled } from './support/fillLaboratory';
import { join, newEmail, password, registerLaboratory, type SignedIn } from './support/people';
import { camera, laser, pinhole } from './support/records';
import { startTestApp, type TestApp } from './support/startTestApp';

/*
 * Walks over every endpoint of the contract: none may be without a handler, none may be called without a token or with
 * a role it is not meant for, and none may read or change anything of another laboratory.
 */

type Name = keyof typeof endpoints;
type Ids = Filled & { membershipId: string; laboratoryId: string };

const named = Object.entries(endpoints) as [Name, Endpoint][];
const closed = named.filter(([, { access }]) => typeof access !== 'string');
const rolesOf = ({ access }: Endpoint): readonly Role[] => (typeof access === 'string' ? [] : access);

let app: TestApp;
const ours = {} as Record<Role, SignedIn>;
let ourIds: Ids;
let theirIds: Ids;

beforeAll(async () => {
  app = await startTestApp();
  ours.manager = await registerLaboratory(app, 'Ours');
  ourIds = await fill(ours.manager, 'aaaaaaaa');
  for (const role of roles) {
    if (role !== 'manager')
      ours[role] = await join(app, ours.manager, role, role === 'client' ? ourIds.clientId : null);
  }
  const theirs = await registerLaboratory(app, 'Theirs');
  theirIds = await fill(theirs, 'bbbbbbbb');
});
afterAll(() => app?.stop());

async function fill({ session }: SignedIn, mark: string): Promise<Ids> {
  const { id: membershipId, laboratoryId } = session.membership;
  const filled = await fillLaboratory(app.database, laboratoryId, session.user.id, mark);
  return { ...filled, membershipId, laboratoryId };
}

const revision = ({ laserId, cameraId }: Ids) => ({
  laserId,
  cameraId,
  distanceMm: 400,
  distanceUncertaintyMm: 0.1,
  illumination: { kind: 'plane' },
});

/** A body that each endpoint takes, so that nothing but access can be what refuses it. */
const bodies: Partial<Record<Name, (ids: Ids) => object>> = {
  switchLaboratory: ({ laboratoryId }) => ({ laboratoryId }),
  changePassword: () => ({ currentPassword: password, newPassword: password }),
  updateAccount: () => ({ name: 'Somebody' }),
  updatePerson: () => ({ role: 'reviewer' }),
  invite: ({ clientId }) => ({ email: newEmail(), role: 'client', clientId }),
  createLaser: () => ({ ...laser, name: newEmail() }),
  updateLaser: () => laser,
  createCamera: () => ({ ...camera, name: newEmail() }),
  updateCamera: () => camera,
  createBench: (ids) => ({ name: newEmail(), revision: revision(ids) }),
  reviseBench: revision,
  createClient: () => ({ name: newEmail() }),
  updateClient: () => ({ name: 'Another name' }),
  createLot: ({ clientId }) => ({ number: newEmail().slice(0, 12), clientId }),
  updateLot: ({ clientId }) => ({ number: 'L-7', clientId }),
  addApertures: () => ({ apertures: [pinhole('P1')] }),
  updateAperture: () => pinhole('P1'),
  createCapture: ({ apertureId, benchId }) => ({ apertureId, benchId }),
  placeKnown: ({ sha256 }) => ({ files: [{ name: 'x.tif', kind: 'dark', sha256 }] }),
  upload: () => ({ kind: 'dark' }),
  updatePlace: () => ({ leftOut: true }),
  measureCapture: () => ({}),
  measureAgain: () => ({}),
};
/** A query that each endpoint needs or that names a row. */
const queries: Partial<Record<Name, (ids: Ids) => Record<string, string>>> = {
  apertures: () => ({ search: 'bbbb' }),
  captures: ({ apertureId, lotId }) => ({ apertureId, lotId }),
  measurements: ({ apertureId, lotId }) => ({ apertureId, lotId }),
  compared: ({ measurementId }) => ({ ids: measurementId }),
  lineProfile: () => ({ x0: '0', y0: '0', x1: '1', y1: '0' }),
  lineProfileCsv: () => ({ x0: '0', y0: '0', x1: '1', y1: '0' }),
};

/** Calls an endpoint with a good body and query about the given rows. */
function attempt(name: Name, endpoint: Endpoint, ids: Ids, token?: string, params: Ids = ids) {
  const query = queries[name]?.(ids) ?? {};
  const body = bodies[name]?.(ids);
  if (!endpoint.multipart) return call(app, endpoint, { token, params: { ...params }, query, body });
  const upload = call(app, endpoint, { token, params: { ...params }, query });
  for (const [field, value] of Object.entries(body ?? {})) void upload.field(field, String(value));
  return upload.attach('file', Buffer.from('not a picture'), 'x.tif');
}

/** Everything that a laboratory holds, as text. */
async function everythingOf(database: DataSource, laboratoryId: string): Promise<string> {
  const tables: { name: string }[] = await database.query(
    `select distinct table_name as name from information_schema.columns
      where column_name = 'laboratory_id' and table_schema = 'public' order by 1`,
  );
  const parts: string[] = [];
  for (const { name } of tables) {
    const [row] = await database.query(
      `select md5(string_agg(r::text, ' ' order by r::text)) as hash, count(*) as n from ${name} r where laboratory_id = $1`,
      [laboratoryId],
    );
    parts.push(`${name} ${row.n} ${row.hash}`);
  }
  return parts.join('\n');
}

test('every endpoint of the contract has a handler, and nothing else does', () => {
  expect([...app.registered].sort()).toEqual(named.map(([, endpoint]) => nameOf(endpoint)).sort());
});

test('every endpoint that takes a body is tried with one', () => {
  for (const [name, { body }] of closed) {
    expect([name, bodies[name] !== undefined]).toEqual([name, !body.safeParse(undefined).success]);
  }
});

test.each(closed)('%s asks who calls', async (name, endpoint) => {
  for (const token of [undefined, 'invented']) {
    const answer = await attempt(name, endpoint, ourIds, token);
    expect([name, answer.status, answer.body.type]).toEqual([name, 401, 'not-signed-in']);
    expect(answer.headers['www-authenticate']).toBe('Bearer');
  }
});

test.each(closed)('%s is closed to the roles it is not meant for', async (name, endpoint) => {
  for (const role of roles.filter((each) => !rolesOf(endpoint).includes(each))) {
    const answer = await attempt(name, endpoint, ourIds, ours[role].token);
    expect([name, role, answer.status, answer.body.type]).toEqual([name, role, 403, 'forbidden']);
  }
});

const withParams = closed.filter(([, { path }]) => path.includes(':'));

test.each(withParams)('%s finds nothing of another laboratory', async (name, endpoint) => {
  const before = await everythingOf(app.database, theirIds.laboratoryId);
  const keys = [...endpoint.path.matchAll(/:(\w+)/g)].map(([, key]) => key as keyof Ids);
  // All of the path foreign, and each part of it alone.
  const foreign = [theirIds, ...keys.map((key) => ({ ...ourIds, [key]: theirIds[key] }))];
  for (const role of rolesOf(endpoint)) {
    for (const params of foreign) {
      const answer = await attempt(name, endpoint, ourIds, ours[role].token, params);
      expect([name, role, answer.status, answer.body.type]).toEqual([name, role, 404, 'not-found']);
    }
  }
  expect(await everythingOf(app.database, theirIds.laboratoryId)).toBe(before);
});

const readable = withParams.filter(([, { method }]) => method === 'get');

test.each(readable)('%s finds the own row, so that the refusal above means something', async (name, endpoint) => {
  const answer = await attempt(name, endpoint, ourIds, ours.manager.token);
  expect([name, answer.status]).toEqual([name, 200]);
});

const lists = closed.filter(([, { method, path, kind }]) => method === 'get' && !path.includes(':') && kind === 'json');

test.each(lists)('%s shows nothing of another laboratory, whatever is asked for', async (name, endpoint) => {
  const marks = [...Object.values(theirIds), 'bbbbbbbb'];
  for (const role of rolesOf(endpoint)) {
    const asked = [theirIds, ourIds].map((ids) => attempt(name, endpoint, ids, ours[role].token));
    for (const answer of await Promise.all(asked)) {
      for (const mark of marks) expect([name, role, answer.text.includes(mark)]).toEqual([name, role, false]);
    }
  }
});

/** Endpoints whose body names rows, each with the one foreign row put in. */
const naming: [Name, (keyof Filled | 'laboratoryId')[]][] = [
  ['switchLaboratory', ['laboratoryId']],
  ['invite', ['clientId']],
  ['createBench', ['laserId']],
  ['createBench', ['cameraId']],
  ['reviseBench', ['laserId']],
  ['reviseBench', ['cameraId']],
  ['createLot', ['clientId']],
  ['updateLot', ['clientId']],
  ['createCapture', ['apertureId']],
  ['createCapture', ['benchId']],
];

test.each(naming)('%s takes no %s of another laboratory', async (name, keys) => {
  const endpoint: Endpoint = endpoints[name];
  const foreign = Object.fromEntries(keys.map((key) => [key, theirIds[key]]));
  const own = await everythingOf(app.database, ourIds.laboratoryId);
  const other = await everythingOf(app.database, theirIds.laboratoryId);
  for (const role of rolesOf(endpoint).filter((each) => each !== 'client' || name === 'switchLaboratory')) {
    const answer = await attempt(name, endpoint, { ...ourIds, ...foreign }, ours[role].token, ourIds);
    expect([400, 404]).toContain(answer.status);
  }
  expect(await everythingOf(app.database, ourIds.laboratoryId)).toBe(own);
  expect(await everythingOf(app.database, theirIds.laboratoryId)).toBe(other);
});

test('frames that only another laboratory holds are not known here', async () => {
  const body = { files: [{ name: 'x.tif', kind: 'light' as const, sha256: theirIds.sha256 }] };
  const params = { captureId: ourIds.captureId };
  const answer = await call(app, endpoints.placeKnown, { token: ours.manager.token, params, body }).expect(200);
  expect(answer.body).toEqual({ missing: [theirIds.sha256] });
});
