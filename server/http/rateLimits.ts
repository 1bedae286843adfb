import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { ProblemError } from './ProblemError';

const MINUTE_MS = 60_000;

interface Limit {
  /** Requests in the window. */
  limit: number;
  windowMs: number;
  /** What is counted together. */
  key: (request: Request) => string;
  /** Only refused attempts count. */
  failuresOnly?: boolean;
}

export interface RateLimits {
  signIn: RequestHandler[];
  register: RequestHandler[];
  forgot: RequestHandler[];
  token: RequestHandler[];
}

const byAddress = (request: Request): string => ipKeyGenerator(request.ip ?? '');

/** The same mailbox from the same place; the body is not validated yet. */
const byAddressAndEmail = (request: Request): string => {
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? String(body.email) : '';
  return `${byAddress(request)} ${email.trim().toLowerCase().slice(0, 254)}`;
};

/**
 * Limits on what can be guessed or used to flood a mailbox, counted in each api process. `factor` widens all of them
 * (many people behind one address, tests).
 */
export function createRateLimits(factor: number): RateLimits {
  const limiter = ({ limit, windowMs, key, failuresOnly = false }: Limit): RequestHandler =>
    rateLimit({
      windowMs,
      limit: Math.ceil(limit * factor),
      keyGenerator: key,
      skipSuccessfulRequests: failuresOnly,
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      // Headers of a proxy are not believed, so that nobody can choose the address that is counted.
      validate: { xForwardedForHeader: false },
      handler: (_request, _response, next) =>
        next(new ProblemError('too-many-requests', `Wait ${Math.ceil(windowMs / MINUTE_MS)} minutes, then try again.`)),
    });
  return {
    signIn: [
      limiter({ limit: 10, windowMs: 15 * MINUTE_MS, key: byAddressAndEmail, failuresOnly: true }),
      limiter({ limit: 100, windowMs: 15 * MINUTE_MS, key: byAddress, failuresOnly: true }),
    ],
    register: [limiter({ limit: 20, windowMs: 60 * MINUTE_MS, key: byAddress })],
    forgot: [
      limiter({ limit: 5, windowMs: 60 * MINUTE_MS, key: byAddressAndEmail }),
      limiter({ limit: 50, windowMs: 60 * MINUTE_MS, key: byAddress }),
    ],
    token: [limiter({ limit: 30, windowMs: 15 * MINUTE_MS, key: byAddress, failuresOnly: true })],
  };
}
