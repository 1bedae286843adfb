import { endpoints } from '../../../shared/contracts/endpoints';
import { INVITATION_DAYS } from '../../../server/features/people/invitationService';
import { call } from '../support/call';
import { join, newEmail, newestMail, password, registerLaboratory, signIn, tokenOf } from '../support/people';
import { startTestApp, type TestApp } from '../support/startTestApp';

const DAY_MS = 86_400_000;

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app?.stop());

const invite = async (token: string, email = newEmail()) => {
  const invitation = await call(app, endpoints.invite, { token, body: { email, role: 'technician' } }).expect(201);
  return { email, invitation: invitation.body, token: tokenOf(await newestMail(app, email)) };
};
const accept = (token: string, secret = password) =>
  call(app, endpoints.acceptInvitation, { body: { token, name: 'Tess', password: secret } });

test('an invited person learns what is offered, joins with the role, and the link works once', async () => {
  const manager = await registerLaboratory(app, 'Aperture room');
  const { email, token, invitation } = await invite(manager.token);
  expect(invitation).toMatchObject({ email, role: 'technician', clientId: null, invitedBy: 'Mara Manager' });
  const mail = await newestMail(app, email);
  expect(mail.subject).toBe('Invitation to Aperture room on Ringwright');
  expect(mail.text).toContain(`https://rings.laboratory.example/invitation?token=${token}`);
  expect(mail.text).toContain('as a technician');

  const offer = await call(app, endpoints.invitation, { params: { token } }).expect(200);
  expect(offer.body).toEqual({ laboratoryName: 'Aperture room', email, role: 'technician', knownPerson: false });

  const session = await accept(token).expect(200);
  expect(session.body.membership).toMatchObject({ laboratoryName: 'Aperture room', role: 'technician' });
  await accept(token).expect(404);
  await call(app, endpoints.invitation, { params: { token } }).expect(404);
  const open = await call(app, endpoints.invitations, { token: manager.token }).expect(200);
  expect(open.body).toEqual([]);
});

test('of two who take the same invitation up at once, one succeeds', async () => {
  const manager = await registerLaboratory(app);
  const { token } = await invite(manager.token);
  const answers = await Promise.all([accept(token), accept(token)]);
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 404]);
});

test('a known person proves to be that person by the password they have', async () => {
  const elsewhere = await registerLaboratory(app, 'Elsewhere');
  const manager = await registerLaboratory(app, 'Here');
  const { token } = await invite(manager.token, elsewhere.email);
  const offer = await call(app, endpoints.invitation, { params: { token } }).expect(200);
  expect(offer.body.knownPerson).toBe(true);
  const refused = await accept(token, 'a guessed password').expect(400);
  expect(refused.body.fields).toHaveProperty('password');
  const session = await accept(token).expect(200);
  expect(session.body.membership.laboratoryName).toBe('Here');
  expect(session.body.memberships).toHaveLength(2);
  expect(session.body.user.name).toBe('Mara Manager');
});

test('an invitation ends by time, when it is withdrawn, and when the address is invited again', async () => {
  const manager = await registerLaboratory(app);
  const late = await invite(manager.token);
  app.passTime(INVITATION_DAYS * DAY_MS + 1000);
  await accept(late.token).expect(404);
  expect((await call(app, endpoints.invitations, { token: manager.token })).body).toEqual([]);

  const withdrawn = await invite(manager.token);
  const params = { invitationId: withdrawn.invitation.id };
  await call(app, endpoints.withdrawInvitation, { token: manager.token, params }).expect(204);
  await call(app, endpoints.withdrawInvitation, { token: manager.token, params }).expect(404);
  await accept(withdrawn.token).expect(404);

  const first = await invite(manager.token);
  const second = await invite(manager.token, first.email);
  await accept(first.token).expect(404);
  await accept(second.token).expect(200);
  await accept('invented').expect(404);
});

test('a person of the laboratory is not invited again', async () => {
  const manager = await registerLaboratory(app);
  const technician = await join(app, manager, 'technician');
  const body = { email: technician.email, role: 'manager' } as const;
  const refused = await call(app, endpoints.invite, { token: manager.token, body }).expect(409);
  expect(refused.body.fields).toHaveProperty('email');
});

test('a person of a client is invited with the client, anybody else without', async () => {
  const manager = await registerLaboratory(app);
  const { token } = manager;
  const client = await call(app, endpoints.createClient, { token, body: { name: 'Fine Optics' } }).expect(201);
  const email = newEmail();
  const without = await call(app, endpoints.invite, { token, body: { email, role: 'client' } }).expect(400);
  expect(without.body.fields).toHaveProperty('clientId');
  const clientId: string = client.body.id;
  await call(app, endpoints.invite, { token, body: { email, role: 'reviewer', clientId } }).expect(400);
  const person = await join(app, manager, 'client', clientId);
  expect(person.session.membership.role).toBe('client');
});

