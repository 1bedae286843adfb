import request, { type Test } from 'supertest';
import type { BodyInputOf, Endpoint } from '../../../shared/contracts/endpoint';
import type { App } from '../../../server/createApp';

export interface CallChoice<E extends Endpoint> {
  token?: string;
  params?: Record<string, string>;
  query?: Record<string, string>;
  body?: BodyInputOf<E>;
  /** Refresh token, sent as the cookie. */
  cookie?: string;
}

/** Calls an endpoint of the contract as a browser of ours would. */
export function call<E extends Endpoint>(app: App, endpoint: E, choice: CallChoice<E> = {}): Test {
  const test = request(app.express)
    [endpoint.method](pathOf(endpoint, choice.params ?? {}))
    .set('X-Requested-With', 'ringwright')
    .query(choice.query ?? {});
  if (choice.token !== undefined) void test.set('Authorization', `Bearer ${choice.token}`);
  if (choice.cookie !== undefined) void test.set('Cookie', `ringwright_refresh=${choice.cookie}`);
  if (choice.body !== undefined) void test.send(choice.body as object);
  return test;
}

export function pathOf(endpoint: Endpoint, params: Record<string, string>): string {
  return `/api${endpoint.path.replace(/:(\w+)/g, (_whole, name: string) => {
    const value = params[name];
    if (value === undefined) throw new Error(`${endpoint.path} needs ${name}`);
    return encodeURIComponent(value);
  })}`;
}

/** The refresh token that an answer sets. */
export function refreshTokenOf(response: { headers: Record<string, unknown> }): string {
  const cookies = response.headers['set-cookie'];
  const all = Array.isArray(cookies) ? cookies.join('\n') : String(cookies);
  const value = /ringwright_refresh=([^;\n]+)/.exec(all)?.[1];
  if (value === undefined) throw new Error(`no refresh token in ${all}`);
  return value;
}
