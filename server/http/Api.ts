import { Router, type Request, type RequestHandler, type Response } from 'express';
import type { AnswerKind, AnswerOf, BodyOf, Endpoint, ParamsOf, QueryOf } from '../../shared/contracts/endpoint';
import type { Role } from '../../shared/contracts/roles';
import type { AccessTokens } from './accessTokens';
import type { Actor } from './Actor';
import { EventStream } from './EventStream';
import { ProblemError } from './ProblemError';
import { sendFile, type FileAnswer } from './sendFile';
import { valid, validParams } from './validate';

/** What a handler is given: all of it validated by the endpoint's schemas. */
export interface Call<E extends Endpoint> {
  params: ParamsOf<E>;
  query: QueryOf<E>;
  body: BodyOf<E>;
  request: Request;
  response: Response;
}
export interface ActorCall<E extends Endpoint> extends Call<E> {
  actor: Actor;
}
/** The call of a multipart endpoint, with what its storage made of the file. */
export interface UploadCall<E extends Endpoint, Stored> extends ActorCall<E> {
  file: Stored;
}

/**
 * Reads the one file of a multipart request while it arrives. The text fields come first and are validated by the time
 * the file begins. Returns what the handler is given; throws a {@link ProblemError} when there is no file.
 */
export type FileReader<E extends Endpoint, Stored> = (
  call: Omit<ActorCall<E>, 'body'> & {
    /** Validates the text fields that have arrived. */
    validBody: (fields: unknown) => BodyOf<E>;
  },
) => Promise<{ body: BodyOf<E>; file: Stored }>;

/** What a handler returns: nothing where the contract answers with nothing. */
type Returned<E extends Endpoint> = AnswerOf<E> extends undefined ? void : AnswerOf<E>;

interface RouteOptions {
  /** Runs before anything else, for example a rate limit. */
  before?: RequestHandler[];
}

/** Content types of answers that are no JSON. */
const fileTypes: Partial<Record<AnswerKind, string>> = {
  csv: 'text/csv; charset=utf-8',
  bytes: 'application/octet-stream',
  png: 'image/png',
};

/** Header that cross-site forms cannot send; required where the refresh cookie is what counts. */
const OWN_HEADER = 'x-requested-with';
const OWN_HEADER_VALUE = 'ringwright';

/**
 * Registers the endpoints of the contract. Each goes the same way: who calls, may they, is what they send right, do it,
 * send what the contract declares and nothing else.
 */
export class Api {
  readonly router = Router();
  private readonly names = new Set<string>();
  private readonly streams = new Set<EventStream>();

  /** `accessStands` tells whether the access that a token was given for has been ended or changed since. */
  constructor(
    private readonly tokens: AccessTokens,
    private readonly accessStands: (actor: Actor) => Promise<boolean>,
  ) {}

  /** `METHOD /path` of every endpoint that has a handler. */
  get registered(): ReadonlySet<string> {
    return this.names;
  }

  /** An endpoint for people who are signed in, with a JSON answer or none. */
  register<E extends Endpoint>(
    endpoint: E,
    handle: (call: ActorCall<E>) => Promise<Returned<E>>,
    { before }: RouteOptions = {},
  ): void {
    const allowed = rolesOf(endpoint);
    this.add(
      endpoint,
      ['json', 'empty'],
      async (request, response) => {
        const actor = await this.authorize(request, allowed);
        const call = { actor, ...validCall(endpoint, request, response) };
        sendJson(endpoint, response, await handle(call));
      },
      before,
    );
  }

  /** An endpoint for anybody, or for whoever holds the refresh cookie. */
  registerOpen<E extends Endpoint>(
    endpoint: E,
    handle: (call: Call<E>) => Promise<Returned<E>>,
    { before }: RouteOptions = {},
  ): void {
    if (endpoint.access !== 'public' && endpoint.access !== 'cookie') throw wrongUse(endpoint, 'is not open');
    this.add(
      endpoint,
      ['json', 'empty'],
      async (request, response) => {
        if (endpoint.access === 'cookie') requireOwnHeader(request);
        sendJson(endpoint, response, await handle(validCall(endpoint, request, response)));
      },
      before,
    );
  }

  /** An endpoint whose answer is a file: CSV, bytes or a picture. */
  registerFile<E extends Endpoint>(endpoint: E, handle: (call: ActorCall<E>) => Promise<FileAnswer>): void {
    const allowed = rolesOf(endpoint);
    this.add(endpoint, ['csv', 'bytes', 'png'], async (request, response) => {
      const actor = await this.authorize(request, allowed);
      const answer = await handle({ actor, ...validCall(endpoint, request, response) });
      await sendFile(request, response, answer, fileTypes[endpoint.kind] as string);
    });
  }

