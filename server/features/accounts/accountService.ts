import type { Logger } from 'pino';
import type { z } from 'zod';
import type {
  changePasswordBody,
  forgotBody,
  registerBody,
  resetBody,
  signInBody,
} from '../../../shared/contracts/accounts';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database, Transaction } from '../../database/Database';
import type { Actor } from '../../http/Actor';
import { found, ProblemError } from '../../http/ProblemError';
import type { MailTexts } from '../../mail/mailTexts';
import { postMail } from '../../mail/outbox';
import {
  addLaboratory,
  addManager,
  addUser,
  findUserByEmail,
  lockUser,
  renameUser,
  setPassword,
  type User,
} from './accountRepository';
import { addPasswordReset, holderOfReset, useResets } from './passwordResetRepository';
import type { Passwords } from './passwords';
import { hashSecret, newSecret } from './secretTokens';
import { revokeOtherFamilies, revokeUser } from './sessionRepository';
import type { OpenedSession, SessionService } from './sessionService';

/** A mailed permission to set a new password ends after this, minutes. */
export const RESET_MINUTES = 60;

export interface AccountDependencies {
  database: Database;
  sessions: SessionService;
  passwords: Passwords;
  mailTexts: MailTexts;
  log: Logger;
  now: () => Date;
}

export type AccountService = ReturnType<typeof createAccountService>;

const wrongPair = (): ProblemError => new ProblemError('not-signed-in', 'The address or the password is not right.');
const emailTaken = {
  type: 'conflict',
  field: 'email',
  message:
    'An account with this address exists. Give its password to register another laboratory with it, or set a new one.',
} as const;

/** Registering, signing in and passwords. */
export function createAccountService({ database, sessions, passwords, mailTexts, log, now }: AccountDependencies) {
  async function replacePassword(transaction: Transaction, user: User, password: string): Promise<void> {
    await setPassword(transaction, user.id, await passwords.hash(password));
    await useResets(transaction, user.id, now());
    await postMail(transaction, null, mailTexts.passwordChanged(user.email, user.name));
  }

  return {
    /** Makes a laboratory with the caller as its manager. Somebody who has an account proves it by its password. */
    async register(body: z.output<typeof registerBody>): Promise<OpenedSession> {
      const known = await findUserByEmail(database.manager, body.email);
      if (known !== null && !(await passwords.matches(body.password, known.passwordHash))) {
        throw new ProblemError('conflict', emailTaken.message, { fields: { email: emailTaken.message } });
      }
      const passwordHash = known?.passwordHash ?? (await passwords.hash(body.password));
      return withConstraintProblems({ uq_app_user_email: emailTaken }, () =>
        database.transaction(async (transaction) => {
          const user = known ?? (await addUser(transaction, { name: body.name, email: body.email, passwordHash }));
          const laboratoryId = await addLaboratory(transaction, body.laboratoryName);
          const membershipId = await addManager(transaction, laboratoryId, user.id);
          return sessions.open(transaction, user, membershipId);
        }),
      );
    },

    async signIn(body: z.output<typeof signInBody>): Promise<OpenedSession> {
      const user = await findUserByEmail(database.manager, body.email);
      const right = await passwords.matches(body.password, user?.passwordHash ?? null);
      if (user === null || !right) throw wrongPair();
      return database.transaction((transaction) => sessions.open(transaction, user));
    },

    async rename(actor: Actor, name: string): Promise<User> {
      return database.transaction(async (transaction) => {
        const user = found(await lockUser(transaction, actor.userId), 'person');
        await renameUser(transaction, user.id, name);
        return { id: user.id, name, email: user.email };
      });
    },

    /** Sets a new password; every other session of the person ends, the one at hand goes on. */
    async changePassword(actor: Actor, body: z.output<typeof changePasswordBody>): Promise<void> {
      await database.transaction(async (transaction) => {
        const user = found(await lockUser(transaction, actor.userId), 'person');
        if (!(await passwords.matches(body.currentPassword, user.passwordHash))) {
          const message = 'This is not the password you use now.';
          throw new ProblemError('invalid', message, { fields: { currentPassword: message } });
        }
        await replacePassword(transaction, user, body.newPassword);
        await revokeOtherFamilies(transaction, user.id, actor.familyId, now());
      });
    },

    /** Mails a link to set a new password, if the address is known. The caller must not learn whether it is. */
    async forgot({ email }: z.output<typeof forgotBody>): Promise<void> {
      const user = await findUserByEmail(database.manager, email);
      if (user === null) {
        log.info('password reset asked for an address that is not known');
        return;
      }
      const token = newSecret();
      const createdAt = now();
      const expiresAt = new Date(createdAt.getTime() + RESET_MINUTES * 60_000);
      await database.transaction(async (transaction) => {
        await addPasswordReset(transaction, { userId: user.id, tokenHash: hashSecret(token), createdAt, expiresAt });
        await postMail(transaction, null, mailTexts.passwordReset(user.email, user.name, token, RESET_MINUTES));
      });
    },

    /** Sets a new password with a mailed token; every session of the person ends. */
    async reset({ token, password }: z.output<typeof resetBody>): Promise<void> {
      await database.transaction(async (transaction) => {
        const userId = await holderOfReset(transaction, hashSecret(token), now());
        const user = userId === null ? null : await lockUser(transaction, userId);
        if (user === null) {
          throw new ProblemError('invalid', 'This link has been used or is too old. Ask for a new one.');
        }
        await replacePassword(transaction, user, password);
        await revokeUser(transaction, user.id, now());
      });
    },
  };
}
