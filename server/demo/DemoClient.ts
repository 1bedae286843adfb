import type { z } from 'zod';
import { accountEndpoints } from '../../shared/contracts/accounts';
import { problemSchema } from '../../shared/contracts/common';
import type { AnswerOf, Endpoint } from '../../shared/contracts/endpoint';

interface Given<E extends Endpoint> {
  params?: z.input<E['params']>;
  query?: z.input<E['query']>;
  body?: z.input<E['body']>;
  /** File of a multipart endpoint; the body's fields go before it. */
  file?: { name: string; bytes: Buffer };
}

/** A call that the service turned down, with its status. */
export class DemoCallError extends Error {
  constructor(
    readonly status: number,
    message: string,
  ) {
    super(message);
  }
}

/** One person's use of the service over HTTP, as a browser or a script would. */
export class DemoClient {
  private token = '';

  constructor(private readonly address: string) {}

  async signIn(email: string, password: string): Promise<void> {
    const session = await this.call(accountEndpoints.signIn, { body: { email, password } });
    this.token = session.accessToken;
  }

  async call<E extends Endpoint>(endpoint: E, given: Given<E> = {}): Promise<AnswerOf<E>> {
    const { params = {}, query = {}, body, file } = given;
    const path = endpoint.path.replace(/:(\w+)/g, (_all, name: string) =>
      encodeURIComponent(String((params as Record<string, unknown>)[name])),
    );
    const search = new URLSearchParams(query as Record<string, string>);
    const headers: Record<string, string> = this.token === '' ? {} : { Authorization: `Bearer ${this.token}` };
    if (file === undefined && body !== undefined) headers['Content-Type'] = 'application/json';
    const response = await fetch(`${this.address}/api${path}?${search.toString()}`, {
      method: endpoint.method.toUpperCase(),
      headers,
      body: file ? form(body, file) : body === undefined ? undefined : JSON.stringify(body),
    });
    const text = await response.text();
    if (!response.ok) throw new DemoCallError(response.status, `${endpoint.summary}: ${reasonOf(text)}`);
    return endpoint.answer.parse(text === '' ? undefined : JSON.parse(text)) as AnswerOf<E>;
  }
}

function form(fields: unknown, file: { name: string; bytes: Buffer }): FormData {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields as Record<string, string>)) data.append(name, value);
  data.append('file', new Blob([new Uint8Array(file.bytes)]), file.name);
  return data;
}

function reasonOf(text: string): string {
  try {
    const problem = problemSchema.parse(JSON.parse(text));
    return `${problem.detail} ${JSON.stringify(problem.fields ?? {})}`;
  } catch {
    return text.slice(0, 200);
  }
}
