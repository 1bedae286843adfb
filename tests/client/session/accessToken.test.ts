import type { Session } from '@/shared/contracts/accounts';
import { accessToken, currentSession, keepSession, onSessionChange, renewAccessToken } from '@/hooks/api/accessToken';
import { call } from '@/hooks/api/call';
import { accountEndpoints } from '@/shared/contracts/accounts';
import { lotEndpoints } from '@/shared/contracts/lots';

const uuid = (n: number) => `00000000-0000-4000-8000-00000000000${n}`;
const membership = {
  id: uuid(1),
  laboratoryId: uuid(2),
  laboratoryName: 'Lindqvarn Optics',
  role: 'technician' as const,
};
const session = (token: string, expiresInSeconds = 600): Session => ({
  accessToken: token,
  expiresInSeconds,
  user: { id: uuid(3), name: 'T. Aldana', email: 't.aldana@lindqvarn.example' },
  membership,
  memberships: [membership],
});

interface Asked {
  url: string;
  authorization: string | undefined;
}
let asked: Asked[] = [];
let refreshes = 0;
let refreshAnswer: () => Response = () => answer(200, session(`new-${refreshes}`));
let goodToken: string | null = null;

const answer = (status: number, body: unknown) => new Response(JSON.stringify(body), { status });
const notSignedIn = () =>
  answer(401, {
    type: 'urn:ringwright:not-signed-in',
    title: 'Not signed in',
    status: 401,
    detail: 'Sign in.',
    id: 'abc',
  });

beforeEach(() => {
  asked = [];
  refreshes = 0;
  goodToken = null;
  refreshAnswer = () => answer(200, session(`new-${refreshes}`));
  keepSession(null);
  global.fetch = jest.fn(async (input: RequestInfo | URL, init?: RequestInit) => {
    const url = String(input);
    const headers = (init?.headers ?? {}) as Record<string, string>;
    asked.push({ url, authorization: headers['Authorization'] });
    if (url.endsWith('/session/refresh')) {
      refreshes += 1;
      await new Promise((resolve) => setTimeout(resolve, 5));
      return refreshAnswer();
    }
    if (goodToken !== null && headers['Authorization'] !== `Bearer ${goodToken}`) return notSignedIn();
    return answer(200, []);
  }) as typeof fetch;
});

test('many callers without a token share one refresh', async () => {
  const tokens = await Promise.all([accessToken(), accessToken(), accessToken()]);
  expect(tokens).toEqual(['new-1', 'new-1', 'new-1']);
  expect(refreshes).toBe(1);
});

test('a token that is good for long is used as it is', async () => {
  keepSession(session('first'));
  expect(await accessToken()).toBe('first');
  expect(refreshes).toBe(0);
});

test('a token about to end is renewed before it is used', async () => {
  keepSession(session('first', 10));
  expect(await accessToken()).toBe('new-1');
});

test('calls that are turned away together refresh once and are sent again', async () => {
  keepSession(session('old'));
  goodToken = 'new-1';
  const answers = await Promise.all([call(lotEndpoints.lots), call(lotEndpoints.lots), call(lotEndpoints.lots)]);
  expect(answers).toEqual([[], [], []]);
  expect(refreshes).toBe(1);
  expect(asked.filter((one) => one.authorization === 'Bearer new-1')).toHaveLength(3);
});

test('a call that is turned away again after the refresh fails instead of going round', async () => {
  keepSession(session('old'));
  goodToken = 'nobody-has-this';
  await expect(call(lotEndpoints.lots)).rejects.toMatchObject({ kind: 'not-signed-in', id: 'abc' });
  expect(refreshes).toBe(1);
});

test('a spent cookie signs out and tells the listeners', async () => {
  keepSession(session('old', 1));
  refreshAnswer = notSignedIn;
  const heard: (Session | null)[] = [];
  const stop = onSessionChange((next) => heard.push(next));
  await expect(accessToken()).rejects.toMatchObject({ kind: 'not-signed-in' });
  stop();
  expect(heard).toEqual([null]);
  expect(currentSession()).toBeNull();
});

test('a server that does not answer does not sign anybody out', async () => {
  keepSession(session('old', 1));
  global.fetch = jest.fn(() => Promise.reject(new TypeError('no network'))) as unknown as typeof fetch;
  await expect(renewAccessToken()).rejects.toMatchObject({ kind: 'network', temporary: true });
  expect(currentSession()?.accessToken).toBe('old');
});

test('public calls carry no token and mark themselves as our own', async () => {
  keepSession(session('secret'));
  await call(accountEndpoints.inbox);
  expect(asked[0]?.authorization).toBeUndefined();
  const [, init] = (global.fetch as jest.Mock).mock.calls[0] as [string, RequestInit];
  expect((init.headers as Record<string, string>)['X-Requested-With']).toBe('ringwright');
});

test('an answer that breaks the contract is a problem, not data', async () => {
  keepSession(session('good'));
  global.fetch = jest.fn(async () => answer(200, [{ id: 'no' }])) as unknown as typeof fetch;
  await expect(call(lotEndpoints.lots)).rejects.toMatchObject({ kind: 'unexpected' });
});
