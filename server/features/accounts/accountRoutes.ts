import type { Response } from 'express';
import type { Session } from '../../../shared/contracts/accounts';
import { endpoints } from '../../../shared/contracts/endpoints';
import type { Api } from '../../http/Api';
import type { Background } from '../../http/Background';
import type { RateLimits } from '../../http/rateLimits';
import type { AccountService } from './accountService';
import type { RefreshCookie } from './refreshCookie';
import type { OpenedSession, SessionService } from './sessionService';

export interface AccountRouteDependencies {
  accounts: AccountService;
  sessions: SessionService;
  cookie: RefreshCookie;
  limits: RateLimits;
  background: Background;
}

/** Sessions, passwords and the own account. */
export function accountRoutes(api: Api, { accounts, sessions, cookie, limits, background }: AccountRouteDependencies) {
  const withCookie = (response: Response, { session, refreshToken }: OpenedSession): Session => {
    cookie.set(response, refreshToken);
    return session;
  };

  api.registerOpen(
    endpoints.register,
    async ({ body, response }) => withCookie(response, await accounts.register(body)),
    { before: limits.register },
  );
  api.registerOpen(endpoints.signIn, async ({ body, response }) => withCookie(response, await accounts.signIn(body)), {
    before: limits.signIn,
  });
  api.registerOpen(endpoints.refresh, async ({ request, response }) =>
    withCookie(response, await sessions.refresh(cookie.read(request))),
  );
  api.registerOpen(endpoints.signOut, async ({ request, response }) => {
    await sessions.end(cookie.read(request));
    cookie.clear(response);
  });
  api.register(endpoints.switchLaboratory, async ({ actor, body, response }) =>
    withCookie(response, await sessions.switchLaboratory(actor, body.laboratoryId)),
  );
  api.registerOpen(
    endpoints.forgot,
    // Answered before the work is done: neither answer nor time tells whether the address is known.
    async ({ body }) => background.run('password reset', () => accounts.forgot(body)),
    { before: limits.forgot },
  );
  api.registerOpen(endpoints.reset, ({ body }) => accounts.reset(body), { before: limits.token });
  api.register(endpoints.changePassword, ({ actor, body }) => accounts.changePassword(actor, body), {
    before: limits.token,
  });
  api.register(endpoints.updateAccount, ({ actor, body }) => accounts.rename(actor, body.name));
}
