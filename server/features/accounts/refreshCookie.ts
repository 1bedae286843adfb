import type { CookieOptions, Request, Response } from 'express';
import { SESSION_MS } from './sessionService';

const NAME = 'ringwright_refresh';

export interface RefreshCookie {
  read(request: Request): string | undefined;
  set(response: Response, refreshToken: string): void;
  clear(response: Response): void;
}

/** The refresh token's cookie: out of reach of scripts, sent to the session endpoints of this site only. */
export function createRefreshCookie(secure: boolean): RefreshCookie {
  const options: CookieOptions = { httpOnly: true, sameSite: 'strict', secure, path: '/api/session' };
  return {
    read(request) {
      const cookies: unknown = request.cookies;
      if (typeof cookies !== 'object' || cookies === null || !(NAME in cookies)) return undefined;
      const value: unknown = cookies[NAME];
      return typeof value === 'string' && value !== '' ? value : undefined;
    },
    set: (response, refreshToken) => response.cookie(NAME, refreshToken, { ...options, maxAge: SESSION_MS }),
    clear: (response) => response.clearCookie(NAME, options),
  };
}
