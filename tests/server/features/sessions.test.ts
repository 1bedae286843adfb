import jwt from 'jsonwebtoken';
import { endpoints } from '../../../shared/contracts/endpoints';
import { REFRESH_GRACE_MS, SESSION_MS } from '../../../server/features/accounts/sessionService';
import { call, refreshTokenOf } from '../support/call';
import { join, newEmail, newestMail, password, registerLaboratory, signIn, tokenOf } from '../support/people';
import { startTestApp, tokenSecret, type TestApp } from '../support/startTestApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app?.stop());

const refresh = (cookie?: string) => call(app, endpoints.refresh, { cookie });

test('registering makes a laboratory with its manager, signed in', async () => {
  const manager = await registerLaboratory(app, 'Slit house');
  expect(manager.session).toMatchObject({
    user: { email: manager.email, name: 'Mara Manager' },
    membership: { laboratoryName: 'Slit house', role: 'manager' },
    expiresInSeconds: 600,
  });
  const claims = jwt.decode(manager.token) as jwt.JwtPayload;
  expect((claims.exp as number) - (claims.iat as number)).toBe(600);
});

test('the refresh cookie is out of reach of scripts and of other sites', async () => {
  const body = { laboratoryName: 'Lab', name: 'Ann', email: newEmail(), password };
  const response = await call(app, endpoints.register, { body }).expect(201);
  const cookie = String(response.headers['set-cookie']);
  expect(cookie).toMatch(/^ringwright_refresh=[\w-]{43};/);
  for (const part of ['HttpOnly', 'Secure', 'SameSite=Strict', 'Path=/api/session']) expect(cookie).toContain(part);
  expect(response.text).not.toContain(refreshTokenOf(response));
});

test('an address that has an account registers a second laboratory only with its password', async () => {
  const { email } = await registerLaboratory(app);
  const body = { laboratoryName: 'Second', name: 'Other', email, password: 'not the password' };
  const refused = await call(app, endpoints.register, { body }).expect(409);
  expect(refused.body.fields.email).toMatch(/account with this address exists/);
  const second = await call(app, endpoints.register, { body: { ...body, password } }).expect(201);
  expect(second.body.memberships).toHaveLength(2);
  expect(second.body.membership.laboratoryName).toBe('Second');
  expect(second.body.user.name).toBe('Mara Manager');
});

test('two registrations of one address at once leave one account', async () => {
  const body = { laboratoryName: 'Race', name: 'Ann', email: newEmail(), password };
  const answers = await Promise.all([1, 2, 3].map(() => call(app, endpoints.register, { body })));
  const rows = await app.database.query('select id from app_user where email = $1', [body.email]);
  expect(rows).toHaveLength(1);
  expect(answers.map(({ status }) => status)).toContain(201);
  for (const { status } of answers) expect([201, 409]).toContain(status);
});

test('a wrong password and an unknown address get the same answer', async () => {
  const { email } = await registerLaboratory(app);
  const wrong = await call(app, endpoints.signIn, { body: { email, password: 'something else' } }).expect(401);
  const unknown = await call(app, endpoints.signIn, { body: { email: newEmail(), password } }).expect(401);
  expect(wrong.type).toBe('application/problem+json');
  expect({ ...wrong.body, id: '' }).toEqual({ ...unknown.body, id: '' });
  expect(wrong.body.id).toMatch(/^[0-9a-f]{12}$/);
});

test('the address may be typed with capitals and blanks', async () => {
  const { email } = await registerLaboratory(app);
  await signIn(app, `  ${email.toUpperCase()} `);
});

test('refresh gives a new access token and a new refresh token, and the new one goes on', async () => {
  const first = await registerLaboratory(app);
  const second = await refresh(first.refreshToken).expect(200);
  expect(refreshTokenOf(second)).not.toBe(first.refreshToken);
  expect(second.body.membership).toEqual(first.session.membership);
  await call(app, endpoints.lasers, { token: second.body.accessToken }).expect(200);
  await refresh(refreshTokenOf(second)).expect(200);
});

test('two tabs that refresh with the same token at once are both served, and so is each successor', async () => {
  const { refreshToken } = await registerLaboratory(app);
  const [one, other] = await Promise.all([refresh(refreshToken).expect(200), refresh(refreshToken).expect(200)]);
  expect(refreshTokenOf(one)).not.toBe(refreshTokenOf(other));
  await refresh(refreshTokenOf(one)).expect(200);
  await refresh(refreshTokenOf(other)).expect(200);
});