  /** An endpoint that takes one file; `read` stores it while it arrives, `handle` answers. */
  registerUpload<E extends Endpoint, Stored>(
    endpoint: E,
    read: FileReader<E, Stored>,
    handle: (call: UploadCall<E, Stored>) => Promise<Returned<E>>,
  ): void {
    if (!endpoint.multipart) throw wrongUse(endpoint, 'takes no file');
    const allowed = rolesOf(endpoint);
    this.add(endpoint, ['json'], async (request, response) => {
      const actor = await this.authorize(request, allowed);
      const call = {
        actor,
        params: validParams(endpoint.params, request.params) as ParamsOf<E>,
        query: valid(endpoint.query, request.query) as QueryOf<E>,
        request,
        response,
      };
      const validBody = (fields: unknown) => valid(endpoint.body, { ...(fields as object) }) as BodyOf<E>;
      const { body, file } = await read({ ...call, validBody });
      sendJson(endpoint, response, await handle({ ...call, body, file }));
    });
  }

  /** An endpoint that keeps sending events until the caller leaves or the access token ends. */
  registerEvents<E extends Endpoint>(
    endpoint: E,
    open: (call: ActorCall<E> & { events: EventStream }) => void | Promise<void>,
  ): void {
    const allowed = rolesOf(endpoint);
    this.add(endpoint, ['events'], async (request, response) => {
      const actor = await this.authorize(request, allowed);
      const call = { actor, ...validCall(endpoint, request, response) };
      const events = new EventStream(response, actor.until);
      this.streams.add(events);
      events.onClose(() => this.streams.delete(events));
      await open({ ...call, events });
    });
  }

  /** Ends every event stream that is open, when the process is to stop. Browsers come back by themselves. */
  endStreams(): void {
    for (const events of this.streams) events.end();
  }

  private add(
    endpoint: Endpoint,
    kinds: AnswerKind[],
    serve: (request: Request, response: Response) => Promise<void>,
    before: RequestHandler[] = [],
  ): void {
    const name = nameOf(endpoint);
    if (!kinds.includes(endpoint.kind)) throw wrongUse(endpoint, `answers with ${endpoint.kind}`);
    if (this.names.has(name)) throw wrongUse(endpoint, 'is registered already');
    this.names.add(name);
    this.router[endpoint.method](endpoint.path, ...before, (request, response) => serve(request, response));
  }

  private async authorize(request: Request, allowed: readonly Role[]): Promise<Actor> {
    const [scheme, token] = (request.headers.authorization ?? '').split(' ');
    const actor = scheme?.toLowerCase() === 'bearer' && token ? this.tokens.read(token) : null;
    if (actor === null || !(await this.accessStands(actor)))
      throw new ProblemError('not-signed-in', 'Sign in to go on.');
    if (!allowed.includes(actor.role)) {
      throw new ProblemError('forbidden', `This is not open to the role ${actor.role}.`);
    }
    return actor;
  }
}

/** The endpoint's name in {@link Api.registered} and in messages. */
export const nameOf = (endpoint: Endpoint): string => `${endpoint.method.toUpperCase()} ${endpoint.path}`;

const wrongUse = (endpoint: Endpoint, why: string): Error => new Error(`${nameOf(endpoint)} ${why}`);

function rolesOf(endpoint: Endpoint): readonly Role[] {
  if (endpoint.access === 'public' || endpoint.access === 'cookie') throw wrongUse(endpoint, 'is open to anybody');
  return endpoint.access;
}

function requireOwnHeader(request: Request): void {
  if (request.headers[OWN_HEADER] !== OWN_HEADER_VALUE) {
    throw new ProblemError('forbidden', `This needs the header X-Requested-With: ${OWN_HEADER_VALUE}.`);
  }
}

function validCall<E extends Endpoint>(endpoint: E, request: Request, response: Response): Call<E> {
  return {
    params: validParams(endpoint.params, request.params) as ParamsOf<E>,
    query: valid(endpoint.query, request.query) as QueryOf<E>,
    // A body that the endpoint does not know is not looked at.
    body: (isNone(endpoint) ? undefined : valid(endpoint.body, request.body ?? {})) as BodyOf<E>,
    request,
    response,
  };
}

/** Sends what the schema declares; anything else that the handler returned stays here. */
function sendJson<E extends Endpoint>(endpoint: E, response: Response, answer: Returned<E>): void {
  // A handler may have chosen another status, for example 503 from the health check.
  if (response.statusCode === 200) response.status(endpoint.status);
  response.set('Cache-Control', 'no-store');
  if (endpoint.kind === 'empty') response.end();
  else response.json(endpoint.answer.parse(answer));
}

const isNone = (endpoint: Endpoint): boolean => endpoint.body.safeParse(undefined).success;
