import request from 'supertest';
import { endpoints } from '../../../shared/contracts/endpoints';
import { startFakeInbox } from '../../../server/mail/startFakeInbox';
import { call } from '../support/call';
import { newEmail, password, registerLaboratory } from '../support/people';
import { startTestApp } from '../support/startTestApp';

test('in the demo the sign-in page may know the sign-ins that are there, and the inbox is shown', async () => {
  const inbox = await startFakeInbox();
  const person = { role: 'manager', name: 'Dara Demo', email: newEmail(), password } as const;
  const missing = { ...person, email: newEmail() };
  const app = await startTestApp({ demo: true, inbox, demoSignIns: [person, missing] });
  try {
    const before = await call(app, endpoints.welcome).expect(200);
    expect(before.body).toEqual({ demo: true, signIns: [], inbox: true });
    const body = { laboratoryName: 'Demo', name: person.name, email: person.email, password };
    await call(app, endpoints.register, { body }).expect(201);
    expect((await call(app, endpoints.welcome)).body.signIns).toEqual([person]);
    expect((await call(app, endpoints.inbox).expect(200)).body).toEqual([]);
  } finally {
    await app.stop();
    await inbox.stop();
  }
});

test('outside of the demo there are no sign-ins and no inbox', async () => {
  const person = { role: 'manager', name: 'Dara', email: newEmail(), password } as const;
  const app = await startTestApp({ demoSignIns: [person] });
  try {
    const body = { laboratoryName: 'Real', name: person.name, email: person.email, password };
    await call(app, endpoints.register, { body }).expect(201);
    expect((await call(app, endpoints.welcome)).body).toEqual({ demo: false, signIns: [], inbox: false });
    await call(app, endpoints.inbox).expect(404);
  } finally {
    await app.stop();
  }
});

test('health says whether the database answers', async () => {
  const app = await startTestApp();
  expect((await call(app, endpoints.health).expect(200)).body).toEqual({ ok: true, database: true });
  await app.stop();
  expect((await call(app, endpoints.health).expect(503)).body).toEqual({ ok: false, database: false });
});

test('headers hold the browser to this service', async () => {
  const app = await startTestApp();
  const answer = await call(app, endpoints.health);
  const policy = String(answer.headers['content-security-policy']);
  expect(policy).toContain("default-src 'self'");
  expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval';");
  expect(policy).not.toMatch(/https?:|\*/);
  expect(answer.headers['x-powered-by']).toBeUndefined();
  expect(answer.headers['x-content-type-options']).toBe('nosniff');
  expect(answer.headers['access-control-allow-origin']).toBeUndefined();
  const missing = await request(app.express).get('/api/nowhere').expect(404);
  expect(missing.body).toMatchObject({ type: 'not-found', status: 404 });
  await app.stop();
});

test('guessing is limited: by mailbox and place for passwords, by place for links', async () => {
  const app = await startTestApp({ rateLimitFactor: 1 });
  try {
    const { email } = await registerLaboratory(app);
    const wrong = { body: { email, password: 'wrong' } };
    for (let attempt = 0; attempt < 10; attempt += 1) await call(app, endpoints.signIn, wrong).expect(401);
    const refused = await call(app, endpoints.signIn, { body: { email, password } }).expect(429);
    expect(refused.body).toMatchObject({ type: 'too-many-requests', detail: 'Wait 15 minutes, then try again.' });
    expect(refused.headers['retry-after']).toBeDefined();
    const colleague = await registerLaboratory(app);
    await call(app, endpoints.signIn, { body: { email: colleague.email, password } }).expect(200);

    for (let attempt = 0; attempt < 5; attempt += 1) await call(app, endpoints.forgot, { body: { email } }).expect(202);
    await call(app, endpoints.forgot, { body: { email } }).expect(429);

    const guess = { body: { token: 'guessed', password } };
    for (let attempt = 0; attempt < 30; attempt += 1) await call(app, endpoints.reset, guess).expect(400);
    await call(app, endpoints.reset, guess).expect(429);
  } finally {
    await app.stop();
  }
});
