import type { AnswerOf, BodyInputOf, Endpoint, ParamsOf, QueryInputOf } from '@/shared/contracts/endpoint';
import { accessToken, currentSession, ownRequest, renewAccessToken } from './accessToken';
import { ApiProblem, networkProblem, problemFrom } from './ApiProblem';
import { urlOf } from './urlOf';

/** What a call is given; parts that the endpoint does not have may be left out. */
export interface CallParts<E extends Endpoint> {
  params?: ParamsOf<E>;
  query?: QueryInputOf<E>;
  body?: BodyInputOf<E>;
  signal?: AbortSignal;
}

async function send(endpoint: Endpoint, parts: CallParts<Endpoint>, token: string | null): Promise<Response> {
  const headers: Record<string, string> = { ...ownRequest };
  if (token !== null) headers['Authorization'] = `Bearer ${token}`;
  if (parts.body !== undefined) headers['Content-Type'] = 'application/json';
  try {
    return await fetch(
      urlOf(endpoint, {
        params: parts.params as Record<string, unknown>,
        query: parts.query as Record<string, unknown>,
      }),
      {
        method: endpoint.method.toUpperCase(),
        headers,
        body: parts.body === undefined ? undefined : JSON.stringify(parts.body),
        signal: parts.signal,
        credentials: 'same-origin',
      },
    );
  } catch (error) {
    if (parts.signal?.aborted) throw error;
    throw networkProblem();
  }
}

/** Sends a request as the person signed in; a token that has ended is renewed once, then the request is sent again. */
async function answerTo(endpoint: Endpoint, parts: CallParts<Endpoint>): Promise<Response> {
  const needsToken = typeof endpoint.access !== 'string';
  let response = await send(endpoint, parts, needsToken ? await accessToken() : null);
  if (needsToken && response.status === 401 && currentSession() !== null) {
    const session = await renewAccessToken();
    if (session !== null) response = await send(endpoint, parts, session.accessToken);
  }
  if (!response.ok) throw problemFrom(response.status, await response.text());
  return response;
}

/**
 * Calls an endpoint of the contract and gives its answer, checked against the contract.
 * @throws ApiProblem; an aborted call throws the abort of `fetch`.
 */
export async function call<E extends Endpoint>(endpoint: E, parts: CallParts<E> = {}): Promise<AnswerOf<E>> {
  const response = await answerTo(endpoint, parts as CallParts<Endpoint>);
  if (endpoint.kind === 'empty' || response.status === 204) return undefined as AnswerOf<E>;
  const parsed = endpoint.answer.safeParse(await response.json());
  if (!parsed.success) {
    throw new ApiProblem(
      'unexpected',
      'The server’s answer does not fit this version of the application. Load the page again.',
      null,
      {},
      response.status,
    );
  }
  return parsed.data as AnswerOf<E>;
}

/** Calls an endpoint that answers with text, such as CSV. */
export async function callText<E extends Endpoint>(endpoint: E, parts: CallParts<E> = {}): Promise<string> {
  return (await answerTo(endpoint, parts as CallParts<Endpoint>)).text();
}

/** Calls an endpoint that answers with bytes or a picture; the headers come along. */
export async function callBytes<E extends Endpoint>(
  endpoint: E,
  parts: CallParts<E> = {},
): Promise<{ bytes: ArrayBuffer; headers: Headers; type: string }> {
  const response = await answerTo(endpoint, parts as CallParts<Endpoint>);
  return {
    bytes: await response.arrayBuffer(),
    headers: response.headers,
    type: response.headers.get('Content-Type') ?? '',
  };
}