test('a new role counts from the next token on', async () => {
  const manager = await registerLaboratory(app);
  const person = await join(app, manager, 'technician');
  const params = { membershipId: person.session.membership.id };
  const answer = await call(app, endpoints.updatePerson, { token: manager.token, params, body: { role: 'manager' } });
  expect(answer.body).toMatchObject({ email: person.email, role: 'manager', active: true });
  const next = await call(app, endpoints.refresh, { cookie: person.refreshToken }).expect(200);
  await call(app, endpoints.people, { token: next.body.accessToken }).expect(200);
});

test('ended access ends the sessions, and comes back when it is restored or by a new invitation', async () => {
  const manager = await registerLaboratory(app);
  const person = await join(app, manager, 'reviewer');
  const params = { membershipId: person.session.membership.id };
  const set = (body: { active: boolean }) => call(app, endpoints.updatePerson, { token: manager.token, params, body });
  await call(app, endpoints.lots, { token: person.token }).expect(200);
  await set({ active: false }).expect(200);
  await call(app, endpoints.lots, { token: person.token }).expect(401);
  await call(app, endpoints.refresh, { cookie: person.refreshToken }).expect(401);
  await call(app, endpoints.signIn, { body: { email: person.email, password } }).expect(403);
  await set({ active: true }).expect(200);
  await signIn(app, person.email);

  await set({ active: false }).expect(200);
  const { token } = await invite(manager.token, person.email);
  const back = await accept(token).expect(200);
  expect(back.body.membership).toMatchObject({ id: params.membershipId, role: 'technician' });
});

test('access that ends in one laboratory leaves the other one open', async () => {
  const manager = await registerLaboratory(app, 'Here');
  const person = await join(app, manager, 'technician');
  const body = { laboratoryName: 'Own', name: 'x', email: person.email, password };
  await call(app, endpoints.register, { body }).expect(201);
  const params = { membershipId: person.session.membership.id };
  await call(app, endpoints.updatePerson, { token: manager.token, params, body: { active: false } }).expect(200);
  const session = await signIn(app, person.email);
  expect(session.session.memberships.map(({ laboratoryName }) => laboratoryName)).toEqual(['Own']);
});

test('the only manager can be neither ended nor made something else; of two, one can', async () => {
  const manager = await registerLaboratory(app);
  const own = { membershipId: manager.session.membership.id };
  const change = (body: object, params = own) =>
    call(app, endpoints.updatePerson, { token: manager.token, params, body });
  const refused = await change({ active: false }).expect(409);
  expect(refused.body.fields.active).toMatch(/only manager/);
  expect((await change({ role: 'reviewer' }).expect(409)).body.fields).toHaveProperty('role');
  await join(app, manager, 'manager');
  await change({ role: 'reviewer' }).expect(200);
});

test('two managers who end each other at once leave one', async () => {
  const one = await registerLaboratory(app);
  const other = await join(app, one, 'manager');
  const end = (who: typeof one, whom: typeof one) =>
    call(app, endpoints.updatePerson, {
      token: who.token,
      params: { membershipId: whom.session.membership.id },
      body: { active: false },
    });
  const answers = await Promise.all([end(one, other), end(other, one)]);
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
});

test('people of a client stay that', async () => {
  const manager = await registerLaboratory(app);
  const { token } = manager;
  const client = await call(app, endpoints.createClient, { token, body: { name: 'Fine Optics' } }).expect(201);
  const person = await join(app, manager, 'client', client.body.id);
  const technician = await join(app, manager, 'technician');
  const change = (membershipId: string, role: 'client' | 'manager') =>
    call(app, endpoints.updatePerson, { token, params: { membershipId }, body: { role } });
  await change(person.session.membership.id, 'manager').expect(409);
  await change(technician.session.membership.id, 'client').expect(409);
});

test('people are listed with role and state', async () => {
  const manager = await registerLaboratory(app);
  const technician = await join(app, manager, 'technician');
  const people = await call(app, endpoints.people, { token: manager.token }).expect(200);
  expect(people.body).toEqual([
    expect.objectContaining({ email: manager.email, role: 'manager', active: true, clientId: null }),
    expect.objectContaining({ email: technician.email, role: 'technician', active: true }),
  ]);
  expect(people.text).not.toContain('password');
});
