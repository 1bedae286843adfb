import { randomUUID } from 'node:crypto';
import type { Logger } from 'pino';
import type { Session } from '../../../shared/contracts/accounts';
import type { Database, Transaction } from '../../database/Database';
import { ACCESS_TOKEN_SECONDS, type AccessTokens } from '../../http/accessTokens';
import type { Actor } from '../../http/Actor';
import { notFound, ProblemError } from '../../http/ProblemError';
import { activeMemberships, lockUser, type Membership, type User } from './accountRepository';
import { hashSecret, newSecret } from './secretTokens';
import {
  addRefreshSession,
  findRefreshSession,
  forgetExpired,
  lastUsedMembership,
  membershipOfFamily,
  revokeFamily,
  spendFamily,
  spendRefreshSession,
} from './sessionRepository';

const DAY_MS = 86_400_000;

/** A session that is not used for this long ends. */
export const SESSION_MS = 30 * DAY_MS;

/**
 * Two tabs that wake up together both send the same refresh token. Within this time, ms, the second one is served;
 * later the token counts as stolen and the whole family ends. A few seconds are common practice.
 */
export const REFRESH_GRACE_MS = 10_000;

/** A session together with the refresh token that goes into the cookie. */
export interface OpenedSession {
  session: Session;
  refreshToken: string;
}

export interface SessionService {
  /** Begins a session of a person who has proved who they are. */
  open(transaction: Transaction, user: User, membershipId?: string): Promise<OpenedSession>;
  /** Spends a refresh token and gives the next one. */
  refresh(refreshToken: string | undefined): Promise<OpenedSession>;
  /** Ends the session of a refresh token; one that is not known is not an error. */
  end(refreshToken: string | undefined): Promise<void>;
  /** Goes on in another laboratory of the same person. */
  switchLaboratory(actor: Actor, laboratoryId: string): Promise<OpenedSession>;
}

export interface SessionDependencies {
  database: Database;
  tokens: AccessTokens;
  log: Logger;
  now: () => Date;
}

const signInAgain = (): ProblemError => new ProblemError('not-signed-in', 'The session has ended. Sign in again.');

/** Holds the row of the person whose refresh token it is, and returns the person; null when the token is not known. */
async function lockHolder(transaction: Transaction, refreshToken: string): Promise<User | null> {
  const session = await findRefreshSession(transaction, hashSecret(refreshToken));
  return session && lockUser(transaction, session.userId);
}

/**
 * Sessions: a short access token and a rotating refresh token. A token that is used a second time, after the grace of
 * {@link REFRESH_GRACE_MS}, ends every token that grew from the same sign-in.
 */
export function createSessionService({ database, tokens, log, now }: SessionDependencies): SessionService {
  async function issue(
    transaction: Transaction,
    user: User,
    familyId: string,
    membership: Membership,
    memberships: Membership[],
  ): Promise<OpenedSession> {
    const refreshToken = newSecret();
    const createdAt = now();
    await addRefreshSession(transaction, {
      familyId,
      userId: user.id,
      membershipId: membership.id,
      tokenHash: hashSecret(refreshToken),
      createdAt,
      expiresAt: new Date(createdAt.getTime() + SESSION_MS),
    });
    const accessToken = tokens.issue({
      userId: user.id,
      membershipId: membership.id,
      laboratoryId: membership.laboratoryId,
      role: membership.role,
      clientId: membership.clientId,
      familyId,
    });
    const { id, name, email } = user;
    const session: Session = {
      accessToken,
      expiresInSeconds: ACCESS_TOKEN_SECONDS,
      user: { id, name, email },
      membership,
      memberships,
    };
    return { session, refreshToken };
  }

  return {
    async open(transaction, user, membershipId) {
      await forgetExpired(transaction, user.id, now());
      const memberships = await activeMemberships(transaction, user.id);
      const wanted = membershipId ?? (await lastUsedMembership(transaction, user.id));
      const membership = memberships.find(({ id }) => id === wanted) ?? memberships[0];
      if (membership === undefined) {
        throw new ProblemError('forbidden', 'Your access has ended. Ask a manager of your laboratory to restore it.');
      }
      return issue(transaction, user, randomUUID(), membership, memberships);
    },

    async refresh(refreshToken) {
      if (refreshToken === undefined) throw signInAgain();
      const opened = await database.transaction(async (transaction) => {
        const user = await lockHolder(transaction, refreshToken);
        const spent = user && (await findRefreshSession(transaction, hashSecret(refreshToken)));
        const at = now();
        if (user === null || spent === null || spent.revokedAt !== null || spent.expiresAt <= at) return null;
        if (spent.spentAt !== null && at.getTime() - spent.spentAt.getTime() > REFRESH_GRACE_MS) {
          log.warn({ userId: spent.userId, familyId: spent.familyId }, 'spent refresh token used again: session ended');
          await revokeFamily(transaction, spent.familyId, at);
          return null;
        }
        const memberships = await activeMemberships(transaction, user.id);
        const wanted = await membershipOfFamily(transaction, spent.familyId);
        const membership = memberships.find(({ id }) => id === wanted) ?? memberships[0];
        if (membership === undefined) return null;
        if (spent.spentAt === null) await spendRefreshSession(transaction, spent.id, at);
        return issue(transaction, user, spent.familyId, membership, memberships);
      });
      if (opened === null) throw signInAgain();
      return opened;
    },

    async end(refreshToken) {
      if (refreshToken === undefined) return;
      await database.transaction(async (transaction) => {
        await lockHolder(transaction, refreshToken);
        const session = await findRefreshSession(transaction, hashSecret(refreshToken));
        if (session !== null) await revokeFamily(transaction, session.familyId, now());
      });
    },

    switchLaboratory(actor, laboratoryId) {
      return database.transaction(async (transaction) => {
        const user = await lockUser(transaction, actor.userId);
        const current = await membershipOfFamily(transaction, actor.familyId);
        if (user === null || current === null) throw signInAgain();
        const memberships = await activeMemberships(transaction, actor.userId);
        const membership = memberships.find((m) => m.laboratoryId === laboratoryId);
        if (membership === undefined) throw notFound('laboratory');
        await spendFamily(transaction, actor.familyId, now());
        return issue(transaction, user, actor.familyId, membership, memberships);
      });
    },
  };
}
