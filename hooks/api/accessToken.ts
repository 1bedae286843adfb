import { accountEndpoints, sessionSchema, type Session } from '@/shared/contracts/accounts';
import { ApiProblem, networkProblem, problemFrom } from './ApiProblem';
import { alone } from './alone';
import { urlOf } from './urlOf';

/** Marks a request as one of our own, against posts from other sites. */
export const ownRequest = { 'X-Requested-With': 'ringwright' } as const;

/** The access token is renewed when it has less than this left, ms. */
const marginMs = 30_000;

interface Held {
  session: Session;
  endsAtMs: number;
}

/** Only in memory: a page that is closed forgets it; the refresh cookie brings it back. */
let held: Held | null = null;
let renewal: Promise<Session | null> | null = null;
const listeners = new Set<(session: Session | null) => void>();

/** The session as this tab knows it; null when nobody is signed in. */
export function currentSession(): Session | null {
  return held?.session ?? null;
}

/** Calls back on every change of the session; returns how to stop. */
export function onSessionChange(listener: (session: Session | null) => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function keepSession(session: Session | null): void {
  held = session === null ? null : { session, endsAtMs: Date.now() + session.expiresInSeconds * 1000 };
  for (const listener of listeners) listener(session);
}

/** Shows another name for the person signed in; the token and its end stay. */
export function renameKeptUser(user: Session['user']): void {
  if (held === null) return;
  held = { ...held, session: { ...held.session, user } };
  for (const listener of listeners) listener(held.session);
}

async function askForSession(): Promise<Session | null> {
  const endpoint = accountEndpoints.refresh;
  let response: Response;
  try {
    response = await fetch(urlOf(endpoint), {
      method: endpoint.method.toUpperCase(),
      headers: ownRequest,
      credentials: 'same-origin',
    });
  } catch {
    throw networkProblem();
  }
  if (response.status === 401) return null;
  if (!response.ok) throw problemFrom(response.status, await response.text());
  return sessionSchema.parse(await response.json());
}

/**
 * Asks for a new access token with the refresh cookie; null when the cookie is no longer good.
 * However many callers there are, one request is on its way; tabs take turns, because the cookie is spent by its use.
 */
export function renewAccessToken(): Promise<Session | null> {
  renewal ??= alone('ringwright-refresh', askForSession)
    .then((session) => {
      keepSession(session);
      return session;
    })
    .finally(() => {
      renewal = null;
    });
  return renewal;
}

/**
 * A token that is good for at least half a minute.
 * @throws ApiProblem `not-signed-in` when the session has ended, `network` when it cannot be renewed now.
 */
export async function accessToken(): Promise<string> {
  if (held !== null && held.endsAtMs - Date.now() > marginMs) return held.session.accessToken;
  const session = await renewAccessToken();
  if (session === null)
    throw new ApiProblem('not-signed-in', 'You are signed out. Sign in again to go on.', null, {}, 401);
  return session.accessToken;
}
