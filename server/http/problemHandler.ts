import type { ErrorRequestHandler } from 'express';
import type { Problem, ProblemType } from '../../shared/contracts/common';
import { ProblemError } from './ProblemError';

const titles: Record<ProblemType, string> = {
  invalid: 'Something is missing or wrong',
  'not-signed-in': 'Not signed in',
  forbidden: 'Not allowed',
  'not-found': 'Not found',
  conflict: 'It does not fit with what is there',
  'too-large': 'Too large',
  'unsupported-format': 'This kind of file cannot be used',
  'too-many-requests': 'Too many attempts',
  internal: 'Something went wrong here',
};

/** Turns whatever was thrown into problem details (RFC 9457); what nobody foresaw is logged whole and told in brief. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const problem = toProblem(error);
  if (problem.type === 'internal') request.log.error({ err: error }, 'request failed');
  else request.log.info({ problem: problem.type, detail: problem.message, fields: problem.fields }, 'request refused');
  if (response.headersSent) {
    next(error);
    return;
  }
  const body: Problem = {
    type: problem.type,
    title: titles[problem.type],
    status: problem.status,
    detail: problem.message,
    id: String(request.id),
    ...(problem.fields && { fields: problem.fields }),
  };
  // RFC 9110, section 15.5.2: an answer 401 says which scheme is wanted.
  if (problem.status === 401) response.set('WWW-Authenticate', 'Bearer');
  response
    .status(problem.status)
    .set('Cache-Control', 'no-store')
    .type('application/problem+json')
    .send(JSON.stringify(body));
};

function toProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  const kind = kindOf(error);
  if (kind === 'entity.parse.failed') return new ProblemError('invalid', 'The body is not JSON.', { cause: error });
  if (kind === 'entity.too.large') return new ProblemError('too-large', 'The body is too large.', { cause: error });
  if (kind === 'encoding.unsupported' || kind === 'charset.unsupported') {
    return new ProblemError('unsupported-format', 'Send the body as UTF-8 without compression.', { cause: error });
  }
  if (error instanceof URIError) return new ProblemError('not-found', 'There is no such address.', { cause: error });
  if (isRequestError(error)) return new ProblemError('invalid', 'The request cannot be read.', { cause: error });
  return new ProblemError('internal', 'The service could not do this. Try again; if it stays, quote the number.', {
    cause: error,
  });
}

/** Errors of parsing a request carry the status that they stand for. */
function isRequestError(error: unknown): boolean {
  if (typeof error !== 'object' || error === null || !('status' in error)) return false;
  return typeof error.status === 'number' && error.status >= 400 && error.status < 500;
}

/** The word that the body parser gives its errors. */
function kindOf(error: unknown): string | undefined {
  if (typeof error !== 'object' || error === null || !('type' in error)) return undefined;
  return typeof error.type === 'string' ? error.type : undefined;
}
