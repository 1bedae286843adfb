import { z } from 'zod';
import type { Role } from './roles';

/**
 * Who may call an endpoint: anybody, whoever holds the refresh cookie, or people signed in with one of the roles.
 */
export type Access = 'public' | 'cookie' | readonly Role[];

/** What the body of the answer is. Only `json` answers are described by a schema. */
export type AnswerKind = 'json' | 'empty' | 'csv' | 'bytes' | 'png' | 'events';

type Schema = z.ZodType;

/** One line of the API contract: the server registers it, the client calls it, the tests try it. */
export interface Endpoint<
  Params extends Schema = Schema,
  Query extends Schema = Schema,
  Body extends Schema = Schema,
  Answer extends Schema = Schema,
> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express path below `/api`, with `:name` parameters. */
  path: string;
  summary: string;
  access: Access;
  params: Params;
  query: Query;
  /** JSON body. For `multipart` the text fields of the form. */
  body: Body;
  /** `multipart` endpoints take one file in the field `file`, after the text fields. */
  multipart: boolean;
  kind: AnswerKind;
  status: number;
  answer: Answer;
}

const nothing = z.object({});
type Nothing = typeof nothing;
const none = z.undefined();
type None = typeof none;

interface Description<P extends Schema, Q extends Schema, B extends Schema, A extends Schema> {
  method: Endpoint['method'];
  path: string;
  summary: string;
  access: Access;
  params?: P;
  query?: Q;
  body?: B;
  multipart?: boolean;
  kind?: AnswerKind;
  status?: number;
  answer?: A;
}

/** Describes an endpoint; what is left out is empty, `json` when it has an answer, else `empty` (204). */
export function endpoint<
  P extends Schema = Nothing,
  Q extends Schema = Nothing,
  B extends Schema = None,
  A extends Schema = None,
>(d: Description<P, Q, B, A>): Endpoint<P, Q, B, A> {
  const kind = d.kind ?? (d.answer ? 'json' : 'empty');
  return {
    method: d.method,
    path: d.path,
    summary: d.summary,
    access: d.access,
    params: (d.params ?? nothing) as P,
    query: (d.query ?? nothing) as Q,
    body: (d.body ?? none) as B,
    multipart: d.multipart ?? false,
    kind,
    status: d.status ?? (kind === 'empty' ? 204 : d.method === 'post' ? 201 : 200),
    answer: (d.answer ?? none) as A,
  };
}

export type ParamsOf<E extends Endpoint> = z.output<E['params']>;
export type QueryOf<E extends Endpoint> = z.output<E['query']>;
export type BodyOf<E extends Endpoint> = z.output<E['body']>;
export type BodyInputOf<E extends Endpoint> = z.input<E['body']>;
export type QueryInputOf<E extends Endpoint> = z.input<E['query']>;
export type AnswerOf<E extends Endpoint> = z.output<E['answer']>;