test('a spent token used after the grace ends the whole family, and no other session', async () => {
  const stolen = await registerLaboratory(app);
  const elsewhere = await signIn(app, stolen.email);
  const rightful = await refresh(stolen.refreshToken).expect(200);
  app.passTime(REFRESH_GRACE_MS - 1000);
  const late = await refresh(stolen.refreshToken).expect(200);
  app.passTime(2000);
  await refresh(stolen.refreshToken).expect(401);
  await refresh(refreshTokenOf(rightful)).expect(401);
  await refresh(refreshTokenOf(late)).expect(401);
  await refresh(elsewhere.refreshToken).expect(200);
});

test('a session that is not used for thirty days ends', async () => {
  const { refreshToken } = await registerLaboratory(app);
  app.passTime(SESSION_MS + 1000);
  await refresh(refreshToken).expect(401);
});

test('no cookie, an invented token, or a request of another site refresh nothing', async () => {
  await refresh().expect(401);
  await refresh('invented').expect(401);
  const { refreshToken } = await registerLaboratory(app);
  await refresh(refreshToken).set('X-Requested-With', 'XMLHttpRequest').expect(403);
  await call(app, endpoints.signOut, { cookie: refreshToken }).unset('X-Requested-With').expect(403);
  await refresh(refreshToken).expect(200);
});

test('signing out ends the session and clears the cookie; doing it twice is no error', async () => {
  const { refreshToken } = await registerLaboratory(app);
  const response = await call(app, endpoints.signOut, { cookie: refreshToken }).expect(204);
  expect(String(response.headers['set-cookie'])).toMatch(/ringwright_refresh=;.*Expires=Thu, 01 Jan 1970/);
  await refresh(refreshToken).expect(401);
  await call(app, endpoints.signOut, { cookie: refreshToken }).expect(204);
  await call(app, endpoints.signOut).expect(204);
});

test('refresh tokens and passwords are not in the database in the clear', async () => {
  const { refreshToken, email } = await registerLaboratory(app);
  const [dump] = await app.database.query(
    `select (select string_agg(s::text, ' ') from refresh_session s) || (select string_agg(u::text, ' ') from app_user u) as text`,
  );
  expect(dump.text).toContain(email);
  expect(dump.text).not.toContain(refreshToken);
  expect(dump.text).not.toContain(password);
});

test('access tokens that are forged, unsigned, ended or of another use are not taken', async () => {
  const { token } = await registerLaboratory(app);
  const claims = jwt.decode(token) as jwt.JwtPayload;
  const forged = [
    jwt.sign(claims, 'another secret, which is long enough too'),
    jwt.sign(claims, '', { algorithm: 'none' }),
    jwt.sign({ ...claims, exp: Math.floor(Date.now() / 1000) - 1 }, tokenSecret),
    jwt.sign({ ...claims, iss: 'somebody' }, tokenSecret),
    jwt.sign({ ...claims, role: 'owner' }, tokenSecret),
    jwt.sign(claims, tokenSecret, { algorithm: 'HS512' }),
    `${token.slice(0, -4)}AAAA`,
    '',
  ];
  for (const each of forged) await call(app, endpoints.lasers, { token: each }).expect(401);
  await call(app, endpoints.lasers, { token }).expect(200);
  await call(app, endpoints.lasers).set('Authorization', `Basic ${token}`).expect(401);
});

test('a person of two laboratories switches between them, and refresh stays in the chosen one', async () => {
  const first = await registerLaboratory(app, 'First');
  const body = { laboratoryName: 'Second', name: 'x', email: first.email, password };
  const second = await call(app, endpoints.register, { body }).expect(201);
  const switched = await call(app, endpoints.switchLaboratory, {
    token: second.body.accessToken,
    cookie: refreshTokenOf(second),
    body: { laboratoryId: first.session.membership.laboratoryId },
  }).expect(200);
  expect(switched.body.membership.laboratoryName).toBe('First');
  const refreshed = await refresh(refreshTokenOf(switched)).expect(200);
  expect(refreshed.body.membership.laboratoryName).toBe('First');
  // Another tab that still holds the token from before the switch ends up in the same laboratory.
  const otherTab = await refresh(refreshTokenOf(second)).expect(200);
  expect(otherTab.body.membership.laboratoryName).toBe('First');
});

test('switching to a laboratory one does not belong to, or belonged to, is refused', async () => {
  const one = await registerLaboratory(app);
  const other = await registerLaboratory(app);
  const laboratoryId = other.session.membership.laboratoryId;
  await call(app, endpoints.switchLaboratory, { token: one.token, body: { laboratoryId } }).expect(404);
});

