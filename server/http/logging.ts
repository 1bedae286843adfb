import { randomBytes } from 'node:crypto';
import type { RequestHandler } from 'express';
import { pino, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** The log of a process: JSON lines on standard output. */
export function createLogger(name: string, level: string): Logger {
  return pino({ name, level, base: { name, pid: process.pid } });
}

/** Addresses hold secrets where a link was mailed; these never reach the log. */
const withoutSecrets = (url: string | undefined): string =>
  (url ?? '').replace(/(\/invitations\/token\/)[^/?]+/, '$1…').replace(/([?&]token=)[^&]+/, '$1…');

/** Gives every request a short id, which problem answers quote, and logs one line when it ends. No headers, no bodies. */
export function logRequests(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: () => randomBytes(6).toString('hex'),
    serializers: {
      req: (request: { id: unknown; method: string; url?: string }) => ({
        id: request.id,
        method: request.method,
        url: withoutSecrets(request.url),
      }),
      res: (response: { statusCode: number }) => ({ statusCode: response.statusCode }),
    },
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'error' : 'info'),
    autoLogging: { ignore: (request) => request.url === '/api/health' },
  });
}