test('changing the password ends every other session and keeps this one', async () => {
  const here = await registerLaboratory(app);
  const elsewhere = await signIn(app, here.email);
  const newPassword = 'another good password';
  const wrong = await call(app, endpoints.changePassword, {
    token: here.token,
    body: { currentPassword: 'wrong one', newPassword },
  }).expect(400);
  expect(wrong.body.fields).toHaveProperty('currentPassword');
  await call(app, endpoints.changePassword, {
    token: here.token,
    body: { currentPassword: password, newPassword },
  }).expect(204);
  await refresh(elsewhere.refreshToken).expect(401);
  await call(app, endpoints.switchLaboratory, {
    token: elsewhere.token,
    body: { laboratoryId: here.session.membership.laboratoryId },
  }).expect(401);
  await refresh(here.refreshToken).expect(200);
  await call(app, endpoints.signIn, { body: { email: here.email, password } }).expect(401);
  await signIn(app, here.email, newPassword);
  expect((await newestMail(app, here.email)).kind).toBe('password-changed');
});

test('a session renewed at the moment the password changes does not outlive the change', async () => {
  const here = await registerLaboratory(app);
  for (let round = 0; round < 5; round += 1) {
    const elsewhere = await signIn(app, here.email);
    const [renewed] = await Promise.all([
      refresh(elsewhere.refreshToken),
      call(app, endpoints.changePassword, {
        token: here.token,
        body: { currentPassword: password, newPassword: password },
      }).expect(204),
    ]);
    const left = renewed.status === 200 ? refreshTokenOf(renewed) : elsewhere.refreshToken;
    await refresh(left).expect(401);
  }
});

test('a forgotten password is set by a mailed link, which works once and ends every session', async () => {
  const person = await registerLaboratory(app);
  await call(app, endpoints.forgot, { body: { email: person.email } }).expect(202);
  await app.background.idle();
  const mail = await newestMail(app, person.email);
  expect(mail.text).toContain('https://rings.laboratory.example/reset?token=');
  const body = { token: tokenOf(mail), password: 'a brand new password' };
  await call(app, endpoints.reset, { body: { ...body, password: 'short' } }).expect(400);
  await call(app, endpoints.reset, { body }).expect(204);
  await call(app, endpoints.reset, { body }).expect(400);
  await refresh(person.refreshToken).expect(401);
  await signIn(app, person.email, body.password);
});

test('a link for a new password ends after an hour, and when another one has been used', async () => {
  const person = await registerLaboratory(app);
  const ask = async (): Promise<string> => {
    await call(app, endpoints.forgot, { body: { email: person.email } }).expect(202);
    await app.background.idle();
    return tokenOf(await newestMail(app, person.email));
  };
  const old = await ask();
  app.passTime(61 * 60_000);
  await call(app, endpoints.reset, { body: { token: old, password } }).expect(400);
  const first = await ask();
  const second = await ask();
  await call(app, endpoints.reset, { body: { token: second, password } }).expect(204);
  await call(app, endpoints.reset, { body: { token: first, password } }).expect(400);
});

test('asking for a new password tells nobody whether the address is known', async () => {
  const { email } = await registerLaboratory(app);
  const known = await call(app, endpoints.forgot, { body: { email } }).expect(202);
  const unknownEmail = newEmail();
  const unknown = await call(app, endpoints.forgot, { body: { email: unknownEmail } }).expect(202);
  await app.background.idle();
  expect(known.text).toBe(unknown.text);
  const rows = await app.database.query('select id from mail_message where to_address = $1', [unknownEmail]);
  expect(rows).toEqual([]);
});

test('a person changes the own name', async () => {
  const person = await registerLaboratory(app);
  const answer = await call(app, endpoints.updateAccount, { token: person.token, body: { name: ' Mara M. ' } });
  expect(answer.body).toEqual({ ...person.session.user, name: 'Mara M.' });
  expect((await refresh(person.refreshToken).expect(200)).body.user.name).toBe('Mara M.');
});

test('somebody whose access has ended everywhere cannot sign in', async () => {
  const manager = await registerLaboratory(app);
  const technician = await join(app, manager, 'technician');
  await call(app, endpoints.updatePerson, {
    token: manager.token,
    params: { membershipId: technician.session.membership.id },
    body: { active: false },
  }).expect(200);
  await refresh(technician.refreshToken).expect(401);
  const body = { email: technician.email, password };
  const answer = await call(app, endpoints.signIn, { body }).expect(403);
  expect(answer.body.detail).toMatch(/access has ended/);
});
